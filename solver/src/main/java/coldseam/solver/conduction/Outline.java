package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;

/**
 * The sides on the outline of the mesh that carry a film, a fixed temperature or a given flow, in
 * the order of their triangles. Side s runs from node {@code start[s]} over {@code middle[s]} to
 * {@code end[s]}, counter-clockwise around the section.
 */
class Outline {
  final int count;
  final int[] triangle;
  final int[] sideOfTriangle;
  final int[] partitionEdge;
  final int[] start;
  final int[] middle;
  final int[] end;
  final double[] lengthM;

  /** What of the body's surface a side stands for, m². */
  final double[] areaM2;

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
    areaM2 = new double[n];
    kind = new Conditions.Kind[n];
    space = new int[n];
    filmM2KPerW = new double[n];
    flowWPerM2 = new double[n];
    at = new int[3 * mesh.triangleCount()];
    Arrays.fill(at, -1);
    for (int s = 0; s < n; s++) {
      read(mesh, conditions, s, found[s]);
    }
    measure(mesh);
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

  /** Measures the areas: of a prism, a square metre for every metre of its section. */
  void measure(Mesh mesh) {
    System.arraycopy(lengthM, 0, areaM2, 0, count);
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

  /** ∫u over the surface of a side over its area. */
  double mean(int s, double[] u) {
    return (u[start[s]] + 4 * u[middle[s]] + u[end[s]]) / 6;
  }

  /** ∫φ_p over the surface of a side, p of 0, 1, 2 for start, middle, end, m². */
  double area(int s, int p) {
    return (p == 1 ? 4 : 1) * lengthM[s] / 6;
  }

  /** ∫φ_p φ_q/Rs over the surface of a side with a film. */
  double film(int s, int p, int q) {
    double unit = lengthM[s] / (30 * filmM2KPerW[s]);
    if (p == 1 || q == 1) {
      return p == q ? 16 * unit : 2 * unit;
    }
    return p == q ? 4 * unit : -unit;
  }

  /**
   * ∫Rs φ_p′ φ_q′/ω along a side with a film, for stream functions, ω the depth behind it; nodes
   * whose values follow from those of the ends have entries of 0.
   */
  double resistance(int s, int p, int q) {
    double unit = filmM2KPerW[s] / (3 * lengthM[s]);
    if (p == 1 || q == 1) {
      return p == q ? 16 * unit : -8 * unit;
    }
    return p == q ? 7 * unit : unit;
  }

  /**
   * ∫Rs S′V′/ω along a side with a film.
   *
   * @param s the side
   * @param sp rise of S along the first half
   * @param sq rise of S along the second half
   * @param vp rise of V along the first half
   * @param vq rise of V along the second half
   */
  double resisted(int s, double sp, double sq, double vp, double vq) {
    return filmM2KPerW[s]
        / (6 * lengthM[s])
        * ((3 * sp - sq) * (3 * vp - vq)
            + 4 * (sp + sq) * (vp + vq)
            + (3 * sq - sp) * (3 * vq - vp));
  }

  /** How many numbers {@link #misfit} writes at most. */
  int misfitSize() {
    return 3;
  }

  /**
   * Writes what Rs S′/ω and space − u differ by along a side with a film, in a form of its own.
   *
   * @param s the side
   * @param u nodal values
   * @param space value of the side's space
   * @param first rise of S along the first half
   * @param second rise of S along the second half
   * @param out takes it
   */
  void misfit(int s, double[] u, double space, double first, double second, double[] out) {
    double scale = filmM2KPerW[s] / lengthM[s];
    out[0] = u[start[s]] - space - scale * (3 * first - second);
    out[1] = u[middle[s]] - space - scale * (first + second);
    out[2] = u[end[s]] - space - scale * (3 * second - first);
  }

  /** The gap between the energies of temperatures and of fluxes in a film, see {@link Body#gap}. */
  double gap(int s, double[] one, double[] other) {
    return lengthM[s]
        / (30 * filmM2KPerW[s])
        * (one[0] * (4 * other[0] + 2 * other[1] - other[2])
            + one[1] * (2 * other[0] + 16 * other[1] + 2 * other[2])
            + one[2] * (4 * other[2] + 2 * other[1] - other[0]));
  }

  /**
   * ∫φ f ω along a side for the shape function of one of its ends.
   *
   * @param s the side
   * @param atStart whether it is the start's
   * @param own linear f there, times the side's length
   * @param far f at the other end, times the side's length
   */
  double atEnd(int s, boolean atStart, double own, double far) {
    return own / 6;
  }

  /**
   * ∫ψ f over the surface of a side for ψ = t(1 − t)(1 − 2t), t from 0 at its start to 1.
   *
   * @param s the side
   * @param a quadratic f at the start
   * @param m in the middle
   * @param b at the end
   */
  double againstCubic(int s, double a, double m, double b) {
    return lengthM[s] * (a - b) / 60;
  }

  /** The same for ψ = t(1 − t)(1 − 2t)². */
  double againstQuartic(int s, double a, double m, double b) {
    return lengthM[s] * (m / 30 + ((a + b) / 2 - m) / 70);
  }
}
