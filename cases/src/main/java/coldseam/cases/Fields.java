package coldseam.cases;

import coldseam.cases.words.Spelling;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The keys of one mapping, checked as it is opened: unknown keys, repeated keys and keys without a
 * value are reported.
 */
final class Fields {
  private final Problems problems;
  private final String what;
  private final Node node;
  private final Map<String, Node.Entry> entries = new LinkedHashMap<>();
  private final List<String> reported = new ArrayList<>();
  private final boolean broken;

  /**
   * Opens a mapping with a closed set of keys.
   *
   * @param problems told what is wrong
   * @param what how messages call the mapping, e.g. "space `indoors`"
   * @param node the mapping; anything else is reported and leaves no keys
   * @param known the keys it may have
   */
  Fields(Problems problems, String what, Node node, List<String> known) {
    this.problems = problems;
    this.what = what;
    this.node = node;
    if (!(node instanceof Node.Mapping mapping)) {
      this.broken = true;
      String right = "write " + (known.isEmpty() ? "keys" : "`" + known.get(0) + ": …`");
      problems.add(node, what + " needs keys with values, not " + Node.describe(node), right);
      return;
    }
    this.broken = false;
    Node.Entry before = null;
    for (Node.Entry entry : mapping.entries()) {
      String key = entry.key().text();
      if (decimalComma(problems, before, entry)) {
        reported.add(before.key().text());
      } else if (!known.contains(key)) {
        problems.add(
            entry.key(),
            what + " has no key `" + Node.shortened(key) + "`",
            Problems.suggestion(key, known));
        reported.add(nearest(key, known).orElse(""));
      } else {
        addUnlessRepeatedOrEmpty(problems, entry, entries, reported);
      }
      before = entry;
    }
  }

  /**
   * Reports a number with a decimal comma between braces, where the comma begins a key: {@code
   * {conductivity: 0,5}} has a key {@code 5} without a value.
   */
  private static boolean decimalComma(Problems problems, Node.Entry before, Node.Entry entry) {
    String after = entry.key().text();
    boolean bare =
        entry.value() instanceof Node.Scalar value
            && value.empty()
            && value.style() == Node.Style.PLAIN
            && PlainNumber.digits(after, 0) > 0;
    if (!bare || before == null || !(before.value() instanceof Node.Scalar whole)) {
      return false;
    }
    String number = whole.text();
    int sign = number.startsWith("-") || number.startsWith("+") ? 1 : 0;
    if (number.length() == sign || PlainNumber.digits(number, sign) < number.length()) {
      return false;
    }
    problems.add(
        whole,
        "`"
            + Node.shortened(before.key().text())
            + "` has a decimal comma: `"
            + Node.shortened(number + "," + after)
            + "`",
        "write " + Node.shortened(number + "." + after) + " with a point");
    return true;
  }

  private static Optional<String> nearest(String key, List<String> known) {
    return Spelling.nearest(key, known);
  }

  /** The word that a longer one begins with, such as in for inch; a single letter says nothing. */
  private static Optional<String> begun(String typed, List<String> words) {
    return words.stream().filter(w -> w.length() > 1 && typed.startsWith(w)).findFirst();
  }

  private static void addUnlessRepeatedOrEmpty(
      Problems problems, Node.Entry entry, Map<String, Node.Entry> into, List<String> reported) {
    String key = entry.key().text();
    Node.Entry earlier = into.get(key);
    if (earlier != null) {
      problems.add(
          entry.key(),
          "`" + Node.shortened(key) + "` is written twice",
          "it already stands in line " + earlier.key().line() + "; keep one of them");
      return;
    }
    if (entry.value() instanceof Node.Scalar scalar && scalar.empty()) {
      problems.add(
          entry.key(),
          "`" + Node.shortened(key) + "` has no value",
          "give it one, or leave the key away");
      reported.add(key);
      return;
    }
    into.put(key, entry);
  }

  /**
   * The entries of a mapping whose keys are names of the user's own.
   *
   * @param problems told what is wrong
   * @param what how messages call the mapping, e.g. "`materials`"
   * @param node the mapping; anything else is reported
   * @return the entries without repeated, blank and empty ones
   */
  static List<Node.Entry> named(Problems problems, String what, Node node) {
    if (!(node instanceof Node.Mapping mapping)) {
      problems.add(
          node,
          what + " needs names with what they mean, not " + Node.describe(node),
          "write `name: …`, one a line");
      return List.of();
    }
    Map<String, Node.Entry> entries = new LinkedHashMap<>();
    Node.Entry before = null;
    for (Node.Entry entry : mapping.entries()) {
      if (decimalComma(problems, before, entry)) {
        before = entry;
        continue;
      }
      before = entry;
      if (entry.key().text().isBlank()) {
        problems.add(entry.key(), what + " has an entry without a name", "write `name: …`");
      } else {
        addUnlessRepeatedOrEmpty(problems, entry, entries, new ArrayList<>());
      }
    }
    return List.copyOf(entries.values());
  }

