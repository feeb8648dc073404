package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Numbers points so that no two numbered points are within the tolerance of each other: a point
 * near a numbered one gets that one's number. A hash of square cells, two tolerances wide, keeps
 * each look-up to at most four cells.
 */
final class PointIndex {
  private final double toleranceM;
  private final double cellM;
  private double[] x = new double[64];
  private double[] y = new double[64];
  private int[] nextInCell = new int[64];
  private int[] heads = new int[256];
  private int count;

  PointIndex(double toleranceM) {
    this.toleranceM = toleranceM;
    this.cellM = 2 * toleranceM;
    Arrays.fill(heads, -1);
  }

  int count() {
    return count;
  }

  double x(int point) {
    return x[point];
  }

  double y(int point) {
    return y[point];
  }

  double[] xs() {
    return Arrays.copyOf(x, count);
  }

  double[] ys() {
    return Arrays.copyOf(y, count);
  }

  /** The number of the nearest numbered point within the tolerance, or a new number. */
  int add(double px, double py) {
    long right = (long) Math.floor((px + toleranceM) / cellM);
    long left = (long) Math.floor((px - toleranceM) / cellM);
    long top = (long) Math.floor((py + toleranceM) / cellM);
    long bottom = (long) Math.floor((py - toleranceM) / cellM);
    int nearest = -1;
    double nearestSquare = toleranceM * toleranceM;
    for (long i = left; i <= right; i++) {
      for (long j = bottom; j <= top; j++) {
        for (int p = heads[slot(i, j)]; p >= 0; p = nextInCell[p]) {
          double dx = x[p] - px;
          double dy = y[p] - py;
          double square = dx * dx + dy * dy;
          if (square < nearestSquare || (square == nearestSquare && nearest < 0)) {
            nearestSquare = square;
            nearest = p;
          }
        }
      }
    }
    return nearest >= 0 ? nearest : insert(px, py);
  }

  private int insert(double px, double py) {
    if (count == x.length) {
      x = Arrays.copyOf(x, 2 * count);
      y = Arrays.copyOf(y, 2 * count);
      nextInCell = Arrays.copyOf(nextInCell, 2 * count);
      rehash();
    }
    x[count] = px;
    y[count] = py;
    link(count);
    return count++;
  }

  private void rehash() {
    heads = new int[4 * x.length];
    Arrays.fill(heads, -1);
    for (int p = 0; p < count; p++) {
      link(p);
    }
  }

  private void link(int p) {
    int slot = slot((long) Math.floor(x[p] / cellM), (long) Math.floor(y[p] / cellM));
    nextInCell[p] = heads[slot];
    heads[slot] = p;
  }

  private int slot(long i, long j) {
    long mixed = (i * 0x9E3779B97F4A7C15L) ^ Long.rotateLeft(j * 0xC2B2AE3D27D4EB4FL, 31);
    mixed ^= mixed >>> 32;
    return (int) (mixed & (heads.length - 1));
  }
}
