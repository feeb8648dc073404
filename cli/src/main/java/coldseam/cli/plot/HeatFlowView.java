package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.text.Digits;
import coldseam.solver.conduction.Solution;
import coldseam.solver.result.Result;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/**
 * Heat flow: its density in filled bands, tubes that each carry the same heat, what passes through
 * each space. Where there are no tubes arrows show the direction.
 */
final class HeatFlowView extends View {
  /** Said where two fixed temperatures meet in a point. */
  private static final String NOT_FINITE = "no finite heat flow";

  private static final int MOST_LEVELS = 10;

  /** Part of the area with less than the lowest band begins with. */
  private static final double LITTLE = 0.02;

  /** Part of the dissipation where there is less than the highest band begins with. */
  private static final double MUCH = 0.97;

  private static final double GRID = 26;
  private static final double SHORTEST = 7;
  private static final double LONGEST = 21;

  /** Decimal orders of density beyond the levels over which arrows still shrink and grow. */
  private static final double ORDERS = 0.4;

  /** Decimal orders between two levels, about. */
  private static final double STEP = 0.3;

  /** How far the rim of a band may be drawn from its place, points. */
  private static final double DISPLACEMENT = 0.5;

  /** Part of the scale of colours under tubes, so that their lines are read on all of it. */
  private static final double QUIET = 0.6;

  private final FlowDensity density;
  private final List<Double> levels;
  private final Optional<FlowTubes> tubes;

