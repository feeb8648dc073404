package coldseam.cli;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;

/**
 * A run of the program inside the test, with what it printed.
 *
 * @param code the exit code
 * @param out standard output
 * @param err standard error
 */
record Ran(int code, String out, String err) {
  /** Runs the program in a folder, nobody looking on. */
  static Ran in(Path cwd, String... args) {
    return in(cwd, Map.of(), false, args);
  }

  /** Runs the program in a folder. */
  static Ran in(Path cwd, Map<String, String> environment, boolean terminal, String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code =
        Main.run(
            args,
            new Surroundings(
                new PrintStream(out, true, StandardCharsets.UTF_8),
                new PrintStream(err, true, StandardCharsets.UTF_8),
                cwd,
                environment,
                terminal,
                terminal,
                Optional.of(Root.folder())));
    return new Ran(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }
}
