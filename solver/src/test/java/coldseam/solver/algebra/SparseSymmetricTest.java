package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.NormOps_DDRM;
import org.junit.jupiter.api.Test;

class SparseSymmetricTest {
  @Test
  void entries_at_one_place_are_added_on_either_side_of_the_diagonal() {
    int[] rows = {2, 0, 0, 1, 2, 0, 1};
    int[] columns = {0, 2, 0, 1, 2, 0, 2};
    double[] values = {1, 10, 100, 1000, 3, 200, 7};
    SparseSymmetric matrix = SparseSymmetric.sum(3, rows, columns, values, 7);
    DMatrixRMaj dense = RandomSystems.dense(matrix);
    assertThat(dense.data).containsExactly(300, 0, 11, 0, 1000, 7, 11, 7, 3);
    assertThat(matrix.entries()).isEqualTo(5);
  }

  @Test
  void summing_and_wrapping_give_the_same_matrix() {
    Random random = new Random(11);
    SparseSymmetric summed = RandomSystems.scattered(60, 6, random);
    int[] start = new int[61];
    int[] row = new int[summed.entries()];
    for (int c = 0; c <= 60; c++) {
      start[c] = summed.start(c);
    }
    for (int p = 0; p < row.length; p++) {
      row[p] = summed.row(p);
    }
    SparseSymmetric wrapped = SparseSymmetric.of(start, row, summed.values());
    assertThat(wrapped.places().same(summed.places())).isTrue();
    assertThat(RandomSystems.dense(wrapped).data).isEqualTo(RandomSystems.dense(summed).data);
  }

  @Test
  void residual_and_norm_agree_with_dense_algebra() {
    Random random = new Random(12);
    SparseSymmetric matrix = RandomSystems.scattered(80, 9, random);
    double[] x = RandomSystems.rightHandSide(80, random);
    double[] b = RandomSystems.rightHandSide(80, random);
    double largest = Arrays.stream(matrix.residual(b, x)).map(Math::abs).max().orElseThrow();
    assertThat(largest).isCloseTo(RandomSystems.denseResidual(matrix, b, x), within(1e-14));
    // the maximum norm of a symmetric matrix is its 1-norm
    assertThat(matrix.norm())
        .isCloseTo(NormOps_DDRM.inducedP1(RandomSystems.dense(matrix)), within(1e-13));
  }

  @Test
  void arrays_that_hold_no_upper_triangle_are_refused() {
    double[] values = {1, 2, 3};
    assertThatIllegalArgumentException()
        .isThrownBy(() -> SparseSymmetric.of(new int[] {0, 1, 2}, new int[] {0, 0}, values))
        .withMessageContaining("column 1 of 2 has no diagonal entry");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> SparseSymmetric.of(new int[] {0, 1, 1}, new int[] {0, 1}, values))
        .withMessageContaining("column 1 of 2");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> SparseSymmetric.of(new int[] {0, 1, 4}, new int[] {0, 0, 0, 1}, values))
        .withMessageContaining("match in length");
    assertThatIllegalArgumentException()
        .isThrownBy(
            () -> SparseSymmetric.of(new int[] {0, 1, 4}, new int[] {0, 0, 0, 1}, new double[4]))
        .withMessageContaining("rows of column 1 of 2 not ascending");
  }

  @Test
  void unknowns_without_an_entry_of_their_own_and_numbers_out_of_range_are_refused() {
    assertThatIllegalArgumentException()
        .isThrownBy(
            () ->
                SparseSymmetric.sum(2, new int[] {0, 0}, new int[] {0, 1}, new double[] {1, 2}, 2))
        .withMessageContaining("unknown 1 has no entry of its own");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> SparseSymmetric.sum(2, new int[] {2}, new int[] {0}, new double[] {1}, 1))
        .withMessageContaining("entry (2, 0) of 2 unknowns");
  }

  @Test
  void too_few_values_are_refused() {
    SparseSymmetric matrix = RandomSystems.scattered(10, 3, new Random(13));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> matrix.withValues(new double[matrix.entries() - 1]));
  }
}
