package coldseam.cases;

import coldseam.mesh.plane.Point;
import java.util.List;
import java.util.Optional;

/** Reads one shape into closed rings. */
final class ShapeReader {
  static final List<String> SHAPES = List.of("box", "polygon", "disc", "strip");
  static final List<String> DISC_KEYS = List.of("centre", "radius", "from", "to", "chords");
  static final List<String> STRIP_KEYS = List.of("along", "thickness", "lies");
  static final List<String> LIES = List.of("centre", "left", "right");

  /** A ring of more corners is refused. */
  private static final int MOST_CORNERS = 5_000;

  /** A shape whose area is less than the resolution times half its perimeter has none. */
  private static final double THINNEST_M = Place.SIZE.least();

  private final Pass pass;
  private final Problems problems;
  private final Quantities quantities;

  ShapeReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
    this.quantities = pass.quantities();
  }

  /**
   * Reads a shape.
   *
   * @param key one of {@link #SHAPES}
   * @param node its value
   * @param name how messages and assumptions call it
   * @return closed rings by the even-odd rule, m, or empty if a mistake was reported
   */
  Optional<List<List<Point>>> rings(String key, Node node, String name) {
    return switch (key) {
      case "box" -> box(node);
      case "polygon" -> polygon(node);
      case "disc" -> disc(node, name);
      default -> strip(node);
    };
  }

  private Optional<List<List<Point>>> box(Node node) {
    if (!(node instanceof Node.Sequence sequence) || sequence.items().size() != 4) {
      problems.add(
          node,
          "a box is four numbers, not " + Quantities.counted(node),
          "write `[x1, y1, x2, y2]`, two opposite corners, with decimal points, not commas");
      return Optional.empty();
    }
    String[] names = {"`x1` of the box", "`y1` of the box", "`x2` of the box", "`y2` of the box"};
    double[] at = new double[4];
    boolean good = true;
    for (int i = 0; i < 4; i++) {
      at[i] = quantities.read(sequence.items().get(i), names[i], Place.COORDINATE);
      good &= !Double.isNaN(at[i]);
    }
    if (!good) {
      return Optional.empty();
    }
    double width = Math.abs(at[2] - at[0]);
    double height = Math.abs(at[3] - at[1]);
    if (width < THINNEST_M || height < THINNEST_M) {
      problems.add(
          node,
          "this box has no " + (width < THINNEST_M ? "width" : "height"),
          "give two opposite corners, `[x1, y1, x2, y2]`");
      return Optional.empty();
    }
    double left = Math.min(at[0], at[2]);
    double right = Math.max(at[0], at[2]);
    double low = Math.min(at[1], at[3]);
    double high = Math.max(at[1], at[3]);
    return Optional.of(
        List.of(
            List.of(
                new Point(left, low),
                new Point(right, low),
                new Point(right, high),
                new Point(left, high))));
  }

  private Optional<List<List<Point>>> polygon(Node node) {
    Optional<List<Point>> corners = quantities.line(node, "a polygon", 3);
    if (corners.isEmpty()) {
      return Optional.empty();
    }
    List<Point> ring = corners.get();
    if (Outlines.same(ring.get(0), ring.get(ring.size() - 1))) {
      ring = ring.subList(0, ring.size() - 1);
    }
    return sound(node, "polygon", "list the corners in order around it", List.of(ring));
  }

  /** The rings unless one crosses itself or has no area, which is reported. */
  private Optional<List<List<Point>>> sound(
      Node node, String what, String right, List<List<Point>> rings) {
    for (List<Point> ring : rings) {
      if (ring.size() > MOST_CORNERS) {
        problems.add(node, "this " + what + " has " + ring.size() + " corners", "5000 at most");
        return Optional.empty();
      }
      if (ring.size() < 3
          || Math.abs(Outlines.area(ring)) * 2 < THINNEST_M * Outlines.perimeter(ring)) {
        int[] crossed = ring.size() < 4 ? null : Outlines.crossing(ring);
        if (crossed == null) {
          problems.add(node, "this " + what + " has no area", right);
          return Optional.empty();
        }
      }
      int[] crossing = Outlines.crossing(ring);
      if (crossing != null) {
        problems.add(node, "this " + what + " crosses itself: " + edges(ring, crossing), right);
        return Optional.empty();
      }
    }
    return Optional.of(rings);
  }

  private String edges(List<Point> ring, int[] crossing) {
    int n = ring.size();
    return "the edge from "
        + written(ring.get(crossing[0]))
        + " to "
        + written(ring.get((crossing[0] + 1) % n))
        + " meets that from "
        + written(ring.get(crossing[1]))
        + " to "
        + written(ring.get((crossing[1] + 1) % n));
  }

  private String written(Point p) {
    double metres = quantities.unit().metres();
    return "[" + Figures.of(p.x() / metres) + ", " + Figures.of(p.y() / metres) + "]";
  }

  private Optional<List<List<Point>>> disc(Node node, String name) {
    Fields fields = new Fields(problems, "disc", node, DISC_KEYS);
    Optional<Node> centreNode = fields.require("centre", "add `centre: [x, y]`");
    Optional<Node> radiusNode = fields.require("radius", "add `radius: …`");
    Optional<Point> centre =
        centreNode.isEmpty()
            ? Optional.empty()
            : quantities.point(centreNode.get(), "`centre` of the disc");
    double radius =
        radiusNode.isEmpty()
            ? Double.NaN
            : quantities.read(radiusNode.get(), "`radius` of the disc", Place.SIZE);
    double from = angle(fields, "from", 0);
    double to = angle(fields, "to", from + 360);
    double sweep = to - from;
    if (!(sweep > 0 && sweep <= 360)) {
      if (!Double.isNaN(sweep)) {
        problems.add(
            fields.keyNode("to"),
            "this sector reaches over " + Figures.of(sweep) + " degrees",
            "`to` is more than `from`, by at most 360");
      }
      return Optional.empty();
    }
    double chords = Disc.usualChords(sweep);
    if (fields.has("chords")) {
      chords = chords(fields, sweep);
    }
    if (centre.isEmpty() || Double.isNaN(radius) || Double.isNaN(chords)) {
      return Optional.empty();
    }
    Disc disc = new Disc(centre.get(), radius, from, sweep, (int) chords);
    pass.assume(
        "round edge of " + name,
        disc.chords()
            + " chords of equal area, at most "
            + Figures.of(disc.deviationM() * 1000)
            + " mm from the arc",
        "by convention of this tool");
    return Optional.of(List.of(disc.ring()));
  }

  private double chords(Fields fields, double sweep) {
    Node node = fields.get("chords").get();
    double chords = quantities.read(node, "`chords` of the disc", Place.COUNT);
    int fewest = Disc.fewestChords(sweep);
    if (chords < fewest || chords > MOST_CORNERS - 2) {
      problems.add(
          node,
          "a disc of " + Figures.of(chords) + " chords cannot be drawn",
          "give " + fewest + " to " + (MOST_CORNERS - 2));
      return Double.NaN;
    }
    return chords;
  }

  private double angle(Fields fields, String key, double otherwise) {
    Optional<Node> node = fields.get(key);
    return node.isEmpty()
        ? otherwise
        : quantities.read(node.get(), "`" + key + "` of the disc", Place.ANGLE);
  }

  private Optional<List<List<Point>>> strip(Node node) {
    Fields fields = new Fields(problems, "strip", node, STRIP_KEYS);
    Optional<Node> alongNode = fields.require("along", "add `along: [[x, y], [x, y]]`");
    Optional<Node> thicknessNode = fields.require("thickness", "add `thickness: …`");
    Optional<String> lies = fields.word("lies", LIES);
    Optional<List<Point>> along =
        alongNode.isEmpty()
            ? Optional.empty()
            : quantities.line(alongNode.get(), "`along` of the strip", 2);
    double thickness =
        thicknessNode.isEmpty()
            ? Double.NaN
            : quantities.read(thicknessNode.get(), "`thickness` of the strip", Place.SIZE);
    boolean badWord = fields.has("lies") && lies.isEmpty();
    if (along.isEmpty() || Double.isNaN(thickness) || badWord) {
      return Optional.empty();
    }
    String side = lies.orElse("centre");
    double left = side.equals("right") ? 0 : side.equals("left") ? thickness : thickness / 2;
    Strip strip = new Strip(along.get(), left, thickness - left);
    Optional<List<List<Point>>> rings = strip.rings();
    if (rings.isEmpty()) {
      problems.add(
          node,
          "this strip " + strip.wrong(),
          "lay it in pieces, or give its outline as a polygon");
      return Optional.empty();
    }
    return sound(node, "strip", "lay it in pieces that do not overlap", rings.get());
  }
}
