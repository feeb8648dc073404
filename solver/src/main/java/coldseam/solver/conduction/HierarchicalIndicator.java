package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;

/**
 * How much energy each triangle still lacks, from a local problem in the quartic polynomials that
 * vanish at its six nodes (Bank and Weiser 1985). Loads are the residual inside, what is missing at
 * films and given flows, and jumps of the flux across sides. A jump is divided between the two
 * triangles in the ratio of their stiffness across the side: flux is better known on the yielding
 * side, whether it yields by its conductivity or by its shape. It steers refinement; it is no
 * bound.
 */
final class HierarchicalIndicator {
  /** Local unknowns: a cubic and a quartic for each side, three quartics inside. */
  private static final int SIZE = 9;

  /** −∂/∂G_k of the local matrix, from an exact rule; SIZE × SIZE for each side k. */
  private static final double[][] REFERENCE = reference();

  private final Discretisation d;
  private final double[][] fields;
  private final double[][] sideFluxes;
  private final double[] matrix = new double[SIZE * SIZE];
  private final double[] load = new double[SIZE];
  private final double[] error = new double[SIZE];

  /** Energy lacking by field and triangle. */
  final double[][] energy;

  /** Largest local error on a side by field and triangle, in units of the field. */
  final double[][] amplitude;

  /**
   * Estimates.
   *
   * @param d the discretisation
   * @param fields nodal values of the fields
   * @param wanted which fields; the others' figures stay null
   */
  HierarchicalIndicator(Discretisation d, double[][] fields, boolean[] wanted) {
    this.d = d;
    this.fields = fields;
    sideFluxes = new double[fields.length][];
    energy = new double[fields.length][];
    amplitude = new double[fields.length][];
    for (int f = 0; f < fields.length; f++) {
      if (wanted[f]) {
        energy[f] = new double[d.mesh.triangleCount()];
        amplitude[f] = new double[d.mesh.triangleCount()];
        sideFluxes[f] = sideFluxes(fields[f]);
      }
    }
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      factor(t);
      for (int f = 0; f < fields.length; f++) {
        if (wanted[f]) {
          solve(t, f);
        }
      }
    }
  }

  /** Outward flux times length at both ends of every side: 6t + 2k at corner k+1, then k+2. */
  private double[] sideFluxes(double[] u) {
    double[] fluxes = new double[6 * d.mesh.triangleCount()];
    double[] derivatives = new double[9];
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      QuadraticElement.derivativesAtCorners(d.nodes, t, u, derivatives);
      for (int k = 0; k < 3; k++) {
        int a = k == 2 ? 0 : k + 1;
        int b = k == 0 ? 2 : k - 1;
        fluxes[6 * t + 2 * k] = QuadraticElement.sideFlux(d.couplings, t, k, a, derivatives);
        fluxes[6 * t + 2 * k + 1] = QuadraticElement.sideFlux(d.couplings, t, k, b, derivatives);
      }
    }
    return fluxes;
  }

  /** Assembles the local matrix and replaces it by its Cholesky factor. */
  private void factor(int t) {
    double g0 = -d.couplings[3 * t];
    double g1 = -d.couplings[3 * t + 1];
    double g2 = -d.couplings[3 * t + 2];
    for (int i = 0; i < matrix.length; i++) {
      matrix[i] = g0 * REFERENCE[0][i] + g1 * REFERENCE[1][i] + g2 * REFERENCE[2][i];
    }
    for (int k = 0; k < 3; k++) {
      int s = d.outline.of(t, k);
      if (s < 0) {
        continue;
      }
      if (d.outline.kind[s] == Conditions.Kind.FILM) {
        double conductance = d.outline.lengthM[s] / d.outline.filmM2KPerW[s];
        matrix[(2 * k) * (SIZE + 1)] += conductance / 210;
        matrix[(2 * k + 1) * (SIZE + 1)] += conductance / 630;
      } else if (d.outline.kind[s] == Conditions.Kind.FIXED) {
        tie(2 * k);
        tie(2 * k + 1);
      }
    }
    for (int j = 0; j < SIZE; j++) {
      for (int i = j; i < SIZE; i++) {
        double sum = matrix[i * SIZE + j];
        for (int m = 0; m < j; m++) {
          sum -= matrix[i * SIZE + m] * matrix[j * SIZE + m];
        }
        matrix[i * SIZE + j] = i == j ? Math.sqrt(sum) : sum / matrix[j * SIZE + j];
      }
    }
  }

  private void tie(int i) {
    for (int j = 0; j < SIZE; j++) {
      matrix[i * SIZE + j] = 0;
      matrix[j * SIZE + i] = 0;
    }
    matrix[i * (SIZE + 1)] = 1;
  }

  private void solve(int t, int f) {
    double source = QuadraticElement.divergence(d.couplings, d.nodes, t, fields[f]);
    for (int k = 0; k < 3; k++) {
      sideLoad(t, k, f);
      load[2 * k + 1] += source / 90;
      load[6 + k] = source / 180;
    }
    for (int k = 0; k < 3; k++) {
      int s = d.outline.of(t, k);
      if (s >= 0 && d.outline.kind[s] == Conditions.Kind.FIXED) {
        load[2 * k] = 0;
        load[2 * k + 1] = 0;
      }
    }
    double lacking = 0;
    for (int i = 0; i < SIZE; i++) {
      double sum = load[i];
      for (int m = 0; m < i; m++) {
        sum -= matrix[i * SIZE + m] * error[m];
      }
      error[i] = sum / matrix[i * (SIZE + 1)];
      lacking += error[i] * error[i];
    }
    for (int i = SIZE - 1; i >= 0; i--) {
      double sum = error[i];
      for (int m = i + 1; m < SIZE; m++) {
        sum -= matrix[m * SIZE + i] * error[m];
      }
      error[i] = sum / matrix[i * (SIZE + 1)];
    }
    energy[f][t] = lacking;
    double most = 0;
    for (int k = 0; k < 3; k++) {
      // the largest values of s(1-s)(1-2s) and s(1-s)(1-2s)²
      most = Math.max(most, Math.abs(error[2 * k]) / 10.4 + Math.abs(error[2 * k + 1]) / 16);
    }
    amplitude[f][t] = most;
  }

  /** Tests the missing flux of a side, a quadratic, with the side's cubic and quartic. */
  private void sideLoad(int t, int k, int f) {
    double[] own = sideFluxes[f];
    int at = 6 * t + 2 * k;
    double first = -own[at];
    double last = -own[at + 1];
    double middle = (first + last) / 2;
    int other = d.mesh.neighbour(t, k);
    if (other != Mesh.NONE) {
      int back = sideOf(other, t);
      double share = stiffness(t, k);
      share /= share + stiffness(other, back);
      first = share * (first - own[6 * other + 2 * back + 1]);
      last = share * (last - own[6 * other + 2 * back]);
      middle = (first + last) / 2;
    } else {
      int s = d.outline.of(t, k);
      if (s >= 0 && d.outline.kind[s] == Conditions.Kind.FILM) {
        double[] u = fields[f];
        double conductance = d.outline.lengthM[s] / d.outline.filmM2KPerW[s];
        double ambient = f == d.outline.space[s] ? 1 : 0;
        first += conductance * (ambient - u[d.outline.start[s]]);
        middle += conductance * (ambient - u[d.outline.middle[s]]);
        last += conductance * (ambient - u[d.outline.end[s]]);
      } else if (s >= 0 && d.outline.kind[s] == Conditions.Kind.FLOW && f == d.spaces) {
        double flow = d.outline.lengthM[s] * d.outline.flowWPerM2[s];
        first += flow;
        middle += flow;
        last += flow;
      }
    }
    load[2 * k] = (first - last) / 60;
    load[2 * k + 1] = middle / 30 + ((first + last) / 2 - middle) / 70;
  }

  private int sideOf(int t, int neighbour) {
    int k = 0;
    while (d.mesh.neighbour(t, k) != neighbour) {
      k++;
    }
    return k;
  }

  /**
   * How stiffly a triangle answers to a flux through a side: λ over the smaller of height, side.
   */
  private double stiffness(int t, int k) {
    double g0 = d.couplings[3 * t];
    double g1 = d.couplings[3 * t + 1];
    double g2 = d.couplings[3 * t + 2];
    double across = 2 * (d.couplings[3 * t + k] - g0 - g1 - g2);
    return Math.max(QuadraticElement.conductivity(d.couplings, t), across);
  }

  private static double[][] reference() {
    double[] points = {
      0.06943184420297371, 0.33000947820757187, 0.6699905217924281, 0.9305681557970263
    };
    double[] weights = {
      0.17392742256872693, 0.32607257743127307, 0.32607257743127307, 0.17392742256872693
    };
    double[][] sums = new double[3][SIZE * SIZE];
    double[][] derivative = new double[SIZE][3];
    for (int i = 0; i < points.length; i++) {
      for (int j = 0; j < points.length; j++) {
        double l0 = points[i];
        double l1 = (1 - l0) * points[j];
        double weight = 2 * weights[i] * weights[j] * (1 - l0);
        barycentricDerivatives(new double[] {l0, l1, 1 - l0 - l1}, derivative);
        for (int k = 0; k < 3; k++) {
          for (int p = 0; p < SIZE; p++) {
            for (int q = 0; q < SIZE; q++) {
              sums[k][p * SIZE + q] += weight * along(derivative[p], k) * along(derivative[q], k);
            }
          }
        }
      }
    }
    return sums;
  }

  private static double along(double[] derivative, int k) {
    return derivative[(k + 2) % 3] - derivative[(k + 1) % 3];
  }

  /** ∂/∂L_i of the local functions. */
  private static void barycentricDerivatives(double[] l, double[][] out) {
    for (int k = 0; k < 3; k++) {
      int a = (k + 1) % 3;
      int b = (k + 2) % 3;
      double t = l[a] - l[b];
      double ab = l[a] * l[b];
      out[2 * k][k] = 0;
      out[2 * k][a] = l[b] * t + ab;
      out[2 * k][b] = l[a] * t - ab;
      out[2 * k + 1][k] = 0;
      out[2 * k + 1][a] = l[b] * t * t + 2 * ab * t;
      out[2 * k + 1][b] = l[a] * t * t - 2 * ab * t;
      out[6 + k][k] = 2 * l[k] * ab;
      out[6 + k][a] = l[k] * l[k] * l[b];
      out[6 + k][b] = l[k] * l[k] * l[a];
    }
  }
}
