package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static coldseam.solver.detail.DimensionSystem.EXTERNAL;
import static coldseam.solver.detail.DimensionSystem.INTERNAL;
import static coldseam.solver.detail.DimensionSystem.OVERALL_INTERNAL;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Material;
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

/**
 * Junctions from drawing to ψ by the rules of ISO 10211. The expected figures were computed with
 * separate elements of degree 2 to 8 on meshes graded to the corners, stable to the digits given.
 */
class JunctionsTest {
  private static final Space INDOORS = room("indoors", 20);
  private static final Space OUTDOORS = outdoors(0);
  private static final List<String> IN = List.of("indoors");
  private static final List<String> OUT = List.of("outdoors");

  private static Result.LinearTransmittance psi(Result result, String name) {
    return result.psi().stream().filter(p -> p.name().equals(name)).findFirst().orElseThrow();
  }

  private static double psiValue(Result result, String name) {
    return psi(result, name).valueWPerMK().value();
  }

  private static double coupling(Result result, String a, String b) {
    return result.couplings().stream()
        .filter(
            c ->
                (c.from().equals(a) && c.to().equals(b))
                    || (c.from().equals(b) && c.to().equals(a)))
        .mapToDouble(c -> c.valueWPerMK().value())
        .findFirst()
        .orElseThrow();
  }

  private static Result.SpaceResult space(Result result, String name) {
    return result.spaces().stream().filter(s -> s.name().equals(name)).findFirst().orElseThrow();
  }

  private static double point(Result result, String name) {
    return result.points().stream()
        .filter(p -> p.name().equals(name))
        .mapToDouble(Result.PointResult::temperatureC)
        .findFirst()
        .orElseThrow();
  }

  /** Computed: degree 8, eight digits stable. */
  @Test
  void homogeneous_corner() {
    Result result =
        new DrawnDetail()
            .box(OUTDOORS, -1500, -1500, 800, 800)
            .box(material("masonry", 0.5), -1500, -1500, 300, 300)
            .box(INDOORS, -1500, -1500, 0, 0)
            .psi("internal", IN, OUT, INTERNAL)
            .psi("external", IN, OUT, EXTERNAL)
            .point("inner", 0, 0, FilmSet.HEAT_LOSS)
            .point("outer", 300, 300, FilmSet.HEAT_LOSS)
            .solve(2e-4);
    assertThat(coupling(result, "indoors", "outdoors")).isCloseTo(4.07021518, within(8e-4));
    assertThat(psiValue(result, "internal")).isCloseTo(0.17411129, within(1e-4));
    assertThat(psiValue(result, "external")).isCloseTo(-0.60510949, within(1e-4));
    assertThat(point(result, "inner") / 20).isCloseTo(0.68989851, within(4e-4));
    assertThat(point(result, "outer") / 20).isCloseTo(0.00234707, within(4e-4));

    Result.SurfacePoint coldest = space(result, "indoors").coldest().orElseThrow();
    assertThat(coldest.filmSet()).isEqualTo(FilmSet.SURFACE);
    assertThat(coldest.filmM2KPerW()).isEqualTo(0.25);
    assertThat(coldest.fRsi().orElseThrow()).isCloseTo(0.56545814, within(4e-4));
    assertThat(coldest.at().distance(new Point(0, 0))).isLessThan(1e-9);
    assertThat(space(result, "indoors").referenceSpace()).contains("outdoors");
    assertThat(space(result, "outdoors").coldest().orElseThrow().fRsi()).isEmpty();
    assertThat(Math.abs(result.balance().relative())).isLessThan(1e-9);
    assertThat(result.weights()).isEmpty();
    assertThat(result.timesMs().keySet())
        .containsExactly("resolve", "heat loss", "surface temperatures", "results");
  }

  /** Computed: degree 8, eight digits stable. U of the flanks is exact, so ψ is as wide as L2D. */
  @Test
  void a_psi_is_certified_as_its_coupling_is_and_contains_the_fine_value() {
    Result result =
        new DrawnDetail()
            .box(OUTDOORS, -1500, -1500, 800, 800)
            .box(material("masonry", 0.5), -1500, -1500, 300, 300)
            .box(INDOORS, -1500, -1500, 0, 0)
            .psi("internal", IN, OUT, INTERNAL)
            .psi("external", IN, OUT, EXTERNAL)
            .want(new Wanted.Transmittance("wall", IN, OUT, OptionalDouble.of(1)))
            .solve(1e-3);
    assertContains(psi(result, "internal").valueWPerMK(), 0.17411129);
    assertContains(psi(result, "external").valueWPerMK(), -0.60510949);
    assertContains(result.transmittances().get(0).valueWPerM2K(), 4.07021518);
    assertContains(result.transmittances().get(0).resistanceM2KPerW(), 1 / 4.07021518);
    Quantity coupling = psi(result, "internal").couplingWPerMK();
    assertThat(psi(result, "internal").valueWPerMK().halfWidth())
        .isCloseTo(coupling.halfWidth(), within(1e-12));
  }

