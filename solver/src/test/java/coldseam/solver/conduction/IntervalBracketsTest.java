package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.orthotropic;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.stat.regression.SimpleRegression;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * On every mesh of the adaptive history the interval holds the exact value, bounds of later passes
 * lie within those of earlier ones, and the two ways to the gap agree. Sources stand with each
 * case; where the reference has limited digits their last place is allowed for.
 */
class IntervalBracketsTest {
  private static final Space ONE = space("one", 1, 0);
  private static final Space ZERO = space("zero", 0, 0);

  /** Rounding of the nested bounds, relative. */
  private static final double NESTED = 1e-11;

  private static List<AdaptiveLoop.Proved> history(Sketch sketch) {
    return ((FieldSolution) sketch.solve()).proved();
  }

  /**
   * Histories to the accuracy asked for and to coarser ones: a run takes but two or three passes.
   */
  private static List<List<AdaptiveLoop.Proved>> histories(Sketch sketch, double... times) {
    double finest = sketch.goal().accuracy().couplingRelative();
    List<List<AdaptiveLoop.Proved>> histories = new ArrayList<>();
    for (double each : times) {
      histories.add(history(sketch.accuracy(each * finest)));
    }
    return histories;
  }

  private static void holds(Sketch sketch, double exact, double lastPlace) {
    int meshes = 0;
    for (List<AdaptiveLoop.Proved> history : histories(sketch, 100, 10, 1)) {
      holds(history, exact, lastPlace);
      meshes += history.size();
    }
    assertThat(meshes).isGreaterThan(4);
  }

  private static void holds(List<AdaptiveLoop.Proved> history, double exact, double lastPlace) {
    double up = Double.POSITIVE_INFINITY;
    double lo = Double.NEGATIVE_INFINITY;
    for (AdaptiveLoop.Proved pass : history) {
      assertThat(exact).isBetween(pass.lo()[0][0] - lastPlace, pass.up()[0][0] + lastPlace);
      assertThat(pass.up()[0][0]).isLessThanOrEqualTo(up * (1 + NESTED));
      assertThat(pass.lo()[0][0]).isGreaterThanOrEqualTo(lo - NESTED * Math.abs(lo));
      up = pass.up()[0][0];
      lo = pass.lo()[0][0];
    }
  }

  private static Sketch corner(double d1, double d2, double l1, double l2, Material material) {
    return new Sketch()
        .accuracy(1e-5)
        .know(ONE)
        .know(ZERO)
        .polygon(material, 0, 0, d2 + l1, 0, d2 + l1, d1, d2, d1, d2, d1 + l2, 0, d1 + l2)
        .facing(ONE, d2 + l1, d1, d2, d1, d2, d1 + l2)
        .facing(ZERO, 0, d1 + l2, 0, 0, d2 + l1, 0);
  }

  /** Exact: conformal map; adiabatic ends of arms of 5 thicknesses change less than 1e-13. */
  @ParameterizedTest
  @ValueSource(doubles = {1, 1.5, 2, 3, 4})
  void isothermal_corner(double rho) {
    holds(
        corner(rho, 1, 5 * rho, 5, material("stone", 1)),
        10 + ExactCasesTest.cornerTerm(rho),
        1e-9);
  }

  /** Exact by scaling of the axes: l1 + 4 l2 + 2 c(2) for λx 4, λy 1. */
  @Test
  void orthotropic_corner() {
    // the arm along x conducts across itself, along y, with 1; the other with 4
    double exact = 6 + 4 * 6 + 2 * ExactCasesTest.cornerTerm(2);
    holds(corner(1, 1, 6, 6, orthotropic("wood", 4, 1, 0)), exact, 1e-6);
  }

  /** Exact: Keller 1964, Dykhne 1970. */
  @ParameterizedTest
  @CsvSource({"1, 4, 1e-4", "1, 9, 1e-4", "0.04, 2.0, 2e-3"})
  void checkerboard(double a, double b, double accuracy) {
    holds(ExactCasesTest.checkerboard(a, b).accuracy(accuracy), Math.sqrt(a * b), 1e-12);
  }

