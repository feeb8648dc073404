package coldseam.cases.drawing;

import coldseam.mesh.plane.Point;

/**
 * How a drawing comes to lie in a section: p in units of the drawing lies at p · metres − origin.
 *
 * @param metresPerUnit metres per unit of the drawing, its scale included
 * @param origin the place of the drawing that becomes (0, 0), m
 * @param toleranceM how far apart corners may be that are joined, m
 */
public record Placement(double metresPerUnit, Point origin, double toleranceM) {
  /** Corners are joined within this part of the drawing's larger dimension unless stated. */
  public static final double STANDARD_TOLERANCE = 1.0 / 4_000;

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException unless the scale is more than 0 and the tolerance 0 or more
   */
  public Placement {
    if (!(metresPerUnit > 0) || !(toleranceM >= 0)) {
      throw new IllegalArgumentException("a placement needs a scale and a tolerance");
    }
  }

  /** Where a point of the drawing lies, m. */
  Point of(Point drawn) {
    return new Point(
        drawn.x() * metresPerUnit - origin.x(), drawn.y() * metresPerUnit - origin.y());
  }
}
