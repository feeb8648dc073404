package coldseam.cli.plot;

import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Finds the part of a drawing that deserves to be shown larger: where most of its inner corners
 * crowd together, when that is much smaller than the whole.
 */
final class Zoom {
  /** Part of the inner corners that the zoom has to show. */
  private static final double MOST = 0.6;

  /** Largest part of the extent of the drawing that is worth a zoom. */
  private static final double LARGEST = 0.4;

  private static final double[] TRIED = {0.02, 0.04, 0.08, 0.15, 0.25, 0.34};
  private static final int FEWEST_CORNERS = 4;
  private static final int MOST_CORNERS = 1500;
  private static final double AIR = 0.35;

  private Zoom() {}

  static Optional<Box> of(DrawnSection section) {
    List<double[]> corners = section.innerCorners();
    int n = corners.size();
    if (n < FEWEST_CORNERS || n > MOST_CORNERS) {
      return Optional.empty();
    }
    double extent = section.extentM();
    for (double part : TRIED) {
      Box best = null;
      int most = 0;
      for (double[] centre : corners) {
        Box window = Box.around(centre[0], centre[1], part * extent, part * extent);
        int inside = 0;
        Box tight = Box.EMPTY;
        for (double[] corner : corners) {
          if (window.contains(corner[0], corner[1])) {
            inside++;
            tight = tight.with(corner[0], corner[1]);
          }
        }
        if (inside > most) {
          most = inside;
          best = tight;
        }
      }
      if (most >= MOST * n && best != null) {
        return worthwhile(best, section);
      }
    }
    return Optional.empty();
  }

  private static Optional<Box> worthwhile(Box corners, DrawnSection section) {
    double size = Math.max(corners.width(), corners.height());
    Box zoom = corners.grown(AIR * size);
    double least = 0.01 * section.extentM();
    if (size <= 0 || Math.max(zoom.width(), zoom.height()) > LARGEST * section.extentM()) {
      return Optional.empty();
    }
    return Optional.of(
        Box.around(
            zoom.midX(),
            zoom.midY(),
            Math.max(least, zoom.width()),
            Math.max(least, zoom.height())));
  }

  /** Shows in the whole drawing what is zoomed. */
  static void mark(Canvas canvas, Panel whole, Panel zoom) {
    canvas.layer("zoom-mark");
    Box box = whole.on(zoom.window());
    Rectangle2D frame =
        new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height());
    canvas.stroke(frame, Palette.PAPER, new Pen(2.6f));
    canvas.stroke(frame, Palette.INK, Pen.MEDIUM);
    Path2D ties = new Path2D.Double();
    Box below = zoom.frame();
    boolean beside = below.x0() >= whole.frame().x1();
    ties.append(
        new Line2D.Double(
            beside ? box.x1() : box.x0(),
            beside ? box.y0() : box.y1(),
            below.x0(),
            below.y0()),
        false);
    ties.append(
        new Line2D.Double(
            box.x1(), box.y1(), beside ? below.x0() : below.x1(), beside ? below.y1() : below.y0()),
        false);
    canvas.stroke(ties, Palette.SECOND_INK, new Pen(0.6f, 3, 3));
  }

  /** Where the words of a zoom stand. */
  static Box words(Panel zoom) {
    return new Box(
        zoom.frame().x0(), zoom.frame().y0(), zoom.frame().x0() + 116, zoom.frame().y0() + 22);
  }

  /** Frames the zoom and says how much larger it is. */
  static void frame(Canvas canvas, Panel whole, Panel zoom) {
    canvas.layer("zoom-frame");
    Box box = zoom.frame();
    canvas.stroke(
        new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()),
        Palette.INK,
        Pen.MEDIUM);
    double times = zoom.pointsPerM() / whole.pointsPerM();
    Plates.write(
        canvas,
        String.format(Locale.ROOT, "%.1f times larger", times),
        box.x0() + 6,
        box.y0() + 15,
        Lettering.SMALL_STRONG);
  }
}
