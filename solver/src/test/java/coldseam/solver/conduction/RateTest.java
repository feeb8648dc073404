package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.detail.Space;
import org.apache.commons.math3.stat.regression.SimpleRegression;
import org.junit.jupiter.api.Test;

/**
 * Quadratic elements on meshes that suit the solution lose energy like unknowns^−2, whatever the
 * corners (Binev, Dahmen and DeVore 2004; Stevenson 2007); on uniform meshes an L-corner would
 * leave unknowns^−0.67.
 */
class RateTest {
  /** Exact: conformal map; see {@link ExactCasesTest}. */
  @Test
  void cornerConvergesAtTheBestRate() {
    Space inside = space("indoors", 1, 0);
    Space outside = space("outdoors", 0, 0);
    Sketch corner =
        new Sketch()
            .know(inside)
            .know(outside)
            .polygon(material("stone", 1), 0, 0, 5, 0, 5, 1, 1, 1, 1, 5, 0, 5)
            .facing(inside, 5, 1, 1, 1, 1, 5)
            .facing(outside, 0, 5, 0, 0, 5, 0);
    check(corner, 9 - 2 * Math.log(2) / Math.PI, new double[] {1e-4, 3e-5, 1e-5, 3e-6, 1e-6});
  }

  /** Exact: Keller 1964, Dykhne 1970; θ ~ r^0.41 at the centre. */
  @Test
  void checkerboardConvergesAtTheBestRate() {
    check(ExactCasesTest.checkerboard(1, 9), 3, new double[] {1e-3, 3e-4, 1e-4, 3e-5, 1e-5});
  }

  /**
   * θ ~ r^0.179: triangles of the smallest size there are, 1e-12 of the section, still hold 4e-5 of
   * the energy; down to there the rate is the best.
   */
  @Test
  void strongCheckerboardConvergesAtTheBestRate() {
    check(
        ExactCasesTest.checkerboard(0.04, 2),
        Math.sqrt(0.08),
        new double[] {3e-2, 1e-2, 5e-3, 2e-3});
  }

  private static void check(Sketch sketch, double exact, double[] accuracies) {
    SimpleRegression line = new SimpleRegression();
    for (double accuracy : accuracies) {
      Solution solution = sketch.accuracy(accuracy).solve();
      Quantity coupling = solution.coupling(new int[] {0}, new int[] {1});
      assertThat(Math.abs(coupling.value() - exact)).isLessThan(coupling.halfWidth());
      assertThat(coupling.halfWidth()).isLessThan(accuracy * exact);
      line.addData(Math.log(solution.unknowns()), Math.log(coupling.halfWidth()));
    }
    assertThat(line.getSlope()).isLessThan(-1.8);
  }
}
