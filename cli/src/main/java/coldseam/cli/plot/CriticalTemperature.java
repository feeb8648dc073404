package coldseam.cli.plot;

/**
 * Surface temperatures below which mould may grow or water condenses, from the air's temperature
 * and humidity (ISO 13788:2012, 5.3 and annex E): saturation pressure p_sat = 610.5 exp(17.269 θ /
 * (237.3 + θ)) Pa from 0 °C, 610.5 exp(21.875 θ / (265.5 + θ)) Pa below.
 */
final class CriticalTemperature {
  /** Relative humidity at the surface from which mould may grow. */
  static final double MOULD = 0.8;

  private static final double AT_ZERO_PA = 610.5;

  private CriticalTemperature() {}

  /**
   * The surface temperature at which air has a given humidity at the surface.
   *
   * @param airC temperature of the air, °C
   * @param humidity relative humidity of the air, more than 0, at most 1
   * @param atSurface relative humidity at the surface: 0.8 for mould, 1 for the dew point
   * @return °C
   */
  static double of(double airC, double humidity, double atSurface) {
    return saturated(humidity * saturationPa(airC) / atSurface);
  }

  static double saturationPa(double celsius) {
    return celsius >= 0
        ? AT_ZERO_PA * Math.exp(17.269 * celsius / (237.3 + celsius))
        : AT_ZERO_PA * Math.exp(21.875 * celsius / (265.5 + celsius));
  }

  /** The temperature at which a vapour pressure is that of saturation, °C. */
  static double saturated(double pa) {
    double l = Math.log(pa / AT_ZERO_PA);
    return l >= 0 ? 237.3 * l / (17.269 - l) : 265.5 * l / (21.875 - l);
  }
}
