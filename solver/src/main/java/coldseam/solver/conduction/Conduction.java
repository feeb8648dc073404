package coldseam.solver.conduction;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.algebra.NotPositiveDefiniteException;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Conditions;
import java.util.List;
import java.util.function.IntPredicate;

/** Solves one detail with one film set: the adaptive loop and nothing else. */
public final class Conduction {
  private Conduction() {}

  /** Which temperatures are wanted, so that refinement goes on until they settle. */
  public enum Temperatures {
    /** None: only heat flows. */
    NONE,
    /**
     * Coldest and warmest surface points: until they move by less than 0.01 K (for spaces 25 K
     * apart, scaled).
     */
    SURFACE,
    /** Those, and all others, at points and along lines, as closely. */
    EVERYWHERE
  }

  /**
   * What the adaptive loop has to meet.
   *
   * @param accuracy the half-widths asked for and the cap on unknowns
   * @param psiAsked whether a ψ is wanted, so that its absolute accuracy counts
   * @param transmittanceAsked whether a U is wanted
   * @param pointAsked whether a χ is wanted
   * @param takenOffWPerMK what is taken off a coupling before the relative accuracy of U or χ
   *     counts
   * @param temperatures which temperatures are wanted
   * @param temperaturesC temperature of every space, °C; decides which points are coldest
   */
  public record Goal(
      Accuracy accuracy,
      boolean psiAsked,
      boolean transmittanceAsked,
      boolean pointAsked,
      double takenOffWPerMK,
      Temperatures temperatures,
      double[] temperaturesC) {
    /** A goal where nothing is taken off a coupling. */
    public Goal(
        Accuracy accuracy,
        boolean psiAsked,
        boolean transmittanceAsked,
        Temperatures temperatures,
        double[] temperaturesC) {
      this(accuracy, psiAsked, transmittanceAsked, false, 0, temperatures, temperaturesC);
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
    Corners corners = Corners.of(coarse, conditions);
    return new AdaptiveLoop(partition, conditions, goal, progress, corners, Double.NaN, true)
        .run(StartMesh.of(coarse));
  }

  /**
   * Solves, beginning with the mesh of another solution.
   *
   * @param start a solution of the same partition, from this class
   * @param conditions conditions on its edges
   * @param goal what to meet
   * @param progress told of each pass
   * @return the solution on the final mesh
   */
  public static Solution solveFrom(
      Solution start, Conditions conditions, Goal goal, Progress progress) {
    Corners corners = ((FieldSolution) start).corners();
    return new AdaptiveLoop(
            start.partition(), conditions, goal, progress, corners, Double.NaN, true)
        .run(start.mesh());
  }

  /**
   * The unit fields on the mesh that {@link #solve} begins with: nothing is proved.
   *
   * @param partition the partition of the detail
   * @param conditions conditions on its edges
   * @return the fields
   */
  public static Solution solveCoarsely(Partition partition, Conditions conditions) {
    Mesh coarse = Triangulator.triangulate(partition, new Conducting(conditions), SizeField.NONE);
    Corners corners = Corners.of(coarse, conditions);
    return fields(partition, conditions, corners, StartMesh.of(coarse));
  }

  /**
   * The unit fields on the mesh of another solution: nothing is proved and nothing refined.
   *
   * @param other a solution of the same partition, from this class
   * @param conditions conditions on its edges
   * @return the fields
   */
  public static Solution solveOnMeshOf(Solution other, Conditions conditions) {
    return fields(other.partition(), conditions, ((FieldSolution) other).corners(), other.mesh());
  }

  private static Solution fields(
      Partition partition, Conditions conditions, Corners corners, Mesh mesh) {
    Discretisation d = new Discretisation(mesh, conditions);
    double[][] fields;
    try {
      fields = Assembly.unitFields(d);
    } catch (NotPositiveDefiniteException e) {
      throw Slivers.explained(d, conditions, e);
    }
    return new FieldSolution(
        partition,
        conditions,
        corners,
        d,
        fields,
        ConductanceMatrix.of(d, fields),
        null,
        new History(Double.NaN),
        List.of(),
        1);
  }

  /**
   * A solution of which nothing counts as proved.
   *
   * @param solution from this class
   * @param reason why not, as a sentence without a full stop
   * @return the same fields
   */
  public static Solution unproved(Solution solution, String reason) {
    return ((FieldSolution) solution).unproved(reason);
  }

  /**
   * Solves another film set of a detail, beginning with the mesh that the first one ended with,
   * finer at its coldest and warmest points.
   *
   * @param first the solution with the first film set, from this class
   * @param conditions conditions on the same partition's edges
   * @param goal what to meet
   * @param progress told of each pass
   * @return the solution on the final mesh
   */
  public static Solution solveNext(
      Solution first, Conditions conditions, Goal goal, Progress progress) {
    FieldSolution before = (FieldSolution) first;
    return new AdaptiveLoop(
            first.partition(),
            conditions,
            goal,
            progress,
            before.corners(),
            before.errorRatio(),
            false)
        .run(StartMesh.gradedToExtremes(before, goal.temperaturesC()));
  }
}
