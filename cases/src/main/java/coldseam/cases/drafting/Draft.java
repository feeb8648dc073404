package coldseam.cases.drafting;

import coldseam.cases.Doubt;
import coldseam.cases.drafting.DraftedFill.Kind;
import coldseam.cases.drawing.Drawing;
import coldseam.cases.drawing.DrawingException;
import coldseam.cases.drawing.DrawingUnit;
import coldseam.cases.drawing.DrawnShapes;
import coldseam.cases.drawing.DrawnShapes.Shape;
import coldseam.cases.drawing.LeftOut;
import coldseam.cases.drawing.Placement;
import coldseam.mesh.partition.Defect;
import coldseam.mesh.partition.LabelledArea;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.DefectWords;
import coldseam.solver.detail.Wording;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** A case file drafted from a drawing, and what is to be seen in a picture of it. Immutable. */
public final class Draft {
  /** Of joined corners and dropped pieces so many are listed, the largest first. */
  private static final int MOST_LISTED = 40;

  /** A detail is hardly smaller than this, m. */
  private static final double SMALLEST_M = 0.03;

  /** A detail is hardly larger than this, m. */
  private static final double LARGEST_M = 60;

  /**
   * What the user says of the drawing beside what it says itself.
   *
   * @param unit the unit it is drawn in; what the file says if empty
   * @param tolerance how far apart corners may be that are joined, in that unit; a 4000th of the
   *     larger dimension if empty
   */
  public record Said(Optional<DrawingUnit> unit, OptionalDouble tolerance) {}

  private final String text;
  private final Partition partition;
  private final List<String> names;
  private final List<Boolean> open;
  private final List<Doubt> doubts;
  private final List<String> warnings;

  private Draft(
      String text,
      Partition partition,
      List<String> names,
      List<Boolean> open,
      List<Doubt> doubts,
      List<String> warnings) {
    this.text = text;
    this.partition = partition;
    this.names = List.copyOf(names);
    this.open = List.copyOf(open);
    this.doubts = List.copyOf(doubts);
    this.warnings = List.copyOf(warnings);
  }

  /**
   * Drafts a case.
   *
   * @param file the drawing
   * @param shown how the case names it, relative to its folder
   * @param picture name of the file with the picture
   * @param said what the user adds
   * @return the draft
   * @throws DrawingException if the drawing cannot be read, or has nothing in it to draft from
   */
  public static Draft of(Path file, String shown, String picture, Said said)
      throws DrawingException {
    Drawing rough = Drawing.read(file, OptionalDouble.empty());
    List<String> aids = new ArrayList<>();
    for (String layer : layers(rough)) {
      if (LayerNames.aid(layer)) {
        aids.add(layer);
      }
    }
    if (rough.without(aids).pieces().isEmpty()) {
      throw new DrawingException(
          0,
          "there is no outline in this drawing"
              + (rough.leftOut().isEmpty() ? "" : "; left out: " + rough.leftOut().get(0).text()),
          "draw lines, polylines, hatches or filled shapes, on layers that are shown");
    }
    Scaling scaling = Scaling.of(rough.without(aids), said);
    Drawing drawing = Drawing.read(file, OptionalDouble.of(scaling.deviation())).without(aids);
    DrawnShapes drawn =
        DrawnShapes.of(
            drawing,
            new Placement(scaling.metresPerUnit(), scaling.originM(), scaling.toleranceM()));
    DraftPlan plan = new DraftPlan(drawn, scaling.toleranceM());
    if (plan.fills().isEmpty()) {
      throw new DrawingException(
          0,
          "no lines of this drawing enclose anything",
          "close them, or let more be joined: --tolerance");
    }
    return drafted(shown, picture, scaling, drawing, drawn, plan, aids);
  }

  private static List<String> layers(Drawing drawing) {
    List<String> layers = new ArrayList<>();
    drawing
        .pieces()
        .forEach(
            p -> {
              if (!layers.contains(p.layer())) {
                layers.add(p.layer());
              }
            });
    return layers;
  }

  private static Draft drafted(
      String shown,
      String picture,
      Scaling scaling,
      Drawing drawing,
      DrawnShapes drawn,
      DraftPlan plan,
      List<String> aids)
      throws DrawingException {
    List<LabelledArea> areas = new ArrayList<>();
    List<String> names = new ArrayList<>();
    List<Boolean> open = new ArrayList<>();
    for (DraftedFill fill : plan.fills()) {
      for (Shape shape : fill.shapes()) {
        areas.add(new LabelledArea(names.size(), shape.rings()));
      }
      names.add(fill.name());
      open.add(fill.kind() == Kind.OPEN);
    }
    Partition partition;
    try {
      partition = Partition.of(areas, List.of(), Resolution.STANDARD);
    } catch (IllegalArgumentException e) {
      throw new DrawingException(0, "nothing is left of the areas of this drawing", "draw larger");
    }
    List<Doubt> doubts = doubts(drawn);
    for (Defect defect : partition.defects()) {
      if (defect.kind() != Defect.Kind.LINE_OFF_EDGE) {
        doubts.add(new Doubt(defect.where(), DefectWords.of(defect, names)));
      }
    }
    List<String> warnings = new ArrayList<>(scaling.warnings());
    warnings.addAll(drawing.remarks());
    for (LeftOut left : drawing.leftOut()) {
      if (left.serious()) {
        warnings.add("left out: " + left.text());
      }
    }
    DraftText text = new DraftText(shown, picture, scaling, drawing, plan, aids, doubts, warnings);
    return new Draft(text.text(), partition, names, open, doubts, warnings);
  }

