package coldseam.cli;

import coldseam.cli.text.Digits;
import coldseam.solver.conduction.Progress;
import java.io.PrintStream;
import java.util.Locale;

/** One line on a terminal that tells how far a solve is, and goes away at its end. */
final class ProgressLine implements Progress, AutoCloseable {
  private static final String ERASE = "\r\u001b[K";

  private final PrintStream err;
  private final String subject;
  private boolean shown;

  /**
   * Shows nothing yet.
   *
   * @param err the terminal
   * @param subject what is solved
   */
  ProgressLine(PrintStream err, String subject) {
    this.err = err;
    this.subject = subject;
  }

  @Override
  public boolean pass(String stage, int pass, int unknowns, double relativeError) {
    err.print(
        ERASE
            + subject
            + ": "
            + stage.toLowerCase(Locale.ROOT).replace('_', ' ')
            + ", pass "
            + pass
            + ", "
            + unknowns
            + " unknowns, error "
            + Digits.significant(relativeError, 2)
            + " × what is asked");
    err.flush();
    shown = true;
    return true;
  }

  @Override
  public void close() {
    if (shown) {
      err.print(ERASE);
      err.flush();
    }
  }
}
