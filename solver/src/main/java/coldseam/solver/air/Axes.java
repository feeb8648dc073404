package coldseam.solver.air;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/**
 * Two directions at right angles along which a cavity is measured: that in which most of its rim
 * runs, along or across, and the other.
 *
 * @param ux x component of the first, a unit vector
 * @param uy y component of it
 * @param share part of the rim that runs along or across
 */
record Axes(double ux, double uy, double share) {
  /** Sine of the angle up to which edges count as parallel. */
  private static final double PARALLEL = 1e-4;

  /** The sheet's own axes. */
  static final Axes SHEET = new Axes(1, 0, 0);

  /** The axes of a closed ring. */
  static Axes of(List<Point> ring) {
    double perimeter = 0;
    Axes best = SHEET;
    double longest = 0;
    for (int i = 0; i < ring.size(); i++) {
      Point a = ring.get(i);
      Point b = ring.get((i + 1) % ring.size());
      double length = a.distance(b);
      perimeter += length;
      double ux = (b.x() - a.x()) / length;
      double uy = (b.y() - a.y()) / length;
      double parallel = 0;
      for (int j = 0; j < ring.size(); j++) {
        Point c = ring.get(j);
        Point d = ring.get((j + 1) % ring.size());
        double along = Math.abs((d.x() - c.x()) * ux + (d.y() - c.y()) * uy);
        double across = Math.abs((d.x() - c.x()) * -uy + (d.y() - c.y()) * ux);
        if (Math.min(along, across) <= PARALLEL * Math.max(along, across)) {
          parallel += Math.max(along, across);
        }
      }
      if (parallel > longest * (1 + Limits.TIE)) {
        longest = parallel;
        best = first(ux, uy);
      }
    }
    return new Axes(best.ux, best.uy, longest / perimeter);
  }

  /** The axes of a whole section: the directions along and across which most of its edges run. */
  static Axes of(Partition partition) {
    int n = partition.edgeCount();
    Integer[] order = new Integer[n];
    double[] angle = new double[n];
    for (int e = 0; e < n; e++) {
      order[e] = e;
      double dx = partition.x(partition.edgeEnd(e)) - partition.x(partition.edgeStart(e));
      double dy = partition.y(partition.edgeEnd(e)) - partition.y(partition.edgeStart(e));
      Axes along = first(dx / Math.hypot(dx, dy), dy / Math.hypot(dx, dy));
      angle[e] = Math.atan2(along.uy, along.ux);
    }
    Arrays.sort(order, Comparator.comparingDouble(e -> angle[e]));
    double most = 0;
    int longest = -1;
    for (int from = 0; from < n; ) {
      double sum = 0;
      int member = order[from];
      int to = from;
      while (to < n && angle[order[to]] - angle[order[from]] <= PARALLEL) {
        sum += partition.edgeLength(order[to]);
        if (partition.edgeLength(order[to]) > partition.edgeLength(member)) {
          member = order[to];
        }
        to++;
      }
      if (sum > most * (1 + Limits.TIE)) {
        most = sum;
        longest = member;
      }
      from = to;
    }
    int a = partition.edgeStart(longest);
    int b = partition.edgeEnd(longest);
    double length = partition.edgeLength(longest);
    return first(
        (partition.x(b) - partition.x(a)) / length, (partition.y(b) - partition.y(a)) / length);
  }

  /** The one of the two that lies within 45° of the sheet's x axis. */
  private static Axes first(double ux, double uy) {
    if (Math.abs(ux) >= Math.abs(uy)) {
      return ux > 0 ? new Axes(ux, uy, 0) : new Axes(-ux, -uy, 0);
    }
    return uy > 0 ? new Axes(uy, -ux, 0) : new Axes(-uy, ux, 0);
  }

  double x(int axis) {
    return axis == 0 ? ux : -uy;
  }

  double y(int axis) {
    return axis == 0 ? uy : ux;
  }

  /** Extent of a ring along an axis, m. */
  double extent(List<Point> ring, int axis) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (Point p : ring) {
      double at = p.x() * x(axis) + p.y() * y(axis);
      low = Math.min(low, at);
      high = Math.max(high, at);
    }
    return high - low;
  }
}
