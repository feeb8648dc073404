package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import coldseam.solver.result.Result;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Alternatives side by side: section above, temperatures below, all at one scale and on one scale
 * of temperature, the same material in the same tone and hatch.
 */
public final class ComparisonFigure {
  private static final int MOST_COLUMNS = 4;
  private static final double GUTTER = 22;
  private static final double HIGHEST = 300;
  private static final double LOWEST = 130;
  private static final double BETWEEN = 8;
  private static final int KEY_COLUMNS = 3;

  /**
   * What is drawn.
   *
   * @param title of the figure
   * @param subtitle what is compared
   * @param stamp state of certification, in a few words
   * @param columns one for each alternative
   */
  public record Content(String title, String subtitle, String stamp, List<Column> columns) {}

  /**
   * One alternative.
   *
   * @param letter it goes by
   * @param name what it is called
   * @param result what came out
   * @param caption the unit of lengths
   * @param lines numbers that stand under it
   */
  public record Column(
      String letter, String name, Result result, Caption caption, List<String> lines) {}

  /** One alternative ready to draw. */
  private record Drawn(
      Column column,
      DrawnSection section,
      List<MaterialLook> looks,
      List<String> nameLines,
      Isotherms isotherms) {}

  private final Content content;
  private final List<Drawn> all = new ArrayList<>();
  private final int across;
  private final double width;
  private final double scale;
  private final double frameHeight;
  private final double nameHeight;
  private final double linesHeight;

  private ComparisonFigure(Content content) {
    this.content = content;
    int count = content.columns().size();
    int rows = (count + MOST_COLUMNS - 1) / MOST_COLUMNS;
    across = (count + rows - 1) / rows;
    width = (Page.INNER - (across - 1) * Page.GAP) / across;
    prepare();
    double fit = Double.POSITIVE_INFINITY;
    double tallest = 0;
    double names = 0;
    double lines = 0;
    for (Drawn one : all) {
      Box box = one.section().bounds();
      fit = Math.min(fit, (width - 2 * GUTTER) / box.width());
      fit = Math.min(fit, (HIGHEST - 2 * GUTTER) / box.height());
      tallest = Math.max(tallest, box.height());
      names = Math.max(names, one.nameLines().size() * Lettering.STRONG.lineHeight());
      lines = Math.max(lines, one.column().lines().size() * Lettering.SMALL.lineHeight());
    }
    scale = fit;
    frameHeight = Math.max(LOWEST, tallest * scale + 2 * GUTTER);
    nameHeight = names + 8;
    linesHeight = lines + 8;
  }

  /**
   * Draws a figure.
   *
   * @param content what is drawn
   * @return an SVG document
   */
  public static String svg(Content content) {
    return new ComparisonFigure(content).drawn();
  }

  private static TemperatureField temperatures(Result result) {
    Solution solution = result.surface().orElse(result.heatLoss());
    double[] celsius = new double[result.spaces().size()];
    for (int i = 0; i < celsius.length; i++) {
      celsius[i] = result.spaces().get(i).temperatureC();
    }
    return solution.temperatures(celsius);
  }

  private void prepare() {
    double[] range = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
    Map<String, Fill> fills = new LinkedHashMap<>();
    for (Column column : content.columns()) {
      double[] own = Isotherms.range(temperatures(column.result()));
      range[0] = Math.min(range[0], own[0]);
      range[1] = Math.max(range[1], own[1]);
      for (Fill fill : column.result().detail().fills()) {
        fills.putIfAbsent(key(fill), fill);
      }
    }
    Map<String, MaterialLook> looks = new LinkedHashMap<>();
    List<MaterialLook> ofAll = MaterialLook.of(List.copyOf(fills.values()));
    int number = 0;
    for (String key : fills.keySet()) {
      looks.put(key, ofAll.get(number++));
    }
    for (Column column : content.columns()) {
      DrawnSection section = DrawnSection.of(column.result());
      List<MaterialLook> own = new ArrayList<>();
      for (Fill fill : column.result().detail().fills()) {
        own.add(looks.get(key(fill)));
      }
      all.add(
          new Drawn(
              column,
              section,
              own,
              Wrapping.of(column.name(), width - 24, Lettering.STRONG),
              new Isotherms(
                  temperatures(column.result()), figures(column, section), List.of(), range)));
    }
  }

  private static Figures figures(Column column, DrawnSection section) {
    return new Figures(column.caption(), section.axis().isPresent());
  }

  /** Materials are the same if they have the same name and conductivity. */
  private static String key(Fill fill) {
    return fill instanceof Material material
        ? fill.name() + '\n' + material.conductivityWPerMK()
        : fill.name();
  }

  private double rowHeight() {
    return nameHeight + 2 * frameHeight + BETWEEN + linesHeight + Page.GAP;
  }

