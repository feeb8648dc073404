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

  private final BitSet corners;
  private Mesh mesh;

  /**
   * Triangles known to lie at a singular corner when they were made; at first all that touch any
   * corner are taken for such.
   */
  private BitSet singular = new BitSet();

  /** What each triangle would lack now, had the field been smooth in the round that made it. */
  private double[] ifSmooth;

  // of the present round
  private double[] sizes;
  private double[] others;

  /**
   * Starts on a mesh.
   *
   * @param mesh the coarsest mesh
   */
  Marking(Mesh mesh) {
    this.mesh = mesh;
    corners = Corners.of(mesh);
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
    for (int t = 0; ifSmooth != null && t < lacking.length; t++) {
      boolean muchMore = lacking[t] > SINGULAR * ifSmooth[t];
      singular.set(t, muchMore && Corners.touches(corners, mesh, t));
    }
    for (int t = 0; ifSmooth == null && t < lacking.length; t++) {
      singular.set(t, Corners.touches(corners, mesh, t));
    }
    double threshold = threshold(lacking, part);
    sizes = lacking;
    others = excess;
    // what is not split keeps its class: it lacks as much as SINGULAR times this or less
    ifSmooth = new double[lacking.length];
    for (int t = 0; t < lacking.length; t++) {
      ifSmooth[t] = singular.get(t) ? 0 : lacking[t];
    }
    for (int round = 0; round < MOST_ROUNDS; round++) {
      BitSet marked = new BitSet(sizes.length);
      for (int t = 0; t < sizes.length; t++) {
        marked.set(t, sizes[t] >= threshold || others[t] > (round == 0 ? 1 : ENOUGH));
      }
      NewestVertexBisection.Refined next = NewestVertexBisection.refine(mesh, marked);
      if (next.mesh() == mesh) {
        break;
      }
      inherit(next);
    }
    return mesh;
  }

  /** Passes on to the parts what is expected of them. */
  private void inherit(NewestVertexBisection.Refined next) {
    int[] parent = next.parent();
    double[] nextSizes = new double[parent.length];
    double[] nextOthers = new double[parent.length];
    double[] nextIfSmooth = new double[parent.length];
    BitSet nextSingular = new BitSet(parent.length);
    for (int t = 0; t < parent.length; t++) {
      int p = parent[t];
      double share = next.mesh().area(t) / mesh.area(p);
      double kept = share * share * share;
      boolean split = kept < 1;
      nextIfSmooth[t] = split ? sizes[p] * kept : ifSmooth[p];
      if (singular.get(p) && (!split || Corners.touches(corners, next.mesh(), t))) {
        nextSingular.set(t);
        kept = split ? KEPT_AT_CORNERS : 1;
      }
      nextSizes[t] = sizes[p] * kept;
      nextOthers[t] = others[p] * kept;
    }
    mesh = next.mesh();
    sizes = nextSizes;
    others = nextOthers;
    ifSmooth = nextIfSmooth;
    singular = nextSingular;
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
