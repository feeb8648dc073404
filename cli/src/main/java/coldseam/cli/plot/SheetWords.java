package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.List;

/** Ground, heading, stamp and foot of a sheet that shows more than one result. */
final class SheetWords {
  private static final double UNDER_HEADING = 14;
  private static final double FOOT_AIR = 14;

  private final String stamp;
  private final List<String> titles;
  private final List<String> subtitles;
  private final List<String> foot = Wrapping.of(Page.SAFETY, Page.INNER - 70, Page.FOOT);

  SheetWords(String title, String subtitle, String stamp) {
    this.stamp = stamp;
    double room = stampWidth(stamp) + 6;
    titles = Wrapping.of(title, Page.INNER - room - Page.GAP, Lettering.TITLE);
    subtitles = Wrapping.of(subtitle, Page.INNER, Lettering.SUBTITLE);
  }

  private static double stampWidth(String stamp) {
    return TextWidths.of(stamp, Lettering.SMALL_STRONG) + 18;
  }

  /** Where the heading ends. */
  double bottom() {
    return Page.MARGIN
        + titles.size() * Lettering.TITLE.lineHeight()
        + subtitles.size() * Lettering.SUBTITLE.lineHeight()
        + UNDER_HEADING;
  }

  /** Height of the sheet around something of a height. */
  double height(double drawn) {
    return Math.ceil(bottom() + drawn + FOOT_AIR + foot.size() * Page.FOOT.lineHeight() + FOOT_AIR);
  }

  void draw(Canvas canvas, double height) {
    canvas.layer("sheet");
    canvas.fill(new Rectangle2D.Double(0, 0, Page.WIDTH, height), Palette.PAPER);
    canvas.layer("heading");
    double y = Page.MARGIN;
    for (String line : titles) {
      canvas.text(line, Page.MARGIN, y + Lettering.TITLE.size() * 0.85, Lettering.TITLE);
      y += Lettering.TITLE.lineHeight();
    }
    for (String line : subtitles) {
      canvas.text(line, Page.MARGIN, y + Lettering.SUBTITLE.size() * 0.85, Lettering.SUBTITLE);
      y += Lettering.SUBTITLE.lineHeight();
    }
    double width = stampWidth(stamp);
    double right = Page.WIDTH - Page.MARGIN;
    canvas.stroke(
        new Rectangle2D.Double(right - width, Page.MARGIN, width, 20), Palette.INK, Pen.MEDIUM);
    canvas.text(
        stamp,
        right - width / 2,
        Page.MARGIN + 10 + Lettering.SMALL.size() * TextWidths.CAPITAL / 2,
        Lettering.SMALL_STRONG,
        Anchor.MIDDLE);
    canvas.layer("foot");
    double top = height - FOOT_AIR - foot.size() * Page.FOOT.lineHeight();
    canvas.stroke(new Line2D.Double(Page.MARGIN, top - 4, right, top - 4), Palette.RULE, Pen.HAIR);
    double base = top + Page.FOOT.size();
    canvas.text("Coldseam", right, base, Page.FOOT, Anchor.END);
    for (String line : foot) {
      canvas.text(line, Page.MARGIN, base, Page.FOOT);
      base += Page.FOOT.lineHeight();
    }
  }
}
