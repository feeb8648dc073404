package coldseam.mesh.triangulation;

import java.util.Arrays;
import java.util.List;

/**
 * The thin parts of faces as rows of cells. A cell is a quadrilateral of two triangles (or one
 * triangle, where a part tapers to a point): two of its sides lie on partition edges, the others
 * are rungs, kept edges across the face. Triangles in a cell are exempt from refinement. A vertex
 * put on one side of a cell gets a partner on the other and a rung between the two, so that cells
 * stay whole; what would become too short for a cell is given back to refinement instead.
 */
final class Ladders {
  /** The name of a rung among kept edges. */
  static final int RUNG = -2;

  /** A foot is not put nearer than this many widths to a vertex that can serve instead. */
  private static final double SNAP = 1.5;

  /** How far a rung retreats, in widths: what it leaves behind has good angles. */
  private static final double RETREAT = 2;

  /** No rung is longer than this many widths. */
  private static final double LONGEST_RUNG = 8;

  /** The triangle beyond a rung is at least this part of the rung's length high. */
  private static final double LEAST_ROOM = 0.1;

  private final ConstrainedDelaunay plane;
  private final Linework lines;

  /** For each triangle its cell, or NONE. */
  private int[] cellOf;

  /** Four vertices a cell: a, b along one side; c, d along the other. */
  private int[] cells = new int[64];

  private int cellCount;

  Ladders(ConstrainedDelaunay plane, Linework lines) {
    this.plane = plane;
    this.lines = lines;
    cellOf = new int[plane.face.length];
    Arrays.fill(cellOf, ConstrainedDelaunay.NONE);
  }

  /** Makes the cells found by a search. */
  void build(List<LadderSearch.Cell> found) {
    for (LadderSearch.Cell cell : found) {
      double snap = SNAP * cell.width();
      int a = vertex(cell.a(), snap);
      int b = vertex(cell.b(), snap);
      int c = vertex(cell.c(), snap);
      int d = vertex(cell.d(), snap);
      if (a >= 0 && b >= 0 && c >= 0 && d >= 0) {
        build(a, b, c, d);
      }
    }
  }

  boolean isLadder(int t) {
    return t < cellOf.length && cellOf[t] != ConstrainedDelaunay.NONE;
  }

  /**
   * Puts a vertex on a partition edge; cells on either hand are split or given up.
   *
   * @return the vertex, or NONE if the point does not fit there
   */
  int split(int h, double px, double py) {
    int g = plane.twin[h];
    if (!fits(h, px, py) || !fits(g, px, py)) {
      return ConstrainedDelaunay.NONE;
    }
    int left = cell(h / 3);
    int right = cell(g / 3);
    int start = plane.start(h);
    int end = plane.end(h);
    giveUp(left);
    giveUp(right);
    int v = plane.insertOn(h, px, py);
    mend(left, start, v, end);
    mend(right, end, v, start);
    return v;
  }

  /** Moves a rung away from the part beside it: its cell is cut, or given up if short. */
  void retreat(int rung) {
    int inside = isLadder(rung / 3) ? rung : plane.twin[rung];
    if (!isLadder(inside / 3)) {
      release(plane.start(rung), plane.end(rung));
      return;
    }
    int at = 4 * cell(inside / 3);
    // A rung runs b-c or d-a in its own cell.
    boolean last = plane.start(inside) == cells[at + 1] && plane.end(inside) == cells[at + 2];
    int a = cells[at + (last ? 2 : 0)];
    int b = cells[at + (last ? 3 : 1)];
    int c = cells[at + (last ? 0 : 2)];
    int d = cells[at + (last ? 1 : 3)];
    giveUp(at / 4);
    cut(a, b, c, d, RETREAT * width(a, b, c, d));
  }

  private int cell(int t) {
    return t < cellOf.length ? cellOf[t] : ConstrainedDelaunay.NONE;
  }

