package coldseam.solver.conduction;

import java.util.ArrayList;
import java.util.List;

/**
 * What the passes of the adaptive loop found, and what is still missing by their decrease.
 * Energies of nested meshes only fall. What is left is guessed by extrapolation: in proportion to
 * the local indicators, and by the rate at which the last falls came (Richardson). It is no bound.
 */
final class History {
  /** Lacking energy over the indicators' sum, before two passes have shown it. */
  private static final double FIRST_RATIO = 2;

  /** The rate energies are trusted to fall at: error ∝ unknowns^−2 for quadratics. */
  private static final double BEST_RATE = 2;

  /** The slowest rate that is extrapolated with. */
  private static final double WORST_RATE = 0.25;

  private final List<ConductanceMatrix> matrices = new ArrayList<>();
  private final List<double[]> lacking = new ArrayList<>();
  private final List<Integer> unknowns = new ArrayList<>();
  private final double earlierRatio;

  /**
   * Starts a history.
   *
   * @param earlierRatio lacking energy over the indicators' sum as seen on a similar problem, or
   *     NaN
   */
  History(double earlierRatio) {
    this.earlierRatio = earlierRatio;
  }

  /**
   * Adds a pass.
   *
   * @param matrix the conductances found
   * @param lackingEnergy sum of the indicators of each field
   * @param unknownCount unknowns
   */
  void add(ConductanceMatrix matrix, double[] lackingEnergy, int unknownCount) {
    matrices.add(matrix);
    lacking.add(lackingEnergy);
    unknowns.add(unknownCount);
  }

  int passes() {
    return matrices.size();
  }

  /**
   * Guesses the error of xᵀAx, which is too high by it.
   *
   * @param x a number for each space
   */
  double error(double[] x) {
    int last = passes() - 1;
    double indicated = indicated(last, x);
    if (last == 0) {
      return (Double.isNaN(earlierRatio) ? FIRST_RATIO : earlierRatio) * indicated;
    }
    double fall = Math.max(0, form(last - 1, x) - form(last, x));
    double before = indicated(last - 1, x);
    double byIndicator = before > indicated ? fall * indicated / (before - indicated) : fall;
    return Math.max(byIndicator, byRate(last, x, fall));
  }

  private double byRate(int last, double[] x, double fall) {
    double growth = unknowns.get(last) / (double) unknowns.get(last - 1);
    if (!(growth > 1)) {
      return fall;
    }
    double rate = BEST_RATE;
    if (last >= 2) {
      double fallBefore = Math.max(0, form(last - 2, x) - form(last - 1, x));
      if (fall > 0 && fallBefore > 0) {
        rate = Math.log(fallBefore / fall) / Math.log(growth);
      }
    }
    rate = Math.min(BEST_RATE, Math.max(WORST_RATE, rate));
    return fall / (Math.pow(growth, rate) - 1);
  }

  /** Lacking energy over the indicators' sum in the last pass, for a similar problem. */
  double ratio(double[] x) {
    double indicated = indicated(passes() - 1, x);
    return indicated > 0 ? error(x) / indicated : FIRST_RATIO;
  }

  private double indicated(int pass, double[] x) {
    // |Σ x_i e_i|² ≤ Σ x_i² |Σ e_i²| would forget cross terms: the triangle inequality does not
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      sum += Math.abs(x[i]) * Math.sqrt(lacking.get(pass)[i]);
    }
    return sum * sum;
  }

  private double form(int pass, double[] x) {
    double[][] a = matrices.get(pass).a;
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j < i; j++) {
        double difference = x[i] - x[j];
        sum -= a[i][j] * difference * difference;
      }
    }
    return sum;
  }
}
