package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Contours on hand-made triangles. */
class ContoursTest {
  /** A unit square of n × n cells of two triangles each. */
  private static LinearPatch square(int n, java.util.function.DoubleBinaryOperator value) {
    LinearPatch patch = new LinearPatch(1, 1);
    for (int j = 0; j <= n; j++) {
      for (int i = 0; i <= n; i++) {
        double x = (double) i / n;
        double y = (double) j / n;
        patch.addVertex(x, y, value.applyAsDouble(x, y));
      }
    }
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n; i++) {
        int a = j * (n + 1) + i;
        patch.addTriangle(a, a + 1, a + n + 2);
        patch.addTriangle(a, a + n + 2, a + n + 1);
      }
    }
    return patch;
  }

  private static double area(List<Polyline> rings) {
    return rings.stream().mapToDouble(Polyline::area).sum();
  }

  @Test
  void a_plane_has_straight_contours_and_exact_regions() {
    double[] levels = {0.25, 0.5, 1.25};
    Contours contours = Contours.of(square(8, (x, y) -> x + y), levels);
    assertThat(area(contours.all())).isCloseTo(1, within(1e-12));
    double[] above = {1 - 0.25 * 0.25 / 2, 1 - 0.5 * 0.5 / 2, 0.75 * 0.75 / 2};
    for (int k = 0; k < levels.length; k++) {
      List<Polyline> lines = contours.lines(k);
      assertThat(lines).hasSize(1);
      assertThat(lines.get(0).closed()).isFalse();
      for (int i = 0; i < lines.get(0).size(); i++) {
        assertThat(lines.get(0).x(i) + lines.get(0).y(i)).isCloseTo(levels[k], within(1e-12));
      }
      assertThat(Simplification.of(lines.get(0), 1e-9).size()).isEqualTo(2);
      assertThat(area(contours.atOrAbove(k))).isCloseTo(above[k], within(1e-12));
    }
  }

  @Test
  void a_hill_has_one_closed_contour_and_a_hollow_one_a_hole() {
    java.util.function.DoubleBinaryOperator hill =
        (x, y) -> -((x - 0.5) * (x - 0.5) + (y - 0.5) * (y - 0.5));
    double r = 0.3;
    Contours up = Contours.of(square(64, hill), new double[] {-r * r});
    assertThat(up.lines(0)).hasSize(1);
    assertThat(up.lines(0).get(0).closed()).isTrue();
    assertThat(area(up.atOrAbove(0))).isCloseTo(Math.PI * r * r, within(2e-3));
    Contours down =
        Contours.of(square(64, (x, y) -> -hill.applyAsDouble(x, y)), new double[] {r * r});
    assertThat(down.atOrAbove(0)).hasSize(2);
    assertThat(area(down.atOrAbove(0))).isCloseTo(1 - Math.PI * r * r, within(2e-3));
  }

  /** What lies at or above a level and what lies below it make up the whole, and nest. */
  @Test
  void regions_of_random_fields_add_up_and_nest() {
    Random random = new Random(20);
    for (int trial = 0; trial < 60; trial++) {
      int n = 2 + random.nextInt(12);
      double[] values = random.doubles((n + 1) * (n + 1)).toArray();
      int size = n;
      LinearPatch patch =
          square(n, (x, y) -> values[(int) Math.round(y * size * (size + 1) + x * size)]);
      double[] levels = {0.2, 0.5, 0.8};
      Contours contours = Contours.of(patch, levels);
      double before = 1;
      for (int k = 0; k < levels.length; k++) {
        double above = area(contours.atOrAbove(k));
        assertThat(above)
            .as("trial %d, level %d", trial, k)
            .isCloseTo(exact(patch, levels[k]), within(1e-12));
        assertThat(above).isLessThanOrEqualTo(before + 1e-12);
        before = above;
        for (Polyline line : contours.lines(k)) {
          assertThat(line.size()).isGreaterThan(1);
          boolean ends = onRim(line, 0) && onRim(line, line.size() - 1);
          assertThat(line.closed() || ends).as("trial %d, level %d", trial, k).isTrue();
        }
      }
    }
  }

  private static boolean onRim(Polyline line, int i) {
    double x = line.x(i);
    double y = line.y(i);
    return Math.min(Math.min(x, 1 - x), Math.min(y, 1 - y)) < 1e-12;
  }

  /** Area where a linear field in each triangle is at or above a level, by hand. */
  private static double exact(LinearPatch patch, double level) {
    double sum = 0;
    for (int t = 0; t < patch.triangles(); t++) {
      double[] v = new double[3];
      for (int k = 0; k < 3; k++) {
        v[k] = patch.value(patch.corner(t, k));
      }
      java.util.Arrays.sort(v);
      double share;
      if (v[0] >= level) {
        share = 1;
      } else if (v[2] < level) {
        share = 0;
      } else if (v[1] >= level) {
        share = 1 - (level - v[0]) * (level - v[0]) / ((v[1] - v[0]) * (v[2] - v[0]));
      } else {
        share = (v[2] - level) * (v[2] - level) / ((v[2] - v[0]) * (v[2] - v[1]));
      }
      int a = patch.corner(t, 0);
      int b = patch.corner(t, 1);
      int c = patch.corner(t, 2);
      double twice =
          (patch.x(b) - patch.x(a)) * (patch.y(c) - patch.y(a))
              - (patch.x(c) - patch.x(a)) * (patch.y(b) - patch.y(a));
      sum += share * twice / 2;
    }
    return sum;
  }
}
