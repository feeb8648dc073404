package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Fill;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads {@code section}: shapes, stacks and groups become areas in the order laid. */
final class SectionReader {
  /** A section of more areas, copies included, is refused. */
  static final int MOST_AREAS = 20_000;

  /** The corners of all areas together. */
  private static final int MOST_CORNERS = 1_000_000;

  private static final List<String> SHAPE_KEYS =
      List.of("fill", "name", "surface", "part", "box", "polygon", "disc", "strip");
  private static final List<String> STACK_KEYS =
      List.of("stack", "layers", "name", "surface", "part", "glazing");
  private static final List<String> GROUP_KEYS =
      List.of("group", "part", "mirror", "rotate", "move", "repeat");
  private static final List<String> ANY_KEYS =
      List.of(
          "fill", "box", "polygon", "disc", "strip", "drawing", "around", "stack", "layers",
          "group", "name", "surface", "part", "glazing", "layer", "look", "at", "mirror", "rotate",
          "move", "repeat");
  private static final List<String> AROUND_KEYS =
      List.of("fill", "name", "surface", "part", "around");

  /** What an entry may be beside a plain shape. */
  private static final List<String> OTHER_KINDS = List.of("stack", "group", "drawing", "around");

  /** In the order of {@link Area.Role} after the first. */
  private static final List<String> PARTS = List.of("glazing", "panel");

  static final List<String> SURFACES = List.of("glazing", "frame");

  private final Pass pass;
  private final Problems problems;
  private final Fills fills;
  private final ShapeReader shapes;
  private final StackReader stacks;
  private final GlazingReader glazings;
  private final DrawingsReader drawings;

  // Made when first needed: most sections take nothing from drawings and start the sooner.
  private DrawnEntryReader drawn;
  private AroundReader arounds;
  private final List<String> names = new ArrayList<>();
  private boolean full;

  /**
   * Prepares.
   *
   * @param pass what the parts of the case share
   * @param fills what names mean as fills
   * @param drawings the drawings of the case, null if it has none
   */
  SectionReader(Pass pass, Fills fills, DrawingsReader drawings) {
    this.pass = pass;
    this.problems = pass.problems();
    this.fills = fills;
    this.shapes = new ShapeReader(pass);
    this.stacks = new StackReader(pass, fills);
    this.glazings = new GlazingReader(pass);
    this.drawings = drawings;
  }

  /**
   * Reads the section.
   *
   * @param node the list of entries
   * @return the areas without a mistake
   */
  List<Area> read(Node node) {
    int before = problems.count();
    List<Area> areas = entries(node, "section", "`section`");
    if (arounds != null && problems.count() == before) {
      areas = arounds.laid(areas);
    }
    int corners = 0;
    for (Area area : areas) {
      for (List<Point> ring : area.rings()) {
        corners += ring.size();
      }
    }
    if (corners > MOST_CORNERS) {
      problems.add(
          node, "the section has " + corners + " corners", "at most " + MOST_CORNERS + " are read");
    }
    return areas;
  }

  /** The names that shapes have, as written. */
  List<String> shapeNames() {
    return names;
  }

  private List<Area> entries(Node node, String path, String what) {
    if (!(node instanceof Node.Sequence sequence) || sequence.items().isEmpty()) {
      problems.add(
          node,
          what + " is a list of shapes, not " + Node.describe(node),
          "write `- {fill: …, box: [x1, y1, x2, y2]}`, one a line");
      return List.of();
    }
    List<Area> areas = new ArrayList<>();
    int index = 1;
    for (Node item : sequence.items()) {
      areas.addAll(entry(item, path + "[" + index + "]", areas.size()));
      if (tooMany(item, areas.size())) {
        return List.of();
      }
      index++;
    }
    return areas;
  }

  private boolean tooMany(Node node, long areas) {
    if (areas > MOST_AREAS && !full) {
      full = true;
      problems.add(
          node,
          "the section has more than " + MOST_AREAS + " shapes, copies included",
          "lay fewer, or fewer copies");
    }
    return full;
  }

