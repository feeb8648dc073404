package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.locationtech.jts.algorithm.Distance;
import org.locationtech.jts.algorithm.LineIntersector;
import org.locationtech.jts.algorithm.RobustLineIntersector;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.noding.MCIndexNoder;
import org.locationtech.jts.noding.NodedSegmentString;
import org.locationtech.jts.noding.SegmentIntersector;
import org.locationtech.jts.noding.SegmentString;

/** Straight edges between numbered vertices, made of lines split wherever they cross or touch. */
final class NodedLines {
  /** More crossings than this belong to no drawing of a detail. */
  private static final int MOST_CROSSINGS = 200_000;

  private final Point origin;
  private final Places places = new Places();
  private final Map<Coordinate, Integer> numbers = new HashMap<>();
  private final Map<Long, Integer> edges = new HashMap<>();
  private int[] start = new int[64];
  private int[] end = new int[64];
  private int[] line = new int[64];

  private NodedLines(Point origin) {
    this.origin = origin;
  }

  static NodedLines of(List<DrawnLine> lines) throws TangledLinesException {
    NodedLines noded = new NodedLines(Closing.origin(lines));
    List<SegmentString> segments = new ArrayList<>();
    for (int l = 0; l < lines.size(); l++) {
      DrawnLine drawn = lines.get(l);
      int n = drawn.points().size();
      Coordinate last = noded.place(drawn.points().get(0));
      for (int i = 1; i < n + (drawn.closed() ? 1 : 0); i++) {
        Coordinate next = noded.place(drawn.points().get(i % n));
        if (next != last) {
          segments.add(new NodedSegmentString(new Coordinate[] {last, next}, l));
        }
        last = next;
      }
    }
    Meetings meetings = noded.new Meetings();
    MCIndexNoder noder = new MCIndexNoder(meetings, 2 * Places.SNAP_M);
    noder.computeNodes(segments);
    if (meetings.isDone()) {
      throw new TangledLinesException("lines that cross more than " + MOST_CROSSINGS + " times");
    }
    for (Object piece : noder.getNodedSubstrings()) {
      SegmentString string = (SegmentString) piece;
      Coordinate a = string.getCoordinate(0);
      Coordinate b = string.getCoordinate(string.size() - 1);
      noded.add(
          noded.places.number(a.x, a.y), noded.places.number(b.x, b.y), (Integer) string.getData());
    }
    for (int v = 0; v < noded.places.count(); v++) {
      noded.numbers.put(noded.places.at(v), v);
    }
    return noded;
  }

  private Coordinate place(Point p) {
    return places.at(places.number(p.x() - origin.x(), p.y() - origin.y()));
  }

  /**
   * Puts nodes where two segments cross, or where an end of one comes within the resolution of the
   * other; two that run together get nodes at each other's ends only.
   */
  private final class Meetings implements SegmentIntersector {
    private final LineIntersector intersector = new RobustLineIntersector();
    private int crossings;

    @Override
    public void processIntersections(SegmentString one, int i, SegmentString two, int j) {
      if (one == two || isDone()) {
        return;
      }
      Coordinate a = one.getCoordinate(0);
      Coordinate b = one.getCoordinate(1);
      Coordinate c = two.getCoordinate(0);
      Coordinate d = two.getCoordinate(1);
      boolean touch = node(two, a) | node(two, b) | node(one, c) | node(one, d);
      if (touch) {
        return;
      }
      intersector.computeIntersection(a, b, c, d);
      if (intersector.getIntersectionNum() == 1) {
        crossings++;
        Coordinate at = intersector.getIntersection(0);
        Coordinate crossing = places.at(places.number(at.x, at.y));
        add(one, crossing);
        add(two, crossing);
      }
    }

    private boolean node(SegmentString segment, Coordinate vertex) {
      Coordinate a = segment.getCoordinate(0);
      Coordinate b = segment.getCoordinate(1);
      boolean near =
          vertex == a || vertex == b || Distance.pointToSegment(vertex, a, b) <= Places.SNAP_M;
      if (near) {
        add(segment, vertex);
      }
      return near;
    }

    private void add(SegmentString segment, Coordinate node) {
      if (node != segment.getCoordinate(0) && node != segment.getCoordinate(1)) {
        ((NodedSegmentString) segment).addIntersection(node, 0);
      }
    }

    @Override
    public boolean isDone() {
      return crossings > MOST_CROSSINGS;
    }
  }

  private void add(int from, int to, int of) {
    if (from == to) {
      return;
    }
    long key = (long) Math.min(from, to) << 32 | Math.max(from, to);
    int edge = edges.size();
    if (edges.putIfAbsent(key, edge) == null) {
      if (edge == start.length) {
        start = Arrays.copyOf(start, 2 * edge);
        end = Arrays.copyOf(end, 2 * edge);
        line = Arrays.copyOf(line, 2 * edge);
      }
      start[edge] = from;
      end[edge] = to;
      line[edge] = of;
    }
  }

  int vertexCount() {
    return places.count();
  }

  int edgeCount() {
    return edges.size();
  }

  int start(int edge) {
    return start[edge];
  }

  int end(int edge) {
    return end[edge];
  }

  /** The first of the lines that run along an edge. */
  int line(int edge) {
    return line[edge];
  }

  /** The place of a vertex relative to the origin. */
  Coordinate local(int vertex) {
    return places.at(vertex);
  }

  /** The number of the vertex at a place relative to the origin. */
  int vertexAt(Coordinate local) {
    return numbers.get(local);
  }

  /** The edge between two vertices. */
  int edgeBetween(int a, int b) {
    return edges.get((long) Math.min(a, b) << 32 | Math.max(a, b));
  }

  double length(int edge) {
    return places.at(start[edge]).distance(places.at(end[edge]));
  }

  /** A place relative to the origin, in the drawing. */
  Point drawn(Coordinate local) {
    return new Point(local.x + origin.x(), local.y + origin.y());
  }
}