  HeatFlowView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    Solution solution = result.heatLoss();
    density = new FlowDensity(solution.temperatures(temperaturesC()), solution.conditions());
    double little = figures().scaledDensity(density.ofArea(LITTLE));
    double much = figures().scaledDensity(much());
    List<Double> series = Levels.series(little, Math.max(much, 2 * little));
    levels = series.subList(Math.max(0, series.size() - MOST_LEVELS), series.size());
    tubes = FlowTubes.of(solution, temperaturesC(), figures());
  }

  private double much() {
    for (Result.SpaceResult space : result().spaces()) {
      if (!Double.isFinite(space.heatFlowWPerM())) {
        return density.ofArea(1 - LITTLE);
      }
    }
    return density.ofDissipation(MUCH);
  }

  @Override
  String shown() {
    return "Heat flow · " + films(result().heatLoss().filmSet());
  }

  @Override
  String told() {
    StringBuilder out = new StringBuilder("Density and direction of the heat flow in the detail.");
    if (tubes.isPresent()) {
      out.append(" Each tube carries ").append(tubes.get().each()).append('.');
    }
    for (Result.SpaceResult space : result().spaces()) {
      out.append(' ').append(space.name()).append(": ").append(passing(space)).append('.');
    }
    return out.toString();
  }

  /** "12.3 W/m into the detail". */
  private String passing(Result.SpaceResult space) {
    double flow = space.heatFlowWPerM();
    if (!Double.isFinite(flow)) {
      return NOT_FINITE;
    }
    String sense = flow > 0 ? " into the detail" : flow < 0 ? " out of the detail" : "";
    return figures().flow(Math.abs(flow), halfWidth(space.name()))
        + Figures.JOINED
        + figures().flowUnit()
        + sense;
  }

  private String signed(double flow, double halfWidth) {
    if (!Double.isFinite(flow)) {
      return NOT_FINITE;
    }
    return Digits.signed(figures().flow(flow, halfWidth)) + Figures.JOINED + figures().flowUnit();
  }

  /** How far the flow of a space may be off: Σ half-width of its couplings × difference, W/m. */
  private double halfWidth(String space) {
    double sum = 0;
    for (Result.Coupling coupling : result().couplings()) {
      if (coupling.from().equals(space) || coupling.to().equals(space)) {
        double from = temperaturesC()[section().detail().spaceIndex(coupling.from())];
        double to = temperaturesC()[section().detail().spaceIndex(coupling.to())];
        if (from != to) {
          sum += coupling.valueWPerMK().halfWidth() * Math.abs(from - to);
        }
      }
    }
    return sum;
  }

  /** The flow through a stretch; infinite if its space has no finite one. */
  private double stretchFlow(Result.StretchResult stretch) {
    int space = section().detail().spaceIndex(stretch.space());
    double whole = space < 0 ? 0 : result().spaces().get(space).heatFlowWPerM();
    return Double.isFinite(whole) ? stretch.heatFlowWPerM() : whole;
  }

  private double worstHalfWidth() {
    double worst = 0;
    for (Result.SpaceResult space : result().spaces()) {
      worst = Math.max(worst, halfWidth(space.name()));
    }
    return worst;
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(54, 54, 62, 78);
  }

  @Override
  void paint(Canvas canvas, Panel panel, Optional<Panel> zoom) {
    double[] traced = new double[levels.size()];
    for (int k = 0; k < traced.length; k++) {
      traced[k] = Math.log10(figures().densityWPerM2(levels.get(k)));
    }
    LinearPatch patch =
        Sampling.of(density, panel.window(), panel.pointsPerM(), STEP, DISPLACEMENT);
    Bands bands = new Bands(Contours.of(patch, traced), panel);
    canvas.layer(panel.name() + "-bands");
    bands.fillAll(canvas, colour(0));
    for (int k = 0; k < traced.length; k++) {
      bands.fill(canvas, k, colour(k + 1));
    }
    SectionLines lines = new SectionLines(section(), panel);
    if (!blackens(panel, zoom)) {
      lines.joints(canvas, Palette.INK, Pen.HAIR);
      if (tubes.isPresent()) {
        tubes.get().draw(canvas, panel, density);
      } else {
        arrows(canvas, panel);
      }
    }
    lines.outline(canvas);
    Ground ground = SectionLines.ground(section(), panel);
    frame(canvas, panel, ground, zoom);
    SpaceLabels labels = new SpaceLabels(canvas, section(), panel, ground);
    labels.write(climatesAndFlows());
    new StretchMarks(section(), panel)
        .draw(canvas, ground, labels, SectionLines.open(section()), stretchFlows());
  }

  private List<List<String>> climatesAndFlows() {
    List<List<String>> said = new ArrayList<>();
    for (int i = 0; i < result().spaces().size(); i++) {
      said.add(List.of(nameOf(i) + ", " + climate(i), passing(result().spaces().get(i))));
    }
    return said;
  }

  private Colour colour(int band) {
    double part = (band + 0.5) / (levels.size() + 1);
    return Palette.flow(tubes.isPresent() ? QUIET * part : part);
  }

  private List<Colour> colours() {
    List<Colour> colours = new ArrayList<>();
    for (int band = 0; band <= levels.size(); band++) {
      colours.add(colour(band));
    }
    return colours;
  }

  private List<String> stretchFlows() {
    List<String> said = new ArrayList<>();
    for (Result.StretchResult stretch : result().stretches()) {
      said.add(stretch.name() + " " + signed(stretchFlow(stretch), worstHalfWidth()));
    }
    return said;
  }

  /** Arrows on a staggered grid, longer where more flows, all one path. */
  private void arrows(Canvas canvas, Panel panel) {
    canvas.layer(panel.name() + "-arrows");
    Path2D path = new Path2D.Double();
    Box frame = panel.frame();
    int row = 0;
    for (double y = frame.y0() + GRID / 2; y < frame.y1(); y += GRID, row++) {
      double shift = row % 2 == 0 ? 0 : GRID / 2;
      for (double x = frame.x0() + GRID / 2 + shift; x < frame.x1(); x += GRID) {
        double[] q = density.at(panel.localX(x), panel.localY(y));
        if (q.length > 0 && Math.hypot(q[0], q[1]) > 0) {
          arrow(path, panel, x, y, q);
        }
      }
    }
    canvas.stroke(path, Palette.PAPER, new Pen(1.6f));
    canvas.fill(path, Palette.INK);
  }

  private void arrow(Path2D path, Panel panel, double x, double y, double[] q) {
    double size = Math.hypot(q[0], q[1]);
    double first = levels.isEmpty() ? size : figures().densityWPerM2(levels.get(0));
    double last = levels.isEmpty() ? size : figures().densityWPerM2(levels.get(levels.size() - 1));
    double least = Math.log10(first) - ORDERS;
    double most = Math.log10(last) + ORDERS;
    double part = (Math.log10(size) - least) / (most - least);
    if (part <= 0) {
      return;
    }
    double length = SHORTEST + (LONGEST - SHORTEST) * Math.min(1, part);
    double ux = q[0] / size;
    double uy = -q[1] / size;
    double half = length / 2 + 1;
    if (inside(panel, x + half * ux, y + half * uy)
        && inside(panel, x - half * ux, y - half * uy)) {
      outline(path, x, y, ux, uy, length);
    }
  }

  private boolean inside(Panel panel, double x, double y) {
    return panel.frame().contains(x, y) && density.at(panel.localX(x), panel.localY(y)).length > 0;
  }

  private static void outline(
      Path2D path, double x, double y, double ux, double uy, double length) {
    double half = length / 2;
    double head = Math.min(6, 0.5 * length);
    double[][] outline = {
      {-half, -0.45},
      {half - head, -0.45},
      {half - head, -2.4},
      {half, 0},
      {half - head, 2.4},
      {half - head, 0.45},
      {-half, 0.45}
    };
    for (int i = 0; i < outline.length; i++) {
      double px = x + outline[i][0] * ux - outline[i][1] * uy;
      double py = y + outline[i][0] * uy + outline[i][1] * ux;
      if (i == 0) {
        path.moveTo(px, py);
      } else {
        path.lineTo(px, py);
      }
    }
    path.closePath();
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Density in " + figures().densityUnit());
    key.tall(new Scale(), (levels.size() + 1) * Bands.STEP + 4);
    if (tubes.isPresent()) {
      explain(key, tubes.get());
    } else {
      key.sample(new Arrow(), "direction of flow; longer where more flows", "");
    }
    key.heading("Heat flow, + into the detail");
    for (Result.SpaceResult space : result().spaces()) {
      key.row(space.name(), signed(space.heatFlowWPerM(), halfWidth(space.name())));
    }
    if (result().heatLoss().prescribedFlow() != 0) {
      key.row("given flows", signed(result().heatLoss().prescribedFlow(), 0));
    }
    if (!result().stretches().isEmpty()) {
      key.heading("Of it, through stretches");
      for (Result.StretchResult stretch : result().stretches()) {
        key.row(stretch.name(), signed(stretchFlow(stretch), worstHalfWidth()));
      }
    }
    return key;
  }

  private static void explain(Key key, FlowTubes tubes) {
    key.heading("Heat flows between the lines");
    key.sample(new Tube(), "each tube between two lines carries " + tubes.each(), "");
    if (tubes.reason().isPresent()) {
      key.note(tubes.reason().get());
    }
    key.note("No heat crosses a line; a tube at the rim may carry less.");
    if (tubes.seamed()) {
      key.sample(
          new Key.Line(FlowTubes.SEAM), "heat crosses here; only the lines do not go on", "");
    }
  }

  private static final class Tube implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      Path2D heads = new Path2D.Double();
      for (double y : new double[] {box.midY() - 4, box.midY() + 4}) {
        canvas.stroke(new Line2D.Double(box.x0(), y, box.x1(), y), Palette.INK, FlowTubes.LINE);
        FlowTubes.head(heads, box.midX(), y, 1, 0);
      }
      canvas.fill(heads, Palette.INK);
    }
  }

  private static final class Arrow implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      Path2D path = new Path2D.Double();
      outline(path, box.midX(), box.midY(), 1, 0, LONGEST);
      canvas.fill(path, Palette.INK);
    }
  }

  private final class Scale implements Key.Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      List<String> texts = new ArrayList<>();
      for (double level : levels) {
        texts.add(Figures.round(level));
      }
      Bands.scale(canvas, box, texts, Collections.nCopies(levels.size(), false), colours());
    }
  }
}
