package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.data.Offset.offset;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.detail.Area.Role;
import coldseam.solver.detail.CornerRule;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * The wooden frame of ISO 10077-2, annex D, case D.4, drawn with x along the wall and y from
 * outside to inside, cavities as solids of the equivalent conductivity that the standard's formulas
 * give (0.205031, 0.130367 and, slightly ventilated, 0.142834). References *computed*: uniform
 * meshes of elements of degree 7, six digits stable; those of the standard *from memory*: L2D
 * 0.346, U_f 1.36, within 3 %.
 */
class FramesTest {
  private static final Material WOOD = material("wood", 0.13);
  private static final Material EPDM = material("EPDM", 0.25);
  private static final Material PANEL = material("panel", 0.035);
  private static final Material GLASS = material("glass", 1.0);
  private static final Material GAS = material("gas", 0.034);
  private static final Material SEALANT = material("sealant", 0.40);

  /** The frame without what it holds, with the air on both sides and points to look at. */
  private static DrawnDetail frame(CornerRule corners) {
    DrawnDetail d = new DrawnDetail();
    d.box(room("indoors", 20), 0, 18, 300, 120);
    d.box(outdoors(0), 0, -40, 300, 18);
    d.polygon(WOOD, 0, 0, 0, 66, 42, 66, 42, 15, 63, 15, 63, 0);
    d.polygon(
        WOOD, 68, 0, 68, 18, 48, 18, 48, 69, 26, 69, 26, 83, 110, 83, 110, 49, 90, 49, 90, 15, 110,
        15, 110, 0);
    d.box(EPDM, 26, 66, 42, 69);
    d.box(EPDM, 48, 15, 63, 18);
    d.box(EPDM, 95, 46, 110, 49);
    d.box(EPDM, 95, 15, 110, 18);
    d.box(material("cavity 42", 0.205031), 42, 15, 48, 69);
    d.box(material("cavity 90", 0.130367), 90, 15, 95, 49);
    d.box(material("groove 63", 0.142834), 63, 0, 68, 18);
    return d.want(wanted(corners, OptionalDouble.empty(), List.of()));
  }

  private static Wanted.Frame wanted(
      CornerRule corners, OptionalDouble width, List<Double> visible) {
    return new Wanted.Frame(
        List.of("indoors"),
        List.of("outdoors"),
        Wanted.Frame.PANEL_W_PER_MK,
        width,
        visible,
        corners,
        Optional.empty());
  }

  private static DrawnDetail withPanel(CornerRule corners) {
    return frame(corners).infill(Role.PANEL, PANEL, 95, 18, 300, 18, 300, 46, 95, 46);
  }

  /** 4/20/4 with a box of aluminium, 0.4 mm thick and filled, 6 mm high on 3 mm of sealant. */
  private static DrawnDetail withGlazing(Material spacerWall, double wallMm) {
    DrawnDetail d = frame(CornerRule.LIMITED);
    box(d, GLASS, 95, 18, 300, 22);
    box(d, GLASS, 95, 42, 300, 46);
    box(d, GAS, 104, 22, 300, 42);
    box(d, SEALANT, 95, 22, 98, 42);
    box(d, spacerWall, 98, 22, 104, 42);
    box(d, material("core", 0.13), 98 + wallMm, 22 + wallMm, 104 - wallMm, 42 - wallMm);
    return d;
  }

  private static void box(
      DrawnDetail d, Material fill, double x0, double y0, double x1, double y1) {
    d.infill(Role.GLAZING, fill, x0, y0, x1, y0, x1, y1, x0, y1);
  }

  private static double frameU(Result result) {
    return result.transmittances().get(0).valueWPerM2K().value();
  }

