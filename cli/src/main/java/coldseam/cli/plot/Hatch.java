package coldseam.cli.plot;

import java.awt.geom.Path2D;
import java.util.Arrays;
import java.util.List;

/** Kinds of hatch, each drawn as one path of lines cut off at the rim of the face. */
enum Hatch {
  /** Nothing. */
  NONE,
  /** Parallel lines. */
  LINES,
  /** Pairs of parallel lines. */
  PAIRS,
  /** Parallel lines along the longest side, each third one broken: grain. */
  GRAIN,
  /** Parallel rows of dashes, every second shifted. */
  DASHES,
  /** Rows of dots, every second shifted. */
  DOTS,
  /** A zigzag as wide as the layer, or in rows. */
  ZIGZAG,
  /** Tufts of three strokes, turned in turns. */
  TUFTS,
  /** Short groups of three lines. */
  GLINTS,
  /** Both diagonals of the face. */
  CROSSED;

  private static final double WIDEST_ZIGZAG = 30;
  private static final double USUAL_PITCH = 9;
  private static final double DOT = 1;

  /** Marks are cut off this near to the rim of a face narrower than it is worth hatching. */
  private static final double NARROWEST = 3;

  /**
   * Adds the hatch of one face.
   *
   * @param rings of the face on the sheet, by the even-odd rule
   * @param whole the outer ring of the face where no frame cuts it off
   * @param look turn and pitch
   * @param path what it is added to
   */
  void append(List<Polyline> rings, Polyline whole, MaterialLook look, Path2D path) {
    if (this == NONE || rings.isEmpty()) {
      return;
    }
    boolean alongSide = this == GRAIN || this == ZIGZAG;
    Field field = new Field(rings, alongSide ? longestSide(whole) : -look.turn(), path);
    if (Math.min(field.box.width(), field.box.height()) < NARROWEST) {
      return;
    }
    double pitch = look.pitch();
    switch (this) {
      case LINES -> field.rows(pitch, 0, new double[0]);
      case PAIRS -> {
        field.rows(1.6 * pitch, 0, new double[0]);
        field.rows(1.6 * pitch, 0.4 * pitch, new double[0]);
      }
      case GRAIN -> {
        field.rows(2 * pitch, 0, new double[0]);
        field.rows(2 * pitch, pitch, new double[] {22, 7});
      }
      case DASHES -> field.rows(pitch, 0, new double[] {9, 6});
      case DOTS -> field.rows(0.6 * pitch, 0, new double[] {DOT, pitch - DOT});
      case ZIGZAG -> zigzag(field, pitch);
      case TUFTS -> field.groups(pitch, 7, true);
      case GLINTS -> field.groups(pitch, 6, false);
      default -> field.diagonals();
    }
  }

  private static void zigzag(Field field, double pitch) {
    double height = field.box.height();
    int rows = (int) Math.ceil(height / WIDEST_ZIGZAG);
    double row = height / rows;
    double half = Math.max(2.5, row * pitch / USUAL_PITCH * 0.36);
    for (int r = 0; r < rows; r++) {
      double low = field.box.y0() + r * row;
      int n = (int) Math.ceil(field.box.width() / half);
      for (int i = 0; i < n; i++) {
        double x = field.box.x0() + i * half;
        boolean up = i % 2 == 0;
        field.piece(x, up ? low : low + row, x + half, up ? low + row : low);
      }
    }
  }

  private static double longestSide(Polyline ring) {
    double most = -1;
    double angle = 0;
    for (int i = 0; i < ring.size(); i++) {
      double dx = ring.x(ring.after(i)) - ring.x(i);
      double dy = ring.y(ring.after(i)) - ring.y(i);
      if (Math.hypot(dx, dy) > most) {
        most = Math.hypot(dx, dy);
        angle = Math.atan2(dy, dx);
      }
    }
    return angle;
  }

  /** A face turned so that the rows of its hatch run along x. */
  private static final class Field {
    private final double[][] xs;
    private final double[][] ys;
    private final double cos;
    private final double sin;
    private final Path2D path;
    private final Box box;
    private double[] cuts = new double[8];

    Field(List<Polyline> rings, double turn, Path2D path) {
      this.path = path;
      cos = Math.cos(turn);
      sin = Math.sin(turn);
      xs = new double[rings.size()][];
      ys = new double[rings.size()][];
      Box bounds = Box.EMPTY;
      for (int r = 0; r < xs.length; r++) {
        Polyline ring = rings.get(r);
        xs[r] = new double[ring.size()];
        ys[r] = new double[ring.size()];
        for (int i = 0; i < ring.size(); i++) {
          xs[r][i] = ring.x(i) * cos + ring.y(i) * sin;
          ys[r][i] = ring.y(i) * cos - ring.x(i) * sin;
          bounds = bounds.with(xs[r][i], ys[r][i]);
        }
      }
      box = bounds;
    }

