package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;

/**
 * What rounding leaves of the divergence. Nodal temperatures of good conductors drawn thin are
 * known to fewer digits of their differences than the flow has, so that the patches balance a
 * little less well than the flux must. The remainder of each triangle is handed on, as a flux of
 * the lowest degree of Raviart and Thomas, along a shortest row of triangles to a side with a film
 * or a fixed temperature.
 */
final class FluxRemainder {
  private final Mesh mesh;

  /** Triangles, each after the one its remainder goes to. */
  private final int[] order;

  /** The side across which the remainder of a triangle goes. */
  private final int[] way;

  FluxRemainder(Discretisation d) {
    mesh = d.mesh;
    order = new int[mesh.triangleCount()];
    way = new int[order.length];
    boolean[] seen = new boolean[order.length];
    int tail = 0;
    for (int s = 0; s < d.outline.count; s++) {
      int t = d.outline.triangle[s];
      if (d.outline.kind[s] != Conditions.Kind.FLOW && !seen[t]) {
        seen[t] = true;
        way[t] = d.outline.sideOfTriangle[s];
        order[tail++] = t;
      }
    }
    for (int head = 0; head < tail; head++) {
      for (int k = 0; k < 3; k++) {
        int next = mesh.neighbour(order[head], k);
        if (next != Mesh.NONE && !seen[next]) {
          seen[next] = true;
          way[next] = sideToward(next, order[head]);
          order[tail++] = next;
        }
      }
    }
    if (tail < order.length) {
      throw new IllegalStateException("a component touches no film and no fixed temperature");
    }
  }

  private int sideToward(int t, int neighbour) {
    int k = 0;
    while (mesh.neighbour(t, k) != neighbour) {
      k++;
    }
    return k;
  }

  /**
   * Takes the remainder out of a flux.
   *
   * @param flux nodal values on the reference triangle, 12 a triangle; changed
   * @return the largest outflow taken from a triangle, W/m
   */
  double carryOff(double[] flux) {
    double[] own = new double[12];
    double largest = 0;
    for (int i = order.length - 1; i >= 0; i--) {
      int t = order[i];
      System.arraycopy(flux, 12 * t, own, 0, 12);
      double outflow = 0;
      for (int k = 0; k < 3; k++) {
        outflow += FluxElement.moment(FluxElement.outflow(own, k), 0);
      }
      largest = Math.max(largest, Math.abs(outflow));
      add(flux, t, way[t], -outflow);
      int next = mesh.neighbour(t, way[t]);
      if (next != Mesh.NONE) {
        add(flux, next, sideToward(next, t), outflow);
      }
    }
    return largest;
  }

  private static void add(double[] flux, int t, int side, double outflow) {
    double[] lowest = FluxElement.lowest(side);
    for (int v = 0; v < 12; v++) {
      flux[12 * t + v] += outflow * lowest[v];
    }
  }
}
