package coldseam.cases;

import coldseam.cases.drawing.Drawing;
import coldseam.cases.drawing.DrawingException;
import coldseam.cases.drawing.DrawingUnit;
import coldseam.cases.drawing.DrawnShapes;
import coldseam.cases.drawing.LeftOut;
import coldseam.cases.drawing.Piece;
import coldseam.cases.drawing.Placement;
import coldseam.mesh.plane.Point;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code drawings}: files, and how they come to lie in the section. */
final class DrawingsReader {
  static final List<String> KEYS =
      List.of("file", "unit", "scale", "origin", "tolerance", "deviation", "without");
  static final List<String> UNITS = List.of("mm", "cm", "m", "in", "ft");

  /** Marks of one drawing beyond this many are counted only. */
  private static final int MOST_MARKS = 60;

  private final Pass pass;
  private final Problems problems;
  private final Map<String, Optional<Source>> sources = new LinkedHashMap<>();

  /**
   * A drawing ready to take shapes from.
   *
   * @param name as the case calls it
   * @param drawing as read
   * @param shapes its shapes in place
   */
  record Source(String name, Drawing drawing, DrawnShapes shapes) {}

  DrawingsReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /** Reads the drawings of a case; mistakes are reported. */
  void read(Node node) {
    for (Node.Entry entry : Fields.named(problems, "`drawings`", node)) {
      String name = entry.key().text();
      Fields fields = new Fields(problems, "drawing `" + name + "`", entry.value(), KEYS);
      sources.put(name, source(name, fields));
    }
  }

  /** Names of the drawings. */
  List<String> names() {
    return List.copyOf(sources.keySet());
  }

  /** A drawing; empty if a mistake in it was reported, null if there is none of that name. */
  Optional<Source> find(String name) {
    return sources.get(name);
  }

  private Optional<Source> source(String name, Fields fields) {
    Optional<Node> fileNode = fields.require("file", "add `file: ` and an SVG or DXF file");
    Optional<DrawingUnit> unit = unit(fields);
    double scale = number(fields, "scale", Place.SCALE, 1);
    double tolerance = number(fields, "tolerance", Place.EXTENT, -1);
    double deviation = number(fields, "deviation", Place.SIZE, -1);
    Optional<Point> origin =
        fields.has("origin")
            ? pass.quantities().point(fields.get("origin").get(), "`origin`")
            : Optional.of(new Point(0, 0));
    Optional<Path> file = fileNode.flatMap(this::file);
    boolean bad = Double.isNaN(scale) || Double.isNaN(tolerance) || Double.isNaN(deviation);
    boolean badUnit = fields.has("unit") && unit.isEmpty();
    if (file.isEmpty() || origin.isEmpty() || bad || badUnit) {
      return Optional.empty();
    }
    try {
      return open(name, fields, file.get(), unit, scale, origin.get(), tolerance, deviation);
    } catch (DrawingException e) {
      String line = e.line() > 0 ? "line " + e.line() + ": " : "";
      String typed = ((Node.Scalar) fileNode.get()).text().strip();
      problems.add(
          fileNode.get(),
          "the drawing `" + Node.shortened(typed) + "` cannot be read: " + line + e.wrong(),
          e.right().orElse(""));
      return Optional.empty();
    }
  }

  private Optional<Source> open(
      String name,
      Fields fields,
      Path file,
      Optional<DrawingUnit> typed,
      double scale,
      Point origin,
      double toleranceM,
      double deviationM)
      throws DrawingException {
    OptionalDouble usual = OptionalDouble.empty();
    Drawing drawing = pass.drawings().drawing(file, usual);
    Optional<DrawingUnit> unit = typed.isPresent() ? typed : drawing.unit();
    if (unit.isEmpty()) {
      problems.add(
          fields.node(),
          "the drawing `" + name + "` does not say in which unit it is drawn",
          "add `unit: mm`, or cm, m, in or ft");
      return Optional.empty();
    }
    double metresPerUnit = unit.get().metres() * scale;
    OptionalDouble deviation =
        deviationM < 0 ? usual : OptionalDouble.of(deviationM / metresPerUnit);
    Drawing fine = pass.drawings().drawing(file, deviation);
    double tolerance =
        toleranceM < 0
            ? drawing.extent() * metresPerUnit * Placement.STANDARD_TOLERANCE
            : toleranceM;
    Placement placement = new Placement(metresPerUnit, origin, tolerance);
    DrawnShapes shapes = pass.drawings().shapes(file, deviation, without(fields, fine), placement);
    Source source = new Source(name, fine, shapes);
    if (typed.isEmpty()) {
      pass.assume("unit of drawing " + name, unit.get().symbol(), "the file");
    }
    remark(source, tolerance, fine.deviation() * metresPerUnit);
    return Optional.of(source);
  }

