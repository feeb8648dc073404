package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import coldseam.cases.WindowFile;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.cli.text.Json;
import coldseam.solver.Solver;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads and checks cases without solving. */
final class CheckCommand implements Command {
  private static final String NAME = "check";
  private static final String VARIANT = "--variant";
  private static final String JSON = "--json";
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
    return show(CaseList.read(List.of(name), NAME, here).get(0), typed, here);
  }

  private static String show(Case from, Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException {
    Optional<String> asked =
        typed.has(VARIANT) ? CaseList.variant(from, typed.value(VARIANT), NAME) : Optional.empty();
    List<Optional<String>> all = new ArrayList<>(List.of(Optional.empty()));
    from.variants().forEach(variant -> all.add(Optional.of(variant)));
    String shown = "";
    for (Optional<String> variant : all) {
      Subject subject =
          Subject.of(from, here.shown(from.file()), variant, from.accuracy(), Main.VERSION);
      String text =
          CaseList.work(
              from,
              variant,
              detail -> {
                Solver.Inspection inspection = Solver.inspect(detail);
                return typed.has(JSON)
                    ? Sheet.understoodJson(subject, inspection) + "\n"
                    : Sheet.understood(subject, inspection, here.outInk());
              });
      if (variant.equals(asked)) {
        shown = text;
      }
    }
    if (!typed.has(JSON) && !from.variants().isEmpty()) {
      shown += "\nVariants, checked too: " + String.join(", ", from.variants()) + "\n";
    }
    return shown;
  }

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
