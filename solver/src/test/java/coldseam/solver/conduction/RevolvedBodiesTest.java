package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Space;
import java.util.List;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.special.BesselJ;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Bodies of revolution whose conductance is known, in W/K: on every mesh of the history the
 * interval holds it, and the two ways to the gap agree.
 */
class RevolvedBodiesTest {
  private static final Space ONE = space("one", 1, 0);
  private static final Space ZERO = space("zero", 0, 0);

  private static FieldSolution solved(Sketch sketch) {
    return (FieldSolution) sketch.solve();
  }

  /** Solves to three accuracies, so that there is a history. */
  private static void holds(Sketch sketch, double exact, double lastPlace, double accuracy) {
    int meshes = 0;
    for (double times : new double[] {100, 10, 1}) {
      List<AdaptiveLoop.Proved> history = solved(sketch.accuracy(times * accuracy)).proved();
      meshes += history.size();
      double up = Double.POSITIVE_INFINITY;
      for (AdaptiveLoop.Proved pass : history) {
        double upper = pass.up()[0][0];
        double lower = pass.lo()[0][0];
        assertThat(exact).isBetween(lower - lastPlace, upper + lastPlace);
        assertThat(upper).isLessThanOrEqualTo(up * (1 + 1e-11));
        assertThat(upper - lower).isCloseTo(pass.gap()[0][0], within(1e-12 * upper));
        up = upper;
      }
      AdaptiveLoop.Proved last = history.get(history.size() - 1);
      assertThat(last.up()[0][0] - last.lo()[0][0]).isLessThan(2 * times * accuracy * exact);
    }
    assertThat(meshes).isGreaterThan(3);
  }

  /**
   * Flow into a rod of radius a and height H from an isothermal base, film on its side, the top
   * adiabatic or with the same film: Q = 2πka Σ c_n J₁(μ_n) t_n with μJ₁(μ) = Bi J₀(μ), c_n = 2Bi /
   * ((μ² + Bi²) J₀(μ)), t_n = tanh(μH/a) or (tanh + Bi/μ) / (1 + Bi/μ tanh) (Carslaw and Jaeger
   * 1959, chapter 8).
   */
  private static double rod(double k, double a, double height, double h, boolean filmOnTop) {
    double bi = h * a / k;
    double sum = 0;
    for (int n = 1; n <= 400; n++) {
      double from = n == 1 ? 1e-6 : (n - 0.95) * Math.PI;
      double mu =
          new BrentSolver(1e-14, 1e-14)
              .solve(
                  200,
                  x -> x * BesselJ.value(1, x) - bi * BesselJ.value(0, x),
                  from,
                  (n - 0.2) * Math.PI);
      double tanh = Math.tanh(mu * height / a);
      double t = filmOnTop ? (tanh + bi / mu) / (1 + bi / mu * tanh) : tanh;
      sum += 2 * bi * BesselJ.value(1, mu) / ((mu * mu + bi * bi) * BesselJ.value(0, mu)) * t;
    }
    // terms beyond: 2Bi²/μ³, μ = (n − ¾)π
    double beyond = bi * bi / Math.pow(Math.PI, 3) / (399.75 * 399.75);
    return 2 * Math.PI * k * a * (sum + beyond);
  }

  private static Sketch rod(boolean filmOnTop) {
    Space air = space("air", 0, 0.02);
    Sketch sketch =
        new Sketch()
            .revolved()
            .know(ONE)
            .know(air)
            .box(material("rod", 15), 0, 0, 0.05, 0.2)
            .facing(ONE, 0, 0, 0.05, 0)
            .facing(air, 0.05, 0, 0.05, 0.2);
    return filmOnTop ? sketch.facing(air, 0, 0.2, 0.05, 0.2) : sketch;
  }

  @ParameterizedTest
  @ValueSource(booleans = {false, true})
  void rod_on_an_isothermal_base(boolean filmOnTop) {
    double exact = rod(15, 0.05, 0.2, 50, filmOnTop);
    // computed: elements of degree 8, seven digits
    assertThat(exact).isCloseTo(filmOnTop ? 1.321908 : 1.308978, within(5e-7));
    holds(rod(filmOnTop), exact, 1e-9, 1e-5);
  }

  private static Sketch rodThroughWall() {
    Space indoors = space("indoors", 1, 0.13);
    Space outdoors = space("outdoors", 0, 0.04);
    return new Sketch()
        .revolved()
        .know(indoors)
        .know(outdoors)
        .box(material("wall", 0.04), 0, 0, 0.5, 0.2)
        .box(material("rod", 50), 0, 0, 0.01, 0.2)
        .facing(indoors, 0, 0, 0.5, 0)
        .facing(outdoors, 0, 0.2, 0.5, 0.2);
  }

  /** Computed: elements of degree 8 graded to the rod's edges, eight digits. */
  @Test
  void rod_through_a_wall() {
    holds(rodThroughWall(), 0.15751076, 5e-9, 1e-5);
  }

