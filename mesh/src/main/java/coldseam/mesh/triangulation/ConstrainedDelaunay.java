package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Predicates;
import java.util.Arrays;

/**
 * A triangulation of a box that keeps given edges and is Delaunay otherwise: no vertex lies inside
 * the circle of a triangle from which it can be seen across no kept edge. Vertices are inserted one
 * by one and edges flipped (Lawson 1977); a kept edge is recovered by flipping what crosses it
 * (Sloan 1993).
 *
 * <p>Triangles are triples of half-edges: half-edge h = 3t + k is the side of triangle t opposite
 * its corner k, from corner k+1 to corner k+2, t on its left. Vertices 0 to 3 are the corners of
 * the box. No triangle is ever removed.
 */
final class ConstrainedDelaunay {
  /** No half-edge across (outline of the box); no kept edge. */
  static final int NONE = -1;

  /** A vertex of the drawing or of the box. */
  static final int GIVEN = -2;

  /** The first vertex that is not a corner of the box. */
  static final int FIRST = 4;

  /** How far the box reaches beyond the vertices, in parts of their extent. */
  private static final double MARGIN = 4;

  double[] x;
  double[] y;

  /** For each vertex the kept edge it was put on, NONE if on none, GIVEN if of the drawing. */
  int[] edgeOf;

  int vertexCount;

  /** Vertex at each corner. */
  int[] corner;

  /** The same side seen from the other triangle. */
  int[] twin;

  /** What is kept there: NONE or a number that the caller gives. */
  int[] kept;

  /** The face a triangle lies in, once {@link #fillFaces} was called. */
  int[] face;

  int triangleCount;

  /** Triangles changed since the caller last set {@link #touchedCount} to 0, repeats included. */
  int[] touched = new int[256];

  int touchedCount;

  /** A corner at each vertex. */
  private int[] cornerAt;

  private int[] stack = new int[256];
  private int stackSize;
  private int lastTriangle;

  /**
   * Triangulates a drawing, each of its edges kept under its own number.
   *
   * @param lines the drawing; its vertex v becomes vertex {@link #FIRST} + v
   * @throws IllegalArgumentException if two vertices coincide or edges cross
   */
  ConstrainedDelaunay(Linework lines) {
    int vertices = 2 * lines.x.length + 256;
    x = new double[vertices];
    y = new double[vertices];
    edgeOf = new int[vertices];
    cornerAt = new int[vertices];
    corner = new int[6 * vertices];
    twin = new int[6 * vertices];
    kept = new int[6 * vertices];
    face = new int[2 * vertices];
    double reach = MARGIN * lines.extent();
    addVertex(lines.minX - reach, lines.minY - reach);
    addVertex(lines.maxX + reach, lines.minY - reach);
    addVertex(lines.maxX + reach, lines.maxY + reach);
    addVertex(lines.minX - reach, lines.maxY + reach);
    int lower = addTriangle();
    int upper = addTriangle();
    setCorners(lower, 0, 1, 2);
    setCorners(upper, 0, 2, 3);
    Arrays.fill(twin, 0, 6, NONE);
    Arrays.fill(kept, 0, 6, NONE);
    join(1, 5);
    for (int v = 0; v < lines.x.length; v++) {
      if (insert(lines.x[v], lines.y[v]) != FIRST + v) {
        throw new IllegalArgumentException(
            "two vertices at (" + lines.x[v] + ", " + lines.y[v] + ")");
      }
    }
    Arrays.fill(edgeOf, 0, vertexCount, GIVEN);
    for (int e = 0; e < lines.start.length; e++) {
      keep(FIRST + lines.start[e], FIRST + lines.end[e], e);
    }
    touchedCount = 0;
  }

  static int next(int h) {
    return h % 3 == 2 ? h - 2 : h + 1;
  }

  static int previous(int h) {
    return h % 3 == 0 ? h + 2 : h - 1;
  }

  int start(int h) {
    return corner[next(h)];
  }

  int end(int h) {
    return corner[previous(h)];
  }

  int apex(int h) {
    return corner[h];
  }

  int keptAt(int h) {
    return kept[h];
  }

  double length(int h) {
    return distance(start(h), end(h));
  }

