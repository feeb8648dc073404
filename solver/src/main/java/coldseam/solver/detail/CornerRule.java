package coldseam.solver.detail;

/**
 * How far the reduced film reaches from an inner corner of a frame (ISO 10077-2; 0.20 m²·K/W for
 * less radiation and convection). The height of the protrusion at the corner is d.
 */
public enum CornerRule {
  /** Over d but at most 30 mm, on the protrusion and on the surface beside it. */
  LIMITED,
  /** Over the whole protrusion; beside it over d but at most 30 mm. */
  WHOLE,
  /** Nowhere. */
  NONE
}
