package coldseam.solver.detail;

/** What an area is filled with: a material, a space, or nothing. */
public sealed interface Fill permits Material, Space, Hollow {
  /** The name the case gives it; unique among the fills of a detail. */
  String name();
}
