package coldseam.solver.air;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.Radiosity;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The faces of one cavity that exchange radiation, cut from its rim. What is no face, a mouth, a
 * throat or a cut-off plane, reflects everything, so that nothing passes there by radiation.
 *
 * <p>The exchange of the faces, Σ_i&lt;j g_ij (T_i − T_j)², is counted as ∫ λ_r |grad T|² over the
 * cavity, with λ_r such that both are equal in the field T found. The solved problem is then one of
 * conduction, whose bounds hold for the settled λ_r. What is <em>not</em> certified: the problem
 * with the faces exchanging heat themselves. Its energy, with the g_ij of T, is the same in T and
 * least in another field, so that it lets no more heat through than the one solved; where each of
 * two conductors has one temperature the two agree.
 */
final class Enclosure {
  /** Faces are no longer than this part of the rim. */
  private static final double PART_OF_RIM = 1.0 / 48;

  private final Radiosity radiosity;

  private Enclosure(Radiosity radiosity) {
    this.radiosity = radiosity;
  }

  /**
   * The enclosure of a cavity.
   *
   * @param group the cavity
   * @param number of it in the rims
   * @param rims the rims
   * @return its faces
   * @throws DetailException if it has an island, touches itself, or its emissivities are stated for
   *     two sides
   */
  static Enclosure of(LaidAir.Group group, int number, Rims rims) {
    Optional<Emissivities> stated = group.pieces().get(0).settings().emissivities();
    if (stated.isPresent() && stated.get().first() != stated.get().second()) {
      throw fault(group, "has two emissivities; with `form: radiosity` state one, or none");
    }
    Map<Integer, Integer> byStart = new HashMap<>();
    double rim = 0;
    for (int edge : rims.edges(number)) {
      if (byStart.put(start(edge, number, rims), edge) != null) {
        throw fault(group, "touches itself, which `form: radiosity` does not cover");
      }
      rim += rims.partition().edgeLength(edge);
    }
    Partition partition = rims.partition();
    List<Point> outline = new ArrayList<>();
    List<Double> emissivities = new ArrayList<>();
    int first = start(rims.edges(number).get(0), number, rims);
    int at = first;
    do {
      int edge = byStart.get(at);
      outline.add(
          new Point(
              partition.origin().x() + partition.x(at), partition.origin().y() + partition.y(at)));
      emissivities.add(emissivity(edge, number, rims, stated));
      at = partition.edgeStart(edge) == at ? partition.edgeEnd(edge) : partition.edgeStart(edge);
    } while (at != first);
    if (outline.size() < byStart.size()) {
      throw fault(group, "has an island, which `form: radiosity` does not cover");
    }
    double[] all = new double[emissivities.size()];
    for (int i = 0; i < all.length; i++) {
      all[i] = emissivities.get(i);
    }
    return new Enclosure(Radiosity.of(outline, all, rim * PART_OF_RIM));
  }

  private static int start(int edge, int number, Rims rims) {
    return rims.onLeft(number, edge)
        ? rims.partition().edgeStart(edge)
        : rims.partition().edgeEnd(edge);
  }

  private static double emissivity(int edge, int number, Rims rims, Optional<Emissivities> stated) {
    Fill far = rims.farFill(number, edge);
    boolean face =
        rims.farPiece(number, edge) < 0 && (far instanceof Material || far instanceof Hollow);
    if (!face) {
      return 0;
    }
    if (stated.isPresent()) {
      return stated.get().first();
    }
    return far instanceof Material material
        ? material.emissivity().orElse(Limits.EMISSIVITY)
        : Limits.EMISSIVITY;
  }

  private static DetailException fault(LaidAir.Group group, String message) {
    Piece piece = group.pieces().get(0);
    AirCavity fill = piece.fill();
    return new DetailException(
        List.of(
            new Fault(
                "cavity",
                fill.name(),
                "the cavity at "
                    + Wording.place(piece.inside())
                    + " "
                    + message
                    + "; lay it as air of its own with another `form`",
                Optional.of(piece.inside()))));
  }

  /** Temperatures of the faces, gathered from a field side by side. */
  final class Reading {
    private static final double CELSIUS = 273.15;

    private final double[] sum;
    private final double[] length;

    /** Integral of the squared gradient over the cavity, K². */
    private double squaredGradient;

    Reading() {
      sum = new double[radiosity.faces().size()];
      length = new double[sum.length];
    }

    void addGradient(double integral) {
      squaredGradient += integral;
    }

    /**
     * Adds the temperatures along one side of a triangle, a parabola.
     *
     * @param ax start, m
     * @param ay start, m
     * @param bx end, m
     * @param by end, m
     * @param a at the start, °C
     * @param m in the middle, °C
     * @param b at the end, °C
     */
    void addSide(double ax, double ay, double bx, double by, double a, double m, double b) {
      int side = nearestSide((ax + bx) / 2, (ay + by) / 2);
      double total = Math.hypot(bx - ax, by - ay);
      double dx = (bx - ax) / total;
      double dy = (by - ay) / total;
      List<Radiosity.Face> faces = radiosity.faces();
      for (int f = 0; f < faces.size(); f++) {
        Radiosity.Face face = faces.get(f);
        if (face.side() != side) {
          continue;
        }
        double from = (face.from().x() - ax) * dx + (face.from().y() - ay) * dy;
        double to = (face.to().x() - ax) * dx + (face.to().y() - ay) * dy;
        double low = Math.max(0, Math.min(from, to)) / total;
        double high = Math.min(total, Math.max(from, to)) / total;
        if (high > low) {
          double mean =
              (at(low, a, m, b) + 4 * at((low + high) / 2, a, m, b) + at(high, a, m, b)) / 6;
          sum[f] += (high - low) * total * mean;
          length[f] += (high - low) * total;
        }
      }
    }

    private static double at(double t, double a, double m, double b) {
      return a * (1 - t) * (1 - 2 * t) + 4 * m * t * (1 - t) + b * t * (2 * t - 1);
    }

    private int nearestSide(double x, double y) {
      int nearest = 0;
      double least = Double.POSITIVE_INFINITY;
      for (Radiosity.Face face : radiosity.faces()) {
        double distance = distance(face, x, y);
        if (distance < least) {
          least = distance;
          nearest = face.side();
        }
      }
      return nearest;
    }

    private static double distance(Radiosity.Face face, double x, double y) {
      double dx = face.to().x() - face.from().x();
      double dy = face.to().y() - face.from().y();
      double t = ((x - face.from().x()) * dx + (y - face.from().y()) * dy) / (dx * dx + dy * dy);
      double near = Math.max(0, Math.min(1, t));
      return Math.hypot(face.from().x() + near * dx - x, face.from().y() + near * dy - y);
    }

    /**
     * The conductivity of a solid that would dissipate in this field what the exchange of radiation
     * does: Σ L q T / ∫ |grad T|².
     *
     * @return W/(m·K); NaN where the cavity has one temperature
     */
    double conductivityWPerMK() {
      double[] kelvins = new double[sum.length];
      double sums = 0;
      double lengths = 0;
      for (int f = 0; f < sum.length; f++) {
        sums += sum[f];
        lengths += length[f];
      }
      if (!(lengths > 0 && squaredGradient > 0)) {
        return Double.NaN;
      }
      for (int f = 0; f < sum.length; f++) {
        // What reflects everything has no say: any temperature does.
        kelvins[f] = CELSIUS + (length[f] > 0 ? sum[f] / length[f] : sums / lengths);
      }
      return radiosity.dissipationWKPerM(kelvins) / squaredGradient;
    }
  }
}
