package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.cli.text.Digits;
import coldseam.solver.ledger.Uncertain;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;

/**
 * Bands that cross the outline of a house from left to right: what comes in joins to one upright
 * bar, what goes out parts from it.
 */
final class LedgerDrawing {
  private static final double WALL_LEFT = 272;
  private static final double WALL_RIGHT = 632;
  private static final double BAR = 20;
  private static final double TAIL = 214;
  private static final double TIP = 690;
  private static final double HEAD = 14;
  private static final double LABEL_GAP = 8;
  private static final double EAVES = 62;
  private static final double OVERHANG = 14;
  private static final double FLOOR = 10;
  private static final double BAND_GAP = 5;

  /** What of the height of the walls the widest sum of bands takes. */
  private static final double FILLED = 0.62;

  private final Flows flows;
  private final Box frame;
  private final double top;
  private final double bottom;

  LedgerDrawing(Flows flows, Box frame) {
    this.flows = flows;
    this.frame = frame;
    top = frame.y0() + EAVES;
    bottom = frame.y1() - FLOOR;
  }

  /** A band with where it lies at the wall and at the bar, points. */
  private record Placed(
      Flows.Band band, List<String> label, double wall, double bar, double thickness) {}

  void draw(Canvas canvas) {
    double sum = flows.sum().value();
    if (!(sum > 0)) {
      canvas.layer("nothing");
      canvas.text(
          "Nothing comes in and nothing goes out",
          frame.midX(),
          frame.midY(),
          Lettering.LABEL,
          Anchor.MIDDLE);
      return;
    }
    double scale = FILLED * (bottom - top) / sum;
    double most =
        Math.max(used(flows.in(), sum, scale, true), used(flows.out(), sum, scale, false));
    while (most > bottom - top && scale * sum > 20) {
      scale *= 0.94;
      most = Math.max(used(flows.in(), sum, scale, true), used(flows.out(), sum, scale, false));
    }
    List<Placed> in = placed(flows.in(), sum, scale, true);
    List<Placed> out = placed(flows.out(), sum, scale, false);
    canvas.layer("in");
    for (Placed band : in) {
      band(canvas, band, true);
    }
    canvas.layer("out");
    for (Placed band : out) {
      band(canvas, band, false);
    }
    bar(canvas, sum, scale);
    house(canvas);
    canvas.layer("labels");
    for (Placed band : in) {
      label(canvas, band, true);
    }
    for (Placed band : out) {
      label(canvas, band, false);
    }
  }

  private double x(double local) {
    return frame.x0() + local;
  }

  private double slot(Flows.Band band, double sum, double scale, boolean in) {
    double text = words(band, sum, in).size() * (Lettering.SMALL.lineHeight() - 1) + 2;
    return Math.max(band.size() * scale + BAND_GAP, text);
  }

  private double used(List<Flows.Band> bands, double sum, double scale, boolean in) {
    double used = 0;
    for (Flows.Band band : bands) {
      used += slot(band, sum, scale, in);
    }
    return used;
  }

  /** Bands under each other, spread over the wall, together at the bar. */
  private List<Placed> placed(List<Flows.Band> bands, double sum, double scale, boolean in) {
    List<Placed> placed = new ArrayList<>();
    double spare = Math.max(0, bottom - top - used(bands, sum, scale, in));
    double between = spare / (bands.size() + 1);
    double wall = top + between;
    double bar = barTop(sum, scale);
    for (Flows.Band band : bands) {
      double slot = slot(band, sum, scale, in);
      double thickness = band.size() * scale;
      placed.add(
          new Placed(band, words(band, sum, in), wall + slot / 2, bar + thickness / 2, thickness));
      wall += slot + between;
      bar += thickness;
    }
    return placed;
  }

  private double barTop(double sum, double scale) {
    return (top + bottom - sum * scale) / 2;
  }

