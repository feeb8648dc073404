package coldseam.solver.algebra;

import java.util.Arrays;
import java.util.concurrent.RecursiveAction;

/**
 * Nested dissection of the elements of a finite-element mesh (George 1973; Lipton, Rose and Tarjan
 * 1979): the elements are halved, the unknowns shared by the halves are numbered last, and the
 * halves are treated in the same way down to small sets, which are numbered by minimum degree.
 *
 * <p>Works on any cover of a matrix by elements: every two unknowns with an entry in the matrix
 * stand together in some element. Elements may have different numbers of unknowns; an unknown that
 * stands in very many of them (one floating value for a whole stretch of outline) ends among the
 * last. The order depends on nothing but the arguments.
 */
public final class NestedDissection {
  /** Sets with more elements are dissected side by side. */
  private static final int SIDE_BY_SIDE_FROM = 4000;

  private NestedDissection() {}

  /**
   * Orders unknowns for elimination.
   *
   * @param unknowns how many unknowns
   * @param start where each element begins in {@code member}, and the end of the last
   * @param member unknowns of the elements in turn; negative numbers are passed over
   * @param x x of each element's centre, in any unit, or null if there are no coordinates
   * @param y y of each element's centre, or null
   * @return for each unknown its place in the order of elimination, from 0
   * @throws IllegalArgumentException if the lengths do not match or a number is out of range
   */
  public static int[] of(int unknowns, int[] start, int[] member, double[] x, double[] y) {
    int elements = start.length - 1;
    if (elements < 0
        || member.length < start[elements]
        || (x == null) != (y == null)
        || (x != null && (x.length != elements || y.length != elements))) {
      throw new IllegalArgumentException("the arrays of the elements do not match in length");
    }
    int[] place = new int[unknowns];
    Arrays.fill(place, -1);
    ElementSet all = FirstSet.of(unknowns, start, member, x, y);
    int alone = unknowns - all.interior();
    if (elements > SIDE_BY_SIDE_FROM) {
      new Dissection(all, alone, place).invoke();
    } else {
      dissect(all, alone, place);
    }
    int next = 0;
    for (int u = 0; u < unknowns; u++) {
      if (place[u] < 0) {
        place[u] = next++;
      }
    }
    return place;
  }

  /**
   * Orders the unknowns of a matrix of which nothing else is known: every entry off the diagonal is
   * an element of two unknowns. Slower than with the elements of a mesh, and not as good.
   *
   * @param matrix the matrix
   * @return for each unknown its place in the order of elimination, from 0
   */
  public static int[] of(SparseSymmetric matrix) {
    int n = matrix.unknowns();
    int pairs = matrix.entries() - n;
    int[] start = new int[pairs + 1];
    int[] member = new int[2 * pairs];
    int pair = 0;
    for (int c = 0; c < n; c++) {
      for (int p = matrix.start(c); p < matrix.start(c + 1) - 1; p++) {
        member[2 * pair] = matrix.row(p);
        member[2 * pair + 1] = c;
        start[++pair] = 2 * pair;
      }
    }
    return of(n, start, member, null, null);
  }

  /** One set, dissected side by side with its sibling. */
  private static final class Dissection extends RecursiveAction {
    private static final long serialVersionUID = 1L;
    private final transient ElementSet set;
    private final int base;
    private final int[] place;

    Dissection(ElementSet set, int base, int[] place) {
      this.set = set;
      this.base = base;
      this.place = place;
    }

    @Override
    protected void compute() {
      if (set.elements() <= SIDE_BY_SIDE_FROM || set.unknown().length <= MinimumDegree.MOST) {
        dissect(set, base, place);
        return;
      }
      ElementSet[] halves = halves(set, base, place);
      invokeAll(
          new Dissection(halves[0], base, place),
          new Dissection(halves[1], base + halves[0].interior(), place));
    }
  }

  private static void dissect(ElementSet set, int base, int[] place) {
    if (set.unknown().length <= MinimumDegree.MOST) {
      MinimumDegree.number(set, base, place);
    } else if (set.elements() == 1) {
      MinimumDegree.numberAsMet(set, base, place);
    } else {
      ElementSet[] halves = halves(set, base, place);
      dissect(halves[0], base, place);
      dissect(halves[1], base + halves[0].interior(), place);
    }
  }

  /** Halves a set and numbers what the halves share, at the end of the numbers of the set. */
  private static ElementSet[] halves(ElementSet set, int base, int[] place) {
    boolean[] right = Bisection.of(set);
    boolean[] shared = shared(set, right);
    int next = base + set.interior();
    for (int u = set.interior() - 1; u >= 0; u--) {
      if (shared[u]) {
        place[set.unknown()[u]] = --next;
      }
    }
    return new ElementSet[] {set.side(right, false, shared), set.side(right, true, shared)};
  }

  private static boolean[] shared(ElementSet set, boolean[] right) {
    int interior = set.interior();
    boolean[] onLeft = new boolean[interior];
    boolean[] shared = new boolean[interior];
    int[] start = set.start();
    int[] member = set.member();
    for (int e = 0; e < right.length; e++) {
      if (!right[e]) {
        for (int p = start[e]; p < start[e + 1]; p++) {
          if (member[p] < interior) {
            onLeft[member[p]] = true;
          }
        }
      }
    }
    for (int e = 0; e < right.length; e++) {
      if (right[e]) {
        for (int p = start[e]; p < start[e + 1]; p++) {
          if (member[p] < interior && onLeft[member[p]]) {
            shared[member[p]] = true;
          }
        }
      }
    }
    return shared;
  }
}
