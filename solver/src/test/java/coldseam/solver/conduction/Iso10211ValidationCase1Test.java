package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;

/**
 * ISO 10211:2017, annex C (annex A of earlier editions), case 1: half of a square column, its top
 * face at 20 °C, the other faces at 0 °C, λ of no influence. One-decimal temperatures of the
 * standard *from memory*; each equals the rounded sum of the exact series.
 */
class Iso10211ValidationCase1Test {
  private static final double[][] PUBLISHED = {
    {9.7, 13.4, 14.7, 15.1},
    {5.3, 8.6, 10.3, 10.8},
    {3.2, 5.6, 7.0, 7.5},
    {2.0, 3.6, 4.7, 5.0},
    {1.3, 2.3, 3.0, 3.2},
    {0.7, 1.4, 1.8, 1.9},
    {0.3, 0.6, 0.8, 0.9}
  };

  /** Exact: T = 80/π Σ sin(nπx) sinh(nπy)/(n sinh nπ), n odd, y from the cold face opposite. */
  private static double series(double x, double y) {
    double sum = 0;
    for (int n = 1; n < 400; n += 2) {
      double k = n * Math.PI;
      double ratio = Math.exp(k * (y - 1)) * (1 - Math.exp(-2 * k * y)) / (1 - Math.exp(-2 * k));
      sum += Math.sin(k * x) / n * ratio;
    }
    return 80 / Math.PI * sum;
  }

  private static Sketch halfColumn() {
    Space hot = space("hot", 20, 0);
    Space cold = space("cold", 0, 0);
    return new Sketch()
        .know(hot)
        .know(cold)
        .box(material("column", 1), 0, 0, 0.5, 1)
        .facing(hot, 0, 1, 0.5, 1)
        .facing(cold, 0, 1, 0, 0, 0.5, 0);
  }

  @Test
  void temperaturesAgreeAtAllTwentyEightPoints() {
    Solution solution = halfColumn().solve();
    TemperatureField field = solution.temperatures(new double[] {20, 0});

    for (int row = 1; row <= 7; row++) {
      for (int column = 1; column <= 4; column++) {
        double x = column / 8.0;
        double y = 1 - row / 8.0;
        double found = field.at(new Point(x, y));
        assertThat(found)
            .as("row %d, column %d", row, column)
            .isCloseTo(series(x, y), within(0.005))
            .isCloseTo(PUBLISHED[row - 1][column - 1], within(0.05 + 0.005));
      }
    }
    assertThat(field.at(new Point(0.5, 0.5))).isCloseTo(5, within(0.005));
  }

  @Test
  void theHeatFlowIsInfiniteAndSaidToBe() {
    Solution solution = halfColumn().solve();

    Quantity coupling = solution.coupling(new int[] {0}, new int[] {1});

    assertThat(coupling.value()).isInfinite();
    assertThat(coupling.certified()).isFalse();
    assertThat(coupling.halfWidth()).isInfinite();
    assertThat(((Certificate.NotCertified) coupling.certificate()).reason())
        .contains("fixed temperatures meet in a point");
    assertThat(solution.matrix(0, 0)).isEqualTo(Double.POSITIVE_INFINITY);
    assertThat(solution.matrix(0, 1)).isEqualTo(Double.NEGATIVE_INFINITY);
    assertThat(solution.spaceFlow(0, new double[] {20, 0})).isEqualTo(Double.POSITIVE_INFINITY);
    assertThat(solution.spaceFlow(1, new double[] {20, 0})).isEqualTo(Double.NEGATIVE_INFINITY);
    assertThat(solution.spaceFlow(0, new double[] {7, 7})).isZero();
  }

  /** A third space that meets neither of the two in a point keeps finite couplings. */
  @Test
  void couplingsAwayFromTheMeetingPointStayFinite() {
    Space hot = space("hot", 20, 0);
    Space cold = space("cold", 0, 0);
    Space room = space("room", 10, 0.1);
    Solution solution =
        new Sketch()
            .know(hot)
            .know(cold)
            .know(room)
            .box(material("column", 1), 0, 0, 0.5, 1)
            .facing(hot, 0, 1, 0.5, 1)
            .facing(cold, 0, 1, 0, 0)
            .facing(room, 0.2, 0, 0.5, 0)
            .solve();

    assertThat(solution.matrix(0, 1)).isEqualTo(Double.NEGATIVE_INFINITY);
    assertThat(solution.matrix(0, 2)).isBetween(-1.0, -0.01);
    assertThat(solution.matrix(1, 2)).isBetween(-5.0, -0.01);
    assertThat(solution.matrix(2, 2))
        .isCloseTo(-solution.matrix(0, 2) - solution.matrix(1, 2), within(1e-9));
    assertThat(solution.coupling(new int[] {2}, new int[] {0, 1}).value())
        .isCloseTo(solution.matrix(2, 2), within(1e-9));
  }
}
