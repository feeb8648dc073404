package coldseam.solver.conduction;

import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;
import java.util.BitSet;

/**
 * Chooses the triangles to split: bulk marking (Dörfler 1996), and all that exceed a limit of their
 * own. A triangle far above the threshold is split in several rounds at once: in a smooth field
 * what a triangle lacks falls with the cube of its area, at a singular corner by far less.
 */
final class Marking {
  /** No triangle is split in more than this many rounds at once. */
  private static final int MOST_ROUNDS = 8;

  /** What a part that still touches a singular corner keeps. */
  private static final double KEPT_AT_CORNERS = 0.4;

  /** Lacking more than this many times what a smooth field would tells a singular corner. */
  private static final double SINGULAR = 8;

  /** Excess that later rounds aim at. */
  private static final double ENOUGH = 0.5;

  private Mesh mesh;
  private BitSet corners;
  private double[] expected;

  /**
   * Starts on a mesh.
   *
   * @param mesh the coarsest mesh
   */
  Marking(Mesh mesh) {
    this.mesh = mesh;
    corners = corners(mesh);
  }

  /**
   * Refines.
   *
   * @param lacking what each triangle lacks, in a unit that stays the same from pass to pass
   * @param part the part of the sum that the triangles to be split have to hold
   * @param excess of each triangle, square of another error over its limit
   * @return the finer mesh, or the same if nothing could be split
   */
  Mesh refine(double[] lacking, double part, double[] excess) {
    BitSet singular = new BitSet(lacking.length);
    for (int t = 0; t < lacking.length; t++) {
      singular.set(t, expected != null && lacking[t] > SINGULAR * expected[t]);
    }
    double threshold = threshold(lacking, part);
    double[] sizes = lacking;
    double[] others = excess;
    for (int round = 0; round < MOST_ROUNDS; round++) {
      BitSet marked = new BitSet(sizes.length);
      for (int t = 0; t < sizes.length; t++) {
        marked.set(t, sizes[t] >= threshold || others[t] > (round == 0 ? 1 : ENOUGH));
      }
      NewestVertexBisection.Refined next = NewestVertexBisection.refine(mesh, marked);
      if (next.mesh() == mesh) {
        break;
      }
      int[] parent = next.parent();
      double[] nextSizes = new double[parent.length];
      double[] nextOthers = new double[parent.length];
      BitSet nextSingular = new BitSet(parent.length);
      for (int t = 0; t < parent.length; t++) {
        int p = parent[t];
        double kept = Math.pow(next.mesh().area(t) / mesh.area(p), 3);
        if (kept < 1 && singular.get(p) && touchesCorner(next.mesh(), t)) {
          kept = KEPT_AT_CORNERS;
          nextSingular.set(t);
        }
        nextSizes[t] = sizes[p] * kept;
        nextOthers[t] = others[p] * kept;
      }
      mesh = next.mesh();
      sizes = nextSizes;
      others = nextOthers;
      singular = nextSingular;
    }
    expected = sizes;
    return mesh;
  }

  private boolean touchesCorner(Mesh finer, int t) {
    return corners.get(finer.vertex(t, 0))
        || corners.get(finer.vertex(t, 1))
        || corners.get(finer.vertex(t, 2));
  }

  /** The vertices where different edges of the partition meet. */
  private static BitSet corners(Mesh mesh) {
    int[] edge = new int[mesh.vertexCount()];
    Arrays.fill(edge, Mesh.NONE);
    BitSet corners = new BitSet(edge.length);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int own = mesh.partitionEdge(t, k);
        if (own == Mesh.NONE) {
          continue;
        }
        for (int end = 1; end <= 2; end++) {
          int v = mesh.vertex(t, (k + end) % 3);
          if (edge[v] == Mesh.NONE) {
            edge[v] = own;
          } else if (edge[v] != own) {
            corners.set(v);
          }
        }
      }
    }
    return corners;
  }

  /** The size from which on triangles together hold the part asked for. */
  private static double threshold(double[] indicator, double part) {
    double[] sorted = indicator.clone();
    Arrays.sort(sorted);
    double total = 0;
    for (double v : sorted) {
      total += v;
    }
    double held = 0;
    int at = sorted.length;
    while (at > 0 && held < part * total) {
      held += sorted[--at];
    }
    return at < sorted.length ? sorted[at] : Double.POSITIVE_INFINITY;
  }
}
