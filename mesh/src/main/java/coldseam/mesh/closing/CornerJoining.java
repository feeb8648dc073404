package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.locationtech.jts.geom.Coordinate;

/** Joins near corners: first places with each other, then places onto edges. */
final class CornerJoining {
  /** A corner moves by at most this part of the way to the next thing drawn there. */
  private static final double SAFE = 0.5;

  /** A line whose two ends are joined is at least so many times longer than the gap. */
  private static final double LONGER = 8;

  /** Cosine of the angle below which two loose ends run side by side, as those of a sheet do. */
  private static final double SIDE_BY_SIDE = Math.cos(Math.toRadians(30));

  /** Sine of the least angle at which two lines meet in a place worth the name. */
  private static final double LEAST_SINE = 0.1;

  private static final double SNAP_M = Places.SNAP_M;

  /** Widens limits a little, so that a gap of just the tolerance is joined however it is turned. */
  private static final double TIE = 1 + 1e-6;

  private final List<DrawnLine> lines;
  private final double toleranceM;
  private Corners corners;
  private double[] roomM;
  private Coordinate[] moved;
  private int[] joinedTo;
  private List<Set<Integer>> meeting;
  private final List<Joined.Join> joins = new ArrayList<>();
  private final List<Joined.Join> doubts = new ArrayList<>();

  CornerJoining(List<DrawnLine> lines, double toleranceM) {
    this.lines = lines;
    this.toleranceM = toleranceM * TIE;
  }

  /** Two places, or a place and an edge, that might be joined. */
  private record Near(double distanceM, int place, int other) {}

  Joined join() throws TangledLinesException {
    if (!(toleranceM > SNAP_M) || lines.isEmpty()) {
      return new Joined(lines, List.of(), List.of());
    }
    corners = new Corners(lines, 2 * toleranceM);
    int n = corners.count();
    moved = new Coordinate[n];
    joinedTo = new int[n];
    meeting = new ArrayList<>();
    for (int p = 0; p < n; p++) {
      moved[p] = corners.at(p);
      joinedTo[p] = p;
      meeting.add(new TreeSet<>(corners.cornered(p)));
    }
    room();
    joinPlaces();
    moveOntoEdges();
    follow();
    return new Joined(built(), joins, doubts);
  }

  /** How far each place is from whatever else the lines that meet there draw. */
  private void room() throws TangledLinesException {
    roomM = new double[corners.count()];
    Arrays.fill(roomM, Double.POSITIVE_INFINITY);
    for (int p = 0; p < roomM.length; p++) {
      for (int e : corners.edgesNear(p)) {
        if (!corners.lines(p).contains(corners.line(e)) || nextToTouched(e, p)) {
          continue;
        }
        double d;
        if (corners.ends(e, p)) {
          d = corners.at(corners.from(e)).distance(corners.at(corners.to(e)));
        } else if (closes(p, e)) {
          continue;
        } else {
          d = corners.distance(e, p);
        }
        if (d > SNAP_M) {
          roomM[p] = Math.min(roomM[p], d);
        }
      }
    }
  }

  /** Whether an edge goes on from an edge that passes through a place, or is that edge. */
  private boolean nextToTouched(int edge, int place) {
    if (corners.cornered(place).contains(corners.line(edge))) {
      return false;
    }
    for (int e : corners.touched(place)) {
      boolean next = corners.ends(edge, corners.from(e)) || corners.ends(edge, corners.to(e));
      if (next && corners.line(e) == corners.line(edge)) {
        return true;
      }
    }
    return false;
  }

  /** Whether an edge belongs to the other end of an open line that ends here. */
  private boolean closes(int place, int edge) {
    int line = corners.line(edge);
    DrawnLine drawn = lines.get(line);
    if (drawn.closed() || drawn.points().size() < 3) {
      return false;
    }
    int first = corners.first(line);
    int last = corners.last(line);
    return place == first && corners.ends(edge, last) || place == last && corners.ends(edge, first);
  }

  private void joinPlaces() throws TangledLinesException {
    List<Near> pairs = new ArrayList<>();
    for (int p = 0; p < corners.count(); p++) {
      for (int q : corners.near(p)) {
        double d = corners.at(p).distance(corners.at(q));
        if (d <= toleranceM && mayMeet(p, q, d)) {
          pairs.add(new Near(d, p, q));
        }
      }
    }
    pairs.sort(
        (a, b) ->
            a.distanceM() != b.distanceM()
                ? Double.compare(a.distanceM(), b.distanceM())
                : a.place() != b.place()
                    ? Integer.compare(a.place(), b.place())
                    : Integer.compare(a.other(), b.other()));
    for (Near pair : pairs) {
      joinPair(pair);
    }
    settlePlaces();
  }

