package coldseam.cli;

import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import coldseam.cases.building.Building;
import coldseam.cases.building.BuildingAccount;
import coldseam.cases.building.BuildingFile;
import coldseam.cli.plot.LedgerPlot;
import coldseam.cli.plot.NoFontException;
import coldseam.cli.sheet.LedgerSubject;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.cli.sheet.WindowSubject;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Draws up the ledger of buildings: junction schedule, H_T, signed account, figure. */
final class LedgerCommand implements Command {
  private static final String NAME = "ledger";
  private static final String OUT = "--out";
  private static final String JSON = "--json";
  private static final String PNG = "--png";
  private static final String NO_PLOTS = "--no-plots";
  private static final String QUIET = "--quiet";
  private static final String ACCURACY = "--accuracy";
  private static final String MOST_UNKNOWNS = "--most-unknowns";

  private static final String DATA = "ledger.json";
  private static final String ACCOUNT = "ledger.csv";
  private static final String SCHEDULE = "schedule.csv";
  private static final String FIGURE = "ledger.svg";
  private static final String PIXELS = "ledger.png";

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "junction schedule and heat ledger of a whole building",
        "BUILDING…",
        1,
        "Reads a building file, solves the cases it takes ψ from, and prints the junction schedule,"
            + " H_T, what junctions amount to, and a signed account of heat over the boundary in a"
            + " period: in positive, out negative, sum zero. A design is closed by what has to be"
            + " bought; with meters, the account shows what the data does not explain. Data and"
            + " figure go to a folder beside the file, house.coldseam for house.yaml: ledger.json,"
            + " ledger.csv, schedule.csv, ledger.svg.",
        List.of(
            new Syntax.Option(
                OUT, "FOLDER", "where data and figure go; with several files, a folder for each"),
            new Syntax.Option(
                JSON,
                "",
                "print the ledger as data, one object on one line for each building; without --out"
                    + " no file is written"),
            new Syntax.Option(PNG, "", "write the figure as PNG too"),
            new Syntax.Option(NO_PLOTS, "", "write data only"),
            new Syntax.Option(
                ACCURACY, "LIST", "half-widths instead of those of the cases, e.g. psi=0.0002"),
            new Syntax.Option(
                MOST_UNKNOWNS,
                "N",
                "stop refining a case at this size; ends with 3 if its accuracy is not reached by"
                    + " then"),
            new Syntax.Option(QUIET, "", "print no card; files are written all the same")),
        List.of(
            new Syntax.Example(
                "cli/coldseam ledger cases/demo/house.yaml",
                "prints the ledger, writes data and figure to cases/demo/house.coldseam/"),
            new Syntax.Example(
                "cli/coldseam ledger cases/demo/house-metered.yaml --json",
                "prints one line of JSON, writes nothing")));
  }

  /** A building with the folder its files go to. */
  private record Job(Building from, Optional<OutputFolder> folder) {}

  @Override
  public int run(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    if (typed.has(PNG) && typed.has(NO_PLOTS)) {
      throw new UsageException(NAME, "--png and --no-plots exclude each other");
    }
    if (typed.has(PNG) && typed.has(JSON) && !typed.has(OUT)) {
      throw new UsageException(NAME, "--json writes no files unless --out says where: add --out");
    }
    int code = ExitCode.DONE;
    boolean first = true;
    for (Job job : jobs(typed, here)) {
      code = ExitCode.worse(code, conclude(job, typed, here, first));
      first = false;
    }
    return code;
  }

  private static List<Job> jobs(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    List<Job> jobs = new ArrayList<>();
    List<Problem> problems = new ArrayList<>();
    Map<Path, String> taken = new LinkedHashMap<>();
    for (String name : typed.operands()) {
      try {
        Building from = BuildingFile.read(here.cwd().resolve(CaseList.path(name, NAME)));
        Optional<OutputFolder> folder =
            SolveCommand.folder(from.file(), Optional.empty(), typed, here, taken);
        if (folder.isPresent()) {
          folder.get().check(names(typed));
        }
        jobs.add(new Job(from, folder));
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
      } catch (UsageException e) {
        throw new UsageException(NAME, e.getMessage());
      }
    }
    if (!problems.isEmpty()) {
      throw new CaseException(problems);
    }
    return jobs;
  }

  private static int conclude(Job job, Syntax.Typed typed, Surroundings here, boolean first)
      throws UsageException, CaseException {
    List<String> missed = new ArrayList<>();
    LedgerSubject subject = account(job.from(), typed, here, missed);
    if (job.folder().isPresent()) {
      try {
        SolveCommand.write(job.folder().get(), files(subject, typed));
      } catch (UsageException e) {
        throw new UsageException(NAME, e.getMessage());
      }
    }
    if (typed.has(JSON)) {
      here.out().println(Sheet.json(subject, false));
    } else if (!typed.has(QUIET)) {
      here.out().print((first ? "" : "\n\n") + Sheet.card(subject, here.outInk()));
    }
    if (job.folder().isPresent() && !typed.has(QUIET)) {
      (typed.has(JSON) ? here.err() : here.out())
          .println(
              "Written to " + job.folder().get().shown() + "/: " + String.join(", ", names(typed)));
    }
    if (missed.isEmpty()) {
      return ExitCode.DONE;
    }
    String file = subject.subject().file();
    here.err().println(here.errInk().alert(file + ": the accuracy asked for was not reached"));
    for (String line : missed) {
      here.err().println("  " + line);
    }
    return ExitCode.ACCURACY;
  }

  private static LedgerSubject account(
      Building from, Syntax.Typed typed, Surroundings here, List<String> missed)
      throws CaseException, UsageException {
    List<Result> results = new ArrayList<>();
    List<WindowSubject.Part> parts = new ArrayList<>();
    for (Building.Part part : from.parts()) {
      Accuracy accuracy = accuracy(part, typed);
      Result result = solve(part, accuracy, typed, here);
      Subject of =
          Subject.of(
              part.from(), here.shown(part.from().file()), part.variant(), accuracy, Main.VERSION);
      for (String line : Sheet.accuracyMissed(of, result)) {
        missed.add(part.name() + ": " + line);
      }
      boolean reached = Sheet.accurateEnough(of, result);
      results.add(result);
      parts.add(new WindowSubject.Part(part.name(), reached, result.unknowns()));
    }
    BuildingAccount account = from.account(results);
    return new LedgerSubject(subject(from, here), account, parts, from.assumptions());
  }

  private static Accuracy accuracy(Building.Part part, Syntax.Typed typed) throws UsageException {
    try {
      return SolveCommand.accuracy(part.from().accuracy(), typed);
    } catch (UsageException e) {
      throw new UsageException(NAME, e.getMessage());
    }
  }

  private static Result solve(
      Building.Part part, Accuracy accuracy, Syntax.Typed typed, Surroundings here)
      throws CaseException {
    if (!here.errIsTerminal() || typed.has(QUIET)) {
      return CaseList.work(
          part.from(), part.variant(), new SolveCommand.Solving(accuracy, Progress.SILENT));
    }
    try (ProgressLine progress = new ProgressLine(here.err(), part.name())) {
      return CaseList.work(
          part.from(), part.variant(), new SolveCommand.Solving(accuracy, progress));
    }
  }

  /** Title and file of a building, whose lengths are metres. */
  private static Subject subject(Building from, Surroundings here) {
    return new Subject(
        from.title(),
        here.shown(from.file()),
        Optional.empty(),
        "m",
        1,
        Accuracy.STANDARD,
        Main.VERSION);
  }

  /**
   * Resolves the cases of a building without solving, and says what is understood.
   *
   * @param from the building
   * @param json as data instead of text
   * @param here where names are shown from
   * @return lines, each ended by a line feed
   * @throws CaseException if a case is at fault
   */
  static String understood(Building from, boolean json, Surroundings here) throws CaseException {
    List<String> names = new ArrayList<>();
    for (Building.Part part : from.parts()) {
      CaseList.work(part.from(), part.variant(), Solver::inspect);
      names.add(part.name());
    }
    Subject subject = subject(from, here);
    return json
        ? Sheet.understoodJson(subject, names, from.assumptions()) + "\n"
        : Sheet.understood(subject, names, from.assumptions(), here.outInk());
  }

  private static List<String> names(Syntax.Typed typed) {
    List<String> names = new ArrayList<>(List.of(DATA, ACCOUNT, SCHEDULE));
    if (!typed.has(NO_PLOTS)) {
      names.add(FIGURE);
    }
    if (typed.has(PNG)) {
      names.add(PIXELS);
    }
    return names;
  }

  private static Map<String, byte[]> files(LedgerSubject of, Syntax.Typed typed)
      throws UsageException {
    Map<String, byte[]> files = new LinkedHashMap<>();
    files.put(DATA, SolveCommand.bytes(Sheet.json(of, true) + "\n"));
    files.put(ACCOUNT, SolveCommand.bytes(Sheet.accountCsv(of)));
    files.put(SCHEDULE, SolveCommand.bytes(Sheet.scheduleCsv(of)));
    LedgerPlot plot = new LedgerPlot(of.subject().title(), of.account().ledger());
    if (!typed.has(NO_PLOTS)) {
      files.put(FIGURE, SolveCommand.bytes(plot.svg()));
    }
    if (typed.has(PNG)) {
      try {
        files.put(PIXELS, plot.png());
      } catch (NoFontException e) {
        throw new UsageException(NAME, e.getMessage());
      }
    }
    return files;
  }
}
