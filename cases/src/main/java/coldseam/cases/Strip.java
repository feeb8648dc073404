package coldseam.cases;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The outline of a line with a thickness: a sheet, a membrane, a profile of even thickness. */
final class Strip {
  /** A corner whose mitre would reach further than this many half thicknesses is refused. */
  private static final double LONGEST_MITRE = 10;

  private final List<Point> line;
  private final boolean closed;
  private final double leftM;
  private final double rightM;
  private String wrong = "";

  /**
   * Prepares a strip.
   *
   * @param line two different points or more; first and last equal for a closed frame
   * @param leftM how far it reaches to the left of the line as walked, m
   * @param rightM how far it reaches to the right, m
   */
  Strip(List<Point> line, double leftM, double rightM) {
    this.closed = line.size() > 3 && Outlines.same(line.get(0), line.get(line.size() - 1));
    this.line = closed ? line.subList(0, line.size() - 1) : line;
    this.leftM = leftM;
    this.rightM = rightM;
  }

  /** The rings; empty if it cannot be drawn, {@link #wrong} then says why. */
  Optional<List<List<Point>>> rings() {
    List<Point> left = side(leftM);
    List<Point> right = wrong.isEmpty() ? side(-rightM) : List.of();
    if (!wrong.isEmpty()) {
      return Optional.empty();
    }
    if (closed) {
      return Optional.of(List.of(left, right));
    }
    List<Point> around = new ArrayList<>(right);
    for (int i = left.size() - 1; i >= 0; i--) {
      around.add(left.get(i));
    }
    return Optional.of(List.of(around));
  }

  String wrong() {
    return wrong;
  }

  /** The line moved sideways by a distance to the left, corners mitred. */
  private List<Point> side(double offset) {
    int n = line.size();
    List<Point> moved = new ArrayList<>(n);
    for (int i = 0; i < n; i++) {
      boolean first = i == 0 && !closed;
      boolean last = i == n - 1 && !closed;
      double[] before = first ? null : normal(line.get((i + n - 1) % n), line.get(i));
      double[] after = last ? null : normal(line.get(i), line.get((i + 1) % n));
      double[] in = first ? after : before;
      double[] out = last ? before : after;
      double scale = 1 + in[0] * out[0] + in[1] * out[1];
      if (scale * LONGEST_MITRE * LONGEST_MITRE < 2) {
        wrong = "turns back on itself at point " + (i + 1);
        return List.of();
      }
      Point p = line.get(i);
      moved.add(
          new Point(
              p.x() + offset * (in[0] + out[0]) / scale,
              p.y() + offset * (in[1] + out[1]) / scale));
    }
    checkOrder(moved);
    return moved;
  }

  /** Between two bends a piece must be long enough for both mitres. */
  private void checkOrder(List<Point> moved) {
    int n = line.size();
    for (int i = 0; i + 1 < n || (closed && i < n); i++) {
      int j = (i + 1) % n;
      double dx = line.get(j).x() - line.get(i).x();
      double dy = line.get(j).y() - line.get(i).y();
      double mx = moved.get(j).x() - moved.get(i).x();
      double my = moved.get(j).y() - moved.get(i).y();
      if (!(dx * mx + dy * my > 0) && wrong.isEmpty()) {
        wrong = "is too thick for the short piece between points " + (i + 1) + " and " + (j + 1);
      }
    }
  }

  private static double[] normal(Point p, Point q) {
    double dx = q.x() - p.x();
    double dy = q.y() - p.y();
    double length = Math.hypot(dx, dy);
    return new double[] {-dy / length, dx / length};
  }
}
