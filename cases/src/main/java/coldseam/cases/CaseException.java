package coldseam.cases;

import java.util.List;

/** A file cannot be read as a case; carries every problem found, in line order. */
public final class CaseException extends Exception {
  private static final long serialVersionUID = 1L;

  private final transient List<Problem> problems;

  /**
   * Collects problems.
   *
   * @param problems one or more, in line order
   */
  public CaseException(List<Problem> problems) {
    super(problems.get(0).text());
    this.problems = List.copyOf(problems);
  }

  /** Everything found wrong. */
  public List<Problem> problems() {
    return problems;
  }
}
