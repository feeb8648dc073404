package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads a stack: layers side by side from a face. */
final class StackReader {
  static final List<String> KEYS = List.of("face", "towards");
  static final List<String> TOWARDS = List.of("left", "right", "up", "down");

  /** Stands for what fills a gap of a glazing until its U has decided it. */
  static final Fill GAP_FILL = new Hollow(GlazingReader.GAP);

  private final Problems problems;
  private final Quantities quantities;
  private final Fills fills;

  StackReader(Pass pass, Fills fills) {
    this.problems = pass.problems();
    this.quantities = pass.quantities();
    this.fills = fills;
  }

  /**
   * One layer.
   *
   * @param number its number from the face, from 1
   * @param fill what it is made of
   * @param ring its corners, m
   * @param node where it is written
   */
  record Layer(int number, Fill fill, List<Point> ring, Node node) {}

  /**
   * Reads a stack.
   *
   * @param stack where it begins and which way it goes
   * @param layers fills and thicknesses
   * @param name the name of the stack, if it has one
   * @param glazing whether a layer may be a {@link #GAP_FILL}
   * @return the layers; none if a mistake was reported
   */
  List<Layer> read(Node stack, Node layers, Optional<String> name, boolean glazing) {
    Fields fields = new Fields(problems, "stack", stack, KEYS);
    Optional<Node> faceNode = fields.require("face", "add `face: [[x, y], [x, y]]`");
    Optional<Node> towardsNode =
        fields.require("towards", "add `towards: right`, `left`, `up`, `down` or `[x, y]`");
    Optional<List<Point>> face =
        faceNode.isEmpty()
            ? Optional.empty()
            : quantities.line(faceNode.get(), "`face` of the stack", 2);
    Optional<double[]> towards =
        towardsNode.isEmpty() ? Optional.empty() : direction(towardsNode.get());
    if (face.isPresent() && face.get().size() != 2) {
      problems.add(faceNode.get(), "`face` is a straight line", "give two points");
      face = Optional.empty();
    }
    if (face.isEmpty() || towards.isEmpty()) {
      readLayers(layers, name, glazing, null, null);
      return List.of();
    }
    Point p = face.get().get(0);
    Point q = face.get().get(1);
    double length = p.distance(q);
    if (length < Place.SIZE.least()) {
      problems.add(faceNode.get(), "`face` of the stack has no length", "give two points");
      return List.of();
    }
    double nx = -(q.y() - p.y()) / length;
    double ny = (q.x() - p.x()) / length;
    double along = nx * towards.get()[0] + ny * towards.get()[1];
    if (Math.abs(along) < 1e-6 * Math.hypot(towards.get()[0], towards.get()[1])) {
      problems.add(
          towardsNode.get(), "`towards` runs along the face", "name a side that the face looks to");
      return List.of();
    }
    double sign = Math.signum(along);
    return readLayers(layers, name, glazing, face.get(), new double[] {sign * nx, sign * ny});
  }

  private Optional<double[]> direction(Node node) {
    if (node instanceof Node.Sequence) {
      Optional<double[]> vector = quantities.pair(node, "`towards` of the stack", Place.DIRECTION);
      if (vector.isPresent() && vector.get()[0] == 0 && vector.get()[1] == 0) {
        problems.add(node, "`towards` points nowhere", "give one number at least that is not 0");
        return Optional.empty();
      }
      return vector;
    }
    String word = node instanceof Node.Scalar scalar ? scalar.text() : "";
    return switch (word) {
      case "left" -> Optional.of(new double[] {-1, 0});
      case "right" -> Optional.of(new double[] {1, 0});
      case "up" -> Optional.of(new double[] {0, 1});
      case "down" -> Optional.of(new double[] {0, -1});
      default -> {
        problems.add(
            node,
            "`towards` is " + Fields.orList(TOWARDS) + " or `[x, y]`, not " + Node.describe(node),
            word.isEmpty() ? "" : Problems.suggestion(word, TOWARDS));
        yield Optional.empty();
      }
    };
  }

  /** Reads the layers; without a face only to report their mistakes. */
  private List<Layer> readLayers(
      Node node, Optional<String> name, boolean glazing, List<Point> face, double[] normal) {
    if (!(node instanceof Node.Sequence sequence) || sequence.items().isEmpty()) {
      problems.add(
          node, "`layers` is a list, not " + Node.describe(node), "write `[[FILL, THICKNESS], …]`");
      return List.of();
    }
    List<Layer> layers = new ArrayList<>();
    double from = 0;
    boolean good = face != null;
    int number = 1;
    for (Node item : sequence.items()) {
      if (!(item instanceof Node.Sequence pair) || pair.items().size() != 2) {
        problems.add(
            item,
            "a layer is a fill and a thickness, not " + Quantities.counted(item),
            "write `[FILL, THICKNESS]`");
        good = false;
        continue;
      }
      Node fillNode = pair.items().get(0);
      boolean gap =
          glazing
              && fillNode instanceof Node.Scalar scalar
              && scalar.text().strip().equals(GlazingReader.GAP);
      Optional<Fill> fill = gap ? Optional.of(GAP_FILL) : fills.find(fillNode, name);
      double thickness = quantities.read(pair.items().get(1), "thickness of the layer", Place.SIZE);
      good &= fill.isPresent() && !Double.isNaN(thickness);
      if (good) {
        layers.add(new Layer(number, fill.get(), ring(face, normal, from, from + thickness), item));
        from += thickness;
      }
      number++;
    }
    return good ? layers : List.of();
  }

  private static List<Point> ring(List<Point> face, double[] normal, double from, double to) {
    Point p = face.get(0);
    Point q = face.get(1);
    return List.of(at(p, normal, from), at(q, normal, from), at(q, normal, to), at(p, normal, to));
  }

  private static Point at(Point p, double[] normal, double distance) {
    return new Point(p.x() + normal[0] * distance, p.y() + normal[1] * distance);
  }
}
