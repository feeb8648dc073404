package coldseam.mesh.triangulation;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Finds the thin parts of faces: two sides of one face that run against each other nearly in
 * parallel, followed along the face in both directions as far as they do. Nothing is changed here;
 * what is found are the places for rungs.
 *
 * <p>A chain is a row of pairs of sides; at each end of a pair is a rung. Where both sides have a
 * vertex there, not further apart along the chain than a few widths, the rung joins the two (so
 * bends become mitres and oblique ends stay as they are); otherwise it joins the vertex of the one
 * side with the foot of its perpendicular on the other.
 */
final class LadderSearch {
  /** Thin: the length of a part is this many times its width, or more. */
  static final double THIN = 20;

  /** A cell shorter than this many widths needs no ladder: its triangles have good angles. */
  static final double SHORTEST_CELL = 2.5;

  /** Vertices on the two sides are joined if they are offset by this many widths at most. */
  private static final double LONGEST_OFFSET = 4;

  /** Sides pair up if the angle between them has at least this cosine (about 11°). */
  private static final double NEARLY_PARALLEL = 0.98;

  /** Neighbours in a chain count towards the length of a part up to this ratio of widths. */
  private static final double SIMILAR_WIDTH = 1.5;

  /** Where along a side to look across, in parts of its length. */
  private static final double[] LOOKOUTS = {0.5, 1.0 / 64, 63.0 / 64};

  /**
   * An end of a rung: a vertex, or a point on a partition edge.
   *
   * @param vertex the vertex of the triangulation, or NONE
   * @param edge the partition edge, if no vertex
   * @param x local x, m
   * @param y local y, m
   */
  record End(int vertex, int edge, double x, double y) {}

  /**
   * A thin part between two rungs: (a, d) and (b, c); a to b lies on one side of the face, c to d
   * on the other, the face to the left of both.
   *
   * @param width the largest distance of the sides, m
   */
  record Cell(End a, End b, End c, End d, double width) {}

  private final ConstrainedDelaunay plane;
  private final boolean[] meshed;

  /** For each half-edge the first of its visited partners in the list below. */
  private final int[] firstPartner;

  private int[] partner = new int[128];
  private int partners;

  private LadderSearch(ConstrainedDelaunay plane, boolean[] meshed) {
    this.plane = plane;
    this.meshed = meshed;
    firstPartner = new int[3 * plane.triangleCount];
    Arrays.fill(firstPartner, ConstrainedDelaunay.NONE);
  }

  static List<Cell> search(ConstrainedDelaunay plane, boolean[] meshed) {
    return new LadderSearch(plane, meshed).cells();
  }

  private List<Cell> cells() {
    List<Cell> found = new ArrayList<>();
    for (int h = 0; h < firstPartner.length; h++) {
      int face = plane.face[h / 3];
      if (plane.kept[h] == ConstrainedDelaunay.NONE || face < 0 || !meshed[face]) {
        continue;
      }
      for (double part : LOOKOUTS) {
        int g = opposite(h, part);
        if (g != ConstrainedDelaunay.NONE && Pair.runsAgainst(plane, h, g) && visit(h, g)) {
          addThinCells(chain(h, g), found);
        }
      }
    }
    return found;
  }

  /** The chain through a pair, as far as it can be followed both ways. */
  private List<Pair> chain(int h, int g) {
    List<Pair> backwards = new ArrayList<>();
    follow(g, h, backwards);
    List<Pair> chain = new ArrayList<>();
    for (int i = backwards.size() - 1; i >= 0; i--) {
      Pair pair = backwards.get(i);
      chain.add(new Pair(plane, pair.g, pair.h));
    }
    chain.add(new Pair(plane, h, g));
    follow(h, g, chain);
    return chain;
  }

  /** Adds the pairs that follow after a pair in the direction of its side h. */
  private void follow(int h, int g, List<Pair> chain) {
    Pair pair = new Pair(plane, h, g);
    while (true) {
      int nextH = pair.endsOnH() ? after(pair.h) : pair.h;
      int nextG = pair.endsOnG() ? before(pair.g) : pair.g;
      if (nextH == nextG
          || nextH == pair.g
          || nextG == pair.h
          || !Pair.runsAgainst(plane, nextH, nextG)
          || !visit(nextH, nextG)) {
        return;
      }
      pair = new Pair(plane, nextH, nextG);
      if (!(pair.length() > 0)) {
        return;
      }
      chain.add(pair);
    }
  }

