package coldseam.solver.algebra;

import java.util.BitSet;

/** Elimination on sets, as in the textbook: slow and plain, to check the fast way against. */
final class SymbolicCheck {
  private SymbolicCheck() {}

  /** For each column of the factor, in the given order, its rows below the diagonal. */
  static BitSet[] columns(SparseSymmetric matrix, int[] place) {
    int n = matrix.unknowns();
    BitSet[] columns = new BitSet[n];
    for (int c = 0; c < n; c++) {
      columns[c] = new BitSet(n);
    }
    for (int c = 0; c < n; c++) {
      for (int p = matrix.start(c); p < matrix.start(c + 1) - 1; p++) {
        int i = place[c];
        int j = place[matrix.row(p)];
        columns[Math.min(i, j)].set(Math.max(i, j));
      }
    }
    for (int c = 0; c < n; c++) {
      int parent = columns[c].nextSetBit(0);
      if (parent >= 0) {
        columns[parent].or(columns[c]);
        columns[parent].clear(parent);
      }
    }
    return columns;
  }

  /** Entries of the factor, the diagonal counted. */
  static long fill(SparseSymmetric matrix, int[] place) {
    long sum = matrix.unknowns();
    for (BitSet column : columns(matrix, place)) {
      sum += column.cardinality();
    }
    return sum;
  }
}
