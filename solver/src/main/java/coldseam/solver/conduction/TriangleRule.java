package coldseam.solver.conduction;

/**
 * Points inside a triangle with weights that add up to 1, and the derivatives of the quadratic
 * shape functions along the sides there.
 */
final class TriangleRule {
  private static final double[] LEGENDRE = {
    0.5 - Math.sqrt(15) / 10, 0.5, 0.5 + Math.sqrt(15) / 10
  };
  private static final double[] LEGENDRE_WEIGHTS = {5 / 18.0, 8 / 18.0, 5 / 18.0};

  /** From where on {@link #ratios} runs forward. */
  private static final double STEEP = 0.9;

  /** Steps of {@link #ratios} back from nothing; each gains 0.4 digits or more. */
  private static final int STEPS = 60;

  /** How many points. */
  final int count;

  final double[] weight;

  /** Barycentric coordinates: 3i + c. */
  final double[] at;

  /** ∂/∂L_b − ∂/∂L_a of shape function p along side k at point i: 18i + 6k + p. */
  final double[] derivative;

  private TriangleRule(double[] weight, double[] at) {
    this(weight, at, derivatives(at));
  }

  private TriangleRule(double[] weight, double[] at, double[] derivative) {
    count = weight.length;
    this.weight = weight;
    this.at = at;
    this.derivative = derivative;
  }

  /** Seven points, exact to degree 5 (Radon 1948). */
  static TriangleRule radon() {
    double root = Math.sqrt(15);
    double[] weight = new double[7];
    double[] at = new double[21];
    weight[0] = 9 / 40.0;
    at[0] = 1 / 3.0;
    at[1] = 1 / 3.0;
    at[2] = 1 / 3.0;
    for (int group = 0; group < 2; group++) {
      double sign = group == 0 ? 1 : -1;
      double pair = (6 - sign * root) / 21;
      for (int c = 0; c < 3; c++) {
        int i = 1 + 3 * group + c;
        weight[i] = (155 - sign * root) / 1200;
        at[3 * i + c] = 1 - 2 * pair;
        at[3 * i + (c + 1) % 3] = pair;
        at[3 * i + (c + 2) % 3] = pair;
      }
    }
    return new TriangleRule(weight, at);
  }

