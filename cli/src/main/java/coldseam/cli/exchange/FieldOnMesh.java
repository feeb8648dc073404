package coldseam.cli.exchange;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;

/**
 * The temperatures of a solution on a mesh that is its own or a refinement of it. Each triangle of
 * a refinement lies in one of the solution's own, so that its quadratic is a quadratic there too.
 */
final class FieldOnMesh {
  private static final double THIRD = 1.0 / 3;

  private final Solution solution;
  private final TemperatureField field;
  private final Mesh fine;

  /**
   * Prepares.
   *
   * @param solution what was solved
   * @param temperaturesC temperature of every space, °C
   * @param fine its mesh, or a refinement of it
   */
  FieldOnMesh(Solution solution, double[] temperaturesC, Mesh fine) {
    this.solution = solution;
    this.fine = fine;
    field = solution.temperatures(temperaturesC);
  }

  /** Temperature at the vertices, then in the middles of the sides, °C. */
  double[] nodal() {
    int vertices = fine.vertexCount();
    double[] nodal = new double[vertices + fine.sideCount()];
    if (fine == field.mesh()) {
      for (int i = 0; i < nodal.length; i++) {
        nodal[i] = field.atNode(i);
      }
      return nodal;
    }
    for (int t = 0; t < fine.triangleCount(); t++) {
      int in = around(t);
      for (int k = 0; k < 3; k++) {
        int v = fine.vertex(t, k);
        int side = fine.side(t, k);
        int a = fine.sideStart(side);
        int b = fine.sideEnd(side);
        nodal[v] = at(in, fine.x(v), fine.y(v));
        nodal[vertices + side] = at(in, (fine.x(a) + fine.x(b)) / 2, (fine.y(a) + fine.y(b)) / 2);
      }
    }
    return nodal;
  }

  /** Mean density of heat flow of each triangle, W/m²: x, y and 0. */
  double[] fluxes() {
    double[] fluxes = new double[3 * fine.triangleCount()];
    for (int t = 0; t < fine.triangleCount(); t++) {
      int in = fine == field.mesh() ? t : around(t);
      double[] l = {THIRD, THIRD, THIRD};
      if (fine != field.mesh()) {
        l = barycentric(in, middleX(t), middleY(t));
      }
      // The gradient of a quadratic is linear: its mean is its value in the centre.
      double[] flux =
          solution
              .conditions()
              .material(fine.label(t))
              .heatFlowDensity(field.gradient(in, l[0], l[1], l[2]));
      fluxes[3 * t] = flux[0];
      fluxes[3 * t + 1] = flux[1];
    }
    return fluxes;
  }

  /** The triangle of the solution that a triangle lies in. */
  private int around(int t) {
    int in = field.mesh().locate(middleX(t), middleY(t));
    if (in == Mesh.NONE) {
      throw new IllegalStateException("a mesh is no refinement of the solution's");
    }
    return in;
  }

  private double middleX(int t) {
    return (fine.x(fine.vertex(t, 0)) + fine.x(fine.vertex(t, 1)) + fine.x(fine.vertex(t, 2))) / 3;
  }

  private double middleY(int t) {
    return (fine.y(fine.vertex(t, 0)) + fine.y(fine.vertex(t, 1)) + fine.y(fine.vertex(t, 2))) / 3;
  }

  private double at(int in, double x, double y) {
    double[] l = barycentric(in, x, y);
    return field.in(in, l[0], l[1], l[2]);
  }

  private double[] barycentric(int t, double x, double y) {
    Mesh mesh = field.mesh();
    int a = mesh.vertex(t, 0);
    double x1 = mesh.x(mesh.vertex(t, 1)) - mesh.x(a);
    double y1 = mesh.y(mesh.vertex(t, 1)) - mesh.y(a);
    double x2 = mesh.x(mesh.vertex(t, 2)) - mesh.x(a);
    double y2 = mesh.y(mesh.vertex(t, 2)) - mesh.y(a);
    double dx = x - mesh.x(a);
    double dy = y - mesh.y(a);
    double twice = x1 * y2 - x2 * y1;
    double l1 = (dx * y2 - x2 * dy) / twice;
    double l2 = (x1 * dy - dx * y1) / twice;
    return new double[] {1 - l1 - l2, l1, l2};
  }
}
