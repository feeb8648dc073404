package coldseam.cases;

import java.util.List;
import java.util.Optional;

/**
 * A value that a case is expected to give.
 *
 * @param quantity which quantity
 * @param subject whose: two spaces for L2D and L3D, the name of a ψ, χ, U, space, stretch or point
 *     otherwise; point and space for a weight
 * @param value the reference, in the quantity's SI unit (temperatures in °C)
 * @param within the tolerance, same unit, more than 0
 * @param variant the variant it is meant for, empty for the base case
 * @param source where the reference comes from
 * @param status seen, computed, memory or invented
 */
public record Expectation(
    Quantity quantity,
    List<String> subject,
    double value,
    double within,
    Optional<String> variant,
    String source,
    String status) {
  /** What can be expected. */
  public enum Quantity {
    /** Coupling coefficient, W/(m·K). */
    L2D,
    /** Coupling coefficient of a body of revolution, W/K. */
    L3D,
    /** Linear transmittance, W/(m·K). */
    PSI,
    /** Point transmittance, W/K. */
    CHI,
    /** Effective U, W/(m²·K). */
    U,
    /** Total resistance 1/U with films, m²·K/W. */
    R,
    /** Heat flow of a space or stretch into the detail, W/m; W for a body of revolution. */
    FLOW,
    /** Temperature of a named point or of a floating space, °C. */
    TEMPERATURE,
    /** Coldest surface temperature of a space, °C. */
    COLDEST,
    /** Temperature factor of the coldest surface of a space. */
    F_RSI,
    /** Temperature weighting factor of a point for a space. */
    WEIGHT
  }

  /** Copies the subject. */
  public Expectation {
    subject = List.copyOf(subject);
    if (!(within > 0) || !(within < Math.max(Math.abs(value), 1))) {
      throw new IllegalArgumentException("a tolerance is more than 0 and less than the value");
    }
  }
}
