package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.TemperatureField;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The sides of a mesh that lie on its outline, with the quadratic trace of a field on each: t(s) =
 * a(1−s)(1−2s) + b s(2s−1) + 4m s(1−s), s from 0 to 1.
 */
final class SurfaceTrace {
  private final Mesh mesh;
  private final List<Side> sides = new ArrayList<>();

  /**
   * One side, with the section on the left from start to end.
   *
   * @param edge partition edge
   * @param start node
   * @param end node
   * @param middle node
   */
  record Side(int edge, int start, int end, int middle) {
    double at(TemperatureField field, double s) {
      return field.atNode(start) * (1 - s) * (1 - 2 * s)
          + field.atNode(end) * s * (2 * s - 1)
          + field.atNode(middle) * 4 * s * (1 - s);
    }

    /** Where the trace has its extremum, if inside the side, else 0. */
    double turningPoint(TemperatureField field) {
      double a = field.atNode(start);
      double b = field.atNode(end);
      double m = field.atNode(middle);
      double curvature = 4 * (a + b - 2 * m);
      double s = curvature == 0 ? 0 : (3 * a + b - 4 * m) / curvature;
      return s > 0 && s < 1 ? s : 0;
    }

    /** What part of the side, 0 to 1, the trace lies below a limit. */
    double partBelow(TemperatureField field, double limit) {
      double a = field.atNode(start) - limit;
      double b = field.atNode(end) - limit;
      double m = field.atNode(middle) - limit;
      double square = 2 * (a + b - 2 * m);
      double linear = 4 * m - 3 * a - b;
      double[] cuts = {0, 1, 1, 1};
      double root = linear * linear - 4 * square * a;
      if (root >= 0) {
        // The stable pair: q/square and a/q (nothing of a side is lost where either is no number).
        double q = -(linear + Math.copySign(Math.sqrt(root), linear)) / 2;
        cuts[1] = inside(q / square);
        cuts[2] = inside(a / q);
      }
      Arrays.sort(cuts);
      double below = 0;
      for (int i = 0; i < 3; i++) {
        double s = (cuts[i] + cuts[i + 1]) / 2;
        below += a + s * (linear + s * square) < 0 ? cuts[i + 1] - cuts[i] : 0;
      }
      return below;
    }

    private static double inside(double s) {
      return s > 0 && s < 1 ? s : 1;
    }
  }

  /**
   * A place on the outline.
   *
   * @param side the side
   * @param s place on it, 0 to 1
   */
  record Place(Side side, double s) {}

  SurfaceTrace(Mesh mesh) {
    this.mesh = mesh;
    for (int triangle = 0; triangle < mesh.triangleCount(); triangle++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(triangle, k) == Mesh.NONE
            && mesh.partitionEdge(triangle, k) != Partition.NONE) {
          sides.add(
              new Side(
                  mesh.partitionEdge(triangle, k),
                  mesh.vertex(triangle, (k + 1) % 3),
                  mesh.vertex(triangle, (k + 2) % 3),
                  mesh.vertexCount() + mesh.side(triangle, k)));
        }
      }
    }
  }

  List<Side> sides() {
    return sides;
  }

  /** A place in the coordinates of the drawing. */
  Point point(Place place) {
    Side side = place.side();
    double x = mesh.x(side.start()) + place.s() * (mesh.x(side.end()) - mesh.x(side.start()));
    double y = mesh.y(side.start()) + place.s() * (mesh.y(side.end()) - mesh.y(side.start()));
    return new Point(mesh.origin().x() + x, mesh.origin().y() + y);
  }

  double lengthM(Side side) {
    return Math.hypot(
        mesh.x(side.end()) - mesh.x(side.start()), mesh.y(side.end()) - mesh.y(side.start()));
  }

  /** The place on the outline nearest to a point of the drawing. */
  Place nearest(Point point) {
    Place best = null;
    double least = Double.POSITIVE_INFINITY;
    for (Side side : sides) {
      double ax = mesh.origin().x() + mesh.x(side.start());
      double ay = mesh.origin().y() + mesh.y(side.start());
      double dx = mesh.x(side.end()) - mesh.x(side.start());
      double dy = mesh.y(side.end()) - mesh.y(side.start());
      double s = ((point.x() - ax) * dx + (point.y() - ay) * dy) / (dx * dx + dy * dy);
      s = Math.max(0, Math.min(1, s));
      double distance = Math.hypot(point.x() - ax - s * dx, point.y() - ay - s * dy);
      if (distance < least) {
        least = distance;
        best = new Place(side, s);
      }
    }
    return best;
  }
}
