package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Edges with what is seen on either side of them and the lines laid on them: the labelled linework
 * on its way to the partition. Sides are loops of the linework first labelled.
 */
final class Boundaries {
  private static final int[] NO_LINES = {};

  double[] x;
  double[] y;
  int vertexCount;
  int edgeCount;
  int[] start;
  int[] end;

  /** The loop on the left of each edge, walking from start to end. */
  int[] leftLoop;

  int[] rightLoop;

  /** Whether the area seen on the left has its own outline here, and is not merely covered. */
  boolean[] leftOwn;

  boolean[] rightOwn;

  /** Labels of the lines on each edge, ascending. */
  int[][] lines;

  /** Vertices that stay even on a straight edge: the ends of lines. */
  boolean[] pinned;

  Boundaries(double[] x, double[] y, int capacity) {
    this.x = x;
    this.y = y;
    this.vertexCount = x.length;
    start = new int[capacity];
    end = new int[capacity];
    leftLoop = new int[capacity];
    rightLoop = new int[capacity];
    leftOwn = new boolean[capacity];
    rightOwn = new boolean[capacity];
    lines = new int[capacity][];
    pinned = new boolean[x.length];
  }

  /** All edges of labelled linework, without lines. */
  static Boundaries of(Linework linework, HalfEdges halves, FaceBuilder faces) {
    int n = linework.edgeCount;
    Boundaries all = new Boundaries(linework.x, linework.y, n);
    for (int e = 0; e < n; e++) {
      int left = halves.loop[2 * e];
      int right = halves.loop[2 * e + 1];
      boolean leftOwn = linework.bounds(e, faces.top(left));
      boolean rightOwn = linework.bounds(e, faces.top(right));
      all.add(linework.start[e], linework.end[e], left, right, leftOwn, rightOwn, NO_LINES);
    }
    return all;
  }

  double length(int edge) {
    return Segments.length(x[end[edge]] - x[start[edge]], y[end[edge]] - y[start[edge]]);
  }

  int addVertex(double px, double py) {
    if (vertexCount == x.length) {
      x = Arrays.copyOf(x, vertexCount + vertexCount / 2 + 16);
      y = Arrays.copyOf(y, x.length);
      pinned = Arrays.copyOf(pinned, x.length);
    }
    x[vertexCount] = px;
    y[vertexCount] = py;
    return vertexCount++;
  }

  void add(
      int from, int to, int left, int right, boolean ownLeft, boolean ownRight, int[] lineLabels) {
    if (edgeCount == start.length) {
      int size = edgeCount + edgeCount / 2 + 16;
      start = Arrays.copyOf(start, size);
      end = Arrays.copyOf(end, size);
      leftLoop = Arrays.copyOf(leftLoop, size);
      rightLoop = Arrays.copyOf(rightLoop, size);
      leftOwn = Arrays.copyOf(leftOwn, size);
      rightOwn = Arrays.copyOf(rightOwn, size);
      lines = Arrays.copyOf(lines, size);
    }
    start[edgeCount] = from;
    end[edgeCount] = to;
    leftLoop[edgeCount] = left;
    rightLoop[edgeCount] = right;
    leftOwn[edgeCount] = ownLeft;
    rightOwn[edgeCount] = ownRight;
    lines[edgeCount++] = lineLabels;
  }

  /** Cuts the edge arrays to their length. */
  void trim() {
    start = Arrays.copyOf(start, edgeCount);
    end = Arrays.copyOf(end, edgeCount);
  }

  /** Adds a piece of an edge of other boundaries, which keeps its sides. */
  void addPiece(Boundaries other, int edge, int from, int to, int[] lineLabels) {
    add(
        from,
        to,
        other.leftLoop[edge],
        other.rightLoop[edge],
        other.leftOwn[edge],
        other.rightOwn[edge],
        lineLabels);
  }
}
