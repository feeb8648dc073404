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
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.View;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * Flanks found in drawings, their U by ISO 6946 and their lengths by the dimension systems of ISO
 * 13789: internal between finished inner faces without partitions, overall internal with them,
 * external between finished outer faces. Expected lengths are read off the drawings.
 */
class FlanksTest {
  private static final Space INDOORS = room("indoors", 20);
  private static final Space OUTDOORS = outdoors(0);
  private static final Material BRICK = material("brick", 0.5);
  private static final Material CONCRETE = material("concrete", 2);
  private static final List<String> IN = List.of("indoors");
  private static final List<String> OUT = List.of("outdoors");

  /** A wall, inner face x = 0, outer face x = 300, of a given height, between the two spaces. */
  private static DrawnDetail wall(double bottom, double top) {
    return new DrawnDetail()
        .view(View.UPRIGHT)
        .box(INDOORS, -1500, bottom, 0, top)
        .box(OUTDOORS, 300, bottom, 2000, top)
        .box(BRICK, 0, bottom, 300, top);
  }

  private static DrawnDetail corner() {
    return new DrawnDetail()
        .box(OUTDOORS, -1500, -1500, 800, 800)
        .box(BRICK, -1500, -1500, 300, 300)
        .box(INDOORS, -1500, -1500, 0, 0);
  }

  private static Result.FlankResult flank(DrawnDetail drawn, String name) {
    return drawn.inspect().flanks().stream()
        .filter(flank -> flank.name().equals(name))
        .findFirst()
        .orElseThrow(() -> new AssertionError(name + " is not among " + drawn.inspect().flanks()));
  }

  private static double length(DrawnDetail drawn, String name, DimensionSystem system) {
    return flank(drawn, name).lengthM().get(system).valueM();
  }

  private static List<Fault> faults(DrawnDetail drawn) {
    return catchThrowableOfType(DetailException.class, drawn::inspect).faults();
  }

  @Test
  void a_corner_is_measured_to_its_inner_and_its_outer_corner() {
    for (String name : List.of("left flank", "bottom flank")) {
      assertThat(length(corner(), name, INTERNAL)).isEqualTo(1.5, within(1e-9));
      assertThat(length(corner(), name, OVERALL_INTERNAL)).isEqualTo(1.5, within(1e-9));
      assertThat(length(corner(), name, EXTERNAL)).isEqualTo(1.8, within(1e-9));
      assertThat(flank(corner(), name).uWPerM2K().mid())
          .isEqualTo(1 / (0.13 + 0.3 / 0.5 + 0.04), within(1e-12));
    }
    assertThat(corner().inspect().flanks()).hasSize(2);
    Result.Length external = flank(corner(), "left flank").lengthM().get(EXTERNAL);
    assertThat(external.from().orElseThrow().distance(new Point(-1.5, 0.3))).isLessThan(1e-9);
    assertThat(external.to().orElseThrow().distance(new Point(0.3, 0.3))).isLessThan(1e-9);
  }

  @Test
  void lengths_do_not_change_when_the_drawing_is_turned_and_moved_far_away() {
    double angle = Math.toRadians(17);
    DrawnDetail turned =
        new DrawnDetail()
            .moved(
                p ->
                    new Point(
                        1e4 + p.x() * Math.cos(angle) - p.y() * Math.sin(angle),
                        p.x() * Math.sin(angle) + p.y() * Math.cos(angle)))
            .box(OUTDOORS, -1500, -1500, 800, 800)
            .box(BRICK, -1500, -1500, 300, 300)
            .box(INDOORS, -1500, -1500, 0, 0);
    assertThat(turned.inspect().flanks()).hasSize(2);
    assertThat(length(turned, "left flank", INTERNAL)).isEqualTo(1.5, within(1e-6));
    assertThat(length(turned, "bottom flank", EXTERNAL)).isEqualTo(1.8, within(1e-6));
    assertThat(flank(turned, "left flank").uWPerM2K().mid())
        .isEqualTo(1 / (0.13 + 0.3 / 0.5 + 0.04), within(1e-6));
  }

