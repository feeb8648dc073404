package coldseam.solver.algebra;

import java.util.Arrays;

/** Forward and backward substitution with the trapezia of a factor, for several columns at once. */
final class Substitution {
  private final Fronts fronts;
  private final WorkUnits units;
  private final Layout layout;
  private final double[][] factor;
  private final double[][] x;
  private final double[][][] carried;

  private Substitution(EliminationPlan plan, double[][] factor, double[][] x) {
    fronts = plan.fronts();
    units = plan.units();
    layout = plan.layout();
    this.factor = factor;
    this.x = x;
    carried = new double[x.length][fronts.count()][];
  }

  /** Solves in place; {@code x} holds right-hand sides, numbered as the columns of the factor. */
  static void solve(EliminationPlan plan, double[][] factor, double[][] x) {
    Substitution substitution = new Substitution(plan, factor, x);
    plan.units().upwards(substitution::forward);
    plan.units().downwards(substitution::backward);
  }

  private int widest(int unit) {
    int widest = 0;
    for (int f = units.start()[unit]; f < units.start()[unit + 1]; f++) {
      widest = Math.max(widest, fronts.width(f) + fronts.rows(f));
    }
    return widest;
  }

  private void forward(int unit) {
    double[] v = new double[widest(unit)];
    int first = units.start()[unit];
    int last = units.start()[unit + 1];
    double[] a = factor[unit];
    for (int f = first; f < last; f++) {
      int width = fronts.width(f);
      int rows = fronts.rows(f);
      int at = layout.trapezium()[f];
      for (int k = 0; k < x.length; k++) {
        collect(f, x[k], carried[k], v);
        forwardSquare(a, at, width, v);
        forwardRows(a, at, width, rows, v);
        System.arraycopy(v, 0, x[k], fronts.first()[f], width);
        if (rows > 0) {
          carried[k][f] = Arrays.copyOfRange(v, width, width + rows);
        }
      }
    }
  }

  private void collect(int f, double[] b, double[][] carriedHere, double[] v) {
    int width = fronts.width(f);
    System.arraycopy(b, fronts.first()[f], v, 0, width);
    Arrays.fill(v, width, width + fronts.rows(f), 0);
    for (int c = fronts.firstChild()[f]; c >= 0; c = fronts.sibling()[c]) {
      double[] from = carriedHere[c];
      int start = fronts.rowStart()[c];
      for (int i = 0; i < fronts.rows(c); i++) {
        v[fronts.rowInParent()[start + i]] += from[i];
      }
      carriedHere[c] = null;
    }
  }

  private static void forwardSquare(double[] a, int at, int width, double[] v) {
    for (int i = 0; i < width; i++) {
      int r = at + i * width;
      double sum = v[i];
      for (int k = 0; k < i; k++) {
        sum -= a[r + k] * v[k];
      }
      v[i] = sum / a[r + i];
    }
  }

  private static void forwardRows(double[] a, int at, int width, int rows, double[] v) {
    int end = width + rows;
    int i = width;
    for (; i + 4 <= end; i += 4) {
      int r0 = at + i * width;
      int r1 = r0 + width;
      int r2 = r1 + width;
      int r3 = r2 + width;
      double t0 = 0;
      double t1 = 0;
      double t2 = 0;
      double t3 = 0;
      for (int k = 0; k < width; k++) {
        double y = v[k];
        t0 += a[r0 + k] * y;
        t1 += a[r1 + k] * y;
        t2 += a[r2 + k] * y;
        t3 += a[r3 + k] * y;
      }
      v[i] -= t0;
      v[i + 1] -= t1;
      v[i + 2] -= t2;
      v[i + 3] -= t3;
    }
    for (; i < end; i++) {
      int r = at + i * width;
      double t = 0;
      for (int k = 0; k < width; k++) {
        t += a[r + k] * v[k];
      }
      v[i] -= t;
    }
  }

  private void backward(int unit) {
    double[] v = new double[widest(unit)];
    double[] a = factor[unit];
    for (int f = units.start()[unit + 1] - 1; f >= units.start()[unit]; f--) {
      int width = fronts.width(f);
      int rows = fronts.rows(f);
      int at = layout.trapezium()[f];
      int first = fronts.first()[f];
      for (double[] column : x) {
        System.arraycopy(column, first, v, 0, width);
        int start = fronts.rowStart()[f];
        int r = at + width * width;
        int i = 0;
        for (; i + 4 <= rows; i += 4) {
          subtractFourRows(
              a,
              r + i * width,
              width,
              v,
              column[fronts.row()[start + i]],
              column[fronts.row()[start + i + 1]],
              column[fronts.row()[start + i + 2]],
              column[fronts.row()[start + i + 3]]);
        }
        for (; i < rows; i++) {
          double y = column[fronts.row()[start + i]];
          for (int k = 0; k < width; k++) {
            v[k] -= a[r + i * width + k] * y;
          }
        }
        backwardSquare(a, at, width, v);
        System.arraycopy(v, 0, column, first, width);
      }
    }
  }

  private static void subtractFourRows(
      double[] a, int r0, int width, double[] v, double y0, double y1, double y2, double y3) {
    int r1 = r0 + width;
    int r2 = r1 + width;
    int r3 = r2 + width;
    for (int k = 0; k < width; k++) {
      v[k] -= (a[r0 + k] * y0 + a[r1 + k] * y1) + (a[r2 + k] * y2 + a[r3 + k] * y3);
    }
  }

  private static void backwardSquare(double[] a, int at, int width, double[] v) {
    for (int i = width - 1; i >= 0; i--) {
      int r = at + i * width;
      double y = v[i] / a[r + i];
      v[i] = y;
      for (int k = 0; k < i; k++) {
        v[k] -= a[r + k] * y;
      }
    }
  }
}
