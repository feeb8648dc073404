package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Finds where a ring crosses itself: a vertex passed twice by its noded path, the second passage
 * going from one side of the first to the other. A ring that only touches itself does not cross.
 */
final class SelfCrossings {
  /** A crossing of a ring and the width of the smaller of the two parts it cuts the ring into. */
  record Crossing(int area, double x, double y, double widthM) {}

  private final Linework linework;
  private final List<Crossing> found = new ArrayList<>();

  /**
   * Looks at the first noding of the outlines.
   *
   * @param outlines the outlines that were noded
   * @param noding the noding that split them
   * @param linework what it made
   */
  SelfCrossings(Outlines outlines, Noding noding, Linework linework) {
    this.linework = linework;
    int segment = 0;
    int[] lastVisit = new int[linework.vertexCount];
    Arrays.fill(lastVisit, -1);
    for (int ring = 0; ring < outlines.ringCount(); ring++) {
      int from = segment;
      while (segment < outlines.segmentCount() && outlines.ringOf(segment) == ring) {
        segment++;
      }
      int first = noding.pieceOffset(from);
      int count = noding.pieceOffset(segment) - first;
      int[] path = new int[count];
      for (int i = 0; i < count; i++) {
        path[i] = noding.pieceStart(first + i);
      }
      look(outlines.areaOfRing(ring), path, lastVisit);
    }
  }

  List<Crossing> found() {
    return found;
  }

  private void look(int area, int[] path, int[] lastVisit) {
    for (int i = 0; i < path.length; i++) {
      int v = path[i];
      if (lastVisit[v] >= 0 && crosses(path, lastVisit[v], i)) {
        double width = Math.min(width(path, lastVisit[v], i), width(path, i, lastVisit[v]));
        found.add(new Crossing(area, linework.x[v], linework.y[v], width));
      }
      lastVisit[v] = i;
    }
    for (int v : path) {
      lastVisit[v] = -1;
    }
  }

  private boolean crosses(int[] path, int i, int j) {
    int n = path.length;
    int v = path[i];
    int in = path[(i + n - 1) % n];
    int out = path[(i + 1) % n];
    int otherIn = path[(j + n - 1) % n];
    int otherOut = path[(j + 1) % n];
    if (otherIn == in || otherIn == out || otherOut == in || otherOut == out) {
      return false;
    }
    return isBetween(v, out, in, otherIn) != isBetween(v, out, in, otherOut);
  }

  /** Whether the direction v–p lies counter-clockwise between v–a and v–b. */
  private boolean isBetween(int v, int a, int b, int p) {
    boolean narrow = turn(v, a, b) > 0;
    boolean afterFirst = turn(v, a, p) > 0;
    boolean beforeSecond = turn(v, p, b) > 0;
    return narrow ? afterFirst && beforeSecond : afterFirst || beforeSecond;
  }

  private double turn(int v, int a, int b) {
    double ax = linework.x[a] - linework.x[v];
    double ay = linework.y[a] - linework.y[v];
    double bx = linework.x[b] - linework.x[v];
    double by = linework.y[b] - linework.y[v];
    return ax * by - ay * bx;
  }

  private double width(int[] path, int from, int to) {
    int n = path.length;
    int steps = Math.floorMod(to - from, n);
    double ox = linework.x[path[from]];
    double oy = linework.y[path[from]];
    double twice = 0;
    double perimeter = 0;
    for (int k = 0; k < steps; k++) {
      int a = path[(from + k) % n];
      int b = path[(from + k + 1) % n];
      double ax = linework.x[a] - ox;
      double ay = linework.y[a] - oy;
      double bx = linework.x[b] - ox;
      double by = linework.y[b] - oy;
      twice += ax * by - ay * bx;
      perimeter += Math.hypot(bx - ax, by - ay);
    }
    return perimeter == 0 ? 0 : Math.abs(twice) / perimeter;
  }
}