  /** The layers that are not taken. */
  private List<String> without(Fields fields, Drawing drawing) {
    if (!fields.has("without")) {
      return List.of();
    }
    Node node = fields.get("without").get();
    List<Node> each = node instanceof Node.Sequence list ? list.items() : List.of(node);
    List<String> known = new ArrayList<>();
    for (Piece piece : drawing.pieces()) {
      if (!known.contains(piece.layer())) {
        known.add(piece.layer());
      }
    }
    List<String> layers = new ArrayList<>();
    for (Node one : each) {
      Optional<String> layer = Fields.text(problems, "a layer of `without`", one);
      // A new version of a drawing may do without a layer that is not taken anyway.
      layer.filter(known::contains).ifPresent(layers::add);
    }
    return layers;
  }

  private void remark(Source source, double toleranceM, double deviationM) {
    String of = " in drawing " + source.name();
    List<DrawnShapes.Mark> joins = source.shapes().joins();
    double widest = 0;
    for (DrawnShapes.Mark join : joins) {
      widest = Math.max(widest, join.sizeM());
    }
    pass.assume(
        "corners joined" + of,
        joins.isEmpty() ? "none" : joins.size() + ", at most " + millimetres(widest) + " apart",
        "tolerance of " + millimetres(toleranceM));
    pass.assume("curves" + of, "chords", "at most " + millimetres(deviationM) + " off the curve");
    for (LeftOut left : source.drawing().leftOut()) {
      pass.assume("left out of drawing " + source.name(), left.text(), "reader of drawings");
    }
    marks(joins, " apart", ": joined");
    marks(source.shapes().doubts(), " apart", ": not joined, something thin lies there");
  }

  private void marks(List<DrawnShapes.Mark> marks, String apart, String what) {
    List<DrawnShapes.Mark> widest = new ArrayList<>(marks);
    widest.sort((a, b) -> Double.compare(b.sizeM(), a.sizeM()));
    for (DrawnShapes.Mark mark : widest.subList(0, Math.min(MOST_MARKS, widest.size()))) {
      pass.doubt(
          mark.where(),
          "corners "
              + millimetres(mark.sizeM())
              + apart
              + (mark.layer().isEmpty() ? "" : " on layer `" + mark.layer() + "`")
              + " (line "
              + mark.line()
              + " of the drawing)"
              + what);
    }
  }

  static String millimetres(double metres) {
    return Figures.of(Math.round(metres * 1e7) / 1e4) + " mm";
  }

  private Optional<DrawingUnit> unit(Fields fields) {
    Optional<String> word = fields.word("unit", UNITS);
    return word.map(w -> DrawingUnit.values()[UNITS.indexOf(w)]);
  }

  private double number(Fields fields, String key, Place place, double otherwise) {
    Optional<Node> node = fields.get(key);
    return node.isEmpty()
        ? otherwise
        : pass.quantities().read(node.get(), "`" + key + "` of the drawing", place);
  }

  private Optional<Path> file(Node node) {
    Optional<String> typed = Fields.text(problems, "`file`", node);
    if (typed.isEmpty()) {
      return Optional.empty();
    }
    Path folder = pass.file().toAbsolutePath().getParent();
    Path file;
    try {
      file = folder.resolve(typed.get());
    } catch (InvalidPathException e) {
      problems.add(node, "`" + Node.shortened(typed.get()) + "` is no file name", "name a drawing");
      return Optional.empty();
    }
    if (!pass.drawings().mayBeRead(file, folder)) {
      problems.add(
          node,
          "`" + Node.shortened(typed.get()) + "` lies outside of the folder of this case",
          "put the drawing beside the case, or name it: `--drawing FILE`");
      return Optional.empty();
    }
    return Optional.of(file);
  }
}
