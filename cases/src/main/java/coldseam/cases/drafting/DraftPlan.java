package coldseam.cases.drafting;

import coldseam.cases.drafting.DraftedFill.Kind;
import coldseam.cases.drawing.DrawingException;
import coldseam.cases.drawing.DrawnShapes;
import coldseam.cases.drawing.DrawnShapes.Shape;
import coldseam.cases.drawing.OpenRegions;
import coldseam.cases.words.Undecided;
import coldseam.mesh.closing.Cells;
import coldseam.mesh.closing.Closing;
import coldseam.mesh.closing.DrawnLine;
import coldseam.mesh.closing.TangledLinesException;
import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Decides which entries a drafted section has. */
final class DraftPlan {
  /** A drawing of more entries than a person would look through. */
  private static final int MOST_ENTRIES = 400;

  /** An outline whose area is hatched to this share is the outline of the hatch. */
  private static final double HATCHED = 0.97;

  private final DrawnShapes drawn;
  private final double toleranceM;
  private final List<DraftedFill> fills = new ArrayList<>();
  private final Set<String> names = new HashSet<>(Set.of("indoors", "outdoors", "hollow"));
  private int passedOver;

  DraftPlan(DrawnShapes drawn, double toleranceM) throws DrawingException {
    this.drawn = drawn;
    this.toleranceM = toleranceM;
    layers();
    gaps();
    fills.sort((a, b) -> Double.compare(b.areaM2(), a.areaM2()));
    if (fills.size() > MOST_ENTRIES) {
      throw new DrawingException(
          0,
          "the drawing has "
              + fills.size()
              + " areas of different kinds, more than a case to be"
              + " completed by hand can have",
          "export the detail alone, one layer for each material");
    }
    open();
  }

  /** The entries: what is drawn, the largest first, then the open regions. */
  List<DraftedFill> fills() {
    return fills;
  }

  /** Outlines that were passed over because what they enclose is hatched. */
  int passedOver() {
    return passedOver;
  }

  private void layers() throws DrawingException {
    Map<String, List<Shape>> groups = new LinkedHashMap<>();
    List<Shape> faces = drawn.faces();
    for (Shape shape : drawn.all()) {
      if (shape.look().isEmpty() && hatched(shape)) {
        passedOver++;
      } else if (shape.divided() || noName(shape)) {
        faces(shape, faces);
      } else {
        groups
            .computeIfAbsent(shape.layer() + '\n' + shape.look(), k -> new ArrayList<>())
            .add(shape);
      }
    }
    for (List<Shape> lines : List.copyOf(groups.values())) {
      Shape first = lines.get(0);
      List<String> looks = looks(first.layer());
      if (first.look().isEmpty() && looks.size() == 1) {
        // One kind of hatch and some outlines without: all of the layer is one thing.
        List<Shape> hatched = groups.get(first.layer() + '\n' + looks.get(0));
        hatched.addAll(lines);
        groups.remove(first.layer() + '\n');
      } else if (first.look().isEmpty() && looks.size() > 1) {
        groups.remove(first.layer() + '\n');
        for (Shape shape : lines) {
          faces(shape, faces);
        }
      }
    }
    groups.values().forEach(this::layer);
  }

  /** Whether a shape cannot be taken by a name: it has none, or one that would be misread. */
  private static boolean noName(Shape shape) {
    return shape.layer().isEmpty() && shape.look().isEmpty()
        || Undecided.hint(shape.layer()).isPresent()
        || Undecided.hint(shape.look()).isPresent();
  }

  /** Takes a shape by the faces that lie in it. */
  private void faces(Shape shape, List<Shape> faces) {
    List<Point> points = new ArrayList<>();
    for (Shape face : faces) {
      if (DrawnShapes.holds(shape, face.inner())) {
        points.add(tidy(face));
      }
    }
    if (!points.isEmpty()) {
      String called = shape.layer().isEmpty() ? "face" : shape.layer();
      add(
          new DraftedFill(
              unique(called, true),
              Kind.FACES,
              shape.layer(),
              "",
              points,
              List.of(shape),
              shape.areaM2(),
              shape.line()));
    }
  }

  /** How shapes of a layer are filled. */
  private List<String> looks(String layer) {
    List<String> looks = new ArrayList<>();
    for (Shape shape : drawn.find(Optional.of(layer), Optional.empty())) {
      if (!shape.look().isEmpty() && !looks.contains(shape.look())) {
        looks.add(shape.look());
      }
    }
    return looks;
  }

  private void layer(List<Shape> shapes) {
    Shape first = shapes.get(0);
    double area = shapes.stream().mapToDouble(Shape::areaM2).sum();
    boolean several = looks(first.layer()).size() > 1;
    String name =
        first.layer().isEmpty()
            ? first.look()
            : (several || LayerNames.general(first.layer())) && !first.look().isEmpty()
                ? first.layer() + " " + first.look()
                : first.layer();
    String look = several || first.layer().isEmpty() ? first.look() : "";
    add(
        new DraftedFill(
            unique(name, false),
            Kind.LAYER,
            first.layer(),
            look,
            List.of(),
            shapes,
            area,
            first.line()));
  }

  private void add(DraftedFill fill) {
    fills.add(fill);
  }

