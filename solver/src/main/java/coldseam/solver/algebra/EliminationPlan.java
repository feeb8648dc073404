package coldseam.solver.algebra;

/**
 * Everything about a factorisation that follows from the places of the entries alone: worked out
 * once and used for every matrix with its entries in the same places. Immutable.
 *
 * <p>References: elimination tree, Liu 1990; multifrontal method, Duff and Reid 1983, Liu 1992.
 */
public final class EliminationPlan {
  private final SparseSymmetric.Places places;
  private final Fronts fronts;
  private final int[] column;
  private final WorkUnits units;
  private final Layout layout;

  private EliminationPlan(
      SparseSymmetric.Places places, Fronts fronts, int[] column, WorkUnits units, Layout layout) {
    this.places = places;
    this.fronts = fronts;
    this.column = column;
    this.units = units;
    this.layout = layout;
  }

  /**
   * Plans a factorisation.
   *
   * @param matrix a matrix with its entries in the places meant
   * @param order for each unknown its place in the order of elimination, from 0
   * @return the plan
   * @throws IllegalArgumentException if {@code order} is not a permutation of the unknowns
   * @throws ArithmeticException if the factor is too large to be held in memory
   */
  public static EliminationPlan of(SparseSymmetric matrix, int[] order) {
    checkOrder(matrix.unknowns(), order);
    EliminationTree tree = EliminationTree.of(matrix, order);
    Amalgamation joined = Amalgamation.of(tree);
    Fronts fronts = Fronts.of(matrix, tree, joined);
    int[] column = new int[order.length];
    for (int u = 0; u < column.length; u++) {
      column[u] = joined.column()[tree.place()[u]];
    }
    WorkUnits units = WorkUnits.of(fronts);
    return new EliminationPlan(matrix.places(), fronts, column, units, Layout.of(fronts, units));
  }

  /** Plans the factorisation of a matrix whose unknowns are numbered in their order. */
  static EliminationPlan inOrder(SparseSymmetric matrix) {
    int[] order = new int[matrix.unknowns()];
    for (int u = 0; u < order.length; u++) {
      order[u] = u;
    }
    return of(matrix, order);
  }

  private static void checkOrder(int unknowns, int[] order) {
    boolean[] taken = new boolean[unknowns];
    if (order.length != unknowns) {
      throw new IllegalArgumentException(order.length + " places for " + unknowns + " unknowns");
    }
    for (int place : order) {
      if (place < 0 || place >= unknowns || taken[place]) {
        throw new IllegalArgumentException("place " + place + " is not taken just once");
      }
      taken[place] = true;
    }
  }

  /** How many unknowns. */
  public int unknowns() {
    return column.length;
  }

  /** Entries of the triangular factor, with the zeros stored among them. */
  public long factorEntries() {
    long sum = 0;
    for (int f = 0; f < fronts.count(); f++) {
      long w = fronts.width(f);
      sum += w * (w + 1) / 2 + w * fronts.rows(f);
    }
    return sum;
  }

  /** Multiplications with additions of a factorisation. */
  public double work() {
    double sum = 0;
    for (int f = 0; f < fronts.count(); f++) {
      sum += fronts.work(f);
    }
    return sum;
  }

  double smallestPivotShare(double[][] factor, SparseSymmetric matrix) {
    double smallest = Double.POSITIVE_INFINITY;
    double[] pivot = new double[column.length];
    for (int u = 0; u < units.count(); u++) {
      for (int f = units.start()[u]; f < units.start()[u + 1]; f++) {
        int width = fronts.width(f);
        for (int k = 0; k < width; k++) {
          double root = factor[u][layout.trapezium()[f] + k * width + k];
          pivot[fronts.first()[f] + k] = root * root;
        }
      }
    }
    for (int u = 0; u < column.length; u++) {
      double diagonal = matrix.value(matrix.start(u + 1) - 1);
      smallest = Math.min(smallest, pivot[column[u]] / diagonal);
    }
    return smallest;
  }

  Fronts fronts() {
    return fronts;
  }

  WorkUnits units() {
    return units;
  }

  Layout layout() {
    return layout;
  }

  /** Column of the factor for unknown {@code u}. */
  int column(int u) {
    return column[u];
  }

  /** Unknown of a column of the factor. */
  int unknownOf(int c) {
    for (int u = 0; u < column.length; u++) {
      if (column[u] == c) {
        return u;
      }
    }
    throw new IllegalArgumentException("column " + c + " of " + column.length);
  }

  boolean fits(SparseSymmetric matrix) {
    return places.same(matrix.places());
  }
}