  /**
   * Nine points for a triangle that touches the axis in one corner. With ρ from 0 there to 1 on the
   * opposite side and x from −1 to 1 along that, the depth is ρ(1 + κx) times that in the middle of
   * the side. The rule is exact for f/(ρ(1 + κx)) with f of degree 5 in ρ and in x, f(ρ=0) = 0: by
   * Legendre's points for ρ; for x by the zeros of P₃ − (Q₃/Q₂)P₂, the points of Gauss for the
   * weight 1/(1 + κx), Q_k being Legendre's functions of the second kind at −1/κ.
   *
   * @param corner the corner on the axis
   * @param depthA depth at the next corner
   * @param depthB depth at the one after
   */
  static TriangleRule aroundCorner(int corner, double depthA, double depthB) {
    double kappa = (depthB - depthA) / (depthA + depthB);
    double[] x = new double[3];
    double[] ofX = new double[3];
    gauss(kappa, x, ofX);
    double[] weight = new double[9];
    double[] at = new double[27];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        int point = 3 * i + j;
        double rho = LEGENDRE[j];
        weight[point] = LEGENDRE_WEIGHTS[j] * ofX[i] * rho * (1 + kappa * x[i]);
        at[3 * point + corner] = 1 - rho;
        at[3 * point + (corner + 1) % 3] = rho * (1 - x[i]) / 2;
        at[3 * point + (corner + 2) % 3] = rho * (1 + x[i]) / 2;
      }
    }
    return new TriangleRule(weight, at);
  }

  /** Points and weights of Gauss on (−1, 1) for the weight 1/(1 + κx). */
  private static void gauss(double kappa, double[] x, double[] weight) {
    double[] ratio = ratios(-kappa);
    double between = 1 / Math.sqrt(3);
    double[] ends = {-1, -between, between, 1};
    for (int i = 0; i < 3; i++) {
      x[i] = zero(ratio[3], ends[i], ends[i + 1]);
    }
    // integrals of P₀, P₁, P₂ over 1 + κx
    double m0 = 2 * (kappa == 0 ? 1 : atanh(kappa) / kappa);
    double m1 = m0 * ratio[1];
    double m2 = m1 * ratio[2];
    for (int i = 0; i < 3; i++) {
      double p = x[(i + 1) % 3];
      double q = x[(i + 2) % 3];
      weight[i] = (m2 * 2 / 3 - (p + q) * m1 + (1 / 3.0 + p * q) * m0) / ((x[i] - p) * (x[i] - q));
    }
  }

  /** Q_n/Q_{n−1} of Legendre's functions of the second kind at 1/y, n = 1, 2, 3. */
  private static double[] ratios(double y) {
    double[] ratio = new double[4];
    if (Math.abs(y) < STEEP) {
      double h = 0;
      for (int n = STEPS; n > 0; n--) {
        h = n * y / (2 * n + 1 - (n + 1) * y * h);
        if (n < ratio.length) {
          ratio[n] = h;
        }
      }
    } else {
      double q0 = atanh(y);
      double q1 = q0 / y - 1;
      double q2 = (3 * q1 / y - q0) / 2;
      double q3 = (5 * q2 / y - 2 * q1) / 3;
      ratio[1] = q1 / q0;
      ratio[2] = q2 / q1;
      ratio[3] = q3 / q2;
    }
    return ratio;
  }

  private static double atanh(double y) {
    return (Math.log1p(y) - Math.log1p(-y)) / 2;
  }

  /** The zero of P₃ − c P₂ between two neighbouring numbers of −1, the zeros of P₂ and 1. */
  private static double zero(double c, double from, double to) {
    double low = from;
    double high = to;
    double atLow = cubic(c, low);
    while (true) {
      double middle = (low + high) / 2;
      if (middle <= low || middle >= high) {
        return middle;
      }
      if (cubic(c, middle) > 0 == atLow > 0) {
        low = middle;
      } else {
        high = middle;
      }
    }
  }

  private static double cubic(double c, double x) {
    return ((5 * x - 3 * c) * x - 3) * x + c;
  }

  /**
   * The same points for stream functions beside the axis, see {@link AxisTies}: the middles of
   * sides that leave the axis count with their ends.
   *
   * @param onAxis which corners lie on the axis
   */
  TriangleRule besideAxis(boolean[] onAxis) {
    double[] tied = derivative.clone();
    for (int side = 0; side < 3; side++) {
      int a = (side + 1) % 3;
      int b = (side + 2) % 3;
      if (onAxis[a] == onAxis[b]) {
        continue;
      }
      for (int i = 0; i < tied.length; i += QuadraticElement.NODES) {
        double middle = tied[i + 3 + side];
        tied[i + 3 + side] = 0;
        tied[i + a] += (onAxis[a] ? 3 : 1) * middle / 4;
        tied[i + b] += (onAxis[b] ? 3 : 1) * middle / 4;
      }
    }
    return new TriangleRule(weight, at, tied);
  }

  private static double[] derivatives(double[] at) {
    double[] derivative = new double[6 * at.length];
    for (int i = 0; i < at.length; i += 3) {
      for (int k = 0; k < 3; k++) {
        int a = (k + 1) % 3;
        int b = (k + 2) % 3;
        int to = 6 * i + 6 * k;
        derivative[to + a] = -(4 * at[i + a] - 1);
        derivative[to + b] = 4 * at[i + b] - 1;
        derivative[to + 3 + k] = 4 * (at[i + a] - at[i + b]);
        derivative[to + 3 + a] = 4 * at[i + k];
        derivative[to + 3 + b] = -4 * at[i + k];
      }
    }
    return derivative;
  }
}