  /** The fine value is rounded to eight decimals. */
  private static void assertContains(Quantity quantity, double fine) {
    assertThat(quantity.certificate())
        .isInstanceOfSatisfying(
            Certificate.Certified.class,
            proved -> assertThat(fine).isBetween(proved.lower() - 5e-9, proved.upper() + 5e-9));
    assertThat(quantity.halfWidth()).isGreaterThan(0).isLessThan(1e-2);
  }

  /** Computed; flows, weighting factors and corner temperatures likewise. */
  @Test
  void three_spaces_around_a_partition() {
    Result result =
        FlanksTest.partitionWall()
            .psi("internal", List.of("a", "b"), OUT, INTERNAL)
            .psi("overall", List.of("a", "b"), OUT, OVERALL_INTERNAL)
            .psi("external", List.of("a", "b"), OUT, EXTERNAL)
            .point("corner a", -100, 0, FilmSet.HEAT_LOSS)
            .point("corner b", 100, 0, FilmSet.HEAT_LOSS)
            .solve(1e-4);
    assertThat(coupling(result, "a", "outdoors")).isCloseTo(0.5227053, within(2e-4));
    assertThat(coupling(result, "b", "outdoors")).isCloseTo(0.5227053, within(2e-4));
    assertThat(coupling(result, "a", "b")).isCloseTo(3.5469738, within(7e-4));
    assertThat(space(result, "outdoors").heatFlowWPerM()).isCloseTo(-18.29469, within(4e-3));
    assertThat(space(result, "a").heatFlowWPerM()).isCloseTo(28.18897, within(6e-3));
    assertThat(space(result, "b").heatFlowWPerM()).isCloseTo(-9.89429, within(3e-3));
    assertThat(point(result, "corner a")).isCloseTo(17.85127, within(8e-3));
    assertThat(point(result, "corner b")).isCloseTo(15.67579, within(8e-3));
    Map<String, Double> g = new HashMap<>();
    result.weights().stream()
        .filter(w -> w.point().equals("corner a"))
        .forEach(w -> g.put(w.space(), w.g()));
    assertThat(g.get("outdoors")).isCloseTo(0.0420841, within(4e-4));
    assertThat(g.get("a")).isCloseTo(0.696506, within(4e-4));
    assertThat(g.get("b")).isCloseTo(0.261410, within(4e-4));
    assertThat(g.values().stream().mapToDouble(x -> x).sum()).isCloseTo(1, within(1e-9));

    assertThat(psi(result, "internal").couplingWPerMK().value()).isCloseTo(1.0454106, within(3e-4));
    assertThat(psiValue(result, "internal")).isCloseTo(0.0698009, within(2e-4));
    assertThat(psiValue(result, "overall")).isCloseTo(0.000114, within(2e-4));
    assertThat(psiValue(result, "external")).isCloseTo(0.000114, within(2e-4));
    assertThat(psi(result, "internal").parts())
        .extracting(part -> part.from() + " – " + part.to())
        .containsExactly("a – outdoors", "b – outdoors");
    assertThat(
            psi(result, "internal").parts().stream()
                .mapToDouble(part -> part.valueWPerMK().value())
                .sum())
        .isCloseTo(psi(result, "internal").couplingWPerMK().value(), within(1e-12));
    assertThat(psi(result, "internal").subtracted())
        .extracting(Result.Subtracted::name)
        .containsExactlyInAnyOrder("left flank", "right flank");
  }

  /** The weighting factors of a coldest point reproduce its temperature. */
  @Test
  void weights_of_the_coldest_points_add_up_to_their_temperatures() {
    Result result = FlanksTest.partitionWall().solve(1e-3);
    for (String name : List.of("a", "b")) {
      double sum = 0;
      double theta = 0;
      for (Result.Weight w : result.weights()) {
        if (w.point().equals("coldest of " + name)) {
          assertThat(w.filmSet()).isEqualTo(FilmSet.SURFACE);
          sum += w.g();
          theta += w.g() * space(result, w.space()).temperatureC();
        }
      }
      assertThat(sum).isCloseTo(1, within(1e-9));
      assertThat(theta)
          .isCloseTo(space(result, name).coldest().orElseThrow().temperatureC(), within(1e-7));
    }
  }

