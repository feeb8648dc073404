package coldseam.solver.algebra;

/**
 * The factor L of A = L Lᵀ found row by row (Davis, Direct Methods for Sparse Linear Systems, 2006,
 * section 4.7), of a matrix whose unknowns are numbered in their order of elimination. Neighbouring
 * columns of one structure are taken in pairs. Starts at once and is the faster way for small
 * matrices: a run as short as a solve of one detail meets this loop before it is compiled well, so
 * it is kept to bare arrays.
 */
final class UpLookingCholesky implements Factor {
  private final int unknowns;

  /** Where each column begins in {@code row} and {@code value}, without its diagonal entry. */
  private final int[] start;

  private final int[] row;
  private final double[] value;
  private final double[] diagonal;

  private UpLookingCholesky(int unknowns, int[] start, int[] row) {
    this.unknowns = unknowns;
    this.start = start;
    this.row = row;
    value = new double[row.length];
    diagonal = new double[unknowns];
  }

  /**
   * Factors a matrix.
   *
   * @throws NotPositiveDefiniteException if it is not positive definite or not finite
   */
  static UpLookingCholesky of(SparseSymmetric matrix) {
    int n = matrix.unknowns();
    int[] parent = new int[n];
    int[] start = columnStarts(matrix, parent);
    UpLookingCholesky factor = new UpLookingCholesky(n, start, columnRows(matrix, parent, start));
    factor.eliminate(matrix);
    return factor;
  }

  /** Finds the elimination tree, and by it how many entries each column of the factor has. */
  private static int[] columnStarts(SparseSymmetric matrix, int[] parent) {
    int n = parent.length;
    int[] from = matrix.starts();
    int[] rows = matrix.rows();
    int[] seen = new int[n];
    int[] start = new int[n + 1];
    for (int k = 0; k < n; k++) {
      parent[k] = -1;
      seen[k] = k;
      int end = from[k + 1] - 1;
      for (int p = from[k]; p < end; p++) {
        for (int i = rows[p]; seen[i] != k; i = parent[i]) {
          seen[i] = k;
          start[i + 1]++;
          if (parent[i] < 0) {
            parent[i] = k;
          }
        }
      }
    }
    for (int k = 0; k < n; k++) {
      start[k + 1] += start[k];
    }
    return start;
  }

  /** The rows of the entries of each column, ascending. */
  private static int[] columnRows(SparseSymmetric matrix, int[] parent, int[] start) {
    int n = parent.length;
    int[] from = matrix.starts();
    int[] rows = matrix.rows();
    int[] seen = new int[n];
    int[] fill = start.clone();
    int[] row = new int[start[n]];
    for (int k = 0; k < n; k++) {
      seen[k] = k;
      int end = from[k + 1] - 1;
      for (int p = from[k]; p < end; p++) {
        for (int i = rows[p]; seen[i] != k; i = parent[i]) {
          seen[i] = k;
          row[fill[i]++] = k;
        }
      }
    }
    return row;
  }

  /** The columns in which each row has an entry, ascending; where each row begins goes first. */
  private int[] rowColumns(int[] rowStart) {
    int n = unknowns;
    int[] rows = row;
    int[] from = start;
    for (int r : rows) {
      rowStart[r + 1]++;
    }
    for (int k = 0; k < n; k++) {
      rowStart[k + 1] += rowStart[k];
    }
    int[] fill = rowStart.clone();
    int[] column = new int[rows.length];
    for (int c = 0; c < n; c++) {
      int end = from[c + 1];
      for (int p = from[c]; p < end; p++) {
        column[fill[rows[p]]++] = c;
      }
    }
    return column;
  }

  /** Finds the values, row by row; {@code x} holds the row that is being solved for. */
  private void eliminate(SparseSymmetric matrix) {
    int n = unknowns;
    int[] rowStart = new int[n + 1];
    int[] column = rowColumns(rowStart);
    int[] fill = start.clone();
    double[] x = new double[n];
    int[] from = matrix.starts();
    int[] rows = matrix.rows();
    double[] values = matrix.values();
    for (int k = 0; k < n; k++) {
      int own = from[k + 1] - 1;
      for (int p = from[k]; p < own; p++) {
        x[rows[p]] = values[p];
      }
      double pivot = values[own] - solveRow(x, column, rowStart[k], rowStart[k + 1], fill);
      if (!(pivot > 0) || Double.isInfinite(pivot)) {
        throw new NotPositiveDefiniteException(k, n, pivot);
      }
      diagonal[k] = Math.sqrt(pivot);
    }
  }