  /** Exact: the affine map to isotropy makes a rhombus, conductance √(k1 k2) = 1. */
  @Test
  void rotated_tensor() {
    double width = Math.sqrt(1.625 / 0.875);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-5)
            .know(ONE)
            .know(ZERO)
            .box(orthotropic("wood", 2, 0.5, Math.PI / 6), 0, 0, width, 1)
            .facing(ZERO, 0, 0, width, 0)
            .facing(ONE, 0, 1, width, 1);
    holds(sketch, 1, 1e-12);
  }

  /** Computed: elements of degree 8 graded to the corner, eight digits stable. */
  @ParameterizedTest
  @CsvSource({"0.13, 4.07021518", "0.25, 3.49577114"})
  void corner_with_films(double rsi, double expected) {
    Space inside = space("indoors", 1, rsi);
    Space outside = space("outdoors", 0, 0.04);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-5)
            .know(inside)
            .know(outside)
            .polygon(material("block", 0.5), 0, 0, 1.8, 0, 1.8, 0.3, 0.3, 0.3, 0.3, 1.8, 0, 1.8)
            .facing(inside, 1.8, 0.3, 0.3, 0.3, 0.3, 1.8)
            .facing(outside, 0, 1.8, 0, 0, 1.8, 0);
    holds(sketch, expected, 5e-9);
  }

  /** Exact series of a fin on an isothermal base, seven digits. */
  @ParameterizedTest
  @CsvSource({"0.3, 3.935739", "1.2, 3.963056"})
  void fin(double length, double flow) {
    Space air = space("air", 0, 0.04);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-5)
            .know(ONE)
            .know(air)
            .box(material("fin", 2), 0, -0.1, length, 0.1)
            .facing(ONE, 0, -0.1, 0, 0.1)
            .facing(air, 0, 0.1, length, 0.1)
            .facing(air, 0, -0.1, length, -0.1);
    holds(sketch, flow, 5e-7);
  }

  private static double radius(double r, int corners, boolean around) {
    return around ? r / Math.cos(Math.PI / corners) : r;
  }

  /**
   * Exact: bipolar coordinates. The conductance grows with the inner body and shrinks with the
   * outer rim: polygons inscribed and circumscribed bracket the circles.
   */
  @ParameterizedTest
  @CsvSource({"1, 3, 1", "0.05, 0.2, 0.1", "1, 2, 0"})
  void eccentric_cylinders(double r1, double r2, double e) {
    double q = (r1 * r1 + r2 * r2 - e * e) / (2 * r1 * r2);
    double exact = 2 * Math.PI / Math.log(q + Math.sqrt(q * q - 1));
    double[] bracket = new double[2];
    for (boolean more : new boolean[] {false, true}) {
      int n = 120;
      Sketch sketch =
          new Sketch()
              .accuracy(1e-4)
              .know(ONE)
              .know(ZERO)
              .box(ZERO, -2 * r2, -2 * r2, 2 * r2, 2 * r2)
              .disc(material("shell", 1), 0, 0, radius(r2, n, !more), n)
              .disc(ONE, e, 0, radius(r1, n, more), n);
      List<AdaptiveLoop.Proved> history = history(sketch);
      for (AdaptiveLoop.Proved pass : history) {
        if (more) {
          assertThat(pass.up()[0][0]).isGreaterThan(exact);
          bracket[1] = pass.up()[0][0];
        } else {
          assertThat(pass.lo()[0][0]).isLessThan(exact);
          bracket[0] = pass.lo()[0][0];
        }
      }
    }
    assertThat(bracket[1] - bracket[0]).isLessThan(0.005 * exact);
  }

  /**
   * Rayleigh 1892: square array of cylinders, area fraction 0.2, conductivity 10 in 1; conductance
   * 1.39145767. More of the better conductor conducts more: polygons bracket the circle.
   */
  @Test
  void array_of_cylinders() {
    double r = Math.sqrt(0.2 / Math.PI);
    for (boolean more : new boolean[] {false, true}) {
      Sketch sketch =
          new Sketch()
              .accuracy(1e-4)
              .know(ONE)
              .know(ZERO)
              .box(material("matrix", 1), -0.5, -0.5, 0.5, 0.5)
              .disc(material("cylinder", 10), 0, 0, radius(r, 90, more), 90)
              .facing(ONE, -0.5, -0.5, -0.5, 0.5)
              .facing(ZERO, 0.5, -0.5, 0.5, 0.5);
      for (AdaptiveLoop.Proved pass : history(sketch)) {
        if (more) {
          assertThat(pass.up()[0][0]).isGreaterThan(1.39145767);
        } else {
          assertThat(pass.lo()[0][0]).isLessThan(1.39145767);
        }
      }
    }
  }

  /** Exact: strip on a half plane, 2K(k)/K(k′); the outer rim adiabatic or at 0 brackets it. */
  @Test
  void strip_on_a_half_plane() {
    double exact = 1.563401923;
    double far = 200;
    for (boolean open : new boolean[] {false, true}) {
      Sketch sketch =
          new Sketch()
              .accuracy(1e-5)
              .know(ONE)
              .know(ZERO)
              .box(material("ground", 1), -far, -far, far, 0)
              .facing(ONE, -1, 0, 1, 0)
              .facing(ZERO, -far, 0, -2, 0)
              .facing(ZERO, 2, 0, far, 0);
      if (open) {
        sketch.facing(ZERO, -far, 0, -far, -far, far, -far, far, 0);
      }
      List<AdaptiveLoop.Proved> history = history(sketch);
      for (AdaptiveLoop.Proved pass : history) {
        if (open) {
          assertThat(pass.up()[0][0]).isGreaterThan(exact);
        } else {
          assertThat(pass.lo()[0][0]).isLessThan(exact);
        }
      }
      AdaptiveLoop.Proved last = history.get(history.size() - 1);
      assertThat((last.up()[0][0] + last.lo()[0][0]) / 2).isBetween(exact - 2e-4, exact + 2e-4);
    }
  }

  /** Computed, seven digits: external wall with a partition, three spaces; each entry of A. */
  @Test
  void three_spaces() {
    Space out = space("outdoors", 0, 0.04);
    Space a = space("room a", 20, 0.13);
    Space b = space("room b", 15, 0.13);
    Material masonry = material("masonry", 1.0);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-5)
            .know(out)
            .know(a)
            .know(b)
            .box(material("insulation", 0.04), 0, 0, 3, 0.1)
            .box(masonry, 0, 0.1, 3, 0.3)
            .box(masonry, 1.4, 0.3, 1.6, 1.8)
            .facing(out, 0, 0, 3, 0)
            .facing(a, 0, 0.3, 1.4, 0.3, 1.4, 1.8)
            .facing(b, 1.6, 1.8, 1.6, 0.3, 3, 0.3);
    double[][] exact = {
      {1.0454106, -0.5227053, -0.5227053},
      {-0.5227053, 4.0696791, -3.5469738},
      {-0.5227053, -3.5469738, 4.0696791}
    };
    for (AdaptiveLoop.Proved pass : history(sketch)) {
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double middle = (pass.up()[i][j] + pass.lo()[i][j]) / 2;
          double half = Math.sqrt(pass.gap()[i][i] * pass.gap()[j][j]) / 2;
          assertThat(Math.abs(exact[i][j] - middle)).isLessThan(half + 1.5e-7);
        }
      }
    }
  }

  /**
   * Gap against unknowns over the last decade, of runs to several accuracies: order 2, singular
   * corners or not.
   */
  @Test
  void the_gap_closes_at_the_best_rate() {
    assertThat(slope(corner(1, 1, 5, 5, material("stone", 1)).accuracy(1e-6)))
        .isLessThanOrEqualTo(-1.8);
    assertThat(slope(ExactCasesTest.checkerboard(0.04, 2).accuracy(4e-3)))
        .isLessThanOrEqualTo(-1.8);
    assertThat(slope(Iso10211ValidationCase2Test.detail(p -> p).accuracy(2e-6)))
        .isLessThanOrEqualTo(-1.8);
  }

  private static double slope(Sketch sketch) {
    List<AdaptiveLoop.Proved> meshes = new ArrayList<>();
    for (List<AdaptiveLoop.Proved> history : histories(sketch, 81, 27, 9, 3, 1)) {
      meshes.addAll(history.subList(1, history.size()));
    }
    int most = meshes.get(meshes.size() - 1).unknowns();
    SimpleRegression line = new SimpleRegression();
    for (AdaptiveLoop.Proved mesh : meshes) {
      if (mesh.unknowns() >= most / 10.0) {
        line.addData(Math.log(mesh.unknowns()), Math.log(mesh.gap()[0][0]));
      }
    }
    assertThat(line.getN()).isGreaterThan(4);
    return line.getSlope();
  }
}