  /**
   * Schur complement by hand of the couplings of the partition wall: with room b floating, θb =
   * (L_ob θo + L_ab θa)/(L_ob + L_ab); with 0.5 W/(m·K) more to outdoors likewise.
   */
  @Test
  void a_floating_room_takes_the_temperature_of_its_balance() {
    double lao = 0.5227053;
    double lbo = 0.5227053;
    double lab = 3.5469738;
    for (double extra : new double[] {0, 0.5}) {
      Result result = withFloatingRoom(extra).psi("wall", List.of("a"), OUT, INTERNAL).solve(1e-4);
      double thetaB = lab * 20 / (lab + lbo + extra);
      assertThat(space(result, "b").temperatureC()).isCloseTo(thetaB, within(2e-3));
      assertThat(space(result, "b").floating()).isTrue();
      assertThat(space(result, "b").heatFlowWPerM()).isCloseTo(-extra * thetaB, within(2e-3));
      double effective = lao + lab * (lbo + extra) / (lab + lbo + extra);
      assertThat(psi(result, "wall").couplingWPerMK().value()).isCloseTo(effective, within(4e-4));
      Certificate.Certified proved =
          (Certificate.Certified) psi(result, "wall").couplingWPerMK().certificate();
      assertThat(effective).isBetween(proved.lower() - 3e-7, proved.upper() + 3e-7);
      assertThat(proved.upper() - proved.lower()).isLessThan(2e-3);
      double b = (lbo + extra) / (lab + lbo + extra);
      assertThat(psi(result, "wall").subtracted())
          .anySatisfy(
              term -> {
                assertThat(term.name()).isEqualTo("top flank");
                assertThat(term.weight()).isCloseTo(b, within(1e-4));
                assertThat(term.valueWPerMK().mid())
                    .isCloseTo(b * 1.5 / (0.13 + 0.2 + 0.13), within(2e-4));
              });
      assertThat(Math.abs(result.balance().relative())).isLessThan(1e-9);
    }
  }

  private static DrawnDetail withFloatingRoom(double conductance) {
    Material inner = material("inner", 1);
    Space b = DrawnDetail.floating(room("b", 0), conductance, conductance > 0 ? "outdoors" : "");
    return new DrawnDetail()
        .box(room("a", 20), -1500, 0, 0, 1500)
        .box(b, 0, 0, 1500, 1500)
        .box(OUTDOORS, -1500, -600, 1500, -300)
        .box(material("outer", 0.04), -1500, -300, 1500, -200)
        .box(inner, -1500, -200, 1500, 0)
        .box(inner, -100, 0, 100, 1500);
  }

  /** Computed. b weights one coupling: hand sum of the couplings of the partition wall. */
  @Test
  void a_weighted_space_counts_b_times() {
    Result result =
        FlanksTest.partitionWall()
            .psi("b", List.of("a"), OUT, Map.of("b", 0.25), INTERNAL)
            .solve(1e-4);
    assertThat(psi(result, "b").couplingWPerMK().value())
        .isCloseTo(0.5227053 + 0.25 * 3.5469738, within(4e-4));
    double u = 1 / (0.13 + 0.2 + 0.1 / 0.04 + 0.04);
    double between = 1 / (0.13 + 0.2 + 0.13);
    assertThat(psiValue(result, "b"))
        .isCloseTo(0.5227053 + 0.25 * 3.5469738 - u * 1.4 - 0.25 * between * 1.5, within(4e-4));
    assertThat(psi(result, "b").parts())
        .anySatisfy(
            part ->
                assertThat(part.valueWPerMK().value()).isCloseTo(0.25 * 3.5469738, within(4e-4)));
  }

  private static DrawnDetail halfSlab() {
    return new DrawnDetail()
        .view(View.UPRIGHT)
        .box(INDOORS, -500, 0, 0, 1100)
        .box(OUTDOORS, 200, 0, 700, 1100)
        .box(material("insulation", 0.035), 0, 0, 200, 1100)
        .box(material("concrete", 2), 0, 0, 200, 100)
        .symmetry("middle of the slab", 0, 0, 200, 0);
  }

