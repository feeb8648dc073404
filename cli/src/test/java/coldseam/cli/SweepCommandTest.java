package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Sweeps: what is written, what is left alone, and that nothing is solved twice. */
class SweepCommandTest {
  private static final Pattern SETTING = Pattern.compile("\"set\":\\{\"lambda\":([0-9.]+)}");

  /** U = 1/(0.17 + 0.2/λ) exactly (ISO 6946). */
  private static final String WALL =
      Cases.WALL
          .replace("view: plan", "view: plan\nvalues: {lambda: 0.5}")
          .replace("{conductivity: 0.5}", "{conductivity: lambda}");

  @TempDir Path dir;

  private Set<String> names(String folder) throws IOException {
    Set<String> names = new TreeSet<>();
    try (Stream<Path> files = Files.list(dir.resolve(folder))) {
      files.forEach(file -> names.add(file.getFileName().toString()));
    }
    return names;
  }

  private Path lines(String folder) {
    return dir.resolve(folder).resolve("sweep.jsonl");
  }

  private static List<String> settings(Path file) throws IOException {
    List<String> settings = new ArrayList<>();
    for (String line : Files.readAllLines(file)) {
      Matcher matcher = SETTING.matcher(line);
      assertThat(matcher.find()).as(line).isTrue();
      settings.add(matcher.group(1));
    }
    return settings;
  }

