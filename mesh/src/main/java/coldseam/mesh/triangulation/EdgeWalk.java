package coldseam.mesh.triangulation;

/** Goes along partition edges, which are split into ever more sides. */
final class EdgeWalk {
  /** Nothing found: neither a vertex nor a side. */
  static final int LOST = Integer.MIN_VALUE;

  /** Sides within this sine of the direction asked for lie on one line with it. */
  private static final double STRAIGHT = 1e-6;

  private final Triangulation plane;

  EdgeWalk(Triangulation plane) {
    this.plane = plane;
  }

  /** The next vertex on the way from p to q along a partition edge, or NONE. */
  int following(int p, int q) {
    int h = sideTowards(p, q);
    return h == Triangulation.NONE ? h : plane.end(h);
  }

  /** The side on a partition edge from p that leads straight to q, or NONE. */
  int sideTowards(int p, int q) {
    double dx = plane.x[q] - plane.x[p];
    double dy = plane.y[q] - plane.y[p];
    int best = Triangulation.NONE;
    double bestSine = STRAIGHT;
    int first = plane.cornerAt(p);
    int c = first;
    do {
      int h = Triangulation.previous(c);
      if (plane.kept[h] >= 0) {
        double ex = plane.x[plane.end(h)] - plane.x[p];
        double ey = plane.y[plane.end(h)] - plane.y[p];
        double sine = Math.abs(ex * dy - ey * dx) / (Math.hypot(ex, ey) * Math.hypot(dx, dy));
        if (ex * dx + ey * dy > 0 && sine < bestSine) {
          bestSine = sine;
          best = h;
        }
      }
      c = plane.counterClockwise(c);
    } while (c != first && c != Triangulation.NONE);
    return best;
  }

  /**
   * A place on the way from p to q along a partition edge.
   *
   * @param snap how far off a vertex may be, m
   * @return a vertex that is near enough, or ~h where h is the side to be split there, or LOST
   */
  int place(int p, int q, double px, double py, double snap) {
    int from = p;
    while (from != q) {
      int h = sideTowards(from, q);
      if (h == Triangulation.NONE) {
        return LOST;
      }
      int to = plane.end(h);
      double gone = Math.hypot(px - plane.x[from], py - plane.y[from]);
      double left = Math.hypot(px - plane.x[to], py - plane.y[to]);
      if (gone <= snap && gone <= left) {
        return from;
      }
      if (left <= snap) {
        return to;
      }
      if (gone < plane.length(h) && left < plane.length(h)) {
        return ~h;
      }
      from = to;
    }
    return LOST;
  }
}
