package coldseam.cli.plot;

/**
 * The colours. Both scales run through ever lighter or ever darker colours, so that they keep their
 * order in grey and for readers who tell hues apart badly; nothing is told by colour alone.
 */
final class Palette {
  static final Colour PAPER = new Colour(0xFFFFFF);
  static final Colour INK = new Colour(0x22262B);
  static final Colour SECOND_INK = new Colour(0x5A626A);
  static final Colour RULE = new Colour(0xB9BEC4);

  /** Inside surfaces, and everything said of them. */
  static final Colour INSIDE = new Colour(0x94501C);

  /** Outside surfaces. */
  static final Colour OUTSIDE = new Colour(0x2A5A8A);

  /** Reference lengths of ψ. */
  static final Colour REFERENCE = new Colour(0x6B2F77);

  private static final int[] TEMPERATURE = {
    0x2C427A, 0x46699B, 0x7793B0, 0xB0A69E, 0xDDB484, 0xF6D9A0, 0xFDF4D6
  };
  private static final int[] FLOW = {
    0xF7F5EC, 0xE2D7C3, 0xCBAE9B, 0xB08078, 0x8A5468, 0x5B2F58, 0x2E1638
  };

  private Palette() {}

  /**
   * The temperature scale, from dark cold to light warm.
   *
   * @param part 0 for the coldest, 1 for the warmest
   */
  static Colour temperature(double part) {
    return along(TEMPERATURE, part);
  }

  /**
   * The scale of heat-flow density, from light and little to dark and much.
   *
   * @param part 0 for the least, 1 for the most
   */
  static Colour flow(double part) {
    return along(FLOW, part);
  }

  private static Colour along(int[] stops, double part) {
    double place = Math.max(0, Math.min(1, part)) * (stops.length - 1);
    int below = Math.min((int) place, stops.length - 2);
    return mix(new Colour(stops[below]), new Colour(stops[below + 1]), place - below);
  }

  /** A colour between two, 0 for the first and 1 for the second. */
  static Colour mix(Colour a, Colour b, double part) {
    long red = Math.round(a.red() + part * (b.red() - a.red()));
    long green = Math.round(a.green() + part * (b.green() - a.green()));
    long blue = Math.round(a.blue() + part * (b.blue() - a.blue()));
    return new Colour((int) (red << 16 | green << 8 | blue));
  }

  /** Relative luminance, 0 black to 1 white (WCAG 2.1). */
  static double luminance(Colour colour) {
    return 0.2126 * linear(colour.red())
        + 0.7152 * linear(colour.green())
        + 0.0722 * linear(colour.blue());
  }

  private static double linear(int channel) {
    double c = channel / 255.0;
    return c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
  }
}
