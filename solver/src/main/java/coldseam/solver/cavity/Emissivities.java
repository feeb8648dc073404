package coldseam.solver.cavity;

/**
 * Thermal emissivities of the two faces that heat flows between.
 *
 * @param first ε₁, from 0 to 1
 * @param second ε₂, from 0 to 1
 */
public record Emissivities(double first, double second) {
  /**
   * Ordinary faces, ε = 0.9: what ISO 10077-2 and ISO 6946 take unless a lower value is
   * safeguarded.
   */
  public static final Emissivities ORDINARY = new Emissivities(0.9, 0.9);

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException unless both lie in [0, 1]
   */
  public Emissivities {
    if (!(first >= 0 && first <= 1 && second >= 0 && second <= 1)) {
      throw new IllegalArgumentException("an emissivity lies between 0 and 1");
    }
  }

  /** E = 1/(1/ε₁ + 1/ε₂ − 1), the factor of two endless parallel grey planes. */
  public double exchange() {
    return 1 / (1 / first + 1 / second - 1);
  }
}
