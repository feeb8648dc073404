package coldseam.solver.algebra;

import java.util.Random;

/** A grid of square elements with four nodes each, and a positive definite matrix on its nodes. */
final class GridSystem {
  private final int wide;
  private final int high;

  GridSystem(int wide, int high) {
    this.wide = wide;
    this.high = high;
  }

  int nodes() {
    return (wide + 1) * (high + 1);
  }

  int[] elements() {
    int[] nodes = new int[4 * wide * high];
    for (int j = 0, at = 0; j < high; j++) {
      for (int i = 0; i < wide; i++) {
        int first = j * (wide + 1) + i;
        nodes[at++] = first;
        nodes[at++] = first + 1;
        nodes[at++] = first + wide + 1;
        nodes[at++] = first + wide + 2;
      }
    }
    return nodes;
  }

  double[] x() {
    double[] x = new double[wide * high];
    for (int e = 0; e < x.length; e++) {
      x[e] = e % wide;
    }
    return x;
  }

  double[] y() {
    double[] y = new double[wide * high];
    for (int e = 0; e < y.length; e++) {
      y[e] = e / wide;
    }
    return y;
  }

  /** Random couplings of either sign of order; each element's matrix is positive definite. */
  SymmetricSystem factor(int[] place) {
    Random random = new Random(7);
    int[] nodes = elements();
    int[] rows = new int[10 * wide * high];
    int[] columns = new int[rows.length];
    double[] values = new double[rows.length];
    int count = 0;
    for (int e = 0; e < wide * high; e++) {
      for (int p = 0; p < 4; p++) {
        for (int q = 0; q <= p; q++) {
          rows[count] = place[nodes[4 * e + p]];
          columns[count] = place[nodes[4 * e + q]];
          values[count++] = p == q ? 4 : random.nextDouble() - 0.5;
        }
      }
    }
    return SymmetricSystem.factor(nodes(), rows, columns, values, count);
  }
}
