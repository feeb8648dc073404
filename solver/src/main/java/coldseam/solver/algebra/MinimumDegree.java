package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * Minimum-degree order (Tinney and Walker 1967) of a small set: each time the unknown with the
 * fewest neighbours left is eliminated and its neighbours are joined. Neighbours outside the set
 * (the halo) count, but are not numbered. One machine word holds the neighbours of an unknown.
 */
final class MinimumDegree {
  /** Most unknowns of a set, halo included. */
  static final int MOST = Long.SIZE;

  private MinimumDegree() {}

  /** Numbers the interior unknowns of the set from {@code base} on. */
  static void number(ElementSet set, int base, int[] place) {
    long[] neighbours = neighbours(set);
    long left = set.interior() == MOST ? -1L : (1L << set.interior()) - 1;
    int next = base;
    while (left != 0) {
      int best = -1;
      int fewest = Integer.MAX_VALUE;
      for (long rest = left; rest != 0; rest &= rest - 1) {
        int u = Long.numberOfTrailingZeros(rest);
        int degree = Long.bitCount(neighbours[u]);
        if (degree < fewest) {
          fewest = degree;
          best = u;
        }
      }
      place[set.unknown()[best]] = next++;
      left &= ~(1L << best);
      long joined = neighbours[best];
      for (long rest = joined; rest != 0; rest &= rest - 1) {
        int u = Long.numberOfTrailingZeros(rest);
        neighbours[u] = (neighbours[u] | joined) & ~(1L << u) & ~(1L << best);
      }
    }
  }

  private static long[] neighbours(ElementSet set) {
    long[] neighbours = new long[set.unknown().length];
    int[] member = set.member();
    for (int e = 0; e < set.elements(); e++) {
      long all = 0;
      for (int p = set.start()[e]; p < set.start()[e + 1]; p++) {
        all |= 1L << member[p];
      }
      for (int p = set.start()[e]; p < set.start()[e + 1]; p++) {
        neighbours[member[p]] |= all & ~(1L << member[p]);
      }
    }
    return neighbours;
  }

  /** Numbers the interior unknowns in the order in which they are met. */
  static void numberAsMet(ElementSet set, int base, int[] place) {
    int[] unknown = Arrays.copyOf(set.unknown(), set.interior());
    for (int u = 0; u < unknown.length; u++) {
      place[unknown[u]] = base + u;
    }
  }
}
