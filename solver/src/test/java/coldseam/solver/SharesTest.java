package coldseam.solver;

import static coldseam.solver.detail.DimensionSystem.EXTERNAL;
import static coldseam.solver.detail.DimensionSystem.INTERNAL;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Dissipation;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

/**
 * Shares, sensitivities and tolerances. Outside sources: the series law of resistances (ISO 6946);
 * Euler's theorem on homogeneous functions (L2D is of degree one in all conductivities and film
 * conductances together); difference quotients of separately solved details, central of fourth
 * order; the definition of ψ (ISO 10211:2017, clause 12) solved anew at each drawn conductivity.
 *
 * <p>A detail is made from factors on its materials and on the conductances of its films.
 */
class SharesTest {
  private static final List<String> IN = List.of("indoors");
  private static final List<String> OUT = List.of("outdoors");

  /** Step of the difference quotients; their own error is about the fourth power of it. */
  private static final double STEP = 0.05;

  /** Accuracy of the details behind difference quotients: the middle of bounds is far better. */
  private static final double FINE = 2e-5;

  private static Material material(String name, double conductivity, double tolerance) {
    return new Material(
        name,
        conductivity,
        conductivity,
        0,
        tolerance,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        "typed in the test");
  }

  /** Not called inside, so that no coldest surface is looked for. */
  private static Space space(String name, double temperature, double film) {
    return DrawnDetail.space(name, temperature, Exposure.OUTSIDE, film);
  }

  /** Masonry, insulation, indoors, outdoors. */
  private static DrawnDetail corner(double[] f, double t) {
    Material masonry = material("masonry", 0.5 * f[0], t);
    Material insulation = material("insulation", 0.04 * f[1], t / 2);
    return new DrawnDetail()
        .box(space("outdoors", -5, 0.04 / f[3]), -2000, -2000, 800, 800)
        .box(insulation, -2000, -2000, 300, 300)
        .box(masonry, -2000, -2000, 200, 200)
        .box(space("indoors", 20, 0.13 / f[2]), -2000, -2000, 0, 0)
        .psi("internal", IN, OUT, INTERNAL)
        .psi("external", IN, OUT, EXTERNAL);
  }

  /** Concrete, masonry, insulation, indoors, outdoors. */
  private static DrawnDetail balcony(double[] f, double t) {
    Material concrete = material("concrete", 2.3 * f[0], t);
    return new DrawnDetail()
        .view(View.UPRIGHT)
        .box(space("indoors", 20, 0.13 / f[3]), -1200, -1200, 0, 1200)
        .box(space("outdoors", -5, 0.04 / f[4]), 360, -1200, 1500, 1200)
        .box(material("masonry", 0.5 * f[1], 0), 0, -1200, 240, 1200)
        .box(material("insulation", 0.035 * f[2], t), 240, -1200, 360, 1200)
        .box(concrete, -1200, -200, 1000, 0)
        .psi("internal", IN, OUT, INTERNAL);
  }

  /** Rooms a and b, parted by a wall, at 20 and 12 °C: outer insulation, inner, films of three. */
  private static DrawnDetail threeSpaces(double[] f, Optional<Double> floating) {
    Material inner = material("inner", f[1], 0.1);
    Space b = space("b", 12, 0.13 / f[3]);
    if (floating.isPresent()) {
      b = DrawnDetail.floating(b, floating.get(), "outdoors");
    }
    return new DrawnDetail()
        .box(space("a", 20, 0.13 / f[2]), -1500, 0, 0, 1500)
        .box(b, 0, 0, 1500, 1500)
        .box(space("outdoors", -5, 0.04 / f[4]), -1500, -600, 1500, -300)
        .box(material("outer", 0.04 * f[0], 0.05), -1500, -300, 1500, -200)
        .box(inner, -1500, -200, 1500, 0)
        .box(inner, -100, 0, 100, 1500);
  }

