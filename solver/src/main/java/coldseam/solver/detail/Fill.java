package coldseam.solver.detail;

/** What an area is filled with: a material, a space, air, or nothing. */
public sealed interface Fill permits Material, Space, Hollow, AirCavity, VentilatedAir {
  /** The name the case gives it; unique among the fills of a detail. */
  String name();
}
