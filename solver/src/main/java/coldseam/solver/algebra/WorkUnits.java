package coldseam.solver.algebra;

import java.util.Arrays;
import java.util.concurrent.CountedCompleter;
import java.util.concurrent.ForkJoinPool;
import java.util.function.IntConsumer;

/**
 * The fronts shared out in units, each a run of consecutive fronts done one after the other: whole
 * subtrees with little work, and single fronts above them. Units form a tree like the fronts do;
 * units of which neither is above the other can be done at the same time.
 *
 * @param start first front of each unit, and the number of fronts
 * @param parent unit above each unit, −1 for none
 * @param firstBelow a unit directly below each unit, −1 for none; the last entry: a unit below none
 * @param nextBelow another unit with the same parent, −1 for none
 */
record WorkUnits(int[] start, int[] parent, int[] firstBelow, int[] nextBelow) {
  /** Systems with less work, in multiplications with additions, are done on one thread. */
  private static final double WORTH_SHARING = 2e7;

  /** A unit has at most this share of the work unless it is a single front. */
  private static final double LARGEST_SHARE = 1.0 / 24;

  static WorkUnits of(Fronts fronts) {
    int n = fronts.count();
    double[] below = new double[n];
    double all = 0;
    for (int f = 0; f < n; f++) {
      double work = fronts.work(f) + overhead(fronts, f);
      below[f] += work;
      all += work;
      if (fronts.parent()[f] >= 0) {
        below[fronts.parent()[f]] += below[f];
      }
    }
    if (all < WORTH_SHARING) {
      return linked(fronts, new int[] {0, n}, new int[n]);
    }
    return cut(fronts, below, all * LARGEST_SHARE);
  }

  private static double overhead(Fronts fronts, int f) {
    double m = fronts.rows(f);
    return 2000 + 4 * m * m;
  }

  /** Walks along the fronts and begins a unit wherever the running one must not go on. */
  private static WorkUnits cut(Fronts fronts, double[] below, double most) {
    int n = fronts.count();
    int[] unitOf = new int[n];
    int units = 0;
    int[] start = new int[n + 1];
    double running = 0;
    int above = -2;
    for (int f = 0; f < n; ) {
      int top = topOfSubtree(fronts, below, f, most);
      boolean large = below[top] > most;
      boolean onlyChild = f > 0 && fronts.firstChild()[f] == f - 1 && fronts.sibling()[f - 1] < 0;
      boolean goesOn =
          large ? onlyChild : above == fronts.parent()[top] && running + below[top] <= most;
      if (!goesOn) {
        start[units++] = f;
        running = 0;
      }
      running += below[top];
      above = large ? -2 : fronts.parent()[top];
      for (; f <= top; f++) {
        unitOf[f] = units - 1;
      }
    }
    start[units] = n;
    return linked(fronts, Arrays.copyOf(start, units + 1), unitOf);
  }

  /** The highest front that has {@code f} as the first of its subtree and little enough work. */
  private static int topOfSubtree(Fronts fronts, double[] below, int f, double most) {
    int top = f;
    int up = fronts.parent()[f];
    while (up >= 0 && below[up] <= most && fronts.firstChild()[up] == top) {
      top = up;
      up = fronts.parent()[up];
    }
    return top;
  }

  private static WorkUnits linked(Fronts fronts, int[] start, int[] unitOf) {
    int units = start.length - 1;
    int[] parent = new int[units];
    int[] firstBelow = new int[units + 1];
    int[] nextBelow = new int[units];
    Arrays.fill(firstBelow, -1);
    for (int u = 0; u < units; u++) {
      int above = fronts.count() == 0 ? -1 : fronts.parent()[start[u + 1] - 1];
      parent[u] = above < 0 ? -1 : unitOf[above];
      int list = parent[u] < 0 ? units : parent[u];
      nextBelow[u] = firstBelow[list];
      firstBelow[list] = u;
    }
    return new WorkUnits(start, parent, firstBelow, nextBelow);
  }

  int count() {
    return parent.length;
  }

  /** Does every unit after those below it. */
  void upwards(IntConsumer work) {
    if (count() == 1) {
      work.accept(0);
    } else {
      invokeApart(new Walk(null, this, count(), true, work));
    }
  }

  /** Does every unit before those below it. */
  void downwards(IntConsumer work) {
    if (count() == 1) {
      work.accept(0);
    } else {
      invokeApart(new Walk(null, this, count(), false, work));
    }
  }

  /**
   * Walks in a pool of its own. In a shared one a thread that waits for its walk can meet a part of
   * another walk on top of its queue; Java 17 then keeps a processor busy looking at it.
   */
  private static void invokeApart(Walk walk) {
    ForkJoinPool pool = new ForkJoinPool();
    try {
      pool.invoke(walk);
    } finally {
      pool.shutdown();
    }
  }

  /** One unit and all below it; the unit past the last stands above all. */
  private static final class Walk extends CountedCompleter<Void> {
    private static final long serialVersionUID = 1L;
    private final transient WorkUnits units;
    private final int unit;
    private final boolean upwards;
    private final transient IntConsumer work;

    Walk(CountedCompleter<?> above, WorkUnits units, int unit, boolean upwards, IntConsumer work) {
      super(above);
      this.units = units;
      this.unit = unit;
      this.upwards = upwards;
      this.work = work;
    }

    @Override
    public void compute() {
      if (!upwards) {
        doUnit();
      }
      for (int u = units.firstBelow[unit]; u >= 0; u = units.nextBelow[u]) {
        addToPendingCount(1);
        new Walk(this, units, u, upwards, work).fork();
      }
      tryComplete();
    }

    @Override
    public void onCompletion(CountedCompleter<?> caller) {
      if (upwards) {
        doUnit();
      }
    }

    private void doUnit() {
      if (unit < units.count()) {
        work.accept(unit);
      }
    }
  }
}
