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
  private final double snapM;
  private final boolean[] plain;
  private final List<Crossing> found = new ArrayList<>();

  /**
   * Looks at the first noding of the outlines.
   *
   * @param outlines the outlines that were noded
   * @param noding the noding that split them
   * @param linework what it made
   * @param snapM the joining length, m; a part cut off that is no wider is none
   */
  SelfCrossings(Outlines outlines, Noding noding, Linework linework, double snapM) {
    this.linework = linework;
    this.snapM = snapM;
    this.plain = new boolean[outlines.ringCount()];
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
      plain[ring] = look(outlines.areaOfRing(ring), path, lastVisit);
    }
  }

  List<Crossing> found() {
    return found;
  }

  /** Whether a ring passes no vertex twice. */
  boolean isPlain(int ring) {
    return plain[ring];
  }

  private boolean look(int area, int[] path, int[] lastVisit) {
    boolean once = true;
    for (int i = 0; i < path.length; i++) {
      int v = path[i];
      if (lastVisit[v] >= 0) {
        once = false;
        double width = Math.min(width(path, lastVisit[v], i), width(path, i, lastVisit[v]));
        if (width > snapM && crosses(path, lastVisit[v], i)) {
          found.add(new Crossing(area, linework.x[v], linework.y[v], width));
        }
      }
      lastVisit[v] = i;
    }
    for (int v : path) {
      lastVisit[v] = -1;
    }
    return once;
  }

  /**
   * Whether the passage at j comes to the passage at i from one of its sides and leaves it on the
   * other, here or after running along it, in either direction.
   */
  private boolean crosses(int[] path, int i, int j) {
    int before = at(path, j - 1);
    if (before == at(path, i - 1) || before == at(path, i + 1)) {
      return false;
    }
    boolean from = isLeft(path, i, before);
    int k = i;
    int after = at(path, j + 1);
    int step = 0;
    if (after == at(path, i + 1)) {
      step = 1;
    } else if (after == at(path, i - 1)) {
      step = -1;
    }
    for (int n = 1; step != 0 && n < path.length; n++) {
      k += step;
      after = at(path, j + n + 1);
      if (after != at(path, k + step)) {
        break;
      }
    }
    if (after == at(path, k - 1) || after == at(path, k + 1)) {
      return false;
    }
    return isLeft(path, k, after) != from;
  }

  private static int at(int[] path, int i) {
    return path[Math.floorMod(i, path.length)];
  }

  /** Whether a vertex next to the path at i lies on its left. */
  private boolean isLeft(int[] path, int i, int vertex) {
    return isBetween(at(path, i), at(path, i + 1), at(path, i - 1), vertex);
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
      perimeter += Segments.length(bx - ax, by - ay);
    }
    return perimeter == 0 ? 0 : Math.abs(twice) / perimeter;
  }
}
