package coldseam.cli.plot;

import coldseam.cli.text.Json;
import coldseam.solver.conduction.Solution;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.Collections;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;

/** The plots of one result, as SVG text or PNG bytes. Immutable and thread-safe. */
public final class Plots {
  /** The plots there are. */
  public enum Kind {
    /** Materials, spaces with films, dimensions and the reference lengths of ψ. */
    SECTION("section"),
    /** Temperature bands, isotherms, the critical isotherm, coldest points. */
    TEMPERATURE("temperature"),
    /** Heat-flow density, its direction, and the heat flow of every space. */
    HEAT_FLOW("heat-flow"),
    /** What the numbers hang on: share of each material and film. */
    SHARES("shares"),
    /** The triangles of the solution, for whoever works on the solver. */
    MESH("mesh");

    private final String stem;

    Kind(String stem) {
      this.stem = stem;
    }

    /** What a file with this plot is called, without extension. */
    public String stem() {
      return stem;
    }
  }

  /**
   * What a plot has to know beside the result.
   *
   * @param variant the variant shown, empty for the base case
   * @param unit name of the unit that lengths are written in: "mm", "cm", "m" or "in"
   * @param metresPerUnit metres per such unit
   */
  public record Caption(Optional<String> variant, String unit, double metresPerUnit) {
    /**
     * Checks the unit.
     *
     * @throws IllegalArgumentException unless {@code metresPerUnit} is more than 0
     */
    public Caption {
      if (!(metresPerUnit > 0) || !Double.isFinite(metresPerUnit)) {
        throw new IllegalArgumentException("a unit of length is more than 0 m");
      }
    }
  }

  private final Result result;
  private final Caption caption;
  private final DrawnSection section;

  private Plots(Result result, Caption caption) {
    this.result = result;
    this.caption = caption;
    section = DrawnSection.of(result);
  }

  /**
   * The plots of a result.
   *
   * @param result what was solved
   * @param caption what else the title says
   * @return the plots; nothing is drawn yet
   */
  public static Plots of(Result result, Caption caption) {
    return new Plots(result, caption);
  }

  /**
   * Draws one plot as SVG. Needs no font on the machine.
   *
   * @param kind which
   * @return an XML document
   */
  public String svg(Kind kind) {
    View view = view(kind);
    Page page = view.page();
    SvgCanvas canvas = SvgCanvas.blank(kind.stem());
    view.draw(canvas, page);
    return canvas.document(page.width(), page.height(), view.title(), view.told());
  }

  /**
   * Draws several plots as SVG, at once where the machine has the processors.
   *
   * @param kinds which
   * @return one XML document each, in the order given
   */
  public Map<Kind, String> svgs(List<Kind> kinds) {
    return begin(kinds).finish();
  }

  /**
   * Begins to draw several plots as SVG on other threads, if the machine has the processors.
   *
   * @param kinds which
   * @return the work begun; {@link Begun#finish()} draws what is left
   */
  public Begun begin(List<Kind> kinds) {
    return new Begun(this, kinds);
  }

  /** Plots being drawn. */
  public static final class Begun {
    private final Map<Kind, FutureTask<String>> tasks = new LinkedHashMap<>();

    private Begun(Plots plots, List<Kind> kinds) {
      for (Kind kind : kinds) {
        tasks.put(kind, new FutureTask<>(new Drawing(plots, kind)));
      }
      int others = Math.min(kinds.size(), Runtime.getRuntime().availableProcessors()) - 1;
      for (int i = 0; i < others; i++) {
        // A task runs once, whoever comes first.
        Thread thread = new Thread(new Work(new ArrayList<>(tasks.values())), "plots");
        thread.setDaemon(true);
        thread.start();
      }
    }

    /**
     * Draws what is left, from the end, and waits for the rest.
     *
     * @return one XML document each, in the order asked for
     */
    public Map<Kind, String> finish() {
      List<FutureTask<String>> fromTheEnd = new ArrayList<>(tasks.values());
      Collections.reverse(fromTheEnd);
      new Work(fromTheEnd).run();
      Map<Kind, String> drawn = new LinkedHashMap<>();
      for (Map.Entry<Kind, FutureTask<String>> task : tasks.entrySet()) {
        drawn.put(task.getKey(), result(task.getKey(), task.getValue()));
      }
      return drawn;
    }
  }

  private record Drawing(Plots plots, Kind kind) implements Callable<String> {
    @Override
    public String call() {
      return plots.svg(kind);
    }
  }

  private record Work(List<FutureTask<String>> tasks) implements Runnable {
    @Override
    public void run() {
      for (FutureTask<String> task : tasks) {
        task.run();
      }
    }
  }

  private static String result(Kind kind, FutureTask<String> task) {
    try {
      return task.get();
    } catch (ExecutionException e) {
      throw new IllegalStateException("the plot " + kind.stem() + " failed", e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new CancellationException("drawing was interrupted");
    }
  }

  /**
   * Draws one plot as PNG, two pixels a point.
   *
   * @param kind which
   * @return the bytes of the file
   * @throws NoFontException if the machine has no font to write its text with
   */
  public byte[] png(Kind kind) throws NoFontException {
    View view = view(kind);
    Page page = view.page();
    PngCanvas canvas = PngCanvas.blank(page.width(), page.height());
    view.draw(canvas, page);
    return canvas.bytes();
  }

  /**
   * Temperature, heat flow and material on grids over the section, as a JSON object: what a page
   * shows under a pointer. The temperature plot has those with the films for surface temperatures,
   * if they were solved, all others those with the films for heat loss.
   *
   * @param kinds which plots
   * @return the object on one line
   */
  public String soundings(List<Kind> kinds) {
    View first = view(kinds.get(0));
    Soundings soundings = new Soundings(first.figures(), section);
    Map<Solution, Integer> taken = new IdentityHashMap<>();
    Json plots = Json.onOneLine().array();
    for (Kind kind : kinds) {
      View view = view(kind);
      Page page = view.page();
      Solution solution =
          kind == Kind.TEMPERATURE ? result.surface().orElse(result.heatLoss()) : result.heatLoss();
      if (!taken.containsKey(solution)) {
        taken.put(solution, soundings.take(solution, first.temperaturesC(), page));
      }
      soundings.write(plots, kind.stem(), page, taken.get(solution));
    }
    Json all = Json.onOneLine().object();
    soundings.write(all);
    return all.raw("plots", plots.endArray().text()).endObject().text();
  }

  View view(Kind kind) {
    return switch (kind) {
      case SECTION -> new SectionView(result, caption, section);
      case TEMPERATURE -> new TemperatureView(result, caption, section);
      case HEAT_FLOW -> new HeatFlowView(result, caption, section);
      case SHARES -> new SharesView(result, caption, section);
      case MESH -> new MeshView(result, caption, section);
    };
  }
}
