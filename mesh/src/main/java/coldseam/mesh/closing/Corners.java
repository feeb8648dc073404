package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.index.strtree.STRtree;

/**
 * The distinct places where lines have corners, with the lines that meet there, and the edges
 * between them. Coordinates are relative to an origin.
 */
final class Corners {
  private static final double SNAP_M = Places.SNAP_M;

  /** Looking up more neighbours than this in all is given up. */
  private static final long MOST_NEIGHBOURS = 10_000_000;

  private final List<DrawnLine> lines;
  private final double reachM;
  private final Point origin;
  private final int[][] placeOf;
  private final Places places = new Places();
  private final List<Set<Integer>> meeting = new ArrayList<>();
  private final List<Set<Integer>> cornered = new ArrayList<>();
  private final Map<Integer, List<Integer>> touched = new HashMap<>();
  private final List<int[]> edges = new ArrayList<>();
  private final STRtree edgeTree = new STRtree();
  private final Map<Long, List<Integer>> grid = new HashMap<>();
  private long neighbours;

  /**
   * Collects.
   *
   * @param lines the lines
   * @param reachM how far {@link #near} will look, m
   */
  Corners(List<DrawnLine> lines, double reachM) throws TangledLinesException {
    this.lines = lines;
    this.reachM = reachM;
    origin = Closing.origin(lines);
    placeOf = new int[lines.size()][];
    for (int l = 0; l < lines.size(); l++) {
      List<Point> points = lines.get(l).points();
      placeOf[l] = new int[points.size()];
      for (int i = 0; i < points.size(); i++) {
        Point point = points.get(i);
        placeOf[l][i] = places.number(point.x() - origin.x(), point.y() - origin.y());
        if (placeOf[l][i] == meeting.size()) {
          meeting.add(new TreeSet<>());
        }
        meeting.get(placeOf[l][i]).add(l);
      }
      for (int i = 0; i + 1 < points.size() + (lines.get(l).closed() ? 1 : 0); i++) {
        addEdge(l, placeOf[l][i], placeOf[l][(i + 1) % points.size()]);
      }
    }
    for (int p = 0; p < places.count(); p++) {
      grid.computeIfAbsent(cell(places.at(p), 0, 0), k -> new ArrayList<>()).add(p);
    }
    touch();
  }

  private long cell(Coordinate c, int dx, int dy) {
    return Places.key((long) Math.floor(c.x / reachM) + dx, (long) Math.floor(c.y / reachM) + dy);
  }

  private void addEdge(int line, int from, int to) {
    if (from != to) {
      edgeTree.insert(new Envelope(places.at(from), places.at(to)), edges.size());
      edges.add(new int[] {line, from, to});
    }
  }

  /** Adds to the lines of each place those that pass through it. */
  private void touch() throws TangledLinesException {
    for (int p = 0; p < places.count(); p++) {
      cornered.add(new TreeSet<>(meeting.get(p)));
      for (int e : edgesNear(p)) {
        if (!ends(e, p) && distance(e, p) <= SNAP_M) {
          meeting.get(p).add(edges.get(e)[0]);
          touched.computeIfAbsent(p, k -> new ArrayList<>(1)).add(e);
        }
      }
    }
  }

  int count() {
    return places.count();
  }

  Point origin() {
    return origin;
  }

  Coordinate at(int place) {
    return places.at(place);
  }

  /** The lines that have a corner at a place or pass through it. */
  Set<Integer> lines(int place) {
    return meeting.get(place);
  }

  /** The lines that have a corner at a place. */
  Set<Integer> cornered(int place) {
    return cornered.get(place);
  }

  /** The edges that pass through a place without a corner of theirs there. */
  List<Integer> touched(int place) {
    return touched.getOrDefault(place, List.of());
  }

  int placeOf(int line, int corner) {
    return placeOf[line][corner];
  }

  int line(int edge) {
    return edges.get(edge)[0];
  }

  int from(int edge) {
    return edges.get(edge)[1];
  }

  int to(int edge) {
    return edges.get(edge)[2];
  }

  boolean ends(int edge, int place) {
    return edges.get(edge)[1] == place || edges.get(edge)[2] == place;
  }

  /** Distance of a place from an edge, m. */
  double distance(int edge, int place) {
    Coordinate a = places.at(edges.get(edge)[1]);
    Coordinate b = places.at(edges.get(edge)[2]);
    return org.locationtech.jts.algorithm.Distance.pointToSegment(places.at(place), a, b);
  }

  /** Edges that may lie within reach of a place. */
  List<Integer> edgesNear(int place) throws TangledLinesException {
    Envelope around = new Envelope(places.at(place));
    around.expandBy(reachM);
    List<Integer> near = new ArrayList<>();
    for (Object found : edgeTree.query(around)) {
      near.add((Integer) found);
    }
    near.sort(null);
    count(near.size());
    return near;
  }

  /** Places of a higher number within reach of a place. */
  List<Integer> near(int place) throws TangledLinesException {
    List<Integer> near = new ArrayList<>();
    Coordinate c = places.at(place);
    for (int dx = -1; dx <= 1; dx++) {
      for (int dy = -1; dy <= 1; dy++) {
        List<Integer> inCell = grid.getOrDefault(cell(c, dx, dy), List.of());
        count(inCell.size());
        for (int other : inCell) {
          if (other > place && places.at(other).distance(c) <= reachM) {
            near.add(other);
          }
        }
      }
    }
    near.sort(null);
    return near;
  }

  private void count(int more) throws TangledLinesException {
    neighbours += more;
    if (neighbours > MOST_NEIGHBOURS) {
      throw new TangledLinesException("corners that crowd closer than lines are joined");
    }
  }

  /** The open lines that end at a place. */
  List<Integer> ending(int place) {
    List<Integer> ending = new ArrayList<>();
    for (int line : cornered.get(place)) {
      if (!lines.get(line).closed() && (first(line) == place) != (last(line) == place)) {
        ending.add(line);
      }
    }
    return ending;
  }

  int first(int line) {
    return placeOf[line][0];
  }

  int last(int line) {
    return placeOf[line][placeOf[line].length - 1];
  }

  /** Where an open line goes from its end at a place, as a unit vector. */
  double[] inward(int line, int place) {
    int n = placeOf[line].length;
    boolean begins = first(line) == place;
    Coordinate a = places.at(place);
    Coordinate b = a;
    for (int i = 1; i < n && b.equals2D(a); i++) {
      b = places.at(placeOf[line][begins ? i : n - 1 - i]);
    }
    double length = Math.max(a.distance(b), Double.MIN_NORMAL);
    return new double[] {(b.x - a.x) / length, (b.y - a.y) / length};
  }
}
