package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.List;
import org.locationtech.jts.algorithm.LineIntersector;
import org.locationtech.jts.algorithm.RobustLineIntersector;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.noding.NodedSegmentString;
import org.locationtech.jts.noding.SegmentIntersector;
import org.locationtech.jts.noding.SegmentString;

/**
 * Puts nodes where two segments cross or come within the joining length of each other. A crossing
 * near a known point is that point. Segments that run together get nodes at each other's ends only:
 * where exactly two such lines cross is an accident of rounding.
 */
final class Crossings implements SegmentIntersector {
  private final double snapM;
  private final PointIndex points;
  private final List<Coordinate> coordinates;
  private final LineIntersector intersector = new RobustLineIntersector();

  /** Starts with the vertices of the segments, no two within the joining length. */
  Crossings(double snapM, double[] x, double[] y) {
    this.snapM = snapM;
    points = new PointIndex(snapM);
    coordinates = new ArrayList<>(2 * x.length);
    for (int v = 0; v < x.length; v++) {
      coordinate(x[v], y[v]);
    }
  }

  /** All vertices and crossings found. */
  PointIndex points() {
    return points;
  }

  /** A known point. */
  Coordinate coordinate(int point) {
    return coordinates.get(point);
  }

  /** The known point near a place, or a new one there. */
  private Coordinate coordinate(double x, double y) {
    int v = points.add(x, y);
    if (v == coordinates.size()) {
      coordinates.add(new Coordinate(x, y));
    }
    return coordinates.get(v);
  }

  @Override
  public void processIntersections(SegmentString one, int i, SegmentString two, int j) {
    if (one == two) {
      return;
    }
    Coordinate a = one.getCoordinate(0);
    Coordinate b = one.getCoordinate(1);
    Coordinate c = two.getCoordinate(0);
    Coordinate d = two.getCoordinate(1);
    boolean touch = node(two, a) | node(two, b) | node(one, c) | node(one, d);
    if (touch) {
      // Bent to pass through the vertex, the two meet there and nowhere else but at such vertices.
      return;
    }
    intersector.computeIntersection(a, b, c, d);
    if (intersector.getIntersectionNum() == 1) {
      Coordinate crossing = intersector.getIntersection(0);
      Coordinate point = coordinate(crossing.x, crossing.y);
      add(one, point);
      add(two, point);
    }
  }

  /** Whether a vertex is near a segment; puts a node there if so. */
  private boolean node(SegmentString segment, Coordinate vertex) {
    Coordinate a = segment.getCoordinate(0);
    Coordinate b = segment.getCoordinate(1);
    boolean near =
        vertex == a
            || vertex == b
            || Segments.distance(vertex.x, vertex.y, a.x, a.y, b.x, b.y) <= snapM;
    if (near) {
      add(segment, vertex);
    }
    return near;
  }

  private static void add(SegmentString segment, Coordinate point) {
    if (point != segment.getCoordinate(0) && point != segment.getCoordinate(1)) {
      ((NodedSegmentString) segment).addIntersection(point, 0);
    }
  }

  @Override
  public boolean isDone() {
    return false;
  }
}