  private void addThinCells(List<Pair> chain, List<Cell> found) {
    int count = chain.size();
    for (int i = 0; i < count; i++) {
      Pair pair = chain.get(i);
      double width = pair.width();
      if (pair.length() < SHORTEST_CELL * width || thinLength(chain, i) < THIN * width) {
        continue;
      }
      if (!isOpen(pair)) {
        continue;
      }
      // Neighbours share a rung where both agree on it: not where the part widens at once.
      boolean shared = i > 0 && chain.get(i - 1).joinedLast == pair.joinedFirst;
      End a = shared ? chain.get(i - 1).lastOnH() : pair.firstOnH();
      End d = shared ? chain.get(i - 1).lastOnG() : pair.firstOnG();
      found.add(new Cell(a, pair.lastOnH(), pair.lastOnG(), d, width));
    }
  }

  /** Length of the part of a chain around pair i that is not much wider than that pair. */
  private static double thinLength(List<Pair> chain, int i) {
    double limit = SIMILAR_WIDTH * chain.get(i).width();
    double enough = THIN * chain.get(i).width();
    double length = chain.get(i).length();
    for (int j = i + 1; j < chain.size() && chain.get(j).width() <= limit && length < enough; j++) {
      length += chain.get(j).length();
    }
    for (int j = i - 1; j >= 0 && chain.get(j).width() <= limit && length < enough; j--) {
      length += chain.get(j).length();
    }
    return length;
  }

  /** Whether nothing stands between the two sides, looked at in three places. */
  private boolean isOpen(Pair pair) {
    return opposite(pair.h, pair.partOfH(0.1)) == pair.g
        && opposite(pair.h, pair.partOfH(0.5)) == pair.g
        && opposite(pair.h, pair.partOfH(0.9)) == pair.g;
  }

  /** The next side of the face after h, along the same piece of its outline. */
  private int after(int h) {
    int g = ConstrainedDelaunay.next(h);
    while (plane.kept[g] == ConstrainedDelaunay.NONE) {
      g = ConstrainedDelaunay.next(plane.twin[g]);
    }
    return g;
  }

  private int before(int h) {
    int g = ConstrainedDelaunay.previous(h);
    while (plane.kept[g] == ConstrainedDelaunay.NONE) {
      g = ConstrainedDelaunay.previous(plane.twin[g]);
    }
    return g;
  }

  /** The kept side met when looking across the face from a point on h, square to h. */
  private int opposite(int h, double part) {
    int a = plane.start(h);
    int b = plane.end(h);
    double dx = plane.x[b] - plane.x[a];
    double dy = plane.y[b] - plane.y[a];
    double px = plane.x[a] + part * dx;
    double py = plane.y[a] + part * dy;
    int entered = h;
    for (int steps = 0; steps < plane.triangleCount; steps++) {
      int tip = plane.apex(entered);
      // Left of the ray lies what is behind along h.
      boolean tipOnLeft = (plane.x[tip] - px) * dx + (plane.y[tip] - py) * dy < 0;
      int leaving =
          tipOnLeft ? ConstrainedDelaunay.next(entered) : ConstrainedDelaunay.previous(entered);
      if (plane.kept[leaving] != ConstrainedDelaunay.NONE) {
        return leaving;
      }
      entered = plane.twin[leaving];
    }
    return ConstrainedDelaunay.NONE;
  }

  /** Notes a pair; false if it was noted before. */
  private boolean visit(int h, int g) {
    int low = Math.min(h, g);
    int high = Math.max(h, g);
    for (int i = firstPartner[low]; i != ConstrainedDelaunay.NONE; i = partner[2 * i + 1]) {
      if (partner[2 * i] == high) {
        return false;
      }
    }
    if (2 * partners == partner.length) {
      partner = Arrays.copyOf(partner, 2 * partner.length);
    }
    partner[2 * partners] = high;
    partner[2 * partners + 1] = firstPartner[low];
    firstPartner[low] = partners++;
    return true;
  }

