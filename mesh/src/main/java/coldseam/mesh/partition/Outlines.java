package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The outlines of all laid areas in local coordinates, with points nearer than the joining length
 * made one, and as segments between numbered vertices.
 */
final class Outlines {
  private final Point origin;
  private final List<Shape> shapes;
  private final PointIndex points;
  private double largestJoinM;

  /** Ring that each segment belongs to, counted over all areas. */
  private int[] ringOf = new int[64];

  private int[] start = new int[64];
  private int[] end = new int[64];
  private int[][] areas = new int[64][];
  private int count;
  private final List<Integer> areaOfRing = new ArrayList<>();

  Outlines(List<LabelledArea> laid, double snapM) {
    origin = origin(laid);
    shapes = new ArrayList<>(laid.size());
    points = new PointIndex(snapM);
    for (int a = 0; a < laid.size(); a++) {
      shapes.add(addArea(a, laid.get(a)));
    }
  }

  Point origin() {
    return origin;
  }

  /** The area as drawn, in local coordinates. */
  Shape shape(int area) {
    return shapes.get(area);
  }

  /** How far a point was moved onto another, at most, m. */
  double largestJoinM() {
    return largestJoinM;
  }

  int segmentCount() {
    return count;
  }

  int ringCount() {
    return areaOfRing.size();
  }

  int areaOfRing(int ring) {
    return areaOfRing.get(ring);
  }

  int ringOf(int segment) {
    return ringOf[segment];
  }

  /** Splits the outlines where they meet. */
  Linework node(Noding noding) {
    return noding.node(
        points.xs(),
        points.ys(),
        Arrays.copyOf(start, count),
        Arrays.copyOf(end, count),
        Arrays.copyOf(areas, count));
  }

  /**
   * The middle of the drawing, on a grid of a power of two near a quarter of its size so that
   * taking it away from a coordinate loses no digit.
   */
  private static Point origin(List<LabelledArea> laid) {
    double minX = Double.POSITIVE_INFINITY;
    double minY = Double.POSITIVE_INFINITY;
    double maxX = Double.NEGATIVE_INFINITY;
    double maxY = Double.NEGATIVE_INFINITY;
    for (LabelledArea area : laid) {
      for (List<Point> ring : area.rings()) {
        for (Point p : ring) {
          minX = Math.min(minX, p.x());
          maxX = Math.max(maxX, p.x());
          minY = Math.min(minY, p.y());
          maxY = Math.max(maxY, p.y());
        }
      }
    }
    double size = Math.max(maxX - minX, maxY - minY);
    if (size == 0) {
      return new Point(minX, minY);
    }
    double step = Math.scalb(1.0, Math.getExponent(size) - 2);
    return new Point(
        Math.rint((minX + maxX) / 2 / step) * step, Math.rint((minY + maxY) / 2 / step) * step);
  }

  private Shape addArea(int area, LabelledArea laid) {
    int[] self = {area};
    List<double[]> xs = new ArrayList<>(laid.rings().size());
    List<double[]> ys = new ArrayList<>(laid.rings().size());
    for (List<Point> ring : laid.rings()) {
      double[] x = new double[ring.size()];
      double[] y = new double[ring.size()];
      int[] vertex = new int[ring.size()];
      for (int i = 0; i < x.length; i++) {
        x[i] = ring.get(i).x() - origin.x();
        y[i] = ring.get(i).y() - origin.y();
        vertex[i] = points.add(x[i], y[i]);
        double moved = Segments.length(points.x(vertex[i]) - x[i], points.y(vertex[i]) - y[i]);
        largestJoinM = Math.max(largestJoinM, moved);
      }
      for (int i = 0; i < x.length; i++) {
        addSegment(vertex[i], vertex[(i + 1) % x.length], self, areaOfRing.size());
      }
      areaOfRing.add(area);
      xs.add(x);
      ys.add(y);
    }
    return new Shape(xs, ys);
  }

  private void addSegment(int from, int to, int[] self, int ring) {
    if (from == to) {
      return;
    }
    if (count == start.length) {
      ringOf = Arrays.copyOf(ringOf, 2 * count);
      start = Arrays.copyOf(start, 2 * count);
      end = Arrays.copyOf(end, 2 * count);
      areas = Arrays.copyOf(areas, 2 * count);
    }
    ringOf[count] = ring;
    start[count] = from;
    end[count] = to;
    areas[count++] = self;
  }
}
