package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * Whether the conducting side of an edge belongs to an area laid as glazing or frame. Areas of one
 * fill may differ in this; then the topmost one over a point just inside the edge counts.
 */
final class GlazingLookup {
  /** How far inside an edge its area is looked up, in closing lengths of the resolution. */
  private static final double STEP_INSIDE = 10;

  private final Partition partition;
  private final List<Fill> fills;
  private final Map<Fill, List<Area>> laid = new HashMap<>();

  GlazingLookup(Detail detail, Partition partition) {
    this.partition = partition;
    fills = detail.fills();
    if (detail.areas().stream().anyMatch(Area::glazing)) {
      for (Area area : detail.areas()) {
        laid.computeIfAbsent(area.fill(), fill -> new ArrayList<>()).add(area);
      }
    }
  }

  boolean onEdge(int edge, boolean conductsLeft) {
    if (laid.isEmpty()) {
      return false;
    }
    Fill fill = fills.get(conductsLeft ? partition.leftLabel(edge) : partition.rightLabel(edge));
    List<Area> ofFill = laid.get(fill);
    if (ofFill.stream().allMatch(Area::glazing)) {
      return true;
    }
    if (ofFill.stream().noneMatch(Area::glazing)) {
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
