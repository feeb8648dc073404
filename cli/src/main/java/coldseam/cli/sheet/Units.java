package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.mesh.plane.Point;

/**
 * How a reader measures: places in the unit of the drawing, and US customary figures beside SI when
 * the case is drawn in inches.
 *
 * @param unit the unit the case draws in
 * @param metresPerUnit metres in one of it
 */
record Units(String unit, double metresPerUnit) {
  /** Joules in a British thermal unit (international table). */
  private static final double JOULES_PER_BTU = 1055.05585262;

  private static final double SECONDS_PER_HOUR = 3600;
  private static final double METRES_PER_FOOT = 0.3048;
  private static final double KELVINS_PER_FAHRENHEIT = 5.0 / 9;
  private static final double WATTS_PER_BTU_PER_HOUR = JOULES_PER_BTU / SECONDS_PER_HOUR;

  /** h·ft²·°F/Btu in a m²·K/W. */
  static final double R =
      WATTS_PER_BTU_PER_HOUR / (METRES_PER_FOOT * METRES_PER_FOOT * KELVINS_PER_FAHRENHEIT);

  /** Btu/(h·ft²·°F) in a W/(m²·K). */
  static final double U = 1 / R;

  /** Btu/(h·ft·°F) in a W/(m·K). */
  static final double PSI = METRES_PER_FOOT * KELVINS_PER_FAHRENHEIT / WATTS_PER_BTU_PER_HOUR;

  /** Btu/(h·ft) in a W/m. */
  static final double FLOW = METRES_PER_FOOT / WATTS_PER_BTU_PER_HOUR;

  /** Btu/(h·°F) in a W/K. */
  static final double CHI = KELVINS_PER_FAHRENHEIT / WATTS_PER_BTU_PER_HOUR;

  /** Btu/h in a W. */
  static final double WHOLE_FLOW = 1 / WATTS_PER_BTU_PER_HOUR;

  static final String CHI_NAME = "Btu/(h·°F)";
  static final String WHOLE_FLOW_NAME = "Btu/h";
  static final String R_NAME = "h·ft²·°F/Btu";
  static final String U_NAME = "Btu/(h·ft²·°F)";
  static final String PSI_NAME = "Btu/(h·ft·°F)";
  static final String FLOW_NAME = "Btu/(h·ft)";

  static Units of(Subject subject) {
    return new Units(subject.unit(), subject.metresPerUnit());
  }

  /** Whether US customary figures stand beside SI. */
  boolean customary() {
    return unit.equals("in");
  }

  /** °F. */
  static double fahrenheit(double celsius) {
    return celsius * 9 / 5 + 32;
  }

  /** °F in a difference of 1 K. */
  static double fahrenheitDifference(double kelvins) {
    return kelvins / KELVINS_PER_FAHRENHEIT;
  }

  /** The unit of the drawing where it stands alone. */
  String unitInWords() {
    return unit.equals("in") ? "inches" : unit;
  }

  /** A place in the drawing, in its unit: {@code (0, 1200)}. */
  String place(Point at) {
    return "(" + length(at.x()) + ", " + length(at.y()) + ")";
  }

  /** A length in the unit of the drawing, without the unit, to a tenth of a millimetre or finer. */
  String length(double metres) {
    int decimals =
        switch (unit) {
          case "m" -> 4;
          case "cm", "in" -> 2;
          default -> 1;
        };
    return Digits.shortest(metres / metresPerUnit, decimals);
  }
}