  @Test
  void the_whole_protrusion_gives_the_published_case() {
    Result result =
        withPanel(CornerRule.WHOLE)
            .point("inner corner", 110, 46, FilmSet.HEAT_LOSS)
            .point("outer step", 26, 66, FilmSet.HEAT_LOSS)
            .point("wall edge", 0, 66, FilmSet.HEAT_LOSS)
            .point("sash edge", 110, 83, FilmSet.HEAT_LOSS)
            .point("panel", 300, 46, FilmSet.HEAT_LOSS)
            .point("outside", 0, 0, FilmSet.HEAT_LOSS)
            .solve(1e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(0.345783, offset(0.000010))
        .isCloseTo(0.346, offset(0.03 * 0.346));
    assertThat(frameU(result))
        .isCloseTo(1.36278, offset(0.00010))
        .isCloseTo(1.36, offset(0.03 * 1.36));
    assertThat(result.points().stream().mapToDouble(Result.PointResult::temperatureC).toArray())
        .containsExactly(
            new double[] {15.153, 15.265, 15.600, 18.737, 17.320, 1.109}, offset(0.002));
  }

  @Test
  void at_most_30_mm_gives_a_little_more() {
    Result result =
        withPanel(CornerRule.LIMITED).point("corner", 110, 46, FilmSet.HEAT_LOSS).solve(1e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(0.345883, offset(0.000010));
    assertThat(frameU(result)).isCloseTo(1.36370, offset(0.00010));
    assertThat(result.points().get(0).temperatureC()).isCloseTo(15.167, offset(0.002));
    assertThat(result.assumptions())
        .filteredOn(line -> line.what().startsWith("reduced film"))
        .extracting(line -> line.what() + ": " + line.value())
        .containsExactlyInAnyOrder(
            "reduced film at the inner corner (26, 66) mm: 0.2 m²·K/W over 17 mm of the protrusion"
                + " and 17 mm beside it",
            "reduced film at the inner corner (110, 46) mm: 0.2 m²·K/W over 30 mm of the protrusion"
                + " and 30 mm beside it");
  }

  /** U_f·b_f + U_p·b_p is L2D, and the interval of U_f is that of L2D less a number, over b_f. */
  @Test
  void the_account_adds_up_with_its_intervals() {
    Result result = withPanel(CornerRule.LIMITED).solve(1e-3);
    Result.Frame frame = result.frame().orElseThrow();
    assertThat(frame.width().valueM()).isCloseTo(0.110, offset(1e-9));
    assertThat(frame.innerM()).isCloseTo(0.110, offset(1e-9));
    assertThat(frame.outerM()).isCloseTo(0.110, offset(1e-9));
    assertThat(frame.glazedCouplingWPerMK()).isEmpty();
    Result.Subtracted panel = frame.panels().get(0);
    assertThat(panel.lengthM().getAsDouble()).isCloseTo(0.190, offset(1e-9));
    // ISO 6946: 0.13 + 0.028/0.035 + 0.04.
    assertThat(panel.uWPerM2K().orElseThrow().mid()).isCloseTo(1 / 0.97, offset(1e-9));
    var coupling = (Certificate.Certified) frame.couplingWPerMK().certificate();
    var u = (Certificate.Certified) result.transmittances().get(0).valueWPerM2K().certificate();
    assertThat(u.lower()).isCloseTo((coupling.lower() - 0.19 / 0.97) / 0.11, offset(1e-9));
    assertThat(u.upper()).isCloseTo((coupling.upper() - 0.19 / 0.97) / 0.11, offset(1e-9));
    assertThat(u.upper() - u.lower()).isLessThan(2 * 1e-3 * u.lower());
    assertThat(u.lower()).isLessThan(1.36370);
    assertThat(u.upper()).isGreaterThan(1.36370);
    assertThat(result.psi()).isEmpty();
  }

  /** *Computed* as above: L2D 0.4726 with the glazing, U_g 1.30508, ψ_g 0.0746; 9.77 °C. */
  @Test
  void glass_edge_with_an_aluminium_spacer() {
    Result result =
        withGlazing(material("aluminium", 160), 0.4)
            .point("corner", 110, 46, FilmSet.HEAT_LOSS)
            .solve(2e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value()).isCloseTo(0.4726, offset(0.0002));
    assertThat(frameU(result)).isCloseTo(1.36370, offset(0.0003));
    Result.LinearTransmittance edge = result.psi().get(0);
    assertThat(edge.of()).isEqualTo("glass edge");
    assertThat(edge.valueWPerMK().value()).isCloseTo(0.0746, offset(0.0002));
    assertThat(edge.valueWPerMK().certified()).isTrue();
    Result.Subtracted glazing = edge.subtracted().get(1);
    assertThat(glazing.uWPerM2K().orElseThrow().mid()).isCloseTo(1.30508, offset(0.00001));
    assertThat(glazing.lengthM().getAsDouble()).isCloseTo(0.190, offset(1e-9));
    assertThat(result.points().get(0).temperatureC()).isCloseTo(9.77, offset(0.02));
    assertThat(result.frame().orElseThrow().couplingWPerMK().value())
        .isCloseTo(0.345883, offset(0.00003));
  }

  /**
   * *Computed*: bilinear elements on a rectangular grid of 0.25 mm around the spacer, 0.45037, and
   * of 0.5 mm, 0.45049, extrapolated to 0.4503; so that ψ_g is 0.4503 − 0.1500 − 0.2480.
   */
  @Test
  void glass_edge_with_a_thin_steel_spacer() {
    Result result = withGlazing(material("stainless steel", 17), 0.2).solve(2e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value()).isCloseTo(0.4503, offset(0.0001));
    assertThat(result.psi().get(0).valueWPerMK().value()).isCloseTo(0.0523, offset(0.0001));
  }

  /** Sensitivities of ψ_g against a run with another conductivity of the spacer. */
  @Test
  void what_the_glass_edge_hangs_on() {
    Result base = withGlazing(material("stainless steel", 17), 0.2).solve(1e-4);
    Result more = withGlazing(material("stainless steel", 17.17), 0.2).solve(1e-4);
    double slope =
        (more.psi().get(0).valueWPerMK().value() - base.psi().get(0).valueWPerMK().value())
            / Math.log(1.01);
    // Euler: ψ is of degree 1 in all conductivities and films together, those of the panel
    // included.
    assertThat(base.psi().get(0).sensitivities().stream().mapToDouble(s -> s.slope()).sum())
        .isCloseTo(base.psi().get(0).valueWPerMK().value(), offset(1e-4));
    assertThat(base.psi().get(0).sensitivities())
        .filteredOn(s -> s.of().equals("stainless steel"))
        .singleElement()
        .satisfies(s -> assertThat(s.slope()).isCloseTo(slope, offset(0.02 * slope)));
  }

  /** A mirror image on the left makes a mullion: twice the panels, twice the frame. */
  @Test
  void panels_on_both_sides_are_both_taken_off() {
    DrawnDetail half = withPanel(CornerRule.LIMITED);
    DrawnDetail both = withPanel(CornerRule.LIMITED);
    both.moved(p -> new coldseam.mesh.plane.Point(-p.x(), p.y()));
    both.box(room("indoors", 20), 0, 18, 300, 120);
    both.box(outdoors(0), 0, -40, 300, 18);
    both.polygon(WOOD, 0, 0, 0, 66, 42, 66, 42, 15, 63, 15, 63, 0);
    both.polygon(
        WOOD, 68, 0, 68, 18, 48, 18, 48, 69, 26, 69, 26, 83, 110, 83, 110, 49, 90, 49, 90, 15, 110,
        15, 110, 0);
    both.box(EPDM, 26, 66, 42, 69);
    both.box(EPDM, 48, 15, 63, 18);
    both.box(EPDM, 95, 46, 110, 49);
    both.box(EPDM, 95, 15, 110, 18);
    both.box(material("cavity 42", 0.205031), 42, 15, 48, 69);
    both.box(material("cavity 90", 0.130367), 90, 15, 95, 49);
    both.box(material("groove 63", 0.142834), 63, 0, 68, 18);
    both.infill(Role.PANEL, PANEL, 95, 18, 300, 18, 300, 46, 95, 46);
    Result one = half.solve(1e-4);
    Result two = both.solve(1e-4);
    assertThat(two.couplings().get(0).valueWPerMK().value())
        .isCloseTo(2 * one.couplings().get(0).valueWPerMK().value(), offset(2e-5));
    assertThat(two.frame().orElseThrow().panels()).hasSize(2);
    assertThat(two.frame().orElseThrow().width().valueM()).isCloseTo(0.220, offset(1e-9));
    assertThat(frameU(two)).isCloseTo(frameU(one), offset(1e-4));
  }

  /** Heat flows horizontally through a sill section too, which stays an upright one. */
  @Test
  void an_upright_frame_has_the_films_of_a_plan() {
    DrawnDetail upright = withPanel(CornerRule.WHOLE).view(coldseam.solver.detail.View.up(0, 1));
    Result result = upright.solve(1e-4);
    assertThat(frameU(result)).isCloseTo(1.36278, offset(0.00010));
    assertThat(result.detail().view().plan()).isFalse();
    assertThat(result.detail().view().upY()).isEqualTo(1);
  }

  /** Turned by 30° nothing changes: corners, lengths and films follow the drawing. */
  @Test
  void a_turned_frame_is_the_same_frame() {
    double cos = Math.cos(Math.toRadians(30));
    double sin = Math.sin(Math.toRadians(30));
    DrawnDetail turned = new DrawnDetail();
    turned.moved(
        p -> new coldseam.mesh.plane.Point(cos * p.x() - sin * p.y(), sin * p.x() + cos * p.y()));
    turned.box(room("indoors", 20), 0, 18, 300, 120);
    turned.box(outdoors(0), 0, -40, 300, 18);
    turned.box(WOOD, 0, 0, 100, 80);
    turned.infill(Role.PANEL, PANEL, 100, 18, 300, 18, 300, 46, 100, 46);
    turned.want(wanted(CornerRule.LIMITED, OptionalDouble.empty(), List.of()));
    DrawnDetail straight = new DrawnDetail();
    straight.box(room("indoors", 20), 0, 18, 300, 120);
    straight.box(outdoors(0), 0, -40, 300, 18);
    straight.box(WOOD, 0, 0, 100, 80);
    straight.infill(Role.PANEL, PANEL, 100, 18, 300, 18, 300, 46, 100, 46);
    straight.want(wanted(CornerRule.LIMITED, OptionalDouble.empty(), List.of()));
    Result a = turned.solve(1e-4);
    Result b = straight.solve(1e-4);
    assertThat(frameU(a)).isCloseTo(frameU(b), offset(1e-4));
    assertThat(a.frame().orElseThrow().width().valueM()).isCloseTo(0.100, offset(1e-9));
  }

  @Test
  void a_film_typed_on_a_stretch_wins_and_so_does_the_word() {
    double limited = frameU(withPanel(CornerRule.LIMITED).solve(1e-4));
    double none = frameU(withPanel(CornerRule.NONE).solve(1e-4));
    double typed =
        frameU(
            withPanel(CornerRule.LIMITED)
                .facing(
                    "inside",
                    "indoors",
                    FilmRule.ISO_6946_INSIDE,
                    0,
                    66,
                    26,
                    66,
                    26,
                    83,
                    110,
                    83,
                    110,
                    46,
                    300,
                    46)
                .solve(1e-4));
    assertThat(none).isGreaterThan(limited + 0.01);
    assertThat(typed).isCloseTo(none, offset(1e-4));
  }

  @Test
  void stated_lengths_replace_those_of_the_drawing() {
    DrawnDetail d = new DrawnDetail();
    d.box(room("indoors", 20), 0, 18, 300, 120);
    d.box(outdoors(0), 0, -40, 300, 18);
    d.box(WOOD, 0, 0, 100, 80);
    d.infill(Role.PANEL, PANEL, 100, 18, 300, 18, 300, 46, 100, 46);
    d.want(wanted(CornerRule.NONE, OptionalDouble.of(0.120), List.of(0.150)));
    Result result = d.solve(1e-3);
    double coupling = result.couplings().get(0).valueWPerMK().value();
    assertThat(frameU(result)).isCloseTo((coupling - 0.150 / 0.97) / 0.120, offset(1e-9));
    assertThat(result.warnings())
        .anyMatch(w -> w.contains("150 mm") && w.contains("190 mm"))
        .anyMatch(w -> w.contains("add up to 270 mm") && w.contains("300 mm"));
  }

  /** ISO 10077-2: b_f is the larger of both projections, and lengths are those of that side. */
  @Test
  void the_wider_side_counts() {
    DrawnDetail d = new DrawnDetail();
    d.box(room("indoors", 20), 0, 18, 300, 120);
    d.box(outdoors(0), 0, -40, 300, 18);
    d.polygon(WOOD, 0, 0, 100, 0, 100, 18, 80, 18, 80, 80, 0, 80);
    d.infill(Role.PANEL, PANEL, 80, 18, 300, 18, 300, 46, 80, 46);
    d.want(wanted(CornerRule.LIMITED, OptionalDouble.empty(), List.of()));
    Result.Frame frame = d.solve(1e-3).frame().orElseThrow();
    assertThat(frame.innerM()).isCloseTo(0.080, offset(1e-9));
    assertThat(frame.outerM()).isCloseTo(0.100, offset(1e-9));
    assertThat(frame.width().valueM()).isCloseTo(0.100, offset(1e-9));
    assertThat(frame.panels().get(0).lengthM().getAsDouble()).isCloseTo(0.200, offset(1e-9));
    assertThat(frame.width().from().orElseThrow().y()).isCloseTo(0, offset(1e-9));
    assertThat(frame.width().to().orElseThrow().x()).isCloseTo(0.100, offset(1e-9));
  }

  @Test
  void a_spacer_that_is_not_marked_is_told() {
    DrawnDetail d = frame(CornerRule.LIMITED);
    box(d, GLASS, 95, 18, 300, 22);
    box(d, GLASS, 95, 42, 300, 46);
    box(d, GAS, 95, 22, 300, 42);
    assertThat(d.inspect().warnings()).noneMatch(w -> w.contains("not marked"));
    d.box(material("spacer", 2), 98, 22, 104, 42);
    assertThat(d.inspect().warnings())
        .filteredOn(w -> w.contains("not marked"))
        .singleElement()
        .asString()
        .startsWith("area ");
  }

  @Test
  void a_frame_that_holds_nothing_is_a_mistake() {
    DrawnDetail d = frame(CornerRule.LIMITED).box(PANEL, 95, 18, 300, 46);
    assertThatThrownBy(d::inspect)
        .isInstanceOf(DetailException.class)
        .hasMessageContaining("part: glazing");
  }
}
