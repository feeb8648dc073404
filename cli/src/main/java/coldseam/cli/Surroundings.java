package coldseam.cli;

import coldseam.cli.text.Ink;
import java.io.PrintStream;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;

/**
 * Where a command runs.
 *
 * @param out for results
 * @param err for messages and progress
 * @param cwd the folder that relative paths start from
 * @param environment environment variables
 * @param outIsTerminal whether somebody looks at {@code out}
 * @param errIsTerminal whether somebody looks at {@code err}
 * @param home the folder of the program with its {@code cases}, if known
 * @param program how the user starts the program: {@code cli/coldseam} in its sources
 */
record Surroundings(
    PrintStream out,
    PrintStream err,
    Path cwd,
    Map<String, String> environment,
    boolean outIsTerminal,
    boolean errIsTerminal,
    Optional<Path> home,
    String program) {
  /** How the program is started in its sources, and called in texts until it is known better. */
  static final String IN_SOURCES = "cli/coldseam";

  /** Surroundings in the sources of the program. */
  Surroundings(
      PrintStream out,
      PrintStream err,
      Path cwd,
      Map<String, String> environment,
      boolean outIsTerminal,
      boolean errIsTerminal,
      Optional<Path> home) {
    this(out, err, cwd, environment, outIsTerminal, errIsTerminal, home, IN_SOURCES);
  }

  /** A text of ours that calls the program as the user does. */
  String named(String text) {
    return named(text, program);
  }

  /**
   * A text of ours that calls the program so.
   *
   * @param text the text, with the name it has in the sources
   * @param program the name
   * @return the text
   */
  static String named(String text, String program) {
    return program.equals(IN_SOURCES) ? text : text.replace(IN_SOURCES + " ", program + " ");
  }

  /** How to print on {@code out}: in colour on a terminal, unless NO_COLOR is set. */
  Ink outInk() {
    return outIsTerminal && colour() ? Ink.TERMINAL : Ink.NONE;
  }

  /** How to print on {@code err}. */
  Ink errInk() {
    return errIsTerminal && colour() ? Ink.TERMINAL : Ink.NONE;
  }

  private boolean colour() {
    return environment.getOrDefault("NO_COLOR", "").isEmpty()
        && !environment.getOrDefault("TERM", "").equals("dumb");
  }

  /**
   * A file as the user would name it: relative to the folder worked in where it lies below or near
   * it.
   *
   * @param file the file
   * @return the name, with forward slashes
   */
  String shown(Path file) {
    Path absolute = cwd.resolve(file).normalize();
    Path base = cwd.normalize();
    boolean near =
        absolute.getRoot() != null
            && absolute.getRoot().equals(base.getRoot())
            && (absolute.startsWith(base)
                || base.getParent() != null && absolute.startsWith(base.getParent()));
    Path shown = near ? base.relativize(absolute) : absolute;
    return shown.toString().isEmpty() ? "." : shown.toString().replace('\\', '/');
  }
}
