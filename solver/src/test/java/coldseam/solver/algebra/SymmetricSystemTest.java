package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;
import org.junit.jupiter.api.Test;

class SymmetricSystemTest {
  /** The same sums solved by the dense LU of commons-math. */
  @Test
  void agreesWithADenseSolver() {
    Random random = new Random(20260301);
    for (int trial = 0; trial < 20; trial++) {
      int n = 1 + random.nextInt(40);
      int count = n + random.nextInt(6 * n);
      int[] rows = new int[count];
      int[] columns = new int[count];
      double[] values = new double[count];
      double[][] dense = new double[n][n];
      for (int i = 0; i < count; i++) {
        rows[i] = i < n ? i : random.nextInt(n);
        columns[i] = i < n ? i : random.nextInt(n);
        values[i] = i < n ? 7 : random.nextDouble() - 0.5;
        if (i < n) {
          dense[i][i] += 7;
        } else if (rows[i] == columns[i]) {
          dense[rows[i]][rows[i]] += values[i];
        } else {
          dense[rows[i]][columns[i]] += values[i];
          dense[columns[i]][rows[i]] += values[i];
        }
      }
      double[] b = random.doubles(n).toArray();

      SymmetricSystem.Solved solved =
          SymmetricSystem.factor(n, rows, columns, values, count).solve(b);

      double[] expected =
          new LUDecomposition(new Array2DRowRealMatrix(dense))
              .getSolver()
              .solve(new ArrayRealVector(b))
              .toArray();
      assertThat(solved.x())
          .as("trial %d, n %d", trial, n)
          .containsExactly(expected, within(1e-13));
      assertThat(solved.relativeResidual()).isLessThan(1e-15);
    }
  }

  /** Stiffness 10^6 apart along one chain, as in a foil; its condition number is about 10^12. */
  @Test
  void keepsTheResidualAtRoundingLevel() {
    int n = 2000;
    int[] rows = new int[2 * n];
    int[] columns = new int[2 * n];
    double[] values = new double[2 * n];
    double[] expected = new double[n];
    double[] b = new double[n];
    double[] link = new double[n + 1];
    for (int i = 0; i <= n; i++) {
      link[i] = i % 2 == 0 ? 1e6 : 1;
    }
    int count = 0;
    for (int i = 0; i < n; i++) {
      expected[i] = 20 + Math.sin(i * 0.01);
      rows[count] = i;
      columns[count] = i;
      values[count++] = link[i] + link[i + 1];
      if (i > 0) {
        rows[count] = i;
        columns[count] = i - 1;
        values[count++] = -link[i];
      }
    }
    for (int i = 0; i < n; i++) {
      b[i] = (link[i] + link[i + 1]) * expected[i];
      b[i] -= i > 0 ? link[i] * expected[i - 1] : 0;
      b[i] -= i < n - 1 ? link[i + 1] * expected[i + 1] : 0;
    }

    SymmetricSystem.Solved solved =
        SymmetricSystem.factor(n, rows, columns, values, count).solve(b);

    assertThat(solved.relativeResidual()).isLessThan(4e-16);
    assertThat(solved.x()).containsExactly(expected, within(1e-3));
  }

  @Test
  void refusesAMatrixThatIsNotPositiveDefinite() {
    assertThatThrownBy(
            () ->
                SymmetricSystem.factor(
                    2, new int[] {0, 1, 1}, new int[] {0, 1, 0}, new double[] {1, 1, 2}, 3))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("cannot be eliminated, its pivot is -3");
  }

  @Test
  void refusesNumbersThatAreNotFinite() {
    for (double bad : new double[] {Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThatThrownBy(
              () ->
                  SymmetricSystem.factor(
                      2, new int[] {0, 1, 1}, new int[] {0, 1, 0}, new double[] {1, bad, 0.5}, 3))
          .isInstanceOf(IllegalStateException.class);
    }
  }

  @Test
  void refusesAnUnknownWithoutAnEntry() {
    assertThatThrownBy(
            () -> SymmetricSystem.factor(2, new int[] {0}, new int[] {0}, new double[] {1}, 1))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("unknown 1 has no entry of its own");
  }

  /** Front by front the same numbers come out as row by row by EJML: materials 10⁴ apart. */
  @Test
  void solvesALargeSystemAsEjmlDoes() {
    QuadraticLaplacian section =
        new QuadraticLaplacian(
            QuadraticLaplacian.square(60, 60), (x, y) -> Math.floor(10 * x) % 2 == 0 ? 200 : 0.02);
    assertThat(section.unknowns).isGreaterThan(SymmetricSystem.LARGE);
    SparseSymmetric matrix = ordered(section);
    double[] b = new Random(20260406).doubles(section.unknowns).toArray();

    SymmetricSystem.Solved solved = SymmetricSystem.factor(matrix).solve(b);

    double[] expected = UpLookingCholesky.of(matrix).substitute(b)[0];
    double largest = 0;
    double difference = 0;
    for (int i = 0; i < expected.length; i++) {
      largest = Math.max(largest, Math.abs(expected[i]));
      difference = Math.max(difference, Math.abs(solved.x()[i] - expected[i]));
    }
    assertThat(difference / largest).isLessThan(1e-8);
    assertThat(solved.relativeResidual()).isLessThan(1e-15);
  }

  private static SparseSymmetric ordered(QuadraticLaplacian section) {
    boolean[] all = new boolean[section.unknowns];
    Arrays.fill(all, true);
    int[] place = FillReducingOrder.of(all, section.nodes, 6, section.centreX, section.centreY);
    SparseSymmetric from = section.matrix;
    int[] rows = new int[from.entries()];
    int[] columns = new int[from.entries()];
    for (int c = 0; c < section.unknowns; c++) {
      for (int p = from.start(c); p < from.start(c + 1); p++) {
        rows[p] = place[from.row(p)];
        columns[p] = place[c];
      }
    }
    return SparseSymmetric.sum(section.unknowns, rows, columns, from.values(), rows.length);
  }

  @Test
  void refusesALargeMatrixThatIsNotPositiveDefinite() {
    int n = SymmetricSystem.LARGE;
    EntryList entries = new EntryList();
    int[] member = new int[n];
    for (int u = 0; u < n; u++) {
      member[u] = u;
    }
    SparseSymmetric matrix = ElementSum.of(n, 1, member, (u, p, q) -> u == n / 2 ? -1 : 1, entries);

    assertThatThrownBy(() -> SymmetricSystem.factor(matrix))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("unknown " + n / 2);
  }
}
