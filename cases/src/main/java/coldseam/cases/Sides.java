package coldseam.cases;

import coldseam.mesh.partition.LabelledArea;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The four sides of the box around the conducting section, as it is seen after all is laid. */
final class Sides {
  static final List<String> NAMES = List.of("left", "right", "top", "bottom");

  private static final double TOUCH_M = Resolution.STANDARD.closeM();

  private final List<double[]> segments = new ArrayList<>();
  private final double[] low = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
  private final double[] high = {Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY};

  private Sides() {}

  /**
   * Works out the box and what lies on its sides.
   *
   * @param areas in the order laid
   * @return the sides; empty if nothing conducts
   */
  static Optional<Sides> of(List<Area> areas) {
    Sides sides = new Sides();
    if (somethingLaidOverConductor(areas)) {
      sides.takeFromPartition(areas);
    } else {
      for (Area area : areas) {
        if (conducts(area.fill())) {
          for (List<Point> ring : area.rings()) {
            sides.takeRing(ring);
          }
        }
      }
    }
    return sides.segments.isEmpty() ? Optional.empty() : Optional.of(sides);
  }

  static boolean conducts(Fill fill) {
    return fill instanceof AirCavity
        || fill instanceof Material material && material.conductivityWPerMK() > 0;
  }

  /** Whether a later area that does not conduct might hide part of a conducting one. */
  private static boolean somethingLaidOverConductor(List<Area> areas) {
    List<double[]> conductors = new ArrayList<>();
    for (Area area : areas) {
      double[] box = box(area.rings());
      if (conducts(area.fill())) {
        conductors.add(box);
        continue;
      }
      for (double[] other : conductors) {
        boolean over =
            box[0] < other[2] - TOUCH_M
                && other[0] < box[2] - TOUCH_M
                && box[1] < other[3] - TOUCH_M
                && other[1] < box[3] - TOUCH_M;
        if (over) {
          return true;
        }
      }
    }
    return false;
  }

  private static double[] box(List<List<Point>> rings) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (List<Point> ring : rings) {
      for (Point p : ring) {
        box[0] = Math.min(box[0], p.x());
        box[1] = Math.min(box[1], p.y());
        box[2] = Math.max(box[2], p.x());
        box[3] = Math.max(box[3], p.y());
      }
    }
    return box;
  }

  private void takeRing(List<Point> ring) {
    for (int i = 0; i < ring.size(); i++) {
      Point p = ring.get(i);
      Point q = ring.get((i + 1) % ring.size());
      take(p.x(), p.y(), q.x(), q.y());
    }
  }

  private void take(double x1, double y1, double x2, double y2) {
    segments.add(new double[] {x1, y1, x2, y2});
    low[0] = Math.min(low[0], Math.min(x1, x2));
    low[1] = Math.min(low[1], Math.min(y1, y2));
    high[0] = Math.max(high[0], Math.max(x1, x2));
    high[1] = Math.max(high[1], Math.max(y1, y2));
  }

  private void takeFromPartition(List<Area> areas) {
    List<LabelledArea> labelled = new ArrayList<>(areas.size());
    for (Area area : areas) {
      labelled.add(new LabelledArea(conducts(area.fill()) ? 1 : 0, area.rings()));
    }
    Partition partition = Partition.of(labelled, List.of(), Resolution.STANDARD);
    Point origin = partition.origin();
    for (int e = 0; e < partition.edgeCount(); e++) {
      boolean left = partition.leftLabel(e) == 1;
      if (left != (partition.rightLabel(e) == 1)) {
        int a = partition.edgeStart(e);
        int b = partition.edgeEnd(e);
        take(
            origin.x() + partition.x(a),
            origin.y() + partition.y(a),
            origin.x() + partition.x(b),
            origin.y() + partition.y(b));
      }
    }
  }

  /**
   * The pieces of the section's outline that lie on a side, from left to right or from the bottom
   * up; pieces that touch are one.
   *
   * @param side one of {@link #NAMES}
   * @return each piece by its two ends; at least one
   */
  List<Point[]> pieces(String side) {
    int across = side.equals("left") || side.equals("right") ? 0 : 1;
    boolean lower = side.equals("left") || side.equals("bottom");
    double level = lower ? low[across] : high[across];
    List<double[]> spans = new ArrayList<>();
    for (double[] s : segments) {
      if (Math.abs(s[across] - level) <= TOUCH_M && Math.abs(s[across + 2] - level) <= TOUCH_M) {
        double from = s[1 - across];
        double to = s[3 - across];
        spans.add(new double[] {Math.min(from, to), Math.max(from, to)});
      }
    }
    spans.sort((a, b) -> Double.compare(a[0], b[0]));
    List<double[]> merged = new ArrayList<>();
    for (double[] span : spans) {
      double[] last = merged.isEmpty() ? null : merged.get(merged.size() - 1);
      if (last != null && span[0] <= last[1] + TOUCH_M) {
        last[1] = Math.max(last[1], span[1]);
      } else {
        merged.add(span);
      }
    }
    List<Point[]> pieces = new ArrayList<>();
    for (double[] span : merged) {
      if (span[1] - span[0] > TOUCH_M) {
        pieces.add(
            across == 0
                ? new Point[] {new Point(level, span[0]), new Point(level, span[1])}
                : new Point[] {new Point(span[0], level), new Point(span[1], level)});
      }
    }
    return pieces;
  }
}
