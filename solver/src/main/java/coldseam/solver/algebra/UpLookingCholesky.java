package coldseam.solver.algebra;

import org.ejml.data.DMatrixSparseCSC;
import org.ejml.sparse.csc.decomposition.chol.CholeskyUpLooking_DSCC;
import org.ejml.sparse.csc.misc.TriangularSolver_DSCC;

/**
 * The factor found row by row, one number at a time, of a matrix whose unknowns are numbered in
 * their order of elimination. Starts at once and is the faster way for small matrices.
 */
final class UpLookingCholesky implements Factor {
  private final DMatrixSparseCSC factor;

  private UpLookingCholesky(DMatrixSparseCSC factor) {
    this.factor = factor;
  }

  /**
   * Factors a matrix.
   *
   * @throws IllegalStateException if it is not positive definite or not finite
   */
  static UpLookingCholesky of(SparseSymmetric matrix) {
    int n = matrix.unknowns();
    CholeskyUpLooking_DSCC cholesky = new CholeskyUpLooking_DSCC();
    if (!cholesky.decompose(wrapped(matrix))) {
      throw new IllegalStateException("the system of " + n + " unknowns is not positive definite");
    }
    DMatrixSparseCSC factor = cholesky.getL();
    for (int c = 0; c < n; c++) {
      double pivot = factor.nz_values[factor.col_idx[c]];
      if (!(pivot > 0) || Double.isInfinite(pivot)) {
        throw new IllegalStateException("pivot " + c + " of " + n + " is " + pivot);
      }
    }
    return new UpLookingCholesky(factor);
  }

  /** The same arrays in the library's form. */
  private static DMatrixSparseCSC wrapped(SparseSymmetric matrix) {
    int n = matrix.unknowns();
    DMatrixSparseCSC upper = new DMatrixSparseCSC(n, n, 0);
    upper.col_idx = matrix.starts();
    upper.nz_rows = matrix.rows();
    upper.nz_values = matrix.values();
    upper.nz_length = matrix.entries();
    upper.indicesSorted = true;
    return upper;
  }

  @Override
  public double[][] substitute(double[]... b) {
    double[][] x = new double[b.length][];
    for (int k = 0; k < b.length; k++) {
      x[k] = b[k].clone();
      TriangularSolver_DSCC.solveL(factor, x[k]);
      TriangularSolver_DSCC.solveTranL(factor, x[k]);
    }
    return x;
  }

  @Override
  public long factorEntries() {
    return factor.nz_length;
  }
}
