package coldseam.cli.plot;

import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** Marks and labels of single points: first all marks take their place, then the labels. */
final class PointMarks {
  private static final double ARM = 4;
  private static final double DIAMOND = 5;

  private final Canvas canvas;
  private final Panel panel;
  private final Ground ground;
  private final Optional<Box> elsewhere;
  private final List<Named> named = new ArrayList<>();

  /** A named point on the sheet. */
  private record Named(double x, double y, String text) {}

  /**
   * Prepares.
   *
   * @param canvas what it is drawn on
   * @param panel the frame
   * @param ground what is taken
   * @param elsewhere the part of the frame whose points are named in the zoom
   */
  PointMarks(Canvas canvas, Panel panel, Ground ground, Optional<Box> elsewhere) {
    this.elsewhere = elsewhere;
    this.canvas = canvas;
    this.panel = panel;
    this.ground = ground;
  }

  /** Adds a named point, if it is seen. */
  void add(double localX, double localY, String text) {
    double x = panel.x(localX);
    double y = panel.y(localY);
    if (panel.frame().contains(x, y)) {
      named.add(new Named(x, y, text));
    }
  }

  /** Draws all, with the texts that find room; the key has the others. */
  void draw() {
    for (Named point : named) {
      ground.keepClear(Box.around(point.x(), point.y(), 2 * ARM, 2 * ARM));
    }
    for (Named point : named) {
      if (elsewhere.isPresent() && elsewhere.get().contains(point.x(), point.y())) {
        continue;
      }
      Box size = Plates.size(List.of(point.text()), Lettering.SMALL);
      Optional<Box> place = place(ground, size, point.x(), point.y(), 5, 46, Ground.ANYWHERE);
      if (place.isPresent()) {
        Box box = place.get();
        if (!box.grown(12).contains(point.x(), point.y())) {
          Plates.leader(canvas, box, point.x(), point.y());
        }
        Plates.centred(canvas, List.of(point.text()), box, Lettering.SMALL, Lettering.SMALL);
      }
    }
    for (Named point : named) {
      cross(canvas, point.x(), point.y());
    }
  }

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

  /** A coldest point. */
  static void diamond(Canvas canvas, double x, double y) {
    Path2D diamond = new Path2D.Double();
    diamond.moveTo(x - DIAMOND, y);
    diamond.lineTo(x, y - DIAMOND);
    diamond.lineTo(x + DIAMOND, y);
    diamond.lineTo(x, y + DIAMOND);
    diamond.closePath();
    canvas.fill(diamond, Palette.PAPER);
    canvas.stroke(diamond, Palette.INK, new Pen(1.5f));
    canvas.fill(new Ellipse2D.Double(x - 1.3, y - 1.3, 2.6, 2.6), Palette.INK);
  }

  /**
   * Takes room for a plate near a point: on what is preferred, else off the lines of the section,
   * else anywhere.
   */
  static Optional<Box> place(
      Ground ground,
      Box size,
      double x,
      double y,
      double least,
      double most,
      IntPredicate preferred) {
    for (IntPredicate accepted : List.of(preferred, Ground.OFF_LINES, Ground.ANYWHERE)) {
      Optional<Box> place = ground.near(x, y, size.width(), size.height(), least, most, accepted);
      if (place.isPresent()) {
        ground.take(place.get());
        return place;
      }
    }
    return Optional.empty();
  }
}
