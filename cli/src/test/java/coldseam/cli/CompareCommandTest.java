package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Alternatives side by side: what is printed, written and left alone. */
class CompareCommandTest {
  @TempDir Path dir;

  /** U = 1/0.57 and 1/0.97 (ISO 6946, computed). */
  @Test
  void a_case_and_its_variants_in_one_table_and_one_figure() throws IOException {
    Cases.write(
        dir, "wall.yaml", Cases.WALL.replace("  thick:", "  thick:\n    cost: 12 a square metre"));
    Ran ran = Ran.in(dir, "compare", "wall.yaml");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .contains("A  base case")
        .contains("B  thick      brick = 0.25; cost: 12 a square metre")
        .containsPattern("U wall +1\\.7543\\d* ± \\S+ +\\(2\\) +1\\.0309\\d* ± \\S+ +\\(1\\)")
        .contains("(estimate)")
        .contains("licensed professional")
        .contains("Written to wall.compare/: compare.csv, compare.svg");
    try (Stream<Path> files = Files.list(dir.resolve("wall.compare"))) {
      assertThat(files.map(file -> file.getFileName().toString()))
          .containsExactlyInAnyOrder(".coldseam-output", "compare.csv", "compare.svg");
    }
    List<String> table = Files.readAllLines(dir.resolve("wall.compare/compare.csv"));
    assertThat(table.get(0)).startsWith("alternative,name,file,variant,differs,cost,quantity,of");
    assertThat(table)
        .anyMatch(line -> line.startsWith("B,thick,wall.yaml,thick,brick = 0.25,12 a"));
    Ran again = Ran.in(dir, "compare", "wall.yaml", "--quiet");
    assertThat(again).isEqualTo(new Ran(0, "", ""));
  }

  @Test
  void json_is_a_line_an_alternative_and_one_with_the_notes() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Ran ran = Ran.in(dir, "compare", "wall.yaml", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    List<String> lines = ran.out().lines().toList();
    assertThat(lines).hasSize(3).allMatch(line -> line.startsWith("{\"coldseam\":"));
    assertThat(lines.get(1))
        .contains("\"alternative\":\"B\",\"name\":\"thick\"")
        .contains("\"quantity\":\"U\",\"of\":\"wall\",\"unit\":\"W_per_m2K\"")
        .contains("\"rank\":1,\"tied\":false");
    assertThat(lines.get(2)).contains("\"notes\":[");
    try (Stream<Path> files = Files.list(dir)) {
      assertThat(files).containsExactly(dir.resolve("wall.yaml"));
    }
  }

  @Test
  void nothing_to_compare_and_files_of_others_are_told() throws IOException {
    String alone = Cases.WALL.substring(0, Cases.WALL.indexOf("variants:"));
    Cases.write(dir, "wall.yaml", alone);
    Ran nothing = Ran.in(dir, "compare", "wall.yaml");
    assertThat(nothing.code()).isEqualTo(2);
    assertThat(nothing.err()).contains("there is nothing to compare");
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Files.createDirectory(dir.resolve("mine"));
    Files.writeString(dir.resolve("mine/compare.svg"), "mine");
    Ran blocked = Ran.in(dir, "compare", "wall.yaml", "--out", "mine");
    assertThat(blocked.code()).isEqualTo(2);
    assertThat(blocked.err()).contains("not written by coldseam");
    assertThat(dir.resolve("mine/compare.svg")).hasContent("mine");
    try (Stream<Path> files = Files.list(dir.resolve("mine"))) {
      assertThat(files).hasSize(1);
    }
  }

  @Test
  void a_mistake_in_any_case_is_told_before_anything_is_solved() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Cases.write(dir, "bad.yaml", Cases.WALL.replace("conductivity: 0.5", "conductivity: -1"));
    Ran ran = Ran.in(dir, "compare", "wall.yaml", "bad.yaml");
    assertThat(ran.code()).isEqualTo(2);
    assertThat(ran.err()).startsWith("bad.yaml:5:");
    assertThat(ran.out()).isEmpty();
    assertThat(dir.resolve("wall.compare")).doesNotExist();
  }

  @Test
  void an_accuracy_that_is_not_reached_ends_with_3() throws IOException {
    Cases.write(dir, "a.yaml", Cases.CORNER);
    Cases.write(dir, "b.yaml", Cases.CORNER.replace("0.5", "0.6"));
    Ran ran = Ran.in(dir, "compare", "a.yaml", "b.yaml", "--json", "--accuracy", "psi=1e-13");
    assertThat(ran.code()).isEqualTo(3);
    assertThat(ran.err()).contains("the accuracy asked for was not reached");
  }
}
