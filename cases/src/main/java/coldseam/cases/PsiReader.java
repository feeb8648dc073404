package coldseam.cases;

import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code psi}. */
final class PsiReader {
  static final List<String> KEYS = List.of("between", "dimensions", "subtract", "b", "of");
  private static final List<String> FLANK_KEYS = List.of("flank", "length");
  private static final List<String> PART_KEYS = List.of("part", "U", "length");
  private static final List<String> CASE_KEYS = List.of("case", "variant", "between");

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;
  private final FlankReader flanks;
  private final OtherCases others;
  private final PairReader pairs;

  PsiReader(Pass pass, SpaceReader spaces, FlankReader flanks, OtherCases others) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
    this.flanks = flanks;
    this.others = others;
    this.pairs = new PairReader(problems, spaces.spaces());
  }

  /**
   * Reads every ψ.
   *
   * @param node the mapping
   * @return those without a mistake
   */
  List<Wanted> read(Node node) {
    List<Wanted> wanted = new ArrayList<>();
    for (Node.Entry entry : Fields.named(problems, "`psi`", node, KEYS, "a ψ", "external")) {
      pass.place("psi", entry.key().text(), entry.key());
      Optional<Wanted.Psi> psi = psi(entry.key(), entry.value());
      if (psi.isPresent()) {
        wanted.add(psi.get());
      }
    }
    return wanted;
  }

  private Optional<Wanted.Psi> psi(Node.Scalar key, Node node) {
    int before = problems.count();
    Fields fields = new Fields(problems, "ψ `" + Node.shortened(key.text()) + "`", node, KEYS);
    Optional<Node> between = fields.require("between", "add `between: [indoors, outdoors]`");
    Optional<PairReader.Sides> sides =
        between.isEmpty()
            ? Optional.empty()
            : pairs.read(between.get(), "`between` of " + fields.what());
    Optional<DimensionSystem> system = dimensions(key, fields);
    List<Subtraction> subtractions =
        fields.has("subtract") ? subtractions(fields.get("subtract").get()) : List.of();
    Map<String, Double> weights = weights(fields);
    String of = "junction";
    if (fields.has("of")) {
      of = Fields.text(problems, "`of` of " + fields.what(), fields.get("of").get()).orElse(of);
    }
    if (problems.count() > before || sides.isEmpty() || system.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Wanted.Psi(
            key.text(),
            of,
            sides.get().warm(),
            sides.get().cold(),
            weights,
            system.get(),
            subtractions));
  }

  private Optional<DimensionSystem> dimensions(Node.Scalar key, Fields fields) {
    if (!fields.has("dimensions")) {
      if (!fields.reported("dimensions")) {
        problems.add(
            key,
            fields.what()
                + " does not say in which dimensions it is, and without them it means nothing",
            "add `dimensions: internal`, `overall-internal` or `external`");
      }
      return Optional.empty();
    }
    Optional<String> word = fields.word("dimensions", FlankReader.SYSTEMS);
    return word.isEmpty()
        ? Optional.empty()
        : Optional.of(DimensionSystem.values()[FlankReader.SYSTEMS.indexOf(word.get())]);
  }

  private Map<String, Double> weights(Fields fields) {
    Map<String, Double> weights = new HashMap<>();
    Optional<Node> node = fields.get("b");
    if (node.isEmpty()) {
      return weights;
    }
    for (Node.Entry entry : Fields.named(problems, "`b` of " + fields.what(), node.get())) {
      String name = entry.key().text();
      if (!spaces.spaces().containsKey(name)) {
        spaces.reportUnknown(entry.key(), name);
      }
      weights.put(
          name, pass.quantities().read(entry.value(), "`b` of `" + name + "`", Place.WEIGHT));
    }
    return weights;
  }

  private List<Subtraction> subtractions(Node node) {
    if (!(node instanceof Node.Sequence sequence) || sequence.items().isEmpty()) {
      problems.add(
          node,
          "`subtract` is a list of what is taken off, not "
              + (node instanceof Node.Sequence ? "an empty one" : Node.describe(node)),
          "write `- {flank: NAME}`, `- {part: NAME, U: …, length: …}` or `- {case: FILE}`,"
              + " or leave it away to take off every flank");
      return List.of();
    }
    List<Subtraction> subtractions = new ArrayList<>();
    for (Node item : sequence.items()) {
      Optional<Subtraction> one = subtraction(item);
      if (one.isPresent()) {
        subtractions.add(one.get());
      }
    }
    return subtractions;
  }

  private Optional<Subtraction> subtraction(Node node) {
    List<String> kinds = new ArrayList<>();
    if (node instanceof Node.Mapping mapping) {
      for (String kind : List.of("flank", "part", "case")) {
        for (Node.Entry entry : mapping.entries()) {
          if (entry.key().text().equals(kind) && !kinds.contains(kind)) {
            kinds.add(kind);
          }
        }
      }
    }
    if (kinds.size() != 1) {
      problems.add(
          node,
          "an entry of `subtract` is one flank, one part or one case",
          "write `{flank: NAME}`, `{part: NAME, U: …, length: …}` or `{case: FILE}`");
      return Optional.empty();
    }
    return switch (kinds.get(0)) {
      case "flank" -> ofFlank(node);
      case "part" -> ofPart(node);
      default -> ofCase(node);
    };
  }

  private Optional<Subtraction> ofFlank(Node node) {
    Fields fields = new Fields(problems, "an entry of `subtract`", node, FLANK_KEYS);
    Optional<Node> value = fields.get("flank");
    if (value.isEmpty()) {
      return Optional.empty();
    }
    Optional<String> name = Fields.text(problems, "`flank`", value.get());
    if (name.isEmpty()) {
      return Optional.empty();
    }
    if (!flanks.names().contains(name.get())) {
      problems.add(
          value.get(),
          "`" + Node.shortened(name.get()) + "` is no flank named in this case",
          flanks.names().isEmpty()
              ? "name it under `flanks`, e.g. `{cut: left}`"
              : Problems.suggestion(name.get(), flanks.names()));
      return Optional.empty();
    }
    OptionalDouble length = OptionalDouble.empty();
    if (fields.has("length")) {
      length =
          OptionalDouble.of(
              pass.quantities().read(fields.get("length").get(), "`length`", Place.EXTENT));
    }
    return Optional.of(new Subtraction.OfFlank(name.get(), length));
  }

  private Optional<Subtraction> ofPart(Node node) {
    Fields fields = new Fields(problems, "an entry of `subtract`", node, PART_KEYS);
    Optional<Node> nameNode = fields.get("part");
    Optional<Node> uNode = fields.require("U", "add `U: …`, in W/(m2 K)");
    Optional<Node> lengthNode = fields.require("length", "add `length: …`");
    Optional<String> name =
        nameNode.isEmpty() ? Optional.empty() : Fields.text(problems, "`part`", nameNode.get());
    Optional<Bracket> u =
        uNode.isEmpty()
            ? Optional.empty()
            : FlankReader.bracket(pass, uNode.get(), "`U` of the part");
    double length =
        lengthNode.isEmpty()
            ? Double.NaN
            : pass.quantities().read(lengthNode.get(), "`length` of the part", Place.EXTENT);
    return name.isEmpty() || u.isEmpty() || Double.isNaN(length)
        ? Optional.empty()
        : Optional.of(new Subtraction.OfKnown(name.get(), u.get(), length));
  }

  private Optional<Subtraction> ofCase(Node node) {
    Fields fields = new Fields(problems, "an entry of `subtract`", node, CASE_KEYS);
    Optional<Node> file = fields.get("case");
    Optional<Node> between = fields.require("between", "add `between: [warm, cold]`, spaces of it");
    if (file.isEmpty() || between.isEmpty()) {
      return Optional.empty();
    }
    return others.read(file.get(), fields.get("variant"), between.get());
  }
}
