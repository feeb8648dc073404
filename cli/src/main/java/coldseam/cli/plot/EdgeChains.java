package coldseam.cli.plot;

import coldseam.mesh.partition.Partition;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Joins edges of a partition, end to end, to lines as long as neighbours belong together. */
final class EdgeChains {
  /** What is joined. */
  interface Rule {
    /** Whether an edge belongs to any line. */
    boolean included(int edge);

    /** Whether two edges that follow each other belong to one line. */
    boolean together(int edge, int next);

    /** Whether an edge is walked from its start to its end, or the other way. */
    boolean asDrawn(int edge);
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
  private final Rule rule;

  private EdgeChains(Partition partition, Rule rule) {
    this.partition = partition;
    this.rule = rule;
  }

  static List<Chain> of(Partition partition, Rule rule) {
    return new EdgeChains(partition, rule).chains();
  }

  private List<Chain> chains() {
    Map<Integer, List<Integer>> leaving = new HashMap<>();
    Map<Integer, List<Integer>> arriving = new HashMap<>();
    List<Integer> all = new ArrayList<>();
    for (int e = 0; e < partition.edgeCount(); e++) {
      if (rule.included(e)) {
        all.add(e);
        add(leaving, start(e), e);
        add(arriving, end(e), e);
      }
    }
    boolean[] used = new boolean[partition.edgeCount()];
    List<Chain> chains = new ArrayList<>();
    for (int e : all) {
      if (!used[e] && begins(e, arriving)) {
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

  private static void add(Map<Integer, List<Integer>> edgesAt, int vertex, int edge) {
    List<Integer> edges = edgesAt.get(vertex);
    if (edges == null) {
      edges = new ArrayList<>(1);
      edgesAt.put(vertex, edges);
    }
    edges.add(edge);
  }

  /** Whether an edge belongs together with none before it. */
  private boolean begins(int edge, Map<Integer, List<Integer>> arriving) {
    for (int before : arriving.getOrDefault(start(edge), List.of())) {
      if (rule.together(before, edge)) {
        return false;
      }
    }
    return true;
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
        if (!used[candidate] && rule.together(at, candidate)) {
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
    return rule.asDrawn(edge) ? partition.edgeStart(edge) : partition.edgeEnd(edge);
  }

  private int end(int edge) {
    return rule.asDrawn(edge) ? partition.edgeEnd(edge) : partition.edgeStart(edge);
  }
}
