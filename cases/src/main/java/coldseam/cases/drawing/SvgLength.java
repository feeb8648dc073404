package coldseam.cases.drawing;

/** Lengths of SVG attributes: a number of user units, or with a unit; SVG 1.1, 4.2. */
final class SvgLength {
  /** User units per inch. */
  static final double PER_INCH = 96;

  private SvgLength() {}

  /**
   * Millimetres per unit of length.
   *
   * @param unit as written
   * @return NaN if it is no unit of length on paper
   */
  static double millimetres(String unit) {
    return switch (unit) {
      case "mm" -> 1;
      case "cm" -> 10;
      case "in" -> 25.4;
      case "pt" -> 25.4 / 72;
      case "pc" -> 25.4 / 6;
      case "q", "Q" -> 0.25;
      default -> Double.NaN;
    };
  }

  /**
   * A length in user units.
   *
   * @param element has it
   * @param key the attribute
   * @param otherwise where it is not written
   * @param whole what 100 % are
   */
  static double of(SvgElement element, String key, double otherwise, double whole)
      throws DrawingException {
    String text = element.attribute(key).strip();
    if (text.isEmpty() || text.equals("auto")) {
      return otherwise;
    }
    SvgScanner in = new SvgScanner("`" + key + "`", text, element.line());
    if (text.indexOf(',') >= 0) {
      throw new DrawingException(
          element.line(),
          "a decimal comma: `" + key + "` is `" + DxfGroups.shortened(text) + "`",
          "numbers in SVG have decimal points");
    }
    double number = in.number();
    String unit = in.word();
    if (!in.done()) {
      throw in.wrong("nothing more");
    }
    if (unit.isEmpty() || unit.equals("px")) {
      return number;
    }
    if (unit.equals("%")) {
      return number / 100 * whole;
    }
    double mm = millimetres(unit);
    if (!Double.isNaN(mm)) {
      return number * mm / 25.4 * PER_INCH;
    }
    throw new DrawingException(
        element.line(),
        "`" + key + "` is in `" + DxfGroups.shortened(unit) + "`, which is not read here",
        "write user units, mm, cm, in, pt or pc");
  }
}
