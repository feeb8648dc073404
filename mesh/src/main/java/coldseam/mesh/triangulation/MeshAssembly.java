package coldseam.mesh.triangulation;

import java.util.Arrays;

/**
 * Takes the wanted triangles out of a triangulation: longest side first, one vertex for each fan,
 * vertices numbered as triangles name them.
 */
final class MeshAssembly {
  private final ConstrainedDelaunay plane;
  private final boolean[] wanted;
  private final int[] vertexAt;
  private int[] source = new int[64];
  private int vertexCount;

  private MeshAssembly(ConstrainedDelaunay plane, boolean[] wanted) {
    this.plane = plane;
    this.wanted = wanted;
    vertexAt = new int[3 * plane.triangleCount];
    Arrays.fill(vertexAt, Triangulation.NONE);
  }

  static Mesh assemble(ConstrainedDelaunay plane, Linework lines, boolean[] meshed) {
    boolean[] wanted = new boolean[plane.triangleCount];
    for (int t = 0; t < wanted.length; t++) {
      wanted[t] = plane.face[t] >= 0 && meshed[plane.face[t]];
    }
    return new MeshAssembly(plane, wanted).mesh(lines);
  }

  private Mesh mesh(Linework lines) {
    int count = 0;
    for (boolean each : wanted) {
      count += each ? 1 : 0;
    }
    int[] corners = new int[3 * count];
    int[] labels = new int[count];
    int[] edges = new int[3 * count];
    int made = 0;
    for (int t = 0; t < wanted.length; t++) {
      if (!wanted[t]) {
        continue;
      }
      int h = longestSide(t);
      for (int k = 0; k < 3; k++) {
        corners[3 * made + k] = vertex(h);
        edges[3 * made + k] = plane.kept[h] >= 0 ? plane.kept[h] : Mesh.NONE;
        h = Triangulation.next(h);
      }
      labels[made++] = lines.faceLabel[plane.face[t]];
    }
    double[] x = new double[vertexCount];
    double[] y = new double[vertexCount];
    for (int v = 0; v < vertexCount; v++) {
      x[v] = plane.x[source[v]];
      y[v] = plane.y[source[v]];
    }
    return Mesh.of(lines.origin, x, y, corners, labels, edges);
  }

  private int longestSide(int t) {
    double a = plane.length(3 * t);
    double b = plane.length(3 * t + 1);
    double c = plane.length(3 * t + 2);
    return a >= b && a >= c ? 3 * t : b >= c ? 3 * t + 1 : 3 * t + 2;
  }

  /** The vertex for a corner: a new one for each fan, given to all corners of the fan at once. */
  private int vertex(int corner) {
    if (vertexAt[corner] != Triangulation.NONE) {
      return vertexAt[corner];
    }
    if (vertexCount == source.length) {
      source = Arrays.copyOf(source, 2 * vertexCount);
    }
    source[vertexCount] = plane.corner[corner];
    int c = corner;
    while (c != Triangulation.NONE && wanted[c / 3] && vertexAt[c] == Triangulation.NONE) {
      vertexAt[c] = vertexCount;
      c = plane.counterClockwise(c);
    }
    c = plane.clockwise(corner);
    while (c != Triangulation.NONE && wanted[c / 3] && vertexAt[c] == Triangulation.NONE) {
      vertexAt[c] = vertexCount;
      c = plane.clockwise(c);
    }
    return vertexCount++;
  }
}
