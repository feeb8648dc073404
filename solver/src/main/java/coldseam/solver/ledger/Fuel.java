package coldseam.solver.ledger;

/**
 * A fuel and what burns it, heating value and efficiency on one basis.
 *
 * @param name of the fuel
 * @param unit it is bought in, e.g. "m³"
 * @param heatingValueKWh per unit, kWh
 * @param efficiency of the appliance: heat over fuel
 * @param basis of both
 */
public record Fuel(
    String name, String unit, double heatingValueKWh, double efficiency, Basis basis) {
  /** What a heating value and an efficiency refer to. */
  public enum Basis {
    /** The higher heating value, with the heat of condensing the water. */
    GROSS,
    /** The lower heating value, without it. */
    NET
  }

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException unless heating value and efficiency are more than 0
   */
  public Fuel {
    if (!(heatingValueKWh > 0) || !(efficiency > 0)) {
      throw new IllegalArgumentException("heating value and efficiency are more than 0");
    }
  }
}
