package coldseam.mesh.partition;

/** Distances of points to straight segments. */
final class Segments {
  private Segments() {}

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
      return Math.hypot(px - ax, py - ay);
    }
    if (t >= 1) {
      return Math.hypot(px - bx, py - by);
    }
    return Math.abs(dx * (py - ay) - dy * (px - ax)) / Math.sqrt(square);
  }
}
