package coldseam.mesh.triangulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.refinement.NewestVertexBisection;
import java.util.BitSet;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** What must hold of the mesh of any drawing, over random ones. The seed is the trial number. */
class MeshPropertyTest {
  private static final int TRIALS = 300;

  @Test
  void trianglesFillTheFacesOfEachLabel() {
    for (int seed = 0; seed < TRIALS; seed++) {
      Partition partition = RandomDrawing.of(seed).partition();
      Mesh mesh = mesh(partition);
      double[] areas = new double[RandomDrawing.SPACE];
      for (int t = 0; t < mesh.triangleCount(); t++) {
        areas[mesh.label(t)] += mesh.area(t);
      }
      for (int label = 0; label < areas.length; label++) {
        double drawn = areaOf(partition, label);
        assertThat(areas[label])
            .as("seed %d label %d", seed, label)
            .isCloseTo(drawn, within(1e-9 * drawn));
      }
    }
  }

  @Test
  void noAngleOutsideLaddersIsSmallUnlessTheDrawingHasOne() {
    int checked = 0;
    for (int seed = 0; seed < TRIALS; seed++) {
      Refined refined = new Refined(RandomDrawing.of(seed).partition());
      for (int t = 0; t < refined.plane.triangleCount; t++) {
        if (refined.isMeshed(t) && !refined.ladders.isLadder(t) && !refined.isByASharpCorner(t)) {
          checked++;
          assertThat(refined.leastAngle(t))
              .as("seed %d triangle %d", seed, t)
              .isGreaterThan(DelaunayRefinement.LEAST_ANGLE_DEGREES - 1e-6);
        }
      }
    }
    assertThat(checked).isGreaterThan(50_000);
  }

  @Test
  void trianglesOutsideLaddersAreDelaunayButAcrossPartitionEdges() {
    for (int seed = 0; seed < 60; seed++) {
      ConstrainedDelaunay plane = new Refined(RandomDrawing.of(seed).partition()).plane;
      for (int h = 0; h < 3 * plane.triangleCount; h++) {
        if (plane.kept[h] == Triangulation.NONE && plane.twin[h] != Triangulation.NONE) {
          int far = plane.apex(plane.twin[h]);
          assertThat(plane.circleContains(h / 3, plane.x[far], plane.y[far]))
              .as("seed %d side %d", seed, h)
              .isFalse();
        }
      }
    }
  }

  @Test
  void theCountOfTrianglesStaysNearThatOfEdges() {
    for (int seed = 0; seed < TRIALS; seed++) {
      Partition partition = RandomDrawing.of(seed).partition();
      assertThat(mesh(partition).triangleCount())
          .as("seed %d", seed)
          .isLessThan(500 + 25 * partition.edgeCount());
    }
  }

  @Test
  void theOrderOfVerticesAndEdgesChangesNeitherAreasNorSizeMuch() {
    for (int seed = 0; seed < 60; seed++) {
      Partition partition = RandomDrawing.of(seed).partition();
      Linework lines = Linework.of(partition);
      Mesh mesh = mesh(partition);
      Mesh other =
          Triangulator.triangulate(
              shuffled(lines, new Random(seed)), l -> l != RandomDrawing.SPACE, SizeField.NONE);
      assertThat(other.triangleCount())
          .as("seed %d", seed)
          .isBetween(mesh.triangleCount() / 2, 2 * mesh.triangleCount());
      assertThat(total(other)).isCloseTo(total(mesh), within(1e-12 * total(mesh)));
    }
  }

  @Test
  void theMeshStaysSoundOverTenRoundsOfRandomBisection() {
    for (int seed = 0; seed < 25; seed++) {
      Partition partition = RandomDrawing.of(seed).partition();
      Linework lines = Linework.of(partition);
      boolean[] meshed = meshed(lines);
      Mesh mesh = mesh(partition);
      Random random = new Random(seed);
      for (int round = 0; round < 10; round++) {
        BitSet marked = new BitSet();
        for (int i = 0; i < 1 + mesh.triangleCount() / 20; i++) {
          marked.set(random.nextInt(mesh.triangleCount()));
        }
        Mesh finer = NewestVertexBisection.refine(mesh, marked).mesh();
        assertThat(finer.triangleCount()).isGreaterThan(mesh.triangleCount());
        MeshCheck.require(finer, lines, meshed);
        mesh = finer;
      }
    }
  }

  private static Mesh mesh(Partition partition) {
    return Triangulator.triangulate(partition, l -> l != RandomDrawing.SPACE, SizeField.NONE);
  }

  private static boolean[] meshed(Linework lines) {
    boolean[] meshed = new boolean[lines.faceLabel.length];
    for (int f = 0; f < meshed.length; f++) {
      meshed[f] = lines.faceLabel[f] != RandomDrawing.SPACE;
    }
    return meshed;
  }

  private static double areaOf(Partition partition, int label) {
    double area = 0;
    for (int f = 0; f < partition.faceCount(); f++) {
      area += partition.faceLabel(f) == label ? partition.faceArea(f) : 0;
    }
    return area;
  }

