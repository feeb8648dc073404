package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** χ = L3D − Σ U·A − Σ ψ·l (ISO 10211:2017, clause 12) of bodies of revolution. */
class PointBridgesTest {
  private static final Space IN = space("indoors", 20, Exposure.INSIDE, 0.13);
  private static final Space OUT = space("outdoors", -5, Exposure.OUTSIDE, 0.04);

  /** χ to 0.1 % of itself. */
  private static final Accuracy FINE = new Accuracy(0.002, 1, 1, 1, 1e-3, 0, 2_000_000);

  private static DrawnDetail wall(double thickness) {
    return new DrawnDetail()
        .revolved()
        .know(IN)
        .know(OUT)
        .box(material("insulation", 0.04), 0, 0, 500, thickness)
        .facing("inside", "indoors", 0, 0, 500, 0)
        .facing("outside", "outdoors", 0, thickness, 500, thickness);
  }

  private static DrawnDetail rod() {
    return wall(200).box(material("steel", 50), 0, 0, 10, 200);
  }

  private static Wanted.Chi chi(Subtraction... subtractions) {
    return new Wanted.Chi(
        "rod", "rod", List.of("indoors"), List.of("outdoors"), List.of(subtractions));
  }

  private static Result.PointTransmittance solved(DrawnDetail drawn, Accuracy accuracy) {
    Result result = Solver.solve(drawn.detail(), accuracy, Progress.SILENT);
    return result.chi().get(0);
  }

  private static void holds(Quantity quantity, double value, double lastPlace) {
    Certificate.Certified proved = (Certificate.Certified) quantity.certificate();
    assertThat(value).isBetween(proved.lower() - lastPlace, proved.upper() + lastPlace);
  }

  /** Computed: elements of degree 8 graded to the rod's edges. */
  @Test
  void rod_through_a_wall() {
    Result.PointTransmittance chi = solved(rod().want(chi()), FINE);
    holds(chi.valueWPerK(), 0.00559622, 6e-9);
    holds(chi.couplingWPerK(), 0.15751076, 6e-9);
    assertThat(chi.valueWPerK().halfWidth()).isLessThan(1e-3 * 0.005596);
    Result.PointTerm wall = chi.subtracted().get(0);
    assertThat(wall.areaM2().getAsDouble()).isCloseTo(Math.PI / 4, within(1e-12));
    assertThat(wall.valueWPerK().mid()).isCloseTo(Math.PI / 4 / 5.17, within(1e-12));
  }

  @Test
  void standard_accuracy_is_the_larger_of_one_percent_and_half_a_milliwatt() {
    assertThat(Accuracy.STANDARD.pointWPerK(0.2)).isEqualTo(0.002);
    assertThat(Accuracy.STANDARD.pointWPerK(-0.2)).isEqualTo(0.002);
    assertThat(Accuracy.STANDARD.pointWPerK(0.01)).isEqualTo(0.0005);
    Result.PointTransmittance chi = solved(rod().want(chi()), Accuracy.STANDARD);
    assertThat(chi.valueWPerK().halfWidth()).isLessThan(0.0005).isGreaterThan(1e-6);
    holds(chi.valueWPerK(), 0.00559622, 6e-9);
  }

  /** Rows of χ by conductivity: L3D is of degree one in all λ and 1/Rs, U as well (Euler). */
  @Test
  void sensitivities_add_up_to_chi() {
    Result.PointTransmittance chi = solved(rod().want(chi()), FINE);
    double sum = chi.sensitivities().stream().mapToDouble(Result.Sensitivity::slope).sum();
    assertThat(sum).isCloseTo(chi.valueWPerK().value(), within(chi.valueWPerK().halfWidth()));
  }

  @Test
  void an_undisturbed_wall_has_none() {
    Result.PointTransmittance chi = solved(wall(200).want(chi()), Accuracy.STANDARD);
    holds(chi.valueWPerK(), 0, 0);
    assertThat(chi.valueWPerK().halfWidth()).isLessThan(0.0005);
  }

  /** The same taken off by hand, and as the L3D of a case of its own. */
  @Test
  void what_is_taken_off_can_be_stated() {
    Subtraction typed = new Subtraction.OfArea("wall", Bracket.of(1 / 5.17), Math.PI / 4);
    Subtraction other =
        new Subtraction.OfDetail(
            "wall", wall(200).detail(), List.of("indoors"), List.of("outdoors"));
    holds(solved(rod().want(chi(typed)), FINE).valueWPerK(), 0.00559622, 6e-9);
    holds(solved(rod().want(chi(other)), FINE).valueWPerK(), 0.00559622, 6e-9);
  }

