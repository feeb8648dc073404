package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;

/** The depth ω = 2πr of a body of revolution behind the points of its section, x being r. */
final class Circumference {
  /** Places of x that may be rounding where the axis is, in places of the origin's last digit. */
  private static final double ROUNDING = 4;

  private Circumference() {}

  /** 2πr at a vertex, m; exactly 0 on the axis. */
  static double at(Mesh mesh, int vertex) {
    double origin = mesh.origin().x();
    double radius = origin + mesh.x(vertex);
    return Math.abs(radius) <= ROUNDING * Math.ulp(origin) ? 0 : 2 * Math.PI * radius;
  }

  /**
   * A polynomial w of degree 3 that is nowhere below 1/ω between two depths, as 1 + the excess of
   * wω. The excess −Π(1 − ω/ω_i) is that of the polynomial that meets 1/ω at the ω_i; with these at
   * both ends and twice in the middle it is positive, and small as the fourth power of the
   * distance: (2ω − a − b)² (ω − a)(b − ω) / ((a + b)² a b).
   *
   * @param depth ω, between a and b
   * @param a the least depth, more than 0
   * @param b the greatest
   * @return the excess, 0 or more
   */
  static double excess(double depth, double a, double b) {
    double fromMiddle = (2 * depth - a - b) / (a + b);
    return Math.max(0, fromMiddle * fromMiddle * ((depth - a) / a) * ((b - depth) / b));
  }
}
