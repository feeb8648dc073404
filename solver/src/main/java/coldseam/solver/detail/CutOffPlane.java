package coldseam.solver.detail;

import java.util.List;

/**
 * A straight, connected run of cut-off edges of a partition, walked with the conducting section on
 * the left.
 *
 * @param vertices partition vertices in order, one more than edges
 * @param edges partition edges in order
 * @param symmetry whether the case marks it as a plane of symmetry
 * @param stated whether the case states it; otherwise the drawing just ends there
 * @param lengthM its length, m
 */
public record CutOffPlane(
    List<Integer> vertices, List<Integer> edges, boolean symmetry, boolean stated, double lengthM) {
  /** Copies the lists. */
  public CutOffPlane {
    vertices = List.copyOf(vertices);
    edges = List.copyOf(edges);
  }

  /** The vertex it starts from. */
  public int first() {
    return vertices.get(0);
  }

  /** The vertex it ends at. */
  public int last() {
    return vertices.get(vertices.size() - 1);
  }
}
