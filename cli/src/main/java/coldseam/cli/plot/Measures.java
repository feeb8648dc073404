package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Path2D;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** Dimension lines: beside what they measure, as near as nothing else is in the way. */
final class Measures {
  private static final double TIER = 16;
  private static final int TIERS = 9;

  /** How much of a line may be blocked rather than lie one tier farther away. */
  private static final double AWAY = 0.02;

  private static final double TICK = 3.2;
  private static final double EXTENSION_GAP = 4;
  private static final double BEYOND = 3.5;
  private static final double LIFT = 3;

  /** Just beside a surface, points. */
  private static final double CLOSE = 5;

  private static final double[] LIFTS = {5, 9};

  /** Where along its line a text is tried, as parts of the room from the middle on. */
  private static final double[] SHIFTS = {0, 0.15, -0.15, 0.3, -0.3, 0.45, -0.45};

  /** How much of a text may be blocked rather than move it by all the room. */
  private static final double SHIFTED = 0.05;

  /** Steeper than this, text is read from the right. */
  private static final double STEEP = Math.toRadians(75);

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
    lines(line, offset, marks, lettering.ink());
    double ox = line.x(0) - offset * uy;
    double oy = line.y(0) + offset * ux;
    for (boolean fitting : new boolean[] {true, false}) {
      for (int i = 0; i < texts.size(); i++) {
        double from = marks.get(i);
        double to = marks.get(i + 1);
        if (TextWidths.of(texts.get(i), lettering) + 2 <= to - from == fitting) {
          Polyline piece = Polyline.of(ox + from * ux, oy + from * uy, ox + to * ux, oy + to * uy);
          boolean lone = texts.size() == 1;
          if (!along(piece, texts.get(i), lettering, fitting, lone)) {
            beside(piece, texts.get(i), lettering);
          }
        }
      }
    }
    ground.take(
        Polyline.of(ox - 2 * ux, oy - 2 * uy, ox + (length + 2) * ux, oy + (length + 2) * uy));
  }

  /** The dimension line with its ticks and extension lines. */
  private void lines(Polyline line, double offset, List<Double> marks, Colour ink) {
    double length = line.length();
    double ux = (line.x(1) - line.x(0)) / length;
    double uy = (line.y(1) - line.y(0)) / length;
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
  }

  /** The signed distance to the right, on the sheet, where the line meets least. */
  private double place(Polyline line, int right, double nearest, double ux, double uy) {
    int[] sides = right == 0 ? openSides(line, ux, uy) : new int[] {right};
    double best = Double.POSITIVE_INFINITY;
    double found = nearest * sides[0];
    for (int tier = 0; tier < TIERS && best > AWAY * tier; tier++) {
      for (int side : sides) {
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
        double score = blocked + AWAY * tier;
        if (score < best) {
          best = score;
          found = offset;
        }
      }
    }
    return found;
  }

  /** The side of a surface that is open, or both sides of a line that runs elsewhere. */
  private int[] openSides(Polyline line, double ux, double uy) {
    double[] blocked = new double[2];
    for (int side = 0; side < 2; side++) {
      double off = side == 0 ? CLOSE : -CLOSE;
      blocked[side] =
          ground.strange(
              Polyline.of(
                  line.x(0) - off * uy,
                  line.y(0) + off * ux,
                  line.x(1) - off * uy,
                  line.y(1) + off * ux),
              open);
    }
    if (Math.abs(blocked[0] - blocked[1]) < 0.5) {
      return new int[] {1, -1};
    }
    return new int[] {blocked[0] < blocked[1] ? 1 : -1};
  }

  /** Whether the text's side of a line along (ux, uy) is to its right (1) or left (−1). */
  private static double upwards(double ux, double uy) {
    double angle = readable(Math.atan2(uy, ux));
    return Math.cos(angle) * ux + Math.sin(angle) * uy > 0 ? -1 : 1;
  }

  /** The angle, or its opposite, at which text is read from below or from the right. */
  static double readable(double angle) {
    double turned = angle;
    while (turned > STEEP) {
      turned -= Math.PI;
    }
    while (turned <= STEEP - Math.PI) {
      turned += Math.PI;
    }
    return turned;
  }

  /**
   * Writes a text above its piece of the line, in the middle or where nothing is in the way; one
   * that is longer than its piece only if it is alone and nothing at all is in the way.
   */
  private boolean along(
      Polyline piece, String text, Lettering lettering, boolean fitting, boolean lone) {
    if (!fitting && !lone) {
      return false;
    }
    double width = TextWidths.of(text, lettering);
    double slack = Math.max(0, piece.length() - width - 8);
    double best = Double.POSITIVE_INFINITY;
    double at = piece.length() / 2;
    for (double part : SHIFTS) {
      double middle = piece.length() / 2 + part * slack;
      double score = SHIFTED * Math.abs(part);
      for (double lift : LIFTS) {
        score += ground.blocked(row(piece, middle, width, lift), open);
      }
      if (score < best) {
        best = score;
        at = middle;
      }
    }
    if (!fitting && best >= SHIFTED) {
      return false;
    }
    Polyline base = row(piece, at, width, LIFT);
    canvas.text(
        text,
        (base.x(0) + base.x(1)) / 2,
        (base.y(0) + base.y(1)) / 2,
        lettering,
        Anchor.MIDDLE,
        readable(Math.atan2(piece.y(1) - piece.y(0), piece.x(1) - piece.x(0))));
    for (double lift : LIFTS) {
      ground.take(row(piece, at, width, lift));
    }
    return true;
  }

  /** A line as long as a text, lifted to the text's side of a piece. */
  private static Polyline row(Polyline piece, double middle, double width, double lift) {
    double ux = (piece.x(1) - piece.x(0)) / piece.length();
    double uy = (piece.y(1) - piece.y(0)) / piece.length();
    double angle = readable(Math.atan2(uy, ux));
    double x = piece.x(0) + lift * Math.sin(angle);
    double y = piece.y(0) - lift * Math.cos(angle);
    return Polyline.of(
        x + (middle - width / 2) * ux,
        y + (middle - width / 2) * uy,
        x + (middle + width / 2) * ux,
        y + (middle + width / 2) * uy);
  }

  /** Writes a text that is longer than its piece of the line beside it, with a leader. */
  private void beside(Polyline piece, String text, Lettering lettering) {
    double x = (piece.x(0) + piece.x(1)) / 2;
    double y = (piece.y(0) + piece.y(1)) / 2;
    double width = TextWidths.of(text, lettering) + 2;
    double height = lettering.size() * 1.1;
    Optional<Box> place = ground.near(x, y, width, height, 5, 90, open);
    if (place.isEmpty()) {
      place = ground.near(x, y, width, height, 5, 140, Ground.ANYWHERE);
    }
    if (place.isPresent()) {
      Box box = place.get();
      ground.take(box);
      Plates.leader(canvas, box, x, y);
      canvas.text(
          text,
          box.midX(),
          box.midY() + lettering.size() * TextWidths.CAPITAL / 2,
          lettering,
          Anchor.MIDDLE);
    }
  }
}
