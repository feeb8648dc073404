package coldseam.mesh.triangulation;

import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.mesh.plane.Point;
import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

/** Each kind of broken mesh is refused, the sound one is not. */
class MeshCheckTest {
  private static final Point ORIGIN = new Point(0, 0);

  /** A unit square of two labels: below and above its diagonal, edge 4. */
  private static final Linework SQUARE =
      new Linework(
          ORIGIN,
          new double[] {0, 1, 1, 0},
          new double[] {0, 0, 1, 1},
          new int[] {0, 1, 2, 3, 0},
          new int[] {1, 2, 3, 0, 2},
          new int[] {0, 0, 1, 1, 1},
          new int[] {-1, -1, -1, -1, 0},
          new int[] {0, 1});

  private static final double[] X = {0, 1, 1, 0, 0.5};
  private static final double[] Y = {0, 0, 1, 1, 0.5};

  @Test
  void theSoundMeshPasses() {
    assertThatCode(() -> check(4, c(1, 2, 0, 3, 0, 2), c(0, 1), c(4, 0, 1, 4, 2, 3)))
        .doesNotThrowAnyException();
  }

  @Test
  void aHangingVertexIsFound() {
    // The upper triangle is split at the middle of the diagonal, the lower is not.
    refused(
        "does not match what lies beyond",
        5,
        c(1, 2, 0, 4, 3, 0, 4, 2, 3),
        c(0, 1, 1),
        c(4, 0, 1, 3, 4, -1, 2, -1, 4));
  }

  @Test
  void aTriangleThatIsMissingIsFound() {
    refused("does not match", 4, c(1, 2, 0), c(0), c(4, 0, 1));
  }

  @Test
  void aSideWithoutItsEdgeIsFound() {
    refused("within a face", 4, c(1, 2, 0, 3, 0, 2), c(0, 1), c(4, -1, 1, 4, 2, 3));
  }

  @Test
  void aWrongLabelIsFound() {
    refused("another label", 4, c(1, 2, 0, 3, 0, 2), c(1, 1), c(4, 0, 1, 4, 2, 3));
    refused("labels differ", 4, c(1, 2, 0, 3, 0, 2), c(0, 1), c(-1, 0, 1, -1, 2, 3));
  }

  @Test
  void aVertexOfNoTriangleIsFound() {
    refused("no triangle", 5, c(1, 2, 0, 3, 0, 2), c(0, 1), c(4, 0, 1, 4, 2, 3));
  }

  @Test
  void twoFansAtAVertexAreFound() {
    // Two triangles that touch in the middle of a bow tie, one vertex for both.
    Linework tie =
        new Linework(
            ORIGIN,
            new double[] {0, 1, 1, 0, 0.5},
            new double[] {0, 0, 1, 1, 0.5},
            new int[] {3, 0, 4, 1, 2, 4},
            new int[] {0, 4, 3, 2, 4, 1},
            new int[] {0, 0, 0, 1, 1, 1},
            new int[] {-1, -1, -1, -1, -1, -1},
            new int[] {0, 0});
    Mesh mesh = Mesh.of(ORIGIN, X, Y, c(3, 0, 4, 1, 2, 4), c(0, 0), c(1, 2, 0, 4, 5, 3));
    assertThatThrownBy(() -> MeshCheck.require(mesh, tie, new boolean[] {true, true}))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("several fans");
  }

  @Test
  void anAreaThatIsNotFilledIsFound() {
    // As sound as the square to all other checks, but its corner lies elsewhere.
    double[] x = X.clone();
    x[1] = 1.001;
    Mesh mesh =
        Mesh.of(
            ORIGIN,
            Arrays.copyOf(x, 4),
            Arrays.copyOf(Y, 4),
            c(1, 2, 0, 3, 0, 2),
            c(0, 1),
            c(4, 0, 1, 4, 2, 3));
    assertThatThrownBy(() -> MeshCheck.require(mesh, SQUARE, new boolean[] {true, true}))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("label 0 fill");
  }

  private static void refused(
      String message, int vertices, int[] corners, int[] labels, int[] edges) {
    assertThatThrownBy(() -> check(vertices, corners, labels, edges))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining(message);
  }

  private static void check(int vertices, int[] corners, int[] labels, int[] edges) {
    Mesh mesh =
        Mesh.of(
            ORIGIN, Arrays.copyOf(X, vertices), Arrays.copyOf(Y, vertices), corners, labels, edges);
    MeshCheck.require(mesh, SQUARE, new boolean[] {true, true});
  }

  private static int[] c(int... values) {
    return IntStream.of(values).toArray();
  }
}
