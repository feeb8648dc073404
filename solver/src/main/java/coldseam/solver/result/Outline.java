package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Conditions.Kind;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** The outline of the conducting section, walked with the section on the left. */
final class Outline {
  /** How far a vertex may lie off a straight line, as a part of the line's length. */
  static final double IN_LINE = 1e-6;

  /** Places from left to right, then upwards. */
  static final Comparator<Point> LEFT_TO_RIGHT = new LeftToRight();

  private static final class LeftToRight implements Comparator<Point> {
    @Override
    public int compare(Point a, Point b) {
      int across = Double.compare(a.x(), b.x());
      return across != 0 ? across : Double.compare(a.y(), b.y());
    }
  }

  private final Partition partition;
  private final Conditions conditions;
  private final List<List<Integer>> incident;

  Outline(Partition partition, Conditions conditions) {
    this.partition = partition;
    this.conditions = conditions;
    incident = new ArrayList<>(partition.vertexCount());
    for (int vertex = 0; vertex < partition.vertexCount(); vertex++) {
      incident.add(new ArrayList<>(2));
    }
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      incident.get(partition.edgeStart(edge)).add(edge);
      incident.get(partition.edgeEnd(edge)).add(edge);
    }
  }

  Partition partition() {
    return partition;
  }

  Conditions conditions() {
    return conditions;
  }

  boolean contains(int edge) {
    return conditions.kind(edge) != Kind.NONE;
  }

  private boolean conductsLeft(int edge) {
    return conditions.conducts(partition.leftLabel(edge));
  }

  /** The vertex an outline edge starts from. */
  int start(int edge) {
    return conductsLeft(edge) ? partition.edgeStart(edge) : partition.edgeEnd(edge);
  }

  /** The vertex an outline edge ends at. */
  int end(int edge) {
    return conductsLeft(edge) ? partition.edgeEnd(edge) : partition.edgeStart(edge);
  }

  /** Label of the conducting side of an outline edge. */
  int label(int edge) {
    return conductsLeft(edge) ? partition.leftLabel(edge) : partition.rightLabel(edge);
  }

  /** The outline edge that follows within the same fan of the section. */
  int next(int edge) {
    int vertex = end(edge);
    return turning(edge, vertex, start(edge), true);
  }

  /** The outline edge that comes before within the same fan of the section. */
  int previous(int edge) {
    int vertex = start(edge);
    return turning(edge, vertex, end(edge), false);
  }

  /**
   * Of the outline edges that leave (or arrive at) a vertex, the one reached first when turning
   * through the section from the given edge: clockwise from an arriving edge, counter-clockwise
   * from a leaving one.
   */
  private int turning(int edge, int vertex, int far, boolean clockwise) {
    double from = angle(vertex, far);
    int best = -1;
    double least = Double.POSITIVE_INFINITY;
    for (int candidate : incident.get(vertex)) {
      if (candidate == edge || !contains(candidate)) {
        continue;
      }
      if ((clockwise ? start(candidate) : end(candidate)) != vertex) {
        continue;
      }
      double to = angle(vertex, clockwise ? end(candidate) : start(candidate));
      double turn = clockwise ? from - to : to - from;
      turn = turn <= 0 ? turn + 2 * Math.PI : turn;
      if (turn < least) {
        least = turn;
        best = candidate;
      }
    }
    return best;
  }

  private double angle(int vertex, int to) {
    return Math.atan2(partition.y(to) - partition.y(vertex), partition.x(to) - partition.x(vertex));
  }

  /** Edges between two different conducting fills that end at a vertex. */
  List<Integer> interfaces(int vertex) {
    List<Integer> edges = new ArrayList<>();
    for (int edge : incident.get(vertex)) {
      if (conditions.conducts(partition.leftLabel(edge))
          && conditions.conducts(partition.rightLabel(edge))
          && partition.leftLabel(edge) != partition.rightLabel(edge)) {
        edges.add(edge);
      }
    }
    return edges;
  }

  /** The other vertex of an edge. */
  int other(int edge, int vertex) {
    return partition.edgeStart(edge) == vertex
        ? partition.edgeEnd(edge)
        : partition.edgeStart(edge);
  }

  /** A vertex in the coordinates of the drawing. */
  Point point(int vertex) {
    return new Point(
        partition.origin().x() + partition.x(vertex), partition.origin().y() + partition.y(vertex));
  }

  /** Unit vector from one vertex to another. */
  Direction direction(int from, int to) {
    return Direction.of(partition.x(to) - partition.x(from), partition.y(to) - partition.y(from));
  }

  /** Distance between two vertices, m. */
  double distance(int a, int b) {
    return Math.hypot(partition.x(b) - partition.x(a), partition.y(b) - partition.y(a));
  }

  /** Signed distance of a vertex along a direction from another vertex, m. */
  double along(Direction direction, int from, int vertex) {
    return direction.dot(
        partition.x(vertex) - partition.x(from), partition.y(vertex) - partition.y(from));
  }

  /** Signed distance of a vertex to the left of a line through another vertex, m. */
  double across(Direction direction, int from, int vertex) {
    return direction.cross(
        partition.x(vertex) - partition.x(from), partition.y(vertex) - partition.y(from));
  }

  /** Offset below which points lie on one line, for a line of a given length, m. */
  static double offset(double lengthM) {
    return Math.max(2 * Resolution.STANDARD.closeM(), IN_LINE * lengthM);
  }

  /**
   * Walks straight on along edges that face one space.
   *
   * @param first the edge to begin with
   * @param forward whether to walk with the section on the left, else against it
   * @return the walk
   */
  FaceWalk walk(int first, boolean forward) {
    int from = forward ? start(first) : end(first);
    int to = forward ? end(first) : start(first);
    int edge = step(first, forward);
    while (edge >= 0 && edge != first && faces(edge, first)) {
      int candidate = forward ? end(edge) : start(edge);
      Direction line = direction(from, candidate);
      if (!(line.dot(direction(to, candidate)) > 0)
          || Math.abs(across(line, from, to)) > offset(distance(from, candidate))) {
        break;
      }
      to = candidate;
      edge = step(edge, forward);
    }
    return new FaceWalk(
        from, to, distance(from, to), direction(from, to), edge, conditions.space(first), forward);
  }

  /** Follows edges that face one space, round corners too, to where they end. */
  FaceEnd follow(FaceWalk walk) {
    int guard = partition.edgeCount();
    int stop = walk.stop();
    int runStart = walk.from();
    int at = walk.to();
    Direction run = walk.direction();
    while (stop >= 0 && conditions.space(stop) == walk.space() && guard-- > 0) {
      FaceWalk following = walk(stop, walk.forward());
      runStart = following.from();
      at = following.to();
      run = following.direction();
      stop = following.stop();
    }
    return new FaceEnd(stop, runStart, at, run);
  }

  private int step(int edge, boolean forward) {
    return forward ? next(edge) : previous(edge);
  }

  private boolean faces(int edge, int first) {
    return conditions.space(edge) == conditions.space(first);
  }
}
