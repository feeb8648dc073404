package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;

/** Barycentric coordinates of a point in a triangle of a mesh. */
final class Barycentric {
  private Barycentric() {}

  static double[] of(Mesh mesh, int triangle, double x, double y) {
    int a = mesh.vertex(triangle, 0);
    int b = mesh.vertex(triangle, 1);
    int c = mesh.vertex(triangle, 2);
    double x1 = mesh.x(b) - mesh.x(a);
    double y1 = mesh.y(b) - mesh.y(a);
    double x2 = mesh.x(c) - mesh.x(a);
    double y2 = mesh.y(c) - mesh.y(a);
    double dx = x - mesh.x(a);
    double dy = y - mesh.y(a);
    double twice = x1 * y2 - x2 * y1;
    double l1 = (dx * y2 - x2 * dy) / twice;
    double l2 = (x1 * dy - dx * y1) / twice;
    return new double[] {1 - l1 - l2, l1, l2};
  }
}
