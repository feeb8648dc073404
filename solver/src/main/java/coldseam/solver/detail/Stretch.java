package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.List;
import java.util.Optional;

/**
 * A named piece of the outline of the conducting section. Where stretches with a condition overlap,
 * the later one counts; the heat flow of every one is reported.
 *
 * @param name unique among the stretches
 * @param along corners of a line that runs along the outline, m
 * @param condition its own condition, if it has one; else that of the space it faces
 * @param glazing whether it counts as glazing or frame for the surface films
 */
public record Stretch(
    String name, List<Point> along, Optional<EdgeCondition> condition, boolean glazing) {
  /** Copies the points. */
  public Stretch {
    along = List.copyOf(along);
  }
}
