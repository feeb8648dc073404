package coldseam.cases.words;

/**
 * Characters that nobody sees but a terminal or a reader may act on: controls, ends of lines beside
 * the line feed, marks that turn the direction of writing, halves of characters.
 */
public final class Invisible {
  /** What is shown in their place. */
  private static final char SHOWN = '\uFFFD';

  private Invisible() {}

  /**
   * Where the first one stands; line feed and tab are none.
   *
   * @param text any text
   * @return its index, or −1
   */
  public static int first(String text) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c < ' ' ? c != '\n' && c != '\t' : c >= 0x7F && at(text, i)) {
        return i;
      }
    }
    return -1;
  }

  private static boolean at(String text, int i) {
    char c = text.charAt(i);
    if (Character.isHighSurrogate(c)) {
      return i + 1 == text.length() || !Character.isLowSurrogate(text.charAt(i + 1));
    }
    if (Character.isLowSurrogate(c)) {
      return i == 0 || !Character.isHighSurrogate(text.charAt(i - 1));
    }
    return c < 0xA0
        || c >= 0x200B && c <= 0x200F
        || c >= 0x2028 && c <= 0x202E
        || c >= 0x2060 && c <= 0x206F
        || c == 0xFEFF
        || c >= 0xFFF0 && c != SHOWN;
  }

  /**
   * A text that can be shown anywhere.
   *
   * @param text any text
   * @return the same with a sign of replacement for each invisible character
   */
  public static String shown(String text) {
    int first = first(text);
    if (first < 0) {
      return text;
    }
    StringBuilder out = new StringBuilder(text);
    for (int i = first; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c < ' ' ? c != '\n' && c != '\t' : c >= 0x7F && at(text, i)) {
        out.setCharAt(i, SHOWN);
      }
    }
    return out.toString();
  }
}
