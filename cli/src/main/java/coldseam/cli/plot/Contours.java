package coldseam.cli.plot;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Lines of equal value, and the regions at or above a value, on linear triangles. Pieces are joined
 * by the numbers of the sides they cross, never by comparing coordinates, so that every line is one
 * polyline and every region a few closed rings.
 */
final class Contours {
  private static final int NONE = -1;

  private final LinearPatch patch;
  private final double[] levels;
  private final int[] sideOf;
  private final int[] outline;
  private final int[] crossing;
  private final int[] crossingFrom;
  private final double[] crossX;
  private final double[] crossY;
  private final int[] next;
  private final boolean[] entered;

  private Contours(LinearPatch patch, double[] levels, int[] sideOf, int sides, int[] outline) {
    this.patch = patch;
    this.levels = levels;
    this.sideOf = sideOf;
    this.outline = outline;
    crossX = new double[sides];
    crossY = new double[sides];
    next = new int[sides];
    Arrays.fill(next, NONE);
    entered = new boolean[sides];
    crossingFrom = new int[levels.length + 1];
    crossing = bucket();
  }

  /**
   * Prepares contours.
   *
   * @param patch the values
   * @param levels every level that will be asked for, ascending
   */
  static Contours of(LinearPatch patch, double[] levels) {
    int n = patch.triangles();
    SideTable table = new SideTable(2 * n);
    int[] sideOf = new int[3 * n];
    for (int t = 0; t < n; t++) {
      int a = patch.corner(t, 0);
      int b = patch.corner(t, 1);
      int c = patch.corner(t, 2);
      sideOf[3 * t] = table.id(b, c);
      sideOf[3 * t + 1] = table.id(c, a);
      sideOf[3 * t + 2] = table.id(a, b);
    }
    byte[] uses = new byte[table.size()];
    for (int side : sideOf) {
      uses[side]++;
    }
    int outer = 0;
    int[] outline = new int[3 * n];
    for (int s = 0; s < 3 * n; s++) {
      if (uses[sideOf[s]] == 1) {
        outline[outer++] = s;
      }
    }
    return new Contours(patch, levels, sideOf, table.size(), Arrays.copyOf(outline, outer));
  }

  /** Sorts the triangles by the levels that cross them. */
  private int[] bucket() {
    int n = patch.triangles();
    int[] first = new int[n];
    int[] last = new int[n];
    for (int t = 0; t < n; t++) {
      double a = patch.value(patch.corner(t, 0));
      double b = patch.value(patch.corner(t, 1));
      double c = patch.value(patch.corner(t, 2));
      first[t] = above(Math.min(a, Math.min(b, c)));
      last[t] = above(Math.max(a, Math.max(b, c)));
      for (int level = first[t]; level < last[t]; level++) {
        crossingFrom[level + 1]++;
      }
    }
    for (int level = 0; level < levels.length; level++) {
      crossingFrom[level + 1] += crossingFrom[level];
    }
    int[] at = crossingFrom.clone();
    int[] sorted = new int[crossingFrom[levels.length]];
    for (int t = 0; t < n; t++) {
      for (int level = first[t]; level < last[t]; level++) {
        sorted[at[level]++] = t;
      }
    }
    return sorted;
  }

  /** Index of the first level above a value. */
  private int above(double value) {
    int low = 0;
    int high = levels.length;
    while (low < high) {
      int mid = (low + high) >>> 1;
      if (levels[mid] > value) {
        high = mid;
      } else {
        low = mid + 1;
      }
    }
    return low;
  }

  /**
   * Lines along which the values equal a level, higher values to their left.
   *
   * @param level index of the level
   * @return open lines that end on the outline, and closed ones
   */
  List<Polyline> lines(int level) {
    int[] from = new int[1];
    int begin = crossingFrom[level];
    int end = crossingFrom[level + 1];
    int[] starts = new int[end - begin];
    for (int i = begin; i < end; i++) {
      int to = cross(crossing[i], levels[level], from);
      next[from[0]] = to;
      entered[to] = true;
      starts[i - begin] = from[0];
    }
    List<Polyline> lines = new ArrayList<>();
    for (boolean open : new boolean[] {true, false}) {
      for (int start : starts) {
        if (next[start] != NONE && !(open && entered[start])) {
          lines.add(follow(start));
        }
      }
    }
    return lines;
  }

