package coldseam.cases.drawing;

/**
 * x' = a x + c y + e, y' = b x + d y + f.
 *
 * @param a see above
 * @param b see above
 * @param c see above
 * @param d see above
 * @param e see above
 * @param f see above
 */
record Affine(double a, double b, double c, double d, double e, double f) {
  static final Affine IDENTITY = new Affine(1, 0, 0, 1, 0, 0);

  static Affine shift(double dx, double dy) {
    return new Affine(1, 0, 0, 1, dx, dy);
  }

  static Affine scale(double sx, double sy) {
    return new Affine(sx, 0, 0, sy, 0, 0);
  }

  /** Turns counter-clockwise where y points up; quarter turns are exact. */
  static Affine turn(double degrees) {
    double quarters = degrees / 90;
    double cos = Math.cos(Math.toRadians(degrees));
    double sin = Math.sin(Math.toRadians(degrees));
    if (quarters == Math.rint(quarters)) {
      cos = Math.rint(cos);
      sin = Math.rint(sin);
    }
    return new Affine(cos, sin, -sin, cos, 0, 0);
  }

  /** First the other, then this. */
  Affine after(Affine first) {
    return new Affine(
        a * first.a + c * first.b,
        b * first.a + d * first.b,
        a * first.c + c * first.d,
        b * first.c + d * first.d,
        a * first.e + c * first.f + e,
        b * first.e + d * first.f + f);
  }

  double x(double px, double py) {
    return a * px + c * py + e;
  }

  double y(double px, double py) {
    return b * px + d * py + f;
  }
}
