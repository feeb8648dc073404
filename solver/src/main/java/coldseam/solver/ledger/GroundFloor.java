package coldseam.solver.ledger;

/**
 * A floor slab on the ground without edge insulation (ISO 13370:2017, clause on slab-on-ground
 * floors): B' = A/(0.5 P), d_t = w + λ (Rsi + Rf + Rse); for d_t &lt; B' U = 2λ/(π B' + d_t) ln(π
 * B'/d_t + 1), else U = λ/(0.457 B' + d_t).
 *
 * @param areaM2 A, m²
 * @param perimeterM P, exposed, m
 * @param wallM w, full thickness of the walls, m
 * @param resistanceM2KPerW Rf of the floor construction, m²·K/W
 * @param groundWPerMK λ of the ground, W/(m·K)
 */
public record GroundFloor(
    double areaM2, double perimeterM, double wallM, double resistanceM2KPerW, double groundWPerMK) {
  /** Rsi of floors, heat flowing down, m²·K/W. */
  public static final double INSIDE_M2K_PER_W = 0.17;

  /** Rse, m²·K/W. */
  public static final double OUTSIDE_M2K_PER_W = 0.04;

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException unless area, perimeter and λ are more than 0 and the rest is
   *     not negative
   */
  public GroundFloor {
    if (!(areaM2 > 0)
        || !(perimeterM > 0)
        || !(groundWPerMK > 0)
        || !(wallM >= 0)
        || !(resistanceM2KPerW >= 0)) {
      throw new IllegalArgumentException("a floor has an area, a perimeter and ground below it");
    }
  }

  /** B', characteristic dimension, m. */
  public double characteristicM() {
    return areaM2 / (0.5 * perimeterM);
  }

  /** d_t, equivalent thickness, m. */
  public double equivalentThicknessM() {
    return wallM + groundWPerMK * (INSIDE_M2K_PER_W + resistanceM2KPerW + OUTSIDE_M2K_PER_W);
  }

  /** U of the floor with the ground, W/(m²·K). */
  public double transmittanceWPerM2K() {
    double b = characteristicM();
    double d = equivalentThicknessM();
    return d < b
        ? 2 * groundWPerMK / (Math.PI * b + d) * Math.log(Math.PI * b / d + 1)
        : groundWPerMK / (0.457 * b + d);
  }
}
