package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Finds the gaps no wider than the closing length and moves their vertices onto the other side. A
 * gap is uncovered ground between two edges, or the same strip of an area laid earlier that shows
 * between later ones; a strip of which both sides were drawn as its own outline is a sheet and is
 * left alone, however thin. Vertices left within the joining length of an edge are always moved
 * onto it: a crossing made by noding may lie on a third edge.
 */
final class GapClosing {
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
  boolean close(double[] x, double[] y, ClosedGaps closed) {
    find();
    int n = linework.vertexCount;
    boolean[] pinned = new boolean[n];
    boolean[] moved = new boolean[n];
    boolean any = false;
    for (int v = 0; v < n; v++) {
      if (pinned[v]) {
        continue;
      }
      int w = joinTo[v];
      int e = moveOnto[v];
      Facing facing;
      if (w >= 0 && !moved[w]) {
        x[v] = linework.x[w];
        y[v] = linework.y[w];
        pinned[w] = true;
        facing = joinFacing[v];
      } else if (w < 0 && !awaited[v] && e >= 0 && isStill(e, moved)) {
        moveToFoot(v, e, x, y);
        pinned[linework.start[e]] = true;
        pinned[linework.end[e]] = true;
        facing = moveFacing[v];
      } else {
        continue;
      }
      moved[v] = true;
      any = true;
      double distance = Segments.length(x[v] - linework.x[v], y[v] - linework.y[v]);
      largestMoveM = Math.max(largestMoveM, distance);
      if (facing != null) {
        int[] sides = {facing.label, facing.otherLabel};
        closed.add(linework, v, facing.edge, facing.otherEdge, facing.widthM, sides);
      }
    }
    return any;
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
    for (int e = 0; e < linework.edgeCount; e++) {
      kept[e] = label(2 * e) != label(2 * e + 1);
      used[linework.start[e]] |= kept[e];
      used[linework.end[e]] |= kept[e];
    }
    VertexGrid grid = new VertexGrid(linework.x, linework.y);
    for (int e = 0; e < linework.edgeCount; e++) {
      int a = linework.start[e];
      int b = linework.end[e];
      double margin = kept[e] ? closeM : snapM;
      int found = grid.near(linework.x[a], linework.y[a], linework.x[b], linework.y[b], margin);
      for (int i = 0; i < found; i++) {
        int v = grid.hit(i);
        if (v != a && v != b) {
          consider(v, e, kept[e] && used[v]);
        }
      }
    }
  }

  private void consider(int v, int e, boolean mayBeGap) {
    int a = linework.start[e];
    int b = linework.end[e];
    double vx = linework.x[v];
    double vy = linework.y[v];
    double d =
        Segments.distance(vx, vy, linework.x[a], linework.y[a], linework.x[b], linework.y[b]);
    if (d <= snapM) {
      if (moveOnto[v] < 0 || moveDistance[v] > d) {
        moveOnto[v] = e;
        moveDistance[v] = d;
        moveFacing[v] = null;
      }
    } else if (mayBeGap) {
      double toA = distance(v, a);
      double toB = distance(v, b);
      double nearest = Math.min(toA, toB);
      boolean joins = nearest <= closeM && considerJoin(v, toA <= toB ? a : b);
      // A foot that falls onto an end of the edge is no place to move to.
      boolean apart = nearest * nearest - d * d > snapM * snapM;
      if (!joins && apart && (moveOnto[v] < 0 || moveDistance[v] > d)) {
        considerMove(v, e, d);
      }
    }
  }

  private void considerMove(int v, int e, double d) {
    int a = linework.start[e];
    double ex = linework.x[linework.end[e]] - linework.x[a];
    double ey = linework.y[linework.end[e]] - linework.y[a];
    boolean onLeft =
        ex * (linework.y[v] - linework.y[a]) - ey * (linework.x[v] - linework.x[a]) > 0;
    // Across the gap: from v at right angles onto e.
    double dx = onLeft ? ey : -ey;
    double dy = onLeft ? -ex : ex;
    Facing facing = facing(v, dx, dy, onLeft ? 2 * e : 2 * e + 1, d);
    if (facing != null) {
      moveOnto[v] = e;
      moveDistance[v] = d;
      moveFacing[v] = facing;
    }
  }

  /** Plans to join the later of two near vertices to the earlier if a gap lies between them. */
  private boolean considerJoin(int v, int w) {
    int low = Math.min(v, w);
    int high = Math.max(v, w);
    if (joinTo[high] >= 0 && joinTo[high] <= low) {
      return true;
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
    if (facing == null) {
      return false;
    }
    joinTo[high] = low;
    joinFacing[high] = facing;
    awaited[low] = true;
    return true;
  }

  /**
   * The edges that face each other across a gap from vertex v to the given side (a half-edge with
   * the gap on its left), or null if there is no gap to close.
   */
  private Facing facing(int v, double dx, double dy, int side, double widthM) {
    int h = wedge(v, dx, dy);
    int other = counterClockwiseKept(h);
    int near = moreAcross(h, other ^ 1, dx, dy) ? h : other ^ 1;
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
        cosine(near, dx, dy) < Limits.ALONG
            && cosine(far, dx, dy) < Limits.ALONG
            && turnsLeft(near, dx, dy)
            && turnsLeft(far, dx, dy);
    if (!open || isDrawn(near ^ 1, far)) {
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
    return Math.abs(ex * dx + ey * dy) / (Segments.length(ex, ey) * Segments.length(dx, dy));
  }

  private double distance(int v, int w) {
    return Segments.length(linework.x[v] - linework.x[w], linework.y[v] - linework.y[w]);
  }

  private int label(int h) {
    int area = faces.top(halves.loop[h]);
    return area == NONE ? NONE : labels[area];
  }
}
