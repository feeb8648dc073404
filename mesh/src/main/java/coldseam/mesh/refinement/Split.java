package coldseam.mesh.refinement;

import coldseam.mesh.triangulation.Mesh;

/** The triangles that old ones become, given the vertex in the middle of each halved side. */
final class Split {
  private final Mesh mesh;
  private final HalvedSides halved;
  private final int[] corners;
  private final int[] labels;
  private final int[] partitionEdges;
  private final int[] parents;
  private int made;

  Split(Mesh mesh, HalvedSides halved, LadderCells cells) {
    this.mesh = mesh;
    this.halved = halved;
    int count = mesh.triangleCount();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        count += halved.middle(t, k) == Mesh.NONE ? 0 : 1;
      }
    }
    corners = new int[3 * count];
    labels = new int[count];
    partitionEdges = new int[3 * count];
    parents = new int[count];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int other = cells.partner(t);
      if (other == Mesh.NONE || halved.middle(t, 0) != Mesh.NONE) {
        bisect(t);
      } else if (halved.middle(t, cells.longSide(t)) == Mesh.NONE) {
        bisect(t);
      } else if (other > t) {
        halveCell(t, other, cells.longSide(t));
      }
    }
  }

  int[] corners() {
    return corners;
  }

  int[] labels() {
    return labels;
  }

  int[] partitionEdges() {
    return partitionEdges;
  }

  /** For each new triangle the old one it comes from. */
  int[] parents() {
    return parents;
  }

  private void bisect(int t) {
    int p0 = mesh.vertex(t, 0);
    int p1 = mesh.vertex(t, 1);
    int p2 = mesh.vertex(t, 2);
    int e0 = mesh.partitionEdge(t, 0);
    int e1 = mesh.partitionEdge(t, 1);
    int e2 = mesh.partitionEdge(t, 2);
    int m0 = halved.middle(t, 0);
    if (m0 == Mesh.NONE) {
      add(t, p0, p1, p2, e0, e1, e2);
      return;
    }
    half(t, m0, p0, p1, e2, e0, Mesh.NONE, halved.middle(t, 2));
    half(t, m0, p2, p0, e1, Mesh.NONE, e0, halved.middle(t, 1));
  }

  /** One half (a newest), split once more if the side opposite a has a vertex m in the middle. */
  private void half(int t, int a, int b, int c, int ea, int eb, int ec, int m) {
    if (m == Mesh.NONE) {
      add(t, a, b, c, ea, eb, ec);
      return;
    }
    add(t, m, a, b, ec, ea, Mesh.NONE);
    add(t, m, c, a, eb, Mesh.NONE, ea);
  }

  /**
   * Halves a cell in length. Its corners are p0, p1, q0, p2 in turn, p1-p2 the diagonal; m and n
   * the middles of the long sides.
   */
  private void halveCell(int t, int other, int along) {
    int p0 = mesh.vertex(t, 0);
    int p1 = mesh.vertex(t, 1);
    int p2 = mesh.vertex(t, 2);
    int q0 = mesh.vertex(other, 0);
    int e1 = mesh.partitionEdge(t, 1);
    int e2 = mesh.partitionEdge(t, 2);
    int f1 = mesh.partitionEdge(other, 1);
    int f2 = mesh.partitionEdge(other, 2);
    int m = halved.middle(t, along);
    int n = halved.middle(other, along);
    if (along == 2) {
      // Long sides p0-p1 and q0-p2.
      add(t, p0, m, p2, Mesh.NONE, e1, e2);
      add(t, n, p2, m, Mesh.NONE, Mesh.NONE, f2);
      add(other, m, p1, n, Mesh.NONE, Mesh.NONE, e2);
      add(other, q0, n, p1, Mesh.NONE, f1, f2);
    } else {
      // Long sides p2-p0 and p1-q0.
      add(t, p0, p1, m, Mesh.NONE, e1, e2);
      add(t, n, m, p1, Mesh.NONE, f1, Mesh.NONE);
      add(other, m, n, p2, Mesh.NONE, e1, Mesh.NONE);
      add(other, q0, p2, n, Mesh.NONE, f1, f2);
    }
  }

  /** Adds a triangle, the partition edges of its sides opposite a, b, c. */
  private void add(int t, int a, int b, int c, int ea, int eb, int ec) {
    int at = 3 * made;
    corners[at] = a;
    corners[at + 1] = b;
    corners[at + 2] = c;
    partitionEdges[at] = ea;
    partitionEdges[at + 1] = eb;
    partitionEdges[at + 2] = ec;
    labels[made] = mesh.label(t);
    parents[made++] = t;
  }
}
