package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Finds thin strips that run along two edges facing each other, nearly parallel, much longer than
 * wide and much thinner than the areas concerned: uncovered ground between two areas, or what shows
 * of an earlier area between later ones. A strip that was drawn, with its own outline on both
 * sides, is neither.
 */
final class GapSearch {
  private static final int NONE = Partition.NONE;

  private final Boundaries edges;
  private final HalfEdges halves;
  private final Sides sides;
  private final double closeM;
  private final double leftoverM;
  private final List<Strip> strips = new ArrayList<>();

  /**
   * What is seen on the left of each half-edge.
   *
   * @param searched whether strips are looked for there
   * @param label the label seen, or NONE
   * @param isOwn whether the area seen has its own outline there
   * @param thickness thickness of the area seen, m
   */
  record Sides(boolean[] searched, int[] label, boolean[] isOwn, double[] thickness) {}

  /** Two half-edges that face each other across a strip on the left of both. */
  private record Strip(int half, int other, double widthM, double lengthM, double x, double y) {}

  /** A thin strip: its label or NONE, its middle, mean width and the half-edges on its sides. */
  record Gap(int label, double x, double y, double widthM, List<Integer> halves) {}

  /**
   * Prepares the search.
   *
   * @param edges merged edges
   * @param halves their half-edges
   * @param sides what is seen beside them
   * @param closeM the closing length, m
   */
  GapSearch(Boundaries edges, HalfEdges halves, Sides sides, double closeM) {
    this.edges = edges;
    this.halves = halves;
    this.sides = sides;
    this.closeM = closeM;
    this.leftoverM = Limits.SLIVER_CLOSING_LENGTHS * closeM;
  }

  /** The strips, in the order of their first edge. */
  List<Gap> find() {
    VertexGrid grid = new VertexGrid(edges.x, edges.y);
    PairIndex seen = new PairIndex(64);
    for (int h = 0; h < sides.searched.length; h++) {
      if (!sides.searched[h]) {
        continue;
      }
      int a = halves.from(h);
      int b = halves.to(h);
      // A strip's width at a vertex is at most twice its mean width.
      double margin = 2 * Limits.THIN * length(h);
      if (sides.label[h] != NONE) {
        margin = Math.min(margin, 2 * leftoverM);
      }
      int found = grid.near(edges.x[a], edges.y[a], edges.x[b], edges.y[b], margin);
      for (int i = 0; i < found; i++) {
        int v = grid.hit(i);
        for (int k = halves.offset[v]; k < halves.offset[v + 1]; k++) {
          int g = halves.around[k];
          consider(h, g, seen);
          consider(h, g ^ 1, seen);
        }
      }
    }
    return gather();
  }

  private double length(int h) {
    int a = halves.from(h);
    int b = halves.to(h);
    return Segments.length(edges.x[b] - edges.x[a], edges.y[b] - edges.y[a]);
  }

  private boolean mayFace(int h, int g) {
    boolean drawn = sides.label[h] != NONE && sides.isOwn[h] && sides.isOwn[g];
    return sides.searched[g] && (h >> 1) != (g >> 1) && sides.label[h] == sides.label[g] && !drawn;
  }

  /** The widest strip between two half-edges that is much thinner than the areas concerned, m. */
  private double widest(int h, int g) {
    if (sides.label[h] == NONE) {
      return Limits.MUCH_THINNER * Math.max(sides.thickness[h ^ 1], sides.thickness[g ^ 1]);
    }
    double thinner = Math.min(sides.thickness[h], sides.thickness[g]);
    return Math.min(leftoverM, Limits.MUCH_THINNER * thinner);
  }

