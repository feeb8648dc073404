package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Assumption;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** One way through a case file, for the base case or one variant: what all its parts share. */
final class Pass {
  private final Path file;
  private final Problems problems;
  private final Quantities quantities;
  private final OpenedDrawings drawings;
  private final List<Assumption> assumptions = new ArrayList<>();
  private final List<Doubt> doubts = new ArrayList<>();
  private final Map<String, Node> places = new HashMap<>();

  Pass(Path file, Problems problems, Quantities quantities, OpenedDrawings drawings) {
    this.file = file;
    this.problems = problems;
    this.quantities = quantities;
    this.drawings = drawings;
  }

  /** The case file, which other files are named relative to. */
  Path file() {
    return file;
  }

  Problems problems() {
    return problems;
  }

  Quantities quantities() {
    return quantities;
  }

  void assume(String what, String value, String source) {
    assume(new Assumption(what, value, source));
  }

  void assume(Assumption assumption) {
    assumptions.add(assumption);
  }

  /** The drawings opened so far. */
  OpenedDrawings drawings() {
    return drawings;
  }

  /** Remembers a place in a drawing to look at. */
  void doubt(Point where, String text) {
    doubts.add(new Doubt(where, text));
  }

  List<Doubt> doubts() {
    return doubts;
  }

  List<Assumption> assumptions() {
    return assumptions;
  }

  /**
   * Remembers where a thing is written.
   *
   * @param part the part of a fault, e.g. "space"
   * @param name the name of the thing, empty for the part as a whole
   * @param node where it is written
   */
  void place(String part, String name, Node node) {
    places.putIfAbsent(key(part, name), node);
  }

  Map<String, Node> places() {
    return places;
  }

  static String key(String part, String name) {
    return part + '\n' + name;
  }
}