  private boolean mayMeet(int p, int q, double distance) {
    for (int one : corners.ending(p)) {
      for (int other : corners.ending(q)) {
        double[] u = corners.inward(one, p);
        double[] v = corners.inward(other, q);
        if (one != other && u[0] * v[0] + u[1] * v[1] > SIDE_BY_SIDE) {
          return false;
        }
      }
    }
    if (ownEnds(p, q, distance)) {
      return true;
    }
    for (int line : corners.lines(p)) {
      if (corners.lines(q).contains(line) && !alongOneEdge(p, q, line)) {
        return false;
      }
    }
    return true;
  }

  /** Whether two places lie on one edge of a line, one of them between its corners. */
  private boolean alongOneEdge(int p, int q, int line) {
    for (int e : corners.touched(p)) {
      if (corners.line(e) == line && (corners.ends(e, q) || corners.touched(q).contains(e))) {
        return true;
      }
    }
    for (int e : corners.touched(q)) {
      if (corners.line(e) == line && corners.ends(e, p)) {
        return true;
      }
    }
    return false;
  }

  /** Whether two places are the ends of one open line, and of nothing else in common. */
  private boolean ownEnds(int p, int q, double distance) {
    Set<Integer> common = new TreeSet<>(corners.lines(p));
    common.retainAll(corners.lines(q));
    if (common.size() != 1) {
      return false;
    }
    int line = common.iterator().next();
    DrawnLine drawn = lines.get(line);
    boolean ends =
        corners.first(line) == p && corners.last(line) == q
            || corners.first(line) == q && corners.last(line) == p;
    if (drawn.closed() || drawn.points().size() < 3 || !ends) {
      return false;
    }
    double length = 0;
    for (int i = 1; i < drawn.points().size(); i++) {
      length += drawn.points().get(i - 1).distance(drawn.points().get(i));
    }
    double[] u = corners.inward(line, p);
    double[] v = corners.inward(line, q);
    return length >= LONGER * distance && u[0] * v[0] + u[1] * v[1] <= SIDE_BY_SIDE;
  }

  private void joinPair(Near pair) {
    int a = root(pair.place());
    int b = root(pair.other());
    if (a == b) {
      return;
    }
    boolean apart =
        Collections.disjoint(meeting.get(a), meeting.get(b))
            || a == pair.place() && b == pair.other() && ownEnds(a, b, pair.distanceM());
    if (!apart) {
      return;
    }
    if (pair.distanceM() > SAFE * TIE * Math.min(roomM[pair.place()], roomM[pair.other()])) {
      doubts.add(join(pair.place(), corners.at(pair.other()), pair.other()));
      return;
    }
    boolean keepsA = meeting.get(a).size() >= meeting.get(b).size();
    int kept = keepsA ? a : b;
    int other = keepsA ? b : a;
    if (corners.at(kept).distance(corners.at(other)) <= toleranceM) {
      joinedTo[other] = kept;
      meeting.get(kept).addAll(meeting.get(other));
    }
  }

  private void settlePlaces() {
    Map<Integer, List<Integer>> clusters = new TreeMap<>();
    for (int p = 0; p < joinedTo.length; p++) {
      int r = root(p);
      if (r != p) {
        clusters.computeIfAbsent(r, k -> new ArrayList<>(List.of(r))).add(p);
      }
    }
    for (Map.Entry<Integer, List<Integer>> cluster : clusters.entrySet()) {
      Coordinate target = target(cluster.getKey(), cluster.getValue());
      for (int p : cluster.getValue()) {
        if (target.distance(corners.at(p)) > SNAP_M) {
          int other = p == cluster.getKey() ? cluster.getValue().get(1) : cluster.getKey();
          moved[p] = target;
          joins.add(join(p, target, other));
        }
      }
    }
  }

  /**
   * Where places that are joined come to lie: where something fits already; else where the first
   * two loose ends would meet if they went on, so that their lines keep their directions.
   */
  private Coordinate target(int kept, List<Integer> places) {
    if (corners.lines(kept).size() > 1) {
      return corners.at(kept);
    }
    List<Integer> ends = new ArrayList<>();
    for (int p : places) {
      if (!corners.ending(p).isEmpty()) {
        ends.add(p);
      }
    }
    for (int i = 0; i < ends.size(); i++) {
      for (int j = i + 1; j < ends.size(); j++) {
        Coordinate meeting = meeting(ends.get(i), ends.get(j));
        boolean near = meeting != null;
        for (int p : places) {
          near = near && meeting.distance(corners.at(p)) <= toleranceM;
        }
        if (near) {
          return meeting;
        }
      }
    }
    return corners.at(kept);
  }

