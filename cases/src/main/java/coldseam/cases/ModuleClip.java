package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Stretch;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Cuts one module out of a wall drawn longer: everything between two planes square to its faces.
 *
 * @param alongY whether the wall runs along y, else along x
 * @param low the lower plane, m
 * @param high the upper one, m
 */
record ModuleClip(boolean alongY, double low, double high) {
  /** The areas between the planes; what lies beyond is gone. */
  List<Area> of(List<Area> areas) {
    List<Area> all = new ArrayList<>();
    for (Area area : areas) {
      List<List<Point>> rings = new ArrayList<>();
      for (List<Point> ring : area.rings()) {
        List<Point> cut = beyond(beyond(ring, low, 1), high, -1);
        if (cut.size() >= 3) {
          rings.add(cut);
        }
      }
      if (!rings.isEmpty()) {
        all.add(new Area(area.name(), area.fill(), rings, area.glazing(), area.role()));
      }
    }
    return all;
  }

  /**
   * The part of a ring on one side of a plane (Sutherland and Hodgman 1974); pieces that part stay
   * joined along the plane, twice over, which counts for nothing.
   */
  private List<Point> beyond(List<Point> ring, double plane, double sign) {
    List<Point> kept = new ArrayList<>();
    for (int i = 0; i < ring.size(); i++) {
      Point a = ring.get(i);
      Point b = ring.get((i + 1) % ring.size());
      double sideA = sign * (at(a) - plane);
      double sideB = sign * (at(b) - plane);
      if (sideA >= 0) {
        kept.add(a);
      }
      if (sideA > 0 && sideB < 0 || sideA < 0 && sideB > 0) {
        double s = sideA / (sideA - sideB);
        kept.add(
            alongY
                ? new Point(a.x() + s * (b.x() - a.x()), plane)
                : new Point(plane, a.y() + s * (b.y() - a.y())));
      }
    }
    return flat(kept) ? List.of() : kept;
  }

  private boolean flat(List<Point> ring) {
    for (Point point : ring) {
      if (at(point) != at(ring.get(0))) {
        return false;
      }
    }
    return true;
  }

  private double at(Point point) {
    return alongY ? point.y() : point.x();
  }

  /** Both planes as planes of symmetry, over the extent of what is laid. */
  List<Stretch> planes(List<Area> areas) {
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    for (Area area : areas) {
      if (!Sides.conducts(area.fill())) {
        continue;
      }
      for (List<Point> ring : area.rings()) {
        for (Point point : ring) {
          double across = alongY ? point.x() : point.y();
          least = Math.min(least, across);
          most = Math.max(most, across);
        }
      }
    }
    return List.of(
        plane("module plane 1", low, least, most), plane("module plane 2", high, least, most));
  }

  private Stretch plane(String name, double at, double from, double to) {
    return new Stretch(
        name,
        alongY
            ? List.of(new Point(from, at), new Point(to, at))
            : List.of(new Point(at, from), new Point(at, to)),
        Optional.of(new EdgeCondition.CutOff(true)),
        false);
  }

  /** Lowest and highest place along the wall of what conducts, m. */
  static double[] extent(List<Area> areas, boolean alongY) {
    double[] ends = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
    for (Area area : areas) {
      if (Sides.conducts(area.fill())) {
        for (List<Point> ring : area.rings()) {
          for (Point point : ring) {
            double at = alongY ? point.y() : point.x();
            ends[0] = Math.min(ends[0], at);
            ends[1] = Math.max(ends[1], at);
          }
        }
      }
    }
    return ends;
  }
}
