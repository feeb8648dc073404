package coldseam.mesh.refinement;

import coldseam.mesh.triangulation.Mesh;
import java.util.BitSet;

/**
 * Newest-vertex bisection: marked triangles are split so that each of their three sides is halved
 * (three bisections), others as far as needed to keep the mesh conforming. Labels and partition
 * edges are inherited. The refined mesh is nested in the old one.
 */
public final class NewestVertexBisection {
  private NewestVertexBisection() {}

  /**
   * A refined mesh and where its parts come from.
   *
   * @param mesh the finer mesh; vertices of the old one keep their numbers, a new vertex v is the
   *     middle of old side {@code oldSide[v - oldVertexCount]}, or −1 if it halves a side that is
   *     itself new
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
    throw new UnsupportedOperationException();
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
}
