package coldseam.mesh.partition;

import coldseam.mesh.plane.Resolution;
import java.util.Arrays;
import java.util.List;

/**
 * The way from laid areas to a partition: node, label, close gaps and node again as long as there
 * are any, lay the lines, merge faces of one label, list what is doubtful.
 */
final class PartitionBuilder {
  private static final int NONE = Partition.NONE;

  private final List<LabelledArea> laid;
  private final double snapM;
  private final double closeM;
  private final int[] labels;
  private final Outlines outlines;
  private final Noding noding;
  private final ClosedGaps closed;
  private SelfCrossings crossings;
  private Linework linework;
  private HalfEdges halves;
  private FaceBuilder faces;

  /** How far any point was moved by all steps so far together, at most, m. */
  private double displacementM;

  PartitionBuilder(List<LabelledArea> laid, Resolution resolution) {
    if (laid.isEmpty()) {
      throw new IllegalArgumentException("a partition needs an area");
    }
    this.laid = laid;
    snapM = resolution.snapM();
    closeM = Limits.TIE * resolution.closeM();
    labels = new int[laid.size()];
    for (int a = 0; a < labels.length; a++) {
      labels[a] = laid.get(a).label();
    }
    outlines = new Outlines(laid, snapM);
    noding = new Noding(snapM);
    closed = new ClosedGaps(closeM);
  }

  Partition build(List<LabelledLine> lines) {
    nodeAndLabel();
    if (linework.edgeCount == 0) {
      throw new IllegalArgumentException("nothing of the areas is left: none has an area");
    }
    int[] topOfLoop = new int[halves.loopCount];
    int[] loopLabels = new int[halves.loopCount];
    for (int l = 0; l < topOfLoop.length; l++) {
      topOfLoop[l] = faces.top(l);
      loopLabels[l] = topOfLoop[l] == NONE ? NONE : labels[topOfLoop[l]];
    }
    Doubts doubts = new Doubts(outlines, labels, checkedAreas());
    doubts.addCrossings(crossings);
    doubts.addClosed(closed.gaps());
    doubts.addLost(halves, faces);

    LineLaying laying =
        new LineLaying(Boundaries.of(linework, halves, faces), loopLabels, closeM + displacementM);
    for (LabelledLine line : lines) {
      layLine(laying, line);
    }
    doubts.addOff(laying.off());
    return merged(laying.laid(), topOfLoop, loopLabels, doubts);
  }

  private Partition merged(Boundaries all, int[] topOfLoop, int[] loopLabels, Doubts doubts) {
    Merging merging = new Merging(all, loopLabels, snapM);
    Boundaries edges = merging.merged();
    HalfEdges merged = new HalfEdges(edges.x, edges.y, edges.start, edges.end);
    FaceRings rings = new FaceRings(edges, merged, loopLabels);
    if (PartitionCheck.withoutArea(rings).isPresent()) {
      // vertices on edges that are straight but for the resolution hold a thinner face open
      merging = new Merging(all, loopLabels, 0);
      edges = merging.merged();
      merged = new HalfEdges(edges.x, edges.y, edges.start, edges.end);
      rings = new FaceRings(edges, merged, loopLabels);
    }
    displacementM += merging.largestShiftM();
    PartitionCheck.faces(edges, merged, rings, loopLabels);
    PartitionCheck.merging(halves.loopArea, loopLabels, edges, rings, merging.largestShiftM());
    doubts.addFaces(edges, merged, rings, topOfLoop, closeM);
    return new Partition(outlines.origin(), edges, rings, doubts.all(), displacementM);
  }

  private void nodeAndLabel() {
    linework = outlines.node(noding);
    crossings = new SelfCrossings(outlines, noding, linework, snapM);
    displacementM = outlines.largestJoinM() + noding.largestBendM();
    for (int turn = 0; ; turn++) {
      halves = new HalfEdges(linework.x, linework.y, linework.start, linework.end);
      faces = new FaceBuilder(linework, halves);
      String fault = PartitionCheck.faultIn(linework, halves, faces);
      double[] x = linework.x.clone();
      double[] y = linework.y.clone();
      if (fault == null) {
        GapClosing closing = new GapClosing(linework, halves, faces, labels, snapM, closeM);
        if (turn == Limits.MOST_TURNS || !closing.close(x, y, closed)) {
          return;
        }
        displacementM += closing.largestMoveM();
      } else if (turn == Limits.MOST_TURNS) {
        throw new IllegalStateException(fault);
      }
      nodeAgain(x, y);
    }
  }

  private void nodeAgain(double[] x, double[] y) {
    PointIndex points = new PointIndex(snapM);
    int[] number = new int[x.length];
    double joined = 0;
    for (int v = 0; v < x.length; v++) {
      number[v] = points.add(x[v], y[v]);
      double moved = Segments.length(points.x(number[v]) - x[v], points.y(number[v]) - y[v]);
      joined = Math.max(joined, moved);
    }
    int n = 0;
    int[] start = new int[linework.edgeCount];
    int[] end = new int[linework.edgeCount];
    int[][] areas = new int[linework.edgeCount][];
    for (int e = 0; e < linework.edgeCount; e++) {
      int a = number[linework.start[e]];
      int b = number[linework.end[e]];
      if (a != b) {
        start[n] = a;
        end[n] = b;
        areas[n++] = linework.areas[e];
      }
    }
    linework =
        noding.node(
            points.xs(),
            points.ys(),
            Arrays.copyOf(start, n),
            Arrays.copyOf(end, n),
            Arrays.copyOf(areas, n));
    displacementM += joined + noding.largestBendM();
  }

  /** Area under each laid area, compared with its ring where it is one plain ring, m². */
  private double[] checkedAreas() {
    double[] covered = new double[labels.length];
    for (int l = 0; l < halves.loopCount; l++) {
      for (int area : faces.members(l)) {
        covered[area] += halves.loopArea[l];
      }
    }
    double[] drawn = new double[labels.length];
    double[] allowance = new double[labels.length];
    int ring = 0;
    for (int a = 0; a < labels.length; a++) {
      Shape shape = outlines.shape(a);
      boolean plain = laid.get(a).rings().size() == 1 && crossings.isPlain(ring);
      drawn[a] = plain ? Math.abs(shape.ringArea(0)) : Double.NaN;
      allowance[a] = PartitionCheck.allowance(shape.perimeterM(), displacementM);
      ring += laid.get(a).rings().size();
    }
    PartitionCheck.areas(drawn, covered, allowance);
    return covered;
  }

  private void layLine(LineLaying laying, LabelledLine line) {
    int n = line.points().size();
    double[] x = new double[n];
    double[] y = new double[n];
    for (int i = 0; i < n; i++) {
      x[i] = line.points().get(i).x() - outlines.origin().x();
      y[i] = line.points().get(i).y() - outlines.origin().y();
    }
    laying.lay(line.label(), x, y);
  }
}
