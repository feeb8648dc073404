package coldseam.cli.plot;

import java.awt.Font;

/**
 * How text is set.
 *
 * @param size of the face, points
 * @param bold whether bold
 * @param ink its colour
 */
record Lettering(float size, boolean bold, Colour ink) {
  static final Lettering TITLE = new Lettering(18, true, Palette.INK);
  static final Lettering SUBTITLE = new Lettering(12.5f, false, Palette.INK);
  static final Lettering HEADING = new Lettering(11.5f, true, Palette.INK);
  static final Lettering LABEL = new Lettering(11.5f, false, Palette.INK);
  static final Lettering STRONG = new Lettering(11.5f, true, Palette.INK);
  static final Lettering SMALL = new Lettering(10, false, Palette.INK);
  static final Lettering SMALL_STRONG = new Lettering(10, true, Palette.INK);
  static final Lettering QUIET = new Lettering(10, false, Palette.SECOND_INK);
  static final Lettering MEASURE = new Lettering(10, false, Palette.INK);
  static final Lettering REFERENCE = new Lettering(10, true, Palette.REFERENCE);

  /** Java's logical sans-serif face, for pixels. */
  Font font() {
    return new Font(Font.SANS_SERIF, bold ? Font.BOLD : Font.PLAIN, 1).deriveFont(size);
  }

  /** Height of a line of this text, points. */
  double lineHeight() {
    return size * 1.32;
  }

  /** The same in another colour. */
  Lettering in(Colour other) {
    return new Lettering(size, bold, other);
  }
}
