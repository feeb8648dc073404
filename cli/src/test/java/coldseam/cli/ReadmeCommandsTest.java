package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the documents tell a reader to type does what it should, in a copy of the shipped cases. */
class ReadmeCommandsTest {
  private static final Pattern WORD = Pattern.compile("\"([^\"]*)\"|(\\S+)");

  @TempDir Path dir;

  @Test
  void the_commands_of_the_readme() throws Exception {
    run(commands(List.of(Root.folder().resolve("README.md")), "", 8));
  }

  @Test
  void the_commands_at_the_head_of_every_shipped_case() throws Exception {
    List<Path> shipped = new ArrayList<>();
    for (String folder : List.of("cases/demo", "cases/published", "cases/windows")) {
      try (Stream<Path> files = Files.list(Root.folder().resolve(folder))) {
        files.filter(file -> file.toString().endsWith(".yaml")).sorted().forEach(shipped::add);
      }
    }
    for (Path file : shipped) {
      assertThat(Files.readString(file))
          .as("%s names its command", file)
          .contains("#   cli/coldseam ");
    }
    run(commands(shipped, "#", shipped.size()));
  }

  private void run(Set<String> commands) throws Exception {
    copyCases();
    for (String command : commands) {
      if (command.contains(" watch ")) {
        follow(words(command));
        continue;
      }
      Ran ran = Ran.in(dir, words(command));
      assertThat(ran.code()).as("%s: %s", command, ran.err()).isEqualTo(ending(command));
      assertThat(ran.out()).as(command).isNotBlank();
    }
  }

  /** The exit code that a remark behind the command announces, else 0. */
  private static int ending(String command) {
    int at = command.indexOf("# ends with ");
    return at < 0 ? 0 : Integer.parseInt(command.substring(at + 12).strip());
  }

  /** The command that goes on until it is stopped. */
  private void follow(String[] words) throws Exception {
    try (Watching watching = new Watching(dir, Arrays.copyOfRange(words, 1, words.length))) {
      assertThat(watching.scene().get("state").textValue()).isEqualTo("solved");
    }
  }

  /** Command lines of our program; at the start of a line, after a mark and blanks. */
  private static Set<String> commands(List<Path> documents, String mark, int least)
      throws IOException {
    Set<String> commands = new LinkedHashSet<>();
    for (Path document : documents) {
      for (String line : Files.readAllLines(document)) {
        String text = line.startsWith(mark) ? line.substring(mark.length()).strip() : "";
        if (text.startsWith("cli/coldseam ")) {
          commands.add(text);
        }
      }
    }
    assertThat(commands).hasSizeGreaterThanOrEqualTo(least);
    return commands;
  }

  private static String[] words(String command) {
    List<String> words = new ArrayList<>();
    Matcher matcher = WORD.matcher(command.replaceFirst(" +#.*", ""));
    while (matcher.find()) {
      words.add(matcher.group(1) != null ? matcher.group(1) : matcher.group(2));
    }
    return words.subList(1, words.size()).toArray(new String[0]);
  }

  private void copyCases() throws IOException {
    Path from = Root.folder().resolve("cases");
    for (String folder : List.of("demo", "demo/drawings", "published", "windows")) {
      Path to = Files.createDirectories(dir.resolve("cases").resolve(folder));
      try (Stream<Path> files = Files.list(from.resolve(folder))) {
        for (Path file : files.filter(Files::isRegularFile).toList()) {
          Files.copy(file, to.resolve(file.getFileName()));
        }
      }
    }
  }
}
