package coldseam.solver.conduction;

import java.util.ArrayList;
import java.util.List;

/**
 * What the passes of the adaptive loop found, and what is still missing by their decrease. Energies
 * of nested meshes only fall. A fall of the local indicators' sum went with a fall of the energy;
 * what is left of the sum is taken to go with what is left to fall in the same ratio. It is no
 * bound.
 */
final class History {
  /** Lacking energy over the indicators' sum, before two passes have shown it. */
  private static final double FIRST_RATIO = 2;

  /** How many passes back the falls are compared. */
  private static final int PASSES_COMPARED = 3;

  /** Smaller falls of the indicators, in parts of them, tell nothing. */
  private static final double CLEAR_FALL = 0.2;

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
    return ratioSeen(x) * indicated;
  }

  /** The fall of the energy over that of the indicators, the largest seen lately. */
  private double ratioSeen(double[] x) {
    int last = passes() - 1;
    double ratio = 0;
    for (int before = last - 1; before >= Math.max(0, last - PASSES_COMPARED); before--) {
      double fall = indicated(before, x) - indicated(last, x);
      if (fall > CLEAR_FALL * indicated(before, x)) {
        ratio = Math.max(ratio, (form(before, x) - form(last, x)) / fall);
      }
    }
    return ratio > 0 ? ratio : Double.isNaN(earlierRatio) ? FIRST_RATIO : earlierRatio;
  }

  /** Lacking energy over the indicators' sum in the last pass, for a similar problem. */
  double ratio(double[] x) {
    double indicated = indicated(passes() - 1, x);
    return indicated > 0 ? error(x) / indicated : FIRST_RATIO;
  }

  /** Sum of the indicators for xᵀAx in a pass. */
  double indicated(int pass, double[] x) {
    // |Σ x_i e_i|² ≤ Σ x_i² |Σ e_i²| would forget cross terms: the triangle inequality does not
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      sum += Math.abs(x[i]) * Math.sqrt(lacking.get(pass)[i]);
    }
    return sum * sum;
  }

  /** xᵀAx in a pass. */
  double form(int pass, double[] x) {
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
