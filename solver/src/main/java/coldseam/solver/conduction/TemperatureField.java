package coldseam.solver.conduction;

import coldseam.mesh.plane.Point;
import coldseam.mesh.triangulation.Mesh;

/**
 * A temperature at every point of the conducting section: quadratic in each triangle. Nodes are the
 * mesh's vertices (0 … V−1), then the middles of its sides (V + side).
 */
public final class TemperatureField {
  private final Mesh mesh;
  private final double[] nodal;

  /**
   * Wraps nodal values.
   *
   * @param mesh the mesh
   * @param nodalC one value a node, °C; copied
   */
  public TemperatureField(Mesh mesh, double[] nodalC) {
    if (nodalC.length != mesh.vertexCount() + mesh.sideCount()) {
      throw new IllegalArgumentException("one value a node is needed");
    }
    this.mesh = mesh;
    this.nodal = nodalC.clone();
  }

  /** The mesh. */
  public Mesh mesh() {
    return mesh;
  }

  /** Temperature at a node, °C. */
  public double atNode(int node) {
    return nodal[node];
  }

  /**
   * Temperature at a point of the drawing.
   *
   * @param point the point, in the coordinates of the drawing, m
   * @return °C, NaN if the point lies outside the conducting section
   */
  public double at(Point point) {
    throw new UnsupportedOperationException();
  }

  /**
   * Temperature inside a triangle.
   *
   * @param triangle the triangle
   * @param l0 barycentric coordinate of corner 0
   * @param l1 of corner 1
   * @param l2 of corner 2
   * @return °C
   */
  public double in(int triangle, double l0, double l1, double l2) {
    throw new UnsupportedOperationException();
  }

  /**
   * Temperature gradient inside a triangle.
   *
   * @param triangle the triangle
   * @param l0 barycentric coordinate of corner 0
   * @param l1 of corner 1
   * @param l2 of corner 2
   * @return x and y components, K/m
   */
  public double[] gradient(int triangle, double l0, double l1, double l2) {
    throw new UnsupportedOperationException();
  }
}
