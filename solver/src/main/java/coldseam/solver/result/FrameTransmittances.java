package coldseam.solver.result;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * U_f = (L2D with the insulating panel − Σ U_p b_p) / b_f and ψ_g = L2D with the glazing − U_f b_f
 * − Σ U_g b_g (ISO 10077-2), intervals taken off outward.
 */
final class FrameTransmittances {
  private final Optional<FramePlan> plan;

  /** The plan of the run with the panel: the own one if the panel itself is drawn. */
  private final Optional<FramePlan> panelPlan;

  /**
   * What came out.
   *
   * @param transmittance U_f
   * @param glassEdge ψ_g; none if the panel itself is drawn
   * @param account the two runs and the lengths
   */
  record Outcome(
      Result.EffectiveTransmittance transmittance,
      List<Result.LinearTransmittance> glassEdge,
      Result.Frame account) {}

  /** L2D of one run, and how it depends on materials and films. */
  private record Run(FramePlan plan, Quantity coupling, Optional<ByPart> byPart) {
    /** L2D less what passes the glazings or panels. */
    Quantity ofFrame() {
      Total total = new Total().add(1, coupling);
      plan.infills().forEach(infill -> total.subtract(heat(infill)));
      return total.quantity();
    }

    /** The same by material and film, added to a sum with a factor. */
    void addOfFrame(Combination sum, double factor) {
      sum.add(factor, byPart.orElseThrow());
      for (FramePlan.Infill infill : plan.infills()) {
        Optional<ByPart> layers = plan.byPart(infill);
        if (layers.isPresent()) {
          sum.add(-factor * infill.visibleM(), layers.get());
        } else {
          sum.subtract(Total.scaled(heat(infill), factor));
        }
      }
    }
  }

  FrameTransmittances(
      Detail detail,
      Outline outline,
      List<PlacedFlank> flanks,
      Map<Subtraction.OfDetail, Plan> others) {
    plan = FramePlan.of(detail, outline, flanks);
    panelPlan = glazed() ? others.get(panelRun()).framePlan() : plan;
  }

  boolean any() {
    return plan.isPresent();
  }

  /** Whether the own run is the one with the glazing, so that ψ_g follows from it. */
  boolean glazed() {
    return plan.isPresent() && plan.get().wanted().panelRun().isPresent();
  }

  private Subtraction.OfDetail panelRun() {
    return plan.orElseThrow().wanted().panelRun().orElseThrow();
  }

  Optional<FramePlan> plan() {
    return plan;
  }

  List<Fault> faults() {
    return plan.isPresent() ? plan.get().faults() : List.of();
  }

  List<String> warnings() {
    return plan.isPresent() ? plan.get().warnings() : List.of();
  }

  List<Assumption> assumptions() {
    if (plan.isEmpty()) {
      return List.of();
    }
    List<Assumption> lines = new ArrayList<>(plan.get().assumptions());
    if (glazed()) {
      lines.add(
          new Assumption(
              "insulating panel for U_f",
              Wording.figure(plan.get().wanted().panelWPerMK())
                  + " W/(m·K) in place of the glazing, of its thickness and rebate depth",
              "ISO 10077-2, insulating panel"));
    }
    return lines;
  }

  /**
   * Works U_f and ψ_g out.
   *
   * @param couplings of the own heat-loss solution
   * @param others L2D of the other details
   * @return empty if no frame is asked for
   */
  Optional<Outcome> evaluate(Couplings couplings, Map<Subtraction.OfDetail, OtherCoupling> others) {
    if (plan.isEmpty()) {
      return Optional.empty();
    }
    FramePlan own = plan.get();
    Run drawn =
        new Run(
            own,
            couplings.between(own.warm(), own.cold(), own.floating()),
            couplings.byPart(own.warm(), own.cold(), Map.of(), own.floating()));
    Run panel = drawn;
    if (glazed()) {
      OtherCoupling other = others.get(panelRun());
      panel = new Run(panelPlan.orElseThrow(), other.value(), other.byPart());
    }
    Quantity loss = panel.ofFrame();
    Result.EffectiveTransmittance transmittance = transmittance(panel, loss);
    return Optional.of(
        new Outcome(
            transmittance,
            glazed()
                ? List.of(glassEdge(drawn, panel, loss, transmittance.valueWPerM2K()))
                : List.of(),
            new Result.Frame(
                panel.plan().width(),
                lengths(drawn.plan()),
                panel.plan().innerM(),
                panel.plan().outerM(),
                panel.coupling(),
                terms(panel.plan()),
                loss,
                glazed() ? Optional.of(drawn.coupling()) : Optional.empty())));
  }

