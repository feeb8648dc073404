package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Finds the gaps no wider than the closing length and moves their vertices onto the other side. A
 * gap is uncovered ground between two edges, or the same strip of an area laid earlier that shows
 * between later ones; a strip of which both sides were drawn as its own outline is a sheet and is
 * left alone, however thin. Vertices within the joining length of an edge are always moved onto it.
 */
final class GapClosing {
  /** Cosine of the angle up to which an edge counts as lying across a gap: 45°. */
  private static final double ACROSS = Math.sqrt(0.5);

  private static final int NONE = Partition.NONE;

  private final Linework linework;
  private final HalfEdges halves;
  private final FaceBuilder faces;
  private final int[] labels;
  private final double snapM;
  private final double closeM;
  private final boolean[] kept;

  /** For each vertex the lowest-numbered vertex it is to be joined to, or −1. */
  private final int[] joinTo;

  /** Whether a higher-numbered vertex is to be joined to this one. */
  private final boolean[] awaited;

  /** For each vertex the nearest edge it is to be moved onto, or −1. */
  private final int[] moveOnto;

  private final double[] moveDistance;
  private final Facing[] joinFacing;
  private final Facing[] moveFacing;
  private double largestMoveM;

  /** The two edges that face each other across a gap, and the width there. */
  private record Facing(int edge, int otherEdge, double widthM, int label, int otherLabel) {}

  /**
   * One gap that was closed.
   *
   * @param x local x of its middle, m
   * @param y local y of its middle, m
   * @param widthM its largest width
   * @param labels what lay on its sides
   */
  record Closed(double x, double y, double widthM, List<Integer> labels) {}

  GapClosing(
      Linework linework,
      HalfEdges halves,
      FaceBuilder faces,
      int[] labels,
      double snapM,
      double closeM) {
    this.linework = linework;
    this.halves = halves;
    this.faces = faces;
    this.labels = labels;
    this.snapM = snapM;
    this.closeM = closeM;
    kept = new boolean[linework.edgeCount];
    int n = linework.vertexCount;
    joinTo = new int[n];
    awaited = new boolean[n];
    moveOnto = new int[n];
    moveDistance = new double[n];
    joinFacing = new Facing[n];
    moveFacing = new Facing[n];
    Arrays.fill(joinTo, -1);
    Arrays.fill(moveOnto, -1);
  }

  /** How far the last {@link #close} moved any vertex, m. */
  double largestMoveM() {
    return largestMoveM;
  }

  /**
   * Moves vertices across the gaps found.
   *
   * @param x x of the vertices, changed in place
   * @param y y of the vertices, changed in place
   * @param closed receives the gaps closed
   * @return whether anything was moved
   */
  boolean close(double[] x, double[] y, List<Closed> closed) {
    find();
    int n = linework.vertexCount;
    boolean[] pinned = new boolean[n];
    boolean[] moved = new boolean[n];
    List<Facing> facings = new ArrayList<>();
    List<Integer> movedVertices = new ArrayList<>();
    for (int v = 0; v < n; v++) {
      if (pinned[v]) {
        continue;
      }
      int w = joinTo[v];
      int e = moveOnto[v];
      if (w >= 0 && !moved[w]) {
        x[v] = linework.x[w];
        y[v] = linework.y[w];
        pinned[w] = true;
        facings.add(joinFacing[v]);
      } else if (w < 0 && !awaited[v] && e >= 0 && isStill(e, moved)) {
        moveToFoot(v, e, x, y);
        pinned[linework.start[e]] = true;
        pinned[linework.end[e]] = true;
        facings.add(moveFacing[v]);
      } else {
        continue;
      }
      moved[v] = true;
      movedVertices.add(v);
      double distance = Math.hypot(x[v] - linework.x[v], y[v] - linework.y[v]);
      largestMoveM = Math.max(largestMoveM, distance);
    }
    list(facings, movedVertices, closed);
    return !movedVertices.isEmpty();
  }

  private boolean isStill(int e, boolean[] moved) {
    return !moved[linework.start[e]] && !moved[linework.end[e]];
  }

  private void moveToFoot(int v, int e, double[] x, double[] y) {
    double ax = linework.x[linework.start[e]];
    double ay = linework.y[linework.start[e]];
    double bx = linework.x[linework.end[e]];
    double by = linework.y[linework.end[e]];
    double t = Segments.foot(linework.x[v], linework.y[v], ax, ay, bx, by);
    x[v] = ax + t * (bx - ax);
    y[v] = ay + t * (by - ay);
  }

