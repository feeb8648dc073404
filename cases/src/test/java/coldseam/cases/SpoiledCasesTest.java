package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Spoiled cases are read or refused with places, never anything else. */
@Timeout(value = 5, unit = TimeUnit.MINUTES)
class SpoiledCasesTest {
  private static final long SEED = 20250314;

  /** Every key of the format at least once. */
  static final Path EVERYTHING = Path.of("src/test/resources/coldseam/cases/everything.yaml");

  /** Every key of drawings at least once. */
  static final Path DRAWN = Path.of("src/test/resources/coldseam/cases/drawn.yaml");

  @TempDir private Path folder;

  static List<Path> samples() {
    List<Path> samples = new ArrayList<>(Written.shipped());
    samples.add(EVERYTHING);
    samples.add(DRAWN);
    return samples;
  }

  /** Of all changes to the sample with every key every second is tried, of others every sixth. */
  static int share(Path file) {
    return file.equals(EVERYTHING) ? 2 : 6;
  }

  @ParameterizedTest
  @MethodSource("samples")
  void cut_after_every_line(Path file) throws IOException {
    String text = Files.readString(file);
    int refused = 0;
    for (int end = text.indexOf('\n'); end >= 0; end = text.indexOf('\n', end + 1)) {
      refused += refused(text.substring(0, end + 1)) ? 1 : 0;
      refused += refused(text.substring(0, Math.max(1, end - 3))) ? 1 : 0;
    }
    assertThat(refused).isGreaterThan(3);
  }

  @ParameterizedTest
  @MethodSource("samples")
  void every_place_spoiled_in_several_ways(Path file) throws IOException {
    Node root = YamlTree.read(Files.readString(file), new Problems("")).orElseThrow();
    List<String> spoiled = Spoiled.some(root, SEED, share(file));
    int refused = 0;
    for (String text : spoiled) {
      refused += refused(text) ? 1 : 0;
    }
    // Most changes are mistakes; a changed coordinate or name of the user's own need not be one.
    assertThat(refused).isGreaterThan(spoiled.size() / 2);
  }

  @ParameterizedTest
  @MethodSource("samples")
  void letters_changed_at_random(Path file) throws IOException {
    String text = Files.readString(file);
    Random random = new Random(SEED);
    String alphabet = "{}[]:,-'\"#&*!|>%@`\n \t0159.eEaxyzψ";
    for (int i = 0; i < 150; i++) {
      StringBuilder spoiled = new StringBuilder(text);
      for (int k = 0; k < 1 + i % 3; k++) {
        int at = random.nextInt(spoiled.length());
        char c = alphabet.charAt(random.nextInt(alphabet.length()));
        if (random.nextBoolean()) {
          spoiled.setCharAt(at, c);
        } else {
          spoiled.insert(at, c);
        }
      }
      refused(spoiled.toString());
    }
  }

  /** Whether a text is refused, as it should be: in words and with places. */
  private boolean refused(String text) {
    try {
      Written.read(folder, text);
      return false;
    } catch (CaseException e) {
      assertThat(e.problems()).isNotEmpty();
      int line = 0;
      for (Problem problem : e.problems()) {
        assertThat(problem.line()).as(problem.text()).isGreaterThanOrEqualTo(Math.max(line, 1));
        assertThat(problem.line()).as(problem.text()).isLessThanOrEqualTo(lines(text) + 1);
        assertThat(problem.wrong()).isNotBlank().doesNotContain("coldseam.").doesNotContain("null");
        line = problem.line();
      }
      return true;
    } catch (RuntimeException | StackOverflowError | OutOfMemoryError e) {
      return fail("not refused in words: " + e + "\n" + text, e);
    }
  }

  private static int lines(String text) {
    return (int) text.chars().filter(c -> c == '\n').count() + 1;
  }
}
