package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;

/**
 * What the area on the conducting side of an edge is: glazing or frame for the surface films, and
 * its role in a frame. Areas of one fill may differ in this; then the topmost one over a point just
 * inside the edge counts.
 */
final class AreaLookup {
  /** How far inside an edge its area is looked up, in closing lengths of the resolution. */
  private static final double STEP_INSIDE = 10;

  private final Partition partition;
  private final List<Fill> fills;
  private final List<Area> areas;
  private final boolean any;

  AreaLookup(Detail detail, Partition partition) {
    this.partition = partition;
    fills = detail.fills();
    areas = detail.areas();
    any = anyMarked(areas);
  }

  private static boolean anyMarked(List<Area> areas) {
    for (Area area : areas) {
      if (area.glazing() || area.role() != Area.Role.OTHER) {
        return true;
      }
    }
    return false;
  }

  /** The area, or null if no area is marked or none of its fill covers the place. */
  Area onEdge(int edge, boolean conductsLeft) {
    if (!any) {
      return null;
    }
    List<Area> ofFill = laid(conductsLeft ? partition.leftLabel(edge) : partition.rightLabel(edge));
    if (alike(ofFill)) {
      return ofFill.get(0);
    }
    Point probe = justInside(edge, conductsLeft);
    Area topmost = null;
    for (Area area : ofFill) {
      if (covers(area, probe)) {
        topmost = area;
      }
    }
    return topmost;
  }

  private static boolean alike(List<Area> areas) {
    for (Area area : areas) {
      if (area.glazing() != areas.get(0).glazing() || area.role() != areas.get(0).role()) {
        return false;
      }
    }
    return true;
  }

  private List<Area> laid(int label) {
    List<Area> ofFill = new ArrayList<>();
    for (Area area : areas) {
      if (area.fill().name().equals(fills.get(label).name())) {
        ofFill.add(area);
      }
    }
    return ofFill;
  }

  private Point justInside(int edge, boolean left) {
    int a = partition.edgeStart(edge);
    int b = partition.edgeEnd(edge);
    double dx = partition.x(b) - partition.x(a);
    double dy = partition.y(b) - partition.y(a);
    double step = (left ? 1 : -1) * STEP_INSIDE * Resolution.STANDARD.closeM() / Math.hypot(dx, dy);
    return new Point(
        partition.origin().x() + partition.x(a) + dx / 2 - dy * step,
        partition.origin().y() + partition.y(a) + dy / 2 + dx * step);
  }

  /** Even-odd rule over all rings. */
  private static boolean covers(Area area, Point p) {
    boolean inside = false;
    for (List<Point> ring : area.rings()) {
      for (int i = 0, j = ring.size() - 1; i < ring.size(); j = i++) {
        Point a = ring.get(i);
        Point b = ring.get(j);
        if ((a.y() > p.y()) != (b.y() > p.y())
            && p.x() < (b.x() - a.x()) * (p.y() - a.y()) / (b.y() - a.y()) + a.x()) {
          inside = !inside;
        }
      }
    }
    return inside;
  }
}
