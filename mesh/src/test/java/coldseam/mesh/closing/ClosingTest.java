package coldseam.mesh.closing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Faces of lines, against areas by elementary geometry; lengths in mm here. */
class ClosingTest {
  private static DrawnLine line(double... xyMm) {
    return new DrawnLine(points(xyMm), false);
  }

  private static DrawnLine ring(double... xyMm) {
    return new DrawnLine(points(xyMm), true);
  }

  private static DrawnLine box(double x0, double y0, double x1, double y1) {
    return ring(x0, y0, x1, y0, x1, y1, x0, y1);
  }

  private static List<Point> points(double... xyMm) {
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < xyMm.length; i += 2) {
      points.add(new Point(xyMm[i] / 1000, xyMm[i + 1] / 1000));
    }
    return points;
  }

  private static List<Double> areasMm2(Cells cells) {
    return cells.cells().stream().map(c -> c.areaM2() * 1e6).toList();
  }

  private static double shoelaceMm2(Cells.Cell cell) {
    double sum = 0;
    for (List<Point> ring : cell.rings()) {
      for (int i = 0; i < ring.size(); i++) {
        Point p = ring.get(i);
        Point q = ring.get((i + 1) % ring.size());
        sum += (p.x() * q.y() - q.x() * p.y()) / 2;
      }
    }
    return sum * 1e6;
  }

  @Test
  void loose_lines_that_cross_and_touch_make_faces() throws TangledLinesException {
    // A grid of two by one drawn with lines that overshoot, and a line that hangs.
    Cells cells =
        Closing.cells(
            List.of(
                line(-5, 0, 205, 0),
                line(-5, 50, 205, 50),
                line(0, -5, 0, 55),
                line(120, 0, 120, 50),
                line(200, -5, 200, 55),
                line(60, 0, 60, 20)));
    assertThat(areasMm2(cells)).hasSize(2);
    assertThat(areasMm2(cells)).anySatisfy(a -> assertThat(a).isCloseTo(6000, within(1e-6)));
    assertThat(areasMm2(cells)).anySatisfy(a -> assertThat(a).isCloseTo(4000, within(1e-6)));
    for (Cells.Cell cell : cells.cells()) {
      assertThat(shoelaceMm2(cell)).isCloseTo(cell.areaM2() * 1e6, within(1e-6));
    }
    assertThat(cells.dropped()).hasSize(9);
    assertThat(cells.dropped())
        .anySatisfy(
            d -> {
              assertThat(d.line()).isEqualTo(5);
              assertThat(d.lengthM() * 1000).isCloseTo(20, within(1e-9));
            });
  }

  @Test
  void rings_in_rings_know_how_deep_they_lie() throws TangledLinesException {
    Cells cells =
        Closing.cells(
            List.of(
                box(0, 0, 100, 100), box(10, 10, 90, 90), box(20, 20, 30, 30), box(90, 0, 99, 9)));
    assertThat(cells.cells()).extracting(Cells.Cell::depth).containsExactly(0, 0, 1, 2);
    assertThat(areasMm2(cells))
        .anySatisfy(a -> assertThat(a).isCloseTo(10000 - 6400 - 81, within(1e-6)));
  }

  @Test
  void gaps_up_to_the_tolerance_are_joined_and_wider_ones_are_not() throws TangledLinesException {
    List<DrawnLine> drawn =
        List.of(
            line(0, 0, 99.6, 0),
            line(100, 0.3, 100, 50),
            line(100.2, 50.2, 0, 50),
            line(0, 49.8, 0, 0.4));
    Joined joined = Closing.join(drawn, 0.001);
    assertThat(joined.joins()).hasSizeGreaterThanOrEqualTo(4);
    assertThat(joined.joins()).allSatisfy(j -> assertThat(j.distanceM()).isLessThan(0.001));
    Cells cells = Closing.cells(joined.lines());
    assertThat(cells.cells()).hasSize(1);
    assertThat(areasMm2(cells).get(0)).isCloseTo(5000, within(60.0));
    assertThat(cells.dropped()).isEmpty();
    Joined less = Closing.join(drawn, 0.0002);
    assertThat(Closing.cells(less.lines()).cells()).isEmpty();
  }

  @Test
  void an_end_short_of_an_edge_is_moved_onto_it() throws TangledLinesException {
    Joined joined = Closing.join(List.of(box(0, 0, 100, 100), line(50, 0.4, 50, 99.5)), 0.001);
    Cells cells = Closing.cells(joined.lines());
    assertThat(areasMm2(cells)).hasSize(2);
    assertThat(areasMm2(cells).get(0)).isCloseTo(5000, within(1e-6));
    assertThat(joined.joins()).hasSize(2);
  }

  @Test
  void a_gap_along_another_line_is_joined() throws TangledLinesException {
    // A room drawn exactly, and a wall beside it whose inner line ends 0.3 mm short of its corner.
    List<DrawnLine> drawn =
        List.of(
            box(-600, 0, 0, 500),
            line(0, 0, 0, 499.7),
            line(0, 500, 100, 500),
            line(100, 500, 100, 0),
            line(100, 0, 0, 0));
    Joined joined = Closing.join(drawn, 0.001);
    assertThat(joined.joins()).hasSize(1);
    Cells wall = Closing.cells(joined.lines().subList(1, 5));
    assertThat(areasMm2(wall)).hasSize(1);
    assertThat(areasMm2(wall).get(0)).isCloseTo(50_000, within(1e-6));
  }

  @Test
  void an_open_line_closes_on_itself() throws TangledLinesException {
    Joined joined = Closing.join(List.of(line(0, 0, 80, 0, 80, 60, 0, 60, 0.2, 0.5)), 0.001);
    assertThat(areasMm2(Closing.cells(joined.lines()))).hasSize(1);
  }

  @Test
  void sheets_thinner_than_the_tolerance_keep_their_thickness() throws TangledLinesException {
    // Masonry, a 0.2 mm foil, insulation, each a closed shape, drawn exactly; then the same foil as
    // two loose lines that end on others; then a foil drawn as an open hook.
    List<List<DrawnLine>> drawings =
        List.of(
            List.of(box(0, 0, 100, 500), box(100, 0, 100.2, 500), box(100.2, 0, 200, 500)),
            List.of(box(0, 0, 200, 500), line(100, 0, 100, 500), line(100.2, 0, 100.2, 500)),
            List.of(line(100, 0, 100, 500, 100.2, 500, 100.2, 0)));
    for (List<DrawnLine> drawing : drawings) {
      Joined joined = Closing.join(drawing, 0.001);
      assertThat(joined.joins()).isEmpty();
      assertThat(joined.lines()).isEqualTo(drawing);
    }
  }

  @Test
  void neighbours_drawn_with_a_small_gap_are_joined_corner_to_corner()
      throws TangledLinesException {
    // Four layers; the gap of 0.3 mm lies between two pairs that fit exactly.
    List<DrawnLine> drawn =
        List.of(
            box(0, 0, 15, 500),
            box(15, 0, 240, 500),
            box(240.3, 0, 400, 500),
            box(400, 0, 410, 500));
    Joined joined = Closing.join(drawn, 0.001);
    Cells cells = Closing.cells(joined.lines());
    double sum = areasMm2(cells).stream().mapToDouble(a -> a).sum();
    assertThat(cells.cells()).hasSize(4);
    assertThat(sum).isCloseTo(410 * 500, within(1e-6));
    assertThat(joined.joins()).hasSize(2);
  }

  @Test
  void what_cannot_be_joined_safely_is_a_doubt() throws TangledLinesException {
    // A 0.5 mm sheet 0.4 mm off a wall: joining would move it by most of its thickness.
    Joined joined = Closing.join(List.of(box(0, 0, 100, 500), box(100.4, 0, 100.9, 500)), 0.001);
    assertThat(joined.joins()).isEmpty();
    assertThat(joined.doubts()).isNotEmpty();
    assertThat(joined.doubts().get(0).distanceM() * 1000).isCloseTo(0.4, within(1e-6));
  }

  /** Moving a drawing far away, turning and mirroring it changes nothing but its place. */
  @Test
  void closing_does_not_depend_on_where_the_drawing_lies() throws TangledLinesException {
    Random random = new Random(20250601);
    for (int trial = 0; trial < 40; trial++) {
      List<DrawnLine> drawn = new ArrayList<>();
      double x = 0;
      for (int i = 0; i < 6; i++) {
        double next = x + 5 + 100 * random.nextDouble();
        double gap = random.nextBoolean() ? 0 : 0.4 * random.nextDouble();
        drawn.add(box(x + gap, 0, next, 300 + 0.3 * random.nextDouble()));
        x = next;
      }
      drawn.add(line(-10, -0.2, x + 10, -0.2));
      drawn.add(line(-10, 300, x + 10, 300.1));
      double angle = Math.toRadians(17);
      List<DrawnLine> there = new ArrayList<>();
      for (DrawnLine line : drawn) {
        List<Point> points = new ArrayList<>();
        for (Point p : line.points()) {
          points.add(
              new Point(
                  1e4 - Math.cos(angle) * p.x() - Math.sin(angle) * p.y(),
                  1e4 - Math.sin(angle) * p.x() + Math.cos(angle) * p.y()));
        }
        there.add(new DrawnLine(points, line.closed()));
      }
      Joined here = Closing.join(drawn, 0.0005);
      Joined far = Closing.join(there, 0.0005);
      assertThat(far.joins()).hasSameSizeAs(here.joins());
      List<Double> areas = areasMm2(Closing.cells(here.lines()));
      List<Double> farAreas = areasMm2(Closing.cells(far.lines()));
      assertThat(farAreas).hasSameSizeAs(areas);
      double sum = areas.stream().mapToDouble(a -> a).sum();
      assertThat(farAreas.stream().mapToDouble(a -> a).sum()).isCloseTo(sum, within(1e-9 * sum));
    }
  }

  @Test
  void tangles_are_refused() {
    List<DrawnLine> grid = new ArrayList<>();
    for (int i = 0; i < 4000; i++) {
      grid.add(line(0, i, 4000, i + 0.5));
      grid.add(line(i, 0, i + 0.5, 4000));
    }
    assertThatThrownBy(() -> Closing.cells(grid))
        .isInstanceOf(TangledLinesException.class)
        .hasMessageContaining("cross more than 200000 times");
    List<DrawnLine> crowd = new ArrayList<>();
    Random random = new Random(7);
    for (int i = 0; i < 20_000; i++) {
      crowd.add(line(random.nextDouble(), random.nextDouble(), 50, random.nextDouble()));
    }
    assertThatThrownBy(() -> Closing.join(crowd, 0.001))
        .isInstanceOf(TangledLinesException.class)
        .hasMessageContaining("crowd");
  }
}
