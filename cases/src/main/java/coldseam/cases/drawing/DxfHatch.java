package coldseam.cases.drawing;

import coldseam.cases.drawing.DxfEntity.Group;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The boundaries of a hatch. */
final class DxfHatch {
  private static final int EXTERNAL = 1;
  private static final int POLYLINE = 2;
  private static final int OUTERMOST = 16;

  /** Style of a hatch that takes no notice of what lies inside. */
  private static final int IGNORING = 2;

  private final DxfEntity entity;
  private final List<Group> groups;
  private int at;

  DxfHatch(DxfEntity entity) {
    this.entity = entity;
    this.groups = entity.groups();
  }

  Optional<DxfShapes.Shape> shape() throws DrawingException {
    String pattern = entity.text(2, "");
    boolean ignoring = entity.whole(75, 0) == IGNORING;
    List<Outline> all = new ArrayList<>();
    List<Outline> outer = new ArrayList<>();
    skipTo(91);
    int loops = count("boundaries");
    for (int i = 0; i < loops; i++) {
      skipTo(92);
      int flags = take().whole();
      Optional<Outline> loop = (flags & POLYLINE) != 0 ? polyline() : edges();
      if (loop.isPresent()) {
        all.add(loop.get());
        if ((flags & (EXTERNAL | OUTERMOST)) != 0) {
          outer.add(loop.get());
        }
      }
    }
    List<Outline> taken = ignoring && !outer.isEmpty() ? outer : all;
    return taken.isEmpty()
        ? Optional.empty()
        : Optional.of(new DxfShapes.Shape(taken, true, pattern));
  }

  private void skipTo(int code) throws DrawingException {
    while (at < groups.size() && groups.get(at).code() != code) {
      at++;
    }
    if (at == groups.size()) {
      throw new DrawingException(
          entity.line(),
          "this HATCH has no group " + code + " where one is due",
          "the file is damaged; save it again");
    }
  }

  private Group take() {
    return groups.get(at++);
  }

  private Group take(int code) throws DrawingException {
    skipTo(code);
    return take();
  }

  private int count(String what) throws DrawingException {
    Group group = take();
    int n = group.whole();
    if (n < 0 || n > groups.size()) {
      throw new DrawingException(
          group.line(), "this HATCH announces " + n + " " + what, "it does not have so many");
    }
    return n;
  }

  private Optional<Outline> polyline() throws DrawingException {
    boolean bulges = take(72).whole() != 0;
    take(73);
    skipTo(93);
    int n = count("corners");
    List<DxfShapes.Corner> corners = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      double x = take(10).number();
      double y = take(20).number();
      boolean has = bulges && at < groups.size() && groups.get(at).code() == 42;
      corners.add(new DxfShapes.Corner(x, y, has ? take().number() : 0));
    }
    return n < 2 ? Optional.empty() : Optional.of(DxfShapes.outline(corners, true));
  }

  private Optional<Outline> edges() throws DrawingException {
    skipTo(93);
    int n = count("edges");
    Outline loop = null;
    double[] end = new double[2];
    for (int i = 0; i < n; i++) {
      Outline edge =
          switch (take(72).whole()) {
            case 1 -> straight();
            case 2 -> arc();
            case 3 -> ellipse();
            default -> spline();
          };
      if (loop == null) {
        loop = new Outline(edge.startX(), edge.startY());
      } else {
        // Edges that do not quite meet are joined by a straight line.
        if (edge.startX() != end[0] || edge.startY() != end[1]) {
          loop.line(edge.startX(), edge.startY());
        }
      }
      edge.appendTo(loop);
      edge.chords(
          Affine.IDENTITY,
          Double.POSITIVE_INFINITY,
          (x, y) -> {
            end[0] = x;
            end[1] = y;
          });
    }
    return loop == null ? Optional.empty() : Optional.of(loop.close());
  }

  private Outline straight() throws DrawingException {
    Outline edge = new Outline(take(10).number(), take(20).number());
    return edge.line(take(11).number(), take(21).number());
  }

  private Outline arc() throws DrawingException {
    double cx = take(10).number();
    double cy = take(20).number();
    double radius = take(40).number();
    return turned(cx, cy, radius, 0, 0, radius);
  }

  private Outline ellipse() throws DrawingException {
    double cx = take(10).number();
    double cy = take(20).number();
    double ux = take(11).number();
    double uy = take(21).number();
    double ratio = take(40).number();
    return turned(cx, cy, ux, uy, -uy * ratio, ux * ratio);
  }

  /** The arc with the angles that come next; of a clockwise one they are counted clockwise. */
  private Outline turned(double cx, double cy, double ux, double uy, double vx, double vy)
      throws DrawingException {
    double from = Math.toRadians(take(50).number());
    double to = Math.toRadians(take(51).number());
    boolean counterClockwise = take(73).whole() != 0;
    double sweep = (to - from) % (2 * Math.PI);
    if (sweep <= 0) {
      sweep += 2 * Math.PI;
    }
    double sign = counterClockwise ? 1 : -1;
    Segment.Arc arc = new Segment.Arc(cx, cy, ux, uy, vx, vy, sign * from, sign * (from + sweep));
    return new Outline(arc.x(arc.from()), arc.y(arc.from())).add(arc);
  }

  private Outline spline() throws DrawingException {
    int degree = take(94).whole();
    skipTo(95);
    int knotCount = count("knots");
    skipTo(96);
    int controlCount = count("control points");
    List<Double> knots = new ArrayList<>();
    for (int i = 0; i < knotCount; i++) {
      knots.add(take(40).number());
    }
    List<double[]> control = new ArrayList<>();
    List<Double> weights = new ArrayList<>();
    for (int i = 0; i < controlCount; i++) {
      control.add(new double[] {take(10).number(), take(20).number()});
      if (at < groups.size() && groups.get(at).code() == 42) {
        weights.add(take().number());
      }
    }
    return DxfShapes.spline(entity, degree, knots, control, weights, List.of()).orElseThrow();
  }
}
