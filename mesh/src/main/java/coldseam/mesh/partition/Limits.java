package coldseam.mesh.partition;

/** Every limit of this package: ratios, and multiples of the resolution. */
final class Limits {
  /**
   * Widens limits a little: lengths in drawings are round numbers, and a strip right at a limit is
   * to fall on the same side of it however the drawing is turned.
   */
  static final double TIE = 1 + 1e-5;

  /** Width over length up to which a strip is thin. */
  static final double THIN = TIE / 50;

  /** Width of a strip over the thickness of the areas concerned up to which it looks unmeant. */
  static final double MUCH_THINNER = TIE / 10;

  /**
   * A strip left of an earlier area is a sliver up to this many closing lengths: below 0.1 mm. A
   * wider one may be drawn on purpose, as the wall of a tube is by a box laid in a box.
   */
  static final double SLIVER_CLOSING_LENGTHS = 99;

  /** A face is left over when at least this part of its outline belongs to other areas. */
  static final double LEFTOVER = 0.25 / TIE;

  /** Sine of the largest angle between two edges that face each other across a strip. */
  static final double NEARLY_PARALLEL = 0.1;

  /** Cosine of the angle up to which an edge runs along a gap and not across it: 45°. */
  static final double ALONG = Math.sqrt(0.5);

  /** How much an edge may lean away from a line laid on it: offset over length. */
  static final double LEAN = 0.1;

  /** Rounding of areas, relative to the square of the outline's length. */
  static final double ROUNDING = 1e-12;

  /** Gaps that meet are closed in turn; a drawing that needs more turns is left as it is. */
  static final int MOST_TURNS = 12;

  private Limits() {}
}
