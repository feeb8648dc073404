package coldseam.mesh.partition;

import coldseam.mesh.plane.Predicates;
import coldseam.mesh.plane.Resolution;

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

  /** Whether the segments a–b and c–d cross, or touch within the closing length. */
  static boolean meet(
      double ax, double ay, double bx, double by, double cx, double cy, double dx, double dy) {
    int c = Predicates.orientation(ax, ay, bx, by, cx, cy);
    int d = Predicates.orientation(ax, ay, bx, by, dx, dy);
    int a = Predicates.orientation(cx, cy, dx, dy, ax, ay);
    int b = Predicates.orientation(cx, cy, dx, dy, bx, by);
    if (c != d && a != b) {
      return true;
    }
    double near = Resolution.STANDARD.closeM();
    return distance(ax, ay, cx, cy, dx, dy) <= near
        || distance(bx, by, cx, cy, dx, dy) <= near
        || distance(cx, cy, ax, ay, bx, by) <= near
        || distance(dx, dy, ax, ay, bx, by) <= near;
  }
}
