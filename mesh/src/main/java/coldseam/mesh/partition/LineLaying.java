package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Lays lines onto edges: an edge, or the part of it beside the line, that runs along a line no
 * farther from it than the tolerance carries the line. Edges are split where a line ends or turns.
 * What of a line lies on no edge between different labels is gathered as {@link Off}.
 */
final class LineLaying {
  private final Boundaries boundaries;
  private final int[] loopLabels;
  private final double toleranceM;
  private final List<Cover> covers = new ArrayList<>();
  private final List<Off> off = new ArrayList<>();

  /** The part of an edge, between two fractions of it, that a line covers. */
  private record Cover(
      int edge, double from, double to, int line, boolean endFrom, boolean endTo) {}

  /**
   * A straight side of a line: from (x, y) in the direction (ux, uy), and where it starts on it.
   */
  private record Side(
      int line,
      double x,
      double y,
      double ux,
      double uy,
      double length,
      double start,
      boolean first,
      boolean last) {
    double along(double px, double py) {
      return (px - x) * ux + (py - y) * uy;
    }

    double off(double px, double py) {
      return (px - x) * uy - (py - y) * ux;
    }
  }

  /** A part of a line, from and to a distance along it. */
  private record Part(double from, double to) {}

  /** A part of a line that lies on no edge: its middle and length, m. */
  record Off(int line, double x, double y, double lengthM) {}

  LineLaying(Boundaries boundaries, int[] loopLabels, double toleranceM) {
    this.boundaries = boundaries;
    this.loopLabels = loopLabels;
    this.toleranceM = toleranceM;
  }

  /** What was found to lie on no edge, in the order of the lines. */
  List<Off> off() {
    return off;
  }

  /** Finds the edges along a line given by local coordinates. */
  void lay(int line, double[] px, double[] py) {
    List<Part> covered = new ArrayList<>();
    double along = 0;
    int last = px.length - 2;
    for (int s = 0; s <= last; s++) {
      double dx = px[s + 1] - px[s];
      double dy = py[s + 1] - py[s];
      double length = Segments.length(dx, dy);
      if (length > 0) {
        Side side =
            new Side(
                line, px[s], py[s], dx / length, dy / length, length, along, s == 0, s == last);
        for (int e = 0; e < boundaries.edgeCount; e++) {
          layOn(e, side, covered);
        }
      }
      along += length;
    }
    gatherOff(line, px, py, along, covered);
  }

  private void layOn(int e, Side side, List<Part> covered) {
    Boundaries b = boundaries;
    double ta = side.along(b.x[b.start[e]], b.y[b.start[e]]);
    double tb = side.along(b.x[b.end[e]], b.y[b.end[e]]);
    double low = Math.min(ta, tb);
    double high = Math.max(ta, tb);
    double da = side.off(b.x[b.start[e]], b.y[b.start[e]]);
    double db = side.off(b.x[b.end[e]], b.y[b.end[e]]);
    if (high <= toleranceM
        || low >= side.length - toleranceM
        || Math.abs(db - da) > Limits.LEAN * (high - low)) {
      return;
    }
    double from = fraction(low < -toleranceM, (0 - ta) / (tb - ta), ta > tb);
    double to = fraction(high > side.length + toleranceM, (side.length - ta) / (tb - ta), ta < tb);
    double offset = Math.max(Math.abs(da + from * (db - da)), Math.abs(da + to * (db - da)));
    if (offset > toleranceM || Math.abs(to - from) * (high - low) <= toleranceM) {
      return;
    }
    boolean fromIsEnd = side.first && low <= toleranceM;
    boolean toIsEnd = side.last && high >= side.length - toleranceM;
    covers.add(
        from <= to
            ? new Cover(e, from, to, side.line, fromIsEnd, toIsEnd)
            : new Cover(e, to, from, side.line, toIsEnd, fromIsEnd));
    if (loopLabels[b.leftLoop[e]] != loopLabels[b.rightLoop[e]]) {
      double t0 = side.start + Math.max(0, low);
      double t1 = side.start + Math.min(side.length, high);
      insert(new Part(t0, t1), covered);
    }
  }

  /** Inserts a part into parts ordered by where they begin. */
  private static void insert(Part part, List<Part> parts) {
    int i = parts.size();
    while (i > 0 && parts.get(i - 1).from > part.from) {
      i--;
    }
    parts.add(i, part);
  }

  /** A fraction of an edge: where the line ends on it, or else one end of the edge. */
  private static double fraction(boolean within, double there, boolean edgeEnd) {
    if (within) {
      return there;
    }
    return edgeEnd ? 1 : 0;
  }

