package coldseam.solver.algebra;

/**
 * Elimination of the columns of a dense trapezium. It has {@code width} columns, its rows stand one
 * after the other; the square on top is eliminated and the rows below become rows of the factor.
 * All products are sums over columns in ascending order, four rows by four at a time in local
 * variables (which makes the innermost methods long), so that a result does not depend on how the
 * rows are shared out.
 */
final class DenseBlocks {
  /** Columns eliminated before the columns to their right are brought up to date. */
  static final int BLOCK = 64;

  /**
   * Columns summed up in one go: two sets of four rows of this length stay in the nearest cache.
   */
  static final int DEPTH = 256;

  private DenseBlocks() {}

  /**
   * Eliminates the columns of a trapezium.
   *
   * @return −1, or the first column whose pivot is not a positive finite number
   */
  static int eliminate(double[] a, int at, int width, int rows) {
    for (int from = 0; from < width; from += BLOCK) {
      int to = Math.min(width, from + BLOCK);
      int bad = eliminateSquare(a, at, width, from, to);
      if (bad >= 0) {
        return bad;
      }
      eliminateRows(a, at, width, from, to, to, rows);
    }
    return -1;
  }

  /** Eliminates columns {@code from} to {@code to} in their own rows. */
  static int eliminateSquare(double[] a, int at, int width, int from, int to) {
    subtractColumnsBefore(a, at, width, from, to, from, to);
    for (int j = from; j < to; j++) {
      int rj = at + j * width;
      double pivot = a[rj + j];
      for (int k = from; k < j; k++) {
        pivot -= a[rj + k] * a[rj + k];
      }
      if (!(pivot > 0) || pivot == Double.POSITIVE_INFINITY) {
        a[rj + j] = pivot;
        return j;
      }
      double root = Math.sqrt(pivot);
      a[rj + j] = root;
      double inverse = 1 / root;
      for (int i = j + 1; i < to; i++) {
        int ri = at + i * width;
        double sum = a[ri + j];
        for (int k = from; k < j; k++) {
          sum -= a[ri + k] * a[rj + k];
        }
        a[ri + j] = sum * inverse;
      }
    }
    return -1;
  }

  /** Eliminates columns {@code from} to {@code to} in the rows below. */
  static void eliminateRows(
      double[] a, int at, int width, int from, int to, int firstRow, int lastRow) {
    subtractColumnsBefore(a, at, width, from, to, firstRow, lastRow);
    int i = firstRow;
    for (; i + 4 <= lastRow; i += 4) {
      solveFourRows(a, at, width, from, to, at + i * width);
    }
    for (; i < lastRow; i++) {
      solveRow(a, at, width, from, to, at + i * width);
    }
  }

  private static void subtractColumnsBefore(
      double[] a, int at, int width, int from, int to, int firstRow, int lastRow) {
    for (int k = 0; k < from; k += DEPTH) {
      int end = Math.min(from, k + DEPTH);
      for (int i = firstRow; i < lastRow; i += 4) {
        for (int j = from; j < to; j += 4) {
          if (i + 4 <= lastRow && j + 4 <= to) {
            subtractTile(a, at + i * width, at + j * width, width, k, end, j);
          } else {
            subtractEdge(a, at, width, i, Math.min(i + 4, lastRow), j, Math.min(j + 4, to), k, end);
          }
        }
      }
    }
  }