  private Polyline follow(int start) {
    Polyline.Builder line = new Polyline.Builder();
    int at = start;
    while (true) {
      line.add(crossX[at], crossY[at]);
      entered[at] = false;
      int then = next[at];
      if (then == NONE) {
        return line.open();
      }
      next[at] = NONE;
      if (then == start) {
        return line.closed();
      }
      at = then;
    }
  }

  /**
   * The crossing of one triangle, from one side to another with the higher corner to the left.
   *
   * @return the side left through
   */
  private int cross(int t, double level, int[] from) {
    int high = 0;
    for (int k = 0; k < 3; k++) {
      if (patch.value(patch.corner(t, k)) >= level) {
        high |= 1 << k;
      }
    }
    boolean single = Integer.bitCount(high) == 1;
    int apex = Integer.numberOfTrailingZeros(single ? high : ~high & 7);
    int first = 3 * t + (apex + 2) % 3;
    int last = 3 * t + (apex + 1) % 3;
    place(first, patch.corner(t, apex), patch.corner(t, (apex + 1) % 3), level);
    place(last, patch.corner(t, apex), patch.corner(t, (apex + 2) % 3), level);
    from[0] = sideOf[single ? first : last];
    return sideOf[single ? last : first];
  }

  /** Puts the crossing of a side; the same from whichever triangle it is asked. */
  private void place(int side, int p, int q, double level) {
    int a = Math.min(p, q);
    int b = Math.max(p, q);
    double part = (level - patch.value(a)) / (patch.value(b) - patch.value(a));
    crossX[sideOf[side]] = patch.x(a) + part * (patch.x(b) - patch.x(a));
    crossY[sideOf[side]] = patch.y(a) + part * (patch.y(b) - patch.y(a));
  }

  /** The rings of everything, filled by the even-odd rule. */
  List<Polyline> all() {
    Rings rings = new Rings(outline.length);
    for (int s : outline) {
      rings.add(corner(s, 1), corner(s, 2));
    }
    return rings.collect();
  }

  /**
   * The region where the values are at or above a level.
   *
   * @param level index of the level
   * @return its rings, filled by the even-odd rule
   */
  List<Polyline> atOrAbove(int level) {
    double value = levels[level];
    Rings rings = new Rings(crossingFrom[level + 1] - crossingFrom[level] + outline.length);
    int[] from = new int[1];
    for (int i = crossingFrom[level]; i < crossingFrom[level + 1]; i++) {
      int to = cross(crossing[i], value, from);
      rings.add(patch.vertices() + from[0], patch.vertices() + to);
    }
    for (int s : outline) {
      int a = corner(s, 1);
      int b = corner(s, 2);
      boolean aHigh = patch.value(a) >= value;
      boolean bHigh = patch.value(b) >= value;
      if (aHigh || bHigh) {
        int node = patch.vertices() + sideOf[s];
        rings.add(aHigh ? a : node, bHigh ? b : node);
      }
    }
    return rings.collect();
  }

  private int corner(int s, int ahead) {
    return patch.corner(s / 3, (s % 3 + ahead) % 3);
  }

  /**
   * Directed pieces between nodes, as many leaving each node as arrive there. Nodes are vertices,
   * then crossings of sides.
   */
  private final class Rings {
    private final int[] first;
    private final int[] following;
    private final int[] ends;
    private final int[] starts;
    private int size;

    Rings(int pieces) {
      first = new int[patch.vertices() + crossX.length];
      Arrays.fill(first, NONE);
      following = new int[pieces];
      ends = new int[pieces];
      starts = new int[pieces];
    }

    void add(int from, int to) {
      starts[size] = from;
      ends[size] = to;
      following[size] = first[from];
      first[from] = size++;
    }

    List<Polyline> collect() {
      List<Polyline> rings = new ArrayList<>();
      for (int i = 0; i < size; i++) {
        while (first[starts[i]] != NONE) {
          Polyline.Builder ring = new Polyline.Builder();
          int at = starts[i];
          while (first[at] != NONE) {
            if (at < patch.vertices()) {
              ring.add(patch.x(at), patch.y(at));
            } else {
              ring.add(crossX[at - patch.vertices()], crossY[at - patch.vertices()]);
            }
            int piece = first[at];
            first[at] = following[piece];
            at = ends[piece];
          }
          if (ring.size() > 2) {
            rings.add(ring.closed());
          }
        }
      }
      return rings;
    }
  }
}
