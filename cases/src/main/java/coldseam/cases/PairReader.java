package coldseam.cases;

import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads {@code between}: the two sides of a result, each one space or a list of them. */
final class PairReader {
  /** Temperatures that differ by less are equal but for rounding, K. */
  private static final double SAME_K = 1e-9;

  private final Problems problems;
  private final Map<String, Optional<Space>> spaces;

  PairReader(Problems problems, Map<String, Optional<Space>> spaces) {
    this.problems = problems;
    this.spaces = spaces;
  }

  /**
   * Two sides.
   *
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   */
  record Sides(List<String> warm, List<String> cold) {}

  /**
   * Reads {@code [warm, cold]}.
   *
   * @param node where it stands
   * @param what how messages call it
   * @return the two sides, or empty if a mistake was reported
   */
  Optional<Sides> read(Node node, String what) {
    if (!(node instanceof Node.Sequence pair) || pair.items().size() != 2) {
      problems.add(
          node,
          what + " is two spaces, not " + Quantities.counted(node),
          "write `[indoors, outdoors]`, the warm one first");
      return Optional.empty();
    }
    Optional<List<String>> warm = side(pair.items().get(0), what);
    Optional<List<String>> cold = side(pair.items().get(1), what);
    if (warm.isEmpty() || cold.isEmpty()) {
      return Optional.empty();
    }
    for (String name : warm.get()) {
      if (cold.get().contains(name)) {
        problems.add(node, what + " has `" + name + "` on both sides", "name two different spaces");
        return Optional.empty();
      }
    }
    return Optional.of(new Sides(warm.get(), cold.get()));
  }

  private Optional<List<String>> side(Node node, String what) {
    List<Node> items = node instanceof Node.Sequence list ? list.items() : List.of(node);
    if (items.isEmpty()) {
      problems.add(node, what + " has a side without a space", "name one space at least");
      return Optional.empty();
    }
    List<String> names = new ArrayList<>();
    double temperature = Double.NaN;
    boolean good = true;
    for (Node item : items) {
      Optional<String> name = name(item, what, names);
      if (name.isEmpty()) {
        good = false;
        continue;
      }
      names.add(name.get());
      Optional<Space> space = spaces.get(name.get());
      if (space.isEmpty() || space.get().floating().isPresent()) {
        continue;
      }
      double own = space.get().temperatureC();
      if (!Double.isNaN(temperature) && Math.abs(own - temperature) > SAME_K) {
        good = false;
        reportUnequal(item, what, temperature, own);
      }
      temperature = own;
    }
    return good ? Optional.of(names) : Optional.empty();
  }

  /** The name of a space, or empty if it is none or a repeated one, which is reported. */
  private Optional<String> name(Node item, String what, List<String> before) {
    Optional<String> name = Fields.text(problems, "a space of " + what, item);
    if (name.isEmpty()) {
      return name;
    }
    if (!spaces.containsKey(name.get())) {
      problems.add(
          item,
          "`" + Node.shortened(name.get()) + "` is no space of this case",
          Problems.suggestion(name.get(), spaces.keySet()));
      return Optional.empty();
    }
    if (before.contains(name.get())) {
      problems.add(item, "`" + name.get() + "` is named twice", "name each space once");
      return Optional.empty();
    }
    return name;
  }

  private void reportUnequal(Node item, String what, double one, double other) {
    problems.add(
        item,
        what + " joins spaces of " + Figures.of(one) + " and " + Figures.of(other) + " °C",
        "only spaces of equal temperature are joined; weight the others by `b`");
  }
}
