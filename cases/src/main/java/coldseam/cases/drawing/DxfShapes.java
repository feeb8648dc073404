package coldseam.cases.drawing;

import coldseam.cases.drawing.DxfEntity.Group;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Makes outlines of single entities, in the entity's own coordinates. */
final class DxfShapes {
  private static final double FULL = 2 * Math.PI;

  private DxfShapes() {}

  /** Outlines of one entity. */
  record Shape(List<Outline> outlines, boolean filled, String look) {
    static Shape line(Outline outline) {
      return new Shape(List.of(outline), false, "");
    }
  }

  /** Entities that are outlines. */
  static final List<String> KNOWN =
      List.of(
          "LINE",
          "LWPOLYLINE",
          "POLYLINE",
          "ARC",
          "CIRCLE",
          "ELLIPSE",
          "SPLINE",
          "HATCH",
          "SOLID",
          "TRACE");

  /**
   * The shape of an entity.
   *
   * @param entity one of {@link #KNOWN}
   * @return its outlines, or empty if nothing flat is drawn by it
   */
  static Optional<Shape> of(DxfEntity entity) throws DrawingException {
    return switch (entity.type()) {
      case "LINE" -> Optional.of(straight(entity));
      case "LWPOLYLINE" -> polyline(lightCorners(entity), closed(entity));
      case "POLYLINE" -> old(entity);
      case "ARC" -> Optional.of(arc(entity));
      case "CIRCLE" -> Optional.of(circle(entity));
      case "ELLIPSE" -> Optional.of(ellipse(entity));
      case "SPLINE" -> spline(entity);
      case "HATCH" -> new DxfHatch(entity).shape();
      default -> Optional.of(quadrangle(entity));
    };
  }

  private static Shape straight(DxfEntity e) throws DrawingException {
    Outline outline = new Outline(e.needed(10), e.needed(20));
    return Shape.line(outline.line(e.needed(11), e.needed(21)));
  }

  private static boolean closed(DxfEntity e) throws DrawingException {
    return (e.whole(70, 0) & 1) != 0;
  }

  /**
   * A corner of a polyline.
   *
   * @param x of it
   * @param y of it
   * @param bulge tangent of a quarter of the angle of the arc to the next corner; positive turns
   *     counter-clockwise
   */
  record Corner(double x, double y, double bulge) {}

  private static List<Corner> lightCorners(DxfEntity e) throws DrawingException {
    List<Corner> corners = new ArrayList<>();
    double x = Double.NaN;
    double y = Double.NaN;
    double bulge = 0;
    for (Group group : e.groups()) {
      switch (group.code()) {
        case 10 -> {
          addCorner(corners, x, y, bulge, e);
          x = group.number();
          y = Double.NaN;
          bulge = 0;
        }
        case 20 -> y = group.number();
        case 42 -> bulge = group.number();
        default -> {}
      }
    }
    addCorner(corners, x, y, bulge, e);
    return corners;
  }

  private static void addCorner(List<Corner> corners, double x, double y, double bulge, DxfEntity e)
      throws DrawingException {
    if (Double.isNaN(x)) {
      return;
    }
    if (Double.isNaN(y)) {
      throw new DrawingException(
          e.line(), "a corner of this " + e.type() + " has no y", "the file is damaged");
    }
    corners.add(new Corner(x, y, bulge));
  }

  private static Optional<Shape> old(DxfEntity e) throws DrawingException {
    int flags = e.whole(70, 0);
    if ((flags & (16 | 64)) != 0) {
      return Optional.empty();
    }
    List<Corner> corners = new ArrayList<>();
    double usual = 0;
    for (DxfEntity vertex : e.parts()) {
      boolean control = (vertex.whole(70, 0) & 16) != 0;
      if (vertex.type().equals("VERTEX") && !control) {
        corners.add(new Corner(vertex.needed(10), vertex.needed(20), vertex.number(42, usual)));
      }
    }
    return polyline(corners, (flags & 1) != 0);
  }

  /** A polyline, or empty if it has fewer than two corners. */
  static Optional<Shape> polyline(List<Corner> corners, boolean closed) {
    if (corners.size() < 2) {
      return Optional.empty();
    }
    return Optional.of(Shape.line(outline(corners, closed)));
  }

  static Outline outline(List<Corner> corners, boolean closed) {
    Corner first = corners.get(0);
    Outline outline = new Outline(first.x(), first.y());
    int n = corners.size();
    for (int i = 0; i < (closed ? n : n - 1); i++) {
      Corner a = corners.get(i);
      Corner b = corners.get((i + 1) % n);
      bulged(outline, a, b);
    }
    return closed ? outline.close() : outline;
  }

  /** The arc between two corners: its angle is four times the arc tangent of the bulge. */
  private static void bulged(Outline outline, Corner a, Corner b) {
    double dx = b.x() - a.x();
    double dy = b.y() - a.y();
    double bulge = a.bulge();
    if (bulge == 0 || dx == 0 && dy == 0 || !(Math.abs(bulge) < 1e6)) {
      outline.line(b.x(), b.y());
      return;
    }
    // The centre lies off the middle of the chord by (1 − b²) / (4 b) of its length.
    double off = (1 - bulge * bulge) / (4 * bulge);
    double cx = (a.x() + b.x()) / 2 - off * dy;
    double cy = (a.y() + b.y()) / 2 + off * dx;
    double from = Math.atan2(a.y() - cy, a.x() - cx);
    double sweep = 4 * Math.atan(bulge);
    double radius = Math.hypot(a.x() - cx, a.y() - cy);
    outline.add(Segment.Arc.circle(cx, cy, radius, from, from + sweep));
  }

