package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Material;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Shapes against their areas and places by elementary geometry. */
class SectionReaderTest {
  @TempDir private Path folder;

  private List<Area> areas(String entries) {
    return areas("mm", entries);
  }

  private List<Area> areas(String unit, String entries) {
    String text =
        """
        coldseam: 1
        title: Shapes
        unit: %s
        materials: {a: {conductivity: 1}, b: {conductivity: 2}, p: {conductivity: [3, 1], angle: 30}}
        spaces: {i: {temperature: 1, film: 0.1}, o: {temperature: 0, film: 0.1}}
        section:
        %s"""
            .formatted(unit, entries);
    try {
      return Written.read(folder, text).detail(Optional.empty()).areas();
    } catch (CaseException e) {
      throw new AssertionError(e.problems().toString(), e);
    }
  }

  /** Net area by the even-odd rule, mm²; rings of one shape lie inside each other. */
  private static double mm2(Area area) {
    double sum = 0;
    for (List<Point> ring : area.rings()) {
      double own = Math.abs(shoelace(ring)) * 1e6;
      sum = Math.abs(sum - own);
    }
    return sum;
  }

  private static double shoelace(List<Point> ring) {
    double twice = 0;
    for (int i = 0; i < ring.size(); i++) {
      Point p = ring.get(i);
      Point q = ring.get((i + 1) % ring.size());
      twice += p.x() * q.y() - q.x() * p.y();
    }
    return twice / 2;
  }

  private static void isAt(Point point, double xMm, double yMm) {
    assertThat(point.x() * 1000).isCloseTo(xMm, within(1e-9));
    assertThat(point.y() * 1000).isCloseTo(yMm, within(1e-9));
  }

  @Test
  void boxes_may_be_given_by_any_two_opposite_corners() {
    List<Area> laid =
        areas("- {fill: a, box: [100, 50, 0, 0]}\n- {fill: b, box: [0, 50, 100, 0]}\n");
    assertThat(laid.get(0).rings()).isEqualTo(laid.get(1).rings());
    assertThat(mm2(laid.get(0))).isCloseTo(5000, within(1e-9));
    assertThat(laid).extracting(Area::name).containsExactly("section[1] (a)", "section[2] (b)");
  }

  @Test
  void units_of_length_scale_the_drawing() {
    double[] metres = {0.001, 0.01, 1, 0.0254};
    String[] units = {"mm", "cm", "m", "in"};
    for (int i = 0; i < 4; i++) {
      Area box = areas(units[i], "- {fill: a, box: [0, 0, 3, 2]}\n").get(0);
      assertThat(mm2(box) * 1e-6).isCloseTo(6 * metres[i] * metres[i], within(1e-12));
    }
  }

  @Test
  void a_closed_polygon_may_repeat_its_first_corner() {
    List<Area> laid =
        areas(
            "- {fill: a, polygon: [[0, 0], [30, 0], [0, 40]]}\n"
                + "- {fill: a, polygon: [[0, 0], [30, 0], [30, 0], [0, 40], [0, 0]]}\n");
    assertThat(laid.get(0).rings()).isEqualTo(laid.get(1).rings());
    assertThat(mm2(laid.get(0))).isCloseTo(600, within(1e-9));
  }

  @Test
  void a_polygon_may_touch_itself() {
    // A square frame drawn with a bridge of no width, and two triangles that share a corner.
    List<Area> laid =
        areas(
            "- {fill: a, polygon: [[0,0],[9,0],[9,9],[0,9],[0,0],[3,3],[3,6],[6,6],[6,3],[3,3]]}\n"
                + "- {fill: a, polygon: [[0,0],[5,5],[10,0],[10,10],[5,5],[0,10]]}\n");
    assertThat(mm2(laid.get(0))).isCloseTo(81 - 9, within(1e-9));
    assertThat(mm2(laid.get(1))).isCloseTo(50, within(1e-9));
  }

  @Test
  void discs_have_the_area_of_the_circle_whatever_the_chords() {
    for (int chords : new int[] {3, 4, 7, 24, 96, 1000}) {
      Area disc =
          areas("- {fill: a, disc: {centre: [7, -3], radius: 20, chords: " + chords + "}}\n")
              .get(0);
      assertThat(disc.rings().get(0)).hasSize(chords);
      assertThat(mm2(disc)).isCloseTo(Math.PI * 400, within(1e-9));
    }
    Area usual = areas("- {fill: a, disc: {centre: [7, -3], radius: 20}}\n").get(0);
    assertThat(usual.rings().get(0)).hasSize(96);
  }

