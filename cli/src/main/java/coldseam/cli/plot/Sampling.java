package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;

/**
 * Makes linear triangles of a quadratic field, as few as a picture needs: sides are halved only
 * where the field bends so much that a line of equal value would be seen to lie elsewhere.
 *
 * <p>Works in passes. A side is looked at once, in the pass after it came to be; triangles without
 * a new side are done.
 */
final class Sampling {
  /** How wrong the value on a drawn line may be, as a share of the step between two. */
  private static final double SHARE_OF_STEP = 0.004;

  /** Sides shorter than this are left alone, points. */
  private static final double SHORT = 2;

  private static final int MOST_PASSES = 8;

  private final Nodal field;
  private final Mesh mesh;
  private final double pointsPerM;
  private final double displacement;
  private final double leastOff;
  private final LinearPatch patch;
  private int[] active;
  private int[] parents;
  private int count;

  private Sampling(Nodal field, double pointsPerM, double step, double displacement) {
    this.field = field;
    this.mesh = field.mesh();
    this.pointsPerM = pointsPerM;
    this.displacement = displacement;
    leastOff = SHARE_OF_STEP * step;
    patch = new LinearPatch(mesh.vertexCount() * 2, mesh.triangleCount() * 2);
  }

  /**
   * Samples.
   *
   * @param field the values
   * @param window triangles outside it are left out, m
   * @param pointsPerM scale of the picture
   * @param step between two lines
   * @param displacement how far a line may be drawn from its place, points
   */
  static LinearPatch of(
      Nodal field, Box window, double pointsPerM, double step, double displacement) {
    Sampling sampling = new Sampling(field, pointsPerM, step, displacement);
    sampling.start(window);
    for (int pass = 0; sampling.count > 0; pass++) {
      sampling.refine(pass);
    }
    return sampling.patch;
  }

  private void start(Box window) {
    int[] numbers = new int[field.cornerValues()];
    Arrays.fill(numbers, -1);
    active = new int[3 * mesh.triangleCount()];
    parents = new int[mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (!meets(t, window)) {
        continue;
      }
      for (int k = 0; k < 3; k++) {
        int value = field.cornerValue(t, k);
        if (numbers[value] < 0) {
          int v = mesh.vertex(t, k);
          numbers[value] = patch.addVertex(mesh.x(v), mesh.y(v), field.atCorner(t, k));
        }
        active[3 * count + k] = numbers[value];
      }
      parents[count++] = t;
    }
  }

  private boolean meets(int t, Box window) {
    double x0 = mesh.x(mesh.vertex(t, 0));
    double x1 = mesh.x(mesh.vertex(t, 1));
    double x2 = mesh.x(mesh.vertex(t, 2));
    if (x0 < window.x0() && x1 < window.x0() && x2 < window.x0()
        || x0 > window.x1() && x1 > window.x1() && x2 > window.x1()) {
      return false;
    }
    double y0 = mesh.y(mesh.vertex(t, 0));
    double y1 = mesh.y(mesh.vertex(t, 1));
    double y2 = mesh.y(mesh.vertex(t, 2));
    return !(y0 < window.y0() && y1 < window.y0() && y2 < window.y0()
        || y0 > window.y1() && y1 > window.y1() && y2 > window.y1());
  }

  /** Puts away the triangles that need no splitting, and splits the others. */
  private void refine(int pass) {
    SideTable sides = new SideTable(2 * count);
    int[] sideOf = new int[3 * count];
    for (int i = 0; i < 3 * count; i++) {
      int from = i - i % 3;
      sideOf[i] = sides.id(active[from + (i + 1) % 3], active[from + (i + 2) % 3]);
    }
    double[] middles = new double[sides.size()];
    boolean[] split = new boolean[sides.size()];
    if (pass < MOST_PASSES) {
      for (int i = 0; i < 3 * count; i++) {
        if (!split[sideOf[i]]) {
          look(i, pass == 0, sideOf[i], middles, split);
        }
      }
    }
    split(sideOf, split, middles);
  }

  /** Decides whether side k of an active triangle has to be halved; i is three times it plus k. */
  private void look(int i, boolean first, int side, double[] middles, boolean[] split) {
    int from = i - i % 3;
    int a = active[from + (i + 1) % 3];
    int b = active[from + (i + 2) % 3];
    double dx = (patch.x(a) - patch.x(b)) * pointsPerM;
    double dy = (patch.y(a) - patch.y(b)) * pointsPerM;
    if (dx * dx + dy * dy < SHORT * SHORT) {
      return;
    }
    int parent = parents[from / 3];
    double middle;
    if (first) {
      middle = field.atMiddle(parent, i - from);
    } else {
      double x = (patch.x(a) + patch.x(b)) / 2;
      double y = (patch.y(a) + patch.y(b)) / 2;
      middle = field.in(parent, Barycentric.of(mesh, parent, x, y));
    }
    double off = Math.abs(middle - (patch.value(a) + patch.value(b)) / 2);
    if (off > leastOff
        && off * pointsPerM
            > displacement * patch.slope(active[from], active[from + 1], active[from + 2])) {
      split[side] = true;
      middles[side] = middle;
    }
  }

  private void split(int[] sideOf, boolean[] split, double[] middles) {
    int[] middleVertex = new int[split.length];
    Arrays.fill(middleVertex, -1);
    int[] old = active;
    int[] oldParents = parents;
    int oldCount = count;
    active = new int[12 * oldCount];
    parents = new int[4 * oldCount];
    count = 0;
    int[] m = new int[3];
    for (int t = 0; t < oldCount; t++) {
      int from = 3 * t;
      int halved = 0;
      for (int k = 0; k < 3; k++) {
        int side = sideOf[from + k];
        if (split[side]) {
          halved++;
          if (middleVertex[side] < 0) {
            int a = old[from + (k + 1) % 3];
            int b = old[from + (k + 2) % 3];
            middleVertex[side] =
                patch.addVertex(
                    (patch.x(a) + patch.x(b)) / 2, (patch.y(a) + patch.y(b)) / 2, middles[side]);
          }
        }
        m[k] = middleVertex[side];
      }
      if (halved == 0) {
        patch.addTriangle(old[from], old[from + 1], old[from + 2]);
      } else {
        pieces(old, from, m, halved, oldParents[t]);
      }
    }
  }

  /** Makes the two to four pieces of a triangle active; m[k] is the vertex on side k, or −1. */
  private void pieces(int[] old, int from, int[] m, int halved, int parent) {
    int k = 0;
    if (halved == 1) {
      k = m[0] >= 0 ? 0 : m[1] >= 0 ? 1 : 2;
    } else if (halved == 2) {
      k = m[0] < 0 ? 0 : m[1] < 0 ? 1 : 2;
    }
    int apex = old[from + k];
    int a = old[from + (k + 1) % 3];
    int b = old[from + (k + 2) % 3];
    int onA = m[(k + 2) % 3];
    int onB = m[(k + 1) % 3];
    switch (halved) {
      case 1 -> {
        activate(apex, a, m[k], parent);
        activate(apex, m[k], b, parent);
      }
      case 2 -> {
        activate(apex, onA, onB, parent);
        activate(onA, a, b, parent);
        activate(onA, b, onB, parent);
      }
      default -> {
        activate(apex, onA, onB, parent);
        activate(onA, a, m[k], parent);
        activate(onB, m[k], b, parent);
        activate(m[k], onB, onA, parent);
      }
    }
  }

  private void activate(int a, int b, int c, int parent) {
    active[3 * count] = a;
    active[3 * count + 1] = b;
    active[3 * count + 2] = c;
    parents[count++] = parent;
  }
}
