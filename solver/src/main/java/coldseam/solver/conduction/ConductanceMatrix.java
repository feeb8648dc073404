package coldseam.solver.conduction;

import coldseam.solver.detail.Conditions;

/**
 * The matrix A of the spaces, A_ij = ∫λ∇u_i·∇u_j + ∫(u_i − δ_i)(u_j − δ_j)/Rs, and the flow that a
 * unit of given flows drives into each space. All from sums of products of differences.
 */
final class ConductanceMatrix {
  /** A, W/(m·K); where fixed temperatures meet, what the mesh makes of an infinite entry. */
  final double[][] a;

  /** Flow from each space into the detail caused by the given flows, W/m. */
  final double[] drivenFlow;

  /** Sum of the given flows, W/m. */
  final double prescribedFlow;

  /** Energy of the field of the given flows, W·K/m. */
  final double flowEnergy;

  private ConductanceMatrix(
      double[][] a, double[] drivenFlow, double prescribedFlow, double flowEnergy) {
    this.a = a;
    this.drivenFlow = drivenFlow;
    this.prescribedFlow = prescribedFlow;
    this.flowEnergy = flowEnergy;
  }

  /** The middle of two-sided bounds. */
  static ConductanceMatrix of(Discretisation d, TwoSidedBound bound) {
    int n = d.spaces;
    double[][] a = new double[n][n];
    double[] driven = new double[n];
    for (int i = 0; i < n; i++) {
      driven[i] = bound.middle(i, n);
      for (int j = 0; j < n; j++) {
        a[i][j] = bound.middle(i, j);
      }
    }
    double prescribed = 0;
    for (int s = 0; s < d.outline.count; s++) {
      prescribed += d.outline.areaM2[s] * d.outline.flowWPerM2[s];
    }
    return new ConductanceMatrix(a, driven, prescribed, -bound.middle(n, n));
  }

  static ConductanceMatrix of(Discretisation d, double[][] fields) {
    int n = d.spaces;
    double[][] a = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        // with two spaces the second field is 1 less the first: the same energy but for the sign
        a[i][j] = n == 2 && j == 1 ? (i == 0 ? -1 : 1) * a[0][0] : energy(d, fields, i, j);
        a[j][i] = a[i][j];
      }
    }
    double[] driven = new double[n];
    double prescribed = 0;
    double flowEnergy = 0;
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FLOW) {
        double flow = o.areaM2[s] * o.flowWPerM2[s];
        prescribed += flow;
        flowEnergy += flow * o.mean(s, fields[n]);
        for (int i = 0; i < n; i++) {
          driven[i] -= flow * o.mean(s, fields[i]);
        }
      }
    }
    return new ConductanceMatrix(a, driven, prescribed, flowEnergy);
  }

  private static double energy(Discretisation d, double[][] fields, int i, int j) {
    double sum = 0;
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      sum += d.body.conducted(t, fields[i], fields[j]);
    }
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FILM) {
        double di = o.space[s] == i ? 1 : 0;
        double dj = o.space[s] == j ? 1 : 0;
        sum += o.filmEnergy(s, fields[i], di, fields[j], dj);
      }
    }
    return sum;
  }
}