  private static Result.EffectiveTransmittance transmittance(Run panel, Quantity loss) {
    double factor = 1 / panel.plan().widthM();
    Quantity u = new Total().add(factor, loss).quantity();
    Optional<Result.Tolerance> tolerance = Optional.empty();
    if (panel.byPart().isPresent()) {
      Combination sum = new Combination();
      panel.addOfFrame(sum, factor);
      tolerance = sum.tolerance(u);
    }
    return new Result.EffectiveTransmittance(
        Wanted.Frame.NAME,
        panel.plan().wanted().warm(),
        panel.plan().wanted().cold(),
        u,
        Total.inverse(u),
        panel.plan().widthM(),
        tolerance);
  }

  private static Result.LinearTransmittance glassEdge(
      Run drawn, Run panel, Quantity loss, Quantity u) {
    Quantity psi = new Total().add(1, drawn.ofFrame()).add(-1, loss).quantity();
    List<Result.Subtracted> subtracted = new ArrayList<>();
    subtracted.add(
        new Result.Subtracted(
            Wanted.Frame.NAME,
            Optional.of(Total.bracket(u)),
            OptionalDouble.of(panel.plan().widthM()),
            1,
            Total.bracket(loss),
            "U_f from the run with the insulating panel, projected width"));
    subtracted.addAll(terms(drawn.plan()));
    Combination sum = new Combination();
    boolean known = drawn.byPart().isPresent() && panel.byPart().isPresent();
    if (known) {
      drawn.addOfFrame(sum, 1);
      panel.addOfFrame(sum, -1);
    }
    return new Result.LinearTransmittance(
        Wanted.Frame.GLASS_EDGE,
        Wanted.Frame.GLASS_EDGE,
        drawn.plan().wanted().warm(),
        drawn.plan().wanted().cold(),
        Optional.<DimensionSystem>empty(),
        drawn.coupling(),
        psi,
        List.copyOf(subtracted),
        List.of(),
        known ? merged(sum.sensitivities()) : List.of(),
        known ? sum.tolerance(psi) : Optional.empty());
  }

  /** A cavity may conduct otherwise in each run: as one thing it counts with both. */
  private static List<Result.Sensitivity> merged(List<Result.Sensitivity> all) {
    List<Result.Sensitivity> merged = new ArrayList<>();
    for (Result.Sensitivity one : all) {
      int known = 0;
      while (known < merged.size() && !merged.get(known).of().equals(one.of())) {
        known++;
      }
      if (known == merged.size()) {
        merged.add(one);
      } else {
        double slope = merged.get(known).slope() + one.slope();
        merged.set(known, new Result.Sensitivity(one.of(), one.film(), slope));
      }
    }
    return List.copyOf(merged);
  }

  private static List<Result.Subtracted> terms(FramePlan plan) {
    List<Result.Subtracted> terms = new ArrayList<>();
    for (FramePlan.Infill infill : plan.infills()) {
      terms.add(
          new Result.Subtracted(
              infill.name(),
              infill.flank().uWPerM2K(),
              OptionalDouble.of(infill.visibleM()),
              1,
              heat(infill),
              infill.flank().uWords() + "; " + infill.derivation()));
    }
    return terms;
  }

  private static List<Result.Length> lengths(FramePlan plan) {
    List<Result.Length> lengths = new ArrayList<>();
    for (FramePlan.Infill infill : plan.infills()) {
      lengths.add(infill.visible());
    }
    return lengths;
  }

  /** U b of a glazing or panel, W/(m·K). */
  private static Bracket heat(FramePlan.Infill infill) {
    return Total.scaled(infill.flank().uWPerM2K().orElseThrow(), infill.visibleM());
  }

  /** What a glazing or panel is called. */
  static String name(Area.Role role) {
    return role == Area.Role.GLAZING ? "glazing" : "panel";
  }
}