  /** Two sides that run against each other, measured along the direction between the two. */
  private static final class Pair {
    private final ConstrainedDelaunay plane;
    private final int h;
    private final int g;
    private final double ux;
    private final double uy;
    private final double startH;
    private final double endH;
    private final double startG;
    private final double endG;
    private final boolean joinedFirst;
    private final boolean joinedLast;

    Pair(ConstrainedDelaunay plane, int h, int g) {
      this.plane = plane;
      this.h = h;
      this.g = g;
      double lengthH = plane.length(h);
      double lengthG = plane.length(g);
      double dx = dx(plane, h) / lengthH - dx(plane, g) / lengthG;
      double dy = dy(plane, h) / lengthH - dy(plane, g) / lengthG;
      double norm = Math.hypot(dx, dy);
      ux = dx / norm;
      uy = dy / norm;
      startH = along(plane.start(h));
      endH = along(plane.end(h));
      startG = along(plane.start(g));
      endG = along(plane.end(g));
      joinedFirst =
          Math.abs(startH - endG) <= LONGEST_OFFSET * across(plane.start(h), plane.end(g));
      joinedLast = Math.abs(endH - startG) <= LONGEST_OFFSET * across(plane.end(h), plane.start(g));
    }

    static boolean runsAgainst(ConstrainedDelaunay plane, int h, int g) {
      double dot = dx(plane, h) * dx(plane, g) + dy(plane, h) * dy(plane, g);
      return -dot >= NEARLY_PARALLEL * plane.length(h) * plane.length(g);
    }

    double length() {
      return Math.min(endH, startG) - Math.max(startH, endG);
    }

    /** The larger distance of the sides at the two ends of the pair. */
    double width() {
      double first = Math.max(startH, endG);
      double last = Math.min(endH, startG);
      return Math.max(offset(first), offset(last));
    }

    /** The place on h, in parts of its length, at a part of the way from first to last. */
    double partOfH(double part) {
      double first = Math.max(startH, endG);
      double last = Math.min(endH, startG);
      return (first + part * (last - first) - startH) / (endH - startH);
    }

    boolean endsOnH() {
      return joinedLast || endH <= startG;
    }

    boolean endsOnG() {
      return joinedLast || endH > startG;
    }

    End firstOnH() {
      return joinedFirst || startH >= endG ? vertex(plane.start(h)) : foot(h, endG);
    }

    End firstOnG() {
      return joinedFirst || startH < endG ? vertex(plane.end(g)) : foot(g, startH);
    }

    End lastOnH() {
      return endsOnH() ? vertex(plane.end(h)) : foot(h, startG);
    }

    End lastOnG() {
      return endsOnG() ? vertex(plane.start(g)) : foot(g, endH);
    }

    private End vertex(int v) {
      return new End(v, ConstrainedDelaunay.NONE, plane.x[v], plane.y[v]);
    }

    /** The point of a side at a place along the pair. */
    private End foot(int side, double at) {
      int a = plane.start(side);
      int b = plane.end(side);
      double part = (at - along(a)) / (along(b) - along(a));
      return new End(
          ConstrainedDelaunay.NONE,
          plane.kept[side],
          plane.x[a] + part * (plane.x[b] - plane.x[a]),
          plane.y[a] + part * (plane.y[b] - plane.y[a]));
    }

    /** Distance of the sides at a place along the pair. */
    private double offset(double at) {
      return level(g, at) - level(h, at);
    }

    private double level(int side, double at) {
      int a = plane.start(side);
      int b = plane.end(side);
      double part = (at - along(a)) / (along(b) - along(a));
      return level(a) + part * (level(b) - level(a));
    }

    private double along(int v) {
      return ux * (plane.x[v] - originX()) + uy * (plane.y[v] - originY());
    }

    private double level(int v) {
      return ux * (plane.y[v] - originY()) - uy * (plane.x[v] - originX());
    }

    private double across(int a, int b) {
      return Math.abs(level(b) - level(a));
    }

    private double originX() {
      return plane.x[plane.start(h)];
    }

    private double originY() {
      return plane.y[plane.start(h)];
    }

    private static double dx(ConstrainedDelaunay plane, int h) {
      return plane.x[plane.end(h)] - plane.x[plane.start(h)];
    }

    private static double dy(ConstrainedDelaunay plane, int h) {
      return plane.y[plane.end(h)] - plane.y[plane.start(h)];
    }
  }
}
