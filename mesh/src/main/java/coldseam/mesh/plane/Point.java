package coldseam.mesh.plane;

/**
 * A point of the drawing plane.
 *
 * @param x to the right, m
 * @param y upwards on the sheet, m
 */
public record Point(double x, double y) {
  /**
   * Checks that both coordinates are finite.
   *
   * @throws IllegalArgumentException if a coordinate is not finite
   */
  public Point {
    if (!Double.isFinite(x) || !Double.isFinite(y)) {
      throw new IllegalArgumentException("a point must be finite, not (" + x + ", " + y + ")");
    }
  }

  /**
   * The distance to another point.
   *
   * @param other the other point
   * @return the distance, m
   */
  public double distance(Point other) {
    return Math.hypot(x - other.x, y - other.y);
  }
}
