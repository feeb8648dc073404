package coldseam.solver.cavity;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Predicates;
import java.util.Arrays;
import java.util.List;

/**
 * View factors between the sides of a simple polygon, seen from inside: F_ij = (crossed strings −
 * uncrossed strings) / (2 L_i) (Hottel, in McAdams, Heat Transmission, 1954, chapter 4).
 *
 * <p>A string is pulled tight inside the polygon: it is the shortest path between two corners that
 * does not leave the polygon, so whatever blocks the view bends it. With the sides AB and CD in the
 * order in which they follow one another along the outline, every line of sight between them parts
 * the outline from B to C from that from D to A, which is why the rule is exact in every simple
 * polygon. Σ_j F_ij = 1 and L_i F_ij = L_j F_ji hold by construction. A polygon with an island is
 * not covered: sight goes past it on two sides.
 *
 * <p>Cost: n² lines of sight against n sides, then n shortest paths; n³ steps.
 */
final class ViewFactors {
  private final double[] x;
  private final double[] y;
  private final int n;

  /** Length of the tight string between two corners, m. */
  private final double[][] string;

  private ViewFactors(List<Point> outline) {
    n = outline.size();
    x = new double[n];
    y = new double[n];
    for (int i = 0; i < n; i++) {
      x[i] = outline.get(i).x();
      y[i] = outline.get(i).y();
    }
    requireSimple();
    string = tighten(lengthsInSight());
  }

  /**
   * Works out all view factors of a polygon.
   *
   * @param outline corners, interior on the left; side i runs from corner i to corner i + 1
   * @return F_ij, row i: what side i sees of each side
   * @throws IllegalArgumentException if there are fewer than three corners, they run clockwise, or
   *     the polygon touches or crosses itself
   */
  static double[][] of(List<Point> outline) {
    return new ViewFactors(outline).factors();
  }

  private double[][] factors() {
    double[][] seen = new double[n][n];
    for (int i = 0; i < n; i++) {
      int b = next(i);
      for (int j = i + 1; j < n; j++) {
        int d = next(j);
        double crossed = string[i][j] + string[b][d];
        double uncrossed = string[i][d] + string[b][j];
        double exchanged = Math.max(0, (crossed - uncrossed) / 2);
        seen[i][j] = exchanged / string[i][b];
        seen[j][i] = exchanged / string[j][d];
      }
    }
    return seen;
  }

  private int next(int corner) {
    return corner + 1 == n ? 0 : corner + 1;
  }

  private int previous(int corner) {
    return corner == 0 ? n - 1 : corner - 1;
  }

  private int turn(int a, int b, int c) {
    return Predicates.orientation(x[a], y[a], x[b], y[b], x[c], y[c]);
  }

  private void requireSimple() {
    if (n < 3) {
      throw new IllegalArgumentException("an enclosure has three sides or more");
    }
    double twiceArea = 0;
    for (int i = 0; i < n; i++) {
      twiceArea += (x[i] - x[0]) * (y[next(i)] - y[0]) - (x[next(i)] - x[0]) * (y[i] - y[0]);
      for (int j = i + 1; j < n; j++) {
        boolean neighbours = next(i) == j || next(j) == i;
        if (neighbours ? folded(i, j) : meet(i, next(i), j, next(j))) {
          throw new IllegalArgumentException("an enclosure neither touches nor crosses itself");
        }
      }
    }
    if (!(twiceArea > 0)) {
      throw new IllegalArgumentException("an enclosure runs counter-clockwise");
    }
  }

  /** Whether two neighbouring sides lie on one another, or one has no length. */
  private boolean folded(int i, int j) {
    int middle = next(i) == j ? j : i;
    int before = previous(middle);
    int after = next(middle);
    double towards =
        (x[before] - x[middle]) * (x[after] - x[middle])
            + (y[before] - y[middle]) * (y[after] - y[middle]);
    boolean apart = x[before] != x[middle] || y[before] != y[middle];
    return !apart || n > 3 && towards > 0 && turn(before, middle, after) == 0;
  }

  /** Whether the segments ab and cd have a point in common. */
  private boolean meet(int a, int b, int c, int d) {
    int ofC = turn(a, b, c);
    int ofD = turn(a, b, d);
    int ofA = turn(c, d, a);
    int ofB = turn(c, d, b);
    if (ofC == 0 && ofD == 0) {
      return overlap(x[a], x[b], x[c], x[d]) && overlap(y[a], y[b], y[c], y[d]);
    }
    return ofC * ofD <= 0 && ofA * ofB <= 0;
  }

  private static boolean overlap(double a, double b, double c, double d) {
    return Math.max(a, b) >= Math.min(c, d) && Math.max(c, d) >= Math.min(a, b);
  }

  /** Distances of corners in sight of one another; infinite for the others. */
  private double[][] lengthsInSight() {
    double[][] length = new double[n][n];
    for (double[] row : length) {
      Arrays.fill(row, Double.POSITIVE_INFINITY);
    }
    for (int i = 0; i < n; i++) {
      length[i][i] = 0;
      for (int j = i + 1; j < n; j++) {
        if (next(i) == j || next(j) == i || inSight(i, j)) {
          double distance = Math.hypot(x[i] - x[j], y[i] - y[j]);
          length[i][j] = distance;
          length[j][i] = distance;
        }
      }
    }
    return length;
  }

  /**
   * Whether the straight line between two corners lies inside and touches no other side. A line
   * that grazes a corner does not count: the string by way of that corner is as long.
   */
  private boolean inSight(int a, int b) {
    if (!looksInside(a, b) || !looksInside(b, a)) {
      return false;
    }
    for (int c = 0; c < n; c++) {
      int d = next(c);
      if (c != a && c != b && d != a && d != b && meet(a, b, c, d)) {
        return false;
      }
    }
    return true;
  }

  private boolean looksInside(int corner, int towards) {
    int before = previous(corner);
    int after = next(corner);
    boolean leftOfNext = turn(corner, after, towards) > 0;
    boolean leftOfPrevious = turn(before, corner, towards) > 0;
    return turn(before, corner, after) >= 0
        ? leftOfNext && leftOfPrevious
        : leftOfNext || leftOfPrevious;
  }

  /** Shortest paths from corner to corner along lines of sight (Dijkstra, one corner at a time). */
  private double[][] tighten(double[][] length) {
    double[][] shortest = new double[n][];
    for (int from = 0; from < n; from++) {
      shortest[from] = shortestFrom(from, length);
    }
    return shortest;
  }

  private double[] shortestFrom(int from, double[][] length) {
    double[] path = length[from].clone();
    boolean[] settled = new boolean[n];
    settled[from] = true;
    for (int round = 1; round < n; round++) {
      int nearest = -1;
      for (int k = 0; k < n; k++) {
        if (!settled[k] && (nearest < 0 || path[k] < path[nearest])) {
          nearest = k;
        }
      }
      settled[nearest] = true;
      for (int k = 0; k < n; k++) {
        path[k] = Math.min(path[k], path[nearest] + length[nearest][k]);
      }
    }
    return path;
  }
}
