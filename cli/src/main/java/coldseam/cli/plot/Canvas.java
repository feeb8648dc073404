package coldseam.cli.plot;

import java.awt.Shape;

/** What a plot is drawn on: shapes of Java2D and lines of text, written as SVG or as pixels. */
abstract class Canvas {
  /** Which point of a text is put at the given place. */
  enum Anchor {
    START,
    MIDDLE,
    END
  }

  /**
   * Everything drawn from now on belongs to a named layer.
   *
   * @param id unique in a plot
   */
  abstract void layer(String id);

  abstract void fill(Shape shape, Colour colour);

  abstract void stroke(Shape shape, Colour colour, Pen pen);

  /**
   * Writes a line of text.
   *
   * @param text the text
   * @param x of the anchor on the base line
   * @param y of the base line
   * @param lettering how it is set
   * @param anchor which point of the text is put there
   * @param turn clockwise about that point, radians
   */
  abstract void text(
      String text, double x, double y, Lettering lettering, Anchor anchor, double turn);

  final void text(String text, double x, double y, Lettering lettering) {
    text(text, x, y, lettering, Anchor.START, 0);
  }

  final void text(String text, double x, double y, Lettering lettering, Anchor anchor) {
    text(text, x, y, lettering, anchor, 0);
  }
}
