package coldseam.solver.air;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.Area;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A connected piece of air, cut off at throats.
 *
 * @param source the area it was laid with
 * @param fill what it was laid as
 * @param rings its rings, m
 * @param settings what is stated for it
 */
record Piece(Area source, AirCavity fill, List<List<Point>> rings, AirCavity.Settings settings) {
  /**
   * How a piece is taken.
   *
   * @param rule the rule that holds
   * @param ruleStated whether the case states it
   * @param ventilation the class
   * @param ventilationStated whether the case states it
   * @param slitM widest opening to a space, m; 0 if there is none
   * @param openings area of the openings of a layer, m² per metre or per m²
   * @param space the space it exchanges air with, if any
   */
  record Classed(
      Rule rule,
      boolean ruleStated,
      Ventilation ventilation,
      boolean ventilationStated,
      double slitM,
      OptionalDouble openings,
      Optional<String> space) {
    boolean well() {
      return ventilation == Ventilation.WELL_VENTILATED;
    }
  }

  /** The same piece with other rings. */
  Piece with(List<List<Point>> others) {
    return new Piece(source, fill, others, settings);
  }

  /** Whether a point lies in it, by the even-odd rule. */
  boolean covers(Point p) {
    return covers(rings, p);
  }

  static boolean covers(List<List<Point>> rings, Point p) {
    boolean inside = false;
    for (List<Point> ring : rings) {
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

  /** Area, m². */
  double areaM2() {
    double sum = 0;
    for (List<Point> ring : rings) {
      sum += signedArea(ring);
    }
    return sum;
  }

  /**
   * Thickness of a strip that goes round corners, m: that of the straight strip of the same area
   * and perimeter. 0 if the piece is a rectangle or no strip.
   */
  double thicknessIfBentM() {
    double perimeter = 0;
    for (List<Point> ring : rings) {
      for (int i = 0; i < ring.size(); i++) {
        perimeter += ring.get(i).distance(ring.get((i + 1) % ring.size()));
      }
    }
    double area = areaM2();
    Axes axes = Axes.of(rings.get(0));
    double box = axes.extent(rings.get(0), 0) * axes.extent(rings.get(0), 1);
    double half = perimeter / 2;
    double root = Math.sqrt(Math.max(0, half * half - 4 * area));
    double thickness = (half - root) / 2;
    double length = (half + root) / 2;
    boolean bent = area < (1 - Limits.TIE) * box && thickness < STRIP * length;
    return bent ? thickness : 0;
  }

  /** Thickness over length up to which a piece of a layer is a strip. */
  private static final double STRIP = 0.25;

  private static double signedArea(List<Point> ring) {
    Point o = ring.get(0);
    double twice = 0;
    for (int i = 1; i + 1 < ring.size(); i++) {
      Point a = ring.get(i);
      Point b = ring.get(i + 1);
      twice += (a.x() - o.x()) * (b.y() - o.y()) - (b.x() - o.x()) * (a.y() - o.y());
    }
    return twice / 2;
  }

  /** A point well inside: middle of the widest stretch of a line across. */
  Point inside() {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (Point p : rings.get(0)) {
      low = Math.min(low, p.y());
      high = Math.max(high, p.y());
    }
    Point best = rings.get(0).get(0);
    double widest = -1;
    for (double height : HEIGHTS) {
      double y = low + (high - low) * height;
      double[] crossings = crossings(y);
      for (int i = 0; i + 1 < crossings.length; i += 2) {
        double width = crossings[i + 1] - crossings[i];
        if (width > widest * (1 + Limits.TIE)) {
          widest = width;
          best = new Point((crossings[i] + crossings[i + 1]) / 2, y);
        }
      }
    }
    return best;
  }

  /** Heights of the lines tried, the middle first, off the round parts that drawings have. */
  private static final double[] HEIGHTS = {0.501, 0.349, 0.651, 0.199, 0.801, 0.051, 0.949};

  private double[] crossings(double y) {
    double[] found = new double[16];
    int n = 0;
    for (List<Point> ring : rings) {
      for (int i = 0, j = ring.size() - 1; i < ring.size(); j = i++) {
        Point a = ring.get(i);
        Point b = ring.get(j);
        if ((a.y() > y) != (b.y() > y)) {
          if (n == found.length) {
            found = Arrays.copyOf(found, 2 * n);
          }
          found[n++] = a.x() + (y - a.y()) / (b.y() - a.y()) * (b.x() - a.x());
        }
      }
    }
    double[] sorted = Arrays.copyOf(found, n);
    Arrays.sort(sorted);
    return sorted;
  }
}
