package coldseam.cli.plot;

import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Filled bands and lines of equal value in a frame. Each band is one path: the region at or above
 * its lower level, drawn over the one before, so that no seam shows.
 */
final class Bands {
  /** Height of a band in the key, points. */
  static final double STEP = 13;

  /** How far a line may be moved by leaving out points, points. */
  private static final double SIMPLIFIED = 0.12;

  private static final double SCALE_WIDTH = 30;
  private static final double TICK = 4;

  private final Contours contours;
  private final Panel panel;

  Bands(Contours contours, Panel panel) {
    this.contours = contours;
    this.panel = panel;
  }

  /** Fills everything. */
  void fillAll(Canvas canvas, Colour colour) {
    fill(canvas, contours.all(), colour);
  }

  /** Fills where the values are at or above a level. */
  void fill(Canvas canvas, int level, Colour colour) {
    fill(canvas, contours.atOrAbove(level), colour);
  }

  private void fill(Canvas canvas, List<Polyline> region, Colour colour) {
    List<Polyline> rings = new ArrayList<>();
    for (Polyline ring : region) {
      Polyline simple = Simplification.of(ring, SIMPLIFIED / panel.pointsPerM());
      if (simple.size() > 2) {
        Optional<Polyline> seen = Clip.ring(simple.on(panel), panel.frame());
        if (seen.isPresent()) {
          rings.add(seen.get());
        }
      }
    }
    if (!rings.isEmpty()) {
      canvas.fill(Polyline.path(rings), colour);
    }
  }

  /** The lines of a level on the sheet. */
  List<Polyline> lines(int level) {
    List<Polyline> drawn = new ArrayList<>();
    for (Polyline line : contours.lines(level)) {
      Polyline simple = Simplification.of(line, SIMPLIFIED / panel.pointsPerM());
      drawn.addAll(Clip.line(simple.on(panel), panel.frame()));
    }
    return drawn;
  }

  /**
   * Draws the scale for the key, the highest band on top.
   *
   * @param canvas what it is drawn on
   * @param box where
   * @param levels between the bands, the lowest first
   * @param heavy which of them are set heavier
   * @param colours of the bands, one more than levels
   */
  static void scale(
      Canvas canvas, Box box, List<String> levels, List<Boolean> heavy, List<Colour> colours) {
    int bands = levels.size() + 1;
    double top = box.y0() + 2;
    for (int k = 0; k < bands; k++) {
      double y = top + (bands - 1 - k) * STEP;
      canvas.fill(new Rectangle2D.Double(box.x0(), y, SCALE_WIDTH, STEP), colours.get(k));
    }
    for (int k = 0; k < levels.size(); k++) {
      double y = top + (bands - 1 - k) * STEP;
      canvas.stroke(
          new Line2D.Double(box.x0(), y, box.x0() + SCALE_WIDTH + TICK, y),
          Palette.INK,
          heavy.get(k) ? Pen.MEDIUM : Pen.HAIR);
      canvas.text(
          levels.get(k),
          box.x0() + SCALE_WIDTH + TICK + 5,
          y + 3.5,
          heavy.get(k) ? Lettering.SMALL_STRONG : Lettering.SMALL);
    }
    canvas.stroke(
        new Rectangle2D.Double(box.x0(), top, SCALE_WIDTH, bands * STEP), Palette.INK, Pen.FINE);
  }
}