  /** Where two open lines would meet if they went on beyond their ends; null if nowhere. */
  private Coordinate meeting(int p, int q) {
    double[] u = corners.inward(corners.ending(p).get(0), p);
    double[] v = corners.inward(corners.ending(q).get(0), q);
    double sine = u[0] * v[1] - u[1] * v[0];
    if (Math.abs(sine) < LEAST_SINE) {
      return null;
    }
    Coordinate a = corners.at(p);
    Coordinate b = corners.at(q);
    double t = ((b.x - a.x) * v[1] - (b.y - a.y) * v[0]) / sine;
    return new Coordinate(a.x + t * u[0], a.y + t * u[1]);
  }

  private int root(int place) {
    int r = place;
    while (joinedTo[r] != r) {
      r = joinedTo[r];
    }
    return r;
  }

  private Joined.Join join(int place, Coordinate to, int other) {
    int line = corners.lines(place).iterator().next();
    int otherLine = line;
    for (int l : corners.lines(other)) {
      if (l != line) {
        otherLine = l;
        break;
      }
    }
    return new Joined.Join(line, drawn(corners.at(place)), otherLine, drawn(to));
  }

  private Point drawn(Coordinate local) {
    return new Point(local.x + corners.origin().x(), local.y + corners.origin().y());
  }

  /** Moves places that nearly touch an edge onto it, together with all that is joined there. */
  private void moveOntoEdges() throws TangledLinesException {
    Coordinate[] target = new Coordinate[moved.length];
    for (int p = 0; p < moved.length; p++) {
      int r = root(p);
      if (moved[p] != corners.at(p) || target[r] != null || r != p) {
        continue;
      }
      Near nearest = nearestEdge(p);
      if (nearest == null) {
        continue;
      }
      Coordinate foot = foot(nearest.other(), p);
      int other = corners.from(nearest.other());
      if (nearest.distanceM() > SAFE * TIE * roomM[p]) {
        doubts.add(join(p, foot, other));
        continue;
      }
      target[r] = foot;
      int line = corners.lines(p).iterator().next();
      joins.add(
          new Joined.Join(line, drawn(corners.at(p)), corners.line(nearest.other()), drawn(foot)));
    }
    for (int p = 0; p < moved.length; p++) {
      Coordinate to = target[root(p)];
      if (to != null) {
        moved[p] = to;
      }
    }
  }

  private Near nearestEdge(int place) throws TangledLinesException {
    Near nearest = null;
    for (int e : corners.edgesNear(place)) {
      if (corners.lines(place).contains(corners.line(e))
          || meeting.get(place).contains(corners.line(e))) {
        continue;
      }
      double d = corners.distance(e, place);
      boolean nearer = nearest == null || d < nearest.distanceM();
      if (d > SNAP_M && d <= toleranceM && nearer && foot(e, place) != null) {
        nearest = new Near(d, place, e);
      }
    }
    return nearest;
  }

  /** The foot of a place on an edge as it lies now; null if it falls on or beyond an end. */
  private Coordinate foot(int edge, int place) {
    Coordinate a = moved[corners.from(edge)];
    Coordinate b = moved[corners.to(edge)];
    Coordinate p = moved[place];
    double dx = b.x - a.x;
    double dy = b.y - a.y;
    double length = Math.hypot(dx, dy);
    double t = ((p.x - a.x) * dx + (p.y - a.y) * dy) / (length * length);
    return t * length > SNAP_M && (1 - t) * length > SNAP_M
        ? new Coordinate(a.x + t * dx, a.y + t * dy)
        : null;
  }

  /** Places that touched an edge of which an end has moved go with it. */
  private void follow() throws TangledLinesException {
    if (joins.isEmpty()) {
      return;
    }
    Coordinate[] before = moved.clone();
    for (int p = 0; p < moved.length; p++) {
      if (before[p] != corners.at(p)) {
        continue;
      }
      for (int e : corners.edgesNear(p)) {
        int from = corners.from(e);
        int to = corners.to(e);
        boolean still = before[from] == corners.at(from) && before[to] == corners.at(to);
        if (!still && !corners.ends(e, p) && corners.distance(e, p) <= SNAP_M) {
          Coordinate foot = foot(e, p);
          if (foot != null) {
            moved[p] = foot;
            break;
          }
        }
      }
    }
  }

  private List<DrawnLine> built() {
    List<DrawnLine> built = new ArrayList<>(lines.size());
    for (int l = 0; l < lines.size(); l++) {
      DrawnLine line = lines.get(l);
      List<Point> points = new ArrayList<>();
      boolean changed = false;
      for (int i = 0; i < line.points().size(); i++) {
        int place = corners.placeOf(l, i);
        boolean stays = moved[place] == corners.at(place);
        changed |= !stays;
        Point point = stays ? line.points().get(i) : drawn(moved[place]);
        if (points.isEmpty() || !points.get(points.size() - 1).equals(point)) {
          points.add(point);
        }
      }
      boolean enough = points.size() >= (line.closed() ? 3 : 2);
      built.add(changed && enough ? new DrawnLine(points, line.closed()) : line);
    }
    return built;
  }
}
