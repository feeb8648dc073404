package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.cli.text.Digits;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * The chart of a sweep: one frame for each kind of number over what was varied, every line labelled
 * where it ends and told apart by its marks and dashes as well.
 */
public final class SweepChart {
  private static final double FRAME_HEIGHT = 250;
  private static final double LEFT = 56;
  private static final double BELOW = 44;
  private static final double HEAD = 26;
  private static final double NAMES = 128;
  private static final double AIR = 10;
  private static final double MARK = 2.6;
  private static final double LABEL_STEP = 12.5;

  /** More points than this are drawn without marks. */
  private static final int MOST_MARKS = 60;

  /** Intervals shorter than this on the sheet hide behind their mark, points. */
  private static final double SHORTEST_BAR = 1.5;

  private static final int GRID_LINES = 5;
  private static final Pen[] PENS = {
    new Pen(1.4f), new Pen(1.4f, 7, 3), new Pen(1.4f, 2.2f, 2.2f), new Pen(1.4f, 9, 3, 2, 3)
  };
  private static final Colour[] COLOURS = {
    Palette.INK, Palette.OUTSIDE, Palette.INSIDE, Palette.REFERENCE
  };

  /**
   * What is drawn.
   *
   * @param title of the case
   * @param subtitle what was varied
   * @param stamp state of certification, in a few words
   * @param across name of what varies across
   * @param settings its settings, in order
   * @param positions where they lie on a scale; empty if they are names
   * @param frames one for each kind of number
   */
  public record Content(
      String title,
      String subtitle,
      String stamp,
      String across,
      List<String> settings,
      List<Double> positions,
      List<Frame> frames) {}

  /**
   * One frame.
   *
   * @param name what is shown in it
   * @param unit of it
   * @param series its lines
   */
  public record Frame(String name, String unit, List<Series> series) {}

  /**
   * One line.
   *
   * @param name what it is called
   * @param points in the order of the settings
   */
  public record Series(String name, List<Reading> points) {}

  /**
   * One number with its two ends.
   *
   * @param value NaN where there is none
   * @param lower end
   * @param upper end
   */
  public record Reading(double value, double lower, double upper) {}

  private final Content content;
  private final double[] places;
  private final double least;
  private final double most;

