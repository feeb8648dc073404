package coldseam.solver.detail;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.DrawnDetail;
import coldseam.solver.detail.Conditions.Kind;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.function.IntPredicate;
import org.junit.jupiter.api.Test;

/**
 * The conventional surface resistances are those of ISO 6946:2017 (inside 0.10 upward, 0.13
 * horizontal, 0.17 downward; outside 0.04; horizontal up to 30° from the horizontal) and ISO 13788
 * (0.25 inside, 0.13 on glazing and frames, 0.04 outside).
 */
class ConditionsTest {
  private static final Space INDOORS = room("indoors", 20);
  private static final Space OUTDOORS = outdoors(0);
  private static final Material BRICK = material("brick", 0.5);

  /** A slab between two spaces, cut at both ends; vertical view. */
  private static DrawnDetail slab(Space above, Space below) {
    return new DrawnDetail()
        .view(View.UPRIGHT)
        .box(above, 0, 200, 1000, 500)
        .box(below, 0, -300, 1000, 0)
        .box(BRICK, 0, 0, 1000, 200);
  }

  private static Map<String, Double> filmLengths(DrawnDetail drawn, FilmSet set) {
    Detail detail = drawn.detail();
    Partition partition = drawn.partition();
    Conditions conditions = Conditions.of(detail, partition, set);
    Map<String, Double> lengths = new TreeMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (conditions.kind(edge) == Kind.FILM) {
        lengths.merge(
            detail.spaces().get(conditions.space(edge)).name() + " " + conditions.filmM2KPerW(edge),
            partition.edgeLength(edge),
            Double::sum);
      }
    }
    return lengths;
  }

  private static double length(Partition partition, IntPredicate accepted) {
    double sum = 0;
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      sum += accepted.test(edge) ? partition.edgeLength(edge) : 0;
    }
    return sum;
  }

  private static List<Fault> faults(DrawnDetail drawn) {
    return catchThrowableOfType(DetailException.class, () -> drawn.conditions(FilmSet.HEAT_LOSS))
        .faults();
  }

  @Test
  void every_edge_of_the_outline_has_the_condition_of_what_lies_beyond() {
    DrawnDetail drawn =
        slab(INDOORS, OUTDOORS)
            .box(new Hollow("duct"), 100, 50, 200, 150)
            .box(material("nothing", 0), 300, 50, 350, 100)
            .box(material("steel", 50), 500, 50, 600, 150);
    Partition partition = drawn.partition();
    Conditions conditions = drawn.conditions(FilmSet.HEAT_LOSS);
    assertThat(length(partition, e -> conditions.kind(e) == Kind.FILM)).isEqualTo(2, within(1e-9));
    assertThat(length(partition, e -> conditions.kind(e) == Kind.CUT_OFF))
        .isEqualTo(0.4, within(1e-9));
    assertThat(length(partition, e -> conditions.kind(e) == Kind.HOLLOW))
        .isEqualTo(0.6, within(1e-9));
    int steel = drawn.detail().fills().indexOf(material("steel", 50));
    assertThat(
            length(
                partition,
                e ->
                    conditions.kind(e) == Kind.NONE
                        && (partition.leftLabel(e) == steel || partition.rightLabel(e) == steel)))
        .isEqualTo(0.4, within(1e-9));
    assertThat(conditions.cutOffPlanes()).hasSize(2);
    assertThat(conditions.cutOffPlanes()).allMatch(plane -> Math.abs(plane.lengthM() - 0.2) < 1e-9);
  }

  @Test
  void the_film_follows_the_direction_of_heat_flow() {
    assertThat(filmLengths(slab(OUTDOORS, INDOORS), FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.1", "outdoors 0.04");
    assertThat(filmLengths(slab(INDOORS, OUTDOORS), FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.17", "outdoors 0.04");
    // in summer the same room is the coldest: heat comes down through the roof into it
    assertThat(filmLengths(slab(outdoors(30), room("indoors", 24)), FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.17", "outdoors 0.04");
    assertThat(filmLengths(slab(INDOORS, OUTDOORS).view(View.PLAN), FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.13", "outdoors 0.04");
    assertThat(filmLengths(slab(INDOORS, OUTDOORS), FilmSet.SURFACE))
        .containsOnlyKeys("indoors 0.25", "outdoors 0.04");
  }

  @Test
  void films_turn_with_the_drawing_and_its_up() {
    double angle = Math.toRadians(17);
    DrawnDetail drawn =
        new DrawnDetail()
            .moved(p -> turned(p, angle))
            .view(View.up(-Math.sin(angle), Math.cos(angle)))
            .box(OUTDOORS, 0, 200, 1000, 500)
            .box(INDOORS, 0, -300, 1000, 0)
            .box(BRICK, 0, 0, 1000, 200);
    assertThat(filmLengths(drawn, FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.1", "outdoors 0.04");
  }

  private static Point turned(Point p, double angle) {
    return new Point(
        1e4 + p.x() * Math.cos(angle) - p.y() * Math.sin(angle),
        p.x() * Math.sin(angle) + p.y() * Math.cos(angle));
  }

  @Test
  void surfaces_steeper_than_sixty_degrees_take_the_horizontal_value() {
    for (double[] slopeAndFilm : new double[][] {{59.9, 0.10}, {60, 0.13}, {60.1, 0.13}}) {
      double rise = Math.tan(Math.toRadians(slopeAndFilm[0]));
      DrawnDetail drawn =
          new DrawnDetail()
              .view(View.UPRIGHT)
              .box(OUTDOORS, -100, -5000, 1100, 5000)
              .polygon(INDOORS, 0, -3000, 1000, -3000, 1000, 1000 * rise, 0, 0)
              .polygon(BRICK, 0, 0, 1000, 1000 * rise, 1000, 1000 * rise + 400, 0, 400);
      assertThat(filmLengths(drawn, FilmSet.HEAT_LOSS)).containsKey("indoors " + slopeAndFilm[1]);
    }
  }

  @Test
  void where_the_direction_cannot_be_decided_the_horizontal_value_is_taken_and_listed() {
    DrawnDetail drawn =
        slab(INDOORS, room("cellar", 10)).facing("edge", "outdoors", 1000, 0, 1000, 200);
    drawn.know(OUTDOORS);
    assertThat(filmLengths(drawn, FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.17", "cellar 0.13", "outdoors 0.04");
    assertThat(drawn.conditions(FilmSet.HEAT_LOSS).assumptions())
        .anyMatch(
            line ->
                line.what().contains("direction of heat flow at cellar")
                    && line.value().contains("1000 mm")
                    && line.value().contains("0.13"));
    assertThat(filmLengths(slab(INDOORS, room("other", 20)), FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.13", "other 0.13");
    Space floating = DrawnDetail.floating(room("cellar", 0), 0, "");
    assertThat(filmLengths(slab(INDOORS, floating), FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.13", "cellar 0.13");
  }

  @Test
  void glazing_takes_its_own_film_in_the_surface_set() {
    DrawnDetail byArea =
        slab(INDOORS, OUTDOORS).glazing(material("glass", 1), 700, 0, 900, 0, 900, 200, 700, 200);
    assertThat(filmLengths(byArea, FilmSet.SURFACE))
        .containsOnlyKeys("indoors 0.13", "indoors 0.25", "outdoors 0.04");
    assertThat(filmLengths(byArea, FilmSet.SURFACE).get("indoors 0.13"))
        .isEqualTo(0.2, within(1e-9));
    assertThat(filmLengths(byArea, FilmSet.HEAT_LOSS))
        .containsOnlyKeys("indoors 0.17", "outdoors 0.04");

    DrawnDetail sameFill =
        slab(INDOORS, OUTDOORS).glazing(BRICK, 700, 0, 900, 0, 900, 200, 700, 200);
    sameFill.along("split", false, 700, 200, 900, 200);
    assertThat(filmLengths(sameFill, FilmSet.SURFACE).get("indoors 0.13"))
        .isEqualTo(0.2, within(1e-9));

    DrawnDetail byStretch = slab(INDOORS, OUTDOORS).along("pane", true, 100, 200, 400, 200);
    assertThat(filmLengths(byStretch, FilmSet.SURFACE).get("indoors 0.13"))
        .isEqualTo(0.3, within(1e-9));
  }

  @Test
  void the_last_stretch_with_a_condition_counts() {
    DrawnDetail drawn =
        slab(INDOORS, OUTDOORS)
            .stretch("heated", new EdgeCondition.HeatFlow(5), 0, 200, 600, 200)
            .stretch("shut", new EdgeCondition.CutOff(true), 300, 200, 600, 200)
            .facing("bath", "indoors", FilmRule.uniform(0, "typed"), 500, 200, 600, 200)
            .along("report", false, 0, 200, 1000, 200);
    Partition partition = drawn.partition();
    Conditions conditions = drawn.conditions(FilmSet.HEAT_LOSS);
    assertThat(length(partition, e -> conditions.kind(e) == Kind.FLOW))
        .isEqualTo(0.3, within(1e-9));
    assertThat(length(partition, e -> conditions.flowWPerM2(e) == 5)).isEqualTo(0.3, within(1e-9));
    assertThat(length(partition, conditions::symmetry)).isEqualTo(0.2, within(1e-9));
    assertThat(length(partition, e -> conditions.kind(e) == Kind.FIXED && conditions.space(e) == 0))
        .isEqualTo(0.1, within(1e-9));
    assertThat(length(partition, e -> conditions.stretches(e).contains(3)))
        .isEqualTo(1, within(1e-9));
  }

  @Test
  void the_films_of_each_space_and_each_cut_off_plane_are_listed() {
    assertThat(slab(INDOORS, OUTDOORS).conditions(FilmSet.HEAT_LOSS).assumptions())
        .extracting(line -> line.what() + ": " + line.value())
        .contains(
            "film at indoors, heat loss: 0.17 m²·K/W downward",
            "film at outdoors, heat loss: 0.04 m²·K/W",
            "cut-off plane: (0, 200) mm to (0, 0) mm, 200 mm, no heat crosses");
  }

  @Test
  void spaces_that_touch_carry_nothing_and_are_listed() {
    DrawnDetail drawn = slab(INDOORS, OUTDOORS).box(room("hall", 18), 1000, 0, 1500, 400);
    assertThat(drawn.conditions(FilmSet.HEAT_LOSS).assumptions())
        .anyMatch(
            line ->
                line.what().equals("spaces that touch: hall and indoors")
                    && line.value().startsWith("200 mm"));
  }

  @Test
  void everything_at_fault_is_reported_together() {
    DrawnDetail drawn =
        slab(INDOORS, OUTDOORS)
            .know(room("attic", 5))
            .box(material("lost", 1), 2000, 0, 2100, 100)
            .facing("nowhere", "indoors", 0, 900, 500, 900)
            .facing("misspelt", "indors", 0, 200, 500, 200);
    assertThat(faults(drawn))
        .extracting(fault -> fault.part() + " " + fault.name())
        .containsExactly("stretch misspelt", "space attic", "stretch nowhere", "section lost");
    assertThat(faults(drawn))
        .anyMatch(fault -> fault.message().contains("none of its 500 mm"))
        .anyMatch(fault -> fault.message().contains("(2000, 0) mm"));
  }

  @Test
  void a_section_without_a_conductor_is_at_fault() {
    DrawnDetail drawn = new DrawnDetail().box(INDOORS, 0, 0, 1, 1).box(OUTDOORS, 1, 0, 2, 1);
    assertThat(faults(drawn)).singleElement().matches(f -> f.message().contains("conductivity"));
  }

  @Test
  void parts_that_meet_in_one_point_only_are_separate() {
    DrawnDetail drawn =
        new DrawnDetail()
            .box(INDOORS, 0, -100, 100, 0)
            .box(BRICK, 0, 0, 100, 100)
            .box(material("timber", 0.13), 100, 100, 200, 200);
    assertThat(faults(drawn)).singleElement().matches(f -> f.name().equals("timber"));
  }

  @Test
  void a_floating_space_needs_a_way_to_a_stated_temperature() {
    Space cellar = DrawnDetail.floating(room("cellar", 0), 0, "");
    Space attic = DrawnDetail.floating(room("attic", 0), 0, "");
    assertThat(faults(slab(cellar, attic)))
        .extracting(Fault::name)
        .containsExactlyInAnyOrder("cellar", "attic");
    Space led = DrawnDetail.floating(room("cellar", 0), 1, "outdoors");
    DrawnDetail drawn = slab(led, attic).know(OUTDOORS);
    assertThat(drawn.conditions(FilmSet.HEAT_LOSS).spaceCount()).isEqualTo(3);
    Space lost = DrawnDetail.floating(room("cellar", 0), 1, "garden");
    assertThat(faults(slab(INDOORS, lost))).anyMatch(f -> f.message().contains("garden"));
  }

  @Test
  void a_material_is_asked_for_only_where_there_is_one() {
    Conditions conditions = slab(INDOORS, OUTDOORS).conditions(FilmSet.HEAT_LOSS);
    int brick = slab(INDOORS, OUTDOORS).detail().fills().indexOf(BRICK);
    assertThat(conditions.material(brick)).isEqualTo(BRICK);
    assertThat(conditions.conducts(Partition.NONE)).isFalse();
    assertThatThrownBy(() -> conditions.material(0)).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void lengths_and_places_are_written_in_millimetres() {
    assertThat(Wording.length(1.5)).isEqualTo("1500 mm");
    assertThat(Wording.length(0.00000123456)).isEqualTo("0.001235 mm");
    assertThat(Wording.length(0.01)).isEqualTo("10 mm");
    assertThat(Wording.length(12.34567)).isEqualTo("12345.7 mm");
    assertThat(Wording.place(new Point(1e4, -0.00001))).isEqualTo("(10000000, 0) mm");
    assertThat(Wording.figure(1.0 / 3)).isEqualTo("0.333333");
    assertThat(Wording.figure(0)).isEqualTo("0");
    assertThat(Optional.of(Wording.figure(100))).contains("100");
  }
}
