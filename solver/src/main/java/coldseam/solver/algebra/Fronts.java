package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * The structure of every front: a dense trapezium of {@code width} columns whose rows are its own
 * columns and then the rows below, ascending; and below that the triangle of updates it passes to
 * its parent. Fronts are in postorder, so the children of a front, last to first, are reached by
 * stepping back over subtrees.
 *
 * @param first first column of each front, and the number of columns
 * @param parent parent of each front, −1 for a root
 * @param firstChild first child of each front in order, −1 if none
 * @param sibling next child of the same parent, −1 for the last
 * @param rowStart where the rows below the columns of each front begin, and the end of the last
 * @param row the rows, as columns of the factor
 * @param rowInParent the same rows as rows of the parent, counted from its first column
 * @param entryStart where the entries of the matrix of each front begin, and the end of the last
 * @param entrySource where the entry stands in the matrix
 * @param entryTarget where it goes in the trapezium, row after row
 */
record Fronts(
    int[] first,
    int[] parent,
    int[] firstChild,
    int[] sibling,
    int[] rowStart,
    int[] row,
    int[] rowInParent,
    int[] entryStart,
    int[] entrySource,
    int[] entryTarget) {

  int count() {
    return parent.length;
  }

  int width(int f) {
    return first[f + 1] - first[f];
  }

  int rows(int f) {
    return rowStart[f + 1] - rowStart[f];
  }

  /** Multiplications with additions to eliminate a front. */
  double work(int f) {
    double w = width(f);
    double m = rows(f);
    return w * w * w / 6 + w * w * m / 2 + w * m * m / 2;
  }

  static Fronts of(SparseSymmetric matrix, EliminationTree tree, Amalgamation joined) {
    return new Builder(matrix, tree, joined).build();
  }

  private static final class Builder {
    private final EliminationTree.Lower lower;
    private final int[] column;
    private final int[] parent;
    private final int[] first;
    private final int[] firstChild;
    private final int[] sibling;
    private final int[] rowStart;
    private final int[] row;
    private final int[] rowInParent;
    private final int[] entryStart;
    private final int[] entrySource;
    private final int[] entryTarget;
    private final int[] member;
    private final int[] diagonal;
    private final int[] position;

    Builder(SparseSymmetric matrix, EliminationTree tree, Amalgamation joined) {
      lower = tree.lower();
      column = joined.column();
      parent = joined.parent();
      int n = column.length;
      int fronts = parent.length;
      first = starts(joined.width());
      rowStart = starts(joined.rows());
      row = new int[rowStart[fronts]];
      rowInParent = new int[rowStart[fronts]];
      firstChild = new int[fronts];
      sibling = new int[fronts];
      member = new int[n];
      diagonal = new int[n];
      position = new int[n];
      int[] entries = new int[fronts];
      for (int c = 0; c < n; c++) {
        member[column[c]] = c;
        entries[joined.front()[c]] += 1 + lower.start()[c + 1] - lower.start()[c];
      }
      for (int u = 0; u < n; u++) {
        diagonal[tree.place()[u]] = matrix.start(u + 1) - 1;
      }
      entryStart = starts(entries);
      entrySource = new int[entryStart[fronts]];
      entryTarget = new int[entryStart[fronts]];
      linkChildren();
    }

    private static int[] starts(int[] lengths) {
      int[] starts = new int[lengths.length + 1];
      for (int i = 0; i < lengths.length; i++) {
        starts[i + 1] = Math.addExact(starts[i], lengths[i]);
      }
      return starts;
    }

    private void linkChildren() {
      Arrays.fill(firstChild, -1);
      Arrays.fill(sibling, -1);
      for (int f = parent.length - 1; f >= 0; f--) {
        if (parent[f] >= 0) {
          sibling[f] = firstChild[parent[f]];
          firstChild[parent[f]] = f;
        }
      }
    }

    Fronts build() {
      Arrays.fill(position, -1);
      for (int f = 0; f < parent.length; f++) {
        collectRows(f);
        placeEntries(f);
      }
      return new Fronts(
          first,
          parent,
          firstChild,
          sibling,
          rowStart,
          row,
          rowInParent,
          entryStart,
          entrySource,
          entryTarget);
    }

    private void collectRows(int f) {
      int end = first[f + 1];
      int at = rowStart[f];
      for (int k = first[f]; k < end; k++) {
        int c = member[k];
        for (int p = lower.start()[c]; p < lower.start()[c + 1]; p++) {
          int r = column[lower.row()[p]];
          if (r >= end && position[r] != f) {
            position[r] = f;
            row[at++] = r;
          }
        }
      }
      for (int child = firstChild[f]; child >= 0; child = sibling[child]) {
        for (int p = rowStart[child + 1] - 1; p >= rowStart[child] && row[p] >= end; p--) {
          if (position[row[p]] != f) {
            position[row[p]] = f;
            row[at++] = row[p];
          }
        }
      }
      if (at != rowStart[f + 1]) {
        throw new IllegalStateException(
            "front " + f + " has " + (at - rowStart[f]) + " rows, not " + rows(f));
      }
      Arrays.sort(row, rowStart[f], at);
    }

    private int rows(int f) {
      return rowStart[f + 1] - rowStart[f];
    }

    private void placeEntries(int f) {
      int width = first[f + 1] - first[f];
      for (int k = first[f]; k < first[f + 1]; k++) {
        position[k] = k - first[f];
      }
      for (int p = rowStart[f]; p < rowStart[f + 1]; p++) {
        position[row[p]] = width + p - rowStart[f];
      }
      for (int child = firstChild[f]; child >= 0; child = sibling[child]) {
        for (int p = rowStart[child]; p < rowStart[child + 1]; p++) {
          rowInParent[p] = position[row[p]];
        }
      }
      int at = entryStart[f];
      for (int k = first[f]; k < first[f + 1]; k++) {
        int c = member[k];
        int own = k - first[f];
        entrySource[at] = diagonal[c];
        entryTarget[at++] = own * width + own;
        for (int p = lower.start()[c]; p < lower.start()[c + 1]; p++) {
          entrySource[at] = lower.source()[p];
          entryTarget[at++] = position[column[lower.row()[p]]] * width + own;
        }
      }
      for (int p = rowStart[f]; p < rowStart[f + 1]; p++) {
        position[row[p]] = -1;
      }
    }
  }
}
