package coldseam.solver.algebra;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.ForkJoinTask;
import java.util.concurrent.RecursiveAction;

/**
 * The numbers of a factorisation: every front collects its entries of the matrix and the updates of
 * its children, eliminates its columns and passes the updates of its rows on.
 */
final class FrontElimination {
  /** Fronts with more work, in multiplications with additions, are shared out among threads. */
  private static final double WORTH_SHARING = 1.5e7;

  /** Pieces a shared front is cut into. */
  private static final int PIECES = 6;

  private final Fronts fronts;
  private final WorkUnits units;
  private final Layout layout;
  private final double[] value;
  private final double[][] factor;
  private final double[][] passed;
  private final int[] badColumn;

  private FrontElimination(EliminationPlan plan, double[] value) {
    this.value = value;
    fronts = plan.fronts();
    units = plan.units();
    layout = plan.layout();
    factor = new double[units.count()][];
    passed = new double[fronts.count()][];
    badColumn = new int[units.count()];
    Arrays.fill(badColumn, -1);
  }

  /** The trapezia of the factor, one array for each unit. */
  static double[][] of(EliminationPlan plan, double[] value) {
    FrontElimination elimination = new FrontElimination(plan, value);
    elimination.units.upwards(elimination::eliminateUnit);
    elimination.refuseBadPivot(plan);
    return elimination.factor;
  }

  private void refuseBadPivot(EliminationPlan plan) {
    int bad = Integer.MAX_VALUE;
    int unit = -1;
    for (int u = 0; u < badColumn.length; u++) {
      if (badColumn[u] >= 0 && badColumn[u] < bad) {
        bad = badColumn[u];
        unit = u;
      }
    }
    if (unit >= 0) {
      int f = Arrays.binarySearch(fronts.first(), bad);
      f = f < 0 ? -f - 2 : f;
      int own = bad - fronts.first()[f];
      double pivot = factor[unit][layout.trapezium()[f] + own * fronts.width(f) + own];
      throw new NotPositiveDefiniteException(plan.unknownOf(bad), plan.unknowns(), pivot);
    }
  }

  private boolean failedBelow(int unit) {
    for (int u = units.firstBelow()[unit]; u >= 0; u = units.nextBelow()[u]) {
      if (badColumn[u] >= 0) {
        return true;
      }
    }
    return false;
  }

  private void eliminateUnit(int unit) {
    if (failedBelow(unit)) {
      badColumn[unit] = Integer.MAX_VALUE;
      return;
    }
    factor[unit] = new double[layout.storage()[unit]];
    double[][] pile = {new double[layout.evenPile()[unit]], new double[layout.oddPile()[unit]]};
    int first = units.start()[unit];
    int last = units.start()[unit + 1];
    for (int f = first; f < last && badColumn[unit] < 0; f++) {
      int bad = eliminate(f, first, last, factor[unit], pile);
      if (bad >= 0) {
        badColumn[unit] = fronts.first()[f] + bad;
      }
    }
  }