  private static List<Doubt> doubts(DrawnShapes drawn) throws DrawingException {
    List<Doubt> doubts = new ArrayList<>();
    add(doubts, drawn.joins(), "corners ", " apart", ": joined");
    add(
        doubts,
        drawn.doubts(),
        "corners ",
        " apart",
        ": not joined, since something thin lies there");
    add(doubts, drawn.dropped(), "a piece of line, ", " long", ": it bounds no area, dropped");
    return doubts;
  }

  private static void add(
      List<Doubt> doubts, List<DrawnShapes.Mark> marks, String what, String size, String outcome) {
    List<DrawnShapes.Mark> largest = new ArrayList<>(marks);
    largest.sort((a, b) -> Double.compare(b.sizeM(), a.sizeM()));
    for (DrawnShapes.Mark mark : largest.subList(0, Math.min(MOST_LISTED, largest.size()))) {
      String layer = mark.layer().isEmpty() ? "" : " on layer '" + mark.layer() + "'";
      doubts.add(
          new Doubt(
              mark.where(),
              what
                  + Wording.length(mark.sizeM())
                  + size
                  + layer
                  + " (line "
                  + mark.line()
                  + " of the drawing) at "
                  + Wording.place(mark.where())
                  + outcome));
    }
  }

  /**
   * How the drawing is scaled and placed.
   *
   * @param unit the unit of the case, if known
   * @param drawnUnit the unit of the drawing, if known
   * @param stated whether the file says so itself
   * @param metresPerUnit metres per unit of the drawing; of a millimetre where nothing is known
   * @param metresPerCaseUnit metres per unit of the case
   * @param originM the place that becomes (0, 0)
   * @param toleranceM of joining
   * @param deviation of chords, in units of the drawing
   * @param warnings what looks wrong
   */
  record Scaling(
      Optional<DrawingUnit> unit,
      Optional<DrawingUnit> drawnUnit,
      boolean stated,
      double metresPerUnit,
      double metresPerCaseUnit,
      Point originM,
      double toleranceM,
      double deviation,
      List<String> warnings) {
    static Scaling of(Drawing drawing, Said said) {
      Optional<DrawingUnit> drawn = said.unit().isPresent() ? said.unit() : drawing.unit();
      double metres = drawn.orElse(DrawingUnit.MM).metres();
      // A case is not written in feet.
      Optional<DrawingUnit> unit = drawn.map(u -> u == DrawingUnit.FT ? DrawingUnit.IN : u);
      double caseMetres = unit.orElse(DrawingUnit.MM).metres();
      double extent = drawing.extent();
      double tolerance = said.tolerance().orElse(nice(extent * Placement.STANDARD_TOLERANCE));
      double step = nice(extent / 2);
      double[] low = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
      drawing
          .pieces()
          .forEach(
              piece ->
                  piece
                      .rings()
                      .forEach(
                          ring ->
                              ring.forEach(
                                  p -> {
                                    low[0] = Math.min(low[0], p.x());
                                    low[1] = Math.min(low[1], p.y());
                                  })));
      boolean far = Math.hypot(low[0], low[1]) > 3 * extent;
      Point origin =
          far
              ? new Point(
                  Math.floor(low[0] / step) * step * metres,
                  Math.floor(low[1] / step) * step * metres)
              : new Point(0, 0);
      return new Scaling(
          unit,
          drawn,
          said.unit().isEmpty(),
          metres,
          caseMetres,
          origin,
          tolerance * metres,
          nice(extent / 20_000),
          warnings(drawing, drawn, extent * metres));
    }

    private static List<String> warnings(
        Drawing drawing, Optional<DrawingUnit> unit, double extentM) {
      if (unit.isEmpty() || extentM >= SMALLEST_M && extentM <= LARGEST_M) {
        return List.of();
      }
      StringBuilder text = new StringBuilder("in ");
      text.append(unit.get().symbol()).append(" the drawing is ");
      text.append(Wording.figure(extentM)).append(" m wide or high, which is hardly a detail");
      for (DrawingUnit other : DrawingUnit.values()) {
        double there = extentM / unit.get().metres() * other.metres();
        if (other != unit.get() && there >= 0.3 && there <= 20) {
          text.append("; in ").append(other.symbol()).append(" it would be ");
          text.append(Wording.figure(there)).append(" m");
        }
      }
      if (drawing.onPaper()) {
        text.append("; if it is drawn to a scale, add `scale`");
      }
      return List.of(text.toString());
    }

    /** The largest of 1, 2 and 5 times a power of ten that is not larger. */
    private static double nice(double value) {
      double power = Math.pow(10, Math.floor(Math.log10(Math.max(value, 1e-12))));
      double times = value / power;
      double digit = times >= 5 ? 5 : times >= 2 ? 2 : 1;
      return power >= 1 ? digit * power : digit / Math.rint(1 / power);
    }
  }

  /** The case file. */
  public String text() {
    return text;
  }

  /** The section as understood; labels are indices of {@link #names()}. */
  public Partition partition() {
    return partition;
  }

  /** What the entries are called until somebody decides. */
  public List<String> names() {
    return names;
  }

  /** Whether an entry is an open region. */
  public boolean isOpen(int label) {
    return open.get(label);
  }

  /** Places to look at, in the order of the list in the case file. */
  public List<Doubt> doubts() {
    return doubts;
  }

  /** What is likely to be wrong. */
  public List<String> warnings() {
    return warnings;
  }
}