  @Test
  void a_balcony_slab_counts_in_overall_internal_and_external_lengths_only() {
    DrawnDetail balcony = wall(-1300, 1600).box(CONCRETE, -1500, -200, 1500, 0);
    assertThat(balcony.inspect().flanks()).hasSize(2);
    assertThat(length(balcony, "top flank", INTERNAL)).isEqualTo(1.6, within(1e-9));
    assertThat(length(balcony, "bottom flank", INTERNAL)).isEqualTo(1.1, within(1e-9));
    assertThat(length(balcony, "top flank", OVERALL_INTERNAL)).isEqualTo(1.7, within(1e-9));
    assertThat(length(balcony, "bottom flank", OVERALL_INTERNAL)).isEqualTo(1.2, within(1e-9));
    assertThat(length(balcony, "top flank", EXTERNAL)).isEqualTo(1.7, within(1e-9));
    assertThat(length(balcony, "bottom flank", EXTERNAL)).isEqualTo(1.2, within(1e-9));
    DrawnDetail endless = wall(-1300, 1600).box(CONCRETE, -1500, -200, 2000, 0);
    assertThat(length(endless, "top flank", EXTERNAL)).isEqualTo(1.7, within(1e-9));
  }

  @Test
  void a_floor_that_stops_inside_the_wall_lets_the_outer_face_run_through() {
    DrawnDetail floor = wall(-1300, 1600).box(CONCRETE, -1500, -200, 150, 0);
    assertThat(length(floor, "top flank", INTERNAL)).isEqualTo(1.6, within(1e-9));
    // to the middle of the slab, as the faces opposite tell
    assertThat(length(floor, "top flank", EXTERNAL)).isEqualTo(1.7, within(1e-9));
    assertThat(length(floor, "bottom flank", EXTERNAL)).isEqualTo(1.2, within(1e-9));
  }

  @Test
  void a_face_that_runs_through_without_anything_opposite_is_halved() {
    DrawnDetail plain = wall(-1000, 1400);
    for (DimensionSystem system : DimensionSystem.values()) {
      assertThat(length(plain, "top flank", system)).isEqualTo(1.2, within(1e-9));
      assertThat(length(plain, "bottom flank", system)).isEqualTo(1.2, within(1e-9));
    }
  }

  @Test
  void a_partition_between_two_rooms_is_left_out_of_internal_lengths() {
    DrawnDetail tee = partitionWall();
    assertThat(tee.inspect().flanks())
        .extracting(f -> f.name() + ": " + f.warm() + ", " + f.cold())
        .containsExactlyInAnyOrder(
            "left flank: a, outdoors", "right flank: b, outdoors", "top flank: a, b");
    assertThat(length(tee, "left flank", INTERNAL)).isEqualTo(1.4, within(1e-9));
    assertThat(length(tee, "left flank", OVERALL_INTERNAL)).isEqualTo(1.5, within(1e-9));
    assertThat(length(tee, "right flank", EXTERNAL)).isEqualTo(1.5, within(1e-9));
    assertThat(flank(tee, "left flank").layers())
        .containsExactly("inner 200 mm (λ 1)", "outer 100 mm (λ 0.04)");
    assertThat(flank(tee, "top flank").uWPerM2K().mid())
        .isEqualTo(1 / (0.13 + 0.2 / 1.0 + 0.13), within(1e-12));
  }

  static DrawnDetail partitionWall() {
    Material inner = material("inner", 1);
    return new DrawnDetail()
        .box(room("a", 20), -1500, 0, 0, 1500)
        .box(room("b", 15), 0, 0, 1500, 1500)
        .box(OUTDOORS, -1500, -600, 1500, -300)
        .box(material("outer", 0.04), -1500, -300, 1500, -200)
        .box(inner, -1500, -200, 1500, 0)
        .box(inner, -100, 0, 100, 1500);
  }

  @Test
  void a_plane_of_symmetry_is_no_flank_and_ends_a_length() {
    DrawnDetail half =
        wall(0, 1100)
            .box(CONCRETE, 0, 0, 300, 100)
            .symmetry("middle of the slab", 0, 0, 300, 0)
            .psi("half", IN, OUT, INTERNAL);
    assertThat(half.inspect().flanks()).singleElement().matches(f -> f.name().equals("top flank"));
    assertThat(length(half, "top flank", INTERNAL)).isEqualTo(1.1, within(1e-9));
    assertThat(flank(half, "top flank").lengthM().get(INTERNAL).derivation())
        .contains("plane of symmetry");
  }

  @Test
  void internal_lengths_stay_inside_when_outdoors_is_the_warmer_space() {
    DrawnDetail summer =
        new DrawnDetail()
            .box(outdoors(32), -1500, -1500, 800, 800)
            .box(BRICK, -1500, -1500, 300, 300)
            .box(room("indoors", 24), -1500, -1500, 0, 0);
    assertThat(flank(summer, "left flank").warm()).isEqualTo("outdoors");
    assertThat(length(summer, "left flank", INTERNAL)).isEqualTo(1.5, within(1e-9));
  }

