package coldseam.solver.ledger;

import java.util.List;

/**
 * Heat that comes in unbought: sun, people, appliances.
 *
 * @param name its name
 * @param perStepKWh one figure for each step of the climate, kWh, 0 or more
 */
public record Gain(String name, List<Double> perStepKWh) {
  /** Copies the list. */
  public Gain {
    perStepKWh = List.copyOf(perStepKWh);
  }

  /** Over the period, kWh. */
  public double sumKWh() {
    double sum = 0;
    for (double step : perStepKWh) {
      sum += step;
    }
    return sum;
  }
}
