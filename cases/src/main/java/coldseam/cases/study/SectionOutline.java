package coldseam.cases.study;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Conditions;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The outline of a conducting section: straight pieces, each with what it faces, whatever materials
 * meet along it. Two L2D compare only over the same one.
 */
final class SectionOutline {
  /** Sine of the angle below which two pieces are one straight line. */
  private static final double STRAIGHT = 1e-9;

  /** One straight piece, m, and what it faces. */
  private record Piece(String faces, double x0, double y0, double x1, double y1) {
    boolean same(Piece other, double within) {
      return faces.equals(other.faces)
          && (near(x0, y0, other.x0, other.y0, within) && near(x1, y1, other.x1, other.y1, within)
              || near(x0, y0, other.x1, other.y1, within)
                  && near(x1, y1, other.x0, other.y0, within));
    }

    private static boolean near(double ax, double ay, double bx, double by, double within) {
      return Math.hypot(ax - bx, ay - by) <= within;
    }
  }

  private final List<Piece> pieces = new ArrayList<>();

  private SectionOutline() {}

  static SectionOutline of(Result result) {
    SectionOutline outline = new SectionOutline();
    Partition partition = result.heatLoss().partition();
    Conditions conditions = result.heatLoss().conditions();
    Map<String, List<Integer>> edges = new TreeMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      String faces = faces(conditions, edge, result);
      if (!faces.isEmpty()) {
        edges.computeIfAbsent(faces, key -> new ArrayList<>()).add(edge);
      }
    }
    for (Map.Entry<String, List<Integer>> group : edges.entrySet()) {
      outline.join(group.getKey(), group.getValue(), partition);
    }
    return outline;
  }

  private static String faces(Conditions conditions, int edge, Result result) {
    return switch (conditions.kind(edge)) {
      case NONE -> "";
      case FILM, FIXED -> "space " + result.detail().spaces().get(conditions.space(edge)).name();
      case FLOW -> "flow";
      case CUT_OFF, HOLLOW, AXIS -> "no flow";
    };
  }

  /** Joins edges over the vertices where exactly two of them meet in one line. */
  private void join(String faces, List<Integer> edges, Partition partition) {
    Map<Integer, List<Integer>> at = new HashMap<>();
    for (int edge : edges) {
      at.computeIfAbsent(partition.edgeStart(edge), key -> new ArrayList<>()).add(edge);
      at.computeIfAbsent(partition.edgeEnd(edge), key -> new ArrayList<>()).add(edge);
    }
    Map<Integer, Boolean> done = new HashMap<>();
    for (int edge : edges) {
      if (done.put(edge, true) == null) {
        int from = walk(edge, partition.edgeStart(edge), at, done, partition);
        int to = walk(edge, partition.edgeEnd(edge), at, done, partition);
        double x = partition.origin().x();
        double y = partition.origin().y();
        pieces.add(
            new Piece(
                faces,
                x + partition.x(from),
                y + partition.y(from),
                x + partition.x(to),
                y + partition.y(to)));
      }
    }
  }

  private static int walk(
      int start,
      int vertex,
      Map<Integer, List<Integer>> at,
      Map<Integer, Boolean> done,
      Partition partition) {
    int edge = start;
    int end = vertex;
    while (true) {
      List<Integer> meeting = at.get(end);
      if (meeting.size() != 2) {
        return end;
      }
      int next = meeting.get(0) == edge ? meeting.get(1) : meeting.get(0);
      if (!straight(edge, next, partition) || done.put(next, true) != null) {
        return end;
      }
      end = partition.edgeStart(next) == end ? partition.edgeEnd(next) : partition.edgeStart(next);
      edge = next;
    }
  }

  private static boolean straight(int a, int b, Partition partition) {
    double ax = partition.x(partition.edgeEnd(a)) - partition.x(partition.edgeStart(a));
    double ay = partition.y(partition.edgeEnd(a)) - partition.y(partition.edgeStart(a));
    double bx = partition.x(partition.edgeEnd(b)) - partition.x(partition.edgeStart(b));
    double by = partition.y(partition.edgeEnd(b)) - partition.y(partition.edgeStart(b));
    return Math.abs(ax * by - ay * bx) <= STRAIGHT * Math.hypot(ax, ay) * Math.hypot(bx, by);
  }

  /** Whether another is the same line facing the same spaces, to the resolution of drawings. */
  boolean same(SectionOutline other) {
    if (pieces.size() != other.pieces.size()) {
      return false;
    }
    List<Piece> left = new ArrayList<>(other.pieces);
    for (Piece piece : pieces) {
      int found = -1;
      for (int i = 0; i < left.size() && found < 0; i++) {
        if (piece.same(left.get(i), Resolution.STANDARD.closeM())) {
          found = i;
        }
      }
      if (found < 0) {
        return false;
      }
      left.remove(found);
    }
    return true;
  }
}