  /** Makes cells of a part whose sides may have vertices between its corners. */
  private void build(int a, int b, int c, int d) {
    double width = width(a, b, c, d);
    double shortest = LadderSearch.SHORTEST_CELL * width;
    if (length(a, b, c, d) < shortest) {
      return;
    }
    int onFirst = a == b ? b : following(a, b);
    int onSecond = c == d ? d : following(c, d);
    if (onFirst == ConstrainedDelaunay.NONE || onSecond == ConstrainedDelaunay.NONE) {
      return;
    }
    if (onFirst != b) {
      int foot = foot(onFirst, c, d, SNAP * width);
      if (foot != ConstrainedDelaunay.NONE) {
        build(a, onFirst, foot, d);
        build(onFirst, b, c, foot);
      }
    } else if (onSecond != d) {
      int foot = foot(onSecond, a, b, SNAP * width);
      if (foot != ConstrainedDelaunay.NONE) {
        build(a, foot, onSecond, d);
        build(foot, b, c, onSecond);
      }
    } else if (!form(a, b, c, d) && length(a, b, c, d) >= 2 * shortest) {
      // Something stands in the way, most often at one end: halves come nearer and nearer to it.
      int middle = vertexOn(a, b, middle(plane.x, a, b), middle(plane.y, a, b), 0);
      int foot = middle == ConstrainedDelaunay.NONE ? middle : foot(middle, c, d, SNAP * width);
      if (foot != ConstrainedDelaunay.NONE) {
        build(a, middle, foot, d);
        build(middle, b, c, foot);
      }
    }
  }

  private static double middle(double[] coordinates, int p, int q) {
    return 0.5 * (coordinates[p] + coordinates[q]);
  }

  /** Deals with a cell, given up before, after vertex v was put on its side from start to end. */
  private void mend(int cell, int start, int v, int end) {
    if (cell == ConstrainedDelaunay.NONE) {
      return;
    }
    int at = 4 * cell;
    boolean first = cells[at] == start && cells[at + 1] == end;
    int a = cells[at + (first ? 0 : 2)];
    int b = cells[at + (first ? 1 : 3)];
    int c = cells[at + (first ? 2 : 0)];
    int d = cells[at + (first ? 3 : 1)];
    double shortest = LadderSearch.SHORTEST_CELL * width(a, b, c, d);
    double length = length(a, b, c, d);
    double before = plane.distance(a, v);
    double after = plane.distance(v, b);
    if (before >= shortest && after >= shortest) {
      build(a, b, c, d);
      release(a, d);
      release(b, c);
    } else if (before < shortest && length >= before + 2 * shortest) {
      cut(a, b, c, d, before + shortest);
    } else if (after < shortest && length >= after + 2 * shortest) {
      cut(c, d, a, b, after + shortest);
    } else {
      release(a, d);
      release(b, c);
    }
  }

  /** Keeps of a part, no cell any more, only what is further than a reach from its rung d-a. */
  private void cut(int a, int b, int c, int d, double reach) {
    double width = width(a, b, c, d);
    if (length(a, b, c, d) >= reach + LadderSearch.SHORTEST_CELL * width) {
      double part = reach / plane.distance(a, b);
      double px = plane.x[a] + part * (plane.x[b] - plane.x[a]);
      double py = plane.y[a] + part * (plane.y[b] - plane.y[a]);
      int last = sideTowards(b, a);
      int v = last == ConstrainedDelaunay.NONE ? last : split(plane.twin[last], px, py);
      int w = v == ConstrainedDelaunay.NONE ? v : foot(v, c, d, SNAP * width);
      if (w != ConstrainedDelaunay.NONE) {
        build(v, b, c, w);
      }
    }
    release(a, d);
    release(b, c);
  }

  /** Where the perpendicular from v meets the line from p to q, in parts of its length. */
  private double footPart(int v, int p, int q) {
    double dx = plane.x[q] - plane.x[p];
    double dy = plane.y[q] - plane.y[p];
    return ((plane.x[v] - plane.x[p]) * dx + (plane.y[v] - plane.y[p]) * dy) / (dx * dx + dy * dy);
  }

