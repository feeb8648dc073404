package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

class VertexGridTest {
  @Test
  void finds_what_a_look_at_every_vertex_finds() {
    for (int seed = 0; seed < 200; seed++) {
      Random random = new Random(seed);
      int n = 1 + random.nextInt(200);
      double[] x = new double[n];
      double[] y = new double[n];
      for (int v = 0; v < n; v++) {
        // Some on a grid, so that many share a coordinate; some crowded in a corner.
        double scale = random.nextInt(3) == 0 ? 1e-3 : 1;
        x[v] = random.nextBoolean() ? random.nextInt(5) * 0.2 : scale * random.nextDouble();
        y[v] = random.nextBoolean() ? random.nextInt(5) * 0.2 : scale * random.nextDouble();
      }
      VertexGrid grid = new VertexGrid(x, y);
      for (int k = 0; k < 50; k++) {
        int a = random.nextInt(n);
        int b = random.nextInt(n);
        double margin = random.nextInt(3) == 0 ? 1e-9 : 0.2 * random.nextDouble();
        Set<Integer> expected = new TreeSet<>();
        for (int v = 0; v < n; v++) {
          if (Segments.distance(x[v], y[v], x[a], y[a], x[b], y[b]) <= margin) {
            expected.add(v);
          }
        }
        Set<Integer> found = new TreeSet<>();
        int count = grid.near(x[a], y[a], x[b], y[b], margin);
        for (int i = 0; i < count; i++) {
          assertThat(found.add(grid.hit(i))).as("found once").isTrue();
        }
        assertThat(found).as("seed %d", seed).isEqualTo(expected);
      }
    }
  }
}
