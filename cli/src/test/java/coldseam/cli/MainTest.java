package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class MainTest {
  @TempDir Path dir;

  private static String golden(String name) throws IOException {
    try (InputStream text = MainTest.class.getResourceAsStream("/help/" + name + ".txt")) {
      return new String(text.readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "solve",
        "check",
        "compare",
        "sweep",
        "seek",
        "draft",
        "materials",
        "prove",
        "ledger",
        "watch"
      })
  void the_help_of_a_command(String command) throws IOException {
    Ran ran = Ran.in(dir, command, "--help");
    assertThat(ran.code()).isZero();
    assertThat(ran.out()).isEqualTo(golden(command));
    assertThat(Ran.in(dir, "help", command).out()).isEqualTo(ran.out());
    assertThat(Ran.in(dir, command, "-h").out()).isEqualTo(ran.out());
    assertThat(ran.out()).contains("Example").contains("--json").contains("--quiet");
    assertThat(ran.out().lines()).allMatch(line -> line.length() <= 96);
  }

  @Test
  void the_overview() throws IOException {
    assertThat(Ran.in(dir, "--help").out()).isEqualTo(golden("overview"));
    assertThat(Ran.in(dir).err()).isEqualTo(golden("overview"));
  }

  @Test
  void the_version_is_that_of_the_build() throws IOException {
    assertThat(Main.VERSION).isEqualTo(System.getProperty("coldseam.version"));
    assertThat(Ran.in(dir, "--version").out())
        .startsWith("coldseam " + Main.VERSION + "\n")
        .contains("Apache License, Version 2.0", "Eclipse Public License", "as is")
        .isEqualTo(Main.version() + "\n");
  }

  @Test
  void colour_is_for_terminals_that_want_it() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    String[] args = {"solve", "wall.yaml", "--no-plots"};
    assertThat(Ran.in(dir, Map.of(), true, args).out()).contains("\u001b[1mPlain wall\u001b[0m");
    assertThat(Ran.in(dir, Map.of(), false, args).out()).doesNotContain("\u001b");
    assertThat(Ran.in(dir, Map.of("NO_COLOR", "1"), true, args).out()).doesNotContain("\u001b");
    assertThat(Ran.in(dir, Map.of("TERM", "dumb"), true, args).out()).doesNotContain("\u001b");
  }

  @Test
  void progress_is_for_terminals_and_goes_away() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Ran seen = Ran.in(dir, Map.of(), true, "solve", "wall.yaml", "--json");
    assertThat(seen.err()).contains("wall.yaml: ").contains("pass 1").endsWith("\r\u001b[K");
    assertThat(Ran.in(dir, Map.of(), true, "solve", "wall.yaml", "--json", "--quiet").err())
        .isEmpty();
    assertThat(Ran.in(dir, "solve", "wall.yaml", "--json").err()).isEmpty();
  }

  @Test
  void quiet_prints_no_card_and_writes_all_the_same() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Ran ran = Ran.in(dir, "solve", "wall.yaml", "--quiet", "--no-plots");
    assertThat(ran.out()).isEmpty();
    assertThat(ran.err()).isEmpty();
    assertThat(dir.resolve("wall.coldseam/result.json")).isNotEmptyFile();
    Ran check = Ran.in(dir, "check", "wall.yaml", "--quiet");
    assertThat(check).isEqualTo(new Ran(0, "", ""));
  }
}
