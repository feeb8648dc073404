package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.cli.plot.Plots.Caption;
import coldseam.solver.detail.View;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;

/** The scale bar, and which way is up. */
final class ScaleBar {
  static final double HEIGHT = 26;

  private static final double LONGEST = 150;
  private static final double BAR = 4;

  private ScaleBar() {}

  /** Draws the bar in the lower left corner of a frame. */
  static void draw(Canvas canvas, Panel panel, Ground ground, Caption caption) {
    canvas.layer(panel.name() + "-scale");
    double unit = caption.metresPerUnit();
    double longest = LONGEST / panel.pointsPerM() / unit;
    double length = Levels.roundDown(longest);
    double points = length * unit * panel.pointsPerM();
    double x = panel.frame().x0() + 8;
    double y = panel.frame().y1() - 9;
    Box box = new Box(x - 4, y - 18, x + points + 60, y + 6);
    if (panel.name().equals("zoom")) {
      Plates.plate(canvas, box);
    }
    ground.take(box);
    Path2D full = new Path2D.Double();
    full.append(new Rectangle2D.Double(x, y - BAR, points / 2, BAR), false);
    canvas.fill(full, Palette.INK);
    canvas.stroke(new Rectangle2D.Double(x, y - BAR, points, BAR), Palette.INK, Pen.FINE);
    canvas.text("0", x, y - BAR - 3, Lettering.SMALL);
    canvas.text(
        Figures.length(length * unit, caption) + " " + caption.unit(),
        x + points,
        y - BAR - 3,
        Lettering.SMALL,
        Anchor.MIDDLE);
  }

  /** Draws an arrow upwards, or says that the section is horizontal, at the lower right. */
  static void direction(Canvas canvas, Panel panel, Ground ground, View view) {
    double x = panel.frame().x1() - 10;
    double y = panel.frame().y1() - 9;
    String text = view.plan() ? "plan" : "up";
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
