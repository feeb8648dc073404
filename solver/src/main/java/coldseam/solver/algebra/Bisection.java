package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * Halves a set of elements so that the halves share few unknowns. Several families of cuts are
 * tried: straight ones in four directions, circles around the middle of the set (which part a mesh
 * graded towards a point much better; Miller, Teng, Thurston and Vavasis 1997), or, without
 * coordinates, the levels of a breadth-first walk. In each family all cuts that leave neither side
 * too small are counted in one sweep. The best of all is then smoothed.
 */
final class Bisection {
  /** The smaller side of a cut holds at least about this share of the elements. */
  private static final double SMALLER_SIDE = 0.3;

  /** Most bins between the two outer ones; with these a bit each of one machine word. */
  private static final int INNER_BINS = Long.SIZE - 2;

  /** No side has less than this share of the elements, however the keys are spread. */
  private static final double SMALLEST_SIDE = 0.1;

  /** Elements looked at to place the bins. */
  private static final int SAMPLE = 120;

  /** Weight of the square of the relative difference of the sides against the shared unknowns. */
  private static final double UNEVENNESS = 0.6;

  /** A set is long if one side is that many times the other. */
  private static final double LONG_FROM = 6;

  /** Sets with fewer elements are cut along the axes only, and not smoothed. */
  private static final int SMALL_SET = 100;

  private final ElementSet set;
  private final double[] key;
  private final double[] sample;
  private Bins bins;
  private Bins best;
  private int bestCut;
  private double bestRating = Double.POSITIVE_INFINITY;

  private Bisection(ElementSet set) {
    this.set = set;
    key = new double[set.elements()];
    sample = new double[Math.min(SAMPLE, key.length)];
    bins = new Bins(set);
    best = new Bins(set);
  }

  /**
   * How good a cut is, small is good.
   *
   * @param shared unknowns held by both sides
   * @param left elements of one side
   * @param all elements of both sides
   */
  static double rating(int shared, int left, int all) {
    double difference = (2.0 * left - all) / all;
    return (shared + 0.01) * (1 + UNEVENNESS * difference * difference);
  }

  /** The elements of the second half. Both halves have at least one element. */
  static boolean[] of(ElementSet set) {
    Bisection bisection = new Bisection(set);
    if (set.x() == null) {
      BreadthFirstLevels.of(set, bisection.key);
      bisection.sweep();
    } else {
      bisection.sweepPlane();
    }
    boolean[] right = new boolean[set.elements()];
    if (bisection.bestRating == Double.POSITIVE_INFINITY) {
      Arrays.fill(right, right.length / 2, right.length, true);
    } else {
      for (int e = 0; e < right.length; e++) {
        right[e] = bisection.best.ofElement(e) > bisection.bestCut;
      }
      if (right.length >= SMALL_SET) {
        CutSmoothing.of(set, bisection.best, bisection.bestCut, right);
      }
    }
    return right;
  }

  private void sweepPlane() {
    sweepAlong(1, 0);
    double middleX = sample[sample.length / 2];
    double extentX = extent();
    sweepAlong(0, 1);
    if (key.length < SMALL_SET) {
      return;
    }
    double middleY = sample[sample.length / 2];
    double stretch = stretch(extentX / extent());
    sweepAlong(1, stretch);
    sweepAlong(1, -stretch);
    double[] x = set.x();
    double[] y = set.y();
    for (int e = 0; e < key.length; e++) {
      double dx = x[e] - middleX;
      double dy = stretch * (y[e] - middleY);
      // the bits of a positive number grow almost like its logarithm
      key[e] = Double.doubleToRawLongBits(dx * dx + dy * dy);
    }
    sweep();
  }

  private void sweepAlong(double dx, double dy) {
    double[] x = set.x();
    double[] y = set.y();
    for (int e = 0; e < key.length; e++) {
      key[e] = dx * x[e] + dy * y[e];
    }
    sweep();
  }

