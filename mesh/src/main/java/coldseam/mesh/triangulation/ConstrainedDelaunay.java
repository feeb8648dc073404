package coldseam.mesh.triangulation;

import java.util.Arrays;

/**
 * A triangulation of a box that keeps given edges and is Delaunay otherwise: no vertex lies inside
 * the circle of a triangle from which it can be seen across no kept edge. Vertices are inserted one
 * by one and edges flipped (Lawson 1977); a kept edge is recovered by flipping what crosses it
 * (Sloan 1993). Vertices 0 to 3 are the corners of the box.
 */
final class ConstrainedDelaunay extends Triangulation {
  /** The first vertex that is not a corner of the box. */
  static final int FIRST = 4;

  /** How far the box reaches beyond the vertices, in parts of their extent. */
  private static final double MARGIN = 4;

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
    super(2 * lines.x.length + 256);
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
    int first = triangleCount;
    int v = putInside(t, px, py);
    push(3 * t);
    push(3 * first);
    push(3 * first + 3);
    restore();
    return v;
  }

  /** Inserts a vertex on a side; if the side is kept, so are its two parts. */
  int insertOn(int h, double px, double py) {
    int g = twin[h];
    int right = 3 * triangleCount;
    int left = right + 3;
    int v = putOn(h, px, py);
    push(previous(h));
    push(next(right));
    push(previous(g));
    push(next(left));
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
    int first = cornerAt(a);
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
    int[] crossing = crossing(a, b);
    int capacity = crossing.length / 2;
    int head = 0;
    int waiting = capacity;
    while (waiting > 0) {
      int p = crossing[2 * head];
      int q = crossing[2 * head + 1];
      int crossed = find(p, q);
      int left = apex(crossed);
      int right = apex(twin[crossed]);
      boolean convex = orientation(right, q, left) > 0 && orientation(left, p, right) > 0;
      boolean still = true;
      if (convex) {
        flipAndStack(crossed);
        p = left;
        q = right;
        boolean atEnd = p == a || q == a || p == b || q == b;
        still = !atEnd && orientation(a, b, p) != orientation(a, b, q);
      }
      if (still) {
        int tail = (head + waiting) % capacity;
        crossing[2 * tail] = p;
        crossing[2 * tail + 1] = q;
      } else {
        waiting--;
      }
      head = head + 1 == capacity ? 0 : head + 1;
    }
  }

  /** The sides that cross the way from a to b, two vertices each. */
  private int[] crossing(int a, int b) {
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
        return Arrays.copyOf(crossing, count);
      }
      h = onwards(across, orientation(a, b, apex(across)));
    }
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

  private void push(int h) {
    if (stackSize == stack.length) {
      stack = Arrays.copyOf(stack, 2 * stackSize);
    }
    stack[stackSize++] = h;
  }
}
