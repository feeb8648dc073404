package coldseam.solver.result;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Subtraction;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.Function;

/** ψ = Σ b·L2D − Σ b·U·l (ISO 10211:2017, clause 12). */
final class LinearTransmittances {
  private final List<PsiPlan> plans;

  LinearTransmittances(List<PsiPlan> plans) {
    this.plans = List.copyOf(plans);
  }

  boolean any() {
    return !plans.isEmpty();
  }

  /** By how much each ψ shifts because a flank's U is typed and not that of the drawn layers. */
  List<String> shifts(PlacedFlank flank) {
    List<String> shifts = new ArrayList<>();
    for (PsiPlan plan : plans) {
      for (PsiPlan.Term term : plan.terms()) {
        if (term.flank().filter(flank::equals).isPresent() && term.separation().floating() < 0) {
          double shift =
              -(term.uWPerM2K().get().mid() - flank.drawnUWPerM2K().getAsDouble())
                  * term.lengthM()
                  * term.separation().weight();
          shifts.add(
              String.format(Locale.ROOT, "ψ '%s' by %+.4f W/(m·K)", plan.wanted().name(), shift));
        }
      }
    }
    return shifts;
  }

  /**
   * Works the ψ out.
   *
   * @param couplings of the heat-loss solution
   * @param others L2D of the other details
   */
  List<Result.LinearTransmittance> evaluate(
      Couplings couplings, Function<Subtraction.OfDetail, Quantity> others) {
    return plans.stream().map(plan -> evaluate(plan, couplings, others)).toList();
  }

  private Result.LinearTransmittance evaluate(
      PsiPlan plan, Couplings couplings, Function<Subtraction.OfDetail, Quantity> others) {
    Total coupling = new Total();
    coupling.add(1, couplings.between(plan.warm(), plan.cold(), plan.floating()));
    plan.weights()
        .forEach(
            (space, b) ->
                coupling.add(
                    b, couplings.between(plan.warm(), new int[] {space}, plan.floating())));
    Quantity start = coupling.quantity();
    Total psi = new Total().add(1, start);
    List<Result.Subtracted> subtracted = new ArrayList<>();
    for (PsiPlan.Term term : plan.terms()) {
      double weight =
          term.separation().floating() < 0
              ? term.separation().weight()
              : couplings.response(plan.floating(), term.separation().floating(), plan.cold());
      Bracket value;
      if (term.other().isPresent()) {
        Quantity other = others.apply(term.other().get());
        psi.add(-1, other);
        value = Total.bracket(other);
      } else {
        value = Total.scaled(term.uWPerM2K().get(), term.lengthM() * weight);
        psi.subtract(value);
      }
      subtracted.add(
          new Result.Subtracted(
              term.name(),
              term.uWPerM2K(),
              Double.isNaN(term.lengthM())
                  ? OptionalDouble.empty()
                  : OptionalDouble.of(term.lengthM()),
              weight,
              value,
              term.derivation()));
    }
    return new Result.LinearTransmittance(
        plan.wanted().name(),
        plan.wanted().of(),
        plan.wanted().warm(),
        plan.wanted().cold(),
        plan.wanted().dimensions(),
        start,
        psi.quantity(),
        List.copyOf(subtracted),
        parts(plan, couplings));
  }

  private List<Result.Coupling> parts(PsiPlan plan, Couplings couplings) {
    int pairs =
        plan.warm().length * plan.cold().length + plan.warm().length * plan.weights().size();
    if (pairs < 2) {
      return List.of();
    }
    List<Result.Coupling> parts = new ArrayList<>();
    for (int w : plan.warm()) {
      for (int c : plan.cold()) {
        parts.add(part(plan, couplings, w, c, 1));
      }
      plan.weights().forEach((space, b) -> parts.add(part(plan, couplings, w, space, b)));
    }
    return parts;
  }

  private static Result.Coupling part(
      PsiPlan plan, Couplings couplings, int warm, int other, double weight) {
    Quantity whole = couplings.between(new int[] {warm}, new int[] {other}, plan.floating());
    return new Result.Coupling(
        couplings.name(warm), couplings.name(other), new Total().add(weight, whole).quantity());
  }
}
