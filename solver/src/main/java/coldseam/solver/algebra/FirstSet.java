package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * The set of all elements, put along a curve that fills the plane (Morton 1966), so that elements
 * near one another stay near one another in memory; unknowns are numbered as they are met.
 */
final class FirstSet {
  /** Steps of the curve along each axis. */
  private static final int STEPS = 1 << 15;

  private FirstSet() {}

  static ElementSet of(int unknowns, int[] start, int[] member, double[] x, double[] y) {
    int elements = start.length - 1;
    int[] order = x == null ? null : alongCurve(x, y);
    int[] number = new int[unknowns];
    Arrays.fill(number, -1);
    int[] unknown = new int[unknowns];
    int[] newStart = new int[elements + 1];
    int[] newMember = new int[start[elements]];
    double[] newX = x == null ? null : new double[elements];
    double[] newY = x == null ? null : new double[elements];
    int met = 0;
    int used = 0;
    for (int i = 0; i < elements; i++) {
      int e = order == null ? i : order[i];
      for (int p = start[e]; p < start[e + 1]; p++) {
        int u = member[p];
        if (u >= unknowns) {
          throw new IllegalArgumentException("unknown " + u + " of " + unknowns);
        }
        if (u >= 0) {
          if (number[u] < 0) {
            unknown[met] = u;
            number[u] = met++;
          }
          newMember[used++] = number[u];
        }
      }
      newStart[i + 1] = used;
      if (x != null) {
        newX[i] = x[e];
        newY[i] = y[e];
      }
    }
    return new ElementSet(newStart, newMember, newX, newY, Arrays.copyOf(unknown, met), met);
  }

  private static int[] alongCurve(double[] x, double[] y) {
    double[] rangeX = range(x);
    double[] rangeY = range(y);
    long[] key = new long[x.length];
    for (int e = 0; e < x.length; e++) {
      long code = spread(step(x[e], rangeX)) | spread(step(y[e], rangeY)) << 1;
      key[e] = code << 32 | e;
    }
    Arrays.sort(key);
    int[] order = new int[x.length];
    for (int i = 0; i < order.length; i++) {
      order[i] = (int) key[i];
    }
    return order;
  }

  private static double[] range(double[] of) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double v : of) {
      if (!Double.isFinite(v)) {
        throw new IllegalArgumentException("a coordinate is " + v);
      }
      low = Math.min(low, v);
      high = Math.max(high, v);
    }
    return new double[] {low, high > low ? (STEPS - 1) / (high - low) : 0};
  }

  private static int step(double v, double[] range) {
    return (int) ((v - range[0]) * range[1]);
  }

  /** Puts a zero between every two of the lowest sixteen bits. */
  private static long spread(int bits) {
    int b = bits;
    b = (b | b << 8) & 0x00ff00ff;
    b = (b | b << 4) & 0x0f0f0f0f;
    b = (b | b << 2) & 0x33333333;
    return (b | b << 1) & 0x55555555;
  }
}
