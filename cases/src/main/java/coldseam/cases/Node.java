package coldseam.cases;

import java.util.List;

/** A piece of a file with its place; line and column count from 1. */
sealed interface Node {
  int line();

  int column();

  /** How a text was written. */
  enum Style {
    /** Without quotes. */
    PLAIN,
    /** In single or double quotes, all on one line. */
    QUOTED,
    /** Over several lines, so that a place in the text is not a place in the file. */
    BLOCK
  }

  /** A text, not yet told apart from a number. */
  record Scalar(String text, Style style, int line, int column) implements Node {
    /** Whether nothing stands here. */
    boolean empty() {
      return style == Style.PLAIN
          && (text.isEmpty() || text.equals("~") || text.equalsIgnoreCase("null"));
    }
  }

  /** A list. */
  record Sequence(List<Node> items, int line, int column) implements Node {}

  /** Keys with their values in the order written, repeated keys included. */
  record Mapping(List<Entry> entries, int line, int column) implements Node {}

  /** One key with its value. */
  record Entry(Scalar key, Node value) {}

  /** What stands here, in words for a message. */
  static String describe(Node node) {
    if (node instanceof Scalar scalar) {
      return scalar.empty() ? "nothing" : "`" + shortened(scalar.text()) + "`";
    }
    return node instanceof Sequence ? "a list" : "a group of keys";
  }

  /** A text that fits into a message. */
  static String shortened(String text) {
    String line = text.replace('\n', ' ').replace('\r', ' ').replace('\t', ' ');
    return line.length() <= 60 ? line : line.substring(0, 57) + "...";
  }
}
