package coldseam.solver.algebra;

import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/** Seeded matrices for tests, and their solutions by the dense Cholesky factorisation of EJML. */
final class RandomSystems {
  private RandomSystems() {}

  /**
   * A matrix with about {@code perRow} random neighbours a row and a slightly dominant diagonal.
   */
  static SparseSymmetric scattered(int n, double perRow, Random random) {
    int pairs = (int) (n * perRow / 2);
    int[] rows = new int[pairs + n];
    int[] columns = new int[pairs + n];
    double[] values = new double[pairs + n];
    double[] diagonal = new double[n];
    int count = 0;
    for (int k = 0; k < pairs; k++) {
      int i = random.nextInt(n);
      int j = random.nextInt(n);
      if (i != j) {
        double v = -Math.pow(10, 4 * random.nextDouble() - 4);
        rows[count] = i;
        columns[count] = j;
        values[count++] = v;
        diagonal[i] -= v;
        diagonal[j] -= v;
      }
    }
    for (int i = 0; i < n; i++) {
      rows[count] = i;
      columns[count] = i;
      values[count++] = diagonal[i] + 1e-2 * (1 + random.nextDouble());
    }
    return SparseSymmetric.sum(n, rows, columns, values, count);
  }

  static double[] rightHandSide(int n, Random random) {
    double[] b = new double[n];
    for (int i = 0; i < n; i++) {
      b[i] = random.nextDouble() - 0.5;
    }
    return b;
  }

  static DMatrixRMaj dense(SparseSymmetric matrix) {
    int n = matrix.unknowns();
    DMatrixRMaj dense = new DMatrixRMaj(n, n);
    for (int c = 0; c < n; c++) {
      for (int p = matrix.start(c); p < matrix.start(c + 1); p++) {
        dense.set(matrix.row(p), c, matrix.value(p));
        dense.set(c, matrix.row(p), matrix.value(p));
      }
    }
    return dense;
  }

  static double[] denseSolution(SparseSymmetric matrix, double[] b) {
    LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.chol(matrix.unknowns());
    if (!solver.setA(dense(matrix))) {
      throw new IllegalStateException("not positive definite");
    }
    DMatrixRMaj x = new DMatrixRMaj(b.length, 1);
    solver.solve(new DMatrixRMaj(b.length, 1, true, b), x);
    return x.data;
  }

  /** Largest entry of b − A x by the dense product of EJML. */
  static double denseResidual(SparseSymmetric matrix, double[] b, double[] x) {
    DMatrixRMaj r = new DMatrixRMaj(b.length, 1, true, b.clone());
    CommonOps_DDRM.multAdd(-1, dense(matrix), new DMatrixRMaj(x.length, 1, true, x), r);
    return CommonOps_DDRM.elementMaxAbs(r);
  }
}
