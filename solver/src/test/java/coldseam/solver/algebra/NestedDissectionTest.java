package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.concurrent.ForkJoinPool;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class NestedDissectionTest {
  /**
   * A k by k grid of unknowns whose elements are the squares between four of them: nested
   * dissection leaves at most 31/4 k² log2 k entries in the factor, to leading order (George 1973;
   * the constant as in George and Liu 1981, from memory).
   */
  @ParameterizedTest
  @ValueSource(ints = {20, 45, 80})
  void a_grid_fills_in_no_more_than_the_theory_says(int k) {
    Grid grid = new Grid(k, k, 1, 1);
    long fill = SymbolicCheck.fill(grid.matrix(), grid.order());
    assertThat((double) fill).isLessThan(7.75 * k * k * Math.log(k) / Math.log(2));
  }

  @Test
  void a_ladder_of_long_thin_elements_fills_in_like_a_band() {
    Grid ladder = new Grid(2000, 3, 1, 1e-3);
    long fill = SymbolicCheck.fill(ladder.matrix(), ladder.order());
    // a cut across has three unknowns: each of 6,000 unknowns is coupled to two cuts at most
    assertThat(fill).isLessThan(6000L * 10);
  }

  @Test
  void a_mesh_graded_towards_a_point_fills_in_no_more_than_an_even_one_of_its_size() {
    QuadraticLaplacian graded =
        new QuadraticLaplacian(
            QuadraticLaplacian.mapped(40, 40, s -> cubed(s), t -> cubed(t)), (x, y) -> 1.0);
    QuadraticLaplacian even =
        new QuadraticLaplacian(QuadraticLaplacian.square(40, 40), (x, y) -> 1.0);
    long gradedFill = SymbolicCheck.fill(graded.matrix, graded.order());
    long evenFill = SymbolicCheck.fill(even.matrix, even.order());
    assertThat(gradedFill).isLessThan(evenFill * 3 / 2);
  }

  private static double cubed(double s) {
    return 4 * (s - 0.5) * (s - 0.5) * (s - 0.5) + 0.5;
  }

  @Test
  void every_unknown_has_one_place() {
    for (int seed = 1; seed <= 30; seed++) {
      Random random = new Random(seed);
      int n = 1 + random.nextInt(400);
      int elements = random.nextInt(500);
      int[] start = new int[elements + 1];
      int[] member = new int[6 * elements];
      double[] x = new double[elements];
      double[] y = new double[elements];
      int used = 0;
      for (int e = 0; e < elements; e++) {
        int size = random.nextInt(7);
        for (int i = 0; i < size; i++) {
          member[used++] = random.nextInt(n + 5) - 5;
        }
        start[e + 1] = used;
        x[e] = random.nextInt(4);
        y[e] = random.nextInt(3);
      }
      boolean placed = random.nextBoolean();
      int[] order = NestedDissection.of(n, start, member, placed ? x : null, placed ? y : null);
      assertThat(Arrays.stream(order).sorted().toArray())
          .as("seed %d", seed)
          .isEqualTo(IntStream.range(0, n).toArray());
    }
  }

  @Test
  void an_unknown_of_very_many_elements_comes_last() {
    int k = 40;
    Grid grid = new Grid(k, k, 1, 1);
    // the elements along the whole outline hold one more unknown
    List<int[]> elements = new ArrayList<>();
    for (int e = 0; e < grid.elements(); e++) {
      int i = e % (k - 1);
      int j = e / (k - 1);
      boolean outer = i == 0 || j == 0 || i == k - 2 || j == k - 2;
      int[] nodes = grid.element(e);
      elements.add(outer ? extended(nodes, k * k) : nodes);
    }
    int[] start = new int[elements.size() + 1];
    int[] member = elements.stream().flatMapToInt(Arrays::stream).toArray();
    for (int e = 0; e < elements.size(); e++) {
      start[e + 1] = start[e] + elements.get(e).length;
    }
    int[] order = NestedDissection.of(k * k + 1, start, member, grid.x, grid.y);
    // with it go only the unknowns of the first cut
    assertThat(order[k * k]).isGreaterThan(k * k - 3 * k);
    long without = SymbolicCheck.fill(grid.matrix(), grid.order());
    long with = SymbolicCheck.fill(Grid.matrix(k * k + 1, start, member), order);
    assertThat(with - without).isLessThan(3L * k * k);
  }

  private static int[] extended(int[] nodes, int more) {
    int[] extended = Arrays.copyOf(nodes, nodes.length + 1);
    extended[nodes.length] = more;
    return extended;
  }

  @Test
  void parts_that_do_not_hang_together_do_not_fill_in_between() {
    Grid one = new Grid(30, 30, 1, 1);
    int n = 900;
    int elements = one.elements();
    int[] start = new int[2 * elements + 1];
    int[] member = new int[8 * elements];
    double[] x = new double[2 * elements];
    double[] y = new double[2 * elements];
    for (int e = 0; e < 2 * elements; e++) {
      start[e + 1] = 4 * (e + 1);
      for (int i = 0; i < 4; i++) {
        member[4 * e + i] = one.element(e / 2)[i] + e % 2 * n;
      }
      x[e] = one.x[e / 2];
      y[e] = one.y[e / 2] + e % 2 * 0.5;
    }
    SparseSymmetric two = Grid.matrix(2 * n, start, member);
    long fillOfOne = SymbolicCheck.fill(one.matrix(), one.order());
    for (double[] known : new double[][] {x, null}) {
      int[] order = NestedDissection.of(2 * n, start, member, known, known == null ? null : y);
      assertThat(SymbolicCheck.fill(two, order)).isLessThan(2 * fillOfOne * 5 / 4);
    }
  }

  @Test
  void without_coordinates_the_order_is_not_much_worse() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(24, 24), (x, y) -> 1.0);
    long with = SymbolicCheck.fill(problem.matrix, problem.order());
    int[] order =
        NestedDissection.of(problem.unknowns, problem.starts(), problem.nodes, null, null);
    assertThat(SymbolicCheck.fill(problem.matrix, order)).isLessThan(with * 3 / 2);
    long fromMatrix = SymbolicCheck.fill(problem.matrix, NestedDissection.of(problem.matrix));
    assertThat(fromMatrix).isLessThan(with * 2);
  }

  @Test
  void the_order_does_not_depend_on_the_number_of_threads() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(100, 90), (x, y) -> 1.0);
    ForkJoinPool one = new ForkJoinPool(1);
    ForkJoinPool four = new ForkJoinPool(4);
    try {
      assertThat(four.submit(problem::order).join()).isEqualTo(one.submit(problem::order).join());
    } finally {
      one.shutdown();
      four.shutdown();
    }
  }

  @Test
  void arrays_that_do_not_match_are_refused() {
    int[] start = {0, 2};
    int[] member = {0, 1};
    double[] one = {0};
    assertThatIllegalArgumentException()
        .isThrownBy(() -> NestedDissection.of(2, start, new int[1], one, one));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> NestedDissection.of(2, start, member, one, null));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> NestedDissection.of(2, start, member, one, new double[2]));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> NestedDissection.of(1, start, member, one, one))
        .withMessageContaining("unknown 1 of 1");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> NestedDissection.of(2, start, member, new double[] {Double.NaN}, one))
        .withMessageContaining("NaN");
  }

  /** Unknowns on a grid, elements the rectangles between them. */
  private static final class Grid {
    private final int across;
    private final int up;
    final double[] x;
    final double[] y;

    Grid(int across, int up, double dx, double dy) {
      this.across = across;
      this.up = up;
      x = new double[elements()];
      y = new double[elements()];
      for (int e = 0; e < x.length; e++) {
        x[e] = dx * (e % (across - 1));
        y[e] = dy * (e / (across - 1));
      }
    }

    int elements() {
      return (across - 1) * (up - 1);
    }

    int[] element(int e) {
      int first = e / (across - 1) * across + e % (across - 1);
      return new int[] {first, first + 1, first + across, first + across + 1};
    }

    private int[] starts() {
      int[] start = new int[elements() + 1];
      for (int e = 0; e < start.length; e++) {
        start[e] = 4 * e;
      }
      return start;
    }

    private int[] members() {
      int[] member = new int[4 * elements()];
      for (int e = 0; e < elements(); e++) {
        System.arraycopy(element(e), 0, member, 4 * e, 4);
      }
      return member;
    }

    int[] order() {
      return NestedDissection.of(across * up, starts(), members(), x, y);
    }

    SparseSymmetric matrix() {
      return matrix(across * up, starts(), members());
    }

    static SparseSymmetric matrix(int n, int[] start, int[] member) {
      List<int[]> pairs = new ArrayList<>();
      for (int e = 0; e < start.length - 1; e++) {
        for (int p = start[e]; p < start[e + 1]; p++) {
          for (int q = start[e]; q <= p; q++) {
            pairs.add(new int[] {member[p], member[q]});
          }
        }
      }
      int[] rows = pairs.stream().mapToInt(pair -> pair[0]).toArray();
      int[] columns = pairs.stream().mapToInt(pair -> pair[1]).toArray();
      double[] values = new double[rows.length];
      return SparseSymmetric.sum(n, rows, columns, values, rows.length);
    }
  }
}
