package coldseam.mesh.refinement;

import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;
import java.util.BitSet;

/**
 * Newest-vertex bisection (Mitchell 1991): marked triangles are split so that each of their three
 * sides is halved (three bisections), others as far as needed to keep the mesh conforming. Labels
 * and partition edges are inherited. The refined mesh is nested in the old one. Descendants of a
 * triangle fall into at most four classes of similar triangles, so quality does not decay.
 *
 * <p>Conformity is reached by marking sides: as soon as any side of a triangle is to be halved, so
 * is its side 0. Marks only grow, so this ends on any mesh, whatever the choice of newest vertices.
 */
public final class NewestVertexBisection {
  /** Triangles less high than this part of the mesh's extent are not split further. */
  private static final double SMALLEST = 1e-12;

  private NewestVertexBisection() {}

  /**
   * A refined mesh and where its parts come from.
   *
   * @param mesh the finer mesh; vertices of the old one keep their numbers, a new vertex v is the
   *     middle of old side {@code oldSide[v - oldVertexCount]}
   * @param parent for each new triangle the old triangle that contains it
   * @param oldSide see {@code mesh}
   */
  public record Refined(Mesh mesh, int[] parent, int[] oldSide) {}

  /**
   * Refines.
   *
   * @param mesh the mesh
   * @param marked the triangles to split
   * @return the refined mesh, the old one if nothing is marked
   */
  public static Refined refine(Mesh mesh, BitSet marked) {
    boolean[] halved = halvedSides(mesh, marked);
    int sideCount = mesh.sideCount();
    int[] middle = new int[sideCount];
    int[] oldSide = new int[sideCount];
    int added = 0;
    for (int s = 0; s < sideCount; s++) {
      middle[s] = Mesh.NONE;
      if (halved[s]) {
        middle[s] = mesh.vertexCount() + added;
        oldSide[added++] = s;
      }
    }
    if (added == 0) {
      int[] parent = new int[mesh.triangleCount()];
      for (int t = 0; t < parent.length; t++) {
        parent[t] = t;
      }
      return new Refined(mesh, parent, new int[0]);
    }
    oldSide = Arrays.copyOf(oldSide, added);
    Split split = new Split(mesh, middle);
    double[] x = new double[mesh.vertexCount() + added];
    double[] y = new double[x.length];
    for (int v = 0; v < mesh.vertexCount(); v++) {
      x[v] = mesh.x(v);
      y[v] = mesh.y(v);
    }
    for (int i = 0; i < added; i++) {
      int a = mesh.sideStart(oldSide[i]);
      int b = mesh.sideEnd(oldSide[i]);
      x[mesh.vertexCount() + i] = 0.5 * (x[a] + x[b]);
      y[mesh.vertexCount() + i] = 0.5 * (y[a] + y[b]);
    }
    Mesh refined = Mesh.of(mesh.origin(), x, y, split.corners, split.labels, split.partitionEdges);
    return new Refined(refined, split.parent, oldSide);
  }

  /**
   * Splits every triangle into four.
   *
   * @param mesh the mesh
   * @return the uniformly refined mesh
   */
  public static Refined refineAll(Mesh mesh) {
    BitSet all = new BitSet(mesh.triangleCount());
    all.set(0, mesh.triangleCount());
    return refine(mesh, all);
  }

  private static boolean[] halvedSides(Mesh mesh, BitSet marked) {
    boolean[] halved = new boolean[mesh.sideCount()];
    int[] pending = new int[mesh.triangleCount()];
    boolean[] waiting = new boolean[mesh.triangleCount()];
    int count = 0;
    double smallest = SMALLEST * extent(mesh);
    for (int t = marked.nextSetBit(0); t >= 0; t = marked.nextSetBit(t + 1)) {
      if (leastHeight(mesh, t) < smallest) {
        continue;
      }
      for (int k = 0; k < 3; k++) {
        halved[mesh.side(t, k)] = true;
        int other = mesh.neighbour(t, k);
        if (other != Mesh.NONE && !waiting[other]) {
          waiting[other] = true;
          pending[count++] = other;
        }
      }
    }
    while (count > 0) {
      int t = pending[--count];
      waiting[t] = false;
      if (halved[mesh.side(t, 0)]) {
        continue;
      }
      halved[mesh.side(t, 0)] = true;
      int other = mesh.neighbour(t, 0);
      if (other != Mesh.NONE && !waiting[other]) {
        waiting[other] = true;
        pending[count++] = other;
      }
    }
    return halved;
  }

  private static double leastHeight(Mesh mesh, int t) {
    double longest = 0;
    for (int k = 0; k < 3; k++) {
      longest = Math.max(longest, mesh.sideLength(mesh.side(t, k)));
    }
    return 2 * mesh.area(t) / longest;
  }

  private static double extent(Mesh mesh) {
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
    return Math.max(maxX - minX, maxY - minY);
  }

  /** The triangles that old ones become, given the vertex in the middle of each halved side. */
  private static final class Split {
    private final Mesh mesh;
    private final int[] middle;
    private final int[] corners;
    private final int[] labels;
    private final int[] partitionEdges;
    private final int[] parent;
    private int made;

    Split(Mesh mesh, int[] middle) {
      this.mesh = mesh;
      this.middle = middle;
      int count = mesh.triangleCount();
      for (int t = 0; t < mesh.triangleCount(); t++) {
        for (int k = 0; k < 3; k++) {
          count += middle[mesh.side(t, k)] == Mesh.NONE ? 0 : 1;
        }
      }
      corners = new int[3 * count];
      labels = new int[count];
      partitionEdges = new int[3 * count];
      parent = new int[count];
      for (int t = 0; t < mesh.triangleCount(); t++) {
        split(t);
      }
    }

    private void split(int t) {
      int p0 = mesh.vertex(t, 0);
      int p1 = mesh.vertex(t, 1);
      int p2 = mesh.vertex(t, 2);
      int e0 = mesh.partitionEdge(t, 0);
      int e1 = mesh.partitionEdge(t, 1);
      int e2 = mesh.partitionEdge(t, 2);
      int m0 = middle[mesh.side(t, 0)];
      if (m0 == Mesh.NONE) {
        add(t, p0, p1, p2, e0, e1, e2);
        return;
      }
      half(t, m0, p0, p1, e2, e0, Mesh.NONE, middle[mesh.side(t, 2)]);
      half(t, m0, p2, p0, e1, Mesh.NONE, e0, middle[mesh.side(t, 1)]);
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

    private void add(int t, int a, int b, int c, int ea, int eb, int ec) {
      int at = 3 * made;
      corners[at] = a;
      corners[at + 1] = b;
      corners[at + 2] = c;
      partitionEdges[at] = ea;
      partitionEdges[at + 1] = eb;
      partitionEdges[at + 2] = ec;
      labels[made] = mesh.label(t);
      parent[made++] = t;
    }
  }
}
