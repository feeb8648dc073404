package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Material;

/**
 * A second lower bound, made without any stream function, to hold against the first: fluxes
 * equilibrated patch by patch (Braess and Schöberl, Equilibrated residual error estimator for edge
 * elements, Math. Comp. 77, 2008; Ern and Vohralík, Polynomial-degree-robust a posteriori estimates
 * in a unified setting, SIAM J. Numer. Anal. 53, 2015).
 *
 * <p>Around each vertex a {@link FluxPatch} finds the flux nearest to −ψλ∇u of divergence −λ∇u·∇ψ.
 * The hat functions ψ sum to 1 and their gradients to 0, so that the sum q of all these fluxes has
 * no divergence, and by Thomson and Prager and Synge (1947) lower = 2F − R with F the flow in from
 * the space and R = ∫q·λ⁻¹q + Σ_film ∫Rs q_n².
 *
 * <p>What rounding leaves of the divergence a {@link FluxRemainder} takes to the outline.
 *
 * <p>With normal components of degree 1 (RT_1) q is linear in each triangle, hence one of the
 * fluxes among which the conjugate problem takes the best: its bound can only be lower. Of degree 2
 * q is quadratic, and as the divergence asked for is of degree 1, RT_2 would yield the same.
 *
 * <p>All is done on the reference triangle of {@link FluxElement}: with q = J q̂/det J a flux costs
 * ∫q̂·Λq̂, Λ = Jᵀλ⁻¹J/det J, and −λ∇u becomes −Λ⁻¹∇̂u.
 */
final class PatchEquilibration {
  /** Lower energies, W/(m·K); the last row and column belong to the given flows. */
  final double[][] lo;

  /** Gap to the upper energies, from what q and −λ∇u differ by. */
  final double[][] gap;

  /** Largest outflow of a triangle, field by field, that rounding left to be taken away, W/m. */
  final double[] carried;

  final Discretisation d;
  final FluxElement element;
  final double[][] fields;

  /** Λ of each triangle: xx, xy, yy. */
  final double[][] resistance;

  private final double[][] conductance;
  private final double[][] flux;

  /**
   * Equilibrates.
   *
   * @param d the discretisation
   * @param conditions conditions on the partition's edges
   * @param fields unit fields and the field of the given flows, solved on {@code d}
   * @param degree degree of the normal components, 1 or 2
   */
  PatchEquilibration(Discretisation d, Conditions conditions, double[][] fields, int degree) {
    this.d = d;
    this.fields = fields;
    element = new FluxElement(degree);
    int count = d.mesh.triangleCount();
    resistance = new double[count][];
    conductance = new double[count][];
    for (int t = 0; t < count; t++) {
      measure(t, conditions.material(d.mesh.label(t)));
    }
    flux = new double[fields.length][12 * count];
    int[][] fans = fans(d.mesh);
    for (int v = 0; v < fans.length; v++) {
      new FluxPatch(this, v, fans[v]).addTo(flux);
    }
    FluxRemainder remainder = new FluxRemainder(d);
    carried = new double[fields.length];
    for (int f = 0; f < fields.length; f++) {
      carried[f] = remainder.carryOff(flux[f]);
    }
    lo = new double[fields.length][fields.length];
    gap = new double[fields.length][fields.length];
    for (int i = 0; i < fields.length; i++) {
      for (int j = 0; j < fields.length; j++) {
        lo[i][j] = lower(i, j);
        gap[i][j] = gap(i, j);
      }
    }
  }

  private static int[][] fans(Mesh mesh) {
    int[] size = new int[mesh.vertexCount()];
    for (int h = 0; h < 3 * mesh.triangleCount(); h++) {
      size[mesh.vertex(h / 3, h % 3)]++;
    }
    int[][] fans = new int[size.length][];
    for (int h = 0; h < 3 * mesh.triangleCount(); h++) {
      int v = mesh.vertex(h / 3, h % 3);
      fans[v] = fans[v] == null ? new int[size[v]] : fans[v];
      fans[v][--size[v]] = h / 3;
    }
    return fans;
  }

  /** Λ and its inverse, det J · J⁻¹λJ⁻ᵀ. */
  private void measure(int t, Material material) {
    double c = Math.cos(material.angleRad());
    double s = Math.sin(material.angleRad());
    double along = material.conductivityWPerMK();
    double across = material.crossConductivityWPerMK();
    double[] e = edges(t);
    double det = e[0] * e[3] - e[2] * e[1];
    // the edges from corner 0 in the principal directions
    double[] first = {c * e[0] + s * e[1], c * e[2] + s * e[3]};
    double[] second = {c * e[1] - s * e[0], c * e[3] - s * e[2]};
    resistance[t] = form(first, second, 1 / along / det, 1 / across / det);
    double[] r = resistance[t];
    double product = along * across;
    conductance[t] = new double[] {product * r[2], -product * r[1], product * r[0]};
  }

