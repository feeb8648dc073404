package coldseam.cases;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What every file begins with: version, title, note, unit and named values. */
final class Heading {
  static final List<String> KEYS = List.of("coldseam", "title", "note", "unit", "values");

  /** The version of the format that is read. */
  static final String VERSION = "1";

  private final Problems problems;
  private final Fields top;
  private final String what;

  /**
   * Prepares.
   *
   * @param problems told what is wrong
   * @param top the keys of the file
   * @param what how messages call the file, e.g. "case"
   */
  Heading(Problems problems, Fields top, String what) {
    this.problems = problems;
    this.top = top;
    this.what = what;
  }

  void checkVersion() {
    Optional<Node> version = top.require("coldseam", "begin with `coldseam: 1`");
    if (version.isEmpty()) {
      return;
    }
    boolean known =
        version.get() instanceof Node.Scalar scalar
            && scalar.style() == Node.Style.PLAIN
            && scalar.text().equals(VERSION);
    if (!known) {
      problems.add(
          version.get(),
          "this is format "
              + Node.describe(version.get())
              + " of a "
              + what
              + ", which is not known here",
          "write `coldseam: 1`");
    }
  }

  void note() {
    if (top.has("note")) {
      Fields.text(problems, "`note`", top.get("note").get());
    }
  }

  String title() {
    Optional<Node> node = top.require("title", "add `title: ` and what the " + what + " is about");
    return node.isEmpty() ? "" : Fields.text(problems, "`title`", node.get()).orElse("");
  }

  LengthUnit unit() {
    Optional<String> word = top.word("unit", LengthUnit.NAMES);
    return word.isPresent() ? LengthUnit.named(word.get()) : LengthUnit.MM;
  }

  List<Node.Entry> values() {
    if (!top.has("values")) {
      return List.of();
    }
    List<Node.Entry> values = new ArrayList<>();
    for (Node.Entry entry : Fields.named(problems, "`values`", top.get("values").get())) {
      if (NamedValues.canBeNamed(entry.key().text())) {
        values.add(entry);
      } else {
        problems.add(
            entry.key(),
            "`" + Node.shortened(entry.key().text()) + "` cannot be calculated with",
            Expression.FUNCTIONS.contains(entry.key().text())
                ? "choose a name that means nothing yet"
                : "name values by words of letters and digits, beginning with a letter");
      }
    }
    return values;
  }
}
