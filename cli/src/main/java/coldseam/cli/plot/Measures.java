package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.Color;
import java.awt.geom.Path2D;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** Dimension lines: beside what they measure, as near as nothing else is in the way. */
final class Measures {
  private static final double TIER = 16;
  private static final int TIERS = 9;
  private static final double TICK = 3.2;
  private static final double EXTENSION_GAP = 4;
  private static final double BEYOND = 3.5;
  private static final double LIFT = 3;

  private final Canvas canvas;
  private final Ground ground;
  private final IntPredicate open;

  /**
   * Prepares.
   *
   * @param canvas what it is drawn on
   * @param ground what is taken
   * @param open owners of squares a dimension line may run over
   */
  Measures(Canvas canvas, Ground ground, IntPredicate open) {
    this.canvas = canvas;
    this.ground = ground;
    this.open = open;
  }

  /**
   * Draws the dimension of a distance, to the right of the way from its first to its second point
   * on the sheet, or to its left.
   *
   * @param line the distance on the sheet
   * @param right on which side, 1 or −1; 0 for the side with more room
   * @param nearest distance of the nearest place tried, points
   * @param text what is written
   * @param lettering how, and in which colour
   */
  void single(Polyline line, int right, double nearest, String text, Lettering lettering) {
    chain(line, right, nearest, List.of(0.0, line.length()), List.of(text), lettering);
  }

  /**
   * Draws a chain of dimensions on one line.
   *
   * @param line what is measured, on the sheet
   * @param right on which side, 1 or −1; 0 for the side with more room
   * @param nearest distance of the nearest place tried, points
   * @param marks distances of the ticks from the start, points
   * @param texts one between every two ticks
   * @param lettering how, and in which colour
   */
  void chain(
      Polyline line,
      int right,
      double nearest,
      List<Double> marks,
      List<String> texts,
      Lettering lettering) {
    double length = line.length();
    if (length < 1) {
      return;
    }
    double ux = (line.x(1) - line.x(0)) / length;
    double uy = (line.y(1) - line.y(0)) / length;
    double offset = place(line, right, nearest, ux, uy);
    Color ink = lettering.ink();
    double ox = line.x(0) - offset * uy;
    double oy = line.y(0) + offset * ux;
    Path2D path = new Path2D.Double();
    path.moveTo(ox, oy);
    path.lineTo(ox + length * ux, oy + length * uy);
    Path2D extensions = new Path2D.Double();
    Path2D ticks = new Path2D.Double();
    double sign = Math.signum(offset);
    for (double mark : marks) {
      double x = line.x(0) + mark * ux;
      double y = line.y(0) + mark * uy;
      double from = EXTENSION_GAP * sign;
      double to = offset + BEYOND * sign;
      extensions.moveTo(x - from * uy, y + from * ux);
      extensions.lineTo(x - to * uy, y + to * ux);
      double cx = ox + mark * ux;
      double cy = oy + mark * uy;
      ticks.moveTo(cx - TICK * (ux - uy), cy - TICK * (uy + ux));
      ticks.lineTo(cx + TICK * (ux - uy), cy + TICK * (uy + ux));
    }
    canvas.stroke(extensions, Palette.mix(ink, Palette.PAPER, 0.45), Pen.HAIR);
    canvas.stroke(path, ink, Pen.FINE);
    canvas.stroke(ticks, ink, Pen.MEDIUM);
    ground.take(
        new Polyline.Builder()
            .add(ox - 2 * ux, oy - 2 * uy)
            .add(ox + (length + 2) * ux, oy + (length + 2) * uy)
            .open());
    for (int i = 0; i < texts.size(); i++) {
      double from = marks.get(i);
      double to = marks.get(i + 1);
      double mid = (from + to) / 2;
      write(texts.get(i), ox + mid * ux, oy + mid * uy, ux, uy, to - from, lettering);
    }
  }

  /** The signed distance to the right, on the sheet, where the line meets least. */
  private double place(Polyline line, int right, double nearest, double ux, double uy) {
    double best = Double.POSITIVE_INFINITY;
    double found = nearest * (right == 0 ? 1 : right);
    for (int tier = 0; tier < TIERS; tier++) {
      for (int side : right == 0 ? new int[] {1, -1} : new int[] {right}) {
        double offset = side * (nearest + tier * TIER);
        double blocked = 0;
        for (double lift : new double[] {-5, 0, 5, 10}) {
          double off = offset + lift * upwards(ux, uy);
          blocked +=
              ground.blocked(
                  Polyline.of(
                      line.x(0) - off * uy,
                      line.y(0) + off * ux,
                      line.x(1) - off * uy,
                      line.y(1) + off * ux),
                  open);
        }
        double score = blocked + 0.02 * tier;
        if (score < best) {
          best = score;
          found = offset;
        }
      }
    }
    return found;
  }

  /** Whether the text's side of a line along (ux, uy) is to its right (1) or left (−1). */
  private static double upwards(double ux, double uy) {
    double angle = readable(Math.atan2(uy, ux));
    return Math.cos(angle) * ux + Math.sin(angle) * uy > 0 ? -1 : 1;
  }

  /** The angle, or its opposite, at which text is read from below or from the right. */
  static double readable(double angle) {
    double turned = angle;
    while (turned > Math.PI / 2 - 1e-6) {
      turned -= Math.PI;
    }
    while (turned < -Math.PI / 2 - 1e-6) {
      turned += Math.PI;
    }
    return turned;
  }

  private void write(
      String text, double x, double y, double ux, double uy, double room, Lettering lettering) {
    double width = TextWidths.of(text, lettering);
    double angle = readable(Math.atan2(uy, ux));
    double upX = Math.sin(angle);
    double upY = -Math.cos(angle);
    if (width + 2 <= room) {
      canvas.text(text, x + LIFT * upX, y + LIFT * upY, lettering, Anchor.MIDDLE, angle);
      double cos = Math.cos(angle) * width / 2;
      double sin = Math.sin(angle) * width / 2;
      for (double lift : new double[] {4, 8, 11}) {
        ground.take(
            Polyline.of(
                x + lift * upX - cos,
                y + lift * upY - sin,
                x + lift * upX + cos,
                y + lift * upY + sin));
      }
      return;
    }
    double height = lettering.size() * 1.1;
    Optional<Box> place = ground.near(x, y, width + 2, height, 9, 90, open);
    if (place.isEmpty()) {
      place = ground.near(x, y, width + 2, height, 9, 140, any -> true);
    }
    place.ifPresent(
        box -> {
          ground.take(box);
          Plates.leader(canvas, box, x, y);
          canvas.text(
              text,
              box.midX(),
              box.midY() + lettering.size() * TextWidths.CAPITAL / 2,
              lettering,
              Anchor.MIDDLE);
        });
  }
}
