package coldseam.cli.plot;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/**
 * A coarse map of a frame: which face of the section lies under each square, and which squares are
 * taken by something written. Labels are placed on it, so that none covers another.
 */
final class Ground {
  /** Nothing is laid here. */
  static final int OPEN = -1;

  /** A line of the drawing passes here. */
  static final int EDGE = -2;

  /** Accepts every square. */
  static final IntPredicate ANYWHERE =
      new IntPredicate() {
        @Override
        public boolean test(int owner) {
          return true;
        }
      };

  /** Accepts every square that no line of the drawing passes. */
  static final IntPredicate OFF_LINES =
      new IntPredicate() {
        @Override
        public boolean test(int owner) {
          return owner != EDGE;
        }
      };

  private static final double SQUARE = 4;

  /** Kept clear of labels, but a leader may cross. */
  private static final byte KEPT = 1;

  /** Something is written or drawn here. */
  private static final byte WRITTEN = 2;

  private static final int DIRECTIONS = 16;

  /** Cosine of the steepest direction in which a box begins with a corner, not with a side. */
  private static final double LEVEL = 0.35;

  /** Squares of owners not accepted that a leader may cross: it ends inside a face. */
  private static final int MOST_STRANGE = 4;

  private final Box frame;
  private final int columns;
  private final int rows;
  private final int[] owners;
  private final byte[] taken;

  Ground(Box frame) {
    this.frame = frame;
    columns = (int) Math.floor(frame.width() / SQUARE);
    rows = (int) Math.floor(frame.height() / SQUARE);
    owners = new int[columns * rows];
    taken = new byte[columns * rows];
    Arrays.fill(owners, OPEN);
  }

  /**
   * Marks the squares that lie wholly inside rings.
   *
   * @param rings on the sheet, by the even-odd rule
   * @param owner their new owner, 0 or more
   * @param edged whether their lines are drawn, so that they are EDGE
   */
  void paint(List<Polyline> rings, int owner, boolean edged) {
    double[] crossings = new double[16];
    for (int row = 0; row < rows; row++) {
      double y = frame.y0() + (row + 0.5) * SQUARE;
      int n = 0;
      for (Polyline ring : rings) {
        for (int i = 0; i < ring.size(); i++) {
          int j = ring.after(i);
          if (ring.y(i) > y != ring.y(j) > y) {
            if (n == crossings.length) {
              crossings = Arrays.copyOf(crossings, 2 * n);
            }
            double t = (y - ring.y(i)) / (ring.y(j) - ring.y(i));
            crossings[n++] = ring.x(i) + t * (ring.x(j) - ring.x(i));
          }
        }
      }
      Arrays.sort(crossings, 0, n);
      for (int k = 0; k + 1 < n; k += 2) {
        int from = Math.max(0, (int) Math.ceil((crossings[k] - frame.x0()) / SQUARE - 0.5));
        int to = Math.min(columns, (int) Math.ceil((crossings[k + 1] - frame.x0()) / SQUARE - 0.5));
        for (int column = from; column < to; column++) {
          owners[row * columns + column] = owner;
        }
      }
    }
    if (edged) {
      for (Polyline ring : rings) {
        for (int square : squares(ring)) {
          owners[square] = EDGE;
        }
      }
    }
  }

  /** Takes the squares that a line passes through. */
  void take(Polyline line) {
    for (int square : squares(line)) {
      taken[square] = WRITTEN;
    }
  }

  /** The squares that a line passes through, in order, each as often as steps end in it. */
  private int[] squares(Polyline line) {
    int[] squares = new int[32];
    int count = 0;
    for (Polyline part : Clip.line(line, frame)) {
      for (int i = 0; i < part.pieces(); i++) {
        int j = part.after(i);
        double dx = part.x(j) - part.x(i);
        double dy = part.y(j) - part.y(i);
        int steps = 1 + (int) (2 * Math.hypot(dx, dy) / SQUARE);
        for (int s = 0; s <= steps; s++) {
          int square = square(part.x(i) + dx * s / steps, part.y(i) + dy * s / steps);
          if (square >= 0) {
            if (count == squares.length) {
              squares = Arrays.copyOf(squares, 2 * count);
            }
            squares[count++] = square;
          }
        }
      }
    }
    return Arrays.copyOf(squares, count);
  }