  private static double[] ones(int n) {
    double[] f = new double[n];
    Arrays.fill(f, 1);
    return f;
  }

  /** Difference quotients of several numbers of one detail. */
  private static double[] quotients(
      Function<double[], DrawnDetail> drawn, int n, int part, Function<Result, double[]> of) {
    double[] weights = {1, -8, 8, -1};
    double[] steps = {-2, -1, 1, 2};
    double[] sums = null;
    for (int k = 0; k < 4; k++) {
      double[] f = ones(n);
      f[part] += steps[k] * STEP;
      double[] values = of.apply(drawn.apply(f).solve(FINE));
      sums = sums == null ? new double[values.length] : sums;
      for (int v = 0; v < values.length; v++) {
        sums[v] += weights[k] * values[v] / (12 * STEP);
      }
    }
    return sums;
  }

  private static double[] couplingAndPsi(Result result) {
    return new double[] {coupling(result), psi(result)};
  }

  private static void near(String what, double found, double expected) {
    assertThat(found).as(what).isCloseTo(expected, within(1e-3 * Math.abs(expected)));
  }

  private static double share(Result result, String name) {
    return result.shares().parts().stream()
        .filter(part -> part.of().equals(name))
        .mapToDouble(Result.Share::share)
        .findFirst()
        .orElseThrow();
  }

  private static double coupling(Result result) {
    return result.couplings().get(0).valueWPerMK().value();
  }

  private static double psi(Result result) {
    return result.psi().get(0).valueWPerMK().value();
  }

  private static double slope(Result.LinearTransmittance psi, String name) {
    return psi.sensitivities().stream()
        .filter(part -> part.of().equals(name))
        .mapToDouble(Result.Sensitivity::slope)
        .findFirst()
        .orElseThrow();
  }

  /** Σ θ Φ over the spaces. */
  private static double power(Result result) {
    double sum = 0;
    for (Result.SpaceResult space : result.spaces()) {
      sum += space.temperatureC() * space.heatFlowWPerM();
    }
    return sum;
  }

  private static double sum(Result result) {
    return result.shares().parts().stream().mapToDouble(Result.Share::share).sum();
  }

  private static Certificate.Certified proved(Optional<Result.Tolerance> tolerance) {
    return (Certificate.Certified) tolerance.orElseThrow().certificate();
  }

  /** Exact: resistances in series share the temperature drop, and so what is dissipated. */
  @Test
  void a_layer_of_a_wall_has_its_part_of_the_resistance() {
    Result result =
        new DrawnDetail()
            .box(space("indoors", 20, 0.13), 0, -300, 400, 0)
            .box(space("outdoors", 0, 0.04), 0, 385, 400, 700)
            .box(material("plaster", 0.57, 0), 0, 0, 400, 15)
            .box(material("brick", 0.5, 0.1), 0, 15, 400, 255)
            .box(material("wool", 0.035, 0.03), 0, 255, 400, 385)
            .want(new Wanted.Transmittance("wall", IN, OUT, OptionalDouble.empty()))
            .solve(1e-3);
    double plaster = 0.015 / 0.57;
    double brick = 0.24 / 0.5;
    double wool = 0.13 / 0.035;
    double all = 0.13 + plaster + brick + wool + 0.04;
    assertThat(result.shares().parts())
        .extracting(Result.Share::of)
        .containsExactly("wool", "brick", "film indoors 0.13", "film outdoors 0.04", "plaster");
    assertThat(result.shares().referTo()).isEqualTo("L2D indoors – outdoors");
    assertThat(share(result, "wool")).isCloseTo(wool / all, within(1e-10));
    assertThat(share(result, "brick")).isCloseTo(brick / all, within(1e-10));
    assertThat(share(result, "plaster")).isCloseTo(plaster / all, within(1e-10));
    assertThat(share(result, "film indoors 0.13")).isCloseTo(0.13 / all, within(1e-10));
    assertThat(share(result, "film outdoors 0.04")).isCloseTo(0.04 / all, within(1e-10));

    // the fields are exact, so that only what moves between the layers makes the box wider
    double low = 1 / (all + brick / 0.9 - brick + wool / 0.97 - wool);
    double high = 1 / (all + brick / 1.1 - brick + wool / 1.03 - wool);
    Certificate.Certified u = proved(result.transmittances().get(0).tolerance());
    assertThat(u.lower()).isCloseTo(low, within(1e-12));
    assertThat(u.upper()).isBetween(high, high * (1 + 1e-3));
    Certificate.Certified l2d = proved(result.couplings().get(0).tolerance());
    assertThat(l2d.lower()).isCloseTo(0.4 * low, within(1e-12));
  }

