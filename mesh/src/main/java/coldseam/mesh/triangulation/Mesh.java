package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Predicates;
import java.util.Arrays;

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

  private final Point origin;
  private final double[] x;
  private final double[] y;
  private final int[] corners;
  private final int[] labels;
  private final int[] partitionEdges;
  private final int[] neighbours;
  private final int[] sides;
  private final int[] sideStarts;
  private final int[] sideEnds;
  private volatile Locator locator;

  private Mesh(
      Point origin, double[] x, double[] y, int[] corners, int[] labels, int[] partitionEdges) {
    this.origin = origin;
    this.x = x;
    this.y = y;
    this.corners = corners;
    this.labels = labels;
    this.partitionEdges = partitionEdges;
    neighbours = new int[corners.length];
    sides = new int[corners.length];
    int count = findSides();
    sideStarts = new int[count];
    sideEnds = new int[count];
    for (int h = 0; h < corners.length; h++) {
      int a = corners[nextCorner(h)];
      int b = corners[previousCorner(h)];
      sideStarts[sides[h]] = Math.min(a, b);
      sideEnds[sides[h]] = Math.max(a, b);
    }
  }

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
    if (x.length != y.length
        || corners.length != 3 * labels.length
        || corners.length != partitionEdges.length) {
      throw new IllegalArgumentException("the arrays of a mesh do not match in length");
    }
    for (int corner : corners) {
      if (corner < 0 || corner >= x.length) {
        throw new IllegalArgumentException("a mesh has no vertex " + corner);
      }
    }
    for (int t = 0; t < labels.length; t++) {
      int a = corners[3 * t];
      int b = corners[3 * t + 1];
      int c = corners[3 * t + 2];
      if (Predicates.orientation(x[a], y[a], x[b], y[b], x[c], y[c]) <= 0) {
        throw new IllegalArgumentException("triangle " + t + " is not counter-clockwise");
      }
    }
    return new Mesh(
        origin, x.clone(), y.clone(), corners.clone(), labels.clone(), partitionEdges.clone());
  }

  /** The point of the drawing at local (0, 0). */
  public Point origin() {
    return origin;
  }

  public int vertexCount() {
    return x.length;
  }

  /** Local x of a vertex, m. */
  public double x(int vertex) {
    return x[vertex];
  }

  /** Local y of a vertex, m. */
  public double y(int vertex) {
    return y[vertex];
  }

  public int triangleCount() {
    return labels.length;
  }

  /** Vertex at a corner of a triangle, k = 0, 1, 2. */
  public int vertex(int triangle, int k) {
    return corners[3 * triangle + k];
  }

  /** Triangle across side k, or NONE on the outline of the meshed region. */
  public int neighbour(int triangle, int k) {
    return neighbours[3 * triangle + k];
  }

  /** Label of a triangle. */
  public int label(int triangle) {
    return labels[triangle];
  }

  /** Partition edge that side k of a triangle lies on, or NONE. */
  public int partitionEdge(int triangle, int k) {
    return partitionEdges[3 * triangle + k];
  }

  /** How many distinct sides there are. */
  public int sideCount() {
    return sideStarts.length;
  }

  /** Index of side k of a triangle among the distinct sides. */
  public int side(int triangle, int k) {
    return sides[3 * triangle + k];
  }

  /** Lower-numbered vertex of a distinct side. */
  public int sideStart(int side) {
    return sideStarts[side];
  }

  /** Higher-numbered vertex of a distinct side. */
  public int sideEnd(int side) {
    return sideEnds[side];
  }

  /** Length of a distinct side, m. */
  public double sideLength(int side) {
    int a = sideStarts[side];
    int b = sideEnds[side];
    return Math.hypot(x[b] - x[a], y[b] - y[a]);
  }

  /** Area of a triangle, m². */
  public double area(int triangle) {
    int a = corners[3 * triangle];
    int b = corners[3 * triangle + 1];
    int c = corners[3 * triangle + 2];
    return 0.5 * ((x[b] - x[a]) * (y[c] - y[a]) - (y[b] - y[a]) * (x[c] - x[a]));
  }

  /**
   * A triangle that contains a local point (on a side counts), or NONE if none does. A point
   * outside, but nearer to the mesh than 1e-9 of the mesh's extent, counts as on the nearest side.
   * Thread-safe.
   *
   * @param x local x, m
   * @param y local y, m
   * @return the triangle or NONE
   */
  public int locate(double x, double y) {
    Locator ready = locator;
    if (ready == null) {
      ready = new Locator(this);
      locator = ready;
    }
    return ready.locate(x, y);
  }

  private static int nextCorner(int h) {
    return h % 3 == 2 ? h - 2 : h + 1;
  }

  private static int previousCorner(int h) {
    return h % 3 == 0 ? h + 2 : h - 1;
  }

  /**
   * Fills the neighbours and numbers the sides in the order in which triangles name them. Sides
   * wait, in one list per lower vertex, for their other triangle.
   */
  private int findSides() {
    int[] firstWaiting = new int[x.length];
    Arrays.fill(firstWaiting, NONE);
    int[] nextWaiting = new int[corners.length];
    Arrays.fill(neighbours, NONE);
    int count = 0;
    for (int h = 0; h < corners.length; h++) {
      int a = corners[nextCorner(h)];
      int b = corners[previousCorner(h)];
      int low = Math.min(a, b);
      int g = firstWaiting[low];
      while (g != NONE && !joins(g, a, b)) {
        g = nextWaiting[g];
      }
      if (g == NONE) {
        sides[h] = count++;
        nextWaiting[h] = firstWaiting[low];
        firstWaiting[low] = h;
        continue;
      }
      if (neighbours[g] != NONE || corners[nextCorner(g)] == a) {
        throw new IllegalArgumentException(
            "more than one triangle lies on one hand of the side from " + a + " to " + b);
      }
      sides[h] = sides[g];
      neighbours[h] = g / 3;
      neighbours[g] = h / 3;
    }
    return count;
  }

  private boolean joins(int h, int a, int b) {
    int start = corners[nextCorner(h)];
    int end = corners[previousCorner(h)];
    return start == a && end == b || start == b && end == a;
  }
}
