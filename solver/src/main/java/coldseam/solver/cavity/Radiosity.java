package coldseam.solver.cavity;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * Net radiation of the grey diffuse faces of a cavity: J_i = ε_i σ T_i⁴ + (1 − ε_i) Σ_j F_ij J_j
 * and q_i = J_i − Σ_j F_ij J_j, with view factors F_ij of straight faces in the plane, shadows
 * included.
 *
 * <p>J_i (W/m²) is what leaves face i, q_i (W/m²) what it gives to the cavity on balance. The sides
 * of the outline are cut into faces; each has one temperature. Solved once for all temperatures as
 * q_i = Σ_j G_ij σ (T_i⁴ − T_j⁴) with exchange factors G_ij ≥ 0, L_i G_ij = L_j G_ji: at equal
 * temperatures every flow is 0, and Σ L_i q_i = 0 whatever the temperatures, both to the last digit
 * of the arithmetic. The gas between is transparent; its conduction and convection are those of
 * {@link EquivalentConductivity#gasConductivityWPerMK}.
 *
 * <p>ISO 10077-2:2017 allows this in place of an equivalent conductivity (<em>from memory</em>).
 * Limits: faces are endless at right angles to the drawing; a cavity with an island is refused.
 */
public final class Radiosity {
  /**
   * A piece of the outline of a cavity that has one temperature.
   *
   * @param from its start; the cavity lies on the left
   * @param to its end
   * @param side the side of the outline it is cut from
   * @param emissivity ε of the side
   */
  public record Face(Point from, Point to, int side, double emissivity) {
    /** Its length, m. */
    public double lengthM() {
      return from.distance(to);
    }
  }

  private final List<Face> faces;
  private final double[][] viewed;

  /** L_i G_ij, symmetric, m. */
  private final double[][] exchange;

  private Radiosity(List<Face> faces) {
    this.faces = List.copyOf(faces);
    List<Point> outline = new ArrayList<>();
    for (Face face : faces) {
      outline.add(face.from());
    }
    viewed = ViewFactors.of(outline);
    exchange = exchangeFactors();
  }

  /**
   * The enclosure of a simple polygon.
   *
   * @param outline corners in m, cavity on the left; side i runs from corner i to corner i + 1
   * @param emissivities ε of each side, 0 to 1
   * @param longestFaceM sides are cut into equal faces no longer than this, m; infinite leaves each
   *     side one face
   * @return the enclosure
   * @throws IllegalArgumentException if the outline has fewer than three corners, runs clockwise,
   *     touches or crosses itself, or an emissivity or the length is out of range
   */
  public static Radiosity of(List<Point> outline, double[] emissivities, double longestFaceM) {
    if (emissivities.length != outline.size()) {
      throw new IllegalArgumentException("an enclosure has one emissivity for each side");
    }
    if (!(longestFaceM > 0)) {
      throw new IllegalArgumentException("faces have a positive length");
    }
    List<Face> faces = new ArrayList<>();
    for (int side = 0; side < outline.size(); side++) {
      double emissivity = emissivities[side];
      if (!(emissivity >= 0 && emissivity <= 1)) {
        throw new IllegalArgumentException("an emissivity lies between 0 and 1");
      }
      Point from = outline.get(side);
      Point to = outline.get(side + 1 == outline.size() ? 0 : side + 1);
      int pieces = (int) Math.max(1, Math.ceil(from.distance(to) / longestFaceM));
      Point start = from;
      for (int k = 1; k <= pieces; k++) {
        Point end = k == pieces ? to : between(from, to, (double) k / pieces);
        faces.add(new Face(start, end, side, emissivity));
        start = end;
      }
    }
    return new Radiosity(faces);
  }

  private static Point between(Point from, Point to, double part) {
    return new Point(from.x() + part * (to.x() - from.x()), from.y() + part * (to.y() - from.y()));
  }

  /** The faces, in order along the outline. */
  public List<Face> faces() {
    return faces;
  }

  /**
   * The share of what leaves one face that meets another, F_ij.
   *
   * @param from index i of the first face
   * @param to index j of the second
   * @return F_ij, 0 to 1; 0 for a face and itself
   */
  public double viewFactor(int from, int to) {
    return viewed[from][to];
  }

  /**
   * Net radiation of each face.
   *
   * @param temperaturesK temperature of each face, K above absolute zero
   * @return q_i, W/m², positive from the face into the cavity
   * @throws IllegalArgumentException unless there is one positive temperature for each face
   */
  public double[] netFlowsWPerM2(double[] temperaturesK) {
    requireTemperatures(temperaturesK);
    int n = faces.size();
    double[] flows = new double[n];
    for (int i = 0; i < n; i++) {
      double ti = temperaturesK[i];
      for (int j = 0; j < n; j++) {
        flows[i] += exchange[i][j] * coefficient(ti, temperaturesK[j]) * (ti - temperaturesK[j]);
      }
      flows[i] /= faces.get(i).lengthM();
    }
    return flows;
  }

  /**
   * What the exchange of the faces amounts to as a dissipation, Σ_i L_i q_i T_i: the integral of λ
   * |grad T|² that a solid in place of the radiation would have to have.
   *
   * @param temperaturesK temperature of each face, K above absolute zero
   * @return W·K/m, not negative
   * @throws IllegalArgumentException unless there is one positive temperature for each face
   */
  public double dissipationWKPerM(double[] temperaturesK) {
    requireTemperatures(temperaturesK);
    double sum = 0;
    for (int i = 0; i < faces.size(); i++) {
      for (int j = 0; j < i; j++) {
        double difference = temperaturesK[i] - temperaturesK[j];
        sum +=
            exchange[i][j]
                * coefficient(temperaturesK[i], temperaturesK[j])
                * difference
                * difference;
      }
    }
    return sum;
  }

  private void requireTemperatures(double[] temperaturesK) {
    if (temperaturesK.length != faces.size()) {
      throw new IllegalArgumentException("an enclosure has one temperature for each face");
    }
    for (double t : temperaturesK) {
      if (!(t > 0) || !Double.isFinite(t)) {
        throw new IllegalArgumentException("a temperature lies above absolute zero");
      }
    }
  }

  /** σ (T_i⁴ − T_j⁴)/(T_i − T_j), without the differences. */
  private static double coefficient(double ti, double tj) {
    return EquivalentConductivity.SIGMA * (ti * ti + tj * tj) * (ti + tj);
  }

  /**
   * L_i G_ij: (I − (1 − ε)F) J = ε σT⁴ solved for every face at σT⁴ = 1 and the others at 0; then
   * −q_j/1 of the others are the exchange factors, made symmetric.
   */
  private double[][] exchangeFactors() {
    int n = faces.size();
    double[][] emitted = new double[n][n];
    double[][] matrix = new double[n][n];
    boolean emits = false;
    for (int i = 0; i < n; i++) {
      double emissivity = faces.get(i).emissivity();
      emits |= emissivity > 0;
      emitted[i][i] = emissivity;
      for (int j = 0; j < n; j++) {
        matrix[i][j] = (i == j ? 1 : 0) - (1 - emissivity) * viewed[i][j];
      }
    }
    double[][] factors = new double[n][n];
    if (!emits) {
      return factors;
    }
    eliminate(matrix, emitted);
    for (int i = 0; i < n; i++) {
      double[] arriving = new double[n];
      for (int k = 0; k < n; k++) {
        for (int j = 0; j < n; j++) {
          arriving[j] += viewed[i][k] * emitted[k][j];
        }
      }
      for (int j = 0; j < n; j++) {
        // Face i takes up ε_i of what arrives; of its own radiosity that is −q_i.
        factors[i][j] =
            i == j ? 0 : faces.get(i).lengthM() * faces.get(i).emissivity() * arriving[j];
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double mean = Math.max(0, (factors[i][j] + factors[j][i]) / 2);
        factors[i][j] = mean;
        factors[j][i] = mean;
      }
    }
    return factors;
  }

  /**
   * Solves A X = B in place. A is 1 on the diagonal, not positive elsewhere and row sums are ε_i:
   * an M-matrix, for which elimination without exchange of rows is stable.
   */
  private static void eliminate(double[][] a, double[][] b) {
    int n = a.length;
    for (int k = 0; k < n; k++) {
      for (int i = k + 1; i < n; i++) {
        double factor = a[i][k] / a[k][k];
        if (factor != 0) {
          subtract(a[i], a[k], factor, k);
          subtract(b[i], b[k], factor, 0);
        }
      }
    }
    for (int k = n - 1; k >= 0; k--) {
      for (int i = k + 1; i < n; i++) {
        subtract(b[k], b[i], a[k][i], 0);
      }
      double pivot = a[k][k];
      for (int j = 0; j < n; j++) {
        b[k][j] /= pivot;
      }
    }
  }

  private static void subtract(double[] row, double[] other, double factor, int first) {
    for (int j = first; j < row.length; j++) {
      row[j] -= factor * other[j];
    }
  }
}
