package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.text.Digits;
import coldseam.solver.detail.Exposure;
import coldseam.solver.result.Result;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What the numbers hang on: a bar for the share of each material and film, and beside it what ψ
 * does if that conducts more.
 */
final class SharesView extends View {
  /** Size of the drawing, points of a sheet: as wide as the frame beside the key. */
  private static final double WIDTH = 648;

  private static final double ROW = 30;
  private static final double BAR = 18;
  private static final double HEAD = 66;
  private static final double AIR = 14;
  private static final double NAMES = 150;
  private static final double COLUMN = 72;
  private static final double FIGURE = 56;
  private static final double LEAST_FRINGE = 10;

  /** Heat flows are written to a tenth. */
  private static final double FLOW_HALF_WIDTH = 0.05;

  /** Low drawings would be laid over the whole sheet, with the key below. */
  private static final double LEAST_HEIGHT = 320;

  private static final int MOST_ROWS = 18;
  private static final int MOST_PSI = 3;
  private static final double RISE = 0.1;
  private static final int MOST_GRID_LINES = 5;

  /** One bar. */
  private record Row(String name, Optional<Result.Share> share, double part) {}

  private final List<Row> rows = new ArrayList<>();
  private final List<Result.LinearTransmittance> psi;
  private final List<MaterialLook> looks;

