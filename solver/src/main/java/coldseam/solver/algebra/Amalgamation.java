package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * The fronts of a factorisation: groups of columns that are eliminated together, and the tree they
 * form. Columns with the same rows below make up a front of themselves (fundamental supernodes); a
 * front is then joined to its parent wherever the time saved by having one front less is worth more
 * than the time for the zeros that are treated as entries (Ashcraft and Grimes 1989).
 *
 * @param width columns of each front, fronts in postorder
 * @param rows rows of each front below its columns
 * @param parent parent of each front, −1 for a root
 * @param column for each column of the tree its number in which columns of a front are consecutive
 * @param front for each column of the tree its front
 */
record Amalgamation(int[] width, int[] rows, int[] parent, int[] column, int[] front) {
  /** Time to start a front and one row of it, against one multiplication with addition. */
  private static final double FRONT_COST = 1500;

  private static final double ROW_COST = 20;

  /** Time to pass one entry to the parent, in the same measure. */
  private static final double PASSING_COST = 6;

  static Amalgamation of(EliminationTree tree) {
    int n = tree.parent().length;
    int[] front = new int[n];
    int fronts = fundamental(tree, front);
    int[] width = new int[fronts];
    int[] rows = new int[fronts];
    int[] parent = new int[fronts];
    for (int c = 0; c < n; c++) {
      int f = front[c];
      width[f]++;
      rows[f] = tree.count()[c] - 1;
      parent[f] = tree.parent()[c] < 0 ? -1 : front[tree.parent()[c]];
    }
    int[] joinedTo = join(width, rows, parent);
    return renumbered(tree, front, joinedTo, width, rows, parent);
  }

  private static int fundamental(EliminationTree tree, int[] front) {
    int[] parent = tree.parent();
    int[] count = tree.count();
    int f = -1;
    for (int c = 0; c < front.length; c++) {
      boolean goesOn = c > 0 && parent[c - 1] == c && count[c] == count[c - 1] - 1;
      front[c] = goesOn ? f : ++f;
    }
    return f + 1;
  }

  /** Joins fronts to their parents, children first; −1 for the fronts that remain. */
  private static int[] join(int[] width, int[] rows, int[] parent) {
    int[] joinedTo = new int[width.length];
    Arrays.fill(joinedTo, -1);
    for (int f = 0; f < width.length; f++) {
      int p = parent[f];
      if (p >= 0) {
        int w = width[f] + width[p];
        double apart = cost(width[f], rows[f]) + cost(width[p], rows[p]);
        if (cost(w, rows[p]) <= apart) {
          joinedTo[f] = p;
          width[p] = w;
        }
      }
    }
    return joinedTo;
  }

  /** Time for a front in multiplications with additions. */
  private static double cost(int width, int rows) {
    double w = width;
    double m = rows;
    double elimination = w * w * w / 6 + w * w * m / 2 + w * m * m / 2;
    return FRONT_COST + ROW_COST * (w + m) + elimination + PASSING_COST * m * m / 2;
  }

  private static Amalgamation renumbered(
      EliminationTree tree, int[] front, int[] joinedTo, int[] width, int[] rows, int[] parent) {
    int[] remaining = new int[joinedTo.length];
    int[] number = new int[joinedTo.length];
    int fronts = 0;
    for (int f = joinedTo.length - 1; f >= 0; f--) {
      remaining[f] = joinedTo[f] < 0 ? f : remaining[joinedTo[f]];
      fronts += joinedTo[f] < 0 ? 1 : 0;
    }
    int[] kept = new int[fronts];
    int next = 0;
    for (int f = 0; f < joinedTo.length; f++) {
      if (joinedTo[f] < 0) {
        number[f] = next;
        kept[next++] = f;
      }
    }
    int[] keptParent = new int[fronts];
    for (int k = 0; k < fronts; k++) {
      int p = parent[kept[k]];
      keptParent[k] = p < 0 ? -1 : number[remaining[p]];
    }
    int[] rank = EliminationTree.postorder(keptParent);
    int[] newWidth = new int[fronts];
    int[] newRows = new int[fronts];
    int[] newParent = new int[fronts];
    for (int k = 0; k < fronts; k++) {
      newWidth[rank[k]] = width[kept[k]];
      newRows[rank[k]] = rows[kept[k]];
      newParent[rank[k]] = keptParent[k] < 0 ? -1 : rank[keptParent[k]];
    }
    int[] fill = new int[fronts];
    for (int f = 1; f < fronts; f++) {
      fill[f] = fill[f - 1] + newWidth[f - 1];
    }
    int n = front.length;
    int[] column = new int[n];
    int[] newFront = new int[n];
    for (int c = 0; c < n; c++) {
      int f = rank[number[remaining[front[c]]]];
      column[c] = fill[f]++;
      newFront[c] = f;
    }
    return new Amalgamation(newWidth, newRows, newParent, column, newFront);
  }
}
