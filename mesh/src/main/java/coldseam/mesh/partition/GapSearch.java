package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Finds thin strips of uncovered ground that are open at an end: two edges that face each other
 * across it, nearly parallel, the strip much longer than wide and much thinner than what lies on
 * its sides.
 */
final class GapSearch {
  /** Wider than this part of its length a strip is not thin. */
  static final double THIN = 1.0 / 50;

  /** Wider than this part of the thicker area on its sides a strip is not a slip of the hand. */
  static final double MUCH_THINNER = 1.0 / 10;

  /** Sine of the largest angle between two edges that are nearly parallel. */
  private static final double NEARLY_PARALLEL = 0.1;

  private static final int NONE = Partition.NONE;

  private final Boundaries edges;
  private final HalfEdges halves;
  private final boolean[] open;
  private final double[] thicknessBeyond;
  private final List<Strip> strips = new ArrayList<>();

  /** Two half-edges with uncovered ground on their left that face each other. */
  private record Strip(int half, int other, double widthM, double lengthM, double x, double y) {}

  /** An open gap: its middle, mean width and the half-edges on its sides. */
  record Gap(double x, double y, double widthM, List<Integer> halves) {}

  /**
   * Prepares the search.
   *
   * @param edges merged edges
   * @param halves their half-edges
   * @param open for each half-edge whether uncovered ground to be searched is on its left
   * @param thicknessBeyond for each half-edge the thickness of the area on its right, m
   */
  GapSearch(Boundaries edges, HalfEdges halves, boolean[] open, double[] thicknessBeyond) {
    this.edges = edges;
    this.halves = halves;
    this.open = open;
    this.thicknessBeyond = thicknessBeyond;
  }

  /** The gaps, in the order of their first edge. */
  List<Gap> find() {
    VertexGrid grid = new VertexGrid(edges.x, edges.y, openVertices());
    PairIndex seen = new PairIndex(64);
    for (int h = 0; h < open.length; h++) {
      if (!open[h]) {
        continue;
      }
      int a = halves.from(h);
      int b = halves.to(h);
      // A strip's width at a vertex is at most twice its mean width.
      double margin = 2 * THIN * length(h);
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

  private int[] openVertices() {
    boolean[] used = new boolean[edges.vertexCount];
    int count = 0;
    for (int h = 0; h < open.length; h++) {
      if (open[h] && !used[halves.from(h)]) {
        used[halves.from(h)] = true;
        count++;
      }
    }
    int[] vertices = new int[count];
    int n = 0;
    for (int v = 0; v < edges.vertexCount; v++) {
      if (used[v]) {
        vertices[n++] = v;
      }
    }
    return vertices;
  }

  private double length(int h) {
    int a = halves.from(h);
    int b = halves.to(h);
    return Math.hypot(edges.x[b] - edges.x[a], edges.y[b] - edges.y[a]);
  }

  private void consider(int h, int g, PairIndex seen) {
    if (!open[g] || (h >> 1) == (g >> 1)) {
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
    if (td >= tc || Math.abs(wd - wc) > NEARLY_PARALLEL * (tc - td)) {
      return;
    }
    double from = Math.max(0, td);
    double to = Math.min(length, tc);
    double slope = (wc - wd) / (tc - td);
    double wFrom = wd + (from - td) * slope;
    double wTo = wd + (to - td) * slope;
    double width = (wFrom + wTo) / 2;
    double thicker = Math.max(thicknessBeyond[h], thicknessBeyond[g]);
    if (to <= from || wFrom < 0 || wTo < 0 || width <= 0 || width > MUCH_THINNER * thicker) {
      return;
    }
    double middle = (from + to) / 2;
    double x = edges.x[a] + middle * ux - width / 2 * uy;
    double y = edges.y[a] + middle * uy + width / 2 * ux;
    strips.add(new Strip(h, g, width, to - from, x, y));
  }

  private List<Gap> gather() {
    DisjointSets sets = new DisjointSets(strips.size());
    int[] firstOnHalf = new int[open.length];
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
    List<Integer> sides = new ArrayList<>();
    for (int i = set; i < strips.size(); i++) {
      if (sets.find(i) == set) {
        Strip strip = strips.get(i);
        length += strip.lengthM;
        area += strip.lengthM * strip.widthM;
        longest = strip.lengthM > longest.lengthM ? strip : longest;
        sides.add(strip.half);
        sides.add(strip.other);
      }
    }
    double width = area / length;
    if (width <= THIN * length && isClear(longest)) {
      gaps.add(new Gap(longest.x, longest.y, width, sides));
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