  SharesView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    looks = MaterialLook.of(section.fills());
    List<Result.LinearTransmittance> known = result.psiWithSensitivities();
    psi = known.subList(0, Math.min(MOST_PSI, known.size()));
    List<Result.Share> shares = result.shares().parts();
    int shown = shares.size() > MOST_ROWS ? MOST_ROWS - 1 : shares.size();
    double rest = 0;
    for (int i = 0; i < shares.size(); i++) {
      if (i < shown) {
        rows.add(new Row(shares.get(i).of(), Optional.of(shares.get(i)), shares.get(i).share()));
      } else {
        rest += shares.get(i).share();
      }
    }
    if (shown < shares.size()) {
      rows.add(new Row((shares.size() - shown) + " others", Optional.empty(), rest));
    }
  }

  @Override
  String shown() {
    String of = result().shares().referTo();
    return rows.isEmpty()
        ? "Shares: no heat flows, or infinitely much"
        : "Shares of " + of + " · " + films(result().heatLoss().filmSet());
  }

  @Override
  String told() {
    StringBuilder out =
        new StringBuilder("How much the heat flow hangs on each material and film.");
    for (Row row : rows) {
      out.append(' ').append(row.name()).append(": ").append(percent(row.part())).append('.');
    }
    return out.toString();
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(0, 0, 0, 0);
  }

  @Override
  Box drawn() {
    return new Box(0, 0, WIDTH, Math.max(LEAST_HEIGHT, HEAD + rows.size() * ROW + AIR));
  }

  @Override
  Optional<Box> zoomed() {
    return Optional.empty();
  }

  @Override
  void paint(Canvas canvas, Panel panel, Optional<Panel> zoom) {
    if (rows.isEmpty()) {
      return;
    }
    Box frame = panel.frame();
    double left = frame.x0() + NAMES;
    double right = frame.x1() - psi.size() * COLUMN - FIGURE;
    double row = Math.min(ROW * 1.25, (frame.height() - HEAD - AIR) / rows.size());
    double top = frame.y0() + HEAD;
    double most = 0;
    for (Row one : rows) {
      most = Math.max(most, one.part());
    }
    double scale = (right - left) / most;
    grid(canvas, left, scale, most, top, top + rows.size() * row);
    heads(canvas, frame, right + FIGURE);
    canvas.layer("names");
    for (int i = 0; i < rows.size(); i++) {
      names(canvas, rows.get(i), left - 10, top + (i + 0.5) * row);
    }
    canvas.layer("bars");
    for (int i = 0; i < rows.size(); i++) {
      double middle = top + (i + 0.5) * row;
      double end = left + Math.max(0.5, rows.get(i).part() * scale);
      bar(canvas, rows.get(i), new Box(left, middle - BAR / 2, end, middle + BAR / 2));
    }
    canvas.stroke(
        new Line2D.Double(left, top - 4, left, top + rows.size() * row), Palette.INK, Pen.MEDIUM);
    canvas.layer("figures");
    for (int i = 0; i < rows.size(); i++) {
      double x = left + rows.get(i).part() * scale + 6;
      figures(canvas, rows.get(i), x, right + FIGURE, base(top + (i + 0.5) * row));
    }
  }

  private static double base(double middle) {
    return middle + Lettering.LABEL.size() * TextWidths.CAPITAL / 2;
  }

  private void grid(
      Canvas canvas, double left, double scale, double most, double top, double bottom) {
    canvas.layer("grid");
    double step = 0.05;
    while (most / step > MOST_GRID_LINES) {
      step *= 2;
    }
    for (int i = 1; i * step <= most; i++) {
      double x = left + i * step * scale;
      canvas.stroke(new Line2D.Double(x, top - 4, x, bottom), Palette.RULE, Pen.HAIR);
      String text = Digits.shortest(100 * i * step, 1) + Figures.JOINED + "%";
      canvas.text(text, x, top - 8, Lettering.QUIET, Anchor.MIDDLE);
    }
  }

  private void heads(Canvas canvas, Box frame, double columns) {
    canvas.layer("heads");
    if (psi.isEmpty()) {
      return;
    }
    double right = frame.x1() - 4;
    canvas.text(
        "change of ψ in "
            + figures().linearUnit()
            + " if it conducts 10"
            + Figures.JOINED
            + "% more",
        right,
        frame.y0() + 12,
        Lettering.SMALL,
        Anchor.END);
    for (int c = 0; c < psi.size(); c++) {
      double x = columns + (c + 1) * COLUMN - 4;
      List<String> lines = Wrapping.of(psi.get(c).name(), COLUMN - 8, Lettering.SMALL_STRONG);
      double y = frame.y0() + HEAD - 8 - (Math.min(2, lines.size()) - 1) * 13;
      for (int i = 0; i < Math.min(2, lines.size()); i++) {
        canvas.text(lines.get(i), x, y + i * 13, Lettering.SMALL_STRONG, Anchor.END);
      }
    }
  }

  private static void names(Canvas canvas, Row row, double right, double middle) {
    List<String> lines = Wrapping.of(row.name(), NAMES - 14, Lettering.SMALL);
    double step = Lettering.SMALL.lineHeight() - 1;
    int count = Math.min(2, lines.size());
    double y = base(middle) - (count - 1) * step / 2;
    for (int i = 0; i < count; i++) {
      canvas.text(lines.get(i), right, y + i * step, Lettering.SMALL, Anchor.END);
    }
  }

  private void bar(Canvas canvas, Row row, Box box) {
    if (row.share().isPresent() && row.share().get().film()) {
      int space = section().detail().spaceIndex(row.share().get().space());
      boolean inside = section().detail().spaces().get(space).exposure() == Exposure.INSIDE;
      Rectangle2D shape = new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height());
      canvas.fill(shape, Palette.PAPER);
      if (box.width() >= LEAST_FRINGE) {
        SurfaceMarks.sample(canvas, new Box(box.x0(), box.y0(), box.x1(), box.y1() + 3), inside);
      }
      canvas.stroke(shape, inside ? Palette.INSIDE : Palette.OUTSIDE, Pen.FINE);
      return;
    }
    for (int label = 0; label < looks.size(); label++) {
      if (section().fills().get(label).name().equals(row.name())) {
        SectionView.swatch(canvas, box, looks.get(label));
        return;
      }
    }
    canvas.stroke(
        new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()),
        Palette.INK,
        Pen.FINE);
  }

  private void figures(Canvas canvas, Row row, double x, double columns, double base) {
    String part = percent(row.part());
    double width = TextWidths.of(part, Lettering.STRONG);
    canvas.fill(new Rectangle2D.Double(x - 2, base - 10, width + 4, 13), Palette.PAPER);
    canvas.text(part, x, base, Lettering.STRONG);
    for (int c = 0; c < psi.size() && row.share().isPresent(); c++) {
      for (Result.Sensitivity sensitivity : psi.get(c).sensitivities()) {
        if (sensitivity.of().equals(row.name())) {
          canvas.text(
              Digits.signed(figures().linear(RISE * sensitivity.slope())),
              columns + (c + 1) * COLUMN - 4,
              base,
              Lettering.LABEL,
              Anchor.END);
        }
      }
    }
  }

  private static String percent(double share) {
    String number = share > 0 && share < 0.0005 ? "< 0.1" : Digits.fixed(100 * share, 1);
    return number + Figures.JOINED + "%";
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Shares");
    key.note(
        "How much the heat flow hangs on a material or film: relative change of it over relative"
            + " change of a conductivity, or of 1/Rs of a film. They add up to 100"
            + Figures.JOINED
            + "%.");
    if (!psi.isEmpty()) {
      key.note(
          "The change of ψ is of first order, for 10"
              + Figures.JOINED
              + "% more conductivity, or 1/Rs, and counts what the flanks take off.");
    }
    tolerances(key);
    key.heading("Where the heat passes");
    key.note("A share does not say that: the heat flow through each stretch does, + inwards.");
    for (Result.StretchResult stretch : result().stretches()) {
      key.row(stretch.name(), flow(stretch.heatFlowWPerM()));
    }
    if (result().stretches().isEmpty()) {
      for (Result.SpaceResult space : result().spaces()) {
        key.row(space.name() + ", in all", flow(space.heatFlowWPerM()));
      }
    }
    return key;
  }

  private String flow(double wPerM) {
    return Digits.signed(figures().flow(wPerM, FLOW_HALF_WIDTH))
        + Figures.JOINED
        + figures().flowUnit();
  }

  private void tolerances(Key key) {
    boolean headed = false;
    for (Result.Share share : result().shares().parts()) {
      if (share.relativeTolerance() > 0) {
        if (!headed) {
          key.heading("Tolerances of conductivities");
          headed = true;
        }
        key.row(
            share.of(),
            "±"
                + Figures.JOINED
                + Digits.shortest(100 * share.relativeTolerance(), 2)
                + Figures.JOINED
                + "%");
      }
    }
    for (Result.LinearTransmittance one : psi) {
      tolerance(key, "so ψ " + one.name(), one.tolerance());
    }
    if (psi.isEmpty() && result().couplings().size() == 1) {
      tolerance(key, "so L2D", result().couplings().get(0).tolerance());
    }
  }

  private void tolerance(Key key, String words, Optional<Result.Tolerance> tolerance) {
    if (tolerance.isPresent()) {
      double halfWidth = figures().scaledLinear(tolerance.get().halfWidth());
      key.row(
          words,
          "±"
              + Figures.JOINED
              + Digits.outward(halfWidth, 2, 4)
              + Figures.JOINED
              + figures().linearUnit());
    }
  }
}
