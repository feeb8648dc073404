package coldseam.cli.plot;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.AffineTransform;

/** What a plot is drawn on: one Java2D graphics behind it, whether it writes SVG or pixels. */
abstract class Canvas {
  /** Which point of a text is put at the given place. */
  enum Anchor {
    START,
    MIDDLE,
    END
  }

  private final Graphics2D graphics;

  Canvas(Graphics2D graphics) {
    this.graphics = graphics;
  }

  /**
   * Everything drawn from now on belongs to a named layer.
   *
   * @param id unique in a plot
   */
  abstract void layer(String id);

  /** How far to the right of its start the anchor of a text lies, as this canvas sets it. */
  abstract double beforeAnchor(String text, Lettering lettering, Anchor anchor);

  /** Called after each text, in order. */
  abstract void written(Anchor anchor);

  final void fill(Shape shape, Color colour) {
    if (shape.getPathIterator(null).isDone()) {
      return;
    }
    graphics.setPaint(colour);
    graphics.fill(shape);
  }

  final void stroke(Shape shape, Color colour, Pen pen) {
    if (shape.getPathIterator(null).isDone()) {
      return;
    }
    graphics.setPaint(colour);
    graphics.setStroke(pen.stroke());
    graphics.draw(shape);
  }

  final void text(String text, double x, double y, Lettering lettering) {
    text(text, x, y, lettering, Anchor.START, 0);
  }

  final void text(String text, double x, double y, Lettering lettering, Anchor anchor) {
    text(text, x, y, lettering, anchor, 0);
  }

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
  final void text(
      String text, double x, double y, Lettering lettering, Anchor anchor, double turn) {
    if (text.isEmpty()) {
      return;
    }
    graphics.setFont(lettering.font());
    graphics.setPaint(lettering.ink());
    AffineTransform saved = graphics.getTransform();
    if (turn != 0) {
      graphics.rotate(turn, x, y);
    }
    double before = beforeAnchor(text, lettering, anchor);
    graphics.drawString(text, (float) (x - before), (float) y);
    graphics.setTransform(saved);
    written(anchor);
  }
}
