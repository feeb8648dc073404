package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.solver.detail.View;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.function.IntPredicate;

/** The scale bar, and which way is up. */
final class ScaleBar {
  static final double HEIGHT = 26;

  private static final double LONGEST = 150;
  private static final double BAR = 4;

  private ScaleBar() {}

  /** Draws the bar in a lower corner of a frame, on a plate if the section lies there. */
  static void draw(
      Canvas canvas, Panel panel, Ground ground, DrawnSection section, Figures figures) {
    canvas.layer(panel.name() + "-scale");
    double unit = figures.caption().metresPerUnit();
    double length = Levels.roundDown(LONGEST / panel.pointsPerM() / unit) * unit;
    double points = length * panel.pointsPerM();
    String text = figures.lengthWithUnit(length);
    double width = points + TextWidths.of(text, Lettering.SMALL) / 2 + 10;
    double y = panel.frame().y1() - 9;
    Box left = new Box(panel.frame().x0() + 4, y - 18, panel.frame().x0() + 4 + width, y + 5);
    Box right = new Box(panel.frame().x1() - 4 - width, y - 18, panel.frame().x1() - 4, y + 5);
    IntPredicate open = SectionLines.open(section);
    Box box = ground.free(left, open) || !ground.free(right, open) ? left : right;
    if (!ground.free(box, open)) {
      Plates.plate(canvas, box);
    }
    ground.take(box);
    double x = box.x0() + 4;
    canvas.fill(new Rectangle2D.Double(x, y - BAR, points / 2, BAR), Palette.INK);
    canvas.stroke(new Rectangle2D.Double(x, y - BAR, points, BAR), Palette.INK, Pen.FINE);
    canvas.text("0", x, y - BAR - 3, Lettering.SMALL);
    canvas.text(text, x + points, y - BAR - 3, Lettering.SMALL, Anchor.MIDDLE);
  }

  /** Draws an arrow upwards, or says that the section is horizontal, at the lower right. */
  static void direction(Canvas canvas, Panel panel, Ground ground, View view, String plan) {
    double x = panel.frame().x1() - 10;
    double y = panel.frame().y1() - 9;
    String text = view.plan() ? plan : "up";
    double width = TextWidths.of(text, Lettering.SMALL);
    ground.take(new Box(x - width - 26, y - 24, x + 6, y + 6));
    canvas.text(text, x, y, Lettering.SMALL, Anchor.END);
    if (view.plan()) {
      return;
    }
    double cx = x - width - 12;
    double cy = y - 7;
    double ux = view.upX();
    double uy = -view.upY();
    Path2D arrow = new Path2D.Double();
    arrow.moveTo(cx - 9 * ux, cy - 9 * uy);
    arrow.lineTo(cx + 3 * ux, cy + 3 * uy);
    canvas.stroke(arrow, Palette.INK, Pen.MEDIUM);
    Path2D head = new Path2D.Double();
    head.moveTo(cx + 10 * ux, cy + 10 * uy);
    head.lineTo(cx + 2 * ux - 3.5 * uy, cy + 2 * uy + 3.5 * ux);
    head.lineTo(cx + 2 * ux + 3.5 * uy, cy + 2 * uy - 3.5 * ux);
    head.closePath();
    canvas.fill(head, Palette.INK);
  }
}
