package coldseam.solver;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.air.Cavities;
import coldseam.solver.air.Cavity;
import coldseam.solver.air.SlightLayers;
import coldseam.solver.conduction.Conduction;
import coldseam.solver.conduction.Progress;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.CornerZones;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.FrameDetail;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Revolution;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Interpolation;
import coldseam.solver.result.OtherCoupling;
import coldseam.solver.result.Plan;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;

/** The door of this module: a detail and an accuracy in, a result out. */
public final class Solver {
  private static final double NANOS_PER_MS = 1e6;

  private Solver() {}

  /**
   * What is understood of a detail before anything is solved; conductivities of cavities are those
   * of a coarse mesh.
   *
   * @param detail the detail as it is to be solved: its fills are the labels of the partition
   * @param partition the resolved section
   * @param heatLoss conditions with the films for heat loss
   * @param surface conditions with the films for surface temperatures
   * @param flanks every flank, named or found
   * @param assumptions everything chosen for the user
   * @param warnings sentences, each with its figures
   */
  public record Inspection(
      Detail detail,
      Partition partition,
      Conditions heatLoss,
      Conditions surface,
      List<Result.FlankResult> flanks,
      List<Assumption> assumptions,
      List<String> warnings) {}

  /**
   * Resolves and checks without solving.
   *
   * @param detail the detail
   * @return what was understood
   * @throws coldseam.solver.detail.DetailException if it cannot be solved as it stands
   */
  public static Inspection inspect(Detail detail) {
    Resolved resolved = Resolved.of(detail);
    return new Inspection(
        resolved.plan().detail(),
        resolved.partition(),
        resolved.heatLoss(),
        resolved.surface(),
        resolved.plan().flanks(),
        resolved.plan().assumptions(),
        resolved.plan().warnings());
  }

  /**
   * Solves.
   *
   * @param detail the detail
   * @param accuracy the half-widths asked for
   * @param progress told of each pass; can cancel
   * @return the result
   * @throws coldseam.solver.detail.DetailException if it cannot be solved as it stands
   */
  public static Result solve(Detail detail, Accuracy accuracy, Progress progress) {
    StageTimes times = new StageTimes();
    Resolved resolved = Resolved.of(detail);
    if (resolved.cavities().isPresent()) {
      Optional<SlightLayers> slight = resolved.cavities().get().slightLayers(detail);
      if (slight.isPresent()) {
        return between(slight.get(), accuracy, progress);
      }
    }
    times.ended("resolve");

    boolean surfaceNeeded = resolved.plan().surfaceNeeded();
    boolean shared = surfaceNeeded && resolved.plan().sameFilms();
    Accuracy ofEach = accuracy.sharingPsi(1 + resolved.others().size());
    Agreed agreed =
        resolved.solve(
            resolved.goal(
                ofEach, resolved.plan().psiWanted(), resolved.plan().heatLossTemperatures(shared)),
            progress);
    Plan plan = agreed.resolved().plan();
    Solution heatLoss = agreed.solution();
    Map<Subtraction.OfDetail, OtherCoupling> others = solveOthers(resolved, ofEach, progress);
    times.ended("heat loss");

    Optional<Solution> surface = Optional.empty();
    List<String> doubts = new ArrayList<>();
    if (shared) {
      surface = Optional.of(heatLoss);
    } else if (surfaceNeeded) {
      surface =
          Optional.of(
              Conduction.solveNext(
                  heatLoss,
                  agreed.resolved().surfaceAgreeing(accuracy, heatLoss, doubts),
                  new Conduction.Goal(
                      accuracy,
                      false,
                      false,
                      plan.surfaceTemperatures(),
                      plan.temperatures(heatLoss)),
                  progress));
    }
    times.ended("surface temperatures");

    List<Cavity> cavities =
        agreed.cavities().isPresent() ? agreed.cavities().get().cavities() : List.of();
    return plan.result(heatLoss, surface, others, cavities, doubts, times);
  }

  private static Result between(SlightLayers slight, Accuracy accuracy, Progress progress) {
    for (Wanted wanted : slight.unventilated().wanted()) {
      if (wanted instanceof Wanted.Frame) {
        throw new DetailException(
            List.of(
                new Fault(
                    "cavity",
                    "",
                    "a frame cannot hold slightly ventilated air layers ("
                        + String.join(", ", slight.names())
                        + "); make them cavities of the frame by `rule: frame`",
                    Optional.empty())));
      }
    }
    return Interpolation.between(
        solve(slight.unventilated(), accuracy, progress),
        solve(slight.wellVentilated(), accuracy, progress),
        slight.wellShare(),
        slight.names(),
        slight.openingsStated()
            ? "from their openings"
            : "openings taken as 1000 mm² since only the class is stated");
  }

