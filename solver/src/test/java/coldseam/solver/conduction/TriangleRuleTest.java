package coldseam.solver.conduction;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.apache.commons.math3.analysis.integration.IterativeLegendreGaussIntegrator;
import org.apache.commons.math3.util.CombinatoricsUtils;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Rules against exact integrals of monomials and a general-purpose integrator (commons-math). */
class TriangleRuleTest {
  /** ∫L₀^i L₁^j L₂^k over a triangle = 2A i!j!k!/(i+j+k+2)!. */
  @Test
  void seven_points_are_exact_to_degree_five() {
    TriangleRule rule = TriangleRule.radon();
    for (int degree = 0; degree <= 5; degree++) {
      for (int i = 0; i <= degree; i++) {
        for (int j = 0; i + j <= degree; j++) {
          int k = degree - i - j;
          double exact =
              2.0
                  * CombinatoricsUtils.factorial(i)
                  * CombinatoricsUtils.factorial(j)
                  * CombinatoricsUtils.factorial(k)
                  / CombinatoricsUtils.factorial(degree + 2);
          double sum = 0;
          for (int p = 0; p < rule.count; p++) {
            sum +=
                rule.weight[p]
                    * Math.pow(rule.at[3 * p], i)
                    * Math.pow(rule.at[3 * p + 1], j)
                    * Math.pow(rule.at[3 * p + 2], k);
          }
          assertThat(sum).isCloseTo(exact, within(1e-15));
        }
      }
    }
  }

  /**
   * Around a corner on the axis: ∫∫ρ^m s^n/(ω_a(1 − s) + ω_b s) ρ dρ ds over ρ^1, for all powers
   * that occur.
   */
  @ParameterizedTest
  @ValueSource(doubles = {1, 1.0000001, 1.3, 3, 0.05, 18, 21, 1000, 1e-6})
  void around_a_corner_on_the_axis(double depthB) {
    TriangleRule rule = TriangleRule.aroundCorner(1, 1, depthB);
    IterativeLegendreGaussIntegrator integrator =
        new IterativeLegendreGaussIntegrator(30, 1e-13, 1e-16);
    for (int n = 0; n <= 5; n++) {
      int power = n;
      double alongSide;
      if (depthB > 0.5 && depthB < 2) {
        alongSide =
            integrator.integrate(100_000, s -> Math.pow(s, power) / (1 + (depthB - 1) * s), 0, 1);
      } else {
        // t = ln ω takes the peak where ω is small
        alongSide =
            integrator.integrate(
                100_000,
                t -> Math.pow((Math.exp(t) - 1) / (depthB - 1), power) / Math.abs(depthB - 1),
                Math.min(0, Math.log(depthB)),
                Math.max(0, Math.log(depthB)));
      }
      for (int m = 1; m <= 5; m++) {
        double sum = 0;
        for (int p = 0; p < rule.count; p++) {
          double rho = 1 - rule.at[3 * p + 1];
          double s = rule.at[3 * p] / rho;
          double depth = rule.at[3 * p + 2] + rule.at[3 * p] * depthB;
          sum += rule.weight[p] * Math.pow(rho, m) * Math.pow(s, n) / depth;
        }
        // dA/A = 2ρ dρ ds, depth = ρ ω(s)
        double exact = 2 * alongSide / (m + 1);
        assertThat(sum).isCloseTo(exact, within(1e-11 * Math.max(1, exact)));
      }
    }
  }

  /** The derivatives along the sides of a random quadratic, by differences. */
  @Test
  void derivatives_of_shape_functions() {
    TriangleRule rule = TriangleRule.radon();
    int[] nodes = {0, 1, 2, 3, 4, 5};
    Random random = new Random(3);
    double[] u = new double[6];
    for (int n = 0; n < 6; n++) {
      u[n] = random.nextDouble();
    }
    double step = 1e-5;
    for (int p = 0; p < rule.count; p++) {
      for (int k = 0; k < 3; k++) {
        double sum = 0;
        for (int n = 0; n < 6; n++) {
          sum += u[n] * rule.derivative[18 * p + 6 * k + n];
        }
        double[] l = {rule.at[3 * p], rule.at[3 * p + 1], rule.at[3 * p + 2]};
        l[(k + 1) % 3] -= step;
        l[(k + 2) % 3] += step;
        double after = QuadraticElement.value(nodes, 0, u, l[0], l[1], l[2]);
        l[(k + 1) % 3] += 2 * step;
        l[(k + 2) % 3] -= 2 * step;
        double before = QuadraticElement.value(nodes, 0, u, l[0], l[1], l[2]);
        assertThat(sum).isCloseTo((after - before) / (2 * step), within(1e-8));
      }
    }
  }

  /** w = (1 + excess)/ω is a polynomial of degree 3, meets 1/ω at the ends, and is never below. */
  @ParameterizedTest
  @ValueSource(doubles = {1.01, 1.5, 2, 10, 1e4})
  void what_stands_for_the_reciprocal(double b) {
    double[] w = new double[9];
    for (int i = 0; i < w.length; i++) {
      double depth = 1 + i * (b - 1) / 8;
      w[i] = (1 + Circumference.excess(depth, 1, b)) / depth;
      assertThat(w[i]).isGreaterThanOrEqualTo(1 / depth);
    }
    assertThat(w[0]).isEqualTo(1);
    assertThat(w[8]).isEqualTo(1 / b);
    assertThat(w[4]).isCloseTo(2 / (1 + b), within(1e-15));
    double fourth = 0;
    for (int i = 0; i + 4 < w.length; i++) {
      fourth =
          Math.max(fourth, Math.abs(w[i] - 4 * w[i + 1] + 6 * w[i + 2] - 4 * w[i + 3] + w[i + 4]));
    }
    assertThat(fourth).isLessThan(1e-12 * Math.max(1, b));
  }
}
