package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.solver.conduction.Solution;
import coldseam.solver.result.Result;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** Heat flow: its density in filled bands, its direction, what passes through each space. */
final class HeatFlowView extends View {
  private static final int MOST_LEVELS = 10;
  private static final double LITTLE = 0.02;
  private static final double MUCH = 0.998;
  private static final double BAND = 14;
  private static final double GRID = 26;
  private static final double SHORTEST = 7;
  private static final double LONGEST = 21;

  private final FlowDensity density;
  private final List<Double> levels;

  HeatFlowView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    Solution solution = result.heatLoss();
    density =
        new FlowDensity(solution.temperatures(temperaturesC()), solution.conditions());
    LinearPatch all = density.logarithms(section.bounds().grown(section.extentM()));
    double little = FlowDensity.quantile(all, LITTLE);
    double much = FlowDensity.quantile(all, MUCH);
    List<Double> series = Levels.series(little, Math.max(much, 1.5 * little));
    levels = series.subList(Math.max(0, series.size() - MOST_LEVELS), series.size());
  }

  @Override
  String shown() {
    return "Heat flow · " + words(result().heatLoss().filmSet());
  }

  @Override
  String told() {
    StringBuilder out = new StringBuilder("Density and direction of the heat flow in the detail.");
    for (Result.SpaceResult space : result().spaces()) {
      out.append(' ').append(space.name()).append(": ").append(flow(space.heatFlowWPerM()));
      out.append('.');
    }
    return out.toString();
  }

  /** "12.3 W/m into the detail". */
  private static String flow(double wPerM) {
    String sense = wPerM > 0 ? " into the detail" : wPerM < 0 ? " out of the detail" : "";
    return Figures.significant(Math.abs(wPerM), 4) + " W/m" + sense;
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(50, 50, 58, 62);
  }

  @Override
  void paint(Canvas canvas, Panel panel, boolean zoomed, Optional<Panel> zoom) {
    Contours contours = Contours.of(density.logarithms(panel.window()));
    canvas.layer(panel.name() + "-bands");
    band(canvas, panel, contours, Double.NEGATIVE_INFINITY, 0);
    for (int k = 0; k < levels.size(); k++) {
      band(canvas, panel, contours, Math.log10(levels.get(k)), k + 1);
    }
    SectionLines lines = new SectionLines(section(), panel);
    lines.joints(canvas, Palette.INK, Pen.HAIR);
    arrows(canvas, panel);
    lines.outline(canvas);
    Ground ground = SectionLines.ground(section(), panel);
    ScaleBar.draw(canvas, panel, ground, caption());
    if (zoomed) {
      ground.take(Zoom.words(panel));
    } else {
      ScaleBar.direction(canvas, panel, ground, section().detail().view());
    }
    SpaceLabels labels = new SpaceLabels(canvas, section(), panel, ground);
    labels.write(
        i ->
            List.of(
                section().detail().spaces().get(i).name() + ", " + climate(i),
                flow(result().spaces().get(i).heatFlowWPerM())));
    IntPredicate open = owner -> owner == Ground.OPEN || owner >= 0 && !section().solid(owner);
    new StretchMarks(section(), panel)
        .draw(canvas, ground, labels, open, i -> name(i) + ": " + stretchFlow(i));
  }

  private String name(int stretch) {
    return section().detail().stretches().get(stretch).name();
  }

  private String stretchFlow(int stretch) {
    return Figures.significant(result().stretches().get(stretch).heatFlowWPerM(), 3) + " W/m";
  }

  private void band(Canvas canvas, Panel panel, Contours contours, double from, int k) {
    List<Polyline> rings = new ArrayList<>();
    double tolerance = TemperatureView.SIMPLIFIED / panel.pointsPerM();
    for (Polyline ring : contours.atOrAbove(from)) {
      Polyline simple = Simplification.of(ring, tolerance);
      if (simple.size() > 2) {
        Clip.ring(simple.on(panel), panel.frame()).ifPresent(rings::add);
      }
    }
    if (!rings.isEmpty()) {
      canvas.fill(Polyline.path(rings), Palette.flow((k + 0.5) / (levels.size() + 1)));
    }
  }

  /** Arrows on a staggered grid, longer where more flows, all one path. */
  private void arrows(Canvas canvas, Panel panel) {
    canvas.layer(panel.name() + "-arrows");
    Path2D path = new Path2D.Double();
    Box frame = panel.frame();
    double least = Math.log10(levels.isEmpty() ? 1 : levels.get(0)) - 0.4;
    double most = Math.log10(levels.isEmpty() ? 10 : levels.get(levels.size() - 1)) + 0.4;
    int row = 0;
    for (double y = frame.y0() + GRID / 2; y < frame.y1(); y += GRID, row++) {
      double shift = row % 2 == 0 ? 0 : GRID / 2;
      for (double x = frame.x0() + GRID / 2 + shift; x < frame.x1(); x += GRID) {
        double[] q = density.at(panel.localX(x), panel.localY(y));
        if (q == null) {
          continue;
        }
        double size = Math.hypot(q[0], q[1]);
        double part = (Math.log10(size) - least) / (most - least);
        if (size > 0 && part > 0) {
          double length = SHORTEST + (LONGEST - SHORTEST) * Math.min(1, part);
          arrow(path, x, y, q[0] / size, -q[1] / size, length);
        }
      }
    }
    canvas.stroke(path, Palette.PAPER, new Pen(1.6f));
    canvas.fill(path, Palette.INK);
  }

  private static void arrow(
      Path2D path, double x, double y, double ux, double uy, double length) {
    double half = length / 2;
    double head = Math.min(6, 0.5 * length);
    double[][] outline = {
      {-half, -0.45}, {half - head, -0.45}, {half - head, -2.4}, {half, 0},
      {half - head, 2.4}, {half - head, 0.45}, {-half, 0.45}
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
    key.heading("Heat-flow density in W/m²");
    key.tall(this::scale, (levels.size() + 1) * BAND + 4);
    key.sample(
        (canvas, box) -> {
          Path2D path = new Path2D.Double();
          arrow(path, box.midX(), box.midY(), 1, 0, LONGEST);
          canvas.fill(path, Palette.INK);
        },
        "direction of flow; longer where more flows",
        "");
    key.heading("Heat flow per metre of detail, + into it");
    for (Result.SpaceResult space : result().spaces()) {
      key.row(space.name(), signed(space.heatFlowWPerM()));
    }
    if (result().heatLoss().prescribedFlow() != 0) {
      key.row("given flows", signed(result().heatLoss().prescribedFlow()));
    }
    if (!result().stretches().isEmpty()) {
      key.heading("Of it through stretches");
      for (Result.StretchResult stretch : result().stretches()) {
        key.row(stretch.name(), signed(stretch.heatFlowWPerM()));
      }
    }
    return key;
  }

  private static String signed(double wPerM) {
    return (wPerM > 0 ? "+" : "") + Figures.significant(wPerM, 4) + " W/m";
  }

  private void scale(Canvas canvas, Box box) {
    int bands = levels.size() + 1;
    double top = box.y0() + 2;
    for (int k = 0; k < bands; k++) {
      double y = top + (bands - 1 - k) * BAND;
      canvas.fill(
          new Rectangle2D.Double(box.x0(), y, 30, BAND), Palette.flow((k + 0.5) / bands));
    }
    for (int k = 0; k < levels.size(); k++) {
      double y = top + (bands - 1 - k) * BAND;
      canvas.stroke(new Line2D.Double(box.x0(), y, box.x0() + 34, y), Palette.INK, Pen.HAIR);
      canvas.text(Figures.quantity(levels.get(k)), box.x0() + 40, y + 3.5, Lettering.SMALL);
    }
    canvas.stroke(
        new Rectangle2D.Double(box.x0(), top, 30, bands * BAND), Palette.INK, Pen.FINE);
  }
}
