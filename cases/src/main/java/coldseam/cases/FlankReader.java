package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Flank;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads {@code flanks}. */
final class FlankReader {
  static final List<String> KEYS = List.of("cut", "U", "length");

  /** The words for dimension systems, in the order of {@link DimensionSystem}. */
  static final List<String> SYSTEMS = List.of("internal", "overall-internal", "external");

  private final Pass pass;
  private final Problems problems;
  private final List<Flank> flanks = new ArrayList<>();
  private final List<String> names = new ArrayList<>();

  FlankReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /** Names of all flanks, those with a mistake included. */
  List<String> names() {
    return names;
  }

  List<Flank> flanks() {
    return flanks;
  }

  /**
   * Reads the flanks.
   *
   * @param node the mapping
   * @param areas the section
   */
  void read(Node node, List<Area> areas) {
    Sidelines sidelines = new Sidelines(problems, areas);
    for (Node.Entry entry : Fields.named(problems, "`flanks`", node, KEYS, "a flank", "wall")) {
      String name = entry.key().text();
      names.add(name);
      pass.place("flank", name, entry.key());
      flank(name, entry.value(), sidelines);
    }
  }

  private void flank(String name, Node node, Sidelines sidelines) {
    int before = problems.count();
    Fields fields = new Fields(problems, "flank `" + Node.shortened(name) + "`", node, KEYS);
    Optional<Point> cut = cut(fields, sidelines);
    Optional<Bracket> u = Optional.empty();
    if (fields.has("U")) {
      u = bracket(pass, fields.get("U").get(), "`U` of " + fields.what());
    }
    Map<DimensionSystem, Double> lengths = lengths(fields);
    if (problems.count() > before) {
      return;
    }
    if (cut.isEmpty() && (u.isEmpty() || lengths.isEmpty())) {
      problems.add(
          fields.node(),
          fields.what() + " has no cut-off plane",
          "add `cut: left`, `right`, `top`, `bottom` or `[x, y]`, or both `U` and `length`");
      return;
    }
    flanks.add(new Flank(name, cut, u, lengths));
  }

  private Optional<Point> cut(Fields fields, Sidelines sidelines) {
    Optional<Node> node = fields.get("cut");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    if (node.get() instanceof Node.Sequence) {
      return pass.quantities().point(node.get(), "`cut` of " + fields.what());
    }
    Optional<String> side = fields.word("cut", Sides.NAMES);
    return side.isEmpty() ? Optional.empty() : sidelines.middle(node.get(), side.get());
  }

  private Map<DimensionSystem, Double> lengths(Fields fields) {
    Map<DimensionSystem, Double> lengths = new EnumMap<>(DimensionSystem.class);
    Optional<Node> node = fields.get("length");
    if (node.isEmpty()) {
      return lengths;
    }
    String what = "`length` of " + fields.what();
    if (node.get() instanceof Node.Scalar) {
      double one = pass.quantities().read(node.get(), what, Place.EXTENT);
      for (DimensionSystem system : DimensionSystem.values()) {
        lengths.put(system, one);
      }
      return lengths;
    }
    Fields each = new Fields(problems, what, node.get(), SYSTEMS);
    for (int i = 0; i < SYSTEMS.size(); i++) {
      String word = SYSTEMS.get(i);
      if (each.has(word)) {
        double one =
            pass.quantities().read(each.get(word).get(), "`" + word + "` length", Place.EXTENT);
        lengths.put(DimensionSystem.values()[i], one);
      }
    }
    return lengths;
  }

  /** A U-value or {@code [lower, upper]}. */
  static Optional<Bracket> bracket(Pass pass, Node node, String what) {
    if (node instanceof Node.Sequence) {
      Optional<double[]> ends = pass.quantities().pair(node, what, Place.TRANSMITTANCE);
      if (ends.isEmpty()) {
        return Optional.empty();
      }
      if (ends.get()[0] > ends.get()[1]) {
        pass.problems().add(node, what + " runs downwards", "write `[lower, upper]`");
        return Optional.empty();
      }
      return Optional.of(new Bracket(ends.get()[0], ends.get()[1]));
    }
    double one = pass.quantities().read(node, what, Place.TRANSMITTANCE);
    return Double.isNaN(one) ? Optional.empty() : Optional.of(Bracket.of(one));
  }
}
