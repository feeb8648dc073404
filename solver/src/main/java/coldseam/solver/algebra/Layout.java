package coldseam.solver.algebra;

/**
 * Where everything stands in memory while fronts are eliminated. The trapezia of a unit stand one
 * after the other in an array of its own. The updates inside a unit stand on two piles, by turns
 * down the tree: those that a front takes in lie on top of one pile while its own go on the other.
 *
 * @param trapezium where the trapezium of each front begins in the array of its unit
 * @param storage entries of the trapezia of each unit
 * @param odd whether each front is an odd number of steps below the root of its tree
 * @param update where the updates of each front begin on their pile
 * @param evenPile height of the pile of the even fronts of each unit
 * @param oddPile height of the other pile
 */
record Layout(
    int[] trapezium, int[] storage, boolean[] odd, int[] update, int[] evenPile, int[] oddPile) {

  /** Most rows of updates whose triangle can be numbered. */
  private static final int MOST_ROWS = 46_340;

  static Layout of(Fronts fronts, WorkUnits units) {
    int n = fronts.count();
    boolean[] odd = new boolean[n];
    for (int f = n - 1; f >= 0; f--) {
      odd[f] = fronts.parent()[f] >= 0 && !odd[fronts.parent()[f]];
    }
    int[] trapezium = new int[n];
    int[] update = new int[n];
    int[] storage = new int[units.count()];
    int[] evenPile = new int[units.count()];
    int[] oddPile = new int[units.count()];
    for (int u = 0; u < units.count(); u++) {
      int first = units.start()[u];
      int last = units.start()[u + 1];
      int[] top = new int[2];
      for (int f = first; f < last; f++) {
        trapezium[f] = storage[u];
        storage[u] = Math.addExact(storage[u], trapeziumSize(fronts, f));
        int pile = odd[f] ? 1 : 0;
        if (fronts.parent()[f] >= 0 && fronts.parent()[f] < last) {
          update[f] = top[pile];
          top[pile] = Math.addExact(top[pile], DenseUpdate.triangle(fronts.rows(f)));
          if (pile == 0) {
            evenPile[u] = Math.max(evenPile[u], top[0]);
          } else {
            oddPile[u] = Math.max(oddPile[u], top[1]);
          }
        }
        for (int c = fronts.firstChild()[f]; c >= 0; c = fronts.sibling()[c]) {
          if (c >= first) {
            top[1 - pile] -= DenseUpdate.triangle(fronts.rows(c));
          }
        }
      }
    }
    return new Layout(trapezium, storage, odd, update, evenPile, oddPile);
  }

  private static int trapeziumSize(Fronts fronts, int f) {
    if (fronts.rows(f) > MOST_ROWS) {
      throw new ArithmeticException("a front has " + fronts.rows(f) + " rows of updates");
    }
    return Math.multiplyExact(fronts.width(f), fronts.width(f) + fronts.rows(f));
  }
}