  /** Computed: slab through insulation, half model; the figures below are those of both halves. */
  @Test
  void slab_through_insulation_by_its_half() {
    Result result =
        halfSlab()
            .psi("half", IN, OUT, INTERNAL)
            .point("slab centre", 0, 0, FilmSet.HEAT_LOSS)
            .point("slab edge", 0, 100, FilmSet.HEAT_LOSS)
            .solve(1e-4);
    assertThat(2 * coupling(result, "indoors", "outdoors")).isCloseTo(1.1107475, within(2e-4));
    assertThat(2 * psiValue(result, "half")).isCloseTo(0.7368703, within(2e-4));
    assertThat(point(result, "slab centre") / 20).isCloseTo(0.532942, within(2e-4));
    assertThat(point(result, "slab edge") / 20).isCloseTo(0.555072, within(2e-4));
    assertThat(result.warnings()).isEmpty();
  }

  /** The same ψ when the undisturbed wall is solved as a detail of its own and taken off. */
  @Test
  void another_detail_can_be_taken_off() {
    DrawnDetail plain =
        new DrawnDetail()
            .view(View.UPRIGHT)
            .box(INDOORS, -500, 0, 0, 1100)
            .box(OUTDOORS, 200, 0, 700, 1100)
            .box(material("insulation", 0.035), 0, 0, 200, 1100);
    Result result =
        halfSlab()
            .psi(
                "half",
                IN,
                OUT,
                Map.of(),
                INTERNAL,
                new Subtraction.OfDetail("plain wall", plain.detail(), IN, OUT))
            .solve(1e-4);
    assertThat(2 * psiValue(result, "half")).isCloseTo(0.7368703, within(2e-4));
    assertThat(psi(result, "half").subtracted())
        .singleElement()
        .satisfies(term -> assertThat(term.uWPerM2K()).isEmpty());
    assertThat(result.assumptions())
        .anyMatch(a -> a.what().equals("in 'plain wall': film at indoors, heat loss"));
  }

  /** The half-widths of both details add up in ψ, and their sum is what was asked for. */
  @Test
  void a_detail_and_one_taken_off_share_the_accuracy() {
    for (double asked = 2e-4; asked < 2e-3; asked *= 1.2) {
      Result result =
          Solver.solve(
              halfSlab()
                  .psi("half", IN, OUT, Map.of(), INTERNAL, off("itself", halfSlab(), IN))
                  .detail(),
              new Accuracy(1, 1, asked, 1, 100_000),
              Progress.SILENT);
      assertThat(psi(result, "half").valueWPerMK().halfWidth()).isPositive().isLessThan(asked);
    }
  }

  @Test
  void a_fault_in_a_detail_that_is_taken_off_names_it() {
    DrawnDetail broken =
        new DrawnDetail().box(material("brick", 0.5), 0, 0, 100, 100).know(room("attic", 5));
    assertThat(
            catchThrowableOfType(
                    DetailException.class,
                    () ->
                        halfSlab()
                            .psi("half", IN, OUT, Map.of(), INTERNAL, off("lost", broken, IN))
                            .inspect())
                .faults())
        .anyMatch(f -> f.name().equals("lost") && f.message().contains("space 'attic'"));
    assertThat(
            catchThrowableOfType(
                    DetailException.class,
                    () ->
                        halfSlab()
                            .psi(
                                "half",
                                IN,
                                OUT,
                                Map.of(),
                                INTERNAL,
                                off("strange", halfSlab(), List.of("attic")))
                            .inspect())
                .faults())
        .singleElement()
        .matches(f -> f.name().equals("strange") && f.message().contains("'attic'"));
  }

  private static Subtraction off(String name, DrawnDetail drawn, List<String> warm) {
    return new Subtraction.OfDetail(name, drawn.detail(), warm, OUT);
  }

