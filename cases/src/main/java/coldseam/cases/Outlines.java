package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.List;

/** Tells whether rings are sound: no crossing of itself, some area. */
final class Outlines {
  private static final double TOUCH_M = Resolution.STANDARD.snapM();

  private Outlines() {}

  /** Whether two points have equal coordinates. */
  static boolean same(Point a, Point b) {
    return a.x() == b.x() && a.y() == b.y();
  }

  /** Area by the shoelace formula, m², positive counter-clockwise; relative to the first corner. */
  static double area(List<Point> ring) {
    Point o = ring.get(0);
    double twice = 0;
    for (int i = 1; i + 1 < ring.size(); i++) {
      Point p = ring.get(i);
      Point q = ring.get(i + 1);
      twice += (p.x() - o.x()) * (q.y() - o.y()) - (q.x() - o.x()) * (p.y() - o.y());
    }
    return twice / 2;
  }

  /** Length around, m. */
  static double perimeter(List<Point> ring) {
    double sum = 0;
    for (int i = 0; i < ring.size(); i++) {
      sum += ring.get(i).distance(ring.get((i + 1) % ring.size()));
    }
    return sum;
  }

  /**
   * The first two edges of a ring that cross: passing through each other, or one passing through a
   * corner of the other. Edges that only touch do not cross.
   *
   * @param ring corners, the first not repeated
   * @return indices of the first corners of the two edges, or null if none cross
   */
  static int[] crossing(List<Point> ring) {
    int n = ring.size();
    for (int i = 0; i < n; i++) {
      Point a = ring.get(i);
      Point b = ring.get((i + 1) % n);
      for (int j = i + 1; j < n; j++) {
        Point c = ring.get(j);
        Point d = ring.get((j + 1) % n);
        if (apart(a, b, c, d)) {
          continue;
        }
        boolean neighbours = j == i + 1 || (i == 0 && j == n - 1);
        if (!neighbours && through(a, b, c, d)) {
          return new int[] {i, j};
        }
        if (cornerThrough(ring, i, j) || cornerThrough(ring, j, i)) {
          return new int[] {i, j};
        }
      }
    }
    return null;
  }

  private static boolean apart(Point a, Point b, Point c, Point d) {
    return Math.max(a.x(), b.x()) < Math.min(c.x(), d.x()) - TOUCH_M
        || Math.max(c.x(), d.x()) < Math.min(a.x(), b.x()) - TOUCH_M
        || Math.max(a.y(), b.y()) < Math.min(c.y(), d.y()) - TOUCH_M
        || Math.max(c.y(), d.y()) < Math.min(a.y(), b.y()) - TOUCH_M;
  }

  private static boolean through(Point a, Point b, Point c, Point d) {
    return side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0;
  }

  /** Whether the ring passes through an edge exactly at a corner that lies inside the edge. */
  private static boolean cornerThrough(List<Point> ring, int edge, int corner) {
    int n = ring.size();
    if (corner == edge || corner == (edge + 1) % n) {
      return false;
    }
    Point a = ring.get(edge);
    Point b = ring.get((edge + 1) % n);
    Point p = ring.get(corner);
    if (side(a, b, p) != 0 || p.distance(a) <= TOUCH_M || p.distance(b) <= TOUCH_M) {
      return false;
    }
    if (a.distance(p) > a.distance(b) || b.distance(p) > a.distance(b)) {
      return false;
    }
    int before = side(a, b, ring.get((corner + n - 1) % n));
    int after = side(a, b, ring.get((corner + 1) % n));
    return before * after < 0;
  }

  /** 1 if a point lies left of a line by more than the resolution, −1 if right, else 0. */
  private static int side(Point a, Point b, Point p) {
    double dx = b.x() - a.x();
    double dy = b.y() - a.y();
    double twice = dx * (p.y() - a.y()) - dy * (p.x() - a.x());
    double limit = TOUCH_M * Math.hypot(dx, dy);
    return twice > limit ? 1 : twice < -limit ? -1 : 0;
  }
}