  private static Map<Subtraction.OfDetail, OtherCoupling> solveOthers(
      Resolved resolved, Accuracy accuracy, Progress progress) {
    Map<Subtraction.OfDetail, OtherCoupling> couplings = new LinkedHashMap<>();
    for (Map.Entry<Subtraction.OfDetail, Resolved> entry : resolved.others().entrySet()) {
      Subtraction.OfDetail of = entry.getKey();
      Resolved other = entry.getValue();
      Agreed agreed =
          other.solve(other.goal(accuracy, true, Conduction.Temperatures.NONE), progress);
      try {
        couplings.put(
            of, agreed.resolved().plan().coupling(agreed.solution(), of.warm(), of.cold()));
      } catch (DetailException e) {
        throw nested(of, e);
      }
    }
    return couplings;
  }

  /** Names the subtracted detail in whatever is at fault in it. */
  private static DetailException nested(Subtraction.OfDetail other, DetailException e) {
    List<Fault> named = new ArrayList<>();
    for (Fault fault : e.faults()) {
      named.add(
          new Fault(
              "psi",
              other.name(),
              "in the detail it subtracts, "
                  + fault.part()
                  + (fault.name().isEmpty() ? "" : " '" + fault.name() + "'")
                  + ": "
                  + fault.message(),
              Optional.empty()));
    }
    return new DetailException(named);
  }

  /** Milliseconds by stage, in the order run; asking for them ends the last stage. */
  private static final class StageTimes implements Supplier<Map<String, Double>> {
    private final Map<String, Double> times = new LinkedHashMap<>();
    private long start = System.nanoTime();

    void ended(String stage) {
      long now = System.nanoTime();
      times.put(stage, (now - start) / NANOS_PER_MS);
      start = now;
    }

    @Override
    public Map<String, Double> get() {
      ended("results");
      return Collections.unmodifiableMap(times);
    }
  }

  /**
   * A detail whose cavities agree with its solution, as far as that could be reached.
   *
   * @param cavities as the solution shows them
   */
  private record Agreed(Resolved resolved, Solution solution, Optional<Cavities> cavities) {}