  /** The vertex at the foot of v on the side from p to q, an old one if near enough. */
  private int foot(int v, int p, int q, double snap) {
    double part = Math.max(0, Math.min(1, footPart(v, p, q)));
    return vertexOn(
        p,
        q,
        plane.x[p] + part * (plane.x[q] - plane.x[p]),
        plane.y[p] + part * (plane.y[q] - plane.y[p]),
        snap);
  }

  private int vertex(LadderSearch.End end, double snap) {
    if (end.vertex() != ConstrainedDelaunay.NONE) {
      return end.vertex();
    }
    return vertexOn(
        ConstrainedDelaunay.FIRST + lines.start[end.edge()],
        ConstrainedDelaunay.FIRST + lines.end[end.edge()],
        end.x(),
        end.y(),
        snap);
  }

  /** A vertex at or near a point of the side from p to q, put there if there is none. */
  private int vertexOn(int p, int q, double px, double py, double snap) {
    int from = p;
    while (from != q) {
      int h = sideTowards(from, q);
      if (h == ConstrainedDelaunay.NONE) {
        return ConstrainedDelaunay.NONE;
      }
      int to = plane.end(h);
      double gone = Math.hypot(px - plane.x[from], py - plane.y[from]);
      double left = Math.hypot(px - plane.x[to], py - plane.y[to]);
      if (gone <= snap && gone <= left) {
        return from;
      }
      if (left <= snap) {
        return to;
      }
      if (gone < plane.length(h) && left < plane.length(h)) {
        return split(h, px, py);
      }
      from = to;
    }
    return ConstrainedDelaunay.NONE;
  }

  /** The next vertex on the way from p to q along a partition edge, or NONE. */
  private int following(int p, int q) {
    int h = sideTowards(p, q);
    return h == ConstrainedDelaunay.NONE ? h : plane.end(h);
  }

  /** The kept side from p that leads straight to q. */
  private int sideTowards(int p, int q) {
    double dx = plane.x[q] - plane.x[p];
    double dy = plane.y[q] - plane.y[p];
    int best = ConstrainedDelaunay.NONE;
    double bestSine = 1e-6;
    int first = plane.cornerAt(p);
    int c = first;
    do {
      int h = ConstrainedDelaunay.previous(c);
      if (plane.kept[h] >= 0) {
        double ex = plane.x[plane.end(h)] - plane.x[p];
        double ey = plane.y[plane.end(h)] - plane.y[p];
        double sine = Math.abs(ex * dy - ey * dx) / (Math.hypot(ex, ey) * Math.hypot(dx, dy));
        if (ex * dx + ey * dy > 0 && sine < bestSine) {
          bestSine = sine;
          best = h;
        }
      }
      c = plane.counterClockwise(c);
    } while (c != first && c != ConstrainedDelaunay.NONE);
    return best;
  }

  /** Makes one cell; false if it cannot be one. */
  private boolean form(int a, int b, int c, int d) {
    int first = a == b ? ConstrainedDelaunay.NONE : plane.find(a, b);
    int second = c == d ? ConstrainedDelaunay.NONE : plane.find(c, d);
    if (first == ConstrainedDelaunay.NONE
        || second == ConstrainedDelaunay.NONE
        || plane.kept[first] < 0
        || plane.kept[second] < 0
        || isLadder(first / 3)
        || isLadder(second / 3)) {
      return false;
    }
    boolean convex =
        (b == c || plane.orientation(a, b, c) > 0 && plane.orientation(b, c, d) > 0)
            && (d == a || plane.orientation(c, d, a) > 0 && plane.orientation(d, a, b) > 0);
    double longest = LONGEST_RUNG * width(a, b, c, d);
    boolean square = plane.distance(b, c) <= longest && plane.distance(d, a) <= longest;
    if (!convex || !square || b == c && d == a || !keepRung(b, c) || !keepRung(d, a)) {
      return false;
    }
    int one = plane.find(a, b) / 3;
    int other = plane.find(c, d) / 3;
    boolean whole =
        b == c || d == a
            ? one == other
            : one != other && (hasCorner(one, c) || hasCorner(one, d)) && adjacent(one, other);
    if (!whole || !hasRoom(c, b) || !hasRoom(a, d)) {
      release(b, c);
      release(d, a);
      return false;
    }
    if (4 * cellCount == cells.length) {
      cells = Arrays.copyOf(cells, 2 * cells.length);
    }
    int at = 4 * cellCount;
    cells[at] = a;
    cells[at + 1] = b;
    cells[at + 2] = c;
    cells[at + 3] = d;
    mark(one, cellCount);
    mark(other, cellCount);
    cellCount++;
    return true;
  }

