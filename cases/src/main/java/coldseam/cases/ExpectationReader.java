package coldseam.cases;

import coldseam.cases.Expectation.Quantity;
import coldseam.solver.detail.Geometry;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;

/** Reads {@code expect}. */
final class ExpectationReader {
  /** The keys that say which quantity, in the order of {@link Quantity}. */
  static final List<String> QUANTITIES =
      List.of(
          "L2D", "L3D", "psi", "chi", "U", "R", "flow", "temperature", "coldest", "fRsi", "weight");

  static final List<String> STATUS = List.of("seen", "computed", "memory", "invented");

  private static final List<String> KEYS =
      List.of(
          "L2D",
          "L3D",
          "psi",
          "chi",
          "U",
          "R",
          "flow",
          "temperature",
          "coldest",
          "fRsi",
          "weight",
          "value",
          "within",
          "source",
          "status",
          "variant");

  private static final Dimension[] DIMENSIONS = {
    Dimension.CONDUCTIVITY,
    Dimension.CONDUCTANCE,
    Dimension.CONDUCTIVITY,
    Dimension.CONDUCTANCE,
    Dimension.TRANSMITTANCE,
    Dimension.RESISTANCE,
    Dimension.FLOW_PER_LENGTH,
    Dimension.TEMPERATURE,
    Dimension.TEMPERATURE,
    Dimension.BARE,
    Dimension.BARE
  };

  private final Problems problems;
  private final Quantities quantities;
  private final Names names;

  /**
   * Prepares.
   *
   * @param pass what the parts of the case share
   * @param names what can be expected of
   */
  ExpectationReader(Pass pass, Names names) {
    this.problems = pass.problems();
    this.quantities = pass.quantities();
    this.names = names;
  }

  /**
   * The names that a case gives to what has results.
   *
   * @param spaces spaces, those of stretches included
   * @param floating those whose temperature is a result
   * @param stretches stretches
   * @param psi each ψ
   * @param chi each χ
   * @param transmittances each U
   * @param points points
   * @param variants variants
   * @param geometry whether couplings are L2D or L3D
   */
  record Names(
      Collection<String> spaces,
      Collection<String> floating,
      Collection<String> stretches,
      Collection<String> psi,
      Collection<String> chi,
      Collection<String> transmittances,
      Collection<String> points,
      Collection<String> variants,
      Geometry geometry) {}

  /**
   * Reads the expectations.
   *
   * @param node the list
   * @return those without a mistake
   */
  List<Expectation> read(Node node) {
    List<Expectation> expectations = new ArrayList<>();
    if (!(node instanceof Node.Sequence sequence) || sequence.items().isEmpty()) {
      problems.add(
          node,
          "`expect` is a list, not " + Node.describe(node),
          "write `- {psi: NAME, value: …, within: …, source: …, status: …}`");
      return expectations;
    }
    for (Node item : sequence.items()) {
      Optional<Expectation> expectation = expectation(item);
      if (expectation.isPresent()) {
        expectations.add(expectation.get());
      }
    }
    return expectations;
  }

  private Optional<Expectation> expectation(Node node) {
    int before = problems.count();
    Fields fields = new Fields(problems, "an expectation", node, KEYS);
    int which = quantity(fields);
    List<String> subject = which < 0 ? List.of() : subject(which, fields);
    Optional<Node> valueNode = fields.require("value", "add `value: …`");
    Optional<Node> withinNode = fields.require("within", "add `within: …`, e.g. `0.1 %`");
    Optional<Node> sourceNode =
        fields.require("source", "add `source: ` and where the value comes from");
    fields.require("status", "add `status: ` and " + Fields.orList(STATUS));
    Optional<String> status = fields.word("status", STATUS);
    Optional<String> source =
        sourceNode.isEmpty()
            ? Optional.empty()
            : Fields.text(problems, "`source`", sourceNode.get());
    Optional<String> variant = variant(fields);
    if (which < 0 || valueNode.isEmpty() || withinNode.isEmpty()) {
      return Optional.empty();
    }
    double value = value(valueNode.get(), DIMENSIONS[which]);
    double within = within(withinNode.get(), DIMENSIONS[which], value);
    if (problems.count() > before || Double.isNaN(value) || Double.isNaN(within)) {
      return Optional.empty();
    }
    return Optional.of(
        new Expectation(
            Quantity.values()[which], subject, value, within, variant, source.get(), status.get()));
  }

  private int quantity(Fields fields) {
    int which = -1;
    for (int i = 0; i < QUANTITIES.size(); i++) {
      if (fields.has(QUANTITIES.get(i))) {
        if (which >= 0) {
          fields.refuseBoth(
              QUANTITIES.get(which), QUANTITIES.get(i), "an expectation is of one quantity");
          return -1;
        }
        which = i;
      }
    }
    boolean reported = fields.reported("value");
    for (String key : QUANTITIES) {
      reported |= fields.reported(key);
    }
    if (which < 0 && !reported) {
      problems.add(
          fields.node(),
          "an expectation does not say of what",
          "add one of " + Problems.listed(QUANTITIES));
    }
    return which;
  }