  /** A detail with its partition, conditions and plan, and the details it subtracts. */
  private record Resolved(
      Detail drawn,
      Partition partition,
      Conditions heatLoss,
      Conditions surface,
      Plan plan,
      Map<Subtraction.OfDetail, Resolved> others,
      Optional<Cavities> cavities,
      Optional<Solution> start) {
    static Resolved of(Detail detail) {
      boolean plane = detail.geometry() == Geometry.PLANE;
      Detail ready = plane ? FrameDetail.prepared(detail) : Revolution.checked(detail);
      Optional<Cavities> air = Cavities.of(ready);
      Detail laid = air.isPresent() ? air.get().detail() : ready;
      Partition first = air.isPresent() ? air.get().partition() : partition(laid);
      Detail placed = CornerZones.placed(laid, first);
      Partition partition = placed == laid ? first : partition(placed);
      Resolved resolved = of(placed, placed, partition, others(placed), air, Optional.empty());
      if (air.isEmpty()) {
        return resolved;
      }
      Solution coarse = Conduction.solveCoarsely(partition, resolved.heatLoss);
      Cavities directed = air.get().after(coarse, Cavities.TOLERANCE, resolved.plan::temperatures);
      return resolved.settled(directed, coarse, Cavities.TOLERANCE);
    }

    /** The same with conductivities of cavities that agree with the temperatures on a mesh. */
    private Resolved settled(Cavities from, Solution near, double tolerance) {
      return with(from.settledNear(near, heatLoss, tolerance, plan::temperatures), near);
    }

    /** The same with other conductivities of cavities, to be solved from a mesh on. */
    private Resolved with(Cavities settled, Solution from) {
      return of(
          drawn, settled.in(drawn), partition, others, Optional.of(settled), Optional.of(from));
    }

    private static Resolved of(
        Detail drawn,
        Detail detail,
        Partition partition,
        Map<Subtraction.OfDetail, Resolved> others,
        Optional<Cavities> cavities,
        Optional<Solution> start) {
      Conditions heatLoss = Conditions.of(detail, partition, FilmSet.HEAT_LOSS);
      Conditions surface = Conditions.of(detail, partition, FilmSet.SURFACE);
      Map<Subtraction.OfDetail, Plan> plans = new LinkedHashMap<>();
      for (Map.Entry<Subtraction.OfDetail, Resolved> other : others.entrySet()) {
        plans.put(other.getKey(), other.getValue().plan());
      }
      boolean provisional = cavities.isPresent() && start.isEmpty();
      Plan plan = Plan.of(detail, partition, heatLoss, surface, plans, provisional);
      return new Resolved(drawn, partition, heatLoss, surface, plan, others, cavities, start);
    }

    private static Map<Subtraction.OfDetail, Resolved> others(Detail detail) {
      Map<Subtraction.OfDetail, Resolved> others = new LinkedHashMap<>();
      for (Wanted wanted : detail.wanted()) {
        for (Subtraction subtraction : wanted.subtractions()) {
          if (subtraction instanceof Subtraction.OfDetail of) {
            others.put(of, resolveOther(detail.geometry(), of));
          }
        }
        if (wanted instanceof Wanted.Frame frame) {
          if (frame.panelRun().isPresent()) {
            Subtraction.OfDetail run = frame.panelRun().get();
            others.put(run, Resolved.of(run.detail()));
          }
        }
      }
      return others;
    }

    private static Resolved resolveOther(Geometry geometry, Subtraction.OfDetail of) {
      try {
        if (of.detail().geometry() != geometry) {
          throw new DetailException(
              List.of(
                  new Fault(
                      "section",
                      "",
                      "one is a prism, the other a body of revolution; take off one of the kind",
                      Optional.empty())));
        }
        Resolved other = of(of.detail());
        if (other.cavities.isPresent()
            && other.cavities.get().slightLayers(of.detail()).isPresent()) {
          throw new DetailException(
              List.of(
                  new Fault(
                      "cavity",
                      "",
                      "slightly ventilated air layers cannot be taken off; state `unventilated` or"
                          + " `well`",
                      Optional.empty())));
        }
        return other;
      } catch (DetailException e) {
        throw nested(of, e);
      }
    }

    private static Partition partition(Detail detail) {
      try {
        return Partition.of(detail.labelledAreas(), detail.labelledLines(), Resolution.STANDARD);
      } catch (IllegalArgumentException e) {
        throw new DetailException(
            List.of(new Fault("section", "", e.getMessage(), Optional.empty())));
      }
    }

    /**
     * Solves with the films for heat loss, and again as long as the conductivities of cavities do
     * not agree with the temperatures.
     */
    Agreed solve(Conduction.Goal goal, Progress progress) {
      Solution solution =
          start.isPresent()
              ? Conduction.solveFrom(start.get(), heatLoss, goal, progress)
              : Conduction.solve(partition, heatLoss, goal, progress);
      if (cavities.isEmpty()) {
        return new Agreed(this, solution, cavities);
      }
      double tolerance = Cavities.tolerance(share(goal, solution));
      Cavities after = cavities.get().after(solution, tolerance, plan::temperatures);
      if (after.settled()) {
        Resolved resolved = after.found() ? with(after, solution) : this;
        return new Agreed(resolved, solution, Optional.of(after));
      }
      if (after.passes() >= Cavities.MOST_PASSES) {
        return new Agreed(
            this,
            Conduction.unproved(solution, after.unsettled()),
            Optional.of(after.as(cavities.get())));
      }
      return settled(after, solution, tolerance).solve(goal, progress);
    }

    /** The smallest half-width asked of a coupling as a part of the largest L2D. */
    private double share(Conduction.Goal goal, Solution solution) {
      double largest = 0;
      for (int i = 0; i < drawn.spaces().size(); i++) {
        largest = Math.max(largest, Math.abs(solution.matrix(i, i)));
      }
      double asked = goal.accuracy().couplingWPerMK();
      if (goal.psiAsked()) {
        asked = Math.min(asked, goal.accuracy().psiWPerMK());
      }
      double share = goal.accuracy().couplingRelative();
      if (goal.transmittanceAsked()) {
        share = Math.min(share, goal.accuracy().transmittanceRelative());
      }
      return largest > 0 && largest < Double.POSITIVE_INFINITY
          ? Math.min(share, asked / largest)
          : share;
    }

    /**
     * Conditions for surface temperatures, with conductivities of cavities that agree with them; if
     * they do not, that is a doubt.
     */
    Conditions surfaceAgreeing(Accuracy accuracy, Solution heatLossSolution, List<String> doubts) {
      if (cavities.isEmpty() || !cavities.get().found()) {
        return surface;
      }
      double[] temperatures = plan.temperatures(heatLossSolution);
      Cavities agreeing =
          cavities
              .get()
              .restarted()
              .settledNear(
                  heatLossSolution,
                  surface,
                  Cavities.tolerance(accuracy.couplingRelative()),
                  solution -> temperatures.clone());
      if (!agreeing.settled()) {
        doubts.add("with the films for surface temperatures, " + agreeing.unsettled());
      }
      return agreeing.in(surface);
    }

    Conduction.Goal goal(Accuracy accuracy, boolean psi, Conduction.Temperatures temperatures) {
      return new Conduction.Goal(
          accuracy,
          psi,
          plan.transmittanceWanted(),
          plan.pointWanted(),
          plan.takenOffWPerMK(),
          temperatures,
          plan.statedTemperatures());
    }
  }
}
