package coldseam.solver.conduction;

import coldseam.solver.algebra.SymmetricSystem;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;

/**
 * How much energy each triangle still lacks: the error is sought among the polynomials of higher
 * degree that vanish at the nodes (Zienkiewicz, Gago and Kelly 1983; Bank and Smith 1993). The
 * cubics, one for each side and one inside each triangle, are solved for together: across a foil or
 * a jump of conductivity their couplings are too strong for problems of single triangles. The
 * quartics, one for each side, see what cubics miss by symmetry and are taken one by one. It steers
 * refinement; it is no bound.
 */
class HierarchicalIndicator {
  /** Local cubics: L_a L_b (L_a − L_b) of the three sides, and L_0 L_1 L_2. */
  static final int SIZE = 4;

  /** −∂/∂G_k of the matrix of the cubics, SIZE × SIZE for each side k. */
  private static final double[][] CUBICS = new double[3][SIZE * SIZE];

  /** −∂/∂G_k of the energy of L_a L_b (L_a − L_b)² for each side. */
  private static final double[][] QUARTICS = new double[3][3];

  static {
    integrateReference();
  }

  /** The largest value of s(1−s)(1−2s). */
  private static final double CUBIC_PEAK = 0.0962;

  /** The largest value of s(1−s)(1−2s)². */
  private static final double QUARTIC_PEAK = 0.0625;

  /** Length over height from which on a triangle counts as slender. */
  private static final double SLENDER = 4;

  /** How many times what is seen a slender triangle may lack (measured on sheet-metal details). */
  private static final double MOST_UNSEEN = 6;

  final Discretisation d;
  private final int[] unknown;
  private final double[] sideStiffness;
  private final double[] matrix = new double[SIZE * SIZE];
  private final double[] local = new double[SIZE];
  private final double[] derivatives = new double[9];
  private final double[] residuals = new double[7];

  /** Energy lacking by field and triangle. */
  final double[][] energy;

  /** Largest error seen on the sides of each triangle by field, in units of the field. */
  final double[][] amplitude;

  /** Estimates for what the section stands for, see the constructor. */
  static HierarchicalIndicator of(Discretisation d, double[][] fields, boolean[] wanted) {
    return d.body instanceof BodyOfRevolution
        ? new RingIndicator(d, fields, wanted)
        : new HierarchicalIndicator(d, fields, wanted);
  }

  /**
   * Estimates.
   *
   * @param d the discretisation
   * @param fields nodal values of the fields
   * @param wanted which fields; the others' figures stay null
   */
  HierarchicalIndicator(Discretisation d, double[][] fields, boolean[] wanted) {
    this.d = d;
    energy = new double[fields.length][];
    amplitude = new double[fields.length][];
    unknown = new int[d.mesh.sideCount()];
    sideStiffness = new double[d.mesh.sideCount()];
    SymmetricSystem system = assemble(numberSides());
    for (int f = 0; f < fields.length; f++) {
      if (wanted[f]) {
        estimate(system, fields[f], f);
      }
    }
  }

  /** Numbers the sides whose middle is free, in the order in which their middles are eliminated. */
  private int numberSides() {
    int[] sideAt = new int[d.unknowns];
    Arrays.fill(sideAt, -1);
    for (int s = 0; s < unknown.length; s++) {
      unknown[s] = -1;
      int place = d.unknown[d.mesh.vertexCount() + s];
      if (place >= 0) {
        sideAt[place] = s;
      }
    }
    int count = 0;
    for (int s : sideAt) {
      if (s >= 0) {
        unknown[s] = count++;
      }
    }
    return count;
  }

