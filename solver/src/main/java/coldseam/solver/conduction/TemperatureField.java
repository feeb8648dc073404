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
    double x = point.x() - mesh.origin().x();
    double y = point.y() - mesh.origin().y();
    int t = mesh.locate(x, y);
    if (t == Mesh.NONE) {
      return Double.NaN;
    }
    double l1 = areaOver(t, 2, 0, x, y);
    double l2 = areaOver(t, 0, 1, x, y);
    return in(t, 1 - l1 - l2, l1, l2);
  }

  /** Area of the triangle on one side and a point, over the whole area. */
  private double areaOver(int t, int from, int to, double x, double y) {
    int a = mesh.vertex(t, from);
    int b = mesh.vertex(t, to);
    double twice =
        (mesh.x(b) - mesh.x(a)) * (y - mesh.y(a)) - (mesh.y(b) - mesh.y(a)) * (x - mesh.x(a));
    return twice / (2 * mesh.area(t));
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
    double corner = nodal[mesh.vertex(triangle, 0)];
    return corner
        + (nodal[mesh.vertex(triangle, 1)] - corner) * l1 * (2 * l1 - 1)
        + (nodal[mesh.vertex(triangle, 2)] - corner) * l2 * (2 * l2 - 1)
        + 4 * (middle(triangle, 0) - corner) * l1 * l2
        + 4 * (middle(triangle, 1) - corner) * l2 * l0
        + 4 * (middle(triangle, 2) - corner) * l0 * l1;
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
    int v0 = mesh.vertex(triangle, 0);
    int v1 = mesh.vertex(triangle, 1);
    int v2 = mesh.vertex(triangle, 2);
    double corner = nodal[v0];
    double m0 = middle(triangle, 0) - corner;
    double m1 = middle(triangle, 1) - corner;
    double m2 = middle(triangle, 2) - corner;
    double by0 = 4 * (m1 * l2 + m2 * l1);
    double along1 = (nodal[v1] - corner) * (4 * l1 - 1) + 4 * (m0 * l2 + m2 * l0) - by0;
    double along2 = (nodal[v2] - corner) * (4 * l2 - 1) + 4 * (m0 * l1 + m1 * l0) - by0;
    double x1 = mesh.x(v1) - mesh.x(v0);
    double y1 = mesh.y(v1) - mesh.y(v0);
    double x2 = mesh.x(v2) - mesh.x(v0);
    double y2 = mesh.y(v2) - mesh.y(v0);
    double twice = x1 * y2 - x2 * y1;
    return new double[] {(along1 * y2 - along2 * y1) / twice, (along2 * x1 - along1 * x2) / twice};
  }

  private double middle(int triangle, int k) {
    return nodal[mesh.vertexCount() + mesh.side(triangle, k)];
  }
}
