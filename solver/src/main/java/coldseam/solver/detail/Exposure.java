package coldseam.solver.detail;

/** On which side of the envelope a space lies; it decides the standard's films. */
public enum Exposure {
  /** A room, heated or not: still-air films. */
  INSIDE,
  /** Outdoors: wind. */
  OUTSIDE
}
