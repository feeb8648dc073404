package coldseam.cases;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The named changes of one variant. */
final class Variant {
  static final List<String> KEYS = List.of("values", "materials", "fills", "cost");

  private final String name;
  private final Optional<Node> materials;
  private final Optional<String> cost;
  private final List<Node.Entry> values = new ArrayList<>();
  private final List<Node.Entry> fills = new ArrayList<>();

  /**
   * Reads a variant.
   *
   * @param problems told what is wrong
   * @param key its name
   * @param node its changes
   * @param baseValues names of the values that it can replace
   */
  Variant(Problems problems, Node.Scalar key, Node node, List<String> baseValues) {
    this.name = key.text();
    Fields fields = new Fields(problems, "variant `" + Node.shortened(name) + "`", node, KEYS);
    this.materials = fields.get("materials");
    this.cost =
        fields.has("cost")
            ? Fields.text(problems, "`cost` of " + fields.what(), fields.get("cost").get())
            : Optional.empty();
    if (fields.has("values")) {
      for (Node.Entry entry :
          Fields.named(problems, "`values` of " + fields.what(), fields.get("values").get())) {
        if (!baseValues.contains(entry.key().text())) {
          problems.add(
              entry.key(),
              "the case has no value `" + Node.shortened(entry.key().text()) + "` to replace",
              baseValues.isEmpty()
                  ? "give the case `values` that variants can replace"
                  : Problems.suggestion(entry.key().text(), baseValues));
        }
        values.add(entry);
      }
    }
    if (fields.has("fills")) {
      for (Node.Entry entry :
          Fields.named(problems, "`fills` of " + fields.what(), fields.get("fills").get())) {
        if (Fields.text(problems, "the new fill", entry.value()).isPresent()) {
          fills.add(entry);
        }
      }
    }
  }

  String name() {
    return name;
  }

  Optional<Node> materials() {
    return materials;
  }

  /** What it costs, as typed. */
  Optional<String> cost() {
    return cost;
  }

  /** A few words for each change. */
  List<String> inWords() {
    List<String> words = new ArrayList<>();
    for (Node.Entry entry : values) {
      words.add(entry.key().text() + " = " + text(entry.value()));
    }
    if (materials.isPresent() && materials.get() instanceof Node.Mapping changed) {
      for (Node.Entry entry : changed.entries()) {
        String value = text(entry.value());
        words.add(entry.key().text() + (value.isEmpty() ? " changed" : " = " + value));
      }
    }
    for (Node.Entry entry : fills) {
      words.add(entry.key().text() + ": " + text(entry.value()));
    }
    return words;
  }

  /** A value as written; of a material its conductivity, or what it is taken from. */
  private static String text(Node node) {
    if (node instanceof Node.Scalar scalar) {
      return scalar.text().strip();
    }
    if (node instanceof Node.Sequence several) {
      List<String> parts = new ArrayList<>();
      for (Node item : several.items()) {
        parts.add(text(item));
      }
      return "[" + String.join(", ", parts) + "]";
    }
    for (String key : List.of("conductivity", "from", "resistance")) {
      for (Node.Entry entry : ((Node.Mapping) node).entries()) {
        if (entry.key().text().equals(key)) {
          return text(entry.value());
        }
      }
    }
    return "";
  }

  /** Puts the values of the variant in place of those of the base case. */
  void replaceValues(NamedValues named) {
    for (Node.Entry entry : values) {
      named.put(entry.key().text(), entry.value());
    }
  }

  void replaceFills(Fills target) {
    for (Node.Entry entry : fills) {
      target.replace(entry.key().text(), (Node.Scalar) entry.value());
    }
  }

  /** Reports fills to be replaced that no shape has. */
  void reportNotReplaced(Problems problems, Fills target) {
    List<String> unused = target.notReplaced();
    for (Node.Entry entry : fills) {
      if (unused.contains(entry.key().text())) {
        problems.add(
            entry.key(),
            "no shape has the name or the fill `" + Node.shortened(entry.key().text()) + "`",
            "name a fill that is laid, or the `name` of a shape");
      }
    }
  }
}
