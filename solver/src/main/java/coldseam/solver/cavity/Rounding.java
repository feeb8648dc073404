package coldseam.solver.cavity;

/**
 * Limits of the standards such as "5 mm" are met by drawings exactly, and drawn lengths are sums: a
 * value within one part in 10⁹ of a limit is on it.
 */
final class Rounding {
  private static final double SHARE = 1e-9;

  private Rounding() {}

  /** Whether a value lies below a positive limit and not on it. */
  static boolean below(double value, double limit) {
    return value < limit * (1 - SHARE);
  }

  /** Whether a value lies above a positive limit and not on it. */
  static boolean above(double value, double limit) {
    return value > limit * (1 + SHARE);
  }
}
