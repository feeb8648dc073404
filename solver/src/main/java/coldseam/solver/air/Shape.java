package coldseam.solver.air;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.CavityBox;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;

/**
 * The size and the faces of a cavity: the rectangle of equal area and of the aspect ratio of the
 * smallest rectangle round it, and the emissivities met on either side of each axis.
 */
final class Shape {
  /** Part of the rim that has to run along or across for a cavity to have axes of its own. */
  private static final double OWN_AXES = 0.5;

  private final Axes axes;
  private final double areaM2;
  private final double[] extentM = new double[2];
  private final Emissivities[] emissivities = new Emissivities[2];
  private final TreeSet<String> faces = new TreeSet<>();
  private final TreeSet<String> unknown = new TreeSet<>();
  private final Point inside;

  /**
   * Measures a cavity.
   *
   * @param parts the pieces it consists of
   * @param numbers of them in the rims
   * @param rims the rims
   * @param section axes for shapes without their own
   */
  Shape(List<Piece> parts, List<Integer> numbers, Rims rims, Axes section) {
    List<Point> corners = new ArrayList<>();
    double area = 0;
    Axes own = Axes.SHEET;
    for (Piece part : parts) {
      Axes of = Axes.of(part.rings().get(0));
      if (of.share() > own.share()) {
        own = of;
      }
      corners.addAll(part.rings().get(0));
      area += part.areaM2();
    }
    axes = own.share() >= OWN_AXES ? own : section;
    areaM2 = area;
    inside = parts.get(0).inside();
    for (int axis = 0; axis < 2; axis++) {
      extentM[axis] = axes.extent(corners, axis);
      emissivities[axis] = faces(numbers, rims, axis);
    }
  }

  Axes axes() {
    return axes;
  }

  Point inside() {
    return inside;
  }

  double areaM2() {
    return areaM2;
  }

  /** Extent of the smallest circumscribing rectangle along an axis, m. */
  double extentM(int axis) {
    return extentM[axis];
  }

  /** The rectangle of equal area and aspect ratio for heat flowing along an axis. */
  CavityBox box(int axis) {
    double around = extentM[0] * extentM[1];
    // a rectangle is its own equal: rounding must not take it below a limit
    return Math.abs(areaM2 - around) <= Limits.TIE * around
        ? new CavityBox(extentM[axis], extentM[1 - axis])
        : CavityBox.ofEqualArea(areaM2, extentM[axis], extentM[1 - axis]);
  }

  /** Emissivities of the faces before and behind along an axis. */
  Emissivities emissivities(int axis) {
    return emissivities[axis];
  }

  /** Names of the materials it touches of which no emissivity is known. */
  TreeSet<String> unknown() {
    return unknown;
  }

  /** Names of the materials it touches. */
  TreeSet<String> faces() {
    return faces;
  }

  /** Means over the faces, by what of them is seen along the axis. */
  private Emissivities faces(List<Integer> numbers, Rims rims, int axis) {
    Mean before = new Mean();
    Mean behind = new Mean();
    for (int number : numbers) {
      for (int edge : rims.edges(number)) {
        Fill far = rims.farFill(number, edge);
        if (!(far instanceof Material material) || rims.farPiece(number, edge) >= 0) {
          continue;
        }
        faces.add(material.name());
        if (material.emissivity().isEmpty()) {
          unknown.add(material.name());
        }
        int a = rims.partition().edgeStart(edge);
        int b = rims.partition().edgeEnd(edge);
        double dx = rims.partition().x(b) - rims.partition().x(a);
        double dy = rims.partition().y(b) - rims.partition().y(a);
        double outward = dy * axes.x(axis) - dx * axes.y(axis);
        outward = rims.onLeft(number, edge) ? outward : -outward;
        double emissivity = material.emissivity().orElse(Limits.EMISSIVITY);
        (outward > 0 ? behind : before).add(Math.abs(outward), emissivity);
      }
    }
    return new Emissivities(before.value(), behind.value());
  }

  /** A weighted mean that is exact where all values are equal. */
  private static final class Mean {
    private double weights;
    private double sum;
    private double least = Double.POSITIVE_INFINITY;
    private double most = Double.NEGATIVE_INFINITY;

    void add(double weight, double value) {
      if (weight > 0) {
        weights += weight;
        sum += weight * value;
        least = Math.min(least, value);
        most = Math.max(most, value);
      }
    }

    double value() {
      return weights > 0 ? Math.max(least, Math.min(most, sum / weights)) : Limits.EMISSIVITY;
    }
  }
}