  private static Shape arc(DxfEntity e) throws DrawingException {
    double from = Math.toRadians(e.needed(50));
    double to = Math.toRadians(e.needed(51));
    return Shape.line(arc(e.needed(10), e.needed(20), radius(e), from, after(from, to)));
  }

  private static double radius(DxfEntity e) throws DrawingException {
    double radius = e.needed(40);
    if (!(radius > 0)) {
      throw new DrawingException(
          e.first(40).line(), "a radius of " + radius, "a radius is more than 0");
    }
    return radius;
  }

  /** The angle that is reached next when turning on from another, by a full turn at most. */
  private static double after(double from, double to) {
    double sweep = (to - from) % FULL;
    return from + (sweep <= 0 ? sweep + FULL : sweep);
  }

  private static Outline arc(double cx, double cy, double radius, double from, double to) {
    Segment.Arc arc = Segment.Arc.circle(cx, cy, radius, from, to);
    return new Outline(arc.x(from), arc.y(from)).add(arc);
  }

  private static Shape circle(DxfEntity e) throws DrawingException {
    return Shape.line(arc(e.needed(10), e.needed(20), radius(e), 0, FULL).close());
  }

  private static Shape ellipse(DxfEntity e) throws DrawingException {
    double ux = e.needed(11);
    double uy = e.needed(21);
    // Seen from behind, the second half axis points the other way.
    double ratio = e.number(230, 1) < 0 ? -e.needed(40) : e.needed(40);
    double from = e.number(41, 0);
    double to = after(from, e.number(42, FULL));
    Segment.Arc arc =
        new Segment.Arc(e.needed(10), e.needed(20), ux, uy, -uy * ratio, ux * ratio, from, to);
    Outline outline = new Outline(arc.x(from), arc.y(from)).add(arc);
    boolean full = to - from > FULL * (1 - 1e-9);
    return Shape.line(full ? outline.close() : outline);
  }

  private static Optional<Shape> spline(DxfEntity e) throws DrawingException {
    List<double[]> control = new ArrayList<>();
    List<double[]> fit = new ArrayList<>();
    List<Double> knots = new ArrayList<>();
    List<Double> weights = new ArrayList<>();
    for (Group group : e.groups()) {
      switch (group.code()) {
        case 10 -> control.add(new double[] {group.number(), 0});
        case 20 -> y(control, group);
        case 11 -> fit.add(new double[] {group.number(), 0});
        case 21 -> y(fit, group);
        case 40 -> knots.add(group.number());
        case 41 -> weights.add(group.number());
        default -> {}
      }
    }
    return spline(e, e.whole(71, 3), knots, control, weights, fit)
        .map(outline -> Shape.line(outline));
  }

  static void y(List<double[]> points, Group group) throws DrawingException {
    if (!points.isEmpty()) {
      points.get(points.size() - 1)[1] = group.number();
    }
  }

  /** The outline of a spline; through its fit points, by chords, if only these are given. */
  static Optional<Outline> spline(
      DxfEntity e,
      int degree,
      List<Double> knots,
      List<double[]> control,
      List<Double> weights,
      List<double[]> fit)
      throws DrawingException {
    if (control.size() > Limits.MOST_CONTROL_POINTS) {
      throw new DrawingException(
          e.line(),
          "this SPLINE has " + control.size() + " control points",
          "at most " + Limits.MOST_CONTROL_POINTS + " are read");
    }
    if (control.isEmpty() && fit.size() > 1) {
      Outline outline = new Outline(fit.get(0)[0], fit.get(0)[1]);
      fit.subList(1, fit.size()).forEach(p -> outline.line(p[0], p[1]));
      return Optional.of(outline);
    }
    int n = control.size();
    double[] x = new double[n];
    double[] y = new double[n];
    double[] w = new double[n];
    for (int i = 0; i < n; i++) {
      x[i] = control.get(i)[0];
      y[i] = control.get(i)[1];
      w[i] = weights.size() == n ? weights.get(i) : 1;
    }
    double[] t = knots.stream().mapToDouble(k -> k).toArray();
    Spline spline = Spline.of(degree, t, x, y, w);
    if (spline == null) {
      throw new DrawingException(
          e.line(),
          "the figures of this SPLINE do not fit together: degree "
              + degree
              + ", "
              + n
              + " control points, "
              + t.length
              + " knots",
          "knots ascend and are as many as control points, degree and one together");
    }
    double[] start = spline.start();
    return Optional.of(new Outline(start[0], start[1]).add(new Segment.Splined(spline)));
  }

  /** A filled quadrangle, whose third and fourth corner stand the other way about in the file. */
  private static Shape quadrangle(DxfEntity e) throws DrawingException {
    Outline outline = new Outline(e.needed(10), e.needed(20)).line(e.needed(11), e.needed(21));
    boolean four = e.first(13) != null;
    if (four) {
      outline.line(e.needed(13), e.needed(23));
    }
    outline.line(e.needed(12), e.needed(22));
    return new Shape(List.of(outline.close()), true, "SOLID");
  }
}