  @Test
  void lines_table_and_chart_in_a_folder_beside_the_case() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    Ran ran = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/5");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.err()).isEmpty();
    assertThat(ran.out())
        .contains("5 points: 5 solved")
        .contains("Written to wall.sweep/lambda/: sweep.jsonl, sweep.csv, sweep.svg")
        .contains("licensed professional");
    assertThat(names(".")).containsExactlyInAnyOrder("wall.sweep", "wall.yaml");
    assertThat(names("wall.sweep/lambda"))
        .containsExactlyInAnyOrder(".coldseam-output", "sweep.csv", "sweep.jsonl", "sweep.svg");
    List<String> table = Files.readAllLines(dir.resolve("wall.sweep/lambda/sweep.csv"));
    assertThat(table).hasSize(6);
    assertThat(table.get(0)).startsWith("lambda,U.wall.value_W_per_m2K,U.wall.lower_W_per_m2K,");
    for (int i = 1; i <= 5; i++) {
      String[] cells = table.get(i).split(",");
      double lambda = Double.parseDouble(cells[0]);
      double exact = 1 / (0.17 + 0.2 / lambda);
      assertThat(lambda).isEqualTo(i / 10.0);
      assertThat(exact)
          .isBetween(Double.parseDouble(cells[2]) - 1e-12, Double.parseDouble(cells[3]) + 1e-12);
    }
    assertThat(Files.readString(dir.resolve("wall.sweep/lambda/sweep.svg")))
        .contains("<svg ")
        .contains(">lambda</text>")
        .contains("Plain wall");
  }

  @Test
  void json_alone_prints_lines_in_order_and_writes_nothing() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    Ran ran = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.5..0.1/9", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    List<String> settings = new ArrayList<>();
    ran.out()
        .lines()
        .forEach(
            line -> {
              Matcher matcher = SETTING.matcher(line);
              assertThat(matcher.find()).isTrue();
              settings.add(matcher.group(1));
            });
    assertThat(settings)
        .containsExactly("0.5", "0.45", "0.4", "0.35", "0.3", "0.25", "0.2", "0.15", "0.1");
    assertThat(names(".")).containsExactly("wall.yaml");
  }

  @Test
  void a_longer_range_keeps_what_was_solved_and_a_changed_case_keeps_nothing() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/3", "--out", "s");
    List<String> before = Files.readAllLines(lines("s"));
    Ran longer = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/5", "--out", "s");
    assertThat(longer.out()).contains("5 points: 2 solved").contains("3 from before");
    assertThat(Files.readAllLines(lines("s"))).hasSize(5).containsAll(before);
    Ran same = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/5", "--out", "s");
    assertThat(same.out()).contains("5 points: 0 solved, 5 from before");
    Cases.write(dir, "wall.yaml", WALL.replace("0.13}", "0.14}"));
    Ran changed = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/5", "--out", "s");
    assertThat(changed.out()).contains("5 points: 5 solved");
    assertThat(Files.readAllLines(lines("s"))).hasSize(5).doesNotContainAnyElementsOf(before);
  }

  /** The program itself, killed while it runs; the case needs some time at each point. */
  @Test
  void killed_half_way_it_goes_on_and_solves_nothing_twice() throws Exception {
    Cases.write(
        dir,
        "corner.yaml",
        Cases.CORNER
            .replace("view: plan", "view: plan\nvalues: {lambda: 0.5}")
            .replace("{conductivity: 0.5}", "{conductivity: lambda}"));
    String[] sweep = {
      "sweep",
      "corner.yaml",
      "--set",
      "lambda=0.1..0.5/41",
      "--accuracy",
      "psi=0.00001",
      "--out",
      "s"
    };
    Process process = start(dir, Map.of(), sweep);
    Path file = lines("s");
    long end = System.nanoTime() + TimeUnit.MINUTES.toNanos(2);
    while (System.nanoTime() < end
        && process.isAlive()
        && (!Files.exists(file) || Files.readString(file).lines().count() < 5)) {
      Thread.sleep(2);
    }
    process.destroyForcibly().waitFor();
    String left = Files.readString(file);
    int whole = (int) left.chars().filter(c -> c == '\n').count();
    assertThat(whole).as("killed between the fifth and the last point").isBetween(5, 40);
    // And half a line, whether the kill left one or not.
    String kept = left.substring(0, left.lastIndexOf('\n') + 1);
    Files.writeString(file, kept + kept.substring(0, kept.indexOf('\n') / 2));

    Ran again = Ran.in(dir, sweep);
    assertThat(again.code()).as(again.err()).isZero();
    assertThat(again.out())
        .contains("41 points: " + (41 - whole) + " solved")
        .contains(whole + " from before");
    assertThat(Files.readString(file).startsWith(kept)).as("finished lines stay").isTrue();
    assertThat(settings(file)).hasSize(41).doesNotHaveDuplicates();
    assertThat(Files.readAllLines(dir.resolve("s/sweep.csv"))).hasSize(42);
  }

  @Test
  void shards_merge_by_concatenation() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    StringBuilder joined = new StringBuilder();
    for (int k = 3; k >= 1; k--) {
      Ran ran =
          Ran.in(
              dir,
              "sweep",
              "wall.yaml",
              "--set",
              "lambda=0.1..0.5/8",
              "--shard",
              k + "/3",
              "--json");
      assertThat(ran.code()).as(ran.err()).isZero();
      joined.append(ran.out());
    }
    Files.createDirectory(dir.resolve("s"));
    Files.writeString(lines("s"), joined);
    Ran ran = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/8", "--out", "s");
    assertThat(ran.out()).contains("8 points: 0 solved, 8 from before");
    Ran alone = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/8", "--out", "t");
    assertThat(alone.code()).isZero();
    for (String name : List.of("sweep.csv", "sweep.svg")) {
      assertThat(dir.resolve("s").resolve(name))
          .hasSameTextualContentAs(dir.resolve("t").resolve(name));
    }
  }

  @Test
  void files_of_others_are_left_alone() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    for (String name : List.of("sweep.jsonl", "sweep.csv", "sweep.svg")) {
      Path folder = Files.createDirectories(dir.resolve("of-" + name));
      Files.writeString(folder.resolve(name), "mine\n");
      Ran ran =
          Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/3", "--out", "of-" + name);
      assertThat(ran.code()).isEqualTo(2);
      assertThat(ran.err()).contains("not written by coldseam");
      assertThat(names("of-" + name)).containsExactly(name);
      assertThat(folder.resolve(name)).hasContent("mine\n");
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "                                             | needs --set",
        "--set;lamda=1..2/3                           | did you mean \"lambda\"?",
        "--set;lambda=1..2/3;--shard;0/3              | count from 1 to n",
        "--set;lambda=1..2/3;--jobs;none              | --jobs is a whole number",
        "--set;lambda=1..2/3;--variant;thin           | has no variant \"thin\"",
        "--set;lambda=-1..1/3                         | with lambda = -1: ",
        "--set;brick=marzipan                             | with brick = marzipan: ",
        "--set;lambda=1..2/3;--accuracy;psi=2%        | the accuracy of ψ is in W/(m·K)",
      })
  void bad_input_is_one_message_and_nothing_written(String typed, String why) throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    List<String> words = new ArrayList<>(List.of("sweep", "wall.yaml"));
    if (typed != null) {
      words.addAll(List.of(typed.split(";")));
    }
    Ran ran = Ran.in(dir, words.toArray(new String[0]));
    assertThat(ran.code()).isEqualTo(2);
    assertThat(ran.err()).contains(why).doesNotContain("\tat ");
    assertThat(ran.out()).isEmpty();
    assertThat(names(".")).containsExactly("wall.yaml");
  }

  /** The section falls apart at one point only when it is resolved. */
  @Test
  void a_point_that_cannot_be_solved_is_told_and_the_others_are_kept() throws IOException {
    Cases.write(
        dir,
        "wall.yaml",
        WALL.replace(
                "box: [200, 0, 300, 1000]",
                "box: ['200 + 100 * max(0, lambda - 0.3)', 0, 300, 1000]")
            .replace(
                "box: [-100, 0, 0, 1000]",
                "box: [-100, 0, '-1000 * max(0, lambda - 0.45)', 1000]"));
    Ran ran = Ran.in(dir, "sweep", "wall.yaml", "--set", "lambda=0.1..0.5/5", "--out", "s");
    assertThat(ran.code()).isEqualTo(2);
    assertThat(ran.err()).contains("wall.yaml:").contains("with lambda = 0.5: ");
    assertThat(settings(lines("s"))).contains("0.1", "0.2").doesNotContain("0.5");
  }

  @Test
  void an_accuracy_that_is_not_reached_ends_with_3() throws IOException {
    Cases.write(
        dir, "corner.yaml", Cases.CORNER.replace("view: plan", "view: plan\nvalues: {a: 1300}"));
    Ran ran =
        Ran.in(dir, "sweep", "corner.yaml", "--set", "a=1,2", "--accuracy", "psi=1e-13", "--json");
    assertThat(ran.code()).isEqualTo(3);
    assertThat(ran.err()).contains("2 of 2 points: the accuracy asked for was not reached");
  }

  @Test
  void the_bar_is_for_terminals_and_goes_away() throws IOException {
    Cases.write(dir, "wall.yaml", WALL);
    String[] args = {"sweep", "wall.yaml", "--set", "lambda=0.1..0.5/3"};
    assertThat(Ran.in(dir, Map.of(), true, args).err())
        .contains("█")
        .contains("3 of 3")
        .endsWith("\r\u001b[K");
    assertThat(Ran.in(dir, args).err()).isEmpty();
  }

  /** Starts the program in a process of its own. */
  static Process start(Path dir, Map<String, String> environment, String... args)
      throws IOException {
    List<String> command =
        new ArrayList<>(
            List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                "coldseam.cli.Main"));
    command.addAll(List.of(args));
    ProcessBuilder builder =
        new ProcessBuilder(command)
            .directory(dir.toFile())
            .redirectOutput(dir.resolve("process.out").toFile())
            .redirectError(dir.resolve("process.err").toFile());
    builder.environment().putAll(environment);
    return builder.start();
  }
}