  private void consider(int h, int g, PairIndex seen) {
    if (!mayFace(h, g)) {
      return;
    }
    int known = seen.count();
    if (seen.add(h, g) != known) {
      return;
    }
    int a = halves.from(h);
    double length = length(h);
    double ux = (edges.x[halves.to(h)] - edges.x[a]) / length;
    double uy = (edges.y[halves.to(h)] - edges.y[a]) / length;
    double cx = edges.x[halves.from(g)] - edges.x[a];
    double cy = edges.y[halves.from(g)] - edges.y[a];
    double dx = edges.x[halves.to(g)] - edges.x[a];
    double dy = edges.y[halves.to(g)] - edges.y[a];
    double tc = cx * ux + cy * uy;
    double td = dx * ux + dy * uy;
    double wc = ux * cy - uy * cx;
    double wd = ux * dy - uy * dx;
    // With the strip on the left of both, the two half-edges run in opposite directions.
    if (td >= tc || Math.abs(wd - wc) > Limits.NEARLY_PARALLEL * (tc - td)) {
      return;
    }
    double from = Math.max(0, td);
    double to = Math.min(length, tc);
    double slope = (wc - wd) / (tc - td);
    double wFrom = wd + (from - td) * slope;
    double wTo = wd + (to - td) * slope;
    double width = (wFrom + wTo) / 2;
    if (to - from <= closeM || wFrom < 0 || wTo < 0 || width <= 0 || width > widest(h, g)) {
      return;
    }
    double middle = (from + to) / 2;
    double x = edges.x[a] + middle * ux - width / 2 * uy;
    double y = edges.y[a] + middle * uy + width / 2 * ux;
    strips.add(new Strip(h, g, width, to - from, x, y));
  }

  private List<Gap> gather() {
    DisjointSets sets = new DisjointSets(strips.size());
    int[] firstOnHalf = new int[sides.searched.length];
    Arrays.fill(firstOnHalf, NONE);
    for (int i = 0; i < strips.size(); i++) {
      unite(strips.get(i).half, i, firstOnHalf, sets);
      unite(strips.get(i).other, i, firstOnHalf, sets);
    }
    List<Gap> gaps = new ArrayList<>();
    for (int i = 0; i < strips.size(); i++) {
      if (sets.find(i) == i) {
        addGap(i, sets, gaps);
      }
    }
    return gaps;
  }

  private static void unite(int half, int i, int[] firstOnHalf, DisjointSets sets) {
    if (firstOnHalf[half] < 0) {
      firstOnHalf[half] = i;
    } else {
      sets.unite(firstOnHalf[half], i);
    }
  }

  private void addGap(int set, DisjointSets sets, List<Gap> gaps) {
    double length = 0;
    double area = 0;
    Strip longest = strips.get(set);
    List<Integer> along = new ArrayList<>();
    for (int i = set; i < strips.size(); i++) {
      if (sets.find(i) == set) {
        Strip strip = strips.get(i);
        length += strip.lengthM;
        area += strip.lengthM * strip.widthM;
        longest = strip.lengthM > longest.lengthM ? strip : longest;
        along.add(strip.half);
        along.add(strip.other);
      }
    }
    double width = area / length;
    if (width <= Limits.THIN * length && isClear(longest)) {
      gaps.add(new Gap(sides.label[longest.half], longest.x, longest.y, width, along));
    }
  }

  /** Whether nothing lies between the two edges where they face each other in the middle. */
  private boolean isClear(Strip strip) {
    int a = halves.from(strip.half);
    int b = halves.to(strip.half);
    double length = length(strip.half);
    double nx = -(edges.y[b] - edges.y[a]) / length;
    double ny = (edges.x[b] - edges.x[a]) / length;
    double reach = strip.widthM / 2;
    for (int e = 0; e < edges.edgeCount; e++) {
      if (e == strip.half >> 1 || e == strip.other >> 1) {
        continue;
      }
      int c = edges.start[e];
      int d = edges.end[e];
      double wc = (edges.x[c] - strip.x) * nx + (edges.y[c] - strip.y) * ny;
      double wd = (edges.x[d] - strip.x) * nx + (edges.y[d] - strip.y) * ny;
      double tc = (edges.x[c] - strip.x) * ny - (edges.y[c] - strip.y) * nx;
      double td = (edges.x[d] - strip.x) * ny - (edges.y[d] - strip.y) * nx;
      if ((tc > 0) != (td > 0)) {
        double w = wc + (0 - tc) / (td - tc) * (wd - wc);
        if (Math.abs(w) < reach) {
          return false;
        }
      }
    }
    return true;
  }
}
