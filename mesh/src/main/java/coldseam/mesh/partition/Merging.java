package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Makes faces of one label one: drops the edges inside them unless a line divides them there, then
 * the vertices left over on straight edges. What remains are the edges of the partition.
 */
final class Merging {
  private final Boundaries all;
  private final int[] loopLabels;
  private final double snapM;
  private final boolean[] kept;
  private final int[] offset;
  private final int[] around;
  private final boolean[] removable;
  private final boolean[] done;
  private final int[] chain;

  /** Pairs of vertices that an edge joins already. */
  private final PairIndex taken = new PairIndex(64);

  private double largestShiftM;

  /**
   * Prepares to merge.
   *
   * @param all labelled edges
   * @param loopLabels the label of each loop
   * @param snapM how far a dropped vertex may lie from the straight edge
   */
  Merging(Boundaries all, int[] loopLabels, double snapM) {
    this.all = all;
    this.loopLabels = loopLabels;
    this.snapM = snapM;
    kept = new boolean[all.edgeCount];
    done = new boolean[2 * all.edgeCount];
    offset = new int[all.vertexCount + 1];
    chain = new int[all.edgeCount + 1];
    keepDividing();
    around = gatherAround();
    removable = new boolean[all.vertexCount];
    for (int v = 0; v < all.vertexCount; v++) {
      removable[v] = isRemovable(v);
    }
  }

  /** How far any dropped vertex lies from the straight edge that replaces it, at most, m. */
  double largestShiftM() {
    return largestShiftM;
  }

  private void keepDividing() {
    DisjointSets regions = new DisjointSets(loopLabels.length);
    for (int e = 0; e < all.edgeCount; e++) {
      boolean sameLabel = loopLabels[all.leftLoop[e]] == loopLabels[all.rightLoop[e]];
      kept[e] = !sameLabel;
      if (sameLabel && all.lines[e].length == 0) {
        regions.unite(all.leftLoop[e], all.rightLoop[e]);
      }
    }
    for (int e = 0; e < all.edgeCount; e++) {
      if (all.lines[e].length > 0
          && regions.find(all.leftLoop[e]) != regions.find(all.rightLoop[e])) {
        kept[e] = true;
      }
    }
  }

  private int[] gatherAround() {
    for (int e = 0; e < all.edgeCount; e++) {
      if (kept[e]) {
        offset[all.start[e] + 1]++;
        offset[all.end[e] + 1]++;
      }
    }
    for (int v = 0; v < all.vertexCount; v++) {
      offset[v + 1] += offset[v];
    }
    int[] halves = new int[offset[all.vertexCount]];
    int[] fill = Arrays.copyOf(offset, all.vertexCount);
    for (int e = 0; e < all.edgeCount; e++) {
      if (kept[e]) {
        halves[fill[all.start[e]]++] = 2 * e;
        halves[fill[all.end[e]]++] = 2 * e + 1;
      }
    }
    return halves;
  }

  private boolean isRemovable(int v) {
    if (offset[v + 1] - offset[v] != 2) {
      return false;
    }
    int one = around[offset[v]];
    int two = around[offset[v] + 1];
    if (all.pinned[v] && all.lines[one >> 1].length > 0) {
      return false;
    }
    return Arrays.equals(all.lines[one >> 1], all.lines[two >> 1])
        && bendAt(v, to(one), to(two)) <= snapM;
  }

  private double bendAt(int v, int a, int b) {
    return Segments.distance(all.x[v], all.y[v], all.x[a], all.y[a], all.x[b], all.y[b]);
  }

  /** The edges that remain, with only the vertices they use. */
  Boundaries merged() {
    Boundaries merged = new Boundaries(all.x, all.y, all.edgeCount);
    for (int e = 0; e < all.edgeCount; e++) {
      if (kept[e] && !removable[all.start[e]] && !removable[all.end[e]]) {
        taken.add(all.start[e], all.end[e]);
      }
    }
    for (int v = 0; v < all.vertexCount; v++) {
      if (!removable[v]) {
        followChains(v, merged);
      }
    }
    // A ring so finely divided that no single vertex of it seems to turn.
    for (int e = 0; e < all.edgeCount; e++) {
      if (kept[e] && !done[2 * e]) {
        removable[all.start[e]] = false;
        followChains(all.start[e], merged);
      }
    }
    return compact(merged);
  }

