package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeMap;

/**
 * Settles what each ψ subtracts before anything is solved; where the case does not say, it is every
 * flank that separates the two sides.
 */
final class PsiPlanner {
  private final Detail detail;
  private final Outline outline;
  private final List<PlacedFlank> flanks;
  private final FlankLengths lengths;
  private final int facedSpaces;
  private final List<Fault> faults = new ArrayList<>();
  private final List<Assumption> assumptions = new ArrayList<>();
  private final List<PsiPlan> plans = new ArrayList<>();
  private final List<String> warnings = new ArrayList<>();

  PsiPlanner(Detail detail, Outline outline, List<PlacedFlank> flanks, FlankLengths lengths) {
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

  List<String> warnings() {
    return warnings;
  }

  List<PsiPlan> plans() {
    return plans;
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
    PsiPlan plan = new PsiPlan(psi, warm, cold, weights, floating, new ArrayList<>());
    if (psi.subtractions().isEmpty()) {
      planAllFlanks(plan);
    } else {
      for (Subtraction subtraction : psi.subtractions()) {
        planStated(plan, subtraction);
      }
      warnOfFlanksLeft(plan);
    }
    plans.add(plan);
  }

  private int[] eliminated(int[] warm, int[] cold, Map<Integer, Double> weights) {
    int[] beside = Couplings.floatingBeside(detail, warm, cold);
    int count = 0;
    for (int f : beside) {
      if (!weights.containsKey(f)) {
        beside[count++] = f;
      }
    }
    return Arrays.copyOf(beside, count);
  }

  private void planAllFlanks(PsiPlan plan) {
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
      PsiPlan.Separation separation = plan.separation(flank);
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

  /**
   * Flanks between the two sides that a stated list leaves out; a part known by its U or another
   * detail may stand for one each.
   */
  private void warnOfFlanksLeft(PsiPlan plan) {
    Set<String> stated = new HashSet<>();
    int others = 0;
    for (Subtraction subtraction : plan.wanted().subtractions()) {
      if (subtraction instanceof Subtraction.OfFlank of) {
        stated.add(of.flank());
      } else {
        others++;
      }
    }
    List<PlacedFlank> left = new ArrayList<>();
    for (PlacedFlank flank : flanks) {
      if (!stated.contains(flank.name()) && known(flank) && !plan.separation(flank).none()) {
        left.add(flank);
      }
    }
    if (left.size() <= others) {
      return;
    }
    for (PlacedFlank flank : left) {
      warnings.add(
          "ψ '"
              + plan.wanted().name()
              + "': its list leaves out flank '"
              + flank.name()
              + "', which lies between its two sides; not subtracted: "
              + transmissionWords(flank, plan.wanted().dimensions()));
    }
  }

  /** Whether the U of a flank is known, and between which spaces it lies. */
  private boolean known(PlacedFlank flank) {
    return flank.uWPerM2K().isPresent()
        && (flank.warm() >= 0 || flank.cold() >= 0 || facedSpaces <= 2);
  }

  private String transmissionWords(PlacedFlank flank, DimensionSystem system) {
    double u = flank.uWPerM2K().orElseThrow().mid();
    Optional<Result.Length> length = lengths.of(flank, system).length();
    if (length.isEmpty()) {
      return "U = " + Wording.figure(u) + " W/(m²·K), length unknown";
    }
    return "U·l = "
        + Wording.figure(u)
        + " W/(m²·K) × "
        + Wording.length(length.get().valueM())
        + " = "
        + Wording.figure(u * length.get().valueM())
        + " W/(m·K)";
  }

  private void planStated(PsiPlan plan, Subtraction subtraction) {
    if (subtraction instanceof Subtraction.OfFlank of) {
      planStatedFlank(plan, of);
    } else if (subtraction instanceof Subtraction.OfKnown of) {
      plan.terms()
          .add(
              new PsiPlan.Term(
                  of.name(),
                  Optional.empty(),
                  PsiPlan.Separation.FULL,
                  Optional.of(of.uWPerM2K()),
                  of.lengthM(),
                  Optional.empty(),
                  "U and length typed in the case"));
    } else if (subtraction instanceof Subtraction.OfDetail of) {
      plan.terms()
          .add(
              new PsiPlan.Term(
                  of.name(),
                  Optional.empty(),
                  PsiPlan.Separation.FULL,
                  Optional.empty(),
                  Double.NaN,
                  Optional.of(of),
                  "L2D of '" + of.detail().title() + "', solved as well"));
    }
  }

  private void planStatedFlank(PsiPlan plan, Subtraction.OfFlank of) {
    Optional<PlacedFlank> flank = named(of.flank());
    if (flank.isEmpty()) {
      fault(plan, "subtracts flank '" + of.flank() + "', which is not one of the flanks" + all());
      return;
    }
    PsiPlan.Separation separation = plan.separation(flank.get());
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
  }

  private Optional<PlacedFlank> named(String name) {
    for (PlacedFlank flank : flanks) {
      if (flank.name().equals(name)) {
        return Optional.of(flank);
      }
    }
    return Optional.empty();
  }

  private String all() {
    List<String> names = new ArrayList<>();
    for (PlacedFlank flank : flanks) {
      names.add(flank.name());
    }
    return names.isEmpty() ? "; there are none" : " (" + String.join(", ", names) + ")";
  }

  private String pairWords(PlacedFlank flank) {
    return nameOf(flank.warm()) + " and " + nameOf(flank.cold());
  }

  private String nameOf(int space) {
    return space < 0 ? "no space" : detail.spaces().get(space).name();
  }

  private void addFlank(
      PsiPlan plan, PlacedFlank flank, PsiPlan.Separation separation, OptionalDouble ownLength) {
    if (flank.uWPerM2K().isEmpty()) {
      faultWithoutU(plan, flank);
      return;
    }
    Optional<Result.Length> length =
        ownLength.isPresent()
            ? Optional.of(
                new Result.Length(
                    ownLength.getAsDouble(),
                    Optional.empty(),
                    Optional.empty(),
                    "length typed for this ψ"))
            : derivedLength(plan, flank);
    if (length.isPresent()) {
      plan.terms()
          .add(
              new PsiPlan.Term(
                  flank.name(),
                  Optional.of(flank),
                  separation,
                  flank.uWPerM2K(),
                  length.get().valueM(),
                  Optional.empty(),
                  flank.uWords() + "; " + length.get().derivation()));
    }
  }

  /** A flank named in the case is at fault by itself; one found here is so for this ψ. */
  private void faultWithoutU(PsiPlan plan, PlacedFlank flank) {
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
  }

  private Optional<Result.Length> derivedLength(PsiPlan plan, PlacedFlank flank) {
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
      return Optional.empty();
    }
    assumeLength(flank, system, outcome.length().get());
    return outcome.length();
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
    assumptions.add(line);
  }

  private static String words(DimensionSystem system) {
    return system.name().toLowerCase(Locale.ROOT).replace('_', ' ');
  }

  private Optional<Point> place(PlacedFlank flank) {
    return flank.plane().isEmpty()
        ? Optional.empty()
        : Optional.of(outline.point(flank.plane().get().first()));
  }

  private void fault(PsiPlan plan, String message) {
    fault(plan, message, Optional.empty());
  }

  private void fault(PsiPlan plan, String message, Optional<Point> where) {
    faults.add(new Fault("psi", plan.wanted().name(), message, where));
  }
}
