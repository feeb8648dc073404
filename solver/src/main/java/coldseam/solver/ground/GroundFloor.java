package coldseam.solver.ground;

/**
 * Steady-state heat loss of a floor next to the ground by the formulas of ISO 13370:2017 (*from
 * memory*, checked against a public transcription). Lengths in m, U in W/(m²·K).
 *
 * @param characteristicM B' = A/(0.5 P), m
 * @param soilWPerMK conductivity of the ground λ, W/(m·K)
 * @param wallM full thickness of the outer walls w, m
 * @param resistanceM2KPerW R of the floor construction alone, without films, m²·K/W
 * @param insideM2KPerW Rsi of the floor, m²·K/W
 * @param outsideM2KPerW Rse, m²·K/W
 */
public record GroundFloor(
    double characteristicM,
    double soilWPerMK,
    double wallM,
    double resistanceM2KPerW,
    double insideM2KPerW,
    double outsideM2KPerW) {
  /** Rsi of a floor, heat flowing downwards (ISO 6946). */
  public static final double FLOOR_FILM_M2K_PER_W = 0.17;

  /** Rsi of a basement wall. */
  public static final double WALL_FILM_M2K_PER_W = 0.13;

  /** Rse. */
  public static final double OUTSIDE_FILM_M2K_PER_W = 0.04;

  /** Share of the openings' area that wind moves air through, W·s·h⁻¹… of ISO 13370: 1450. */
  private static final double VENTILATION = 1450;

  /** Heat capacity of air by volume over 3600 s, Wh/(m³·K). */
  private static final double AIR_WH_PER_M3K = 0.33;

  /** Slope of U against B' for well insulated floors. */
  private static final double WELL_INSULATED = 0.457;

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException unless B' and λ are more than 0 and the others 0 or more
   */
  public GroundFloor {
    if (!(characteristicM > 0) || !(soilWPerMK > 0)) {
      throw new IllegalArgumentException("a floor on the ground needs a width and a ground");
    }
    for (double part : new double[] {wallM, resistanceM2KPerW, insideM2KPerW, outsideM2KPerW}) {
      if (!(part >= 0) || !Double.isFinite(part)) {
        throw new IllegalArgumentException("a thickness or resistance is 0 or more");
      }
    }
  }

  /** Equivalent thickness d_t = w + λ (Rsi + Rf + Rse), m. */
  public double equivalentM() {
    return wallM + soilWPerMK * (insideM2KPerW + resistanceM2KPerW + outsideM2KPerW);
  }

  /** U of a slab on the ground, insulated all over or not at all. */
  public double slab() {
    return under(equivalentM());
  }

  /** U for an equivalent thickness: the slab's formula. */
  private double under(double thickness) {
    return thickness < characteristicM
        ? logarithmic(thickness)
        : soilWPerMK / (WELL_INSULATED * characteristicM + thickness);
  }

  private double logarithmic(double thickness) {
    double length = Math.PI * characteristicM;
    return 2 * soilWPerMK / (length + thickness) * Math.log(length / thickness + 1);
  }

  /** A strip of insulation along the edge of a slab. */
  public enum Edge {
    /** Lying, of some width from the edge. */
    HORIZONTAL,
    /** Standing, of some depth below the ground. */
    VERTICAL
  }

  /**
   * What insulation along the edge adds to ψ: always negative.
   *
   * @param edge how it lies
   * @param extentM its width or depth D, m
   * @param thicknessM its thickness, m
   * @param conductivityWPerMK its conductivity, W/(m·K)
   * @return ψ_g,e, W/(m·K)
   */
  public double edgeInsulation(
      Edge edge, double extentM, double thicknessM, double conductivityWPerMK) {
    double extra = (thicknessM / conductivityWPerMK - thicknessM / soilWPerMK) * soilWPerMK;
    double reach = edge == Edge.HORIZONTAL ? extentM : 2 * extentM;
    double thickness = equivalentM();
    return -soilWPerMK
        / Math.PI
        * (Math.log(reach / thickness + 1) - Math.log(reach / (thickness + extra) + 1));
  }

  /**
   * U of a slab with insulation along its edge: U + 2 ψ_g,e/B'.
   *
   * @param edgeInsulationWPerMK ψ_g,e, W/(m·K)
   * @return W/(m²·K)
   */
  public double slabWith(double edgeInsulationWPerMK) {
    return slab() + 2 * edgeInsulationWPerMK / characteristicM;
  }

  /**
   * U of the floor of a heated basement.
   *
   * @param depthM depth z of its floor below the ground, m
   * @return U_bf, W/(m²·K)
   */
  public double basementFloor(double depthM) {
    return under(equivalentM() + depthM / 2);
  }

  /**
   * U of the walls of a basement, below the ground.
   *
   * @param depthM depth z, m, more than 0
   * @param wallM2KPerW R of the wall alone, m²·K/W
   * @return U_bw, W/(m²·K)
   */
  public double basementWall(double depthM, double wallM2KPerW) {
    double wall = soilWPerMK * (WALL_FILM_M2K_PER_W + wallM2KPerW + outsideM2KPerW);
    double floor = Math.min(equivalentM(), wall);
    return 2
        * soilWPerMK
        / (Math.PI * depthM)
        * (1 + 0.5 * floor / (floor + depthM))
        * Math.log(depthM / wall + 1);
  }

  /**
   * Heat loss of a heated basement for each metre of edge of the half floor.
   *
   * @param depthM depth z, m
   * @param wallM2KPerW R of the wall alone, m²·K/W
   * @return 0.5 B' U_bf + z U_bw, W/(m·K)
   */
  public double basement(double depthM, double wallM2KPerW) {
    return characteristicM / 2 * basementFloor(depthM) + depthM * basementWall(depthM, wallM2KPerW);
  }

  /**
   * U of the floor over an unheated basement.
   *
   * @param floor U_f between the rooms and the basement, W/(m²·K)
   * @param depthM depth of the basement floor below the ground z, m
   * @param wallM2KPerW R of its walls below the ground, m²·K/W
   * @param heightM height of the floor above the ground h, m
   * @param wall U of its walls above the ground, W/(m²·K)
   * @param airChanges changes of air n, 1/h
   * @return W/(m²·K)
   */
  public double overBasement(
      double floor,
      double depthM,
      double wallM2KPerW,
      double heightM,
      double wall,
      double airChanges) {
    double area = characteristicM / 2;
    double out =
        basement(depthM, wallM2KPerW)
            + heightM * wall
            + AIR_WH_PER_M3K * airChanges * area * (depthM + heightM);
    return 1 / (1 / floor + area / out);
  }

  /** How much wind reaches a crawl space. */
  public enum Shielding {
    /** City centre. */
    SHELTERED(0.02),
    /** Suburban. */
    AVERAGE(0.05),
    /** Rural. */
    EXPOSED(0.10);

    private final double factor;

    Shielding(double factor) {
      this.factor = factor;
    }
  }

  /**
   * Conductance that ventilation adds between a crawl space and outdoors, for each metre of edge.
   *
   * @param openingsM2PerM area of the openings for each metre of edge, m²/m
   * @param windMPerS mean wind speed, m/s
   * @param shielding how much of it arrives
   * @return W/(m·K)
   */
  public static double ventilation(double openingsM2PerM, double windMPerS, Shielding shielding) {
    return VENTILATION / 2 * openingsM2PerM * windMPerS * shielding.factor;
  }

  /**
   * U of a suspended floor; the resistance of this floor is that of what lies on the ground under
   * the void.
   *
   * @param floor U_f between the rooms and the void, W/(m²·K)
   * @param heightM height of the floor above the ground h, m
   * @param wall U of the void's walls above the ground, W/(m²·K)
   * @param ventilationWPerMK as {@link #ventilation}, W/(m·K)
   * @return W/(m²·K)
   */
  public double suspended(double floor, double heightM, double wall, double ventilationWPerMK) {
    double across = 2 * (heightM * wall + ventilationWPerMK) / characteristicM;
    return 1 / (1 / floor + 1 / (logarithmic(equivalentM()) + across));
  }
}
