package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Lists what looks doubtful in a drawing, in the order of {@link Defect.Kind}. */
final class Doubts {
  /** A leftover strip is called a sliver up to this many closing lengths. */
  private static final double SLIVER_CLOSING_LENGTHS = 1000;

  /** A face is a leftover when at least this part of its outline belongs to other areas. */
  private static final double LEFTOVER = 0.25;

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

  void addClosed(List<GapClosing.Closed> closed) {
    for (GapClosing.Closed gap : closed) {
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

  /** Slivers among the faces, enclosed ground that nothing covers, and gaps. */
  void addFaces(
      Boundaries edges, HalfEdges halves, FaceRings rings, int[] topOfLoop, double closeM) {
    double[] leftover = new double[rings.faces().size()];
    double[] outline = new double[leftover.length];
    double[] thinnest = new double[leftover.length];
    Arrays.fill(thinnest, Double.POSITIVE_INFINITY);
    LabelSet[] beside = new LabelSet[leftover.length];
    for (int h = 0; h < halves.loop.length; h++) {
      int face = rings.faceOf(h);
      if (face == NONE) {
        continue;
      }
      double length = length(edges, h);
      outline[face] += length;
      leftover[face] += isOwn(edges, h) ? 0 : length;
      thinnest[face] = Math.min(thinnest[face], thickness[topOfLoop[side(edges, h)]]);
      if (beside[face] == null) {
        beside[face] = new LabelSet();
      }
      beside[face].add(label(edges, h, topOfLoop));
      beside[face].add(label(edges, h ^ 1, topOfLoop));
    }
    for (int f = 0; f < leftover.length; f++) {
      FaceRings.Face face = rings.faces().get(f);
      double width = 2 * rings.area(face) / outline[f];
      boolean thin = width <= GapSearch.THIN * outline[f] / 2;
      if (thin
          && width <= SLIVER_CLOSING_LENGTHS * closeM
          && width <= GapSearch.MUCH_THINNER * thinnest[f]
          && leftover[f] >= LEFTOVER * outline[f]) {
        double[] at = Shape.of(face.rings(), edges.x, edges.y).innerPoint();
        add(Defect.Kind.SLIVER, at[0], at[1], width, beside[f].ascending());
      }
    }
    addHoles(edges, halves, rings, topOfLoop);
  }

  private void addHoles(Boundaries edges, HalfEdges halves, FaceRings rings, int[] topOfLoop) {
    boolean[] thin = new boolean[rings.holes().size()];
    for (int i = 0; i < thin.length; i++) {
      FaceRings.Face hole = rings.holes().get(i);
      Shape shape = Shape.of(hole.rings(), edges.x, edges.y);
      double half = shape.perimeterM() / 2;
      double width = rings.area(hole) / half;
      thin[i] = width <= GapSearch.THIN * half;
      LabelSet beside = new LabelSet();
      for (int loop : hole.loops()) {
        int first = halves.loopStart[loop];
        int h = first;
        do {
          beside.add(label(edges, h ^ 1, topOfLoop));
          h = halves.next[h];
        } while (h != first);
      }
      double[] at = shape.innerPoint();
      Defect.Kind kind = thin[i] ? Defect.Kind.GAP : Defect.Kind.UNCOVERED;
      add(kind, at[0], at[1], width, beside.ascending());
    }
    addOpenGaps(edges, halves, rings, topOfLoop, thin);
  }

  private void addOpenGaps(
      Boundaries edges, HalfEdges halves, FaceRings rings, int[] topOfLoop, boolean[] thinHole) {
    boolean[] open = new boolean[halves.loop.length];
    double[] beyond = new double[open.length];
    boolean any = false;
    for (int h = 0; h < open.length; h++) {
      if (label(edges, h, topOfLoop) == NONE) {
        int hole = rings.holeOf(h);
        open[h] = hole < 0 || !thinHole[hole];
        beyond[h] = thickness[topOfLoop[side(edges, h ^ 1)]];
        any |= open[h];
      }
    }
    if (!any) {
      return;
    }
    for (GapSearch.Gap gap : new GapSearch(edges, halves, open, beyond).find()) {
      LabelSet beside = new LabelSet();
      for (int h : gap.halves()) {
        beside.add(label(edges, h ^ 1, topOfLoop));
      }
      add(Defect.Kind.GAP, gap.x(), gap.y(), gap.widthM(), beside.ascending());
    }
  }

  private static double length(Boundaries edges, int h) {
    int a = edges.start[h >> 1];
    int b = edges.end[h >> 1];
    return Math.hypot(edges.x[b] - edges.x[a], edges.y[b] - edges.y[a]);
  }

  private static boolean isOwn(Boundaries edges, int h) {
    return (h & 1) == 0 ? edges.leftOwn[h >> 1] : edges.rightOwn[h >> 1];
  }

  private static int side(Boundaries edges, int h) {
    return (h & 1) == 0 ? edges.leftLoop[h >> 1] : edges.rightLoop[h >> 1];
  }

  private int label(Boundaries edges, int h, int[] topOfLoop) {
    int area = topOfLoop[side(edges, h)];
    return area == NONE ? NONE : labels[area];
  }
}
