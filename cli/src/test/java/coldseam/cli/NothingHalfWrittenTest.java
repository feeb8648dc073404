package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Whatever a file looks like, there is a whole output or none. */
class NothingHalfWrittenTest {
  @TempDir Path dir;

  private List<String> names() throws IOException {
    try (Stream<Path> files = Files.list(dir)) {
      return files.map(file -> file.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void a_solve_writes_everything_it_says() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Ran ran = Ran.in(dir, "solve", "wall.yaml", "--variants");
    assertThat(ran.code()).as(ran.err()).isZero();
    Path out = dir.resolve("wall.coldseam");
    for (Path folder : List.of(out, out.resolve("thick"))) {
      for (String name :
          List.of(
              "result.json",
              "result.csv",
              "section.svg",
              "temperature.svg",
              "heat-flow.svg",
              "shares.svg")) {
        assertThat(folder.resolve(name)).isNotEmptyFile();
      }
    }
    assertThat(ran.out())
        .contains("Written to wall.coldseam/: result.json, result.csv, section.svg")
        .contains("Written to wall.coldseam/thick/: ");
    assertThat(names()).containsExactly("wall.coldseam", "wall.yaml");
  }

  @Test
  void json_alone_writes_no_file() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Ran ran = Ran.in(dir, "solve", "wall.yaml", "--variants", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out().lines()).hasSize(2).allMatch(line -> line.startsWith("{\"coldseam\":"));
    assertThat(ran.err()).isEmpty();
    assertThat(names()).containsExactly("wall.yaml");
  }

  /** The file cut after every line: solved and written whole, or one message and no folder. */
  @Test
  void a_case_cut_anywhere_is_solved_or_explained() throws IOException {
    List<String> lines = Cases.WALL.lines().toList();
    int solved = 0;
    for (int k = 0; k <= lines.size(); k++) {
      String cut = String.join("\n", lines.subList(0, k)) + "\n";
      Cases.write(dir, "wall.yaml", cut);
      Ran ran = Ran.in(dir, "solve", "wall.yaml", "--no-plots");
      assertThat(ran.code()).as("cut after line %d: %s", k, ran.err()).isIn(0, 2);
      if (ran.code() == 0) {
        solved++;
        Files.walk(dir.resolve("wall.coldseam"))
            .sorted(Comparator.reverseOrder())
            .forEach(path -> path.toFile().delete());
      } else {
        assertThat(ran.err()).startsWith("wall.yaml:").doesNotContain("\tat ");
        assertThat(ran.out()).isEmpty();
      }
      assertThat(names()).as("cut after line %d", k).containsExactly("wall.yaml");
    }
    assertThat(solved).isGreaterThanOrEqualTo(1);
  }

  /** A mistake that shows only when the second of two is resolved keeps the first from writing. */
  @Test
  void a_fault_in_a_variant_keeps_all_from_being_written() throws IOException {
    String apart =
        Cases.WALL.replace(
            "materials: {brick: {conductivity: 0.25}}", "fills: {indoors: outdoors}");
    Cases.write(dir, "wall.yaml", apart);
    Ran ran = Ran.in(dir, "solve", "wall.yaml", "--variants", "--no-plots");
    assertThat(ran.code()).as(ran.err()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err()).startsWith("wall.yaml:").contains("touches no material");
    assertThat(ran.out()).isEmpty();
    assertThat(names()).containsExactly("wall.yaml");
  }

  /** Every scalar of the file replaced by nonsense in turn. */
  @Test
  void a_case_spoiled_anywhere_is_solved_or_explained() throws IOException {
    String[] parts = Cases.WALL.split("(?<=[ :,\\[{])|(?=[,\\]}\\n])");
    int explained = 0;
    for (int k = 0; k < parts.length; k++) {
      if (parts[k].isBlank() || !Character.isLetterOrDigit(parts[k].charAt(0))) {
        continue;
      }
      for (String nonsense : List.of(".nan", "\"", "-1e99", "[")) {
        String[] spoiled = parts.clone();
        spoiled[k] = nonsense;
        Cases.write(dir, "wall.yaml", String.join("", spoiled));
        Ran ran = Ran.in(dir, "solve", "wall.yaml", "--json");
        assertThat(ran.code()).as("%s for %s: %s", nonsense, parts[k], ran.err()).isIn(0, 2);
        explained += ran.code() == 2 ? 1 : 0;
        assertThat(ran.err()).doesNotContain("\tat ");
        assertThat(names()).containsExactly("wall.yaml");
      }
    }
    assertThat(explained).isGreaterThan(100);
  }
}