  @Test
  void sectors_have_the_area_of_the_sector() {
    for (double[] span : new double[][] {{0, 90}, {-45, 45}, {30, 300}, {350, 370}}) {
      Area sector =
          areas(
                  "- {fill: a, disc: {centre: [1, 2], radius: 20, from: %s, to: %s}}\n"
                      .formatted(span[0], span[1]))
              .get(0);
      double share = (span[1] - span[0]) / 360;
      assertThat(mm2(sector)).isCloseTo(share * Math.PI * 400, within(1e-9));
      assertThat(sector.rings().get(0)).contains(new Point(0.001, 0.002));
    }
  }

  @Test
  void the_chords_of_a_disc_are_an_assumption_with_their_deviation() throws CaseException {
    String text =
        Written.WALL + "  - {fill: steel, disc: {centre: [120, 500], radius: 20, chords: 12}}\n";
    // r' = r √(α / sin α) with α = 30°; the corners stick out by r' − r, the middles lie in by
    // r − r' cos 15°.
    double corner = 20 * Math.sqrt(Math.PI / 6 / 0.5);
    double deviation = Math.max(corner - 20, 20 - corner * Math.cos(Math.PI / 12));
    assertThat(Written.read(folder, text).detail(Optional.empty()).assumptions())
        .anySatisfy(
            assumption -> {
              assertThat(assumption.what()).isEqualTo("round edge of section[4] (steel)");
              assertThat(assumption.value())
                  .startsWith("12 chords of equal area, at most ")
                  .contains(Double.toString(deviation).substring(0, 6));
            });
  }

  @Test
  void strips_have_mitred_corners() {
    Area angle =
        areas("- {fill: a, strip: {along: [[0, 0], [100, 0], [100, 50]], thickness: 2}}\n").get(0);
    // Centre lines of 100 and 50 meet in a mitre: the corner square counts once.
    assertThat(mm2(angle)).isCloseTo(2 * 150, within(1e-9));
    assertThat(angle.rings().get(0)).hasSize(6);
    isAt(angle.rings().get(0).get(1), 101, -1);
    Area left =
        areas(
                "- {fill: a, strip: {along: [[0, 0], [100, 0], [100, 50]], thickness: 2,"
                    + " lies: left}}\n")
            .get(0);
    assertThat(mm2(left)).isCloseTo(2 * (100 + 50 - 2), within(1e-9));
    Area right =
        areas(
                "- {fill: a, strip: {along: [[0, 0], [100, 0], [100, 50]], thickness: 2,"
                    + " lies: right}}\n")
            .get(0);
    assertThat(mm2(right)).isCloseTo(2 * (100 + 50 + 2), within(1e-9));
    isAt(right.rings().get(0).get(1), 102, -2);
  }

  @Test
  void a_strip_back_to_its_beginning_is_a_frame() {
    Area frame =
        areas(
                "- {fill: a, strip: {along: [[0, 0], [100, 0], [100, 50], [0, 50], [0, 0]],"
                    + " thickness: 2}}\n")
            .get(0);
    assertThat(frame.rings()).hasSize(2);
    assertThat(mm2(frame)).isCloseTo(102 * 52 - 98 * 48, within(1e-9));
  }

  @Test
  void stacks_lay_layers_from_the_face() {
    List<Area> laid =
        areas(
            """
            - {stack: {face: [[0, 0], [0, 100]], towards: left}, layers: [[a, 10], [b, 5]]}
            - {stack: {face: [[0, 0], [0, 100]], towards: right}, layers: [[a, 10]]}
            - {stack: {face: [[0, 0], [40, 30]], towards: up}, layers: [[a, 10], [b, 2]], name: n}
            - {stack: {face: [[0, 0], [40, 30]], towards: [1, -1]}, layers: [[a, 10]]}
            """);
    isAt(laid.get(0).rings().get(0).get(2), -10, 100);
    isAt(laid.get(1).rings().get(0).get(2), -15, 100);
    assertThat(mm2(laid.get(1))).isCloseTo(500, within(1e-9));
    isAt(laid.get(2).rings().get(0).get(2), 10, 100);
    // The face rises 3 in 4; its normal upwards is (−0.6, 0.8).
    isAt(laid.get(3).rings().get(0).get(3), -6, 8);
    isAt(laid.get(4).rings().get(0).get(3), -7.2, 9.6);
    isAt(laid.get(5).rings().get(0).get(3), 6, -8);
    assertThat(laid.get(4).name()).isEqualTo("section[3].layer[2] (n, b)");
  }

