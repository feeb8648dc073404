package coldseam.mesh.partition;

import static coldseam.mesh.partition.Drawings.box;
import static coldseam.mesh.partition.Drawings.laid;
import static coldseam.mesh.partition.Drawings.line;
import static coldseam.mesh.partition.Drawings.turned;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

class PartitionLinesTest {
  private static final List<LabelledArea> TWO_BOXES =
      List.of(box(0, 0, 0, 1, 1), box(1, 1, 0, 2, 1));

  private static Partition of(List<LabelledArea> areas, LabelledLine... lines) {
    Partition partition = Partition.of(areas, List.of(lines), Resolution.STANDARD);
    Audit.check(partition);
    return partition;
  }

  private static double lengthOn(Partition partition, int line) {
    double length = 0;
    for (int e = 0; e < partition.edgeCount(); e++) {
      if (partition.linesOn(e).contains(line)) {
        length += partition.edgeLength(e);
      }
    }
    return length;
  }

  private static boolean hasVertex(Partition partition, Point place) {
    for (int v = 0; v < partition.vertexCount(); v++) {
      Point at =
          new Point(
              partition.origin().x() + partition.x(v), partition.origin().y() + partition.y(v));
      if (at.distance(place) < 1e-9) {
        return true;
      }
    }
    return false;
  }

