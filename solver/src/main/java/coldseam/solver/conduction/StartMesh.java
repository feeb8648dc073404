package coldseam.solver.conduction;

import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import java.util.BitSet;

/** The meshes that the adaptive loop begins with. */
final class StartMesh {
  /** The coarsest mesh is refined until it has so many triangles. */
  private static final int FEWEST_TRIANGLES = 64;

  /**
   * Square of the excess given to the triangles beside the extremes found with other films: they
   * will lie at the same places, and finding that out would take a pass.
   */
  private static final double EXCESS_AT_EARLIER_EXTREMES = 4;

  private StartMesh() {}

  /** The coarsest mesh, or one refined throughout if that is very coarse. */
  static Mesh of(Mesh coarsest) {
    Mesh mesh = coarsest;
    while (mesh.triangleCount() < FEWEST_TRIANGLES) {
      BitSet all = new BitSet(mesh.triangleCount());
      all.set(0, mesh.triangleCount());
      mesh = NewestVertexBisection.refine(mesh, all).mesh();
    }
    return mesh;
  }

  /** The mesh of another film set's solution, finer beside its coldest and warmest points. */
  static Mesh gradedToExtremes(FieldSolution other, double[] temperaturesC) {
    Mesh mesh = other.mesh();
    double[] nothing = new double[mesh.triangleCount()];
    double[] excess = new double[mesh.triangleCount()];
    BitSet beside = other.besideExtremes(temperaturesC);
    for (int t = beside.nextSetBit(0); t >= 0; t = beside.nextSetBit(t + 1)) {
      excess[t] = EXCESS_AT_EARLIER_EXTREMES;
    }
    return new Marking(mesh, other.corners()).refine(nothing, 1, excess);
  }
}