  @Test
  void groups_are_mirrored_then_turned_then_moved_then_repeated() {
    List<Area> laid =
        areas(
            """
            - group: [{fill: a, polygon: [[10, 0], [20, 0], [20, 5]]}]
              mirror: {across: [[0, 0], [0, 1]], keep: true}
              rotate: {by: 90}
              move: [100, 0]
              repeat: {times: 3, step: [0, 1000]}
            """);
    assertThat(laid).hasSize(6);
    // (20, 5) is turned to (−5, 20) and moved to (95, 20); its image (−20, 5) to (95, −20).
    isAt(laid.get(0).rings().get(0).get(2), 95, 20);
    isAt(laid.get(1).rings().get(0).get(2), 95, -20);
    isAt(laid.get(5).rings().get(0).get(2), 95, 1980);
    for (Area area : laid) {
      assertThat(mm2(area)).isCloseTo(25, within(1e-9));
    }
    assertThat(laid).extracting(Area::name).doesNotHaveDuplicates();
  }

  @Test
  void motions_keep_areas_and_distances() {
    Random random = new Random(4711);
    for (int i = 0; i < 200; i++) {
      Point p = point(random);
      Point q = point(random);
      Point about = point(random);
      Motion motion =
          i % 2 == 0
              ? Motion.rotation(random.nextDouble() * 720 - 360, about)
              : Motion.reflection(about, point(random));
      assertThat(motion.of(p).distance(motion.of(q))).isCloseTo(p.distance(q), within(1e-12));
      assertThat(motion.of(about).distance(about)).isLessThan(1e-12);
      double determinant = motion.a() * motion.d() - motion.b() * motion.c();
      assertThat(determinant).isCloseTo(i % 2 == 0 ? 1 : -1, within(1e-12));
    }
  }

  private static Point point(Random random) {
    return new Point(random.nextDouble() * 10 - 5, random.nextDouble() * 10 - 5);
  }

  @Test
  void the_grain_of_an_orthotropic_material_turns_with_its_group() {
    List<Area> laid =
        areas(
            """
            - {fill: p, box: [0, 0, 1, 1]}
            - {group: [{fill: p, box: [0, 0, 1, 1]}], rotate: {by: 17}}
            - {group: [{fill: p, box: [0, 0, 1, 1]}], rotate: {by: 180}}
            - {group: [{fill: p, box: [0, 0, 1, 1]}], mirror: {across: [[0, 0], [0, 1]]}}
            - {group: [{fill: p, box: [0, 0, 1, 1]}], move: [3, 0], repeat: {times: 2, step: [1, 0]}}
            - {group: [{group: [{fill: p, box: [0, 0, 1, 1]}], rotate: {by: 17}}], rotate: {by: -17}}
            - {group: [{fill: a, box: [0, 0, 1, 1]}], rotate: {by: 17}}
            """);
    double[] degrees = {30, 47, 30, 150, 30, 30, 30};
    for (int i = 0; i < degrees.length; i++) {
      Material planks = (Material) laid.get(i).fill();
      assertThat(Math.toDegrees(planks.angleRad())).isCloseTo(degrees[i], within(1e-9));
      assertThat(planks.conductivityWPerMK()).isEqualTo(3);
    }
    assertThat(laid.get(1).fill().name()).isEqualTo("p, along 47 deg");
    assertThat(laid.get(5).fill()).isSameAs(laid.get(0).fill());
    assertThat(laid.get(7).fill().name()).isEqualTo("a");
  }

  @Test
  void glazing_and_frames_are_marked() {
    List<Area> laid =
        areas(
            "- {fill: a, box: [0, 0, 1, 1], surface: glazing}\n"
                + "- {fill: a, box: [1, 0, 2, 1], surface: frame}\n"
                + "- {fill: a, box: [2, 0, 3, 1]}\n");
    assertThat(laid).extracting(Area::glazing).containsExactly(true, true, false);
  }
}
