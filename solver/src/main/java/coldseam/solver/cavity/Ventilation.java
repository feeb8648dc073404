package coldseam.solver.cavity;

/** How far the air of a cavity or of a layer is exchanged with that of a space. */
public enum Ventilation {
  /** Taken as still. */
  UNVENTILATED("unventilated"),
  /** Half way: λ_eq doubled in a frame, total resistance interpolated in a layer. */
  SLIGHTLY_VENTILATED("slightly ventilated"),
  /** Part of the space it opens to. */
  WELL_VENTILATED("well ventilated");

  /**
   * Width of a slit up to which a cavity of a frame counts as unventilated, m, and width of a
   * throat at which it is taken as two. ISO 10077-2, air cavities; <em>from memory</em>.
   */
  public static final double UNVENTILATED_SLIT_M = 0.002;

  /**
   * Width of a slit or groove up to which a cavity of a frame counts as slightly ventilated, m. ISO
   * 10077-2, air cavities; <em>from memory</em>.
   */
  public static final double SLIGHTLY_VENTILATED_SLIT_M = 0.010;

  /**
   * Area of openings up to which an air layer counts as unventilated: m² per metre of length of a
   * vertical layer, per m² of surface of a horizontal one. ISO 6946, unventilated air layers;
   * <em>from memory</em>.
   */
  public static final double UNVENTILATED_OPENINGS = 500e-6;

  /**
   * Area of openings from which on an air layer counts as well ventilated, same unit. ISO 6946,
   * well ventilated air layers; <em>from memory</em>.
   */
  public static final double WELL_VENTILATED_OPENINGS = 1500e-6;

  private final String words;

  Ventilation(String words) {
    this.words = words;
  }

  /** The standards' word for it. */
  public String words() {
    return words;
  }

  /**
   * The class of a cavity of a frame (ISO 10077-2).
   *
   * @param slitM width of its widest opening to a space, m; 0 if closed
   * @return unventilated up to 2 mm, slightly ventilated up to 10 mm
   * @throws IllegalArgumentException if the width is negative or not a number
   */
  public static Ventilation ofSlit(double slitM) {
    if (!(slitM >= 0)) {
      throw new IllegalArgumentException("an opening has a width of 0 or more");
    }
    if (!Rounding.above(slitM, UNVENTILATED_SLIT_M)) {
      return UNVENTILATED;
    }
    return Rounding.above(slitM, SLIGHTLY_VENTILATED_SLIT_M)
        ? WELL_VENTILATED
        : SLIGHTLY_VENTILATED;
  }

  /**
   * The class of an air layer (ISO 6946).
   *
   * @param openings area of its openings to outdoor air, m² per metre of length of a vertical
   *     layer, m² per m² of surface of a horizontal one
   * @return unventilated up to 500 mm², well ventilated from 1500 mm² on
   * @throws IllegalArgumentException if the area is negative or not a number
   */
  public static Ventilation ofOpenings(double openings) {
    if (!(openings >= 0)) {
      throw new IllegalArgumentException("openings have an area of 0 or more");
    }
    if (!Rounding.above(openings, UNVENTILATED_OPENINGS)) {
      return UNVENTILATED;
    }
    return Rounding.below(openings, WELL_VENTILATED_OPENINGS)
        ? SLIGHTLY_VENTILATED
        : WELL_VENTILATED;
  }

  /**
   * How much of a slightly ventilated air layer counts as well ventilated (ISO 6946:2017): R_tot =
   * (1500 − A_v)/1000 · R_tot,unventilated + (A_v − 500)/1000 · R_tot,well, A_v in mm².
   *
   * @param openings area of its openings, m² per metre or per m², as in {@link #ofOpenings}
   * @return (A_v − 500)/1000, 0 for unventilated layers, 1 for well ventilated ones
   * @throws IllegalArgumentException if the area is negative or not a number
   */
  public static double wellVentilatedShare(double openings) {
    return switch (ofOpenings(openings)) {
      case UNVENTILATED -> 0;
      case WELL_VENTILATED -> 1;
      case SLIGHTLY_VENTILATED ->
          (openings - UNVENTILATED_OPENINGS) / (WELL_VENTILATED_OPENINGS - UNVENTILATED_OPENINGS);
    };
  }

  /**
   * Total resistance of a construction with a slightly ventilated air layer (ISO 6946:2017).
   *
   * @param unventilatedM2KPerW total resistance with the layer unventilated, m²·K/W
   * @param wellVentilatedM2KPerW total resistance with the layer well ventilated, m²·K/W
   * @param openings area of its openings, as in {@link #ofOpenings}
   * @return total resistance, m²·K/W, linear in the openings between the two
   * @throws IllegalArgumentException if the area is negative or not a number
   */
  public static double totalResistance(
      double unventilatedM2KPerW, double wellVentilatedM2KPerW, double openings) {
    double well = wellVentilatedShare(openings);
    return (1 - well) * unventilatedM2KPerW + well * wellVentilatedM2KPerW;
  }
}
