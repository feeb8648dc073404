package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** Files that are no cases. */
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class CaseFileTest {
  @TempDir private Path folder;

  private String said(Path file) {
    CaseException e = catchThrowableOfType(CaseException.class, () -> CaseFile.read(file));
    assertThat(e).isNotNull();
    assertThat(e.problems()).hasSize(1);
    return e.getMessage().replace(folder.toString(), "FOLDER").replace('\\', '/');
  }

  private String said(byte[] content) throws IOException {
    return said(Files.write(folder.resolve("case.yaml"), content));
  }

  private String said(String content) throws IOException {
    return said(content.getBytes(StandardCharsets.UTF_8));
  }

  @Test
  void no_such_file() throws IOException {
    assertThat(said(folder.resolve("nowhere.yaml")))
        .isEqualTo("FOLDER/nowhere.yaml: there is no such file; check the path");
    Files.writeString(folder.resolve("balcony.yaml"), "");
    assertThat(said(folder.resolve("balcny.yaml")))
        .isEqualTo("FOLDER/balcny.yaml: there is no such file; did you mean `balcony.yaml`?");
    assertThat(said(folder.resolve("no/such/folder.yaml"))).contains("there is no such file");
  }

  @Test
  void a_folder() {
    assertThat(said(folder))
        .isEqualTo("FOLDER: this is a folder, not a file; name a case file in it");
  }

  @Test
  void empty() throws IOException {
    assertThat(said(""))
        .isEqualTo("FOLDER/case.yaml: this file is empty; a case begins with `coldseam: 1`");
    assertThat(said(" \n\n")).contains("this file is empty");
    assertThat(said("# only a comment\n"))
        .isEqualTo(
            "FOLDER/case.yaml:1: this file has no content; a case begins with `coldseam: 1`");
  }

  @Test
  void binary() throws IOException {
    byte[] noise = new byte[4096];
    new Random(7).nextBytes(noise);
    assertThat(said(noise))
        .isEqualTo(
            "FOLDER/case.yaml: this is not a text file; a case is a YAML text; see"
                + " cases/README.md");
    assertThat(said("title: a\0b")).contains("this is not a text file");
  }

  @Test
  void another_encoding() throws IOException {
    assertThat(said("coldseam: 1\ntitle: Küche\n".getBytes(StandardCharsets.ISO_8859_1)))
        .isEqualTo(
            "FOLDER/case.yaml:2: a character here is not UTF-8; save the file in the encoding"
                + " UTF-8");
    assertThat(said("coldseam: 1\n".getBytes(StandardCharsets.UTF_16)))
        .contains("this is not a text file");
  }

  @Test
  void a_byte_order_mark_is_no_mistake() throws CaseException {
    assertThat(Written.read(folder, "\uFEFF" + Written.WALL).title()).isEqualTo("Test");
  }

  @Test
  void too_large() throws IOException {
    assertThat(said("# " + "x".repeat(FileText.MOST_BYTES)))
        .isEqualTo(
            "FOLDER/case.yaml: this file is too large to be a case; a case file has at most 4 MB");
  }

  @Test
  void not_yaml() throws IOException {
    assertThat(said("coldseam: 1\ntitle: [a, b\n"))
        .startsWith("FOLDER/case.yaml:3:1: this is not YAML: ");
    assertThat(said("coldseam: 1\n\ttitle: x\n"))
        .startsWith("FOLDER/case.yaml:2:1: this is not YAML: ")
        .endsWith("; indent with spaces, not tabs");
    assertThat(said("just words"))
        .isEqualTo(
            "FOLDER/case.yaml:1:1: a case needs keys with values, not `just words`; write"
                + " `coldseam: …`");
    assertThat(said("a: 1\n---\nb: 2\n")).contains(":2:1: a second document begins here");
    assertThat(said("? [a, b]\n: 1\n")).contains(":1:3: a key must be a word");
    assertThat(said("a: !!str b\n")).contains(":1:4: tags such as `!!str` are not used here");
    assertThat(said("a: *b\n")).contains(":1:4: `*b` refers to nothing written before it");
  }

  /** Nothing that a terminal acts on comes from a file to a message or a card. */
  @Test
  void invisible_characters_are_refused() throws IOException {
    assertThat(said("coldseam: 1\ntitle: \"a\\e[31mb\"\n"))
        .isEqualTo(
            "FOLDER/case.yaml:2:8: an invisible character stands here, U+001B; leave it away");
    assertThat(said("coldseam: 1\ntitle: a\u202Eb\n")).contains("U+202E");
    assertThat(said("coldseam: 1\ntitle: \"a\\ud800b\"\n")).contains("U+D800");
    assertThat(said("coldseam: 1\nti\u0085tle: x\n")).doesNotContain("\u0085");
  }

  @Test
  void bombs_are_refused() throws IOException {
    StringBuilder aliases = new StringBuilder("a0: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
    for (int i = 1; i < 12; i++) {
      String before = "*a" + (i - 1);
      aliases
          .append("a" + i + ": &a" + i + " [")
          .append((before + ", ").repeat(9))
          .append(before + "]\n");
    }
    assertThat(said(aliases.toString())).contains("this file says too much");
    assertThat(said("a: " + "[".repeat(100_000))).contains("this is nested too deeply");
    assertThat(said("a:\n" + "- ".repeat(100_000) + "x\n")).contains("this is nested too deeply");
    assertThat(said("a: &a [*a]\n")).contains("`*a` refers to nothing written before it");
  }

  @Test
  void expressions_are_bounded() {
    for (String expression :
        new String[] {
          "(".repeat(50_000) + "1" + ")".repeat(50_000),
          "-".repeat(50_000) + "1",
          "2^".repeat(50_000) + "1",
          "abs(".repeat(50_000) + "1" + ")".repeat(50_000)
        }) {
      assertThat(Written.problems(folder, Written.WALL + "points: {a: [" + expression + ", 0]}\n"))
          .singleElement()
          .asString()
          .contains("nested too deeply");
    }
    StringBuilder chain = new StringBuilder(Written.WALL + "values:\n  v0: 1\n");
    for (int i = 1; i < 5000; i++) {
      chain.append("  v" + i + ": v" + (i - 1) + " + 1\n");
    }
    // Read in this order each value is worked out before it is needed; the other way round not.
    assertThat(Written.problems(folder, chain.toString())).isEmpty();
    StringBuilder back = new StringBuilder(Written.WALL + "values:\n");
    for (int i = 5000; i > 0; i--) {
      back.append("  v" + i + ": v" + (i - 1) + " + 1\n");
    }
    assertThat(Written.problems(folder, back + "  v0: 1\n"))
        .isNotEmpty()
        .allMatch(p -> p.contains("over too many steps"));
  }

  @Test
  void copies_are_bounded() {
    String group = "{fill: masonry, box: [0, 0, 1, 1]}";
    for (int i = 0; i < 6; i++) {
      group = "{group: [" + group + "], repeat: {times: 100, step: [1, 0]}}";
    }
    assertThat(Written.problems(folder, Written.WALL + "  - " + group + "\n"))
        .singleElement()
        .asString()
        .contains("more than 20000 shapes, copies included");
  }
}
