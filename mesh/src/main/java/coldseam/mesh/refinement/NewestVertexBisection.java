package coldseam.mesh.refinement;

import coldseam.mesh.triangulation.Mesh;
import java.util.BitSet;

/**
 * Newest-vertex bisection (Mitchell 1991): marked triangles are split so that each of their three
 * sides is halved (three bisections), others as far as needed to keep the mesh conforming. Labels
 * and partition edges are inherited. Descendants of a triangle fall into at most four classes of
 * similar triangles, so quality does not decay.
 *
 * <p>In ladders it is done otherwise by {@link #refine}: two right-angled triangles that share
 * their longest side and are together more than three times as long as wide are a cell. A cell is
 * halved in length only: by the middles of its two long sides and a rung between them, its diagonal
 * giving way to one in each half. So cells grow squarer with each pass and a thin sheet takes no
 * more triangles across its thickness than it needs. Everywhere else, and throughout in {@link
 * #refineAll}, the refined mesh is nested in the old one.
 */
public final class NewestVertexBisection {
  private NewestVertexBisection() {}

  /**
   * A refined mesh and where its parts come from.
   *
   * @param mesh the finer mesh; vertices of the old one keep their numbers, a new vertex v is the
   *     middle of old side {@code oldSide[v - oldVertexCount]}
   * @param parent for each new triangle the old triangle that contains it; in a halved cell of a
   *     ladder, where two of the four triangles cross the old diagonal, one that contains half of
   *     it
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
    BitSet sides = new BitSet(3 * mesh.triangleCount());
    for (int t = marked.nextSetBit(0); t >= 0; t = marked.nextSetBit(t + 1)) {
      sides.set(3 * t, 3 * t + 3);
    }
    LadderCells cells = LadderCells.of(mesh);
    return split(mesh, HalvedSides.of(mesh, sides, cells), cells);
  }

  /**
   * One of several rounds that lead to the halving of given sides. Where a side other than 0 of a
   * triangle is halved, its side 0 is too; a cell of a ladder is halved in length, whichever of its
   * sides is named. If a cell would be cut across by what goes on beyond its rungs, such cells
   * alone are halved in length, and the sides are to be named again in the next round, on the mesh
   * returned: so no triangles are left that are as long as a cell and half as high.
   *
   * @param mesh the mesh
   * @param sides the sides to halve: 3t + k for side k of triangle t
   * @return the refined mesh, the old one if no side is named
   */
  public static Refined refineSides(Mesh mesh, BitSet sides) {
    LadderCells cells = LadderCells.of(mesh);
    return split(mesh, HalvedSides.squaringFirst(mesh, sides, cells), cells);
  }

  /**
   * Splits every triangle into four, in ladders too.
   *
   * @param mesh the mesh
   * @return the uniformly refined mesh, nested in the old one
   */
  public static Refined refineAll(Mesh mesh) {
    BitSet all = new BitSet(mesh.triangleCount());
    all.set(0, 3 * mesh.triangleCount());
    LadderCells cells = LadderCells.none(mesh);
    return split(mesh, HalvedSides.of(mesh, all, cells), cells);
  }

  private static Refined split(Mesh mesh, HalvedSides halved, LadderCells cells) {
    if (halved.count() == 0) {
      int[] parent = new int[mesh.triangleCount()];
      for (int t = 0; t < parent.length; t++) {
        parent[t] = t;
      }
      return new Refined(mesh, parent, new int[0]);
    }
    int old = mesh.vertexCount();
    double[] x = new double[old + halved.count()];
    double[] y = new double[old + halved.count()];
    for (int v = 0; v < old; v++) {
      x[v] = mesh.x(v);
      y[v] = mesh.y(v);
    }
    int[] oldSide = halved.sides();
    for (int i = 0; i < oldSide.length; i++) {
      int a = mesh.sideStart(oldSide[i]);
      int b = mesh.sideEnd(oldSide[i]);
      x[old + i] = 0.5 * (x[a] + x[b]);
      y[old + i] = 0.5 * (y[a] + y[b]);
    }
    Split split = new Split(mesh, halved, cells);
    Mesh refined =
        Mesh.of(mesh.origin(), x, y, split.corners(), split.labels(), split.partitionEdges());
    return new Refined(refined, split.parents(), oldSide);
  }
}
