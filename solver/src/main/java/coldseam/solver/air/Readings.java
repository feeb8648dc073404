package coldseam.solver.air;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;
import java.util.Map;

/** What a temperature field says about every cavity: the heat flow through it and its faces. */
final class Readings {
  private static final int NONE = -1;
  private static final double THIRD = 1.0 / 3;

  private final TemperatureField field;
  private final Mesh mesh;
  private final Conditions conditions;
  private final int[] cavityOfLabel;

  /** Minus the integral of the gradient, K·m. */
  final double[] flowX;

  final double[] flowY;
  private final double[] coldest;
  private final double[] warmest;
  private final double[] sum;
  private final double[] length;
  private final Enclosure.Reading[] radiating;

  /**
   * Reads.
   *
   * @param field the temperatures
   * @param conditions say which label is what and what each edge faces
   * @param numbers number of each cavity by name
   * @param enclosures of the cavities whose faces exchange radiation
   */
  Readings(
      TemperatureField field,
      Conditions conditions,
      Map<String, Integer> numbers,
      Map<Integer, Enclosure> enclosures) {
    this.field = field;
    this.conditions = conditions;
    mesh = field.mesh();
    int count = numbers.size();
    flowX = new double[count];
    flowY = new double[count];
    coldest = filled(count, Double.POSITIVE_INFINITY);
    warmest = filled(count, Double.NEGATIVE_INFINITY);
    sum = new double[count];
    length = new double[count];
    radiating = new Enclosure.Reading[count];
    for (Map.Entry<Integer, Enclosure> entry : enclosures.entrySet()) {
      radiating[entry.getKey()] = entry.getValue().new Reading();
    }
    int labels = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      labels = Math.max(labels, mesh.label(t) + 1);
    }
    cavityOfLabel = new int[labels];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      String material = conditions.material(mesh.label(t)).name();
      cavityOfLabel[mesh.label(t)] = numbers.getOrDefault(material, NONE);
    }
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (cavityOfLabel[mesh.label(t)] != NONE) {
        read(t, cavityOfLabel[mesh.label(t)]);
      }
    }
  }

  private static double[] filled(int count, double value) {
    double[] values = new double[count];
    Arrays.fill(values, value);
    return values;
  }

  private void read(int t, int cavity) {
    double[] gradient = field.gradient(t, THIRD, THIRD, THIRD);
    flowX[cavity] -= gradient[0] * mesh.area(t);
    flowY[cavity] -= gradient[1] * mesh.area(t);
    for (int k = 0; k < 3; k++) {
      if (face(t, k)) {
        double a = field.atNode(mesh.vertex(t, (k + 1) % 3));
        double b = field.atNode(mesh.vertex(t, (k + 2) % 3));
        double m = field.atNode(mesh.vertexCount() + mesh.side(t, k));
        coldest[cavity] = Math.min(coldest[cavity], Math.min(m, Math.min(a, b)));
        warmest[cavity] = Math.max(warmest[cavity], Math.max(m, Math.max(a, b)));
        double side = mesh.sideLength(mesh.side(t, k));
        sum[cavity] += side * (a + 4 * m + b) / 6;
        length[cavity] += side;
        if (radiating[cavity] != null) {
          radiating[cavity].addSide(
              x(t, (k + 1) % 3), y(t, (k + 1) % 3), x(t, (k + 2) % 3), y(t, (k + 2) % 3), a, m, b);
        }
      }
    }
    if (radiating[cavity] != null) {
      double squares = 0;
      for (int k = 0; k < 3; k++) {
        // Middles of the sides integrate a polynomial of degree two.
        double[] at = field.gradient(t, k == 0 ? 0 : 0.5, k == 1 ? 0 : 0.5, k == 2 ? 0 : 0.5);
        squares += at[0] * at[0] + at[1] * at[1];
      }
      radiating[cavity].addGradient(squares * THIRD * mesh.area(t));
    }
  }

  private double x(int t, int corner) {
    return mesh.origin().x() + mesh.x(mesh.vertex(t, corner));
  }

  private double y(int t, int corner) {
    return mesh.origin().y() + mesh.y(mesh.vertex(t, corner));
  }

  /**
   * What the radiation between the faces of a cavity amounts to as a conductivity, W/(m·K); NaN if
   * it is not worked out face by face.
   */
  double radiatingWPerMK(int cavity) {
    return radiating[cavity] == null ? Double.NaN : radiating[cavity].conductivityWPerMK();
  }

  /** Whether a side of a triangle is a face of its cavity: no mouth, cut-off or throat. */
  private boolean face(int t, int k) {
    int edge = mesh.partitionEdge(t, k);
    if (edge == Mesh.NONE) {
      return false;
    }
    int beyond = mesh.neighbour(t, k);
    if (beyond == Mesh.NONE) {
      return conditions.kind(edge) == Conditions.Kind.HOLLOW;
    }
    int label = mesh.label(beyond);
    return label != mesh.label(t) && cavityOfLabel[label] == NONE;
  }

  /** Largest difference of surface temperatures of a cavity, K; NaN if it has no face. */
  double differenceK(int cavity) {
    return length[cavity] > 0 ? warmest[cavity] - coldest[cavity] : Double.NaN;
  }

  /** Mean surface temperature of a cavity, °C; NaN if it has no face. */
  double meanC(int cavity) {
    return length[cavity] > 0 ? sum[cavity] / length[cavity] : Double.NaN;
  }
}
