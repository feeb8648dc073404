package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * Entries of a symmetric matrix, one by one: of every pair of equal off-diagonal entries only one
 * is given, on either side of the diagonal; several at one place are added.
 */
public final class EntryList {
  private int[] rows = new int[64];
  private int[] columns = new int[64];
  private double[] values = new double[64];
  private int count;

  /** An empty list. */
  public EntryList() {}

  /**
   * Adds an entry.
   *
   * @param row its row, from 0
   * @param column its column
   * @param value what to add at that place
   */
  public void add(int row, int column, double value) {
    if (count == rows.length) {
      rows = Arrays.copyOf(rows, 2 * count);
      columns = Arrays.copyOf(columns, 2 * count);
      values = Arrays.copyOf(values, 2 * count);
    }
    rows[count] = row;
    columns[count] = column;
    values[count++] = value;
  }

  int count() {
    return count;
  }

  int row(int i) {
    return Math.min(rows[i], columns[i]);
  }

  int column(int i) {
    return Math.max(rows[i], columns[i]);
  }

  double value(int i) {
    return values[i];
  }
}
