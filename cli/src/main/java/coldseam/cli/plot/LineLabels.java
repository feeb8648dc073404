package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Path2D;
import java.util.List;

/** Writes the value of a contour on it, where it is straight enough and not crowded. */
final class LineLabels {
  private static final double STEP = 7;
  private static final int MOST_TRIED = 40;

  /** How far the line may leave its chord under a label, points. */
  private static final double BEND = 2.2;

  /** Shortest chord under a label, over its length along the line. */
  private static final double STRAIGHT = 0.94;

  /** More room than this is no better, points. */
  private static final double ENOUGH = 24;

  /** How much room the end of a line has to offer more than its middle, points. */
  private static final double TO_THE_MIDDLE = 8;

  /** Labels of so many characters or fewer are set level where there is room. */
  private static final int SHORT = 4;

  private final Canvas canvas;
  private final Ground ground;
  private final Spacing spacing;

  /** The distance from a contour to its neighbour at a point, points. */
  @FunctionalInterface
  interface Spacing {
    double at(double x, double y);
  }

  /** Of a contour without neighbours. */
  static final Spacing ALONE =
      new Spacing() {
        @Override
        public double at(double x, double y) {
          return Double.POSITIVE_INFINITY;
        }
      };

  /**
   * Where a label goes.
   *
   * @param x of its middle
   * @param y of its middle
   * @param turn clockwise, radians
   * @param score the higher the better
   */
  private record Place(double x, double y, double turn, double score) {}

  /**
   * Prepares.
   *
   * @param canvas what it is drawn on
   * @param ground what is taken
   * @param spacing how crowded the contours are
   */
  LineLabels(Canvas canvas, Ground ground, Spacing spacing) {
    this.canvas = canvas;
    this.ground = ground;
    this.spacing = spacing;
  }

  /**
   * Tries to write a label on one of the lines of a level.
   *
   * @param lines the lines of the level, on the sheet
   * @param text the label
   * @param lettering how it is set
   * @param leastSpacing how far the neighbours have to be
   * @return whether it was written
   */
  boolean write(List<Polyline> lines, String text, Lettering lettering, double leastSpacing) {
    double width = TextWidths.of(text, lettering) + 6;
    Place best = new Place(0, 0, 0, leastSpacing - TO_THE_MIDDLE);
    Place none = best;
    for (Polyline line : lines) {
      double slack = line.length() / 2 - width / 2 - 2;
      double step = Math.max(STEP, line.length() / MOST_TRIED);
      for (double off = 0; off < slack; off += step) {
        double part = off / slack;
        if (ENOUGH - TO_THE_MIDDLE * part <= best.score()) {
          break;
        }
        for (double at : new double[] {line.length() / 2 - off, line.length() / 2 + off}) {
          best = better(best, line, at, part, text, width, lettering, leastSpacing);
        }
      }
    }
    if (best == none) {
      return false;
    }
    plate(best, width, text, lettering);
    return true;
  }

  /** The place at a distance along a line, if it will do and is better than another. */
  private Place better(
      Place than,
      Polyline line,
      double at,
      double part,
      String text,
      double width,
      Lettering lettering,
      double leastSpacing) {
    double[] from = line.at(at - width / 2);
    double[] to = line.at(at + width / 2);
    double[] mid = line.at(at);
    double chord = Math.hypot(to[0] - from[0], to[1] - from[1]);
    if (chord < STRAIGHT * width || off(mid, from, to) > BEND) {
      return than;
    }
    double room = Math.min(ENOUGH, spacing.at(mid[0], mid[1]));
    double score = room - TO_THE_MIDDLE * part;
    double turn = Measures.readable(Math.atan2(to[1] - from[1], to[0] - from[0]));
    if (room < leastSpacing || score <= than.score() || !free(mid, width, turn, lettering)) {
      return than;
    }
    boolean level = text.length() <= SHORT && room >= width + 2 && free(mid, width, 0, lettering);
    return new Place(mid[0], mid[1], level ? 0 : turn, score);
  }

  private static double off(double[] p, double[] a, double[] b) {
    double dx = b[0] - a[0];
    double dy = b[1] - a[1];
    return Math.abs((p[0] - a[0]) * dy - (p[1] - a[1]) * dx) / Math.hypot(dx, dy);
  }

  private boolean free(double[] at, double width, double turn, Lettering lettering) {
    double half = lettering.size() / 2;
    for (double lift : new double[] {-half, -half / 2, 0, half / 2, half}) {
      if (ground.blocked(row(at[0], at[1], width, turn, lift), Ground.ANYWHERE) > 0) {
        return false;
      }
    }
    return true;
  }

  /** A line through a turned label, above or below its middle. */
  private static Polyline row(double x, double y, double width, double turn, double lift) {
    double dx = Math.cos(turn) * width / 2;
    double dy = Math.sin(turn) * width / 2;
    double cx = x - lift * Math.sin(turn);
    double cy = y + lift * Math.cos(turn);
    return Polyline.of(cx - dx, cy - dy, cx + dx, cy + dy);
  }

  private void plate(Place place, double width, String text, Lettering lettering) {
    double half = lettering.size() * 0.56;
    Polyline top = row(place.x(), place.y(), width, place.turn(), -half);
    Polyline bottom = row(place.x(), place.y(), width, place.turn(), half);
    Path2D plate = new Path2D.Double();
    plate.moveTo(top.x(0), top.y(0));
    plate.lineTo(top.x(1), top.y(1));
    plate.lineTo(bottom.x(1), bottom.y(1));
    plate.lineTo(bottom.x(0), bottom.y(0));
    plate.closePath();
    canvas.fill(plate, Palette.PAPER);
    double drop = lettering.size() * TextWidths.CAPITAL / 2;
    canvas.text(
        text,
        place.x() - drop * Math.sin(place.turn()),
        place.y() + drop * Math.cos(place.turn()),
        lettering,
        Anchor.MIDDLE,
        place.turn());
    for (double lift : new double[] {-half, -half / 2, 0, half / 2, half}) {
      ground.take(row(place.x(), place.y(), width, place.turn(), lift));
    }
  }
}