  private static DrawnDetail pipe(double height) {
    return new DrawnDetail()
        .revolved()
        .know(IN)
        .know(OUT)
        .box(material("pipe", 50), 20, 0, 22, height)
        .box(material("lagging", 0.04), 22, 0, 60, height)
        .facing("fluid", "indoors", 20, 0, 20, height)
        .facing("air", "outdoors", 60, 0, 60, height);
  }

  /** Exact: 2π / (Ri/r₁ + Σ ln(r₂/r₁)/λ + Re/r₂) for each metre. */
  private static double pipePerMetre() {
    return 2
        * Math.PI
        / (0.13 / 0.020 + Math.log(22.0 / 20) / 50 + Math.log(60.0 / 22) / 0.04 + 0.04 / 0.060);
  }

  @Test
  void a_pipe_takes_off_what_it_loses_by_the_metre() {
    Result.PointTransmittance none = solved(pipe(300).want(chi()), FINE);
    Result.PointTerm term = none.subtracted().get(0);
    assertThat(term.lengthM().getAsDouble()).isCloseTo(0.3, within(1e-12));
    assertThat(term.psiWPerMK().orElseThrow().mid()).isCloseTo(pipePerMetre(), within(1e-12));
    holds(none.couplingWPerK(), 0.3 * pipePerMetre(), 0);
    holds(none.valueWPerK(), 0, 0);

    DrawnDetail flange = pipe(300).box(material("steel", 50), 22, 145, 60, 155);
    Result.PointTransmittance chi = solved(flange.want(chi()), FINE);
    assertThat(chi.valueWPerK().value()).isGreaterThan(0.01);
    Subtraction typed = new Subtraction.OfLine("pipe", Bracket.of(pipePerMetre()), 0.3);
    DrawnDetail again = pipe(300).box(material("steel", 50), 22, 145, 60, 155).want(chi(typed));
    assertThat(solved(again, FINE).valueWPerK().value())
        .isCloseTo(chi.valueWPerK().value(), within(2 * chi.valueWPerK().halfWidth()));
  }

  /** A wall around a hole: what lies within the inner cylinder is missing. */
  @Test
  void a_cut_off_cylinder_on_the_inside_counts_against_the_one_outside() {
    DrawnDetail ring =
        new DrawnDetail()
            .revolved()
            .know(IN)
            .know(OUT)
            .box(material("insulation", 0.04), 100, 0, 500, 200)
            .facing("inside", "indoors", 100, 0, 500, 0)
            .facing("outside", "outdoors", 100, 200, 500, 200)
            .want(chi());
    Result.PointTransmittance chi = solved(ring, Accuracy.STANDARD);
    assertThat(chi.subtracted()).hasSize(2);
    holds(chi.valueWPerK(), 0, 0);
    holds(chi.couplingWPerK(), Math.PI * (0.25 - 0.01) / 5.17, 0);
  }

  private static List<String> faults(DrawnDetail drawn) {
    DetailException e =
        catchThrowableOfType(DetailException.class, () -> Solver.inspect(drawn.detail()));
    assertThat(e).isNotNull();
    return e.faults().stream().map(f -> f.part() + ": " + f.message()).toList();
  }

  @Test
  void what_reaches_across_the_axis_is_refused_with_its_place() {
    DrawnDetail drawn = rod().box(material("steel", 50), -5, 20, 10, 30);
    drawn.along("head", false, -3, 0, 10, 0).point("A", -1, 50, FilmSet.HEAT_LOSS);
    assertThat(faults(drawn))
        .containsExactly(
            "section: area 2 reaches across the axis at (-5, 20) mm; x is the radius, 0 or more",
            "stretch: reaches across the axis at (-3, 0) mm; x is the radius, 0 or more",
            "point: reaches across the axis at (-1, 50) mm; x is the radius, 0 or more");
    List<Point> place = rod().points(-5, 20);
    DetailException e =
        catchThrowableOfType(DetailException.class, () -> Solver.inspect(drawn.detail()));
    assertThat(e.faults().get(0).where()).contains(place.get(0));
  }