  @Test
  void an_unequal_wall_that_runs_through_cannot_be_shared() {
    DrawnDetail two =
        wall(-1500, 1500)
            .box(material("other brick", 0.3), 0, 0, 300, 1500)
            .psi("joint", IN, OUT, INTERNAL);
    assertThat(faults(two))
        .extracting(Fault::part, Fault::name)
        .containsExactly(
            org.assertj.core.groups.Tuple.tuple("psi", "joint"),
            org.assertj.core.groups.Tuple.tuple("psi", "joint"));
    assertThat(faults(two).get(0).message())
        .contains("state lengths")
        .contains("whose U differs")
        .contains("3000 mm");
    DrawnDetail typed =
        wall(-1500, 1500)
            .box(material("other brick", 0.3), 0, 0, 300, 1500)
            .flank("upper", new Point(0.1, 1.5), Optional.empty(), Map.of(INTERNAL, 1.5))
            .flank("lower", new Point(0.1, -1.5), Optional.empty(), Map.of(INTERNAL, 1.5))
            .psi("joint", IN, OUT, INTERNAL);
    assertThat(length(typed, "upper", INTERNAL)).isEqualTo(1.5);
  }

  @Test
  void a_step_or_a_broken_corner_leaves_the_length_in_doubt() {
    DrawnDetail step =
        wall(0, 1500)
            .box(BRICK, -60, 0, 0, 700)
            .symmetry("axis", -60, 0, 300, 0)
            .psi("step", IN, OUT, INTERNAL);
    assertThat(faults(step)).singleElement().matches(f -> f.message().contains("(-60, 700) mm"));
    DrawnDetail chamfer =
        corner().polygon(BRICK, 0, 0, -100, 0, 0, -100).psi("corner", IN, OUT, INTERNAL);
    assertThat(faults(chamfer))
        .hasSize(2)
        .allMatch(f -> f.message().contains("do not meet in one corner"));
    DrawnDetail external =
        corner().polygon(BRICK, 0, 0, -100, 0, 0, -100).psi("corner", IN, OUT, EXTERNAL);
    assertThat(external.inspect().flanks()).hasSize(2);
  }

  @Test
  void walls_out_of_line_above_and_below_a_slab_leave_the_outer_length_in_doubt() {
    DrawnDetail offset =
        new DrawnDetail()
            .view(View.UPRIGHT)
            .box(OUTDOORS, 0, -1500, 2000, 1500)
            .box(INDOORS, -1500, -1500, 0, 1500)
            .box(BRICK, 0, -1500, 300, 1500)
            .box(BRICK, 0, 0, 400, 1500)
            .box(CONCRETE, -1500, -200, 1000, 0);
    assertThat(length(offset, "top flank", INTERNAL)).isEqualTo(1.5, within(1e-9));
    assertThat(flank(offset, "top flank").lengthM()).doesNotContainKey(EXTERNAL);
    assertThat(faults(offset.psi("slab", IN, OUT, EXTERNAL)).get(0).message())
        .contains("parallel but not in line")
        .contains("200 mm");
  }

  @Test
  void a_cut_that_is_oblique_measures_thickness_square_to_the_faces() {
    DrawnDetail oblique =
        new DrawnDetail()
            .box(INDOORS, -1500, -2000, 0, 2000)
            .box(OUTDOORS, 300, -2000, 2000, 2000)
            .polygon(BRICK, 0, -1500, 300, -1500, 300, 1600, 0, 1500);
    Solver.Inspection inspection = oblique.inspect();
    assertThat(flank(oblique, "top flank").uWPerM2K().mid())
        .isEqualTo(1 / (0.13 + 0.3 / 0.5 + 0.04), within(1e-9));
    assertThat(inspection.warnings())
        .anyMatch(w -> w.contains("'top flank'") && w.contains("not square to the layers"));
  }

