package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import org.junit.jupiter.api.Test;

class PointIndexTest {
  @Test
  void numbers_points_as_a_look_at_every_point_would() {
    for (int seed = 0; seed < 50; seed++) {
      Random random = new Random(seed);
      double tolerance = 0.01;
      PointIndex index = new PointIndex(tolerance);
      for (int i = 0; i < 400; i++) {
        double px = random.nextDouble() - 0.5;
        double py = random.nextInt(3) == 0 ? 0.02 * random.nextInt(20) : random.nextDouble() - 0.5;
        int expected = index.count();
        double nearest = tolerance;
        for (int p = 0; p < index.count(); p++) {
          double distance = Segments.length(index.x(p) - px, index.y(p) - py);
          if (distance <= nearest) {
            nearest = distance;
            expected = p;
          }
        }
        assertThat(index.add(px, py)).as("seed %d", seed).isEqualTo(expected);
      }
      assertThat(index.xs()).hasSize(index.count());
    }
  }

  @Test
  void pairs_are_numbered_in_either_order() {
    PairIndex pairs = new PairIndex(4);
    for (int i = 0; i < 1000; i++) {
      assertThat(pairs.add(i, i * 7 + 1)).isEqualTo(i);
    }
    for (int i = 0; i < 1000; i++) {
      assertThat(pairs.add(i * 7 + 1, i)).isEqualTo(i);
      assertThat(pairs.contains(i, i * 7 + 1)).isTrue();
      assertThat(pairs.contains(i, i * 7 + 2)).isFalse();
    }
    assertThat(pairs.count()).isEqualTo(1000);
  }
}
