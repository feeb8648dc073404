package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;

/**
 * The sides on the outline of the mesh that carry a film, a fixed temperature or a given flow, in
 * the order of their triangles. Side s runs from node {@code start[s]} over {@code middle[s]} to
 * {@code end[s]}, counter-clockwise around the section.
 */
final class Outline {
  final int count;
  final int[] triangle;
  final int[] sideOfTriangle;
  final int[] partitionEdge;
  final int[] start;
  final int[] middle;
  final int[] end;
  final double[] lengthM;
  final Conditions.Kind[] kind;
  final int[] space;
  final double[] filmM2KPerW;
  final double[] flowWPerM2;
  private final int[] at;

  Outline(Mesh mesh, Conditions conditions) {
    int[] found = new int[64];
    int n = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(t, k) != Mesh.NONE && mesh.partitionEdge(t, k) == Mesh.NONE) {
          continue;
        }
        if (mesh.neighbour(t, k) == Mesh.NONE && carries(conditions, mesh.partitionEdge(t, k))) {
          if (n == found.length) {
            found = Arrays.copyOf(found, 2 * n);
          }
          found[n++] = 3 * t + k;
        }
      }
    }
    count = n;
    triangle = new int[n];
    sideOfTriangle = new int[n];
    partitionEdge = new int[n];
    start = new int[n];
    middle = new int[n];
    end = new int[n];
    lengthM = new double[n];
    kind = new Conditions.Kind[n];
    space = new int[n];
    filmM2KPerW = new double[n];
    flowWPerM2 = new double[n];
    at = new int[3 * mesh.triangleCount()];
    Arrays.fill(at, -1);
    for (int s = 0; s < n; s++) {
      read(mesh, conditions, s, found[s]);
    }
  }

  private static boolean carries(Conditions conditions, int edge) {
    if (edge == Mesh.NONE) {
      return false;
    }
    Conditions.Kind kind = conditions.kind(edge);
    return kind == Conditions.Kind.FILM
        || kind == Conditions.Kind.FIXED
        || kind == Conditions.Kind.FLOW && conditions.flowWPerM2(edge) != 0;
  }

  private void read(Mesh mesh, Conditions conditions, int s, int corner) {
    int t = corner / 3;
    int k = corner % 3;
    int edge = mesh.partitionEdge(t, k);
    triangle[s] = t;
    sideOfTriangle[s] = k;
    partitionEdge[s] = edge;
    start[s] = mesh.vertex(t, (k + 1) % 3);
    end[s] = mesh.vertex(t, (k + 2) % 3);
    middle[s] = mesh.vertexCount() + mesh.side(t, k);
    lengthM[s] = Math.hypot(mesh.x(end[s]) - mesh.x(start[s]), mesh.y(end[s]) - mesh.y(start[s]));
    kind[s] = conditions.kind(edge);
    space[s] = conditions.space(edge);
    filmM2KPerW[s] = conditions.filmM2KPerW(edge);
    flowWPerM2[s] = conditions.flowWPerM2(edge);
    at[corner] = s;
  }

  /** Index of a triangle's side here, or −1. */
  int of(int t, int k) {
    return at[3 * t + k];
  }

  /**
   * ∫(u − u_space)(v − v_space)/Rs along a side with a film, exact for quadratics.
   *
   * @param s the side
   * @param u nodal values
   * @param du value of the side's space in u
   * @param v nodal values
   * @param dv value of the side's space in v
   */
  double filmEnergy(int s, double[] u, double du, double[] v, double dv) {
    double ua = u[start[s]] - du;
    double um = u[middle[s]] - du;
    double ub = u[end[s]] - du;
    double va = v[start[s]] - dv;
    double vm = v[middle[s]] - dv;
    double vb = v[end[s]] - dv;
    return lengthM[s]
        / (30 * filmM2KPerW[s])
        * (ua * (4 * va + 2 * vm - vb)
            + um * (2 * va + 16 * vm + 2 * vb)
            + ub * (4 * vb + 2 * vm - va));
  }

  /** ∫u along a side over its length. */
  double mean(int s, double[] u) {
    return (u[start[s]] + 4 * u[middle[s]] + u[end[s]]) / 6;
  }
}
