package coldseam.solver.ledger;

import java.util.ArrayList;
import java.util.List;

/**
 * How gains are used when the losses of every step are known.
 *
 * <p>The need rises with the losses of every step, and gains not used fall: by the formula of η, η
 * · γ rises with γ and its slope lies between 0 and 1, and so does that of used gains over losses;
 * a greater H shortens the time constant, which lowers η.
 */
public final class GainUse {
  private final Climate climate;
  private final double conductanceWPerK;
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

  GainUse(
      Climate climate,
      Envelope envelope,
      List<Gain> gains,
      Utilisation utilisation,
      double storeKWh) {
    this.climate = climate;
    this.conductanceWPerK = envelope.transmissionWPerK().value() + envelope.airWPerK().value();
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
   * @param lossKWh losses of each step, kWh
   * @return what becomes of them
   */
  Outcome of(double[] lossKWh) {
    List<Step> steps = new ArrayList<>();
    double used = 0;
    double left = storeKWh;
    double surplus = 0;
    for (int i = 0; i < lossKWh.length; i++) {
      Step step = step(climate.steps().get(i), gainKWh[i], lossKWh[i]);
      steps.add(step);
      used += step.usedKWh();
      surplus += step.gainKWh() - step.usedKWh();
      left += step.lossKWh() - step.usedKWh();
    }
    // A store that gives off more than is lacking leaves a surplus as well.
    return new Outcome(steps, used, Math.max(0, left), surplus + Math.max(0, -left));
  }

  private Step step(Climate.Step step, double gain, double loss) {
    double drive = step.outdoorKiloKelvinHours();
    double overAll = drive > 0 && loss > 0 ? loss / drive : conductanceWPerK;
    Utilisation.Use use = utilisation.of(gain, loss, overAll);
    // Where nothing is lost, what comes in through the envelope is not used either.
    double used = loss <= 0 ? loss : use.factor() * gain;
    return new Step(step.name(), gain, loss, overAll, use, used);
  }
}
