package coldseam.solver;

import coldseam.mesh.partition.Partition;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.result.Result;
import java.util.List;

/** The door of this module: a detail and an accuracy in, a result out. */
public final class Solver {
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
    throw new UnsupportedOperationException();
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
    throw new UnsupportedOperationException();
  }
}