  private static double[] form(double[] a, double[] b, double p, double q) {
    return new double[] {
      p * a[0] * a[0] + q * b[0] * b[0],
      p * a[0] * a[1] + q * b[0] * b[1],
      p * a[1] * a[1] + q * b[1] * b[1]
    };
  }

  /** The edges from corner 0 to corners 1 and 2. */
  private double[] edges(int t) {
    Mesh m = d.mesh;
    int o = m.vertex(t, 0);
    int a = m.vertex(t, 1);
    int b = m.vertex(t, 2);
    return new double[] {m.x(a) - m.x(o), m.y(a) - m.y(o), m.x(b) - m.x(o), m.y(b) - m.y(o)};
  }

  /** ∇̂u at the nodes of a triangle. */
  double[] gradient(int field, int t) {
    double[] u = new double[6];
    for (int n = 0; n < 6; n++) {
      u[n] = fields[field][d.nodes[QuadraticElement.NODES * t + n]];
    }
    return FluxElement.gradient(u);
  }

  /** Λ⁻¹∇̂u, that is λ∇u, at the nodes of a triangle. */
  double[] conducted(int field, int t) {
    double[] g = gradient(field, t);
    double[] k = conductance[t];
    double[] out = new double[12];
    for (int n = 0; n < 6; n++) {
      out[2 * n] = k[0] * g[2 * n] + k[1] * g[2 * n + 1];
      out[2 * n + 1] = k[1] * g[2 * n] + k[2] * g[2 * n + 1];
    }
    return out;
  }

  /** u less what it is in the space behind a side, at its start, middle and end. */
  double[] aboveSpace(int field, int s) {
    double delta = d.outline.space[s] == field ? 1 : 0;
    double[] u = fields[field];
    return new double[] {
      u[d.outline.start[s]] - delta, u[d.outline.middle[s]] - delta, u[d.outline.end[s]] - delta
    };
  }

  /**
   * The summed flux of a field in a triangle.
   *
   * @return its components at the six nodes, x of node n at 2n and y at 2n + 1, W/m²
   */
  double[] flux(int field, int t) {
    double[] e = edges(t);
    double det = e[0] * e[3] - e[2] * e[1];
    double[] q = reference(field, t);
    double[] out = new double[12];
    for (int n = 0; n < 6; n++) {
      out[2 * n] = (e[0] * q[2 * n] + e[2] * q[2 * n + 1]) / det;
      out[2 * n + 1] = (e[1] * q[2 * n] + e[3] * q[2 * n + 1]) / det;
    }
    return out;
  }

  private double[] reference(int field, int t) {
    double[] q = new double[12];
    System.arraycopy(flux[field], 12 * t, q, 0, 12);
    return q;
  }

  private double lower(int i, int j) {
    double sum = 0;
    for (int t = 0; t < resistance.length; t++) {
      sum -= FluxElement.energy(resistance[t], reference(i, t), reference(j, t));
    }
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      double[] qi = outflow(i, s);
      double[] qj = outflow(j, s);
      if (o.kind[s] == Conditions.Kind.FILM) {
        sum -= o.filmM2KPerW[s] / o.lengthM[s] * product(qi, qj);
      }
      sum -= o.space[s] == i ? FluxElement.moment(qj, 0) : 0;
      sum -= o.space[s] == j ? FluxElement.moment(qi, 0) : 0;
    }
    return sum;
  }

  private double[] outflow(int field, int s) {
    return FluxElement.outflow(
        reference(field, d.outline.triangle[s]), d.outline.sideOfTriangle[s]);
  }

  private double gap(int i, int j) {
    double sum = 0;
    for (int t = 0; t < resistance.length; t++) {
      sum += FluxElement.energy(resistance[t], misfit(i, t), misfit(j, t));
    }
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FILM) {
        double perFilm = o.lengthM[s] / o.filmM2KPerW[s];
        sum += perFilm * product(filmMisfit(i, s), filmMisfit(j, s));
      }
    }
    return sum;
  }

  /** q + λ∇u at the nodes. */
  private double[] misfit(int field, int t) {
    double[] out = reference(field, t);
    double[] along = conducted(field, t);
    for (int v = 0; v < 12; v++) {
      out[v] += along[v];
    }
    return out;
  }

  /** Rs q_n − (u − δ) at start, middle and end of a side. */
  private double[] filmMisfit(int field, int s) {
    double[] out = outflow(field, s);
    double[] above = aboveSpace(field, s);
    for (int v = 0; v < 3; v++) {
      out[v] = d.outline.filmM2KPerW[s] / d.outline.lengthM[s] * out[v] - above[v];
    }
    return out;
  }

  /** ∫ab of quadratics on [0, 1] given at start, middle and end. */
  private static double product(double[] a, double[] b) {
    return (a[0] * (4 * b[0] + 2 * b[1] - b[2])
            + a[1] * (2 * b[0] + 16 * b[1] + 2 * b[2])
            + a[2] * (4 * b[2] + 2 * b[1] - b[0]))
        / 30;
  }
}
