package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.ForkJoinPool;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.DMatrixSparseCSC;
import org.ejml.data.DMatrixSparseTriplet;
import org.ejml.interfaces.linsol.LinearSolverSparse;
import org.ejml.ops.DConvertMatrixStruct;
import org.ejml.sparse.FillReducing;
import org.ejml.sparse.csc.factory.LinearSolverFactory_DSCC;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Against the dense and sparse Cholesky factorisations of EJML. */
class MultifrontalCholeskyTest {
  private static MultifrontalCholesky factored(SparseSymmetric matrix) {
    return MultifrontalCholesky.factor(
        EliminationPlan.of(matrix, NestedDissection.of(matrix)), matrix);
  }

  private static double largest(double[] values) {
    return Arrays.stream(values).map(Math::abs).max().orElse(0);
  }

  private static void assertSame(double[] x, double[] reference, double relative) {
    double allowed = relative * largest(reference);
    for (int i = 0; i < x.length; i++) {
      assertThat(x[i]).isCloseTo(reference[i], within(allowed));
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 5, 17, 64, 65, 200, 500})
  void random_systems_are_solved_like_dense_ones(int n) {
    for (double perRow : new double[] {0.5, 2, 5, 40}) {
      Random random = new Random(n);
      SparseSymmetric matrix = RandomSystems.scattered(n, perRow, random);
      double[] b = RandomSystems.rightHandSide(n, random);
      MultifrontalCholesky.Solved solved = factored(matrix).solve(b)[0];
      assertSame(solved.x(), RandomSystems.denseSolution(matrix, b), 1e-11);
      assertThat(solved.relativeResidual()).isLessThan(1e-15);
      double scale = matrix.norm() * largest(solved.x()) + largest(b);
      assertThat(RandomSystems.denseResidual(matrix, b, solved.x()) / scale).isLessThan(1e-15);
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {1, 10, 100, 1000})
  void stretched_triangles_with_contrast_are_solved_like_by_the_sparse_library(double aspect) {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(
            QuadraticLaplacian.mapped(15, 14, s -> s, t -> t / aspect),
            (x, y) -> (int) (6 * x) % 2 == (int) (5 * aspect * y) % 2 ? 2.0 : 2e-4);
    double[] b = RandomSystems.rightHandSide(problem.unknowns, new Random(7));
    MultifrontalCholesky cholesky =
        MultifrontalCholesky.factor(
            EliminationPlan.of(problem.matrix, problem.order()), problem.matrix);
    MultifrontalCholesky.Solved solved = cholesky.solve(b)[0];
    assertThat(solved.relativeResidual()).isLessThan(1e-15);
    // the condition grows with the aspect: two factorisations agree in that many digits fewer
    assertSame(solved.x(), sparseSolution(problem.matrix, b), 1e-9 * aspect);
  }

  /** EJML's sparse Cholesky factorisation in the natural order. */
  private static double[] sparseSolution(SparseSymmetric matrix, double[] b) {
    int n = matrix.unknowns();
    DMatrixSparseTriplet triplets = new DMatrixSparseTriplet(n, n, 2 * matrix.entries());
    for (int c = 0; c < n; c++) {
      for (int p = matrix.start(c); p < matrix.start(c + 1); p++) {
        triplets.addItem(matrix.row(p), c, matrix.value(p));
        if (matrix.row(p) != c) {
          triplets.addItem(c, matrix.row(p), matrix.value(p));
        }
      }
    }
    LinearSolverSparse<DMatrixSparseCSC, DMatrixRMaj> solver =
        LinearSolverFactory_DSCC.cholesky(FillReducing.NONE);
    assertThat(solver.setA(DConvertMatrixStruct.convert(triplets, (DMatrixSparseCSC) null)))
        .isTrue();
    DMatrixRMaj x = new DMatrixRMaj(n, 1);
    solver.solve(new DMatrixRMaj(n, 1, true, b), x);
    return x.data;
  }

  /** Conduction through a slab: u = 1 + (1 + y) over the film of conductance 1 below, flux 1. */
  @Test
  void a_large_system_that_is_shared_out_gives_the_exact_linear_solution() {
    int m = 100;
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(m, m), (x, y) -> 0.5);
    EliminationPlan plan = EliminationPlan.of(problem.matrix, problem.order());
    assertThat(plan.units().count()).isGreaterThan(1);
    double[] exact = new double[problem.unknowns];
    double[] b = new double[problem.unknowns];
    for (int e = 0; e < problem.centreX.length; e++) {
      for (int i = 0; i < 6; i++) {
        int node = problem.nodes[6 * e + i];
        double y = problem.nodeY(e, i);
        exact[node] = 1 + 2 * y;
      }
    }
    // flux 1 enters the upper edge: weights 1/6, 4/6, 1/6 of each edge
    problem.forEachUpperEdge(
        (first, second, middle) -> {
          b[first] += 1.0 / 6 / m;
          b[second] += 1.0 / 6 / m;
          b[middle] += 4.0 / 6 / m;
        });
    MultifrontalCholesky.Solved solved =
        MultifrontalCholesky.factor(plan, problem.matrix).solve(b)[0];
    assertSame(solved.x(), exact, 1e-11);
  }

