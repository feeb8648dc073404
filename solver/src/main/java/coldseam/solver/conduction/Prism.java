package coldseam.solver.conduction;

import coldseam.solver.algebra.ElementSum;

/** A body of one section all along: everything counts per metre of it. */
final class Prism implements Body {
  private final int[] nodes;
  private final double[] couplings;
  private final double[] conjugate;

  /**
   * Takes the triangles.
   *
   * @param nodes their nodes, of temperatures
   * @param couplings couplings for λ
   * @param conjugate couplings for λ/det λ
   */
  Prism(int[] nodes, double[] couplings, double[] conjugate) {
    this.nodes = nodes;
    this.couplings = couplings;
    this.conjugate = conjugate;
  }

  @Override
  public ElementSum.Entries conduction() {
    return new QuadraticElement.Stiffness(couplings);
  }

  @Override
  public ElementSum.Entries resistance() {
    return new QuadraticElement.Stiffness(conjugate);
  }

  @Override
  public double conducted(int t, double[] u, double[] v) {
    return QuadraticElement.energy(couplings, nodes, t, u, v);
  }

  @Override
  public double resisted(int[] streamNodes, int t, double[] s, double[] v) {
    return QuadraticElement.energy(conjugate, streamNodes, t, s, v);
  }

  @Override
  public int misfitSize() {
    return 9;
  }

  /** At the three middles of sides, as components along the sides: 3m + k at middle m. */
  @Override
  public void misfit(int t, double[] u, int[] streamNodes, double[] s, double[] out) {
    double[] du = new double[9];
    double[] ds = new double[9];
    QuadraticElement.derivativesAtMiddles(nodes, t, u, du);
    QuadraticElement.derivativesAtMiddles(streamNodes, t, s, ds);
    for (int m = 0; m < 3; m++) {
      for (int k = 0; k < 3; k++) {
        int a = (k + 1) % 3;
        int b = (k + 2) % 3;
        // λ⁻¹ curl S along side k is 2|T| ∇L_k·(λ/det λ)∇S: towards corners a and b from corner k
        double along =
            2 * (conjugate[3 * t + b] * ds[3 * m + b] - conjugate[3 * t + a] * ds[3 * m + a]);
        out[3 * m + k] = du[3 * m + k] + along;
      }
    }
  }

  @Override
  public double gap(int t, double[] one, double[] other) {
    double sum = 0;
    for (int m = 0; m < 9; m++) {
      sum -= couplings[3 * t + m % 3] * one[m] * other[m];
    }
    return sum / 3;
  }

  @Override
  public double depthM(int t) {
    return 1;
  }
}
