package coldseam.solver.algebra;

/**
 * What the eliminated columns of a dense trapezium leave to the rows below its square: − L Lᵀ, as a
 * triangle stored row after row. Four rows by four at a time in local variables, which makes the
 * innermost methods long.
 */
final class DenseUpdate {
  private DenseUpdate() {}

  /** Where row {@code i} of a triangle begins that is stored row after row. */
  static int triangle(int i) {
    return i * (i + 1) / 2;
  }

  /**
   * Writes rows of the triangle.
   *
   * @param a holds the trapezium, from {@code at} its rows below the square
   * @param firstRow first row of the triangle, a multiple of four
   * @param lastRow end of the rows
   * @param u holds the triangle from {@code to}
   */
  static void write(double[] a, int at, int width, int firstRow, int lastRow, double[] u, int to) {
    for (int k = 0; k < width; k += DenseBlocks.DEPTH) {
      int end = Math.min(width, k + DenseBlocks.DEPTH);
      boolean add = k > 0;
      int i = firstRow;
      for (; i + 4 <= lastRow; i += 4) {
        updateFourRows(a, at, width, i, k, end, u, to, add);
      }
      for (; i < lastRow; i++) {
        updateRow(a, at, width, i, k, end, u, to + triangle(i), add);
      }
    }
  }

  private static void updateFourRows(
      double[] a, int at, int width, int i, int k0, int k1, double[] u, int to, boolean add) {
    int r0 = at + i * width;
    int r1 = r0 + width;
    int r2 = r1 + width;
    int r3 = r2 + width;
    int c0 = to + triangle(i);
    int c1 = c0 + i + 1;
    int c2 = c1 + i + 2;
    int c3 = c2 + i + 3;
    for (int j = 0; j < i; j += 4) {
      int s0 = at + j * width;
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
      putFour(u, c0 + j, t00, t01, t02, t03, add);
      putFour(u, c1 + j, t10, t11, t12, t13, add);
      putFour(u, c2 + j, t20, t21, t22, t23, add);
      putFour(u, c3 + j, t30, t31, t32, t33, add);
    }
    updateCorner(a, r0, width, k0, k1, u, c0 + i, i, add);
  }

  private static void putFour(
      double[] u, int c, double t0, double t1, double t2, double t3, boolean add) {
    if (add) {
      u[c] -= t0;
      u[c + 1] -= t1;
      u[c + 2] -= t2;
      u[c + 3] -= t3;
    } else {
      u[c] = -t0;
      u[c + 1] = -t1;
      u[c + 2] = -t2;
      u[c + 3] = -t3;
    }
  }

  /** The triangle at the end of four rows. */
  private static void updateCorner(
      double[] a, int r0, int width, int k0, int k1, double[] u, int c, int i, boolean add) {
    int r1 = r0 + width;
    int r2 = r1 + width;
    int r3 = r2 + width;
    double t00 = 0;
    double t10 = 0;
    double t11 = 0;
    double t20 = 0;
    double t21 = 0;
    double t22 = 0;
    double t30 = 0;
    double t31 = 0;
    double t32 = 0;
    double t33 = 0;
    for (int k = k0; k < k1; k++) {
      double x0 = a[r0 + k];
      double x1 = a[r1 + k];
      double x2 = a[r2 + k];
      double x3 = a[r3 + k];
      t00 += x0 * x0;
      t10 += x1 * x0;
      t11 += x1 * x1;
      t20 += x2 * x0;
      t21 += x2 * x1;
      t22 += x2 * x2;
      t30 += x3 * x0;
      t31 += x3 * x1;
      t32 += x3 * x2;
      t33 += x3 * x3;
    }
    int d1 = c + i + 1;
    int d2 = d1 + i + 2;
    int d3 = d2 + i + 3;
    u[c] = (add ? u[c] : 0) - t00;
    u[d1] = (add ? u[d1] : 0) - t10;
    u[d1 + 1] = (add ? u[d1 + 1] : 0) - t11;
    u[d2] = (add ? u[d2] : 0) - t20;
    u[d2 + 1] = (add ? u[d2 + 1] : 0) - t21;
    u[d2 + 2] = (add ? u[d2 + 2] : 0) - t22;
    putFour(u, d3, t30, t31, t32, t33, add);
  }

  private static void updateRow(
      double[] a, int at, int width, int i, int k0, int k1, double[] u, int c, boolean add) {
    int r = at + i * width;
    int j = 0;
    for (; j + 4 <= i + 1; j += 4) {
      int s0 = at + j * width;
      int s1 = s0 + width;
      int s2 = s1 + width;
      int s3 = s2 + width;
      double t0 = 0;
      double t1 = 0;
      double t2 = 0;
      double t3 = 0;
      for (int k = k0; k < k1; k++) {
        double x = a[r + k];
        t0 += x * a[s0 + k];
        t1 += x * a[s1 + k];
        t2 += x * a[s2 + k];
        t3 += x * a[s3 + k];
      }
      putFour(u, c + j, t0, t1, t2, t3, add);
    }
    for (; j <= i; j++) {
      int s = at + j * width;
      double t = 0;
      for (int k = k0; k < k1; k++) {
        t += a[r + k] * a[s + k];
      }
      u[c + j] = (add ? u[c + j] : 0) - t;
    }
  }
}
