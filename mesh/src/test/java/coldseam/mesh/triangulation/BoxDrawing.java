package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Boxes laid in order, made into linework on the grid of their sides, then turned and shifted. */
final class BoxDrawing {
  private record Box(int label, double left, double bottom, double right, double top) {}

  private final List<Box> boxes = new ArrayList<>();

  /** Lays a box; m. */
  BoxDrawing box(int label, double left, double bottom, double right, double top) {
    boxes.add(new Box(label, left, bottom, right, top));
    return this;
  }

  Linework lines() {
    return lines(0, 0, 0);
  }

  /** Area with a label, m². */
  double area(int label) {
    double[] xs = cuts(true);
    double[] ys = cuts(false);
    double sum = 0;
    for (int i = 0; i + 1 < xs.length; i++) {
      for (int j = 0; j + 1 < ys.length; j++) {
        if (labelAt(xs, ys, i, j) == label) {
          sum += (xs[i + 1] - xs[i]) * (ys[j + 1] - ys[j]);
        }
      }
    }
    return sum;
  }

  /** The linework, turned about the origin by an angle in degrees, then shifted. */
  Linework lines(double degrees, double shiftX, double shiftY) {
    double[] xs = cuts(true);
    double[] ys = cuts(false);
    int columns = xs.length - 1;
    int rows = ys.length - 1;
    int[] face = new int[columns * rows];
    Arrays.fill(face, -1);
    List<Integer> labels = new ArrayList<>();
    for (int cell = 0; cell < face.length; cell++) {
      int label = labelAt(xs, ys, cell % columns, cell / columns);
      if (label >= 0 && face[cell] < 0) {
        flood(xs, ys, face, cell, label, labels.size());
        labels.add(label);
      }
    }
    int[] vertexAt = new int[xs.length * ys.length];
    Arrays.fill(vertexAt, -1);
    List<Point> points = new ArrayList<>();
    List<int[]> edges = new ArrayList<>();
    for (int j = 0; j <= rows; j++) {
      for (int i = 0; i <= columns; i++) {
        if (isVertex(face, columns, rows, i, j)) {
          vertexAt[j * xs.length + i] = points.size();
          points.add(new Point(xs[i], ys[j]));
        }
      }
    }
    for (int j = 0; j <= rows; j++) {
      int last = -1;
      for (int i = 0; i <= columns; i++) {
        int v = vertexAt[j * xs.length + i];
        int above = i == 0 ? -1 : faceAt(face, columns, rows, i - 1, j);
        int below = i == 0 ? -1 : faceAt(face, columns, rows, i - 1, j - 1);
        if (v >= 0) {
          if (i > 0 && above != below) {
            edges.add(new int[] {last, v, above, below});
          }
          last = v;
        }
      }
    }
    for (int i = 0; i <= columns; i++) {
      int last = -1;
      for (int j = 0; j <= rows; j++) {
        int v = vertexAt[j * xs.length + i];
        int left = j == 0 ? -1 : faceAt(face, columns, rows, i - 1, j - 1);
        int right = j == 0 ? -1 : faceAt(face, columns, rows, i, j - 1);
        if (v >= 0) {
          if (j > 0 && left != right) {
            edges.add(new int[] {last, v, left, right});
          }
          last = v;
        }
      }
    }
    return linework(points, edges, labels, degrees, shiftX, shiftY);
  }

  private static Linework linework(
      List<Point> points,
      List<int[]> edges,
      List<Integer> labels,
      double degrees,
      double shiftX,
      double shiftY) {
    double cos = Math.cos(Math.toRadians(degrees));
    double sin = Math.sin(Math.toRadians(degrees));
    double[] x = points.stream().mapToDouble(p -> cos * p.x() - sin * p.y() + shiftX).toArray();
    double[] y = points.stream().mapToDouble(p -> sin * p.x() + cos * p.y() + shiftY).toArray();
    return new Linework(
        new Point(0, 0),
        x,
        y,
        edges.stream().mapToInt(e -> e[0]).toArray(),
        edges.stream().mapToInt(e -> e[1]).toArray(),
        edges.stream().mapToInt(e -> e[2]).toArray(),
        edges.stream().mapToInt(e -> e[3]).toArray(),
        labels.stream().mapToInt(Integer::intValue).toArray());
  }

  private double[] cuts(boolean ofX) {
    return boxes.stream()
        .flatMap(
            b ->
                ofX
                    ? java.util.stream.Stream.of(b.left, b.right)
                    : java.util.stream.Stream.of(b.bottom, b.top))
        .mapToDouble(Double::doubleValue)
        .sorted()
        .distinct()
        .toArray();
  }

  private int labelAt(double[] xs, double[] ys, int i, int j) {
    double x = 0.5 * (xs[i] + xs[i + 1]);
    double y = 0.5 * (ys[j] + ys[j + 1]);
    int label = -1;
    for (Box b : boxes) {
      if (x > b.left && x < b.right && y > b.bottom && y < b.top) {
        label = b.label;
      }
    }
    return label;
  }

  private void flood(double[] xs, double[] ys, int[] face, int from, int label, int name) {
    int columns = xs.length - 1;
    int rows = ys.length - 1;
    int[] stack = new int[4 * face.length + 4];
    int size = 0;
    stack[size++] = from;
    while (size > 0) {
      int cell = stack[--size];
      if (face[cell] >= 0 || labelAt(xs, ys, cell % columns, cell / columns) != label) {
        continue;
      }
      face[cell] = name;
      int i = cell % columns;
      int j = cell / columns;
      if (i > 0) {
        stack[size++] = cell - 1;
      }
      if (i + 1 < columns) {
        stack[size++] = cell + 1;
      }
      if (j > 0) {
        stack[size++] = cell - columns;
      }
      if (j + 1 < rows) {
        stack[size++] = cell + columns;
      }
    }
  }

  private static int faceAt(int[] face, int columns, int rows, int i, int j) {
    return i < 0 || j < 0 || i >= columns || j >= rows ? -1 : face[j * columns + i];
  }

  private static boolean isVertex(int[] face, int columns, int rows, int i, int j) {
    int a = faceAt(face, columns, rows, i - 1, j - 1);
    int b = faceAt(face, columns, rows, i, j - 1);
    int c = faceAt(face, columns, rows, i, j);
    int d = faceAt(face, columns, rows, i - 1, j);
    boolean below = a != b;
    boolean right = b != c;
    boolean above = c != d;
    boolean left = d != a;
    return (below || right || above || left)
        && !(below && above && !left && !right)
        && !(left && right && !below && !above);
  }
}
