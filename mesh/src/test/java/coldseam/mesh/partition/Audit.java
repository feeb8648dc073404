package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.locationtech.jts.algorithm.RobustLineIntersector;
import org.locationtech.jts.geom.Coordinate;

/** Everything a partition promises, checked the slow and plain way, edge against edge. */
final class Audit {
  private final Partition partition;
  private final Map<Long, Integer> faceOnLeft = new HashMap<>();

  private Audit(Partition partition) {
    this.partition = partition;
  }

  static void check(Partition partition) {
    Audit audit = new Audit(partition);
    audit.edgesAreUniqueAndDivide();
    audit.ringsUseEachSideOnce();
    audit.edgesMeetOnlyAtVertices();
    audit.everyVertexJoinsTwoEdgesOrMore();
  }

  private void edgesAreUniqueAndDivide() {
    for (int e = 0; e < partition.edgeCount(); e++) {
      int a = partition.edgeStart(e);
      int b = partition.edgeEnd(e);
      assertThat(a).isNotEqualTo(b);
      assertThat(faceOnLeft.put(key(a, b), partition.leftFace(e))).isNull();
      assertThat(faceOnLeft.put(key(b, a), partition.rightFace(e))).isNull();
      assertThat(partition.leftFace(e)).isNotEqualTo(partition.rightFace(e));
      if (partition.leftLabel(e) == partition.rightLabel(e)) {
        assertThat(partition.linesOn(e)).as("an edge inside one label").isNotEmpty();
      }
    }
  }

  private void ringsUseEachSideOnce() {
    Set<Long> used = new HashSet<>();
    for (int f = 0; f < partition.faceCount(); f++) {
      double area = 0;
      boolean outer = true;
      for (int[] ring : partition.faceRings(f)) {
        Set<Integer> passed = new HashSet<>();
        for (int i = 0; i < ring.length; i++) {
          long side = key(ring[i], ring[(i + 1) % ring.length]);
          assertThat(faceOnLeft.get(side)).isEqualTo(f);
          assertThat(used.add(side)).as("each side of an edge is in one ring").isTrue();
          assertThat(passed.add(ring[i])).as("a ring passes a vertex once").isTrue();
        }
        double ringArea = ringArea(ring);
        assertThat(ringArea > 0).as("outer rings run counter-clockwise").isEqualTo(outer);
        area += ringArea;
        outer = false;
      }
      assertThat(partition.faceArea(f)).isCloseTo(area, within(1e-13)).isPositive();
    }
    long sides = faceOnLeft.values().stream().filter(face -> face != Partition.NONE).count();
    assertThat(used).hasSize((int) sides);
  }

  private void edgesMeetOnlyAtVertices() {
    RobustLineIntersector intersector = new RobustLineIntersector();
    for (int e = 0; e < partition.edgeCount(); e++) {
      Coordinate a = coordinate(partition.edgeStart(e));
      Coordinate b = coordinate(partition.edgeEnd(e));
      for (int g = 0; g < e; g++) {
        Coordinate c = coordinate(partition.edgeStart(g));
        Coordinate d = coordinate(partition.edgeEnd(g));
        intersector.computeIntersection(a, b, c, d);
        assertThat(intersector.isInteriorIntersection()).as("edges cross").isFalse();
      }
    }
  }

  private void everyVertexJoinsTwoEdgesOrMore() {
    int[] degree = new int[partition.vertexCount()];
    for (int e = 0; e < partition.edgeCount(); e++) {
      degree[partition.edgeStart(e)]++;
      degree[partition.edgeEnd(e)]++;
    }
    for (int d : degree) {
      assertThat(d).isGreaterThanOrEqualTo(2);
    }
  }

  private double ringArea(int[] ring) {
    double twice = 0;
    for (int i = 1; i < ring.length; i++) {
      int a = ring[i];
      int b = ring[(i + 1) % ring.length];
      double ax = partition.x(a) - partition.x(ring[0]);
      double ay = partition.y(a) - partition.y(ring[0]);
      double bx = partition.x(b) - partition.x(ring[0]);
      double by = partition.y(b) - partition.y(ring[0]);
      twice += ax * by - bx * ay;
    }
    return twice / 2;
  }

  private Coordinate coordinate(int v) {
    return new Coordinate(partition.x(v), partition.y(v));
  }

  private static long key(int a, int b) {
    return (long) a << 32 | b;
  }
}
