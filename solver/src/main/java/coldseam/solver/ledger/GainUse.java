package coldseam.solver.ledger;

import java.util.ArrayList;
import java.util.List;

/**
 * How gains are used when the losses of every step are known.
 *
 * <p>At a given time constant the gains used rise with the losses, by 0 to 1 kWh for each: η · γ
 * rises with γ and is concave. A greater H shortens the time constant, and fewer gains are used. So
 * the need rises with the losses either way, and its ends come from the ends of the losses; gains
 * used are bounded by the losses of one end with the time constant of the other.
 */
public final class GainUse {
  private final Climate climate;
  private final double[] gainKWh;
  private final Utilisation utilisation;
  private final double storeKWh;

  /**
   * One step.
   *
   * @param name of the step
   * @param gainKWh gains, kWh
   * @param lossKWh losses, kWh
   * @param conductanceWPerK H over all: losses over hours and difference to outdoors, W/K
   * @param use η and how it came about
   * @param usedKWh gains used, kWh
   */
  public record Step(
      String name,
      double gainKWh,
      double lossKWh,
      double conductanceWPerK,
      Utilisation.Use use,
      double usedKWh) {}

  /** All steps, and what is left to buy or to get rid of. */
  record Outcome(List<Step> steps, double usedKWh, double needKWh, double unusedKWh) {}

  GainUse(Climate climate, List<Gain> gains, Utilisation utilisation, double storeKWh) {
    this.climate = climate;
    this.gainKWh = new double[climate.steps().size()];
    for (Gain gain : gains) {
      for (int i = 0; i < gainKWh.length; i++) {
        gainKWh[i] += gain.perStepKWh().get(i);
      }
    }
    this.utilisation = utilisation;
    this.storeKWh = storeKWh;
  }

  double gainKWh() {
    double sum = 0;
    for (double gain : gainKWh) {
      sum += gain;
    }
    return sum;
  }

  /**
   * Uses the gains.
   *
   * @param losses of each step, kWh, and after them H of the whole envelope, W/K
   * @return what becomes of them
   */
  Outcome of(double[] losses) {
    return of(losses, losses);
  }

  /**
   * Uses the gains by losses and a time constant of their own.
   *
   * @param losses of each step, kWh, and after them H of the whole envelope, W/K
   * @param forTimeConstant the same for the time constant
   * @return what becomes of them
   */
  Outcome of(double[] losses, double[] forTimeConstant) {
    List<Step> steps = new ArrayList<>();
    double used = 0;
    double left = storeKWh;
    double surplus = 0;
    for (int i = 0; i < gainKWh.length; i++) {
      double drive = climate.steps().get(i).outdoorKiloKelvinHours();
      double overAll =
          drive > 0 ? forTimeConstant[i] / drive : forTimeConstant[forTimeConstant.length - 1];
      Step step = step(climate.steps().get(i).name(), gainKWh[i], losses[i], overAll);
      steps.add(step);
      used += step.usedKWh();
      surplus += step.gainKWh() - step.usedKWh();
      left += step.lossKWh() - step.usedKWh();
    }
    // A store that gives off more than is lacking leaves a surplus as well.
    return new Outcome(steps, used, Math.max(0, left), surplus + Math.max(0, -left));
  }

  private Step step(String name, double gain, double loss, double overAll) {
    Utilisation.Use use = utilisation.of(gain, loss, overAll);
    // Where nothing is lost, what comes in through the envelope is not used either.
    double used = loss <= 0 ? loss : use.factor() * gain;
    return new Step(name, gain, loss, overAll, use, used);
  }
}
