package coldseam.cli;

/** What the process ends with. */
final class ExitCode {
  /** Done. */
  static final int DONE = 0;

  /** Done, but a stated requirement is not met. */
  static final int NOT_MET = 1;

  /** Bad input or usage: nothing was done. */
  static final int BAD_INPUT = 2;

  /** Done, but the accuracy asked for was not reached. */
  static final int ACCURACY = 3;

  /** A defect of the program. */
  static final int DEFECT = 70;

  private ExitCode() {}

  /** The code that says most of two: a defect over bad input over accuracy over a requirement. */
  static int worse(int one, int other) {
    return rank(one) >= rank(other) ? one : other;
  }

  private static int rank(int code) {
    return switch (code) {
      case DONE -> 0;
      case NOT_MET -> 1;
      case ACCURACY -> 2;
      case BAD_INPUT -> 3;
      default -> 4;
    };
  }
}
