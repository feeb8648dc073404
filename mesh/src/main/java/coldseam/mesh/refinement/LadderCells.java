package coldseam.mesh.refinement;

import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;

/**
 * Pairs of triangles that form a cell of a ladder: each the other's neighbour across its longest
 * side, which lies within a face, their long legs opposite each other and of like length.
 */
final class LadderCells {
  /** A cell is this many times longer than wide, or more: squarer ones are split like others. */
  private static final double LONG = 3;

  /** The long sides of a cell differ by this ratio at most. */
  private static final double ALIKE = 1.5;

  private final int[] partner;
  private final boolean[] secondIsLong;

  private LadderCells(int[] partner, boolean[] secondIsLong) {
    this.partner = partner;
    this.secondIsLong = secondIsLong;
  }

  /** The cells of a mesh. */
  static LadderCells of(Mesh mesh) {
    LadderCells cells = none(mesh);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int other = mesh.neighbour(t, 0);
      if (other > t && mesh.neighbour(other, 0) == t && isCell(mesh, t, other)) {
        cells.partner[t] = other;
        cells.partner[other] = t;
        cells.secondIsLong[t] = length(mesh, t, 2) > length(mesh, t, 1);
        cells.secondIsLong[other] = cells.secondIsLong[t];
      }
    }
    return cells;
  }

  /** No cells at all. */
  static LadderCells none(Mesh mesh) {
    int[] partner = new int[mesh.triangleCount()];
    Arrays.fill(partner, Mesh.NONE);
    return new LadderCells(partner, new boolean[partner.length]);
  }

  /** The other triangle of the cell, or NONE. */
  int partner(int triangle) {
    return partner[triangle];
  }

  /** Which side of a triangle is a long side of its cell: 1 or 2. */
  int longSide(int triangle) {
    return secondIsLong[triangle] ? 2 : 1;
  }

  private static boolean isCell(Mesh mesh, int t, int other) {
    if (mesh.partitionEdge(t, 0) != Mesh.NONE) {
      return false;
    }
    // Side 1 of the one lies opposite side 1 of the other, likewise sides 2.
    double first = length(mesh, t, 1);
    double second = length(mesh, t, 2);
    double firstOther = length(mesh, other, 1);
    double secondOther = length(mesh, other, 2);
    boolean alongFirst = first > second;
    double shorter = alongFirst ? Math.min(first, firstOther) : Math.min(second, secondOther);
    double longer = alongFirst ? Math.max(first, firstOther) : Math.max(second, secondOther);
    double rung = alongFirst ? Math.max(second, secondOther) : Math.max(first, firstOther);
    double diagonal = length(mesh, t, 0);
    return shorter >= LONG * rung && longer <= ALIKE * shorter && diagonal >= longer;
  }

  private static double length(Mesh mesh, int t, int k) {
    return mesh.sideLength(mesh.side(t, k));
  }
}
