package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Completion as a shell does it, in a folder with files. */
class CompletionsTest {
  @TempDir Path dir;

  private static boolean there(String shell) {
    return Files.isExecutable(Path.of("/bin/" + shell))
        || Files.isExecutable(Path.of("/usr/bin/" + shell));
  }

  private String run(String... command) throws Exception {
    Path out = Files.createTempFile("completed", "");
    Process process =
        new ProcessBuilder(command)
            .directory(dir.toFile())
            .redirectErrorStream(true)
            .redirectOutput(out.toFile())
            .start();
    assertThat(process.waitFor(1, TimeUnit.MINUTES)).isTrue();
    String text = Files.readString(out);
    Files.delete(out);
    assertThat(process.exitValue()).as(text).isZero();
    return text;
  }

  /** What bash offers when the last of the words is being typed. */
  private List<String> offered(String... words) throws Exception {
    Path script = dir.resolve("script.sh");
    Files.writeString(script, Ran.in(dir, "--completion", "bash").out());
    StringBuilder typed = new StringBuilder();
    for (String word : words) {
      typed.append(" '").append(word).append('\'');
    }
    String program =
        ". ./script.sh\nCOMP_WORDS=(coldseam%s)\nCOMP_CWORD=%d\n".formatted(typed, words.length)
            + "_coldseam\nprintf '%s\\n' \"${COMPREPLY[@]}\"\n";
    return run("bash", "-c", program).lines().filter(line -> !line.isEmpty()).toList();
  }

  @Test
  void bash_offers_commands_options_and_files() throws Exception {
    assumeTrue(there("bash"), "skipped: there is no bash");
    for (String file : List.of("wall.yaml", "a case.yml", "plan.dxf", "plan.svg", "notes.txt")) {
      Files.writeString(dir.resolve(file), "");
    }
    Files.createDirectory(dir.resolve("folder"));
    assertThat(offered("so")).containsExactly("solve");
    assertThat(offered("")).contains("solve", "check", "draft", "prove", "help", "--version");
    assertThat(offered("help", "mat")).containsExactly("materials");
    assertThat(offered("--completion", "")).containsExactly("bash", "zsh");
    assertThat(offered("solve", "--v")).containsExactly("--variant", "--variants", "--vtu");
    assertThat(offered("solve", "")).containsExactlyInAnyOrder("folder", "wall.yaml", "a case.yml");
    assertThat(offered("solve", "--png", "w")).containsExactly("wall.yaml");
    assertThat(offered("draft", "plan")).containsExactlyInAnyOrder("plan.dxf", "plan.svg");
    assertThat(offered("solve", "--out", "")).containsExactly("folder");
    assertThat(offered("solve", "--out", "=", "f")).containsExactly("folder");
    assertThat(offered("solve", "--out", "=")).containsExactly("folder");
    assertThat(offered("check", "--drawing", "not")).containsExactly("notes.txt");
    assertThat(offered("solve", "--variant", "")).isEmpty();
  }

  /** Every option that a command reads, by its own help. */
  @Test
  void both_scripts_know_every_option_of_every_command() throws Exception {
    List<String> commands = new ArrayList<>();
    String overview = Ran.in(dir, "--help").out();
    overview
        .substring(overview.indexOf("Commands\n"), overview.indexOf("\nExamples"))
        .lines()
        .skip(1)
        .filter(line -> line.startsWith("  ") && line.charAt(2) != ' ')
        .forEach(line -> commands.add(line.strip().split(" ")[0]));
    assertThat(commands).hasSizeGreaterThanOrEqualTo(5);
    String zsh = Ran.in(dir, "--completion", "zsh").out();
    String man = Ran.in(dir, "--man").out();
    for (String command : commands) {
      List<String> options = new ArrayList<>();
      Ran.in(dir, command, "--help")
          .out()
          .lines()
          .filter(line -> line.startsWith("  --"))
          .forEach(line -> options.add(line.strip().split(" ")[0]));
      assertThat(options).contains("--help");
      String ofZsh = zsh.substring(zsh.indexOf("    " + command + ")\n"));
      ofZsh = ofZsh.substring(0, ofZsh.indexOf(";;"));
      String head = ".SH COLDSEAM " + command.toUpperCase(Locale.ROOT) + "\n";
      assertThat(man).contains(head);
      String ofMan = man.substring(man.indexOf(head) + 4);
      ofMan = ofMan.substring(0, ofMan.indexOf(".SH "));
      for (String option : options) {
        assertThat(ofZsh).containsPattern("'[*]?" + option + "=?\\[");
        assertThat(ofMan).contains(".B " + option.replace("-", "\\-"));
      }
      if (there("bash")) {
        assertThat(offered(command, "--")).containsExactlyInAnyOrderElementsOf(options);
      }
    }
  }

  @Test
  void zsh_understands_its_script() throws Exception {
    Path script = Files.writeString(dir.resolve("_s"), Ran.in(dir, "--completion", "zsh").out());
    assertThat(script).content(StandardCharsets.UTF_8).startsWith("#compdef coldseam\n");
    assumeTrue(there("zsh"), "skipped: there is no zsh");
    assertThat(run("zsh", "-n", script.toString())).isEmpty();
  }

  @Test
  void other_shells_are_refused() {
    assertThat(Ran.in(dir, "--completion", "tcsh").code()).isEqualTo(2);
    assertThat(Ran.in(dir, "--completion", "tcsh").err()).contains("name bash or zsh");
    assertThat(Ran.in(dir, "--completion").err()).contains("needs the name of a shell");
  }

  /** A line that begins with a point or an apostrophe would be a request of roff. */
  @Test
  void the_manual_page_has_only_requests_that_are_meant() {
    String man = Ran.in(dir, "--man").out();
    assertThat(man).startsWith(".TH COLDSEAM 1 ");
    assertThat(man.lines().filter(line -> line.startsWith(".") || line.startsWith("'")))
        .allMatch(line -> line.matches("\\.(TH|SH|B|TP|PP|br)( .*)?"));
    assertThat(man).doesNotContain("cli/coldseam").contains("licensed professional");
    assertThat(man.chars()).allMatch(c -> c == '\n' || c >= ' ' && c < 127);
  }
}
