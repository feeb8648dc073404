package coldseam.cli.plot;

import coldseam.cli.text.Json;
import coldseam.mesh.plane.Point;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.Fill;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;

/**
 * Temperature, heat flow and material on grids over the section, so that a page can show them under
 * a pointer without the mesh. Between the places of a grid they are not known: a sheet thinner than
 * its step may fall through. Plots with the same films share their grids.
 */
final class Soundings {
  /** Distance of the places on the sheet, points. */
  private static final double STEP = 3.5;

  /** Stands for a place outside of the section. */
  private static final int OUTSIDE = 255;

  private static final int TEMPERATURE_STEPS = 0xFFFF;
  private static final int FLOW_STEPS = 255;
  private static final int TURN_STEPS = 256;

  /** Decimal orders of heat-flow density below the greatest that are told apart. */
  private static final double ORDERS = 4;

  private final Figures figures;
  private final Box bounds;
  private final List<String> materials = new ArrayList<>();
  private final int[] materialOf;
  private final List<Grid> grids = new ArrayList<>();

  Soundings(Figures figures, DrawnSection section) {
    this.figures = figures;
    this.bounds = section.bounds();
    List<Fill> fills = section.fills();
    this.materialOf = new int[fills.size()];
    for (int label = 0; label < materialOf.length; label++) {
      String name = fills.get(label).name();
      int known = materials.indexOf(name);
      if (known < 0 && materials.size() < OUTSIDE) {
        known = materials.size();
        materials.add(name);
      }
      materialOf[label] = known < 0 ? OUTSIDE - 1 : known;
    }
  }

  /** The places of one window of the drawing, row by row from its upper left corner. */
  private final class Grid {
    private final double left;
    private final double top;
    private final double stepM;
    private final int columns;
    private final int rows;
    private final Point origin;
    private final double[] temperatures;
    private final double[] flows;
    private final double[] turns;
    private final int[] materialAt;

    Grid(Panel panel, TemperatureField field, FlowDensity density) {
      Box window = panel.window();
      left = Math.max(window.x0(), bounds.x0());
      top = Math.min(window.y1(), bounds.y1());
      stepM = STEP / panel.pointsPerM();
      columns = count(Math.min(window.x1(), bounds.x1()) - left);
      rows = count(top - Math.max(window.y0(), bounds.y0()));
      origin = field.mesh().origin();
      temperatures = new double[columns * rows];
      flows = new double[columns * rows];
      turns = new double[columns * rows];
      materialAt = new int[columns * rows];
      for (int row = 0; row < rows; row++) {
        for (int column = 0; column < columns; column++) {
          double x = left + (column + 0.5) * stepM;
          sound(row * columns + column, x, top - (row + 0.5) * stepM, field, density);
        }
      }
    }

    private int count(double lengthM) {
      return Math.max(1, (int) Math.ceil(lengthM / stepM));
    }

    private void sound(int place, double x, double y, TemperatureField field, FlowDensity density) {
      int t = field.mesh().locate(x, y);
      materialAt[place] = OUTSIDE;
      if (t < 0) {
        return;
      }
      double[] l = Barycentric.of(field.mesh(), t, x, y);
      double[] q = density.at(x, y);
      materialAt[place] = materialOf[field.mesh().label(t)];
      temperatures[place] = figures.scaled(field.in(t, l[0], l[1], l[2]));
      flows[place] = figures.scaledDensity(Math.sqrt(q[0] * q[0] + q[1] * q[1]));
      turns[place] = Math.atan2(q[1], q[0]);
    }

    void write(Json json) {
      double least = Double.POSITIVE_INFINITY;
      double most = Double.NEGATIVE_INFINITY;
      double greatest = 0;
      int n = materialAt.length;
      for (int i = 0; i < n; i++) {
        if (materialAt[i] != OUTSIDE) {
          least = Math.min(least, temperatures[i]);
          most = Math.max(most, temperatures[i]);
          greatest = Math.max(greatest, flows[i]);
        }
      }
      byte[] t = new byte[2 * n];
      byte[] q = new byte[n];
      byte[] turn = new byte[n];
      byte[] material = new byte[n];
      for (int i = 0; i < n; i++) {
        material[i] = (byte) materialAt[i];
        if (materialAt[i] == OUTSIDE) {
          continue;
        }
        double part = most > least ? (temperatures[i] - least) / (most - least) : 0;
        int scaled = (int) Math.round(part * TEMPERATURE_STEPS);
        t[2 * i] = (byte) scaled;
        t[2 * i + 1] = (byte) (scaled >> 8);
        double order = flows[i] > 0 ? 1 + Math.log10(flows[i] / greatest) / ORDERS : 0;
        q[i] = (byte) Math.round(Math.max(0, order) * FLOW_STEPS);
        turn[i] = (byte) Math.round(turns[i] / (2 * Math.PI) * TURN_STEPS);
      }
      double unit = figures.caption().metresPerUnit();
      json.object()
          .member("left", (left + origin.x()) / unit)
          .member("top", (top + origin.y()) / unit)
          .member("step", stepM / unit)
          .member("columns", columns)
          .member("rows", rows)
          .member("least", least > most ? 0 : least)
          .member("most", least > most ? 0 : most)
          .member("greatest", greatest)
          .member("t", Base64.getEncoder().encodeToString(t))
          .member("q", Base64.getEncoder().encodeToString(q))
          .member("turn", Base64.getEncoder().encodeToString(turn))
          .member("material", Base64.getEncoder().encodeToString(material))
          .endObject();
    }
  }

  /**
   * Takes the grids of a solution, fine enough for the frames of a page.
   *
   * @return how many grids were there before
   */
  int take(Solution solution, double[] temperaturesC, Page page) {
    int before = grids.size();
    TemperatureField field = solution.temperatures(temperaturesC);
    FlowDensity density = new FlowDensity(field, solution.conditions());
    grids.add(new Grid(page.panel(), field, density));
    if (page.zoom().isPresent()) {
      grids.add(new Grid(page.zoom().get(), field, density));
    }
    return before;
  }

  /** Writes the grids, and what their figures mean. */
  void write(Json json) {
    json.member("unit", figures.caption().unit())
        .member("degrees", figures.degrees())
        .member("density", figures.densityUnit())
        .member("orders", ORDERS)
        .member("materials", materials)
        .array("grids");
    for (Grid grid : grids) {
      grid.write(json);
    }
    json.endArray();
  }

  /**
   * Writes where on a plot its frames lie and which grids they show.
   *
   * @param json what it is added to
   * @param id of the plot
   * @param page its page
   * @param first number of the grid of its first frame
   */
  void write(Json json, String id, Page page, int first) {
    json.object().member("id", id).array("frames");
    frame(json, page.panel(), first);
    if (page.zoom().isPresent()) {
      frame(json, page.zoom().get(), Math.min(first + 1, grids.size() - 1));
    }
    json.endArray().endObject();
  }

  private void frame(Json json, Panel panel, int grid) {
    Point origin = grids.get(grid).origin;
    double unit = figures.caption().metresPerUnit();
    json.object()
        .numbers(
            "box", panel.frame().x0(), panel.frame().y0(), panel.frame().x1(), panel.frame().y1())
        .member("x", (panel.localX(panel.frame().x0()) + origin.x()) / unit)
        .member("y", (panel.localY(panel.frame().y0()) + origin.y()) / unit)
        .member("perPoint", 1 / panel.pointsPerM() / unit)
        .member("grid", grid)
        .endObject();
  }
}
