package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * Makes a cut shorter by moving elements near it from side to side, one at a time, always the one
 * that frees most shared unknowns, also uphill, and going back to the best state seen (Fiduccia and
 * Mattheyses 1982, elements as cells and unknowns as nets). Only a band of elements on either side
 * of the cut can move.
 */
final class CutSmoothing {
  /** Rounds of moves at most; a round that gains nothing is the last. */
  private static final int ROUNDS = 3;

  /** Moves without a gain after which a round ends, and that as a share of the shared unknowns. */
  private static final int PATIENCE = 12;

  private static final double PATIENCE_SHARE = 0.25;

  /** Elements of the band for every shared unknown. */
  private static final int BAND = 8;

  /** Neither side shrinks below this share of the elements. */
  private static final double SMALLEST_SIDE = 0.25;

  private final Band band;
  private final int all;
  private final boolean[] right;
  private final int[] onLeft;
  private final int[] onRight;
  private final int[] gain;
  private final int[] next;
  private final int[] previous;
  private final int span;
  private final int[][] head;
  private final boolean[] listed;
  private final boolean[] moved;
  private int left;
  private int shared;

  private CutSmoothing(Band band, int all, int left) {
    this.band = band;
    this.all = all;
    this.left = left;
    right = band.right();
    onLeft = band.fixedLeft();
    onRight = band.fixedRight();
    int n = right.length;
    gain = new int[n];
    next = new int[n];
    previous = new int[n];
    listed = new boolean[n];
    moved = new boolean[n];
    int widest = 0;
    for (int e = 0; e < n; e++) {
      widest = Math.max(widest, band.start()[e + 1] - band.start()[e]);
      int[] count = right[e] ? onRight : onLeft;
      for (int p = band.start()[e]; p < band.start()[e + 1]; p++) {
        count[band.member()[p]]++;
      }
    }
    span = widest;
    head = new int[2][2 * span + 1];
    for (int u = 0; u < onLeft.length; u++) {
      shared += cut(u) ? 1 : 0;
    }
  }

  /**
   * Smooths a cut.
   *
   * @param set the elements
   * @param bins the bins that were cut
   * @param cut the last bin of the first half
   * @param right the elements of the second half, changed here
   */
  static void of(ElementSet set, Bisection.Bins bins, int cut, boolean[] right) {
    int left = 0;
    for (boolean r : right) {
      left += r ? 0 : 1;
    }
    int shared = 0;
    long after = -2L << cut;
    for (int u = 0; u < set.interior(); u++) {
      long bits = bins.ofUnknown(u);
      shared += (bits & after) != 0 && (bits & ~after) != 0 ? 1 : 0;
    }
    if (shared > 0) {
      Band band = Band.of(set, bins, cut, right, BAND * shared);
      CutSmoothing smoothing = new CutSmoothing(band, right.length, left);
      int rounds = 0;
      while (rounds < ROUNDS && smoothing.shared > 0 && smoothing.round()) {
        rounds++;
      }
      for (int i = 0; i < band.element().length; i++) {
        right[band.element()[i]] = smoothing.right[i];
      }
    }
  }

  private boolean cut(int u) {
    return onLeft[u] > 0 && onRight[u] > 0;
  }

  private int gainOf(int e) {
    int sum = 0;
    for (int p = band.start()[e]; p < band.start()[e + 1]; p++) {
      int u = band.member()[p];
      int here = right[e] ? onRight[u] : onLeft[u];
      int there = right[e] ? onLeft[u] : onRight[u];
      if (here + there > 1) {
        sum += here == 1 ? 1 : there == 0 ? -1 : 0;
      }
    }
    return sum;
  }

  private void list(int e) {
    int[] heads = head[right[e] ? 1 : 0];
    int slot = gain[e] + span;
    next[e] = heads[slot];
    previous[e] = -1;
    if (heads[slot] >= 0) {
      previous[heads[slot]] = e;
    }
    heads[slot] = e;
  }

