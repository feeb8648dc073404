package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.BitSet;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Against elimination on sets, column by column. */
class FrontsTest {
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6})
  void every_front_has_room_for_its_columns_and_no_row_that_none_of_them_has(int seed) {
    Random random = new Random(seed);
    int n = 40 * seed;
    SparseSymmetric matrix = RandomSystems.scattered(n, 1 + seed, random);
    EliminationPlan plan = EliminationPlan.of(matrix, EliminationTreeTest.shuffled(n, random));
    int[] place = new int[n];
    for (int u = 0; u < n; u++) {
      place[u] = plan.column(u);
    }
    BitSet[] columns = SymbolicCheck.columns(matrix, place);
    Fronts fronts = plan.fronts();
    assertThat(fronts.first()[fronts.count()]).isEqualTo(n);
    for (int f = 0; f < fronts.count(); f++) {
      BitSet rows = new BitSet(n);
      for (int p = fronts.rowStart()[f]; p < fronts.rowStart()[f + 1]; p++) {
        rows.set(fronts.row()[p]);
      }
      BitSet needed = new BitSet(n);
      for (int c = fronts.first()[f]; c < fronts.first()[f + 1]; c++) {
        needed.or(columns[c]);
      }
      needed.clear(0, fronts.first()[f + 1]);
      assertThat(rows).isEqualTo(needed);
      if (!rows.isEmpty()) {
        int parent = fronts.parent()[f];
        assertThat(rows.nextSetBit(0))
            .isBetween(fronts.first()[parent], fronts.first()[parent + 1] - 1);
      }
    }
  }
}
