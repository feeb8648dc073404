package coldseam.mesh.triangulation;

/**
 * The corners of the drawing where edges meet under less than 60°. Around them edges are split on
 * circles whose radii are halves of each other, and a triangle that is thin because two of its
 * corners lie on one circle is left so; else neighbouring edges would split each other for ever
 * (Ruppert 1995; Miller, Pav and Walkington 2003).
 */
final class SharpCorners {
  private static final double SHARP_DEGREES = 60;

  /** Two lengths on one circle around a vertex agree to this part of themselves. */
  private static final double SAME_CIRCLE = 1e-6;

  private final ConstrainedDelaunay plane;
  private final Linework lines;
  private final double extent;
  private final boolean[] sharp;

  /**
   * Looks for them.
   *
   * @param plane the triangulation
   * @param lines the drawing
   * @param refined for each triangle whether it is to be refined: corners elsewhere do not matter
   */
  SharpCorners(ConstrainedDelaunay plane, Linework lines, boolean[] refined) {
    this.plane = plane;
    this.lines = lines;
    extent = lines.extent();
    sharp = new boolean[plane.vertexCount];
    for (int h = 0; h < 3 * plane.triangleCount; h++) {
      if (plane.kept[h] != Triangulation.NONE && refined[h / 3] && isSharp(h)) {
        sharp[plane.start(h)] = true;
      }
    }
  }

  /** Whether a triangle, given by its shortest side, may keep its small angle. */
  boolean excuses(int shortest) {
    int h = Triangulation.next(shortest);
    int g = Triangulation.previous(shortest);
    if (plane.edgeOf[plane.apex(shortest)] == Triangulation.GIVEN
        && plane.kept[h] >= 0
        && plane.kept[g] >= 0) {
      return true;
    }
    int p = plane.start(shortest);
    int q = plane.end(shortest);
    int e = plane.edgeOf[p];
    int f = plane.edgeOf[q];
    int z = e < 0 || f < 0 || e == f ? Triangulation.NONE : commonVertex(e, f);
    if (z == Triangulation.NONE) {
      return false;
    }
    double toP = plane.distance(z, p);
    double toQ = plane.distance(z, q);
    return Math.abs(toP - toQ) < SAME_CIRCLE * toP && plane.distance(p, q) < toP;
  }

  /** Where to split a kept side, in parts of its length: the middle, or on a circle. */
  double partToSplitAt(int h) {
    boolean atStart = isSharpCorner(plane.start(h));
    boolean atEnd = isSharpCorner(plane.end(h));
    if (atStart == atEnd) {
      return 0.5;
    }
    double length = plane.length(h);
    double radius = extent;
    while (length < 1.5 * radius) {
      radius *= 0.5;
    }
    return atStart ? radius / length : 1 - radius / length;
  }

  private boolean isSharpCorner(int v) {
    return plane.edgeOf[v] == Triangulation.GIVEN && sharp[v];
  }

  /** Whether the next kept edge counter-clockwise around the start of h is less than 60° away. */
  private boolean isSharp(int h) {
    int c = Triangulation.next(h);
    double angle = 0;
    while (angle < SHARP_DEGREES) {
      angle += Math.toDegrees(angleAt(c));
      if (plane.kept[Triangulation.next(c)] != Triangulation.NONE) {
        return angle < SHARP_DEGREES;
      }
      c = plane.counterClockwise(c);
    }
    return false;
  }

  private double angleAt(int c) {
    int v = plane.corner[c];
    int a = plane.start(c);
    int b = plane.end(c);
    double ax = plane.x[a] - plane.x[v];
    double ay = plane.y[a] - plane.y[v];
    double bx = plane.x[b] - plane.x[v];
    double by = plane.y[b] - plane.y[v];
    return Math.atan2(ax * by - ay * bx, ax * bx + ay * by);
  }

  private int commonVertex(int e, int f) {
    int a = lines.start[e];
    int b = lines.end[e];
    if (a == lines.start[f] || a == lines.end[f]) {
      return a + ConstrainedDelaunay.FIRST;
    }
    return b == lines.start[f] || b == lines.end[f]
        ? b + ConstrainedDelaunay.FIRST
        : Triangulation.NONE;
  }
}
