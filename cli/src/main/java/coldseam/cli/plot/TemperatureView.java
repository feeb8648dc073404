package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.text.Digits;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;

/**
 * Temperatures: filled bands, labelled isotherms at round steps, every fifth heavier, the critical
 * isotherms of the warmest space with a stated humidity heaviest, coldest points with their values.
 */
final class TemperatureView extends View {
  private static final Pen MOULD = new Pen(2.4f);
  private static final Pen DEW = new Pen(2.4f, 9, 4);

  /** Points with longer names are labelled by their temperature alone. */
  private static final int LONG_NAME = 4;

  private final Solution solution;
  private final Isotherms isotherms;
  private final ColdestPoints coldest;

  TemperatureView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    solution = result.surface().orElse(result.heatLoss());
    isotherms = new Isotherms(solution.temperatures(temperaturesC()), figures(), critical());
    coldest = new ColdestPoints(result, section, figures());
  }

  private List<Isotherms.Critical> critical() {
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
    String of = space.name() + " (" + climate(warmest) + "), ISO" + Figures.JOINED + "13788";
    return List.of(
        new Isotherms.Critical(
            "mould-limit",
            "mould limit",
            CriticalTemperature.of(air, humidity, CriticalTemperature.MOULD),
            "80 % humidity at the surface, air of " + of,
            MOULD),
        new Isotherms.Critical(
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
    out.append(Figures.round(isotherms.step())).append(' ').append(figures().kelvins()).append('.');
    for (Result.SpaceResult space : result().spaces()) {
      out.append(' ').append(space.name()).append(' ');
      out.append(figures().temperature(space.temperatureC(), 1));
      if (space.coldest().isPresent()) {
        out.append(", coldest surface ").append(coldest.temperature(space.coldest().get()));
      }
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
    Isotherms.Traced traced = isotherms.in(panel);
    traced.fill(canvas);
    SectionLines lines = new SectionLines(section(), panel);
    boolean small = blackens(panel, zoom);
    if (!small) {
      lines.joints(canvas, Palette.mix(Palette.INK, Palette.PAPER, 0.25), Pen.HAIR);
      traced.drawLines(canvas);
    }
    lines.outline(canvas);
    if (!small) {
      traced.drawCritical(canvas);
    }
    Ground ground = SectionLines.ground(section(), panel);
    frame(canvas, panel, ground, zoom);
    Optional<Box> elsewhere = shownElsewhere(panel, zoom);
    coldest.draw(canvas, panel, ground, elsewhere);
    new SpaceLabels(canvas, section(), panel, ground).write(namesAndClimates());
    points(canvas, panel, ground, elsewhere);
    if (elsewhere.isPresent()) {
      ground.take(elsewhere.get());
    }
    traced.label(canvas, ground, section(), zoom.isEmpty());
  }

  /** Whether a point's temperature is not of the field that is drawn. */
  private boolean otherFilms(Result.PointResult point) {
    return point.filmSet() != solution.filmSet() && !sameFilms();
  }

  /**
   * Named points: a short name with the temperature, of a long one the temperature alone; if its
   * temperature was computed with other films than those of the drawing, the name alone.
   */
  private void points(Canvas canvas, Panel panel, Ground ground, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-points");
    PointMarks marks = new PointMarks(canvas, panel, ground, elsewhere);
    for (Result.PointResult point : result().points()) {
      String value = Digits.fixed(figures().scaled(point.temperatureC()), 1);
      String text = point.name().length() > LONG_NAME ? value : point.name() + " " + value;
      marks.add(
          section().localX(point.at()),
          section().localY(point.at()),
          otherFilms(point) ? point.name() : text);
    }
    marks.draw();
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Temperature in " + figures().degrees());
    key.tall(isotherms.scale(), isotherms.bands() * Bands.STEP + 4);
    key.sample(
        new Key.Line(Isotherms.PLAIN),
        "isotherms every " + Figures.round(isotherms.step()) + " " + figures().kelvins(),
        "");
    key.sample(new Key.Line(Isotherms.INDEX), "every fifth of them", "");
    for (Isotherms.Critical c : isotherms.critical()) {
      key.sample(
          new Key.Line(c.pen()),
          c.name() + ": " + c.meaning(),
          figures().temperature(c.temperatureC(), 1));
    }
    coldest.list(key);
    key.heading("Spaces");
    for (int i = 0; i < result().spaces().size(); i++) {
      key.row(nameOf(i), climate(i));
    }
    if (!result().points().isEmpty()) {
      key.heading("Named points");
      for (Result.PointResult point : result().points()) {
        String films = otherFilms(point) ? " (" + ColdestPoints.name(point.filmSet()) + ")" : "";
        key.row(point.name() + films, figures().temperature(point.temperatureC(), 2));
      }
    }
    return key;
  }
}
