package coldseam.mesh.partition;

import static coldseam.mesh.partition.Drawings.box;
import static coldseam.mesh.partition.Drawings.laid;
import static coldseam.mesh.partition.Drawings.points;
import static coldseam.mesh.partition.Drawings.polygon;
import static coldseam.mesh.partition.Drawings.turned;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PartitionTest {
  private static final Offset<Double> EXACT = within(1e-14);

  private static Partition of(List<LabelledArea> areas) {
    Partition partition = Partition.of(areas, List.of(), Resolution.STANDARD);
    Audit.check(partition);
    return partition;
  }

  @Test
  void a_later_area_covers_an_earlier_one() {
    Partition partition = of(List.of(box(4, 0, 0, 1, 1), box(5, 0.5, 0, 2, 1)));
    assertThat(partition.faceCount()).isEqualTo(2);
    assertThat(partition.labelArea(4)).isCloseTo(0.5, EXACT);
    assertThat(partition.labelArea(5)).isCloseTo(1.5, EXACT);
    assertThat(partition.labelArea(6)).isZero();
    assertThat(partition.defects()).isEmpty();
    assertThat(partition.vertexCount()).isEqualTo(6);
    assertThat(partition.edgeCount()).isEqualTo(7);
  }

  @Test
  void one_area_may_be_laid_under_and_over_others_of_its_label() {
    Partition partition =
        of(
            List.of(
                box(1, 0, 0, 5, 5),
                box(2, 0.5, 0.5, 4.5, 4.5),
                box(1, 1, 1, 4, 4),
                box(2, 1.5, 1.5, 3.5, 3.5),
                box(1, 2, 2, 3, 3)));
    assertThat(partition.faceCount()).isEqualTo(5);
    assertThat(partition.labelArea(1)).isCloseTo(25 - 16 + 9 - 4 + 1, EXACT);
    assertThat(partition.labelArea(2)).isCloseTo(16 - 9 + 4 - 1, EXACT);
    double[] faces = new double[5];
    for (int f = 0; f < faces.length; f++) {
      faces[f] = partition.faceArea(f);
    }
    assertThat(faces).containsExactlyInAnyOrder(9, 7, 5, 3, 1);
  }

  @Test
  void faces_of_one_label_are_merged_and_straight_vertices_dropped() {
    List<LabelledArea> areas = new ArrayList<>();
    for (int i = 0; i < 10; i++) {
      areas.add(box(3, i / 10.0, 0, (i + 1) / 10.0, 1));
    }
    Partition partition = of(laid(areas, turned(17, 0, 0)));
    assertThat(partition.faceCount()).isEqualTo(1);
    assertThat(partition.vertexCount()).isEqualTo(4);
    assertThat(partition.faceArea(0)).isCloseTo(1, EXACT);
  }

  @Test
  void a_vertex_on_a_straight_edge_stays_where_another_edge_ends() {
    Partition partition =
        of(List.of(box(0, 0, 0, 1, 1), box(1, 1, 0, 2, 0.4), box(2, 1, 0.4, 2, 1)));
    assertThat(partition.vertexCount()).isEqualTo(8);
    assertThat(partition.edgeCount()).isEqualTo(10);
  }

  @Test
  void sides_of_an_edge_know_their_faces() {
    Partition partition = of(List.of(box(7, 0, 0, 1, 1), box(9, 1, 0, 2, 1)));
    int shared = 0;
    for (int e = 0; e < partition.edgeCount(); e++) {
      double middleX =
          (partition.x(partition.edgeStart(e)) + partition.x(partition.edgeEnd(e))) / 2;
      if (Math.abs(middleX + partition.origin().x() - 1) < 1e-9) {
        shared++;
        boolean up = partition.y(partition.edgeEnd(e)) > partition.y(partition.edgeStart(e));
        assertThat(partition.leftLabel(e)).isEqualTo(up ? 7 : 9);
        assertThat(partition.rightLabel(e)).isEqualTo(up ? 9 : 7);
        assertThat(partition.edgeLength(e)).isCloseTo(1, EXACT);
      } else {
        assertThat(Math.min(partition.leftLabel(e), partition.rightLabel(e)))
            .isEqualTo(Partition.NONE);
      }
    }
    assertThat(shared).isEqualTo(1);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17, 45, 73.123, 90, 211})
  void a_sheet_of_a_tenth_of_a_millimetre_keeps_its_area_at_any_angle(double degrees) {
    double[] thickness = {1e-4, 1.5e-3, 1e-4};
    List<LabelledArea> areas = new ArrayList<>();
    areas.add(box(0, -0.2, -1, 0, 3));
    double at = 0;
    for (int i = 0; i < thickness.length; i++) {
      areas.add(box(i + 1, at, -1, at + thickness[i], 3));
      at += thickness[i];
    }
    areas.add(box(9, at, -1, 0.3, 3));
    areas.add(box(8, -0.2, 1, 0.3, 1.2));
    Partition partition = of(laid(areas, turned(degrees, 0, 0)));
    assertThat(partition.faceCount()).isEqualTo(11);
    for (int i = 0; i < thickness.length; i++) {
      double drawn = thickness[i] * (4 - 0.2);
      assertThat(partition.labelArea(i + 1)).isCloseTo(drawn, within(1e-9 * drawn));
    }
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void a_drawing_far_away_is_the_same_drawing() {
    List<LabelledArea> areas =
        List.of(box(0, 0, 0, 1, 1), box(1, 0.25, 0.5, 2, 0.75), box(2, 1.5, 0, 1.5 + 1e-4, 1));
    Partition near = of(areas);
    Partition far = of(laid(areas, turned(0, 1e4, -1e4)));
    assertThat(far.faceCount()).isEqualTo(near.faceCount());
    assertThat(far.edgeCount()).isEqualTo(near.edgeCount());
    for (int f = 0; f < near.faceCount(); f++) {
      assertThat(far.faceLabel(f)).isEqualTo(near.faceLabel(f));
      // Coordinates near 1e4 m are themselves known to 2e-12 m only.
      assertThat(far.faceArea(f)).isCloseTo(near.faceArea(f), within(1e-11));
    }
    assertThat(far.origin().x()).isBetween(1e4, 1e4 + 2);
    assertThat(far.largestDisplacementM()).isLessThan(1e-11);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 1e-9, 9e-9})
  void a_gap_within_the_joining_length_is_none(double gap) {
    Partition partition = of(List.of(box(0, 0, 0, 1, 1), box(1, 1 + gap, 0, 2, 1)));
    assertThat(partition.edgeCount()).isEqualTo(7);
    assertThat(partition.defects()).isEmpty();
    assertThat(partition.largestDisplacementM()).isCloseTo(gap, within(1e-15));
  }

  @Test
  void a_gap_up_to_the_closing_length_is_closed_and_listed_once() {
    double gap = 5e-7;
    List<LabelledArea> areas = List.of(box(0, 0, 0, 1, 1), box(1, 1 + gap, -0.5, 2, 0.5));
    for (double degrees : new double[] {0, 17}) {
      Partition partition = of(laid(areas, turned(degrees, 0, 0)));
      assertThat(partition.edgeCount()).isEqualTo(9);
      assertThat(partition.defects()).hasSize(1);
      Defect defect = partition.defects().get(0);
      assertThat(defect.kind()).isEqualTo(Defect.Kind.CLOSED_GAP);
      assertThat(defect.sizeM()).isCloseTo(gap, within(1e-12));
      assertThat(defect.labels()).containsExactly(0, 1);
      Point middle = turned(degrees, 0, 0).apply(new Point(1, 0.25));
      assertThat(defect.where().distance(middle)).isLessThan(0.3);
      assertThat(partition.largestDisplacementM()).isBetween(gap / 2, 2 * gap);
    }
  }

  @Test
  void a_gap_over_an_earlier_area_is_closed_as_well() {
    Partition partition =
        of(List.of(box(3, -1, -1, 3, 2), box(0, 0, 0, 1, 1), box(1, 1 + 5e-7, 0, 2, 1)));
    assertThat(partition.faceCount()).isEqualTo(3);
    assertThat(partition.labelArea(3)).isCloseTo(10, within(1e-12));
    assertThat(partition.defects())
        .singleElement()
        .extracting(Defect::kind)
        .isEqualTo(Defect.Kind.CLOSED_GAP);
  }

  @Test
  void a_gap_on_a_common_ground_is_closed_without_a_short_edge() {
    Partition partition =
        of(List.of(box(3, -1, -1, 3, 0), box(0, 0, 0, 1, 1), box(1, 1 + 5e-7, 0, 2, 1)));
    assertThat(partition.faceCount()).isEqualTo(3);
    for (int e = 0; e < partition.edgeCount(); e++) {
      assertThat(partition.edgeLength(e)).isGreaterThan(0.5);
    }
  }

  @Test
  void a_drawn_sheet_thinner_than_the_closing_length_is_no_gap() {
    double thickness = 5e-7;
    Partition partition =
        of(
            List.of(
                box(0, 0, 0, 1, 1),
                box(1, 1, 0, 1 + thickness, 1),
                box(2, 1 + thickness, 0, 2, 1)));
    assertThat(partition.labelArea(1)).isCloseTo(thickness, within(1e-9 * thickness));
    assertThat(partition.defects()).isEmpty();
  }

  @ParameterizedTest
  @ValueSource(doubles = {1.2e-6, 1e-5, 1e-3})
  void a_wider_thin_gap_stays_and_is_reported(double gap) {
    List<LabelledArea> open = List.of(box(0, 0, 0, 1, 1), box(1, 1 + gap, 0, 2, 1));
    List<LabelledArea> enclosed = new ArrayList<>(open);
    enclosed.add(box(2, -1, -1, 3, 0));
    enclosed.add(box(2, -1, 1, 3, 2));
    for (List<LabelledArea> areas : List.of(open, enclosed)) {
      Partition partition = of(laid(areas, turned(17, 0, 0)));
      assertThat(partition.labelArea(0) + partition.labelArea(1)).isCloseTo(2 - gap, within(1e-12));
      assertThat(partition.defects()).hasSize(1);
      Defect defect = partition.defects().get(0);
      assertThat(defect.kind()).isEqualTo(Defect.Kind.GAP);
      assertThat(defect.sizeM()).isCloseTo(gap, within(2e-3 * gap));
      assertThat(defect.labels()).contains(0, 1);
      Point middle = turned(17, 0, 0).apply(new Point(1 + gap / 2, 0.5));
      assertThat(defect.where().distance(middle)).isLessThan(1e-9);
    }
  }

  @Test
  void a_slot_that_is_not_thin_is_no_gap() {
    Partition partition = of(List.of(box(0, 0, 0, 1, 1), box(1, 1.05, 0, 2, 1)));
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void what_shows_of_an_earlier_area_between_two_later_ones_is_a_sliver() {
    double width = 5e-5;
    List<LabelledArea> closedEnds =
        List.of(box(3, 0, 0, 2, 1), box(0, 0, 0, 1, 1), box(1, 1 + width, 0, 2, 1));
    List<LabelledArea> openEnds =
        List.of(box(3, -1, -1, 3, 2), box(0, 0, 0, 1, 1), box(1, 1 + width, 0, 2, 1));
    for (List<LabelledArea> areas : List.of(closedEnds, openEnds)) {
      Partition partition = of(areas);
      assertThat(partition.defects()).hasSize(1);
      Defect defect = partition.defects().get(0);
      assertThat(defect.kind()).isEqualTo(Defect.Kind.SLIVER);
      assertThat(defect.sizeM()).isCloseTo(width, within(1e-3 * width));
      assertThat(defect.where().distance(new Point(1 + width / 2, 0.5))).isLessThan(1e-9);
      assertThat(defect.labels()).contains(3);
    }
  }

  @Test
  void what_is_left_along_the_edge_of_an_area_is_a_sliver() {
    Partition partition = of(List.of(box(0, 0, 0, 1, 1), box(1, 3e-5, 0, 1, 1)));
    assertThat(partition.defects())
        .singleElement()
        .extracting(Defect::kind)
        .isEqualTo(Defect.Kind.SLIVER);
    assertThat(partition.labelArea(0)).isCloseTo(3e-5, within(1e-14));
  }

  @ParameterizedTest
  @ValueSource(doubles = {1e-4, 8e-4, 1.5e-3})
  void the_wall_of_a_tube_drawn_as_a_box_in_a_box_is_no_sliver(double wall) {
    List<LabelledArea> tube =
        List.of(
            box(0, 0, 0, 0.1, 0.05),
            box(1, wall, wall, 0.05 - wall / 2, 0.05 - wall),
            box(1, 0.05 + wall / 2, wall, 0.1 - wall, 0.05 - wall));
    for (double degrees : new double[] {0, 17}) {
      assertThat(of(laid(tube, turned(degrees, 0, 0))).defects()).isEmpty();
    }
  }

  @Test
  void a_layer_left_of_a_box_covered_by_another_is_no_sliver() {
    Partition partition = of(List.of(box(0, 0, 0, 0.4, 2.5), box(1, 0.015, 0, 0.4, 2.5)));
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void a_sheet_drawn_thinner_than_any_sliver_is_none() {
    double thickness = 2e-5;
    LabelledArea block = polygon(0, 0, 0, 1, 0, 1, 1, 0.5, 1, 0.5, 0.2, 0, 0.2);
    LabelledArea strip = box(1, -1, 0.5, 0.4, 0.5 + thickness);
    LabelledArea fin =
        polygon(2, -1, 0.6, -0.5, 0.6, -0.5, 0.7, 0.45, 0.7, 0.45, 0.7 + thickness, -1, 0.7001);
    LabelledArea ground = box(3, -2, -2, 2, 2);
    Partition partition = of(List.of(ground, block, strip, fin));
    assertThat(partition.defects()).isEmpty();
    assertThat(partition.labelArea(1)).isCloseTo(1.4 * thickness, within(1e-14));
  }

  @Test
  void an_arc_of_many_short_chords_stays_within_the_joining_length() {
    double radius = 0.01;
    double[] xy = new double[2 * 6000];
    for (int i = 0; i < xy.length / 2; i++) {
      double angle = 2 * Math.PI * i / (xy.length / 2);
      xy[2 * i] = radius * Math.cos(angle);
      xy[2 * i + 1] = radius * Math.sin(angle);
    }
    Partition partition = Partition.of(List.of(polygon(0, xy)), List.of(), Resolution.STANDARD);
    double circumference = 2 * Math.PI * radius;
    assertThat(partition.labelArea(0))
        .isCloseTo(Math.PI * radius * radius, within(1e-8 * circumference));
    assertThat(partition.vertexCount()).isBetween(1000, 5000);
    assertThat(partition.largestDisplacementM()).isLessThanOrEqualTo(1e-8);
  }

  @Test
  void a_sheet_crossed_by_others_is_no_sliver() {
    List<LabelledArea> areas = new ArrayList<>();
    areas.add(box(0, 0, 0, 1, 1));
    areas.add(box(1, 0.5, 0, 0.5 + 1e-4, 1));
    for (int i = 1; i < 10; i++) {
      areas.add(box(2, 0.2, i / 10.0, 0.8, i / 10.0 + 0.01));
    }
    Partition partition = of(areas);
    assertThat(partition.labelArea(1)).isCloseTo(1e-4 * 0.91, within(1e-13));
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void an_enclosed_place_that_nothing_covers_is_reported() {
    LabelledArea frame =
        new LabelledArea(
            1, List.of(points(0, 0, 1, 0, 1, 1, 0, 1), points(.2, .2, .8, .2, .8, .8, .2, .8)));
    Partition partition = of(List.of(frame, box(6, 0.4, 0.4, 0.6, 0.6)));
    assertThat(partition.labelArea(1)).isCloseTo(0.64, EXACT);
    assertThat(partition.faceRings(0)).hasSize(2);
    Defect defect = partition.defects().get(0);
    assertThat(partition.defects()).hasSize(1);
    assertThat(defect.kind()).isEqualTo(Defect.Kind.UNCOVERED);
    // Area 0.36 − 0.04 over half the perimeter 2.4 + 0.8.
    assertThat(defect.sizeM()).isCloseTo(0.32 / 1.6, EXACT);
    assertThat(defect.labels()).containsExactly(1, 6);
  }

  @Test
  void rings_that_touch_in_a_vertex_stay_apart() {
    Partition partition =
        of(
            List.of(
                box(0, 0, 0, 3, 3),
                polygon(1, 1, 1, 1.5, 1.5, 1, 2, 0.5, 1.5),
                polygon(1, 2, 1, 2.5, 1.5, 2, 2, 1.5, 1.5),
                polygon(1, 0, 0, 0.4, 0.2, 0.2, 0.4)));
    assertThat(partition.faceCount()).isEqualTo(4);
    int host = partition.faceLabel(0) == 0 ? 0 : 1;
    // The outer ring, two squares that touch each other, a triangle that touches the outer ring.
    assertThat(partition.faceRings(host)).hasSize(4);
    assertThat(partition.faceArea(host)).isCloseTo(9 - 0.5 - 0.5 - 0.06, EXACT);
  }

  @Test
  void a_ring_that_crosses_itself_is_filled_by_the_even_odd_rule_and_reported() {
    Partition partition = of(List.of(polygon(5, 0, 0, 2, 2, 2, 0, 0, 2)));
    assertThat(partition.faceCount()).isEqualTo(2);
    assertThat(partition.labelArea(5)).isCloseTo(2, EXACT);
    Defect defect = partition.defects().get(0);
    assertThat(partition.defects()).hasSize(1);
    assertThat(defect.kind()).isEqualTo(Defect.Kind.SELF_CROSSING);
    assertThat(defect.where().distance(new Point(1, 1))).isLessThan(1e-12);
    // The smaller part: a triangle of area 1 with half the perimeter 1 + √2.
    assertThat(defect.sizeM()).isCloseTo(1 / (1 + Math.sqrt(2)), EXACT);
    assertThat(defect.labels()).containsExactly(5);
  }

  @Test
  void a_five_pointed_star_leaves_its_middle_out() {
    double[] xy = new double[10];
    for (int i = 0; i < 5; i++) {
      xy[2 * i] = Math.sin(4 * Math.PI * i / 5);
      xy[2 * i + 1] = Math.cos(4 * Math.PI * i / 5);
    }
    Partition partition = of(List.of(polygon(5, xy)));
    assertThat(partition.faceCount()).isEqualTo(5);
    assertThat(partition.defects().stream().filter(d -> d.kind() == Defect.Kind.SELF_CROSSING))
        .hasSize(5);
    assertThat(partition.defects().stream().filter(d -> d.kind() == Defect.Kind.UNCOVERED))
        .hasSize(1);
  }

  @Test
  void a_ring_with_a_hole_reached_by_a_bridge_does_not_cross_itself() {
    Partition partition =
        of(
            List.of(
                polygon(
                    1, 0, 0, 0.5, 0, 0.5, 0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.25, 0.5,
                    0.25, 0.5, 0, 1, 0, 1, 1, 0, 1)));
    assertThat(partition.labelArea(1)).isCloseTo(0.75, EXACT);
    assertThat(partition.defects()).extracting(Defect::kind).containsExactly(Defect.Kind.UNCOVERED);
  }

  @Test
  void a_ring_that_crosses_itself_along_a_stretch_is_reported() {
    // Comes from below, runs along y = 0 from x = 1 to 2 and leaves upwards; the second passage
    // comes from above and leaves below.
    Partition partition = of(List.of(polygon(1, 0, 0, 3, 0, 3, -1, 2, -1, 2, 0, 1, 0, 1, 1, 0, 1)));
    assertThat(partition.defects())
        .extracting(Defect::kind)
        .containsExactly(Defect.Kind.SELF_CROSSING);
  }

  @Test
  void a_shape_without_area_is_left_out_and_reported() {
    Partition partition =
        of(
            List.of(
                box(0, 0, 0, 1, 1),
                polygon(1, 2, 2, 3, 3, 2.5, 2.5),
                box(2, 0.2, 0.2, 0.2 + 1e-9, 0.8)));
    assertThat(partition.faceCount()).isEqualTo(1);
    assertThat(partition.vertexCount()).isEqualTo(4);
    assertThat(partition.defects())
        .extracting(Defect::kind)
        .containsExactly(Defect.Kind.ZERO_AREA, Defect.Kind.ZERO_AREA);
    assertThat(partition.defects()).extracting(d -> d.labels().get(0)).containsExactly(1, 2);
  }

  @Test
  void an_area_of_which_nothing_is_left_is_reported() {
    Partition partition =
        of(List.of(box(0, 0, 0, 1, 1), box(1, 0.2, 0.2, 0.8, 0.8), box(2, 0, 0, 1, 1)));
    assertThat(partition.faceCount()).isEqualTo(1);
    assertThat(partition.faceLabel(0)).isEqualTo(2);
    assertThat(partition.defects())
        .extracting(Defect::kind)
        .containsExactly(Defect.Kind.HIDDEN, Defect.Kind.HIDDEN);
    assertThat(partition.defects()).extracting(d -> d.labels().get(0)).containsExactly(0, 1);
  }

  @Test
  void nothing_to_make_faces_of_is_refused() {
    assertThatThrownBy(() -> of(List.of()))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("needs an area");
    assertThatThrownBy(() -> of(List.of(polygon(0, 0, 0, 1, 1, 2, 2))))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("nothing of the areas is left");
    assertThatThrownBy(() -> of(List.of(polygon(0, 1, 1, 1, 1, 1, 1))))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("nothing of the areas is left");
  }

  /**
   * A triangle whose corner lies on its long side but for rounding, beside edges straight but for
   * the resolution: its sides stay apart. Found at random.
   */
  @Test
  void a_face_thinner_than_the_resolution_keeps_an_area() {
    Partition partition =
        of(
            laid(
                List.of(
                    polygon(
                        1,
                        0.25,
                        0.7967077200708055,
                        0.034618501662032067,
                        0.5,
                        0.4,
                        0.2,
                        0.30530177167101226,
                        0.2,
                        0.85,
                        0.2),
                    box(1, -0.05, 0.35, 0.7, 0.75),
                    polygon(
                        0,
                        0.027620439000348163,
                        0.630444725666762,
                        0.49384275260198876,
                        0.5250682160448936,
                        0.21638059175687908,
                        0.390222362833381,
                        0.4118672575653366,
                        0.49684225731080176,
                        0.35115787121768426,
                        0.3394413262752752,
                        0.046422340136243136,
                        0.40595518359187344),
                    box(1, -0.1, 0.5, 0.95, 0.75)),
                p -> new Point(p.x() + 1, p.y())));
    for (int face = 0; face < partition.faceCount(); face++) {
      assertThat(partition.faceArea(face)).isPositive();
    }
  }
}
