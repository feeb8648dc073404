package coldseam.cli;

import coldseam.cases.CaseException;
import coldseam.cases.WindowCase;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.cli.sheet.WindowSubject;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import coldseam.solver.window.Window;
import coldseam.solver.window.WindowTransmittance;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Solves the cases a window takes figures from, and adds them up. */
final class WindowJobs {
  private WindowJobs() {}

  /** Changes the accuracy of a case by what was typed on the command line. */
  @FunctionalInterface
  interface Asked {
    /**
     * The accuracy asked for.
     *
     * @param ofCase what the case asks for
     * @return what is asked for in its place
     * @throws UsageException if what was typed cannot be read
     */
    Accuracy of(Accuracy ofCase) throws UsageException;
  }

  /**
   * A window with its outcome, and what was not reached, a line each.
   *
   * @param subject for the sheets
   * @param missed lines; none if everything was reached
   */
  record Outcome(WindowSubject subject, List<String> missed) {}

  /**
   * Solves.
   *
   * @param from the window
   * @param asked accuracy of its cases
   * @param here where names are shown from
   * @param progress whether a line of progress may be shown
   * @return U_w
   * @throws CaseException if a case or the window is at fault
   * @throws UsageException if the accuracy cannot be read
   */
  static Outcome solve(WindowCase from, Asked asked, Surroundings here, boolean progress)
      throws CaseException, UsageException {
    List<Result> results = new ArrayList<>();
    List<WindowSubject.Part> parts = new ArrayList<>();
    List<String> missed = new ArrayList<>();
    for (WindowCase.Part part : from.parts()) {
      Accuracy accuracy = asked.of(part.from().accuracy());
      Result result = solve(part, accuracy, here, progress);
      Subject subject =
          Subject.of(
              part.from(), here.shown(part.from().file()), part.variant(), accuracy, Main.VERSION);
      boolean reached = Sheet.accurateEnough(subject, result);
      if (!reached) {
        for (String line : Sheet.accuracyMissed(subject, result)) {
          missed.add(part.name() + ": " + line);
        }
      }
      results.add(result);
      parts.add(new WindowSubject.Part(part.name(), reached, result.unknowns()));
    }
    Window window = from.window(results);
    WindowTransmittance transmittance = from.transmittance(window);
    return new Outcome(
        new WindowSubject(
            subject(from, here),
            window,
            transmittance,
            parts,
            from.assumptions(),
            from.warnings(results)),
        missed);
  }

  private static Subject subject(WindowCase from, Surroundings here) {
    return new Subject(
        from.title(),
        here.shown(from.file()),
        Optional.empty(),
        from.unit(),
        from.metresPerUnit(),
        Accuracy.STANDARD,
        Main.VERSION);
  }

  /**
   * Resolves the cases of a window without solving, and says what is understood.
   *
   * @param from the window
   * @param json as data instead of text
   * @param here where names are shown from
   * @return lines, each ended by a line feed
   * @throws CaseException if a case is at fault
   */
  static String understood(WindowCase from, boolean json, Surroundings here) throws CaseException {
    List<String> names = new ArrayList<>();
    for (WindowCase.Part part : from.parts()) {
      CaseList.work(part.from(), part.variant(), Solver::inspect);
      names.add(part.name());
    }
    Subject subject = subject(from, here);
    return json
        ? Sheet.understoodJson(subject, names, from.assumptions()) + "\n"
        : Sheet.understood(subject, names, from.assumptions(), here.outInk());
  }

  private static Result solve(
      WindowCase.Part part, Accuracy accuracy, Surroundings here, boolean shown)
      throws CaseException {
    if (!shown) {
      return CaseList.work(
          part.from(), part.variant(), new SolveCommand.Solving(accuracy, Progress.SILENT));
    }
    try (ProgressLine progress = new ProgressLine(here.err(), part.name())) {
      return CaseList.work(
          part.from(), part.variant(), new SolveCommand.Solving(accuracy, progress));
    }
  }
}
