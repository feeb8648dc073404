package coldseam.cli;

import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import coldseam.cases.WindowCase;
import coldseam.cases.WindowFile;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.WindowSubject;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A window file that {@code solve} was given.
 *
 * @param from the window
 * @param folder where its data go
 */
record WindowSolve(WindowCase from, Optional<OutputFolder> folder) {
  /** Files written for a window: data, then the table. */
  private static final List<String> FILES = List.of("result.json", "result.csv");

  /**
   * Reads window files.
   *
   * @param windows their names as typed
   * @param cases names of the other files, whose mistakes are reported with theirs
   * @param typed what was typed
   * @param here where it was typed
   * @param taken folders that are written to already
   * @return the windows
   * @throws CaseException with the mistakes of all files
   * @throws UsageException if an option does not suit a window, or a folder is taken
   * @throws IOException if a folder cannot be read
   */
  static List<WindowSolve> read(
      List<String> windows,
      List<String> cases,
      Syntax.Typed typed,
      Surroundings here,
      Map<Path, String> taken)
      throws UsageException, CaseException, IOException {
    if (typed.has(SolveCommand.VARIANT)) {
      throw new UsageException(
          SolveCommand.NAME, windows.get(0) + " is a window file, which has no variants");
    }
    List<WindowSolve> jobs = new ArrayList<>();
    List<Problem> problems = new ArrayList<>();
    for (String window : windows) {
      try {
        WindowCase from =
            WindowFile.read(here.cwd().resolve(CaseList.path(window, SolveCommand.NAME)));
        Optional<OutputFolder> folder =
            SolveCommand.folder(from.file(), Optional.empty(), typed, here, taken);
        if (folder.isPresent()) {
          folder.get().check(FILES);
        }
        jobs.add(new WindowSolve(from, folder));
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
      }
    }
    if (!problems.isEmpty()) {
      try {
        CaseList.read(cases, SolveCommand.NAME, here);
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
      }
      throw new CaseException(problems);
    }
    return jobs;
  }

  /**
   * Solves, prints and writes.
   *
   * @param typed what was typed
   * @param here where it was typed
   * @param first whether nothing was printed before
   * @return the exit code
   * @throws UsageException if an option cannot be read or the folder takes nothing
   * @throws CaseException if a case or the window is at fault
   */
  int conclude(Syntax.Typed typed, Surroundings here, boolean first)
      throws UsageException, CaseException {
    WindowJobs.Outcome outcome =
        WindowJobs.solve(
            from,
            ofCase -> SolveCommand.accuracy(ofCase, typed),
            here,
            here.errIsTerminal() && !typed.has(SolveCommand.QUIET));
    WindowSubject subject = outcome.subject();
    if (folder.isPresent()) {
      Map<String, byte[]> files = new LinkedHashMap<>();
      files.put(FILES.get(0), SolveCommand.bytes(Sheet.json(subject, true) + "\n"));
      files.put(FILES.get(1), SolveCommand.bytes(Sheet.csv(subject)));
      SolveCommand.write(folder.get(), files);
    }
    if (typed.has(SolveCommand.JSON)) {
      here.out().println(Sheet.json(subject, false));
    } else if (!typed.has(SolveCommand.QUIET)) {
      here.out().print((first ? "" : "\n\n") + Sheet.card(subject, here.outInk()));
    }
    if (folder.isPresent() && !typed.has(SolveCommand.QUIET)) {
      (typed.has(SolveCommand.JSON) ? here.err() : here.out())
          .println("Written to " + folder.get().shown() + "/: " + String.join(", ", FILES));
    }
    if (outcome.missed().isEmpty()) {
      return ExitCode.DONE;
    }
    String file = subject.subject().file();
    here.err().println(here.errInk().alert(file + ": the accuracy asked for was not reached"));
    for (String line : outcome.missed()) {
      here.err().println("  " + line);
    }
    return ExitCode.ACCURACY;
  }
}
