package coldseam.solver.conduction;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.mesh.triangulation.Mesh;
import org.junit.jupiter.api.Test;

class TemperatureFieldTest {
  private static final Point ORIGIN = new Point(100, -20);

  private static Mesh mesh() {
    return Mesh.of(
        ORIGIN,
        new double[] {0, 3, 2.5, -0.2},
        new double[] {0, 0.1, 2, 1.5},
        new int[] {0, 1, 2, 0, 2, 3},
        new int[] {0, 0},
        new int[] {-1, -1, 0, -1, 1, -1});
  }

  private static double quadratic(double x, double y) {
    return 3 - 2 * x + y + 0.5 * x * x - 1.5 * x * y + 0.25 * y * y;
  }

  private static TemperatureField field(Mesh mesh) {
    double[] nodal = new double[mesh.vertexCount() + mesh.sideCount()];
    for (int v = 0; v < mesh.vertexCount(); v++) {
      nodal[v] = quadratic(mesh.x(v), mesh.y(v));
    }
    for (int s = 0; s < mesh.sideCount(); s++) {
      int a = mesh.sideStart(s);
      int b = mesh.sideEnd(s);
      nodal[mesh.vertexCount() + s] =
          quadratic((mesh.x(a) + mesh.x(b)) / 2, (mesh.y(a) + mesh.y(b)) / 2);
    }
    return new TemperatureField(mesh, nodal);
  }

  @Test
  void aQuadraticIsReproducedWithItsGradient() {
    Mesh mesh = mesh();
    TemperatureField field = field(mesh);
    for (double[] p : new double[][] {{1, 0.5}, {2.4, 1.2}, {0.5, 1}, {0, 0}, {2.5, 2}}) {
      assertThat(field.at(new Point(ORIGIN.x() + p[0], ORIGIN.y() + p[1])))
          .isCloseTo(quadratic(p[0], p[1]), within(1e-12));
    }
    double x = 0.2 * mesh.x(0) + 0.3 * mesh.x(1) + 0.5 * mesh.x(2);
    double y = 0.2 * mesh.y(0) + 0.3 * mesh.y(1) + 0.5 * mesh.y(2);
    assertThat(field.in(0, 0.2, 0.3, 0.5)).isCloseTo(quadratic(x, y), within(1e-12));
    assertThat(field.gradient(0, 0.2, 0.3, 0.5))
        .containsExactly(new double[] {-2 + x - 1.5 * y, 1 - 1.5 * x + 0.5 * y}, within(1e-12));
  }

  @Test
  void outsideThereIsNoTemperature() {
    assertThat(field(mesh()).at(new Point(0, 0))).isNaN();
  }

  @Test
  void oneValueANodeIsNeeded() {
    assertThatThrownBy(() -> new TemperatureField(mesh(), new double[4]))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
