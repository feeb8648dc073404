package coldseam.solver.conduction;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.BalconyDetail;
import coldseam.solver.algebra.ElementSum;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.FilmSet;

/**
 * The balcony with triangles of one size everywhere, about as many as a number of unknowns needs: a
 * mesh of a stated longest side, every triangle of which is split into four a few times.
 */
public final class UniformBalcony {
  /** Area of the section, m². */
  private static final double SECTION_M2 = 2.0325;

  /** Triangles of the made mesh for each equilateral one with the longest side asked for. */
  private static final double CROWDING = 2.1;

  final Conditions conditions;
  final Mesh mesh;
  private Discretisation discretisation;

  private UniformBalcony(Conditions conditions, Mesh mesh) {
    this.conditions = conditions;
    this.mesh = mesh;
  }

  /**
   * Makes the mesh.
   *
   * @param unknowns about how many temperatures the quadratic elements are to have
   * @return the balcony with its mesh
   */
  public static UniformBalcony of(int unknowns) {
    Detail detail = BalconyDetail.drawn();
    Partition partition =
        Partition.of(detail.labelledAreas(), detail.labelledLines(), Resolution.STANDARD);
    Conditions conditions = Conditions.of(detail, partition, FilmSet.HEAT_LOSS);
    int splits = 0;
    double triangles = unknowns / 2.0;
    while (triangles > 20_000) {
      triangles /= 4;
      splits++;
    }
    double side = Math.sqrt(CROWDING * 4 / Math.sqrt(3) * SECTION_M2 / triangles);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, (x, y) -> side);
    for (int i = 0; i < splits; i++) {
      mesh = NewestVertexBisection.refineAll(mesh).mesh();
    }
    return new UniformBalcony(conditions, mesh);
  }

  /**
   * The nodes of its quadratic triangles.
   *
   * @return six nodes for each triangle in turn
   */
  public int[] nodes() {
    return discretisation().nodes;
  }

  /**
   * Centres of its triangles.
   *
   * @return x of each, then y of each, in thirds of a metre
   */
  public double[][] centres() {
    return new double[][] {discretisation().centreX, discretisation().centreY};
  }

  /**
   * What its triangles conduct, the films spread over the whole section so that it is definite.
   *
   * @return the matrix of each triangle
   */
  public ElementSum.Entries conduction() {
    double[] couplings = discretisation().couplings;
    return (t, p, q) ->
        QuadraticElement.stiffness(couplings, t, p, q) + (p == q ? mesh.area(t) : 0);
  }

  private Discretisation discretisation() {
    if (discretisation == null) {
      discretisation = new Discretisation(mesh, conditions);
    }
    return discretisation;
  }
}