  @Test
  void several_right_hand_sides_give_the_same_bits_as_one_at_a_time() {
    Random random = new Random(21);
    SparseSymmetric matrix = RandomSystems.scattered(300, 4, random);
    double[][] b = new double[5][];
    for (int k = 0; k < 5; k++) {
      b[k] = RandomSystems.rightHandSide(300, random);
    }
    MultifrontalCholesky cholesky = factored(matrix);
    MultifrontalCholesky.Solved[] together = cholesky.solve(b);
    for (int k = 0; k < 5; k++) {
      assertThat(together[k].x()).isEqualTo(cholesky.solve(b[k])[0].x());
      assertSame(together[k].x(), RandomSystems.denseSolution(matrix, b[k]), 1e-11);
    }
    assertThat(cholesky.solve()).isEmpty();
  }

  @Test
  void the_numbers_do_not_depend_on_the_number_of_threads() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(
            QuadraticLaplacian.square(120, 100), (x, y) -> x + y > 1 ? 1.0 : 1e-4);
    assertSameBits(problem.matrix, EliminationPlan.of(problem.matrix, problem.order()));
    SparseSymmetric nearlyFull = RandomSystems.scattered(800, 300, new Random(9));
    assertSameBits(nearlyFull, EliminationPlan.of(nearlyFull, NestedDissection.of(nearlyFull)));
  }

  private static void assertSameBits(SparseSymmetric matrix, EliminationPlan plan) {
    double[] b = RandomSystems.rightHandSide(matrix.unknowns(), new Random(8));
    double[] first = null;
    for (int threads = 1; threads <= 4; threads++) {
      ForkJoinPool pool = new ForkJoinPool(threads);
      try {
        double[] x =
            pool.submit(() -> MultifrontalCholesky.factor(plan, matrix).substitute(b)[0]).join();
        first = first == null ? x : first;
        assertThat(x).isEqualTo(first);
      } finally {
        pool.shutdown();
      }
    }
  }

  @Test
  void two_systems_are_solved_at_the_same_time_as_one_after_the_other() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(100, 90), (x, y) -> 1.0 + x);
    double[] b = RandomSystems.rightHandSide(problem.unknowns, new Random(10));
    List<double[]> together =
        IntStream.range(0, 2)
            .mapToObj(k -> CompletableFuture.supplyAsync(() -> solution(problem, b)))
            .toList()
            .stream()
            .map(CompletableFuture::join)
            .toList();
    double[] alone = solution(problem, b);
    assertThat(together.get(0)).isEqualTo(alone);
    assertThat(together.get(1)).isEqualTo(alone);
  }

  private static double[] solution(QuadraticLaplacian problem, double[] b) {
    EliminationPlan plan = EliminationPlan.of(problem.matrix, problem.order());
    return MultifrontalCholesky.factor(plan, problem.matrix).solve(b)[0].x();
  }

  /** In its natural order a band makes one long branch of fronts. */
  @Test
  void a_long_band_in_its_natural_order_is_solved() {
    int n = 12_000;
    int half = 60;
    int[] start = new int[n + 1];
    int[] row = new int[n * (half + 1)];
    double[] value = new double[row.length];
    double[] b = new double[n];
    int count = 0;
    for (int c = 0; c < n; c++) {
      for (int r = Math.max(0, c - half); r <= c; r++) {
        row[count] = r;
        double v = r == c ? 2.0 * half + 1 : -1;
        value[count++] = v;
        b[r] += v;
        b[c] += r == c ? 0 : v;
      }
      start[c + 1] = count;
    }
    SparseSymmetric matrix = SparseSymmetric.of(start, row, value);
    int[] natural = IntStream.range(0, n).toArray();
    EliminationPlan plan = EliminationPlan.of(matrix, natural);
    double[] x = MultifrontalCholesky.factor(plan, matrix).substitute(b)[0];
    for (double one : x) {
      assertThat(one).isCloseTo(1, within(1e-12));
    }
  }

  @Test
  void a_great_many_unknowns_that_stand_alone_are_solved() {
    int n = 30_000;
    int[] at = IntStream.range(0, n).toArray();
    double[] value = new double[n];
    Arrays.setAll(value, i -> 1 + i);
    SparseSymmetric matrix = SparseSymmetric.sum(n, at, at, value, n);
    double[] x = factored(matrix).substitute(value)[0];
    for (double one : x) {
      assertThat(one).isCloseTo(1, within(1e-15));
    }
  }

  @Test
  void a_plan_serves_every_matrix_with_the_same_places() {
    Random random = new Random(31);
    SparseSymmetric first = RandomSystems.scattered(200, 5, random);
    EliminationPlan plan = EliminationPlan.of(first, NestedDissection.of(first));
    double[] doubled = Arrays.stream(first.values()).map(v -> 2 * v).toArray();
    SparseSymmetric second = first.withValues(doubled);
    double[] b = RandomSystems.rightHandSide(200, random);
    double[] x = MultifrontalCholesky.factor(plan, first).substitute(b)[0];
    double[] half = MultifrontalCholesky.factor(plan, second).substitute(b)[0];
    assertSame(Arrays.stream(half).map(v -> 2 * v).toArray(), x, 1e-13);
    SparseSymmetric other = RandomSystems.scattered(200, 5, random);
    assertThatIllegalArgumentException().isThrownBy(() -> MultifrontalCholesky.factor(plan, other));
  }

  @Test
  void rows_coupled_to_nearly_everything_are_no_trouble() {
    Random random = new Random(41);
    int n = 400;
    int[] rows = new int[4 * n];
    int[] columns = new int[4 * n];
    double[] values = new double[4 * n];
    int count = 0;
    for (int i = 0; i < n; i++) {
      rows[count] = i;
      columns[count] = i;
      values[count++] = i < 2 ? 3 * n : 6 + random.nextDouble();
      for (int dense = 0; dense < 2; dense++) {
        if (i > 1 && random.nextDouble() < 0.9) {
          rows[count] = dense;
          columns[count] = i;
          values[count++] = -1;
        }
      }
    }
    SparseSymmetric matrix = SparseSymmetric.sum(n, rows, columns, values, count);
    int[] order = NestedDissection.of(matrix);
    assertThat(Math.min(order[0], order[1])).isGreaterThan(n / 2);
    double[] b = RandomSystems.rightHandSide(n, random);
    assertSame(factored(matrix).solve(b)[0].x(), RandomSystems.denseSolution(matrix, b), 1e-12);
    assertThat(EliminationPlan.of(matrix, order).factorEntries()).isLessThan(12L * n);
  }

  @Test
  void a_matrix_that_is_not_positive_definite_is_refused_with_the_unknown() {
    Random random = new Random(51);
    for (int k = 0; k < 20; k++) {
      SparseSymmetric good = RandomSystems.scattered(120, 3, random);
      int bad = random.nextInt(120);
      double[] values = good.values().clone();
      values[good.start(bad + 1) - 1] = k % 2 == 0 ? -1 : Double.NaN;
      SparseSymmetric matrix = good.withValues(values);
      // eliminated first, the unknown is the one that is named
      int[] order = EliminationTreeTest.shuffled(120, random);
      for (int u = 0; u < 120; u++) {
        order[u] = order[u] == 0 ? order[bad] : order[u];
      }
      order[bad] = 0;
      EliminationPlan plan = EliminationPlan.of(matrix, order);
      assertThatExceptionOfType(NotPositiveDefiniteException.class)
          .isThrownBy(() -> MultifrontalCholesky.factor(plan, matrix))
          .satisfies(e -> assertThat(e.unknown()).isEqualTo(bad))
          .satisfies(e -> assertThat(e.pivot() > 0).isFalse())
          .withMessageContaining("unknown " + bad + " of 120");
    }
  }

  @Test
  void an_entry_that_is_not_a_number_is_found_wherever_it_stands() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(110, 100), (x, y) -> 1.0);
    EliminationPlan plan = EliminationPlan.of(problem.matrix, problem.order());
    Random random = new Random(61);
    for (int k = 0; k < 6; k++) {
      double[] values = problem.matrix.values().clone();
      values[random.nextInt(problem.matrix.entries())] = Double.NaN;
      assertThatExceptionOfType(NotPositiveDefiniteException.class)
          .isThrownBy(() -> MultifrontalCholesky.factor(plan, problem.matrix.withValues(values)))
          .satisfies(e -> assertThat(e.pivot()).isNaN());
    }
  }

  @Test
  void a_singular_matrix_is_refused_or_shows_in_its_smallest_pivot() {
    // two blocks, one with a film, the other held by nothing
    int n = 50;
    int[] rows = new int[3 * n];
    int[] columns = new int[3 * n];
    double[] values = new double[3 * n];
    int count = 0;
    for (int i = 0; i + 1 < n; i++) {
      int[] pair = {i, i + 1};
      if (i + 1 != n / 2) {
        rows[count] = pair[0];
        columns[count] = pair[1];
        values[count++] = -1.1;
        for (int end : pair) {
          rows[count] = end;
          columns[count] = end;
          values[count++] = 1.1;
        }
      }
    }
    int film = count;
    rows[count] = 0;
    columns[count] = 0;
    values[count++] = 0.3;
    SparseSymmetric singular = SparseSymmetric.sum(n, rows, columns, values, count);
    rows[count] = n - 1;
    columns[count] = n - 1;
    values[count++] = values[film];
    SparseSymmetric held = SparseSymmetric.sum(n, rows, columns, values, count);
    assertThat(factored(held).smallestPivotShare()).isGreaterThan(1e-3);
    try {
      assertThat(factored(singular).smallestPivotShare()).isLessThan(1e-14);
    } catch (NotPositiveDefiniteException e) {
      assertThat(e.pivot()).isLessThanOrEqualTo(0);
    }
  }

  @Test
  void orders_and_right_hand_sides_that_do_not_fit_are_refused() {
    SparseSymmetric matrix = RandomSystems.scattered(4, 2, new Random(71));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> EliminationPlan.of(matrix, new int[] {0, 1, 2}));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> EliminationPlan.of(matrix, new int[] {0, 1, 2, 2}));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> EliminationPlan.of(matrix, new int[] {0, 1, 2, 4}));
    MultifrontalCholesky cholesky = factored(matrix);
    assertThatIllegalArgumentException().isThrownBy(() -> cholesky.substitute(new double[3]));
  }

  @Test
  void the_plan_counts_the_entries_of_the_factor() {
    Random random = new Random(81);
    SparseSymmetric matrix = RandomSystems.scattered(250, 4, random);
    int[] order = NestedDissection.of(matrix);
    EliminationPlan plan = EliminationPlan.of(matrix, order);
    long fill = SymbolicCheck.fill(matrix, order);
    assertThat(plan.factorEntries()).isBetween(fill, 3 * fill);
    assertThat(plan.unknowns()).isEqualTo(250);
  }
}
