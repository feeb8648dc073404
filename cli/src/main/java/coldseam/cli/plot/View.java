package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** One plot: what stands on the page, and how the section is painted into a frame of it. */
abstract class View {
  /** Breadth of a section below which nothing is drawn in it that a zoom shows better, points. */
  private static final double SMALLEST = 24;

  private final Result result;
  private final Caption caption;
  private final Figures figures;
  private final DrawnSection section;

  View(Result result, Caption caption, DrawnSection section) {
    this.result = result;
    this.caption = caption;
    this.section = section;
    figures = new Figures(caption, round());
  }

  final Result result() {
    return result;
  }

  final Figures figures() {
    return figures;
  }

  final DrawnSection section() {
    return section;
  }

  /** What is shown and with which films, for the line under the title. */
  abstract String shown();

  /** What a reader who cannot see the plot is told. */
  abstract String told();

  /** Whether the section is drawn with room for dimensions around it. */
  abstract Page.Gutters gutters();

  /** The key. */
  abstract Key key();

  /**
   * Paints the section into a frame.
   *
   * @param canvas what it is drawn on
   * @param panel the frame
   * @param zoom the frame of the part shown larger, if this is the frame of the whole
   */
  abstract void paint(Canvas canvas, Panel panel, Optional<Panel> zoom);

  /** What of the drawing is laid out, m. */
  Box drawn() {
    Box bounds = section.bounds();
    double least = 0.02 * section.extentM();
    return Box.around(
        bounds.midX(),
        bounds.midY(),
        Math.max(least, bounds.width()),
        Math.max(least, bounds.height()));
  }

  /** The part of it that is shown larger, if any. */
  Optional<Box> zoomed() {
    return Zoom.of(section);
  }

  final Page page() {
    return Page.of(
        new Page.Content(
            section.detail().title(), subtitle(), state(), drawn(), gutters(), zoomed(), key()));
  }

  final String title() {
    return section.detail().title() + ": " + subtitle();
  }

  private String subtitle() {
    Optional<String> variant = caption.variant();
    return shown() + (variant.isEmpty() ? "" : " · variant “" + variant.get() + "”");
  }

  /** The state of certification, for the stamp. */
  String state() {
    return certified() ? (round() ? "L3D" : "L2D") + " CERTIFIED" : "NOT CERTIFIED";
  }

  /** Whether the section is turned about its axis. */
  final boolean round() {
    return section.axis().isPresent();
  }

  /** Whether bounds of every coupling are proved. */
  final boolean certified() {
    for (Result.Coupling coupling : result.couplings()) {
      if (!coupling.valueWPerMK().certified()) {
        return false;
      }
    }
    return !result.couplings().isEmpty();
  }

  final void draw(Canvas canvas, Page page) {
    page.drawGround(canvas);
    paint(canvas, page.panel(), page.zoom());
    if (page.zoom().isPresent()) {
      Panel zoom = page.zoom().get();
      Zoom.mark(canvas, page.panel(), zoom);
      paint(canvas, zoom, Optional.empty());
      Zoom.frame(canvas, page.panel(), zoom);
    }
    page.drawWords(canvas);
  }

  /** "20 °C, 50 % r.h." */
  final String climate(int space) {
    Space said = section.detail().spaces().get(space);
    Result.SpaceResult found = result.spaces().get(space);
    String temperature =
        found.floating()
            ? figures.temperature(found.temperatureC(), 1) + " (floats)"
            : figures.plainTemperature(found.temperatureC());
    return said.relativeHumidity().isPresent()
        ? temperature
            + ", "
            + Figures.percent(said.relativeHumidity().getAsDouble())
            + Figures.JOINED
            + "r.h."
        : temperature;
  }

  /** Name of a space. */
  final String nameOf(int space) {
    return section.detail().spaces().get(space).name();
  }

  /** Name and climate of each space. */
  final List<List<String>> namesAndClimates() {
    List<List<String>> said = new ArrayList<>();
    for (int i = 0; i < section.detail().spaces().size(); i++) {
      said.add(List.of(nameOf(i), climate(i)));
    }
    return said;
  }

  /** The part of a frame that is shown larger in another. */
  static Optional<Box> shownElsewhere(Panel panel, Optional<Panel> zoom) {
    return zoom.isEmpty() ? Optional.empty() : Optional.of(panel.on(zoom.get().window()));
  }

  final double[] temperaturesC() {
    double[] temperatures = new double[result.spaces().size()];
    for (int i = 0; i < temperatures.length; i++) {
      temperatures[i] = result.spaces().get(i).temperatureC();
    }
    return temperatures;
  }

  /** Index of the coldest space; −1 if there is none. */
  final int coldestSpace() {
    double[] temperatures = temperaturesC();
    int coldest = -1;
    for (int i = 0; i < temperatures.length; i++) {
      if (coldest < 0 || temperatures[i] < temperatures[coldest]) {
        coldest = i;
      }
    }
    return coldest;
  }

  /** Whether the two film sets are the same here, so that one solution serves both. */
  final boolean sameFilms() {
    return result.surface().isPresent() && result.surface().get() == result.heatLoss();
  }

  /** Which films the temperatures of a solution were computed with. */
  final String films(FilmSet set) {
    if (sameFilms()) {
      return "films of the heat-loss and surface sets, which are the same here";
    }
    return set == FilmSet.SURFACE
        ? "surface set of films (for surface temperatures)"
        : "heat-loss set of films (for heat flow)";
  }

  /** Whether a frame shows the section so small that lines in it would only blacken it. */
  final boolean blackens(Panel panel, Optional<Panel> zoom) {
    double across = Math.min(section.bounds().width(), section.bounds().height());
    return zoom.isPresent() && across * panel.pointsPerM() < SMALLEST;
  }

  /** Labels, the scale and the direction that every frame has, and what is kept clear of labels. */
  final void frame(Canvas canvas, Panel panel, Ground ground, Optional<Panel> zoom) {
    new SectionLines(section, panel).keepClear(ground);
    if (zoom.isPresent()) {
      Zoom.keepClear(ground, panel, zoom.get());
    }
    if (panel.name().equals(Panel.ZOOM)) {
      ground.take(Zoom.words(panel));
    } else {
      String plan = round() ? "level" : "plan";
      ScaleBar.direction(canvas, panel, ground, section.detail().view(), plan);
    }
    ScaleBar.draw(canvas, panel, ground, section, figures);
  }
}
