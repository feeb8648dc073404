package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Material;
import java.util.Arrays;
import java.util.Comparator;

/**
 * The heat-flow density q = −Λ grad θ, W/m²: averaged at each vertex and side middle over the
 * triangles of one material around it and quadratic between, so that it is continuous inside a
 * material and jumps between two. As a {@link Nodal} it gives log₁₀ of the density's size.
 */
final class FlowDensity implements Nodal {
  private static final int NONE = -1;

  /** Densities below this part of the greatest are drawn as this part. */
  private static final double FLOOR = 1e-9;

  private final TemperatureField field;
  private final Mesh mesh;
  private final Conditions conditions;
  private final int[] nodeOf;
  private final int corners;
  private final double[] qx;
  private final double[] qy;
  private final double[] logarithms;
  private final double floor;

  FlowDensity(TemperatureField field, Conditions conditions) {
    this.field = field;
    this.mesh = field.mesh();
    this.conditions = conditions;
    nodeOf = new int[6 * mesh.triangleCount()];
    corners = number(0, 0, mesh.vertexCount());
    int nodes = number(3, corners, mesh.sideCount());
    qx = new double[nodes];
    qy = new double[nodes];
    average();
    double most = 0;
    for (int i = 0; i < nodes; i++) {
      most = Math.max(most, Math.sqrt(qx[i] * qx[i] + qy[i] * qy[i]));
    }
    floor = most > 0 ? FLOOR * most : 1;
    logarithms = new double[nodes];
    for (int i = 0; i < nodes; i++) {
      logarithms[i] = logarithm(qx[i], qy[i]);
    }
  }

  /**
   * Numbers the corners (from 0) or side middles (from 3) of the triangles, one number for each
   * place and material.
   *
   * @return the count of numbers so far
   */
  private int number(int from, int start, int places) {
    int[] first = new int[places];
    Arrays.fill(first, NONE);
    int[] next = new int[3 * mesh.triangleCount()];
    int[] labels = new int[next.length];
    int count = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int place = from == 0 ? mesh.vertex(t, k) : mesh.side(t, k);
        int entry = first[place];
        while (entry != NONE && labels[entry] != mesh.label(t)) {
          entry = next[entry];
        }
        if (entry == NONE) {
          entry = count++;
          labels[entry] = mesh.label(t);
          next[entry] = first[place];
          first[place] = entry;
        }
        nodeOf[6 * t + from + k] = start + entry;
      }
    }
    return start + count;
  }

  private void average() {
    double[] weights = new double[qx.length];
    double[] l = new double[3];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      // Small triangles are where the field bends: they know it best.
      double weight = 1 / Math.sqrt(mesh.area(t));
      for (int node = 0; node < 6; node++) {
        for (int k = 0; k < 3; k++) {
          l[k] = node < 3 ? (k == node ? 1 : 0) : (k == node - 3 ? 0 : 0.5);
        }
        double[] q = triangleDensity(t, l);
        int entry = nodeOf[6 * t + node];
        qx[entry] += weight * q[0];
        qy[entry] += weight * q[1];
        weights[entry] += weight;
      }
    }
    for (int i = 0; i < qx.length; i++) {
      qx[i] /= weights[i];
      qy[i] /= weights[i];
    }
  }

  private double[] triangleDensity(int t, double[] l) {
    return conditions.material(mesh.label(t)).heatFlowDensity(field.gradient(t, l[0], l[1], l[2]));
  }

  /** The density at a place in the section, W/m²; empty array outside. */
  double[] at(double x, double y) {
    int t = mesh.locate(x, y);
    return t < 0 ? new double[0] : vector(t, Barycentric.of(mesh, t, x, y));
  }

  private double[] vector(int t, double[] l) {
    double[] q = new double[2];
    for (int node = 0; node < 6; node++) {
      double shape =
          node < 3 ? l[node] * (2 * l[node] - 1) : 4 * l[(node - 2) % 3] * l[(node - 1) % 3];
      int entry = nodeOf[6 * t + node];
      q[0] += shape * qx[entry];
      q[1] += shape * qy[entry];
    }
    return q;
  }

  @Override
  public Mesh mesh() {
    return mesh;
  }

  @Override
  public int cornerValues() {
    return corners;
  }

  @Override
  public int cornerValue(int triangle, int k) {
    return nodeOf[6 * triangle + k];
  }

  @Override
  public double atCorner(int triangle, int k) {
    return logarithms[nodeOf[6 * triangle + k]];
  }

  @Override
  public double atMiddle(int triangle, int k) {
    return logarithms[nodeOf[6 * triangle + 3 + k]];
  }

  @Override
  public double in(int triangle, double[] barycentric) {
    double[] q = vector(triangle, barycentric);
    return logarithm(q[0], q[1]);
  }

  private double logarithm(double x, double y) {
    return Math.log10(Math.max(floor, Math.sqrt(x * x + y * y)));
  }

  /**
   * The density that is reached on all but a share of the area.
   *
   * @param share of the area with less
   * @return W/m²
   */
  double ofArea(double share) {
    double[] areas = new double[mesh.triangleCount()];
    for (int t = 0; t < areas.length; t++) {
      areas[t] = mesh.area(t);
    }
    return quantile(share, areas);
  }

  /**
   * The density that is reached where all but a share of the dissipation q²/λ takes place, so that
   * small places count where much temperature is lost, and thin sheets of good conductors do not.
   *
   * @param share of the dissipation where there is less
   * @return W/m²
   */
  double ofDissipation(double share) {
    double[] dissipated = new double[mesh.triangleCount()];
    for (int t = 0; t < dissipated.length; t++) {
      Material material = conditions.material(mesh.label(t));
      double lambda = Math.max(material.conductivityWPerMK(), material.crossConductivityWPerMK());
      dissipated[t] = mesh.area(t) * Math.pow(10, 2 * mean(t)) / lambda;
    }
    return quantile(share, dissipated);
  }

  private double mean(int t) {
    return (atCorner(t, 0) + atCorner(t, 1) + atCorner(t, 2)) / 3;
  }

  /** Indices in the order of the values they stand for. */
  private record ByValue(double[] values) implements Comparator<Integer> {
    @Override
    public int compare(Integer a, Integer b) {
      return Double.compare(values[a], values[b]);
    }
  }

  private double quantile(double share, double[] weights) {
    int n = mesh.triangleCount();
    double[] means = new double[n];
    double total = 0;
    Integer[] sorted = new Integer[n];
    for (int t = 0; t < n; t++) {
      means[t] = mean(t);
      total += weights[t];
      sorted[t] = t;
    }
    Arrays.sort(sorted, new ByValue(means));
    double sum = 0;
    double found = means[sorted[n - 1]];
    for (int i = 0; i < n && sum < share * total; i++) {
      sum += weights[sorted[i]];
      found = means[sorted[i]];
    }
    return Math.pow(10, found);
  }
}
