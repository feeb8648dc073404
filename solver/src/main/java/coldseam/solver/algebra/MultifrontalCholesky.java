package coldseam.solver.algebra;

/**
 * A sparse symmetric positive definite system A x = b, factored by the multifrontal method (Duff
 * and Reid 1983; Liu 1992) as A = L Lᵀ and solved for any number of right-hand sides. Independent
 * parts of the elimination tree and the rows of large fronts are done at the same time; the numbers
 * do not depend on how many threads there are or which is first.
 */
public final class MultifrontalCholesky implements Factor {
  private final EliminationPlan plan;
  private final SparseSymmetric matrix;
  private final double[][] factor;
  private final double norm;

  private MultifrontalCholesky(EliminationPlan plan, SparseSymmetric matrix, double[][] factor) {
    this.plan = plan;
    this.matrix = matrix;
    this.factor = factor;
    norm = matrix.norm();
  }

  /**
   * A solution and how well it fits.
   *
   * @param x the solution
   * @param relativeResidual largest entry of b − A x over ‖A‖‖x‖ + ‖b‖ (maximum norms)
   */
  public record Solved(double[] x, double relativeResidual) {}

  /**
   * Factors a matrix.
   *
   * @param plan the plan for matrices with their entries in these places
   * @param matrix the matrix
   * @return the factored system
   * @throws IllegalArgumentException if the plan was made for other places
   * @throws NotPositiveDefiniteException if the matrix is not positive definite or not finite
   */
  public static MultifrontalCholesky factor(EliminationPlan plan, SparseSymmetric matrix) {
    if (!plan.fits(matrix)) {
      throw new IllegalArgumentException("the plan was made for a matrix with other places");
    }
    return new MultifrontalCholesky(plan, matrix, FrontElimination.of(plan, matrix.values()));
  }

  /** How many unknowns. */
  public int unknowns() {
    return matrix.unknowns();
  }

  /**
   * The smallest of all pivots, each over the diagonal entry it started from. At the rounding error
   * of a number (1e-16 or so) the matrix is singular but for rounding; triangles of aspect 1000
   * with a contrast of 10^4 leave some 1e-6.
   */
  public double smallestPivotShare() {
    return plan.smallestPivotShare(factor, matrix);
  }

  /**
   * Solves with one step of iterative refinement for each right-hand side.
   *
   * @param b right-hand sides
   * @return the solutions with their residuals, in the same order
   */
  public Solved[] solve(double[]... b) {
    double[][] x = substitute(b);
    double[][] r = new double[b.length][];
    for (int k = 0; k < b.length; k++) {
      r[k] = matrix.residual(b[k], x[k]);
    }
    double[][] correction = substitute(r);
    Solved[] solved = new Solved[b.length];
    for (int k = 0; k < b.length; k++) {
      for (int i = 0; i < x[k].length; i++) {
        x[k][i] += correction[k][i];
      }
      double left = largest(matrix.residual(b[k], x[k]));
      solved[k] = new Solved(x[k], left == 0 ? 0 : left / (norm * largest(x[k]) + largest(b[k])));
    }
    return solved;
  }

  /**
   * Solves by substitution alone.
   *
   * @param b right-hand sides
   * @return the solutions, in the same order
   */
  @Override
  public double[][] substitute(double[]... b) {
    int n = unknowns();
    double[][] x = new double[b.length][n];
    for (int k = 0; k < b.length; k++) {
      if (b[k].length != n) {
        throw new IllegalArgumentException(b[k].length + " numbers for " + n + " unknowns");
      }
      for (int u = 0; u < n; u++) {
        x[k][plan.column(u)] = b[k][u];
      }
    }
    Substitution.solve(plan, factor, x);
    double[] ordered = new double[n];
    for (int k = 0; k < b.length; k++) {
      for (int u = 0; u < n; u++) {
        ordered[u] = x[k][plan.column(u)];
      }
      double[] free = x[k];
      x[k] = ordered;
      ordered = free;
    }
    return x;
  }

  @Override
  public long factorEntries() {
    return plan.factorEntries();
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double v : values) {
      largest = Math.max(largest, Math.abs(v));
    }
    return largest;
  }
}
