package coldseam.mesh.plane;

import java.util.Arrays;

/**
 * Exact sums and products of doubles. An expansion is an unevaluated sum of doubles that do not
 * overlap, in order of growing magnitude, without zeros; the empty array is zero. The sign of an
 * expansion is that of its last component. After J. R. Shewchuk (1997), theorems 6, 7, 13, 18, 19.
 */
final class Expansion {
  /** 2²⁷ + 1: splits a double into two halves of 26 bits. */
  private static final double SPLITTER = 0x1p27 + 1;

  private Expansion() {}

  /** a − b. */
  static double[] difference(double a, double b) {
    double high = a - b;
    double virtualB = a - high;
    double virtualA = high + virtualB;
    double low = (a - virtualA) + (virtualB - b);
    return pair(low, high);
  }

  static double[] negative(double[] e) {
    double[] result = new double[e.length];
    for (int i = 0; i < e.length; i++) {
      result[i] = -e[i];
    }
    return result;
  }

  /** e + f, merging by magnitude. */
  static double[] sum(double[] e, double[] f) {
    if (e.length == 0) {
      return f;
    }
    if (f.length == 0) {
      return e;
    }
    double[] merged = merge(e, f);
    int count = 0;
    double carried = merged[0];
    for (int i = 1; i < merged.length; i++) {
      double next = merged[i];
      double total = carried + next;
      double virtual = total - carried;
      double low = (carried - (total - virtual)) + (next - virtual);
      if (low != 0) {
        merged[count++] = low;
      }
      carried = total;
    }
    if (carried != 0) {
      merged[count++] = carried;
    }
    return count == merged.length ? merged : Arrays.copyOf(merged, count);
  }

  /** e · f. */
  static double[] product(double[] e, double[] f) {
    double[] result = new double[0];
    for (double factor : f) {
      result = sum(result, scaled(e, factor));
    }
    return result;
  }

  /** The sign of e. */
  static int sign(double[] e) {
    return e.length == 0 ? 0 : e[e.length - 1] > 0 ? 1 : -1;
  }

  /** e · b. */
  private static double[] scaled(double[] e, double b) {
    double[] result = new double[2 * e.length];
    int count = 0;
    double carried = 0;
    for (double component : e) {
      double high = component * b;
      double low = productError(component, b, high);
      double total = carried + low;
      double virtual = total - carried;
      double error = (carried - (total - virtual)) + (low - virtual);
      if (error != 0) {
        result[count++] = error;
      }
      carried = high + total;
      error = total - (carried - high);
      if (error != 0) {
        result[count++] = error;
      }
    }
    if (carried != 0) {
      result[count++] = carried;
    }
    return Arrays.copyOf(result, count);
  }

  /** a · b − product, exactly, where product is a · b rounded. */
  private static double productError(double a, double b, double product) {
    double c = SPLITTER * a;
    double aHigh = c - (c - a);
    double aLow = a - aHigh;
    double d = SPLITTER * b;
    double bHigh = d - (d - b);
    double bLow = b - bHigh;
    return aLow * bLow - (((product - aHigh * bHigh) - aLow * bHigh) - aHigh * bLow);
  }

  private static double[] merge(double[] e, double[] f) {
    double[] merged = new double[e.length + f.length];
    int i = 0;
    int j = 0;
    for (int k = 0; k < merged.length; k++) {
      boolean fromE = j == f.length || i < e.length && Math.abs(e[i]) < Math.abs(f[j]);
      merged[k] = fromE ? e[i++] : f[j++];
    }
    return merged;
  }

  private static double[] pair(double low, double high) {
    if (low != 0) {
      return new double[] {low, high};
    }
    return high != 0 ? new double[] {high} : new double[0];
  }
}
