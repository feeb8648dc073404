package coldseam.solver;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
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
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
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
   * What is understood of a detail before anything is solved.
   *
   * @param partition the resolved section
   * @param heatLoss conditions with the films for heat loss
   * @param surface conditions with the films for surface temperatures
   * @param flanks every flank, named or found
   * @param assumptions everything chosen for the user
   * @param warnings sentences, each with its figures
   */
  public record Inspection(
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
    Plan plan = resolved.plan();
    times.ended("resolve");

    boolean surfaceNeeded = plan.surfaceNeeded();
    boolean shared = surfaceNeeded && plan.sameFilms();
    Solution heatLoss =
        resolved.solveHeatLoss(accuracy, plan.heatLossTemperatures(shared), progress);
    Map<Subtraction.OfDetail, OtherCoupling> others = solveOthers(resolved, accuracy, progress);
    times.ended("heat loss");

    Optional<Solution> surface = Optional.empty();
    if (shared) {
      surface = Optional.of(heatLoss);
    } else if (surfaceNeeded) {
      surface =
          Optional.of(
              Conduction.solveNext(
                  heatLoss,
                  resolved.surface(),
                  new Conduction.Goal(
                      accuracy,
                      false,
                      false,
                      plan.surfaceTemperatures(),
                      plan.temperatures(heatLoss)),
                  progress));
    }
    times.ended("surface temperatures");

    return plan.result(heatLoss, surface, others, times);
  }

  private static Map<Subtraction.OfDetail, OtherCoupling> solveOthers(
      Resolved resolved, Accuracy accuracy, Progress progress) {
    Map<Subtraction.OfDetail, OtherCoupling> couplings = new LinkedHashMap<>();
    for (Map.Entry<Subtraction.OfDetail, Resolved> entry : resolved.others().entrySet()) {
      Subtraction.OfDetail of = entry.getKey();
      Resolved other = entry.getValue();
      Conduction.Goal goal = other.goal(accuracy, true, Conduction.Temperatures.NONE);
      Solution solution = Conduction.solve(other.partition(), other.heatLoss(), goal, progress);
      try {
        couplings.put(of, other.plan().coupling(solution, of.warm(), of.cold()));
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

  /** A detail with its partition, conditions and plan, and the details it subtracts. */
  private record Resolved(
      Partition partition,
      Conditions heatLoss,
      Conditions surface,
      Plan plan,
      Map<Subtraction.OfDetail, Resolved> others) {
    static Resolved of(Detail detail) {
      if (detail.geometry() != Geometry.PLANE) {
        throw new DetailException(
            List.of(
                new Fault("section", "", "only plane sections can be solved", Optional.empty())));
      }
      Detail ready = FrameDetail.prepared(detail);
      Partition first = partition(ready);
      Detail placed = CornerZones.placed(ready, first);
      return of(placed, placed == ready ? first : partition(placed));
    }

    private static Resolved of(Detail detail, Partition partition) {
      Conditions heatLoss = Conditions.of(detail, partition, FilmSet.HEAT_LOSS);
      Conditions surface = Conditions.of(detail, partition, FilmSet.SURFACE);
      Map<Subtraction.OfDetail, Resolved> others = others(detail);
      Map<Subtraction.OfDetail, Plan> plans = new LinkedHashMap<>();
      for (Map.Entry<Subtraction.OfDetail, Resolved> other : others.entrySet()) {
        plans.put(other.getKey(), other.getValue().plan());
      }
      Plan plan = Plan.of(detail, partition, heatLoss, surface, plans);
      return new Resolved(partition, heatLoss, surface, plan, others);
    }

    private static Map<Subtraction.OfDetail, Resolved> others(Detail detail) {
      Map<Subtraction.OfDetail, Resolved> others = new LinkedHashMap<>();
      for (Wanted wanted : detail.wanted()) {
        if (wanted instanceof Wanted.Psi psi) {
          for (Subtraction subtraction : psi.subtractions()) {
            if (subtraction instanceof Subtraction.OfDetail of) {
              others.put(of, resolveOther(of));
            }
          }
        } else if (wanted instanceof Wanted.Frame frame) {
          if (frame.panelRun().isPresent()) {
            Subtraction.OfDetail run = frame.panelRun().get();
            others.put(run, Resolved.of(run.detail()));
          }
        }
      }
      return others;
    }

    private static Resolved resolveOther(Subtraction.OfDetail of) {
      try {
        return of(of.detail());
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

    Solution solveHeatLoss(
        Accuracy accuracy, Conduction.Temperatures temperatures, Progress progress) {
      Conduction.Goal goal = goal(accuracy, plan.psiWanted(), temperatures);
      return Conduction.solve(partition, heatLoss, goal, progress);
    }

    Conduction.Goal goal(Accuracy accuracy, boolean psi, Conduction.Temperatures temperatures) {
      return new Conduction.Goal(
          accuracy,
          psi,
          plan.transmittanceWanted(),
          plan.takenOffWPerMK(),
          temperatures,
          plan.statedTemperatures());
    }
  }
}