  double distance(int a, int b) {
    return Math.hypot(x[b] - x[a], y[b] - y[a]);
  }

  int orientation(int a, int b, int c) {
    return Predicates.orientation(x[a], y[a], x[b], y[b], x[c], y[c]);
  }

  int orientation(int a, int b, double px, double py) {
    return Predicates.orientation(x[a], y[a], x[b], y[b], px, py);
  }

  /** Whether a point lies inside the circle of a triangle. */
  boolean circleContains(int t, double px, double py) {
    int a = corner[3 * t];
    int b = corner[3 * t + 1];
    int c = corner[3 * t + 2];
    return Predicates.inCircle(x[a], y[a], x[b], y[b], x[c], y[c], px, py) > 0;
  }

  /** The half-edge from a to b, or NONE. */
  int find(int a, int b) {
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
  int cornerAt(int vertex) {
    return cornerAt[vertex];
  }

  /** The corner at the same vertex in the next triangle counter-clockwise, or NONE. */
  int counterClockwise(int c) {
    int across = twin[next(c)];
    return across == NONE ? NONE : next(across);
  }

  /** The corner at the same vertex in the next triangle clockwise, or NONE. */
  int clockwise(int c) {
    int across = twin[previous(c)];
    return across == NONE ? NONE : previous(across);
  }

  /**
   * Inserts a vertex wherever it lies.
   *
   * @return the vertex: an old one if there is one at exactly this place
   */
  int insert(double px, double py) {
    int t = locate(px, py);
    int on = NONE;
    for (int k = 0; k < 3; k++) {
      int h = 3 * t + k;
      if (orientation(start(h), end(h), px, py) == 0) {
        if (on != NONE) {
          return corner[3 * t + 3 - k - on % 3];
        }
        on = h;
      }
    }
    return on == NONE ? insertInside(t, px, py) : insertOn(on, px, py);
  }

  /** Inserts a vertex inside a triangle. */
  int insertInside(int t, double px, double py) {
    int v = addVertex(px, py);
    int h = 3 * t;
    int a = corner[h];
    int b = corner[h + 1];
    int c = corner[h + 2];
    int twinA = twin[h + 1];
    int keptA = kept[h + 1];
    int twinB = twin[h + 2];
    int keptB = kept[h + 2];
    int second = addTriangle();
    int third = addTriangle();
    face[second] = face[t];
    face[third] = face[t];
    // t keeps the side b-c, the second gets c-a, the third a-b; v is corner 0 of each.
    setCorners(t, v, b, c);
    setCorners(second, v, c, a);
    setCorners(third, v, a, b);
    kept[3 * second] = keptA;
    join(3 * second, twinA);
    kept[3 * third] = keptB;
    join(3 * third, twinB);
    joinFree(3 * t + 1, 3 * second + 2);
    joinFree(3 * second + 1, 3 * third + 2);
    joinFree(3 * third + 1, 3 * t + 2);
    touch(t);
    push(3 * t);
    push(3 * second);
    push(3 * third);
    restore();
    return v;
  }

  /** Inserts a vertex on a side; if the side is kept, so are its two parts. */
  int insertOn(int h, double px, double py) {
    int v = addVertex(px, py);
    edgeOf[v] = kept[h];
    int g = twin[h];
    int right = splitAt(h, v);
    if (g != NONE) {
      int left = splitAt(g, v);
      // h now runs from its start to v, `right` from v to its end; likewise g and `left`.
      join(h, left);
      join(right, g);
      push(previous(g));
      push(next(left));
    } else {
      twin[h] = NONE;
      twin[right] = NONE;
    }
    push(previous(h));
    push(next(right));
    restore();
    return v;
  }

  /**
   * Keeps the straight edge between two vertices. Where it passes exactly through vertices or runs
   * along kept edges, each part is kept.
   *
   * @param name given to those parts that are not kept yet
   */
  void keep(int from, int to, int name) {
    int a = from;
    while (a != to) {
      int h = find(a, to);
      int reached = to;
      if (h == NONE) {
        reached = firstVertexOn(a, to);
        if (find(a, reached) == NONE) {
          clearWay(a, reached);
        }
        h = find(a, reached);
      }
      if (kept[h] == NONE) {
        setKept(h, name);
      }
      a = reached;
    }
    restore();
  }

  /** Lets a kept edge go; it is flipped if it is not Delaunay. */
  void release(int h) {
    setKept(h, NONE);
    touch(h / 3);
    touch(twin[h] / 3);
    push(h);
    restore();
  }

  void setKept(int h, int name) {
    kept[h] = name;
    if (twin[h] != NONE) {
      kept[twin[h]] = name;
    }
  }

  /** Gives each triangle its face: known beside kept edges, spread from there. */
  void fillFaces(Linework lines) {
    Arrays.fill(face, 0, triangleCount, Integer.MIN_VALUE);
    stackSize = 0;
    for (int h = 0; h < 3 * triangleCount; h++) {
      int e = kept[h];
      if (twin[h] == NONE || e != NONE && face[h / 3] == Integer.MIN_VALUE) {
        boolean along = e != NONE && runsAlong(h, lines, e);
        face[h / 3] = e == NONE ? NONE : along ? lines.leftFace[e] : lines.rightFace[e];
        push(h / 3);
      }
    }
    while (stackSize > 0) {
      int t = stack[--stackSize];
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        if (kept[h] == NONE && twin[h] != NONE && face[twin[h] / 3] == Integer.MIN_VALUE) {
          face[twin[h] / 3] = face[t];
          push(twin[h] / 3);
        }
      }
    }
  }

