package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.CutOffPlane;

/** The outline of a frame as its lengths are measured on it: square to the glazing. */
final class FrameOutline {
  private final Outline outline;

  FrameOutline(Outline outline) {
    this.outline = outline;
  }

  /** What the outline along a cut-off plane belongs to: one glazing or panel, or something else. */
  static Area.Role role(Outline outline, CutOffPlane plane) {
    Area.Role role = outline.conditions().role(plane.edges().get(0));
    for (int edge : plane.edges()) {
      if (outline.conditions().role(edge) != role) {
        return Area.Role.OTHER;
      }
    }
    return role;
  }

  /** Along the glazing, out of the section. */
  Direction axis(PlacedFlank flank) {
    CutOffPlane plane = flank.plane().orElseThrow();
    Direction run = outline.direction(plane.first(), plane.last());
    return new Direction(run.y(), -run.x());
  }

  /** Width of the surfaces that face one side, seen square to the glazing. */
  double extent(int[] spaces, Direction axis) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int edge = 0; edge < outline.partition().edgeCount(); edge++) {
      if (outline.contains(edge) && Couplings.contains(spaces, outline.conditions().space(edge))) {
        for (int vertex : new int[] {outline.start(edge), outline.end(edge)}) {
          low = Math.min(low, along(axis, vertex));
          high = Math.max(high, along(axis, vertex));
        }
      }
    }
    return high - low;
  }

  /** How far the glazing or panel is seen from its end on, m. */
  double visible(FlankEnd end) {
    Area.Role role = outline.conditions().role(end.face());
    int at = end.vertex();
    int edge = end.face();
    int guard = outline.partition().edgeCount();
    while (edge >= 0
        && guard-- > 0
        && role != Area.Role.OTHER
        && outline.conditions().space(edge) == end.space()
        && outline.conditions().role(edge) == role
        && straight(end.vertex(), at, far(edge, end))) {
      at = far(edge, end);
      edge = end.forward() ? outline.next(edge) : outline.previous(edge);
    }
    return outline.distance(end.vertex(), at);
  }

  int far(int edge, FlankEnd end) {
    return end.forward() ? outline.end(edge) : outline.start(edge);
  }

  boolean straight(int from, int at, int to) {
    if (at == from) {
      return true;
    }
    Direction line = outline.direction(from, to);
    return line.dot(outline.direction(at, to)) > 0
        && Math.abs(outline.across(line, from, at)) <= Outline.offset(outline.distance(from, to));
  }

  double along(Direction direction, int vertex) {
    return direction.dot(outline.partition().x(vertex), outline.partition().y(vertex));
  }

  /** How far the surfaces that face one side stand out. */
  double level(int[] spaces, Direction away) {
    double level = Double.NEGATIVE_INFINITY;
    for (int edge = 0; edge < outline.partition().edgeCount(); edge++) {
      if (outline.contains(edge) && Couplings.contains(spaces, outline.conditions().space(edge))) {
        level = Math.max(level, along(away, outline.start(edge)));
        level = Math.max(level, along(away, outline.end(edge)));
      }
    }
    return level;
  }

  /** The place at a distance along each of two directions square to each other. */
  Point at(Direction one, double first, Direction other, double second) {
    Point origin = outline.partition().origin();
    double square = 1 - one.dot(other) * one.dot(other);
    double a = (first - one.dot(other) * second) / square;
    double b = (second - one.dot(other) * first) / square;
    return new Point(
        origin.x() + a * one.x() + b * other.x(), origin.y() + a * one.y() + b * other.y());
  }
}
