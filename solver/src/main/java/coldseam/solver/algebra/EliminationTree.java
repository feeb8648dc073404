package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * The elimination tree of a symmetric matrix in a given order: the parent of a column is the row of
 * the first entry below the diagonal of its column of the factor (Liu 1986). Columns are renumbered
 * in postorder; everything here is in these new numbers.
 *
 * @param place for each unknown its column, in postorder
 * @param parent parent of each column, −1 for a root
 * @param lower the lower triangle of the matrix by columns, without the diagonal
 * @param count entries of each column of the factor, the diagonal counted
 */
record EliminationTree(int[] place, int[] parent, Lower lower, int[] count) {

  /**
   * Entries below the diagonal by columns.
   *
   * @param start where each column begins, and the end of the last
   * @param row row of each entry, in no order
   * @param source where the entry stands in the matrix given
   */
  record Lower(int[] start, int[] row, int[] source) {}

  static EliminationTree of(SparseSymmetric matrix, int[] order) {
    int[] parentInOrder = parents(matrix, order);
    int[] rank = postorder(parentInOrder);
    int n = order.length;
    int[] place = new int[n];
    int[] parent = new int[n];
    for (int u = 0; u < n; u++) {
      place[u] = rank[order[u]];
    }
    for (int c = 0; c < n; c++) {
      parent[rank[c]] = parentInOrder[c] < 0 ? -1 : rank[parentInOrder[c]];
    }
    Lower lower = lower(matrix, place);
    return new EliminationTree(place, parent, lower, counts(parent, lower));
  }

  /** Liu's algorithm with path compression, row after row. */
  private static int[] parents(SparseSymmetric matrix, int[] place) {
    int n = place.length;
    Grouped rows = group(matrix, place, true);
    int[] start = rows.start;
    int[] column = rows.other;
    int[] parent = new int[n];
    int[] ancestor = new int[n];
    for (int i = 0; i < n; i++) {
      parent[i] = -1;
      ancestor[i] = -1;
      for (int p = start[i]; p < start[i + 1]; p++) {
        int j = column[p];
        while (ancestor[j] != -1 && ancestor[j] != i) {
          int up = ancestor[j];
          ancestor[j] = i;
          j = up;
        }
        if (ancestor[j] == -1 && j != i) {
          ancestor[j] = i;
          parent[j] = i;
        }
      }
    }
    return parent;
  }

  /** Rank of each node when every node comes after all its descendants, children in order. */
  static int[] postorder(int[] parent) {
    int n = parent.length;
    int[] firstChild = new int[n];
    int[] sibling = new int[n];
    Arrays.fill(firstChild, -1);
    int firstRoot = -1;
    for (int c = n - 1; c >= 0; c--) {
      if (parent[c] < 0) {
        sibling[c] = firstRoot;
        firstRoot = c;
      } else {
        sibling[c] = firstChild[parent[c]];
        firstChild[parent[c]] = c;
      }
    }
    int[] rank = new int[n];
    int next = 0;
    int node = firstRoot;
    while (node >= 0) {
      while (firstChild[node] >= 0) {
        node = firstChild[node];
      }
      rank[node] = next++;
      while (sibling[node] < 0 && parent[node] >= 0) {
        node = parent[node];
        rank[node] = next++;
      }
      node = sibling[node];
    }
    return rank;
  }

  private static Lower lower(SparseSymmetric matrix, int[] place) {
    Grouped columns = group(matrix, place, false);
    return new Lower(columns.start, columns.other, columns.source);
  }

  /** Entries off the diagonal by one of their two places: the other place, and where they stand. */
  private record Grouped(int[] start, int[] other, int[] source) {}

  /** Groups the entries by the greater or the smaller of their two places. */
  private static Grouped group(SparseSymmetric matrix, int[] place, boolean byGreater) {
    int n = place.length;
    int[] start = new int[n + 1];
    for (int c = 0; c < n; c++) {
      int diagonal = matrix.start(c + 1) - 1;
      for (int p = matrix.start(c); p < diagonal; p++) {
        int pr = place[matrix.row(p)];
        start[pr > place[c] == byGreater ? pr + 1 : place[c] + 1]++;
      }
    }
    for (int i = 0; i < n; i++) {
      start[i + 1] += start[i];
    }
    int[] other = new int[start[n]];
    int[] source = new int[start[n]];
    int[] fill = Arrays.copyOf(start, n);
    for (int c = 0; c < n; c++) {
      int pc = place[c];
      int diagonal = matrix.start(c + 1) - 1;
      for (int p = matrix.start(c); p < diagonal; p++) {
        int pr = place[matrix.row(p)];
        boolean byRow = pr > pc == byGreater;
        int at = fill[byRow ? pr : pc]++;
        other[at] = byRow ? pc : pr;
        source[at] = p;
      }
    }
    return new Grouped(start, other, source);
  }

  /** Column counts of the factor (Gilbert, Ng and Peyton 1994), columns in postorder. */
  private static int[] counts(int[] parent, Lower lower) {
    int n = parent.length;
    int[] firstDescendant = new int[n];
    int[] count = new int[n];
    Arrays.fill(firstDescendant, -1);
    for (int c = 0; c < n; c++) {
      // a leaf of the tree starts with its diagonal
      count[c] = firstDescendant[c] < 0 ? 1 : 0;
      for (int a = c; a >= 0 && firstDescendant[a] < 0; a = parent[a]) {
        firstDescendant[a] = c;
      }
    }
    int[] lastLeaf = new int[n];
    int[] lastVisit = new int[n];
    int[] set = new int[n];
    Arrays.fill(lastLeaf, -1);
    Arrays.fill(lastVisit, -1);
    for (int c = 0; c < n; c++) {
      set[c] = c;
    }
    for (int c = 0; c < n; c++) {
      if (parent[c] >= 0) {
        count[parent[c]]--;
      }
      for (int p = lower.start()[c]; p < lower.start()[c + 1]; p++) {
        int i = lower.row()[p];
        if (firstDescendant[c] > lastVisit[i]) {
          count[c]++;
          if (lastLeaf[i] >= 0) {
            count[find(set, lastLeaf[i])]--;
          }
          lastLeaf[i] = c;
        }
        lastVisit[i] = c;
      }
      if (parent[c] >= 0) {
        set[c] = parent[c];
      }
    }
    for (int c = 0; c < n; c++) {
      if (parent[c] >= 0) {
        count[parent[c]] += count[c];
      }
    }
    return count;
  }

  private static int find(int[] set, int node) {
    int root = node;
    while (set[root] != root) {
      root = set[root];
    }
    int at = node;
    while (set[at] != root) {
      int up = set[at];
      set[at] = root;
      at = up;
    }
    return root;
  }
}
