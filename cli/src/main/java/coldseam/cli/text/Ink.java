package coldseam.cli.text;

/**
 * Colour and weight of text on a terminal, or none at all. Colour never carries a meaning of its
 * own: the words say the same without it.
 */
public final class Ink {
  /** Plain text. */
  public static final Ink NONE = new Ink(false);

  /** Text with escape sequences for a terminal. */
  public static final Ink TERMINAL = new Ink(true);

  private final boolean escapes;

  private Ink(boolean escapes) {
    this.escapes = escapes;
  }

  /** What a title or heading looks like. */
  public String strong(String text) {
    return wrap("1", text);
  }

  /** What stands back: units, sources, places. */
  public String faint(String text) {
    return wrap("2", text);
  }

  /** What needs attention. */
  public String alert(String text) {
    return wrap("33", text);
  }

  /** What is as it should be. */
  public String good(String text) {
    return wrap("32", text);
  }

  /** What is not. */
  public String bad(String text) {
    return wrap("31", text);
  }

  private String wrap(String code, String text) {
    return escapes && !text.isEmpty() ? "\u001b[" + code + "m" + text + "\u001b[0m" : text;
  }

  /** Columns that a text takes on a terminal: escape sequences take none. */
  static int width(String text) {
    int width = 0;
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c == '\u001b') {
        i = text.indexOf('m', i);
      } else if (!Character.isLowSurrogate(c)) {
        width++;
      }
    }
    return width;
  }
}
