package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Points in a grid of as many cells, so that those near a segment are found by walking along it,
 * whatever its direction.
 */
final class VertexGrid {
  private final double[] x;
  private final double[] y;
  private final int columns;
  private final double left;
  private final double bottom;
  private final double cellWidth;
  private final double cellHeight;
  private final int[] offset;
  private final int[] inCell;
  private int[] hits = new int[16];

  /**
   * Fills the grid.
   *
   * @param x x of all vertices, m
   * @param y y of all vertices, m
   * @param vertices the vertices to be found
   */
  VertexGrid(double[] x, double[] y, int[] vertices) {
    this.x = x;
    this.y = y;
    columns = Math.max(1, (int) Math.sqrt(vertices.length));
    double minX = Double.POSITIVE_INFINITY;
    double minY = Double.POSITIVE_INFINITY;
    double maxX = Double.NEGATIVE_INFINITY;
    double maxY = Double.NEGATIVE_INFINITY;
    for (int v : vertices) {
      minX = Math.min(minX, x[v]);
      maxX = Math.max(maxX, x[v]);
      minY = Math.min(minY, y[v]);
      maxY = Math.max(maxY, y[v]);
    }
    left = minX;
    bottom = minY;
    cellWidth = Math.max((maxX - minX) / columns, Double.MIN_NORMAL);
    cellHeight = Math.max((maxY - minY) / columns, Double.MIN_NORMAL);
    offset = new int[columns * columns + 1];
    inCell = new int[vertices.length];
    for (int v : vertices) {
      offset[cell(column(x[v]), row(y[v])) + 1]++;
    }
    for (int c = 0; c < columns * columns; c++) {
      offset[c + 1] += offset[c];
    }
    int[] fill = Arrays.copyOf(offset, columns * columns);
    for (int v : vertices) {
      inCell[fill[cell(column(x[v]), row(y[v]))]++] = v;
    }
  }

  /** A vertex found by the last {@link #near}. */
  int hit(int i) {
    return hits[i];
  }

  /** Finds all vertices within a margin of a segment and returns how many; see {@link #hit}. */
  int near(double ax, double ay, double bx, double by, double margin) {
    int found = 0;
    int first = column(Math.min(ax, bx) - margin);
    int last = column(Math.max(ax, bx) + margin);
    double slope = (by - ay) / (bx - ax);
    for (int i = first; i <= last; i++) {
      double low = Math.min(ay, by);
      double high = Math.max(ay, by);
      if (first != last && !Double.isNaN(slope) && !Double.isInfinite(slope)) {
        // The outermost columns hold everything beyond them as well.
        double from = i == first ? Math.min(ax, bx) : left + i * cellWidth - 2 * margin;
        double to = i == last ? Math.max(ax, bx) : left + (i + 1) * cellWidth + 2 * margin;
        double yFrom = ay + (from - ax) * slope;
        double yTo = ay + (to - ax) * slope;
        low = Math.max(low, Math.min(yFrom, yTo));
        high = Math.min(high, Math.max(yFrom, yTo));
      }
      int top = row(high + 2 * margin);
      for (int j = row(low - 2 * margin); j <= top; j++) {
        found = collect(cell(i, j), ax, ay, bx, by, margin, found);
      }
    }
    return found;
  }

  private int collect(
      int cell, double ax, double ay, double bx, double by, double margin, int found) {
    for (int k = offset[cell]; k < offset[cell + 1]; k++) {
      int v = inCell[k];
      if (Segments.distance(x[v], y[v], ax, ay, bx, by) <= margin) {
        if (found == hits.length) {
          hits = Arrays.copyOf(hits, 2 * found);
        }
        hits[found++] = v;
      }
    }
    return found;
  }

  private int column(double px) {
    return clamp((px - left) / cellWidth);
  }

  private int row(double py) {
    return clamp((py - bottom) / cellHeight);
  }

  private int clamp(double position) {
    return (int) Math.max(0, Math.min(columns - 1, position));
  }

  private int cell(int column, int row) {
    return column * columns + row;
  }
}
