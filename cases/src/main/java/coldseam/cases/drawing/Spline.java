package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;

/**
 * A B-spline, rational or not, evaluated by de Boor's recurrence (de Boor 1972).
 *
 * <p>x(t) = Σ wᵢ Nᵢ(t) xᵢ / Σ wᵢ Nᵢ(t), and y likewise.
 */
final class Spline {
  private final int degree;
  private final double[] knots;
  private final double[] x;
  private final double[] y;
  private final double[] weights;

  private Spline(int degree, double[] knots, double[] x, double[] y, double[] weights) {
    this.degree = degree;
    this.knots = knots;
    this.x = x;
    this.y = y;
    this.weights = weights;
  }

  /**
   * A spline, if the figures make one.
   *
   * @param degree 1 or more
   * @param knots ascending, as many as control points plus degree plus one
   * @param x control points
   * @param y control points
   * @param weights positive, as many as control points
   * @return the spline, or null if the figures contradict each other
   */
  static Spline of(int degree, double[] knots, double[] x, double[] y, double[] weights) {
    boolean fits =
        degree >= 1
            && degree <= 25
            && x.length > degree
            && y.length == x.length
            && weights.length == x.length
            && knots.length == x.length + degree + 1;
    if (!fits) {
      return null;
    }
    for (int i = 1; i < knots.length; i++) {
      if (!(knots[i] >= knots[i - 1])) {
        return null;
      }
    }
    for (double weight : weights) {
      if (!(weight > 0)) {
        return null;
      }
    }
    return knots[degree] < knots[x.length] ? new Spline(degree, knots, x, y, weights) : null;
  }

  /** The spans of the parameter between different knots, each as its two ends. */
  List<double[]> spans() {
    List<double[]> spans = new ArrayList<>();
    for (int i = degree; i < x.length; i++) {
      if (knots[i + 1] > knots[i]) {
        spans.add(new double[] {knots[i], knots[i + 1]});
      }
    }
    return spans;
  }

  /** Where the curve begins. */
  double[] start() {
    return point(knots[degree]);
  }

  /** The last span between different knots that begins at a parameter or before. */
  private int span(double t) {
    int low = degree;
    int high = x.length - 1;
    while (low < high) {
      int middle = (low + high + 1) >>> 1;
      if (knots[middle] <= t) {
        low = middle;
      } else {
        high = middle - 1;
      }
    }
    while (low > degree && knots[low] == knots[low + 1]) {
      low--;
    }
    return low;
  }

  /** The point at a parameter between the first and the last span's ends. */
  double[] point(double t) {
    int span = span(t);
    double[][] d = new double[degree + 1][];
    for (int j = 0; j <= degree; j++) {
      int i = span - degree + j;
      d[j] = new double[] {x[i] * weights[i], y[i] * weights[i], weights[i]};
    }
    for (int r = 1; r <= degree; r++) {
      for (int j = degree; j >= r; j--) {
        int i = span - degree + j;
        double width = knots[i + degree - r + 1] - knots[i];
        double s = width == 0 ? 0 : (t - knots[i]) / width;
        for (int k = 0; k < 3; k++) {
          d[j][k] = (1 - s) * d[j - 1][k] + s * d[j][k];
        }
      }
    }
    return new double[] {d[degree][0] / d[degree][2], d[degree][1] / d[degree][2]};
  }
}