  private Optional<String> variant(Fields fields) {
    if (!fields.has("variant")) {
      return Optional.empty();
    }
    Node node = fields.get("variant").get();
    Optional<String> name = Fields.text(problems, "`variant`", node);
    if (name.isPresent()) {
      check(node, name.get(), names.variants(), "a variant");
    }
    return name;
  }

  private List<String> subject(int which, Fields fields) {
    Node node = fields.get(QUANTITIES.get(which)).get();
    return switch (Quantity.values()[which]) {
      case L2D, L3D -> coupling(which, node);
      case CHI -> one(node, names.chi(), "a χ");
      case PSI -> one(node, names.psi(), "a ψ");
      case U, R -> one(node, names.transmittances(), "a U");
      case FLOW -> one(node, joined(names.spaces(), names.stretches()), "a space or a stretch");
      case TEMPERATURE ->
          one(node, joined(names.points(), names.floating()), "a point or a floating space");
      case COLDEST, F_RSI -> one(node, names.spaces(), "a space");
      case WEIGHT ->
          pair(node, joined(names.points(), names.spaces()), names.spaces(), "a point or a space");
    };
  }

  /** Two spaces; L2D of a prism, L3D of a body of revolution. */
  private List<String> coupling(int which, Node node) {
    boolean ofPrism = Quantity.values()[which] == Quantity.L2D;
    if (ofPrism != (names.geometry() == Geometry.PLANE)) {
      problems.add(
          node,
          ofPrism ? "a body of revolution has no L2D" : "a plane section has no L3D",
          ofPrism ? "expect `L3D`" : "expect `L2D`");
    }
    return pair(node, names.spaces(), names.spaces(), "a space");
  }

  private static Collection<String> joined(Collection<String> a, Collection<String> b) {
    List<String> both = new ArrayList<>(a);
    for (String name : b) {
      if (!both.contains(name)) {
        both.add(name);
      }
    }
    return both;
  }

  private List<String> one(Node node, Collection<String> valid, String kind) {
    Optional<String> name = Fields.text(problems, "the name of " + kind, node);
    if (name.isEmpty()) {
      return List.of();
    }
    check(node, name.get(), valid, kind);
    return List.of(name.get());
  }

  private List<String> pair(
      Node node, Collection<String> first, Collection<String> second, String kind) {
    if (!(node instanceof Node.Sequence pair) || pair.items().size() != 2) {
      problems.add(
          node, "this is two names, not " + Quantities.counted(node), "write `[NAME, NAME]`");
      return List.of();
    }
    List<String> both = new ArrayList<>(one(pair.items().get(0), first, kind));
    both.addAll(one(pair.items().get(1), second, "a space"));
    if (both.size() == 2 && both.get(0).equals(both.get(1))) {
      problems.add(node, "`" + both.get(0) + "` is named twice", "name two different ones");
    }
    return both;
  }

  private void check(Node node, String name, Collection<String> valid, String kind) {
    if (!valid.contains(name)) {
      problems.add(
          node,
          "`" + Node.shortened(name) + "` is not " + kind + " of this case",
          Problems.suggestion(name, valid));
    }
  }

  private double value(Node node, Dimension dimension) {
    Value value = quantities.value(node, "`value`");
    if (value.unknown()) {
      return Double.NaN;
    }
    boolean fits =
        value.dimension().same(dimension) || value.dimension().kind() == Dimension.Kind.BARE;
    return fits ? value.number() : mismatch(node, "`value`", value, dimension);
  }

  private double mismatch(Node node, String what, Value value, Dimension dimension) {
    problems.add(
        node,
        what + " cannot be " + value.dimension().inWords(),
        "it is " + dimension.inWords() + ", or a number in its SI unit");
    return Double.NaN;
  }

  private double within(Node node, Dimension dimension, double value) {
    Value typed = quantities.value(node, "`within`");
    if (typed.unknown() || Double.isNaN(value)) {
      return Double.NaN;
    }
    boolean temperature = dimension.same(Dimension.TEMPERATURE);
    Dimension wanted = temperature ? Dimension.TEMPERATURE_DIFFERENCE : dimension;
    double within = typed.number();
    if (typed.dimension().same(Dimension.SHARE)) {
      if (temperature) {
        problems.add(node, "a share of a temperature means nothing", "give kelvins, e.g. `0.02`");
        return Double.NaN;
      }
      within *= Math.abs(value);
    } else if (!typed.dimension().same(wanted) && typed.dimension().kind() != Dimension.Kind.BARE) {
      return mismatch(node, "`within`", typed, wanted);
    }
    if (!(within > 0) || !(within < Math.max(Math.abs(value), 1))) {
      problems.add(
          node,
          "`within` is out of range: " + Figures.of(within),
          "it is more than 0 and less than the value, or than 1");
      return Double.NaN;
    }
    return within;
  }
}
