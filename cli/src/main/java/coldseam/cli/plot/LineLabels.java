package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Path2D;
import java.util.List;

/** Writes the value of a contour along it, where it is straight enough and not crowded. */
final class LineLabels {
  private static final double STEP = 7;

  /** How far the line may leave its chord under a label, points. */
  private static final double BEND = 2.2;

  /** Labels of so many characters or fewer are set level where there is room. */
  private static final int SHORT = 4;

  private LineLabels() {}

  /** The distance from a contour to its neighbour at a point, points. */
  @FunctionalInterface
  interface Spacing {
    double at(double x, double y);
  }

  /**
   * Tries to write a label on one of the lines of a level.
   *
   * @param canvas what it is drawn on
   * @param ground what is taken
   * @param lines the lines of the level, on the sheet
   * @param text the label
   * @param lettering how it is set
   * @param spacing how crowded it is
   * @param leastSpacing how far the neighbours have to be
   * @return whether it was written
   */
  static boolean write(
      Canvas canvas,
      Ground ground,
      List<Polyline> lines,
      String text,
      Lettering lettering,
      Spacing spacing,
      double leastSpacing) {
    double width = TextWidths.of(text, lettering) + 6;
    double best = leastSpacing - 4;
    double[] found = null;
    for (Polyline line : lines) {
      double length = line.length();
      for (double at = width / 2 + 2; at < length - width / 2 - 2; at += STEP) {
        double[] from = SpaceLabels.at(line, at - width / 2);
        double[] to = SpaceLabels.at(line, at + width / 2);
        double[] mid = SpaceLabels.at(line, at);
        double chord = Math.hypot(to[0] - from[0], to[1] - from[1]);
        if (chord < 0.94 * width || off(mid, from, to) > BEND) {
          continue;
        }
        double room = Math.min(24, spacing.at(mid[0], mid[1]));
        double score = room - 4 * Math.abs(at / length - 0.5);
        if (room >= leastSpacing && score > best && free(ground, from, to, lettering)) {
          best = score;
          boolean level =
              text.length() <= SHORT && room >= width + 2 && flat(ground, mid, width, lettering);
          double turn = level ? 0 : Math.atan2(to[1] - from[1], to[0] - from[0]);
          found = new double[] {mid[0], mid[1], turn};
        }
      }
    }
    if (found == null) {
      return false;
    }
    plate(canvas, ground, found, width, text, lettering);
    return true;
  }

  private static boolean flat(Ground ground, double[] at, double width, Lettering lettering) {
    return free(
        ground,
        new double[] {at[0] - width / 2, at[1]},
        new double[] {at[0] + width / 2, at[1]},
        lettering);
  }

  private static double off(double[] p, double[] a, double[] b) {
    double dx = b[0] - a[0];
    double dy = b[1] - a[1];
    return Math.abs((p[0] - a[0]) * dy - (p[1] - a[1]) * dx) / Math.hypot(dx, dy);
  }

  private static boolean free(Ground ground, double[] a, double[] b, Lettering lettering) {
    double length = Math.hypot(b[0] - a[0], b[1] - a[1]);
    double nx = -(b[1] - a[1]) / length;
    double ny = (b[0] - a[0]) / length;
    for (double side : new double[] {-0.5, 0, 0.5}) {
      double lift = side * lettering.size();
      Polyline line =
          Polyline.of(a[0] + lift * nx, a[1] + lift * ny, b[0] + lift * nx, b[1] + lift * ny);
      if (ground.blocked(line, owner -> true) > 0) {
        return false;
      }
    }
    return true;
  }

  private static void plate(
      Canvas canvas, Ground ground, double[] at, double width, String text, Lettering lettering) {
    double angle = Measures.readable(at[2]);
    double cos = Math.cos(angle);
    double sin = Math.sin(angle);
    double half = lettering.size() * 0.56;
    double[][] corners = {
      {-width / 2, -half}, {width / 2, -half}, {width / 2, half}, {-width / 2, half}
    };
    Path2D plate = new Path2D.Double();
    for (int i = 0; i < 4; i++) {
      double x = at[0] + corners[i][0] * cos - corners[i][1] * sin;
      double y = at[1] + corners[i][0] * sin + corners[i][1] * cos;
      if (i == 0) {
        plate.moveTo(x, y);
      } else {
        plate.lineTo(x, y);
      }
    }
    plate.closePath();
    canvas.fill(plate, Palette.PAPER);
    double drop = lettering.size() * TextWidths.CAPITAL / 2;
    canvas.text(text, at[0] - drop * sin, at[1] + drop * cos, lettering, Anchor.MIDDLE, angle);
    for (double lift : new double[] {-half, 0, half}) {
      ground.take(
          Polyline.of(
              at[0] - width / 2 * cos - lift * sin,
              at[1] - width / 2 * sin + lift * cos,
              at[0] + width / 2 * cos - lift * sin,
              at[1] + width / 2 * sin + lift * cos));
    }
  }
}
