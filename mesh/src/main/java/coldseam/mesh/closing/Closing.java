package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.List;

/** Joins the ends of loosely drawn lines and finds the faces they enclose. */
public final class Closing {
  private Closing() {}

  /**
   * Joins corners that nearly meet: a corner to a corner of another line, an end to the other end
   * of its own line, a corner onto an edge of another line. A corner moves no further than the
   * tolerance, and no further than half the way to the next corner or edge of the lines that meet
   * there already, so that sheets thinner than the tolerance stay as they are.
   *
   * @param lines the lines
   * @param toleranceM how far apart what is joined may be, m; 0 joins nothing
   * @return the lines with what was moved
   * @throws TangledLinesException if too many corners crowd within the tolerance
   */
  public static Joined join(List<DrawnLine> lines, double toleranceM) throws TangledLinesException {
    return new CornerJoining(lines, toleranceM).join();
  }

  /**
   * Finds the faces that lines enclose, wherever they cross or touch.
   *
   * @param lines the lines
   * @return the faces and what is left
   * @throws TangledLinesException if there are too many crossings
   */
  public static Cells cells(List<DrawnLine> lines) throws TangledLinesException {
    return new CellFinder(lines).find();
  }

  /** The corner of the box around lines: coordinates relative to it keep their last digits. */
  static Point origin(List<DrawnLine> lines) {
    double x = Double.POSITIVE_INFINITY;
    double y = Double.POSITIVE_INFINITY;
    for (DrawnLine line : lines) {
      for (Point p : line.points()) {
        x = Math.min(x, p.x());
        y = Math.min(y, p.y());
      }
    }
    return new Point(x, y);
  }
}
