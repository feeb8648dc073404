package coldseam.solver.ledger;

import java.util.List;
import java.util.OptionalDouble;

/**
 * What drives heat out, step by step through the period.
 *
 * @param insideC inside temperature, °C
 * @param steps the period, or its months
 * @param baseC base of degree-days, °C; empty if mean temperatures are given
 */
public record Climate(double insideC, List<Step> steps, OptionalDouble baseC) {
  private static final double HOURS_PER_DAY = 24;

  /** Temperatures nearer than this are the same, K: the last digit anybody types. */
  private static final double SAME_K = 1e-6;

  /**
   * One step.
   *
   * @param name of the month; "period" for the whole
   * @param days how long
   * @param outdoorKelvinDays difference of temperature to outdoors times days, K·d
   * @param groundKelvinDays difference to what drives heat into the ground, times days, K·d; empty
   *     if it is not known
   */
  public record Step(
      String name, double days, double outdoorKelvinDays, OptionalDouble groundKelvinDays) {
    /** The difference to outdoors as kilokelvin-hours: kWh of each W/K. */
    double outdoorKiloKelvinHours() {
      return outdoorKelvinDays * HOURS_PER_DAY / 1000;
    }

    /** The same to the ground. */
    double groundKiloKelvinHours() {
      return groundKelvinDays.orElseThrow() * HOURS_PER_DAY / 1000;
    }
  }

  /** Copies the list. */
  public Climate {
    steps = List.copyOf(steps);
  }

  /**
   * One step by mean temperatures.
   *
   * @param name of the step
   * @param days how long
   * @param insideC inside, °C
   * @param outsideC mean outside in the step, °C
   * @param annualC mean outside in the year, °C, which drives heat into the ground
   * @return the step
   */
  public static Step step(
      String name, double days, double insideC, double outsideC, OptionalDouble annualC) {
    return new Step(name, days, (insideC - outsideC) * days, ground(days, insideC, annualC));
  }

  /**
   * One step by degree-days.
   *
   * @param days how long
   * @param degreeDays K·d
   * @param insideC inside, °C
   * @param annualC mean outside in the year, °C
   * @return the step
   */
  public static Step degreeDays(
      double days, double degreeDays, double insideC, OptionalDouble annualC) {
    return new Step("period", days, degreeDays, ground(days, insideC, annualC));
  }

  private static OptionalDouble ground(double days, double insideC, OptionalDouble annualC) {
    return annualC.isEmpty()
        ? OptionalDouble.empty()
        : OptionalDouble.of((insideC - annualC.getAsDouble()) * days);
  }

  /** Days of the period. */
  public double days() {
    double sum = 0;
    for (Step step : steps) {
      sum += step.days();
    }
    return sum;
  }

  /** Whether the base of degree-days lies below the inside temperature and stands for gains. */
  public boolean gainsInBase() {
    return baseC.isPresent() && baseC.getAsDouble() < insideC - SAME_K;
  }

  /** Whether the base of degree-days lies above the inside temperature. */
  public boolean baseAboveInside() {
    return baseC.isPresent() && baseC.getAsDouble() > insideC + SAME_K;
  }

  /** Mean difference to outdoors over the period, K. */
  public double meanDifferenceK() {
    double sum = 0;
    for (Step step : steps) {
      sum += step.outdoorKelvinDays();
    }
    return sum / days();
  }
}