  private List<Area> entry(Node node, String path, int laidBefore) {
    if (node instanceof Node.Mapping mapping) {
      List<String> kinds = new ArrayList<>();
      for (Node.Entry entry : mapping.entries()) {
        String key = entry.key().text();
        boolean kind = ShapeReader.SHAPES.contains(key) || OTHER_KINDS.contains(key);
        if (kind && !kinds.contains(key)) {
          kinds.add(key);
        }
      }
      if (kinds.size() > 1) {
        problems.add(
            node,
            "this entry has " + Problems.listed(kinds) + " at once",
            "write an entry of its own for each");
        return List.of();
      }
      if (!kinds.isEmpty()) {
        return switch (kinds.get(0)) {
          case "stack" -> stack(node, path);
          case "group" -> group(node, path);
          case "drawing" -> drawn(node, path);
          case "around" -> around(node, path, laidBefore);
          default -> shape(kinds.get(0), node, path);
        };
      }
    }
    int before = problems.count();
    new Fields(problems, "an entry of the section", node, ANY_KEYS);
    if (problems.count() == before) {
      problems.add(
          node,
          "this entry has no shape",
          "add `box`, `polygon`, `disc`, `strip`, `drawing` or `around`, or write a `stack` or a"
              + " `group`");
    }
    return List.of();
  }

  private Optional<String> name(Fields fields) {
    if (!fields.has("name")) {
      return Optional.empty();
    }
    Optional<String> name = Fields.text(problems, "`name`", fields.get("name").get());
    if (name.isPresent()) {
      names.add(name.get());
    }
    return name;
  }

  private List<Area> shape(String key, Node node, String path) {
    Fields fields = new Fields(problems, "this " + key, node, SHAPE_KEYS);
    Optional<String> name = name(fields);
    boolean glazing = fields.word("surface", SURFACES).isPresent();
    Area.Role role = role(fields);
    Optional<Node> fillNode = fields.require("fill", "add `fill: ` and a material or a space");
    Optional<Fill> fill = fillNode.isEmpty() ? Optional.empty() : fills.find(fillNode.get(), name);
    String called = called(path, name, fill);
    Optional<Node> value = fields.get(key);
    if (value.isEmpty()) {
      return List.of();
    }
    Optional<List<List<Point>>> rings = shapes.rings(key, value.get(), called);
    pass.place("section", called, node);
    if (fill.isPresent()) {
      pass.place("section", fill.get().name(), node);
    }
    if (fill.isEmpty() || rings.isEmpty()) {
      return List.of();
    }
    return List.of(new Area(called, fill.get(), rings.get(), glazing, role));
  }

  /** Shapes taken from a drawing. */
  private List<Area> drawn(Node node, String path) {
    Fields fields = new Fields(problems, "this entry", node, DrawnEntryReader.KEYS);
    Optional<String> name = name(fields);
    boolean glazing = fields.word("surface", SURFACES).isPresent();
    Area.Role role = role(fields);
    Optional<Node> fillNode = fields.require("fill", "add `fill: ` and a material or a space");
    Optional<Fill> fill = fillNode.isEmpty() ? Optional.empty() : fills.find(fillNode.get(), name);
    if (drawn == null) {
      drawn = new DrawnEntryReader(pass, drawings == null ? new DrawingsReader(pass) : drawings);
    }
    List<List<List<Point>>> shapes = drawn.read(fields);
    fill.ifPresent(f -> pass.place("section", f.name(), node));
    List<Area> areas = new ArrayList<>();
    for (int i = 0; i < shapes.size() && fill.isPresent(); i++) {
      String at = shapes.size() == 1 ? path : path + ".shape[" + (i + 1) + "]";
      String called = called(at, name, fill);
      pass.place("section", called, node);
      areas.add(new Area(called, fill.get(), shapes.get(i), glazing, role));
    }
    return areas;
  }

  /** An open region, laid when everything else is known. */
  private List<Area> around(Node node, String path, int laidBefore) {
    Fields fields = new Fields(problems, "this entry", node, AROUND_KEYS);
    Optional<String> name = name(fields);
    boolean glazing = fields.word("surface", SURFACES).isPresent();
    Area.Role role = role(fields);
    Optional<Node> fillNode = fields.require("fill", "add `fill: ` and a material or a space");
    Optional<Fill> fill = fillNode.isEmpty() ? Optional.empty() : fills.find(fillNode.get(), name);
    Optional<Point> at =
        fields.has("around")
            ? pass.quantities().point(fields.get("around").get(), "`around`")
            : Optional.empty();
    if (path.contains(".group")) {
      problems.add(
          fields.keyNode("around"),
          "an open region cannot be part of a group",
          "write this entry on its own, outside of the group");
      return List.of();
    }
    if (fill.isPresent() && at.isPresent()) {
      String called = called(path, name, fill);
      pass.place("section", called, node);
      pass.place("section", fill.get().name(), node);
      if (arounds == null) {
        arounds = new AroundReader(problems);
      }
      arounds.add(laidBefore, node, called, fill.get(), at.get(), glazing, role);
    }
    return List.of();
  }