  private void find() {
    boolean[] used = new boolean[linework.vertexCount];
    int count = 0;
    for (int e = 0; e < linework.edgeCount; e++) {
      kept[e] = label(2 * e) != label(2 * e + 1);
      if (kept[e]) {
        count += (used[linework.start[e]] ? 0 : 1) + (used[linework.end[e]] ? 0 : 1);
        used[linework.start[e]] = true;
        used[linework.end[e]] = true;
      }
    }
    int[] vertices = new int[count];
    int n = 0;
    for (int v = 0; v < linework.vertexCount; v++) {
      if (used[v]) {
        vertices[n++] = v;
      }
    }
    VertexGrid grid = new VertexGrid(linework.x, linework.y, vertices);
    for (int e = 0; e < linework.edgeCount; e++) {
      if (!kept[e]) {
        continue;
      }
      int a = linework.start[e];
      int b = linework.end[e];
      int found = grid.near(linework.x[a], linework.y[a], linework.x[b], linework.y[b], closeM);
      for (int i = 0; i < found; i++) {
        int v = grid.hit(i);
        if (v != a && v != b) {
          consider(v, e);
        }
      }
    }
  }

  private void consider(int v, int e) {
    int a = linework.start[e];
    int b = linework.end[e];
    double toA = distance(v, a);
    double toB = distance(v, b);
    if (Math.min(toA, toB) <= closeM) {
      considerJoin(v, toA <= toB ? a : b);
      return;
    }
    double vx = linework.x[v];
    double vy = linework.y[v];
    double d =
        Segments.distance(vx, vy, linework.x[a], linework.y[a], linework.x[b], linework.y[b]);
    if (moveOnto[v] >= 0 && moveDistance[v] <= d) {
      return;
    }
    double ex = linework.x[b] - linework.x[a];
    double ey = linework.y[b] - linework.y[a];
    boolean onLeft = ex * (vy - linework.y[a]) - ey * (vx - linework.x[a]) > 0;
    // Across the gap: from v at right angles onto e.
    double dx = onLeft ? ey : -ey;
    double dy = onLeft ? -ex : ex;
    int side = onLeft ? 2 * e : 2 * e + 1;
    Facing facing = facing(v, dx, dy, side, d);
    if (facing != null) {
      moveOnto[v] = e;
      moveDistance[v] = d;
      moveFacing[v] = facing;
    }
  }

  private void considerJoin(int v, int w) {
    int low = Math.min(v, w);
    int high = Math.max(v, w);
    if (joinTo[high] >= 0 && joinTo[high] <= low) {
      return;
    }
    double d = distance(v, w);
    int link = keptHalfEdge(low, high);
    Facing facing;
    if (link >= 0) {
      facing = across(link, d);
      if (facing == null) {
        facing = across(link ^ 1, d);
      }
    } else {
      double dx = linework.x[low] - linework.x[high];
      double dy = linework.y[low] - linework.y[high];
      int h = wedge(low, -dx, -dy);
      int other = counterClockwiseKept(h);
      int side = moreAcross(h, other ^ 1, dx, dy) ? h : other ^ 1;
      facing = facing(high, dx, dy, side, d);
    }
    if (facing != null) {
      joinTo[high] = low;
      joinFacing[high] = facing;
      awaited[low] = true;
    }
  }

  /**
   * The edges that face each other across a gap from vertex v to the given side (a half-edge with
   * the gap on its left), or null if there is no gap to close.
   */
  private Facing facing(int v, double dx, double dy, int side, double widthM) {
    int h = wedge(v, dx, dy);
    int other = counterClockwiseKept(h);
    int near = moreAcross(h, other ^ 1, dx, dy) ? h : other ^ 1;
    if (widthM <= snapM) {
      return new Facing(near >> 1, side >> 1, widthM, label(near ^ 1), label(side ^ 1));
    }
    if (label(near) != label(side) || isDrawn(near, side)) {
      return null;
    }
    return new Facing(near >> 1, side >> 1, widthM, label(near ^ 1), label(side ^ 1));
  }

  /** The same for two vertices joined by an edge, with the gap on the left of the half-edge. */
  private Facing across(int link, double widthM) {
    int near = counterClockwiseKept(link);
    int far = clockwiseKept(link ^ 1);
    double dx = linework.x[halves.to(link)] - linework.x[halves.from(link)];
    double dy = linework.y[halves.to(link)] - linework.y[halves.from(link)];
    boolean open =
        cosine(near, dx, dy) < ACROSS
            && cosine(far, dx, dy) < ACROSS
            && turnsLeft(near, dx, dy)
            && turnsLeft(far, dx, dy);
    boolean join = widthM <= snapM;
    if (!join && (!open || isDrawn(near ^ 1, far))) {
      return null;
    }
    return new Facing(near >> 1, far >> 1, widthM, label(near), label(far ^ 1));
  }

  private boolean turnsLeft(int h, double dx, double dy) {
    double hx = linework.x[halves.to(h)] - linework.x[halves.from(h)];
    double hy = linework.y[halves.to(h)] - linework.y[halves.from(h)];
    return dx * hy - dy * hx > 0;
  }

