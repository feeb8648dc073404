package coldseam.mesh.triangulation;

import java.util.Arrays;

/** The faces of a drawing in its triangulation. */
final class Faces {
  private static final int UNKNOWN = Integer.MIN_VALUE;

  private Faces() {}

  /** Gives each triangle its face: known beside the edges of the drawing, spread from there. */
  static void fill(ConstrainedDelaunay plane, Linework lines) {
    int[] pending = new int[plane.triangleCount];
    int count = 0;
    Arrays.fill(plane.face, 0, plane.triangleCount, UNKNOWN);
    for (int h = 0; h < 3 * plane.triangleCount; h++) {
      int e = plane.kept[h];
      if (plane.face[h / 3] == UNKNOWN
          && (e != Triangulation.NONE || plane.twin[h] == Triangulation.NONE)) {
        plane.face[h / 3] = faceBeside(plane, lines, h);
        pending[count++] = h / 3;
      }
    }
    while (count > 0) {
      int t = pending[--count];
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        int g = plane.twin[h];
        if (plane.kept[h] == Triangulation.NONE
            && g != Triangulation.NONE
            && plane.face[g / 3] == UNKNOWN) {
          plane.face[g / 3] = plane.face[t];
          pending[count++] = g / 3;
        }
      }
    }
  }

  /** The face to the left of a side on an edge of the drawing, or NONE at the box. */
  private static int faceBeside(ConstrainedDelaunay plane, Linework lines, int h) {
    int e = plane.kept[h];
    if (e == Triangulation.NONE) {
      return Triangulation.NONE;
    }
    int a = lines.start[e] + ConstrainedDelaunay.FIRST;
    int b = lines.end[e] + ConstrainedDelaunay.FIRST;
    int p = plane.start(h);
    int q = plane.end(h);
    double along =
        (plane.x[q] - plane.x[p]) * (plane.x[b] - plane.x[a])
            + (plane.y[q] - plane.y[p]) * (plane.y[b] - plane.y[a]);
    return along > 0 ? lines.leftFace[e] : lines.rightFace[e];
  }
}
