package coldseam.solver.result;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Subtraction;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** ψ = Σ b·L2D − Σ b·U·l (ISO 10211:2017, clause 12). */
final class LinearTransmittances {
  private final List<PsiPlan> plans;
  private final Detail detail;
  private final Conditions conditions;

  LinearTransmittances(List<PsiPlan> plans, Detail detail, Conditions conditions) {
    this.plans = List.copyOf(plans);
    this.detail = detail;
    this.conditions = conditions;
  }

  boolean any() {
    return !plans.isEmpty();
  }

  /** By how much each ψ shifts because a flank's U is typed and not that of the drawn layers. */
  List<String> shifts(PlacedFlank flank) {
    List<String> shifts = new ArrayList<>();
    for (PsiPlan plan : plans) {
      for (PsiPlan.Term term : plan.terms()) {
        if (term.of(flank) && term.separation().floating() < 0) {
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
      Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    List<Result.LinearTransmittance> all = new ArrayList<>();
    for (PsiPlan plan : plans) {
      all.add(evaluate(plan, couplings, others));
    }
    return all;
  }

  private Result.LinearTransmittance evaluate(
      PsiPlan plan, Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    Total coupling = new Total();
    coupling.add(1, couplings.between(plan.warm(), plan.cold(), plan.floating()));
    for (Map.Entry<Integer, Double> weight : plan.weights().entrySet()) {
      int[] between = {weight.getKey()};
      coupling.add(weight.getValue(), couplings.between(plan.warm(), between, plan.floating()));
    }
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
        Quantity other = others.get(term.other().get()).value();
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
    Quantity value = psi.quantity();
    Optional<Combination> made = combination(plan, couplings, others);
    return new Result.LinearTransmittance(
        plan.wanted().name(),
        plan.wanted().of(),
        plan.wanted().warm(),
        plan.wanted().cold(),
        Optional.of(plan.wanted().dimensions()),
        start,
        value,
        List.copyOf(subtracted),
        parts(plan, couplings),
        made.isEmpty() ? List.of() : made.get().sensitivities(),
        made.isEmpty() ? Optional.empty() : made.get().tolerance(value));
  }

  /** ψ by material and film: empty where an L2D in it is infinite. */
  private Optional<Combination> combination(
      PsiPlan plan, Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    Optional<ByPart> coupling =
        couplings.byPart(plan.warm(), plan.cold(), plan.weights(), plan.floating());
    if (coupling.isEmpty()) {
      return Optional.empty();
    }
    Combination all = new Combination().add(1, coupling.get());
    for (PsiPlan.Term term : plan.terms()) {
      if (term.other().isPresent()) {
        Optional<ByPart> other = others.get(term.other().get()).byPart();
        if (other.isEmpty()) {
          return Optional.empty();
        }
        all.add(-1, other.get(), term.name());
        continue;
      }
      Bracket u = term.uWPerM2K().get();
      double weight = term.separation().weight();
      int floating = term.separation().floating();
      if (floating >= 0) {
        weight = couplings.response(plan.floating(), floating, plan.cold());
        ByPart slopes = couplings.responseByPart(plan.floating(), floating, plan.cold());
        all.add(-u.mid() * term.lengthM(), slopes);
      }
      Optional<ByPart> layers =
          term.flank().isEmpty() ? Optional.empty() : term.flank().get().byPart(detail, conditions);
      if (layers.isPresent()) {
        all.add(-weight * term.lengthM(), layers.get());
      } else {
        all.subtract(Total.scaled(u, weight * term.lengthM()));
      }
    }
    return Optional.of(all);
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
      for (Map.Entry<Integer, Double> weight : plan.weights().entrySet()) {
        parts.add(part(plan, couplings, w, weight.getKey(), weight.getValue()));
      }
    }
    return parts;
  }

  private static Result.Coupling part(
      PsiPlan plan, Couplings couplings, int warm, int other, double weight) {
    Quantity whole = couplings.between(new int[] {warm}, new int[] {other}, plan.floating());
    return new Result.Coupling(
        couplings.name(warm),
        couplings.name(other),
        new Total().add(weight, whole).quantity(),
        Optional.empty());
  }
}
