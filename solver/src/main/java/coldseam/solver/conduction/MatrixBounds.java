package coldseam.solver.conduction;

/**
 * Two symmetric matrices that bracket the matrix A of the spaces: xᵀ lower x ≤ xᵀAx ≤ xᵀ upper x
 * for every x. Adding conductances to both, and eliminating a space from both by its Schur
 * complement, keeps the order.
 *
 * @param upper upper matrix, W/(m·K)
 * @param lower lower matrix, W/(m·K)
 * @param allowance relative allowance for rounding
 */
public record MatrixBounds(double[][] upper, double[][] lower, double allowance) {
  /** Copies the matrices. */
  public MatrixBounds {
    upper = copy(upper);
    lower = copy(lower);
  }

  private static double[][] copy(double[][] matrix) {
    double[][] copy = new double[matrix.length][];
    for (int i = 0; i < matrix.length; i++) {
      copy[i] = matrix[i].clone();
    }
    return copy;
  }

  /** The matrices again, copied. */
  @Override
  public double[][] upper() {
    return copy(upper);
  }

  /** The matrices again, copied. */
  @Override
  public double[][] lower() {
    return copy(lower);
  }
}
