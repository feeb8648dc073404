package coldseam.solver.detail;

/** The two sets of surface resistances from one case. */
public enum FilmSet {
  /** For heat flow, ψ and U: ISO 6946. */
  HEAT_LOSS,
  /** For coldest surfaces and f_Rsi: ISO 13788. */
  SURFACE
}
