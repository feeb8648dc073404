package coldseam.cases.drafting;

import coldseam.cases.drawing.DrawnShapes;
import coldseam.cases.drawing.DrawnShapes.Shape;
import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * Guesses which sides of the box around a drawing are faces of the construction, behind which open
 * air lies, and which are cuts. A piece of a side that something drawn reaches is a face if it is
 * longer than what lies behind it is deep, or if it is the tip of a single part; else it is a cut.
 */
final class OuterSides {
  private static final int SAMPLES = 400;

  /** Share of the smaller dimension below which a single part only shows its tip. */
  private static final double TIP = 0.1;

  /** Share of a side below which a piece of it says nothing. */
  private static final double NOTHING = 0.003;

  /** How far inside the box a side is walked along, as a share of the larger dimension. */
  private static final double INSIDE = 0.002;

  /** The same for the tips of sheets. */
  private static final double JUST_INSIDE = 0.0001;

  /** How far beyond a face the air is laid, as a share of the larger dimension. */
  private static final double BEYOND = 0.1;

  private final List<Shape> shapes;
  private final double left;
  private final double bottom;
  private final double right;
  private final double top;

  OuterSides(List<Shape> shapes, double left, double bottom, double right, double top) {
    this.shapes = shapes;
    this.left = left;
    this.bottom = bottom;
    this.right = right;
    this.top = top;
  }

  /** A point beyond each side that is a face. */
  List<Point> beyond() {
    double away = BEYOND * Math.max(right - left, top - bottom);
    List<Point> points = new ArrayList<>();
    double x = face(new Point(left, bottom), 0, 1, 1, 0, top - bottom, right - left);
    if (!Double.isNaN(x)) {
      points.add(new Point(left - away, bottom + x));
    }
    x = face(new Point(right, bottom), 0, 1, -1, 0, top - bottom, right - left);
    if (!Double.isNaN(x)) {
      points.add(new Point(right + away, bottom + x));
    }
    x = face(new Point(left, bottom), 1, 0, 0, 1, right - left, top - bottom);
    if (!Double.isNaN(x)) {
      points.add(new Point(left + x, bottom - away));
    }
    x = face(new Point(left, top), 1, 0, 0, -1, right - left, top - bottom);
    if (!Double.isNaN(x)) {
      points.add(new Point(left + x, top + away));
    }
    return points;
  }

  /** The middle of the longest piece of a side that is a face, from its corner; NaN if none is. */
  private double face(
      Point corner, double ux, double uy, double inX, double inY, double length, double depth) {
    double step = length / SAMPLES;
    double inside = INSIDE * Math.max(length, depth);
    double just = JUST_INSIDE * Math.max(length, depth);
    double middle = Double.NaN;
    double longest = 0;
    int from = -1;
    for (int i = 0; i <= SAMPLES; i++) {
      double s = (i + 0.5) * step;
      boolean drawn =
          i < SAMPLES
              && (over(corner.x() + s * ux + inside * inX, corner.y() + s * uy + inside * inY) >= 0
                  || over(corner.x() + s * ux + just * inX, corner.y() + s * uy + just * inY) >= 0);
      if (drawn && from < 0) {
        from = i;
      } else if (!drawn && from >= 0) {
        double run = (i - from) * step;
        double at = (i + from) / 2.0 * step;
        boolean counts = run > NOTHING * length && run > longest;
        if (counts && isFace(corner, ux, uy, inX, inY, from, i, step, depth)) {
          longest = run;
          middle = at;
        }
        from = -1;
      }
    }
    return middle;
  }

  private boolean isFace(
      Point corner,
      double ux,
      double uy,
      double inX,
      double inY,
      int from,
      int to,
      double step,
      double depth) {
    double run = (to - from) * step;
    double at = (to + from) / 2.0 * step;
    double inward = depth / SAMPLES;
    int deep = 0;
    while (deep < SAMPLES
        && over(
                corner.x() + at * ux + (deep + 0.5) * inward * inX,
                corner.y() + at * uy + (deep + 0.5) * inward * inY)
            >= 0) {
      deep++;
    }
    if (run > deep * inward) {
      return true;
    }
    double just = JUST_INSIDE * Math.max(right - left, top - bottom);
    int first = -1;
    boolean single = true;
    for (int i = from; i < to; i++) {
      double s = (i + 0.5) * step;
      int shape = over(corner.x() + s * ux + just * inX, corner.y() + s * uy + just * inY);
      single &= first < 0 || shape < 0 || shape == first;
      first = Math.max(first, shape);
    }
    return single && run < TIP * Math.min(right - left, top - bottom);
  }

  /** Index of the last shape laid over a point, or −1. */
  private int over(double x, double y) {
    Point p = new Point(x, y);
    for (int i = shapes.size() - 1; i >= 0; i--) {
      if (DrawnShapes.holds(shapes.get(i), p)) {
        return i;
      }
    }
    return -1;
  }
}
