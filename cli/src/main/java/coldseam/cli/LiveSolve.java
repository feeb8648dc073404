package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.CaseFile;
import coldseam.cases.Problem;
import coldseam.cli.live.Scene;
import coldseam.cli.plot.Plots;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.cli.text.Ink;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.LocalTime;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.FutureTask;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * Solves a case as it stands in its file, and makes of it what is shown.
 *
 * @param file the case
 * @param drawings drawings outside of its folder that it may read
 * @param variant the variant to solve, empty for the base case
 * @param typed what else was asked for
 * @param here how messages call files
 */
record LiveSolve(
    Path file,
    List<Path> drawings,
    Optional<String> variant,
    Syntax.Typed typed,
    Surroundings here) {
  private static final List<Plots.Kind> SHOWN = List.of(Plots.Kind.SECTION, Plots.Kind.TEMPERATURE);

  private static final double NANOS_PER_MS = 1e6;

  /**
   * Prepares.
   *
   * @param file the case
   * @param typed the command line
   * @param here where it was typed
   * @throws UsageException if an option is wrong, as far as that can be told before the case is
   *     read
   */
  static LiveSolve of(Path file, Syntax.Typed typed, Surroundings here) throws UsageException {
    SolveCommand.accuracy(Accuracy.STANDARD, typed);
    List<Path> drawings = new ArrayList<>();
    for (String drawing : typed.values(WatchCommand.DRAWING)) {
      drawings.add(here.cwd().resolve(CaseList.path(drawing, WatchCommand.NAME)));
    }
    Optional<String> variant =
        typed.has(WatchCommand.VARIANT)
            ? Optional.of(typed.value(WatchCommand.VARIANT))
            : Optional.empty();
    return new LiveSolve(file, drawings, variant, typed, here);
  }

  /**
   * What came of it.
   *
   * @param scene what is shown
   * @param problems what is wrong with the case; none if it was solved
   * @param json the result as data; empty unless asked for and solved
   * @param files every file it depends on
   */
  record Outcome(Scene scene, List<Problem> problems, String json, Set<Path> files) {}

  /**
   * A solve under way.
   *
   * @param begun when
   * @param task to wait for
   * @param cancelled set to end it
   */
  record Run(Instant begun, FutureTask<Outcome> task, AtomicBoolean cancelled) {
    void cancel() {
      cancelled.set(true);
    }
  }

  /** Begins to read and solve on another thread. */
  Run begin() {
    Instant begun = Instant.now();
    AtomicBoolean cancelled = new AtomicBoolean();
    FutureTask<Outcome> task = new FutureTask<>(() -> outcome(cancelled));
    Thread thread = new Thread(task, "solve");
    thread.setDaemon(true);
    thread.start();
    return new Run(begun, task, cancelled);
  }

  private Outcome outcome(AtomicBoolean cancelled) throws UsageException {
    long start = System.nanoTime();
    CaseFile.Attempt attempt = CaseFile.attempt(file, drawings);
    List<Problem> problems = attempt.problems();
    if (attempt.read().isPresent()) {
      try {
        return solved(attempt.read().get(), attempt.files(), start, cancelled);
      } catch (CaseException mistakes) {
        problems = mistakes.problems();
      }
    }
    return new Outcome(faulty(problems), problems, "", attempt.files());
  }

  private Outcome solved(Case from, Set<Path> files, long start, AtomicBoolean cancelled)
      throws CaseException, UsageException {
    if (variant.isPresent() && !from.variants().contains(variant.get())) {
      throw new CaseException(
          List.of(
              new Problem(
                  file.toString(),
                  0,
                  0,
                  "there is no variant `" + variant.get() + "`",
                  from.variants().isEmpty()
                      ? Optional.empty()
                      : Optional.of("there are " + String.join(", ", from.variants())))));
    }
    Accuracy accuracy = SolveCommand.accuracy(from.accuracy(), typed);
    Subject subject = Subject.of(from, here.shown(file), variant, accuracy, Main.VERSION);
    SolveCommand.Solving solving =
        new SolveCommand.Solving(
            accuracy, (stage, pass, unknowns, relativeError) -> !cancelled.get());
    Result result = CaseList.work(from, variant, solving);
    Plots plots = Plots.of(result, new Plots.Caption(variant, from.unit(), from.metresPerUnit()));
    Map<String, String> pictures = new LinkedHashMap<>();
    plots.svgs(SHOWN).forEach((kind, svg) -> pictures.put(kind.stem(), svg));
    List<String> remarks = new ArrayList<>(Sheet.accuracyMissed(subject, result));
    remarks.addAll(Sheet.requirementsMissed(result));
    String card = Sheet.card(subject, result, Ink.NONE);
    String json = typed.has(WatchCommand.JSON) ? Sheet.json(subject, result, false) : "";
    long ms = Math.round((System.nanoTime() - start) / NANOS_PER_MS);
    Scene scene =
        new Scene(
            Scene.State.SOLVED,
            from.title() + variant.map(name -> ", " + name).orElse(""),
            here.shown(file),
            time() + "  solved in " + ms + " ms",
            pictures,
            card,
            remarks,
            List.of());
    return new Outcome(scene, List.of(), json, files);
  }

  private static String time() {
    return LocalTime.now().truncatedTo(ChronoUnit.SECONDS).toString();
  }

  /** A scene without a picture. */
  Scene solving() {
    String shown = here.shown(file);
    return new Scene(Scene.State.SOLVING, shown, shown, "", Map.of(), "", List.of(), List.of());
  }

  private Scene faulty(List<Problem> problems) {
    List<Scene.Mistake> mistakes = new ArrayList<>();
    for (Problem problem : problems) {
      mistakes.add(mistake(problem));
    }
    return faultyWith(mistakes);
  }

  private Scene faultyWith(List<Scene.Mistake> mistakes) {
    String shown = here.shown(file);
    return new Scene(
        Scene.State.FAULTY,
        shown,
        shown,
        time() + "  not solved",
        Map.of(),
        "",
        List.of(),
        mistakes);
  }

  /** What is shown if the program itself is at fault. */
  Scene faulty(Throwable defect) {
    String words =
        defect instanceof UsageException
            ? defect.getMessage()
            : "a defect of the program, not of your case: " + defect;
    return faultyWith(
        List.of(new Scene.Mistake("", words, "see the terminal for what to report", "")));
  }

  private Scene.Mistake mistake(Problem problem) {
    StringBuilder place = new StringBuilder(here.shown(Path.of(problem.file())));
    if (problem.line() > 0) {
      place.append(':').append(problem.line());
      if (problem.column() > 0) {
        place.append(':').append(problem.column());
      }
    }
    return new Scene.Mistake(
        place.toString(),
        problem.wrong(),
        here.named(problem.right().orElse("")),
        line(Path.of(problem.file()), problem.line()));
  }

  /** A line of a file, empty if there is none. */
  private static String line(Path file, int number) {
    if (number < 1) {
      return "";
    }
    try {
      String text = new String(Files.readAllBytes(file), StandardCharsets.UTF_8);
      return text.lines().skip(number - 1L).findFirst().orElse("");
    } catch (IOException e) {
      return "";
    }
  }
}
