package coldseam.solver.air;

import coldseam.mesh.partition.Partition;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.VentilatedAir;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** What the pieces of air of a partition border on, and the openings in their rims. */
final class Rims {
  private static final int NONE = -1;

  private final Detail detail;
  private final Partition partition;
  private final List<Fill> fills;
  private final int[] pieceOfLabel;
  private final List<List<Integer>> edges = new ArrayList<>();

  /**
   * Walks the edges.
   *
   * @param detail a detail in which every piece is a fill of its own
   * @param partition its partition
   * @param pieceOfLabel the piece of each label, or −1
   * @param pieces how many pieces there are
   */
  Rims(Detail detail, Partition partition, int[] pieceOfLabel, int pieces) {
    this.detail = detail;
    this.partition = partition;
    this.pieceOfLabel = pieceOfLabel.clone();
    fills = detail.fills();
    for (int p = 0; p < pieces; p++) {
      edges.add(new ArrayList<>());
    }
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      int left = piece(partition.leftLabel(edge));
      int right = piece(partition.rightLabel(edge));
      if (left != right) {
        if (left != NONE) {
          edges.get(left).add(edge);
        }
        if (right != NONE) {
          edges.get(right).add(edge);
        }
      }
    }
  }

  private int piece(int label) {
    return label == Partition.NONE ? NONE : pieceOfLabel[label];
  }

  Partition partition() {
    return partition;
  }

  /** The edges of a piece's rim. */
  List<Integer> edges(int piece) {
    return edges.get(piece);
  }

  /** Whether a piece lies to the left of an edge of its rim. */
  boolean onLeft(int piece, int edge) {
    return piece(partition.leftLabel(edge)) == piece;
  }

  /** The label on the far side of an edge of a piece's rim, or NONE. */
  int farLabel(int piece, int edge) {
    return onLeft(piece, edge) ? partition.rightLabel(edge) : partition.leftLabel(edge);
  }

  /** The piece on the far side, or −1. */
  int farPiece(int piece, int edge) {
    return piece(farLabel(piece, edge));
  }

  /** The fill on the far side, or null. */
  Fill farFill(int piece, int edge) {
    int label = farLabel(piece, edge);
    return label == Partition.NONE ? null : fills.get(label);
  }

  /** Index of the space that an edge of a rim opens to, or −1: laid there, or by a stretch. */
  int space(int piece, int edge) {
    Fill far = farFill(piece, edge);
    int space = NONE;
    if (far instanceof Space laid) {
      space = detail.spaceIndex(laid.name());
    } else if (far instanceof VentilatedAir air) {
      space = detail.spaceIndex(air.space());
    } else if (far != null && !(far instanceof Hollow)) {
      return NONE;
    }
    for (int line : partition.linesOn(edge)) {
      if (line < detail.stretches().size()
          && detail.stretches().get(line).condition().isPresent()) {
        EdgeCondition condition = detail.stretches().get(line).condition().get();
        space =
            condition instanceof EdgeCondition.Faces faces
                ? detail.spaceIndex(faces.space())
                : NONE;
      }
    }
    return space;
  }

  /**
   * An opening.
   *
   * @param space index of the space behind it
   * @param widthM from end to end, or all around where it has no ends, m
   */
  record Opening(int space, double widthM) {}

  /**
   * The openings in a piece's rim.
   *
   * @param piece the piece
   * @param spaceOfPiece index of the space that each piece belongs to, or −1
   */
  List<Opening> openings(int piece, int[] spaceOfPiece) {
    Map<Integer, List<Integer>> bySpace = new TreeMap<>();
    for (int edge : edges.get(piece)) {
      int other = farPiece(piece, edge);
      int space = other == NONE ? space(piece, edge) : spaceOfPiece[other];
      if (space != NONE) {
        bySpace.computeIfAbsent(space, s -> new ArrayList<>()).add(edge);
      }
    }
    List<Opening> openings = new ArrayList<>();
    for (Map.Entry<Integer, List<Integer>> of : bySpace.entrySet()) {
      runs(of.getValue(), of.getKey(), openings);
    }
    return openings;
  }

  /** Joins edges that share vertices and measures each run. */
  private void runs(List<Integer> of, int space, List<Opening> openings) {
    boolean[] taken = new boolean[of.size()];
    for (int i = 0; i < taken.length; i++) {
      if (taken[i]) {
        continue;
      }
      Map<Integer, Integer> times = new TreeMap<>();
      double length = 0;
      List<Integer> queue = new ArrayList<>();
      queue.add(i);
      taken[i] = true;
      for (int at = 0; at < queue.size(); at++) {
        int edge = of.get(queue.get(at));
        length += partition.edgeLength(edge);
        times.merge(partition.edgeStart(edge), 1, Integer::sum);
        times.merge(partition.edgeEnd(edge), 1, Integer::sum);
        for (int j = 0; j < taken.length; j++) {
          if (!taken[j] && joined(edge, of.get(j))) {
            taken[j] = true;
            queue.add(j);
          }
        }
      }
      openings.add(new Opening(space, widthOf(times, length)));
    }
  }

  private boolean joined(int a, int b) {
    int start = partition.edgeStart(a);
    int end = partition.edgeEnd(a);
    return start == partition.edgeStart(b)
        || start == partition.edgeEnd(b)
        || end == partition.edgeStart(b)
        || end == partition.edgeEnd(b);
  }

  private double widthOf(Map<Integer, Integer> times, double length) {
    int[] ends = new int[2];
    int n = 0;
    for (Map.Entry<Integer, Integer> vertex : times.entrySet()) {
      if (vertex.getValue() % 2 == 1) {
        if (n < 2) {
          ends[n] = vertex.getKey();
        }
        n++;
      }
    }
    return n == 2
        ? Math.hypot(
            partition.x(ends[1]) - partition.x(ends[0]),
            partition.y(ends[1]) - partition.y(ends[0]))
        : length;
  }

  /** Labels of the pieces of a partition. */
  static int[] pieceOfLabel(Detail detail, List<String> names) {
    List<Fill> fills = detail.fills();
    int[] piece = new int[fills.size()];
    Arrays.fill(piece, NONE);
    for (int label = 0; label < piece.length; label++) {
      piece[label] = names.indexOf(fills.get(label).name());
    }
    return piece;
  }
}
