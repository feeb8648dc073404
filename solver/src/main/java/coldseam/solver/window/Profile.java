package coldseam.solver.window;

import coldseam.solver.conduction.Quantity;
import java.util.Map;
import java.util.Optional;

/**
 * A frame profile, a mullion or a transom.
 *
 * @param name unique among the profiles of a window
 * @param insideWidthM projected width seen from inside, m
 * @param outsideWidthM projected width seen from outside, m
 * @param uWPerM2K U_f, referred to the larger of the two widths, W/(m²·K)
 * @param edgeWPerMK ψ of its edge with any glazing or panel, W/(m·K); empty if only known by name
 * @param edgeByInfillWPerMK ψ of its edge with glazings or panels by their names, W/(m·K)
 */
public record Profile(
    String name,
    double insideWidthM,
    double outsideWidthM,
    Quantity uWPerM2K,
    Optional<Quantity> edgeWPerMK,
    Map<String, Quantity> edgeByInfillWPerMK) {
  /**
   * Checks the widths.
   *
   * @throws IllegalArgumentException unless both are positive and finite
   */
  public Profile {
    if (!(insideWidthM > 0 && outsideWidthM > 0)
        || !Double.isFinite(insideWidthM + outsideWidthM)) {
      throw new IllegalArgumentException("profile `" + name + "` has no width");
    }
    edgeByInfillWPerMK = Map.copyOf(edgeByInfillWPerMK);
  }

  /** b_f, the larger projected width, m. */
  public double widthM() {
    return Math.max(insideWidthM, outsideWidthM);
  }

  /**
   * ψ of its edge.
   *
   * @param infill the glazing or panel
   * @return ψ, W/(m·K)
   * @throws IllegalArgumentException if none is known
   */
  Quantity edge(Infill infill) {
    Quantity named = edgeByInfillWPerMK.get(infill.name());
    if (named != null) {
      return named;
    }
    if (edgeWPerMK.isEmpty()) {
      throw new IllegalArgumentException(
          "profile `" + name + "` has no ψ of its edge with `" + infill.name() + "`");
    }
    return edgeWPerMK.get();
  }
}
