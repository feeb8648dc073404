package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class FillReducingOrderTest {
  @Test
  void everyFreeNodeGetsOnePlaceAndTheOthersNone() {
    GridSystem grid = new GridSystem(13, 7);
    boolean[] free = new boolean[grid.nodes()];
    Arrays.fill(free, true);
    free[0] = false;
    free[20] = false;

    int[] place = FillReducingOrder.of(free, grid.elements(), 4, grid.x(), grid.y());

    assertThat(place[0]).isEqualTo(-1);
    assertThat(place[20]).isEqualTo(-1);
    assertThat(Arrays.stream(place).filter(p -> p >= 0).sorted().toArray())
        .isEqualTo(java.util.stream.IntStream.range(0, grid.nodes() - 2).toArray());
  }

  /**
   * George (1973): nested dissection of an m × m grid of elements leaves (31/4) n log2 n + O(n)
   * entries in the factor, while row-by-row order leaves about n^1.5.
   */
  @Test
  void fillGrowsLikeTheTheoryOfNestedDissection() {
    for (int m : new int[] {31, 63, 127}) {
      GridSystem grid = new GridSystem(m, m);
      int n = grid.nodes();
      boolean[] free = new boolean[n];
      Arrays.fill(free, true);
      int[] place = FillReducingOrder.of(free, grid.elements(), 4, grid.x(), grid.y());
      double theory = 7.75 * n * Math.log(n) / Math.log(2);

      assertThat((double) grid.factor(place).factorEntries()).isLessThan(theory);
    }
    GridSystem grid = new GridSystem(127, 127);
    int[] byRows = java.util.stream.IntStream.range(0, grid.nodes()).toArray();
    assertThat((double) grid.factor(byRows).factorEntries())
        .isGreaterThan(0.9 * Math.pow(grid.nodes(), 1.5));
  }

  @Test
  void elementsOnOnePlaceDoNotStopIt() {
    GridSystem grid = new GridSystem(9, 9);
    boolean[] free = new boolean[grid.nodes()];
    Arrays.fill(free, true);
    double[] same = new double[81];

    int[] place = FillReducingOrder.of(free, grid.elements(), 4, same, same);

    assertThat(Arrays.stream(place).distinct().count()).isEqualTo(100);
  }

  @Test
  void refusesWhatDoesNotMatch() {
    assertThatThrownBy(
            () ->
                FillReducingOrder.of(
                    new boolean[3], new int[] {0, 1, 2}, 3, new double[2], new double[2]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("do not match");
    assertThatThrownBy(
            () ->
                FillReducingOrder.of(
                    new boolean[] {true, true, true, true},
                    new int[] {0, 1, 2},
                    3,
                    new double[1],
                    new double[1]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("1 nodes belong to no element");
  }
}
