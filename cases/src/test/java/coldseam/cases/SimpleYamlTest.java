package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What the short reader reads, it reads as the YAML library does (snakeyaml-engine, YAML 1.2). */
@Timeout(value = 5, unit = TimeUnit.MINUTES)
class SimpleYamlTest {
  private static final long SEED = 20261201;
  private static final int CHANGES = Integer.getInteger("coldseam.yamlChanges", 400);
  private static final String ALPHABET =
      "{}[]:,-'\"#&*!|>%@`?~=\n\n \t  \r.0159eEaxyzψ\uFEFF\u2028\\";

  static List<Path> samples() {
    return SpoiledCasesTest.samples();
  }

  private static Optional<Node> simple(String text) {
    return SimpleYaml.read(text, YamlTree.DEEPEST, YamlTree.MOST_NODES);
  }

  private static void assertAgreement(String text) {
    Optional<Node> simple = simple(text);
    if (simple.isPresent()) {
      Problems problems = new Problems("");
      assertThat(YamlTree.readByLibrary(text, problems)).as(text).isEqualTo(simple);
      assertThat(problems.none()).as(text).isTrue();
    }
  }

  @Test
  void reads_nearly_every_shipped_case() throws IOException {
    List<Path> shipped = Written.shipped();
    int read = 0;
    for (Path file : shipped) {
      String text = Files.readString(file);
      read += simple(text).isPresent() ? 1 : 0;
      assertAgreement(text);
    }
    assertThat(read).isGreaterThan(shipped.size() * 9 / 10);
    // Its time to start is watched.
    Path balcony = Path.of("demo/balcony.yaml");
    assertThat(simple(Files.readString(balcony))).isPresent();
  }

  @Test
  void agrees_or_steps_back_after_random_changes() throws IOException {
    int read = 0;
    for (Path file : samples()) {
      read += readAfterChanges(file);
    }
    assertThat(read).isGreaterThan(samples().size() * CHANGES / 20);
  }

  private static int readAfterChanges(Path file) throws IOException {
    String original = Files.readString(file);
    Random random = new Random(SEED);
    int read = 0;
    for (int i = 0; i < CHANGES; i++) {
      StringBuilder text = new StringBuilder(original);
      // A short piece of the file, so that many changes fall into one spot.
      int from = random.nextInt(Math.max(1, text.length() - 400));
      int start = original.lastIndexOf('\n', from) + 1;
      text = new StringBuilder(original.substring(start, Math.min(start + 400, text.length())));
      for (int k = 0; k < i % 4; k++) {
        int at = random.nextInt(text.length());
        char c = ALPHABET.charAt(random.nextInt(ALPHABET.length()));
        switch (random.nextInt(3)) {
          case 0 -> text.setCharAt(at, c);
          case 1 -> text.insert(at, c);
          default -> text.deleteCharAt(at);
        }
      }
      read += simple(text.toString()).isPresent() ? 1 : 0;
      assertAgreement(text.toString());
    }
    return read;
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "a: 1",
        "a: 1\n",
        "# c\n\n  # d\na: b # c\n",
        "a:\n- 1\n- b: 2\n  c: [1, {d: e}]\n-\n  - x\n",
        "- - 1\n  - 2\n- a: 1\n  b: 2\n",
        "a: {b: [1,\n 2], 'c': \"d\"}\n",
        "a: x#y\nb: http://c\nc: -5\nd: 1:2\n",
        "'a b': 'c: d'\n\"e\": \"f # g\"\n",
        "a: 5 mm \n",
        "ψ: µ\n",
        "a:   b\nc:\n    d:   e\n    f: g\n",
        "a: [1, 2,]\n",
        "a: {b: c,}\n",
        "a: {}\nb: []\n",
        "- a\n- b",
        "a: b:c\n",
        "a: '#'\n",
        "a: = 3\n",
        "a: {b: why?, c: what? d}\n",
      })
  void reads(String text) {
    assertThat(simple(text)).isPresent();
    assertAgreement(text);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "",
        "# c\n",
        "a",
        "a: &x 1\n",
        "a: *x\n",
        "a: !!str 1\n",
        "a: |\n  b\n",
        "a: >\n  b\n",
        "a:\n",
        "a: b\n  c\n",
        "a: b\n c: d\n",
        "a: b: c\n",
        "a: {b}\n",
        "a: [b: c]\n",
        "a: {b:c}\n",
        "a: 'b\n  c'\n",
        "a: \"b\\n\"\n",
        "a: 'it''s'\n",
        "? a\n: b\n",
        "---\na: b\n",
        "a: b\n...\n",
        "%YAML 1.2\n---\na: b\n",
        "a: [1, 2\n",
        "a: {b: c\n",
        "a: b }\nc: ]\nd: [e\n",
        "a:\tb\n",
        "\ta: b\n",
        "a: b\r\n",
        "a: @b\n",
        "a: `b\n",
        "a: - b\n",
        "- a\nb: c\n",
        "a: 1\n- b\n",
        "  a: 1\nb: 2\n",
        "a: {b: c}d\n",
        "a: [b]]\n",
        "a: 'b' c\n",
        "a: [b\nc]\n",
        "a: [b\n c]\n",
        "a: {b: c\n}\n",
        "a: {b: c d\n  e}\n",
        "[a, b\n]\n",
        "a: ,\n",
        "a: [,]\n",
        "a: {,}\n",
        "a: [-]\n",
        "a: [b, -]\n",
        "- \n- a\n",
        "a: {b: , c: d}\n",
        "a: x ? y\n: z\n",
      })
  void agrees_or_steps_back(String text) {
    assertAgreement(text);
  }

  @Test
  void steps_back_where_nesting_or_size_is_too_much() {
    String deep = "a: " + "[".repeat(YamlTree.DEEPEST) + "1" + "]".repeat(YamlTree.DEEPEST) + "\n";
    assertThat(simple(deep)).isEmpty();
    String shallow = "a: " + "[".repeat(5) + "1" + "]".repeat(5) + "\n";
    assertThat(simple(shallow)).isPresent();
    assertThat(SimpleYaml.read("a: [1, 2]\n", YamlTree.DEEPEST, 5)).isPresent();
    assertThat(SimpleYaml.read("a: [1, 2]\n", YamlTree.DEEPEST, 4)).isEmpty();
  }
}
