package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.awt.Color;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Temperatures: filled bands, labelled isotherms at round steps, every fifth heavier, the critical
 * isotherms of the warmest space with a stated humidity heaviest, coldest points with their values.
 */
final class TemperatureView extends View {
  /** How far a line may be moved by leaving out points, points. */
  static final double SIMPLIFIED = 0.12;

  private static final int INDEX = 5;
  private static final Pen ISOTHERM = new Pen(0.6f);
  private static final Pen INDEX_ISOTHERM = new Pen(1.2f);
  private static final Pen CASING = new Pen(4.4f);
  private static final Pen MOULD = new Pen(2.4f);
  private static final Pen DEW = new Pen(2.4f, 9, 4);
  private static final double BAND = 13;

  private final Solution solution;
  private final TemperatureField field;
  private final double step;
  private final List<Double> levels;
  private final List<Critical> critical;

  /** An isotherm that matters: its name, where it is drawn, and what is said of it. */
  private record Critical(String id, String name, double temperatureC, String meaning, Pen pen) {}

  TemperatureView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    solution = result.surface().orElse(result.heatLoss());
    field = solution.temperatures(temperaturesC());
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    int nodes = field.mesh().vertexCount() + field.mesh().sideCount();
    for (int node = 0; node < nodes; node++) {
      least = Math.min(least, field.atNode(node));
      most = Math.max(most, field.atNode(node));
    }
    step = Levels.step(most - least);
    levels = Levels.between(least, most, step);
    critical = critical();
  }

  private List<Critical> critical() {
    int warmest = -1;
    double[] temperatures = temperaturesC();
    List<Space> spaces = section().detail().spaces();
    for (int i = 0; i < temperatures.length; i++) {
      boolean humid =
          spaces.get(i).relativeHumidity().isPresent()
              && spaces.get(i).relativeHumidity().getAsDouble() > 0;
      if (humid && i != coldestSpace() && (warmest < 0 || temperatures[i] > temperatures[warmest])) {
        warmest = i;
      }
    }
    if (warmest < 0) {
      return List.of();
    }
    double air = temperatures[warmest];
    double humidity = spaces.get(warmest).relativeHumidity().getAsDouble();
    String of = spaces.get(warmest).name() + " at " + climate(warmest);
    double mould = CriticalTemperature.of(air, humidity, CriticalTemperature.MOULD);
    double dew = CriticalTemperature.of(air, humidity, 1);
    return List.of(
        new Critical(
            "mould-limit",
            "mould limit",
            mould,
            "80 % humidity at a surface facing " + of + " (ISO 13788)",
            MOULD),
        new Critical(
            "dew-point",
            "dew point",
            dew,
            "condensation on a surface facing " + of + " (ISO 13788)",
            DEW));
  }

  @Override
  String shown() {
    return "Temperature · " + words(solution.filmSet());
  }

  @Override
  String told() {
    StringBuilder out = new StringBuilder("Temperatures in the detail, isotherms every ");
    out.append(Figures.plain(step)).append(" K.");
    for (Result.SpaceResult space : result().spaces()) {
      out.append(' ').append(space.name()).append(' ');
      out.append(Figures.temperature(space.temperatureC()));
      space
          .coldest()
          .ifPresent(
              p ->
                  out.append(", coldest surface ").append(Figures.temperature(p.temperatureC())));
      out.append('.');
    }
    return out.toString();
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(46, 46, 50, 54);
  }

  @Override
  void paint(Canvas canvas, Panel panel, boolean zoomed, Optional<Panel> zoom) {
    Box window = panel.window();
    Contours contours =
        Contours.of(Sampling.of(field, window, panel.pointsPerM(), step));
    bands(canvas, panel, contours);
    SectionLines lines = new SectionLines(section(), panel);
    lines.joints(canvas, Palette.mix(Palette.INK, Palette.PAPER, 0.25), Pen.HAIR);
    Ground ground = SectionLines.ground(section(), panel);
    List<List<Polyline>> isotherms = new ArrayList<>();
    for (double level : levels) {
      canvas.layer(panel.name() + "-isotherm_" + String.format(Locale.ROOT, "%.6g", level));
      List<Polyline> drawn = shown(contours.lines(level), panel);
      isotherms.add(drawn);
      canvas.stroke(Polyline.path(drawn), Palette.INK, index(level) ? INDEX_ISOTHERM : ISOTHERM);
    }
    lines.outline(canvas);
    List<List<Polyline>> heavy = new ArrayList<>();
    for (Critical c : critical) {
      canvas.layer(panel.name() + "-" + c.id());
      List<Polyline> drawn = shown(contours.lines(c.temperatureC()), panel);
      heavy.add(drawn);
      canvas.stroke(Polyline.path(drawn), Palette.PAPER, CASING);
      canvas.stroke(Polyline.path(drawn), Palette.INK, c.pen());
    }
    ScaleBar.draw(canvas, panel, ground, caption());
    if (zoomed) {
      ground.take(Zoom.words(panel));
    } else {
      ScaleBar.direction(canvas, panel, ground, section().detail().view());
    }
    coldest(canvas, panel, ground);
    new SpaceLabels(canvas, section(), panel, ground)
        .write(i -> List.of(section().detail().spaces().get(i).name(), climate(i)));
    points(canvas, panel, ground);
    label(canvas, panel, ground, isotherms, heavy);
  }

  private void bands(Canvas canvas, Panel panel, Contours contours) {
    canvas.layer(panel.name() + "-bands");
    band(canvas, panel, contours, Double.NEGATIVE_INFINITY, 0);
    for (int k = 0; k < levels.size(); k++) {
      band(canvas, panel, contours, levels.get(k), k + 1);
    }
  }

  private void band(Canvas canvas, Panel panel, Contours contours, double from, int k) {
    List<Polyline> rings = new ArrayList<>();
    double tolerance = SIMPLIFIED / panel.pointsPerM();
    for (Polyline ring : contours.atOrAbove(from)) {
      Polyline simple = Simplification.of(ring, tolerance);
      if (simple.size() > 2) {
        Clip.ring(simple.on(panel), panel.frame()).ifPresent(rings::add);
      }
    }
    if (!rings.isEmpty()) {
      canvas.fill(Polyline.path(rings), colour(k));
    }
  }

  private Color colour(int band) {
    return Palette.temperature((band + 0.5) / (levels.size() + 1));
  }

  private boolean index(double level) {
    return Math.round(level / step) % INDEX == 0;
  }

  static List<Polyline> shown(List<Polyline> lines, Panel panel) {
    List<Polyline> drawn = new ArrayList<>();
    for (Polyline line : lines) {
      Polyline simple = Simplification.of(line, SIMPLIFIED / panel.pointsPerM());
      drawn.addAll(Clip.line(simple.on(panel), panel.frame()));
    }
    return drawn;
  }

  private void label(
      Canvas canvas,
      Panel panel,
      Ground ground,
      List<List<Polyline>> isotherms,
      List<List<Polyline>> heavy) {
    canvas.layer(panel.name() + "-isotherm-labels");
    for (int i = 0; i < critical.size(); i++) {
      Critical c = critical.get(i);
      String text = c.name() + " " + Figures.fixed(c.temperatureC(), 1);
      boolean written =
          LineLabels.write(
              canvas, ground, heavy.get(i), text, Lettering.SMALL_STRONG, (x, y) -> 24, 0);
      if (!written) {
        beside(canvas, ground, heavy.get(i), text);
      }
    }
    LineLabels.Spacing spacing = (x, y) -> spacing(panel, x, y);
    for (boolean first : new boolean[] {true, false}) {
      for (int i = 0; i < levels.size(); i++) {
        if (index(levels.get(i)) == first) {
          String text = Figures.plain(levels.get(i));
          LineLabels.write(
              canvas,
              ground,
              isotherms.get(i),
              text,
              first ? Lettering.SMALL_STRONG : Lettering.SMALL,
              spacing,
              first ? 0 : 6.5);
        }
      }
    }
  }

  /** A label with a leader, for a line too short or too bent to carry it. */
  private static void beside(Canvas canvas, Ground ground, List<Polyline> lines, String text) {
    Polyline longest = null;
    for (Polyline line : lines) {
      if (longest == null || line.length() > longest.length()) {
        longest = line;
      }
    }
    if (longest == null) {
      return;
    }
    double[] at = SpaceLabels.at(longest, longest.length() / 2);
    PointMarks.label(ground, List.of(text), Lettering.SMALL_STRONG, at[0], at[1], 14, 120)
        .ifPresent(
            box -> {
              Plates.leader(canvas, box, at[0], at[1]);
              Plates.centred(
                  canvas, List.of(text), box, Lettering.SMALL_STRONG, Lettering.SMALL);
            });
  }

  /** Distance between two isotherms at a place on the sheet, points. */
  private double spacing(Panel panel, double x, double y) {
    Mesh mesh = field.mesh();
    double lx = panel.localX(x);
    double ly = panel.localY(y);
    int t = mesh.locate(lx, ly);
    if (t < 0) {
      return 0;
    }
    double[] l = Barycentric.of(mesh, t, lx, ly);
    double[] gradient = field.gradient(t, l[0], l[1], l[2]);
    return step / Math.hypot(gradient[0], gradient[1]) * panel.pointsPerM();
  }

  /** Whether the coldest point of a space says anything: not for the coldest space itself. */
  private boolean told(int space) {
    double[] temperatures = temperaturesC();
    return temperatures[space] > temperatures[coldestSpace()]
        && result().spaces().get(space).coldest().isPresent();
  }

  private void coldest(Canvas canvas, Panel panel, Ground ground) {
    canvas.layer(panel.name() + "-coldest-points");
    for (int i = 0; i < result().spaces().size(); i++) {
      if (!told(i)) {
        continue;
      }
      Result.SurfacePoint point = result().spaces().get(i).coldest().get();
      double x = panel.x(section().localX(point.at()));
      double y = panel.y(section().localY(point.at()));
      if (!panel.frame().grown(-6).contains(x, y)) {
        continue;
      }
      List<String> lines = new ArrayList<>();
      lines.add(Figures.temperature(point.temperatureC()));
      lines.add(factor(point) + "Rs " + Figures.quantity(point.filmM2KPerW()));
      ground.take(Box.around(x, y, 12, 12));
      PointMarks.label(ground, lines, Lettering.STRONG, x, y, 16, 120)
          .ifPresent(
              box -> {
                Plates.leader(canvas, box, x, y);
                Plates.centred(canvas, lines, box, Lettering.STRONG, Lettering.SMALL);
              });
      PointMarks.diamond(canvas, x, y);
    }
  }

  private static String factor(Result.SurfacePoint point) {
    return point.fRsi().isPresent()
        ? "fRsi " + Figures.fixed(point.fRsi().getAsDouble(), 3) + ", "
        : "";
  }

  private void points(Canvas canvas, Panel panel, Ground ground) {
    canvas.layer(panel.name() + "-points");
    for (Result.PointResult point : result().points()) {
      double x = panel.x(section().localX(point.at()));
      double y = panel.y(section().localY(point.at()));
      if (panel.frame().contains(x, y)) {
        PointMarks.cross(canvas, x, y);
        PointMarks.name(canvas, ground, point.name(), x, y);
      }
    }
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Temperature in °C, isotherms every " + Figures.plain(step) + " K");
    key.tall(this::scale, (levels.size() + 1) * BAND + 4);
    key.sample((c, box) -> SectionView.line(c, box, INDEX_ISOTHERM), "every fifth isotherm", "");
    for (Critical c : critical) {
      key.sample(
          (canvas, box) -> SectionView.line(canvas, box, c.pen()),
          c.name() + ": " + c.meaning(),
          Figures.temperature(c.temperatureC()));
    }
    coldestRows(key);
    if (!result().points().isEmpty()) {
      key.heading("Named points");
      for (Result.PointResult point : result().points()) {
        String set = point.filmSet() == solution.filmSet() ? "" : " (" + short_(point.filmSet()) + ")";
        key.row(point.name() + set, Figures.fixed(point.temperatureC(), 2) + " °C");
      }
    }
    key.heading("Spaces");
    for (int i = 0; i < section().detail().spaces().size(); i++) {
      key.row(section().detail().spaces().get(i).name(), climate(i));
    }
    return key;
  }

  private static String short_(FilmSet set) {
    return set == FilmSet.SURFACE ? "surface set" : "heat-loss set";
  }

  private void coldestRows(Key key) {
    boolean headed = false;
    for (int i = 0; i < result().spaces().size(); i++) {
      if (!told(i)) {
        continue;
      }
      if (!headed) {
        key.heading("Coldest surface (an estimate, never certified)");
        headed = true;
      }
      Result.SpaceResult space = result().spaces().get(i);
      Result.SurfacePoint point = space.coldest().get();
      String words =
          space.name()
              + ": "
              + factor(point)
              + "Rs "
              + Figures.quantity(point.filmM2KPerW())
              + ", "
              + short_(point.filmSet());
      key.sample(
          (c, box) -> PointMarks.diamond(c, box.midX(), box.midY()),
          words,
          Figures.temperature(point.temperatureC()));
    }
  }

  private void scale(Canvas canvas, Box box) {
    int bands = levels.size() + 1;
    double top = box.y0() + 2;
    for (int k = 0; k < bands; k++) {
      double y = top + (bands - 1 - k) * BAND;
      canvas.fill(new java.awt.geom.Rectangle2D.Double(box.x0(), y, 30, BAND), colour(k));
    }
    for (int k = 0; k < levels.size(); k++) {
      double y = top + (bands - 1 - k) * BAND;
      boolean heavy = index(levels.get(k));
      canvas.stroke(
          new java.awt.geom.Line2D.Double(box.x0(), y, box.x0() + 34, y),
          Palette.INK,
          heavy ? INDEX_ISOTHERM : ISOTHERM);
      canvas.text(
          Figures.plain(levels.get(k)),
          box.x0() + 40,
          y + 3.5,
          heavy ? Lettering.SMALL_STRONG : Lettering.SMALL);
    }
    canvas.stroke(
        new java.awt.geom.Rectangle2D.Double(box.x0(), top, 30, bands * BAND),
        Palette.INK,
        Pen.FINE);
  }
}
