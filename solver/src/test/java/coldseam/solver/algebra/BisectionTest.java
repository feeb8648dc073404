package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Elements are the squares of a grid, unknowns its points; the shortest cut is known. */
class BisectionTest {
  /** {@code across} by {@code up} squares, turned and stretched. */
  private static ElementSet grid(int across, int up, double degrees, double stretch) {
    int elements = across * up;
    int[] start = new int[elements + 1];
    int[] member = new int[4 * elements];
    double[] x = new double[elements];
    double[] y = new double[elements];
    double cos = Math.cos(Math.toRadians(degrees));
    double sin = Math.sin(Math.toRadians(degrees));
    for (int e = 0; e < elements; e++) {
      int i = e % across;
      int j = e / across;
      int first = j * (across + 1) + i;
      member[4 * e] = first;
      member[4 * e + 1] = first + 1;
      member[4 * e + 2] = first + across + 1;
      member[4 * e + 3] = first + across + 2;
      start[e + 1] = 4 * e + 4;
      x[e] = cos * stretch * i - sin * j;
      y[e] = sin * stretch * i + cos * j;
    }
    return FirstSet.of((across + 1) * (up + 1), start, member, x, y);
  }

  private static int shared(ElementSet set, boolean[] right) {
    int count = 0;
    int[][] holders = set.elementsOfUnknowns();
    for (int u = 0; u < set.interior(); u++) {
      boolean left = false;
      boolean other = false;
      for (int h = holders[0][u]; h < holders[0][u + 1]; h++) {
        left |= !right[holders[1][h]];
        other |= right[holders[1][h]];
      }
      count += left && other ? 1 : 0;
    }
    return count;
  }

  private static int countRight(boolean[] right) {
    int count = 0;
    for (boolean r : right) {
      count += r ? 1 : 0;
    }
    return count;
  }

  @ParameterizedTest
  @CsvSource({"40,40,0", "60,20,0", "20,60,0", "300,2,0", "300,2,17", "9,9,0", "60,20,45"})
  void a_rectangle_is_cut_across_where_it_is_narrow(int across, int up, double degrees) {
    ElementSet set = grid(across, up, degrees, 1);
    boolean[] right = Bisection.of(set);
    assertThat(shared(set, right)).isLessThanOrEqualTo(Math.min(across, up) + 1);
    assertThat(countRight(right)).isBetween(across * up / 4, across * up * 3 / 4);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3})
  void a_ragged_cut_is_smoothed(int seed) {
    ElementSet set = grid(50, 50, 0, 1);
    Random random = new Random(seed);
    for (int e = 0; e < set.elements(); e++) {
      set.x()[e] += 4 * random.nextDouble();
      set.y()[e] += 4 * random.nextDouble();
    }
    // the straight cut alone shares more than 100 unknowns
    assertThat(shared(set, Bisection.of(set))).isLessThanOrEqualTo(60);
  }

  @ParameterizedTest
  @CsvSource({"1e3", "1e-3"})
  void stretched_squares_are_cut_as_well(double stretch) {
    ElementSet set = grid(40, 40, 0, stretch);
    assertThat(shared(set, Bisection.of(set))).isLessThanOrEqualTo(41);
  }

  @Test
  void elements_all_in_one_place_are_halved_by_number() {
    int[] start = new int[101];
    int[] member = new int[200];
    for (int e = 0; e < 100; e++) {
      start[e + 1] = 2 * e + 2;
      member[2 * e] = e;
      member[2 * e + 1] = e + 1;
    }
    ElementSet set = FirstSet.of(101, start, member, new double[100], new double[100]);
    assertThat(countRight(Bisection.of(set))).isEqualTo(50);
  }

  @Test
  void a_few_elements_far_away_are_not_a_half() {
    int n = 90;
    int[] start = new int[n + 1];
    int[] member = new int[2 * n];
    double[] x = new double[n];
    for (int e = 0; e < n; e++) {
      start[e + 1] = 2 * e + 2;
      member[2 * e] = e;
      member[2 * e + 1] = e + 1;
      x[e] = e < 3 ? 1000 : 0;
    }
    ElementSet set = FirstSet.of(n + 1, start, member, x, new double[n]);
    assertThat(countRight(Bisection.of(set))).isBetween(n / 10, n - n / 10);
  }
}
