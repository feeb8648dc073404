package coldseam.solver.algebra;

/**
 * A sparse symmetric positive definite system A x = b, factored once and solved many times. The
 * unknowns are numbered in their order of elimination from the start (see {@link
 * FillReducingOrder}), so nothing is permuted here. Small systems are factored row by row, large
 * ones front by front on all processors.
 */
public final class SymmetricSystem {
  /**
   * Systems with so many unknowns are factored front by front. Measured on both problems of a
   * uniformly refined section, order and bounds included, processor time of the one way over that
   * of the other: warm 0.9 at 6,000 unknowns, 0.5 at 11,000 and 20,000, 0.26 at 43,000; as the
   * first thing a process does 1.4 at 11,000, 0.85 at 22,000.
   */
  static final int LARGE = 10_000;

  private final SparseSymmetric matrix;
  private final Factor factor;
  private final double norm;

  private SymmetricSystem(SparseSymmetric matrix, Factor factor) {
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
   * Sums entries up and factors the matrix.
   *
   * @param unknowns how many unknowns
   * @param rows row of each entry; of every pair of equal off-diagonal entries only one is given,
   *     on either side of the diagonal
   * @param columns column of each entry
   * @param values the entries; several at one place are added
   * @param count how many of the entries to use
   * @return the factored system
   * @throws IllegalArgumentException if an unknown has no diagonal entry or an index is out of
   *     range
   * @throws NotPositiveDefiniteException if the matrix is not positive definite or has entries that
   *     are not finite
   */
  public static SymmetricSystem factor(
      int unknowns, int[] rows, int[] columns, double[] values, int count) {
    return factor(SparseSymmetric.sum(unknowns, rows, columns, values, count));
  }

  /**
   * Factors a matrix.
   *
   * @param matrix the matrix
   * @return the factored system
   * @throws NotPositiveDefiniteException if the matrix is not positive definite or has entries that
   *     are not finite
   */
  public static SymmetricSystem factor(SparseSymmetric matrix) {
    Factor factor =
        matrix.unknowns() < LARGE
            ? UpLookingCholesky.of(matrix)
            : MultifrontalCholesky.factor(EliminationPlan.inOrder(matrix), matrix);
    return new SymmetricSystem(matrix, factor);
  }

  /** How many unknowns. */
  public int unknowns() {
    return matrix.unknowns();
  }

  /** Entries of the triangular factor. */
  public long factorEntries() {
    return factor.factorEntries();
  }

  /**
   * Solves with one step of iterative refinement.
   *
   * @param b right-hand side
   * @return the solution and its residual
   */
  public Solved solve(double[] b) {
    double[][] one = {b};
    return solve(one)[0];
  }

  /**
   * Solves with one step of iterative refinement for each right-hand side.
   *
   * @param b right-hand sides
   * @return the solutions with their residuals, in the same order
   */
  public Solved[] solve(double[][] b) {
    double[][] x = factor.substitute(b);
    double[][] r = new double[b.length][];
    for (int k = 0; k < b.length; k++) {
      r[k] = matrix.residual(b[k], x[k]);
    }
    double[][] correction = factor.substitute(r);
    Solved[] solved = new Solved[b.length];
    for (int k = 0; k < b.length; k++) {
      for (int i = 0; i < x[k].length; i++) {
        x[k][i] += correction[k][i];
      }
      double left = largest(matrix.residual(b[k], x[k]));
      solved[k] = new Solved(x[k], left / (norm * largest(x[k]) + largest(b[k])));
    }
    return solved;
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double v : values) {
      largest = Math.max(largest, Math.abs(v));
    }
    return largest;
  }
}
