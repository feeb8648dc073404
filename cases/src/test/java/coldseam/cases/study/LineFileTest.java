package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LineFileTest {
  @TempDir Path dir;
  private Path file;
  private Sweep sweep;

  @BeforeEach
  void lay_out() throws Exception {
    file = dir.resolve("sweep.jsonl");
    Axis axis = Axis.read("thickness=100..103/4", Wall.in(dir), Optional.empty());
    sweep = Sweep.of(Wall.in(dir), Optional.empty(), List.of(axis));
  }

  private static String line(String key, int thickness) {
    return "{\"coldseam\":\"1\",\"study\":\""
        + key
        + "\",\"set\":{\"thickness\":"
        + thickness
        + "}}";
  }

  private Map<Integer, Lines.Line> finished() throws Exception {
    return LineFile.finished(sweep, "k", List.of(file));
  }

  /** A run can be killed after any byte. */
  @Test
  void a_line_cut_anywhere_is_no_line() throws Exception {
    String whole = line("k", 100) + "\n" + line("k", 102) + "\n";
    for (int cut = 0; cut <= whole.length(); cut++) {
      Files.writeString(file, whole.substring(0, cut));
      int ends = whole.substring(0, cut).replaceAll("[^\n]", "").length();
      assertThat(finished()).as("cut after %d", cut).hasSize(ends);
      assertThat(LineFile.ours(file)).as("cut after %d", cut).isTrue();
      List<String> kept = finished().values().stream().map(Lines.Line::text).toList();
      try (LineFile open = LineFile.open(file, kept).get()) {
        open.append(line("k", 103));
      }
      assertThat(finished().keySet()).contains(3).hasSize(ends + 1);
      assertThat(Files.readAllLines(file)).hasSize(ends + 1);
    }
  }

  @Test
  void lines_of_another_study_or_of_no_point_are_dropped_when_it_is_opened() throws Exception {
    Files.writeString(
        file,
        String.join(
            "\n", line("other", 100), line("k", 101), line("k", 99), "{}", line("k", 103), ""));
    assertThat(finished().keySet()).containsExactly(1, 3);
    List<String> kept = finished().values().stream().map(Lines.Line::text).toList();
    LineFile.open(file, kept).get().close();
    assertThat(Files.readAllLines(file)).containsExactly(line("k", 101), line("k", 103));
  }

  @Test
  void a_point_in_two_files_counts_once_and_numbers_count_by_value() throws Exception {
    Path other = dir.resolve("shard-1-of-2.jsonl");
    Files.writeString(file, line("k", 101).replace("101", "101.0") + "\n");
    Files.writeString(other, line("k", 101) + "\n" + line("k", 100) + "\n");
    assertThat(LineFile.finished(sweep, "k", List.of(file, other)).keySet()).containsExactly(1, 0);
  }

  @Test
  void one_run_at_a_time() throws Exception {
    try (LineFile open = LineFile.open(file, List.of()).get()) {
      open.append(line("k", 100));
      assertThat(LineFile.open(file, List.of(line("k", 100)))).isEmpty();
    }
    LineFile.open(file, List.of(line("k", 100))).get().close();
    assertThat(Files.readAllLines(file)).containsExactly(line("k", 100));
  }

  @Test
  void files_of_others_are_known_by_their_first_line() throws Exception {
    for (String text : List.of("my notes", "my notes\n", "{\"study\": 1}\n", "[1, 2]\n")) {
      Files.writeString(file, text);
      assertThat(LineFile.ours(file)).as(text).isFalse();
    }
    Files.writeString(file, "");
    assertThat(LineFile.ours(file)).isTrue();
  }
}
