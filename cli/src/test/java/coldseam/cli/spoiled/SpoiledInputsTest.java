package coldseam.cli.spoiled;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/**
 * Spoiled cases, window files and drawings through the whole program: done, or refused in words
 * with a place, in bounded time, and nothing left behind.
 *
 * <p>The long run: {@code mvn test -pl cli -am -Dtest=SpoiledInputsTest
 * -Dsurefire.failIfNoSpecifiedTests=false -Dspoiled=20000}, with {@code -Dspoiled.first=N} to begin
 * at another input and {@code -Dspoiled.keep=FOLDER} to keep what fails.
 */
@Timeout(value = 12, unit = TimeUnit.HOURS)
class SpoiledInputsTest {
  private static final int ORDINARY = 400;

  /** An input that keeps a processor busy for longer hangs. */
  private static final double MOST_S = 10;

  /** One that waits for longer without being busy does, too. */
  private static final double MOST_WAITING_S = 300;

  @TempDir private Path folder;

  private final List<String> failures = new ArrayList<>();
  private final Map<Integer, Integer> codes = new TreeMap<>();
  private double slowestS;
  private double busiestS;

  @Test
  void done_or_explained() throws Exception {
    long count = Long.getLong("spoiled", ORDINARY);
    long first = Long.getLong("spoiled.first", 0);
    Path repository = repository();
    Corpus corpus = new Corpus(repository, folder);
    List<Path> clean = corpus.all();
    for (long number = first; number < first + count; number++) {
      if (!watched(corpus.input(number), repository, number)) {
        corpus = new Corpus(repository, Files.createDirectory(folder.resolve("after-" + number)));
        clean = corpus.all();
      }
    }
    String summary =
        String.format(
            Locale.ROOT,
            "%d spoiled inputs: exit codes %s, %d failed; slowest %.1f s, busiest %.1f s",
            count,
            codes,
            failures.size(),
            slowestS,
            busiestS);
    System.getLogger("coldseam.test").log(System.Logger.Level.INFO, summary);
    assertThat(failures).as(summary).isEmpty();
    assertThat(corpus.all()).isEqualTo(clean);
    assertThat(codes.keySet()).contains(0, 2);
  }

  @Test
  void what_broke_something_once() throws Exception {
    Path repository = repository();
    Corpus corpus = new Corpus(repository, folder);
    List<Corpus.Input> inputs = corpus.foundBefore();
    for (int i = 0; i < inputs.size(); i++) {
      watched(inputs.get(i), repository, i);
    }
    assertThat(failures).isEmpty();
    assertThat(inputs).hasSizeGreaterThan(5);
  }

  private static Path repository() {
    String told = System.getProperty("coldseam.root", "");
    Path at = told.isEmpty() ? Path.of("").toAbsolutePath() : Path.of(told);
    while (!Files.isRegularFile(at.resolve("cli/coldseam"))) {
      at = at.getParent();
    }
    return at;
  }

  /**
   * Runs an input by a thread of its own, under watch.
   *
   * @return false if it hangs
   */
  private boolean watched(Corpus.Input input, Path repository, long number) throws Exception {
    Outcome[] outcome = new Outcome[1];
    Throwable[] thrown = new Throwable[1];
    Thread runner =
        new Thread(
            null,
            () -> {
              try {
                outcome[0] = Outcome.of(input, repository);
              } catch (IOException e) {
                thrown[0] = new UncheckedIOException(e);
              } catch (RuntimeException | Error e) {
                thrown[0] = e;
              }
            },
            "spoiled " + number,
            4 << 20);
    runner.setDaemon(true);
    ThreadMXBean threads = ManagementFactory.getThreadMXBean();
    long start = System.nanoTime();
    runner.start();
    double busy = 0;
    while (runner.isAlive()) {
      runner.join(20);
      busy = Math.max(busy, threads.getThreadCpuTime(runner.getId()) / 1e9);
      double wall = (System.nanoTime() - start) / 1e9;
      if (runner.isAlive() && (busy > MOST_S || wall > MOST_WAITING_S)) {
        fail(number, input, "hangs\n  at " + stack(runner));
        return false;
      }
    }
    slowestS = Math.max(slowestS, (System.nanoTime() - start) / 1e9);
    busiestS = Math.max(busiestS, busy);
    if (thrown[0] != null) {
      fail(number, input, "threw " + thrown[0]);
      return true;
    }
    codes.merge(outcome[0].code(), 1, Integer::sum);
    if (!outcome[0].faults().isEmpty()) {
      fail(number, input, outcome[0].faults() + "\n" + outcome[0].told());
    }
    return true;
  }

  private static String stack(Thread thread) {
    StringBuilder text = new StringBuilder();
    for (StackTraceElement element : thread.getStackTrace()) {
      text.append(element).append("\n  ");
    }
    return text.toString();
  }

  private void fail(long number, Corpus.Input input, String why) throws IOException {
    failures.add("input " + number + ", " + folder.relativize(input.file()) + ": " + why);
    String keep = System.getProperty("spoiled.keep", "");
    if (!keep.isEmpty()) {
      Path kept = Files.createDirectories(Path.of(keep));
      Files.write(kept.resolve(number + "-" + input.file().getFileName()), input.bytes());
      Files.writeString(kept.resolve(number + ".txt"), failures.get(failures.size() - 1));
    }
  }
}
