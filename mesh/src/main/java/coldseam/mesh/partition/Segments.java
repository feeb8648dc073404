package coldseam.mesh.partition;

/** Lengths, and distances of points to straight segments. */
final class Segments {
  private Segments() {}

  /**
   * Length of the vector (dx, dy); lengths of drawings are far from the ends of the number range.
   */
  static double length(double dx, double dy) {
    return Math.sqrt(dx * dx + dy * dy);
  }

  /** Where the foot of the perpendicular from p lies on the line a–b: 0 at a, 1 at b. */
  static double foot(double px, double py, double ax, double ay, double bx, double by) {
    double dx = bx - ax;
    double dy = by - ay;
    return ((px - ax) * dx + (py - ay) * dy) / (dx * dx + dy * dy);
  }

  /** Distance of p to the segment a–b. */
  static double distance(double px, double py, double ax, double ay, double bx, double by) {
    double dx = bx - ax;
    double dy = by - ay;
    double square = dx * dx + dy * dy;
    double t = square == 0 ? 0 : ((px - ax) * dx + (py - ay) * dy) / square;
    if (t <= 0) {
      return length(px - ax, py - ay);
    }
    if (t >= 1) {
      return length(px - bx, py - by);
    }
    return Math.abs(dx * (py - ay) - dy * (px - ax)) / Math.sqrt(square);
  }
}
