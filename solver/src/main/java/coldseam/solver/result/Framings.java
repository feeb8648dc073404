package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Framed walls beside their two resistance limits, and U with the corrections of ISO 6946. */
final class Framings {
  private final List<Plan> plans = new ArrayList<>();
  private final List<Fault> faults = new ArrayList<>();

  private record Plan(Wanted.Framing wanted, ResistanceLimits limits) {}

  Framings(Detail detail, Partition partition, Conditions conditions) {
    for (Wanted any : detail.wanted()) {
      if (any instanceof Wanted.Framing framing) {
        plan(framing, partition, conditions);
      }
    }
  }

  private void plan(Wanted.Framing framing, Partition partition, Conditions conditions) {
    Optional<ResistanceLimits> limits =
        ResistanceLimits.of(partition, conditions, framing.alongY(), framing.layer());
    if (limits.isEmpty()) {
      fault(
          framing,
          "its faces are not two planes along "
              + (framing.alongY() ? "y" : "x")
              + "; say which way the wall runs with `along`");
      return;
    }
    if (!framing.layer().isEmpty() && !(limits.get().layerM2KPerW() > 0)) {
      fault(framing, "no `" + framing.layer() + "` is met on the path beside the framing");
    }
    if (framing.fractions().isPresent() && limits.get().metal()) {
      fault(
          framing,
          "metal bridges it, and parallel paths do not hold then; leave `fractions` away and draw"
              + " the headers in a case of their own");
    }
    plans.add(new Plan(framing, limits.get()));
  }

  private void fault(Wanted.Framing framing, String message) {
    faults.add(new Fault("framing", framing.of(), message, Optional.empty()));
  }

  List<Fault> faults() {
    return faults;
  }

  List<Result.Framing> evaluate(List<Result.EffectiveTransmittance> transmittances) {
    List<Result.Framing> all = new ArrayList<>();
    for (Plan plan : plans) {
      for (Result.EffectiveTransmittance u : transmittances) {
        if (u.of().equals(plan.wanted().of())) {
          all.add(evaluate(plan, u));
        }
      }
    }
    return all;
  }

  private static Result.Framing evaluate(Plan plan, Result.EffectiveTransmittance u) {
    ResistanceLimits limits = plan.limits();
    Quantity resistance = u.resistanceM2KPerW();
    boolean mean =
        !limits.metal()
            && limits.parallelM2KPerW()
                <= TransmittanceRules.MOST_RATIO * limits.isothermalM2KPerW();
    double beside = limits.highestM2KPerW();
    OptionalDouble layer = OptionalDouble.empty();
    OptionalDouble effective = OptionalDouble.empty();
    if (!plan.wanted().layer().isEmpty()) {
      layer = OptionalDouble.of(limits.layerM2KPerW());
      effective = OptionalDouble.of(resistance.value() - (beside - limits.layerM2KPerW()));
    }
    Optional<Wanted.Framing.Fractions> fractions = plan.wanted().fractions();
    OptionalDouble whole =
        fractions.isEmpty()
            ? OptionalDouble.empty()
            : OptionalDouble.of(
                fractions.get().cavity() / beside
                    + (fractions.get().studs() + fractions.get().headers())
                        / limits.lowestM2KPerW());
    return new Result.Framing(
        plan.wanted(),
        resistance,
        limits.filmsM2KPerW(),
        limits.parallelM2KPerW(),
        limits.isothermalM2KPerW(),
        beside,
        limits.lowestM2KPerW(),
        limits.framedShare(),
        limits.metal(),
        mean
            ? OptionalDouble.of((limits.parallelM2KPerW() + limits.isothermalM2KPerW()) / 2)
            : OptionalDouble.empty(),
        TransmittanceRules.error(limits.parallelM2KPerW(), limits.isothermalM2KPerW()),
        (u.valueWPerM2K().value() - 1 / beside) * u.widthM(),
        layer,
        effective,
        whole,
        fractions.isEmpty()
            ? OptionalDouble.empty()
            : OptionalDouble.of(
                u.valueWPerM2K().value()
                    + (1 - fractions.get().cavity() - limits.framedShare())
                        * (1 / limits.lowestM2KPerW() - 1 / beside)),
        corrected(plan.wanted(), u.valueWPerM2K().value(), limits.layerM2KPerW()));
  }

  private static Optional<Result.Corrected> corrected(
      Wanted.Framing wanted, double u, double layerR) {
    if (wanted.corrections().isEmpty()) {
      return Optional.empty();
    }
    Wanted.Framing.Corrections ask = wanted.corrections().get();
    double total = 1 / u;
    double voids = TransmittanceRules.airVoids(ask.voidLevel(), layerR, total);
    double fasteners =
        ask.fastenersPerM2() == 0
            ? 0
            : TransmittanceRules.fasteners(
                ask.fastenersPerM2(),
                ask.fastenerWPerMK(),
                ask.fastenerM2(),
                ask.insulationM(),
                ask.throughM(),
                layerR,
                total);
    double rain =
        TransmittanceRules.invertedRoof(ask.rainMmPerDay(), ask.rainFactor(), layerR, total);
    OptionalDouble tapered = OptionalDouble.empty();
    if (ask.taper().isPresent()) {
      tapered =
          OptionalDouble.of(
              TransmittanceRules.tapered(ask.taper().get(), ask.taperM2KPerW(), total));
    }
    return Optional.of(new Result.Corrected(voids, fasteners, rain, u, tapered));
  }
}
