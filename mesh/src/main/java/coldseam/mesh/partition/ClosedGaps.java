package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.List;

/**
 * Gathers the moves that closed gaps. Moves between the same two labels along the same edges are
 * one gap, in whichever turn they were made.
 */
final class ClosedGaps {
  /** One gap that was closed: its middle, largest width and what lay on its sides. */
  record Gap(double x, double y, double widthM, List<Integer> labels) {}

  /** One vertex moved across a gap, and the two edges (x, y, x, y) that faced each other there. */
  private record Move(double x, double y, double widthM, double[] edges, int label, int other) {
    boolean sameSides(Move move) {
      return Math.min(label, other) == Math.min(move.label, move.other)
          && Math.max(label, other) == Math.max(move.label, move.other);
    }

    boolean isBeside(Move move, double distanceM) {
      return edgeDistance(move, 0) <= distanceM || edgeDistance(move, 4) <= distanceM;
    }

    private double edgeDistance(Move move, int k) {
      double[] e = move.edges;
      return Segments.distance(x, y, e[k], e[k + 1], e[k + 2], e[k + 3]);
    }
  }

  private final double closeM;
  private final List<Move> moves = new ArrayList<>();

  ClosedGaps(double closeM) {
    this.closeM = closeM;
  }

  /** Notes a move across a gap between two edges of the linework. */
  void add(Linework linework, int vertex, int edge, int otherEdge, double widthM, int[] labels) {
    double[] edges = new double[8];
    int k = 0;
    for (int e : new int[] {edge, otherEdge}) {
      edges[k++] = linework.x[linework.start[e]];
      edges[k++] = linework.y[linework.start[e]];
      edges[k++] = linework.x[linework.end[e]];
      edges[k++] = linework.y[linework.end[e]];
    }
    moves.add(
        new Move(linework.x[vertex], linework.y[vertex], widthM, edges, labels[0], labels[1]));
  }

  /** The gaps, in the order in which their first vertex was moved. */
  List<Gap> gaps() {
    DisjointSets sets = new DisjointSets(moves.size());
    for (int i = 0; i < moves.size(); i++) {
      for (int j = i + 1; j < moves.size(); j++) {
        Move a = moves.get(i);
        Move b = moves.get(j);
        // Edges of another turn may have moved by the closing length themselves.
        if (a.sameSides(b) && (a.isBeside(b, 2 * closeM) || b.isBeside(a, 2 * closeM))) {
          sets.unite(i, j);
        }
      }
    }
    List<Gap> gaps = new ArrayList<>();
    for (int i = 0; i < moves.size(); i++) {
      if (sets.find(i) == i) {
        gaps.add(gather(i, sets));
      }
    }
    return gaps;
  }

  private Gap gather(int set, DisjointSets sets) {
    double sumX = 0;
    double sumY = 0;
    double width = 0;
    int count = 0;
    LabelSet sides = new LabelSet();
    for (int i = set; i < moves.size(); i++) {
      if (sets.find(i) == set) {
        Move move = moves.get(i);
        sumX += move.x;
        sumY += move.y;
        width = Math.max(width, move.widthM);
        count++;
        sides.add(move.label);
        sides.add(move.other);
      }
    }
    return new Gap(sumX / count, sumY / count, width, sides.ascending());
  }
}