    /** Rows at multiples of the pitch, full lines or dashes and gaps by turns. */
    void rows(double pitch, double shift, double[] dashes) {
      int first = (int) Math.ceil((box.y0() - shift) / pitch);
      for (int k = first; k * pitch + shift < box.y1(); k++) {
        double y = k * pitch + shift;
        if (dashes.length == 0) {
          piece(box.x0() - 1, y, box.x1() + 1, y);
          continue;
        }
        double period = dashes[0] + dashes[1];
        double offset = k % 2 == 0 ? 0 : period / 2;
        double start = Math.floor((box.x0() - offset) / period) * period + offset;
        for (double x = start; x < box.x1(); x += period) {
          piece(x, y, x + dashes[0], y);
        }
      }
    }

    /** Groups of three strokes on a staggered grid. */
    void groups(double pitch, double length, boolean turning) {
      int row = 0;
      for (double y = box.y0() + pitch / 2; y < box.y1(); y += pitch * 0.8, row++) {
        int column = row;
        double x = box.x0() + pitch * (row % 2 == 0 ? 0.3 : 0.8);
        for (; x < box.x1(); x += pitch, column++) {
          double slant = turning && column % 2 == 0 ? -1 : 1;
          for (int k = -1; k <= 1; k++) {
            double across = k * 3.2;
            double half = length / 2 * (1 - 0.25 * Math.abs(k));
            if (turning) {
              piece(
                  x + across - half * 0.6,
                  y + slant * half * 0.6,
                  x + across + half * 0.6,
                  y - slant * half * 0.6);
            } else {
              piece(x - half, y + across, x + half, y + across);
            }
          }
        }
      }
    }

    void diagonals() {
      piece(box.x0(), box.y0(), box.x1(), box.y1());
      piece(box.x0(), box.y1(), box.x1(), box.y0());
    }

    /** Adds the parts of a straight piece that lie inside the face. */
    void piece(double ax, double ay, double bx, double by) {
      int n = 0;
      cuts[n++] = 0;
      for (int r = 0; r < xs.length; r++) {
        for (int i = 0; i < xs[r].length; i++) {
          int j = i + 1 == xs[r].length ? 0 : i + 1;
          double t = crossing(ax, ay, bx, by, xs[r][i], ys[r][i], xs[r][j], ys[r][j]);
          if (t > 0 && t < 1) {
            if (n + 2 > cuts.length) {
              cuts = Arrays.copyOf(cuts, 2 * cuts.length);
            }
            cuts[n++] = t;
          }
        }
      }
      cuts[n++] = 1;
      Arrays.sort(cuts, 0, n);
      for (int k = 0; k + 1 < n; k++) {
        double mid = (cuts[k] + cuts[k + 1]) / 2;
        if (cuts[k + 1] > cuts[k] && inside(ax + mid * (bx - ax), ay + mid * (by - ay))) {
          move(ax + cuts[k] * (bx - ax), ay + cuts[k] * (by - ay));
          line(ax + cuts[k + 1] * (bx - ax), ay + cuts[k + 1] * (by - ay));
        }
      }
    }

    private void move(double x, double y) {
      path.moveTo(x * cos - y * sin, x * sin + y * cos);
    }

    private void line(double x, double y) {
      path.lineTo(x * cos - y * sin, x * sin + y * cos);
    }

    private static double crossing(
        double ax, double ay, double bx, double by, double px, double py, double qx, double qy) {
      double sideP = (bx - ax) * (py - ay) - (by - ay) * (px - ax);
      double sideQ = (bx - ax) * (qy - ay) - (by - ay) * (qx - ax);
      if (sideP > 0 == sideQ > 0) {
        return -1;
      }
      double s = sideP / (sideP - sideQ);
      double x = px + s * (qx - px);
      double y = py + s * (qy - py);
      double dx = bx - ax;
      double dy = by - ay;
      return ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy);
    }

    private boolean inside(double x, double y) {
      boolean odd = false;
      for (int r = 0; r < xs.length; r++) {
        for (int i = 0; i < xs[r].length; i++) {
          int j = i + 1 == xs[r].length ? 0 : i + 1;
          if (ys[r][i] > y != ys[r][j] > y
              && x < xs[r][i] + (y - ys[r][i]) / (ys[r][j] - ys[r][i]) * (xs[r][j] - xs[r][i])) {
            odd = !odd;
          }
        }
      }
      return odd;
    }
  }
}
