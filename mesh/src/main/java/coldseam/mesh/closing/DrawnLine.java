package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * One line as drawn.
 *
 * @param points its corners, m; the first is not repeated where it is closed
 * @param closed whether it returns to its first corner
 */
public record DrawnLine(List<Point> points, boolean closed) {
  /**
   * Copies the corners.
   *
   * @throws IllegalArgumentException if there are fewer than two, or than three of a closed line
   */
  public DrawnLine {
    points = List.copyOf(points);
    if (points.size() < (closed ? 3 : 2)) {
      throw new IllegalArgumentException("a line needs two corners, a closed one three");
    }
  }
}
