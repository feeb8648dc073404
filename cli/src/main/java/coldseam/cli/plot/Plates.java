package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.List;

/** Text on a plate of paper, so that it reads on any ground; numbers in rings; leaders. */
final class Plates {
  static final double RING = 15;

  private static final double PAD = 3;

  private Plates() {}

  /** Size of a plate for lines of text. */
  static Box size(List<String> lines, Lettering lettering) {
    double width = 0;
    for (String line : lines) {
      width = Math.max(width, TextWidths.of(line, lettering));
    }
    double height = lines.size() * lettering.lineHeight();
    return new Box(0, 0, width + 2 * PAD, height + 2);
  }

  /** Writes lines centred in a box of the size of their plate. */
  static void centred(Canvas canvas, List<String> lines, Box box, Lettering first, Lettering rest) {
    plate(canvas, box);
    unplated(canvas, lines, box, first, rest);
  }

  /** Writes lines centred in a box, without a plate. */
  static void unplated(
      Canvas canvas, List<String> lines, Box box, Lettering first, Lettering rest) {
    double step = first.lineHeight();
    double base =
        box.midY() - lines.size() * step / 2 + (step + first.size() * TextWidths.CAPITAL) / 2;
    Lettering lettering = first;
    for (String line : lines) {
      canvas.text(line, box.midX(), base, lettering, Anchor.MIDDLE);
      base += step;
      lettering = rest;
    }
  }

  static void plate(Canvas canvas, Box box) {
    canvas.fill(
        new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()), Palette.PAPER);
  }

  /** Writes a line on a plate from a point of its base line. */
  static void write(Canvas canvas, String text, double x, double base, Lettering lettering) {
    double width = TextWidths.of(text, lettering);
    plate(
        canvas,
        new Box(
            x - PAD,
            base - lettering.size() * 0.95,
            x + width + PAD,
            base + lettering.size() * 0.32));
    canvas.text(text, x, base, lettering);
  }

  /** A number in a ring. */
  static void ring(Canvas canvas, String number, double x, double y) {
    Ellipse2D ring = new Ellipse2D.Double(x - RING / 2, y - RING / 2, RING, RING);
    canvas.fill(ring, Palette.PAPER);
    canvas.stroke(ring, Palette.INK, Pen.FINE);
    canvas.text(
        number,
        x,
        y + Lettering.SMALL.size() * TextWidths.CAPITAL / 2,
        Lettering.SMALL,
        Anchor.MIDDLE);
  }

  /** A leader from a plate or ring to what it speaks of, with a dot at its end. */
  static void leader(Canvas canvas, Box from, double x, double y) {
    double startX = Math.max(from.x0(), Math.min(from.x1(), x));
    double startY = Math.max(from.y0(), Math.min(from.y1(), y));
    canvas.stroke(new Line2D.Double(startX, startY, x, y), Palette.PAPER, new Pen(2));
    canvas.stroke(new Line2D.Double(startX, startY, x, y), Palette.INK, Pen.HAIR);
    canvas.fill(new Ellipse2D.Double(x - 1.4, y - 1.4, 2.8, 2.8), Palette.INK);
  }
}
