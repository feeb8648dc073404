package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.awt.geom.Path2D;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Lines cut off, simplified and written as text. */
class LinesTest {
  private static final Box BOX = new Box(-1, -1, 1, 1);

  private static Polyline.Builder wander(Random random, int n) {
    Polyline.Builder line = new Polyline.Builder();
    for (int i = 0; i < n; i++) {
      line.add(3 * random.nextDouble() - 1.5, 3 * random.nextDouble() - 1.5);
    }
    return line;
  }

  @Test
  void a_line_cut_off_keeps_what_is_inside() {
    Random random = new Random(1);
    for (int trial = 0; trial < 300; trial++) {
      Polyline line = wander(random, 2 + random.nextInt(6)).open();
      double inside = 0;
      int samples = 4000;
      for (int i = 0; i < samples; i++) {
        double[] at = line.at((i + 0.5) * line.length() / samples);
        inside += BOX.contains(at[0], at[1]) ? line.length() / samples : 0;
      }
      double kept = 0;
      for (Polyline part : Clip.line(line, BOX)) {
        assertThat(BOX.grown(1e-12).contains(part.bounds())).isTrue();
        kept += part.length();
      }
      assertThat(kept).as("trial %d", trial).isCloseTo(inside, within(0.02));
    }
  }

  @Test
  void a_ring_cut_off_keeps_its_area_inside() {
    // Everything above the line y = |x| − 2, which passes through the lower corners of the box.
    Polyline ring = new Polyline.Builder().add(-9, 7).add(0, -2).add(9, 7).closed();
    assertThat(Math.abs(Clip.ring(ring, BOX).orElseThrow().area())).isCloseTo(4, within(1e-12));
    // A right-angled triangle of sides 2 of which the box leaves a square of side 1.
    Polyline corner = new Polyline.Builder().add(0, 0).add(2, 0).add(0, 2).closed();
    assertThat(Clip.ring(corner, BOX).orElseThrow().area()).isCloseTo(1, within(1e-12));
    Polyline away = new Polyline.Builder().add(2, 2).add(3, 2).add(2, 3).closed();
    assertThat(Clip.ring(away, BOX)).isEmpty();
  }

  @Test
  void a_simplified_line_stays_near_every_point_left_out() {
    Random random = new Random(2);
    for (int trial = 0; trial < 200; trial++) {
      Polyline.Builder builder = wander(random, 3 + random.nextInt(60));
      Polyline line = trial % 2 == 0 ? builder.open() : builder.closed();
      double tolerance = 0.3 * random.nextDouble();
      Polyline simple = Simplification.of(line, tolerance);
      assertThat(simple.size()).isLessThanOrEqualTo(line.size());
      assertThat(simple.closed()).isEqualTo(line.closed());
      for (int i = 0; i < line.size(); i++) {
        assertThat(distance(simple, line.x(i), line.y(i))).isLessThanOrEqualTo(tolerance + 1e-12);
      }
    }
  }

  private static double distance(Polyline line, double x, double y) {
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < line.pieces(); i++) {
      int j = line.after(i);
      least =
          Math.min(
              least,
              java.awt.geom.Line2D.ptSegDist(line.x(i), line.y(i), line.x(j), line.y(j), x, y));
    }
    return least;
  }

  @Test
  void path_text_reads_back_within_half_a_hundredth() {
    Random random = new Random(3);
    for (int trial = 0; trial < 100; trial++) {
      Polyline open = wander(random, 40).open();
      Polyline closed = wander(random, 7).closed();
      Path2D path = Polyline.path(List.of(open, closed, Polyline.of(0.004, 5, 0.004, -7.126)));
      StringBuilder written = new StringBuilder("d=");
      PathText.of(path.getPathIterator(null), written);
      List<Polyline> back = Read.path(written.substring(2));
      assertThat(back).hasSize(3);
      for (int line = 0; line < 2; line++) {
        Polyline before = line == 0 ? open : closed;
        assertThat(back.get(line).closed()).isEqualTo(before.closed());
        for (int i = 0; i < before.size(); i++) {
          assertThat(back.get(line).x(i)).isCloseTo(before.x(i), within(0.00501));
          assertThat(back.get(line).y(i)).isCloseTo(before.y(i), within(0.00501));
        }
      }
      assertThat(back.get(2).y(1)).isCloseTo(-7.13, within(1e-9));
    }
  }

  @Test
  void a_place_along_a_line_has_its_right_hand_vector() {
    Polyline line = new Polyline.Builder().add(0, 0).add(10, 0).add(10, 10).open();
    assertThat(line.at(4)).containsExactly(new double[] {4, 0, 0, 1}, within(1e-15));
    assertThat(line.at(15)).containsExactly(new double[] {10, 5, -1, 0}, within(1e-15));
    assertThat(line.at(99)).containsExactly(new double[] {10, 10, -1, 0}, within(1e-15));
    assertThat(line.length()).isEqualTo(20);
  }
}
