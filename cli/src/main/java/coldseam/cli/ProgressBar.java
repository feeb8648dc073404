package coldseam.cli;

import coldseam.cli.text.Digits;
import java.io.PrintStream;

/** A bar on a terminal that tells how many of many jobs are done, and goes away at the end. */
final class ProgressBar implements AutoCloseable {
  private static final String ERASE = "\r\u001b[K";
  private static final int WIDTH = 30;
  private static final long NANOS_BETWEEN = 100_000_000;
  private static final double NANOS_PER_S = 1e9;

  private final PrintStream err;
  private final boolean seen;
  private final int before;
  private final int all;
  private final long start = System.nanoTime();
  private long last;
  private int done;

  /**
   * Shows nothing yet.
   *
   * @param err the terminal
   * @param seen whether somebody looks at it
   * @param before how many were done before
   * @param all how many there are
   */
  ProgressBar(PrintStream err, boolean seen, int before, int all) {
    this.err = err;
    this.seen = seen;
    this.before = before;
    this.all = all;
    this.done = before;
  }

  /** One more is done. */
  void step() {
    done++;
    long now = System.nanoTime();
    if (!seen || now - last < NANOS_BETWEEN && last != 0 && done < all) {
      return;
    }
    last = now;
    int full = (int) ((long) WIDTH * done / all);
    StringBuilder bar = new StringBuilder(ERASE);
    bar.append("█".repeat(full)).append("░".repeat(WIDTH - full));
    bar.append(' ').append(done).append(" of ").append(all);
    double rate = rate();
    if (rate > 0) {
      bar.append(", ").append(Digits.significant(rate, 2)).append(" a second");
      bar.append(", ").append(Digits.significant((all - done) / rate, 2)).append(" s to go");
    }
    err.print(bar);
    err.flush();
  }

  /** Jobs a second since the start. */
  double rate() {
    return (done - before) / ((System.nanoTime() - start) / NANOS_PER_S);
  }

  /** Seconds since the start. */
  double seconds() {
    return (System.nanoTime() - start) / NANOS_PER_S;
  }

  @Override
  public void close() {
    if (last != 0) {
      err.print(ERASE);
      err.flush();
    }
  }
}
