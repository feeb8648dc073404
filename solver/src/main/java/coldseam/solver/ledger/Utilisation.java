package coldseam.solver.ledger;

/** How much of the gains takes the place of heating. */
public sealed interface Utilisation {
  /**
   * The factor of one step.
   *
   * @param gain gains in the step, kWh
   * @param loss losses in the step, kWh
   * @param conductanceWPerK H over all, W/K
   * @return η and how it came about; η is at most what the losses leave room for
   */
  Use of(double gain, double loss, double conductanceWPerK);

  /**
   * A factor and how it came about.
   *
   * @param ratio γ, gains over losses; NaN where nothing is lost
   * @param timeConstantH τ, h; NaN where it has no meaning
   * @param exponent a; NaN where it has no meaning
   * @param factor η
   */
  record Use(double ratio, double timeConstantH, double exponent, double factor) {}

  /**
   * A factor that was stated.
   *
   * @param factor η, 0 to 1
   */
  record Stated(double factor) implements Utilisation {
    /**
     * Checks the factor.
     *
     * @throws IllegalArgumentException unless it is 0 to 1
     */
    public Stated {
      if (!(factor >= 0 && factor <= 1)) {
        throw new IllegalArgumentException("a utilisation factor is 0 to 1");
      }
    }

    @Override
    public Use of(double gain, double loss, double conductanceWPerK) {
      double most = gain > 0 ? loss / gain : 1;
      return new Use(gain / loss, Double.NaN, Double.NaN, Math.min(factor, most));
    }
  }

  /**
   * By the time constant of the building (monthly method of ISO 13790:2008, 12.2.1, kept by ISO
   * 52016-1; <em>from memory</em>): η = (1 − γ^a)/(1 − γ^(a+1)), a = a₀ + τ/τ₀, τ = C/H.
   *
   * @param capacityJPerK C, J/K
   * @param a0 a₀
   * @param tau0H τ₀, h
   */
  record ByTimeConstant(double capacityJPerK, double a0, double tau0H) implements Utilisation {
    /** a₀ for months. */
    public static final double MONTHLY_A0 = 1;

    /** τ₀ for months, h. */
    public static final double MONTHLY_TAU0_H = 15;

    /** a₀ for a season. */
    public static final double SEASONAL_A0 = 0.8;

    /** τ₀ for a season, h. */
    public static final double SEASONAL_TAU0_H = 30;

    private static final double SECONDS_PER_HOUR = 3600;

    /**
     * Checks the figures.
     *
     * @throws IllegalArgumentException unless all are more than 0
     */
    public ByTimeConstant {
      if (!(capacityJPerK > 0) || !(a0 > 0) || !(tau0H > 0)) {
        throw new IllegalArgumentException("capacity, a0 and tau0 are more than 0");
      }
    }

    @Override
    public Use of(double gain, double loss, double conductanceWPerK) {
      if (!(conductanceWPerK > 0)) {
        // Nothing cools the building down: all is used that there is room for.
        double most = gain > 0 ? Math.min(1, loss / gain) : 1;
        return new Use(gain / loss, Double.NaN, Double.NaN, most);
      }
      double tau = capacityJPerK / (SECONDS_PER_HOUR * conductanceWPerK);
      double a = a0 + tau / tau0H;
      double gamma = gain / loss;
      return new Use(gamma, tau, a, gain > 0 ? factor(gamma, a) : 1);
    }
  }

  /**
   * η for a ratio and an exponent.
   *
   * @param gamma gains over losses, not 0; negative where the building gains through its envelope
   * @param a more than 0
   * @return η; 1/γ for negative γ
   */
  static double factor(double gamma, double a) {
    if (gamma < 0) {
      return 1 / gamma;
    }
    if (gamma > 1) {
      // The same formula, with powers of 1/γ that cannot overflow.
      return factor(1 / gamma, a) / gamma;
    }
    double log = Math.log(gamma);
    return log == 0 ? a / (a + 1) : Math.expm1(a * log) / Math.expm1((a + 1) * log);
  }
}
