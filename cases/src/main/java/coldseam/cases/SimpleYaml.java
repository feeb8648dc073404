package coldseam.cases;

import coldseam.cases.words.Invisible;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Reads the everyday part of YAML 1.2: block mappings and lists, flow collections, scalars plain or
 * quoted on one line, and comments. For everything else, mistakes included, it steps back and
 * leaves the text to the library behind {@link YamlTree}, which alone decides what YAML is; a test
 * holds the two together. It is here because the library takes as long to start as the reading of a
 * case may take in all.
 */
final class SimpleYaml {
  /** A longer key needs a question mark in YAML. */
  private static final int LONGEST_KEY = 1000;

  /** Thrown, without a trace, as soon as the text goes beyond what is read here. */
  private static final class BeyondException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    BeyondException() {
      super(null, null, false, false);
    }
  }

  private final String text;
  private final int deepest;
  private int nodesLeft;
  private int at;
  private int line = 1;
  private int lineStart;

  private SimpleYaml(String text, int deepest, int mostNodes) {
    this.text = text;
    this.deepest = deepest;
    this.nodesLeft = mostNodes;
  }

  /**
   * Reads a text.
   *
   * @param text the text
   * @param deepest most levels of nesting
   * @param mostNodes most nodes
   * @return its tree, with the places the library gives; empty if the text goes beyond what is read
   *     here or has a mistake
   */
  static Optional<Node> read(String text, int deepest, int mostNodes) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c == '\t' || c >= 0xD800) {
        return Optional.empty();
      }
    }
    if (Invisible.first(text) >= 0) {
      return Optional.empty();
    }
    try {
      return Optional.of(new SimpleYaml(text, deepest, mostNodes).document());
    } catch (BeyondException e) {
      return Optional.empty();
    }
  }

  private Node document() {
    toNextContent();
    if (at >= text.length()) {
      throw new BeyondException();
    }
    Node root = block(indent(), 0);
    if (at < text.length()) {
      throw new BeyondException();
    }
    return root;
  }

  private int indent() {
    return at - lineStart;
  }

  private int column() {
    return at - lineStart + 1;
  }

  private void count(int depth) {
    nodesLeft--;
    if (nodesLeft < 0 || depth > deepest) {
      throw new BeyondException();
    }
  }

  private char peek(int ahead) {
    return at + ahead < text.length() ? text.charAt(at + ahead) : '\n';
  }

  private static boolean blank(char c) {
    return c == ' ' || c == '\n';
  }

  /** Over blanks, comments and ends of lines, to what comes next. */
  private void toNextContent() {
    boolean mayComment = at == lineStart || text.charAt(at - 1) == ' ';
    while (at < text.length()) {
      char c = text.charAt(at);
      if (c == '\n') {
        at++;
        line++;
        lineStart = at;
        mayComment = true;
      } else if (c == ' ') {
        at++;
        mayComment = true;
      } else if (c == '#' && mayComment) {
        int end = text.indexOf('\n', at);
        at = end < 0 ? text.length() : end;
      } else {
        return;
      }
    }
  }

  /** From the end of a value on to the next content, which must begin on another line. */
  private void endOfValue() {
    int before = line;
    toNextContent();
    if (at < text.length() && line == before) {
      throw new BeyondException();
    }
  }

  /** A block mapping or list whose first entry stands here, at this indentation. */
  private Node block(int indent, int depth) {
    char c = peek(0);
    if (c == '-' && blank(peek(1))) {
      return sequence(indent, depth);
    }
    return mapping(indent, depth);
  }

  private Node sequence(int indent, int depth) {
    count(depth);
    int startLine = line;
    int startColumn = column();
    List<Node> items = new ArrayList<>();
    while (at < text.length() && indent() == indent && peek(0) == '-' && blank(peek(1))) {
      at++;
      int dashLine = line;
      toNextContent();
      if (at >= text.length() || indent() <= indent) {
        throw new BeyondException();
      }
      if (line != dashLine || (peek(0) == '-' && blank(peek(1))) || keyFollows()) {
        items.add(block(indent(), depth + 1));
      } else {
        items.add(value(depth + 1));
        endOfValue();
        noContinuation(indent);
      }
    }
    noContinuation(indent);
    return new Node.Sequence(List.copyOf(items), startLine, startColumn);
  }

  private Node mapping(int indent, int depth) {
    count(depth);
    int startLine = line;
    int startColumn = column();
    List<Node.Entry> entries = new ArrayList<>();
    while (at < text.length() && indent() == indent) {
      if (!keyFollows()) {
        throw new BeyondException();
      }
      Node.Scalar key = (Node.Scalar) scalar(false, depth + 1);
      if (peek(0) != ':' || !blank(peek(1))) {
        throw new BeyondException();
      }
      at++;
      entries.add(new Node.Entry(key, valueOfKey(indent, depth + 1)));
    }
    noContinuation(indent);
    return new Node.Mapping(List.copyOf(entries), startLine, startColumn);
  }

  private Node valueOfKey(int indent, int depth) {
    int keyLine = line;
    toNextContent();
    if (at >= text.length()) {
      throw new BeyondException();
    }
    if (line == keyLine) {
      Node value = value(depth);
      endOfValue();
      noContinuation(indent);
      return value;
    }
    boolean list = peek(0) == '-' && blank(peek(1));
    if (indent() < indent || indent() == indent && !list) {
      throw new BeyondException();
    }
    if (!list && !keyFollows()) {
      throw new BeyondException();
    }
    return block(indent(), depth);
  }

  /** What stands deeper than the entries of a collection belongs to none of them. */
  private void noContinuation(int indent) {
    if (at < text.length() && indent() > indent) {
      throw new BeyondException();
    }
  }

  /** Whether a scalar with a colon after it stands on this line, outside any bracket. */
  private boolean keyFollows() {
    char first = peek(0);
    int i = at;
    if (first == '"' || first == '\'') {
      i = text.indexOf(first, at + 1);
      if (i < 0) {
        return false;
      }
      i++;
      return i < text.length() && text.charAt(i) == ':';
    }
    if (first == '{' || first == '[') {
      return false;
    }
    for (; i < text.length() && text.charAt(i) != '\n'; i++) {
      char c = text.charAt(i);
      if (c == ':' && (i + 1 == text.length() || blank(text.charAt(i + 1)))) {
        return i - at <= LONGEST_KEY;
      }
      if (c == '#' && i > at && text.charAt(i - 1) == ' ') {
        return false;
      }
    }
    return false;
  }

  /** A flow collection or a scalar of a block collection. */
  private Node value(int depth) {
    char c = peek(0);
    if (c == '{' || c == '[') {
      return flow(depth);
    }
    Node scalar = scalar(false, depth);
    if (peek(0) == ':') {
      throw new BeyondException();
    }
    return scalar;
  }

  private Node flow(int depth) {
    char c = peek(0);
    if (c == '{') {
      return flowMapping(depth);
    }
    return c == '[' ? flowSequence(depth) : scalar(true, depth);
  }

  private Node flowSequence(int depth) {
    count(depth);
    int startLine = line;
    int startColumn = column();
    List<Node> items = new ArrayList<>();
    at++;
    toNextContent();
    while (peek(0) != ']') {
      items.add(flow(depth + 1));
      comma(']');
    }
    at++;
    return new Node.Sequence(List.copyOf(items), startLine, startColumn);
  }

  private Node flowMapping(int depth) {
    count(depth);
    int startLine = line;
    int startColumn = column();
    List<Node.Entry> entries = new ArrayList<>();
    at++;
    toNextContent();
    while (peek(0) != '}') {
      int keyStart = at;
      Node.Scalar key = (Node.Scalar) scalar(true, depth + 1);
      if (peek(0) != ':' || !blank(peek(1)) || at - keyStart > LONGEST_KEY) {
        throw new BeyondException();
      }
      at++;
      toNextContent();
      entries.add(new Node.Entry(key, flow(depth + 1)));
      comma('}');
    }
    at++;
    return new Node.Mapping(List.copyOf(entries), startLine, startColumn);
  }

  /** Over the comma after an entry of a flow collection, or to the bracket that closes it. */
  private void comma(char closing) {
    toNextContent();
    if (peek(0) == ',') {
      at++;
      toNextContent();
    } else if (peek(0) != closing) {
      throw new BeyondException();
    }
    if (at >= text.length() || indent() == 0) {
      throw new BeyondException();
    }
  }

  /** A scalar on one line; afterwards the place is right behind it, blanks not yet passed. */
  private Node scalar(boolean inFlow, int depth) {
    count(depth);
    char first = peek(0);
    if (first == '"' || first == '\'') {
      return quoted(first);
    }
    char second = peek(1);
    if ("?:,[]{}#&*!|>%@`".indexOf(first) >= 0 || first == '-' && !plainAfterDash(second)) {
      throw new BeyondException();
    }
    if (at == lineStart && (first == '-' || first == '.')) {
      throw new BeyondException();
    }
    int start = at;
    int end = at;
    for (; at < text.length(); at++) {
      char c = text.charAt(at);
      if (c == '\n' || c == ':' && blank(peek(1)) || c == '#' && text.charAt(at - 1) == ' ') {
        break;
      }
      if (inFlow) {
        if (c == ',' || c == ']' || c == '}') {
          break;
        }
        if (c == '[' || c == '{' || c == ':' && ",[]{}".indexOf(peek(1)) >= 0) {
          throw new BeyondException();
        }
      }
      if (c != ' ') {
        end = at + 1;
      }
    }
    if (peek(0) == ':' && end != at) {
      throw new BeyondException();
    }
    at = end;
    return new Node.Scalar(
        text.substring(start, end), Node.Style.PLAIN, line, start - lineStart + 1);
  }

  private static boolean plainAfterDash(char c) {
    return !blank(c) && ",[]{}".indexOf(c) < 0;
  }

  private Node quoted(char quote) {
    int start = at;
    int end = start + 1;
    for (; ; end++) {
      char c = end < text.length() ? text.charAt(end) : '\n';
      if (c == '\n' || c == '\\') {
        throw new BeyondException();
      }
      if (c == quote) {
        break;
      }
    }
    at = end + 1;
    char next = peek(0);
    if (!blank(next) && next != ':' && next != ',' && next != ']' && next != '}') {
      throw new BeyondException();
    }
    return new Node.Scalar(
        text.substring(start + 1, end), Node.Style.QUOTED, line, start - lineStart + 1);
  }
}
