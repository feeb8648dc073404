package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.study.Alternative;
import coldseam.cases.study.Comparison;
import coldseam.cases.study.Measure;
import coldseam.cases.study.Study;
import coldseam.cli.plot.ComparisonFigure;
import coldseam.cli.plot.Plots;
import coldseam.cli.sheet.ComparisonSheet;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/** Solves cases or variants and lays them side by side. */
final class CompareCommand implements Command {
  private static final String NAME = "compare";
  private static final String VARIANTS = "--variants";
  private static final String OUT = "--out";
  private static final String ACCURACY = "--accuracy";
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";
  private static final String TABLE = "compare.csv";
  private static final String FIGURE = "compare.svg";

  /** More could not be told apart in one figure. */
  private static final int MOST = 52;

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "cases or variants side by side: one table, one figure",
        "CASE…",
        1,
        "Solves several cases, or the base case and every variant of one, and lays them side by"
            + " side: what differs, ψ, U, L2D, coldest surfaces, f_Rsi, and the cost where the case"
            + " states it; sections and temperatures at one scale. They rank by L2D where the"
            + " outlines are the same, by U and by f_Rsi; by ψ only where the flanks have the same"
            + " U, since the best ψ can belong to the worst wall. Numbers differ only where their"
            + " intervals do not overlap. Table and figure go to a folder beside the first case,"
            + " balcony.compare for balcony.yaml.",
        List.of(
            new Syntax.Option(VARIANTS, "", "every variant of every case; the rule for one case"),
            new Syntax.Option(OUT, "FOLDER", "where compare.csv and compare.svg go"),
            new Syntax.Option(ACCURACY, "LIST", "half-widths instead of those of the cases"),
            new Syntax.Option(
                JSON,
                "",
                "print one line of JSON for each alternative and one with the notes; without --out no"
                    + " file is written"),
            new Syntax.Option(QUIET, "", "print no table; files are written all the same")),
        List.of(
            new Syntax.Example(
                "cli/coldseam compare cases/demo/balcony-alternatives.yaml",
                "four ways to fix a balcony, side by side"),
            new Syntax.Example(
                "cli/coldseam compare cases/demo/timber-stud.yaml cases/demo/steel-stud.yaml",
                "two cases")));
  }

  /** One alternative before it is solved. */
  private record Job(
      int index, Case from, Optional<String> variant, String name, Subject subject) {}

  @Override
  public int run(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    List<Job> jobs = jobs(typed, here);
    Optional<OutputFolder> folder = folder(typed, jobs.get(0).from(), here);
    if (folder.isPresent()) {
      folder.get().check(List.of(TABLE, FIGURE));
    }
    Map<Integer, Result> results = solved(jobs, typed, here);
    List<Alternative> alternatives = new ArrayList<>();
    List<String> files = new ArrayList<>();
    for (Job job : jobs) {
      alternatives.add(
          new Alternative(job.from(), job.variant(), job.name(), results.get(job.index())));
      files.add(job.subject().file());
    }
    Comparison comparison = Comparison.of(alternatives);
    ComparisonSheet sheet = new ComparisonSheet(comparison, files);
    if (folder.isPresent()) {
      Map<String, byte[]> written = new LinkedHashMap<>();
      written.put(TABLE, bytes(sheet.csv()));
      written.put(FIGURE, bytes(figure(comparison, sheet, jobs)));
      folder.get().write(written);
    }
    say(sheet, jobs, folder, typed, here);
    return accuracy(jobs, results, here);
  }

  private static byte[] bytes(String text) {
    return text.getBytes(StandardCharsets.UTF_8);
  }

  private static List<Job> jobs(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException {
    List<Case> cases = CaseList.read(typed.operands(), NAME, here);
    boolean variants = typed.has(VARIANTS) || cases.size() == 1;
    List<Job> jobs = new ArrayList<>();
    for (Case from : cases) {
      add(jobs, from, Optional.empty(), cases.size() == 1, typed, here);
      for (String variant : variants ? from.variants() : List.<String>of()) {
        add(jobs, from, Optional.of(variant), cases.size() == 1, typed, here);
      }
    }
    if (jobs.size() < 2) {
      throw new UsageException(
          NAME,
          "there is nothing to compare: the case has no variants; name several cases, or give it"
              + " variants");
    }
    if (jobs.size() > MOST) {
      throw new UsageException(
          NAME, jobs.size() + " alternatives are too many to see; at most " + MOST);
    }
    return jobs;
  }

  private static void add(
      List<Job> jobs,
      Case from,
      Optional<String> variant,
      boolean one,
      Syntax.Typed typed,
      Surroundings here)
      throws UsageException {
    Accuracy accuracy =
        typed.has(ACCURACY)
            ? AccuracyOption.read(from.accuracy(), typed.value(ACCURACY))
            : from.accuracy();
    String name =
        one
            ? variant.orElse("base case")
            : from.title() + variant.map(named -> ", " + named).orElse("");
    String shown = here.shown(from.file());
    Subject subject = Subject.of(from, shown, variant, accuracy, Main.VERSION);
    jobs.add(new Job(jobs.size(), from, variant, name, subject));
  }

  private static Optional<OutputFolder> folder(Syntax.Typed typed, Case first, Surroundings here)
      throws UsageException {
    if (typed.has(JSON) && !typed.has(OUT)) {
      return Optional.empty();
    }
    Path folder;
    if (typed.has(OUT)) {
      folder = here.cwd().resolve(CaseList.path(typed.value(OUT), NAME));
    } else {
      Path file = here.cwd().resolve(first.file());
      String name = file.getFileName().toString();
      int dot = name.lastIndexOf('.');
      folder = file.resolveSibling((dot < 0 ? name : name.substring(0, dot)) + ".compare");
    }
    folder = folder.normalize();
    return Optional.of(new OutputFolder(folder, here.shown(folder)));
  }

  private static Map<Integer, Result> solved(List<Job> jobs, Syntax.Typed typed, Surroundings here)
      throws CaseException, IOException {
    Map<Integer, Result> results = new TreeMap<>();
    boolean seen = here.errIsTerminal() && !typed.has(QUIET);
    try (ProgressBar bar = new ProgressBar(here.err(), seen, 0, jobs.size())) {
      var problems =
          Study.run(
              jobs,
              Runtime.getRuntime().availableProcessors(),
              job ->
                  CaseList.work(
                      job.from(),
                      job.variant(),
                      detail -> Solver.solve(detail, job.subject().accuracy(), Progress.SILENT)),
              (job, result) -> {
                results.put(job.index(), result);
                bar.step();
              });
      if (!problems.isEmpty()) {
        throw new CaseException(problems);
      }
    }
    return results;
  }

  private static String figure(Comparison comparison, ComparisonSheet sheet, List<Job> jobs) {
    List<ComparisonFigure.Column> columns = new ArrayList<>();
    boolean certified = true;
    for (int i = 0; i < jobs.size(); i++) {
      Alternative alternative = comparison.alternatives().get(i);
      Case from = alternative.from();
      columns.add(
          new ComparisonFigure.Column(
              ComparisonSheet.letter(i),
              alternative.name(),
              alternative.result(),
              new Plots.Caption(alternative.variant(), from.unit(), from.metresPerUnit()),
              sheet.lines(i)));
      for (Measure measure : Measure.all(alternative.result())) {
        certified &= measure.knowledge() != Measure.Knowledge.OPEN;
      }
    }
    return ComparisonFigure.svg(
        new ComparisonFigure.Content(
            title(jobs),
            jobs.size() + " alternatives at one scale · temperatures are estimates",
            certified ? "L2D CERTIFIED" : "NOT ALL CERTIFIED",
            columns));
  }

  private static String title(List<Job> jobs) {
    String first = jobs.get(0).from().title();
    for (Job job : jobs) {
      if (!job.from().title().equals(first)) {
        return "Alternatives";
      }
    }
    return first;
  }

  private static void say(
      ComparisonSheet sheet,
      List<Job> jobs,
      Optional<OutputFolder> folder,
      Syntax.Typed typed,
      Surroundings here) {
    if (typed.has(JSON)) {
      sheet.json(Main.VERSION).forEach(here.out()::println);
    } else if (!typed.has(QUIET)) {
      here.out().println(here.outInk().strong(title(jobs)));
      here.out().print(sheet.text(here.outInk()));
    }
    if (folder.isPresent() && !typed.has(QUIET)) {
      (typed.has(JSON) ? here.err() : here.out())
          .println("Written to " + folder.get().shown() + "/: " + TABLE + ", " + FIGURE);
    }
  }

  private static int accuracy(List<Job> jobs, Map<Integer, Result> results, Surroundings here) {
    int code = ExitCode.DONE;
    for (Job job : jobs) {
      Result result = results.get(job.index());
      if (!Sheet.accurateEnough(job.subject(), result)) {
        here.err()
            .println(here.errInk().alert(job.name() + ": the accuracy asked for was not reached"));
        for (String line : Sheet.accuracyMissed(job.subject(), result)) {
          here.err().println("  " + line);
        }
        code = ExitCode.ACCURACY;
      }
    }
    return code;
  }
}
