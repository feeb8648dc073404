package coldseam.solver.algebra;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import java.util.function.ToDoubleBiFunction;

/**
 * −div(λ grad u) with quadratic triangles, a film of conductance 1 on the lower edge and nothing on
 * the others: the matrix, its elements and their centres. Meshes: the unit square or an L, in
 * right-angled triangles, stretched or graded.
 */
final class QuadraticLaplacian {
  final int unknowns;
  final int[] nodes;
  final double[] centreX;
  final double[] centreY;
  final SparseSymmetric matrix;
  private final Triangles mesh;

  /** Triangles: corner numbers by threes, coordinates of the corners. */
  record Triangles(int[] corners, double[] x, double[] y) {}

  QuadraticLaplacian(Triangles mesh, ToDoubleBiFunction<Double, Double> conductivity) {
    this.mesh = mesh;
    int elements = mesh.corners().length / 3;
    nodes = new int[6 * elements];
    unknowns = numberNodes(mesh);
    centreX = new double[elements];
    centreY = new double[elements];
    int entries = 21 * elements + 6 * elements;
    int[] rows = new int[entries];
    int[] columns = new int[entries];
    double[] values = new double[entries];
    int count = 0;
    double lowest = Arrays.stream(mesh.y()).min().orElseThrow();
    double[][] local = new double[6][6];
    for (int e = 0; e < elements; e++) {
      double[] x = new double[3];
      double[] y = new double[3];
      for (int i = 0; i < 3; i++) {
        x[i] = mesh.x()[mesh.corners()[3 * e + i]];
        y[i] = mesh.y()[mesh.corners()[3 * e + i]];
      }
      centreX[e] = (x[0] + x[1] + x[2]) / 3;
      centreY[e] = (y[0] + y[1] + y[2]) / 3;
      stiffness(x, y, conductivity.applyAsDouble(centreX[e], centreY[e]), local);
      for (int i = 0; i < 3; i++) {
        int j = (i + 1) % 3;
        if (y[i] == lowest && y[j] == lowest) {
          film(local, i, j, 3 + i, Math.abs(x[i] - x[j]));
        }
      }
      for (int i = 0; i < 6; i++) {
        for (int j = 0; j <= i; j++) {
          rows[count] = nodes[6 * e + i];
          columns[count] = nodes[6 * e + j];
          values[count++] = local[i][j];
        }
      }
    }
    matrix = SparseSymmetric.sum(unknowns, rows, columns, values, count);
  }

  /** What is done with an edge: its ends and its middle. */
  interface EdgeVisitor {
    void edge(int first, int second, int middle);
  }

  /** y of node {@code i} of element {@code e}: three corners, then the middles after each. */
  double nodeY(int e, int i) {
    double y = mesh.y()[mesh.corners()[3 * e + i % 3]];
    return i < 3 ? y : (y + mesh.y()[mesh.corners()[3 * e + (i + 1) % 3]]) / 2;
  }

  void forEachUpperEdge(EdgeVisitor visitor) {
    double highest = Arrays.stream(mesh.y()).max().orElseThrow();
    for (int e = 0; e < centreX.length; e++) {
      for (int i = 0; i < 3; i++) {
        int j = (i + 1) % 3;
        if (nodeY(e, i) == highest && nodeY(e, j) == highest) {
          visitor.edge(nodes[6 * e + i], nodes[6 * e + j], nodes[6 * e + 3 + i]);
        }
      }
    }
  }

  /** Where each element begins among the nodes. */
  int[] starts() {
    int[] starts = new int[centreX.length + 1];
    for (int e = 0; e < starts.length; e++) {
      starts[e] = 6 * e;
    }
    return starts;
  }

  int[] order() {
    return NestedDissection.of(unknowns, starts(), nodes, centreX, centreY);
  }

  private int numberNodes(Triangles mesh) {
    int corners = mesh.x().length;
    Map<Long, Integer> middles = new HashMap<>();
    int next = corners;
    for (int e = 0; e < mesh.corners().length / 3; e++) {
      for (int i = 0; i < 3; i++) {
        int a = mesh.corners()[3 * e + i];
        int b = mesh.corners()[3 * e + (i + 1) % 3];
        nodes[6 * e + i] = a;
        long key = (long) Math.min(a, b) << 32 | Math.max(a, b);
        Integer middle = middles.get(key);
        if (middle == null) {
          middle = next++;
          middles.put(key, middle);
        }
        nodes[6 * e + 3 + i] = middle;
      }
    }
    return next;
  }

