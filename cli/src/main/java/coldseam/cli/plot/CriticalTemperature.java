package coldseam.cli.plot;

import coldseam.solver.result.MoistureLimits;

/**
 * Surface temperatures below which mould may grow or water condenses, from the air's temperature
 * and humidity ({@link MoistureLimits}).
 */
final class CriticalTemperature {
  /** Relative humidity at the surface from which mould may grow. */
  static final double MOULD = MoistureLimits.MOULD;

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
    return MoistureLimits.criticalC(humidity * MoistureLimits.saturationPa(airC), atSurface);
  }
}
