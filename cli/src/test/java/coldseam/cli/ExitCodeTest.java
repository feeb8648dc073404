package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Each code of the table of commands, reached. */
class ExitCodeTest {
  @TempDir Path dir;

  @Test
  void done_is_0() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    for (String[] args :
        new String[][] {
          {"--version"},
          {"solve", "wall.yaml", "--json"},
          {"solve", "wall.yaml", "--variants", "--quiet", "--no-plots"},
          {"check", "wall.yaml"},
          {"materials", "wool"},
          {"materials", "no such thing"}
        }) {
      Ran ran = Ran.in(dir, args);
      assertThat(ran.code()).as(String.join(" ", args) + ": " + ran.err()).isZero();
    }
  }

  @Test
  void a_value_out_of_its_tolerance_is_1() throws IOException {
    String expect =
        "expect:\n  - {R: wall, value: %s, within: 0.001, source: by hand, status: computed}\n";
    Cases.write(dir, "right.yaml", Cases.WALL + expect.formatted("0.57"));
    Cases.write(dir, "wrong.yaml", Cases.WALL + expect.formatted("0.58"));
    Ran right = Ran.in(dir, "prove", "right.yaml");
    assertThat(right.code()).as(right.err()).isZero();
    assertThat(right.out()).contains("pass  R wall").contains("0.5700").contains("by hand");
    Ran both = Ran.in(dir, "prove", "right.yaml", "wrong.yaml");
    assertThat(both.code()).isEqualTo(1);
    assertThat(both.out()).contains("FAIL  R wall").contains("1 passed, 1 failed");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "solve nowhere.yaml | nowhere.yaml: ",
        "solve . | .: ",
        "solve empty.yaml | empty.yaml: ",
        "solve binary.yaml | binary.yaml: ",
        "solve wall.yaml --variant thin | has no variant \"thin\"",
        "solve wall.yaml --variant thikc | did you mean \"thick\"?",
        "solve wall.yaml --jsno | did you mean --json?",
        "solve wall.yaml --out | --out needs a value",
        "solve wall.yaml --json --json | given twice",
        "solve wall.yaml --json=yes | takes no value",
        "solve wall.yaml --json --png | add --out",
        "solve wall.yaml --png --no-plots | exclude each other",
        "solve wall.yaml --variant thick --variants | give one of them",
        "solve wall.yaml wall.yaml | two solves would be written",
        "solve wall.yaml --accuracy ps=1 | did you mean psi=",
        "solve wall.yaml --most-unknowns many | is no whole number",
        "solve wall.yaml --out wall.yaml | is a file, not a folder",
        "solve | needs CASE…",
        "sovle wall.yaml | did you mean solve?",
        "wall.yaml | did you mean: cli/coldseam solve wall.yaml",
        "--json solve | options stand after the command",
        "prove nonsense | has \"nonsense\" in its name or title",
        "prove wall.yaml | expects nothing",
        "'' | Commands",
      })
  void bad_input_and_usage_are_2_with_one_clear_message(String line, String words)
      throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Cases.write(dir, "empty.yaml", "");
    Files.write(dir.resolve("binary.yaml"), new byte[] {0, 1, (byte) 0xff, 7, 0, 12});
    Ran ran = Ran.in(dir, line.isEmpty() ? new String[0] : line.split(" "));
    assertThat(ran.code()).as(ran.err()).isEqualTo(2);
    assertThat(ran.err()).contains(words).doesNotContain("\tat ").doesNotContain("Exception");
    assertThat(ran.out()).isEmpty();
    try (Stream<Path> files = Files.list(dir)) {
      assertThat(files.map(f -> f.getFileName().toString()))
          .containsExactlyInAnyOrder("wall.yaml", "empty.yaml", "binary.yaml");
    }
  }

  @Test
  void mistakes_of_several_files_are_told_together() throws IOException {
    Cases.write(dir, "a.yaml", Cases.WALL.replace("conductivity: 0.5", "conductivity: -1"));
    Cases.write(dir, "b.yaml", Cases.WALL.replace("fill: brick", "fill: brik"));
    Ran ran = Ran.in(dir, "solve", "a.yaml", "b.yaml");
    assertThat(ran.code()).isEqualTo(2);
    assertThat(ran.err()).containsPattern("(?m)^a\\.yaml:5:").containsPattern("(?m)^b\\.yaml:11:");
    Ran json = Ran.in(dir, "check", "b.yaml", "--json");
    assertThat(json.code()).isEqualTo(2);
    assertThat(json.out()).contains("\"valid\":false").contains("\"line\":11");
    assertThat(json.err()).isEmpty();
  }

  @Test
  void an_accuracy_not_reached_is_3_and_the_result_is_there() throws IOException {
    Cases.write(dir, "corner.yaml", Cases.CORNER);
    Ran ran =
        Ran.in(
            dir,
            "solve",
            "corner.yaml",
            "--json",
            "--accuracy",
            "L2D=0.0001%",
            "--most-unknowns",
            "500");
    assertThat(ran.code()).as(ran.err()).isEqualTo(3);
    assertThat(ran.err())
        .contains("corner.yaml: the accuracy asked for was not reached")
        .containsPattern("L2D \\S+ – \\S+: asked ± \\S+, reached ± \\S+ W/\\(m·K\\)")
        .contains("--most-unknowns");
    assertThat(ran.out()).contains("\"reached\":false");
    assertThat(Ran.in(dir, "solve", "corner.yaml", "--json").code()).isZero();
  }

  /** Two leaves that do not meet: L2D and U are 0, of which no part can be asked for. */
  @Test
  void nothing_to_be_accurate_about_is_0_with_a_warning() throws IOException {
    String leaves =
        Cases.WALL.replace(
            "- {fill: brick, box: [0, 0, 200, 1000]}",
            "- {fill: brick, box: [0, 0, 80, 1000]}\n  - {fill: brick, box: [120, 0, 200, 1000]}");
    Cases.write(dir, "leaves.yaml", leaves);
    Ran ran = Ran.in(dir, "solve", "leaves.yaml", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .contains("\"reached\":true")
        .contains("no heat path joins 'indoors' and 'outdoors'");
  }

  @Test
  void a_defect_is_70_says_what_to_report_and_keeps_its_trace_to_a_file() {
    PrintStream broken =
        new PrintStream(OutputStream.nullOutputStream(), true, StandardCharsets.UTF_8) {
          @Override
          public void println(String text) {
            throw new IllegalStateException("made for the test");
          }
        };
    for (Map<String, String> environment :
        List.of(Map.<String, String>of(), Map.of(Failure.TRACE, "1"))) {
      ByteArrayOutputStream err = new ByteArrayOutputStream();
      int code =
          Main.run(
              new String[] {"--version"},
              new Surroundings(
                  broken,
                  new PrintStream(err, true, StandardCharsets.UTF_8),
                  dir,
                  environment,
                  false,
                  false,
                  Optional.empty()));
      String text = err.toString(StandardCharsets.UTF_8);
      assertThat(code).isEqualTo(70);
      assertThat(text).contains("a defect of the program, not of your case").contains("made for");
      if (environment.isEmpty()) {
        assertThat(text).doesNotContain("\tat ").contains("Please report it with your case file");
        String file = text.substring(text.lastIndexOf(" and ") + 5).strip();
        assertThat(Path.of(file))
            .content()
            .contains("\tat coldseam.cli.Main")
            .contains("--version");
        Path.of(file).toFile().delete();
      } else {
        assertThat(text).contains("\tat coldseam.cli.Main");
      }
    }
  }

  @Test
  void the_worse_of_two_counts() {
    assertThat(ExitCode.worse(ExitCode.DONE, ExitCode.ACCURACY)).isEqualTo(3);
    assertThat(ExitCode.worse(ExitCode.ACCURACY, ExitCode.NOT_MET)).isEqualTo(3);
    assertThat(ExitCode.worse(ExitCode.BAD_INPUT, ExitCode.ACCURACY)).isEqualTo(2);
    assertThat(ExitCode.worse(ExitCode.BAD_INPUT, ExitCode.DEFECT)).isEqualTo(70);
  }
}
