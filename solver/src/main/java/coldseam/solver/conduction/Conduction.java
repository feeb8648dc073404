package coldseam.solver.conduction;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Conditions;
import java.util.function.IntPredicate;

/** Solves one detail with one film set: the adaptive loop and nothing else. */
public final class Conduction {
  private Conduction() {}

  /**
   * What the adaptive loop has to meet.
   *
   * @param accuracy the half-widths asked for and the cap on unknowns
   * @param psiAsked whether a ψ is wanted, so that its absolute accuracy counts
   * @param transmittanceAsked whether a U is wanted
   * @param takenOffWPerMK what is taken off a coupling before the relative accuracy of U counts
   * @param surfaceTemperatures whether coldest and warmest surface points are wanted: refinement
   *     then also goes on until they move by less than 0.01 K (for spaces 25 K apart, scaled)
   * @param temperaturesC temperature of every space, °C; decides which points are coldest
   */
  public record Goal(
      Accuracy accuracy,
      boolean psiAsked,
      boolean transmittanceAsked,
      double takenOffWPerMK,
      boolean surfaceTemperatures,
      double[] temperaturesC) {
    /** A goal where nothing is taken off a coupling. */
    public Goal(
        Accuracy accuracy,
        boolean psiAsked,
        boolean transmittanceAsked,
        boolean surfaceTemperatures,
        double[] temperaturesC) {
      this(accuracy, psiAsked, transmittanceAsked, 0, surfaceTemperatures, temperaturesC);
    }
  }

  private record Conducting(Conditions conditions) implements IntPredicate {
    @Override
    public boolean test(int label) {
      return conditions.conducts(label);
    }
  }

  /**
   * Solves.
   *
   * @param partition the partition of the detail
   * @param conditions conditions on its edges
   * @param goal what to meet
   * @param progress told of each pass
   * @return the solution on the final mesh
   */
  public static Solution solve(
      Partition partition, Conditions conditions, Goal goal, Progress progress) {
    Mesh coarse = Triangulator.triangulate(partition, new Conducting(conditions), SizeField.NONE);
    return new AdaptiveLoop(partition, conditions, goal, progress, Double.NaN, true)
        .run(AdaptiveLoop.prepared(coarse));
  }

  /**
   * Solves another film set of a detail, beginning with the mesh that the first one ended with.
   *
   * @param first the solution with the first film set, from this class
   * @param conditions conditions on the same partition's edges
   * @param goal what to meet
   * @param progress told of each pass
   * @return the solution on the final mesh
   */
  public static Solution solveNext(
      Solution first, Conditions conditions, Goal goal, Progress progress) {
    double ratio = ((FieldSolution) first).errorRatio();
    return new AdaptiveLoop(first.partition(), conditions, goal, progress, ratio, false)
        .run(first.mesh());
  }
}