  private int square(double x, double y) {
    int column = (int) Math.floor((x - frame.x0()) / SQUARE);
    int row = (int) Math.floor((y - frame.y0()) / SQUARE);
    return column < 0 || row < 0 || column >= columns || row >= rows ? -1 : row * columns + column;
  }

  /** The owner of the square at a point: a face, OPEN or EDGE; EDGE outside the frame. */
  int owner(double x, double y) {
    int square = square(x, y);
    return square < 0 ? EDGE : owners[square];
  }

  /** Takes every square that a box touches. */
  void take(Box box) {
    mark(box, WRITTEN);
  }

  /** Keeps labels, but not leaders, off every square that a box touches. */
  void keepClear(Box box) {
    mark(box, KEPT);
  }

  private void mark(Box box, byte as) {
    int c0 = Math.max(0, (int) Math.floor((box.x0() - frame.x0()) / SQUARE));
    int c1 = Math.min(columns - 1, (int) Math.floor((box.x1() - frame.x0()) / SQUARE));
    int r0 = Math.max(0, (int) Math.floor((box.y0() - frame.y0()) / SQUARE));
    int r1 = Math.min(rows - 1, (int) Math.floor((box.y1() - frame.y0()) / SQUARE));
    for (int row = r0; row <= r1; row++) {
      for (int column = c0; column <= c1; column++) {
        int square = row * columns + column;
        taken[square] = (byte) Math.max(taken[square], as);
      }
    }
  }

  /** Whether a box lies in the frame, on squares that are not taken and have accepted owners. */
  boolean free(Box box, IntPredicate accepted) {
    int c0 = (int) Math.floor((box.x0() - frame.x0()) / SQUARE);
    int c1 = (int) Math.floor((box.x1() - frame.x0()) / SQUARE);
    int r0 = (int) Math.floor((box.y0() - frame.y0()) / SQUARE);
    int r1 = (int) Math.floor((box.y1() - frame.y0()) / SQUARE);
    if (c0 < 0 || r0 < 0 || c1 >= columns || r1 >= rows) {
      return false;
    }
    for (int row = r0; row <= r1; row++) {
      for (int column = c0; column <= c1; column++) {
        int square = row * columns + column;
        if (taken[square] != 0 || !accepted.test(owners[square])) {
          return false;
        }
      }
    }
    return true;
  }

  /** The share of the squares along a line whose owner is not accepted. */
  double strange(Polyline line, IntPredicate accepted) {
    int[] squares = squares(line);
    int strange = 0;
    for (int square : squares) {
      strange += accepted.test(owners[square]) ? 0 : 1;
    }
    return squares.length == 0 ? 1 : (double) strange / squares.length;
  }

  /**
   * The share of the squares along a line that are taken or have an owner not accepted, and 1 if it
   * leaves the frame.
   */
  double blocked(Polyline line, IntPredicate accepted) {
    for (int i = 0; i < line.size(); i++) {
      if (!frame.contains(line.x(i), line.y(i))) {
        return 1;
      }
    }
    int[] squares = squares(line);
    int blocked = 0;
    for (int square : squares) {
      blocked += taken[square] != 0 || !accepted.test(owners[square]) ? 1 : 0;
    }
    return squares.length == 0 ? 1 : (double) blocked / squares.length;
  }

