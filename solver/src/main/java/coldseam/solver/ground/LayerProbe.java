package coldseam.solver.ground;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** What a straight line through laid areas meets, the topmost area counting. */
final class LayerProbe {
  /** Pieces shorter than this part of the line are seams between shapes. */
  private static final double SEAM = 1e-9;

  private LayerProbe() {}

  /**
   * One piece of the line.
   *
   * @param fill what it lies in; null where nothing is laid
   * @param lengthM m
   */
  record Piece(Fill fill, double lengthM) {
    /** d/λ across the line's direction, m²·K/W; infinite where nothing conducts. */
    double resistance(double dx, double dy) {
      if (!(fill instanceof Material material)) {
        return Double.POSITIVE_INFINITY;
      }
      double cosine = Math.cos(material.angleRad());
      double sine = Math.sin(material.angleRad());
      double along = dx * cosine + dy * sine;
      double across = dy * cosine - dx * sine;
      return lengthM
          / (material.conductivityWPerMK() * along * along
              + material.crossConductivityWPerMK() * across * across);
    }
  }

  /** The pieces from one point to another, like neighbours joined. */
  static List<Piece> pieces(List<Area> areas, Point from, Point to) {
    double[] cuts = cuts(areas, from, to);
    double length = from.distance(to);
    List<Piece> pieces = new ArrayList<>();
    for (int i = 1; i < cuts.length; i++) {
      double part = cuts[i] - cuts[i - 1];
      if (part <= SEAM) {
        continue;
      }
      double middle = (cuts[i] + cuts[i - 1]) / 2;
      Fill fill =
          at(
              areas,
              from.x() + middle * (to.x() - from.x()),
              from.y() + middle * (to.y() - from.y()));
      Piece last = pieces.isEmpty() ? null : pieces.get(pieces.size() - 1);
      if (last != null && last.fill() == fill) {
        pieces.set(pieces.size() - 1, new Piece(fill, last.lengthM() + part * length));
      } else {
        pieces.add(new Piece(fill, part * length));
      }
    }
    return pieces;
  }

  private static double[] cuts(List<Area> areas, Point from, Point to) {
    List<Double> cuts = new ArrayList<>(List.of(0.0, 1.0));
    double dx = to.x() - from.x();
    double dy = to.y() - from.y();
    for (Area area : areas) {
      for (List<Point> ring : area.rings()) {
        for (int i = 0, j = ring.size() - 1; i < ring.size(); j = i++) {
          Point a = ring.get(j);
          Point b = ring.get(i);
          double sideA = dx * (a.y() - from.y()) - dy * (a.x() - from.x());
          double sideB = dx * (b.y() - from.y()) - dy * (b.x() - from.x());
          if ((sideA > 0) == (sideB > 0)) {
            continue;
          }
          double s = sideA / (sideA - sideB);
          double x = a.x() + s * (b.x() - a.x());
          double y = a.y() + s * (b.y() - a.y());
          double t = ((x - from.x()) * dx + (y - from.y()) * dy) / (dx * dx + dy * dy);
          if (t > 0 && t < 1) {
            cuts.add(t);
          }
        }
      }
    }
    double[] sorted = new double[cuts.size()];
    for (int i = 0; i < sorted.length; i++) {
      sorted[i] = cuts.get(i);
    }
    Arrays.sort(sorted);
    return sorted;
  }

  private static Fill at(List<Area> areas, double x, double y) {
    Fill fill = null;
    for (Area area : areas) {
      if (covers(area, x, y)) {
        fill = area.fill();
      }
    }
    return fill;
  }

  /** Even-odd rule over all rings. */
  private static boolean covers(Area area, double x, double y) {
    boolean inside = false;
    for (List<Point> ring : area.rings()) {
      for (int i = 0, j = ring.size() - 1; i < ring.size(); j = i++) {
        Point a = ring.get(i);
        Point b = ring.get(j);
        if ((a.y() > y) != (b.y() > y)
            && x < (b.x() - a.x()) * (y - a.y()) / (b.y() - a.y()) + a.x()) {
          inside = !inside;
        }
      }
    }
    return inside;
  }
}
