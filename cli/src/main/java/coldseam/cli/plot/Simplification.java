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
      double dx = line.x(i) - line.x(from);
      double dy = line.y(i) - line.y(from);
      double d = dx * dx + dy * dy;
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
      int worst = farthest(line, a, b, tolerance);
      if (worst >= 0) {
        kept.set(worst);
        stack[top++] = a;
        stack[top++] = worst;
        stack[top++] = worst;
        stack[top++] = b;
      }
    }
  }

  /** The point between two that lies farthest from the line through them, or −1 if none does. */
  private static int farthest(Polyline line, int a, int b, double tolerance) {
    double ax = line.x(a);
    double ay = line.y(a);
    double dx = line.x(b % line.size()) - ax;
    double dy = line.y(b % line.size()) - ay;
    double squared = dx * dx + dy * dy;
    double most = tolerance * tolerance;
    int worst = -1;
    for (int i = a + 1; i < b; i++) {
      double px = line.x(i) - ax;
      double py = line.y(i) - ay;
      double t = px * dx + py * dy;
      if (t > 0 && squared > 0) {
        double part = t < squared ? t / squared : 1;
        px -= part * dx;
        py -= part * dy;
      }
      double d = px * px + py * py;
      if (d > most) {
        most = d;
        worst = i;
      }
    }
    return worst;
  }
}
