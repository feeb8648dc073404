package coldseam.mesh.triangulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class TriangulatorTest {
  @Test
  void anOrdinaryBalconyStartsWithAFewHundredTriangles() {
    for (double degrees : new double[] {0, 17, 45, 90, 210}) {
      Mesh mesh = mesh(balcony(Drawing.turned(degrees)), SizeField.NONE);
      assertThat(mesh.triangleCount()).as("%s degrees", degrees).isBetween(100, 300);
    }
  }

  @Test
  void theLongestSideOfEachTriangleIsItsSide0() {
    Mesh mesh = mesh(balcony(Drawing.turned(17)), SizeField.NONE);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double longest = mesh.sideLength(mesh.side(t, 0));
      assertThat(longest).isGreaterThanOrEqualTo(mesh.sideLength(mesh.side(t, 1)));
      assertThat(longest).isGreaterThanOrEqualTo(mesh.sideLength(mesh.side(t, 2)));
    }
  }

  @Test
  void sidesAreNoLongerThanWanted() {
    SizeField size = (x, y) -> y < 0.5 ? 0.03 : 0.3;
    Mesh mesh = mesh(balcony(Drawing.upright()), size);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double y = 0;
      for (int k = 0; k < 3; k++) {
        y += mesh.y(mesh.vertex(t, k)) / 3;
      }
      assertThat(mesh.sideLength(mesh.side(t, 0))).isLessThanOrEqualTo(y < 0.5 ? 0.03 : 0.3);
    }
  }

  @Test
  void eachFanAtAPinchedPointHasItsOwnVertex() {
    // Two boxes that touch in a corner, spaces in the other two quadrants.
    Drawing drawing = Drawing.turned(30).box(0, 0, 0, 100, 100).box(1, 100, 100, 200, 200);
    drawing.box(RandomDrawing.SPACE, 100, 0, 200, 100);
    Mesh mesh = mesh(drawing, SizeField.NONE);
    double x = 0.1 * (Math.cos(Math.PI / 6) - Math.sin(Math.PI / 6)) - mesh.origin().x();
    double y = 0.1 * (Math.cos(Math.PI / 6) + Math.sin(Math.PI / 6)) - mesh.origin().y();
    int there = 0;
    for (int v = 0; v < mesh.vertexCount(); v++) {
      there += Math.hypot(mesh.x(v) - x, mesh.y(v) - y) < 1e-9 ? 1 : 0;
    }
    assertThat(there).isEqualTo(2);
  }

  @Test
  void openGroundBetweenMeshedFacesIsAnOutline() {
    Drawing drawing = Drawing.upright().box(0, 0, 0, 100, 100).box(0, 150, 0, 200, 100);
    Mesh mesh = mesh(drawing.box(RandomDrawing.SPACE, 20, 20, 60, 60), SizeField.NONE);
    double outline = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(t, k) == Mesh.NONE) {
          outline += mesh.sideLength(mesh.side(t, k));
          assertThat(mesh.partitionEdge(t, k)).isNotEqualTo(Mesh.NONE);
        }
      }
    }
    assertThat(outline).isCloseTo(0.4 + 0.3 + 0.16, within(1e-12));
  }

  /** A fan of wedges of 0.5° to 20° around one point: the process ends, and soon. */
  @Test
  void verySharpCornersEnd() {
    Drawing drawing = Drawing.upright().box(0, -1000, -1000, 1000, 1000);
    double angle = 0;
    int label = 1;
    for (double width : new double[] {0.5, 1, 3, 0.7, 8, 15, 20, 0.5, 45, 2}) {
      double next = angle + Math.toRadians(width);
      double radius = 300 + 50 * label;
      drawing.polygon(
          label++,
          0,
          0,
          radius * Math.cos(angle),
          radius * Math.sin(angle),
          radius * Math.cos(next),
          radius * Math.sin(next));
      angle = next;
    }
    assertThat(mesh(drawing, SizeField.NONE).triangleCount()).isLessThan(500);
  }

  /** A bar within a wedge draws small triangles near a sharp corner; they must not spread to it. */
  @Test
  void smallTrianglesDoNotRunIntoSharpCorners() {
    for (double degrees : new double[] {0.5, 1, 2, 5, 10}) {
      double half = Math.tan(Math.toRadians(degrees / 2));
      double end = Math.toRadians(degrees);
      Drawing drawing = Drawing.upright().box(0, -1000, -1000, 1000, 1000);
      drawing.polygon(1, 0, 0, 700, 0, 700 * Math.cos(end), 700 * Math.sin(end));
      drawing.disc(2, 350, 350 * half, 175 * half, 12);
      assertThat(mesh(drawing, SizeField.NONE).triangleCount())
          .as("%s degrees", degrees)
          .isLessThan(400);
    }
  }

  @Test
  void lowlyMeshesAreSoundToo() {
    for (int steps = 0; steps < 60; steps += 3) {
      Linework lines = Linework.of(RandomDrawing.of(steps).partition()).alongCurve();
      boolean[] meshed = new boolean[lines.faceLabel.length];
      Arrays.fill(meshed, true);
      ConstrainedDelaunay plane = new ConstrainedDelaunay(lines);
      Faces.fill(plane, lines);
      Ladders ladders = new Ladders(plane, lines);
      ladders.build(LadderSearch.search(plane, meshed));
      int before = plane.triangleCount;
      new DelaunayRefinement(plane, lines, ladders, meshed, SizeField.NONE).run(steps);
      Mesh mesh = MeshAssembly.assemble(plane, lines, meshed);
      MeshCheck.require(mesh, lines, meshed);
      assertThat(plane.triangleCount).isBetween(before, before + 100 * steps);
    }
  }

  /** An edge right across a face and one with loose ends, the same face on both hands. */
  @Test
  void edgesWithinAFaceAreKept() {
    Linework lines =
        new Linework(
            new Point(0, 0),
            new double[] {0, 1, 1, 0, 0, 1, 0.3, 0.3},
            new double[] {0, 0, 0.4, 0.4, 0.2, 0.2, 0.05, 0.199},
            new int[] {0, 1, 5, 2, 3, 4, 4, 6},
            new int[] {1, 5, 2, 3, 4, 0, 5, 7},
            new int[8],
            new int[] {-1, -1, -1, -1, -1, -1, 0, 0},
            new int[1]);
    Mesh mesh = Triangulator.triangulate(lines, l -> true, SizeField.NONE);
    double[] lengths = new double[8];
    boolean[] seen = new boolean[mesh.sideCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int edge = mesh.partitionEdge(t, k);
        int side = mesh.side(t, k);
        if (edge != Mesh.NONE && !seen[side]) {
          seen[side] = true;
          lengths[edge] += mesh.sideLength(side);
        }
      }
    }
    assertThat(lengths[6]).isCloseTo(1, within(1e-12));
    assertThat(lengths[7]).isCloseTo(0.149, within(1e-12));
    assertThat(mesh.triangleCount()).isLessThan(100);
  }

  @Test
  void nothingToMeshIsRefused() {
    Partition partition = Drawing.upright().box(RandomDrawing.SPACE, 0, 0, 1, 1).partition();
    assertThatThrownBy(() -> Triangulator.triangulate(partition, l -> false, SizeField.NONE))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("no face");
  }

  @Test
  void lineworkThatIsNotCleanIsRefused() {
    double[] x = {0, 1, 1, 0};
    double[] y = {0, 0, 1, 1};
    int[] none = {-1, -1, -1, -1, -1, -1};
    Linework crossing =
        new Linework(
            new Point(0, 0),
            x,
            y,
            new int[] {0, 1, 2, 3, 0, 1},
            new int[] {1, 2, 3, 0, 2, 3},
            new int[6],
            none,
            new int[1]);
    assertThatThrownBy(() -> new ConstrainedDelaunay(crossing))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("cross");
    Linework twice =
        new Linework(
            new Point(0, 0),
            new double[] {0, 1, 1, 1},
            y,
            new int[] {0},
            new int[] {1},
            new int[1],
            none,
            new int[1]);
    assertThatThrownBy(() -> new ConstrainedDelaunay(twice))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("two vertices");
  }

  private static Drawing balcony(Drawing drawing) {
    return drawing
        .box(0, 0, 0, 15, 3000)
        .box(1, 15, 0, 190, 3000)
        .box(2, 190, 0, 350, 3000)
        .box(3, 350, 0, 360, 3000)
        .box(4, -1000, 1400, 1500, 1600)
        .box(5, 190, 1400, 270, 1600)
        .box(6, -1000, 1600, 0, 1630)
        .box(7, -1000, 1630, 0, 1690);
  }

  private static Mesh mesh(Drawing drawing, SizeField size) {
    return Triangulator.triangulate(drawing.partition(), l -> l != RandomDrawing.SPACE, size);
  }
}
