package coldseam.mesh.refinement;

import coldseam.mesh.triangulation.Mesh;
import java.util.BitSet;

/**
 * The sides to be halved so that the mesh stays conforming. As soon as any side of a triangle is to
 * be halved, so is its side 0; but in a cell whose long sides only are concerned, both of them, and
 * the diagonal (side 0 of both triangles) is not. Sides are only ever added, so this ends on any
 * mesh, whatever the choice of newest vertices.
 */
final class HalvedSides {
  /** Halving cells in length may cut others across; after so many attempts that is let be. */
  private static final int MOST_ATTEMPTS = 4;

  /** Triangles less high than this part of the mesh's extent are not split further. */
  private static final double SMALLEST = 1e-12;

  private final Mesh mesh;
  private final LadderCells cells;

  /** For each side the new vertex in its middle, or NONE. */
  private final int[] middle;

  private final boolean[] halved;
  private final int[] pending;
  private final boolean[] waiting;
  private int pendingCount;
  private int count;

  private HalvedSides(Mesh mesh, LadderCells cells) {
    this.mesh = mesh;
    this.cells = cells;
    middle = new int[mesh.sideCount()];
    halved = new boolean[mesh.sideCount()];
    pending = new int[mesh.triangleCount()];
    waiting = new boolean[mesh.triangleCount()];
  }

  /**
   * The sides to halve for those marked, and what these entail.
   *
   * @param mesh the mesh
   * @param marked sides wanted halved: 3t + k for side k of triangle t
   * @param cells the cells of its ladders
   */
  static HalvedSides of(Mesh mesh, BitSet marked, LadderCells cells) {
    HalvedSides result = closed(mesh, marked, cells);
    result.number();
    return result;
  }

  /**
   * The same, but where long cells would be cut across, which leaves triangles as long as a cell
   * and half as high, nothing else is done than to halve these cells in length.
   *
   * @param mesh the mesh
   * @param marked sides wanted halved
   * @param cells the cells of its ladders
   */
  static HalvedSides squaringFirst(Mesh mesh, BitSet marked, LadderCells cells) {
    HalvedSides result = closed(mesh, marked, cells);
    for (int attempt = 0; attempt < MOST_ATTEMPTS; attempt++) {
      BitSet cut = result.cutCells();
      if (cut.isEmpty()) {
        break;
      }
      result = closed(mesh, cut, cells);
    }
    result.number();
    return result;
  }

  private static HalvedSides closed(Mesh mesh, BitSet marked, LadderCells cells) {
    HalvedSides result = new HalvedSides(mesh, cells);
    result.mark(marked);
    result.close();
    return result;
  }

  /** The cells that would be cut across, by a side of each. */
  private BitSet cutCells() {
    BitSet cut = new BitSet();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (cells.partner(t) > t && isHalved(t, 0)) {
        cut.set(3 * t);
      }
    }
    return cut;
  }

  /** How many sides are halved. */
  int count() {
    return count;
  }

  /** The vertex in the middle of a side of a triangle, or NONE. */
  int middle(int triangle, int k) {
    return middle[mesh.side(triangle, k)];
  }

  /** The halved sides in the order of their new vertices. */
  int[] sides() {
    int[] sides = new int[count];
    for (int s = 0; s < middle.length; s++) {
      if (halved[s]) {
        sides[middle[s] - mesh.vertexCount()] = s;
      }
    }
    return sides;
  }

  private void mark(BitSet marked) {
    double smallest = SMALLEST * extent();
    for (int h = marked.nextSetBit(0); h >= 0; h = marked.nextSetBit(h + 1)) {
      if (height(h / 3) < smallest) {
        continue;
      }
      if (cells.partner(h / 3) != Mesh.NONE) {
        halve(h / 3, cells.longSide(h / 3));
      } else {
        halve(h / 3, h % 3);
      }
    }
  }

  private void close() {
    while (pendingCount > 0) {
      int t = pending[--pendingCount];
      waiting[t] = false;
      int other = cells.partner(t);
      if (other == Mesh.NONE) {
        if (isHalved(t, 0) || isHalved(t, 1) || isHalved(t, 2)) {
          halve(t, 0);
        }
        continue;
      }
      int along = cells.longSide(t);
      int across = 3 - along;
      if (isHalved(t, 0) || isHalved(t, across) || isHalved(other, across)) {
        halve(t, 0);
      } else if (isHalved(t, along) || isHalved(other, along)) {
        halve(t, along);
        halve(other, along);
      }
    }
  }

  private void number() {
    for (int s = 0; s < middle.length; s++) {
      middle[s] = halved[s] ? mesh.vertexCount() + count++ : Mesh.NONE;
    }
  }

  private boolean isHalved(int t, int k) {
    return halved[mesh.side(t, k)];
  }

  /** Halves a side; the triangles on both hands are looked at again. */
  private void halve(int t, int k) {
    if (isHalved(t, k)) {
      return;
    }
    halved[mesh.side(t, k)] = true;
    lookAt(t);
    int other = mesh.neighbour(t, k);
    if (other != Mesh.NONE) {
      lookAt(other);
    }
  }

  private void lookAt(int t) {
    if (!waiting[t]) {
      waiting[t] = true;
      pending[pendingCount++] = t;
    }
  }

  private double height(int t) {
    double longest = 0;
    for (int k = 0; k < 3; k++) {
      longest = Math.max(longest, mesh.sideLength(mesh.side(t, k)));
    }
    return 2 * mesh.area(t) / longest;
  }

  private double extent() {
    double[] x = new double[mesh.vertexCount()];
    double[] y = new double[mesh.vertexCount()];
    for (int v = 0; v < x.length; v++) {
      x[v] = mesh.x(v);
      y[v] = mesh.y(v);
    }
    return Math.max(spread(x), spread(y));
  }

  private static double spread(double[] values) {
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    for (double value : values) {
      least = Math.min(least, value);
      most = Math.max(most, value);
    }
    return most - least;
  }
}
