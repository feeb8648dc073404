package coldseam.cli.plot;

/**
 * How wide a text is, without asking a font: a machine may have none, and a plot must come out the
 * same everywhere. The widths are those of a wide sans-serif face, so that text set in a narrower
 * one takes less room than was kept for it.
 */
final class TextWidths {
  /** From the base line up to the top of capitals and digits, over the size. */
  static final double CAPITAL = 0.73;

  /** From the base line down to the foot of a descender, over the size. */
  static final double DESCENT = 0.22;

  private static final int FIRST = ' ';
  private static final char NO_BREAK_SPACE = '\u00a0';
  private static final double OTHER = 0.70;
  private static final double IDEOGRAPH = 1.05;
  private static final char FIRST_IDEOGRAPH = '\u1100';
  private static final double BOLD = 1.11;

  /** Advance of the characters from space to tilde, hundredths of the size. */
  private static final int[] ADVANCE = {
    32, 40, 46, 84, 64, 95, 78, 28, 39, 39, 50, 84, 32, 36, 32, 34, 64, 64, 64, 64, 64, 64, 64, 64,
    64, 64, 34, 34, 84, 84, 84, 53, 100, 68, 69, 70, 77, 63, 58, 78, 75, 30, 30, 66, 56, 86, 75, 79,
    60, 79, 70, 64, 61, 73, 68, 99, 69, 61, 69, 39, 34, 39, 84, 50, 50, 61, 64, 55, 64, 62, 35, 64,
    63, 28, 28, 58, 28, 97, 63, 61, 64, 64, 41, 52, 39, 63, 59, 82, 59, 59, 53, 64, 34, 64, 84
  };

  private TextWidths() {}

  /** Width of a text set in a lettering, points. */
  static double of(String text, Lettering lettering) {
    double sum = 0;
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c == NO_BREAK_SPACE) {
        sum += ADVANCE[0] / 100.0;
      } else if (c >= FIRST && c - FIRST < ADVANCE.length) {
        sum += ADVANCE[c - FIRST] / 100.0;
      } else if (c >= FIRST_IDEOGRAPH && c < '\u2000' || c >= '\u2e80') {
        sum += IDEOGRAPH;
      } else {
        sum += OTHER;
      }
    }
    return sum * lettering.size() * (lettering.bold() ? BOLD : 1);
  }
}