  /** Whether the strip between two half-edges, on the left of both, is covered and was drawn. */
  private boolean isDrawn(int h, int g) {
    return label(h) != NONE && isOwn(h) && isOwn(g);
  }

  /** Whether the outline of the area seen on the left of a half-edge runs along it. */
  private boolean isOwn(int h) {
    return linework.bounds(h >> 1, faces.top(halves.loop[h]));
  }

  /** The half-edge leaving v that has the direction to its left, before the next one. */
  private int wedge(int v, double dx, double dy) {
    int last = -1;
    for (int i = halves.offset[v]; i < halves.offset[v + 1]; i++) {
      int h = halves.around[i];
      if (kept[h >> 1]) {
        int next = counterClockwiseKept(h);
        if (isBetween(h, next, dx, dy)) {
          return h;
        }
        last = h;
      }
    }
    return last;
  }

  private boolean isBetween(int h, int next, double dx, double dy) {
    int v = halves.from(h);
    double hx = linework.x[halves.to(h)] - linework.x[v];
    double hy = linework.y[halves.to(h)] - linework.y[v];
    double nx = linework.x[halves.to(next)] - linework.x[v];
    double ny = linework.y[halves.to(next)] - linework.y[v];
    boolean leftOfFirst = hx * dy - hy * dx >= 0;
    boolean rightOfNext = dx * ny - dy * nx > 0;
    boolean narrow = hx * ny - hy * nx > 0;
    return narrow ? leftOfFirst && rightOfNext : leftOfFirst || rightOfNext;
  }

  private int counterClockwiseKept(int h) {
    int g = halves.counterClockwise(h);
    while (!kept[g >> 1]) {
      g = halves.counterClockwise(g);
    }
    return g;
  }

  private int clockwiseKept(int h) {
    int g = halves.clockwise(h);
    while (!kept[g >> 1]) {
      g = halves.clockwise(g);
    }
    return g;
  }

  private int keptHalfEdge(int v, int w) {
    for (int i = halves.offset[v]; i < halves.offset[v + 1]; i++) {
      int h = halves.around[i];
      if (halves.to(h) == w && kept[h >> 1]) {
        return h;
      }
    }
    return -1;
  }

  private boolean moreAcross(int g, int h, double dx, double dy) {
    return cosine(g, dx, dy) <= cosine(h, dx, dy);
  }

  private double cosine(int h, double dx, double dy) {
    int e = h >> 1;
    double ex = linework.x[linework.end[e]] - linework.x[linework.start[e]];
    double ey = linework.y[linework.end[e]] - linework.y[linework.start[e]];
    return Math.abs(ex * dx + ey * dy) / (Math.hypot(ex, ey) * Math.hypot(dx, dy));
  }

  private double distance(int v, int w) {
    return Math.hypot(linework.x[v] - linework.x[w], linework.y[v] - linework.y[w]);
  }

  private int label(int h) {
    int area = faces.top(halves.loop[h]);
    return area == NONE ? NONE : labels[area];
  }

  /** Puts moves along the same facing edges together, so that each gap is listed once. */
  private void list(List<Facing> facings, List<Integer> movedVertices, List<Closed> closed) {
    int n = facings.size();
    DisjointSets gaps = new DisjointSets(n);
    int[] firstOnEdge = new int[linework.edgeCount];
    Arrays.fill(firstOnEdge, -1);
    for (int i = 0; i < n; i++) {
      Facing f = facings.get(i);
      if (f.widthM <= snapM) {
        continue;
      }
      uniteOn(f.edge, i, firstOnEdge, gaps);
      uniteOn(f.otherEdge, i, firstOnEdge, gaps);
    }
    for (int i = 0; i < n; i++) {
      if (gaps.find(i) == i && facings.get(i).widthM > snapM) {
        closed.add(gather(i, facings, movedVertices, gaps));
      }
    }
  }

  private static void uniteOn(int edge, int i, int[] firstOnEdge, DisjointSets gaps) {
    if (firstOnEdge[edge] < 0) {
      firstOnEdge[edge] = i;
    } else {
      gaps.unite(firstOnEdge[edge], i);
    }
  }

  private Closed gather(
      int gap, List<Facing> facings, List<Integer> movedVertices, DisjointSets gaps) {
    double sumX = 0;
    double sumY = 0;
    double width = 0;
    int count = 0;
    LabelSet sides = new LabelSet();
    for (int i = gap; i < facings.size(); i++) {
      if (gaps.find(i) == gap) {
        Facing f = facings.get(i);
        int v = movedVertices.get(i);
        sumX += linework.x[v];
        sumY += linework.y[v];
        width = Math.max(width, f.widthM);
        count++;
        sides.add(f.label);
        sides.add(f.otherLabel);
      }
    }
    return new Closed(sumX / count, sumY / count, width, sides.ascending());
  }
}
