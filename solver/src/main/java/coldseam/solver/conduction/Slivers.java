package coldseam.solver.conduction;

import coldseam.mesh.plane.Point;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wording;
import java.util.List;
import java.util.Optional;

/** Places of a section that are too thin for their length to be computed with. */
final class Slivers {
  /**
   * Longest side over height beyond which a failure of the numbers is the drawing's, not the
   * program's: conductances across and along a triangle differ by the square of it, which leaves
   * six of sixteen digits.
   */
  private static final double LONGEST_OVER_HEIGHT = 1e5;

  private Slivers() {}

  /**
   * Why the numbers fail.
   *
   * @param d the discretisation they fail on
   * @param conditions names of the materials
   * @param failure how they fail
   * @return the drawing's fault, with its place, if there is a place so thin; else the failure
   */
  static RuntimeException explained(
      Discretisation d, Conditions conditions, IllegalStateException failure) {
    int worst = -1;
    double most = LONGEST_OVER_HEIGHT;
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      double longest = longest(d.mesh, t);
      double ratio = longest * longest / (2 * d.mesh.area(t));
      if (ratio > most) {
        most = ratio;
        worst = t;
      }
    }
    return worst < 0 ? failure : thin(d.mesh, worst, conditions);
  }

  private static double longest(Mesh mesh, int t) {
    double longest = 0;
    for (int k = 0; k < 3; k++) {
      int a = mesh.vertex(t, (k + 1) % 3);
      int b = mesh.vertex(t, (k + 2) % 3);
      longest = Math.max(longest, Math.hypot(mesh.x(b) - mesh.x(a), mesh.y(b) - mesh.y(a)));
    }
    return longest;
  }

  private static DetailException thin(Mesh mesh, int t, Conditions conditions) {
    double longest = longest(mesh, t);
    double x = 0;
    double y = 0;
    for (int k = 0; k < 3; k++) {
      x += mesh.x(mesh.vertex(t, k)) / 3;
      y += mesh.y(mesh.vertex(t, k)) / 3;
    }
    Point at = new Point(mesh.origin().x() + x, mesh.origin().y() + y);
    String name = conditions.material(mesh.label(t)).name();
    return new DetailException(
        List.of(
            new Fault(
                "section",
                "",
                "'"
                    + name
                    + "' is only "
                    + Wording.figure(2 * mesh.area(t) / longest * 1000)
                    + " mm wide over a length of "
                    + Wording.length(longest)
                    + " at "
                    + Wording.place(at)
                    + ", too thin to be computed with; draw it thicker, or let its corners meet"
                    + " those beside it",
                Optional.of(at))));
  }
}