  /** Whether the triangle beyond a rung, to the left from p to q, is not much thinner than that. */
  private boolean hasRoom(int p, int q) {
    int h = p == q ? ConstrainedDelaunay.NONE : plane.find(p, q);
    if (h == ConstrainedDelaunay.NONE || plane.kept[h] != RUNG) {
      return true;
    }
    int apex = plane.apex(h);
    double twiceArea =
        (plane.x[q] - plane.x[p]) * (plane.y[apex] - plane.y[p])
            - (plane.y[q] - plane.y[p]) * (plane.x[apex] - plane.x[p]);
    double length = plane.length(h);
    return twiceArea >= LEAST_ROOM * length * length;
  }

  private boolean hasCorner(int t, int v) {
    return plane.corner[3 * t] == v || plane.corner[3 * t + 1] == v || plane.corner[3 * t + 2] == v;
  }

  private boolean adjacent(int t, int s) {
    return plane.twin[3 * t] / 3 == s
        || plane.twin[3 * t + 1] / 3 == s
        || plane.twin[3 * t + 2] / 3 == s;
  }

  private boolean keepRung(int p, int q) {
    if (p == q) {
      return true;
    }
    if (!plane.isClear(p, q)) {
      return false;
    }
    plane.keep(p, q, RUNG);
    return true;
  }

  /** Lets a rung go unless a cell needs it. */
  private void release(int p, int q) {
    int h = p == q ? ConstrainedDelaunay.NONE : plane.find(p, q);
    if (h != ConstrainedDelaunay.NONE
        && plane.kept[h] == RUNG
        && !isLadder(h / 3)
        && !isLadder(plane.twin[h] / 3)) {
      plane.release(h);
    }
  }

  private void mark(int t, int cell) {
    if (t >= cellOf.length) {
      int old = cellOf.length;
      cellOf = Arrays.copyOf(cellOf, Math.max(2 * old, plane.face.length));
      Arrays.fill(cellOf, old, cellOf.length, ConstrainedDelaunay.NONE);
    }
    cellOf[t] = cell;
  }

  /** Takes the mark of a cell from its triangles, which are then like any others. */
  private void giveUp(int cell) {
    if (cell == ConstrainedDelaunay.NONE) {
      return;
    }
    for (int i = 0; i < 4; i += 2) {
      int p = cells[4 * cell + i];
      int q = cells[4 * cell + i + 1];
      if (p != q) {
        int t = plane.find(p, q) / 3;
        cellOf[t] = ConstrainedDelaunay.NONE;
        plane.touch(t);
      }
    }
  }

  private boolean fits(int h, double px, double py) {
    int apex = plane.apex(h);
    return plane.orientation(apex, plane.start(h), px, py) > 0
        && plane.orientation(plane.end(h), apex, px, py) > 0;
  }

  /** Area over the mean length of the two sides. */
  private double width(int a, int b, int c, int d) {
    double twiceArea =
        (plane.x[c] - plane.x[a]) * (plane.y[d] - plane.y[b])
            - (plane.y[c] - plane.y[a]) * (plane.x[d] - plane.x[b]);
    return twiceArea / (plane.distance(a, b) + plane.distance(c, d));
  }

  /** The shorter of the two sides. */
  private double length(int a, int b, int c, int d) {
    return Math.min(plane.distance(a, b), plane.distance(c, d));
  }
}
