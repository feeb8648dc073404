package coldseam.cli;

import coldseam.cases.CaseException;
import coldseam.cases.CaseFile;
import coldseam.cases.WindowFile;
import coldseam.cases.building.BuildingFile;
import coldseam.cli.live.LivePage;
import java.io.IOException;
import java.net.BindException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Set;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;

/** Solves a case at every save and shows it in the browser. */
final class WatchCommand implements Command {
  static final String NAME = "watch";
  static final String VARIANT = "--variant";
  static final String ACCURACY = "--accuracy";
  static final String DRAWING = "--drawing";
  static final String JSON = "--json";
  private static final String PORT = "--port";
  private static final String QUIET = "--quiet";

  /** Time between two looks at the files, ms; a save is taken when two looks agree. */
  private static final long LOOK_MS = 60;

  private static final int MOST_PORTS = 65_535;

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "solve a case at every save, live picture in the browser",
        "CASE",
        1,
        "Solves the case and shows its section, temperatures and card on a page of this machine,"
            + " whose link is printed; open it in a browser. Whenever the case is saved, or a"
            + " drawing or another case that it names, it is solved again and the page shows what"
            + " came of it: the new pictures, or every mistake with its line in their place. Nothing"
            + " is written, and nobody else can open the page. Ctrl-C ends it.",
        List.of(
            new Syntax.Option(PORT, "N", "serve the page at this port; any free one if not given"),
            new Syntax.Option(VARIANT, "NAME", "show this variant instead of the base case"),
            new Syntax.Option(
                ACCURACY,
                "LIST",
                "half-widths instead of those of the case, e.g." + " L2D=0.02%,psi=0.0002,U=0.1%"),
            new Syntax.Option(
                DRAWING, "FILE", "a drawing outside of the case's folder that it may read"),
            new Syntax.Option(
                JSON, "", "print the result of every solve as data, one object on one line"),
            new Syntax.Option(QUIET, "", "print the link only")),
        List.of(
            new Syntax.Example(
                "cli/coldseam watch cases/demo/balcony.yaml",
                "prints a link to the live picture and follows the file until Ctrl-C"),
            new Syntax.Example(
                "cli/coldseam watch cases/demo/balcony.yaml --variant \"thermal break\" --port 4711",
                "follows one variant, always at the same link")));
  }

  @Override
  public int run(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    Path file = file(typed, here);
    LiveSolve solve = LiveSolve.of(file, typed, here);
    int port = port(typed);
    try (LivePage page = open(port)) {
      Thread atTheEnd = new Thread(page::close, "end of watch");
      Runtime.getRuntime().addShutdownHook(atTheEnd);
      say(typed.has(JSON), here, here.shown(file) + ": " + page.address() + "  Ctrl-C ends");
      try {
        follow(file, solve, page, typed, here);
      } catch (InterruptedException e) {
        // That is how it ends where there is no Ctrl-C.
        Runtime.getRuntime().removeShutdownHook(atTheEnd);
      }
    }
    return ExitCode.DONE;
  }

  private static Path file(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException {
    if (typed.operands().size() > 1) {
      throw new UsageException(NAME, "follows one case; start it again for another");
    }
    String name = typed.operands().get(0);
    Path file = here.cwd().resolve(CaseList.path(name, NAME));
    if (WindowFile.is(file) || BuildingFile.is(file)) {
      throw new UsageException(NAME, name + " has no section to show; name one of its cases");
    }
    if (!Files.isRegularFile(file)) {
      // Says what is there instead.
      CaseFile.read(file);
    }
    return file;
  }

  private static int port(Syntax.Typed typed) throws UsageException {
    if (!typed.has(PORT)) {
      return 0;
    }
    try {
      int port = Integer.parseInt(typed.value(PORT));
      if (port > 0 && port <= MOST_PORTS) {
        return port;
      }
    } catch (NumberFormatException e) {
      throw noPort(typed.value(PORT));
    }
    throw noPort(typed.value(PORT));
  }

  private static UsageException noPort(String value) {
    return new UsageException(NAME, value + " is no port: a number from 1 to " + MOST_PORTS);
  }

  private static LivePage open(int port) throws UsageException, IOException {
    try {
      return LivePage.open(port);
    } catch (BindException e) {
      throw new UsageException(
          NAME, "port " + port + " cannot be had (" + e.getMessage() + "); choose another");
    }
  }

  private static void say(boolean aside, Surroundings here, String words) {
    (aside ? here.err() : here.out()).println(words);
    (aside ? here.err() : here.out()).flush();
  }

  /** Looks, solves and shows until interrupted. */
  private static void follow(
      Path file, LiveSolve solve, LivePage page, Syntax.Typed typed, Surroundings here)
      throws InterruptedException {
    WatchedFiles files = new WatchedFiles();
    files.watch(Set.of(file), Instant.MAX);
    LiveSolve.Run run = begin(solve, page);
    try {
      while (true) {
        if (run != null && run.task().isDone()) {
          conclude(run, solve, files, page, typed, here);
          run = null;
        }
        Thread.sleep(LOOK_MS);
        if (files.changed()) {
          if (run != null) {
            run.cancel();
          }
          files.take();
          run = begin(solve, page);
        }
      }
    } finally {
      if (run != null) {
        run.cancel();
      }
    }
  }

  private static LiveSolve.Run begin(LiveSolve solve, LivePage page) {
    page.show(solve.solving());
    return solve.begin();
  }

  private static void conclude(
      LiveSolve.Run run,
      LiveSolve solve,
      WatchedFiles files,
      LivePage page,
      Syntax.Typed typed,
      Surroundings here)
      throws InterruptedException {
    FutureTask<LiveSolve.Outcome> task = run.task();
    try {
      LiveSolve.Outcome outcome = task.get();
      files.watch(outcome.files(), run.begun());
      page.show(outcome.scene());
      if (outcome.problems().isEmpty()) {
        if (typed.has(JSON)) {
          here.out().println(outcome.json());
          here.out().flush();
        }
        if (!typed.has(QUIET)) {
          say(typed.has(JSON), here, outcome.scene().told());
        }
      } else {
        Failure.report(new CaseException(outcome.problems()), List.of(NAME), here);
        here.err().flush();
      }
    } catch (ExecutionException e) {
      if (!(e.getCause() instanceof CancellationException)) {
        Failure.report(e.getCause(), List.of(NAME, solve.file().toString()), here);
        here.err().flush();
        page.show(solve.faulty(e.getCause()));
      }
    }
  }
}
