package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.function.Function;

/**
 * ψ = Σ b·L2D − Σ b·U·l (ISO 10211:2017, clause 12). What is taken off is settled before anything
 * is solved; where the case does not say, it is every flank that separates the two sides.
 */
final class LinearTransmittances {
  private final Detail detail;
  private final Outline outline;
  private final List<PlacedFlank> flanks;
  private final FlankLengths lengths;
  private final int facedSpaces;
  private final List<Fault> faults = new ArrayList<>();
  private final List<Assumption> assumptions = new ArrayList<>();
  private final List<Plan> plans = new ArrayList<>();

  /**
   * One term to be taken off.
   *
   * @param weight b, or NaN where it follows from the balance of a floating space
   * @param floating that space, or −1
   */
  private record Term(
      String name,
      Optional<PlacedFlank> flank,
      double weight,
      int floating,
      Optional<Bracket> uWPerM2K,
      double lengthM,
      Optional<Subtraction.OfDetail> other,
      String derivation) {}

  private record Plan(
      Wanted.Psi wanted,
      int[] warm,
      int[] cold,
      Map<Integer, Double> weights,
      int[] floating,
      List<Term> terms) {}

  LinearTransmittances(
      Detail detail, Outline outline, List<PlacedFlank> flanks, FlankLengths lengths) {
    this.detail = detail;
    this.outline = outline;
    this.flanks = flanks;
    this.lengths = lengths;
    facedSpaces =
        Couplings.faced(outline.partition().edgeCount(), outline.conditions()).cardinality();
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Psi psi) {
        plan(psi);
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

  /** The other details whose L2D is taken off. */
  List<Subtraction.OfDetail> otherDetails() {
    List<Subtraction.OfDetail> others = new ArrayList<>();
    plans.forEach(plan -> plan.terms().forEach(term -> term.other().ifPresent(others::add)));
    return others;
  }

  private void plan(Wanted.Psi psi) {
    SpaceGroups groups = new SpaceGroups(detail, "psi", psi.name());
    int[] warm = groups.indices(psi.warm());
    int[] cold = groups.indices(psi.cold());
    int[] between = groups.indices(List.copyOf(psi.weights().keySet()));
    groups.checkApart(warm, cold);
    faults.addAll(groups.faults());
    if (!groups.faults().isEmpty()) {
      return;
    }
    Map<Integer, Double> weights = new TreeMap<>();
    for (int space : between) {
      weights.put(space, psi.weights().get(detail.spaces().get(space).name()));
    }
    int[] floating = eliminated(warm, cold, weights);
    Plan plan = new Plan(psi, warm, cold, weights, floating, new ArrayList<>());
    if (psi.subtractions().isEmpty()) {
      planAllFlanks(plan);
    } else {
      psi.subtractions().forEach(subtraction -> planStated(plan, subtraction));
    }
    plans.add(plan);
  }

  private int[] eliminated(int[] warm, int[] cold, Map<Integer, Double> weights) {
    return Arrays.stream(Couplings.floating(detail))
        .filter(f -> !Couplings.contains(warm, f) && !Couplings.contains(cold, f))
        .filter(f -> !weights.containsKey(f))
        .toArray();
  }

  private void planAllFlanks(Plan plan) {
    List<String> words = new ArrayList<>();
    for (PlacedFlank flank : flanks) {
      if (flank.warm() < 0 && flank.cold() < 0 && facedSpaces > 2) {
        fault(
            plan,
            "flank '"
                + flank.name()
                + "' has no cut-off plane and the detail has more than two spaces: state under"
                + " subtract whether it is taken off");
        continue;
      }
      Separation separation = separation(plan, flank);
      if (separation.none()) {
        continue;
      }
      addFlank(plan, flank, separation, OptionalDouble.empty());
      words.add("'" + flank.name() + "'");
    }
    if (words.isEmpty()) {
      fault(
          plan,
          "no flank separates "
              + String.join(", ", plan.wanted().warm())
              + " from "
              + String.join(", ", plan.wanted().cold())
              + ": state what is subtracted");
      return;
    }
    assumptions.add(
        new Assumption(
            "what ψ '" + plan.wanted().name() + "' subtracts",
            "every flank between its two sides: " + String.join(", ", words),
            "ISO 10211, clause 12"));
  }

  /** How a flank counts in a ψ: times b, or by the balance of a floating space. */
  private record Separation(double weight, int floating) {
    boolean none() {
      return weight == 0 && floating < 0;
    }
  }

  /** A flank with an unknown side counts where its known side, if any, is one of the two. */
  private Separation separation(Plan plan, PlacedFlank flank) {
    if (flank.warm() < 0) {
      return new Separation(1, -1);
    }
    if (Couplings.contains(plan.warm(), flank.warm())) {
      return seenFromWarm(plan, flank.cold());
    }
    if (Couplings.contains(plan.warm(), flank.cold())) {
      return seenFromWarm(plan, flank.warm());
    }
    boolean known = flank.cold() < 0 && Couplings.contains(plan.cold(), flank.warm());
    return new Separation(known ? 1 : 0, -1);
  }

  private static Separation seenFromWarm(Plan plan, int other) {
    if (other < 0 || Couplings.contains(plan.cold(), other)) {
      return new Separation(1, -1);
    }
    if (Couplings.contains(plan.floating(), other)) {
      return new Separation(Double.NaN, other);
    }
    return new Separation(plan.weights().getOrDefault(other, 0.0), -1);
  }

  private void planStated(Plan plan, Subtraction subtraction) {
    if (subtraction instanceof Subtraction.OfFlank of) {
      Optional<PlacedFlank> flank =
          flanks.stream().filter(f -> f.name().equals(of.flank())).findFirst();
      if (flank.isEmpty()) {
        fault(plan, "subtracts flank '" + of.flank() + "', which is not one of the flanks" + all());
        return;
      }
      Separation separation = separation(plan, flank.get());
      if (separation.none()) {
        fault(
            plan,
            "subtracts flank '"
                + of.flank()
                + "', which separates "
                + pairWords(flank.get())
                + " and not its two sides");
        return;
      }
      addFlank(plan, flank.get(), separation, of.lengthM());
    } else if (subtraction instanceof Subtraction.OfKnown of) {
      plan.terms()
          .add(
              new Term(
                  of.name(),
                  Optional.empty(),
                  1,
                  -1,
                  Optional.of(of.uWPerM2K()),
                  of.lengthM(),
                  Optional.empty(),
                  "U and length typed in the case"));
    } else if (subtraction instanceof Subtraction.OfDetail of) {
      plan.terms()
          .add(
              new Term(
                  of.name(),
                  Optional.empty(),
                  1,
                  -1,
                  Optional.empty(),
                  Double.NaN,
                  Optional.of(of),
                  "L2D of '" + of.detail().title() + "', solved as well"));
    }
  }

  private String all() {
    return flanks.isEmpty()
        ? "; there are none"
        : " (" + String.join(", ", flanks.stream().map(PlacedFlank::name).toList()) + ")";
  }

  private String pairWords(PlacedFlank flank) {
    return nameOf(flank.warm()) + " and " + nameOf(flank.cold());
  }

  private String nameOf(int space) {
    return space < 0 ? "no space" : detail.spaces().get(space).name();
  }

  private void addFlank(
      Plan plan, PlacedFlank flank, Separation separation, OptionalDouble ownLength) {
    if (flank.uWPerM2K().isEmpty()) {
      if (flank.typed().isEmpty()) {
        fault(
            plan,
            "the section is not layered at "
                + flank.placeWords(outline)
                + " ("
                + flank.reading().reason()
                + "): name that flank and type its U",
            place(flank));
      }
      return;
    }
    double length;
    String derivation;
    if (ownLength.isPresent()) {
      length = ownLength.getAsDouble();
      derivation = "length typed for this ψ";
    } else {
      DimensionSystem system = plan.wanted().dimensions();
      FlankLengths.Outcome outcome = lengths.of(flank, system);
      if (outcome.length().isEmpty()) {
        fault(
            plan,
            "state lengths: the "
                + words(system)
                + " length of flank '"
                + flank.name()
                + "' cannot be derived; "
                + outcome.reason(),
            place(flank));
        return;
      }
      length = outcome.length().get().valueM();
      derivation = outcome.length().get().derivation();
      assumeLength(flank, system, outcome.length().get());
    }
    plan.terms()
        .add(
            new Term(
                flank.name(),
                Optional.of(flank),
                separation.weight(),
                separation.floating(),
                flank.uWPerM2K(),
                length,
                Optional.empty(),
                flank.uWords() + "; " + derivation));
  }

  private void assumeLength(PlacedFlank flank, DimensionSystem system, Result.Length length) {
    if (flank.typedLengths().containsKey(system)) {
      return;
    }
    Assumption line =
        new Assumption(
            words(system) + " length of flank '" + flank.name() + "'",
            Wording.length(length.valueM()) + ", " + length.derivation(),
            "ISO 13789, " + words(system) + " dimensions");
    if (!assumptions.contains(line)) {
      assumptions.add(line);
    }
  }

  static String words(DimensionSystem system) {
    return system.name().toLowerCase(Locale.ROOT).replace('_', ' ');
  }

  private Optional<Point> place(PlacedFlank flank) {
    return flank.plane().map(plane -> outline.point(plane.first()));
  }

  private void fault(Plan plan, String message) {
    fault(plan, message, Optional.empty());
  }

  private void fault(Plan plan, String message, Optional<Point> where) {
    faults.add(new Fault("psi", plan.wanted().name(), message, where));
  }

  /** By how much each ψ shifts because a flank's U is typed and not that of the drawn layers. */
  List<String> shifts(PlacedFlank flank) {
    List<String> shifts = new ArrayList<>();
    for (Plan plan : plans) {
      for (Term term : plan.terms()) {
        if (term.flank().filter(flank::equals).isPresent() && term.floating() < 0) {
          double shift =
              -(term.uWPerM2K().get().mid() - flank.drawnUWPerM2K().getAsDouble())
                  * term.lengthM()
                  * term.weight();
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
      Plan plan, Couplings couplings, Function<Subtraction.OfDetail, Quantity> others) {
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
    for (Term term : plan.terms()) {
      double weight =
          term.floating() < 0
              ? term.weight()
              : couplings.response(plan.floating(), term.floating(), plan.cold());
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

  private List<Result.Coupling> parts(Plan plan, Couplings couplings) {
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
      Plan plan, Couplings couplings, int warm, int other, double weight) {
    Quantity whole = couplings.between(new int[] {warm}, new int[] {other}, plan.floating());
    return new Result.Coupling(
        couplings.name(warm), couplings.name(other), new Total().add(weight, whole).quantity());
  }
}
