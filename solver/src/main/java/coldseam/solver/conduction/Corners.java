package coldseam.solver.conduction;

import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;
import java.util.BitSet;

/** The vertices where different edges of the partition meet: where a field may be singular. */
final class Corners {
  /** Length over height up to which a triangle may stay at a corner. */
  private static final double SLENDER = 3.5;

  /** A part that keeps more of its parent's slenderness than this is of no use. */
  private static final double HARDLY_SQUARER = 0.8;

  /** Enough rounds for a metre of the thinnest foil. */
  private static final int MOST_ROUNDS = 24;

  private Corners() {}

  /** Finds them; vertices keep their numbers when the mesh is refined. */
  static BitSet of(Mesh mesh) {
    int[] edge = new int[mesh.vertexCount()];
    Arrays.fill(edge, Mesh.NONE);
    BitSet corners = new BitSet(edge.length);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int own = mesh.partitionEdge(t, k);
        if (own == Mesh.NONE) {
          continue;
        }
        for (int end = 1; end <= 2; end++) {
          int v = mesh.vertex(t, (k + end) % 3);
          if (edge[v] == Mesh.NONE) {
            edge[v] = own;
          } else if (edge[v] != own) {
            corners.set(v);
          }
        }
      }
    }
    return corners;
  }

  /** Whether a triangle has a corner among its vertices. */
  static boolean touches(BitSet corners, Mesh mesh, int t) {
    return corners.get(mesh.vertex(t, 0))
        || corners.get(mesh.vertex(t, 1))
        || corners.get(mesh.vertex(t, 2));
  }

  /**
   * Halves the cells of ladders in length where they touch a corner, until they are about square:
   * near the ends and joints of a sheet the field varies in all directions, and splitting slender
   * triangles in the ordinary way would keep them slender.
   *
   * @param coarse the mesh
   * @return a mesh without slender triangles at corners but for those that cannot be made squarer
   */
  static Mesh squared(Mesh coarse) {
    Mesh mesh = coarse;
    BitSet corners = of(mesh);
    BitSet hopeless = new BitSet();
    for (int round = 0; round < MOST_ROUNDS; round++) {
      BitSet marked = new BitSet(mesh.triangleCount());
      for (int t = 0; t < mesh.triangleCount(); t++) {
        marked.set(
            t, touches(corners, mesh, t) && !hopeless.get(t) && slenderness(mesh, t) > SLENDER);
      }
      if (marked.isEmpty()) {
        return mesh;
      }
      NewestVertexBisection.Refined next = NewestVertexBisection.refine(mesh, marked);
      BitSet nextHopeless = new BitSet(next.mesh().triangleCount());
      for (int t = 0; t < next.mesh().triangleCount(); t++) {
        int parent = next.parent()[t];
        nextHopeless.set(
            t,
            hopeless.get(parent)
                || marked.get(parent)
                    && slenderness(next.mesh(), t) > HARDLY_SQUARER * slenderness(mesh, parent));
      }
      mesh = next.mesh();
      hopeless = nextHopeless;
    }
    return mesh;
  }

  /** Length over height of a triangle. */
  static double slenderness(Mesh mesh, int t) {
    double longest = 0;
    for (int k = 0; k < 3; k++) {
      longest = Math.max(longest, mesh.sideLength(mesh.side(t, k)));
    }
    return longest * longest / (2 * mesh.area(t));
  }
}