  /** Less than the resolution, 1e-5 mm, is on the axis. */
  @ParameterizedTest
  @ValueSource(doubles = {-9e-6, 9e-6})
  void points_within_the_resolution_of_the_axis_are_on_it(double x) {
    DrawnDetail drawn =
        new DrawnDetail()
            .revolved()
            .know(IN)
            .know(OUT)
            .box(material("insulation", 0.04), x, 0, 500, 200)
            .facing("inside", "indoors", x, 0, 500, 0)
            .facing("outside", "outdoors", x, 200, 500, 200)
            .want(chi());
    holds(solved(drawn, Accuracy.STANDARD).valueWPerK(), 0, 0);
    assertThat(drawn.inspect().heatLoss().cutOffPlanes()).hasSize(1);
  }

  @Test
  void what_a_body_of_revolution_does_not_have_is_refused() {
    DrawnDetail drawn =
        rod()
            .psi("p", List.of("indoors"), List.of("outdoors"), DimensionSystem.INTERNAL)
            .want(
                new Wanted.Transmittance(
                    "wall", List.of("indoors"), List.of("outdoors"), OptionalDouble.of(1)))
            .typedFlank("f", 0.2, DimensionSystem.INTERNAL, 1)
            .view(View.up(1, 0));
    assertThat(faults(drawn))
        .hasSize(4)
        .anyMatch(f -> f.startsWith("flank: a body of revolution names no flanks"))
        .anyMatch(f -> f.startsWith("psi: is of a metre of a prism"))
        .anyMatch(f -> f.startsWith("U: is of a module of a prism"))
        .anyMatch(f -> f.startsWith("section: a body of revolution is upright"));
  }

  @Test
  void the_axis_is_no_surface() {
    DrawnDetail drawn = rod().facing("core", "indoors", 0, 50, 0, 100);
    assertThat(faults(drawn)).singleElement().asString().contains("runs along the axis");
  }

  @Test
  void what_cannot_be_derived_has_to_be_stated() {
    DrawnDetail one = pipe(300).symmetry("middle", 20, 0, 60, 0).want(chi());
    assertThat(faults(one)).singleElement().asString().contains("not the same at two ends");
    DrawnDetail conical =
        wall(200).polygon(material("wedge", 0.1), 400, 200, 500, 150, 500, 200).want(chi());
    assertThat(faults(conical)).singleElement().asString().contains("state under subtract");
  }

  /** A wrong geometry of what is taken off. */
  @Test
  void a_prism_is_not_taken_off_a_body_of_revolution() {
    DrawnDetail prism =
        new DrawnDetail()
            .know(IN)
            .know(OUT)
            .box(material("insulation", 0.04), 0, 0, 500, 200)
            .facing("inside", "indoors", 0, 0, 500, 0)
            .facing("outside", "outdoors", 0, 200, 500, 200);
    Subtraction other =
        new Subtraction.OfDetail("wall", prism.detail(), List.of("indoors"), List.of("outdoors"));
    assertThat(faults(rod().want(chi(other)))).singleElement().asString().contains("prism");
  }

  /** Three spaces: heat flows add up, and a floating one takes the temperature of its balance. */
  @Test
  void several_spaces_and_a_floating_one() {
    Space cavity = DrawnDetail.floating(space("loft", 0, Exposure.INSIDE, 0.1), 0, "");
    DrawnDetail drawn =
        new DrawnDetail()
            .revolved()
            .know(IN)
            .know(OUT)
            .know(cavity)
            .box(material("block", 0.5), 0, 0, 300, 400)
            .facing("inside", "indoors", 0, 0, 300, 0)
            .facing("outside", "outdoors", 0, 400, 300, 400)
            .facing("side", "loft", 300, 0, 300, 400);
    Result result = Solver.solve(drawn.detail(), Accuracy.STANDARD, Progress.SILENT);
    Map<String, Result.SpaceResult> spaces = new HashMap<>();
    result.spaces().forEach(s -> spaces.put(s.name(), s));
    double in = spaces.get("indoors").heatFlowWPerM();
    assertThat(spaces.get("outdoors").heatFlowWPerM()).isCloseTo(-in, within(1e-9 * in));
    assertThat(spaces.get("loft").heatFlowWPerM()).isCloseTo(0, within(1e-9 * in));
    assertThat(spaces.get("loft").temperatureC()).isBetween(-5.0, 20.0);
    assertThat(Math.abs(result.balance().relative())).isLessThan(1e-9);
    assertThat(result.shares().parts().stream().mapToDouble(Result.Share::share).sum())
        .isCloseTo(1, within(1e-9));
  }
}
