package coldseam.solver.algebra;

import java.util.Arrays;
import org.ejml.data.DMatrixSparseCSC;
import org.ejml.sparse.csc.decomposition.chol.CholeskyUpLooking_DSCC;
import org.ejml.sparse.csc.misc.TriangularSolver_DSCC;

/**
 * A sparse symmetric positive definite system A x = b, factored once and solved many times. The
 * unknowns are numbered in their order of elimination from the start (see {@link
 * FillReducingOrder}), so nothing is permuted here.
 */
public final class SymmetricSystem {
  private final DMatrixSparseCSC upper;
  private final DMatrixSparseCSC factor;
  private final double norm;

  private SymmetricSystem(DMatrixSparseCSC upper, DMatrixSparseCSC factor) {
    this.upper = upper;
    this.factor = factor;
    norm = rowSumNorm();
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
   * @throws IllegalStateException if the matrix is not positive definite or has entries that are
   *     not finite
   */
  public static SymmetricSystem factor(
      int unknowns, int[] rows, int[] columns, double[] values, int count) {
    DMatrixSparseCSC upper = sum(unknowns, rows, columns, values, count);
    CholeskyUpLooking_DSCC cholesky = new CholeskyUpLooking_DSCC();
    if (!cholesky.decompose(upper)) {
      throw new IllegalStateException(
          "the system of " + unknowns + " unknowns is not positive definite");
    }
    DMatrixSparseCSC factor = cholesky.getL();
    for (int c = 0; c < unknowns; c++) {
      double pivot = factor.nz_values[factor.col_idx[c]];
      if (!(pivot > 0) || Double.isInfinite(pivot)) {
        throw new IllegalStateException("pivot " + c + " of " + unknowns + " is " + pivot);
      }
    }
    return new SymmetricSystem(upper, factor);
  }

  /** How many unknowns. */
  public int unknowns() {
    return upper.numCols;
  }

  /** Entries of the triangular factor. */
  public int factorEntries() {
    return factor.nz_length;
  }

  /**
   * Solves with one step of iterative refinement.
   *
   * @param b right-hand side
   * @return the solution and its residual
   */
  public Solved solve(double[] b) {
    double[] x = b.clone();
    substitute(x);
    double[] r = residual(b, x);
    substitute(r);
    for (int i = 0; i < x.length; i++) {
      x[i] += r[i];
    }
    return new Solved(x, largest(residual(b, x)) / (norm * largest(x) + largest(b)));
  }

  private void substitute(double[] x) {
    TriangularSolver_DSCC.solveL(factor, x);
    TriangularSolver_DSCC.solveTranL(factor, x);
  }

  private double[] residual(double[] b, double[] x) {
    double[] r = b.clone();
    for (int c = 0; c < x.length; c++) {
      double sum = 0;
      int diagonal = upper.col_idx[c + 1] - 1;
      for (int p = upper.col_idx[c]; p < diagonal; p++) {
        int row = upper.nz_rows[p];
        r[row] -= upper.nz_values[p] * x[c];
        sum += upper.nz_values[p] * x[row];
      }
      r[c] -= sum + upper.nz_values[diagonal] * x[c];
    }
    return r;
  }

  private double rowSumNorm() {
    double[] sums = new double[upper.numCols];
    for (int c = 0; c < sums.length; c++) {
      for (int p = upper.col_idx[c]; p < upper.col_idx[c + 1]; p++) {
        double size = Math.abs(upper.nz_values[p]);
        sums[c] += size;
        if (upper.nz_rows[p] != c) {
          sums[upper.nz_rows[p]] += size;
        }
      }
    }
    return largest(sums);
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double v : values) {
      largest = Math.max(largest, Math.abs(v));
    }
    return largest;
  }

  /** The upper triangle by columns, rows ascending, the diagonal last in each column. */
  private static DMatrixSparseCSC sum(
      int n, int[] rows, int[] columns, double[] values, int count) {
    int[] byRow = sortByRow(n, rows, columns, count);
    int[] start = new int[n + 1];
    for (int i = 0; i < count; i++) {
      start[Math.max(rows[i], columns[i]) + 1]++;
    }
    for (int c = 0; c < n; c++) {
      start[c + 1] += start[c];
    }
    int[] sortedRows = new int[count];
    double[] sorted = new double[count];
    int[] end = Arrays.copyOf(start, n);
    for (int i : byRow) {
      int row = Math.min(rows[i], columns[i]);
      int column = Math.max(rows[i], columns[i]);
      int last = end[column] - 1;
      if (last >= start[column] && sortedRows[last] == row) {
        sorted[last] += values[i];
      } else {
        sortedRows[last + 1] = row;
        sorted[last + 1] = values[i];
        end[column]++;
      }
    }
    int[] columnStarts = new int[n + 1];
    int used = 0;
    for (int c = 0; c < n; c++) {
      columnStarts[c] = used;
      int length = end[c] - start[c];
      if (length == 0 || sortedRows[end[c] - 1] != c) {
        throw new IllegalStateException("unknown " + c + " of " + n + " has no entry of its own");
      }
      System.arraycopy(sortedRows, start[c], sortedRows, used, length);
      System.arraycopy(sorted, start[c], sorted, used, length);
      used += length;
    }
    columnStarts[n] = used;
    DMatrixSparseCSC upper = new DMatrixSparseCSC(n, n, 0);
    upper.col_idx = columnStarts;
    upper.nz_rows = sortedRows;
    upper.nz_values = sorted;
    upper.nz_length = used;
    upper.indicesSorted = true;
    return upper;
  }

  private static int[] sortByRow(int n, int[] rows, int[] columns, int count) {
    int[] start = new int[n + 1];
    for (int i = 0; i < count; i++) {
      start[Math.min(rows[i], columns[i]) + 1]++;
    }
    for (int r = 0; r < n; r++) {
      start[r + 1] += start[r];
    }
    int[] sorted = new int[count];
    for (int i = 0; i < count; i++) {
      sorted[start[Math.min(rows[i], columns[i])]++] = i;
    }
    return sorted;
  }
}
