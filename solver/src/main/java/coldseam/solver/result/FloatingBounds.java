package coldseam.solver.result;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.MatrixBounds;
import coldseam.solver.conduction.Quantity;
import java.util.Optional;

/**
 * Bounds of a coupling with floating spaces eliminated. Schur complements keep the order of
 * symmetric positive semidefinite matrices (Haynsworth 1970), so those of the two bracketing
 * matrices bracket that of A, and |xᵀAy − middle| ≤ ½√(xᵀGx · yᵀGy) with G their difference.
 */
final class FloatingBounds {
  private FloatingBounds() {}

  /**
   * The coupling of two groups.
   *
   * @param bounds brackets of A without the floating spaces' own conductances
   * @param joined what those conductances add to A, same size
   * @param floating the spaces to eliminate
   * @param warm one group
   * @param cold the other
   * @return the certified coupling; empty if the lower matrix cannot be eliminated
   */
  static Optional<Quantity> coupling(
      MatrixBounds bounds, double[][] joined, int[] floating, int[] warm, int[] cold) {
    double[][] upper = bounds.upper();
    double[][] lower = bounds.lower();
    add(upper, joined);
    add(lower, joined);
    double scale = 0;
    for (int f : floating) {
      scale = Math.max(scale, upper[f][f]);
    }
    for (int f : floating) {
      if (!eliminate(upper, f, scale * bounds.allowance())
          || !eliminate(lower, f, scale * bounds.allowance())) {
        return Optional.empty();
      }
    }
    double[] x = indicator(warm, upper.length);
    double[] y = indicator(cold, upper.length);
    double value = -(form(upper, x, y) + form(lower, x, y)) / 2;
    double gaps =
        Math.max(0, form(upper, x, x) - form(lower, x, x))
            * Math.max(0, form(upper, y, y) - form(lower, y, y));
    double energies = Math.abs(form(upper, x, x) * form(upper, y, y));
    // elimination adds the rounding of what it takes off
    double rounding = bounds.allowance() * (Math.sqrt(energies) + floating.length * scale);
    double half = Math.sqrt(gaps) / 2 + rounding;
    return Optional.of(new Quantity(value, new Certificate.Certified(value - half, value + half)));
  }

  private static void add(double[][] to, double[][] what) {
    for (int i = 0; i < to.length; i++) {
      for (int j = 0; j < to.length; j++) {
        to[i][j] += what[i][j];
      }
    }
  }

  private static boolean eliminate(double[][] a, int f, double least) {
    double pivot = a[f][f];
    if (!(pivot > least)) {
      return false;
    }
    double[] row = a[f].clone();
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < a.length; j++) {
        a[i][j] = i == f || j == f ? 0 : a[i][j] - row[i] * row[j] / pivot;
      }
    }
    return true;
  }

  private static double[] indicator(int[] group, int size) {
    double[] x = new double[size];
    for (int i : group) {
      x[i] = 1;
    }
    return x;
  }

  private static double form(double[][] a, double[] x, double[] y) {
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j < y.length; j++) {
        sum += x[i] * a[i][j] * y[j];
      }
    }
    return sum;
  }
}
