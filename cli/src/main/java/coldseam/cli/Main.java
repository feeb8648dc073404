package coldseam.cli;

import coldseam.cli.text.Table;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The program. Only here does the process end. */
public final class Main {
  /** The version, as in the build. */
  static final String VERSION = "0.1.0-SNAPSHOT";

  /** What it is for, in one line. */
  static final String PURPOSE =
      "heat flow, ψ, U and surface temperatures of building junctions in two dimensions";

  private static final List<String> NAMES =
      List.of(
          "solve",
          "check",
          "compare",
          "sweep",
          "seek",
          "draft",
          "materials",
          "prove",
          "ledger",
          "watch");

  private Main() {}

  /**
   * Runs the program and ends the process.
   *
   * <p>System properties tell what only the launcher knows: {@code coldseam.home}, the folder with
   * {@code cases}; {@code coldseam.program}, how the program is started; {@code coldseam.out} and
   * {@code coldseam.err}, {@code terminal} if somebody looks at that stream.
   *
   * @param args what was typed
   */
  public static void main(String[] args) {
    PrintStream out = stream(FileDescriptor.out);
    PrintStream err = stream(FileDescriptor.err);
    String home = System.getProperty("coldseam.home", "");
    int code =
        run(
            args,
            new Surroundings(
                out,
                err,
                Path.of("").toAbsolutePath(),
                System.getenv(),
                "terminal".equals(System.getProperty("coldseam.out")),
                "terminal".equals(System.getProperty("coldseam.err")),
                home.isEmpty() ? Optional.empty() : Optional.of(Path.of(home)),
                System.getProperty("coldseam.program", Surroundings.IN_SOURCES)));
    out.flush();
    err.flush();
    System.exit(code);
  }

  private static PrintStream stream(FileDescriptor descriptor) {
    return new PrintStream(new FileOutputStream(descriptor), false, StandardCharsets.UTF_8);
  }

  /**
   * Runs the program without ending the process.
   *
   * @param args what was typed
   * @param out for results
   * @param err for messages
   * @param cwd the folder that relative paths start from
   * @param environment environment variables
   * @param home the folder with {@code cases}
   * @return the exit code
   */
  public static int run(
      String[] args,
      PrintStream out,
      PrintStream err,
      Path cwd,
      Map<String, String> environment,
      Path home) {
    return run(args, new Surroundings(out, err, cwd, environment, false, false, Optional.of(home)));
  }

  static int run(String[] args, Surroundings here) {
    List<String> words = List.of(args);
    try {
      return dispatch(words, here);
    } catch (Throwable failure) {
      return Failure.report(failure, words, here);
    }
  }

  private static int dispatch(List<String> words, Surroundings here) throws Exception {
    if (words.isEmpty()) {
      here.err().print(here.named(overview()));
      return ExitCode.BAD_INPUT;
    }
    String name = words.get(0);
    List<String> rest = words.subList(1, words.size());
    switch (name) {
      case "--version" -> {
        here.out().println(version());
        return ExitCode.DONE;
      }
      case "--help", "-h" -> {
        here.out().print(here.named(overview()));
        return ExitCode.DONE;
      }
      case "--completion" -> {
        if (rest.size() != 1) {
          throw new UsageException("", "--completion needs the name of a shell: bash or zsh");
        }
        here.out().print(new Completions(syntaxes()).script(rest.get(0)));
        return ExitCode.DONE;
      }
      case "--man" -> {
        here.out().print(ManualPage.of(syntaxes()));
        return ExitCode.DONE;
      }
      case "help" -> {
        String text = rest.isEmpty() ? overview() : command(rest.get(0)).syntax().help();
        here.out().print(here.named(text));
        return ExitCode.DONE;
      }
      default -> {
        Command command = command(name);
        Syntax.Typed typed = command.syntax().read(rest);
        if (typed.has("--help")) {
          here.out().print(here.named(command.syntax().help()));
          return ExitCode.DONE;
        }
        return command.run(typed, here);
      }
    }
  }

  private static Command command(String name) throws UsageException {
    return switch (name) {
      case "solve" -> new SolveCommand();
      case "check" -> new CheckCommand();
      case "draft" -> new DraftCommand();
      case "compare" -> new CompareCommand();
      case "sweep" -> new SweepCommand();
      case "seek" -> new SeekCommand();
      case "materials" -> new MaterialsCommand();
      case "prove" -> new ProveCommand();
      case "ledger" -> new LedgerCommand();
      case "watch" -> new WatchCommand();
      default -> throw unknown(name);
    };
  }

  private static List<Syntax> syntaxes() throws UsageException {
    List<Syntax> syntaxes = new ArrayList<>();
    for (String name : NAMES) {
      syntaxes.add(command(name).syntax());
    }
    return syntaxes;
  }

  /** The version, and the licences of the program and of what it comes with. */
  static String version() throws IOException {
    try (InputStream notice = Main.class.getResourceAsStream("/coldseam/NOTICE")) {
      String text = new String(notice.readAllBytes(), StandardCharsets.UTF_8);
      return "coldseam " + VERSION + text.substring(text.indexOf('\n')).stripTrailing();
    }
  }

  private static UsageException unknown(String name) {
    String right;
    if (name.endsWith(".yaml") || name.endsWith(".yml")) {
      right = "did you mean: cli/coldseam solve " + name;
    } else if (name.startsWith("-")) {
      right = "options stand after the command, e.g. cli/coldseam solve CASE " + name;
    } else {
      right =
          Nearest.of(name, NAMES)
              .map(near -> "did you mean " + near + "?")
              .orElse("there are " + String.join(", ", NAMES));
    }
    return new UsageException("", name + " is no command; " + right);
  }

  private static String overview() throws UsageException {
    Table commands = new Table("ll", 2, 84);
    List<String> examples = new ArrayList<>();
    for (String name : NAMES) {
      Syntax syntax = command(name).syntax();
      commands.row((name + " " + syntax.operands()).strip(), syntax.summary());
      examples.add("  " + syntax.examples().get(0).line() + "\n");
    }
    return "coldseam "
        + VERSION
        + ": "
        + PURPOSE
        + "\n\n"
        + "  cli/coldseam COMMAND [OPTION…] …\n\n"
        + "Commands\n"
        + commands.text()
        + "\nExamples\n"
        + String.join("", examples)
        + "\nEvery command has --help, --json for machines and --quiet. Of the program: --version and"
        + "\nlicences, --man the manual page, --completion bash or zsh a script for that shell."
        + "\nExit codes: 0 done; 1 done, but a stated requirement is not met; 2 bad input or usage;"
        + "\n3 accuracy not reached; 70 a defect of the program.\n";
  }
}