  /**
   * Wall on a slab on ground, ISO 13370 by numbers: B' 8 m, U of the floor by the formula of the
   * standard; L2D, ψ and the corner computed on a graded mesh.
   */
  @Test
  void slab_edge_on_the_ground() {
    double lowest = -20165;
    double floorU = 0.19496568;
    Result result =
        new DrawnDetail()
            .view(View.UPRIGHT)
            .box(INDOORS, -4000, 0, 0, 1500)
            .box(OUTDOORS, 380, -165, 20380, 1500)
            .box(material("soil", 2.0), -4000, lowest, 20380, -165)
            .box(material("screed", 1.35), -4000, -65, 0, 0)
            .box(material("floor insulation", 0.035), -4000, -165, 0, -65)
            .box(material("slab", 2.3), -4000, -315, 0, -165)
            .box(material("foundation", 1.65), 0, -800, 240, -315)
            .box(material("masonry", 0.5), 0, -315, 240, 1500)
            .box(material("wall insulation", 0.035), 240, -165, 380, 1500)
            .typedFlank("ground", floorU, INTERNAL, 4)
            .psi("internal", IN, OUT, INTERNAL)
            .psi(
                "external",
                IN,
                OUT,
                Map.of(),
                EXTERNAL,
                new Subtraction.OfFlank("top flank", OptionalDouble.empty()),
                new Subtraction.OfFlank("ground", OptionalDouble.of(4.38)))
            .point("corner", 0, 0, FilmSet.HEAT_LOSS)
            .solve(1e-4);
    assertThat(coupling(result, "indoors", "outdoors"))
        .isCloseTo(1.346202, within(0.0002 * 1.346202));
    assertThat(psiValue(result, "internal")).isCloseTo(0.243759, within(5e-4));
    assertThat(psiValue(result, "external")).isCloseTo(0.134188, within(5e-4));
    assertThat(point(result, "corner") / 20).isCloseTo(0.838506, within(8e-4));
    Result.SurfacePoint coldest = space(result, "indoors").coldest().orElseThrow();
    assertThat(coldest.fRsi().orElseThrow()).isCloseTo(0.788359, within(4e-4));
    assertThat(coldest.at().distance(new Point(0, 0))).isLessThan(1e-9);
  }

  /** Invariance: a junction turned, mirrored and moved far away is the same junction. */
  @Test
  void a_turned_and_mirrored_junction_gives_the_same_numbers() {
    Result upright = balcony(new DrawnDetail().view(View.UPRIGHT)).solve(2e-4);
    double angle = Math.toRadians(17);
    double cos = Math.cos(angle);
    double sin = Math.sin(angle);
    Result turned =
        balcony(
                new DrawnDetail()
                    .view(View.up(-sin, cos))
                    .moved(
                        p ->
                            new Point(1e4 - p.x() * cos - p.y() * sin, -p.x() * sin + p.y() * cos)))
            .solve(2e-4);
    for (String name : List.of("internal", "overall", "external")) {
      assertThat(psiValue(turned, name)).isCloseTo(psiValue(upright, name), within(4e-4));
    }
    assertThat(coupling(turned, "indoors", "outdoors"))
        .isCloseTo(coupling(upright, "indoors", "outdoors"), within(4e-4));
    assertThat(space(turned, "indoors").coldest().orElseThrow().temperatureC())
        .isCloseTo(space(upright, "indoors").coldest().orElseThrow().temperatureC(), within(0.02));
    assertThat(turned.flanks())
        .extracting(f -> f.name() + " " + String.join(", ", f.layers()))
        .containsExactlyInAnyOrderElementsOf(
            upright.flanks().stream()
                .map(f -> f.name() + " " + String.join(", ", f.layers()))
                .toList());
    assertThat(turned.warnings()).isEmpty();
    assertThat(upright.warnings()).isEmpty();
    assertThat(
            psi(upright, "internal").subtracted().stream()
                .mapToDouble(t -> t.lengthM().orElse(0))
                .sum())
        .isCloseTo(2.9, within(1e-9));
  }

  private static DrawnDetail balcony(DrawnDetail drawn) {
    return drawn
        .box(INDOORS, -1500, -1700, 0, 1400)
        .box(OUTDOORS, 300, -1700, 2000, 1400)
        .box(material("brick", 0.5), 0, -1700, 180, 1400)
        .box(material("insulation", 0.035), 180, -1700, 300, 1400)
        .box(material("concrete", 2.3), -1500, -200, 1500, 0)
        .psi("internal", IN, OUT, INTERNAL)
        .psi("overall", IN, OUT, OVERALL_INTERNAL)
        .psi("external", IN, OUT, EXTERNAL);
  }

  /** Away from a re-entrant corner the flow near a close plane is not one-dimensional. */
  @Test
  void a_cut_off_plane_in_disturbed_flow_is_told_with_the_departure() {
    Result near =
        new DrawnDetail()
            .view(View.UPRIGHT)
            .box(INDOORS, -500, 0, 0, 250)
            .box(OUTDOORS, 200, 0, 700, 250)
            .box(material("masonry", 0.5), 0, 0, 200, 250)
            .box(material("steel", 50), 0, 0, 200, 100)
            .symmetry("axis", 0, 0, 200, 0)
            .solve(1e-3);
    assertThat(near.warnings())
        .anyMatch(w -> w.contains("depart from one-dimensional flow by up to"));
    Result far = halfSlab().solve(1e-3);
    assertThat(far.warnings()).isEmpty();
  }
}
