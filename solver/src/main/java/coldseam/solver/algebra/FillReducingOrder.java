package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * Geometric nested dissection of a finite-element mesh (George 1973; Lipton, Rose and Tarjan 1979).
 * The elements are halved at the median of their centres across the direction in which fewer nodes
 * are shared by the two halves; the shared nodes come last, the halves are treated in the same way.
 * Meshes of large systems are left to {@link NestedDissection}.
 */
public final class FillReducingOrder {
  /** Element sets of this size or less are not halved. */
  private static final int SMALLEST_SET = 4;

  /** Above this size both directions are tried, below it the longer one is taken. */
  private static final int BOTH_DIRECTIONS_FROM = 64;

  private final int[] nodes;
  private final int perElement;
  private final double[] x;
  private final double[] y;
  private final int[] elements;
  private final int[] place;
  private final int[] seen;
  private int stamp;
  private int next;

  private FillReducingOrder(
      int nodeCount, int[] nodes, int perElement, double[] x, double[] y, int unknowns) {
    this.nodes = nodes;
    this.perElement = perElement;
    this.x = x;
    this.y = y;
    elements = new int[x.length];
    for (int e = 0; e < elements.length; e++) {
      elements[e] = e;
    }
    place = new int[nodeCount];
    Arrays.fill(place, -1);
    seen = new int[nodeCount];
    next = unknowns;
  }

  /**
   * Orders nodes for elimination.
   *
   * @param free which nodes are unknowns; the others are left out
   * @param nodes node numbers, {@code perElement} for each element in turn
   * @param perElement nodes of an element
   * @param x x of the centre of each element, in any unit
   * @param y y of the centre of each element
   * @return for each node its place in the order of elimination, from 0, or −1 for a node that is
   *     left out
   * @throws IllegalArgumentException if the lengths do not match or a free node is in no element
   */
  public static int[] of(boolean[] free, int[] nodes, int perElement, double[] x, double[] y) {
    if (x.length != y.length || nodes.length != perElement * x.length) {
      throw new IllegalArgumentException("the arrays of the elements do not match in length");
    }
    int unknowns = 0;
    for (boolean f : free) {
      unknowns += f ? 1 : 0;
    }
    if (unknowns >= SymmetricSystem.LARGE) {
      return dissected(free, unknowns, nodes, perElement, x, y);
    }
    return geometric(free, unknowns, nodes, perElement, x, y);
  }

  /** The order of this class itself, quick to begin with. */
  static int[] geometric(
      boolean[] free, int unknowns, int[] nodes, int perElement, double[] x, double[] y) {
    FillReducingOrder order = new FillReducingOrder(free.length, nodes, perElement, x, y, unknowns);
    for (int n = 0; n < free.length; n++) {
      order.seen[n] = free[n] ? 0 : Integer.MAX_VALUE;
    }
    order.dissect(0, x.length);
    if (order.next != 0) {
      throw new IllegalArgumentException(order.next + " nodes belong to no element");
    }
    return order.place;
  }

  /** The order of {@link NestedDissection}, which leaves fewer entries in large factors. */
  static int[] dissected(
      boolean[] free, int unknowns, int[] nodes, int perElement, double[] x, double[] y) {
    int[] number = new int[free.length];
    int next = 0;
    for (int n = 0; n < number.length; n++) {
      number[n] = free[n] ? next++ : -1;
    }
    int[] member = new int[nodes.length];
    for (int i = 0; i < member.length; i++) {
      member[i] = number[nodes[i]];
    }
    int[] start = new int[x.length + 1];
    for (int e = 0; e <= x.length; e++) {
      start[e] = e * perElement;
    }
    int[] order = NestedDissection.of(unknowns, start, member, x, y);
    for (int n = 0; n < number.length; n++) {
      number[n] = free[n] ? order[number[n]] : -1;
    }
    return number;
  }

  private void dissect(int from, int to) {
    if (to - from <= SMALLEST_SET) {
      for (int i = from; i < to; i++) {
        for (int p = elements[i] * perElement; p < (elements[i] + 1) * perElement; p++) {
          putLast(nodes[p]);
        }
      }
      return;
    }
    int middle = (from + to) >>> 1;
    boolean wide = extent(x, from, to) >= extent(y, from, to);
    select(wide ? x : y, from, to, middle);
    if (to - from >= BOTH_DIRECTIONS_FROM) {
      int shared = countShared(from, middle, to);
      select(wide ? y : x, from, to, middle);
      if (countShared(from, middle, to) >= shared) {
        select(wide ? x : y, from, to, middle);
      }
    }
    markLeft(from, middle);
    for (int i = middle; i < to; i++) {
      for (int p = elements[i] * perElement; p < (elements[i] + 1) * perElement; p++) {
        if (seen[nodes[p]] == stamp) {
          putLast(nodes[p]);
        }
      }
    }
    dissect(middle, to);
    dissect(from, middle);
  }

  private void putLast(int node) {
    if (seen[node] != Integer.MAX_VALUE) {
      seen[node] = Integer.MAX_VALUE;
      place[node] = --next;
    }
  }

  private void markLeft(int from, int middle) {
    stamp++;
    for (int i = from; i < middle; i++) {
      for (int p = elements[i] * perElement; p < (elements[i] + 1) * perElement; p++) {
        if (seen[nodes[p]] != Integer.MAX_VALUE) {
          seen[nodes[p]] = stamp;
        }
      }
    }
  }

  private int countShared(int from, int middle, int to) {
    markLeft(from, middle);
    int left = stamp;
    stamp++;
    int count = 0;
    for (int i = middle; i < to; i++) {
      for (int p = elements[i] * perElement; p < (elements[i] + 1) * perElement; p++) {
        if (seen[nodes[p]] == left) {
          seen[nodes[p]] = stamp;
          count++;
        }
      }
    }
    return count;
  }

  private double extent(double[] key, int from, int to) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int i = from; i < to; i++) {
      low = Math.min(low, key[elements[i]]);
      high = Math.max(high, key[elements[i]]);
    }
    return high - low;
  }

  /** Puts the elements with the smaller keys before the middle (Hoare 1961). */
  private void select(double[] key, int from, int to, int middle) {
    int low = from;
    int high = to - 1;
    while (low < high) {
      double pivot = key[elements[(low + high) >>> 1]];
      int i = low;
      int j = high;
      while (i <= j) {
        while (key[elements[i]] < pivot) {
          i++;
        }
        while (key[elements[j]] > pivot) {
          j--;
        }
        if (i <= j) {
          int swapped = elements[i];
          elements[i++] = elements[j];
          elements[j--] = swapped;
        }
      }
      if (middle <= j) {
        high = j;
      } else if (middle >= i) {
        low = i;
      } else {
        return;
      }
    }
  }
}