  private int eliminate(int f, int firstOfUnit, int lastOfUnit, double[] a, double[][] pile) {
    int at = layout.trapezium()[f];
    int width = fronts.width(f);
    int rows = fronts.rows(f);
    int other = layout.odd()[f] ? 0 : 1;
    for (int p = fronts.entryStart()[f]; p < fronts.entryStart()[f + 1]; p++) {
      a[at + fronts.entryTarget()[p]] = value[fronts.entrySource()[p]];
    }
    for (int c = fronts.firstChild()[f]; c >= 0; c = fronts.sibling()[c]) {
      boolean inside = c >= firstOfUnit;
      addToTrapezium(
          c, inside ? pile[other] : passed[c], inside ? layout.update()[c] : 0, a, at, width);
    }
    boolean shared = fronts.work(f) > WORTH_SHARING;
    int bad =
        shared
            ? eliminateShared(a, at, width, width + rows)
            : DenseBlocks.eliminate(a, at, width, width + rows);
    if (bad >= 0) {
      return bad;
    }
    if (rows == 0) {
      return -1;
    }
    boolean stays = fronts.parent()[f] < lastOfUnit;
    double[] u = stays ? pile[1 - other] : new double[DenseUpdate.triangle(rows)];
    int to = stays ? layout.update()[f] : 0;
    if (shared) {
      updateShared(a, at + width * width, width, rows, u, to);
    } else {
      DenseUpdate.write(a, at + width * width, width, 0, rows, u, to);
    }
    for (int c = fronts.firstChild()[f]; c >= 0; c = fronts.sibling()[c]) {
      boolean inside = c >= firstOfUnit;
      addToUpdate(
          c, inside ? pile[other] : passed[c], inside ? layout.update()[c] : 0, u, to, width);
      passed[c] = null;
    }
    if (!stays) {
      passed[f] = u;
    }
    return -1;
  }

  /** Adds the updates of a child to columns that are eliminated now. */
  private void addToTrapezium(int child, double[] from, int at, double[] a, int to, int width) {
    int[] place = fronts.rowInParent();
    int start = fronts.rowStart()[child];
    int rows = fronts.rows(child);
    int inColumns = 0;
    int p = at;
    for (int i = 0; i < rows; i++) {
      int row = place[start + i];
      if (row < width) {
        inColumns++;
      }
      int base = to + row * width;
      for (int j = 0; j < inColumns; j++) {
        a[base + place[start + j]] += from[p + j];
      }
      p += i + 1;
    }
  }

  /** Adds the updates of a child to those passed on. */
  private void addToUpdate(int child, double[] from, int at, double[] u, int to, int width) {
    int[] place = fronts.rowInParent();
    int start = fronts.rowStart()[child];
    int rows = fronts.rows(child);
    int first = 0;
    while (first < rows && place[start + first] < width) {
      first++;
    }
    int p = at + DenseUpdate.triangle(first);
    for (int i = first; i < rows; i++) {
      int base = to + DenseUpdate.triangle(place[start + i] - width) - width;
      for (int j = first; j <= i; j++) {
        u[base + place[start + j]] += from[p + j];
      }
      p += i + 1;
    }
  }

  private static int eliminateShared(double[] a, int at, int width, int rows) {
    for (int from = 0; from < width; from += DenseBlocks.BLOCK) {
      int begin = from;
      int to = Math.min(width, from + DenseBlocks.BLOCK);
      int bad = DenseBlocks.eliminateSquare(a, at, width, from, to);
      if (bad >= 0) {
        return bad;
      }
      List<Piece> pieces = new ArrayList<>();
      int step = Math.max(16, ((rows - to) / PIECES + 4) & ~3);
      for (int r = to; r < rows; r += step) {
        int row = r;
        int end = Math.min(rows, r + step);
        pieces.add(new Piece(() -> DenseBlocks.eliminateRows(a, at, width, begin, to, row, end)));
      }
      ForkJoinTask.invokeAll(pieces);
    }
    return -1;
  }

  private static void updateShared(double[] a, int at, int width, int rows, double[] u, int to) {
    List<Piece> pieces = new ArrayList<>();
    int row = 0;
    for (int k = 1; k <= PIECES; k++) {
      int begin = row;
      int end = k == PIECES ? rows : (int) (rows * Math.sqrt((double) k / PIECES)) & ~3;
      pieces.add(new Piece(() -> DenseUpdate.write(a, at, width, begin, end, u, to)));
      row = end;
    }
    ForkJoinTask.invokeAll(pieces);
  }

  /** A part of the work on one front. */
  private static final class Piece extends RecursiveAction {
    private static final long serialVersionUID = 1L;
    private final transient Runnable work;

    Piece(Runnable work) {
      this.work = work;
    }

    @Override
    protected void compute() {
      work.run();
    }
  }
}
