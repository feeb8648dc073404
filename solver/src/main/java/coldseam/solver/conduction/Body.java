package coldseam.solver.conduction;

import coldseam.solver.algebra.ElementSum;

/**
 * The body that a section stands for, triangle by triangle: behind each point it is so many metres
 * deep, and conduction counts as often as it is deep, resistance the reciprocal of it as often.
 * With the depth ω, ∫ω∇u·λ∇v is the energy of temperatures, ∫∇S·(λ/det λ)∇V/ω that of the stream
 * functions of q = curl S/ω.
 */
interface Body {
  /** The matrices ∫ω∇φ_p·λ∇φ_q of the triangles. */
  ElementSum.Entries conduction();

  /**
   * The matrices ∫∇φ_p·(λ/det λ)∇φ_q/ω of the triangles, or of no less than 1/ω. Nodes whose values
   * follow from those of corners count with the corners and have entries of 0 themselves.
   */
  ElementSum.Entries resistance();

  /**
   * ∫ω∇u·λ∇v over a triangle, from differences.
   *
   * @param t the triangle
   * @param u nodal values of temperatures
   * @param v nodal values of temperatures
   */
  double conducted(int t, double[] u, double[] v);

  /**
   * ∫∇S·(λ/det λ)∇V/ω over a triangle, from differences; no less for S = V.
   *
   * @param nodes nodes of the stream functions, all triangles
   * @param t the triangle
   * @param s nodal values of a stream function
   * @param v nodal values of a stream function
   */
  double resisted(int[] nodes, int t, double[] s, double[] v);

  /** How many numbers {@link #misfit} writes at most. */
  int misfitSize();

  /**
   * Writes what ω⁻¹λ⁻¹curl S + ∇u is in a triangle, in a form of its own.
   *
   * @param t the triangle
   * @param u nodal values of temperatures
   * @param nodes nodes of the stream functions, all triangles
   * @param s nodal values of a stream function
   * @param out takes it
   */
  void misfit(int t, double[] u, int[] nodes, double[] s, double[] out);

  /**
   * The gap between the energies of temperatures and of fluxes in a triangle: ∫ω m·λn for the
   * misfits m and n, and what the resistance counts in excess of 1/ω.
   *
   * @param t the triangle
   * @param one what {@link #misfit} wrote
   * @param other what it wrote for the other field
   */
  double gap(int t, double[] one, double[] other);

  /** The mean depth behind a triangle, m. */
  double depthM(int t);

  /**
   * ∫ω∇φ_p·λ∇u over a triangle, from differences.
   *
   * @param nodes nodes of all triangles
   * @param t the triangle
   * @param p a local node
   * @param u nodal values
   */
  default double residual(int[] nodes, int t, int p, double[] u) {
    ElementSum.Entries entries = conduction();
    int at = QuadraticElement.NODES * t;
    double own = u[nodes[at + p]];
    double sum = 0;
    for (int q = 0; q < QuadraticElement.NODES; q++) {
      if (q != p) {
        sum += entries.entry(t, p, q) * (u[nodes[at + q]] - own);
      }
    }
    return sum;
  }
}
