package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.Map;
import java.util.Optional;

/**
 * The undisturbed one-dimensional construction at a cut-off plane.
 *
 * @param name unique among the flanks
 * @param cut a point on, or next to, its cut-off plane, m; empty if the flank is typed altogether
 * @param typedUWPerM2K lower and upper U, W/(m²·K), typed in the case instead of computed from the
 *     layers met at the plane (both ends equal for a plain number)
 * @param typedLengthM lengths typed in the case instead of derived from the drawing, m
 */
public record Flank(
    String name,
    Optional<Point> cut,
    Optional<Bracket> typedUWPerM2K,
    Map<DimensionSystem, Double> typedLengthM) {
  /** Copies the lengths. */
  public Flank {
    typedLengthM = Map.copyOf(typedLengthM);
    if (cut.isEmpty() && (typedUWPerM2K.isEmpty() || typedLengthM.isEmpty())) {
      throw new IllegalArgumentException(
          "flank " + name + ": without a cut-off plane both U and length must be typed");
    }
  }
}