  private void gatherOff(int line, double[] px, double[] py, double length, List<Part> covered) {
    double reached = 0;
    for (Part part : covered) {
      addOff(line, px, py, reached, part.from);
      reached = Math.max(reached, part.to);
    }
    addOff(line, px, py, reached, length);
  }

  private void addOff(int line, double[] px, double[] py, double from, double to) {
    // Two ends may each be off by the tolerance without anything being amiss.
    if (to - from <= 2 * toleranceM) {
      return;
    }
    double middle = (from + to) / 2;
    int s = 0;
    double length = Segments.length(px[1] - px[0], py[1] - py[0]);
    while (middle > length && s < px.length - 2) {
      middle -= length;
      s++;
      length = Segments.length(px[s + 1] - px[s], py[s + 1] - py[s]);
    }
    double t = middle / length;
    double x = px[s] + t * (px[s + 1] - px[s]);
    double y = py[s] + t * (py[s + 1] - py[s]);
    off.add(new Off(line, x, y, to - from));
  }

  /** The boundaries with the lines laid on them, edges split where lines end. */
  Boundaries laid() {
    if (covers.isEmpty()) {
      return boundaries;
    }
    List<List<Cover>> byEdge = new ArrayList<>(boundaries.edgeCount);
    for (int e = 0; e < boundaries.edgeCount; e++) {
      byEdge.add(null);
    }
    for (Cover cover : covers) {
      List<Cover> onEdge = byEdge.get(cover.edge);
      if (onEdge == null) {
        onEdge = new ArrayList<>(2);
        byEdge.set(cover.edge, onEdge);
      }
      onEdge.add(cover);
    }
    Boundaries b = boundaries;
    Boundaries laid =
        new Boundaries(
            Arrays.copyOf(b.x, b.vertexCount),
            Arrays.copyOf(b.y, b.vertexCount),
            b.edgeCount + 2 * covers.size());
    for (int e = 0; e < b.edgeCount; e++) {
      List<Cover> onEdge = byEdge.get(e);
      if (onEdge == null) {
        laid.addPiece(b, e, b.start[e], b.end[e], b.lines[e]);
      } else {
        split(e, onEdge, laid);
      }
    }
    return laid;
  }

  private void split(int e, List<Cover> onEdge, Boundaries laid) {
    int a = boundaries.start[e];
    int b = boundaries.end[e];
    double length =
        Segments.length(boundaries.x[b] - boundaries.x[a], boundaries.y[b] - boundaries.y[a]);
    double[] stops = new double[2 * onEdge.size() + 2];
    int n = 0;
    stops[n++] = 0;
    stops[n++] = 1;
    for (Cover cover : onEdge) {
      stops[n++] = cover.from;
      stops[n++] = cover.to;
    }
    Arrays.sort(stops);
    double from = 0;
    int fromVertex = a;
    pin(onEdge, 0, length, laid, a);
    pin(onEdge, 1, length, laid, b);
    for (double stop : stops) {
      boolean apart = (stop - from) * length > toleranceM;
      boolean inside = (1 - stop) * length > toleranceM;
      if (!apart || (!inside && stop < 1)) {
        continue;
      }
      int toVertex = b;
      if (inside) {
        double px = boundaries.x[a] + stop * (boundaries.x[b] - boundaries.x[a]);
        double py = boundaries.y[a] + stop * (boundaries.y[b] - boundaries.y[a]);
        toVertex = laid.addVertex(px, py);
        pin(onEdge, stop, length, laid, toVertex);
      }
      int[] lines = linesAt(onEdge, (from + stop) / 2, boundaries.lines[e]);
      laid.addPiece(boundaries, e, fromVertex, toVertex, lines);
      from = stop;
      fromVertex = toVertex;
    }
  }

  private void pin(List<Cover> onEdge, double stop, double length, Boundaries laid, int vertex) {
    for (Cover cover : onEdge) {
      boolean endsHere =
          (cover.endFrom && Math.abs(cover.from - stop) * length <= toleranceM)
              || (cover.endTo && Math.abs(cover.to - stop) * length <= toleranceM);
      if (endsHere) {
        laid.pinned[vertex] = true;
      }
    }
  }

  private static int[] linesAt(List<Cover> onEdge, double middle, int[] already) {
    LabelSet lines = new LabelSet();
    for (int line : already) {
      lines.add(line);
    }
    for (Cover cover : onEdge) {
      if (cover.from <= middle && middle <= cover.to) {
        lines.add(cover.line);
      }
    }
    List<Integer> ascending = lines.ascending();
    int[] labels = new int[ascending.size()];
    for (int i = 0; i < labels.length; i++) {
      labels[i] = ascending.get(i);
    }
    return labels;
  }
}
