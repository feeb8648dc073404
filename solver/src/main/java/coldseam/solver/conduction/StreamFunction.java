package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.Topology;
import java.util.Arrays;

/**
 * A stream function S of the heat flow, W/m: quadratic in each triangle, with the flux q = (∂S/∂y,
 * −∂S/∂x). Heat flows along the lines of equal S, higher values to their left, and what passes
 * between two such lines is their difference, everywhere along them; the flow in across a piece of
 * outline is the fall of S along it, walked counter-clockwise. In each component of the section the
 * least value is 0.
 *
 * <p>Around a rim through which heat flows in all, S cannot return to where it began: it jumps by
 * that flow across a path of sides from the rim to another one. Nodes of such a path exist once for
 * each side of it, so that values are asked of a triangle, never of a place.
 */
public final class StreamFunction {
  /** Rounding of a difference of values, as a share of the range of values. */
  private static final double ROUNDING = 1e-9;

  private final Mesh mesh;
  private final int[] nodes;
  private final double[] nodal;

  /**
   * Takes the values over and sets the least of each component to 0.
   *
   * @param mesh the mesh
   * @param nodes six nodes a triangle: at corner k, then 3 + k in the middle of side k
   * @param nodal one value a node, W/m; changed
   */
  StreamFunction(Mesh mesh, int[] nodes, double[] nodal) {
    this.mesh = mesh;
    this.nodes = nodes;
    this.nodal = nodal;
    Topology topology = Topology.of(mesh);
    double[] least = new double[topology.componentCount()];
    Arrays.fill(least, Double.POSITIVE_INFINITY);
    int[] component = new int[nodal.length];
    for (int i = 0; i < nodes.length; i++) {
      int c = topology.component(i / QuadraticElement.NODES);
      component[nodes[i]] = c;
      least[c] = Math.min(least[c], nodal[nodes[i]]);
    }
    for (int n = 0; n < nodal.length; n++) {
      nodal[n] -= least[component[n]];
    }
  }

  /** The mesh. */
  public Mesh mesh() {
    return mesh;
  }

  /** How many nodes there are, those of jumps counted once for each side. */
  public int nodeCount() {
    return nodal.length;
  }

  /**
   * A node of a triangle; two triangles share it exactly if S does not jump between them there.
   *
   * @param triangle the triangle
   * @param local 0, 1, 2 for corners; 3, 4, 5 for the middles of the sides opposite them
   * @return its number, from 0
   */
  public int node(int triangle, int local) {
    return nodes[QuadraticElement.NODES * triangle + local];
  }

  /**
   * The value at a node of a triangle.
   *
   * @param triangle the triangle
   * @param local 0, 1, 2 for corners; 3, 4, 5 for the middles of the sides opposite them
   * @return W/m
   */
  public double value(int triangle, int local) {
    return nodal[node(triangle, local)];
  }

  /**
   * The value inside a triangle.
   *
   * @param triangle the triangle
   * @param l0 barycentric coordinate of corner 0
   * @param l1 of corner 1
   * @param l2 of corner 2
   * @return W/m
   */
  public double in(int triangle, double l0, double l1, double l2) {
    double corner = value(triangle, 0);
    return corner
        + (value(triangle, 1) - corner) * l1 * (2 * l1 - 1)
        + (value(triangle, 2) - corner) * l2 * (2 * l2 - 1)
        + 4 * (value(triangle, 3) - corner) * l1 * l2
        + 4 * (value(triangle, 4) - corner) * l2 * l0
        + 4 * (value(triangle, 5) - corner) * l0 * l1;
  }

  /** The greatest value, W/m. */
  public double greatest() {
    double greatest = 0;
    for (double value : nodal) {
      greatest = Math.max(greatest, value);
    }
    return greatest;
  }

  /** All heat that enters anywhere across the outline, W/m. */
  public double entering() {
    double sum = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(t, k) == Mesh.NONE) {
          sum += Math.max(0, value(t, (k + 1) % 3) - value(t, (k + 2) % 3));
        }
      }
    }
    return sum;
  }

  /**
   * How much greater S is beyond a side of a triangle.
   *
   * @param triangle the triangle
   * @param side the side opposite corner 0, 1 or 2
   * @return W/m; 0 where S does not jump, and on the outline
   */
  public double jump(int triangle, int side) {
    int neighbour = mesh.neighbour(triangle, side);
    if (neighbour == Mesh.NONE) {
      return 0;
    }
    int back = 0;
    while (mesh.neighbour(neighbour, back) != triangle) {
      back++;
    }
    return value(neighbour, 3 + back) - value(triangle, 3 + side);
  }

  /**
   * The jumps there are.
   *
   * @return their sizes, W/m, each once, ascending; empty where S does not jump
   */
  public double[] jumps() {
    double[] found = new double[4];
    int count = 0;
    double rounding = ROUNDING * greatest();
    for (int i = 0; i < 3 * mesh.triangleCount(); i++) {
      double jump = jump(i / 3, i % 3);
      boolean known = jump <= rounding;
      for (int j = 0; j < count && !known; j++) {
        known = Math.abs(jump - found[j]) <= rounding;
      }
      if (!known) {
        found = count == found.length ? Arrays.copyOf(found, 2 * count) : found;
        found[count++] = jump;
      }
    }
    double[] jumps = Arrays.copyOf(found, count);
    Arrays.sort(jumps);
    return jumps;
  }
}
