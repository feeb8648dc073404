package coldseam.cli.plot;

import java.util.Arrays;

/**
 * Values at the vertices of conforming triangles, linear in each: what contours are traced on. A
 * vertex at which two values meet is two vertices.
 */
final class LinearPatch {
  private double[] xs;
  private double[] ys;
  private double[] values;
  private int vertices;
  private int[] corners;
  private int triangles;

  LinearPatch(int expectedVertices, int expectedTriangles) {
    xs = new double[Math.max(8, expectedVertices)];
    ys = new double[xs.length];
    values = new double[xs.length];
    corners = new int[3 * Math.max(8, expectedTriangles)];
  }

  int addVertex(double x, double y, double value) {
    if (vertices == xs.length) {
      xs = Arrays.copyOf(xs, 2 * vertices);
      ys = Arrays.copyOf(ys, 2 * vertices);
      values = Arrays.copyOf(values, 2 * vertices);
    }
    xs[vertices] = x;
    ys[vertices] = y;
    values[vertices] = value;
    return vertices++;
  }

  /** Adds a triangle, corners counter-clockwise. */
  void addTriangle(int a, int b, int c) {
    if (3 * triangles == corners.length) {
      corners = Arrays.copyOf(corners, 2 * corners.length);
    }
    corners[3 * triangles] = a;
    corners[3 * triangles + 1] = b;
    corners[3 * triangles + 2] = c;
    triangles++;
  }

  int vertices() {
    return vertices;
  }

  int triangles() {
    return triangles;
  }

  double x(int vertex) {
    return xs[vertex];
  }

  double y(int vertex) {
    return ys[vertex];
  }

  double value(int vertex) {
    return values[vertex];
  }

  int corner(int triangle, int k) {
    return corners[3 * triangle + k];
  }

  double least() {
    double least = Double.POSITIVE_INFINITY;
    for (int v = 0; v < vertices; v++) {
      least = Math.min(least, values[v]);
    }
    return least;
  }

  double most() {
    double most = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < vertices; v++) {
      most = Math.max(most, values[v]);
    }
    return most;
  }

  double area(int triangle) {
    int a = corner(triangle, 0);
    int b = corner(triangle, 1);
    int c = corner(triangle, 2);
    return ((xs[b] - xs[a]) * (ys[c] - ys[a]) - (xs[c] - xs[a]) * (ys[b] - ys[a])) / 2;
  }

  double meanOf(int triangle) {
    return (values[corner(triangle, 0)] + values[corner(triangle, 1)] + values[corner(triangle, 2)])
        / 3;
  }

  /** Length of the gradient of the values in a triangle. */
  double slope(int triangle) {
    int a = corner(triangle, 0);
    int b = corner(triangle, 1);
    int c = corner(triangle, 2);
    double x1 = xs[b] - xs[a];
    double y1 = ys[b] - ys[a];
    double x2 = xs[c] - xs[a];
    double y2 = ys[c] - ys[a];
    double v1 = values[b] - values[a];
    double v2 = values[c] - values[a];
    double twice = x1 * y2 - x2 * y1;
    return Math.hypot(v1 * y2 - v2 * y1, v2 * x1 - v1 * x2) / Math.abs(twice);
  }
}
