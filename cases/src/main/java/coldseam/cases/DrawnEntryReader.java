package coldseam.cases;

import coldseam.cases.drawing.DrawingException;
import coldseam.cases.drawing.DrawnShapes;
import coldseam.cases.drawing.LeftOut;
import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Reads an entry of the section whose shapes are taken from a drawing. */
final class DrawnEntryReader {
  static final List<String> KEYS =
      List.of("fill", "name", "surface", "part", "drawing", "layer", "look", "at");

  private final Pass pass;
  private final Problems problems;
  private final DrawingsReader drawings;

  DrawnEntryReader(Pass pass, DrawingsReader drawings) {
    this.pass = pass;
    this.problems = pass.problems();
    this.drawings = drawings;
  }

  /**
   * Finds the shapes of an entry.
   *
   * @param fields the entry
   * @return closed rings of each shape by the even-odd rule, m; none if a mistake was reported
   */
  List<List<List<Point>>> read(Fields fields) {
    Optional<Node> node = fields.get("drawing");
    Optional<String> name =
        node.isEmpty() ? Optional.empty() : Fields.text(problems, "`drawing`", node.get());
    if (name.isEmpty()) {
      return List.of();
    }
    Optional<DrawingsReader.Source> source = drawings.find(name.get());
    if (source == null) {
      String known = Problems.suggestion(name.get(), drawings.names());
      problems.add(
          node.get(),
          "there is no drawing `" + Node.shortened(name.get()) + "` under `drawings`",
          known.isEmpty() ? "add `drawings: {" + "NAME: {file: …}}`" : known);
      return List.of();
    }
    boolean both =
        fields.refuseBoth("at", "layer", "a point takes the face between lines of all layers")
            | fields.refuseBoth("at", "look", "a point takes the face between lines of all layers");
    if (!fields.has("at") && !fields.has("layer") && !fields.has("look")) {
      problems.add(
          fields.node(),
          "this entry does not say what to take of the drawing",
          "add `layer: NAME`, `look: NAME` or `at: [x, y]`");
      return List.of();
    }
    if (both || source.isEmpty()) {
      return List.of();
    }
    try {
      return fields.has("at") ? faces(fields, source.get()) : found(fields, source.get());
    } catch (DrawingException e) {
      problems.add(node.get(), e.wrong(), e.right().orElse(""));
      return List.of();
    }
  }

  private List<List<List<Point>>> faces(Fields fields, DrawingsReader.Source source)
      throws DrawingException {
    Node node = fields.get("at").get();
    List<Node> each = new ArrayList<>();
    if (node instanceof Node.Sequence list
        && !list.items().isEmpty()
        && list.items().get(0) instanceof Node.Sequence) {
      each.addAll(list.items());
    } else {
      each.add(node);
    }
    List<List<List<Point>>> faces = new ArrayList<>();
    for (Node at : each) {
      Optional<Point> point = pass.quantities().point(at, "`at`");
      if (point.isEmpty()) {
        continue;
      }
      Optional<DrawnShapes.Shape> face = source.shapes().face(point.get());
      if (face.isEmpty()) {
        problems.add(
            at,
            "no lines of the drawing enclose this point",
            "name a point well inside a face, or give the drawing a wider `tolerance`");
      } else {
        faces.add(face.get().rings());
      }
    }
    return faces;
  }

  private List<List<List<Point>>> found(Fields fields, DrawingsReader.Source source) {
    Optional<String> layer = one(fields, "layer", source.shapes().layers());
    Optional<String> look = one(fields, "look", source.shapes().looks());
    boolean unknown =
        fields.has("layer") && layer.isEmpty() || fields.has("look") && look.isEmpty();
    if (unknown) {
      hidden(fields, source);
      return List.of();
    }
    List<DrawnShapes.Shape> shapes = source.shapes().find(layer, look);
    if (shapes.isEmpty()) {
      problems.add(
          fields.keyNode(fields.has("layer") ? "layer" : "look"),
          "nothing drawn there encloses an area",
          "take faces between lines of all layers by `at: [x, y]`, or widen the drawing's"
              + " `tolerance`");
    }
    List<List<List<Point>>> rings = new ArrayList<>();
    shapes.forEach(shape -> rings.add(shape.rings()));
    return rings;
  }

  /** A name as typed, or the one that differs by case only. */
  private Optional<String> one(Fields fields, String key, List<String> known) {
    if (!fields.has(key)) {
      return Optional.empty();
    }
    Optional<String> typed = Fields.text(problems, "`" + key + "`", fields.get(key).get());
    if (typed.isEmpty() || known.contains(typed.get())) {
      return typed;
    }
    for (String name : known) {
      if (name.toLowerCase(Locale.ROOT).equals(typed.get().toLowerCase(Locale.ROOT))) {
        return Optional.of(name);
      }
    }
    return Optional.empty();
  }

  /** Reports a layer or a look that nothing is drawn in, and why, if it was left out. */
  private void hidden(Fields fields, DrawingsReader.Source source) {
    for (String key : List.of("layer", "look")) {
      boolean layer = key.equals("layer");
      List<String> known = layer ? source.shapes().layers() : source.shapes().looks();
      boolean found = !fields.has(key) || one(fields, key, known).isPresent();
      // What is no name at all was reported when it was read.
      if (found || !(fields.get(key).get() instanceof Node.Scalar scalar)) {
        continue;
      }
      String typed = scalar.text().strip();
      String why = "";
      for (LeftOut left : source.drawing().leftOut()) {
        if (layer && left.layer().equalsIgnoreCase(typed)) {
          why = left.why();
        }
      }
      problems.add(
          fields.get(key).get(),
          "nothing of "
              + key
              + " `"
              + Node.shortened(typed)
              + "` is taken from the drawing"
              + (why.isEmpty() ? "" : ": " + why),
          why.isEmpty() ? Problems.suggestion(typed, known) : "show it in the drawing");
    }
  }
}
