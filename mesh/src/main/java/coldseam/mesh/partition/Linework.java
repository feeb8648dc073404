package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Straight edges between numbered vertices. Each edge is unique and knows the areas whose outline
 * runs along it an odd number of times: crossing the edge means leaving or entering exactly those.
 */
final class Linework {
  final int vertexCount;
  final double[] x;
  final double[] y;
  final int edgeCount;
  final int[] start;
  final int[] end;

  /** For each edge the areas that change across it, ascending, never empty. */
  final int[][] areas;

  Linework(double[] x, double[] y, int[] start, int[] end, int[][] areas) {
    this.vertexCount = x.length;
    this.x = x;
    this.y = y;
    this.edgeCount = start.length;
    this.start = start;
    this.end = end;
    this.areas = areas;
  }

  /** The areas in one of two ascending sets but not in both. */
  static int[] symmetricDifference(int[] a, int[] b) {
    int[] merged = new int[a.length + b.length];
    int n = 0;
    int i = 0;
    int j = 0;
    while (i < a.length || j < b.length) {
      if (j == b.length || (i < a.length && a[i] < b[j])) {
        merged[n++] = a[i++];
      } else if (i == a.length || b[j] < a[i]) {
        merged[n++] = b[j++];
      } else {
        i++;
        j++;
      }
    }
    return n == merged.length ? merged : Arrays.copyOf(merged, n);
  }

  /** Whether crossing the edge means leaving or entering the area. */
  boolean bounds(int edge, int area) {
    for (int a : areas[edge]) {
      if (a == area) {
        return true;
      }
    }
    return false;
  }

  double length(int edge) {
    return Segments.length(x[end[edge]] - x[start[edge]], y[end[edge]] - y[start[edge]]);
  }
}
