package coldseam.solver.ledger;

/** What is bought to cover the need of a design. */
public sealed interface Supply {
  /** Heat itself. */
  record Heat() implements Supply {}

  /**
   * A fuel, burnt.
   *
   * @param fuel with its appliance
   */
  record Burnt(Fuel fuel) implements Supply {}

  /**
   * Electricity that lifts ambient heat, or is turned into heat by itself.
   *
   * @param performance heat over electricity, 1 or more
   */
  record HeatPump(double performance) implements Supply {
    /**
     * Checks the figure.
     *
     * @throws IllegalArgumentException unless it is 1 or more
     */
    public HeatPump {
      if (!(performance >= 1)) {
        throw new IllegalArgumentException("a heat pump gives as much heat as electricity or more");
      }
    }
  }
}
