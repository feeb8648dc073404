package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;

/**
 * Looks at a flux given by its components at the six nodes of every triangle, in the coordinates of
 * the mesh: what of it arises inside the triangles, and what does not arrive across their sides.
 * Knows nothing of how the flux was made.
 */
final class FluxAudit {
  private final Discretisation d;
  private final Mesh mesh;
  private final double[][] flux;
  private final double given;

  /**
   * Takes a flux.
   *
   * @param patches what made it
   * @param field which of its fields
   */
  FluxAudit(PatchEquilibration patches, int field) {
    d = patches.d;
    mesh = d.mesh;
    given = field == d.spaces ? 1 : 0;
    flux = new double[mesh.triangleCount()][];
    for (int t = 0; t < flux.length; t++) {
      flux[t] = patches.flux(field, t);
    }
  }

  /** Largest |q| times longest side of a triangle, W/m. */
  double scale() {
    double largest = 0;
    for (int t = 0; t < flux.length; t++) {
      double longest = 0;
      for (int k = 0; k < 3; k++) {
        longest = Math.max(longest, mesh.sideLength(mesh.side(t, k)));
      }
      for (int n = 0; n < 6; n++) {
        largest = Math.max(largest, longest * Math.hypot(flux[t][2 * n], flux[t][2 * n + 1]));
      }
    }
    return largest;
  }

  /** Largest |T| · |div q| at a corner of a triangle, W/m. */
  double source() {
    double largest = 0;
    for (int t = 0; t < flux.length; t++) {
      for (int corner = 0; corner < 3; corner++) {
        double sum = 0;
        for (int n = 0; n < 6; n++) {
          double[] slope = slope(t, n, corner);
          sum += slope[0] * flux[t][2 * n] + slope[1] * flux[t][2 * n + 1];
        }
        largest = Math.max(largest, Math.abs(sum));
      }
    }
    return largest;
  }

  /** |T| times the gradient of a node's quadratic shape function at a corner. */
  private double[] slope(int t, int node, int corner) {
    double[] slope = new double[2];
    if (node < 3) {
      add(slope, t, node, node == corner ? 3 : -1);
    } else {
      int a = (node + 1) % 3;
      int b = (node + 2) % 3;
      add(slope, t, a, b == corner ? 4 : 0);
      add(slope, t, b, a == corner ? 4 : 0);
    }
    return slope;
  }

  /** Adds |T| times the gradient of a barycentric coordinate. */
  private void add(double[] slope, int t, int corner, double factor) {
    int a = mesh.vertex(t, (corner + 1) % 3);
    int b = mesh.vertex(t, (corner + 2) % 3);
    slope[0] += factor * (mesh.y(a) - mesh.y(b)) / 2;
    slope[1] += factor * (mesh.x(b) - mesh.x(a)) / 2;
  }

  /**
   * Largest of what normal components differ by across a side, are where nothing may cross, and
   * differ from a given flow, times the side's length, W/m.
   */
  double jump() {
    double largest = 0;
    for (int t = 0; t < flux.length; t++) {
      for (int k = 0; k < 3; k++) {
        double[] out = outflow(t, k);
        int s = d.outline.of(t, k);
        int other = mesh.neighbour(t, k);
        if (s >= 0 && d.outline.kind[s] != Conditions.Kind.FLOW) {
          continue;
        }
        double[] back = other == Mesh.NONE ? new double[3] : outflow(other, sideToward(other, t));
        double in = s >= 0 ? given * d.outline.flowWPerM2[s] * d.outline.lengthM[s] : 0;
        for (int i = 0; i < 3; i++) {
          largest = Math.max(largest, Math.abs(out[i] + back[2 - i] + in));
        }
      }
    }
    return largest;
  }

  private int sideToward(int t, int neighbour) {
    int k = 0;
    while (mesh.neighbour(t, k) != neighbour) {
      k++;
    }
    return k;
  }

  /** Normal component outward times length, at start, middle and end of a side. */
  private double[] outflow(int t, int k) {
    int[] at = {(k + 1) % 3, 3 + k, (k + 2) % 3};
    int a = mesh.vertex(t, at[0]);
    int b = mesh.vertex(t, at[2]);
    double[] out = new double[3];
    for (int i = 0; i < 3; i++) {
      double x = flux[t][2 * at[i]];
      double y = flux[t][2 * at[i] + 1];
      out[i] = x * (mesh.y(b) - mesh.y(a)) - y * (mesh.x(b) - mesh.x(a));
    }
    return out;
  }
}
