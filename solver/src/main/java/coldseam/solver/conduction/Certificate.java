package coldseam.solver.conduction;

/** What is known about how far a number is from the exact one. */
public sealed interface Certificate {
  /**
   * The exact value of the stated problem is proved to lie between the two.
   *
   * @param lower proved lower bound, in the number's unit
   * @param upper proved upper bound
   */
  record Certified(double lower, double upper) implements Certificate {
    /**
     * Checks the order.
     *
     * @throws IllegalArgumentException unless lower ≤ upper
     */
    public Certified {
      if (!(lower <= upper)) {
        throw new IllegalArgumentException("a lower bound must not exceed the upper");
      }
    }
  }

  /**
   * Nothing is proved.
   *
   * @param reason why not, as a sentence without a full stop
   * @param estimatedHalfWidth a guess at the error, never a bound; infinite if there is none
   */
  record NotCertified(String reason, double estimatedHalfWidth) implements Certificate {}
}