  /**
   * The second bracket, by hand (ISO 6946, 6.7.2): with the rod insulated on its side each part
   * conducts for itself, which is too little; with planes square to the rod made isothermal both
   * conduct in parallel between the films, which is too much.
   */
  @Test
  void rod_through_a_wall_lies_between_the_limits_of_heat_paths() {
    double area = Math.PI * 0.25;
    double ofRod = Math.PI * 1e-4;
    double apart = ofRod / (0.13 + 0.2 / 50 + 0.04) + (area - ofRod) / (0.13 + 0.2 / 0.04 + 0.04);
    double mean = (ofRod * 50 + (area - ofRod) * 0.04) / area;
    double together = area / (0.13 + 0.2 / mean + 0.04);
    AdaptiveLoop.Proved coarse = solved(rodThroughWall().accuracy(0.01)).proved().get(0);
    assertThat(coarse.up()[0][0]).isLessThan(together);
    assertThat(coarse.lo()[0][0]).isGreaterThan(apart);
  }

  /** Exact: 1/L = Ri/(2πr₁h) + ln(r₂/r₁)/(2πλh) + Re/(2πr₂h). */
  @ParameterizedTest
  @CsvSource({"0.1, 0.2, 1, 0.5, 0.13, 0.04", "0.001, 0.05, 0.02, 0.04, 0.1, 0.1"})
  void hollow_cylinder(double r1, double r2, double h, double lambda, double ri, double re) {
    Space in = space("in", 1, ri);
    Space out = space("out", 0, re);
    double resistance =
        ri / (2 * Math.PI * r1 * h)
            + Math.log(r2 / r1) / (2 * Math.PI * lambda * h)
            + re / (2 * Math.PI * r2 * h);
    holds(
        new Sketch()
            .revolved()
            .know(in)
            .know(out)
            .box(material("pipe", lambda), r1, 0, r2, h)
            .facing(in, r1, 0, r1, h)
            .facing(out, r2, 0, r2, h),
        1 / resistance,
        0,
        1e-5);
  }

  private static Sketch halfDisc(Sketch sketch, Fill fill, double r, int n) {
    double[] xy = new double[2 * (n + 1)];
    for (int i = 0; i <= n; i++) {
      double angle = Math.PI * (i / (double) n - 0.5);
      xy[2 * i] = i == 0 || i == n ? 0 : r * Math.cos(angle);
      xy[2 * i + 1] = r * Math.sin(angle);
    }
    return sketch.polygon(fill, xy);
  }

