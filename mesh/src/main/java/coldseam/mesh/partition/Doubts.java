package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/** Lists what looks doubtful in a drawing, in the order of {@link Defect.Kind}. */
final class Doubts {
  private static final int NONE = Partition.NONE;

  private final Point origin;
  private final int[] labels;
  private final Outlines outlines;
  private final double[] thickness;
  private final List<List<Defect>> byKind = new ArrayList<>();

  Doubts(Outlines outlines, int[] labels, double[] coveredArea) {
    this.origin = outlines.origin();
    this.labels = labels;
    this.outlines = outlines;
    this.thickness = new double[labels.length];
    for (int a = 0; a < labels.length; a++) {
      thickness[a] = 2 * coveredArea[a] / outlines.shape(a).perimeterM();
    }
    for (int k = 0; k < Defect.Kind.values().length; k++) {
      byKind.add(new ArrayList<>());
    }
  }

  /** All doubts, kind by kind. */
  List<Defect> all() {
    List<Defect> all = new ArrayList<>();
    for (List<Defect> kind : byKind) {
      all.addAll(kind);
    }
    return all;
  }

  void add(Defect.Kind kind, double x, double y, double sizeM, List<Integer> concerned) {
    Point where = new Point(origin.x() + x, origin.y() + y);
    byKind.get(kind.ordinal()).add(new Defect(kind, where, sizeM, concerned));
  }

  void addClosed(List<ClosedGaps.Gap> closed) {
    for (ClosedGaps.Gap gap : closed) {
      add(Defect.Kind.CLOSED_GAP, gap.x(), gap.y(), gap.widthM(), gap.labels());
    }
  }

  void addCrossings(SelfCrossings crossings) {
    for (SelfCrossings.Crossing c : crossings.found()) {
      add(Defect.Kind.SELF_CROSSING, c.x(), c.y(), c.widthM(), List.of(labels[c.area()]));
    }
  }

  void addOff(List<LineLaying.Off> off) {
    for (LineLaying.Off part : off) {
      List<Integer> line = List.of(part.line());
      add(Defect.Kind.LINE_OFF_EDGE, part.x(), part.y(), part.lengthM(), line);
    }
  }

  /** Areas without area, and areas of which nothing is seen. */
  void addLost(HalfEdges halves, FaceBuilder faces) {
    boolean[] covers = new boolean[labels.length];
    boolean[] seen = new boolean[labels.length];
    for (int l = 0; l < halves.loopCount; l++) {
      for (int area : faces.members(l)) {
        covers[area] = true;
      }
      if (faces.top(l) != NONE) {
        seen[faces.top(l)] = true;
      }
    }
    for (int a = 0; a < labels.length; a++) {
      if (seen[a]) {
        continue;
      }
      Shape shape = outlines.shape(a);
      double[] at = shape.innerPoint();
      Defect.Kind kind = covers[a] ? Defect.Kind.HIDDEN : Defect.Kind.ZERO_AREA;
      double size = covers[a] ? thickness[a] : shape.perimeterM() / 2;
      add(kind, at[0], at[1], size, List.of(labels[a]));
    }
  }

  /**
   * Slivers among the faces, enclosed ground that nothing covers, and thin strips of either that
   * open into more of the same.
   */
  void addFaces(
      Boundaries edges, HalfEdges halves, FaceRings rings, int[] topOfLoop, double closeM) {
    int n = halves.loop.length;
    GapSearch.Sides sides =
        new GapSearch.Sides(new boolean[n], new int[n], new boolean[n], new double[n]);
    for (int h = 0; h < n; h++) {
      boolean forward = (h & 1) == 0;
      int area = topOfLoop[forward ? edges.leftLoop[h >> 1] : edges.rightLoop[h >> 1]];
      sides.label()[h] = area == NONE ? NONE : labels[area];
      sides.isOwn()[h] = forward ? edges.leftOwn[h >> 1] : edges.rightOwn[h >> 1];
      sides.thickness()[h] = area == NONE ? 0 : thickness[area];
    }
    double leftoverM = Limits.SLIVER_CLOSING_LENGTHS * closeM;
    boolean[] sliver = addSlivers(edges, halves, rings, sides, leftoverM);
    boolean[] thinHole = addHoles(edges, halves, rings, sides);
    for (int h = 0; h < n; h++) {
      int face = rings.faceOf(h);
      int hole = rings.holeOf(h);
      sides.searched()[h] = !(face >= 0 && sliver[face]) && !(hole >= 0 && thinHole[hole]);
    }
    for (GapSearch.Gap gap : new GapSearch(edges, halves, sides, closeM).find()) {
      LabelSet concerned = new LabelSet();
      concerned.add(gap.label());
      for (int h : gap.halves()) {
        concerned.add(sides.label()[h ^ 1]);
      }
      Defect.Kind kind = gap.label() == NONE ? Defect.Kind.GAP : Defect.Kind.SLIVER;
      add(kind, gap.x(), gap.y(), gap.widthM(), concerned.ascending());
    }
  }

  private boolean[] addSlivers(
      Boundaries edges,
      HalfEdges halves,
      FaceRings rings,
      GapSearch.Sides sides,
      double leftoverM) {
    boolean[] sliver = new boolean[rings.faces().size()];
    for (int f = 0; f < sliver.length; f++) {
      FaceRings.Face face = rings.faces().get(f);
      double outline = 0;
      double leftover = 0;
      double thinnest = Double.POSITIVE_INFINITY;
      for (int loop : face.loops()) {
        int h = halves.loopStart[loop];
        do {
          double length = edges.length(h >> 1);
          outline += length;
          leftover += sides.isOwn()[h] ? 0 : length;
          thinnest = Math.min(thinnest, sides.thickness()[h]);
          h = halves.next[h];
        } while (h != halves.loopStart[loop]);
      }
      double width = 2 * rings.area(face) / outline;
      sliver[f] =
          width <= Limits.THIN * outline / 2
              && width <= leftoverM
              && width <= Limits.MUCH_THINNER * thinnest
              && leftover >= Limits.LEFTOVER * outline;
      if (sliver[f]) {
        addFace(Defect.Kind.SLIVER, face, width, edges, halves, sides);
      }
    }
    return sliver;
  }

  private boolean[] addHoles(
      Boundaries edges, HalfEdges halves, FaceRings rings, GapSearch.Sides sides) {
    boolean[] thin = new boolean[rings.holes().size()];
    for (int i = 0; i < thin.length; i++) {
      FaceRings.Face hole = rings.holes().get(i);
      double half = Shape.of(hole.rings(), edges.x, edges.y).perimeterM() / 2;
      double width = rings.area(hole) / half;
      thin[i] = width <= Limits.THIN * half;
      Defect.Kind kind = thin[i] ? Defect.Kind.GAP : Defect.Kind.UNCOVERED;
      addFace(kind, hole, width, edges, halves, sides);
    }
    return thin;
  }

  private void addFace(
      Defect.Kind kind,
      FaceRings.Face face,
      double width,
      Boundaries edges,
      HalfEdges halves,
      GapSearch.Sides sides) {
    LabelSet concerned = new LabelSet();
    concerned.add(face.label());
    for (int loop : face.loops()) {
      int h = halves.loopStart[loop];
      do {
        concerned.add(sides.label()[h ^ 1]);
        h = halves.next[h];
      } while (h != halves.loopStart[loop]);
    }
    double[] at = Shape.of(face.rings(), edges.x, edges.y).innerPoint();
    add(kind, at[0], at[1], width, concerned.ascending());
  }
}
