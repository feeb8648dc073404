package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Material;
import java.util.Arrays;

/**
 * The heat-flow density q = −Λ grad θ, W/m², averaged at each vertex over the triangles of one
 * material around it, so that it is continuous inside a material and jumps between two.
 */
final class FlowDensity {
  private static final int NONE = -1;

  /** Densities below this part of the greatest are drawn as this part. */
  private static final double FLOOR = 1e-9;

  private final TemperatureField field;
  private final Mesh mesh;
  private final Conditions conditions;
  private final int[] vertexOf;
  private final double[] qx;
  private final double[] qy;
  private final int size;

  FlowDensity(TemperatureField field, Conditions conditions) {
    this.field = field;
    this.mesh = field.mesh();
    this.conditions = conditions;
    int[] first = new int[mesh.vertexCount()];
    Arrays.fill(first, NONE);
    int[] next = new int[3 * mesh.triangleCount()];
    int[] labels = new int[next.length];
    vertexOf = new int[next.length];
    int count = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.vertex(t, k);
        int entry = first[v];
        while (entry != NONE && labels[entry] != mesh.label(t)) {
          entry = next[entry];
        }
        if (entry == NONE) {
          entry = count++;
          labels[entry] = mesh.label(t);
          next[entry] = first[v];
          first[v] = entry;
        }
        vertexOf[3 * t + k] = entry;
      }
    }
    size = count;
    qx = new double[size];
    qy = new double[size];
    average();
  }

  private void average() {
    double[] weights = new double[size];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double area = mesh.area(t);
      for (int k = 0; k < 3; k++) {
        double[] q = at(t, k == 0 ? 1 : 0, k == 1 ? 1 : 0, k == 2 ? 1 : 0);
        int entry = vertexOf[3 * t + k];
        qx[entry] += area * q[0];
        qy[entry] += area * q[1];
        weights[entry] += area;
      }
    }
    for (int i = 0; i < size; i++) {
      qx[i] /= weights[i];
      qy[i] /= weights[i];
    }
  }

  private double[] at(int t, double l0, double l1, double l2) {
    Material material = conditions.material(mesh.label(t));
    double[] gradient = field.gradient(t, l0, l1, l2);
    double cos = Math.cos(material.angleRad());
    double sin = Math.sin(material.angleRad());
    double along = -material.conductivityWPerMK() * (gradient[0] * cos + gradient[1] * sin);
    double across = -material.crossConductivityWPerMK() * (gradient[1] * cos - gradient[0] * sin);
    return new double[] {along * cos - across * sin, along * sin + across * cos};
  }

  /** The averaged density at a place in the section; null outside. */
  double[] at(double x, double y) {
    int t = mesh.locate(x, y);
    if (t < 0) {
      return null;
    }
    double[] l = Barycentric.of(mesh, t, x, y);
    double[] q = new double[2];
    for (int k = 0; k < 3; k++) {
      q[0] += l[k] * qx[vertexOf[3 * t + k]];
      q[1] += l[k] * qy[vertexOf[3 * t + k]];
    }
    return q;
  }

  /** Densities as decimal logarithms, on the triangles that meet a window. */
  LinearPatch logarithms(Box window) {
    double most = 0;
    for (int i = 0; i < size; i++) {
      most = Math.max(most, Math.hypot(qx[i], qy[i]));
    }
    double floor = most > 0 ? FLOOR * most : 1;
    int[] numbers = new int[size];
    Arrays.fill(numbers, NONE);
    LinearPatch patch = new LinearPatch(size, mesh.triangleCount());
    for (int t = 0; t < mesh.triangleCount(); t++) {
      Box box = Box.EMPTY;
      for (int k = 0; k < 3; k++) {
        box = box.with(mesh.x(mesh.vertex(t, k)), mesh.y(mesh.vertex(t, k)));
      }
      if (!box.meets(window)) {
        continue;
      }
      for (int k = 0; k < 3; k++) {
        int entry = vertexOf[3 * t + k];
        if (numbers[entry] == NONE) {
          int v = mesh.vertex(t, k);
          double value = Math.log10(Math.max(floor, Math.hypot(qx[entry], qy[entry])));
          numbers[entry] = patch.addVertex(mesh.x(v), mesh.y(v), value);
        }
      }
      patch.addTriangle(
          numbers[vertexOf[3 * t]], numbers[vertexOf[3 * t + 1]], numbers[vertexOf[3 * t + 2]]);
    }
    return patch;
  }

  /**
   * The density that is reached on all but a share of the area.
   *
   * @param patch densities as decimal logarithms
   * @param share of the area with less
   * @return W/m²
   */
  static double quantile(LinearPatch patch, double share) {
    int n = patch.triangles();
    double[] means = new double[n];
    double total = 0;
    for (int t = 0; t < n; t++) {
      means[t] = patch.meanOf(t);
      total += patch.area(t);
    }
    Integer[] sorted = new Integer[n];
    Arrays.setAll(sorted, t -> t);
    Arrays.sort(sorted, (a, b) -> Double.compare(means[a], means[b]));
    double sum = 0;
    for (int t : sorted) {
      sum += patch.area(t);
      if (sum >= share * total) {
        return Math.pow(10, means[t]);
      }
    }
    return Math.pow(10, patch.most());
  }
}
