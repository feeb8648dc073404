package coldseam.solver.conduction;

import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;
import java.util.BitSet;

/** Chooses the triangles to split: bulk marking (Dörfler 1996). */
final class Marking {
  /** A smooth field's indicator falls by this factor from a triangle to one of its four parts. */
  private static final double FALL_OF_PARTS = 64;

  /** No triangle is split in more than this many rounds at once. */
  private static final int MOST_ROUNDS = 3;

  private Marking() {}

  /**
   * Refines.
   *
   * @param mesh the mesh
   * @param indicator what each triangle lacks
   * @param part the part of the sum that the triangles to be split have to hold
   * @param others triangles to be split besides
   * @return the finer mesh, or the same if nothing could be split
   */
  static Mesh refine(Mesh mesh, double[] indicator, double part, BitSet others) {
    double threshold = threshold(indicator, part);
    double[] sizes = indicator;
    BitSet marked = (BitSet) others.clone();
    for (int t = 0; t < sizes.length; t++) {
      if (sizes[t] >= threshold) {
        marked.set(t);
      }
    }
    Mesh refined = mesh;
    for (int round = 0; round < MOST_ROUNDS && !marked.isEmpty(); round++) {
      NewestVertexBisection.Refined next = NewestVertexBisection.refine(refined, marked);
      if (next.mesh() == refined) {
        return refined;
      }
      int[] parent = next.parent();
      double[] expected = new double[parent.length];
      BitSet again = new BitSet(parent.length);
      for (int t = 0; t < parent.length; t++) {
        expected[t] = sizes[parent[t]] / FALL_OF_PARTS;
        if (marked.get(parent[t]) && expected[t] >= threshold) {
          again.set(t);
        }
      }
      refined = next.mesh();
      sizes = expected;
      marked = again;
    }
    return refined;
  }

  /** The size from which on triangles together hold the part asked for. */
  private static double threshold(double[] indicator, double part) {
    double[] sorted = indicator.clone();
    Arrays.sort(sorted);
    double total = 0;
    for (double v : sorted) {
      total += v;
    }
    if (!(total > 0)) {
      return Double.POSITIVE_INFINITY;
    }
    double held = 0;
    int at = sorted.length;
    while (at > 0 && held < part * total) {
      held += sorted[--at];
    }
    return at < sorted.length ? sorted[at] : Double.POSITIVE_INFINITY;
  }
}
