package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.BitSet;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Against elimination on sets, column by column. */
class EliminationTreeTest {
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8})
  void parents_and_counts_are_those_of_the_elimination(int seed) {
    Random random = new Random(seed);
    SparseSymmetric matrix = RandomSystems.scattered(10 + 30 * seed, 1 + 0.7 * seed, random);
    EliminationTree tree = EliminationTree.of(matrix, shuffled(matrix.unknowns(), random));
    BitSet[] columns = SymbolicCheck.columns(matrix, tree.place());
    for (int c = 0; c < columns.length; c++) {
      assertThat(tree.parent()[c]).isEqualTo(columns[c].nextSetBit(0));
      assertThat(tree.count()[c]).isEqualTo(1 + columns[c].cardinality());
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3})
  void descendants_are_numbered_without_a_break_up_to_their_ancestor(int seed) {
    Random random = new Random(100 + seed);
    SparseSymmetric matrix = RandomSystems.scattered(150, 2.5, random);
    int[] parent = EliminationTree.of(matrix, shuffled(150, random)).parent();
    int[] size = new int[150];
    for (int c = 0; c < 150; c++) {
      size[c]++;
      if (parent[c] >= 0) {
        assertThat(parent[c]).isGreaterThan(c);
        size[parent[c]] += size[c];
      }
    }
    for (int c = 0; c < 150; c++) {
      for (int d = c - size[c] + 1; d < c; d++) {
        int up = d;
        while (up >= 0 && up < c) {
          up = parent[up];
        }
        assertThat(up).as("ancestor of %d among its elders", d).isEqualTo(c);
      }
    }
  }

  static int[] shuffled(int n, Random random) {
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    for (int i = n - 1; i > 0; i--) {
      int j = random.nextInt(i + 1);
      int swapped = order[i];
      order[i] = order[j];
      order[j] = swapped;
    }
    return order;
  }
}