  private void band(Canvas canvas, Placed placed, boolean in) {
    double half = Math.max(placed.thickness(), 0.6) / 2;
    double wallX = x(in ? WALL_LEFT : WALL_RIGHT);
    double barX = x((WALL_LEFT + WALL_RIGHT) / 2) + (in ? -BAR / 2 : BAR / 2);
    double bend = (barX + wallX) / 2;
    double head = Math.min(HEAD, 4 + half);
    Path2D path = new Path2D.Double();
    double wall = placed.wall();
    double bar = placed.bar();
    path.moveTo(barX, bar - half);
    path.curveTo(bend, bar - half, bend, wall - half, wallX, wall - half);
    if (in) {
      double tail = x(TAIL);
      path.lineTo(tail, wall - half);
      path.lineTo(tail + Math.min(HEAD, half), wall);
      path.lineTo(tail, wall + half);
    } else {
      double neck = x(TIP) - head;
      path.lineTo(neck, wall - half);
      path.lineTo(neck, wall - half - 3);
      path.lineTo(x(TIP), wall);
      path.lineTo(neck, wall + half + 3);
      path.lineTo(neck, wall + half);
    }
    path.lineTo(wallX, wall + half);
    path.curveTo(bend, wall + half, bend, bar + half, barX, bar + half);
    path.closePath();
    Flows.Look look = placed.band().look();
    canvas.fill(path, colour(look));
    Pen pen = look == Flows.Look.REMAINDER ? new Pen(0.9f, 4, 3) : Pen.HAIR;
    canvas.stroke(path, Palette.INK, pen);
  }

  private static Colour colour(Flows.Look look) {
    return switch (look) {
      case BOUGHT -> Palette.mix(Palette.PAPER, Palette.INSIDE, 0.62);
      case GAIN -> Palette.temperature(0.83);
      case PLANE -> Palette.temperature(0.33);
      case BRIDGES -> Palette.mix(Palette.PAPER, Palette.REFERENCE, 0.72);
      case AIR -> Palette.mix(Palette.PAPER, Palette.temperature(0.33), 0.5);
      case UNUSED -> Palette.mix(Palette.PAPER, Palette.RULE, 0.7);
      case REMAINDER -> Palette.PAPER;
    };
  }

  private void bar(Canvas canvas, double sum, double scale) {
    canvas.layer("bar");
    double middle = x((WALL_LEFT + WALL_RIGHT) / 2);
    double y = barTop(sum, scale);
    Rectangle2D bar = new Rectangle2D.Double(middle - BAR / 2, y, BAR, sum * scale);
    canvas.fill(bar, Palette.INK);
    Uncertain all = flows.sum();
    String text =
        Digits.between(all.value(), all.lower(), all.upper(), 0).value()
            + Figures.JOINED
            + "kWh in = out";
    canvas.text(text, middle, top - 8, Lettering.STRONG, Anchor.MIDDLE);
  }

  /** The boundary, crossed by the bands. */
  private void house(Canvas canvas) {
    canvas.layer("boundary");
    double left = x(WALL_LEFT);
    double right = x(WALL_RIGHT);
    Path2D outline = new Path2D.Double();
    outline.moveTo(left, bottom);
    outline.lineTo(left, top);
    outline.lineTo((left + right) / 2, frame.y0() + 4);
    outline.lineTo(right, top);
    outline.lineTo(right, bottom);
    outline.closePath();
    canvas.stroke(outline, Palette.INK, Pen.CUT_OFF);
    canvas.stroke(
        new Line2D.Double(left - 4 * OVERHANG, bottom, left, bottom), Palette.INK, Pen.MEDIUM);
    canvas.stroke(
        new Line2D.Double(right, bottom, right + 4 * OVERHANG, bottom), Palette.INK, Pen.MEDIUM);
    canvas.text("in +", left - 10, top - 14, Lettering.HEADING, Anchor.END);
    canvas.text("out −", right + 10, top - 14, Lettering.HEADING);
    canvas.text("boundary", left + 92, frame.y0() + 18, Lettering.QUIET, Anchor.END);
  }

  /** Name, kWh and share, on one line if they fit. */
  private List<String> words(Flows.Band band, double sum, boolean in) {
    double width = (in ? TAIL : frame.width() - TIP) - LABEL_GAP;
    String share = Digits.fixed(100 * band.size() / sum, 1) + Figures.JOINED + "%";
    String figure = band.figure() + Figures.JOINED + "kWh, " + share;
    String both = band.name() + "  " + figure;
    if (TextWidths.of(both, Lettering.SMALL) <= width) {
      return List.of(both);
    }
    List<String> lines = new ArrayList<>(Wrapping.of(band.name(), width, Lettering.SMALL));
    lines.add(figure);
    return lines;
  }

  private void label(Canvas canvas, Placed placed, boolean in) {
    List<String> lines = placed.label();
    double step = Lettering.SMALL.lineHeight() - 1;
    double base =
        placed.wall()
            - (lines.size() - 1) * step / 2
            + Lettering.SMALL.size() * TextWidths.CAPITAL / 2;
    for (String line : lines) {
      canvas.text(
          line,
          in ? x(TAIL) - LABEL_GAP : x(TIP) + LABEL_GAP,
          base,
          Lettering.SMALL,
          in ? Anchor.END : Anchor.START);
      base += step;
    }
  }
}
