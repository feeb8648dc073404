package coldseam.mesh.refinement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.LabelledArea;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class NewestVertexBisectionTest {
  @Test
  void uniformRefinementMakesFourOfEachAndIsNested() {
    Mesh mesh = wallWithFoil(17);
    NewestVertexBisection.Refined refined = NewestVertexBisection.refineAll(mesh);
    assertThat(refined.mesh().triangleCount()).isEqualTo(4 * mesh.triangleCount());
    double[] filled = new double[mesh.triangleCount()];
    for (int t = 0; t < refined.mesh().triangleCount(); t++) {
      int parent = refined.parent()[t];
      filled[parent] += refined.mesh().area(t);
      assertThat(refined.mesh().label(t)).isEqualTo(mesh.label(parent));
      for (int k = 0; k < 3; k++) {
        int v = refined.mesh().vertex(t, k);
        assertThat(outside(mesh, parent, refined.mesh().x(v), refined.mesh().y(v)))
            .isLessThan(1e-15);
      }
    }
    for (int t = 0; t < filled.length; t++) {
      assertThat(filled[t]).isCloseTo(mesh.area(t), within(1e-11 * mesh.area(t)));
    }
  }

  @Test
  void oldVerticesStayAndNewOnesHalveOldSides() {
    Mesh mesh = wallWithFoil(0);
    Random random = new Random(3);
    for (int round = 0; round < 6; round++) {
      BitSet marked = new BitSet();
      for (int i = 0; i < 20; i++) {
        marked.set(random.nextInt(mesh.triangleCount()));
      }
      NewestVertexBisection.Refined refined = NewestVertexBisection.refine(mesh, marked);
      Mesh finer = refined.mesh();
      assertThat(finer.vertexCount()).isEqualTo(mesh.vertexCount() + refined.oldSide().length);
      for (int v = 0; v < mesh.vertexCount(); v++) {
        assertThat(finer.x(v)).isEqualTo(mesh.x(v));
        assertThat(finer.y(v)).isEqualTo(mesh.y(v));
      }
      for (int v = mesh.vertexCount(); v < finer.vertexCount(); v++) {
        int side = refined.oldSide()[v - mesh.vertexCount()];
        int a = mesh.sideStart(side);
        int b = mesh.sideEnd(side);
        assertThat(finer.x(v)).isEqualTo(0.5 * (mesh.x(a) + mesh.x(b)));
        assertThat(finer.y(v)).isEqualTo(0.5 * (mesh.y(a) + mesh.y(b)));
      }
      for (int t = 0; t < finer.triangleCount(); t++) {
        assertThat(finer.label(t)).isEqualTo(mesh.label(refined.parent()[t]));
      }
      mesh = finer;
    }
  }

  @Test
  void nothingMarkedChangesNothing() {
    Mesh mesh = wallWithFoil(17);
    NewestVertexBisection.Refined refined = NewestVertexBisection.refine(mesh, new BitSet());
    assertThat(refined.mesh()).isSameAs(mesh);
    assertThat(refined.oldSide()).isEmpty();
    assertThat(refined.parent()[7]).isEqualTo(7);
  }

  /** Every marked triangle is gone, and halved sides are marked on both hands. */
  @Test
  void markedTrianglesAreSplit() {
    Mesh mesh = wallWithFoil(17);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      BitSet marked = new BitSet();
      marked.set(t);
      NewestVertexBisection.Refined refined = NewestVertexBisection.refine(mesh, marked);
      int children = 0;
      for (int parent : refined.parent()) {
        children += parent == t ? 1 : 0;
      }
      assertThat(children).as("triangle %d", t).isGreaterThanOrEqualTo(2);
    }
  }

  /**
   * Newest-vertex bisection makes at most four similar kinds of triangles of each (Mitchell 1991),
   * so the least angle of all over 25 rounds is reached within the first three.
   */
  @Test
  void anglesDoNotDecay() {
    Mesh mesh = plate();
    double[] least = new double[25];
    for (int round = 0; round < least.length; round++) {
      BitSet marked = new BitSet();
      for (int t = 0; t < mesh.triangleCount(); t++) {
        for (int k = 0; k < 3; k++) {
          if (Math.hypot(mesh.x(mesh.vertex(t, k)) - 0.05, mesh.y(mesh.vertex(t, k))) < 1e-9) {
            marked.set(t);
          }
        }
      }
      mesh = NewestVertexBisection.refine(mesh, marked).mesh();
      least[round] = leastAngle(mesh);
    }
    assertThat(least[0]).isGreaterThan(10);
    assertThat(least[24]).isGreaterThan(least[3] - 1e-6);
  }

  /** Cells of a sheet are halved in length only, until they are no longer than three widths. */
  @Test
  void ladderCellsAreHalvedInLength() {
    Mesh mesh = wallWithFoil(17);
    int before = mesh.vertexCount();
    for (int round = 0; round < 5; round++) {
      BitSet marked = new BitSet();
      for (int t = 0; t < mesh.triangleCount(); t++) {
        marked.set(t, mesh.label(t) == 1);
      }
      mesh = NewestVertexBisection.refine(mesh, marked).mesh();
    }
    boolean[] onEdge = new boolean[mesh.vertexCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.partitionEdge(t, k) != Mesh.NONE) {
          onEdge[mesh.vertex(t, (k + 1) % 3)] = true;
          onEdge[mesh.vertex(t, (k + 2) % 3)] = true;
        }
      }
    }
    int inFoil = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.label(t) == 1) {
        inFoil++;
        for (int k = 0; k < 3; k++) {
          assertThat(onEdge[mesh.vertex(t, k)]).as("a vertex within the foil").isTrue();
        }
      }
    }
    assertThat(mesh.vertexCount()).isGreaterThan(before + 100);
    assertThat(inFoil).isGreaterThan(64);
  }

  /**
   * Halving sides towards the end of a foil within a wall: no cell is cut across while it is long,
   * so no triangle at the end stays slender, and each round that is wanted comes in the end.
   */
  @Test
  void cellsAreSquareBeforeTheyAreCutAcross() {
    Mesh mesh =
        mesh(
            17,
            new double[][] {
              {0, 0, 0, 0.2, 1.2}, {1, 0.1, 0.3, 0.1001, 1.2}, {2, 0.2, 0, 0.3, 1.2}
            });
    double cos = Math.cos(Math.toRadians(17));
    double sin = Math.sin(Math.toRadians(17));
    double x = cos * 0.1 - sin * 0.3 - mesh.origin().x();
    double y = sin * 0.1 + cos * 0.3 - mesh.origin().y();
    Mesh cut = mesh;
    for (int round = 0; round < 10; round++) {
      BitSet touching = new BitSet();
      BitSet sides = sidesAt(cut, x, y);
      for (int h = sides.nextSetBit(0); h >= 0; h = sides.nextSetBit(h + 1)) {
        touching.set(h / 3);
      }
      cut = NewestVertexBisection.refine(cut, touching).mesh();
    }
    for (int round = 0; round < 36; round++) {
      mesh = NewestVertexBisection.refineSides(mesh, sidesAt(mesh, x, y)).mesh();
    }
    assertThat(mostSlender(mesh, x, y)).isLessThan(7);
    assertThat(mostSlender(cut, x, y)).isGreaterThan(20);
    assertThat(longestAt(mesh, x, y)).isLessThan(1e-5);
  }

  /** The sides that meet at a point, 3t + k. */
  private static BitSet sidesAt(Mesh mesh, double x, double y) {
    BitSet sides = new BitSet();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.vertex(t, k);
        if (Math.hypot(mesh.x(v) - x, mesh.y(v) - y) < 1e-9) {
          sides.set(3 * t + (k + 1) % 3);
          sides.set(3 * t + (k + 2) % 3);
        }
      }
    }
    return sides;
  }

  private static double longestAt(Mesh mesh, double x, double y) {
    double longest = 0;
    BitSet sides = sidesAt(mesh, x, y);
    for (int h = sides.nextSetBit(0); h >= 0; h = sides.nextSetBit(h + 1)) {
      longest = Math.max(longest, mesh.sideLength(mesh.side(h / 3, h % 3)));
    }
    return longest;
  }

  /** The largest length over height of the triangles at a point. */
  private static double mostSlender(Mesh mesh, double x, double y) {
    double most = 0;
    BitSet sides = sidesAt(mesh, x, y);
    for (int h = sides.nextSetBit(0); h >= 0; h = sides.nextSetBit(h + 1)) {
      double longest = 0;
      for (int k = 0; k < 3; k++) {
        longest = Math.max(longest, mesh.sideLength(mesh.side(h / 3, k)));
      }
      most = Math.max(most, longest * longest / (2 * mesh.area(h / 3)));
    }
    return most;
  }

  @Test
  void refiningAtOnePointEndsAtTheSmallestSize() {
    Mesh mesh = plate();
    int previous = 0;
    int rounds = 0;
    while (mesh.triangleCount() > previous && rounds < 200) {
      previous = mesh.triangleCount();
      BitSet marked = new BitSet();
      marked.set(mesh.locate(0.0123, 0.0456));
      mesh = NewestVertexBisection.refine(mesh, marked).mesh();
      rounds++;
    }
    assertThat(rounds).isBetween(35, 60);
  }

  /** 0.1 mm of foil, label 1, between 12.5 mm and 140 mm, 1.2 m high. */
  private static Mesh wallWithFoil(double degrees) {
    return mesh(
        degrees,
        new double[][] {
          {0, 0, 0, 0.0125, 1.2}, {1, 0.0125, 0, 0.0126, 1.2}, {2, 0.0126, 0, 0.1526, 1.2}
        });
  }

  /** Two plates of 0.05 m by 0.1 m side by side. */
  private static Mesh plate() {
    return mesh(0, new double[][] {{0, 0, 0, 0.05, 0.1}, {1, 0.05, 0, 0.1, 0.1}});
  }

  private static Mesh mesh(double degrees, double[][] boxes) {
    double cos = Math.cos(Math.toRadians(degrees));
    double sin = Math.sin(Math.toRadians(degrees));
    List<LabelledArea> areas = new ArrayList<>();
    for (double[] b : boxes) {
      List<Point> ring = new ArrayList<>();
      for (double[] p : new double[][] {{b[1], b[2]}, {b[3], b[2]}, {b[3], b[4]}, {b[1], b[4]}}) {
        ring.add(new Point(cos * p[0] - sin * p[1], sin * p[0] + cos * p[1]));
      }
      areas.add(new LabelledArea((int) b[0], List.of(ring)));
    }
    Partition partition = Partition.of(areas, List.of(), Resolution.STANDARD);
    return Triangulator.triangulate(partition, l -> true, SizeField.NONE);
  }

  /** How far a point lies outside a triangle, m. */
  private static double outside(Mesh mesh, int t, double px, double py) {
    double most = 0;
    for (int k = 0; k < 3; k++) {
      int a = mesh.vertex(t, k);
      int b = mesh.vertex(t, (k + 1) % 3);
      double dx = mesh.x(b) - mesh.x(a);
      double dy = mesh.y(b) - mesh.y(a);
      double left = dx * (py - mesh.y(a)) - dy * (px - mesh.x(a));
      most = Math.max(most, -left / Math.hypot(dx, dy));
    }
    return most;
  }

  private static double leastAngle(Mesh mesh) {
    double least = 180;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.vertex(t, k);
        int a = mesh.vertex(t, (k + 1) % 3);
        int b = mesh.vertex(t, (k + 2) % 3);
        double ax = mesh.x(a) - mesh.x(v);
        double ay = mesh.y(a) - mesh.y(v);
        double bx = mesh.x(b) - mesh.x(v);
        double by = mesh.y(b) - mesh.y(v);
        least = Math.min(least, Math.toDegrees(Math.atan2(ax * by - ay * bx, ax * bx + ay * by)));
      }
    }
    return least;
  }
}