  /** Euler: shares add up to the upper energy; and the other bound from the same parts. */
  @Test
  void parts_add_up_to_both_bounds() {
    Result result = balcony(ones(5), 0.1).solve(1e-3);
    Certificate.Certified bounds =
        (Certificate.Certified) result.couplings().get(0).valueWPerMK().certificate();
    Dissipation dissipation = result.heatLoss().dissipation();
    double[] x = {0.75, -0.25};
    double upper = 0;
    double lower = 2 * dissipation.inflow(x);
    for (int p = 0; p < dissipation.parts().size(); p++) {
      upper += dissipation.dissipated(p, x, x);
      lower -= dissipation.resisted(p, x);
    }
    assertThat(upper).isCloseTo(bounds.upper(), within(1e-10 * upper));
    assertThat(lower).isCloseTo(bounds.lower(), within(1e-10 * upper));
    assertThat(upper - lower).isGreaterThan(1e-5);
    assertThat(sum(result)).isCloseTo(1, within(1e-10));

    Result three = threeSpaces(ones(5), Optional.empty()).solve(1e-3);
    assertThat(sum(three)).isCloseTo(1, within(1e-10));
    assertThat(three.shares().referTo()).startsWith("θᵀAθ");
    double[] theta = {20, 12, -5};
    double all = 0;
    for (int p = 0; p < 5; p++) {
      all += three.heatLoss().dissipation().dissipated(p, theta, theta);
    }
    assertThat(all).isCloseTo(power(three), within(2e-3 * all)).isGreaterThan(power(three));
  }

  @Test
  void shares_and_slopes_of_a_corner_are_difference_quotients() {
    Result result = corner(ones(4), 0.1).solve(FINE);
    List<String> names =
        List.of("masonry", "insulation", "film indoors 0.13", "film outdoors 0.04");
    for (int p = 0; p < 4; p++) {
      double[] expected = quotients(f -> corner(f, 0.1), 4, p, SharesTest::couplingAndPsi);
      String name = names.get(p);
      near(name, share(result, name) * coupling(result), expected[0]);
      near("ψ " + name, slope(result.psi().get(0), name), expected[1]);
    }
  }

  @Test
  void shares_and_slopes_of_a_balcony_are_difference_quotients() {
    Result result = balcony(ones(5), 0.1).solve(FINE);
    List<String> names =
        List.of("concrete", "masonry", "insulation", "film indoors 0.13", "film outdoors 0.04");
    for (int p = 0; p < 5; p++) {
      double[] expected = quotients(f -> balcony(f, 0.1), 5, p, SharesTest::couplingAndPsi);
      String name = names.get(p);
      near(name, share(result, name) * coupling(result), expected[0]);
      near("ψ " + name, slope(result.psi().get(0), name), expected[1]);
    }
  }

