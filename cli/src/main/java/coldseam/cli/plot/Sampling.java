package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;

/**
 * Makes linear triangles of a quadratic field, as few as a picture needs: sides are halved only
 * where the field bends so much that a line of equal value would be seen to lie elsewhere.
 */
final class Sampling {
  /** How far a line may be drawn from its place, points. */
  private static final double DISPLACEMENT = 0.15;

  /** How wrong the value on a drawn line may be, as a share of the step between two. */
  private static final double SHARE_OF_STEP = 0.004;

  /** Sides shorter than this are left alone, points. */
  private static final double SHORT = 1.5;

  private static final int MOST_PASSES = 8;

  private final Nodal field;
  private final Mesh mesh;
  private final double pointsPerM;
  private final double step;
  private LinearPatch patch;
  private int[] parents;

  private Sampling(Nodal field, double pointsPerM, double step) {
    this.field = field;
    this.mesh = field.mesh();
    this.pointsPerM = pointsPerM;
    this.step = step;
  }

  /**
   * Samples.
   *
   * @param field the values
   * @param window triangles outside it are left out, m
   * @param pointsPerM scale of the picture
   * @param step between two lines
   */
  static LinearPatch of(Nodal field, Box window, double pointsPerM, double step) {
    Sampling sampling = new Sampling(field, pointsPerM, step);
    sampling.start(window);
    for (int pass = 0; pass < MOST_PASSES && sampling.refine(); pass++) {
      continue;
    }
    return sampling.patch;
  }

  private void start(Box window) {
    int[] numbers = new int[field.cornerValues()];
    Arrays.fill(numbers, -1);
    patch = new LinearPatch(mesh.vertexCount() * 2, mesh.triangleCount() * 2);
    parents = new int[mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      Box box = Box.EMPTY;
      for (int k = 0; k < 3; k++) {
        box = box.with(mesh.x(mesh.vertex(t, k)), mesh.y(mesh.vertex(t, k)));
      }
      if (!box.meets(window)) {
        continue;
      }
      for (int k = 0; k < 3; k++) {
        int value = field.cornerValue(t, k);
        if (numbers[value] < 0) {
          int v = mesh.vertex(t, k);
          numbers[value] = patch.addVertex(mesh.x(v), mesh.y(v), field.atCorner(t, k));
        }
      }
      parents[patch.triangles()] = t;
      patch.addTriangle(
          numbers[field.cornerValue(t, 0)],
          numbers[field.cornerValue(t, 1)],
          numbers[field.cornerValue(t, 2)]);
    }
  }

  /** One pass; false if nothing had to be split. */
  private boolean refine() {
    int n = patch.triangles();
    SideTable sides = new SideTable(2 * n);
    int[] sideOf = new int[3 * n];
    for (int t = 0; t < n; t++) {
      for (int k = 0; k < 3; k++) {
        sideOf[3 * t + k] = sides.id(patch.corner(t, (k + 1) % 3), patch.corner(t, (k + 2) % 3));
      }
    }
    double[] middles = new double[sides.size()];
    Arrays.fill(middles, Double.NaN);
    boolean[] split = new boolean[sides.size()];
    boolean any = false;
    for (int t = 0; t < n; t++) {
      double slope = patch.slope(t);
      for (int k = 0; k < 3; k++) {
        int side = sideOf[3 * t + k];
        if (Double.isNaN(middles[side])) {
          middles[side] = middle(t, k);
        }
        if (!split[side] && bent(t, k, middles[side], slope)) {
          split[side] = true;
          any = true;
        }
      }
    }
    if (any) {
      split(sideOf, split, middles);
    }
    return any;
  }

  private boolean bent(int t, int k, double middle, double slope) {
    int a = patch.corner(t, (k + 1) % 3);
    int b = patch.corner(t, (k + 2) % 3);
    double length = Math.hypot(patch.x(a) - patch.x(b), patch.y(a) - patch.y(b)) * pointsPerM;
    double off = Math.abs(middle - (patch.value(a) + patch.value(b)) / 2);
    return length > SHORT && off > SHARE_OF_STEP * step && off * pointsPerM > DISPLACEMENT * slope;
  }

  private double middle(int t, int k) {
    int a = patch.corner(t, (k + 1) % 3);
    int b = patch.corner(t, (k + 2) % 3);
    double x = (patch.x(a) + patch.x(b)) / 2;
    double y = (patch.y(a) + patch.y(b)) / 2;
    int parent = parents[t];
    return field.in(parent, Barycentric.of(mesh, parent, x, y));
  }

  private void split(int[] sideOf, boolean[] split, double[] middles) {
    LinearPatch old = patch;
    int[] oldParents = parents;
    int n = old.triangles();
    patch = new LinearPatch(2 * old.vertices(), 4 * n);
    parents = new int[4 * n];
    for (int v = 0; v < old.vertices(); v++) {
      patch.addVertex(old.x(v), old.y(v), old.value(v));
    }
    int[] middleVertex = new int[split.length];
    Arrays.fill(middleVertex, -1);
    int[] m = new int[3];
    for (int t = 0; t < n; t++) {
      int from = patch.triangles();
      for (int k = 0; k < 3; k++) {
        int side = sideOf[3 * t + k];
        if (split[side] && middleVertex[side] < 0) {
          int a = old.corner(t, (k + 1) % 3);
          int b = old.corner(t, (k + 2) % 3);
          middleVertex[side] =
              patch.addVertex((old.x(a) + old.x(b)) / 2, (old.y(a) + old.y(b)) / 2, middles[side]);
        }
        m[k] = middleVertex[side];
      }
      pieces(old, t, m);
      Arrays.fill(parents, from, patch.triangles(), oldParents[t]);
    }
  }

  /** Adds the one to four pieces of a triangle; m[k] is the vertex on side k, or −1. */
  private void pieces(LinearPatch old, int t, int[] m) {
    int count = (m[0] >= 0 ? 1 : 0) + (m[1] >= 0 ? 1 : 0) + (m[2] >= 0 ? 1 : 0);
    int k = 0;
    if (count == 1) {
      k = m[0] >= 0 ? 0 : m[1] >= 0 ? 1 : 2;
    } else if (count == 2) {
      k = m[0] < 0 ? 0 : m[1] < 0 ? 1 : 2;
    }
    int apex = old.corner(t, k);
    int a = old.corner(t, (k + 1) % 3);
    int b = old.corner(t, (k + 2) % 3);
    int onA = m[(k + 2) % 3];
    int onB = m[(k + 1) % 3];
    switch (count) {
      case 0 -> patch.addTriangle(apex, a, b);
      case 1 -> {
        patch.addTriangle(apex, a, m[k]);
        patch.addTriangle(apex, m[k], b);
      }
      case 2 -> {
        patch.addTriangle(apex, onA, onB);
        patch.addTriangle(onA, a, b);
        patch.addTriangle(onA, b, onB);
      }
      default -> {
        patch.addTriangle(apex, onA, onB);
        patch.addTriangle(onA, a, m[k]);
        patch.addTriangle(onB, m[k], b);
        patch.addTriangle(m[k], onB, onA);
      }
    }
  }
}
