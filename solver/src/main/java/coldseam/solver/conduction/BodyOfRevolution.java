package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.algebra.ElementSum;
import java.util.HashMap;
import java.util.Map;

/**
 * A body of revolution about x = 0: behind each point there is a ring, ω = 2πr deep.
 *
 * <p>Every integral over a triangle is a sum over the points of one rule, which is exact for the
 * three products that occur: ω∇u·λ∇v, of degree 3; ∇u·curl S, of degree 2; and w∇S·(λ/det λ)∇V with
 * what stands for 1/ω:
 *
 * <ul>
 *   <li>where the triangle does not touch the axis, the polynomial w of {@link
 *       Circumference#excess}, of degree 3 and nowhere below 1/ω, so that the lower bound stays
 *       one;
 *   <li>where a side lies on the axis, 1/ω: by {@link AxisTies} |∇S| is proportional to ω;
 *   <li>where a corner lies on the axis, 1/ω: ∇S is proportional to the distance from the corner,
 *       and the rule is made for what is left, {@link TriangleRule#aroundCorner}.
 * </ul>
 *
 * <p>So the energies are exact sums of positive terms, and so is the gap.
 */
final class BodyOfRevolution implements Body {
  private static final TriangleRule RULE = TriangleRule.radon();

  /** Σ weight · L_c ∂_kφ_p ∂_kφ_q of the rule: ((3c + k)6 + p)6 + q. */
  private static final double[] CONDUCTION = conductionTable();

  private final int[] nodes;
  private final double[] couplings;
  private final double[] conjugate;

  /** ω at the corners, m: 3t + c. */
  private final double[] depth;

  /** What counts for 1/ω at the points of the rule, times their weights: 7t + i. */
  private final double[] reciprocal;

  /** Triangles that touch the axis. */
  private final Map<Integer, Touching> touching = new HashMap<>();

  /** A rule for temperatures and one for stream functions, on the same points. */
  private record Touching(TriangleRule plain, TriangleRule tied, double[] reciprocal) {}

  /**
   * Takes the triangles.
   *
   * @param mesh the mesh, x being the radius
   * @param nodes its nodes, of temperatures
   * @param couplings couplings for λ
   * @param conjugate couplings for λ/det λ
   */
  BodyOfRevolution(Mesh mesh, int[] nodes, double[] couplings, double[] conjugate) {
    this.nodes = nodes;
    this.couplings = couplings;
    this.conjugate = conjugate;
    depth = new double[couplings.length];
    reciprocal = new double[RULE.count * mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double least = Double.POSITIVE_INFINITY;
      double greatest = 0;
      for (int c = 0; c < 3; c++) {
        depth[3 * t + c] = Circumference.at(mesh, mesh.vertex(t, c));
        least = Math.min(least, depth[3 * t + c]);
        greatest = Math.max(greatest, depth[3 * t + c]);
      }
      if (least > 0) {
        for (int i = 0; i < RULE.count; i++) {
          double here = depth(t, RULE, i);
          double excess = Circumference.excess(here, least, greatest);
          reciprocal[RULE.count * t + i] = RULE.weight[i] * (1 + excess) / here;
        }
      } else {
        touching.put(t, touching(t));
      }
    }
  }

  private Touching touching(int t) {
    boolean[] onAxis = new boolean[3];
    int corners = 0;
    int corner = 0;
    for (int c = 0; c < 3; c++) {
      onAxis[c] = depth[3 * t + c] == 0;
      corners += onAxis[c] ? 1 : 0;
      corner = onAxis[c] ? c : corner;
    }
    TriangleRule plain =
        corners > 1
            ? RULE
            : TriangleRule.aroundCorner(
                corner, depth[3 * t + (corner + 1) % 3], depth[3 * t + (corner + 2) % 3]);
    double[] exactly = new double[plain.count];
    for (int i = 0; i < exactly.length; i++) {
      exactly[i] = plain.weight[i] / depth(t, plain, i);
    }
    return new Touching(plain, plain.besideAxis(onAxis), exactly);
  }

  private double depth(int t, TriangleRule rule, int i) {
    return depth[3 * t] * rule.at[3 * i]
        + depth[3 * t + 1] * rule.at[3 * i + 1]
        + depth[3 * t + 2] * rule.at[3 * i + 2];
  }

  /** Whether a triangle touches the axis. */
  private boolean touches(int t) {
    return depth[3 * t] == 0 || depth[3 * t + 1] == 0 || depth[3 * t + 2] == 0;
  }

  private static double[] conductionTable() {
    double[] table = new double[9 * 36];
    for (int i = 0; i < RULE.count; i++) {
      for (int c = 0; c < 3; c++) {
        for (int k = 0; k < 3; k++) {
          for (int p = 0; p < 6; p++) {
            for (int q = 0; q < 6; q++) {
              table[((3 * c + k) * 6 + p) * 6 + q] +=
                  RULE.weight[i]
                      * RULE.at[3 * i + c]
                      * RULE.derivative[18 * i + 6 * k + p]
                      * RULE.derivative[18 * i + 6 * k + q];
            }
          }
        }
      }
    }
    return table;
  }