  /** Whether h runs in the direction of the edge on which it lies. */
  private boolean runsAlong(int h, Linework lines, int edge) {
    int a = lines.start[edge] + FIRST;
    int b = lines.end[edge] + FIRST;
    double along =
        (x[end(h)] - x[start(h)]) * (x[b] - x[a]) + (y[end(h)] - y[start(h)]) * (y[b] - y[a]);
    return along > 0;
  }

  /** A triangle that contains a point of the box. */
  int locate(double px, double py) {
    int t = lastTriangle;
    int entered = NONE;
    int steps = 0;
    int turn = 0;
    while (steps++ < 2 * triangleCount + 16) {
      int across = NONE;
      turn = turn == 2 ? 0 : turn + 1;
      for (int i = 0; i < 3 && across == NONE; i++) {
        int h = 3 * t + (i + turn) % 3;
        if (h != entered && twin[h] != NONE && orientation(start(h), end(h), px, py) < 0) {
          across = h;
        }
      }
      if (across == NONE) {
        lastTriangle = t;
        return t;
      }
      entered = twin[across];
      t = entered / 3;
    }
    return search(px, py);
  }

  /** Looks at every triangle: the walk may go round in a circle where edges are kept. */
  private int search(double px, double py) {
    for (int t = 0; t < triangleCount; t++) {
      int h = 3 * t;
      if (orientation(start(h), end(h), px, py) >= 0
          && orientation(start(h + 1), end(h + 1), px, py) >= 0
          && orientation(start(h + 2), end(h + 2), px, py) >= 0) {
        return t;
      }
    }
    throw new IllegalStateException("no triangle at (" + px + ", " + py + ")");
  }

  /** Whether the straight way between two vertices meets no other vertex and no kept edge. */
  boolean isClear(int a, int b) {
    if (find(a, b) != NONE) {
      return true;
    }
    int h = leavingCorner(a, b);
    if (orientation(a, b, start(h)) == 0) {
      return false;
    }
    while (kept[h] == NONE) {
      int across = twin[h];
      if (apex(across) == b) {
        return true;
      }
      int hand = orientation(a, b, apex(across));
      if (hand == 0) {
        return false;
      }
      h = onwards(across, hand);
    }
    return false;
  }

  /** The first vertex met on the way from a to b that lies exactly on it: at last b. */
  private int firstVertexOn(int a, int b) {
    int c = leavingCorner(a, b);
    if (orientation(a, b, corner[next(c)]) == 0) {
      return corner[next(c)];
    }
    int h = c;
    while (true) {
      int across = twin[h];
      int tip = apex(across);
      if (tip == b) {
        return b;
      }
      int hand = orientation(a, b, tip);
      if (hand == 0) {
        return tip;
      }
      h = onwards(across, hand);
    }
  }

