package coldseam.solver.detail;

/**
 * λ₂ = λ₁ F_T F_m: a conductivity converted to another temperature and moisture (ISO 10456:2007,
 * clause 7; <em>from memory</em>).
 */
public final class DesignConductivity {
  private DesignConductivity() {}

  /**
   * Factor for temperature, F_T = e^(f_T (T₂ − T₁)) (ISO 10456:2007, 7.2).
   *
   * @param coefficientPerK f_T, 1/K
   * @param fromC temperature T₁ that the conductivity is stated for, °C
   * @param toC temperature T₂ it is wanted for, °C
   * @return F_T
   */
  public static double temperatureFactor(double coefficientPerK, double fromC, double toC) {
    return Math.exp(coefficientPerK * (toC - fromC));
  }

  /**
   * Factor for moisture, F_m = e^(f_ψ (ψ₂ − ψ₁)) by volume or e^(f_u (u₂ − u₁)) by mass (ISO
   * 10456:2007, 7.3).
   *
   * @param coefficient f_ψ in m³/m³, or f_u in kg/kg
   * @param from moisture content that the conductivity is stated for, in the unit of the
   *     coefficient
   * @param to moisture content it is wanted for
   * @return F_m
   */
  public static double moistureFactor(double coefficient, double from, double to) {
    return Math.exp(coefficient * (to - from));
  }
}
