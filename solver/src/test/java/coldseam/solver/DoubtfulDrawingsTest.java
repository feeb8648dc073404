package coldseam.solver;

import static coldseam.solver.DrawnDetail.floating;
import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static coldseam.solver.detail.DimensionSystem.INTERNAL;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * Drawings that can be solved but hardly mean what they say. The figures expected are read off the
 * drawings: lengths in mm, U of 300 mm of λ = 0.5 between films of 0.13 and 0.04 by ISO 6946.
 */
class DoubtfulDrawingsTest {
  private static final Space INDOORS = room("indoors", 20);
  private static final Space OUTDOORS = outdoors(0);
  private static final Material MASONRY = material("masonry", 0.5);
  private static final List<String> IN = List.of("indoors");
  private static final List<String> OUT = List.of("outdoors");

  /** A wall of 1 m between cut-off planes, inside below. */
  private static DrawnDetail wall(Space inside, Space outside) {
    return new DrawnDetail()
        .box(outside, 0, 300, 1000, 500)
        .box(inside, 0, -200, 1000, 0)
        .box(MASONRY, 0, 0, 1000, 300);
  }

  /** Two leaves with a gap between them that nothing covers. */
  private static DrawnDetail leaves(double gapMm) {
    return new DrawnDetail()
        .box(OUTDOORS, 0, 300 + gapMm, 1000, 500 + gapMm)
        .box(INDOORS, 0, -200, 1000, 0)
        .box(MASONRY, 0, 0, 1000, 100)
        .box(material("cladding", 1), 0, 100 + gapMm, 1000, 300 + gapMm);
  }

  @Test
  void a_plain_wall_is_beyond_doubt() {
    assertThat(wall(INDOORS, OUTDOORS).psi("all", IN, OUT, INTERNAL).inspect().warnings())
        .isEmpty();
  }

  @Test
  void spaces_that_no_material_joins() {
    DrawnDetail drawn =
        leaves(40).want(new Wanted.Transmittance("wall", IN, OUT, OptionalDouble.empty()));
    assertThat(drawn.inspect().warnings())
        .contains(
            "no heat path joins 'outdoors' and 'indoors': no connected material faces both; L2D"
                + " between them is 0",
            "'masonry' at (0, 0) mm: detached from the rest and facing 'indoors' alone; no heat"
                + " flows through it",
            "'cladding' at (0, 140) mm: detached from the rest and facing 'outdoors' alone; no"
                + " heat flows through it");
    Result result = drawn.solve(1e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value()).isCloseTo(0, within(1e-12));
    assertThat(result.couplings().get(0).valueWPerMK().halfWidth()).isLessThan(1e-10);
    assertThat(result.unknowns()).isLessThan(5000);
    assertThat(result.shares().parts()).isEmpty();
  }

  @Test
  void spaces_joined_by_a_floating_one_have_a_path() {
    DrawnDetail drawn = leaves(40).box(floating(room("cavity", 0), 0, ""), 0, 100, 1000, 140);
    assertThat(drawn.inspect().warnings()).isEmpty();
  }

  @Test
  void material_detached_from_the_rest() {
    DrawnDetail drawn =
        wall(INDOORS, OUTDOORS)
            .box(material("rail", 50), 100, -150, 200, -100)
            .box(material("rail", 50), 300, -150, 400, -100);
    assertThat(drawn.inspect().warnings())
        .containsExactly(
            "'rail' at (100, -150) mm and 1 more like it: detached from the rest and facing"
                + " 'indoors' alone; no heat flows through it");
  }

  @Test
  void a_flank_left_out_of_a_stated_list() {
    DrawnDetail drawn =
        new DrawnDetail()
            .box(OUTDOORS, -1500, -1500, 800, 800)
            .box(MASONRY, -1500, -1500, 300, 300)
            .box(INDOORS, -1500, -1500, 0, 0)
            .flank("left", new Point(-1.5, 0.15), Optional.empty(), Map.of())
            .flank("below", new Point(0.15, -1.5), Optional.empty(), Map.of());
    Subtraction left = new Subtraction.OfFlank("left", OptionalDouble.empty());
    Subtraction below = new Subtraction.OfFlank("below", OptionalDouble.empty());
    Subtraction known = new Subtraction.OfKnown("pier", Bracket.of(1.3), 1.5);
    drawn
        .psi("half", IN, OUT, Map.of(), INTERNAL, left)
        .psi("whole", IN, OUT, Map.of(), INTERNAL, left, below)
        .psi("known", IN, OUT, Map.of(), INTERNAL, left, known);
    // U = 1/(0.13 + 0.6 + 0.04) = 1.298701, times 1.5 m
    assertThat(drawn.inspect().warnings())
        .containsExactly(
            "ψ 'half': its list leaves out flank 'below', which lies between its two sides; not"
                + " subtracted: U·l = 1.2987 W/(m²·K) × 1500 mm = 1.94805 W/(m·K)");
  }

  @Test
  void air_that_meets_other_air() {
    DrawnDetail drawn =
        new DrawnDetail()
            .box(OUTDOORS, 0, 0, 1000, 500)
            .box(INDOORS, 0, -200, 1000, 0)
            .box(MASONRY, 0, 0, 900, 300);
    assertThat(drawn.inspect().warnings())
        .contains(
            "'outdoors' meets 'indoors' with nothing between them along 100 mm from (900, 0) mm:"
                + " no heat is counted there");
    DrawnDetail zones = wall(INDOORS, OUTDOORS).box(room("corner", 20), 0, -200, 300, 0);
    assertThat(zones.inspect().warnings()).noneMatch(w -> w.contains("meets"));
  }

  @Test
  void a_typed_width_that_is_not_the_drawn_one() {
    DrawnDetail drawn =
        wall(INDOORS, OUTDOORS)
            .want(new Wanted.Transmittance("wall", IN, OUT, OptionalDouble.of(0.6)))
            .want(new Wanted.Transmittance("true", IN, OUT, OptionalDouble.of(1.0005)));
    assertThat(drawn.inspect().warnings())
        .containsExactly(
            "U of wall: its typed width 600 mm differs from the 1000 mm between the two cut-off"
                + " planes");
  }

  @Test
  void stretches_with_different_conditions_on_one_edge() {
    DrawnDetail drawn =
        wall(INDOORS, OUTDOORS)
            .facing("face", "indoors", 0, 0, 800, 0)
            .facing("again", "indoors", 0, 0, 100, 0)
            .stretch("heated", new EdgeCondition.HeatFlow(10), 600, 0, 1000, 0);
    assertThat(drawn.inspect().warnings())
        .contains(
            "stretches 'face' and 'heated' say different things along the same 200 mm: the later"
                + " one, 'heated', counts there")
        .noneMatch(warning -> warning.contains("'again'"));
  }

  @Test
  void temperatures_the_wrong_way_round_or_all_alike() {
    assertThat(wall(room("indoors", -5), outdoors(20)).inspect().warnings())
        .containsExactly(
            "outside 'outdoors' at 20 °C is warmer than inside 'indoors' at -5 °C: is it meant?");
    assertThat(wall(room("indoors", 20), outdoors(20)).inspect().warnings())
        .containsExactly(
            "every space is at 20 °C: no heat flows; only L2D, ψ and U have a meaning");
    DrawnDetail heated =
        wall(room("indoors", 20), outdoors(20))
            .stretch("heated", new EdgeCondition.HeatFlow(10), 600, 0, 1000, 0);
    assertThat(heated.inspect().warnings()).noneMatch(w -> w.contains("no heat flows"));
  }
}
