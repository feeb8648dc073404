package coldseam.solver.result;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * χ = L3D − Σ U·A − Σ ψ·l (ISO 10211:2017, clause 12) of a body of revolution. Where the case does
 * not say what is subtracted, it is every {@link RoundFlank} between the two sides.
 */
final class PointTransmittances {
  private static final String CLAUSE = "ISO 10211, clause 12";

  /** One term to be taken off; {@code flank} tells how it follows from materials and films. */
  private record Term(
      Result.PointTerm stated, Optional<RoundFlank> flank, Optional<Subtraction.OfDetail> other) {}

  private record Planned(
      Wanted.Chi wanted, int[] warm, int[] cold, int[] floating, List<Term> terms) {}

  private final Detail detail;
  private final Outline outline;
  private final List<RoundFlank> flanks;
  private final List<Planned> plans = new ArrayList<>();
  private final List<Fault> faults = new ArrayList<>();
  private final List<Assumption> assumptions = new ArrayList<>();

  /**
   * Settles what each χ subtracts.
   *
   * @param detail the detail
   * @param outline its outline
   * @param placed every flank found
   */
  PointTransmittances(Detail detail, Outline outline, List<PlacedFlank> placed) {
    this.detail = detail;
    this.outline = outline;
    flanks = RoundFlank.of(outline, placed);
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Chi chi) {
        plan(chi);
      }
    }
  }

  List<Fault> faults() {
    return faults;
  }

  List<Assumption> assumptions() {
    return assumptions;
  }

  boolean any() {
    return !plans.isEmpty();
  }

  /** The most that any χ takes off its L3D as far as that is known before solving, W/K. */
  double takenOffWPerK() {
    double most = 0;
    for (Planned plan : plans) {
      double sum = 0;
      for (Term term : plan.terms()) {
        sum += term.other().isPresent() ? 0 : term.stated().valueWPerK().mid();
      }
      most = Math.max(most, sum);
    }
    return most;
  }

  private void plan(Wanted.Chi chi) {
    SpaceGroups groups = new SpaceGroups(detail, "chi", chi.name());
    int[] warm = groups.indices(chi.warm());
    int[] cold = groups.indices(chi.cold());
    groups.checkApart(warm, cold);
    faults.addAll(groups.faults());
    if (!groups.faults().isEmpty()) {
      return;
    }
    List<Term> terms = new ArrayList<>();
    int[] floating = Couplings.floatingBeside(detail, warm, cold);
    Planned plan = new Planned(chi, warm, cold, floating, terms);
    if (chi.subtractions().isEmpty()) {
      addFlanks(plan);
    }
    for (Subtraction subtraction : chi.subtractions()) {
      terms.add(term(subtraction));
    }
    plans.add(plan);
  }

  private void addFlanks(Planned plan) {
    List<String> words = new ArrayList<>();
    for (RoundFlank flank : flanks) {
      PlacedFlank placed = flank.placed();
      boolean between =
          Couplings.contains(plan.warm(), placed.warm())
                  && Couplings.contains(plan.cold(), placed.cold())
              || Couplings.contains(plan.cold(), placed.warm())
                  && Couplings.contains(plan.warm(), placed.cold());
      if (!between) {
        continue;
      }
      if (!flank.reason().isEmpty()) {
        fault(
            plan.wanted(),
            "what the undisturbed construction at "
                + placed.placeWords(outline)
                + " counts cannot be derived ("
                + flank.reason()
                + "); state under subtract what is taken off");
        return;
      }
      plan.terms().add(new Term(flank.term(), Optional.of(flank), Optional.empty()));
      words.add(flank.name() + ", " + flank.term().derivation());
    }
    if (words.isEmpty()) {
      fault(
          plan.wanted(),
          "no undisturbed construction at a cut-off plane separates "
              + String.join(", ", plan.wanted().warm())
              + " from "
              + String.join(", ", plan.wanted().cold())
              + "; state under subtract what is taken off");
      return;
    }
    assumptions.add(
        new Assumption(
            "what χ '" + plan.wanted().name() + "' subtracts", String.join("; ", words), CLAUSE));
  }

  private static Term term(Subtraction subtraction) {
    if (subtraction instanceof Subtraction.OfArea of) {
      return stated(
          new Result.PointTerm(
              of.name(),
              Optional.of(of.uWPerM2K()),
              OptionalDouble.of(of.areaM2()),
              Optional.empty(),
              OptionalDouble.empty(),
              Total.scaled(of.uWPerM2K(), of.areaM2()),
              "stated in the case"));
    }
    if (subtraction instanceof Subtraction.OfLine of) {
      return stated(
          new Result.PointTerm(
              of.name(),
              Optional.empty(),
              OptionalDouble.empty(),
              Optional.of(of.psiWPerMK()),
              OptionalDouble.of(of.lengthM()),
              Total.scaled(of.psiWPerMK(), of.lengthM()),
              "stated in the case"));
    }
    Subtraction.OfDetail of = (Subtraction.OfDetail) subtraction;
    return new Term(
        new Result.PointTerm(
            of.name(),
            Optional.empty(),
            OptionalDouble.empty(),
            Optional.empty(),
            OptionalDouble.empty(),
            Bracket.of(0),
            "L3D of the other case, solved as well"),
        Optional.empty(),
        Optional.of(of));
  }

  private static Term stated(Result.PointTerm term) {
    return new Term(term, Optional.empty(), Optional.empty());
  }

  private void fault(Wanted.Chi chi, String message) {
    faults.add(new Fault("chi", chi.name(), message, Optional.empty()));
  }

  /**
   * Works the χ out.
   *
   * @param couplings of the heat-loss solution
   * @param others L3D of the other details
   */
  List<Result.PointTransmittance> evaluate(
      Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    List<Result.PointTransmittance> all = new ArrayList<>();
    for (Planned plan : plans) {
      all.add(evaluate(plan, couplings, others));
    }
    return all;
  }

  private Result.PointTransmittance evaluate(
      Planned plan, Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    Quantity start = couplings.between(plan.warm(), plan.cold(), plan.floating());
    Total chi = new Total().add(1, start);
    List<Result.PointTerm> subtracted = new ArrayList<>();
    for (Term term : plan.terms()) {
      if (term.other().isPresent()) {
        Quantity other = others.get(term.other().get()).value();
        chi.add(-1, other);
        subtracted.add(term.stated().worth(Total.bracket(other)));
      } else {
        chi.subtract(term.stated().valueWPerK());
        subtracted.add(term.stated());
      }
    }
    Quantity value = chi.quantity();
    Optional<Combination> made = combination(plan, couplings, others);
    return new Result.PointTransmittance(
        plan.wanted().name(),
        plan.wanted().of(),
        plan.wanted().warm(),
        plan.wanted().cold(),
        start,
        value,
        List.copyOf(subtracted),
        made.isEmpty() ? List.of() : made.get().sensitivities(),
        made.isEmpty() ? Optional.empty() : made.get().tolerance(value));
  }

  /** χ by material and film: empty where an L3D in it is infinite. */
  private Optional<Combination> combination(
      Planned plan, Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    Optional<ByPart> coupling =
        couplings.byPart(plan.warm(), plan.cold(), Map.of(), plan.floating());
    if (coupling.isEmpty()) {
      return Optional.empty();
    }
    Combination all = new Combination().add(1, coupling.get());
    for (Term term : plan.terms()) {
      if (term.other().isPresent()) {
        Optional<ByPart> other = others.get(term.other().get()).byPart();
        if (other.isEmpty()) {
          return Optional.empty();
        }
        all.add(-1, other.get(), term.stated().name());
      } else if (term.flank().isPresent()) {
        RoundFlank flank = term.flank().get();
        all.add(-flank.extent(), flank.byPart(detail, outline));
      } else {
        all.subtract(term.stated().valueWPerK());
      }
    }
    return Optional.of(all);
  }
}