  private String unique(String name, boolean numbered) {
    boolean unusable = name.isBlank() || Undecided.hint(name).isPresent();
    String plain = unusable ? "area" : name.strip();
    if (!numbered && names.add(plain)) {
      return plain;
    }
    int n = numbered ? 1 : 2;
    while (!names.add(plain + " " + n)) {
      n++;
    }
    return plain + " " + n;
  }

  /** Whether what a line encloses is hatched or filled all over. */
  private boolean hatched(Shape outline) {
    double filled = 0;
    for (Shape shape : drawn.all()) {
      if (!shape.look().isEmpty()
          && DrawnShapes.holds(outline, shape.inner())
          && shape.areaM2() <= outline.areaM2() * (1 + 1e-6)) {
        filled += shape.areaM2();
      }
    }
    return filled >= HATCHED * outline.areaM2();
  }

  /** Faces that nothing above covers. */
  private void gaps() throws DrawingException {
    for (Shape face : drawn.faces()) {
      boolean covered = false;
      for (DraftedFill fill : fills) {
        for (Shape shape : fill.shapes()) {
          covered |= DrawnShapes.holds(shape, face.inner());
        }
      }
      if (!covered && width(face) > toleranceM) {
        add(
            new DraftedFill(
                unique("face", true),
                Kind.GAPS,
                "",
                "",
                List.of(tidy(face)),
                List.of(face),
                face.areaM2(),
                face.line()));
      }
    }
  }

  private static double width(Shape shape) {
    double around = 0;
    for (List<Point> ring : shape.rings()) {
      for (int i = 0; i < ring.size(); i++) {
        around += ring.get(i).distance(ring.get((i + 1) % ring.size()));
      }
    }
    return 2 * shape.areaM2() / around;
  }

  private void open() throws DrawingException {
    List<Shape> shapes = new ArrayList<>();
    List<List<List<Point>>> rings = new ArrayList<>();
    double[] box = {1e300, 1e300, -1e300, -1e300};
    for (DraftedFill fill : fills) {
      for (Shape shape : fill.shapes()) {
        shapes.add(shape);
        rings.add(shape.rings());
        for (List<Point> ring : shape.rings()) {
          for (Point p : ring) {
            box[0] = Math.min(box[0], p.x());
            box[1] = Math.min(box[1], p.y());
            box[2] = Math.max(box[2], p.x());
            box[3] = Math.max(box[3], p.y());
          }
        }
      }
    }
    if (shapes.isEmpty()) {
      return;
    }
    List<Point> beyond = new ArrayList<>();
    for (Point p : new OuterSides(shapes, box[0], box[1], box[2], box[3]).beyond()) {
      beyond.add(new Point(coarse(p.x()), coarse(p.y())));
    }
    Optional<OpenRegions> regions = OpenRegions.of(rings, beyond);
    if (regions.isEmpty()) {
      return;
    }
    List<Shape> open = new ArrayList<>();
    List<Point> points = new ArrayList<>();
    for (int region : regions.get().all()) {
      Optional<Shape> shape = shape(regions.get().rings(region));
      if (shape.isEmpty() || width(shape.get()) <= toleranceM) {
        continue;
      }
      Point at = null;
      for (Point p : beyond) {
        at = at == null && regions.get().at(p) == region ? p : at;
      }
      open.add(shape.get());
      points.add(at == null ? tidy(shape.get()) : at);
    }
    for (int i = 0; i < open.size(); i++) {
      add(
          new DraftedFill(
              unique("region", true),
              Kind.OPEN,
              "",
              "",
              List.of(points.get(i)),
              List.of(open.get(i)),
              open.get(i).areaM2(),
              0));
    }
  }

  /** A region as a shape with a point in it. */
  private static Optional<Shape> shape(List<List<Point>> rings) throws DrawingException {
    List<DrawnLine> lines = new ArrayList<>();
    rings.forEach(ring -> lines.add(new DrawnLine(ring, true)));
    try {
      for (Cells.Cell cell : Closing.cells(lines).cells()) {
        if (cell.depth() == 0) {
          return Optional.of(
              new Shape(cell.rings(), "", "", 0, false, cell.inner(), cell.areaM2()));
        }
      }
    } catch (TangledLinesException e) {
      throw new DrawingException(0, "the drawing has " + e.getMessage(), "export less");
    }
    return Optional.empty();
  }

  /** A point in a shape with as few digits as do. */
  private static Point tidy(Shape shape) {
    Point p = shape.inner();
    for (double step : new double[] {1e-2, 1e-3, 1e-4, 1e-5}) {
      Point rounded = new Point(Math.rint(p.x() / step) * step, Math.rint(p.y() / step) * step);
      double off = 2 * step;
      boolean inside = true;
      for (int k = 0; k < 5; k++) {
        double dx = k == 1 ? off : k == 2 ? -off : 0;
        double dy = k == 3 ? off : k == 4 ? -off : 0;
        inside &= DrawnShapes.holds(shape, new Point(rounded.x() + dx, rounded.y() + dy));
      }
      if (inside) {
        return rounded;
      }
    }
    return p;
  }

  private static double coarse(double metres) {
    return Math.rint(metres * 100) / 100;
  }
}