  /**
   * The side by which a way leaves the triangle that it enters by a side, whose start then lies on
   * the left of the way and its end on the right, if the apex lies on the given hand.
   */
  private static int onwards(int entered, int hand) {
    return hand > 0 ? next(entered) : previous(entered);
  }

  /** The corner at a through whose triangle the way to b leaves, or along whose side it runs. */
  private int leavingCorner(int a, int b) {
    int first = cornerAt[a];
    int c = first;
    do {
      int p = corner[next(c)];
      int q = corner[previous(c)];
      int handP = orientation(a, b, p);
      if (handP <= 0 && orientation(a, b, q) > 0 && (handP < 0 || isAhead(a, b, p))) {
        return c;
      }
      c = counterClockwise(c);
    } while (c != first && c != NONE);
    throw new IllegalStateException("no triangle from vertex " + a + " towards " + b);
  }

  private boolean isAhead(int a, int b, int p) {
    return (x[p] - x[a]) * (x[b] - x[a]) + (y[p] - y[a]) * (y[b] - y[a]) > 0;
  }

  /** Flips the sides that cross the way from a to b until none does. */
  private void clearWay(int a, int b) {
    int[] crossing = new int[64];
    int count = 0;
    int h = leavingCorner(a, b);
    while (true) {
      if (kept[h] != NONE) {
        throw new IllegalArgumentException("two edges of the drawing cross");
      }
      if (count + 2 > crossing.length) {
        crossing = Arrays.copyOf(crossing, 2 * crossing.length);
      }
      crossing[count++] = start(h);
      crossing[count++] = end(h);
      int across = twin[h];
      if (apex(across) == b) {
        break;
      }
      h = onwards(across, orientation(a, b, apex(across)));
    }
    int head = 0;
    int waiting = count / 2;
    int capacity = count / 2;
    while (waiting > 0) {
      int p = crossing[2 * head];
      int q = crossing[2 * head + 1];
      int crossed = find(p, q);
      int slot = head;
      head = head + 1 == capacity ? 0 : head + 1;
      waiting--;
      int left = apex(crossed);
      int right = apex(twin[crossed]);
      boolean convex = orientation(right, q, left) > 0 && orientation(left, p, right) > 0;
      if (convex) {
        flipAndStack(crossed);
        p = left;
        q = right;
        if (p == a || q == a || p == b || q == b || orientation(a, b, p) == orientation(a, b, q)) {
          continue;
        }
      }
      int tail = (slot + waiting + 1) % capacity;
      crossing[2 * tail] = p;
      crossing[2 * tail + 1] = q;
      waiting++;
    }
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

  /** Flips stacked sides that are neither kept nor Delaunay, and what that brings along. */
  private void restore() {
    while (stackSize > 0) {
      int h = stack[--stackSize];
      int g = twin[h];
      if (g == NONE || kept[h] != NONE) {
        continue;
      }
      int opposite = apex(g);
      if (circleContains(h / 3, x[opposite], y[opposite])) {
        flipAndStack(h);
      }
    }
  }

  private void flipAndStack(int h) {
    int g = twin[h];
    flip(h);
    push(h);
    push(previous(h));
    push(g);
    push(previous(g));
    push(next(h));
  }

  /** Replaces the side h by the other diagonal of its quadrilateral, then at next(h). */
  private void flip(int h) {
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

  private void join(int h, int g) {
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

  private void setCorners(int t, int a, int b, int c) {
    corner[3 * t] = a;
    corner[3 * t + 1] = b;
    corner[3 * t + 2] = c;
    cornerAt[a] = 3 * t;
    cornerAt[b] = 3 * t + 1;
    cornerAt[c] = 3 * t + 2;
  }

  private int addVertex(double px, double py) {
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

  private int addTriangle() {
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
  void touch(int t) {
    if (touchedCount == touched.length) {
      touched = Arrays.copyOf(touched, 2 * touchedCount);
    }
    touched[touchedCount++] = t;
  }

  private void push(int h) {
    if (stackSize == stack.length) {
      stack = Arrays.copyOf(stack, 2 * stackSize);
    }
    stack[stackSize++] = h;
  }
}
