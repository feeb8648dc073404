package coldseam.solver.detail;

/**
 * A lower and an upper value.
 *
 * @param lower not above {@code upper}
 * @param upper not below {@code lower}
 */
public record Bracket(double lower, double upper) {
  /**
   * Checks the order.
   *
   * @throws IllegalArgumentException unless lower ≤ upper, both finite
   */
  public Bracket {
    if (!(lower <= upper) || !Double.isFinite(lower) || !Double.isFinite(upper)) {
      throw new IllegalArgumentException("a bracket needs lower <= upper, both finite");
    }
  }

  /**
   * A single value.
   *
   * @param value both ends
   * @return the bracket
   */
  public static Bracket of(double value) {
    return new Bracket(value, value);
  }

  /** The middle. */
  public double mid() {
    return lower + (upper - lower) / 2;
  }
}