  /** A long set is made about as high as it is wide, so that oblique cuts suit long triangles. */
  private static double stretch(double ratio) {
    boolean kept = ratio < LONG_FROM && ratio > 1 / LONG_FROM;
    return kept || !Double.isFinite(ratio) || ratio == 0 ? 1 : ratio;
  }

  /** Distance between the outer fifths of the sample. */
  private double extent() {
    return sample[4 * sample.length / 5] - sample[sample.length / 5];
  }

  private void takeSample(double[] of) {
    for (int i = 0; i < sample.length; i++) {
      sample[i] = of[(int) ((long) i * of.length / sample.length)];
    }
    Arrays.sort(sample);
  }

  /** Counts the cuts between smaller and larger keys and keeps the best. */
  private void sweep() {
    takeSample(key);
    double from = sample[(int) (SMALLER_SIDE * sample.length)];
    double to = sample[(int) ((1 - SMALLER_SIDE) * sample.length)];
    if (to > from) {
      keepBest(from, to);
    } else {
      // many equal keys in the middle: the cut lies before or after them
      keepBest(sample[0], sample[sample.length - 1]);
    }
  }

  private void keepBest(double from, double to) {
    if (!(to > from)) {
      return;
    }
    int inner = Math.min(INNER_BINS, key.length);
    int[] inBin = bins.fill(key, from, to, inner);
    int[] shared = bins.sharedAtCuts(inner);
    int left = 0;
    int least = Math.max(1, (int) (SMALLEST_SIDE * key.length));
    boolean better = false;
    for (int c = 0; c <= inner; c++) {
      left += inBin[c];
      if (left >= least && key.length - left >= least) {
        double rating = rating(shared[c], left, key.length);
        if (rating < bestRating) {
          bestRating = rating;
          bestCut = c;
          better = true;
        }
      }
    }
    if (better) {
      Bins kept = bins;
      bins = best;
      best = kept;
    }
  }

  /** Elements in bins, by key, and for each unknown the bins of its elements. */
  static final class Bins {
    private final ElementSet set;
    private final byte[] ofElement;
    private final long[] ofUnknown;

    private Bins(ElementSet set) {
      this.set = set;
      ofElement = new byte[set.elements()];
      ofUnknown = new long[set.interior()];
    }

    /** Bin of an element. */
    int ofElement(int e) {
      return ofElement[e];
    }

    /** A bit for each bin that holds an element of the unknown. */
    long ofUnknown(int u) {
      return ofUnknown[u];
    }

    /** Keys below {@code from} go to bin 0, from {@code to} on to the last. */
    private int[] fill(double[] key, double from, double to, int inner) {
      int[] inBin = new int[inner + 2];
      double scale = inner / (to - from);
      for (int e = 0; e < key.length; e++) {
        double at = (key[e] - from) * scale;
        int b = at < 0 ? 0 : at >= inner ? inner + 1 : 1 + (int) at;
        ofElement[e] = (byte) b;
        inBin[b]++;
      }
      return inBin;
    }

    /** For each cut, after a bin, the interior unknowns with elements on both sides. */
    private int[] sharedAtCuts(int inner) {
      Arrays.fill(ofUnknown, 0);
      int[] start = set.start();
      int[] member = set.member();
      int interior = ofUnknown.length;
      for (int e = 0; e < ofElement.length; e++) {
        long bit = 1L << ofElement[e];
        int end = start[e + 1];
        for (int p = start[e]; p < end; p++) {
          int u = member[p];
          if (u < interior) {
            ofUnknown[u] |= bit;
          }
        }
      }
      int[] shared = new int[Long.SIZE];
      for (long bits : ofUnknown) {
        if ((bits & (bits - 1)) != 0) {
          shared[Long.numberOfTrailingZeros(bits)]++;
          shared[Long.SIZE - 1 - Long.numberOfLeadingZeros(bits)]--;
        }
      }
      for (int c = 1; c <= inner; c++) {
        shared[c] += shared[c - 1];
      }
      return shared;
    }
  }
}