  /**
   * The entries of a mapping whose keys are names of the user's own and whose values have keys
   * themselves; a forgotten name is reported, once.
   *
   * @param problems told what is wrong
   * @param what how messages call the mapping, e.g. "`psi`"
   * @param node the mapping; anything else is reported
   * @param known the keys that each value may have
   * @param one how messages call one of them, e.g. "a ψ"
   * @param name a name for an example
   * @return the entries without repeated, blank and empty ones; none if the name was forgotten
   */
  static List<Node.Entry> named(
      Problems problems, String what, Node node, List<String> known, String one, String name) {
    if (node instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        String key = entry.key().text();
        if (known.contains(key) && !(entry.value() instanceof Node.Mapping)) {
          problems.add(
              entry.key(),
              one + " needs a name before its `" + key + "`",
              "write " + what.replace("`", "") + ": {" + name + ": {" + key + ": …}}");
          return List.of();
        }
      }
    }
    return named(problems, what, node);
  }

  private Fields(Fields other, Problems problems) {
    this.problems = problems;
    this.what = other.what;
    this.node = other.node;
    this.broken = other.broken;
    this.entries.putAll(other.entries);
    this.reported.addAll(other.reported);
  }

  /** The same keys, telling what is wrong to somebody else from now on. */
  Fields reportingTo(Problems others) {
    return new Fields(this, others);
  }

  /** The value of a key, if it is there. */
  Optional<Node> get(String key) {
    Node.Entry entry = entries.get(key);
    return entry == null ? Optional.empty() : Optional.of(entry.value());
  }

  /** The value of a key, or null where the key is not there. */
  Node nodeOrNull(String key) {
    Node.Entry entry = entries.get(key);
    return entry == null ? null : entry.value();
  }

  /** Whether a key is there with a value. */
  boolean has(String key) {
    return get(key).isPresent();
  }

  /**
   * The value of a key that must be there; its absence is reported.
   *
   * @param key the key
   * @param example what would be right, e.g. "add `temperature: 20`"
   * @return the value, or empty
   */
  Optional<Node> require(String key, String example) {
    Optional<Node> value = get(key);
    if (value.isEmpty() && !broken && !reported.contains(key)) {
      problems.add(node, what + " has no `" + key + "`", example);
    }
    return value;
  }

  /** The key itself, for its place. */
  Node keyNode(String key) {
    Node.Entry entry = entries.get(key);
    return entry == null ? node : entry.key();
  }

  /** Whether the mapping could not be opened or a key near to this one was reported. */
  boolean reported(String key) {
    return broken || reported.contains(key);
  }

  /** The mapping. */
  Node node() {
    return node;
  }

  /** How messages call the mapping. */
  String what() {
    return what;
  }

  /**
   * Reports two keys that exclude each other.
   *
   * @param one a key
   * @param other the other
   * @param right what would be right
   * @return whether both are there
   */
  boolean refuseBoth(String one, String other, String right) {
    if (has(one) && has(other)) {
      problems.add(keyNode(other), what + " has both `" + one + "` and `" + other + "`", right);
      return true;
    }
    return false;
  }

  /**
   * A text.
   *
   * @param problems told if it is none
   * @param what how messages call it
   * @param value where it stands
   * @return the text without white space around it, or empty
   */
  static Optional<String> text(Problems problems, String what, Node value) {
    if (value instanceof Node.Scalar scalar && !scalar.empty() && !scalar.text().isBlank()) {
      return Optional.of(scalar.text().strip());
    }
    problems.add(value, what + " is a text, not " + Node.describe(value), "write it in one line");
    return Optional.empty();
  }

  /**
   * One of a few words.
   *
   * @param key the key it stands under, used in messages
   * @param words the words
   * @return the word, or empty if the key is absent or something else stands there
   */
  Optional<String> word(String key, List<String> words) {
    Optional<Node> value = get(key);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (value.get() instanceof Node.Scalar scalar && words.contains(scalar.text())) {
      return Optional.of(scalar.text());
    }
    String typed = value.get() instanceof Node.Scalar scalar ? scalar.text() : "";
    problems.add(
        value.get(),
        "`" + key + "` is " + orList(words) + ", not " + Node.describe(value.get()),
        nearest(typed, words)
            .or(() -> begun(typed, words))
            .map(near -> "did you mean `" + near + "`?")
            .orElse(""));
    return Optional.empty();
  }

  /**
   * A yes or no.
   *
   * @param key the key it stands under
   * @return whether it is there and `true`
   */
  boolean flag(String key) {
    boolean quoted =
        get(key).orElse(null) instanceof Node.Scalar scalar && scalar.style() != Node.Style.PLAIN;
    if (quoted) {
      problems.add(get(key).get(), "`" + key + "` is `true` or `false`, not a text", "no quotes");
      return false;
    }
    return word(key, List.of("true", "false")).orElse("false").equals("true");
  }

  static String orList(List<String> words) {
    StringBuilder out = new StringBuilder();
    for (int i = 0; i < words.size(); i++) {
      if (i > 0) {
        out.append(i == words.size() - 1 ? " or " : ", ");
      }
      out.append('`').append(words.get(i)).append('`');
    }
    return out.toString();
  }
}
