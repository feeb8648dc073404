package coldseam.cases;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * A rigid motion of the drawing plane: x' = a·x + b·y + e, y' = c·x + d·y + f, lengths in m.
 *
 * @param a x to x
 * @param b y to x
 * @param c x to y
 * @param d y to y
 * @param e displacement in x, m
 * @param f displacement in y, m
 */
record Motion(double a, double b, double c, double d, double e, double f) {
  static Motion shift(double dx, double dy) {
    return new Motion(1, 0, 0, 1, dx, dy);
  }

  /** Counter-clockwise about a point. */
  static Motion rotation(double degrees, Point about) {
    double cos = Degrees.cos(degrees);
    double sin = Degrees.sin(degrees);
    return new Motion(cos, -sin, sin, cos, 0, 0).keeping(about);
  }

  /** Mirror image across the line through two different points. */
  static Motion reflection(Point p, Point q) {
    double dx = q.x() - p.x();
    double dy = q.y() - p.y();
    double square = dx * dx + dy * dy;
    double cos = (dx * dx - dy * dy) / square;
    double sin = 2 * dx * dy / square;
    return new Motion(cos, sin, sin, -cos, 0, 0).keeping(p);
  }

  private Motion keeping(Point fixed) {
    double x = a * fixed.x() + b * fixed.y();
    double y = c * fixed.x() + d * fixed.y();
    return new Motion(a, b, c, d, fixed.x() - x, fixed.y() - y);
  }

  Point of(Point p) {
    return new Point(a * p.x() + b * p.y() + e, c * p.x() + d * p.y() + f);
  }

  List<List<Point>> of(List<List<Point>> rings) {
    List<List<Point>> moved = new ArrayList<>(rings.size());
    for (List<Point> ring : rings) {
      List<Point> points = new ArrayList<>(ring.size());
      for (Point p : ring) {
        points.add(of(p));
      }
      moved.add(points);
    }
    return moved;
  }

  /** The direction that a direction becomes, radians from x. */
  double direction(double angleRad) {
    double x = Math.cos(angleRad);
    double y = Math.sin(angleRad);
    return Math.atan2(c * x + d * y, a * x + b * y);
  }
}
