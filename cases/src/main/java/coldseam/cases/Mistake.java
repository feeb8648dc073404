package coldseam.cases;

/** Something wrong inside a text, found at an index of it. */
final class Mistake extends Exception {
  private static final long serialVersionUID = 1L;

  private final String right;
  private final int index;

  Mistake(String wrong, String right, int index) {
    super(wrong);
    this.right = right;
    this.index = index;
  }

  /** What would be right, or empty. */
  String right() {
    return right;
  }

  /** Where in the text, from 0. */
  int index() {
    return index;
  }
}
