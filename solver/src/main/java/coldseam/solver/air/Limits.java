package coldseam.solver.air;

/** Lengths at which this tool changes its rule, and what a drawn length may be off. */
final class Limits {
  /**
   * By convention of this tool, from the largest thickness that ISO 6946 knows: cavities of which a
   * side is longer are layers of a building element and not cavities of a frame, m.
   */
  static final double LONGEST_IN_FRAME_M = 0.3;

  /** Part of itself by which a drawn length may differ from another and still be the same. */
  static final double TIE = 1e-6;

  /** Emissivity of a face of which none is stated. */
  static final double EMISSIVITY = 0.9;

  private Limits() {}
}
