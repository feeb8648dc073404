package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Closed rings in local coordinates, filled by the even-odd rule.
 *
 * @param x x of the corners, ring by ring, m
 * @param y y of the corners, m
 */
record Shape(List<double[]> x, List<double[]> y) {
  /** The rings of a face. */
  static Shape of(List<int[]> rings, double[] vx, double[] vy) {
    List<double[]> x = new ArrayList<>(rings.size());
    List<double[]> y = new ArrayList<>(rings.size());
    for (int[] ring : rings) {
      double[] rx = new double[ring.length];
      double[] ry = new double[ring.length];
      for (int i = 0; i < ring.length; i++) {
        rx[i] = vx[ring[i]];
        ry[i] = vy[ring[i]];
      }
      x.add(rx);
      y.add(ry);
    }
    return new Shape(x, y);
  }

  /** Length of all rings, m. */
  double perimeterM() {
    double sum = 0;
    for (int r = 0; r < x.size(); r++) {
      double[] rx = x.get(r);
      double[] ry = y.get(r);
      for (int i = 0; i < rx.length; i++) {
        int j = (i + 1) % rx.length;
        sum += Segments.length(rx[j] - rx[i], ry[j] - ry[i]);
      }
    }
    return sum;
  }

  /** Signed area of a ring, m². */
  double ringArea(int ring) {
    double[] rx = x.get(ring);
    double[] ry = y.get(ring);
    double twice = 0;
    for (int i = 1; i + 1 < rx.length; i++) {
      twice += (rx[i] - rx[0]) * (ry[i + 1] - ry[0]) - (rx[i + 1] - rx[0]) * (ry[i] - ry[0]);
    }
    return twice / 2;
  }

  /** A point well inside: the middle of the longest inner stretch of a level line half-way up. */
  double[] innerPoint() {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    double sumX = 0;
    int corners = 0;
    for (int r = 0; r < x.size(); r++) {
      for (int i = 0; i < x.get(r).length; i++) {
        low = Math.min(low, y.get(r)[i]);
        high = Math.max(high, y.get(r)[i]);
        sumX += x.get(r)[i];
        corners++;
      }
    }
    double level = (low + high) / 2;
    double[] crossings = crossings(level);
    double[] best = {sumX / corners, level};
    double longest = 0;
    for (int i = 0; i + 1 < crossings.length; i += 2) {
      if (crossings[i + 1] - crossings[i] > longest) {
        longest = crossings[i + 1] - crossings[i];
        best[0] = (crossings[i] + crossings[i + 1]) / 2;
      }
    }
    return best;
  }

  private double[] crossings(double level) {
    double[] found = new double[8];
    int n = 0;
    for (int r = 0; r < x.size(); r++) {
      double[] rx = x.get(r);
      double[] ry = y.get(r);
      for (int i = 0; i < rx.length; i++) {
        int j = (i + 1) % rx.length;
        if ((ry[i] > level) != (ry[j] > level)) {
          if (n == found.length) {
            found = Arrays.copyOf(found, 2 * n);
          }
          found[n++] = rx[i] + (level - ry[i]) / (ry[j] - ry[i]) * (rx[j] - rx[i]);
        }
      }
    }
    double[] sorted = Arrays.copyOf(found, n);
    Arrays.sort(sorted);
    return sorted;
  }
}
