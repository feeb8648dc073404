package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Predicates;
import java.util.Arrays;

/**
 * Triangles that share their sides, and the changes made to them: a vertex put inside a triangle or
 * on a side, and a side flipped. No triangle or vertex is ever removed.
 *
 * <p>Triangles are triples of half-edges: half-edge h = 3t + k is the side of triangle t opposite
 * its corner k, from corner k+1 to corner k+2, t on its left. The arrays are open to this package,
 * whose inner loops read them; they grow, so they are not to be held on to.
 */
class Triangulation {
  /** No half-edge across; no kept edge. */
  static final int NONE = -1;

  /** A vertex of the drawing or of the box. */
  static final int GIVEN = -2;

  double[] x;
  double[] y;

  /** For each vertex the kept edge it was put on, NONE if on none, GIVEN if of the drawing. */
  int[] edgeOf;

  int vertexCount;

  /** Vertex at each corner. */
  int[] corner;

  /** The same side seen from the other triangle. */
  int[] twin;

  /** What is kept there: a partition edge, a rung, or NONE. */
  int[] kept;

  /** The face a triangle lies in, once {@link Faces#fill} was called. */
  int[] face;

  int triangleCount;

  /** Triangles changed since the caller last set {@link #touchedCount} to 0, repeats included. */
  int[] touched = new int[256];

  int touchedCount;

  /** A corner at each vertex. */
  private int[] cornerAt;

  /** Makes room for so many vertices at first. */
  Triangulation(int vertices) {
    x = new double[vertices];
    y = new double[vertices];
    edgeOf = new int[vertices];
    cornerAt = new int[vertices];
    corner = new int[6 * vertices];
    twin = new int[6 * vertices];
    kept = new int[6 * vertices];
    face = new int[2 * vertices];
  }

  static int next(int h) {
    return h % 3 == 2 ? h - 2 : h + 1;
  }

  static int previous(int h) {
    return h % 3 == 0 ? h + 2 : h - 1;
  }

  final int start(int h) {
    return corner[next(h)];
  }

  final int end(int h) {
    return corner[previous(h)];
  }

  final int apex(int h) {
    return corner[h];
  }

  final double length(int h) {
    return distance(start(h), end(h));
  }

  final double distance(int a, int b) {
    return Math.hypot(x[b] - x[a], y[b] - y[a]);
  }

  final int orientation(int a, int b, int c) {
    return Predicates.orientation(x[a], y[a], x[b], y[b], x[c], y[c]);
  }

  final int orientation(int a, int b, double px, double py) {
    return Predicates.orientation(x[a], y[a], x[b], y[b], px, py);
  }

  /** Whether a point lies inside the circle of a triangle. */
  final boolean circleContains(int t, double px, double py) {
    int a = corner[3 * t];
    int b = corner[3 * t + 1];
    int c = corner[3 * t + 2];
    return Predicates.inCircle(x[a], y[a], x[b], y[b], x[c], y[c], px, py) > 0;
  }

  /** The half-edge from a to b, or NONE. */
  final int find(int a, int b) {
    int first = cornerAt[a];
    int c = first;
    do {
      if (corner[next(c)] == b) {
        return previous(c);
      }
      c = counterClockwise(c);
    } while (c != first && c != NONE);
    if (c == NONE) {
      for (c = clockwise(first); c != NONE; c = clockwise(c)) {
        if (corner[next(c)] == b) {
          return previous(c);
        }
      }
    }
    return NONE;
  }

  /** A corner at a vertex. */
  final int cornerAt(int vertex) {
    return cornerAt[vertex];
  }

  /** The corner at the same vertex in the next triangle counter-clockwise, or NONE. */
  final int counterClockwise(int c) {
    int across = twin[next(c)];
    return across == NONE ? NONE : next(across);
  }

  /** The corner at the same vertex in the next triangle clockwise, or NONE. */
  final int clockwise(int c) {
    int across = twin[previous(c)];
    return across == NONE ? NONE : previous(across);
  }

  final void setKept(int h, int name) {
    kept[h] = name;
    if (twin[h] != NONE) {
      kept[twin[h]] = name;
    }
  }

