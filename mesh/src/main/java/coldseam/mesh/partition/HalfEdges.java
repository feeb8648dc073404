package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * The two directions of every edge, and the loops they form when each is followed with its face on
 * the left. Half-edge 2e runs from the start of edge e to its end, 2e + 1 back. A loop encloses its
 * face (positive area) or goes round a piece of linework from outside (negative area).
 */
final class HalfEdges {
  private final double[] x;
  private final double[] y;
  private final int[] start;
  private final int[] end;

  /** The half-edge that follows with the same face on the left. */
  final int[] next;

  /** The loop of each half-edge. */
  final int[] loop;

  int loopCount;

  /** One half-edge of each loop. */
  int[] loopStart;

  /** Area to the left of each loop, m²; negative round the outside of linework. */
  double[] loopArea;

  /**
   * For each vertex where its half-edges begin in {@link #around}; one more entry than vertices.
   */
  final int[] offset;

  /** The half-edges that leave each vertex, counter-clockwise. */
  final int[] around;

  /** Where each half-edge stands in {@link #around}. */
  final int[] place;

  HalfEdges(double[] x, double[] y, int[] start, int[] end) {
    this.x = x;
    this.y = y;
    this.start = start;
    this.end = end;
    int halves = 2 * start.length;
    next = new int[halves];
    loop = new int[halves];
    offset = new int[x.length + 1];
    around = new int[halves];
    place = new int[halves];
    gatherAround();
    for (int v = 0; v < x.length; v++) {
      sortAround(offset[v], offset[v + 1]);
    }
    for (int i = 0; i < halves; i++) {
      place[around[i]] = i;
    }
    for (int h = 0; h < halves; h++) {
      next[h] = clockwise(h ^ 1);
    }
    traceLoops();
  }

  int from(int h) {
    return (h & 1) == 0 ? start[h >> 1] : end[h >> 1];
  }

  int to(int h) {
    return (h & 1) == 0 ? end[h >> 1] : start[h >> 1];
  }

  int degree(int vertex) {
    return offset[vertex + 1] - offset[vertex];
  }

  /** The half-edge that leaves the same vertex, next in clockwise order. */
  int clockwise(int h) {
    int v = from(h);
    int i = place[h];
    return around[i == offset[v] ? offset[v + 1] - 1 : i - 1];
  }

  /** The half-edge that leaves the same vertex, next in counter-clockwise order. */
  int counterClockwise(int h) {
    int v = from(h);
    int i = place[h] + 1;
    return around[i == offset[v + 1] ? offset[v] : i];
  }

  private void gatherAround() {
    for (int h = 0; h < next.length; h++) {
      offset[from(h) + 1]++;
    }
    for (int v = 0; v < x.length; v++) {
      offset[v + 1] += offset[v];
    }
    int[] fill = Arrays.copyOf(offset, x.length);
    for (int h = 0; h < next.length; h++) {
      around[fill[from(h)]++] = h;
    }
  }

  private void sortAround(int first, int last) {
    for (int i = first + 1; i < last; i++) {
      int h = around[i];
      int j = i;
      while (j > first && before(h, around[j - 1])) {
        around[j] = around[j - 1];
        j--;
      }
      around[j] = h;
    }
  }

  /**
   * Whether half-edge g comes before h counter-clockwise from the negative x axis. Differences of
   * stored coordinates are right to one part in 2⁵³ and directions at a vertex of noded linework
   * differ by far more, so the sign of the product needs no further care.
   */
  private boolean before(int g, int h) {
    double gx = x[to(g)] - x[from(g)];
    double gy = y[to(g)] - y[from(g)];
    double hx = x[to(h)] - x[from(h)];
    double hy = y[to(h)] - y[from(h)];
    boolean gUpper = gy > 0 || (gy == 0 && gx > 0);
    boolean hUpper = hy > 0 || (hy == 0 && hx > 0);
    if (gUpper != hUpper) {
      return hUpper;
    }
    return gx * hy - gy * hx > 0;
  }

  private void traceLoops() {
    loopStart = new int[16];
    Arrays.fill(loop, -1);
    for (int h = 0; h < next.length; h++) {
      if (loop[h] >= 0) {
        continue;
      }
      if (loopCount == loopStart.length) {
        loopStart = Arrays.copyOf(loopStart, 2 * loopCount);
      }
      loopStart[loopCount] = h;
      int g = h;
      do {
        loop[g] = loopCount;
        g = next[g];
      } while (g != h);
      loopCount++;
    }
    loopArea = new double[loopCount];
    for (int l = 0; l < loopCount; l++) {
      loopArea[l] = area(l);
    }
  }

  private double area(int l) {
    int first = loopStart[l];
    double ox = x[from(first)];
    double oy = y[from(first)];
    double twice = 0;
    for (int h = next[first]; h != first; h = next[h]) {
      twice += (x[from(h)] - ox) * (y[to(h)] - oy) - (x[to(h)] - ox) * (y[from(h)] - oy);
    }
    return twice / 2;
  }
}