  /** The matrix of the side cubics; those inside the triangles are eliminated first. */
  private SymmetricSystem assemble(int unknowns) {
    int capacity = 6 * d.mesh.triangleCount() + d.outline.count;
    int[] rows = new int[capacity];
    int[] columns = new int[capacity];
    double[] values = new double[capacity];
    int count = 0;
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      localMatrix(t, matrix);
      double inside = matrix[SIZE * SIZE - 1];
      for (int p = 0; p < 3; p++) {
        int row = unknown[d.mesh.side(t, p)];
        for (int q = 0; q <= p && row >= 0; q++) {
          int column = unknown[d.mesh.side(t, q)];
          if (column >= 0) {
            rows[count] = row;
            columns[count] = column;
            values[count++] =
                sign(t, p)
                    * sign(t, q)
                    * (matrix[p * SIZE + q] - matrix[p * SIZE + 3] * matrix[q * SIZE + 3] / inside);
          }
        }
        sideStiffness[d.mesh.side(t, p)] += quartic(t, p);
      }
    }
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      int side = o.middle[s] - d.mesh.vertexCount();
      if (o.kind[s] == Conditions.Kind.FILM) {
        rows[count] = unknown[side];
        columns[count] = unknown[side];
        values[count++] = o.areaM2[s] / o.filmM2KPerW[s] / 210;
        sideStiffness[side] += o.areaM2[s] / o.filmM2KPerW[s] / 630;
      }
    }
    return unknowns == 0 ? null : SymmetricSystem.factor(unknowns, rows, columns, values, count);
  }

  /** Writes the energies of the cubics of a triangle, SIZE × SIZE. */
  void localMatrix(int t, double[] out) {
    double g0 = -d.couplings[3 * t];
    double g1 = -d.couplings[3 * t + 1];
    double g2 = -d.couplings[3 * t + 2];
    for (int i = 0; i < out.length; i++) {
      out[i] = g0 * CUBICS[0][i] + g1 * CUBICS[1][i] + g2 * CUBICS[2][i];
    }
  }

  /** The energy of the quartic of a side in a triangle. */
  double quartic(int t, int k) {
    return -d.couplings[3 * t] * QUARTICS[0][k]
        - d.couplings[3 * t + 1] * QUARTICS[1][k]
        - d.couplings[3 * t + 2] * QUARTICS[2][k];
  }

  /** A side's cubic is positive near its lower-numbered end. */
  private int sign(int t, int k) {
    return d.mesh.vertex(t, (k + 1) % 3) < d.mesh.vertex(t, (k + 2) % 3) ? 1 : -1;
  }

  private void estimate(SymmetricSystem system, double[] u, int field) {
    int triangles = d.mesh.triangleCount();
    double[] cubicLoad = new double[system == null ? 0 : system.unknowns()];
    double[] quarticLoad = new double[d.mesh.sideCount()];
    double[] source = new double[triangles];
    for (int t = 0; t < triangles; t++) {
      load(t, u, source, cubicLoad, quarticLoad);
    }
    outlineLoad(u, field, cubicLoad, quarticLoad);
    double[] cubic = system == null ? cubicLoad : system.solve(cubicLoad).x();
    double[] quartic = new double[quarticLoad.length];
    for (int s = 0; s < quartic.length; s++) {
      quartic[s] = unknown[s] < 0 ? 0 : quarticLoad[s] / sideStiffness[s];
    }
    energy[field] = new double[triangles];
    amplitude[field] = new double[triangles];
    for (int t = 0; t < triangles; t++) {
      gather(t, field, source[t], cubic, quartic);
    }
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      int side = o.middle[s] - d.mesh.vertexCount();
      if (o.kind[s] == Conditions.Kind.FILM) {
        double c = cubic[unknown[side]];
        double q = quartic[side];
        energy[field][o.triangle[s]] +=
            o.areaM2[s] / o.filmM2KPerW[s] * (c * c / 210 + q * q / 630);
      }
    }
  }

  /** The residual of a triangle tested with its cubics (those inside eliminated) and quartics. */
  private void load(int t, double[] u, double[] source, double[] cubicLoad, double[] quarticLoad) {
    localMatrix(t, matrix);
    QuadraticElement.derivativesAtCorners(d.nodes, t, u, derivatives);
    residuals(t, u, derivatives, residuals);
    source[t] = residuals[3];
    for (int k = 0; k < 3; k++) {
      int side = d.mesh.side(t, k);
      if (unknown[side] < 0) {
        continue;
      }
      double inside = matrix[k * SIZE + 3] / matrix[SIZE * SIZE - 1] * source[t];
      cubicLoad[unknown[side]] += sign(t, k) * (residuals[k] - inside);
      quarticLoad[side] += residuals[4 + k];
    }
  }

  /**
   * Writes −∫∇u·λ∇ψ over a triangle for the cubics ψ, that inside last, then for the quartics.
   *
   * @param t the triangle
   * @param u nodal values
   * @param corners what {@link QuadraticElement#derivativesAtCorners} wrote of them
   * @param out seven numbers
   */
  void residuals(int t, double[] u, double[] corners, double[] out) {
    double divergence = QuadraticElement.divergence(d.couplings, d.nodes, t, u);
    out[3] = divergence / 60;
    for (int k = 0; k < 3; k++) {
      double first = QuadraticElement.sideFlux(d.couplings, t, k, (k + 1) % 3, corners);
      double last = QuadraticElement.sideFlux(d.couplings, t, k, (k + 2) % 3, corners);
      out[k] = (last - first) / 60;
      out[4 + k] = divergence / 90 - (first + last) / 60;
    }
  }

  private void outlineLoad(double[] u, int field, double[] cubicLoad, double[] quarticLoad) {
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      int side = o.middle[s] - d.mesh.vertexCount();
      if (o.kind[s] == Conditions.Kind.FILM) {
        double conductance = 1 / o.filmM2KPerW[s];
        double ambient = o.space[s] == field ? 1 : 0;
        double first = ambient - u[o.start[s]];
        double middle = ambient - u[o.middle[s]];
        double last = ambient - u[o.end[s]];
        int sign = o.start[s] < o.end[s] ? 1 : -1;
        cubicLoad[unknown[side]] += sign * conductance * o.againstCubic(s, first, middle, last);
        quarticLoad[side] += conductance * o.againstQuartic(s, first, middle, last);
      } else if (o.kind[s] == Conditions.Kind.FLOW && field == d.spaces) {
        int sign = o.start[s] < o.end[s] ? 1 : -1;
        cubicLoad[unknown[side]] += sign * o.flowWPerM2[s] * o.againstCubic(s, 1, 1, 1);
        quarticLoad[side] += o.flowWPerM2[s] * o.againstQuartic(s, 1, 1, 1);
      }
    }
  }

  private void gather(int t, int field, double source, double[] cubic, double[] quartic) {
    localMatrix(t, matrix);
    double inside = source;
    double lacking = 0;
    double most = 0;
    for (int k = 0; k < 3; k++) {
      int side = d.mesh.side(t, k);
      local[k] = unknown[side] < 0 ? 0 : sign(t, k) * cubic[unknown[side]];
      inside -= matrix[k * SIZE + 3] * local[k];
      lacking += quartic(t, k) * quartic[side] * quartic[side];
      most =
          Math.max(most, Math.abs(local[k]) * CUBIC_PEAK + Math.abs(quartic[side]) * QUARTIC_PEAK);
    }
    local[3] = inside / matrix[SIZE * SIZE - 1];
    for (int p = 0; p < SIZE; p++) {
      for (int q = 0; q < SIZE; q++) {
        lacking += matrix[p * SIZE + q] * local[p] * local[q];
      }
    }
    energy[field][t] = lacking * unseen(t);
    amplitude[field][t] = most;
  }

  /**
   * What the energy seen in a triangle is taken for. In the thin triangles of a sheet, near its
   * joints and edges, polynomials of any degree see but a fourth to a tenth of what is lacking.
   */
  private double unseen(int t) {
    return Math.min(MOST_UNSEEN, Math.max(1, Corners.slenderness(d.mesh, t) / SLENDER));
  }

  /** Integrates the products of derivatives along the sides by a rule exact to degree 6. */
  private static void integrateReference() {
    double[] points = {
      0.06943184420297371, 0.33000947820757187, 0.6699905217924281, 0.9305681557970263
    };
    double[] weights = {
      0.17392742256872693, 0.32607257743127307, 0.32607257743127307, 0.17392742256872693
    };
    double[][] derivative = new double[7][3];
    for (int i = 0; i < points.length; i++) {
      for (int j = 0; j < points.length; j++) {
        double l0 = points[i];
        double l1 = (1 - l0) * points[j];
        double weight = 2 * weights[i] * weights[j] * (1 - l0);
        barycentricDerivatives(new double[] {l0, l1, 1 - l0 - l1}, derivative);
        for (int k = 0; k < 3; k++) {
          for (int p = 0; p < SIZE; p++) {
            for (int q = 0; q < SIZE; q++) {
              CUBICS[k][p * SIZE + q] += weight * along(derivative[p], k) * along(derivative[q], k);
            }
          }
          for (int m = 0; m < 3; m++) {
            double along = along(derivative[SIZE + m], k);
            QUARTICS[k][m] += weight * along * along;
          }
        }
      }
    }
  }

  static double along(double[] derivative, int k) {
    return derivative[(k + 2) % 3] - derivative[(k + 1) % 3];
  }

  /** ∂/∂L_i of the side cubics, the cubic inside, the side quartics. */
  static void barycentricDerivatives(double[] l, double[][] out) {
    for (int k = 0; k < 3; k++) {
      int a = (k + 1) % 3;
      int b = (k + 2) % 3;
      double t = l[a] - l[b];
      double ab = l[a] * l[b];
      out[k][k] = 0;
      out[k][a] = l[b] * t + ab;
      out[k][b] = l[a] * t - ab;
      out[3][k] = ab;
      out[SIZE + k][k] = 0;
      out[SIZE + k][a] = l[b] * t * t + 2 * ab * t;
      out[SIZE + k][b] = l[a] * t * t - 2 * ab * t;
    }
  }
}
