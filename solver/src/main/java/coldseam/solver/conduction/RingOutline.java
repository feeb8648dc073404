package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;

/**
 * The outline of the section of a body of revolution: behind each side there is a ring, ω = 2πr
 * deep, ω linear along the side. Products of temperatures and depth are polynomials of degree 5 and
 * those of slopes of stream functions and {@link Circumference#excess w} as well, for which three
 * points of Gauss and Legendre are exact. Along a side that touches the axis slopes are
 * proportional to ω, and 1/ω stands as it is.
 */
final class RingOutline extends Outline {
  private static final double OFF_MIDDLE = Math.sqrt(15) / 10;
  private static final double[] POINTS = {0.5 - OFF_MIDDLE, 0.5, 0.5 + OFF_MIDDLE};
  private static final double[] WEIGHTS = {5 / 18.0, 8 / 18.0, 5 / 18.0};

  /** Values of the shape functions of start, middle, end at each point: 3i + p. */
  private static final double[] SHAPES = new double[9];

  /** Their derivatives by the part of the length: 3i + p. */
  private static final double[] SLOPES = new double[9];

  static {
    for (int i = 0; i < 3; i++) {
      double x = POINTS[i];
      SHAPES[3 * i] = (1 - x) * (1 - 2 * x);
      SHAPES[3 * i + 1] = 4 * x * (1 - x);
      SHAPES[3 * i + 2] = x * (2 * x - 1);
      SLOPES[3 * i] = 4 * x - 3;
      SLOPES[3 * i + 1] = 4 - 8 * x;
      SLOPES[3 * i + 2] = 4 * x - 1;
    }
  }

  /** Depth at the start of each side, m. */
  private double[] atStart;

  /** Depth at its end, m. */
  private double[] atEnd;

  RingOutline(Mesh mesh, Conditions conditions) {
    super(mesh, conditions);
  }

  @Override
  void measure(Mesh mesh) {
    atStart = new double[count];
    atEnd = new double[count];
    for (int s = 0; s < count; s++) {
      atStart[s] = Circumference.at(mesh, start[s]);
      atEnd[s] = Circumference.at(mesh, end[s]);
      areaM2[s] = lengthM[s] * (atStart[s] + atEnd[s]) / 2;
    }
  }

  private double depth(int s, int i) {
    return atStart[s] + POINTS[i] * (atEnd[s] - atStart[s]);
  }

  /** What counts for 1/ω at a point. */
  private double reciprocal(int s, int i) {
    double depth = depth(s, i);
    return (1 + excess(s, depth)) / depth;
  }

  private double excess(int s, double depth) {
    double least = Math.min(atStart[s], atEnd[s]);
    return least == 0 ? 0 : Circumference.excess(depth, least, Math.max(atStart[s], atEnd[s]));
  }

  @Override
  double filmEnergy(int s, double[] u, double du, double[] v, double dv) {
    double sum = 0;
    for (int i = 0; i < 3; i++) {
      sum += WEIGHTS[i] * depth(s, i) * (value(s, i, u, du) * value(s, i, v, dv));
    }
    return sum * lengthM[s] / filmM2KPerW[s];
  }

  /** u − space at a point. */
  private double value(int s, int i, double[] u, double space) {
    return SHAPES[3 * i] * (u[start[s]] - space)
        + SHAPES[3 * i + 1] * (u[middle[s]] - space)
        + SHAPES[3 * i + 2] * (u[end[s]] - space);
  }

  @Override
  double mean(int s, double[] u) {
    return (area(s, 0) * u[start[s]] + area(s, 1) * u[middle[s]] + area(s, 2) * u[end[s]])
        / areaM2[s];
  }

  @Override
  double area(int s, int p) {
    if (p == 1) {
      return lengthM[s] * (atStart[s] + atEnd[s]) / 3;
    }
    return lengthM[s] * (p == 0 ? atStart[s] : atEnd[s]) / 6;
  }

  @Override
  double film(int s, int p, int q) {
    double sum = 0;
    for (int i = 0; i < 3; i++) {
      sum += WEIGHTS[i] * depth(s, i) * SHAPES[3 * i + p] * SHAPES[3 * i + q];
    }
    return sum * lengthM[s] / filmM2KPerW[s];
  }

  @Override
  double resistance(int s, int p, int q) {
    double sum = 0;
    for (int i = 0; i < 3; i++) {
      sum += WEIGHTS[i] * reciprocal(s, i) * slope(s, i, p) * slope(s, i, q);
    }
    return sum * filmM2KPerW[s] / lengthM[s];
  }

  /** Slope of a stream function that is 1 at an end or in the middle. */
  private double slope(int s, int i, int p) {
    if (atStart[s] > 0 && atEnd[s] > 0) {
      return SLOPES[3 * i + p];
    }
    // it rises from the axis with the square of the distance
    double fromAxis = atStart[s] == 0 ? POINTS[i] : 1 - POINTS[i];
    return p == 1 ? 0 : p == 2 ? 2 * fromAxis : -2 * fromAxis;
  }

  @Override
  double resisted(int s, double sp, double sq, double vp, double vq) {
    double sum = 0;
    for (int i = 0; i < 3; i++) {
      sum += WEIGHTS[i] * reciprocal(s, i) * slope(i, sp, sq) * slope(i, vp, vq);
    }
    return sum * filmM2KPerW[s] / lengthM[s];
  }

  /** Slope at a point by the rises along both halves. */
  private static double slope(int i, double first, double second) {
    return first + second + 4 * (POINTS[i] - 0.5) * (second - first);
  }

  @Override
  int misfitSize() {
    return 6;
  }

  /** The misfit at the points, then the slope of S there. */
  @Override
  void misfit(int s, double[] u, double space, double first, double second, double[] out) {
    for (int i = 0; i < 3; i++) {
      double slope = slope(i, first, second) / lengthM[s];
      out[i] = value(s, i, u, space) - filmM2KPerW[s] * slope / depth(s, i);
      out[3 + i] = slope;
    }
  }

  @Override
  double gap(int s, double[] one, double[] other) {
    double sum = 0;
    for (int i = 0; i < 3; i++) {
      double depth = depth(s, i);
      sum += WEIGHTS[i] * depth / filmM2KPerW[s] * one[i] * other[i];
      sum += WEIGHTS[i] * filmM2KPerW[s] * excess(s, depth) / depth * one[3 + i] * other[3 + i];
    }
    return sum * lengthM[s];
  }

  @Override
  double atEnd(int s, boolean start, double own, double far) {
    double depth = start ? atStart[s] : atEnd[s];
    double farDepth = start ? atEnd[s] : atStart[s];
    return own * depth / 6 - (far - own) * (farDepth - depth) / 60;
  }

  @Override
  double againstCubic(int s, double a, double m, double b) {
    double depth = (atStart[s] + atEnd[s]) / 2;
    double deeper = atEnd[s] - atStart[s];
    double curved = 2 * ((a - m) + (b - m));
    return lengthM[s] * (((a - b) * depth - m * deeper) / 60 - curved * deeper / 560);
  }

  @Override
  double againstQuartic(int s, double a, double m, double b) {
    double depth = (atStart[s] + atEnd[s]) / 2;
    double deeper = atEnd[s] - atStart[s];
    double curved = 2 * ((a - m) + (b - m));
    return lengthM[s] * (m * depth / 30 + (curved * depth + (b - a) * deeper) / 280);
  }
}