  private static void subtractTile(
      double[] a, int r0, int s0, int width, int k0, int k1, int column) {
    int r1 = r0 + width;
    int r2 = r1 + width;
    int r3 = r2 + width;
    int s1 = s0 + width;
    int s2 = s1 + width;
    int s3 = s2 + width;
    double t00 = 0;
    double t01 = 0;
    double t02 = 0;
    double t03 = 0;
    double t10 = 0;
    double t11 = 0;
    double t12 = 0;
    double t13 = 0;
    double t20 = 0;
    double t21 = 0;
    double t22 = 0;
    double t23 = 0;
    double t30 = 0;
    double t31 = 0;
    double t32 = 0;
    double t33 = 0;
    for (int k = k0; k < k1; k++) {
      double y0 = a[s0 + k];
      double y1 = a[s1 + k];
      double y2 = a[s2 + k];
      double y3 = a[s3 + k];
      double x0 = a[r0 + k];
      t00 += x0 * y0;
      t01 += x0 * y1;
      t02 += x0 * y2;
      t03 += x0 * y3;
      double x1 = a[r1 + k];
      t10 += x1 * y0;
      t11 += x1 * y1;
      t12 += x1 * y2;
      t13 += x1 * y3;
      double x2 = a[r2 + k];
      t20 += x2 * y0;
      t21 += x2 * y1;
      t22 += x2 * y2;
      t23 += x2 * y3;
      double x3 = a[r3 + k];
      t30 += x3 * y0;
      t31 += x3 * y1;
      t32 += x3 * y2;
      t33 += x3 * y3;
    }
    int c = r0 + column;
    a[c] -= t00;
    a[c + 1] -= t01;
    a[c + 2] -= t02;
    a[c + 3] -= t03;
    c = r1 + column;
    a[c] -= t10;
    a[c + 1] -= t11;
    a[c + 2] -= t12;
    a[c + 3] -= t13;
    c = r2 + column;
    a[c] -= t20;
    a[c + 1] -= t21;
    a[c + 2] -= t22;
    a[c + 3] -= t23;
    c = r3 + column;
    a[c] -= t30;
    a[c + 1] -= t31;
    a[c + 2] -= t32;
    a[c + 3] -= t33;
  }

  private static void subtractEdge(
      double[] a, int at, int width, int i0, int i1, int j0, int j1, int k0, int k1) {
    for (int i = i0; i < i1; i++) {
      int ri = at + i * width;
      for (int j = j0; j < j1; j++) {
        int rj = at + j * width;
        double sum = 0;
        for (int k = k0; k < k1; k++) {
          sum += a[ri + k] * a[rj + k];
        }
        a[ri + j] -= sum;
      }
    }
  }

  /** Four rows by the square above, two columns at a time. */
  private static void solveFourRows(double[] a, int at, int width, int from, int to, int r0) {
    int r1 = r0 + width;
    int r2 = r1 + width;
    int r3 = r2 + width;
    int j = from;
    for (; j + 2 <= to; j += 2) {
      int sj = at + j * width;
      int sk = sj + width;
      double t0 = a[r0 + j];
      double t1 = a[r1 + j];
      double t2 = a[r2 + j];
      double t3 = a[r3 + j];
      double u0 = a[r0 + j + 1];
      double u1 = a[r1 + j + 1];
      double u2 = a[r2 + j + 1];
      double u3 = a[r3 + j + 1];
      for (int k = from; k < j; k++) {
        double y = a[sj + k];
        double z = a[sk + k];
        double x0 = a[r0 + k];
        t0 -= x0 * y;
        u0 -= x0 * z;
        double x1 = a[r1 + k];
        t1 -= x1 * y;
        u1 -= x1 * z;
        double x2 = a[r2 + k];
        t2 -= x2 * y;
        u2 -= x2 * z;
        double x3 = a[r3 + k];
        t3 -= x3 * y;
        u3 -= x3 * z;
      }
      double inverse = 1 / a[sj + j];
      double between = a[sk + j];
      double second = 1 / a[sk + j + 1];
      t0 *= inverse;
      t1 *= inverse;
      t2 *= inverse;
      t3 *= inverse;
      a[r0 + j] = t0;
      a[r1 + j] = t1;
      a[r2 + j] = t2;
      a[r3 + j] = t3;
      a[r0 + j + 1] = (u0 - t0 * between) * second;
      a[r1 + j + 1] = (u1 - t1 * between) * second;
      a[r2 + j + 1] = (u2 - t2 * between) * second;
      a[r3 + j + 1] = (u3 - t3 * between) * second;
    }
    if (j < to) {
      solveColumn(a, at, width, from, j, r0);
      solveColumn(a, at, width, from, j, r1);
      solveColumn(a, at, width, from, j, r2);
      solveColumn(a, at, width, from, j, r3);
    }
  }

  private static void solveRow(double[] a, int at, int width, int from, int to, int r) {
    for (int j = from; j < to; j++) {
      solveColumn(a, at, width, from, j, r);
    }
  }

  private static void solveColumn(double[] a, int at, int width, int from, int j, int r) {
    int sj = at + j * width;
    double sum = a[r + j];
    for (int k = from; k < j; k++) {
      sum -= a[r + k] * a[sj + k];
    }
    a[r + j] = sum * (1 / a[sj + j]);
  }
}