  private void unlist(int e) {
    if (previous[e] >= 0) {
      next[previous[e]] = next[e];
    } else {
      head[right[e] ? 1 : 0][gain[e] + span] = next[e];
    }
    if (next[e] >= 0) {
      previous[next[e]] = previous[e];
    }
  }

  private void listThoseAtTheCut() {
    Arrays.fill(head[0], -1);
    Arrays.fill(head[1], -1);
    Arrays.fill(listed, false);
    Arrays.fill(moved, false);
    for (int e = 0; e < right.length; e++) {
      for (int p = band.start()[e]; p < band.start()[e + 1] && !listed[e]; p++) {
        if (cut(band.member()[p])) {
          gain[e] = gainOf(e);
          listed[e] = true;
          list(e);
        }
      }
    }
  }

  private boolean round() {
    listThoseAtTheCut();
    int patience = PATIENCE + (int) (PATIENCE_SHARE * shared);
    int[] moves = new int[2 * patience];
    int made = 0;
    int best = 0;
    double before = Bisection.rating(shared, left, all);
    double bestRating = before;
    while (made - best < patience) {
      int e = choose();
      if (e < 0) {
        break;
      }
      move(e);
      if (made == moves.length) {
        moves = Arrays.copyOf(moves, 2 * made);
      }
      moves[made++] = e;
      double rating = Bisection.rating(shared, left, all);
      if (rating < bestRating) {
        bestRating = rating;
        best = made;
      }
    }
    while (made > best) {
      putBack(moves[--made]);
    }
    return bestRating < before;
  }

  /** The listed element with the largest gain that may leave its side; the larger side first. */
  private int choose() {
    int least = (int) (SMALLEST_SIDE * all) + 1;
    boolean fromLeft = left > least;
    boolean fromRight = all - left > least;
    int larger = 2 * left >= all ? 0 : 1;
    for (int slot = 2 * span; slot >= 0; slot--) {
      for (int i = 0; i < 2; i++) {
        int side = i == 0 ? larger : 1 - larger;
        if (head[side][slot] >= 0 && (side == 0 ? fromLeft : fromRight)) {
          return head[side][slot];
        }
      }
    }
    return -1;
  }

  private void move(int e) {
    unlist(e);
    moved[e] = true;
    boolean side = right[e];
    right[e] = !side;
    left += side ? 1 : -1;
    int[] hereCount = side ? onRight : onLeft;
    int[] thereCount = side ? onLeft : onRight;
    for (int p = band.start()[e]; p < band.start()[e + 1]; p++) {
      int u = band.member()[p];
      int here = hereCount[u]--;
      int there = thereCount[u]++;
      shared += (here > 1 ? 1 : 0) - (there > 0 ? 1 : 0);
      int stayers = (here == 2 ? 1 : 0) + (there == 0 ? 1 : 0);
      int others = -(there == 1 ? 1 : 0) - (here == 1 ? 1 : 0);
      if (stayers != 0 && here > 1 || others != 0 && there > 0) {
        for (int h = band.from()[u]; h < band.from()[u + 1]; h++) {
          int neighbour = band.holder()[h];
          adapt(neighbour, right[neighbour] == side ? stayers : others);
        }
      }
    }
  }

  private void adapt(int e, int change) {
    if (moved[e] || change == 0) {
      return;
    }
    if (listed[e]) {
      unlist(e);
      gain[e] += change;
    } else {
      listed[e] = true;
      gain[e] = gainOf(e);
    }
    list(e);
  }

  private void putBack(int e) {
    boolean side = right[e];
    right[e] = !side;
    left += side ? 1 : -1;
    for (int p = band.start()[e]; p < band.start()[e + 1]; p++) {
      int u = band.member()[p];
      int here = side ? onRight[u]-- : onLeft[u]--;
      int there = side ? onLeft[u]++ : onRight[u]++;
      shared += (here > 1 ? 1 : 0) - (there > 0 ? 1 : 0);
    }
  }
}
