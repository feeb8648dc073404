package coldseam.cases.words;

import java.util.Optional;

/**
 * The mark that a drafted case bears wherever something is left to be decided. A case with such
 * marks is not read as one: every mark is a mistake of its own.
 */
public final class Undecided {
  private static final String MARK = "TODO";

  private Undecided() {}

  /**
   * A mark.
   *
   * @param hint what could be written in its place, in one line; may be empty
   */
  public static String mark(String hint) {
    return hint.isEmpty() ? MARK : MARK + " " + hint;
  }

  /**
   * What a mark hints at.
   *
   * @param text a text of a case
   * @return the hint, which may be empty, or empty if the text is no mark
   */
  public static Optional<String> hint(String text) {
    String plain = text.strip();
    if (plain.equals(MARK)) {
      return Optional.of("");
    }
    return plain.startsWith(MARK + " ")
        ? Optional.of(plain.substring(MARK.length()).strip())
        : Optional.empty();
  }
}
