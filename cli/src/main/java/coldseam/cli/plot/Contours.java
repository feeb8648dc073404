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
  private final int[] sideOf;
  private final int sides;
  private final int[] outline;

  private Contours(LinearPatch patch, int[] sideOf, int sides, int[] outline) {
    this.patch = patch;
    this.sideOf = sideOf;
    this.sides = sides;
    this.outline = outline;
  }

  static Contours of(LinearPatch patch) {
    int n = patch.triangles();
    SideTable table = new SideTable(2 * n);
    int[] sideOf = new int[3 * n];
    for (int s = 0; s < 3 * n; s++) {
      int t = s / 3;
      int k = s % 3;
      sideOf[s] = table.id(patch.corner(t, (k + 1) % 3), patch.corner(t, (k + 2) % 3));
    }
    int[] uses = new int[table.size()];
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
    return new Contours(patch, sideOf, table.size(), Arrays.copyOf(outline, outer));
  }

  LinearPatch patch() {
    return patch;
  }

  /**
   * Lines along which the values equal a level, higher values to their left.
   *
   * @param level the level
   * @return open lines that end on the outline, and closed ones
   */
  List<Polyline> lines(double level) {
    int[] next = new int[sides];
    Arrays.fill(next, NONE);
    double[] x = new double[sides];
    double[] y = new double[sides];
    boolean[] entered = new boolean[sides];
    int[] from = new int[1];
    int[] crossed = new int[patch.triangles()];
    int count = 0;
    for (int t = 0; t < patch.triangles(); t++) {
      int to = cross(t, level, from, x, y);
      if (to != NONE) {
        next[from[0]] = to;
        entered[to] = true;
        crossed[count++] = from[0];
      }
    }
    List<Polyline> lines = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      if (!entered[crossed[i]]) {
        lines.add(follow(crossed[i], next, x, y));
      }
    }
    for (int i = 0; i < count; i++) {
      if (next[crossed[i]] != NONE) {
        lines.add(follow(crossed[i], next, x, y));
      }
    }
    return lines;
  }

  private static Polyline follow(int start, int[] next, double[] x, double[] y) {
    Polyline.Builder line = new Polyline.Builder();
    int at = start;
    while (true) {
      line.add(x[at], y[at]);
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
   * @return the side left through, or NONE if the level does not cross
   */
  private int cross(int t, double level, int[] from, double[] x, double[] y) {
    int high = 0;
    for (int k = 0; k < 3; k++) {
      if (patch.value(patch.corner(t, k)) >= level) {
        high |= 1 << k;
      }
    }
    if (high == 0 || high == 7) {
      return NONE;
    }
    boolean single = Integer.bitCount(high) == 1;
    int apex = Integer.numberOfTrailingZeros(single ? high : ~high & 7);
    int first = 3 * t + (apex + 2) % 3;
    int last = 3 * t + (apex + 1) % 3;
    place(t, (apex + 2) % 3, level, x, y);
    place(t, (apex + 1) % 3, level, x, y);
    from[0] = sideOf[single ? first : last];
    return sideOf[single ? last : first];
  }

  /** Puts the crossing of a side; the same from whichever triangle it is asked. */
  private void place(int t, int k, double level, double[] x, double[] y) {
    int p = patch.corner(t, (k + 1) % 3);
    int q = patch.corner(t, (k + 2) % 3);
    int a = Math.min(p, q);
    int b = Math.max(p, q);
    double part = (level - patch.value(a)) / (patch.value(b) - patch.value(a));
    int side = sideOf[3 * t + k];
    x[side] = patch.x(a) + part * (patch.x(b) - patch.x(a));
    y[side] = patch.y(a) + part * (patch.y(b) - patch.y(a));
  }

  /**
   * The region where the values are at or above a level.
   *
   * @param level the level
   * @return its rings, filled by the even-odd rule
   */
  List<Polyline> atOrAbove(double level) {
    Rings rings = new Rings(patch.vertices() + sides, 3 * patch.triangles());
    double[] x = new double[sides];
    double[] y = new double[sides];
    int[] from = new int[1];
    for (int t = 0; t < patch.triangles(); t++) {
      int to = cross(t, level, from, x, y);
      if (to != NONE) {
        rings.add(patch.vertices() + from[0], patch.vertices() + to);
      }
    }
    for (int s : outline) {
      int a = patch.corner(s / 3, (s % 3 + 1) % 3);
      int b = patch.corner(s / 3, (s % 3 + 2) % 3);
      boolean aHigh = patch.value(a) >= level;
      boolean bHigh = patch.value(b) >= level;
      if (aHigh || bHigh) {
        int crossing = patch.vertices() + sideOf[s];
        rings.add(aHigh ? a : crossing, bHigh ? b : crossing);
      }
    }
    return rings.collect(
        node -> node < patch.vertices() ? patch.x(node) : x[node - patch.vertices()],
        node -> node < patch.vertices() ? patch.y(node) : y[node - patch.vertices()]);
  }

  /** Directed pieces between nodes, as many leaving each node as arrive there. */
  private static final class Rings {
    private final int[] first;
    private int[] following;
    private int[] ends;
    private int[] starts;
    private int size;

    Rings(int nodes, int expected) {
      first = new int[nodes];
      Arrays.fill(first, NONE);
      following = new int[Math.max(16, expected)];
      ends = new int[following.length];
      starts = new int[following.length];
    }

    void add(int from, int to) {
      if (size == ends.length) {
        following = Arrays.copyOf(following, 2 * size);
        ends = Arrays.copyOf(ends, 2 * size);
        starts = Arrays.copyOf(starts, 2 * size);
      }
      starts[size] = from;
      ends[size] = to;
      following[size] = first[from];
      first[from] = size++;
    }

    List<Polyline> collect(
        java.util.function.IntToDoubleFunction x, java.util.function.IntToDoubleFunction y) {
      List<Polyline> rings = new ArrayList<>();
      for (int i = 0; i < size; i++) {
        int start = starts[i];
        while (first[start] != NONE) {
          Polyline.Builder ring = new Polyline.Builder();
          int at = start;
          while (first[at] != NONE) {
            ring.add(x.applyAsDouble(at), y.applyAsDouble(at));
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
