package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.List;

/** Shapes laid on the glazing of a frame but not marked as pieces of it. */
final class UnmarkedGlazing {
  private UnmarkedGlazing() {}

  /**
   * A shape laid on the glazing but not marked as a piece of it stays when the panel is put there.
   */
  static List<String> warnings(List<Area> areas) {
    List<String> warnings = new ArrayList<>();
    for (int i = 0; i < areas.size(); i++) {
      Area area = areas.get(i);
      if (area.role() != Area.Role.OTHER || !(area.fill() instanceof Material)) {
        continue;
      }
      for (Area below : areas.subList(0, i)) {
        if (below.role() == Area.Role.GLAZING && within(area, below)) {
          warnings.add(
              area.name()
                  + " lies on the glazing, but is not marked as a piece of it: it stays where the"
                  + " insulating panel is put");
          break;
        }
      }
    }
    return warnings;
  }

  /** Whether the box around an area lies in that around another. */
  private static boolean within(Area area, Area other) {
    double[] inner = box(area);
    double[] outer = box(other);
    double touch = Resolution.STANDARD.closeM();
    return inner[0] >= outer[0] - touch
        && inner[1] >= outer[1] - touch
        && inner[2] <= outer[2] + touch
        && inner[3] <= outer[3] + touch;
  }

  private static double[] box(Area area) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (List<Point> ring : area.rings()) {
      for (Point p : ring) {
        box[0] = Math.min(box[0], p.x());
        box[1] = Math.min(box[1], p.y());
        box[2] = Math.max(box[2], p.x());
        box[3] = Math.max(box[3], p.y());
      }
    }
    return box;
  }
}
