package coldseam.mesh.triangulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.mesh.plane.Point;
import java.util.Arrays;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class MeshTest {
  private static final Point ORIGIN = new Point(0, 0);

  /** A unit square of two triangles. */
  private static final double[] X = {0, 1, 1, 0};

  private static final double[] Y = {0, 0, 1, 1};

  @Test
  void neighboursAndSidesAreWorkedOut() {
    Mesh mesh = square(1, 2, 0, 3, 0, 2);
    assertThat(mesh.sideCount()).isEqualTo(5);
    assertThat(mesh.neighbour(0, 0)).isEqualTo(1);
    assertThat(mesh.neighbour(1, 0)).isEqualTo(0);
    assertThat(mesh.side(0, 0)).isEqualTo(mesh.side(1, 0));
    assertThat(mesh.neighbour(0, 1)).isEqualTo(Mesh.NONE);
    assertThat(mesh.sideStart(mesh.side(0, 0))).isEqualTo(0);
    assertThat(mesh.sideEnd(mesh.side(0, 0))).isEqualTo(2);
    assertThat(mesh.area(0)).isEqualTo(0.5);
  }

  @Test
  void badArraysAreRefused() {
    assertThatThrownBy(() -> square(1, 0, 2, 3, 0, 2))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("counter-clockwise");
    assertThatThrownBy(() -> square(1, 2, 0, 1, 2, 0))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("side");
    assertThatThrownBy(() -> square(1, 2, 0, 3, 0, 4))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("no vertex 4");
    assertThatThrownBy(() -> Mesh.of(ORIGIN, X, Y, new int[6], new int[1], new int[6]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("length");
  }

  @Test
  void locatingAgreesWithLookingAtEveryTriangle() {
    for (int seed = 0; seed < 40; seed++) {
      Mesh mesh = mesh(RandomDrawing.of(seed));
      Random random = new Random(seed);
      for (int i = 0; i < 400; i++) {
        double[] p = point(mesh, random, i % 4);
        int found = mesh.locate(p[0], p[1]);
        double nearest = Double.POSITIVE_INFINITY;
        for (int t = 0; t < mesh.triangleCount(); t++) {
          nearest = Math.min(nearest, distance(mesh, t, p[0], p[1]));
        }
        if (nearest < 1e-12) {
          assertThat(found).as("seed %d point %d", seed, i).isNotEqualTo(Mesh.NONE);
          assertThat(distance(mesh, found, p[0], p[1])).isLessThan(1e-12);
        } else if (nearest > 1e-7) {
          assertThat(found).as("seed %d point %d", seed, i).isEqualTo(Mesh.NONE);
        }
      }
    }
  }

  @Test
  void pointsOnSidesVerticesAndARoundingOffTheOutlineAreFound() {
    Mesh mesh = square(1, 2, 0, 3, 0, 2);
    assertThat(mesh.locate(0.5, 0.5)).isNotEqualTo(Mesh.NONE);
    assertThat(mesh.locate(1, 1)).isNotEqualTo(Mesh.NONE);
    assertThat(mesh.locate(Math.nextUp(1.0), 0.5)).isEqualTo(0);
    assertThat(mesh.locate(-1e-10, 0.5)).isEqualTo(1);
    assertThat(mesh.locate(1.001, 0.5)).isEqualTo(Mesh.NONE);
    assertThat(mesh.locate(Double.NaN, 0.5)).isEqualTo(Mesh.NONE);
  }

  @Test
  void locatingFromManyThreadsGivesTheSame() {
    Mesh mesh = mesh(RandomDrawing.of(5));
    double[][] points =
        new Random(5)
            .doubles(2000)
            .mapToObj(d -> point(mesh, new Random((long) (1e9 * d)), 0))
            .toArray(double[][]::new);
    Mesh fresh = mesh(RandomDrawing.of(5));
    int[] alone = Arrays.stream(points).mapToInt(p -> mesh.locate(p[0], p[1])).toArray();
    int[] together =
        IntStream.range(0, points.length)
            .parallel()
            .map(i -> fresh.locate(points[i][0], points[i][1]))
            .toArray();
    assertThat(together).isEqualTo(alone);
  }

  /** A point anywhere around, on a side, at a vertex, or within a triangle. */
  private static double[] point(Mesh mesh, Random random, int kind) {
    int t = random.nextInt(mesh.triangleCount());
    double a = random.nextDouble();
    double b = random.nextDouble() * (1 - a);
    if (kind == 0) {
      a = 4 * random.nextDouble() - 2;
      b = 4 * random.nextDouble() - 2;
    } else if (kind == 1) {
      b = 1 - a;
    } else if (kind == 2) {
      a = 1;
      b = 0;
    }
    double x = 0;
    double y = 0;
    double[] weights = {a, b, 1 - a - b};
    for (int k = 0; k < 3; k++) {
      x += weights[k] * mesh.x(mesh.vertex(t, k));
      y += weights[k] * mesh.y(mesh.vertex(t, k));
    }
    return new double[] {x, y};
  }

  /** Distance of a point from a triangle, 0 within. */
  private static double distance(Mesh mesh, int t, double px, double py) {
    double outside = Double.POSITIVE_INFINITY;
    boolean within = true;
    for (int k = 0; k < 3; k++) {
      double ax = mesh.x(mesh.vertex(t, k));
      double ay = mesh.y(mesh.vertex(t, k));
      double dx = mesh.x(mesh.vertex(t, (k + 1) % 3)) - ax;
      double dy = mesh.y(mesh.vertex(t, (k + 1) % 3)) - ay;
      within &= dx * (py - ay) - dy * (px - ax) >= 0;
      double part = ((px - ax) * dx + (py - ay) * dy) / (dx * dx + dy * dy);
      part = Math.max(0, Math.min(1, part));
      outside = Math.min(outside, Math.hypot(px - ax - part * dx, py - ay - part * dy));
    }
    return within ? 0 : outside;
  }

  private static Mesh mesh(Drawing drawing) {
    return Triangulator.triangulate(
        drawing.partition(), l -> l != RandomDrawing.SPACE, SizeField.NONE);
  }

  private static Mesh square(int... corners) {
    int[] edges = new int[6];
    Arrays.fill(edges, Mesh.NONE);
    return Mesh.of(ORIGIN, X, Y, corners, new int[2], edges);
  }
}