  private void followChains(int v, Boundaries merged) {
    for (int i = offset[v]; i < offset[v + 1]; i++) {
      if (!done[around[i]]) {
        followChain(around[i], merged);
      }
    }
  }

  /** Walks from a vertex that stays to the next that stays and lays straight edges on the way. */
  private void followChain(int first, Boundaries merged) {
    int n = 0;
    int h = first;
    while (true) {
      chain[n++] = h;
      done[h] = true;
      done[h ^ 1] = true;
      int v = to(h);
      if (!removable[v]) {
        break;
      }
      int one = around[offset[v]];
      h = one == (h ^ 1) ? around[offset[v] + 1] : one;
    }
    int i = 0;
    while (i < n) {
      int j = i;
      while (j + 1 < n && isStraight(i, j + 1)) {
        j++;
      }
      addStraight(i, j, merged);
      i = j + 1;
    }
  }

  /** Whether the chain from the start of half-edge i to the end of half-edge j is straight. */
  private boolean isStraight(int i, int j) {
    int a = from(chain[i]);
    int b = to(chain[j]);
    if (a == b || taken.contains(a, b)) {
      return false;
    }
    for (int k = i; k < j; k++) {
      if (bendAt(to(chain[k]), a, b) > snapM) {
        return false;
      }
    }
    return true;
  }

  private void addStraight(int i, int j, Boundaries merged) {
    int a = from(chain[i]);
    int b = to(chain[j]);
    boolean leftOwn = true;
    boolean rightOwn = true;
    for (int k = i; k <= j; k++) {
      int h = chain[k];
      boolean forward = (h & 1) == 0;
      leftOwn &= forward ? all.leftOwn[h >> 1] : all.rightOwn[h >> 1];
      rightOwn &= forward ? all.rightOwn[h >> 1] : all.leftOwn[h >> 1];
      if (k < j) {
        largestShiftM = Math.max(largestShiftM, bendAt(to(h), a, b));
      }
    }
    taken.add(a, b);
    int h = chain[i];
    boolean forward = (h & 1) == 0;
    int left = forward ? all.leftLoop[h >> 1] : all.rightLoop[h >> 1];
    int right = forward ? all.rightLoop[h >> 1] : all.leftLoop[h >> 1];
    merged.add(a, b, left, right, leftOwn, rightOwn, all.lines[h >> 1]);
  }

  private static Boundaries compact(Boundaries loose) {
    int[] number = new int[loose.vertexCount];
    Arrays.fill(number, -1);
    double[] x = new double[loose.vertexCount];
    double[] y = new double[loose.vertexCount];
    int n = 0;
    for (int e = 0; e < loose.edgeCount; e++) {
      for (int end = 0; end < 2; end++) {
        int v = end == 0 ? loose.start[e] : loose.end[e];
        if (number[v] < 0) {
          x[n] = loose.x[v];
          y[n] = loose.y[v];
          number[v] = n++;
        }
      }
    }
    Boundaries compact = new Boundaries(Arrays.copyOf(x, n), Arrays.copyOf(y, n), loose.edgeCount);
    for (int e = 0; e < loose.edgeCount; e++) {
      compact.addPiece(loose, e, number[loose.start[e]], number[loose.end[e]], loose.lines[e]);
    }
    compact.trim();
    return compact;
  }

  private int from(int h) {
    return (h & 1) == 0 ? all.start[h >> 1] : all.end[h >> 1];
  }

  private int to(int h) {
    return (h & 1) == 0 ? all.end[h >> 1] : all.start[h >> 1];
  }
}
