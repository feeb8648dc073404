package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * A line laid on the sheet, noded together with the areas so that its ends are vertices of the
 * partition. Several lines may lie on the same edge.
 *
 * @param label names the line, 0 or more; unique among the lines of one partition
 * @param points the corners of the line in order, m, two or more
 */
public record LabelledLine(int label, List<Point> points) {
  /**
   * Copies the points.
   *
   * @throws IllegalArgumentException if the label is negative or fewer than two points are given
   */
  public LabelledLine {
    if (label < 0) {
      throw new IllegalArgumentException("a label is 0 or more, not " + label);
    }
    points = List.copyOf(points);
    if (points.size() < 2) {
      throw new IllegalArgumentException("a line needs two points or more");
    }
  }
}