  @Test
  void a_conductivity_across_the_layers_counts_for_u() {
    Material board =
        new Material(
            "board",
            0.4,
            0.1,
            Math.toRadians(90),
            0,
            OptionalDouble.empty(),
            OptionalDouble.empty(),
            "typed in the test");
    DrawnDetail drawn = wall(-1500, 1500).box(board, 0, -1500, 300, 1500);
    assertThat(flank(drawn, "top flank").uWPerM2K().mid())
        .isEqualTo(1 / (0.13 + 0.3 / 0.1 + 0.04), within(1e-9));
    assertThat(drawn.inspect().warnings()).noneMatch(w -> w.contains("oblique"));
    Material turned =
        new Material(
            "board",
            0.4,
            0.1,
            Math.toRadians(60),
            0,
            OptionalDouble.empty(),
            OptionalDouble.empty(),
            "typed in the test");
    DrawnDetail skew = wall(-1500, 1500).box(turned, 0, -1500, 300, 1500);
    double across = 0.4 * 0.25 + 0.1 * 0.75;
    assertThat(flank(skew, "top flank").uWPerM2K().mid())
        .isEqualTo(1 / (0.13 + 0.3 / across + 0.04), within(1e-9));
    assertThat(skew.inspect().warnings()).anyMatch(w -> w.contains("oblique to the layers"));
  }

  @Test
  void a_plane_that_is_not_layered_asks_for_a_typed_u_where_a_psi_needs_it() {
    DrawnDetail wedge = wall(-1500, 1500).polygon(CONCRETE, 0, 1500, 100, 1500, 50, 800);
    assertThat(wedge.inspect().flanks())
        .extracting(Result.FlankResult::name)
        .containsExactly("bottom flank");
    assertThat(wedge.inspect().warnings()).anyMatch(w -> w.contains("not layered"));
    assertThat(faults(wedge.psi("joint", IN, OUT, INTERNAL)))
        .anyMatch(f -> f.message().contains("not layered") && f.message().contains("type its U"));
  }

  @Test
  void a_typed_u_counts_and_its_difference_from_the_layers_is_told() {
    double drawnU = 1 / (0.13 + 0.3 / 0.5 + 0.04);
    DrawnDetail drawn =
        wall(-1500, 1500)
            .box(CONCRETE, -1500, -200, 1500, 0)
            .flank("upper", new Point(0.15, 1.5), Optional.of(Bracket.of(1.2)), Map.of())
            .psi("slab", IN, OUT, INTERNAL);
    assertThat(flank(drawn, "upper").uWPerM2K().mid()).isEqualTo(1.2);
    String shift = String.format(java.util.Locale.ROOT, "%+.4f", (drawnU - 1.2) * 1.5);
    assertThat(drawn.inspect().warnings())
        .anyMatch(
            w -> w.contains("1.2987") && w.contains("ψ 'slab' by " + shift) && w.contains("upper"));
    DrawnDetail higher =
        wall(-1500, 1500)
            .flank("upper", new Point(0.15, 1.5), Optional.of(Bracket.of(1.4)), Map.of());
    assertThat(higher.inspect().warnings())
        .anyMatch(w -> w.contains("1.4 differs from the 1.2987"));
    DrawnDetail alike =
        wall(-1500, 1500)
            .flank("upper", new Point(0.15, 1.5), Optional.of(Bracket.of(1.299)), Map.of());
    assertThat(alike.inspect().warnings()).isEmpty();
  }

  @Test
  void named_flanks_attach_to_the_nearest_plane_or_say_why_not() {
    DrawnDetail far = wall(-1500, 1500).flank("up", new Point(0, 3.1), Optional.empty(), Map.of());
    assertThat(faults(far).get(0).message()).contains("1600 mm away");
    DrawnDetail twice =
        wall(-1500, 1500)
            .flank("up", new Point(0, 1.5), Optional.empty(), Map.of())
            .flank("again", new Point(0.2, 1.4), Optional.empty(), Map.of());
    assertThat(faults(twice).get(0).message()).contains("flank 'up'");
    DrawnDetail mirror =
        wall(-1500, 1500)
            .symmetry("axis", 0, 1500, 300, 1500)
            .flank("up", new Point(0, 1.5), Optional.empty(), Map.of());
    assertThat(faults(mirror).get(0).message()).contains("plane of symmetry");
  }

  @Test
  void a_psi_that_subtracts_what_is_not_there_is_at_fault() {
    DrawnDetail drawn =
        partitionWall()
            .psi(
                "one",
                List.of("a"),
                OUT,
                Map.of(),
                INTERNAL,
                new Subtraction.OfFlank("roof", OptionalDouble.empty()))
            .psi(
                "two",
                List.of("a"),
                OUT,
                Map.of(),
                INTERNAL,
                new Subtraction.OfFlank("top flank", OptionalDouble.empty()))
            .psi("three", List.of("a"), List.of("a"), INTERNAL)
            .psi("four", List.of("a"), List.of("garden"), INTERNAL);
    assertThat(faults(drawn))
        .extracting(f -> f.name() + ": " + f.message())
        .anyMatch(m -> m.startsWith("one: subtracts flank 'roof'") && m.contains("left flank"))
        .anyMatch(m -> m.startsWith("two: ") && m.contains("separates a and b"))
        .anyMatch(m -> m.startsWith("three: ") && m.contains("on both sides"))
        .anyMatch(m -> m.startsWith("four: ") && m.contains("'garden'"))
        .hasSize(4);
  }

