package coldseam.solver.conduction;

import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import java.util.BitSet;

/**
 * Chooses the triangles to split, and splits them again at once until, by all that can be foreseen,
 * what is lacking is down to what is wanted and shared out evenly. Where the field is smooth, what
 * a triangle lacks falls with the cube of its area; where it runs like r^α, with r^2α at the corner
 * and hardly beside it. Towards a corner only the sides that meet there are halved, so that each
 * halving of the distance costs two triangles for each that touches it.
 */
final class Marking {
  /** No triangle is split in more than this many rounds at once. */
  private static final int MOST_ROUNDS = 16;

  /** What a triangle lacks over what each half lacks when it is bisected, in a smooth field. */
  private static final double BY_BISECTION = 8;

  /** What the halves lack together over what the whole lacked. */
  private static final double LEFT_BY_BISECTION = 0.25;

  /** The part of a triangle's size at a corner that is left beside it, with the threshold's. */
  private static final double BESIDE_CORNERS = 0.1;

  /** By so much more than α the power is with which temperature errors fall (measured). */
  private static final double TEMPERATURES_SETTLE = 0.2;

  /** Excess that later rounds aim at. */
  private static final double ENOUGH = 0.8;

  /** The threshold is sought down to this part of the largest size, in so many halvings. */
  private static final double LEAST_THRESHOLD = 1e-12;

  private static final int HALVINGS = 20;

  private final Corners corners;
  private Mesh mesh;

  // of the present round
  private double[] sizes;
  private double[] others;

  /**
   * Starts on a mesh.
   *
   * @param mesh the mesh to start with
   * @param corners the corners of the drawing
   */
  Marking(Mesh mesh, Corners corners) {
    this.mesh = mesh;
    this.corners = corners;
  }

  /**
   * Refines.
   *
   * @param lacking what each triangle lacks, in a unit that stays the same from pass to pass
   * @param part the part of the sum that may be left, 1 or more for all of it
   * @param excess of each triangle, square of another error over its limit
   * @return the finer mesh, or the same if nothing could be split
   */
  Mesh refine(double[] lacking, double part, double[] excess) {
    sizes = lacking;
    others = excess;
    double threshold = part < 1 ? threshold(part) : Double.POSITIVE_INFINITY;
    for (int round = 0; round < MOST_ROUNDS; round++) {
      NewestVertexBisection.Refined next =
          NewestVertexBisection.refineSides(mesh, toHalve(threshold, round == 0 ? 1 : ENOUGH));
      if (next.mesh() == mesh) {
        break;
      }
      inherit(next);
    }
    return mesh;
  }

  /** The sides to halve in a round, 3t + k. */
  private BitSet toHalve(double threshold, double limit) {
    BitSet sides = new BitSet(3 * sizes.length);
    for (int t = 0; t < sizes.length; t++) {
      boolean over = others[t] > limit;
      if (!over && !(sizes[t] > threshold)) {
        continue;
      }
      int corner = corners.in(mesh, t);
      if (corner >= 0) {
        sides.set(3 * t + (corner + 1) % 3);
        sides.set(3 * t + (corner + 2) % 3);
      } else if (over || sizes[t] > BY_BISECTION * threshold) {
        sides.set(3 * t, 3 * t + 3);
      } else {
        sides.set(3 * t);
      }
    }
    return sides;
  }

  /** Passes on to the parts what is expected of them. */
  private void inherit(NewestVertexBisection.Refined next) {
    int[] parent = next.parent();
    double[] nextSizes = new double[parent.length];
    double[] nextOthers = new double[parent.length];
    for (int t = 0; t < parent.length; t++) {
      int p = parent[t];
      double share = next.mesh().area(t) / mesh.area(p);
      double kept = share * share * share;
      double keptOfOthers = kept;
      int corner = kept < 1 ? corners.in(next.mesh(), t) : -1;
      if (corner >= 0) {
        double exponent = corners.exponent(next.mesh(), t, corner);
        keptOfOthers = Math.max(kept, Math.pow(share, exponent + TEMPERATURES_SETTLE));
        double narrowed = narrowed(next.mesh(), t, corner, p, exponent);
        kept = Math.max(kept, Math.pow(share, exponent) * narrowed);
      }
      nextSizes[t] = sizes[p] * kept;
      nextOthers[t] = others[p] * keptOfOthers;
    }
    mesh = next.mesh();
    sizes = nextSizes;
    others = nextOthers;
  }

  /** What r^2α times the angle φ is more than its area's power α tells: (φ/φ')^(1−α). */
  private double narrowed(Mesh finer, int t, int corner, int parent, double exponent) {
    int v = finer.vertex(t, corner);
    for (int k = 0; k < 3; k++) {
      if (mesh.vertex(parent, k) == v && exponent < 1) {
        double ratio = Corners.angle(finer, t, corner) / Corners.angle(mesh, parent, k);
        return ratio < 1 ? Math.pow(ratio, 1 - exponent) : 1;
      }
    }
    return 1;
  }

  /** The size above which splitting is expected to leave a part of the sum. */
  private double threshold(double part) {
    double total = 0;
    double largest = 0;
    double[] keptAtCorner = new double[sizes.length];
    for (int t = 0; t < sizes.length; t++) {
      total += sizes[t];
      largest = Math.max(largest, sizes[t]);
      int corner = corners.in(mesh, t);
      keptAtCorner[t] = corner < 0 ? 0 : Math.pow(0.25, corners.exponent(mesh, t, corner));
    }
    double low = Math.log(LEAST_THRESHOLD);
    double high = 0;
    for (int i = 0; i < HALVINGS; i++) {
      double middle = 0.5 * (low + high);
      double left = 0;
      for (int t = 0; t < sizes.length; t++) {
        left += left(sizes[t], keptAtCorner[t], largest * Math.exp(middle));
      }
      if (left > part * total) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return largest * Math.exp(low);
  }

  /** What is left of a triangle's size when its parts are split down to a threshold. */
  private static double left(double size, double keptAtCorner, double threshold) {
    if (size <= threshold) {
      return size;
    }
    double times = Math.log(size / threshold);
    if (keptAtCorner == 0) {
      return size * Math.pow(LEFT_BY_BISECTION, Math.ceil(times / Math.log(BY_BISECTION)));
    }
    double atCorner = size * Math.pow(keptAtCorner, Math.ceil(times / -Math.log(keptAtCorner)));
    double beside = BESIDE_CORNERS * Math.cbrt(size * threshold * threshold);
    return Math.min(size, atCorner + beside);
  }
}
