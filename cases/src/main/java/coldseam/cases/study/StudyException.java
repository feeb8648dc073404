package coldseam.cases.study;

/** A study was asked for in a way that cannot be done; says what is wrong and what is right. */
public final class StudyException extends Exception {
  private static final long serialVersionUID = 1L;

  /**
   * Says why.
   *
   * @param message what is wrong; what would be right
   */
  public StudyException(String message) {
    super(message);
  }
}
