package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.algebra.ElementSum;
import coldseam.solver.detail.Material;

/**
 * The quadratic triangle. Its nodes are the corners 0, 1, 2, then the middles 3, 4, 5 of the sides
 * opposite them. With barycentric coordinates L, side k runs from corner a = k+1 to corner b = k+2
 * (mod 3).
 *
 * <p>Shape and conductivity enter by three numbers alone, the couplings G_k = |T| ∇L_a·λ∇L_b of
 * side k (for an isotropic material −λ/2 times the cotangent of the angle opposite). They stand at
 * 3t + k in an array over all triangles. For any fields |T| ∇u·λ∇v = −Σ_k G_k D_k u D_k v, where
 * D_k = ∂/∂L_b − ∂/∂L_a is the derivative along side k. All is evaluated from differences of nodal
 * values, so that a constant contributes nothing, rounding included.
 */
final class QuadraticElement {
  /** Nodes of a triangle. */
  static final int NODES = 6;

  private QuadraticElement() {}

  /** Writes the three couplings of a triangle, W/(m·K). */
  static void couplings(Mesh mesh, int t, Material material, double[] out, int at) {
    double c = Math.cos(material.angleRad());
    double s = Math.sin(material.angleRad());
    double along = material.conductivityWPerMK();
    double across = material.crossConductivityWPerMK();
    boolean isotropic = material.isotropic();
    double xx = isotropic ? along : along * c * c + across * s * s;
    double yy = isotropic ? along : along * s * s + across * c * c;
    double xy = isotropic ? 0 : (along - across) * s * c;
    int v0 = mesh.vertex(t, 0);
    int v1 = mesh.vertex(t, 1);
    int v2 = mesh.vertex(t, 2);
    double x1 = mesh.x(v1) - mesh.x(v0);
    double y1 = mesh.y(v1) - mesh.y(v0);
    double x2 = mesh.x(v2) - mesh.x(v0);
    double y2 = mesh.y(v2) - mesh.y(v0);
    double x0 = mesh.x(v2) - mesh.x(v1);
    double y0 = mesh.y(v2) - mesh.y(v1);
    double fourAreas = 2 * (x1 * y2 - x2 * y1);
    // sides 0, 1, 2 run along (x0, y0), (-x2, -y2), (x1, y1); gradients are these turned by 90°
    out[at] = -turned(xx, xy, yy, x2, y2, x1, y1) / fourAreas;
    out[at + 1] = turned(xx, xy, yy, x0, y0, x1, y1) / fourAreas;
    out[at + 2] = -turned(xx, xy, yy, x0, y0, x2, y2) / fourAreas;
  }

  /** Couplings of λ/det λ: those of λ over det λ. */
  static double[] conjugate(double[] g) {
    double[] conjugate = new double[g.length];
    for (int t = 0; t < g.length / 3; t++) {
      double root = conductivity(g, t);
      for (int k = 0; k < 3; k++) {
        conjugate[3 * t + k] = g[3 * t + k] / (root * root);
      }
    }
    return conjugate;
  }

  /** √det λ of a triangle's material, W/(m·K). */
  static double conductivity(double[] g, int t) {
    double g0 = g[3 * t];
    double g1 = g[3 * t + 1];
    double g2 = g[3 * t + 2];
    return 2 * Math.sqrt(g0 * g1 + g1 * g2 + g2 * g0);
  }

  /**
   * How much of the figures of a triangle cancels in its energies: relative rounding errors grow by
   * so much. 1 if it has a right angle, whatever its proportions; about the square of length over
   * height if it is blunt or sharp; infinite if nothing is left.
   */
  static double cancellation(double[] g, int t) {
    double p = g[3 * t] * g[3 * t + 1];
    double q = g[3 * t + 1] * g[3 * t + 2];
    double r = g[3 * t + 2] * g[3 * t];
    double left = p + q + r;
    return left > 0 ? (Math.abs(p) + Math.abs(q) + Math.abs(r)) / left : Double.POSITIVE_INFINITY;
  }

  private static double turned(
      double xx, double xy, double yy, double ax, double ay, double bx, double by) {
    return xx * ay * by - xy * (ay * bx + ax * by) + yy * ax * bx;
  }

  /**
   * An entry of the stiffness matrix of a triangle, ∫∇φ_p·λ∇φ_q.
   *
   * @param g couplings of all triangles
   * @param t the triangle
   * @param p a local node
   * @param q another or the same
   */
  static double stiffness(double[] g, int t, int p, int q) {
    int at = 3 * t;
    if (p < 3 && q < 3) {
      return p == q ? g[at + p] - sum(g, at) : -g[at + 3 - p - q] / 3;
    }
    if (p >= 3 && q >= 3) {
      return p == q ? -8 * sum(g, at) / 3 : 8 * g[at + 9 - p - q] / 3;
    }
    int middle = Math.max(p, q) - 3;
    return middle == Math.min(p, q) ? 0 : 4 * g[at + middle] / 3;
  }