  @Test
  void ends_of_a_line_become_vertices() {
    Partition partition = of(TWO_BOXES, line(7, 0.25, 1, 1.75, 1));
    assertThat(lengthOn(partition, 7)).isCloseTo(1.5, within(1e-14));
    assertThat(hasVertex(partition, new Point(0.25, 1))).isTrue();
    assertThat(hasVertex(partition, new Point(1.75, 1))).isTrue();
    assertThat(partition.vertexCount()).isEqualTo(8);
    assertThat(partition.faceCount()).isEqualTo(2);
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void several_lines_may_lie_on_one_edge_and_run_round_corners() {
    Partition partition =
        of(TWO_BOXES, line(9, 0, 1, 0, 0, 2, 0), line(3, 0, 0.5, 0, 0), line(4, 1, 1, 1, 0));
    assertThat(lengthOn(partition, 9)).isCloseTo(3, within(1e-14));
    assertThat(lengthOn(partition, 3)).isCloseTo(0.5, within(1e-14));
    assertThat(lengthOn(partition, 4)).isCloseTo(1, within(1e-14));
    List<List<Integer>> carried = new ArrayList<>();
    for (int e = 0; e < partition.edgeCount(); e++) {
      carried.add(partition.linesOn(e));
    }
    assertThat(carried).contains(List.of(3, 9)).contains(List.of(9)).contains(List.of(4));
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void the_end_of_a_closed_line_stays_a_vertex() {
    Partition partition =
        of(List.of(box(0, 0, 0, 1, 1)), line(5, 0.5, 0, 1, 0, 1, 1, 0, 1, 0, 0, 0.5, 0));
    assertThat(partition.vertexCount()).isEqualTo(5);
    assertThat(lengthOn(partition, 5)).isCloseTo(4, within(1e-14));
  }

  @Test
  void a_line_near_an_edge_is_laid_on_it() {
    Partition partition = of(TWO_BOXES, line(7, 5e-7, 1 + 8e-7, 1.5, 1 - 8e-7));
    assertThat(lengthOn(partition, 7)).isCloseTo(1.5, within(1e-12));
    // Its first end is nearer to the corner than the closing length: no vertex of its own.
    assertThat(partition.vertexCount()).isEqualTo(7);
    assertThat(partition.defects()).isEmpty();
  }

  @Test
  void a_line_in_the_middle_of_a_material_is_off_edge() {
    Partition partition = of(TWO_BOXES, line(2, 0.2, 0.5, 0.8, 0.5));
    assertThat(partition.edgeCount()).isEqualTo(7);
    Defect defect = partition.defects().get(0);
    assertThat(partition.defects()).hasSize(1);
    assertThat(defect.kind()).isEqualTo(Defect.Kind.LINE_OFF_EDGE);
    assertThat(defect.where().distance(new Point(0.5, 0.5))).isLessThan(1e-12);
    assertThat(defect.sizeM()).isCloseTo(0.6, within(1e-14));
    assertThat(defect.labels()).containsExactly(2);
  }

  @Test
  void only_the_part_of_a_line_that_leaves_the_edge_is_off_edge() {
    Partition partition = of(TWO_BOXES, line(2, 0.5, 1, 2.5, 1), line(3, -1, 2, -1, 3));
    assertThat(lengthOn(partition, 2)).isCloseTo(1.5, within(1e-14));
    assertThat(lengthOn(partition, 3)).isZero();
    assertThat(partition.defects()).hasSize(2);
    Defect defect = partition.defects().get(0);
    assertThat(defect.where().distance(new Point(2.25, 1))).isLessThan(1e-12);
    assertThat(defect.sizeM()).isCloseTo(0.5, within(1e-14));
    assertThat(partition.defects().get(1).sizeM()).isCloseTo(1, within(1e-14));
  }

  @Test
  void a_line_where_two_areas_of_one_label_meet_divides_them_and_is_off_edge() {
    List<LabelledArea> areas = List.of(box(0, 0, 0, 1, 1), box(0, 1, 0, 2, 1));
    assertThat(of(areas).faceCount()).isEqualTo(1);
    Partition divided = of(areas, line(2, 1, 0, 1, 1));
    assertThat(divided.faceCount()).isEqualTo(2);
    assertThat(lengthOn(divided, 2)).isCloseTo(1, within(1e-14));
    assertThat(divided.defects())
        .singleElement()
        .extracting(Defect::kind)
        .isEqualTo(Defect.Kind.LINE_OFF_EDGE);
    Partition dangling = of(areas, line(2, 1, 0, 1, 0.5));
    assertThat(dangling.faceCount()).isEqualTo(1);
    assertThat(dangling.edgeCount()).isEqualTo(4);
  }

  @Test
  void a_line_along_a_closed_gap_lies_on_the_edge_that_remains() {
    List<LabelledArea> areas = List.of(box(0, 0, 0, 1, 1), box(1, 1 + 9e-7, 0, 2, 1));
    Partition partition = of(areas, line(4, 1, 0.25, 1, 1), line(5, 1 + 9e-7, 0, 1 + 9e-7, 0.25));
    assertThat(lengthOn(partition, 4)).isCloseTo(0.75, within(1e-9));
    assertThat(lengthOn(partition, 5)).isCloseTo(0.25, within(1e-9));
    assertThat(partition.defects())
        .extracting(Defect::kind)
        .containsExactly(Defect.Kind.CLOSED_GAP);
  }

  /** Lines drawn along random parts of random edges must be found there in full. */
  @Test
  void lines_drawn_on_edges_are_found_on_them_at_any_angle() {
    for (int seed = 0; seed < 150; seed++) {
      Random random = new Random(seed);
      UnaryOperator<Point> move = turned(random.nextInt(4) * 17, 0, random.nextInt(2) * 1e4);
      List<LabelledArea> areas = laid(RandomDrawings.areas(random, 8), move);
      Partition plain = of(areas);
      List<LabelledLine> lines = new ArrayList<>();
      double[] length = new double[5];
      for (int l = 0; l < length.length; l++) {
        int e = random.nextInt(plain.edgeCount());
        double from = random.nextBoolean() ? 0 : 0.1 + 0.3 * random.nextDouble();
        double to = random.nextBoolean() ? 1 : 0.6 + 0.3 * random.nextDouble();
        length[l] = (to - from) * plain.edgeLength(e);
        Point a = on(plain, e, from);
        Point b = on(plain, e, to);
        lines.add(new LabelledLine(l, random.nextBoolean() ? List.of(a, b) : List.of(b, a)));
      }
      Partition partition = of(areas, lines.toArray(new LabelledLine[0]));
      assertThat(partition.faceCount()).as("seed %d", seed).isEqualTo(plain.faceCount());
      for (int l = 0; l < length.length; l++) {
        assertThat(lengthOn(partition, l))
            .as("seed %d line %d", seed, l)
            .isCloseTo(length[l], within(1e-9));
        for (Point end : lines.get(l).points()) {
          assertThat(hasVertex(partition, end)).as("seed %d", seed).isTrue();
        }
      }
      assertThat(partition.defects()).as("seed %d", seed).hasSameSizeAs(plain.defects());
    }
  }

  private static Point on(Partition partition, int e, double t) {
    int a = partition.edgeStart(e);
    int b = partition.edgeEnd(e);
    return new Point(
        partition.origin().x() + partition.x(a) + t * (partition.x(b) - partition.x(a)),
        partition.origin().y() + partition.y(a) + t * (partition.y(b) - partition.y(a)));
  }
}
