package coldseam.cli.plot;

import java.util.BitSet;

/** Leaves out points that a line does not need (Douglas and Peucker 1973). */
final class Simplification {
  private Simplification() {}

  /**
   * A line with fewer points.
   *
   * @param line the line; its ends, or two far points of a closed one, stay
   * @param tolerance how far a point left out may lie from the new line, in the line's unit
   * @return the line, of two points or more (three if closed), or of fewer if it had fewer
   */
  static Polyline of(Polyline line, double tolerance) {
    int n = line.size();
    if (n < 3) {
      return line;
    }
    BitSet kept = new BitSet(n);
    kept.set(0);
    if (line.closed()) {
      int far = farthestFrom(line, 0);
      kept.set(far);
      keep(line, 0, far, tolerance, kept);
      keep(line, far, n, tolerance, kept);
    } else {
      kept.set(n - 1);
      keep(line, 0, n - 1, tolerance, kept);
    }
    Polyline.Builder out = new Polyline.Builder();
    for (int i = kept.nextSetBit(0); i >= 0; i = kept.nextSetBit(i + 1)) {
      out.add(line.x(i), line.y(i));
    }
    return line.closed() ? out.closed() : out.open();
  }

  private static int farthestFrom(Polyline line, int from) {
    int far = from;
    double most = -1;
    for (int i = 0; i < line.size(); i++) {
      double d = Math.hypot(line.x(i) - line.x(from), line.y(i) - line.y(from));
      if (d > most) {
        most = d;
        far = i;
      }
    }
    return far;
  }

  /** Works through a stack of spans; point {@code n} of a closed line is its first again. */
  private static void keep(Polyline line, int first, int last, double tolerance, BitSet kept) {
    int n = line.size();
    int[] stack = new int[2 * (last - first + 2)];
    int top = 0;
    stack[top++] = first;
    stack[top++] = last;
    while (top > 0) {
      int b = stack[--top];
      int a = stack[--top];
      double ax = line.x(a);
      double ay = line.y(a);
      double bx = line.x(b % n);
      double by = line.y(b % n);
      int worst = -1;
      double most = tolerance;
      for (int i = a + 1; i < b; i++) {
        double d = distance(line.x(i), line.y(i), ax, ay, bx, by);
        if (d > most) {
          most = d;
          worst = i;
        }
      }
      if (worst >= 0) {
        kept.set(worst);
        stack[top++] = a;
        stack[top++] = worst;
        stack[top++] = worst;
        stack[top++] = b;
      }
    }
  }

  private static double distance(double x, double y, double ax, double ay, double bx, double by) {
    double dx = bx - ax;
    double dy = by - ay;
    double squared = dx * dx + dy * dy;
    double t = squared == 0 ? 0 : ((x - ax) * dx + (y - ay) * dy) / squared;
    t = Math.max(0, Math.min(1, t));
    return Math.hypot(x - ax - t * dx, y - ay - t * dy);
  }
}