  /** What a shape is to a frame. */
  private static Area.Role role(Fields fields) {
    Optional<String> word = fields.word("part", PARTS);
    return word.isPresent() ? Area.Role.values()[1 + PARTS.indexOf(word.get())] : Area.Role.OTHER;
  }

  private static String called(String path, Optional<String> name, Optional<Fill> fill) {
    String of = fill.isPresent() ? fill.get().name() : "";
    return path + " (" + (name.isPresent() ? name.get() + ", " + of : of) + ")";
  }

  private List<Area> stack(Node node, String path) {
    Fields fields = new Fields(problems, "this stack", node, STACK_KEYS);
    Optional<String> name = name(fields);
    boolean glazing = fields.word("surface", SURFACES).isPresent();
    Area.Role role = role(fields);
    fields.refuseBoth("glazing", "part", "a glazing is one already");
    Optional<Node> layers = fields.require("layers", "add `layers: [[FILL, THICKNESS], …]`");
    Optional<Node> stack = fields.get("stack");
    if (stack.isEmpty() || layers.isEmpty()) {
      return List.of();
    }
    List<Area> areas = new ArrayList<>();
    boolean unit = fields.has("glazing");
    List<StackReader.Layer> read = stacks.read(stack.get(), layers.get(), name, unit);
    if (unit) {
      areas.addAll(glazings.read(fields.get("glazing").get(), read, path));
      for (Area area : areas) {
        pass.place("section", area.name(), node);
        pass.place("section", area.fill().name(), node);
      }
      return areas;
    }
    for (StackReader.Layer layer : read) {
      String called =
          called(path + ".layer[" + layer.number() + "]", name, Optional.of(layer.fill()));
      pass.place("section", called, layer.node());
      pass.place("section", layer.fill().name(), layer.node());
      areas.add(new Area(called, layer.fill(), List.of(layer.ring()), glazing, role));
    }
    return areas;
  }

  private List<Area> group(Node node, String path) {
    Fields fields = new Fields(problems, "this group", node, GROUP_KEYS);
    Optional<Node> members = fields.get("group");
    List<Area> areas =
        members.isEmpty() ? List.of() : entries(members.get(), path + ".group", "`group`");
    Area.Role role = role(fields);
    if (role != Area.Role.OTHER) {
      areas = ofRole(areas, role);
    }
    MotionReader motions = new MotionReader(pass, fields);
    Optional<MotionReader.Mirror> mirror = motions.mirror();
    Optional<Motion> turnAndMove = motions.turnAndMove();
    Optional<MotionReader.Repeat> repeat = motions.repeat();
    if (mirror.isPresent()) {
      List<Area> images = moved(areas, mirror.get().motion(), " mirrored");
      if (mirror.get().keep()) {
        List<Area> both = new ArrayList<>(areas);
        both.addAll(images);
        areas = both;
      } else {
        areas = images;
      }
    }
    if (turnAndMove.isPresent()) {
      areas = moved(areas, turnAndMove.get(), "");
    }
    if (repeat.isPresent()) {
      areas = repeated(areas, repeat.get(), node);
    }
    return areas;
  }

  /** Areas that are nothing to a frame of their own become part of what their group is. */
  private static List<Area> ofRole(List<Area> areas, Area.Role role) {
    List<Area> all = new ArrayList<>(areas.size());
    for (Area area : areas) {
      all.add(
          area.role() == Area.Role.OTHER
              ? new Area(area.name(), area.fill(), area.rings(), area.glazing(), role)
              : area);
    }
    return all;
  }

  private List<Area> repeated(List<Area> areas, MotionReader.Repeat repeat, Node node) {
    if (tooMany(node, (long) areas.size() * repeat.times())) {
      return List.of();
    }
    List<Area> all = new ArrayList<>(areas);
    for (int k = 1; k < repeat.times(); k++) {
      Motion step = Motion.shift(k * repeat.dx(), k * repeat.dy());
      all.addAll(moved(areas, step, " copy " + (k + 1)));
    }
    return all;
  }

  private List<Area> moved(List<Area> areas, Motion motion, String suffix) {
    List<Area> moved = new ArrayList<>(areas.size());
    for (Area area : areas) {
      Fill fill = fills.turned(area.fill(), motion);
      String name = area.name() + suffix;
      Node place = pass.places().get(Pass.key("section", area.name()));
      if (place != null) {
        pass.place("section", name, place);
      }
      moved.add(new Area(name, fill, motion.of(area.rings()), area.glazing(), area.role()));
    }
    return moved;
  }
}
