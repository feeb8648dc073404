package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class BreadthFirstLevelsTest {
  /** A chain of pairs 0–1, 1–2 and so on, in the order of {@code at}. */
  private static ElementSet chain(int[] at, int more) {
    int n = at.length;
    int size = more > 0 ? 3 : 2;
    int[] start = IntStream.rangeClosed(0, n).map(i -> size * i).toArray();
    int[] member = new int[size * n];
    for (int e = 0; e < n; e++) {
      member[size * e] = at[e];
      member[size * e + 1] = at[e] + 1;
      if (more > 0) {
        member[size * e + 2] = more;
      }
    }
    int unknowns = Arrays.stream(member).max().orElseThrow() + 1;
    return new ElementSet(
        start, member, null, null, IntStream.range(0, unknowns).toArray(), unknowns);
  }

  private static double[] levels(ElementSet set) {
    double[] key = new double[set.elements()];
    BreadthFirstLevels.of(set, key);
    return key;
  }

  @Test
  void levels_run_from_one_end_of_a_chain_to_the_other() {
    double[] levels = levels(chain(new int[] {3, 1, 0, 4, 2}, 0));
    assertThat(levels).isIn(new double[] {3, 1, 0, 4, 2}, new double[] {1, 3, 4, 0, 2});
  }

  @Test
  void parts_that_do_not_hang_together_follow_one_another() {
    double[] levels = levels(chain(new int[] {0, 1, 2, 10, 11, 12}, 0));
    assertThat(Arrays.stream(levels).sorted().toArray()).containsExactly(0, 1, 2, 3, 4, 5);
  }

  @Test
  void an_unknown_of_very_many_elements_is_no_short_cut() {
    double[] levels = levels(chain(IntStream.range(0, 200).toArray(), 1000));
    assertThat(Arrays.stream(levels).max().orElseThrow()).isEqualTo(199);
  }
}
