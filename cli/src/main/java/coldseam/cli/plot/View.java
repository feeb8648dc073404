package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.util.Optional;

/** One plot: what stands on the page, and how the section is painted into a frame of it. */
abstract class View {
  private final Result result;
  private final Caption caption;
  private final DrawnSection section;

  View(Result result, Caption caption, DrawnSection section) {
    this.result = result;
    this.caption = caption;
    this.section = section;
  }

  final Result result() {
    return result;
  }

  final Caption caption() {
    return caption;
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
   * @param zoomed whether it is the frame of a part shown larger
   * @param zoom that other frame, if it is not
   */
  abstract void paint(Canvas canvas, Panel panel, boolean zoomed, Optional<Panel> zoom);

  final Page page() {
    Box bounds = section.bounds();
    double least = 0.02 * section.extentM();
    Box drawn =
        Box.around(
            bounds.midX(),
            bounds.midY(),
            Math.max(least, bounds.width()),
            Math.max(least, bounds.height()));
    return Page.of(
        new Page.Content(
            section.detail().title(),
            subtitle(),
            state(),
            drawn,
            gutters(),
            Zoom.of(section),
            key()));
  }

  final String title() {
    return section.detail().title() + ": " + subtitle();
  }

  private String subtitle() {
    String variant = caption.variant().map(v -> " · variant “" + v + "”").orElse("");
    return shown() + variant;
  }

  /** The state of certification of the couplings. */
  private String state() {
    boolean certified =
        !result.couplings().isEmpty()
            && result.couplings().stream()
                .map(Result.Coupling::valueWPerMK)
                .allMatch(Quantity::certified);
    return certified ? "L2D CERTIFIED" : "NOT CERTIFIED";
  }

  final void draw(Canvas canvas, Page page) {
    page.drawGround(canvas);
    paint(canvas, page.panel(), false, page.zoom());
    page.zoom()
        .ifPresent(
            zoom -> {
              Zoom.mark(canvas, page.panel(), zoom);
              paint(canvas, zoom, true, Optional.empty());
              Zoom.frame(canvas, page.panel(), zoom);
            });
    page.drawWords(canvas);
  }

  /** "20 °C, 50 % r.h." */
  final String climate(int space) {
    Space said = section.detail().spaces().get(space);
    Result.SpaceResult found = result.spaces().get(space);
    String temperature =
        found.floating()
            ? Figures.temperature(found.temperatureC()) + " (floats)"
            : Figures.plain(found.temperatureC()) + " °C";
    return said.relativeHumidity().isPresent()
        ? temperature + ", " + Figures.percent(said.relativeHumidity().getAsDouble()) + " r.h."
        : temperature;
  }

  final double[] temperaturesC() {
    return result.spaces().stream().mapToDouble(Result.SpaceResult::temperatureC).toArray();
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

  static String words(FilmSet set) {
    return set == FilmSet.SURFACE
        ? "films for surface temperatures (surface set)"
        : "films for heat loss (heat-loss set)";
  }

  /** A length with its unit. */
  final String length(double metres) {
    return Figures.length(metres, caption) + " " + caption.unit();
  }
}
