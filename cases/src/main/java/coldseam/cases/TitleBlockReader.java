package coldseam.cases;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;

/** Reads what a case types for its sheet. */
final class TitleBlockReader {
  private static final List<String> KEYS =
      List.of("project", "number", "revision", "date", "author", "checked-by", "question");

  private final Problems problems;

  TitleBlockReader(Problems problems) {
    this.problems = problems;
  }

  TitleBlock read(Node node) {
    Fields fields = new Fields(problems, "`sheet`", node, KEYS);
    return new TitleBlock(
        text(fields, "project"),
        text(fields, "number"),
        text(fields, "revision"),
        date(fields),
        text(fields, "author"),
        text(fields, "checked-by"),
        text(fields, "question"));
  }

  private Optional<String> text(Fields fields, String key) {
    Optional<Node> node = fields.get(key);
    return node.isEmpty() ? Optional.empty() : Fields.text(problems, "`" + key + "`", node.get());
  }

  /** A day of the calendar, as ISO 8601 writes it. */
  private Optional<String> date(Fields fields) {
    Optional<String> typed = text(fields, "date");
    if (typed.isEmpty()) {
      return typed;
    }
    try {
      return Optional.of(LocalDate.parse(typed.get()).toString());
    } catch (DateTimeException e) {
      problems.add(
          fields.get("date").get(),
          "`" + Node.shortened(typed.get()) + "` is no date",
          "write year, month and day, such as 2026-11-30");
      return Optional.empty();
    }
  }
}
