package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Doubt;
import coldseam.cases.Problem;
import coldseam.cases.WindowFile;
import coldseam.cases.building.BuildingFile;
import coldseam.cli.plot.Understood;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.cli.text.Json;
import coldseam.mesh.partition.Defect;
import coldseam.solver.Solver;
import coldseam.solver.detail.DefectWords;
import coldseam.solver.detail.Detail;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads and checks cases without solving. */
final class CheckCommand implements Command {
  private static final String NAME = "check";
  private static final String VARIANT = "--variant";
  private static final String JSON = "--json";
  private static final String OUT = "--out";
  private static final String FORCE = "--force";
  private static final String DRAWING = "--drawing";
  private static final String QUIET = "--quiet";

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "read and check cases, list everything that would be assumed",
        "CASE…",
        1,
        "Reads each case with all its variants and resolves its section without solving. Lists what"
            + " was understood: materials, spaces, outline with films, flanks with their U and"
            + " lengths, and everything chosen for you with its source. Every mistake in a file is"
            + " listed in one go, with line and column.",
        List.of(
            new Syntax.Option(VARIANT, "NAME", "show this variant instead of the base case"),
            new Syntax.Option(
                OUT,
                "FILE",
                "write the section as understood to this SVG file, everything to look at circled"
                    + " and numbered"),
            new Syntax.Option(FORCE, "", "replace that file if it is there"),
            new Syntax.Option(
                DRAWING, "FILE", "a drawing outside of the case's folder that it may read"),
            new Syntax.Option(
                JSON,
                "",
                "print what was understood as data, one object on one line for each case;"
                    + " mistakes too"),
            new Syntax.Option(QUIET, "", "print mistakes only")),
        List.of(
            new Syntax.Example(
                "cli/coldseam check cases/demo/balcony.yaml",
                "lists what is understood and assumed"),
            new Syntax.Example(
                "cli/coldseam check --quiet cases/demo/*.yaml",
                "prints nothing if every case is in order")));
  }

  @Override
  public int run(Syntax.Typed typed, Surroundings here) throws UsageException, CaseException {
    List<Problem> problems = new ArrayList<>();
    if (typed.has(OUT)) {
      if (typed.operands().size() > 1) {
        throw new UsageException(
            NAME, "--out takes the picture of one case; check them one by one");
      }
      new NewFiles(NAME, typed.has(FORCE), here).check(picture(typed, here));
    }
    boolean first = true;
    for (String name : typed.operands()) {
      try {
        String shown = show(name, typed, here);
        if (!typed.has(QUIET)) {
          here.out().print(first || typed.has(JSON) ? shown : "\n\n" + shown);
        }
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
        if (typed.has(JSON)) {
          here.out().println(json(here.shown(CaseList.path(name, NAME)), mistakes, here));
        }
      }
      first = false;
    }
    if (problems.isEmpty()) {
      return ExitCode.DONE;
    }
    if (typed.has(JSON)) {
      return ExitCode.BAD_INPUT;
    }
    throw new CaseException(problems);
  }

  private static String show(String name, Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException {
    Path file = here.cwd().resolve(CaseList.path(name, NAME));
    if (WindowFile.is(file)) {
      if (typed.has(VARIANT)) {
        throw new UsageException(NAME, name + " is a window file, which has no variants");
      }
      return WindowJobs.understood(WindowFile.read(file), typed.has(JSON), here);
    }
    if (BuildingFile.is(file)) {
      if (typed.has(VARIANT)) {
        throw new UsageException(NAME, name + " is a building file, which has no variants");
      }
      return LedgerCommand.understood(BuildingFile.read(file), typed.has(JSON), here);
    }
    List<String> drawings = typed.has(DRAWING) ? List.of(typed.value(DRAWING)) : List.of();
    return show(CaseList.read(List.of(name), drawings, NAME, here).get(0), typed, here);
  }

  private static Path picture(Syntax.Typed typed, Surroundings here) throws UsageException {
    return here.cwd().resolve(CaseList.path(typed.value(OUT), NAME));
  }

  /** Writes the section as understood; tells the list in words that its numbers refer to. */
  private static String draw(
      Case from,
      Optional<String> variant,
      Detail detail,
      Solver.Inspection inspection,
      Syntax.Typed typed,
      Surroundings here)
      throws UsageException {
    List<String> names = new ArrayList<>();
    detail.fills().forEach(fill -> names.add(fill.name()));
    List<Understood.Mark> marks = new ArrayList<>();
    for (Doubt doubt : from.doubts(variant)) {
      marks.add(new Understood.Mark(doubt.where(), doubt.text()));
    }
    for (Defect defect : inspection.partition().defects()) {
      if (defect.kind() != Defect.Kind.LINE_OFF_EDGE) {
        marks.add(new Understood.Mark(defect.where(), DefectWords.of(defect, names)));
      }
    }
    String svg =
        Understood.svg(
            from.title(),
            "Section as understood" + variant.map(v -> " · variant “" + v + "”").orElse(""),
            inspection.partition(),
            detail.fills(),
            marks);
    Path file = picture(typed, here);
    new NewFiles(NAME, typed.has(FORCE), here)
        .write(Map.of(file, svg.getBytes(StandardCharsets.UTF_8)));
    StringBuilder list = new StringBuilder("\nShown in " + here.shown(file) + ", by number\n");
    int number = 1;
    for (String name : names) {
      list.append("  ").append(number++).append("  ").append(name).append('\n');
    }
    for (Understood.Mark mark : marks) {
      list.append("  ").append(number++).append("  ").append(mark.text()).append('\n');
    }
    return list.toString();
  }

  private static String show(Case from, Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException {
    Optional<String> asked =
        typed.has(VARIANT) ? CaseList.variant(from, typed.value(VARIANT), NAME) : Optional.empty();
    List<Optional<String>> all = new ArrayList<>(List.of(Optional.empty()));
    from.variants().forEach(variant -> all.add(Optional.of(variant)));
    String shown = "";
    Shown last = null;
    for (Optional<String> variant : all) {
      Subject subject =
          Subject.of(from, here.shown(from.file()), variant, from.accuracy(), Main.VERSION);
      Shown one =
          CaseList.work(
              from,
              variant,
              detail -> {
                Solver.Inspection inspection = Solver.inspect(detail);
                String text =
                    typed.has(JSON)
                        ? Sheet.understoodJson(subject, inspection) + "\n"
                        : Sheet.understood(subject, inspection, here.outInk());
                return new Shown(text, inspection.detail(), inspection);
              });
      if (variant.equals(asked)) {
        shown = one.text();
        last = one;
      }
    }
    if (typed.has(OUT) && last != null) {
      String list = draw(from, asked, last.detail(), last.inspection(), typed, here);
      shown += typed.has(JSON) ? "" : list;
    }
    if (!typed.has(JSON) && !from.variants().isEmpty()) {
      shown += "\nVariants, checked too: " + String.join(", ", from.variants()) + "\n";
    }
    return shown;
  }

  /** What was understood of a case or variant, in words and as it is drawn. */
  private record Shown(String text, Detail detail, Solver.Inspection inspection) {}

  private static String json(String file, CaseException mistakes, Surroundings here) {
    Json json = Json.onOneLine().object().member("coldseam", Main.VERSION).member("file", file);
    json.member("valid", false).array("problems");
    for (Problem problem : mistakes.problems()) {
      json.object()
          .member("file", here.shown(Path.of(problem.file())))
          .member("line", problem.line())
          .member("column", problem.column())
          .member("wrong", problem.wrong());
      if (problem.right().isPresent()) {
        json.member("right", problem.right().get());
      } else {
        json.nothing("right");
      }
      json.endObject();
    }
    return json.endArray().endObject().text();
  }
}
