package coldseam.cli.plot;

import coldseam.solver.result.Result;
import java.util.Optional;

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

  private View view(Kind kind) {
    return switch (kind) {
      case SECTION -> new SectionView(result, caption, section);
      case TEMPERATURE -> new TemperatureView(result, caption, section);
      case HEAT_FLOW -> new HeatFlowView(result, caption, section);
      case MESH -> new MeshView(result, caption, section);
    };
  }
}
