package coldseam.solver.conduction;

import java.util.Arrays;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Fluxes on the triangle (0,0), (1,0), (0,1): those of Raviart and Thomas (1977) whose normal
 * components are of degree 1 along a side, or those of Brezzi, Douglas and Marini (1985) of degree
 * 2. The divergence of either is of degree 1.
 *
 * <p>A flux is known by its moments: on side k, counter-clockwise from corner k+1, those of its
 * flow outward against the Legendre polynomials P_j of the part walked, at k · (degree + 1) + j;
 * then by two or three moments inside. The transformation of Piola, q = J q̂ / det J, carries a
 * flux to any triangle and keeps its moments, so that triangles which agree in the moments of a
 * common side, but for sign, agree in the normal component.
 *
 * <p>Every flux is also written down by its values at the six nodes of the quadratic triangle,
 * component c at node n at 2n + c; integrals are exact.
 */
final class FluxElement {
  private static final double[][] NODES = {{0, 0}, {1, 0}, {0, 1}, {.5, .5}, {0, .5}, {.5, 0}};

  /** Moments a side. */
  final int perSide;

  /** Moments in all. */
  final int size;

  /** Nodal values of the flux whose only moment is the given one, and that is 1. */
  final double[][] basis;

  /** Divergence of the same at the three corners. */
  final double[][] divergence;

  /** ∫q̂·Λq̂′ of the same is Λ_xx times the first, plus Λ_xy times the second, Λ_yy the third. */
  final double[][][] energy;

