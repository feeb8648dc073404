package coldseam.cli.text;

import java.util.List;

/**
 * Writes JSON (RFC 8259) in order, nothing kept but the text. Numbers are written so that reading
 * them back gives the same double; what is not finite becomes {@code null}.
 */
public final class Json {
  private final StringBuilder text = new StringBuilder();
  private final boolean indented;
  private int depth;
  private boolean first = true;

  private Json(boolean indented) {
    this.indented = indented;
  }

  /** On one line. */
  public static Json onOneLine() {
    return new Json(false);
  }

  /** On many lines, two blanks a level. */
  public static Json indented() {
    return new Json(true);
  }

  /** Starts an object that is an element of an array, or the whole text. */
  public Json object() {
    separate();
    return open('{');
  }

  /** Starts an object that is a member. */
  public Json object(String name) {
    name(name);
    return open('{');
  }

  /** Starts an array that is an element of an array, or the whole text. */
  public Json array() {
    separate();
    return open('[');
  }

  /** Starts an array that is a member. */
  public Json array(String name) {
    name(name);
    return open('[');
  }

  /** Ends an object. */
  public Json endObject() {
    return close('}');
  }

  /** Ends an array. */
  public Json endArray() {
    return close(']');
  }

  /** A member that is a text. */
  public Json member(String name, String value) {
    name(name);
    quote(value);
    return this;
  }

  /** A member that is a number; {@code null} if it is not finite. */
  public Json member(String name, double value) {
    name(name);
    number(value);
    return this;
  }

  /** A member that is a whole number. */
  public Json member(String name, int value) {
    name(name);
    text.append(value);
    return this;
  }

  /** A member that is true or false. */
  public Json member(String name, boolean value) {
    name(name);
    text.append(value);
    return this;
  }

  /** A member that is {@code null}. */
  public Json nothing(String name) {
    name(name);
    text.append("null");
    return this;
  }

  /** A member that is JSON already. */
  public Json raw(String name, String json) {
    name(name);
    text.append(json);
    return this;
  }

  /** A member that is an array of texts, on one line. */
  public Json member(String name, List<String> values) {
    name(name);
    text.append('[');
    String comma = "";
    for (String value : values) {
      text.append(comma);
      quote(value);
      comma = indented ? ", " : ",";
    }
    text.append(']');
    return this;
  }

  /** A member that is an array of numbers, on one line. */
  public Json numbers(String name, double... values) {
    name(name);
    text.append('[');
    String comma = "";
    for (double value : values) {
      text.append(comma);
      number(value);
      comma = indented ? ", " : ",";
    }
    text.append(']');
    return this;
  }

  /** Everything written. */
  public String text() {
    if (depth != 0) {
      throw new IllegalStateException("an object or array is still open");
    }
    return text.toString();
  }

  private Json open(char bracket) {
    text.append(bracket);
    depth++;
    first = true;
    return this;
  }

  private Json close(char bracket) {
    depth--;
    if (!first) {
      newLine();
    }
    text.append(bracket);
    first = false;
    return this;
  }

  private void name(String name) {
    separate();
    quote(name);
    text.append(indented ? ": " : ":");
  }

  private void separate() {
    if (depth == 0) {
      return;
    }
    if (!first) {
      text.append(',');
    }
    first = false;
    newLine();
  }

  private void newLine() {
    if (indented) {
      text.append('\n').append("  ".repeat(depth));
    }
  }

  private void number(double value) {
    if (!Double.isFinite(value)) {
      text.append("null");
    } else if (value == Math.rint(value) && Math.abs(value) < 1e15) {
      text.append((long) value);
    } else {
      text.append(value);
    }
  }

  private void quote(String value) {
    text.append('"');
    for (int i = 0; i < value.length(); i++) {
      char c = value.charAt(i);
      switch (c) {
        case '"' -> text.append("\\\"");
        case '\\' -> text.append("\\\\");
        case '\n' -> text.append("\\n");
        case '\r' -> text.append("\\r");
        case '\t' -> text.append("\\t");
        default -> {
          if (c < 0x20 || Character.isSurrogate(c) && !paired(value, i)) {
            text.append("\\u").append(Integer.toHexString(0x10000 | c).substring(1));
          } else {
            text.append(c);
          }
        }
      }
    }
    text.append('"');
  }

  private static boolean paired(String value, int i) {
    return Character.isHighSurrogate(value.charAt(i))
        ? i + 1 < value.length() && Character.isLowSurrogate(value.charAt(i + 1))
        : i > 0 && Character.isHighSurrogate(value.charAt(i - 1));
  }
}