  /**
   * Room for a box inside a face, as near as can be to the middle of what is left of it, with as
   * much air around it as can be had.
   *
   * @param owner the face
   * @param within a box around the face
   * @param width of the box
   * @param height of the box
   */
  Optional<Box> within(int owner, Box within, double width, double height) {
    int c0 = Math.max(0, (int) Math.floor((within.x0() - frame.x0()) / SQUARE));
    int c1 = Math.min(columns, (int) Math.ceil((within.x1() - frame.x0()) / SQUARE));
    int r0 = Math.max(0, (int) Math.floor((within.y0() - frame.y0()) / SQUARE));
    int r1 = Math.min(rows, (int) Math.ceil((within.y1() - frame.y0()) / SQUARE));
    int across = c1 - c0;
    int down = r1 - r0;
    if (across * SQUARE < width || down * SQUARE < height) {
      return Optional.empty();
    }
    int[] sums = new int[(across + 1) * (down + 1)];
    double sumX = 0;
    double sumY = 0;
    int count = 0;
    for (int row = 0; row < down; row++) {
      int inRow = 0;
      int square = (row + r0) * columns + c0;
      int sum = (row + 1) * (across + 1) + 1;
      for (int column = 0; column < across; column++, square++, sum++) {
        if (owners[square] == owner && taken[square] == 0) {
          inRow++;
          sumX += column;
          sumY += row;
          count++;
        }
        sums[sum] = sums[sum - across - 1] + inRow;
      }
    }
    if (count * SQUARE * SQUARE < width * height) {
      return Optional.empty();
    }
    double x = frame.x0() + c0 * SQUARE;
    double y = frame.y0() + r0 * SQUARE;
    for (double air : new double[] {12, 6, 2, 0}) {
      int w = (int) Math.ceil((width + 2 * air) / SQUARE);
      int h = (int) Math.ceil((height + 2 * air) / SQUARE);
      int found = nearest(sums, across, w, h, sumX / count, sumY / count);
      if (found >= 0) {
        double middleX = x + (found % (across + 1) + w / 2.0) * SQUARE;
        double middleY = y + (found / (across + 1) + h / 2.0) * SQUARE;
        return Optional.of(Box.around(middleX, middleY, width, height));
      }
    }
    return Optional.empty();
  }

  /** Index in the sums of the first corner of the w × h squares all inside, or −1. */
  private static int nearest(int[] sums, int across, int w, int h, double middleX, double middleY) {
    int stride = across + 1;
    int rows = sums.length / stride - 1;
    double best = Double.POSITIVE_INFINITY;
    int found = -1;
    for (int row = 0; row + h <= rows; row++) {
      double dy = row + h / 2.0 - middleY;
      int at = row * stride;
      for (int column = 0; column + w <= across; column++, at++) {
        int below = at + h * stride;
        if (sums[below + w] - sums[at + w] - sums[below] + sums[at] == w * h) {
          double dx = column + w / 2.0 - middleX;
          if (dx * dx + dy * dy < best) {
            best = dx * dx + dy * dy;
            found = at;
          }
        }
      }
    }
    return found;
  }

  /**
   * Whether a leader from the middle of a box to a point crosses nothing written but at the point,
   * and not much but accepted owners.
   */
  private boolean clear(Box box, double x, double y, IntPredicate accepted) {
    int last = -1;
    int strange = 0;
    for (int square : squares(Polyline.of(box.midX(), box.midY(), x, y))) {
      if (taken[square] == WRITTEN && far(square, x, y)) {
        return false;
      }
      if (square != last && !accepted.test(owners[square])) {
        strange++;
      }
      last = square;
    }
    return strange <= MOST_STRANGE;
  }

  /** Whether a square is not the one at a point, nor next to it. */
  private boolean far(int square, double x, double y) {
    double dx = frame.x0() + (square % columns + 0.5) * SQUARE - x;
    double dy = frame.y0() + (square / columns + 0.5) * SQUARE - y;
    return Math.max(Math.abs(dx), Math.abs(dy)) > 2 * SQUARE;
  }

  /**
   * Room for a box near a point, such that a leader to the point crosses nothing written.
   *
   * @param x of the point
   * @param y of the point
   * @param width of the box
   * @param height of the box
   * @param least how far the box stays away, at least
   * @param most how far it may go away
   * @param accepted the owners it may lie on
   */
  Optional<Box> near(
      double x,
      double y,
      double width,
      double height,
      double least,
      double most,
      IntPredicate accepted) {
    for (double away = least; away <= most; away += 6) {
      for (int k = 0; k < DIRECTIONS; k++) {
        double angle =
            2 * Math.PI / DIRECTIONS * ((k + 1) / 2 * (k % 2 == 0 ? 1 : -1)) - Math.PI / 4;
        double cos = Math.cos(angle);
        double sin = Math.sin(angle);
        double middleX = x + away * cos + width / 2 * Math.max(-1, Math.min(1, cos / LEVEL));
        double middleY = y + away * sin + height / 2 * Math.max(-1, Math.min(1, sin / LEVEL));
        Box box = Box.around(middleX, middleY, width, height);
        if (free(box, accepted) && clear(box, x, y, accepted)) {
          return Optional.of(box);
        }
      }
    }
    return Optional.empty();
  }
}
