package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Changes;
import coldseam.cases.Problem;
import coldseam.cases.WindowFile;
import coldseam.cases.building.BuildingFile;
import coldseam.cases.study.Axis;
import coldseam.cases.study.StudyException;
import coldseam.cli.exchange.FieldFile;
import coldseam.cli.plot.NoFontException;
import coldseam.cli.plot.Plots;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Solves cases: card, data, plots. */
final class SolveCommand implements Command {
  static final String NAME = "solve";
  static final String VARIANT = "--variant";
  private static final String VARIANTS = "--variants";
  private static final String SET = "--set";
  private static final String OUT = "--out";
  static final String JSON = "--json";
  private static final String PNG = "--png";
  private static final String VTU = "--vtu";
  private static final String FIELD = "field.vtu";
  private static final String NO_PLOTS = "--no-plots";
  private static final String SHEET = "--sheet";
  private static final String PDF = "--pdf";
  private static final String ACCURACY = "--accuracy";
  private static final String MOST_UNKNOWNS = "--most-unknowns";
  private static final String DRAWING = "--drawing";
  static final String QUIET = "--quiet";

  private static final List<Plots.Kind> PLOTS =
      List.of(Plots.Kind.SECTION, Plots.Kind.TEMPERATURE, Plots.Kind.HEAT_FLOW, Plots.Kind.SHARES);

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "solve cases: numbers, data and plots",
        "CASE…",
        1,
        "Solves each case and prints its card. Data and plots go to a folder beside the case file,"
            + " balcony.coldseam for balcony.yaml: result.json, result.csv, section.svg,"
            + " temperature.svg, heat-flow.svg and shares.svg; a variant has a folder of its own in it. What an"
            + " earlier solve wrote there is replaced, nothing else. A window file gives the U_w of a"
            + " whole window; the cases it names are solved for it, and it is written as data only.",
        List.of(
            new Syntax.Option(VARIANT, "NAME", "solve this variant instead of the base case"),
            new Syntax.Option(VARIANTS, "", "solve the base case and every variant"),
            new Syntax.Option(
                SET,
                "NAME=VALUE",
                "with this named value, or this material in place of a fill; may be repeated. What"
                    + " is solved then counts as a variant of that name",
                true),
            new Syntax.Option(
                OUT,
                "FOLDER",
                "where data and plots go; with several cases, a folder for each in" + " it"),
            new Syntax.Option(
                JSON,
                "",
                "print the result as data, one object on one line for each solve;"
                    + " without --out no file is written"),
            new Syntax.Option(PNG, "", "write each plot as PNG too"),
            new Syntax.Option(
                VTU,
                "",
                "write temperatures and heat flow as " + FIELD + " too, for viewers of VTK files"),
            new Syntax.Option(NO_PLOTS, "", "write no plots"),
            new Syntax.Option(
                SHEET,
                "",
                "write sheet.html too: all of it on one page for the project's file, with the"
                    + " title block of the case; it needs no network"),
            new Syntax.Option(PDF, "", "write the same as sheet.pdf"),
            new Syntax.Option(
                ACCURACY,
                "LIST",
                "half-widths instead of those of the case, e.g." + " L2D=0.02%,psi=0.0002,U=0.1%"),
            new Syntax.Option(
                MOST_UNKNOWNS,
                "N",
                "stop refining at this size; ends with 3 if the accuracy is not reached by then"),
            new Syntax.Option(
                DRAWING, "FILE", "a drawing outside of the case's folder that it may read"),
            new Syntax.Option(QUIET, "", "print no card; files are written all the same")),
        List.of(
            new Syntax.Example(
                "cli/coldseam solve cases/demo/balcony.yaml",
                "prints the card, writes data and plots to cases/demo/balcony.coldseam/"),
            new Syntax.Example(
                "cli/coldseam solve cases/demo/balcony.yaml --variants --json",
                "prints two lines of JSON, writes nothing"),
            new Syntax.Example(
                "cli/coldseam solve cases/demo/balcony.yaml --variant \"thermal break\" --out break"
                    + " --png",
                "solves one variant and writes PNG beside SVG to the folder break")));
  }

  /** One case or variant to solve. */
  private record Job(
      Case from,
      Optional<String> variant,
      Changes changes,
      Subject subject,
      Accuracy accuracy,
      Optional<OutputFolder> folder,
      Optional<SheetFiles> sheet) {}

  @Override
  public int run(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    contradictions(typed);
    List<String> cases = new ArrayList<>();
    List<String> windows = new ArrayList<>();
    for (String operand : typed.operands()) {
      boolean window = WindowFile.is(here.cwd().resolve(CaseList.path(operand, NAME)));
      (window ? windows : cases).add(operand);
    }
    if (sheet(typed) && !windows.isEmpty()) {
      throw new UsageException(
          NAME,
          windows.get(0)
              + " is a window, which has no sheet; ask for one of each frame case, or leave away "
              + SHEET
              + " and "
              + PDF);
    }
    Map<Path, String> taken = new LinkedHashMap<>();
    List<WindowSolve> whole =
        windows.isEmpty() ? List.of() : WindowSolve.read(windows, cases, typed, here, taken);
    List<Job> jobs = jobs(cases, typed, here, taken);
    if (jobs.size() + whole.size() > 1) {
      resolveAll(jobs, whole, here);
    }
    int code = ExitCode.DONE;
    boolean first = true;
    for (Job job : jobs) {
      Result result = solve(job, typed, here);
      code = ExitCode.worse(code, conclude(job, result, typed, here, first));
      first = false;
    }
    for (WindowSolve job : whole) {
      code = ExitCode.worse(code, job.conclude(typed, here, first));
      first = false;
    }
    return code;
  }

  /** Finds what is at fault in any of several before the first is solved and written. */
  private static void resolveAll(List<Job> jobs, List<WindowSolve> windows, Surroundings here)
      throws CaseException {
    List<Problem> problems = new ArrayList<>();
    for (Job job : jobs) {
      try {
        CaseList.work(job.from(), job.subject().variant(), Solver::inspect);
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
      }
    }
    for (WindowSolve window : windows) {
      try {
        WindowJobs.understood(window.from(), false, here);
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
      }
    }
    if (!problems.isEmpty()) {
      throw new CaseException(problems);
    }
  }

  private static void contradictions(Syntax.Typed typed) throws UsageException {
    if (typed.has(VARIANT) && typed.has(VARIANTS)) {
      throw new UsageException(NAME, "--variant names one, --variants means all; give one of them");
    }
    if (typed.has(PNG) && typed.has(NO_PLOTS)) {
      throw new UsageException(NAME, "--png and --no-plots exclude each other");
    }
    if ((typed.has(PNG) || typed.has(VTU) || sheet(typed)) && typed.has(JSON) && !typed.has(OUT)) {
      throw new UsageException(NAME, "--json writes no files unless --out says where: add --out");
    }
  }

  private static List<Job> jobs(
      List<String> cases, Syntax.Typed typed, Surroundings here, Map<Path, String> taken)
      throws UsageException, CaseException, IOException {
    List<Job> jobs = new ArrayList<>();
    for (Case from : read(cases, typed, here)) {
      List<Optional<String>> variants = new ArrayList<>();
      if (typed.has(VARIANT)) {
        variants.add(CaseList.variant(from, typed.value(VARIANT), NAME));
      } else {
        variants.add(Optional.empty());
        if (typed.has(VARIANTS)) {
          for (String name : from.variants()) {
            variants.add(Optional.of(name));
          }
        }
      }
      Accuracy accuracy = accuracy(from.accuracy(), typed);
      String shown = here.shown(from.file());
      for (Optional<String> variant : variants) {
        Changes changes = changes(from, variant, typed);
        Optional<String> called = called(variant, changes);
        Optional<OutputFolder> folder = folder(from.file(), called, typed, here, taken);
        if (folder.isPresent()) {
          folder.get().check(names(typed));
        }
        Subject subject = Subject.of(from, shown, called, accuracy, Main.VERSION);
        Optional<SheetFiles> sheet =
            sheet(typed) ? Optional.of(SheetFiles.of(from, subject, here)) : Optional.empty();
        jobs.add(new Job(from, variant, changes, subject, accuracy, folder, sheet));
      }
    }
    return jobs;
  }

  private static boolean sheet(Syntax.Typed typed) {
    return typed.has(SHEET) || typed.has(PDF);
  }

  /** Reads cases; a building among them is told as what it is. */
  private static List<Case> read(List<String> cases, Syntax.Typed typed, Surroundings here)
      throws CaseException, UsageException {
    try {
      return CaseList.read(cases, drawings(typed), NAME, here);
    } catch (CaseException mistakes) {
      for (String name : cases) {
        if (BuildingFile.is(here.cwd().resolve(CaseList.path(name, NAME)))) {
          throw new UsageException(
              NAME, name + " is a building; did you mean: cli/coldseam ledger " + name);
        }
      }
      throw mistakes;
    }
  }

  /** The accuracy of a case, changed by what was typed. */
  static Accuracy accuracy(Accuracy ofCase, Syntax.Typed typed) throws UsageException {
    Accuracy accuracy = ofCase;
    if (typed.has(ACCURACY)) {
      accuracy = AccuracyOption.read(accuracy, typed.value(ACCURACY));
    }
    if (typed.has(MOST_UNKNOWNS)) {
      accuracy = AccuracyOption.limit(accuracy, typed.value(MOST_UNKNOWNS));
    }
    return accuracy;
  }

  private static List<String> drawings(Syntax.Typed typed) {
    return typed.has(DRAWING) ? List.of(typed.value(DRAWING)) : List.of();
  }

  private static Changes changes(Case from, Optional<String> variant, Syntax.Typed typed)
      throws UsageException {
    if (!typed.has(SET)) {
      return Changes.NONE;
    }
    Map<String, String> values = new LinkedHashMap<>();
    Map<String, String> fills = new LinkedHashMap<>();
    for (String set : typed.values(SET)) {
      try {
        Axis axis = Axis.read(set, from, variant);
        if (axis.settings().size() > 1) {
          throw new UsageException(NAME, "--set takes one value here; sweep takes several");
        }
        (axis.fill() ? fills : values).put(axis.name(), axis.settings().get(0));
      } catch (StudyException e) {
        throw new UsageException(NAME, e.getMessage());
      }
    }
    return new Changes(values, fills);
  }

  /** What is solved is called after its variant and what was set. */
  private static Optional<String> called(Optional<String> variant, Changes changes) {
    if (changes == Changes.NONE) {
      return variant;
    }
    String set = changes.inWords();
    return Optional.of(variant.isPresent() ? variant.get() + ", " + set : set);
  }

  static Optional<OutputFolder> folder(
      Path written,
      Optional<String> variant,
      Syntax.Typed typed,
      Surroundings here,
      Map<Path, String> taken)
      throws UsageException {
    if (typed.has(JSON) && !typed.has(OUT)) {
      return Optional.empty();
    }
    Path file = here.cwd().resolve(written);
    String stem = stem(file.getFileName().toString());
    Path folder;
    if (!typed.has(OUT)) {
      folder = file.resolveSibling(stem + ".coldseam");
    } else {
      folder = here.cwd().resolve(CaseList.path(typed.value(OUT), NAME));
      if (typed.operands().size() > 1) {
        folder = folder.resolve(stem);
      }
    }
    if (variant.isPresent() && !(typed.has(OUT) && typed.has(VARIANT))) {
      folder = folder.resolve(fileName(variant.get()));
    }
    folder = folder.normalize();
    String other = taken.put(folder, file.toString());
    if (other != null) {
      throw new UsageException(
          NAME, "two solves would be written to " + here.shown(folder) + "; solve them one by one");
    }
    return Optional.of(new OutputFolder(folder, here.shown(folder)));
  }

  /** The name of a case file without its ending. */
  private static String stem(String file) {
    for (String ending : List.of(".yaml", ".yml")) {
      if (file.endsWith(ending)) {
        return file.substring(0, file.length() - ending.length());
      }
    }
    return file;
  }

  /** A variant's name as the name of a folder. */
  static String fileName(String variant) {
    StringBuilder name = new StringBuilder();
    for (int i = 0; i < variant.length(); i += Character.charCount(variant.codePointAt(i))) {
      int c = variant.codePointAt(i);
      name.appendCodePoint(Character.isLetterOrDigit(c) || "._+".indexOf(c) >= 0 ? c : '-');
    }
    return name.charAt(0) == '.' ? "-" + name : name.toString();
  }

  private static Result solve(Job job, Syntax.Typed typed, Surroundings here) throws CaseException {
    if (!here.errIsTerminal() || typed.has(QUIET)) {
      return solve(job, Progress.SILENT);
    }
    try (ProgressLine progress = new ProgressLine(here.err(), name(job))) {
      return solve(job, progress);
    }
  }

  private static Result solve(Job job, Progress progress) throws CaseException {
    Solving solving = new Solving(job.accuracy(), progress);
    return CaseList.work(job.from(), job.variant(), job.changes(), solving);
  }

  private static final class Inspecting implements CaseList.Work<Solver.Inspection> {
    @Override
    public Solver.Inspection on(Detail detail) {
      return Solver.inspect(detail);
    }
  }

  record Solving(Accuracy accuracy, Progress progress) implements CaseList.Work<Result> {
    @Override
    public Result on(Detail detail) {
      return Solver.solve(detail, accuracy, progress);
    }
  }

  /** The file of a job, and its variant if it has one. */
  private static String name(Job job) {
    Optional<String> variant = job.subject().variant();
    return job.subject().file() + (variant.isEmpty() ? "" : ", " + variant.get());
  }

  private static int conclude(
      Job job, Result result, Syntax.Typed typed, Surroundings here, boolean first)
      throws UsageException, CaseException {
    if (job.folder().isPresent()) {
      write(job.folder().get(), files(job, result, typed));
    }
    if (typed.has(JSON)) {
      here.out().println(Sheet.json(job.subject(), result, false));
    } else if (!typed.has(QUIET)) {
      here.out().print((first ? "" : "\n\n") + Sheet.card(job.subject(), result, here.outInk()));
    }
    if (job.folder().isPresent() && !typed.has(QUIET)) {
      String written = "Written to " + job.folder().get().shown() + "/: ";
      (typed.has(JSON) ? here.err() : here.out())
          .println(written + String.join(", ", names(typed)));
    }
    int met = requirements(job, result, here);
    if (Sheet.accurateEnough(job.subject(), result)) {
      return met;
    }
    here.err().println(here.errInk().alert(name(job) + ": the accuracy asked for was not reached"));
    for (String line : Sheet.accuracyMissed(job.subject(), result)) {
      here.err().println("  " + line);
    }
    return ExitCode.worse(met, ExitCode.ACCURACY);
  }

  /** Tells which requirements of the case are not met. */
  private static int requirements(Job job, Result result, Surroundings here) {
    if (result.requirements().isEmpty()) {
      return ExitCode.DONE;
    }
    List<String> missed = Sheet.requirementsMissed(result);
    if (missed.isEmpty()) {
      return ExitCode.DONE;
    }
    here.err().println(here.errInk().alert(name(job) + ": a requirement of the case is not met"));
    for (String line : missed) {
      here.err().println("  " + line);
    }
    return ExitCode.NOT_MET;
  }

  static void write(OutputFolder folder, Map<String, byte[]> files) throws UsageException {
    try {
      folder.write(files);
    } catch (IOException e) {
      throw new UsageException(
          NAME,
          folder.shown()
              + " cannot take the output: "
              + Failure.words(e)
              + "; choose another with --out FOLDER");
    }
  }

  /** Names of the files that one solve writes. */
  private static List<String> names(Syntax.Typed typed) {
    List<String> names = new ArrayList<>(List.of("result.json", "result.csv"));
    if (typed.has(VTU)) {
      names.add(FIELD);
    }
    if (!typed.has(NO_PLOTS)) {
      for (Plots.Kind kind : PLOTS) {
        names.add(kind.stem() + ".svg");
      }
    }
    if (typed.has(PNG)) {
      for (Plots.Kind kind : PLOTS) {
        names.add(kind.stem() + ".png");
      }
    }
    if (typed.has(SHEET)) {
      names.add(SheetFiles.PAGE);
    }
    if (typed.has(PDF)) {
      names.add(SheetFiles.PDF);
    }
    return names;
  }

  private static Map<String, byte[]> files(Job job, Result result, Syntax.Typed typed)
      throws UsageException, CaseException {
    Plots plots =
        Plots.of(
            result,
            new Plots.Caption(
                job.subject().variant(), job.from().unit(), job.from().metresPerUnit()));
    boolean drawn = !typed.has(NO_PLOTS);
    Plots.Begun begun = plots.begin(drawn || typed.has(SHEET) ? PLOTS : List.of());
    Map<String, byte[]> files = new LinkedHashMap<>();
    files.put("result.json", bytes(Sheet.json(job.subject(), result, true) + "\n"));
    files.put("result.csv", bytes(Sheet.csv(job.subject(), result)));
    if (typed.has(VTU)) {
      files.put(FIELD, bytes(FieldFile.vtu(job.subject().title(), result, Main.VERSION)));
    }
    try {
      Map<Plots.Kind, String> svgs = begun.finish();
      if (drawn) {
        for (Map.Entry<Plots.Kind, String> svg : svgs.entrySet()) {
          files.put(svg.getKey().stem() + ".svg", bytes(svg.getValue()));
        }
      }
      for (Plots.Kind kind : PLOTS) {
        if (typed.has(PNG)) {
          files.put(kind.stem() + ".png", plots.png(kind));
        }
      }
      if (job.sheet().isPresent()) {
        SheetFiles sheet = job.sheet().get();
        Solver.Inspection inspection =
            CaseList.work(job.from(), job.variant(), job.changes(), new Inspecting());
        if (typed.has(SHEET)) {
          files.put(SheetFiles.PAGE, bytes(sheet.page(result, inspection, plots, svgs)));
        }
        if (typed.has(PDF)) {
          files.put(SheetFiles.PDF, sheet.pdf(result, inspection, plots, PLOTS));
        }
      }
    } catch (NoFontException e) {
      throw new UsageException(NAME, e.getMessage());
    }
    return files;
  }

  static byte[] bytes(String text) {
    return text.getBytes(StandardCharsets.UTF_8);
  }
}
