package coldseam.solver.air;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.CavityBox;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Temperatures;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One cavity as it was found, classed and given a conductivity.
 *
 * @param name name of the fill that it became, "cavity 1", …
 * @param fill what it was laid as
 * @param at a point well inside, m
 * @param areaM2 its area, m²
 * @param rule the rule that holds
 * @param ventilation class of ventilation
 * @param slitM widest opening to a space, m; 0 if there is none
 * @param space the space it exchanges air with, if any
 * @param counted what it counts as; empty for well ventilated air, which belongs to its space
 */
public record Cavity(
    String name,
    String fill,
    Point at,
    double areaM2,
    Rule rule,
    Ventilation ventilation,
    double slitM,
    Optional<String> space,
    Optional<Counted> counted) {
  /**
   * The rectangle it counts as and what follows from it.
   *
   * @param box the rectangle of equal area, d in the direction of heat flow
   * @param direction unit vector in which heat flows
   * @param emissivities of the faces before and behind
   * @param conductivityWPerMK λ_eq, W/(m·K)
   * @param form how radiation is written, in words; empty where no shape enters: of a layer wider
   *     than ten times its thickness, or where the conductivity is stated
   * @param temperatures fixed or found
   * @param stated whether the conductivity is stated in the case
   * @param differenceK temperature difference in the formulas; empty where fixed values hold
   * @param meanC mean temperature in the formulas, °C
   * @param passes solutions looked at
   * @param settled whether the conductivities agree with the temperatures
   */
  public record Counted(
      CavityBox box,
      Point direction,
      Emissivities emissivities,
      double conductivityWPerMK,
      Optional<String> form,
      Temperatures temperatures,
      boolean stated,
      OptionalDouble differenceK,
      OptionalDouble meanC,
      int passes,
      boolean settled) {}
}