  /** θᵀAθ, a ψ of one pair of three, and one with a floating space between, whose b moves too. */
  @Test
  void slopes_with_three_spaces_are_difference_quotients() {
    List<String> names =
        List.of("outer", "inner", "film a 0.13", "film b 0.13", "film outdoors 0.04");
    Function<double[], DrawnDetail> stated =
        f ->
            threeSpaces(f, Optional.empty())
                .psi("pair", List.of("a"), OUT, INTERNAL)
                .psi("weighted", List.of("a"), OUT, Map.of("b", 0.25), INTERNAL);
    Function<double[], DrawnDetail> floating =
        f -> threeSpaces(f, Optional.of(0.7)).psi("wall", List.of("a"), OUT, INTERNAL);
    Result result = stated.apply(ones(5)).solve(FINE);
    Result floats = floating.apply(ones(5)).solve(FINE);
    for (int p : new int[] {0, 1, 3}) {
      String name = names.get(p);
      double[] expected =
          quotients(
              stated,
              5,
              p,
              r ->
                  new double[] {
                    power(r),
                    r.psi().get(0).valueWPerMK().value(),
                    r.psi().get(1).valueWPerMK().value()
                  });
      near(name, share(result, name) * power(result), expected[0]);
      near("pair " + name, slope(result.psi().get(0), name), expected[1]);
      near("weighted " + name, slope(result.psi().get(1), name), expected[2]);
      expected = quotients(floating, 5, p, r -> new double[] {psi(r)});
      near("floating " + name, slope(floats.psi().get(0), name), expected[0]);
    }
    assertThat(floats.psi().get(0).tolerance().orElseThrow().certificate())
        .isInstanceOf(Certificate.NotCertified.class);
    double first = 0;
    for (int p = 0; p < 2; p++) {
      first += (p == 0 ? 0.05 : 0.1) * Math.abs(slope(result.psi().get(0), names.get(p)));
    }
    assertThat(result.psi().get(0).tolerance().orElseThrow().halfWidth())
        .isCloseTo(first, within(1e-12));
  }

  /** A wall taken off as a detail of its own shares its materials. */
  @Test
  void another_detail_taken_off_moves_with_its_materials() {
    Function<double[], DrawnDetail> drawn =
        f -> {
          DrawnDetail plain =
              new DrawnDetail()
                  .view(View.UPRIGHT)
                  .box(space("indoors", 20, 0.13 / f[3]), -500, -1200, 0, 1000)
                  .box(space("outdoors", -5, 0.04 / f[4]), 360, -1200, 700, 1000)
                  .box(material("masonry", 0.5 * f[1], 0), 0, -1200, 240, 1000)
                  .box(material("insulation", 0.035 * f[2], 0.1), 240, -1200, 360, 1000);
          return balcony(f, 0.1)
              .psi(
                  "by hand",
                  IN,
                  OUT,
                  Map.of(),
                  INTERNAL,
                  new Subtraction.OfDetail("plain", plain.detail(), IN, OUT));
        };
    Result result = drawn.apply(ones(5)).solve(FINE);
    double whole = slope(result.psi().get(0), "insulation");
    // internal lengths are 1000 + 1200 here, too
    assertThat(slope(result.psi().get(1), "insulation")).isCloseTo(whole, within(1e-9));
    Certificate.Certified of = proved(result.psi().get(0).tolerance());
    assertThat(proved(result.psi().get(1).tolerance()).upper()).isCloseTo(of.upper(), within(1e-5));
  }

  /** 200 draws each: every ψ and L2D lies in the interval over all tolerances. */
  @Test
  void every_draw_within_tolerances_lies_in_the_box() {
    Random random = new Random(20240611);
    double tolerance = 0.2;
    Result box = corner(ones(4), tolerance).solve(1e-3);
    Certificate.Certified l2d = proved(box.couplings().get(0).tolerance());
    Certificate.Certified internal = proved(box.psi().get(0).tolerance());
    Certificate.Certified external = proved(box.psi().get(1).tolerance());
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (int draw = 0; draw < 200; draw++) {
      double[] f = ones(4);
      // every fifth draw is a corner of the box
      for (int p = 0; p < 2; p++) {
        double half = p == 0 ? tolerance : tolerance / 2;
        double part = random.nextDouble(-1, 1);
        f[p] += half * (draw % 5 == 0 ? Math.signum(part) : part);
      }
      Result one = corner(f, 0).solve(1e-3);
      assertThat(inside(one.couplings().get(0).valueWPerMK().certificate(), l2d)).isTrue();
      assertThat(inside(one.psi().get(0).valueWPerMK().certificate(), internal)).isTrue();
      assertThat(inside(one.psi().get(1).valueWPerMK().certificate(), external)).isTrue();
      lowest = Math.min(lowest, coupling(one));
      highest = Math.max(highest, coupling(one));
    }
    // and the box is not much wider than it has to be
    double used = highest - lowest;
    assertThat(l2d.upper() - l2d.lower()).isBetween(used, 1.1 * used);
  }

