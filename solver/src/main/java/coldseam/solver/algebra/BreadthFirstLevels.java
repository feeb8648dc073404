package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * Distance of each element from an element at the rim, counted in steps between elements that share
 * an unknown (George and Liu 1979: a walk from the last element of a first walk). Parts that do not
 * hang together follow one another. Unknowns held by very many elements are no neighbourhood and
 * are not followed.
 */
final class BreadthFirstLevels {
  /** Unknowns held by more elements are not followed. */
  private static final int MOST_HOLDERS = 100;

  private final ElementSet set;
  private final int[] from;
  private final int[] holder;
  private final int[] queue;
  private final int[] level;
  private final boolean[] followed;

  private BreadthFirstLevels(ElementSet set) {
    this.set = set;
    int[][] elements = set.elementsOfUnknowns();
    from = elements[0];
    holder = elements[1];
    queue = new int[set.elements()];
    level = new int[set.elements()];
    followed = new boolean[set.interior()];
  }

  /** Writes the level of each element into {@code key}. */
  static void of(ElementSet set, double[] key) {
    BreadthFirstLevels walk = new BreadthFirstLevels(set);
    walk.all(0);
    int rim = walk.queue[walk.queue.length - 1];
    walk.all(rim);
    for (int e = 0; e < key.length; e++) {
      key[e] = walk.level[e];
    }
  }

  private void all(int first) {
    Arrays.fill(level, -1);
    Arrays.fill(followed, false);
    int end = walk(first, 0, 0);
    for (int e = 0; e < level.length; e++) {
      if (level[e] < 0) {
        end = walk(e, end, level[queue[end - 1]] + 1);
      }
    }
  }

  private int walk(int first, int at, int firstLevel) {
    int head = at;
    int tail = at;
    level[first] = firstLevel;
    queue[tail++] = first;
    while (head < tail) {
      int e = queue[head++];
      for (int p = set.start()[e]; p < set.start()[e + 1]; p++) {
        int u = set.member()[p];
        if (u >= set.interior() || followed[u] || from[u + 1] - from[u] > MOST_HOLDERS) {
          continue;
        }
        followed[u] = true;
        for (int h = from[u]; h < from[u + 1]; h++) {
          if (level[holder[h]] < 0) {
            level[holder[h]] = level[e] + 1;
            queue[tail++] = holder[h];
          }
        }
      }
    }
    return tail;
  }
}