  /** Local matrix, corners 0 to 2 and then the middles of the edges 01, 12, 20. */
  private static void stiffness(double[] x, double[] y, double conductivity, double[][] k) {
    double[] gx = {y[1] - y[2], y[2] - y[0], y[0] - y[1]};
    double[] gy = {x[2] - x[1], x[0] - x[2], x[1] - x[0]};
    double area2 = gx[0] * gy[1] - gx[1] * gy[0];
    double[][] g = new double[3][3];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        g[i][j] = conductivity * (gx[i] * gx[j] + gy[i] * gy[j]) / (2 * Math.abs(area2));
      }
    }
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        k[i][j] = i == j ? g[i][i] : -g[i][j] / 3;
      }
      for (int m = 0; m < 3; m++) {
        int a = m;
        int b = (m + 1) % 3;
        double toMiddle = i == a ? 4 * g[a][b] / 3 : i == b ? 4 * g[a][b] / 3 : 0;
        k[i][3 + m] = toMiddle;
        k[3 + m][i] = toMiddle;
      }
    }
    for (int m = 0; m < 3; m++) {
      int a = m;
      int b = (m + 1) % 3;
      int c = (m + 2) % 3;
      k[3 + m][3 + m] = 8 * (g[a][a] + g[b][b] + g[a][b]) / 3;
      double next = 4 * (g[b][c] + g[b][b] + 2 * g[a][c] + g[a][b]) / 3;
      k[3 + m][3 + b] = next;
      k[3 + b][3 + m] = next;
    }
  }

  private static void film(double[][] k, int i, int j, int middle, double length) {
    int[] node = {i, j, middle};
    double[][] mass = {{4, -1, 2}, {-1, 4, 2}, {2, 2, 16}};
    for (int a = 0; a < 3; a++) {
      for (int b = 0; b < 3; b++) {
        k[node[a]][node[b]] += length / 30 * mass[a][b];
      }
    }
  }

  /** The unit square, {@code nx} by {@code ny} rectangles halved in turn this way and that. */
  static Triangles square(int nx, int ny) {
    List<int[]> cells = new ArrayList<>();
    for (int j = 0; j < ny; j++) {
      for (int i = 0; i < nx; i++) {
        cells.add(new int[] {i, j});
      }
    }
    return cells(nx, ny, cells, s -> s, t -> t);
  }

  /** The square without its upper right quarter, {@code 2 n} cells along each long side. */
  static Triangles ell(int n) {
    List<int[]> cells = new ArrayList<>();
    for (int j = 0; j < 2 * n; j++) {
      for (int i = 0; i < 2 * n; i++) {
        if (i < n || j < n) {
          cells.add(new int[] {i, j});
        }
      }
    }
    return cells(2 * n, 2 * n, cells, s -> s, t -> t);
  }

  static Triangles mapped(int nx, int ny, DoubleUnaryOperator toX, DoubleUnaryOperator toY) {
    List<int[]> cells = new ArrayList<>();
    for (int j = 0; j < ny; j++) {
      for (int i = 0; i < nx; i++) {
        cells.add(new int[] {i, j});
      }
    }
    return cells(nx, ny, cells, toX, toY);
  }

  private static Triangles cells(
      int nx, int ny, List<int[]> cells, DoubleUnaryOperator toX, DoubleUnaryOperator toY) {
    int[] number = new int[(nx + 1) * (ny + 1)];
    Arrays.fill(number, -1);
    double[] x = new double[number.length];
    double[] y = new double[number.length];
    int[] corners = new int[6 * cells.size()];
    int met = 0;
    int used = 0;
    for (int[] cell : cells) {
      int[] at = new int[4];
      for (int v = 0; v < 4; v++) {
        int i = cell[0] + (v & 1);
        int j = cell[1] + (v >> 1);
        int place = j * (nx + 1) + i;
        if (number[place] < 0) {
          x[met] = toX.applyAsDouble((double) i / nx);
          y[met] = toY.applyAsDouble((double) j / ny);
          number[place] = met++;
        }
        at[v] = number[place];
      }
      boolean rising = ((cell[0] + cell[1]) & 1) == 0;
      int[] two =
          rising
              ? new int[] {at[0], at[1], at[3], at[0], at[3], at[2]}
              : new int[] {at[0], at[1], at[2], at[1], at[3], at[2]};
      for (int v : two) {
        corners[used++] = v;
      }
    }
    return new Triangles(corners, Arrays.copyOf(x, met), Arrays.copyOf(y, met));
  }
}
