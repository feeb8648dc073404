package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * A sparse symmetric matrix, one triangle stored: the upper triangle by columns, rows ascending in
 * each column and the diagonal therefore last (read the other way round: the lower triangle by
 * rows). Every diagonal entry is stored. Immutable.
 */
public final class SparseSymmetric {
  private final Places places;
  private final int[] start;
  private final int[] row;
  private final double[] value;

  private SparseSymmetric(Places places, double[] value) {
    this.places = places;
    this.value = value;
    start = places.start;
    row = places.row;
  }

  /** Where the entries of a matrix stand. */
  static final class Places {
    private final int[] start;
    private final int[] row;

    private Places(int[] start, int[] row) {
      this.start = start;
      this.row = row;
    }

    boolean same(Places other) {
      int n = start.length - 1;
      return this == other
          || Arrays.equals(start, other.start)
              && Arrays.equals(row, 0, start[n], other.row, 0, start[n]);
    }
  }

  /** Where the entries stand. */
  Places places() {
    return places;
  }

  /**
   * Wraps arrays that hold the upper triangle by columns. The arrays are taken over, not copied,
   * and must not be changed afterwards.
   *
   * @param start where each column begins in {@code row} and {@code value}, and the end of the last
   * @param row row of each entry, ascending in each column, the diagonal last
   * @param value the entries
   * @return the matrix
   * @throws IllegalArgumentException if the arrays do not hold an upper triangle in this form
   */
  public static SparseSymmetric of(int[] start, int[] row, double[] value) {
    int n = start.length - 1;
    if (n < 0 || start[0] != 0 || row.length < start[n] || value.length < start[n]) {
      throw new IllegalArgumentException("the arrays of the matrix do not match in length");
    }
    for (int c = 0; c < n; c++) {
      int end = start[c + 1];
      if (end <= start[c] || row[end - 1] != c || row[start[c]] < 0) {
        throw new IllegalArgumentException("column " + c + " of " + n + " has no diagonal entry");
      }
      for (int p = start[c] + 1; p < end; p++) {
        if (row[p] <= row[p - 1]) {
          throw new IllegalArgumentException("rows of column " + c + " of " + n + " not ascending");
        }
      }
    }
    return new SparseSymmetric(new Places(start, row), value);
  }

  /**
   * Sums entries up.
   *
   * @param unknowns how many unknowns
   * @param rows row of each entry; of every pair of equal off-diagonal entries only one is given,
   *     on either side of the diagonal
   * @param columns column of each entry
   * @param values the entries; several at one place are added in the order given
   * @param count how many of the entries to use
   * @return the matrix
   * @throws IllegalArgumentException if an unknown has no diagonal entry or an index is out of
   *     range
   */
  public static SparseSymmetric sum(
      int unknowns, int[] rows, int[] columns, double[] values, int count) {
    int[] byRow = new int[count];
    int[] fill = new int[unknowns + 1];
    for (int i = 0; i < count; i++) {
      if (Math.min(rows[i], columns[i]) < 0 || Math.max(rows[i], columns[i]) >= unknowns) {
        throw new IllegalArgumentException(
            "entry (" + rows[i] + ", " + columns[i] + ") of " + unknowns + " unknowns");
      }
      fill[Math.min(rows[i], columns[i]) + 1]++;
    }
    accumulate(fill);
    for (int i = 0; i < count; i++) {
      byRow[fill[Math.min(rows[i], columns[i])]++] = i;
    }
    int[] start = new int[unknowns + 1];
    for (int i = 0; i < count; i++) {
      start[Math.max(rows[i], columns[i]) + 1]++;
    }
    accumulate(start);
    int[] row = new int[count];
    double[] value = new double[count];
    int[] end = Arrays.copyOf(start, unknowns);
    for (int i : byRow) {
      int r = Math.min(rows[i], columns[i]);
      int c = Math.max(rows[i], columns[i]);
      int last = end[c] - 1;
      if (last >= start[c] && row[last] == r) {
        value[last] += values[i];
      } else {
        row[last + 1] = r;
        value[last + 1] = values[i];
        end[c]++;
      }
    }
    return packed(start, end, row, value);
  }

  private static void accumulate(int[] counts) {
    for (int i = 1; i < counts.length; i++) {
      counts[i] += counts[i - 1];
    }
  }

  private static SparseSymmetric packed(int[] start, int[] end, int[] row, double[] value) {
    int used = 0;
    int[] packed = new int[start.length];
    for (int c = 0; c < end.length; c++) {
      int length = end[c] - start[c];
      if (length == 0 || row[end[c] - 1] != c) {
        throw new IllegalArgumentException("unknown " + c + " has no entry of its own");
      }
      System.arraycopy(row, start[c], row, used, length);
      System.arraycopy(value, start[c], value, used, length);
      used += length;
      packed[c + 1] = used;
    }
    return new SparseSymmetric(
        new Places(packed, Arrays.copyOf(row, used)), Arrays.copyOf(value, used));
  }

  /** How many unknowns. */
  public int unknowns() {
    return start.length - 1;
  }

  /** How many entries are stored, the diagonal and one triangle. */
  public int entries() {
    return start[start.length - 1];
  }

  /** Where column {@code c} begins; its diagonal stands just before the start of the next. */
  int start(int c) {
    return start[c];
  }

  /** Row of entry {@code p}. */
  int row(int p) {
    return row[p];
  }

  /** Value of entry {@code p}. */
  double value(int p) {
    return value[p];
  }

  /** The column starts, not to be changed. */
  int[] starts() {
    return start;
  }

  /** The rows, not to be changed. */
  int[] rows() {
    return row;
  }

  /** The values, not to be changed: for the inner loops of this package. */
  double[] values() {
    return value;
  }

  /**
   * A matrix with its entries in the same places.
   *
   * @param values the entries, in the order of this matrix; taken over, not copied
   * @return the matrix
   * @throws IllegalArgumentException if there are too few values
   */
  public SparseSymmetric withValues(double[] values) {
    if (values.length < entries()) {
      throw new IllegalArgumentException(values.length + " values for " + entries() + " entries");
    }
    return new SparseSymmetric(places, values);
  }

  /**
   * The residual b − A x.
   *
   * @param b right-hand side
   * @param x a solution
   * @return b − A x, a new array
   */
  public double[] residual(double[] b, double[] x) {
    double[] r = b.clone();
    for (int c = 0; c < x.length; c++) {
      int diagonal = start[c + 1] - 1;
      double xc = x[c];
      double sum = value[diagonal] * xc;
      for (int p = start[c]; p < diagonal; p++) {
        r[row[p]] -= value[p] * xc;
        sum += value[p] * x[row[p]];
      }
      r[c] -= sum;
    }
    return r;
  }

  /** The largest sum of absolute values in a row (maximum norm). */
  public double norm() {
    double[] sums = new double[unknowns()];
    for (int c = 0; c < sums.length; c++) {
      for (int p = start[c]; p < start[c + 1]; p++) {
        double size = Math.abs(value[p]);
        sums[c] += size;
        if (row[p] != c) {
          sums[row[p]] += size;
        }
      }
    }
    double largest = 0;
    for (double s : sums) {
      largest = Math.max(largest, s);
    }
    return largest;
  }
}