  /** The matrices of temperatures. */
  private record Conduction(double[] couplings, double[] depth) implements ElementSum.Entries {
    @Override
    public double entry(int t, int p, int q) {
      double sum = 0;
      for (int k = 0; k < 3; k++) {
        int at = (6 * k + p) * 6 + q;
        double along =
            depth[3 * t] * CONDUCTION[at]
                + depth[3 * t + 1] * CONDUCTION[at + 108]
                + depth[3 * t + 2] * CONDUCTION[at + 216];
        sum -= couplings[3 * t + k] * along;
      }
      return sum;
    }
  }

  @Override
  public ElementSum.Entries conduction() {
    return new Conduction(couplings, depth);
  }

  /** The matrices of stream functions. */
  private final class Resistance implements ElementSum.Entries {
    @Override
    public double entry(int t, int p, int q) {
      if (!touches(t)) {
        return entry(t, RULE, reciprocal, RULE.count * t, p, q);
      }
      Touching there = touching.get(t);
      return entry(t, there.tied, there.reciprocal, 0, p, q);
    }

    private double entry(int t, TriangleRule rule, double[] factor, int from, int p, int q) {
      double sum = 0;
      for (int i = 0; i < rule.count; i++) {
        double here = 0;
        for (int k = 0; k < 3; k++) {
          int at = 18 * i + 6 * k;
          here -= conjugate[3 * t + k] * rule.derivative[at + p] * rule.derivative[at + q];
        }
        sum += factor[from + i] * here;
      }
      return sum;
    }
  }

  @Override
  public ElementSum.Entries resistance() {
    return new Resistance();
  }

  @Override
  public double conducted(int t, double[] u, double[] v) {
    double[] du = new double[9];
    double[] dv = new double[9];
    QuadraticElement.derivativesAtCorners(nodes, t, u, du);
    QuadraticElement.derivativesAtCorners(nodes, t, v, dv);
    double sum = 0;
    for (int i = 0; i < RULE.count; i++) {
      sum += RULE.weight[i] * depth(t, RULE, i) * product(couplings, t, RULE, i, du, dv);
    }
    return sum;
  }

  /** |T| ∇u·λ∇v at a point, by the derivatives along the sides at the corners. */
  private static double product(
      double[] g, int t, TriangleRule rule, int i, double[] du, double[] dv) {
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      sum -= g[3 * t + k] * (at(rule, i, du, k) * at(rule, i, dv, k));
    }
    return sum;
  }

  private static double at(TriangleRule rule, int i, double[] derivatives, int k) {
    return rule.at[3 * i] * derivatives[3 * k]
        + rule.at[3 * i + 1] * derivatives[3 * k + 1]
        + rule.at[3 * i + 2] * derivatives[3 * k + 2];
  }

  @Override
  public double resisted(int[] streamNodes, int t, double[] s, double[] v) {
    double[] ds = new double[9];
    double[] dv = new double[9];
    QuadraticElement.derivativesAtCorners(streamNodes, t, s, ds);
    QuadraticElement.derivativesAtCorners(streamNodes, t, v, dv);
    Touching there = touches(t) ? touching.get(t) : null;
    TriangleRule rule = there == null ? RULE : there.plain;
    double sum = 0;
    for (int i = 0; i < rule.count; i++) {
      double factor = there == null ? reciprocal[rule.count * t + i] : there.reciprocal[i];
      sum += factor * product(conjugate, t, rule, i, ds, dv);
    }
    return sum;
  }

  @Override
  public int misfitSize() {
    return 54;
  }

  /** At each point the components along the sides, 6i + k, then those of ∇S, 6i + 3 + k. */
  @Override
  public void misfit(int t, double[] u, int[] streamNodes, double[] s, double[] out) {
    double[] du = new double[9];
    double[] ds = new double[9];
    QuadraticElement.derivativesAtCorners(nodes, t, u, du);
    QuadraticElement.derivativesAtCorners(streamNodes, t, s, ds);
    TriangleRule rule = touches(t) ? touching.get(t).plain : RULE;
    for (int i = 0; i < rule.count; i++) {
      int at = 6 * i;
      double here = depth(t, rule, i);
      for (int k = 0; k < 3; k++) {
        out[at + 3 + k] = at(rule, i, ds, k);
      }
      for (int k = 0; k < 3; k++) {
        int a = (k + 1) % 3;
        int b = (k + 2) % 3;
        // λ⁻¹ curl S along side k is 2|T| ∇L_k·(λ/det λ)∇S: towards corners a and b from corner k
        double along =
            2 * (conjugate[3 * t + b] * out[at + 3 + b] - conjugate[3 * t + a] * out[at + 3 + a]);
        out[at + k] = at(rule, i, du, k) + along / here;
      }
    }
  }

  @Override
  public double gap(int t, double[] one, double[] other) {
    boolean touches = touches(t);
    TriangleRule rule = touches ? touching.get(t).plain : RULE;
    double sum = 0;
    for (int i = 0; i < rule.count; i++) {
      double here = depth(t, rule, i);
      double misfits = 0;
      double slopes = 0;
      for (int k = 0; k < 3; k++) {
        int at = 6 * i + k;
        misfits -= couplings[3 * t + k] * one[at] * other[at];
        slopes -= conjugate[3 * t + k] * one[at + 3] * other[at + 3];
      }
      double excess = touches ? 0 : reciprocal[rule.count * t + i] - rule.weight[i] / here;
      sum += rule.weight[i] * here * misfits + excess * slopes;
    }
    return sum;
  }

  @Override
  public double depthM(int t) {
    return (depth[3 * t] + depth[3 * t + 1] + depth[3 * t + 2]) / 3;
  }
}
