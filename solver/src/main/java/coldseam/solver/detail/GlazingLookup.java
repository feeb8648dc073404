package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;

/**
 * Whether the conducting side of an edge belongs to an area laid as glazing or frame. Areas of one
 * fill may differ in this; then the topmost one over a point just inside the edge counts.
 */
final class GlazingLookup {
  /** How far inside an edge its area is looked up, in closing lengths of the resolution. */
  private static final double STEP_INSIDE = 10;

  private final Partition partition;
  private final List<Fill> fills;
  private final List<Area> areas;
  private final boolean any;

  GlazingLookup(Detail detail, Partition partition) {
    this.partition = partition;
    fills = detail.fills();
    areas = detail.areas();
    any = contains(areas, true);
  }

  private static boolean contains(List<Area> areas, boolean glazing) {
    for (Area area : areas) {
      if (area.glazing() == glazing) {
        return true;
      }
    }
    return false;
  }

  boolean onEdge(int edge, boolean conductsLeft) {
    if (!any) {
      return false;
    }
    List<Area> ofFill = laid(conductsLeft ? partition.leftLabel(edge) : partition.rightLabel(edge));
    if (!contains(ofFill, false)) {
      return true;
    }
    if (!contains(ofFill, true)) {
      return false;
    }
    Point probe = justInside(edge, conductsLeft);
    boolean glazing = false;
    for (Area area : ofFill) {
      if (covers(area, probe)) {
        glazing = area.glazing();
      }
    }
    return glazing;
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