  /**
   * Works the element out.
   *
   * @param degree of the normal components, 1 or 2
   */
  FluxElement(int degree) {
    double[][] generators = generators(degree);
    perSide = degree + 1;
    size = generators.length;
    RealMatrix moments = new Array2DRowRealMatrix(size, size);
    for (int g = 0; g < size; g++) {
      moments.setColumn(g, moments(generators[g]));
    }
    RealMatrix inverse = new LUDecomposition(moments).getSolver().getInverse();
    basis = inverse.transpose().multiply(new Array2DRowRealMatrix(generators)).getData();
    divergence = new double[size][];
    for (int i = 0; i < size; i++) {
      divergence[i] = divergence(basis[i]);
    }
    energy = new double[3][size][size];
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        for (int part = 0; part < 3; part++) {
          double[] unit = new double[3];
          unit[part] = 1;
          energy[part][i][j] = energy(unit, basis[i], basis[j]);
        }
      }
    }
  }

  private static double[][] generators(int degree) {
    if (degree != 1 && degree != 2) {
      throw new IllegalArgumentException("fluxes are of degree 1 or 2");
    }
    double[][] values = new double[degree == 1 ? 8 : 12][12];
    for (int n = 0; n < 6; n++) {
      double x = NODES[n][0];
      double y = NODES[n][1];
      double[] monomials = {1, x, y, x * x, x * y, y * y};
      for (int g = 0; g < values.length; g++) {
        values[g][2 * n + g % 2] = monomials[g / 2];
      }
      if (degree == 1) {
        for (int c = 0; c < 2; c++) {
          values[6][2 * n + c] = x * NODES[n][c];
          values[7][2 * n + c] = y * NODES[n][c];
        }
      }
    }
    return values;
  }

  private double[] moments(double[] flux) {
    double[] moments = new double[size];
    for (int k = 0; k < 3; k++) {
      double[] flow = outflow(flux, k);
      for (int j = 0; j < perSide; j++) {
        moments[k * perSide + j] = moment(flow, j);
      }
    }
    for (int n = 3; n < 6; n++) {
      double x = NODES[n][0] - 1.0 / 3;
      double y = NODES[n][1] - 1.0 / 3;
      double[] inside = {flux[2 * n], flux[2 * n + 1], x * flux[2 * n + 1] - y * flux[2 * n]};
      for (int i = 3 * perSide; i < size; i++) {
        moments[i] += inside[i - 3 * perSide];
      }
    }
    return moments;
  }

  /**
   * Flow outward across a side per unit of the part walked, at its start, middle and end; on any
   * triangle the normal component times the side's length.
   */
  static double[] outflow(double[] flux, int k) {
    int a = (k + 1) % 3;
    int b = (k + 2) % 3;
    double dx = NODES[b][0] - NODES[a][0];
    double dy = NODES[b][1] - NODES[a][1];
    double[] flow = new double[3];
    int[] at = {a, 3 + k, b};
    for (int i = 0; i < 3; i++) {
      flow[i] = flux[2 * at[i]] * dy - flux[2 * at[i] + 1] * dx;
    }
    return flow;
  }

  /** ∫P_j f of a quadratic f on [0, 1] given at start, middle and end. */
  static double moment(double[] f, int j) {
    return switch (j) {
      case 0 -> (f[0] + 4 * f[1] + f[2]) / 6;
      case 1 -> (f[2] - f[0]) / 6;
      default -> (f[0] - 2 * f[1] + f[2]) / 15;
    };
  }

  /** The Legendre polynomial P_j of [0, 1]. */
  static double legendre(int j, double s) {
    return switch (j) {
      case 0 -> 1;
      case 1 -> 2 * s - 1;
      default -> 6 * s * (s - 1) + 1;
    };
  }

  private static double[] divergence(double[] flux) {
    double[] x = new double[6];
    double[] y = new double[6];
    for (int n = 0; n < 6; n++) {
      x[n] = flux[2 * n];
      y[n] = flux[2 * n + 1];
    }
    double[] gx = gradient(x);
    double[] gy = gradient(y);
    return new double[] {gx[0] + gy[1], gx[2] + gy[3], gx[4] + gy[5]};
  }

  /** Gradient of a quadratic at the three corners and, linear, at the middles: 2n + c. */
  static double[] gradient(double[] u) {
    double x1 = u[5] - u[0];
    double x2 = u[1] - u[5];
    double y1 = u[4] - u[0];
    double y2 = u[2] - u[4];
    double[] g = new double[12];
    g[0] = 3 * x1 - x2;
    g[1] = 3 * y1 - y2;
    g[2] = 3 * x2 - x1;
    g[3] = 4 * (u[3] - u[5]) - y1 - y2;
    g[4] = 4 * (u[3] - u[4]) - x1 - x2;
    g[5] = 3 * y2 - y1;
    for (int k = 0; k < 3; k++) {
      for (int c = 0; c < 2; c++) {
        g[2 * (3 + k) + c] = (g[2 * ((k + 1) % 3) + c] + g[2 * ((k + 2) % 3) + c]) / 2;
      }
    }
    return g;
  }

  /** A vector field times the hat function of a corner, at the nodes. */
  static double[] hat(double[] field, int corner) {
    double[] out = new double[12];
    for (int c = 0; c < 2; c++) {
      out[2 * corner + c] = field[2 * corner + c];
      for (int k = 1; k < 3; k++) {
        int middle = 2 * (3 + (corner + k) % 3) + c;
        out[middle] = field[middle] / 2;
      }
    }
    return out;
  }

  /** Derivative of the hat function of a corner in direction c. */
  static double hatSlope(int corner, int c) {
    return corner == 0 ? -1 : corner == c + 1 ? 1 : 0;
  }

  /**
   * ∫q̂·Λr̂ of fields of degree 2.
   *
   * @param metric Λ_xx, Λ_xy, Λ_yy
   * @param q nodal values
   * @param r nodal values
   */
  static double energy(double[] metric, double[] q, double[] r) {
    double[] w = weighted(r);
    double sum = 0;
    for (int n = 0; n < 6; n++) {
      sum +=
          q[2 * n] * (metric[0] * w[2 * n] + metric[1] * w[2 * n + 1])
              + q[2 * n + 1] * (metric[1] * w[2 * n] + metric[2] * w[2 * n + 1]);
    }
    return sum;
  }

  /** ∫φ_n r at 2n + c, so that the sum of products with nodal values of q̂ is ∫q̂·r. */
  static double[] weighted(double[] r) {
    double[] w = new double[12];
    for (int m = 0; m < 6; m++) {
      for (int n = 0; n < 6; n++) {
        double mass = mass(m, n) / 360;
        w[2 * m] += mass * r[2 * n];
        w[2 * m + 1] += mass * r[2 * n + 1];
      }
    }
    return w;
  }

  /** ∫φ_m φ_n times 360. */
  private static double mass(int m, int n) {
    if (m < 3 && n < 3) {
      return m == n ? 6 : -1;
    }
    if (m >= 3 && n >= 3) {
      return m == n ? 32 : 16;
    }
    return Math.abs(m - n) == 3 ? -4 : 0;
  }

  /** The flux of lowest degree, that flows out with 1 across one side alone. */
  static double[] lowest(int side) {
    double[] flux = new double[12];
    for (int v = 0; v < 12; v++) {
      flux[v] = NODES[v / 2][v % 2] - NODES[side][v % 2];
    }
    return flux;
  }

  /** The flux with given moments, at the nodes. */
  double[] flux(double[] moments) {
    double[] flux = new double[12];
    Arrays.setAll(flux, i -> value(moments, i));
    return flux;
  }

  private double value(double[] moments, int i) {
    double sum = 0;
    for (int m = 0; m < size; m++) {
      sum += moments[m] * basis[m][i];
    }
    return sum;
  }
}