  /**
   * The stiffness matrices of all triangles, to be summed up.
   *
   * @param g couplings of all triangles
   */
  record Stiffness(double[] g) implements ElementSum.Entries {
    @Override
    public double entry(int element, int p, int q) {
      return stiffness(g, element, p, q);
    }
  }

  private static double sum(double[] g, int at) {
    return g[at] + g[at + 1] + g[at + 2];
  }

  /**
   * ∫∇u·λ∇v over a triangle: exact, by the rule of the three side middles.
   *
   * @param g couplings of all triangles
   * @param nodes nodes of all triangles
   * @param t the triangle
   * @param u nodal values
   * @param v nodal values
   */
  static double energy(double[] g, int[] nodes, int t, double[] u, double[] v) {
    int at = NODES * t;
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      int a = k == 2 ? 0 : k + 1;
      int b = k == 0 ? 2 : k - 1;
      double up = u[nodes[at + b]] - u[nodes[at + 3 + k]];
      double uq = u[nodes[at + 3 + k]] - u[nodes[at + a]];
      double um = 2 * (u[nodes[at + 3 + a]] - u[nodes[at + 3 + b]]);
      double vp = v[nodes[at + b]] - v[nodes[at + 3 + k]];
      double vq = v[nodes[at + 3 + k]] - v[nodes[at + a]];
      double vm = 2 * (v[nodes[at + 3 + a]] - v[nodes[at + 3 + b]]);
      sum -=
          g[3 * t + k]
              * ((up + uq) * (vp + vq)
                  + (up - uq + um) * (vp - vq + vm)
                  + (uq - up + um) * (vq - vp + vm));
    }
    return sum / 3;
  }

  /**
   * Writes the derivatives along the sides at the corners: D_k at corner c stands at 3k + c.
   *
   * @param nodes nodes of all triangles
   * @param t the triangle
   * @param u nodal values
   * @param out nine numbers
   */
  static void derivativesAtCorners(int[] nodes, int t, double[] u, double[] out) {
    int at = NODES * t;
    for (int k = 0; k < 3; k++) {
      int a = k == 2 ? 0 : k + 1;
      int b = k == 0 ? 2 : k - 1;
      double p = u[nodes[at + b]] - u[nodes[at + 3 + k]];
      double q = u[nodes[at + 3 + k]] - u[nodes[at + a]];
      out[3 * k + a] = 3 * q - p;
      out[3 * k + b] = 3 * p - q;
      out[3 * k + k] = 4 * (u[nodes[at + 3 + a]] - u[nodes[at + 3 + b]]) - p - q;
    }
  }

  /**
   * Writes the derivatives along the sides at the middles of the sides: D_k at the middle of side m
   * stands at 3m + k.
   *
   * @param nodes nodes of all triangles
   * @param t the triangle
   * @param u nodal values
   * @param out nine numbers
   */
  static void derivativesAtMiddles(int[] nodes, int t, double[] u, double[] out) {
    int at = NODES * t;
    for (int k = 0; k < 3; k++) {
      int a = k == 2 ? 0 : k + 1;
      int b = k == 0 ? 2 : k - 1;
      double p = u[nodes[at + b]] - u[nodes[at + 3 + k]];
      double q = u[nodes[at + 3 + k]] - u[nodes[at + a]];
      double middle = 2 * (u[nodes[at + 3 + a]] - u[nodes[at + 3 + b]]);
      out[3 * k + k] = p + q;
      out[3 * b + k] = q - p + middle;
      out[3 * a + k] = p - q + middle;
    }
  }

  /**
   * Density of n·λ∇u on side k, n outward, at one of its corners, times the side's length.
   *
   * @param g couplings of all triangles
   * @param t the triangle
   * @param k the side
   * @param corner one of the side's two corners
   * @param d what {@link #derivativesAtCorners} wrote
   */
  static double sideFlux(double[] g, int t, int k, int corner, double[] d) {
    int a = k == 2 ? 0 : k + 1;
    int b = k == 0 ? 2 : k - 1;
    return 2 * (g[3 * t + a] * d[3 * a + corner] - g[3 * t + b] * d[3 * b + corner]);
  }

  /** |T| div(λ∇u), constant over a triangle. */
  static double divergence(double[] g, int[] nodes, int t, double[] u) {
    int at = NODES * t;
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      int a = k == 2 ? 0 : k + 1;
      int b = k == 0 ? 2 : k - 1;
      double middle = u[nodes[at + 3 + k]];
      sum += 4 * g[3 * t + k] * ((middle - u[nodes[at + a]]) + (middle - u[nodes[at + b]]));
    }
    return sum;
  }

  /** A field given by nodal values at barycentric coordinates. */
  static double value(int[] nodes, int t, double[] u, double l0, double l1, double l2) {
    int at = NODES * t;
    return u[nodes[at]] * l0 * (2 * l0 - 1)
        + u[nodes[at + 1]] * l1 * (2 * l1 - 1)
        + u[nodes[at + 2]] * l2 * (2 * l2 - 1)
        + 4
            * (u[nodes[at + 3]] * l1 * l2
                + u[nodes[at + 4]] * l2 * l0
                + u[nodes[at + 5]] * l0 * l1);
  }
}
