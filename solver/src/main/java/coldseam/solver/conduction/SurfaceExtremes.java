package coldseam.solver.conduction;

import coldseam.solver.detail.Conditions;
import java.util.Arrays;
import java.util.BitSet;

/** Coldest and warmest point of the surface that faces each space through a film. */
final class SurfaceExtremes {
  /** Lowest temperature by space, °C; +∞ where the space has no film. */
  final double[] coldestC;

  /** Highest temperature by space, °C; −∞ where the space has no film. */
  final double[] warmestC;

  /** Side of the outline where it is lowest, or −1. */
  final int[] coldestSide;

  /** Side of the outline where it is highest, or −1. */
  final int[] warmestSide;

  /**
   * Searches.
   *
   * @param d the discretisation
   * @param nodalC temperatures of the nodes, °C
   */
  SurfaceExtremes(Discretisation d, double[] nodalC) {
    coldestC = new double[d.spaces];
    warmestC = new double[d.spaces];
    coldestSide = new int[d.spaces];
    warmestSide = new int[d.spaces];
    Arrays.fill(coldestC, Double.POSITIVE_INFINITY);
    Arrays.fill(warmestC, Double.NEGATIVE_INFINITY);
    Arrays.fill(coldestSide, -1);
    Arrays.fill(warmestSide, -1);
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] != Conditions.Kind.FILM) {
        continue;
      }
      double a = nodalC[o.start[s]];
      double m = nodalC[o.middle[s]];
      double b = nodalC[o.end[s]];
      int space = o.space[s];
      double low = Math.min(Math.min(a, b), turningPoint(a, m, b));
      double high = Math.max(Math.max(a, b), turningPoint(a, m, b));
      if (low < coldestC[space]) {
        coldestC[space] = low;
        coldestSide[space] = s;
      }
      if (high > warmestC[space]) {
        warmestC[space] = high;
        warmestSide[space] = s;
      }
    }
  }

  /**
   * Whether a side with a film would hold the coldest or warmest point of its space, were it colder
   * or warmer by a margin.
   */
  boolean mayBeExceeded(Discretisation d, double[] nodalC, int s, double marginK) {
    Outline o = d.outline;
    double a = nodalC[o.start[s]];
    double m = nodalC[o.middle[s]];
    double b = nodalC[o.end[s]];
    return Math.min(Math.min(a, b), m) - marginK < coldestC[o.space[s]]
        || Math.max(Math.max(a, b), m) + marginK > warmestC[o.space[s]];
  }

  /** Distance of a triangle's centre from the nearest end of a side with an extreme point, m. */
  double distance(Discretisation d, int t) {
    double x = d.centreX[t] / 3;
    double y = d.centreY[t] / 3;
    double nearest = Double.POSITIVE_INFINITY;
    for (int i = 0; i < coldestSide.length; i++) {
      if (coldestSide[i] >= 0) {
        nearest = Math.min(nearest, distance(d, coldestSide[i], x, y));
        nearest = Math.min(nearest, distance(d, warmestSide[i], x, y));
      }
    }
    return nearest;
  }

  private static double distance(Discretisation d, int side, double x, double y) {
    int a = d.outline.start[side];
    int b = d.outline.end[side];
    return Math.min(
        Math.hypot(d.mesh.x(a) - x, d.mesh.y(a) - y), Math.hypot(d.mesh.x(b) - x, d.mesh.y(b) - y));
  }

  /** Value of the parabola where it turns between its ends, else its middle. */
  private static double turningPoint(double a, double m, double b) {
    double slope = (b - a) / 2;
    double curvature = (a - m) + (b - m);
    return Math.abs(slope) < Math.abs(curvature) ? m - slope * slope / (2 * curvature) : m;
  }

  /** The triangles that touch an end of a side with a coldest or warmest point. */
  BitSet triangles(Discretisation d) {
    BitSet ends = new BitSet();
    for (int[] sides : new int[][] {coldestSide, warmestSide}) {
      for (int side : sides) {
        if (side >= 0) {
          ends.set(d.outline.start[side]);
          ends.set(d.outline.end[side]);
        }
      }
    }
    BitSet touching = new BitSet();
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (ends.get(d.mesh.vertex(t, k))) {
          touching.set(t);
        }
      }
    }
    return touching;
  }

  /**
   * The largest change against another pass.
   *
   * @param other the other pass
   * @return K
   */
  double change(SurfaceExtremes other) {
    double most = 0;
    for (int i = 0; i < coldestC.length; i++) {
      if (coldestSide[i] >= 0) {
        most = Math.max(most, Math.abs(coldestC[i] - other.coldestC[i]));
        most = Math.max(most, Math.abs(warmestC[i] - other.warmestC[i]));
      }
    }
    return most;
  }
}
