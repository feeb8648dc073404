package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.CholeskyDecomposition_F64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Against the dense Cholesky factorisation of EJML. */
class DenseBlocksTest {
  @ParameterizedTest
  @CsvSource({
    "1,0", "1,1", "2,5", "3,4", "4,4", "5,11", "17,30", "64,9", "65,64", "70,3", "150,93", "300,37"
  })
  void columns_are_eliminated_and_the_rest_is_what_remains(int width, int rows) {
    int n = width + rows;
    DMatrixRMaj full = RandomMatrices_DDRM.symmetricPosDef(n, new Random(n));
    double[] a = trapezium(full, width, 3);
    assertThat(DenseBlocks.eliminate(a, 3, width, n)).isEqualTo(-1);
    double[] u = new double[DenseUpdate.triangle(rows) + 5];
    DenseUpdate.write(a, 3 + width * width, width, 0, rows, u, 5);
    CholeskyDecomposition_F64<DMatrixRMaj> cholesky = DecompositionFactory_DDRM.chol(n, true);
    assertThat(cholesky.decompose(full.copy())).isTrue();
    DMatrixRMaj l = cholesky.getT(null);
    double scale = full.get(0, 0);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= Math.min(i, width - 1); j++) {
        assertThat(a[3 + i * width + j]).isCloseTo(l.get(i, j), within(1e-12 * scale));
      }
    }
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int k = 0; k < width; k++) {
          sum += l.get(width + i, k) * l.get(width + j, k);
        }
        assertThat(u[5 + DenseUpdate.triangle(i) + j]).isCloseTo(-sum, within(1e-11 * scale));
      }
    }
  }

  @Test
  void shares_of_the_rows_give_the_same_bits() {
    int width = 150;
    int rows = 101;
    DMatrixRMaj full = RandomMatrices_DDRM.symmetricPosDef(width + rows, new Random(5));
    double[] whole = trapezium(full, width, 0);
    double[] parts = whole.clone();
    DenseBlocks.eliminate(whole, 0, width, width + rows);
    for (int from = 0; from < width; from += DenseBlocks.BLOCK) {
      int to = Math.min(width, from + DenseBlocks.BLOCK);
      DenseBlocks.eliminateSquare(parts, 0, width, from, to);
      int third = to + (width + rows - to) / 3;
      DenseBlocks.eliminateRows(parts, 0, width, from, to, third, width + rows);
      DenseBlocks.eliminateRows(parts, 0, width, from, to, to, third);
    }
    assertThat(lower(parts, width)).isEqualTo(lower(whole, width));
    double[] u = new double[DenseUpdate.triangle(rows)];
    double[] v = new double[DenseUpdate.triangle(rows)];
    DenseUpdate.write(whole, width * width, width, 0, rows, u, 0);
    DenseUpdate.write(whole, width * width, width, 48, rows, v, 0);
    DenseUpdate.write(whole, width * width, width, 0, 48, v, 0);
    assertThat(v).isEqualTo(u);
  }

  @Test
  void the_first_pivot_that_is_not_positive_is_named() {
    for (double bad : new double[] {-1, 0, Double.NaN, Double.POSITIVE_INFINITY}) {
      double[] a = new double[100 * 100];
      for (int i = 0; i < 100; i++) {
        a[101 * i] = i == 70 ? bad : 2;
      }
      a[101 * 90] = -3;
      assertThat(DenseBlocks.eliminate(a, 0, 100, 100)).isEqualTo(70);
    }
  }

  private static double[] trapezium(DMatrixRMaj full, int width, int at) {
    double[] a = new double[at + width * full.numRows];
    for (int i = 0; i < full.numRows; i++) {
      for (int j = 0; j <= Math.min(i, width - 1); j++) {
        a[at + i * width + j] = full.get(i, j);
      }
    }
    return a;
  }

  private static double[] lower(double[] a, int width) {
    double[] lower = a.clone();
    for (int i = 0; i < width; i++) {
      for (int j = i + 1; j < width; j++) {
        lower[i * width + j] = 0;
      }
    }
    return lower;
  }
}