  private static double total(Mesh mesh) {
    double sum = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sum += mesh.area(t);
    }
    return sum;
  }

  /** The same lines in another order, some of them the other way round. */
  private static Linework shuffled(Linework lines, Random random) {
    int[] vertexOrder = order(lines.x.length, random);
    int[] place = new int[vertexOrder.length];
    double[] x = new double[vertexOrder.length];
    double[] y = new double[vertexOrder.length];
    for (int i = 0; i < vertexOrder.length; i++) {
      place[vertexOrder[i]] = i;
      x[i] = lines.x[vertexOrder[i]];
      y[i] = lines.y[vertexOrder[i]];
    }
    int[] edgeOrder = order(lines.start.length, random);
    int[] start = new int[edgeOrder.length];
    int[] end = new int[edgeOrder.length];
    int[] left = new int[edgeOrder.length];
    int[] right = new int[edgeOrder.length];
    for (int i = 0; i < edgeOrder.length; i++) {
      int e = edgeOrder[i];
      boolean turn = random.nextBoolean();
      start[i] = place[turn ? lines.end[e] : lines.start[e]];
      end[i] = place[turn ? lines.start[e] : lines.end[e]];
      left[i] = turn ? lines.rightFace[e] : lines.leftFace[e];
      right[i] = turn ? lines.leftFace[e] : lines.rightFace[e];
    }
    return new Linework(lines.origin, x, y, start, end, left, right, lines.faceLabel);
  }

  private static int[] order(int count, Random random) {
    int[] order = new int[count];
    for (int i = 0; i < count; i++) {
      int j = random.nextInt(i + 1);
      order[i] = order[j];
      order[j] = i;
    }
    return order;
  }

  /** The triangulation behind the mesh of a partition, which still knows its ladders. */
  private static final class Refined {
    private final Linework lines;
    private final ConstrainedDelaunay plane;
    private final Ladders ladders;
    private final boolean[] meshed;

    Refined(Partition partition) {
      lines = Linework.of(partition).alongCurve();
      meshed = meshed(lines);
      plane = new ConstrainedDelaunay(lines);
      Faces.fill(plane, lines);
      ladders = new Ladders(plane, lines);
      ladders.build(LadderSearch.search(plane, meshed));
      new DelaunayRefinement(plane, lines, ladders, meshed, SizeField.NONE).run();
    }

    boolean isMeshed(int t) {
      return plane.face[t] >= 0 && meshed[plane.face[t]];
    }

    /**
     * Whether two edges of the drawing meet under less than 60° at a corner of the triangle, or two
     * of its corners lie on two such edges at equal distance from where they meet.
     */
    boolean isByASharpCorner(int t) {
      for (int i = 0; i < 3; i++) {
        int v = plane.corner[3 * t + i];
        if (plane.edgeOf[v] == Triangulation.GIVEN && hasSharpCorner(v)) {
          return true;
        }
        int p = plane.corner[3 * t + (i + 1) % 3];
        int e = plane.edgeOf[v];
        int f = plane.edgeOf[p];
        if (e >= 0 && f >= 0 && e != f) {
          int z = common(e, f);
          if (z >= 0
              && hasSharpCorner(z)
              && Math.abs(plane.distance(z, v) / plane.distance(z, p) - 1) < 1e-5) {
            return true;
          }
        }
      }
      return false;
    }

    double leastAngle(int t) {
      double least = 180;
      for (int k = 0; k < 3; k++) {
        int a = plane.corner[3 * t + k];
        int b = plane.corner[3 * t + (k + 1) % 3];
        int c = plane.corner[3 * t + (k + 2) % 3];
        least = Math.min(least, angle(a, b, c));
      }
      return least;
    }

    private int common(int e, int f) {
      int[] ends = {lines.start[e], lines.end[e]};
      for (int v : ends) {
        if (v == lines.start[f] || v == lines.end[f]) {
          return v + ConstrainedDelaunay.FIRST;
        }
      }
      return -1;
    }

    private boolean hasSharpCorner(int v) {
      int given = v - ConstrainedDelaunay.FIRST;
      for (int e = 0; e < lines.start.length; e++) {
        for (int f = 0; f < e; f++) {
          if ((lines.start[e] == given || lines.end[e] == given)
              && (lines.start[f] == given || lines.end[f] == given)
              && angle(v, farEnd(e, given), farEnd(f, given)) < 60) {
            return true;
          }
        }
      }
      return false;
    }

    private int farEnd(int e, int v) {
      return (lines.start[e] == v ? lines.end[e] : lines.start[e]) + ConstrainedDelaunay.FIRST;
    }

    private double angle(int at, int p, int q) {
      double px = plane.x[p] - plane.x[at];
      double py = plane.y[p] - plane.y[at];
      double qx = plane.x[q] - plane.x[at];
      double qy = plane.y[q] - plane.y[at];
      return Math.toDegrees(Math.atan2(Math.abs(px * qy - py * qx), px * qx + py * qy));
    }
  }
}
