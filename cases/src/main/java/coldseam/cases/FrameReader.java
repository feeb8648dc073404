package coldseam.cases;

import coldseam.solver.detail.CornerRule;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code frame}: the frame whose U_f and ψ_g are wanted. */
final class FrameReader {
  static final List<String> KEYS = List.of("between", "panel", "width", "visible", "corners");
  private static final List<String> PANEL_KEYS = List.of("conductivity");

  /** In the order of {@link CornerRule}. */
  private static final List<String> CORNERS = List.of("limited", "whole", "none");

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;

  FrameReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
  }

  /**
   * Reads the frame.
   *
   * @param key its key, for its place
   * @param node the mapping
   * @return the frame, or empty if a mistake was reported
   */
  Optional<Wanted> read(Node key, Node node) {
    pass.place("frame", "", key);
    int before = problems.count();
    Fields fields = new Fields(problems, "`frame`", node, KEYS);
    Optional<Node> between = fields.require("between", "add `between: [indoors, outdoors]`");
    Optional<PairReader.Sides> sides =
        between.isEmpty()
            ? Optional.empty()
            : new PairReader(problems, spaces.spaces()).read(between.get(), "`between` of `frame`");
    double panel = panel(fields);
    OptionalDouble width = OptionalDouble.empty();
    if (fields.has("width")) {
      width = OptionalDouble.of(length(fields.get("width").get(), "`width` of `frame`"));
    }
    List<Double> visible = new ArrayList<>();
    if (fields.has("visible")) {
      Node value = fields.get("visible").get();
      List<Node> items = value instanceof Node.Sequence list ? list.items() : List.of(value);
      if (items.isEmpty()) {
        problems.add(value, "`visible` is an empty list", "give one length for each glazing");
      }
      for (Node item : items) {
        visible.add(length(item, "`visible` of `frame`"));
      }
    }
    CornerRule corners = CornerRule.LIMITED;
    Optional<String> word = fields.word("corners", CORNERS);
    if (word.isPresent()) {
      corners = CornerRule.values()[CORNERS.indexOf(word.get())];
    }
    if (problems.count() > before || sides.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Wanted.Frame(
            sides.get().warm(),
            sides.get().cold(),
            panel,
            width,
            visible,
            corners,
            Optional.empty()));
  }

  private double length(Node node, String what) {
    return pass.quantities().read(node, what, Place.SIZE);
  }

  private double panel(Fields fields) {
    if (!fields.has("panel")) {
      return Wanted.Frame.PANEL_W_PER_MK;
    }
    Node node = fields.get("panel").get();
    Fields panel = new Fields(problems, "`panel` of `frame`", node, PANEL_KEYS);
    Optional<Node> value = panel.require("conductivity", "add `conductivity: 0.035`");
    if (value.isEmpty()) {
      return Double.NaN;
    }
    double conductivity =
        pass.quantities().read(value.get(), "`conductivity` of `panel`", Place.CONDUCTIVITY);
    if (conductivity < MaterialReader.LEAST_CONDUCTIVITY_W_PER_MK) {
      problems.add(value.get(), "the panel conducts nothing", "the standard's has `0.035`");
    }
    return conductivity;
  }
}
