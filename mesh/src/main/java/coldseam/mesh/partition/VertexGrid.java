package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Points sorted into columns of about as many points each, and each column into rows likewise, so
 * that those near a segment are found by walking along it, whatever its direction and however
 * crowded a corner of the drawing is.
 */
final class VertexGrid {
  /** Points a cell holds on average. */
  private static final int IN_CELL = 3;

  private final double[] x;
  private final double[] y;

  /** Where one column ends and the next begins. */
  private final double[] columnEdges;

  /** For each column where one row ends and the next begins. */
  private final double[][] rowEdges;

  /** The points of each row of each column. */
  private final int[][][] cells;

  private int[] hits = new int[16];

  /**
   * Sorts all vertices.
   *
   * @param x x of the vertices, m
   * @param y y of the vertices, m
   */
  VertexGrid(double[] x, double[] y) {
    this.x = x;
    this.y = y;
    int columns = 1 + (int) Math.sqrt(x.length / (double) IN_CELL);
    columnEdges = edges(x.clone(), columns);
    int[] all = new int[x.length];
    for (int v = 0; v < all.length; v++) {
      all[v] = v;
    }
    int[][] inColumn = distribute(all, x, columnEdges);
    rowEdges = new double[columns][];
    cells = new int[columns][][];
    for (int i = 0; i < columns; i++) {
      double[] heights = new double[inColumn[i].length];
      for (int k = 0; k < heights.length; k++) {
        heights[k] = y[inColumn[i][k]];
      }
      rowEdges[i] = edges(heights, 1 + heights.length / IN_CELL);
      cells[i] = distribute(inColumn[i], y, rowEdges[i]);
    }
  }

  /** Sorts values and returns those that cut them into parts of about equal count. */
  private static double[] edges(double[] values, int parts) {
    Arrays.sort(values);
    double[] edges = new double[parts - 1];
    for (int i = 1; i < parts; i++) {
      edges[i - 1] = values[(int) ((long) values.length * i / parts)];
    }
    return edges;
  }

  private static int[][] distribute(int[] vertices, double[] position, double[] edges) {
    int[] count = new int[edges.length + 1];
    for (int v : vertices) {
      count[part(position[v], edges)]++;
    }
    int[][] parts = new int[count.length][];
    for (int i = 0; i < parts.length; i++) {
      parts[i] = new int[count[i]];
    }
    for (int v : vertices) {
      int i = part(position[v], edges);
      parts[i][--count[i]] = v;
    }
    return parts;
  }

  /** How many edges lie at or below a position. */
  private static int part(double position, double[] edges) {
    int low = 0;
    int high = edges.length;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (edges[middle] <= position) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }

  /** A vertex found by the last {@link #near}. */
  int hit(int i) {
    return hits[i];
  }

  /** Finds all vertices within a margin of a segment and returns how many; see {@link #hit}. */
  int near(double ax, double ay, double bx, double by, double margin) {
    int found = 0;
    double left = Math.min(ax, bx);
    double right = Math.max(ax, bx);
    double slope = right > left ? (by - ay) / (bx - ax) : 0;
    int last = part(right + margin, columnEdges);
    for (int i = part(left - margin, columnEdges); i <= last; i++) {
      double low = Math.min(ay, by);
      double high = Math.max(ay, by);
      if (slope != 0) {
        // The part of the segment whose margin reaches into this column.
        double from = i == 0 ? left : Math.max(left, columnEdges[i - 1] - margin);
        double to = i == columnEdges.length ? right : Math.min(right, columnEdges[i] + margin);
        double yFrom = ay + (from - ax) * slope;
        double yTo = ay + (to - ax) * slope;
        low = Math.max(low, Math.min(yFrom, yTo) - margin);
        high = Math.min(high, Math.max(yFrom, yTo) + margin);
      }
      int top = part(high + margin, rowEdges[i]);
      for (int j = part(low - margin, rowEdges[i]); j <= top; j++) {
        found = collect(cells[i][j], ax, ay, bx, by, margin, found);
      }
    }
    return found;
  }

  private int collect(
      int[] cell, double ax, double ay, double bx, double by, double margin, int found) {
    int n = found;
    for (int v : cell) {
      if (Segments.distance(x[v], y[v], ax, ay, bx, by) <= margin) {
        if (n == hits.length) {
          hits = Arrays.copyOf(hits, 2 * n);
        }
        hits[n++] = v;
      }
    }
    return n;
  }
}
