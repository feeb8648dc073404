package coldseam.cli;

import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import java.io.IOException;
import java.io.PrintStream;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** The one place that turns what went wrong into words and an exit code. */
final class Failure {
  /** Set to anything to see the stack trace of a defect on the terminal. */
  static final String TRACE = "COLDSEAM_TRACE";

  private Failure() {}

  /**
   * Says on {@code err} what went wrong.
   *
   * @param failure what was thrown
   * @param words the command line
   * @param here where it ran
   * @return the exit code
   */
  static int report(Throwable failure, List<String> words, Surroundings here) {
    PrintStream err = here.err();
    if (failure instanceof CaseException mistakes) {
      problems(mistakes.problems(), here);
      return ExitCode.BAD_INPUT;
    }
    if (failure instanceof UsageException usage) {
      String command = usage.command().isEmpty() ? "" : " " + usage.command();
      err.println(here.errInk().bad("coldseam" + command + ": ") + here.named(usage.getMessage()));
      err.println(here.errInk().faint(here.named("cli/coldseam" + command + " --help says more")));
      return ExitCode.BAD_INPUT;
    }
    if (failure instanceof IOException io) {
      err.println(here.errInk().bad("coldseam: ") + words(io));
      return ExitCode.BAD_INPUT;
    }
    defect(failure, words, here);
    return ExitCode.DEFECT;
  }

  private static void problems(List<Problem> problems, Surroundings here) {
    for (Problem problem : problems) {
      Problem shown =
          new Problem(
              here.shown(Path.of(problem.file())),
              problem.line(),
              problem.column(),
              problem.wrong(),
              problem.right().isEmpty()
                  ? problem.right()
                  : Optional.of(here.named(problem.right().get())));
      here.err().println(shown.text());
    }
    if (problems.size() > 1) {
      here.err().println(here.errInk().faint(problems.size() + " mistakes"));
    }
  }

  /** What an input or output error is about, and why it happened. */
  static String words(IOException failure) {
    if (failure instanceof AccessDeniedException denied) {
      return denied.getFile() + ": no permission";
    }
    if (failure instanceof FileSystemException file && file.getFile() != null) {
      String reason = file.getReason() == null ? "" : ": " + file.getReason();
      return file.getFile() + reason;
    }
    return failure.getMessage() == null ? "input or output failed" : failure.getMessage();
  }

  private static void defect(Throwable failure, List<String> words, Surroundings here) {
    PrintStream err = here.err();
    if (failure instanceof OutOfMemoryError) {
      err.println(
          here.errInk().bad("coldseam: ")
              + "not enough memory; ask for less accuracy, or give the program more:"
              + " COLDSEAM_JAVA_OPTIONS=-Xmx8g");
    } else {
      err.println(
          here.errInk().bad("coldseam: ")
              + "a defect of the program, not of your case: "
              + failure.getClass().getSimpleName()
              + (failure.getMessage() == null ? "" : ": " + failure.getMessage()));
    }
    String trace = trace(failure, words);
    if (!here.environment().getOrDefault(TRACE, "").isEmpty()) {
      err.print(trace);
      return;
    }
    try {
      Path file = Files.createTempFile("coldseam-defect-", ".txt");
      Files.writeString(file, trace);
      err.println("Please report it with your case file and " + file);
    } catch (IOException e) {
      err.println("Please report it with your case file and what " + TRACE + "=1 prints");
    }
  }

  private static String trace(Throwable failure, List<String> words) {
    StringWriter text = new StringWriter();
    PrintWriter writer = new PrintWriter(text);
    writer.println("coldseam " + Main.VERSION);
    writer.println("command: " + String.join(" ", words));
    for (String key : List.of("java.vm.name", "java.version", "os.name", "os.arch")) {
      writer.println(key + ": " + System.getProperty(key));
    }
    failure.printStackTrace(writer);
    writer.flush();
    return text.toString();
  }
}