  /** Puts a vertex inside a triangle; two triangles are added. */
  final int putInside(int t, double px, double py) {
    int v = addVertex(px, py);
    int h = 3 * t;
    int a = corner[h];
    int b = corner[h + 1];
    int c = corner[h + 2];
    int beyondB = twin[h + 1];
    int keptB = kept[h + 1];
    int beyondC = twin[h + 2];
    int keptC = kept[h + 2];
    int second = addTriangle();
    int third = addTriangle();
    face[second] = face[t];
    face[third] = face[t];
    // t keeps the side b-c, the second gets c-a, the third a-b; v is corner 0 of each.
    setCorners(t, v, b, c);
    setCorners(second, v, c, a);
    setCorners(third, v, a, b);
    kept[3 * second] = keptB;
    join(3 * second, beyondB);
    kept[3 * third] = keptC;
    join(3 * third, beyondC);
    joinFree(3 * t + 1, 3 * second + 2);
    joinFree(3 * second + 1, 3 * third + 2);
    joinFree(3 * third + 1, 3 * t + 2);
    touch(t);
    return v;
  }

  /**
   * Puts a vertex on a side with triangles on both hands; if the side is kept, so are its parts.
   * Two triangles are added, the one on the left of h first: their side 0 runs on from the vertex.
   */
  final int putOn(int h, double px, double py) {
    int v = addVertex(px, py);
    edgeOf[v] = kept[h];
    int g = twin[h];
    int right = splitAt(h, v);
    int left = splitAt(g, v);
    // h now runs from its start to v, `right` from v to its end; likewise g and `left`.
    join(h, left);
    join(right, g);
    return v;
  }

  /** Splits the triangle of h at vertex v on h: h keeps the start; returns the part from v on. */
  private int splitAt(int h, int v) {
    int t = h / 3;
    int a = apex(h);
    int e = end(h);
    int outer = twin[next(h)];
    int outerKept = kept[next(h)];
    int added = addTriangle();
    face[added] = face[t];
    corner[previous(h)] = v;
    setCorners(added, a, v, e);
    cornerAt[a] = h;
    int right = 3 * added;
    kept[right] = kept[h];
    twin[right] = NONE;
    kept[right + 1] = outerKept;
    join(right + 1, outer);
    joinFree(next(h), right + 2);
    touch(t);
    return right;
  }

  /** Replaces the side h by the other diagonal of its quadrilateral, then at next(h). */
  final void flip(int h) {
    int g = twin[h];
    int a = corner[h];
    int b = corner[g];
    int hn = next(h);
    int hp = previous(h);
    int gn = next(g);
    int gp = previous(g);
    int fromEnd = twin[hn];
    int fromEndKept = kept[hn];
    int fromStart = twin[gn];
    int fromStartKept = kept[gn];
    int u = corner[hn];
    int w = corner[gn];
    corner[hp] = b;
    corner[gp] = a;
    kept[h] = fromStartKept;
    join(h, fromStart);
    kept[g] = fromEndKept;
    join(g, fromEnd);
    joinFree(hn, gn);
    cornerAt[a] = h;
    cornerAt[b] = g;
    cornerAt[u] = hn;
    cornerAt[w] = gn;
    touch(h / 3);
    touch(g / 3);
  }

  final void join(int h, int g) {
    twin[h] = g;
    if (g != NONE) {
      twin[g] = h;
    }
  }

  private void joinFree(int h, int g) {
    kept[h] = NONE;
    kept[g] = NONE;
    join(h, g);
  }

  final void setCorners(int t, int a, int b, int c) {
    corner[3 * t] = a;
    corner[3 * t + 1] = b;
    corner[3 * t + 2] = c;
    cornerAt[a] = 3 * t;
    cornerAt[b] = 3 * t + 1;
    cornerAt[c] = 3 * t + 2;
  }

  final int addVertex(double px, double py) {
    if (vertexCount == x.length) {
      x = Arrays.copyOf(x, 2 * vertexCount);
      y = Arrays.copyOf(y, 2 * vertexCount);
      edgeOf = Arrays.copyOf(edgeOf, 2 * vertexCount);
      cornerAt = Arrays.copyOf(cornerAt, 2 * vertexCount);
    }
    x[vertexCount] = px;
    y[vertexCount] = py;
    edgeOf[vertexCount] = NONE;
    return vertexCount++;
  }

  final int addTriangle() {
    if (triangleCount == face.length) {
      face = Arrays.copyOf(face, 2 * triangleCount);
      corner = Arrays.copyOf(corner, 6 * triangleCount);
      twin = Arrays.copyOf(twin, 6 * triangleCount);
      kept = Arrays.copyOf(kept, 6 * triangleCount);
    }
    touch(triangleCount);
    return triangleCount++;
  }

  /** Notes a triangle as changed. */
  final void touch(int t) {
    if (touchedCount == touched.length) {
      touched = Arrays.copyOf(touched, 2 * touchedCount);
    }
    touched[touchedCount++] = t;
  }
}
