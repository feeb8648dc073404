package coldseam.mesh.triangulation;

import java.util.ArrayList;
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
  private final EdgeWalk edges;
  private final List<Cell> cells = new ArrayList<>();

  /** For each triangle the number of its cell, or NONE. */
  private int[] cellOf;

  Ladders(ConstrainedDelaunay plane, Linework lines) {
    this.plane = plane;
    this.lines = lines;
    edges = new EdgeWalk(plane);
    cellOf = new int[plane.face.length];
    Arrays.fill(cellOf, Triangulation.NONE);
  }

  /** Makes the cells of the parts found by a search. */
  void build(List<LadderSearch.Part> found) {
    for (LadderSearch.Part part : found) {
      double snap = SNAP * part.width();
      int a = vertex(part.a(), snap);
      int b = vertex(part.b(), snap);
      int c = vertex(part.c(), snap);
      int d = vertex(part.d(), snap);
      if (a >= 0 && b >= 0 && c >= 0 && d >= 0) {
        build(new Cell(a, b, c, d));
      }
    }
  }

  boolean isLadder(int t) {
    return number(t) != Triangulation.NONE;
  }

  /**
   * Puts a vertex on a partition edge; cells on either hand are split or given up.
   *
   * @return the vertex, or NONE if the point does not fit there
   */
  int split(int h, double px, double py) {
    int g = plane.twin[h];
    if (!fits(h, px, py) || !fits(g, px, py)) {
      return Triangulation.NONE;
    }
    int left = number(h / 3);
    int right = number(g / 3);
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
    int number = number(inside / 3);
    if (number == Triangulation.NONE) {
      release(plane.start(rung), plane.end(rung));
      return;
    }
    Cell cell = cells.get(number);
    giveUp(number);
    boolean last = plane.start(inside) == cell.b() && plane.end(inside) == cell.c();
    cut(last ? cell.turned() : cell, RETREAT * cell.width(plane));
  }

  /**
   * Gives every cell the longer of its diagonals. In a cell that ends in a mitre the longest side
   * of both triangles is then the diagonal, as in all others, and refinement knows it for a cell.
   */
  void takeLongerDiagonals() {
    for (int h = 0; h < 3 * plane.triangleCount; h++) {
      int g = plane.twin[h];
      if (h < g
          && plane.kept[h] == Triangulation.NONE
          && isLadder(h / 3)
          && number(h / 3) == number(g / 3)
          && plane.distance(plane.apex(h), plane.apex(g)) > plane.length(h)) {
        plane.flip(h);
      }
    }
  }

  /** Makes cells of a part whose sides may have vertices between its corners. */
  private void build(Cell part) {
    if (part.length(plane) < shortest(part)) {
      return;
    }
    int onFirst = edges.following(part.a(), part.b());
    int onSecond = edges.following(part.c(), part.d());
    if (onFirst == Triangulation.NONE || onSecond == Triangulation.NONE) {
      return;
    }
    if (onFirst != part.b()) {
      buildHalves(part, onFirst);
    } else if (onSecond != part.d()) {
      buildHalves(part.turned(), onSecond);
    } else if (mayForm(part) && !form(part) && part.length(plane) >= 2 * shortest(part)) {
      // Something stands in the way, most often at one end: halves come nearer and nearer to it.
      int middle =
          vertexOn(
              part.a(),
              part.b(),
              0.5 * (plane.x[part.a()] + plane.x[part.b()]),
              0.5 * (plane.y[part.a()] + plane.y[part.b()]),
              0);
      if (middle != Triangulation.NONE) {
        buildHalves(part, middle);
      }
    }
  }

  /** Builds a part in two, on either hand of a vertex on its side a-b. */
  private void buildHalves(Cell part, int v) {
    int foot = foot(v, part);
    if (foot != Triangulation.NONE) {
      build(new Cell(part.a(), v, foot, part.d()));
      build(new Cell(v, part.b(), part.c(), foot));
    }
  }

  /** Deals with a cell, given up before, after vertex v was put on its side from start to end. */
  private void mend(int number, int start, int v, int end) {
    if (number == Triangulation.NONE) {
      return;
    }
    Cell old = cells.get(number);
    Cell cell = old.a() == start && old.b() == end ? old : old.turned();
    double shortest = shortest(cell);
    double length = cell.length(plane);
    double before = plane.distance(cell.a(), v);
    double after = plane.distance(v, cell.b());
    if (before >= shortest && after >= shortest) {
      build(cell);
    } else if (before < shortest && length >= before + 2 * shortest) {
      cut(cell, before + shortest);
    } else if (after < shortest && length >= after + 2 * shortest) {
      cut(cell.turned(), after + shortest);
    }
    release(cell.a(), cell.d());
    release(cell.b(), cell.c());
  }

  /** Keeps of a cell, given up before, only what is further than a reach from its rung d-a. */
  private void cut(Cell cell, double reach) {
    int a = cell.a();
    int b = cell.b();
    if (cell.length(plane) >= reach + shortest(cell)) {
      double part = reach / plane.distance(a, b);
      int last = edges.sideTowards(b, a);
      int v =
          last == Triangulation.NONE
              ? Triangulation.NONE
              : split(
                  plane.twin[last],
                  plane.x[a] + part * (plane.x[b] - plane.x[a]),
                  plane.y[a] + part * (plane.y[b] - plane.y[a]));
      int w = v == Triangulation.NONE ? v : foot(v, cell);
      if (w != Triangulation.NONE) {
        build(new Cell(v, b, cell.c(), w));
      }
    }
    release(a, cell.d());
    release(b, cell.c());
  }

  /**
   * For a vertex on the side a-b of a part, one near its foot on the other, put there if need be.
   */
  private int foot(int v, Cell part) {
    int p = part.c();
    int q = part.d();
    double dx = plane.x[q] - plane.x[p];
    double dy = plane.y[q] - plane.y[p];
    double along = (plane.x[v] - plane.x[p]) * dx + (plane.y[v] - plane.y[p]) * dy;
    double at = Math.max(0, Math.min(1, along / (dx * dx + dy * dy)));
    return vertexOn(p, q, plane.x[p] + at * dx, plane.y[p] + at * dy, SNAP * part.width(plane));
  }

  private int vertex(SidePair.End end, double snap) {
    if (end.vertex() != Triangulation.NONE) {
      return end.vertex();
    }
    int p = ConstrainedDelaunay.FIRST + lines.start[end.edge()];
    int q = ConstrainedDelaunay.FIRST + lines.end[end.edge()];
    return vertexOn(p, q, end.x(), end.y(), snap);
  }

  /** A vertex at or near a point of the side from p to q, put there if there is none. */
  private int vertexOn(int p, int q, double px, double py, double snap) {
    int place = edges.place(p, q, px, py, snap);
    if (place == EdgeWalk.LOST) {
      return Triangulation.NONE;
    }
    return place >= 0 ? place : split(~place, px, py);
  }

  /** Whether both sides are partition edges with no cell on this hand yet. */
  private boolean mayForm(Cell cell) {
    int first = plane.find(cell.a(), cell.b());
    int second = plane.find(cell.c(), cell.d());
    return first != Triangulation.NONE
        && second != Triangulation.NONE
        && plane.kept[first] >= 0
        && plane.kept[second] >= 0
        && !isLadder(first / 3)
        && !isLadder(second / 3);
  }

  /** Makes one cell; false if something is in its way. */
  private boolean form(Cell cell) {
    double longest = LONGEST_RUNG * cell.width(plane);
    if (!cell.isConvex(plane)
        || plane.distance(cell.b(), cell.c()) > longest
        || plane.distance(cell.d(), cell.a()) > longest
        || !keepRung(cell.b(), cell.c())) {
      return false;
    }
    if (!keepRung(cell.d(), cell.a())
        || !isWhole(cell)
        || !hasRoom(cell.c(), cell.b())
        || !hasRoom(cell.a(), cell.d())) {
      release(cell.b(), cell.c());
      release(cell.d(), cell.a());
      return false;
    }
    mark(plane.find(cell.a(), cell.b()) / 3);
    mark(plane.find(cell.c(), cell.d()) / 3);
    cells.add(cell);
    return true;
  }

  /** Whether a cell, its rungs kept, is two triangles, or one where it tapers to a point. */
  private boolean isWhole(Cell cell) {
    int first = plane.find(cell.a(), cell.b());
    int second = plane.find(cell.c(), cell.d());
    if (cell.isTriangle()) {
      return first / 3 == second / 3;
    }
    int next = plane.twin[Triangulation.next(first)] / 3;
    int previous = plane.twin[Triangulation.previous(first)] / 3;
    int apex = plane.apex(first);
    return (apex == cell.c() || apex == cell.d()) && (next == second / 3 || previous == second / 3);
  }

  /** Whether the triangle beyond a rung, to the left from p to q, is not much thinner than that. */
  private boolean hasRoom(int p, int q) {
    int h = p == q ? Triangulation.NONE : plane.find(p, q);
    if (h == Triangulation.NONE || plane.kept[h] != RUNG) {
      return true;
    }
    int apex = plane.apex(h);
    double twiceArea =
        (plane.x[q] - plane.x[p]) * (plane.y[apex] - plane.y[p])
            - (plane.y[q] - plane.y[p]) * (plane.x[apex] - plane.x[p]);
    double length = plane.length(h);
    return twiceArea >= LEAST_ROOM * length * length;
  }

  private boolean keepRung(int p, int q) {
    if (p != q && !plane.isClear(p, q)) {
      return false;
    }
    plane.keep(p, q, RUNG);
    return true;
  }

  /** Lets a rung go unless a cell needs it. */
  private void release(int p, int q) {
    int h = p == q ? Triangulation.NONE : plane.find(p, q);
    if (h != Triangulation.NONE
        && plane.kept[h] == RUNG
        && !isLadder(h / 3)
        && !isLadder(plane.twin[h] / 3)) {
      plane.release(h);
    }
  }

  private int number(int t) {
    return t < cellOf.length ? cellOf[t] : Triangulation.NONE;
  }

  /** Marks a triangle as belonging to the next cell. */
  private void mark(int t) {
    if (t >= cellOf.length) {
      int old = cellOf.length;
      cellOf = Arrays.copyOf(cellOf, Math.max(2 * old, plane.face.length));
      Arrays.fill(cellOf, old, cellOf.length, Triangulation.NONE);
    }
    cellOf[t] = cells.size();
  }

  /** Takes the mark of a cell from its triangles, which are then like any others. */
  private void giveUp(int number) {
    if (number == Triangulation.NONE) {
      return;
    }
    Cell cell = cells.get(number);
    unmark(plane.find(cell.a(), cell.b()) / 3);
    unmark(plane.find(cell.c(), cell.d()) / 3);
  }

  private void unmark(int t) {
    cellOf[t] = Triangulation.NONE;
    plane.touch(t);
  }

  /** Whether the two parts of a triangle split at a point on its side h turn the right way. */
  private boolean fits(int h, double px, double py) {
    int apex = plane.apex(h);
    return plane.orientation(apex, plane.start(h), px, py) > 0
        && plane.orientation(plane.end(h), apex, px, py) > 0;
  }

  private double shortest(Cell cell) {
    return LadderSearch.SHORTEST_CELL * cell.width(plane);
  }
}
