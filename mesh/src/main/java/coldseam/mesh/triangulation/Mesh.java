package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Point;

/**
 * Conforming triangles. Corners of a triangle run counter-clockwise; side k lies opposite corner k,
 * from corner k+1 to corner k+2 (mod 3). Corner 0 is the newest vertex: bisection splits side 0.
 *
 * <p>Each vertex has exactly one fan of triangles around it: where the meshed region pinches to a
 * point, that point is several vertices at the same place.
 *
 * <p>Triangles, vertices and sides are numbered from 0. "Sides" below are the distinct sides of the
 * mesh, each shared by one or two triangles.
 */
public final class Mesh {
  /** No neighbour, or no partition edge. */
  public static final int NONE = -1;

  private Mesh() {}

  /**
   * Wraps arrays; they are copied.
   *
   * @param origin the point of the drawing at local (0, 0)
   * @param x local x of each vertex, m
   * @param y local y of each vertex, m
   * @param corners three vertex indices a triangle, counter-clockwise, newest vertex first
   * @param labels label of each triangle
   * @param partitionEdges for side k of triangle t at 3t + k: the partition edge the side lies on,
   *     or NONE
   * @return the mesh with neighbours and sides worked out
   * @throws IllegalArgumentException if array lengths do not match, a triangle is not
   *     counter-clockwise, or more than two triangles share a side
   */
  public static Mesh of(
      Point origin, double[] x, double[] y, int[] corners, int[] labels, int[] partitionEdges) {
    throw new UnsupportedOperationException();
  }

  /** The point of the drawing at local (0, 0). */
  public Point origin() {
    throw new UnsupportedOperationException();
  }

  public int vertexCount() {
    throw new UnsupportedOperationException();
  }

  /** Local x of a vertex, m. */
  public double x(int vertex) {
    throw new UnsupportedOperationException();
  }

  /** Local y of a vertex, m. */
  public double y(int vertex) {
    throw new UnsupportedOperationException();
  }

  public int triangleCount() {
    throw new UnsupportedOperationException();
  }

  /** Vertex at a corner of a triangle, k = 0, 1, 2. */
  public int vertex(int triangle, int k) {
    throw new UnsupportedOperationException();
  }

  /** Triangle across side k, or NONE on the outline of the meshed region. */
  public int neighbour(int triangle, int k) {
    throw new UnsupportedOperationException();
  }

  /** Label of a triangle. */
  public int label(int triangle) {
    throw new UnsupportedOperationException();
  }

  /** Partition edge that side k of a triangle lies on, or NONE. */
  public int partitionEdge(int triangle, int k) {
    throw new UnsupportedOperationException();
  }

  /** How many distinct sides there are. */
  public int sideCount() {
    throw new UnsupportedOperationException();
  }

  /** Index of side k of a triangle among the distinct sides. */
  public int side(int triangle, int k) {
    throw new UnsupportedOperationException();
  }

  /** Lower-numbered vertex of a distinct side. */
  public int sideStart(int side) {
    throw new UnsupportedOperationException();
  }

  /** Higher-numbered vertex of a distinct side. */
  public int sideEnd(int side) {
    throw new UnsupportedOperationException();
  }

  /** Area of a triangle, m². */
  public double area(int triangle) {
    throw new UnsupportedOperationException();
  }

  /**
   * A triangle that contains a local point (on a side counts), or NONE if none does. Thread-safe.
   *
   * @param x local x, m
   * @param y local y, m
   * @return the triangle or NONE
   */
  public int locate(double x, double y) {
    throw new UnsupportedOperationException();
  }
}
