package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;

/** The conducting section as a shape: whether a point lies in it and how far from its outline. */
final class SectionShape {
  private final Outline outline;

  SectionShape(Outline outline) {
    this.outline = outline;
  }

  /** Even-odd rule over the outline; points on it may go either way. */
  boolean contains(Point point) {
    Partition partition = outline.partition();
    boolean inside = false;
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (!outline.contains(edge)) {
        continue;
      }
      Point a = outline.point(partition.edgeStart(edge));
      Point b = outline.point(partition.edgeEnd(edge));
      if ((a.y() > point.y()) != (b.y() > point.y())
          && point.x() < (b.x() - a.x()) * (point.y() - a.y()) / (b.y() - a.y()) + a.x()) {
        inside = !inside;
      }
    }
    return inside;
  }

  /** Distance to the nearest edge of the outline, m. */
  double distanceToOutline(Point point) {
    Partition partition = outline.partition();
    double least = Double.POSITIVE_INFINITY;
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (outline.contains(edge)) {
        least =
            Math.min(
                least,
                distance(
                    point,
                    outline.point(partition.edgeStart(edge)),
                    outline.point(partition.edgeEnd(edge))));
      }
    }
    return least;
  }

  /** Distance of a point from the line between two others, m. */
  static double distance(Point p, Point a, Point b) {
    double dx = b.x() - a.x();
    double dy = b.y() - a.y();
    double length2 = dx * dx + dy * dy;
    double s = length2 == 0 ? 0 : ((p.x() - a.x()) * dx + (p.y() - a.y()) * dy) / length2;
    s = Math.max(0, Math.min(1, s));
    return Math.hypot(p.x() - a.x() - s * dx, p.y() - a.y() - s * dy);
  }
}
