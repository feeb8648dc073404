package coldseam.mesh.partition;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What must hold for every partition. The checks cost little and run every time; a failure is a
 * defect of this program, never of the drawing.
 */
final class PartitionCheck {
  private PartitionCheck() {}

  /**
   * Checks labelled linework: no edge ends freely, no edge has one face on both sides, both sides
   * agree with the areas that change across each edge, and the edges lie flat: by Euler's formula
   * vertices − edges + loops is twice the number of connected pieces.
   *
   * @return what is wrong, or null
   */
  static String faultIn(Linework linework, HalfEdges halves, FaceBuilder faces) {
    int vertices = 0;
    for (int v = 0; v < linework.vertexCount; v++) {
      int degree = halves.degree(v);
      if (degree == 1) {
        return "an edge ends freely at local (" + linework.x[v] + ", " + linework.y[v] + ")";
      }
      vertices += degree > 0 ? 1 : 0;
    }
    int e = faces.inconsistentEdge();
    if (e >= 0) {
      int v = linework.start[e];
      return "the sides of the edge at local ("
          + linework.x[v]
          + ", "
          + linework.y[v]
          + ") contradict its areas";
    }
    int euler = vertices - linework.edgeCount + halves.loopCount;
    if (euler != 2 * faces.componentCount()) {
      return "edges cross without a vertex: Euler's sum is " + euler;
    }
    return null;
  }

  /**
   * Checks that the faces under each area drawn as one plain ring add up to the ring.
   *
   * @param drawnArea area of the ring of each laid area as drawn, m², or NaN if not to be checked
   * @param coveredArea area of all loops under each laid area, m²
   * @param allowance difference that moved points explain, m²
   */
  static void areas(double[] drawnArea, double[] coveredArea, double[] allowance) {
    for (int a = 0; a < drawnArea.length; a++) {
      if (Math.abs(drawnArea[a] - coveredArea[a]) > allowance[a]) {
        throw new IllegalStateException(
            "area " + a + " measures " + drawnArea[a] + " m² but its faces " + coveredArea[a]);
      }
    }
  }

  /** Difference of area to be expected when an outline moves by no more than the displacement. */
  static double allowance(double perimeterM, double displacementM) {
    return 2 * perimeterM * displacementM + Limits.ROUNDING * perimeterM * perimeterM;
  }

  /**
   * Checks merged faces: each loop has one label all the way, each face at least three corners and
   * area, no edge one face on both sides.
   */
  static void faces(Boundaries edges, HalfEdges halves, FaceRings rings, int[] loopLabels) {
    int[] labels = new int[halves.loopCount];
    Arrays.fill(labels, Integer.MIN_VALUE);
    for (int h = 0; h < halves.loop.length; h++) {
      int side = (h & 1) == 0 ? edges.leftLoop[h >> 1] : edges.rightLoop[h >> 1];
      int loop = halves.loop[h];
      if (labels[loop] != Integer.MIN_VALUE && labels[loop] != loopLabels[side]) {
        throw fault("a face with two labels", edges, halves.from(h));
      }
      labels[loop] = loopLabels[side];
      if (halves.loop[h ^ 1] == loop) {
        throw fault("an edge with one face on both sides", edges, halves.from(h));
      }
    }
    Optional<FaceRings.Face> empty = withoutArea(rings);
    if (empty.isPresent()) {
      throw fault("a face without area", edges, empty.get().rings().get(0)[0]);
    }
  }

  /** A face with fewer than three corners, or no area within them. */
  static Optional<FaceRings.Face> withoutArea(FaceRings rings) {
    List<FaceRings.Face> all = rings.faces();
    for (FaceRings.Face face : all) {
      if (!(rings.area(face) > 0) || face.rings().get(0).length < 3) {
        return Optional.of(face);
      }
    }
    return Optional.empty();
  }

  /**
   * Checks that merging changed no label's area: the loops first labelled and the merged faces add
   * up to the same.
   *
   * @param loopArea area of each loop first labelled, m²
   * @param loopLabels its label
   * @param edges merged edges
   * @param rings merged faces
   * @param shiftM how far merging moved an edge, at most, m
   */
  static void merging(
      double[] loopArea, int[] loopLabels, Boundaries edges, FaceRings rings, double shiftM) {
    Map<Integer, Double> difference = new HashMap<>();
    for (int l = 0; l < loopArea.length; l++) {
      if (loopLabels[l] != Partition.NONE) {
        add(difference, loopLabels[l], loopArea[l]);
      }
    }
    for (FaceRings.Face face : rings.faces()) {
      add(difference, face.label(), -rings.area(face));
    }
    double outline = 0;
    for (int e = 0; e < edges.edgeCount; e++) {
      outline += 2 * edges.length(e);
    }
    for (Map.Entry<Integer, Double> entry : difference.entrySet()) {
      if (Math.abs(entry.getValue()) > allowance(outline, shiftM)) {
        throw new IllegalStateException(
            "merging changed the area of label " + entry.getKey() + " by " + entry.getValue());
      }
    }
  }

  private static void add(Map<Integer, Double> sums, int label, double value) {
    sums.put(label, sums.getOrDefault(label, 0.0) + value);
  }

  private static IllegalStateException fault(String what, Boundaries edges, int v) {
    return new IllegalStateException(what + " at local (" + edges.x[v] + ", " + edges.y[v] + ") m");
  }
}