  private SweepChart(Content content) {
    this.content = content;
    int count = content.settings().size();
    places = new double[count];
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < count; i++) {
      places[i] = content.positions().isEmpty() ? i : content.positions().get(i);
      low = Math.min(low, places[i]);
      high = Math.max(high, places[i]);
    }
    double air = content.positions().isEmpty() ? 0.5 : high > low ? 0 : 1;
    least = low - air;
    most = high + air;
  }

  /**
   * Draws a chart.
   *
   * @param content what is drawn
   * @return an SVG document
   */
  public static String svg(Content content) {
    return new SweepChart(content).drawn();
  }

  private String drawn() {
    SvgCanvas canvas = SvgCanvas.blank("sweep");
    int columns = content.frames().size() > 1 ? 2 : 1;
    int rows = (content.frames().size() + columns - 1) / columns;
    SheetWords words = new SheetWords(content.title(), content.subtitle(), content.stamp());
    double cell = FRAME_HEIGHT + HEAD + BELOW;
    double height = words.height(rows * cell);
    words.draw(canvas, height);
    double width = (Page.INNER - (columns - 1) * Page.GAP) / columns;
    for (int i = 0; i < content.frames().size(); i++) {
      double x = Page.MARGIN + i % columns * (width + Page.GAP);
      double y = words.bottom() + i / columns * cell + HEAD;
      canvas.layer("frame-" + (i + 1));
      frame(
          canvas,
          content.frames().get(i),
          new Box(x + LEFT, y, x + width - NAMES, y + FRAME_HEIGHT));
    }
    return canvas.document(Page.WIDTH, height, content.title() + ": " + content.subtitle(), told());
  }

  private String told() {
    StringBuilder out = new StringBuilder();
    for (Frame frame : content.frames()) {
      for (Series series : frame.series()) {
        int last = series.points().size() - 1;
        out.append(frame.name()).append(", ").append(series.name()).append(": ");
        out.append(Digits.significant(series.points().get(0).value(), 3)).append(" at ");
        out.append(content.settings().get(0)).append(", ");
        out.append(Digits.significant(series.points().get(last).value(), 3)).append(" at ");
        out.append(content.settings().get(last)).append(". ");
      }
    }
    return out.toString().strip();
  }

  private double x(int setting, Box box) {
    return box.x0() + (places[setting] - least) / (most - least) * box.width();
  }

  private void frame(Canvas canvas, Frame frame, Box box) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (Series series : frame.series()) {
      for (Reading reading : series.points()) {
        if (Double.isFinite(reading.value())) {
          low = Math.min(low, end(reading.lower(), reading.value()));
          high = Math.max(high, end(reading.upper(), reading.value()));
        }
      }
    }
    String head = frame.name() + (frame.unit().isEmpty() ? "" : ", " + frame.unit());
    canvas.text(head, box.x0() - LEFT, box.y0() - 10, Lettering.HEADING);
    if (!(low <= high)) {
      canvas.text("no number", box.midX(), box.midY(), Lettering.QUIET, Anchor.MIDDLE);
      return;
    }
    double size = Math.max(high - low, 1e-3 * Math.max(Math.abs(high), 1e-9));
    double step = Levels.roundDown(size / (GRID_LINES - 1) * 1.3);
    double bottom = Math.floor((low - 0.02 * size) / step) * step;
    double top = Math.ceil((high + 0.02 * size) / step) * step;
    Scale scale = new Scale(bottom, top, box);
    grid(canvas, scale, step, box);
    across(canvas, box);
    List<double[]> ends = new ArrayList<>();
    for (int s = 0; s < frame.series().size(); s++) {
      ends.add(line(canvas, frame.series().get(s), s, scale, box));
    }
    names(canvas, frame, ends, box);
  }

  /** An end of an interval; the number itself where there is none. */
  private static double end(double end, double value) {
    return Double.isFinite(end) ? end : value;
  }

  private record Scale(double bottom, double top, Box box) {
    double y(double value) {
      return box.y1() - (value - bottom) / (top - bottom) * box.height();
    }
  }

  private static void grid(Canvas canvas, Scale scale, double step, Box box) {
    int decimals = Math.max(0, (int) Math.ceil(-Math.log10(step) - 1e-9));
    long count = Math.round((scale.top() - scale.bottom()) / step);
    for (long i = 0; i <= count; i++) {
      double value = scale.bottom() + i * step;
      double y = scale.y(value);
      canvas.stroke(new Line2D.Double(box.x0(), y, box.x1(), y), Palette.RULE, Pen.HAIR);
      String text = Digits.fixed(value, decimals);
      canvas.text(text, box.x0() - 6, y + 3.5, Lettering.QUIET, Anchor.END);
    }
    canvas.stroke(new Line2D.Double(box.x0(), box.y0(), box.x0(), box.y1()), Palette.INK, Pen.FINE);
  }

  /** The scale below: round numbers, or names. */
  private void across(Canvas canvas, Box box) {
    canvas.stroke(new Line2D.Double(box.x0(), box.y1(), box.x1(), box.y1()), Palette.INK, Pen.FINE);
    canvas.text(
        content.across(), box.midX(), box.y1() + BELOW - 12, Lettering.SMALL_STRONG, Anchor.MIDDLE);
    if (content.positions().isEmpty()) {
      double room = box.width() / places.length - 4;
      for (int i = 0; i < places.length; i++) {
        List<String> lines = Wrapping.of(content.settings().get(i), room, Lettering.SMALL);
        for (int line = 0; line < Math.min(2, lines.size()); line++) {
          double y = box.y1() + 12 + line * 11;
          canvas.text(lines.get(line), x(i, box), y, Lettering.SMALL, Anchor.MIDDLE);
        }
      }
      return;
    }
    double step = Levels.roundDown((most - least) / 4 * 1.2);
    int decimals = Math.max(0, (int) Math.ceil(-Math.log10(step) - 1e-9));
    for (double value = Math.ceil(least / step - 1e-9) * step;
        value <= most + 1e-9 * step;
        value += step) {
      double x = box.x0() + (value - least) / (most - least) * box.width();
      canvas.stroke(new Line2D.Double(x, box.y1(), x, box.y1() + 4), Palette.INK, Pen.FINE);
      String text = Digits.fixed(value, decimals);
      canvas.text(text, x, box.y1() + 16, Lettering.SMALL, Anchor.MIDDLE);
    }
  }

  /** Draws one line; returns where it ends. */
  private double[] line(Canvas canvas, Series series, int number, Scale scale, Box box) {
    Colour colour = COLOURS[number % COLOURS.length];
    Path2D path = new Path2D.Double();
    double[] end = {Double.NaN, Double.NaN};
    boolean open = false;
    for (int i = 0; i < series.points().size(); i++) {
      Reading reading = series.points().get(i);
      if (!Double.isFinite(reading.value())) {
        open = false;
        continue;
      }
      double x = x(i, box);
      double y = scale.y(reading.value());
      if (open) {
        path.lineTo(x, y);
      } else {
        path.moveTo(x, y);
      }
      open = true;
      end = new double[] {x, y};
      interval(canvas, reading, x, scale, colour);
    }
    if (!content.positions().isEmpty()) {
      canvas.stroke(path, colour, PENS[number / COLOURS.length % PENS.length]);
    }
    if (series.points().size() <= MOST_MARKS) {
      for (int i = 0; i < series.points().size(); i++) {
        double value = series.points().get(i).value();
        if (Double.isFinite(value)) {
          mark(canvas, x(i, box), scale.y(value), number, colour);
        }
      }
    }
    return end;
  }

  private static void interval(
      Canvas canvas, Reading reading, double x, Scale scale, Colour colour) {
    double top = scale.y(end(reading.upper(), reading.value()));
    double bottom = scale.y(end(reading.lower(), reading.value()));
    if (bottom - top >= SHORTEST_BAR) {
      canvas.stroke(new Line2D.Double(x, top, x, bottom), colour, Pen.FINE);
      canvas.stroke(new Line2D.Double(x - 3, top, x + 3, top), colour, Pen.FINE);
      canvas.stroke(new Line2D.Double(x - 3, bottom, x + 3, bottom), colour, Pen.FINE);
    }
  }

  /** A disc, a square, a triangle or a ring: told apart without colour. */
  private static void mark(Canvas canvas, double x, double y, int number, Colour colour) {
    double r = MARK;
    switch (number % 4) {
      case 0 -> canvas.fill(new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r), colour);
      case 1 -> canvas.fill(new Rectangle2D.Double(x - r, y - r, 2 * r, 2 * r), colour);
      case 2 -> {
        Path2D triangle = new Path2D.Double();
        triangle.moveTo(x, y - 1.3 * r);
        triangle.lineTo(x + 1.2 * r, y + r);
        triangle.lineTo(x - 1.2 * r, y + r);
        triangle.closePath();
        canvas.fill(triangle, colour);
      }
      default -> {
        Ellipse2D ring = new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r);
        canvas.fill(ring, Palette.PAPER);
        canvas.stroke(ring, colour, Pen.MEDIUM);
      }
    }
  }

  /** Names every line at its end, moved apart where ends crowd. */
  private static void names(Canvas canvas, Frame frame, List<double[]> ends, Box box) {
    List<Integer> order = new ArrayList<>();
    for (int s = 0; s < ends.size(); s++) {
      if (!Double.isNaN(ends.get(s)[1])) {
        order.add(s);
      }
    }
    order.sort(Comparator.comparingDouble(s -> ends.get(s)[1]));
    double[] y = new double[order.size()];
    double above = box.y0() - LABEL_STEP;
    for (int i = 0; i < y.length; i++) {
      y[i] = Math.max(ends.get(order.get(i))[1], above + LABEL_STEP);
      above = y[i];
    }
    double below = box.y1() + LABEL_STEP / 2;
    for (int i = y.length - 1; i >= 0; i--) {
      y[i] = Math.min(y[i], below);
      below = y[i] - LABEL_STEP;
    }
    for (int i = 0; i < y.length; i++) {
      int s = order.get(i);
      double[] end = ends.get(s);
      double x = box.x1() + AIR + 8;
      Colour colour = COLOURS[s % COLOURS.length];
      canvas.stroke(
          new Line2D.Double(Math.min(end[0] + 4, box.x1()), end[1], x - 3, y[i]),
          Palette.RULE,
          Pen.HAIR);
      mark(canvas, x + 2, y[i], s, colour);
      String name = frame.series().get(s).name();
      String line = Wrapping.of(name, NAMES - AIR - 20, Lettering.SMALL).get(0);
      canvas.text(
          line.length() < name.length() ? line + "…" : line,
          x + 9,
          y[i] + 3.5,
          Lettering.SMALL.in(colour));
    }
  }
}
