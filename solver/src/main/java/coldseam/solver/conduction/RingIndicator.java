package coldseam.solver.conduction;

/** The same for a body of revolution: every integral over a triangle with the depth ω = 2πr. */
final class RingIndicator extends HierarchicalIndicator {
  /**
   * Points of a rule on the triangle, exact to degree 8: Gauss and Legendre's of 5 points, twice.
   */
  private static final double[] POINTS = {
    0.046910077030668, 0.2307653449471585, 0.5, 0.7692346550528415, 0.953089922969332
  };

  private static final double[] WEIGHTS = {
    0.1184634425280945,
    0.2393143352496832,
    0.2844444444444444,
    0.2393143352496832,
    0.1184634425280945
  };

  /** −∂²/∂ω_c∂G_k of the matrix of the cubics, at 3c + k. */
  private static final double[][] CUBICS = new double[9][SIZE * SIZE];

  /** The same of the energies of the quartics. */
  private static final double[][] QUARTICS = new double[9][3];

  /** ∫L_c L_e ∂ψ along side k for the seven polynomials ψ, over the area: at 9c + 3k + e. */
  private static final double[][] SLOPES = new double[27][7];

  static {
    double[][] derivative = new double[7][3];
    for (int i = 0; i < POINTS.length; i++) {
      for (int j = 0; j < POINTS.length; j++) {
        double l0 = POINTS[i];
        double l1 = (1 - l0) * POINTS[j];
        double[] l = {l0, l1, 1 - l0 - l1};
        barycentricDerivatives(l, derivative);
        integrate(l, derivative, 2 * WEIGHTS[i] * WEIGHTS[j] * (1 - l0));
      }
    }
  }

  RingIndicator(Discretisation d, double[][] fields, boolean[] wanted) {
    super(d, fields, wanted);
  }

  private static void integrate(double[] l, double[][] derivative, double weight) {
    for (int c = 0; c < 3; c++) {
      for (int k = 0; k < 3; k++) {
        for (int p = 0; p < SIZE; p++) {
          for (int q = 0; q < SIZE; q++) {
            CUBICS[3 * c + k][p * SIZE + q] +=
                weight * l[c] * along(derivative[p], k) * along(derivative[q], k);
          }
        }
        for (int m = 0; m < 3; m++) {
          double along = along(derivative[SIZE + m], k);
          QUARTICS[3 * c + k][m] += weight * l[c] * along * along;
        }
        for (int e = 0; e < 3; e++) {
          for (int psi = 0; psi < 7; psi++) {
            SLOPES[9 * c + 3 * k + e][psi] += weight * l[c] * l[e] * along(derivative[psi], k);
          }
        }
      }
    }
  }

  private double depth(int t, int c) {
    return Circumference.at(d.mesh, d.mesh.vertex(t, c));
  }

  @Override
  void localMatrix(int t, double[] out) {
    for (int i = 0; i < out.length; i++) {
      double sum = 0;
      for (int c = 0; c < 3; c++) {
        for (int k = 0; k < 3; k++) {
          sum -= depth(t, c) * d.couplings[3 * t + k] * CUBICS[3 * c + k][i];
        }
      }
      out[i] = sum;
    }
  }

  @Override
  double quartic(int t, int side) {
    double sum = 0;
    for (int c = 0; c < 3; c++) {
      for (int k = 0; k < 3; k++) {
        sum -= depth(t, c) * d.couplings[3 * t + k] * QUARTICS[3 * c + k][side];
      }
    }
    return sum;
  }

  @Override
  void residuals(int t, double[] u, double[] corners, double[] out) {
    for (int psi = 0; psi < out.length; psi++) {
      double sum = 0;
      for (int c = 0; c < 3; c++) {
        for (int k = 0; k < 3; k++) {
          double along = 0;
          for (int e = 0; e < 3; e++) {
            along += corners[3 * k + e] * SLOPES[9 * c + 3 * k + e][psi];
          }
          sum += depth(t, c) * d.couplings[3 * t + k] * along;
        }
      }
      out[psi] = sum;
    }
  }
}