  /**
   * Exact: a shell between spheres at fixed temperatures conducts 4πλ/(1/r₁ − 1/r₂). It grows with
   * the inner body and shrinks with the outer surface: polygons inscribed and circumscribed bracket
   * the spheres. The axis has two stretches, on either side of the inner body.
   */
  @Test
  void spherical_shell() {
    double exact = 4 * Math.PI / (1 - 0.5);
    double[] bracket = new double[2];
    int n = 60;
    double larger = 1 / Math.cos(Math.PI / (2 * n));
    for (boolean more : new boolean[] {false, true}) {
      Sketch sketch =
          new Sketch().revolved().accuracy(1e-4).know(ONE).know(ZERO).box(ZERO, 0, -3, 3, 3);
      halfDisc(sketch, material("shell", 1), more ? 2 : 2 * larger, n);
      halfDisc(sketch, ONE, more ? larger : 1, n);
      for (AdaptiveLoop.Proved pass : solved(sketch).proved()) {
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
   * A film all around the inner body keeps the shell from being isothermal only by the polygon: the
   * same shell with films, 1/L = Ri/(4πr₁²) + (1/r₁ − 1/r₂)/(4πλ) + Re/(4πr₂²), to the chord error.
   */
  @Test
  void spherical_shell_with_films() {
    Space in = space("in", 1, 0.5);
    Space out = space("out", 0, 0.3);
    Sketch sketch = new Sketch().revolved().accuracy(1e-4).know(in).know(out).box(out, 0, -3, 3, 3);
    halfDisc(sketch, material("shell", 1), 2, 120);
    halfDisc(sketch, in, 1, 120);
    double exact = 4 * Math.PI / (0.5 + 0.5 + 0.3 / 4);
    AdaptiveLoop.Proved last = solved(sketch).proved().get(solved(sketch).proved().size() - 1);
    assertThat((last.up()[0][0] + last.lo()[0][0]) / 2).isCloseTo(exact, within(5e-4 * exact));
  }

  /**
   * A body that meets the axis in one corner only, and its mirror image across it: a double cone
   * with a film on its rim and one on its upper faces. Bounds close although no side lies on the
   * axis.
   */
  @Test
  void bounds_close_where_the_section_meets_the_axis_in_a_corner() {
    Space rim = space("rim", 1, 0.1);
    Space above = space("above", 0, 0.2);
    Sketch sketch =
        new Sketch()
            .revolved()
            .accuracy(1e-5)
            .know(rim)
            .know(above)
            .polygon(material("ring", 1), 0, 0, 1, -0.5, 1, 0.8)
            .facing(rim, 1, -0.5, 1, 0.8)
            .facing(above, 0, 0, 1, 0.8);
    FieldSolution solution = solved(sketch);
    AdaptiveLoop.Proved last = solution.proved().get(solution.proved().size() - 1);
    double value = last.up()[0][0];
    assertThat(value - last.lo()[0][0]).isLessThan(2e-5 * value);
    // both films in series over their areas conduct more, the body being in between
    double areaOfRim = 2 * Math.PI * 1.3;
    double areaAbove = Math.PI * Math.hypot(1, 0.8);
    assertThat(value).isLessThan(1 / (0.1 / areaOfRim + 0.2 / areaAbove));
    for (AdaptiveLoop.Proved pass : solution.proved()) {
      assertThat(pass.lo()[0][0]).isLessThanOrEqualTo(value);
      assertThat(pass.up()[0][0] * (1 + 1e-12)).isGreaterThanOrEqualTo(last.lo()[0][0]);
    }
  }

  /** What enters by a given flow from the axis on is its density times the area of its ring. */
  @Test
  void given_flow_through_a_disc() {
    Space air = space("air", 0, 0.1);
    Sketch sketch =
        new Sketch()
            .revolved()
            .know(air)
            .know(space("rim", 0, 0.1))
            .box(material("disc", 2), 0, 0, 0.4, 0.1)
            .facing(air, 0, 0.1, 0.4, 0.1)
            .facing(space("rim", 0, 0.1), 0.4, 0, 0.4, 0.1)
            .flow(100, 0, 0, 0.15, 0)
            .flow(30, 0.2, 0, 0.3, 0);
    FieldSolution solution = solved(sketch);
    double in = 100 * Math.PI * 0.15 * 0.15 + 30 * Math.PI * (0.09 - 0.04);
    double[] zero = {0, 0};
    assertThat(solution.prescribedFlow()).isCloseTo(in, within(1e-12 * in));
    double out = solution.spaceFlow(0, zero) + solution.spaceFlow(1, zero);
    assertThat(out).isCloseTo(-in, within(1e-9 * in));
    assertThat(solution.stretchFlow(2, zero)).isCloseTo(Math.PI * 2.25, within(1e-9));
    assertThat(solution.stretchFlow(0, zero)).isCloseTo(solution.spaceFlow(0, zero), within(1e-6));
  }

  /** Stretches of a fixed temperature that meet on a face add up to the flow of the space. */
  @Test
  void stretches_add_up() {
    Space air = space("air", 0, 0.02);
    Sketch sketch =
        new Sketch()
            .revolved()
            .accuracy(1e-4)
            .know(ONE)
            .know(air)
            .box(material("rod", 15), 0, 0, 0.05, 0.2)
            .facing(ONE, 0, 0, 0.02, 0)
            .facing(ONE, 0.02, 0, 0.05, 0)
            .facing(air, 0.05, 0, 0.05, 0.2);
    FieldSolution solution = solved(sketch);
    double[] temperatures = {1, 0};
    double flow = solution.spaceFlow(0, temperatures);
    double inner = solution.stretchFlow(0, temperatures);
    double outer = solution.stretchFlow(1, temperatures);
    assertThat(inner + outer).isCloseTo(flow, within(1e-9 * flow));
    assertThat(solution.stretchFlow(2, temperatures)).isCloseTo(-flow, within(1e-9 * flow));
    // more than its part of the area enters outside, where the film is near
    assertThat(outer / flow).isGreaterThan(1 - 0.16);
  }

  /** Turned upside down, moved along the axis, and scaled with its films: L goes with the size. */
  @Test
  void moved_and_scaled() {
    double asDrawn = solved(rodThroughWall().accuracy(1e-4)).proved().get(0).up()[0][0];
    Space indoors = space("indoors", 1, 1.3);
    Space outdoors = space("outdoors", 0, 0.4);
    Sketch sketch =
        new Sketch()
            .revolved()
            .accuracy(1e-5)
            .know(indoors)
            .know(outdoors)
            .box(material("wall", 0.04), 0, 100, 5, 102)
            .box(material("rod", 50), 0, 100, 0.1, 102)
            .facing(indoors, 0, 102, 5, 102)
            .facing(outdoors, 0, 100, 5, 100);
    List<AdaptiveLoop.Proved> history = solved(sketch).proved();
    AdaptiveLoop.Proved last = history.get(history.size() - 1);
    assertThat(1.5751076).isBetween(last.lo()[0][0] - 5e-8, last.up()[0][0] + 5e-8);
    assertThat(last.up()[0][0]).isLessThan(10 * asDrawn);
  }
}
