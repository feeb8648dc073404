package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What a seek prints and ends with. */
class SeekCommandTest {
  private static final Pattern WORD = Pattern.compile("\"([^\"]*)\"|(\\S+)");

  /** U = 1/(0.17 + 0.2/λ): at most 1 up to λ = 0.2/0.83 = 0.24096… (ISO 6946, computed). */
  private static final String WALL =
      Cases.WALL
          .replace("view: plan", "view: plan\nvalues: {lambda: 0.5}")
          .replace("{conductivity: 0.5}", "{conductivity: lambda}");

  @TempDir Path dir;

  @Test
  void the_answer_and_what_it_rests_on() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    Ran ran =
        Ran.in(
            dir,
            "seek",
            "wall.yaml",
            "--set",
            "lambda=0.1..0.5",
            "--until",
            "U <= 1",
            "--largest",
            "--step",
            "0.001");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .contains("lambda = 0.24 meets U wall ≤ 1 W/(m²·K); 0.241 does not, a step of 0.001 away.")
        .contains("Decided by proved intervals.")
        .contains("Assumed that it rises or falls throughout")
        .contains("cli/coldseam solve wall.yaml --set lambda=0.24")
        .contains("licensed professional");
    assertThat(ran.err()).isEmpty();
    try (var files = Files.list(dir)) {
      assertThat(files).containsExactly(dir.resolve("wall.yaml"));
    }
  }

  /** The command that the card ends with gives an interval that meets the target. */
  @Test
  void the_answer_solved_again_meets_the_target() throws IOException {
    Cases.write(
        dir,
        "corner.yaml",
        Cases.CORNER
            .replace("view: plan", "view: plan\nvalues: {lambda: 0.5}")
            .replace("{conductivity: 0.5}", "{conductivity: lambda}"));
    String[] seek = {"seek", "corner.yaml", "--set", "lambda=0.1..0.9", "--until", "psi >= 0.05"};
    Ran ran = Ran.in(dir, seek);
    assertThat(ran.code()).as(ran.err()).isZero();
    String command =
        ran.out().lines().filter(line -> line.contains("cli/coldseam solve")).findFirst().get();
    List<String> words = new ArrayList<>();
    Matcher matcher = WORD.matcher(command.strip());
    while (matcher.find()) {
      words.add(matcher.group(1) != null ? matcher.group(1) : matcher.group(2));
    }
    words.remove(0);
    words.add("--json");
    Ran again = Ran.in(dir, words.toArray(new String[0]));
    assertThat(again.code()).as(again.err()).isZero();
    String psi = again.out().substring(again.out().indexOf("\"psi\":["));
    Matcher lower = Pattern.compile("\"lower_W_per_mK\":([0-9.eE-]+)").matcher(psi);
    assertThat(lower.find()).isTrue();
    assertThat(Double.parseDouble(lower.group(1))).isGreaterThanOrEqualTo(0.05);

    List<String> data = new ArrayList<>(List.of(seek));
    data.add("--json");
    Ran json = Ran.in(dir, data.toArray(new String[0]));
    assertThat(json.out().lines()).hasSize(1);
    assertThat(json.out())
        .contains("\"ending\":\"found\"")
        .contains("\"quantity\":\"psi.internal\"")
        .contains("\"lower\":" + lower.group(1));
    assertThat(json.out().split("\"decided\":", -1).length - 1 - 2).isBetween(3, 12);
    data.set(data.size() - 1, "--quiet");
    Ran quiet = Ran.in(dir, data.toArray(new String[0]));
    assertThat(quiet.out()).matches("[0-9.]+\n");
  }

  @Test
  void none_ends_with_1() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    String[] args = {"seek", "wall.yaml", "--set", "lambda=0.3..0.5", "--until", "U <= 1"};
    Ran ran = Ran.in(dir, args);
    assertThat(ran.code()).isEqualTo(1);
    assertThat(ran.out()).contains("No value of lambda that was solved meets U wall ≤ 1 W/(m²·K).");
  }

  /** f_Rsi = 1 − 0.13/(0.17 + 0.2/λ); the colder space is at −5 °C, so 0.01 K are 0.0004. */
  @Test
  void the_temperature_factor_is_labelled_an_estimate() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    Ran ran =
        Ran.in(
            dir,
            "seek",
            "wall.yaml",
            "--set",
            "lambda=0.1..0.5",
            "--until",
            "fRsi.indoors >= 0.8",
            "--largest",
            "--step",
            "0.01");
    // R ≥ 0.13/0.1996 = 0.6513: λ ≤ 0.2/0.4813 = 0.4155 (computed).
    assertThat(ran.out())
        .contains("lambda = 0.41 meets")
        .contains("(estimate)")
        .contains("margin of 0.01 K");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "--set;lambda=0.1..0.5                         | needs --set NAME=FROM..TO and --until",
        "--set;lambda=0.1..0.5;--until;U = 1           | compares nothing",
        "--set;lambda=0.1..0.5;--until;psi <= 1        | has no psi",
        "--set;mu=0.1..0.5;--until;U <= 1              | the case has no value \"mu\"",
        "--set;lambda=-1..0.5;--until;U <= 1           | with lambda = -1: ",
      })
  void bad_input_is_one_message(String typed, String why) throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    List<String> words = new ArrayList<>(List.of("seek", "wall.yaml"));
    words.addAll(List.of(typed.split(";")));
    Ran ran = Ran.in(dir, words.toArray(new String[0]));
    assertThat(ran.code()).isEqualTo(2);
    assertThat(ran.err()).contains(why).doesNotContain("\tat ");
    assertThat(ran.out()).isEmpty();
  }
}
