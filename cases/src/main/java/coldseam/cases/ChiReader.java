package coldseam.cases;

import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads {@code chi}. */
final class ChiReader {
  static final List<String> KEYS = List.of("between", "subtract", "of");
  private static final List<String> PART_KEYS = List.of("part", "U", "radius", "psi", "length");
  private static final List<String> CASE_KEYS = List.of("case", "variant", "between");
  private static final String RIGHT =
      "write `{part: NAME, U: …, radius: …}`, `{part: NAME, psi: …, length: …}` or `{case: FILE}`";

  private final Pass pass;
  private final Problems problems;
  private final OtherCases others;
  private final PairReader pairs;

  ChiReader(Pass pass, SpaceReader spaces, OtherCases others) {
    this.pass = pass;
    this.problems = pass.problems();
    this.others = others;
    this.pairs = new PairReader(problems, spaces.spaces());
  }

  /**
   * Reads every χ.
   *
   * @param node the mapping
   * @return those without a mistake
   */
  List<Wanted> read(Node node) {
    List<Wanted> wanted = new ArrayList<>();
    for (Node.Entry entry : Fields.named(problems, "`chi`", node, KEYS, "a χ", "rod")) {
      pass.place("chi", entry.key().text(), entry.key());
      Optional<Wanted.Chi> chi = chi(entry.key(), entry.value());
      if (chi.isPresent()) {
        wanted.add(chi.get());
      }
    }
    return wanted;
  }

  private Optional<Wanted.Chi> chi(Node.Scalar key, Node node) {
    int before = problems.count();
    Fields fields = new Fields(problems, "χ `" + Node.shortened(key.text()) + "`", node, KEYS);
    Optional<Node> between = fields.require("between", "add `between: [indoors, outdoors]`");
    Optional<PairReader.Sides> sides =
        between.isEmpty()
            ? Optional.empty()
            : pairs.read(between.get(), "`between` of " + fields.what());
    List<Subtraction> subtractions =
        fields.has("subtract") ? subtractions(fields.get("subtract").get()) : List.of();
    String of = key.text();
    if (fields.has("of")) {
      of = Fields.text(problems, "`of` of " + fields.what(), fields.get("of").get()).orElse(of);
    }
    if (problems.count() > before || sides.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Wanted.Chi(key.text(), of, sides.get().warm(), sides.get().cold(), subtractions));
  }

  private List<Subtraction> subtractions(Node node) {
    if (!(node instanceof Node.Sequence sequence) || sequence.items().isEmpty()) {
      problems.add(
          node,
          "`subtract` is a list of what is taken off, not "
              + (node instanceof Node.Sequence ? "an empty one" : Node.describe(node)),
          RIGHT + ", or leave it away to take off what is met at the cut-off planes");
      return List.of();
    }
    List<Subtraction> subtractions = new ArrayList<>();
    for (Node item : sequence.items()) {
      Optional<Subtraction> one = has(item, "case") ? ofCase(item) : ofPart(item);
      if (one.isPresent()) {
        subtractions.add(one.get());
      }
    }
    return subtractions;
  }

  private static boolean has(Node node, String key) {
    if (node instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        if (entry.key().text().equals(key)) {
          return true;
        }
      }
    }
    return false;
  }

  private Optional<Subtraction> ofPart(Node node) {
    int before = problems.count();
    Fields fields = new Fields(problems, "an entry of `subtract`", node, PART_KEYS);
    Optional<Node> nameNode = fields.require("part", RIGHT);
    Optional<String> name =
        nameNode.isEmpty() ? Optional.empty() : Fields.text(problems, "`part`", nameNode.get());
    boolean line = fields.has("psi") || fields.has("length");
    if (line && (fields.has("U") || fields.has("radius"))) {
      problems.add(fields.node(), fields.what() + " is a surface and a line at once", RIGHT);
      return Optional.empty();
    }
    Optional<Node> first = fields.require(line ? "psi" : "U", RIGHT);
    Optional<Node> second = fields.require(line ? "length" : "radius", RIGHT);
    if (first.isEmpty() || second.isEmpty()) {
      return Optional.empty();
    }
    if (line) {
      double psi =
          pass.quantities().read(first.get(), "`psi` of the part", Place.LINEAR_TRANSMITTANCE);
      double length = pass.quantities().read(second.get(), "`length` of the part", Place.EXTENT);
      return problems.count() > before || name.isEmpty()
          ? Optional.empty()
          : Optional.of(new Subtraction.OfLine(name.get(), Bracket.of(psi), length));
    }
    Optional<Bracket> u = FlankReader.bracket(pass, first.get(), "`U` of the part");
    double radius = pass.quantities().read(second.get(), "`radius` of the part", Place.EXTENT);
    return problems.count() > before || name.isEmpty() || u.isEmpty()
        ? Optional.empty()
        : Optional.of(new Subtraction.OfArea(name.get(), u.get(), Math.PI * radius * radius));
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
