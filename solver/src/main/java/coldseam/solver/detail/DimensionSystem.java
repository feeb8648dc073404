package coldseam.solver.detail;

/** How lengths of plane elements are measured (ISO 13789; ISO 14683). */
public enum DimensionSystem {
  /** Between the finished inner faces of each room, partitions left out. */
  INTERNAL,
  /** Between finished inner faces, the thickness of partitions and floors included. */
  OVERALL_INTERNAL,
  /** Between finished outer faces. */
  EXTERNAL
}
