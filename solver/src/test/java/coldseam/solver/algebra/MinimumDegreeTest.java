package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.BitSet;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class MinimumDegreeTest {
  private static ElementSet pairs(int unknowns, int interior, int[]... pairs) {
    int[] start = IntStream.rangeClosed(0, pairs.length).map(i -> 2 * i).toArray();
    int[] member = Arrays.stream(pairs).flatMapToInt(Arrays::stream).toArray();
    return new ElementSet(
        start, member, null, null, IntStream.range(0, unknowns).toArray(), interior);
  }

  @Test
  void the_middle_of_a_star_comes_after_its_points() {
    int[][] points = IntStream.range(1, 30).mapToObj(i -> new int[] {0, i}).toArray(int[][]::new);
    int[] place = new int[30];
    MinimumDegree.number(pairs(30, 30, points), 100, place);
    assertThat(place[0]).isGreaterThanOrEqualTo(128);
    assertThat(Arrays.stream(place).sorted().toArray())
        .isEqualTo(IntStream.range(100, 130).toArray());
  }

  @Test
  void neighbours_outside_count() {
    // unknown 0 has one neighbour inside, unknown 2 none but three outside
    int[][] pairs = {{0, 1}, {2, 3}, {2, 4}, {2, 5}};
    int[] place = new int[6];
    MinimumDegree.number(pairs(6, 3, pairs), 0, place);
    assertThat(place[2]).isEqualTo(2);
  }

  /** Each unknown eliminated has, of those left, the fewest neighbours. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6})
  void each_time_one_with_the_fewest_neighbours_is_eliminated(int seed) {
    Random random = new Random(seed);
    int n = seed == 6 ? 64 : 10 * seed;
    int[][] pairs = new int[2 * n][];
    BitSet[] neighbours = new BitSet[n];
    Arrays.setAll(neighbours, i -> new BitSet());
    for (int k = 0; k < pairs.length; k++) {
      int i = random.nextInt(n);
      int j = (i + 1 + random.nextInt(n - 1)) % n;
      pairs[k] = new int[] {i, j};
      neighbours[i].set(j);
      neighbours[j].set(i);
    }
    int[] place = new int[n];
    MinimumDegree.number(pairs(n, n, pairs), 0, place);
    int[] unknown = new int[n];
    for (int u = 0; u < n; u++) {
      unknown[place[u]] = u;
    }
    for (int k = 0; k < n; k++) {
      int fewest = n;
      for (int later = k; later < n; later++) {
        fewest = Math.min(fewest, neighbours[unknown[later]].cardinality());
      }
      BitSet joined = neighbours[unknown[k]];
      assertThat(joined.cardinality()).isEqualTo(fewest);
      for (int u = joined.nextSetBit(0); u >= 0; u = joined.nextSetBit(u + 1)) {
        neighbours[u].or(joined);
        neighbours[u].clear(u);
        neighbours[u].clear(unknown[k]);
      }
    }
  }
}