  /**
   * Whether the middle of a draw's bounds, much nearer the truth than they are, lies in the box.
   */
  private static boolean inside(Certificate one, Certificate.Certified box) {
    Certificate.Certified bounds = (Certificate.Certified) one;
    double middle = (bounds.lower() + bounds.upper()) / 2;
    return middle >= box.lower() && middle <= box.upper();
  }

  /** Insulation decides L2D of a corner with long flanks; what is left of it in ψ is little. */
  @Test
  void a_psi_hangs_far_less_on_the_flanks_than_its_coupling() {
    Result result = corner(ones(4), 0.1).solve(1e-4);
    double ofCoupling = share(result, "insulation") * coupling(result);
    double ofPsi = Math.abs(slope(result.psi().get(0), "insulation"));
    assertThat(ofPsi).isGreaterThan(0).isLessThan(ofCoupling / 10);
    // exact: ψ is of degree one in all conductances together, as U·l and L2D are
    double all =
        result.psi().get(0).sensitivities().stream().mapToDouble(Result.Sensitivity::slope).sum();
    assertThat(all).isCloseTo(psi(result), within(1e-4));
    Result.Tolerance tolerance = result.psi().get(0).tolerance().orElseThrow();
    assertThat(tolerance.halfWidth())
        .isLessThan(result.couplings().get(0).tolerance().orElseThrow().halfWidth() / 4);
  }

  @Test
  void without_tolerances_nothing_is_said_of_them() {
    Result result = corner(ones(4), 0).solve(1e-3);
    assertThat(result.couplings().get(0).tolerance()).isEmpty();
    assertThat(result.psi().get(0).tolerance()).isEmpty();
  }

  /** Two films at one space count apart; a tensor has one factor for both its conductivities. */
  @Test
  void films_count_by_their_resistance_and_a_tensor_as_one() {
    Function<double[], DrawnDetail> drawn =
        f ->
            new DrawnDetail()
                .box(space("indoors", 20, 0.13), 0, -500, 600, 0)
                .box(space("outdoors", -5, 0.04), 0, 300, 600, 600)
                .box(
                    new Material(
                        "timber",
                        0.3 * f[0],
                        0.12 * f[0],
                        0.4,
                        0,
                        OptionalDouble.empty(),
                        OptionalDouble.empty(),
                        "typed in the test"),
                    0,
                    0,
                    600,
                    300)
                .facing(
                    "shaded",
                    "indoors",
                    FilmRule.uniform(0.25 / f[1], "typed in the test"),
                    0,
                    0,
                    200,
                    0);
    Result result = drawn.apply(ones(2)).solve(FINE);
    assertThat(result.shares().parts())
        .extracting(Result.Share::of)
        .containsExactlyInAnyOrder(
            "timber", "film indoors 0.13", "film indoors 0.25", "film outdoors 0.04");
    List<String> names = List.of("timber", "film indoors 0.25");
    for (int p = 0; p < 2; p++) {
      double[] expected = quotients(drawn, 2, p, r -> new double[] {coupling(r)});
      near(names.get(p), share(result, names.get(p)) * coupling(result), expected[0]);
    }
  }
}
