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

  /** Neighbours in a chain count towards the length of a part up to this ratio of widths. */
  private static final double SIMILAR_WIDTH = 1.5;

  /** Where along a side to look across, in parts of its length. */
  private static final double[] LOOKOUTS = {0.5, 1.0 / 64, 63.0 / 64};

  /**
   * A thin part between two rungs: (a, d) and (b, c); a to b lies on one side of the face, c to d
   * on the other, the face to the left of both.
   *
   * @param width the largest distance of the sides, m
   */
  record Part(SidePair.End a, SidePair.End b, SidePair.End c, SidePair.End d, double width) {}

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
    Arrays.fill(firstPartner, Triangulation.NONE);
  }

  static List<Part> search(ConstrainedDelaunay plane, boolean[] meshed) {
    return new LadderSearch(plane, meshed).parts();
  }

  private List<Part> parts() {
    List<Part> found = new ArrayList<>();
    for (int h = 0; h < firstPartner.length; h++) {
      int face = plane.face[h / 3];
      if (plane.kept[h] == Triangulation.NONE || face < 0 || !meshed[face]) {
        continue;
      }
      for (double part : LOOKOUTS) {
        int g = opposite(h, part);
        if (g != Triangulation.NONE && SidePair.runsAgainst(plane, h, g) && visit(h, g)) {
          addThinParts(chain(h, g), found);
        }
      }
    }
    return found;
  }

  /** The chain through a pair, as far as it can be followed both ways. */
  private List<SidePair> chain(int h, int g) {
    List<SidePair> backwards = new ArrayList<>();
    follow(g, h, backwards);
    List<SidePair> chain = new ArrayList<>();
    for (int i = backwards.size() - 1; i >= 0; i--) {
      SidePair pair = backwards.get(i);
      chain.add(new SidePair(plane, pair.g(), pair.h()));
    }
    chain.add(new SidePair(plane, h, g));
    follow(h, g, chain);
    return chain;
  }

  /** Adds the pairs that follow after a pair in the direction of its side h. */
  private void follow(int h, int g, List<SidePair> chain) {
    SidePair pair = new SidePair(plane, h, g);
    while (true) {
      int nextH = pair.endsOnH() ? after(pair.h()) : pair.h();
      int nextG = pair.endsOnG() ? before(pair.g()) : pair.g();
      if (nextH == nextG
          || nextH == pair.g()
          || nextG == pair.h()
          || !SidePair.runsAgainst(plane, nextH, nextG)
          || !visit(nextH, nextG)) {
        return;
      }
      pair = new SidePair(plane, nextH, nextG);
      if (!(pair.length() > 0)) {
        return;
      }
      chain.add(pair);
    }
  }

  private void addThinParts(List<SidePair> chain, List<Part> found) {
    int count = chain.size();
    for (int i = 0; i < count; i++) {
      SidePair pair = chain.get(i);
      double width = pair.width();
      if (pair.length() < SHORTEST_CELL * width || thinLength(chain, i) < THIN * width) {
        continue;
      }
      if (!isOpen(pair)) {
        continue;
      }
      // Neighbours share a rung where both agree on it: not where the part widens at once.
      boolean shared = i > 0 && chain.get(i - 1).joinedLast() == pair.joinedFirst();
      SidePair.End a = shared ? chain.get(i - 1).lastOnH() : pair.firstOnH();
      SidePair.End d = shared ? chain.get(i - 1).lastOnG() : pair.firstOnG();
      found.add(new Part(a, pair.lastOnH(), pair.lastOnG(), d, width));
    }
  }

  /** Length of the part of a chain around pair i that is not much wider than that pair. */
  private static double thinLength(List<SidePair> chain, int i) {
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
  private boolean isOpen(SidePair pair) {
    return opposite(pair.h(), pair.partOfH(0.1)) == pair.g()
        && opposite(pair.h(), pair.partOfH(0.5)) == pair.g()
        && opposite(pair.h(), pair.partOfH(0.9)) == pair.g();
  }

  /** The next side of the face after h, along the same piece of its outline. */
  private int after(int h) {
    int g = Triangulation.next(h);
    while (plane.kept[g] == Triangulation.NONE) {
      g = Triangulation.next(plane.twin[g]);
    }
    return g;
  }

  private int before(int h) {
    int g = Triangulation.previous(h);
    while (plane.kept[g] == Triangulation.NONE) {
      g = Triangulation.previous(plane.twin[g]);
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
      int leaving = tipOnLeft ? Triangulation.next(entered) : Triangulation.previous(entered);
      if (plane.kept[leaving] != Triangulation.NONE) {
        return leaving;
      }
      entered = plane.twin[leaving];
    }
    return Triangulation.NONE;
  }

  /** Notes a pair; false if it was noted before. */
  private boolean visit(int h, int g) {
    int low = Math.min(h, g);
    int high = Math.max(h, g);
    for (int i = firstPartner[low]; i != Triangulation.NONE; i = partner[2 * i + 1]) {
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
}
