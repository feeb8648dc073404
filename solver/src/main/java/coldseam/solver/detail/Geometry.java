package coldseam.solver.detail;

/** What the section stands for. */
public enum Geometry {
  /** A prism: results per metre of depth. */
  PLANE,
  /** A body of revolution about x = 0, x being the radius. */
  AXISYMMETRIC
}
