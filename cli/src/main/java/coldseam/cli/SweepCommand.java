package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import coldseam.cases.study.Axis;
import coldseam.cases.study.LineFile;
import coldseam.cases.study.Lines;
import coldseam.cases.study.Point;
import coldseam.cases.study.Shard;
import coldseam.cases.study.Study;
import coldseam.cases.study.StudyException;
import coldseam.cases.study.Sweep;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.StudyLine;
import coldseam.cli.sheet.StudyTable;
import coldseam.cli.sheet.Subject;
import coldseam.cli.text.Digits;
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

/** Solves a case over and over with one or two things varied. */
final class SweepCommand implements Command {
  private static final String NAME = "sweep";
  private static final String SET = "--set";
  private static final String VARIANT = "--variant";
  private static final String OUT = "--out";
  private static final String SHARD = "--shard";
  private static final String JOBS = "--jobs";
  private static final String ACCURACY = "--accuracy";
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";

  /** Larger sweeps are not printed; their table is a file. */
  private static final int MOST_PRINTED = 40;

  private static final int MOST_JOBS = 1024;

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "a parameter study: one or two values, or a list of materials, with a chart",
        "CASE",
        1,
        "Solves a case for every setting of one named value, or for every combination of two, on all"
            + " processors, each solve on one. A folder beside the case, balcony.sweep/insulation for"
            + " balcony.yaml, gets one line of JSON for each solve in sweep.jsonl as soon as it is"
            + " done, and in the end sweep.csv and sweep.svg. Run again, it goes on where it was"
            + " interrupted and solves nothing twice; a changed case, variant or accuracy begins"
            + " anew, a changed range keeps what still belongs to it.",
        List.of(
            new Syntax.Option(
                SET,
                "NAME=FROM..TO/N",
                "N numbers from one end to the other, both included; or NAME=A,B,C, numbers for a"
                    + " named value, materials for a fill or shape. Once or twice",
                true),
            new Syntax.Option(VARIANT, "NAME", "start from this variant"),
            new Syntax.Option(OUT, "FOLDER", "where lines, table and chart go"),
            new Syntax.Option(
                SHARD,
                "K/N",
                "only every N-th point from the K-th on, to shard-K-of-N.jsonl: one job of an array;"
                    + " a sweep without --shard then takes over what the shards have solved"),
            new Syntax.Option(JOBS, "N", "how many to solve at a time; default all processors"),
            new Syntax.Option(ACCURACY, "LIST", "half-widths instead of those of the case"),
            new Syntax.Option(
                JSON,
                "",
                "print the lines, in the order of the points; without --out no file is written"),
            new Syntax.Option(QUIET, "", "print no table; files are written all the same")),
        List.of(
            new Syntax.Example(
                "cli/coldseam sweep cases/demo/balcony.yaml --set insulation=100..240/8",
                "eight thicknesses: table, sweep.jsonl, sweep.csv and sweep.svg"),
            new Syntax.Example(
                "cli/coldseam sweep balcony.yaml --set \"wall insulation=EPS,XPS\" --set"
                    + " insulation=120..200/5",
                "two materials of the library, five thicknesses of each"),
            new Syntax.Example(
                "cli/coldseam sweep balcony.yaml --set insulation=100..240/200 --shard 2/10 --out"
                    + " study",
                "the second of ten jobs of an array; see cases/cluster")));
  }

  /** Everything a run needs. */
  private record Plan(
      Sweep sweep,
      Shard shard,
      Accuracy accuracy,
      String key,
      Subject subject,
      Optional<SweepFiles> files,
      int jobs) {}

  /** What stands in the lines so far, by index of the point. */
  private record Found(Map<Integer, Lines.Line> lines, int before, double seconds) {}

  @Override
  public int run(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    Plan plan;
    try {
      plan = plan(typed, here);
    } catch (StudyException e) {
      throw new UsageException(NAME, e.getMessage());
    }
    Map<Integer, Lines.Line> lines = new LinkedHashMap<>();
    if (plan.files().isPresent()) {
      plan.files().get().check();
      lines.putAll(plan.files().get().finished(plan.sweep(), plan.key()));
    }
    List<Point> own = plan.shard().part(plan.sweep().points());
    List<Point> open = new ArrayList<>();
    for (Point point : own) {
      if (!lines.containsKey(point.index())) {
        open.add(point);
      }
    }
    plan.sweep().check(open, plan.jobs());
    int before = own.size() - open.size();
    List<Problem> problems;
    double seconds;
    try (Output output = new Output(plan, typed, here, lines);
        ProgressBar bar =
            new ProgressBar(
                here.err(), here.errIsTerminal() && !typed.has(QUIET), before, own.size())) {
      problems =
          Study.run(
              open,
              plan.jobs(),
              point -> solved(plan, point),
              (point, line) -> {
                output.take(point, line);
                bar.step();
              });
      seconds = bar.seconds();
    }
    return conclude(plan, new Found(lines, before, seconds), problems, own, typed, here);
  }

  private static Plan plan(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, StudyException {
    if (typed.operands().size() > 1) {
      throw new UsageException(NAME, "one case at a time is swept");
    }
    if (!typed.has(SET)) {
      throw new UsageException(
          NAME, "needs --set NAME=FROM..TO/N: what is varied, e.g. --set insulation=100..240/8");
    }
    Shard shard = typed.has(SHARD) ? Shard.read(typed.value(SHARD)) : Shard.WHOLE;
    int jobs = jobs(typed);
    Case from = CaseList.read(typed.operands(), NAME, here).get(0);
    Optional<String> variant =
        typed.has(VARIANT) ? CaseList.variant(from, typed.value(VARIANT), NAME) : Optional.empty();
    List<Axis> axes = new ArrayList<>();
    for (String set : typed.values(SET)) {
      axes.add(Axis.read(set, from, variant));
    }
    Sweep sweep = Sweep.of(from, variant, axes);
    Accuracy accuracy = accuracy(typed, from);
    String shown = here.shown(from.file());
    Optional<SweepFiles> files = Optional.empty();
    if (typed.has(OUT) || !typed.has(JSON)) {
      Path folder =
          typed.has(OUT)
              ? here.cwd().resolve(CaseList.path(typed.value(OUT), NAME))
              : SweepFiles.usual(here.cwd().resolve(from.file()), sweep);
      Path normal = folder.normalize();
      files = Optional.of(new SweepFiles(normal, here.shown(normal), shard));
    }
    return new Plan(
        sweep,
        shard,
        accuracy,
        sweep.key(accuracy, Main.VERSION),
        Subject.of(from, shown, variant, accuracy, Main.VERSION),
        files,
        jobs);
  }

  private static int jobs(Syntax.Typed typed) throws UsageException {
    if (!typed.has(JOBS)) {
      return Runtime.getRuntime().availableProcessors();
    }
    try {
      int jobs = Integer.parseInt(typed.value(JOBS));
      if (jobs >= 1 && jobs <= MOST_JOBS) {
        return jobs;
      }
    } catch (NumberFormatException e) {
      // Said below.
    }
    throw new UsageException(
        NAME, "--jobs is a whole number from 1 on, not \"" + typed.value(JOBS) + "\"");
  }

  private static Accuracy accuracy(Syntax.Typed typed, Case from) throws UsageException {
    return typed.has(ACCURACY)
        ? AccuracyOption.read(from.accuracy(), typed.value(ACCURACY))
        : from.accuracy();
  }

  private static Lines.Line solved(Plan plan, Point point) throws CaseException {
    Sweep sweep = plan.sweep();
    Result result =
        CaseList.work(
            sweep.from(),
            sweep.variant(),
            point.changes(),
            detail -> Solver.solve(detail, plan.accuracy(), Progress.SILENT));
    String line = StudyLine.write(plan.key(), point, plan.subject(), result);
    return Lines.read(line)
        .orElseThrow(() -> new IllegalStateException("a line cannot be read back: " + line));
  }

  /** Where lines go: the file, and standard output in the order of points. */
  private static final class Output implements AutoCloseable {
    private final Optional<LineFile> file;
    private final Map<Integer, Lines.Line> lines;

    Output(Plan plan, Syntax.Typed typed, Surroundings here, Map<Integer, Lines.Line> lines)
        throws UsageException, IOException {
      this.lines = lines;
      this.file =
          plan.files().isPresent()
              ? Optional.of(plan.files().get().open(List.copyOf(lines.values())))
              : Optional.empty();
    }

    void take(Point point, Lines.Line line) throws IOException {
      if (file.isPresent()) {
        file.get().append(line.text());
      }
      lines.put(point.index(), line);
    }

    @Override
    public void close() throws IOException {
      if (file.isPresent()) {
        file.get().close();
      }
    }
  }

  private static int conclude(
      Plan plan,
      Found found,
      List<Problem> problems,
      List<Point> own,
      Syntax.Typed typed,
      Surroundings here)
      throws UsageException, CaseException, IOException {
    List<StudyTable.Row> rows = new ArrayList<>();
    int inaccurate = 0;
    for (Point point : own) {
      Lines.Line line = found.lines().get(point.index());
      if (line != null) {
        rows.add(new StudyTable.Row(point.settings(), StudyLine.measures(line)));
        inaccurate += StudyLine.accurateEnough(line) ? 0 : 1;
        if (typed.has(JSON)) {
          here.out().println(line.text());
        }
      }
    }
    List<String> names = plan.sweep().axes().stream().map(Axis::name).toList();
    StudyTable table = new StudyTable(names, rows);
    if (plan.files().isPresent() && plan.shard().whole() && !rows.isEmpty()) {
      plan.files().get().write(table.csv(), SweepPicture.svg(plan.sweep(), rows));
    }
    if (!typed.has(QUIET)) {
      say(plan, found, rows, table, typed, here);
    }
    if (!problems.isEmpty()) {
      throw new CaseException(problems);
    }
    if (inaccurate > 0) {
      here.err()
          .println(
              here.errInk()
                  .alert(
                      inaccurate
                          + " of "
                          + own.size()
                          + " points: the accuracy asked for was not reached"));
      return ExitCode.ACCURACY;
    }
    return ExitCode.DONE;
  }

  private static void say(
      Plan plan,
      Found found,
      List<StudyTable.Row> rows,
      StudyTable table,
      Syntax.Typed typed,
      Surroundings here) {
    if (!typed.has(JSON)) {
      String variant = plan.sweep().variant().map(name -> ", variant \"" + name + "\"").orElse("");
      here.out().println(here.outInk().strong(plan.sweep().from().title()) + variant);
      here.out().println(here.outInk().faint(plan.subject().file()));
      if (rows.size() <= MOST_PRINTED) {
        here.out().print(table.text(here.outInk()));
      }
    }
    StringBuilder words = new StringBuilder();
    int now = rows.size() - found.before();
    words.append(rows.size()).append(rows.size() == 1 ? " point: " : " points: ");
    words.append(now).append(" solved");
    if (now > 0) {
      words.append(" in ").append(Digits.significant(found.seconds(), 2)).append(" s, ");
      words.append(Digits.significant(now / found.seconds(), 2)).append(" a second");
    }
    if (found.before() > 0) {
      words.append(", ").append(found.before()).append(" from before");
    }
    var out = typed.has(JSON) ? here.err() : here.out();
    if (plan.files().isPresent()) {
      SweepFiles files = plan.files().get();
      out.println(words);
      String also = plan.shard().whole() ? ", " + SweepFiles.TABLE + ", " + SweepFiles.CHART : "";
      out.println("Written to " + files.shown() + "/: " + files.linesName() + also);
    }
    if (!typed.has(JSON)) {
      here.out().println(here.outInk().faint(Sheet.safety()));
    }
  }
}
