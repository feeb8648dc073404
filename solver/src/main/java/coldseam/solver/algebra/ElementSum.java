package coldseam.solver.algebra;

import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * Sums the matrices of finite elements up, column by column: each column asks the elements that
 * hold its unknown. Columns of large matrices are made side by side; every entry is a sum in the
 * order of the elements, however many processors there are.
 */
public final class ElementSum {
  /** Columns made in one go. */
  private static final int BATCH = 4096;

  /** Matrices with fewer unknowns are made by one thread. */
  private static final int WORTH_SHARING = 8 * BATCH;

  private final int unknowns;
  private final int perElement;
  private final int[] member;
  private final Entries entries;
  private final EntryList others;

  /** Where each unknown's places in {@code member} begin in {@code places}. */
  private final int[] placeStart;

  private final int[] places;

  /** Where each column's entries of {@code others} begin in {@code otherPlaces}. */
  private final int[] otherStart;

  private final int[] otherPlaces;
  private final int[] length;

  /** The matrix of each element. */
  @FunctionalInterface
  public interface Entries {
    /**
     * An entry of an element's matrix.
     *
     * @param element the element
     * @param p one of its places
     * @param q another or the same
     * @return the entry, the same with p and q exchanged; an entry of 0 takes no place
     */
    double entry(int element, int p, int q);
  }

  private ElementSum(
      int unknowns, int perElement, int[] member, Entries entries, EntryList others) {
    this.unknowns = unknowns;
    this.perElement = perElement;
    this.member = member;
    this.entries = entries;
    this.others = others;
    placeStart = new int[unknowns + 1];
    for (int u : member) {
      if (u >= 0) {
        placeStart[u + 1]++;
      }
    }
    accumulate(placeStart);
    places = new int[placeStart[unknowns]];
    int[] fill = Arrays.copyOf(placeStart, unknowns);
    for (int i = 0; i < member.length; i++) {
      if (member[i] >= 0) {
        places[fill[member[i]]++] = i;
      }
    }
    otherStart = new int[unknowns + 1];
    for (int i = 0; i < others.count(); i++) {
      otherStart[others.column(i) + 1]++;
    }
    accumulate(otherStart);
    otherPlaces = new int[others.count()];
    System.arraycopy(otherStart, 0, fill, 0, unknowns);
    for (int i = 0; i < otherPlaces.length; i++) {
      otherPlaces[fill[others.column(i)]++] = i;
    }
    length = new int[unknowns];
  }

  private static void accumulate(int[] counts) {
    for (int i = 1; i < counts.length; i++) {
      counts[i] += counts[i - 1];
    }
  }

  /**
   * Sums.
   *
   * @param unknowns how many unknowns
   * @param perElement places of an element
   * @param member the unknown at each place, {@code perElement} for each element in turn; negative
   *     for a place that is left out. Two places of one element may hold the same unknown
   * @param entries the elements' matrices; asked from several threads
   * @param others what else to add
   * @return the matrix
   * @throws IllegalArgumentException if an unknown has no diagonal entry
   */
  public static SparseSymmetric of(
      int unknowns, int perElement, int[] member, Entries entries, EntryList others) {
    ElementSum sum = new ElementSum(unknowns, perElement, member, entries, others);
    Batch[] batches = new Batch[(unknowns + BATCH - 1) / BATCH];
    if (unknowns < WORTH_SHARING) {
      for (int b = 0; b < batches.length; b++) {
        batches[b] = sum.new Batch(b);
      }
    } else {
      IntStream.range(0, batches.length).parallel().forEach(b -> batches[b] = sum.new Batch(b));
    }
    return sum.joined(batches);
  }

  private SparseSymmetric joined(Batch[] batches) {
    int[] start = new int[unknowns + 1];
    for (int c = 0; c < unknowns; c++) {
      start[c + 1] = start[c] + length[c];
    }
    int[] row = new int[start[unknowns]];
    double[] value = new double[start[unknowns]];
    int at = 0;
    for (int b = 0; b < batches.length; b++) {
      System.arraycopy(batches[b].row, 0, row, at, batches[b].used);
      System.arraycopy(batches[b].value, 0, value, at, batches[b].used);
      at += batches[b].used;
      batches[b] = null;
    }
    return SparseSymmetric.of(start, row, value);
  }

  /** Consecutive columns. */
  private final class Batch {
    private int[] row;
    private double[] value;
    private int used;
    private int begin;

    Batch(int number) {
      int end = Math.min(unknowns, (number + 1) * BATCH);
      row = new int[8 * (end - number * BATCH)];
      value = new double[row.length];
      for (int c = number * BATCH; c < end; c++) {
        begin = used;
        column(c);
        length[c] = used - begin;
        if (used == begin || row[used - 1] != c) {
          throw new IllegalArgumentException("unknown " + c + " has no entry of its own");
        }
      }
    }

    private void column(int c) {
      for (int i = placeStart[c]; i < placeStart[c + 1]; i++) {
        int element = places[i] / perElement;
        int p = places[i] % perElement;
        int at = element * perElement;
        for (int q = 0; q < perElement; q++) {
          int r = member[at + q];
          if (r >= 0 && r <= c) {
            double entry = entries.entry(element, p, q);
            if (entry != 0 || r == c) {
              add(r, entry);
            }
          }
        }
      }
      for (int i = otherStart[c]; i < otherStart[c + 1]; i++) {
        add(others.row(otherPlaces[i]), others.value(otherPlaces[i]));
      }
    }

    /** Adds to the entry of a row, kept in ascending order. */
    private void add(int r, double v) {
      int low = begin;
      int high = used;
      while (low < high) {
        int middle = (low + high) >>> 1;
        if (row[middle] < r) {
          low = middle + 1;
        } else {
          high = middle;
        }
      }
      if (low < used && row[low] == r) {
        value[low] += v;
        return;
      }
      if (used == row.length) {
        row = Arrays.copyOf(row, used + used / 2 + 64);
        value = Arrays.copyOf(value, row.length);
      }
      System.arraycopy(row, low, row, low + 1, used - low);
      System.arraycopy(value, low, value, low + 1, used - low);
      row[low] = r;
      value[low] = v;
      used++;
    }
  }
}