  @Test
  void a_flank_without_a_plane_counts_by_itself_only_between_two_spaces() {
    DrawnDetail two =
        wall(-1500, 1500).typedFlank("ground", 0.2, INTERNAL, 4).psi("joint", IN, OUT, INTERNAL);
    assertThat(two.inspect().assumptions())
        .anyMatch(
            line ->
                line.value().contains("'ground', 'bottom flank', 'top flank'")
                    || line.value().contains("'ground', 'top flank', 'bottom flank'"));
    DrawnDetail three =
        partitionWall()
            .typedFlank("ground", 0.2, INTERNAL, 4)
            .psi("joint", List.of("a"), OUT, INTERNAL);
    assertThat(faults(three)).singleElement().matches(f -> f.message().contains("more than two"));
  }

  @Test
  void cut_off_planes_too_near_the_junction_are_told_with_both_distances() {
    DrawnDetail near = wall(-1300, 800).box(CONCRETE, -1500, -200, 1500, 0);
    assertThat(near.inspect().warnings())
        .singleElement()
        .matches(w -> w.contains("changes 800 mm from it") && w.contains("asks for 1000 mm"));
    DrawnDetail thick =
        new DrawnDetail()
            .box(INDOORS, -1500, -2000, 0, 2000)
            .box(OUTDOORS, 500, -2000, 2000, 2000)
            .box(BRICK, 0, -1300, 500, 1600)
            .box(CONCRETE, -1500, -200, 1500, 0);
    assertThat(thick.inspect().warnings())
        .singleElement()
        .matches(w -> w.contains("changes 1100 mm from it") && w.contains("asks for 1500 mm"));
    assertThat(wall(-400, 400).inspect().warnings()).isEmpty();
    DrawnDetail hidden = wall(-1500, 1500).box(CONCRETE, 100, 700, 150, 750);
    assertThat(hidden.inspect().warnings())
        .singleElement()
        .matches(w -> w.contains("changes 750 mm from it"));
  }

  @Test
  void a_plane_that_ends_where_two_parts_meet_in_a_point_belongs_to_its_own_part() {
    DrawnDetail drawn =
        new DrawnDetail()
            .know(INDOORS)
            .know(OUTDOORS)
            .box(BRICK, 0, 0, 300, 1000)
            .box(CONCRETE, 300, 1000, 600, 2000)
            .facing("lower inside", "indoors", 0, 0, 0, 1000)
            .facing("lower outside", "outdoors", 300, 0, 300, 1000)
            .facing("upper inside", "indoors", 300, 1000, 300, 2000)
            .facing("upper outside", "outdoors", 600, 1000, 600, 2000);
    double brick = 1 / (0.13 + 0.3 / 0.5 + 0.04);
    double concrete = 1 / (0.13 + 0.3 / 2 + 0.04);
    assertThat(drawn.inspect().flanks())
        .extracting(f -> f.uWPerM2K().mid())
        .usingElementComparator((a, b) -> Math.abs(a - b) < 1e-9 ? 0 : Double.compare(a, b))
        .containsExactlyInAnyOrder(brick, brick, concrete, concrete);
  }

  @Test
  void a_plane_is_one_only_as_far_as_it_is_straight_and_marked_alike() {
    DrawnDetail drawn = wall(-1500, 1500).symmetry("half of it", 0, 1500, 100, 1500);
    assertThat(drawn.inspect().heatLoss().cutOffPlanes())
        .extracting(plane -> plane.symmetry() + " " + Math.round(plane.lengthM() * 1000))
        .containsExactlyInAnyOrder("true 100", "false 200", "false 300");
    DrawnDetail broken =
        new DrawnDetail()
            .box(INDOORS, -1500, -2000, 0, 2000)
            .box(OUTDOORS, 300, -2000, 2000, 2000)
            .polygon(BRICK, 0, -1500, 300, -1500, 300, 1500, 150, 1501, 0, 1500);
    assertThat(broken.inspect().heatLoss().cutOffPlanes()).hasSize(3);
  }
}
