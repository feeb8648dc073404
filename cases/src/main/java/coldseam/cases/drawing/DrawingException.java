package coldseam.cases.drawing;

import java.util.Optional;

/** A drawing cannot be read; says where, what is wrong and what would be right. */
public final class DrawingException extends Exception {
  private static final long serialVersionUID = 1L;

  private final int line;
  private final String wrong;
  private final transient Optional<String> right;

  /**
   * Says what is wrong.
   *
   * @param line line in the file from 1, 0 if the whole file is meant
   * @param wrong a sentence without a full stop
   * @param right what would be right, without a full stop; may be empty
   */
  public DrawingException(int line, String wrong, String right) {
    super(wrong);
    this.line = line;
    this.wrong = wrong;
    this.right = right.isEmpty() ? Optional.empty() : Optional.of(right);
  }

  /** Line in the file from 1, 0 if the whole file is meant. */
  public int line() {
    return line;
  }

  /** What is wrong. */
  public String wrong() {
    return wrong;
  }

  /** What would be right. */
  public Optional<String> right() {
    return right;
  }
}
