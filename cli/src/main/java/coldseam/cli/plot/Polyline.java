package coldseam.cli.plot;

import java.awt.geom.Path2D;
import java.util.Arrays;
import java.util.List;

/**
 * A line through points, closed or not; in the drawing (m) or on the sheet (points). A closed one
 * does not repeat its first point.
 */
final class Polyline {
  private final double[] xs;
  private final double[] ys;
  private final boolean closed;
  private final double[] along;

  private Polyline(double[] xs, double[] ys, boolean closed) {
    this.xs = xs;
    this.ys = ys;
    this.closed = closed;
    along = new double[pieces() + 1];
    for (int i = 0; i + 1 < along.length; i++) {
      double dx = xs[after(i)] - xs[i];
      double dy = ys[after(i)] - ys[i];
      along[i + 1] = along[i] + Math.sqrt(dx * dx + dy * dy);
    }
  }

  /** Collects the points of a polyline. */
  static final class Builder {
    private double[] xs = new double[16];
    private double[] ys = new double[16];
    private int size;

    Builder add(double x, double y) {
      if (size == xs.length) {
        xs = Arrays.copyOf(xs, 2 * size);
        ys = Arrays.copyOf(ys, 2 * size);
      }
      xs[size] = x;
      ys[size++] = y;
      return this;
    }

    int size() {
      return size;
    }

    Polyline open() {
      return new Polyline(Arrays.copyOf(xs, size), Arrays.copyOf(ys, size), false);
    }

    Polyline closed() {
      return new Polyline(Arrays.copyOf(xs, size), Arrays.copyOf(ys, size), true);
    }
  }

  static Polyline of(double x0, double y0, double x1, double y1) {
    return new Polyline(new double[] {x0, x1}, new double[] {y0, y1}, false);
  }

  int size() {
    return xs.length;
  }

  double x(int i) {
    return xs[i];
  }

  double y(int i) {
    return ys[i];
  }

  boolean closed() {
    return closed;
  }

  /** How many straight pieces there are. */
  int pieces() {
    return closed ? xs.length : Math.max(0, xs.length - 1);
  }

  /** The point after another, the first again after the last. */
  int after(int i) {
    return i + 1 == xs.length ? 0 : i + 1;
  }

  double length() {
    return along[along.length - 1];
  }

  /**
   * A place on the line.
   *
   * @param distance from its start along it
   * @return x and y of the place, then x and y of the unit vector to the right of the line there,
   *     as the sheet is seen (y downwards)
   */
  double[] at(double distance) {
    int found = Arrays.binarySearch(along, distance);
    int piece = Math.max(0, Math.min(pieces() - 1, found >= 0 ? found : -found - 2));
    while (piece > 0 && along[piece + 1] == along[piece]) {
      piece--;
    }
    int next = after(piece);
    double length = along[piece + 1] - along[piece];
    double dx = xs[next] - xs[piece];
    double dy = ys[next] - ys[piece];
    if (length == 0) {
      return new double[] {xs[piece], ys[piece], 0, 0};
    }
    double t = Math.max(0, Math.min(1, (distance - along[piece]) / length));
    return new double[] {xs[piece] + t * dx, ys[piece] + t * dy, -dy / length, dx / length};
  }

  /** Signed area of a closed polyline, positive when it runs from x towards y. */
  double area() {
    double twice = 0;
    for (int i = 0; i < xs.length; i++) {
      int j = after(i);
      twice += (xs[i] - xs[0]) * (ys[j] - ys[0]) - (xs[j] - xs[0]) * (ys[i] - ys[0]);
    }
    return twice / 2;
  }

  Box bounds() {
    double x0 = Double.POSITIVE_INFINITY;
    double y0 = x0;
    double x1 = -x0;
    double y1 = -x0;
    for (int i = 0; i < xs.length; i++) {
      x0 = xs[i] < x0 ? xs[i] : x0;
      x1 = xs[i] > x1 ? xs[i] : x1;
      y0 = ys[i] < y0 ? ys[i] : y0;
      y1 = ys[i] > y1 ? ys[i] : y1;
    }
    return new Box(x0, y0, x1, y1);
  }

  /** The same line on the sheet. */
  Polyline on(Panel panel) {
    double[] px = new double[xs.length];
    double[] py = new double[xs.length];
    for (int i = 0; i < xs.length; i++) {
      px[i] = panel.x(xs[i]);
      py[i] = panel.y(ys[i]);
    }
    return new Polyline(px, py, closed);
  }

  /** The points {@code from} to {@code to}, both included, as an open line. */
  Polyline part(int from, int to) {
    return new Polyline(
        Arrays.copyOfRange(xs, from, to + 1), Arrays.copyOfRange(ys, from, to + 1), false);
  }

  void appendTo(Path2D path) {
    if (xs.length < 2) {
      return;
    }
    path.moveTo(xs[0], ys[0]);
    for (int i = 1; i < xs.length; i++) {
      path.lineTo(xs[i], ys[i]);
    }
    if (closed) {
      path.closePath();
    }
  }

  /** All as one path, filled by the even-odd rule. */
  static Path2D path(List<Polyline> lines) {
    Path2D path = new Path2D.Double(Path2D.WIND_EVEN_ODD);
    for (Polyline line : lines) {
      line.appendTo(path);
    }
    return path;
  }
}
