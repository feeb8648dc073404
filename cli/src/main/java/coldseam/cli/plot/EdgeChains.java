package coldseam.cli.plot;

import coldseam.mesh.partition.Partition;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.IntPredicate;

/** Joins edges of a partition, end to end, to lines as long as neighbours belong together. */
final class EdgeChains {
  /** Whether two edges that follow each other belong to one line. */
  @FunctionalInterface
  interface Together {
    boolean test(int edge, int next);
  }

  /**
   * Edges in order.
   *
   * @param edges of the partition
   * @param line through their vertices
   */
  record Chain(List<Integer> edges, Polyline line) {
    int firstEdge() {
      return edges.get(0);
    }
  }

  private final Partition partition;
  private final IntPredicate asDrawn;
  private final Together together;

  /**
   * Prepares.
   *
   * @param partition the edges
   * @param asDrawn whether an edge is walked from its start to its end, or the other way
   * @param together which neighbours belong together
   */
  EdgeChains(Partition partition, IntPredicate asDrawn, Together together) {
    this.partition = partition;
    this.asDrawn = asDrawn;
    this.together = together;
  }

  List<Chain> of(IntPredicate included) {
    Map<Integer, List<Integer>> leaving = new HashMap<>();
    Map<Integer, List<Integer>> arriving = new HashMap<>();
    List<Integer> all = new ArrayList<>();
    for (int e = 0; e < partition.edgeCount(); e++) {
      if (included.test(e)) {
        all.add(e);
        leaving.computeIfAbsent(start(e), v -> new ArrayList<>(1)).add(e);
        arriving.computeIfAbsent(end(e), v -> new ArrayList<>(1)).add(e);
      }
    }
    boolean[] used = new boolean[partition.edgeCount()];
    List<Chain> chains = new ArrayList<>();
    for (int e : all) {
      boolean begins =
          arriving.getOrDefault(start(e), List.of()).stream()
              .noneMatch(before -> together.test(before, e));
      if (begins && !used[e]) {
        chains.add(follow(e, leaving, used));
      }
    }
    for (int e : all) {
      if (!used[e]) {
        chains.add(follow(e, leaving, used));
      }
    }
    return chains;
  }

  private Chain follow(int first, Map<Integer, List<Integer>> leaving, boolean[] used) {
    List<Integer> edges = new ArrayList<>();
    Polyline.Builder line = new Polyline.Builder();
    int at = first;
    while (true) {
      used[at] = true;
      edges.add(at);
      line.add(partition.x(start(at)), partition.y(start(at)));
      int end = end(at);
      int next = -1;
      for (int candidate : leaving.getOrDefault(end, List.of())) {
        if (!used[candidate] && together.test(at, candidate)) {
          next = candidate;
          break;
        }
      }
      if (next < 0) {
        if (end == start(first) && edges.size() > 2) {
          return new Chain(edges, line.closed());
        }
        return new Chain(edges, line.add(partition.x(end), partition.y(end)).open());
      }
      at = next;
    }
  }

  private int start(int edge) {
    return asDrawn.test(edge) ? partition.edgeStart(edge) : partition.edgeEnd(edge);
  }

  private int end(int edge) {
    return asDrawn.test(edge) ? partition.edgeEnd(edge) : partition.edgeStart(edge);
  }
}
