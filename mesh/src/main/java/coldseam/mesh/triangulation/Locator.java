package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Predicates;
import java.util.Arrays;

/**
 * Finds the triangle that contains a point: triangles in the order of their centres along a
 * space-filling curve, and above them a binary tree of bounding boxes. It does not walk, so that
 * holes, separate pieces and needles do not matter; containment is decided by exact orientation.
 */
final class Locator {
  /** Triangles in a leaf of the tree. */
  private static final int LEAF = 4;

  /** A point counts as on the mesh when nearer than this part of the mesh's extent. */
  private static final double NEAR = 1e-9;

  private final Mesh mesh;
  private final int[] order;
  private final int leaves;
  private final float[] boxes;
  private final double left;
  private final double bottom;
  private final double extent;

  Locator(Mesh mesh) {
    this.mesh = mesh;
    double minX = Double.POSITIVE_INFINITY;
    double minY = Double.POSITIVE_INFINITY;
    double maxX = Double.NEGATIVE_INFINITY;
    double maxY = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < mesh.vertexCount(); v++) {
      minX = Math.min(minX, mesh.x(v));
      minY = Math.min(minY, mesh.y(v));
      maxX = Math.max(maxX, mesh.x(v));
      maxY = Math.max(maxY, mesh.y(v));
    }
    left = minX;
    bottom = minY;
    extent = Math.max(maxX - minX, maxY - minY);
    order = alongCurve();
    int count = 1;
    while (count * LEAF < order.length) {
      count *= 2;
    }
    leaves = count;
    boxes = new float[8 * leaves];
    fillBoxes();
  }

  int locate(double px, double py) {
    double reach = NEAR * extent;
    if (!(px >= left - reach && py >= bottom - reach)) {
      return Mesh.NONE;
    }
    // Boxes are kept in parts of the extent and are widened by more than a float's rounding.
    double u = (px - left) / extent;
    double v = (py - bottom) / extent;
    int nearest = Mesh.NONE;
    double nearestSquared = reach * reach;
    int[] pending = new int[64];
    int depth = 0;
    pending[depth++] = 1;
    while (depth > 0) {
      int node = pending[--depth];
      int at = 4 * node;
      if (u < boxes[at] || u > boxes[at + 1] || v < boxes[at + 2] || v > boxes[at + 3]) {
        continue;
      }
      if (node < leaves) {
        pending[depth++] = 2 * node + 1;
        pending[depth++] = 2 * node;
        continue;
      }
      int from = (node - leaves) * LEAF;
      int to = Math.min(order.length, from + LEAF);
      for (int i = from; i < to; i++) {
        if (contains(order[i], px, py)) {
          return order[i];
        }
        double squared = squaredDistance(order[i], px, py);
        if (squared < nearestSquared) {
          nearestSquared = squared;
          nearest = order[i];
        }
      }
    }
    return nearest;
  }

  private boolean contains(int t, double px, double py) {
    for (int k = 0; k < 3; k++) {
      int a = mesh.vertex(t, k);
      int b = mesh.vertex(t, k == 2 ? 0 : k + 1);
      if (Predicates.orientation(mesh.x(a), mesh.y(a), mesh.x(b), mesh.y(b), px, py) < 0) {
        return false;
      }
    }
    return true;
  }

  /** Squared distance of a point outside a triangle from the triangle's sides. */
  private double squaredDistance(int t, double px, double py) {
    double least = Double.POSITIVE_INFINITY;
    for (int k = 0; k < 3; k++) {
      int a = mesh.vertex(t, k);
      int b = mesh.vertex(t, k == 2 ? 0 : k + 1);
      double dx = mesh.x(b) - mesh.x(a);
      double dy = mesh.y(b) - mesh.y(a);
      double qx = px - mesh.x(a);
      double qy = py - mesh.y(a);
      double along = Math.max(0, Math.min(1, (qx * dx + qy * dy) / (dx * dx + dy * dy)));
      qx -= along * dx;
      qy -= along * dy;
      least = Math.min(least, qx * qx + qy * qy);
    }
    return least;
  }

  private int[] alongCurve() {
    int count = mesh.triangleCount();
    long[] keys = new long[count];
    double scale = 65535 / (3 * extent);
    for (int t = 0; t < count; t++) {
      int a = mesh.vertex(t, 0);
      int b = mesh.vertex(t, 1);
      int c = mesh.vertex(t, 2);
      int column = (int) ((mesh.x(a) + mesh.x(b) + mesh.x(c) - 3 * left) * scale);
      int row = (int) ((mesh.y(a) + mesh.y(b) + mesh.y(c) - 3 * bottom) * scale);
      keys[t] = SpaceFillingCurve.index(column, row) << 31 | t;
    }
    Arrays.sort(keys);
    int[] result = new int[count];
    for (int i = 0; i < count; i++) {
      result[i] = (int) (keys[i] & 0x7fffffff);
    }
    return result;
  }

  private void fillBoxes() {
    for (int node = 2 * leaves - 1; node >= 1; node--) {
      int at = 4 * node;
      boxes[at] = Float.POSITIVE_INFINITY;
      boxes[at + 1] = Float.NEGATIVE_INFINITY;
      boxes[at + 2] = Float.POSITIVE_INFINITY;
      boxes[at + 3] = Float.NEGATIVE_INFINITY;
      if (node < leaves) {
        widen(at, 8 * node);
        widen(at, 8 * node + 4);
        continue;
      }
      int from = (node - leaves) * LEAF;
      int to = Math.min(order.length, from + LEAF);
      for (int i = from; i < to; i++) {
        for (int k = 0; k < 3; k++) {
          include(at, mesh.vertex(order[i], k));
        }
      }
    }
  }

  private void widen(int at, int other) {
    boxes[at] = Math.min(boxes[at], boxes[other]);
    boxes[at + 1] = Math.max(boxes[at + 1], boxes[other + 1]);
    boxes[at + 2] = Math.min(boxes[at + 2], boxes[other + 2]);
    boxes[at + 3] = Math.max(boxes[at + 3], boxes[other + 3]);
  }

  private void include(int at, int vertex) {
    float margin = 0x1p-22f;
    float u = (float) ((mesh.x(vertex) - left) / extent);
    float v = (float) ((mesh.y(vertex) - bottom) / extent);
    boxes[at] = Math.min(boxes[at], u - margin);
    boxes[at + 1] = Math.max(boxes[at + 1], u + margin);
    boxes[at + 2] = Math.min(boxes[at + 2], v - margin);
    boxes[at + 3] = Math.max(boxes[at + 3], v + margin);
  }
}
