package coldseam.cli.plot;

import java.awt.geom.Path2D;
import java.util.List;
import java.util.Optional;

/** Marks and labels of single points. */
final class PointMarks {
  private static final double ARM = 4;
  private static final double DIAMOND = 5;

  private PointMarks() {}

  /** A named point. */
  static void cross(Canvas canvas, double x, double y) {
    Path2D cross = new Path2D.Double();
    cross.moveTo(x - ARM, y);
    cross.lineTo(x + ARM, y);
    cross.moveTo(x, y - ARM);
    cross.lineTo(x, y + ARM);
    canvas.stroke(cross, Palette.PAPER, new Pen(2.8f));
    canvas.stroke(cross, Palette.INK, Pen.MEDIUM);
  }

  /** A coldest or warmest point. */
  static void diamond(Canvas canvas, double x, double y) {
    Path2D diamond = new Path2D.Double();
    diamond.moveTo(x - DIAMOND, y);
    diamond.lineTo(x, y - DIAMOND);
    diamond.lineTo(x + DIAMOND, y);
    diamond.lineTo(x, y + DIAMOND);
    diamond.closePath();
    canvas.fill(diamond, Palette.PAPER);
    canvas.stroke(diamond, Palette.INK, new Pen(1.5f));
    Path2D dot = new Path2D.Double();
    dot.append(new java.awt.geom.Ellipse2D.Double(x - 1.3, y - 1.3, 2.6, 2.6), false);
    canvas.fill(dot, Palette.INK);
  }

  /** The name of a point beside it; left out where there is no room, the key has it. */
  static void name(Canvas canvas, Ground ground, String name, double x, double y) {
    Optional<Box> place = label(ground, List.of(name), Lettering.SMALL, x, y, 5, 40);
    place.ifPresent(
        box -> {
          boolean far = Math.hypot(box.midX() - x, box.midY() - y) > 8 + box.width() / 2 + 6;
          if (far) {
            Plates.leader(canvas, box, x, y);
          }
          Plates.centred(canvas, List.of(name), box, Lettering.SMALL, Lettering.SMALL);
        });
  }

  /** Takes room for lines near a point. */
  static Optional<Box> label(
      Ground ground,
      List<String> lines,
      Lettering lettering,
      double x,
      double y,
      double least,
      double most) {
    Box size = Plates.size(lines, lettering);
    Optional<Box> place =
        ground.near(
            x, y, size.width(), size.height(), least, most, owner -> owner != Ground.EDGE);
    if (place.isEmpty()) {
      place = ground.near(x, y, size.width(), size.height(), least, most, owner -> true);
    }
    place.ifPresent(ground::take);
    return place;
  }
}
