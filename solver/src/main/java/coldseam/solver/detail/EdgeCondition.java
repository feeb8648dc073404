package coldseam.solver.detail;

import java.util.Optional;

/** What happens along a stretch of outline, where the case says so itself. */
public sealed interface EdgeCondition {
  /**
   * The stretch faces a space, through a film of its own or the space's.
   *
   * @param space name of the space
   * @param heatLoss film for heat flow, if not the space's
   * @param surface film for surface temperatures, if not the space's
   */
  record Faces(String space, Optional<FilmRule> heatLoss, Optional<FilmRule> surface)
      implements EdgeCondition {}

  /**
   * A given heat flow enters.
   *
   * @param densityWPerM2 into the detail, W/m²
   */
  record HeatFlow(double densityWPerM2) implements EdgeCondition {}

  /**
   * No heat crosses.
   *
   * @param symmetry whether the plane is one of symmetry (never a flank, no distance required)
   */
  record CutOff(boolean symmetry) implements EdgeCondition {}
}
