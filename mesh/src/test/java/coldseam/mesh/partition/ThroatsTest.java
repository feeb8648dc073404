package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Places narrower than a width part a face; areas by hand, mm². */
class ThroatsTest {
  private static final double WIDTH = 0.002;

  private static List<Point> ring(double turn, double... xy) {
    List<Point> ring = new ArrayList<>();
    double c = Math.cos(Math.toRadians(turn));
    double s = Math.sin(Math.toRadians(turn));
    for (int i = 0; i < xy.length; i += 2) {
      double x = xy[i] / 1000;
      double y = xy[i + 1] / 1000;
      ring.add(new Point(c * x - s * y, s * x + c * y));
    }
    return ring;
  }

  private static List<Double> areas(double turn, double[]... rings) {
    List<List<Point>> all = new ArrayList<>();
    for (double[] xy : rings) {
      all.add(ring(turn, xy));
    }
    Partition partition =
        Partition.of(List.of(new LabelledArea(0, all)), List.of(), Resolution.STANDARD);
    List<Double> areas = new ArrayList<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      double sum = 0;
      for (List<List<Point>> piece : Throats.pieces(partition, face, WIDTH)) {
        double area = area(piece);
        areas.add(Math.rint(area * 1e9) / 1e3);
        sum += area;
      }
      assertThat(sum).isCloseTo(partition.faceArea(face), within(1e-9 * sum));
    }
    areas.sort(Double::compare);
    return areas;
  }

  private static Offset<Double> within(double of) {
    return Offset.offset(of);
  }

  static double area(List<List<Point>> rings) {
    double twice = 0;
    for (List<Point> ring : rings) {
      for (int i = 0; i < ring.size(); i++) {
        Point a = ring.get(i);
        Point b = ring.get((i + 1) % ring.size());
        twice += a.x() * b.y() - b.x() * a.y();
      }
    }
    return twice / 2;
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17, 45, 90, 211})
  void two_chambers_joined_by_a_channel_of_2_mm_are_two_and_the_channel_a_third(double turn) {
    double[] dumbbell = {
      0, 0, 20, 0, 20, 9, 30, 9, 30, 0, 50, 0, 50, 20, 30, 20, 30, 11, 20, 11, 20, 20, 0, 20
    };
    assertThat(areas(turn, dumbbell)).containsExactly(20.0, 400.0, 400.0);
  }

  @Test
  void a_step_within_a_straight_channel_does_not_part_it() {
    double[] dumbbell = {
      0, 0, 20, 0, 20, 9, 30, 9, 30, 0, 50, 0, 50, 20, 30, 20, 30, 10.8, 25, 10.8, 25, 11, 20, 11,
      20, 20, 0, 20
    };
    assertThat(areas(0, dumbbell)).containsExactly(19.0, 400.0, 400.0);
  }

  @Test
  void a_channel_of_more_than_2_mm_joins() {
    double[] dumbbell = {
      0, 0, 20, 0, 20, 9, 30, 9, 30, 0, 50, 0, 50, 20, 30, 20, 30, 11.01, 20, 11.01, 20, 20, 0, 20
    };
    assertThat(areas(0, dumbbell)).containsExactly(820.1);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void two_corners_that_nearly_meet_part_by_one_cut(double turn) {
    // the halves: trapezoids of 20 and 1 mm, 10 mm high
    double[] waist = {0, 0, 20, 0, 10.5, 10, 20, 20, 0, 20, 9.5, 10};
    assertThat(areas(turn, waist)).containsExactly(105.0, 105.0);
  }

  @Test
  void a_wedge_that_ends_far_from_the_other_wall_parts_nothing() {
    assertThat(areas(0, new double[] {0, 0, 20, 0, 20, 20, 0, 20, 9, 10.5, 9, 9.5}))
        .containsExactly(305.5);
  }

  @Test
  void a_bar_near_a_wall_leaves_a_gap_of_its_own() {
    double[] chamber = {0, 0, 40, 0, 40, 40, 0, 40};
    double[] bar = {10, 1.5, 30, 1.5, 30, 20, 10, 20};
    assertThat(areas(0, chamber, bar)).containsExactly(30.0, 1600 - 20 * 18.5 - 30);
  }

  @Test
  void a_dead_end_slot_is_a_gap_but_a_nook_shallower_than_wide_is_not() {
    double[] slot = {0, 0, 20, 0, 20, 20, 11, 20, 11, 30, 9.5, 30, 9.5, 20, 0, 20};
    double[] nook = {0, 0, 20, 0, 20, 20, 11, 20, 11, 21, 9.5, 21, 9.5, 20, 0, 20};
    assertThat(areas(0, slot)).containsExactly(15.0, 400.0);
    assertThat(areas(0, nook)).containsExactly(401.5);
  }

  @Test
  void a_round_waist_is_cut_once_though_many_chords_come_near() {
    List<Double> xy = new ArrayList<>();
    // left side straight, right side a bulge of radius 10 that comes within 1.2 mm of it
    xy.addAll(List.of(0.0, -30.0, 20.0, -30.0));
    for (int i = 0; i <= 60; i++) {
      double a = Math.toRadians(-90 - 3.0 * i);
      xy.add(11.2 + 10 * Math.cos(a));
      xy.add(10 * Math.sin(a));
    }
    xy.addAll(List.of(20.0, 30.0, 0.0, 30.0));
    double[] ring = xy.stream().mapToDouble(Double::doubleValue).toArray();
    // each half: 312 mm² beside the wedge, 112 less a quarter of a disc beside the bulge
    double half = 312 + 112 - Math.PI * 100 / 4;
    List<Double> areas = areas(0, ring);
    assertThat(areas).hasSize(2).allSatisfy(a -> assertThat(a).isCloseTo(half, within(0.1)));
  }

  @Test
  void a_wedge_that_runs_to_a_point_is_whole() {
    assertThat(areas(0, new double[] {0, 0, 60, 0, 60, 4})).containsExactly(120.0);
  }

  @Test
  void a_narrow_strip_alone_is_whole() {
    assertThat(areas(0, new double[] {0, 0, 40, 0, 40, 1.5, 0, 1.5})).containsExactly(60.0);
  }

  /** Random unions of boxes at random angles, cut at random widths: nothing is lost. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void cutting_conserves_area_and_never_fails(long seed) {
    Random random = new Random(seed);
    for (int trial = 0; trial < 60; trial++) {
      List<LabelledArea> areas = new ArrayList<>();
      int boxes = 2 + random.nextInt(7);
      double turn = random.nextBoolean() ? 0 : random.nextDouble() * 90;
      for (int i = 0; i < boxes; i++) {
        double x = random.nextInt(40);
        double y = random.nextInt(40);
        double w = random.nextInt(3) == 0 ? 1 + random.nextDouble() : 2 + random.nextInt(30);
        double h = random.nextInt(3) == 0 ? 1 + random.nextDouble() : 2 + random.nextInt(30);
        double own = random.nextInt(4) == 0 ? random.nextDouble() * 90 : turn;
        int label = random.nextInt(4) == 0 ? 1 : 0;
        areas.add(
            new LabelledArea(label, List.of(ring(own, x, y, x + w, y, x + w, y + h, x, y + h))));
      }
      Partition partition = Partition.of(areas, List.of(), Resolution.STANDARD);
      for (int face = 0; face < partition.faceCount(); face++) {
        double width = random.nextInt(3) == 0 ? 0.010 : WIDTH;
        double sum = 0;
        for (List<List<Point>> piece : Throats.pieces(partition, face, width)) {
          double area = area(piece);
          assertThat(area).as("seed %d trial %d", seed, trial).isPositive();
          sum += area;
        }
        assertThat(sum)
            .as("seed %d trial %d", seed, trial)
            .isCloseTo(partition.faceArea(face), within(1e-9 * partition.faceArea(face)));
      }
    }
  }
}
