package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.text.Digits;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/**
 * Temperatures: filled bands, labelled isotherms at round steps, every fifth heavier, the critical
 * isotherms of the warmest space with a stated humidity heaviest, coldest points with their values.
 */
final class TemperatureView extends View {
  private static final int INDEX = 5;
  private static final Pen ISOTHERM = new Pen(0.6f);
  private static final Pen INDEX_ISOTHERM = new Pen(1.2f);
  private static final Pen CASING = new Pen(4.4f);
  private static final Pen MOULD = new Pen(2.4f);
  private static final Pen DEW = new Pen(2.4f, 9, 4);

  /** Isotherms nearer to each other than this carry no label, points. */
  private static final double CROWDED = 6.5;

  private static final int LONG_NAME = 4;

  /** How far an isotherm may be drawn from its place, points. */
  private static final double DISPLACEMENT = 0.15;

  private final Solution solution;
  private final TemperatureField field;
  private final double step;
  private final List<Double> levels;
  private final List<Critical> critical;

  /**
   * An isotherm that matters.
   *
   * @param id of its layer
   * @param name as written beside it
   * @param temperatureC where it lies
   * @param meaning in a few words
   * @param pen it is drawn with
   */
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
    double low = figures().scaled(least);
    double high = figures().scaled(most);
    step = Levels.step(high - low);
    levels = Levels.between(low, high, step);
    critical = critical();
  }

  private List<Critical> critical() {
    int warmest = -1;
    double[] temperatures = temperaturesC();
    for (int i = 0; i < temperatures.length; i++) {
      boolean humid = section().detail().spaces().get(i).relativeHumidity().orElse(0) > 0;
      if (humid
          && i != coldestSpace()
          && (warmest < 0 || temperatures[i] > temperatures[warmest])) {
        warmest = i;
      }
    }
    if (warmest < 0) {
      return List.of();
    }
    Space space = section().detail().spaces().get(warmest);
    double air = temperatures[warmest];
    double humidity = space.relativeHumidity().getAsDouble();
    String of = space.name() + " (" + climate(warmest) + "), ISO 13788";
    return List.of(
        new Critical(
            "mould-limit",
            "mould limit",
            CriticalTemperature.of(air, humidity, CriticalTemperature.MOULD),
            "80 % humidity at the surface, air of " + of,
            MOULD),
        new Critical(
            "dew-point",
            "dew point",
            CriticalTemperature.of(air, humidity, 1),
            "condensation, air of " + of,
            DEW));
  }

  @Override
  String shown() {
    return "Temperature · " + films(solution.filmSet());
  }

  /** Temperatures have no proved bounds, whatever is known of the couplings. */
  @Override
  String state() {
    return certified() ? "TEMPERATURES ARE ESTIMATES" : super.state();
  }

  @Override
  String told() {
    StringBuilder out = new StringBuilder("Temperatures in the detail, isotherms every ");
    out.append(Figures.round(step)).append(' ').append(figures().kelvins()).append('.');
    for (Result.SpaceResult space : result().spaces()) {
      out.append(' ').append(space.name()).append(' ');
      out.append(figures().temperature(space.temperatureC(), 1));
      space.coldest().ifPresent(p -> out.append(", coldest surface ").append(temperature(p)));
      out.append('.');
    }
    return out.toString();
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(50, 50, 56, 76);
  }

  @Override
  void paint(Canvas canvas, Panel panel, Optional<Panel> zoom) {
    double[] traced = traced();
    LinearPatch patch =
        Sampling.of(
            new NodalTemperature(field),
            panel.window(),
            panel.pointsPerM(),
            figures().differenceK(step),
            DISPLACEMENT);
    Bands bands = new Bands(Contours.of(patch, traced), panel);
    canvas.layer(panel.name() + "-bands");
    bands.fillAll(canvas, Palette.temperature(part(0)));
    for (int k = 0; k < levels.size(); k++) {
      bands.fill(canvas, index(traced, levelC(k)), Palette.temperature(part(k + 1)));
    }
    SectionLines lines = new SectionLines(section(), panel);
    lines.joints(canvas, Palette.mix(Palette.INK, Palette.PAPER, 0.25), Pen.HAIR);
    List<List<Polyline>> isotherms = new ArrayList<>();
    for (int k = 0; k < levels.size(); k++) {
      double level = levels.get(k);
      canvas.layer(panel.name() + "-isotherm_" + Digits.shortest(level, 6).replace('−', '-'));
      List<Polyline> drawn = bands.lines(index(traced, levelC(k)));
      isotherms.add(drawn);
      canvas.stroke(Polyline.path(drawn), Palette.INK, index(level) ? INDEX_ISOTHERM : ISOTHERM);
    }
    lines.outline(canvas);
    List<List<Polyline>> heavy = new ArrayList<>();
    for (Critical c : critical) {
      canvas.layer(panel.name() + "-" + c.id());
      List<Polyline> drawn = bands.lines(index(traced, c.temperatureC()));
      heavy.add(drawn);
      canvas.stroke(Polyline.path(drawn), Palette.PAPER, CASING);
      canvas.stroke(Polyline.path(drawn), Palette.INK, c.pen());
    }
    Ground ground = SectionLines.ground(section(), panel);
    frame(canvas, panel, ground, zoom);
    Optional<Box> elsewhere = zoom.map(z -> panel.on(z.window()));
    coldest(canvas, panel, ground, elsewhere);
    new SpaceLabels(canvas, section(), panel, ground).write(i -> List.of(nameOf(i), climate(i)));
    points(canvas, panel, ground, elsewhere);
    elsewhere.ifPresent(ground::take);
    label(canvas, panel, ground, isotherms, heavy, zoom);
  }

  /** Every temperature at which something is traced, ascending, °C. */
  private double[] traced() {
    double[] all = new double[levels.size() + critical.size()];
    for (int k = 0; k < levels.size(); k++) {
      all[k] = levelC(k);
    }
    for (int i = 0; i < critical.size(); i++) {
      all[levels.size() + i] = critical.get(i).temperatureC();
    }
    Arrays.sort(all);
    return all;
  }

  private double levelC(int k) {
    return figures().celsius(levels.get(k));
  }

  private static int index(double[] traced, double temperatureC) {
    return Arrays.binarySearch(traced, temperatureC);
  }

  private double part(int band) {
    return (band + 0.5) / (levels.size() + 1);
  }

  private boolean index(double level) {
    return Math.round(level / step) % INDEX == 0;
  }

  private void label(
      Canvas canvas,
      Panel panel,
      Ground ground,
      List<List<Polyline>> isotherms,
      List<List<Polyline>> heavy,
      Optional<Panel> zoom) {
    canvas.layer(panel.name() + "-isotherm-labels");
    LineLabels lone = new LineLabels(canvas, ground, (x, y) -> Double.POSITIVE_INFINITY);
    for (int i = 0; i < critical.size(); i++) {
      Critical c = critical.get(i);
      String text = c.name() + " " + figures().temperature(c.temperatureC(), 1);
      if (!lone.write(heavy.get(i), text, Lettering.SMALL_STRONG, 0) && zoom.isEmpty()) {
        beside(canvas, ground, heavy.get(i), text);
      }
    }
    LineLabels labels = new LineLabels(canvas, ground, (x, y) -> spacing(panel, x, y));
    for (boolean first : new boolean[] {true, false}) {
      for (int i = 0; i < levels.size(); i++) {
        if (index(levels.get(i)) == first) {
          labels.write(
              isotherms.get(i),
              Digits.shortest(levels.get(i), 6),
              first ? Lettering.SMALL_STRONG : Lettering.SMALL,
              first ? 0 : CROWDED);
        }
      }
    }
  }

  /** A label with a leader, for a line too short or too bent to carry it. */
  private void beside(Canvas canvas, Ground ground, List<Polyline> lines, String text) {
    Polyline longest = null;
    for (Polyline line : lines) {
      if (longest == null || line.length() > longest.length()) {
        longest = line;
      }
    }
    if (longest == null) {
      return;
    }
    double[] at = longest.at(longest.length() / 2);
    Box size = Plates.size(List.of(text), Lettering.SMALL_STRONG);
    PointMarks.place(ground, size, at[0], at[1], 14, 120, SectionLines.open(section()))
        .ifPresent(
            box -> {
              Plates.leader(canvas, box, at[0], at[1]);
              Plates.centred(canvas, List.of(text), box, Lettering.SMALL_STRONG, Lettering.SMALL);
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
    return figures().differenceK(step) / Math.hypot(gradient[0], gradient[1]) * panel.pointsPerM();
  }

  /**
   * The coldest point of a space, where it says anything: not of the coldest space, and not of a
   * surface whose temperature is fixed.
   */
  private Optional<Result.SurfacePoint> coldestPoint(int space) {
    double[] temperatures = temperaturesC();
    return result()
        .spaces()
        .get(space)
        .coldest()
        .filter(point -> point.filmM2KPerW() > 0)
        .filter(point -> temperatures[space] > temperatures[coldestSpace()]);
  }

  /** With the decimals that its estimated error leaves, two at most. */
  private String temperature(Result.SurfacePoint point) {
    double factor = figures().customary() ? 1.8 : 1;
    return Digits.of(figures().scaled(point.temperatureC()), point.estimatedErrorK() * factor, 2)
            .value()
        + " "
        + figures().degrees();
  }

  private void coldest(Canvas canvas, Panel panel, Ground ground, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-coldest-points");
    for (int i = 0; i < result().spaces().size(); i++) {
      Optional<Result.SurfacePoint> found = coldestPoint(i);
      if (found.isEmpty()) {
        continue;
      }
      Result.SurfacePoint point = found.get();
      double x = panel.x(section().localX(point.at()));
      double y = panel.y(section().localY(point.at()));
      if (!panel.frame().grown(-6).contains(x, y)) {
        continue;
      }
      if (elsewhere.isPresent() && elsewhere.get().contains(x, y)) {
        PointMarks.diamond(canvas, x, y);
        continue;
      }
      ground.keepClear(Box.around(x, y, 12, 12));
      labelColdest(canvas, ground, point, x, y);
      PointMarks.diamond(canvas, x, y);
    }
  }

  private void labelColdest(
      Canvas canvas, Ground ground, Result.SurfacePoint point, double x, double y) {
    String film = "Rs " + figures().film(point.filmM2KPerW());
    String factor = factor(point);
    List<String> wide = List.of(temperature(point), factor.isEmpty() ? film : factor + ", " + film);
    List<String> narrow = new ArrayList<>(List.of(temperature(point), factor, film));
    narrow.removeIf(String::isEmpty);
    IntPredicate open = SectionLines.open(section());
    for (IntPredicate accepted :
        List.of(open, (IntPredicate) owner -> owner != Ground.EDGE, owner -> true)) {
      for (List<String> lines : List.of(wide, narrow)) {
        Box size = Plates.size(lines, Lettering.STRONG);
        Optional<Box> place = ground.near(x, y, size.width(), size.height(), 12, 110, accepted);
        if (place.isPresent()) {
          ground.take(place.get());
          Plates.leader(canvas, place.get(), x, y);
          Plates.centred(canvas, lines, place.get(), Lettering.STRONG, Lettering.SMALL);
          return;
        }
      }
    }
  }

  private static String factor(Result.SurfacePoint point) {
    return point.fRsi().isPresent() ? "fRsi " + Digits.fixed(point.fRsi().getAsDouble(), 3) : "";
  }

  /** Named points: a short name with the temperature, of a long one the temperature alone. */
  private void points(Canvas canvas, Panel panel, Ground ground, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-points");
    PointMarks marks = new PointMarks(canvas, panel, ground, elsewhere);
    for (Result.PointResult point : result().points()) {
      String value = Digits.fixed(figures().scaled(point.temperatureC()), 1);
      String text = point.name().length() > LONG_NAME ? value : point.name() + " " + value;
      marks.add(section().localX(point.at()), section().localY(point.at()), text);
    }
    marks.draw();
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Temperature in " + figures().degrees());
    key.tall(this::scale, (levels.size() + 1) * Bands.STEP + 4);
    key.sample(
        (c, box) -> SectionView.line(c, box, ISOTHERM),
        "isotherms every " + Figures.round(step) + " " + figures().kelvins(),
        "");
    key.sample((c, box) -> SectionView.line(c, box, INDEX_ISOTHERM), "every fifth of them", "");
    for (Critical c : critical) {
      key.sample(
          (canvas, box) -> SectionView.line(canvas, box, c.pen()),
          c.name() + ": " + c.meaning(),
          figures().temperature(c.temperatureC(), 1));
    }
    coldestRows(key);
    key.heading("Spaces");
    for (int i = 0; i < result().spaces().size(); i++) {
      key.row(nameOf(i), climate(i));
    }
    if (!result().points().isEmpty()) {
      key.heading("Named points");
      for (Result.PointResult point : result().points()) {
        boolean other = point.filmSet() != solution.filmSet();
        key.row(
            point.name() + (other ? " (" + name(point.filmSet()) + ")" : ""),
            figures().temperature(point.temperatureC(), 2));
      }
    }
    return key;
  }

  private static String name(FilmSet set) {
    return set == FilmSet.SURFACE ? "surface set" : "heat-loss set";
  }

  private void coldestRows(Key key) {
    boolean headed = false;
    for (int i = 0; i < result().spaces().size(); i++) {
      Optional<Result.SurfacePoint> found = coldestPoint(i);
      if (found.isEmpty()) {
        continue;
      }
      if (!headed) {
        key.heading("Coldest surface, an estimate");
        headed = true;
      }
      Result.SurfacePoint point = found.get();
      key.sample(
          (c, box) -> PointMarks.diamond(c, box.midX(), box.midY()),
          nameOf(i)
              + ": "
              + (factor(point).isEmpty() ? "" : factor(point) + ", ")
              + "Rs "
              + figures().film(point.filmM2KPerW())
              + " "
              + figures().filmUnit()
              + ", "
              + name(point.filmSet()),
          temperature(point));
    }
  }

  private void scale(Canvas canvas, Box box) {
    List<String> texts = new ArrayList<>();
    List<Boolean> heavy = new ArrayList<>();
    for (double level : levels) {
      texts.add(Digits.shortest(level, 6));
      heavy.add(index(level));
    }
    Bands.scale(canvas, box, texts, heavy, k -> Palette.temperature(part(k)));
  }
}
