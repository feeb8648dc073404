package coldseam.solver.result;

/**
 * What a surface temperature has to be for mould not to grow or water not to condense on it (ISO
 * 13788:2012, clauses 4.2, 5.2, 5.3 and annex E; *from memory*). Saturation pressure is 610.5
 * exp(17.269 θ / (237.3 + θ)) Pa from 0 °C and 610.5 exp(21.875 θ / (265.5 + θ)) Pa below.
 */
public final class MoistureLimits {
  /** Relative humidity at a surface above which mould may grow. */
  public static final double MOULD = 0.8;

  /** Relative humidity at a surface at which water condenses. */
  public static final double CONDENSATION = 1.0;

  /** Added to a fixed indoor humidity in the monthly procedure (ISO 13788:2012, 5.3). */
  public static final double MONTHLY_MARGIN = 0.05;

  /** By what an excess of vapour pressure is multiplied in the monthly procedure. */
  public static final double EXCESS_MARGIN = 1.10;

  /** Outdoor temperature at which the excess of vapour pressure has fallen to 0, °C. */
  private static final double NO_EXCESS_C = 20;

  private static final double AT_ZERO_PA = 610.5;

  /** Upper limits of the humidity classes 1 to 4 at 0 °C and below, Pa; class 5 has none. */
  private static final double[] CLASS_PA = {270, 540, 810, 1080};

  private MoistureLimits() {}

  /**
   * Pressure of saturated vapour.
   *
   * @param celsius temperature, °C, above absolute zero
   * @return Pa
   */
  public static double saturationPa(double celsius) {
    return celsius >= 0
        ? AT_ZERO_PA * Math.exp(17.269 * celsius / (237.3 + celsius))
        : AT_ZERO_PA * Math.exp(21.875 * celsius / (265.5 + celsius));
  }

  /**
   * The temperature at which a vapour pressure is that of saturation: the dew point.
   *
   * @param pa vapour pressure, Pa, more than 0
   * @return °C
   */
  public static double saturatedC(double pa) {
    double l = Math.log(pa / AT_ZERO_PA);
    return l >= 0 ? 237.3 * l / (17.269 - l) : 265.5 * l / (21.875 - l);
  }

  /**
   * The surface temperature at which the air has a given relative humidity at the surface.
   *
   * @param vapourPa vapour pressure of the air, Pa
   * @param atSurface relative humidity at the surface, {@link #MOULD} or {@link #CONDENSATION}
   * @return °C
   */
  public static double criticalC(double vapourPa, double atSurface) {
    return saturatedC(vapourPa / atSurface);
  }

  /**
   * The temperature factor that a surface needs.
   *
   * @param criticalC the least surface temperature, °C
   * @param insideC temperature indoors, °C
   * @param outsideC temperature outdoors, °C, below that indoors
   * @return (θsi,min − θe)/(θi − θe)
   */
  public static double requiredFactor(double criticalC, double insideC, double outsideC) {
    return (criticalC - outsideC) / (insideC - outsideC);
  }

  /**
   * By how much the vapour pressure indoors exceeds that outdoors: all of it up to 0 °C, falling
   * linearly to nothing at 20 °C.
   *
   * @param excessPa excess at 0 °C and below, Pa
   * @param outsideC temperature outdoors, °C
   * @return Pa
   */
  public static double excessPa(double excessPa, double outsideC) {
    double part = (NO_EXCESS_C - outsideC) / NO_EXCESS_C;
    return excessPa * Math.max(0, Math.min(1, part));
  }

  /**
   * Upper limit of a humidity class at 0 °C and below.
   *
   * @param humidityClass 1 (stores) to 4 (kitchens, sports halls)
   * @return Pa
   * @throws IllegalArgumentException for class 5, which has no upper limit, and what is no class
   */
  public static double classPa(int humidityClass) {
    if (humidityClass < 1 || humidityClass > CLASS_PA.length) {
      throw new IllegalArgumentException("humidity classes with an upper limit are 1 to 4");
    }
    return CLASS_PA[humidityClass - 1];
  }
}
