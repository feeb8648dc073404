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

  /** Length of the gradient of the values in the triangle of three vertices. */
  double slope(int a, int b, int c) {
    double x1 = xs[b] - xs[a];
    double y1 = ys[b] - ys[a];
    double x2 = xs[c] - xs[a];
    double y2 = ys[c] - ys[a];
    double v1 = values[b] - values[a];
    double v2 = values[c] - values[a];
    double gx = v1 * y2 - v2 * y1;
    double gy = v2 * x1 - v1 * x2;
    return Math.sqrt(gx * gx + gy * gy) / Math.abs(x1 * y2 - x2 * y1);
  }
}