  /** Solves for one row, stores it and returns the sum of its squares. */
  private double solveRow(double[] x, int[] column, int first, int end, int[] fill) {
    double squares = 0;
    int at = first;
    while (at < end) {
      int i = column[at];
      if (at + 3 < end && paired(i) && paired(i + 1) && paired(i + 2)) {
        squares += takeFour(x, i, fill);
        at += 4;
      } else if (at + 1 < end && paired(i)) {
        squares += takeTwo(x, i, fill);
        at += 2;
      } else {
        squares += takeOne(x, i, fill);
        at++;
      }
    }
    return squares;
  }

  /** Whether the next column has the same entries below its diagonal, so that both go together. */
  private boolean paired(int i) {
    return row[start[i]] == i + 1 && start[i + 1] - start[i] == start[i + 2] - start[i + 1] + 1;
  }

  private double takeOne(double[] x, int i, int[] fill) {
    int[] rows = row;
    double[] values = value;
    double a = x[i] / diagonal[i];
    x[i] = 0;
    int stop = fill[i]++;
    for (int p = start[i]; p < stop; p++) {
      x[rows[p]] -= values[p] * a;
    }
    values[stop] = a;
    return a * a;
  }

  private double takeTwo(double[] x, int i, int[] fill) {
    int[] rows = row;
    double[] values = value;
    int p = start[i];
    int q = start[i + 1];
    double a = x[i] / diagonal[i];
    double b = (x[i + 1] - values[p] * a) / diagonal[i + 1];
    x[i] = 0;
    x[i + 1] = 0;
    int stop = fill[i]++;
    for (p++; p < stop; p++, q++) {
      x[rows[p]] -= values[p] * a + values[q] * b;
    }
    values[stop] = a;
    values[fill[i + 1]++] = b;
    return a * a + b * b;
  }

  private double takeFour(double[] x, int i, int[] fill) {
    int[] rows = row;
    double[] values = value;
    int p = start[i];
    int q = start[i + 1];
    int r = start[i + 2];
    int s = start[i + 3];
    double a = x[i] / diagonal[i];
    double b = (x[i + 1] - values[p] * a) / diagonal[i + 1];
    double c = (x[i + 2] - values[p + 1] * a - values[q] * b) / diagonal[i + 2];
    double d = (x[i + 3] - values[p + 2] * a - values[q + 1] * b - values[r] * c) / diagonal[i + 3];
    x[i] = 0;
    x[i + 1] = 0;
    x[i + 2] = 0;
    x[i + 3] = 0;
    int stop = fill[i]++;
    for (p += 3, q += 2, r++; p < stop; p++, q++, r++, s++) {
      x[rows[p]] -= values[p] * a + values[q] * b + values[r] * c + values[s] * d;
    }
    values[stop] = a;
    values[fill[i + 1]++] = b;
    values[fill[i + 2]++] = c;
    values[fill[i + 3]++] = d;
    return a * a + b * b + c * c + d * d;
  }

  @Override
  public double[][] substitute(double[]... b) {
    double[][] x = new double[b.length][];
    for (int k = 0; k < b.length; k++) {
      x[k] = b[k].clone();
      forward(x[k]);
      backward(x[k]);
    }
    return x;
  }

  private void forward(double[] x) {
    int[] rows = row;
    double[] values = value;
    for (int c = 0; c < x.length; c++) {
      double xc = x[c] / diagonal[c];
      x[c] = xc;
      int end = start[c + 1];
      for (int p = start[c]; p < end; p++) {
        x[rows[p]] -= values[p] * xc;
      }
    }
  }

  private void backward(double[] x) {
    int[] rows = row;
    double[] values = value;
    for (int c = x.length - 1; c >= 0; c--) {
      double sum = x[c];
      int end = start[c + 1];
      for (int p = start[c]; p < end; p++) {
        sum -= values[p] * x[rows[p]];
      }
      x[c] = sum / diagonal[c];
    }
  }

  @Override
  public long factorEntries() {
    return (long) row.length + unknowns;
  }
}
