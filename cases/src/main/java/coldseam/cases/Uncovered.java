package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.Area;
import java.util.ArrayList;
import java.util.List;

/** Air laid under everything, which shows where the shapes enclose a place they do not cover. */
final class Uncovered {
  /** How far the air reaches beyond the drawing, in parts of its size. */
  private static final double BEYOND = 0.1;

  /** Told from air that is laid as shapes, which counts where it is not enclosed too. */
  private static final String NAME = ", uncovered";

  private Uncovered() {}

  /**
   * Lays the air.
   *
   * @param areas the section
   * @param air what is uncovered
   * @return the areas with the air first
   */
  static List<Area> under(List<Area> areas, AirCavity air) {
    double left = Double.POSITIVE_INFINITY;
    double bottom = Double.POSITIVE_INFINITY;
    double right = Double.NEGATIVE_INFINITY;
    double top = Double.NEGATIVE_INFINITY;
    for (Area area : areas) {
      for (List<Point> ring : area.rings()) {
        for (Point p : ring) {
          left = Math.min(left, p.x());
          right = Math.max(right, p.x());
          bottom = Math.min(bottom, p.y());
          top = Math.max(top, p.y());
        }
      }
    }
    double beyond = BEYOND * Math.max(right - left, top - bottom);
    AirCavity enclosed =
        new AirCavity(
            air.name() + NAME,
            air.settings(),
            air.form(),
            air.temperatures(),
            air.throatM(),
            true,
            air.singles());
    List<Area> all = new ArrayList<>(areas.size() + 1);
    all.add(
        new Area(
            "uncovered (" + air.name() + ")",
            enclosed,
            List.of(
                List.of(
                    new Point(left - beyond, bottom - beyond),
                    new Point(right + beyond, bottom - beyond),
                    new Point(right + beyond, top + beyond),
                    new Point(left - beyond, top + beyond))),
            false));
    all.addAll(areas);
    return all;
  }
}
