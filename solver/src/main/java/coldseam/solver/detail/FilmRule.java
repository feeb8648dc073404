package coldseam.solver.detail;

/**
 * Surface resistance by the direction of heat flow through the surface. All four figures 0 mean
 * that the surface has the temperature of the space (a fixed temperature).
 *
 * @param upM2KPerW for heat flowing upwards, m²·K/W
 * @param horizontalM2KPerW for heat flowing within 30° of the horizontal, or in a direction that
 *     cannot be decided, m²·K/W
 * @param downM2KPerW for heat flowing downwards, m²·K/W
 * @param glazingM2KPerW on surfaces of glazing and frames, whatever the direction; NaN means by
 *     direction like any other surface
 * @param source clause, or "typed in the case"
 */
public record FilmRule(
    double upM2KPerW,
    double horizontalM2KPerW,
    double downM2KPerW,
    double glazingM2KPerW,
    String source) {
  /** ISO 6946:2017, 6.8, table 7, inside. */
  public static final FilmRule ISO_6946_INSIDE =
      new FilmRule(0.10, 0.13, 0.17, Double.NaN, "ISO 6946 conventional surface resistance, Rsi");

  /** ISO 6946:2017, 6.8, table 7, outside. */
  public static final FilmRule ISO_6946_OUTSIDE =
      new FilmRule(0.04, 0.04, 0.04, Double.NaN, "ISO 6946 conventional surface resistance, Rse");

  /** ISO 13788: 0.25 inside, 0.13 on glazing and frames. */
  public static final FilmRule ISO_13788_INSIDE =
      new FilmRule(0.25, 0.25, 0.25, 0.13, "ISO 13788 surface resistance for surface temperature");

  /** ISO 13788: 0.04 outside. */
  public static final FilmRule ISO_13788_OUTSIDE =
      new FilmRule(0.04, 0.04, 0.04, 0.04, "ISO 13788 surface resistance, outside");

  /** ISO 10077-2: less radiation and convection at inner corners of frames. */
  public static final FilmRule ISO_10077_2_REDUCED =
      uniform(0.20, "ISO 10077-2 reduced radiation and convection at inner corners");

  /** The surface has the temperature of the space. */
  public static final FilmRule FIXED_TEMPERATURE =
      new FilmRule(0, 0, 0, 0, "fixed surface temperature");

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException if a resistance is negative or not finite, or some but not all
   *     are 0
   */
  public FilmRule {
    double glazing = Double.isNaN(glazingM2KPerW) ? horizontalM2KPerW : glazingM2KPerW;
    double[] all = {upM2KPerW, horizontalM2KPerW, downM2KPerW, glazing};
    int zeros = 0;
    for (double r : all) {
      if (!(r >= 0) || !Double.isFinite(r)) {
        throw new IllegalArgumentException("a film resistance is a finite number, 0 or more");
      }
      zeros += r == 0 ? 1 : 0;
    }
    if (zeros != 0 && zeros != all.length) {
      throw new IllegalArgumentException("film resistances are all 0 or all more than 0");
    }
  }

  /**
   * One resistance for every direction and surface.
   *
   * @param resistanceM2KPerW Rs, m²·K/W; 0 fixes the surface temperature
   * @param source clause, or "typed in the case"
   * @return the rule
   */
  public static FilmRule uniform(double resistanceM2KPerW, String source) {
    return new FilmRule(
        resistanceM2KPerW, resistanceM2KPerW, resistanceM2KPerW, resistanceM2KPerW, source);
  }

  /** Whether the surface has the temperature of the space. */
  public boolean fixedTemperature() {
    return horizontalM2KPerW == 0;
  }
}
