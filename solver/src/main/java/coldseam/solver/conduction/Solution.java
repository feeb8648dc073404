package coldseam.solver.conduction;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import java.util.Optional;

/**
 * The unit fields of one detail with one film set: field k has space k at 1 and all others at 0,
 * with prescribed flows 0; one more field has all spaces at 0 and the prescribed flows. Everything
 * for any set of temperatures is a sum of these.
 *
 * <p>Heat flow is positive from a space into the detail.
 */
public interface Solution {
  /** The film set. */
  default FilmSet filmSet() {
    return conditions().filmSet();
  }

  /** The final mesh. */
  Mesh mesh();

  /** The partition it was made from. */
  Partition partition();

  /** Conditions on the partition's edges. */
  Conditions conditions();

  /** Unknowns of the temperature problem on the final mesh. */
  int unknowns();

  /** Passes of the adaptive loop. */
  int passes();

  /**
   * Entry of the matrix A, A_ii = Σ_j L_ij, A_ij = −L_ij: the flow from space i into the detail per
   * kelvin of space j; symmetric, rows sum to 0.
   *
   * @param i a space
   * @param j a space
   * @return W/(m·K); infinite where two fixed temperatures meet in a point
   */
  double matrix(int i, int j);

  /**
   * Coupling coefficient of two groups of spaces, Σ L_ij, with what is known of its error.
   *
   * @param warm indices of spaces
   * @param cold indices of spaces, none of them in {@code warm}
   * @return W/(m·K)
   */
  Quantity coupling(int[] warm, int[] cold);

  /** Matrices that bracket A, where bounds are proved. */
  Optional<MatrixBounds> bounds();

  /**
   * Flow from a space into the detail.
   *
   * @param space the space
   * @param temperaturesC temperature of every space, °C
   * @return W/m; the flows of all spaces and the prescribed flows sum to 0 but for rounding
   */
  double spaceFlow(int space, double[] temperaturesC);

  /**
   * Flow into the detail through a stretch.
   *
   * @param stretch index of the stretch
   * @param temperaturesC temperature of every space, °C
   * @return W/m
   */
  double stretchFlow(int stretch, double[] temperaturesC);

  /** What each material and film contributes to the matrix A; without prescribed flows. */
  Dissipation dissipation();

  /** Total prescribed flow into the detail, W/m. */
  double prescribedFlow();

  /**
   * Unit field of a space as nodal values.
   *
   * @param space the space
   * @return a fresh array, one value a node
   */
  double[] unitField(int space);

  /**
   * The temperature field for given temperatures of the spaces.
   *
   * @param temperaturesC temperature of every space, °C
   * @return the field
   */
  TemperatureField temperatures(double[] temperaturesC);

  /**
   * The stream function of the heat flow for given temperatures of the spaces.
   *
   * @param temperaturesC temperature of every space, °C
   * @return the function; empty where no bounds are proved, which need one
   */
  Optional<StreamFunction> streamFunction(double[] temperaturesC);
}
