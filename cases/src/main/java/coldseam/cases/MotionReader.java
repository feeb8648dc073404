package coldseam.cases;

import coldseam.mesh.plane.Point;
import java.util.List;
import java.util.Optional;

/** Reads how a group is changed: mirrored, turned, moved, repeated. */
final class MotionReader {
  private static final List<String> MIRROR_KEYS = List.of("across", "keep");
  private static final List<String> ROTATE_KEYS = List.of("by", "about");
  private static final List<String> REPEAT_KEYS = List.of("times", "step");

  private final Problems problems;
  private final Quantities quantities;
  private final Fields group;

  MotionReader(Pass pass, Fields group) {
    this.problems = pass.problems();
    this.quantities = pass.quantities();
    this.group = group;
  }

  /**
   * A mirror image.
   *
   * @param motion the reflection
   * @param keep whether the original stays
   */
  record Mirror(Motion motion, boolean keep) {}

  /**
   * Copies in a row.
   *
   * @param times how many there are in all
   * @param dx from one to the next, m
   * @param dy from one to the next, m
   */
  record Repeat(int times, double dx, double dy) {}

  Optional<Mirror> mirror() {
    Optional<Node> node = group.get("mirror");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    Fields fields = new Fields(problems, "`mirror`", node.get(), MIRROR_KEYS);
    boolean keep = fields.flag("keep");
    Optional<Node> across = fields.require("across", "add `across: [[x, y], [x, y]]`");
    Optional<List<Point>> line =
        across.isEmpty()
            ? Optional.empty()
            : quantities.line(across.get(), "`across` of the mirror", 2);
    if (line.isEmpty()) {
      return Optional.empty();
    }
    Point p = line.get().get(0);
    Point q = line.get().get(1);
    if (line.get().size() != 2 || p.distance(q) < Place.SIZE.least()) {
      problems.add(across.get(), "`across` is a straight line", "give two different points");
      return Optional.empty();
    }
    return Optional.of(new Mirror(Motion.reflection(p, q), keep));
  }

  /** The rotation followed by the displacement, as one motion. */
  Optional<Motion> turnAndMove() {
    Optional<Motion> rotation = rotation();
    Optional<Motion> shift = Optional.empty();
    if (group.has("move")) {
      Optional<double[]> by = quantities.pair(group.get("move").get(), "`move`", Place.COORDINATE);
      if (by.isPresent()) {
        shift = Optional.of(Motion.shift(by.get()[0], by.get()[1]));
      }
    }
    if (rotation.isEmpty() || shift.isEmpty()) {
      return rotation.isPresent() ? rotation : shift;
    }
    Motion r = rotation.get();
    Motion s = shift.get();
    return Optional.of(new Motion(r.a(), r.b(), r.c(), r.d(), r.e() + s.e(), r.f() + s.f()));
  }

  private Optional<Motion> rotation() {
    Optional<Node> node = group.get("rotate");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    Fields fields = new Fields(problems, "`rotate`", node.get(), ROTATE_KEYS);
    Optional<Node> by = fields.require("by", "add `by: ` and an angle in degrees");
    double degrees =
        by.isEmpty() ? Double.NaN : quantities.read(by.get(), "`by` of `rotate`", Place.ANGLE);
    Optional<Node> about = fields.get("about");
    Optional<Point> centre =
        about.isEmpty()
            ? Optional.of(new Point(0, 0))
            : quantities.point(about.get(), "`about` of `rotate`");
    return centre.isEmpty() || Double.isNaN(degrees)
        ? Optional.empty()
        : Optional.of(Motion.rotation(degrees, centre.get()));
  }

  Optional<Repeat> repeat() {
    Optional<Node> node = group.get("repeat");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    Fields fields = new Fields(problems, "`repeat`", node.get(), REPEAT_KEYS);
    Optional<Node> times = fields.require("times", "add `times: ` and how many there are in all");
    Optional<Node> step = fields.require("step", "add `step: [dx, dy]`");
    double count =
        times.isEmpty() ? Double.NaN : quantities.read(times.get(), "`times`", Place.COUNT);
    Optional<double[]> by =
        step.isEmpty()
            ? Optional.empty()
            : quantities.pair(step.get(), "`step` of `repeat`", Place.COORDINATE);
    return by.isEmpty() || Double.isNaN(count)
        ? Optional.empty()
        : Optional.of(new Repeat((int) count, by.get()[0], by.get()[1]));
  }
}
