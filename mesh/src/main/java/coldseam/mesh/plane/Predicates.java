package coldseam.mesh.plane;

/**
 * Orientation and in-circle tests with the exact sign.
 *
 * <p>Both are determinants of coordinate differences. They are first evaluated in floating point;
 * if the value exceeds its forward error bound its sign is right, otherwise the determinant is
 * evaluated exactly. Bounds and expansion arithmetic: J. R. Shewchuk, "Adaptive precision
 * floating-point arithmetic and fast robust geometric predicates", Discrete and Computational
 * Geometry 18 (1997), sections 2, 4.2 and 4.3. Exact as long as no product under- or overflows:
 * coordinates of 0 or between 1e-50 and 1e50 in magnitude are safe.
 */
public final class Predicates {
  /** Half the spacing of doubles just above 1. */
  private static final double EPSILON = 0x1p-53;

  private static final double ORIENTATION_BOUND = (3 + 16 * EPSILON) * EPSILON;
  private static final double IN_CIRCLE_BOUND = (10 + 96 * EPSILON) * EPSILON;

  private Predicates() {}

  /**
   * Which way a, b, c turn.
   *
   * @param ax x of a
   * @param ay y of a
   * @param bx x of b
   * @param by y of b
   * @param cx x of c
   * @param cy y of c
   * @return 1 if counter-clockwise, −1 if clockwise, 0 if on one straight line
   */
  public static int orientation(double ax, double ay, double bx, double by, double cx, double cy) {
    double left = (ax - cx) * (by - cy);
    double right = (ay - cy) * (bx - cx);
    double determinant = left - right;
    double bound = ORIENTATION_BOUND * (Math.abs(left) + Math.abs(right));
    if (determinant > bound) {
      return 1;
    }
    if (-determinant > bound) {
      return -1;
    }
    return exactOrientation(ax, ay, bx, by, cx, cy);
  }

  /**
   * Whether d lies within the circle through a, b, c, which turn counter-clockwise.
   *
   * @param ax x of a
   * @param ay y of a
   * @param bx x of b
   * @param by y of b
   * @param cx x of c
   * @param cy y of c
   * @param dx x of d
   * @param dy y of d
   * @return 1 if inside, −1 if outside, 0 if on the circle (opposite signs if a, b, c turn
   *     clockwise)
   */
  public static int inCircle(
      double ax, double ay, double bx, double by, double cx, double cy, double dx, double dy) {
    double adx = ax - dx;
    double ady = ay - dy;
    double bdx = bx - dx;
    double bdy = by - dy;
    double cdx = cx - dx;
    double cdy = cy - dy;
    double bc = bdx * cdy;
    double cb = cdx * bdy;
    double ca = cdx * ady;
    double ac = adx * cdy;
    double ab = adx * bdy;
    double ba = bdx * ady;
    double liftA = adx * adx + ady * ady;
    double liftB = bdx * bdx + bdy * bdy;
    double liftC = cdx * cdx + cdy * cdy;
    double determinant = liftA * (bc - cb) + liftB * (ca - ac) + liftC * (ab - ba);
    double permanent =
        (Math.abs(bc) + Math.abs(cb)) * liftA
            + (Math.abs(ca) + Math.abs(ac)) * liftB
            + (Math.abs(ab) + Math.abs(ba)) * liftC;
    double bound = IN_CIRCLE_BOUND * permanent;
    if (determinant > bound) {
      return 1;
    }
    if (-determinant > bound) {
      return -1;
    }
    return exactInCircle(ax, ay, bx, by, cx, cy, dx, dy);
  }

  static int exactOrientation(double ax, double ay, double bx, double by, double cx, double cy) {
    return Expansion.sign(
        cross(
            Expansion.difference(ax, cx),
            Expansion.difference(ay, cy),
            Expansion.difference(bx, cx),
            Expansion.difference(by, cy)));
  }

  static int exactInCircle(
      double ax, double ay, double bx, double by, double cx, double cy, double dx, double dy) {
    double[] adx = Expansion.difference(ax, dx);
    double[] ady = Expansion.difference(ay, dy);
    double[] bdx = Expansion.difference(bx, dx);
    double[] bdy = Expansion.difference(by, dy);
    double[] cdx = Expansion.difference(cx, dx);
    double[] cdy = Expansion.difference(cy, dy);
    double[] a = Expansion.product(lift(adx, ady), cross(bdx, bdy, cdx, cdy));
    double[] b = Expansion.product(lift(bdx, bdy), cross(cdx, cdy, adx, ady));
    double[] c = Expansion.product(lift(cdx, cdy), cross(adx, ady, bdx, bdy));
    return Expansion.sign(Expansion.sum(Expansion.sum(a, b), c));
  }

  /** x² + y². */
  private static double[] lift(double[] x, double[] y) {
    return Expansion.sum(Expansion.product(x, x), Expansion.product(y, y));
  }

  /** x₁ y₂ − y₁ x₂. */
  private static double[] cross(double[] x1, double[] y1, double[] x2, double[] y2) {
    return Expansion.sum(Expansion.product(x1, y2), Expansion.negative(Expansion.product(y1, x2)));
  }
}
