package coldseam.mesh.triangulation;

import java.util.Arrays;

/**
 * What must hold of every mesh of a drawing. All of it takes one pass over the triangles, so it is
 * done each time a mesh is made. That triangles turn counter-clockwise and that no side has three
 * of them is checked by {@link Mesh#of} already.
 */
final class MeshCheck {
  /** Areas agree to this part of themselves. */
  private static final double SAME_AREA = 1e-9;

  private final Mesh mesh;
  private final Linework lines;
  private final boolean[] meshed;

  private MeshCheck(Mesh mesh, Linework lines, boolean[] meshed) {
    this.mesh = mesh;
    this.lines = lines;
    this.meshed = meshed;
  }

  /**
   * Checks a mesh against its drawing.
   *
   * @param mesh the mesh, at any refinement
   * @param lines the drawing
   * @param meshed for each face whether it is filled
   * @throws IllegalStateException if something does not hold, saying what and where
   */
  static void require(Mesh mesh, Linework lines, boolean[] meshed) {
    MeshCheck check = new MeshCheck(mesh, lines, meshed);
    check.sidesMatchTheDrawing();
    check.onlyOneFanAtEachVertex();
    check.eulerCount();
    check.areas();
  }

  /** A side without neighbour lies on an edge with open ground beyond, and only such a side. */
  private void sidesMatchTheDrawing() {
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int e = mesh.partitionEdge(t, k);
        int other = mesh.neighbour(t, k);
        if (e == Mesh.NONE) {
          if (other == Mesh.NONE) {
            fail("a side without neighbour lies within a face", t);
          }
          if (mesh.label(other) != mesh.label(t)) {
            fail("labels differ across a side within a face", t);
          }
          continue;
        }
        boolean outline = !isMeshed(lines.leftFace[e]) || !isMeshed(lines.rightFace[e]);
        if (outline != (other == Mesh.NONE)) {
          fail("a side on partition edge " + e + " does not match what lies beyond", t);
        }
        if (labelOf(lines.leftFace[e]) != mesh.label(t)
            && labelOf(lines.rightFace[e]) != mesh.label(t)) {
          fail("a side lies on partition edge " + e + " of another label", t);
        }
      }
    }
  }

  /** Walking round a vertex from any of its corners meets all of its corners. */
  private void onlyOneFanAtEachVertex() {
    int[] corners = new int[mesh.vertexCount()];
    int[] outline = new int[mesh.vertexCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        corners[mesh.vertex(t, k)]++;
        for (int end = 1; end <= 2; end++) {
          int v = mesh.vertex(t, (k + end) % 3);
          outline[v] += mesh.neighbour(t, k) == Mesh.NONE ? 1 : 0;
        }
      }
    }
    int[] fan = fanSizes();
    for (int v = 0; v < corners.length; v++) {
      if (corners[v] == 0) {
        throw new IllegalStateException("vertex " + v + " belongs to no triangle");
      }
      if (outline[v] != 0 && outline[v] != 2 || fan[v] != corners[v]) {
        throw new IllegalStateException(
            "vertex " + v + " at (" + mesh.x(v) + ", " + mesh.y(v) + ") has several fans");
      }
    }
  }

  private int[] fanSizes() {
    int[] size = new int[mesh.vertexCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.vertex(t, k);
        if (size[v] == 0) {
          size[v] = 1 + walk(t, k, 1) + (closes(t, k) ? 0 : walk(t, k, 2));
        }
      }
    }
    return size;
  }

  /** How many more triangles lie around corner k of t, leaving through side k + step. */
  private int walk(int from, int corner, int step) {
    int v = mesh.vertex(from, corner);
    int t = from;
    int k = corner;
    int count = 0;
    while (true) {
      int next = mesh.neighbour(t, (k + step) % 3);
      if (next == Mesh.NONE || next == from) {
        return count;
      }
      t = next;
      k = mesh.vertex(t, 0) == v ? 0 : mesh.vertex(t, 1) == v ? 1 : 2;
      count++;
    }
  }

  /** Whether the triangles around corner k of t close to a full turn. */
  private boolean closes(int from, int corner) {
    int v = mesh.vertex(from, corner);
    int t = from;
    int k = corner;
    do {
      t = mesh.neighbour(t, (k + 1) % 3);
      if (t == Mesh.NONE) {
        return false;
      }
      k = mesh.vertex(t, 0) == v ? 0 : mesh.vertex(t, 1) == v ? 1 : 2;
    } while (t != from);
    return true;
  }

  /** Vertices − sides + triangles = 2 · pieces − loops of the outline. */
  private void eulerCount() {
    int euler = mesh.vertexCount() - mesh.sideCount() + mesh.triangleCount();
    int pieces = pieces();
    int loops = loops();
    if (euler != 2 * pieces - loops) {
      throw new IllegalStateException(
          "Euler's count is " + euler + " for " + pieces + " pieces and " + loops + " loops");
    }
  }

  private int pieces() {
    boolean[] seen = new boolean[mesh.triangleCount()];
    int[] pending = new int[mesh.triangleCount()];
    int pieces = 0;
    for (int t = 0; t < seen.length; t++) {
      if (seen[t]) {
        continue;
      }
      pieces++;
      int count = 0;
      seen[t] = true;
      pending[count++] = t;
      while (count > 0) {
        int at = pending[--count];
        for (int k = 0; k < 3; k++) {
          int other = mesh.neighbour(at, k);
          if (other != Mesh.NONE && !seen[other]) {
            seen[other] = true;
            pending[count++] = other;
          }
        }
      }
    }
    return pieces;
  }

  private int loops() {
    int[] following = new int[mesh.vertexCount()];
    Arrays.fill(following, Mesh.NONE);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(t, k) == Mesh.NONE) {
          following[mesh.vertex(t, (k + 1) % 3)] = mesh.vertex(t, (k + 2) % 3);
        }
      }
    }
    int loops = 0;
    for (int v = 0; v < following.length; v++) {
      if (following[v] != Mesh.NONE) {
        loops++;
      }
      int at = v;
      while (following[at] != Mesh.NONE) {
        int next = following[at];
        following[at] = Mesh.NONE;
        at = next;
      }
    }
    return loops;
  }

  /** Triangles fill the faces of each label: their areas add up to those of the outlines. */
  private void areas() {
    int labels = 0;
    for (int label : lines.faceLabel) {
      labels = Math.max(labels, label + 1);
    }
    double[] filled = new double[labels];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      filled[mesh.label(t)] += mesh.area(t);
    }
    double[] drawn = new double[labels];
    double[] outline = new double[labels];
    for (int e = 0; e < lines.start.length; e++) {
      addEdge(e, lines.leftFace[e], 1, drawn, outline);
      addEdge(e, lines.rightFace[e], -1, drawn, outline);
    }
    double rounding = 16 * Math.ulp(lines.extent());
    for (int label = 0; label < labels; label++) {
      double difference = Math.abs(filled[label] - drawn[label]);
      if (!(difference <= SAME_AREA * drawn[label] + rounding * outline[label])) {
        throw new IllegalStateException(
            "triangles of label " + label + " fill " + filled[label] + " of " + drawn[label]);
      }
    }
  }

  /** Adds what an edge contributes to the area of the label on one hand of it (Green). */
  private void addEdge(int e, int face, int sign, double[] drawn, double[] outline) {
    if (!isMeshed(face)) {
      return;
    }
    double ax = lines.x[lines.start[e]] - lines.minX;
    double ay = lines.y[lines.start[e]] - lines.minY;
    double bx = lines.x[lines.end[e]] - lines.minX;
    double by = lines.y[lines.end[e]] - lines.minY;
    drawn[lines.faceLabel[face]] += 0.5 * sign * (ax * by - ay * bx);
    outline[lines.faceLabel[face]] += Math.hypot(bx - ax, by - ay) + Math.hypot(ax, ay);
  }

  private boolean isMeshed(int face) {
    return face >= 0 && meshed[face];
  }

  private int labelOf(int face) {
    return face < 0 ? Mesh.NONE : lines.faceLabel[face];
  }

  private void fail(String what, int t) {
    int v = mesh.vertex(t, 0);
    throw new IllegalStateException(
        what + ": triangle " + t + " at (" + mesh.x(v) + ", " + mesh.y(v) + ")");
  }
}
