package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.text.Digits;

/**
 * Figures as the plots write them: SI, or US customary units when the case is drawn in inches.
 * Everything in the results is SI; only what is written is converted.
 *
 * @param caption the unit of lengths
 * @param whole whether flows and transmittances are of a whole body of revolution, not of a metre
 */
record Figures(Caption caption, boolean whole) {
  /** Between a number and its unit: a space at which no line is broken. */
  static final String JOINED = "\u00a0";

  /** W in a Btu/h (international table). */
  private static final double WATTS = 1055.05585262 / 3600;

  private static final double METRES_PER_FOOT = 0.3048;
  private static final double METRES_PER_INCH = 0.0254;
  private static final double KELVINS = 5.0 / 9;

  /** h·ft²·°F/Btu in a m²·K/W. */
  private static final double RESISTANCE = WATTS / (METRES_PER_FOOT * METRES_PER_FOOT * KELVINS);

  /** Btu/(h·ft) in a W/m. */
  private static final double FLOW = METRES_PER_FOOT / WATTS;

  /** Btu/(h·ft²) in a W/m². */
  private static final double DENSITY = METRES_PER_FOOT * METRES_PER_FOOT / WATTS;

  /** Whether US customary units are written. */
  boolean customary() {
    return caption.unit().equals("in");
  }

  String degrees() {
    return customary() ? "°F" : "°C";
  }

  /** Name of the unit of a temperature difference. */
  String kelvins() {
    return customary() ? "°F" : "K";
  }

  /** A temperature on the written scale. */
  double scaled(double celsius) {
    return customary() ? celsius / KELVINS + 32 : celsius;
  }

  /** A temperature of the written scale in °C. */
  double celsius(double scaled) {
    return customary() ? (scaled - 32) * KELVINS : scaled;
  }

  /** A difference of temperature of the written scale in K. */
  double differenceK(double scaled) {
    return customary() ? scaled * KELVINS : scaled;
  }

  /** A temperature with a fixed count of decimals and its unit. */
  String temperature(double celsius, int decimals) {
    return Digits.fixed(scaled(celsius), decimals) + JOINED + degrees();
  }

  /** A temperature with the decimals it has, two at most, and its unit. */
  String plainTemperature(double celsius) {
    return Digits.shortest(scaled(celsius), 2) + JOINED + degrees();
  }

  /** A length in the unit of the case, without its name. */
  String length(double metres) {
    int decimals = (int) Math.max(0, Math.ceil(Math.log10(caption.metresPerUnit()) + 4 - 1e-9));
    return Digits.shortest(metres / caption.metresPerUnit(), Math.min(4, decimals));
  }

  /** The unit of lengths in words. */
  String lengthUnit() {
    return customary() ? "inches" : caption.unit();
  }

  /** A length with its unit. */
  String lengthWithUnit(double metres) {
    return length(metres) + JOINED + caption.unit();
  }

  /** A film resistance, two decimals at least, without its unit. */
  String film(double m2KPerW) {
    String text = Digits.shortest(m2KPerW * (customary() ? RESISTANCE : 1), 4);
    int decimals = text.contains(".") ? text.length() - text.indexOf('.') - 1 : 0;
    return decimals >= 2 ? text : Digits.fixed(m2KPerW * (customary() ? RESISTANCE : 1), 2);
  }

  String filmUnit() {
    return customary() ? "h·ft²·°F/Btu" : "m²·K/W";
  }

  /** A conductivity without its unit. */
  String conductivity(double wPerMK) {
    double written = customary() ? wPerMK / METRES_PER_INCH / RESISTANCE : wPerMK;
    return written >= 100 ? Digits.shortest(written, 0) : Digits.shortest(written, 4);
  }

  String conductivityUnit() {
    return customary() ? "Btu·in/(h·ft²·°F)" : "W/(m·K)";
  }

  /** A U-value with its unit. */
  String transmittance(double wPerM2K) {
    return customary()
        ? Digits.fixed(wPerM2K / RESISTANCE, 4) + JOINED + "Btu/(h·ft²·°F)"
        : Digits.fixed(wPerM2K, 3) + JOINED + "W/(m²·K)";
  }

  /**
   * A heat flow per metre to the digits that its half-width leaves, without its unit.
   *
   * @param wPerM the flow
   * @param halfWidthWPerM how far it may be off
   */
  String flow(double wPerM, double halfWidthWPerM) {
    double factor = customary() ? flowScale() : 1;
    return Digits.of(wPerM * factor, halfWidthWPerM * factor, 3).value();
  }

  /** Btu/(h·ft) in a W/m, or Btu/h in a W. */
  private double flowScale() {
    return whole ? 1 / WATTS : FLOW;
  }

  /** A ψ or χ or a change of it on the written scale. */
  double scaledLinear(double wPerMK) {
    return customary() ? wPerMK * flowScale() * KELVINS : wPerMK;
  }

  /** A ψ or a change of it, without its unit. */
  String linear(double wPerMK) {
    return Digits.fixed(scaledLinear(wPerMK), 4);
  }

  String linearUnit() {
    if (whole) {
      return customary() ? "Btu/(h·°F)" : "W/K";
    }
    return customary() ? "Btu/(h·ft·°F)" : "W/(m·K)";
  }

  /** A heat flow per metre on the written scale. */
  double scaledFlow(double wPerM) {
    return customary() ? wPerM * flowScale() : wPerM;
  }

  /** A heat flow per metre of the written scale in W/m. */
  double flowWPerM(double scaled) {
    return customary() ? scaled / flowScale() : scaled;
  }

  String flowUnit() {
    if (whole) {
      return customary() ? "Btu/h" : "W";
    }
    return customary() ? "Btu/(h·ft)" : "W/m";
  }

  /** A density of heat flow on the written scale. */
  double scaledDensity(double wPerM2) {
    return customary() ? wPerM2 * DENSITY : wPerM2;
  }

  /** A density of the written scale in W/m². */
  double densityWPerM2(double scaled) {
    return customary() ? scaled / DENSITY : scaled;
  }

  String densityUnit() {
    return customary() ? "Btu/(h·ft²)" : "W/m²";
  }

  /** A plain figure as short as it is. */
  static String round(double value) {
    return Digits.shortest(value, 6);
  }

  static String percent(double share) {
    return Digits.shortest(100 * share, 1) + JOINED + "%";
  }
}
