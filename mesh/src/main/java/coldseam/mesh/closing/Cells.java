package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * The faces that lines enclose.
 *
 * @param cells the faces, in the order of their first line
 * @param dropped pieces of line that bound no face
 */
public record Cells(List<Cell> cells, List<Dropped> dropped) {
  /** Copies the lists. */
  public Cells {
    cells = List.copyOf(cells);
    dropped = List.copyOf(dropped);
  }

  /**
   * A face.
   *
   * @param rings the outer ring counter-clockwise, then the holes clockwise; m
   * @param areaM2 its area
   * @param inner a point well inside it
   * @param depth how many other groups of connected lines enclose the group it belongs to: 1 for a
   *     ring drawn inside another without touching it
   * @param group number of its group of connected lines
   * @param lines indices of the lines that it lies between, ascending
   */
  public record Cell(
      List<List<Point>> rings,
      double areaM2,
      Point inner,
      int depth,
      int group,
      List<Integer> lines) {
    /** Copies the lists. */
    public Cell {
      rings = rings.stream().map(List::copyOf).toList();
      lines = List.copyOf(lines);
    }
  }

  /**
   * A connected piece of a line that bounds no face.
   *
   * @param line index of the line
   * @param from one end
   * @param to the other end
   * @param lengthM its length
   */
  public record Dropped(int line, Point from, Point to, double lengthM) {}
}
