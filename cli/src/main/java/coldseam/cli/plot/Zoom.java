package coldseam.cli.plot;

import coldseam.cli.text.Digits;
import java.awt.geom.Rectangle2D;
import java.util.List;
import java.util.Optional;

/**
 * Finds the part of a drawing that deserves to be shown larger: where most of its inner corners
 * crowd together, when that is much smaller than the whole; or the middle of something slender.
 */
final class Zoom {
  /** Part of the inner corners that the zoom has to show, at least. */
  private static final double MOST = 0.6;

  /** Largest part of the extent of the drawing that is worth a zoom. */
  private static final double LARGEST = 0.45;

  private static final double[] TRIED = {0.02, 0.04, 0.08, 0.15, 0.25, 0.34};
  private static final int FEWEST_CORNERS = 4;
  private static final int MOST_CORNERS = 1500;
  private static final double AIR = 0.3;

  /** Sections of less than this, breadth over length, are always zoomed. */
  private static final double SLENDER = 0.05;

  private static final double TAG = 15;

  private Zoom() {}

  static Optional<Box> of(DrawnSection section) {
    List<double[]> corners = section.innerCorners();
    int n = corners.size();
    if (n < FEWEST_CORNERS || n > MOST_CORNERS) {
      return ofSlender(section.bounds());
    }
    double extent = section.extentM();
    Box found = null;
    double bestScore = 0;
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
      // Much in view and much larger: one against the other.
      double score = (double) most / n * Math.log(1 / part);
      if (most >= MOST * n && score > bestScore) {
        bestScore = score;
        found = best;
      }
    }
    Optional<Box> crowd = found == null ? Optional.empty() : worthwhile(found, section);
    return crowd.isPresent() ? crowd : ofSlender(section.bounds());
  }

  /** The middle of a section that is so slender that nothing of it can be told apart. */
  private static Optional<Box> ofSlender(Box all) {
    double across = Math.min(all.width(), all.height());
    if (across > SLENDER * Math.max(all.width(), all.height())) {
      return Optional.empty();
    }
    double grown = (1 + 2 * AIR) * across;
    return Optional.of(Box.around(all.midX(), all.midY(), grown, grown));
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

  /** Keeps labels off the lines that show in the whole drawing what is zoomed. */
  static void keepClear(Ground ground, Panel whole, Panel zoom) {
    Box box = whole.on(zoom.window());
    ground.take(
        new Polyline.Builder()
            .add(box.x0(), box.y0())
            .add(box.x1(), box.y0())
            .add(box.x1(), box.y1())
            .add(box.x0(), box.y1())
            .closed());
    ground.take(tag(box, whole));
  }

  /** The place of the letter: on the frame, or in it where there is no room above. */
  private static Box tag(Box box, Panel whole) {
    double y = box.y0() - TAG < whole.frame().y0() ? box.y0() + TAG : box.y0();
    return new Box(box.x0(), y - TAG, box.x0() + TAG, y);
  }

  /** Shows in the whole drawing what is zoomed. */
  static void mark(Canvas canvas, Panel whole, Panel zoom) {
    canvas.layer("zoom-mark");
    Box box = whole.on(zoom.window());
    Rectangle2D frame = new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height());
    canvas.stroke(frame, Palette.PAPER, new Pen(2.6f));
    canvas.stroke(frame, Palette.INK, Pen.MEDIUM);
    letter(canvas, tag(box, whole));
  }

  private static void letter(Canvas canvas, Box box) {
    canvas.fill(new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()), Palette.INK);
    Plates.unplated(
        canvas,
        List.of("A"),
        box,
        Lettering.SMALL_STRONG.in(Palette.PAPER),
        Lettering.SMALL_STRONG);
  }

  /** Where the words of a zoom stand. */
  static Box words(Panel zoom) {
    return new Box(
        zoom.frame().x0(), zoom.frame().y0(), zoom.frame().x0() + 132, zoom.frame().y0() + 22);
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
        Digits.fixed(times, 1) + " times larger",
        box.x0() + 24,
        box.y0() + 15,
        Lettering.SMALL_STRONG);
    letter(canvas, new Box(box.x0() + 4, box.y0() + 4, box.x0() + 19, box.y0() + 19));
  }
}
