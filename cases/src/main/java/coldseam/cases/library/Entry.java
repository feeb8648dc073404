package coldseam.cases.library;

import java.util.List;
import java.util.OptionalDouble;

/**
 * One material of the library.
 *
 * @param name the trade's generic name, unique
 * @param otherNames further names it is found by
 * @param conductivityWPerMK λ, W/(m·K)
 * @param densityKgPerM3 density, kg/m³, if known
 * @param vapourResistanceDry μ dry cup, if known; infinite for a vapour-tight material
 * @param vapourResistanceWet μ wet cup, if known
 * @param emissivity thermal emissivity, if known
 * @param conversion coefficients for temperature and moisture
 * @param source standard and table, or "handbook value"
 * @param status seen or memory
 */
public record Entry(
    String name,
    List<String> otherNames,
    double conductivityWPerMK,
    OptionalDouble densityKgPerM3,
    OptionalDouble vapourResistanceDry,
    OptionalDouble vapourResistanceWet,
    OptionalDouble emissivity,
    Conversion conversion,
    String source,
    String status) {
  /**
   * Coefficients of ISO 10456 that convert the conductivity; recalled, whatever the status.
   *
   * @param temperaturePerK f_T for the conductivity of the entry, 1/K, if known
   * @param moistureByVolume f_ψ, per m³/m³, if known
   * @param moistureByMass f_u, per kg/kg, if known
   */
  public record Conversion(
      OptionalDouble temperaturePerK,
      OptionalDouble moistureByVolume,
      OptionalDouble moistureByMass) {}

  /** Copies the names. */
  public Entry {
    otherNames = List.copyOf(otherNames);
  }
}