  private String drawn() {
    SvgCanvas canvas = SvgCanvas.blank("compare");
    SheetWords words = new SheetWords(content.title(), content.subtitle(), content.stamp());
    int rows = (all.size() + across - 1) / across;
    Key key = key();
    double keyWidth = (Page.INNER - (KEY_COLUMNS - 1) * Page.GAP) / KEY_COLUMNS;
    double keyHeight = key.restHeight(keyWidth, 0, keyWidth, KEY_COLUMNS);
    double height = words.height(rows * rowHeight() + keyHeight);
    words.draw(canvas, height);
    for (int i = 0; i < all.size(); i++) {
      double x = Page.MARGIN + i % across * (width + Page.GAP);
      column(canvas, all.get(i), x, words.bottom() + i / across * rowHeight());
    }
    canvas.layer("key");
    List<Key.Column> columns = new ArrayList<>();
    double keyTop = words.bottom() + rows * rowHeight();
    for (int c = 0; c < KEY_COLUMNS; c++) {
      columns.add(
          new Key.Column(Page.MARGIN + c * (keyWidth + Page.GAP), keyTop, keyWidth, keyHeight));
    }
    key.draw(canvas, columns);
    return canvas.document(Page.WIDTH, height, content.title() + ": " + content.subtitle(), told());
  }

  private String told() {
    StringBuilder out = new StringBuilder();
    for (Column column : content.columns()) {
      out.append(column.letter()).append(", ").append(column.name()).append(": ");
      out.append(String.join("; ", column.lines())).append(". ");
    }
    return out.toString().strip();
  }

  private void column(Canvas canvas, Drawn one, double x, double y) {
    String letter = one.column().letter();
    canvas.layer(letter + "-name");
    Plates.ring(canvas, letter, x + Plates.RING / 2, y + Plates.RING / 2 - 2);
    double base = y + Lettering.STRONG.size() - 1;
    for (String line : one.nameLines()) {
      canvas.text(line, x + 22, base, Lettering.STRONG);
      base += Lettering.STRONG.lineHeight();
    }
    double top = y + nameHeight;
    section(canvas, one, panel(one, letter + "-section", x, top));
    temperature(canvas, one, panel(one, letter + "-temperature", x, top + frameHeight + BETWEEN));
    canvas.layer(letter + "-figures");
    base = top + 2 * frameHeight + BETWEEN + 6 + Lettering.SMALL.size();
    for (String line : one.column().lines()) {
      canvas.text(line, x, base, Lettering.SMALL);
      base += Lettering.SMALL.lineHeight();
    }
  }

  private Panel panel(Drawn one, String name, double x, double y) {
    Box bounds = one.section().bounds();
    return new Panel(
        name, new Box(x, y, x + width, y + frameHeight), scale, bounds.midX(), bounds.midY());
  }

  private static void frame(Canvas canvas, Panel panel) {
    canvas.layer(panel.name() + "-frame");
    Box box = panel.frame();
    canvas.stroke(
        new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()),
        Palette.RULE,
        Pen.HAIR);
  }

  private static void section(Canvas canvas, Drawn one, Panel panel) {
    frame(canvas, panel);
    Ground ground = SectionLines.ground(one.section(), panel);
    new MaterialLabels(one.section(), panel, one.looks()).fills(canvas);
    SectionLines lines = new SectionLines(one.section(), panel);
    lines.joints(canvas, Palette.INK, Pen.FINE);
    new SurfaceMarks(one.section(), panel).fringes(canvas);
    lines.outline(canvas);
    lines.keepClear(ground);
    ScaleBar.draw(canvas, panel, ground, one.section(), figures(one.column(), one.section()));
    List<List<String>> spaces = new ArrayList<>();
    for (Result.SpaceResult space : one.column().result().spaces()) {
      spaces.add(List.of(space.name()));
    }
    new SpaceLabels(canvas, one.section(), panel, ground).write(spaces);
  }

  private static void temperature(Canvas canvas, Drawn one, Panel panel) {
    frame(canvas, panel);
    Isotherms.Traced traced = one.isotherms().in(panel);
    traced.fill(canvas);
    SectionLines lines = new SectionLines(one.section(), panel);
    lines.joints(canvas, Palette.mix(Palette.INK, Palette.PAPER, 0.25), Pen.HAIR);
    traced.drawLines(canvas);
    lines.outline(canvas);
    Ground ground = SectionLines.ground(one.section(), panel);
    lines.keepClear(ground);
    new ColdestPoints(one.column().result(), one.section(), figures(one.column(), one.section()))
        .draw(canvas, panel, ground, Optional.empty());
    traced.label(canvas, ground, one.section(), false);
  }

  private Key key() {
    Drawn first = all.get(0);
    Figures figures = figures(first.column(), first.section());
    Key key = new Key();
    key.heading("Materials, λ in " + figures.conductivityUnit());
    List<String> done = new ArrayList<>();
    for (Drawn one : all) {
      List<Fill> fills = one.section().fills();
      for (int label = 0; label < fills.size(); label++) {
        Fill fill = fills.get(label);
        if (one.section().solid(label)
            && !one.section().largestFirst(label).isEmpty()
            && !done.contains(key(fill))) {
          done.add(key(fill));
          String value =
              fill instanceof Material material
                  ? figures.conductivity(material.conductivityWPerMK())
                  : "";
          key.sample(new SectionView.Swatch(one.looks().get(label)), fill.name(), value);
        }
      }
    }
    key.heading("Temperature in " + figures.degrees());
    key.tall(first.isotherms().scale(), first.isotherms().bands() * Bands.STEP + 4);
    key.note("One scale for all; surface set of films unless the heat-loss set is the same.");
    return key;
  }
}
