package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Changes;
import coldseam.cases.study.Measure;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.cases.study.Seek;
import coldseam.cases.study.StudyException;
import coldseam.cases.study.Target;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Table;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;

/** Finds the value that just meets a target. */
final class SeekCommand implements Command {
  private static final String NAME = "seek";
  private static final String SET = "--set";
  private static final String UNTIL = "--until";
  private static final String STEP = "--step";
  private static final String LARGEST = "--largest";
  private static final String VARIANT = "--variant";
  private static final String ACCURACY = "--accuracy";
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "find the value that just meets a target",
        "CASE",
        1,
        "Finds the smallest value in a range at which a number meets a target, in at most "
            + Seek.MOST_SOLVES
            + " solves. What meets it is decided by intervals: the whole interval of the answer"
            + " meets the target, that of the step before does not. f_Rsi and surface temperatures"
            + " have no bounds; they must meet it with a margin of 0.01 K, and are labelled"
            + " estimates. Between the values solved the number is taken to rise or fall throughout;"
            + " whether the solves do is checked. Ends with 1 if no value meets the target.",
        List.of(
            new Syntax.Option(SET, "NAME=FROM..TO", "the named value and its range"),
            new Syntax.Option(
                UNTIL,
                "TARGET",
                "psi, U, L2D, chi, L3D, fRsi or coldest, with a name after a point where there are several,"
                    + " then <= or >= and a number"),
            new Syntax.Option(STEP, "S", "between values tried; default a round one"),
            new Syntax.Option(LARGEST, "", "find the largest value instead of the smallest"),
            new Syntax.Option(VARIANT, "NAME", "start from this variant"),
            new Syntax.Option(ACCURACY, "LIST", "half-widths to begin with, as for solve"),
            new Syntax.Option(JSON, "", "print the outcome as data, one object on one line"),
            new Syntax.Option(QUIET, "", "print the value alone, nothing if there is none")),
        List.of(
            new Syntax.Example(
                "cli/coldseam seek cases/demo/balcony.yaml --set insulation=60..300 --until"
                    + " \"fRsi >= 0.75\"",
                "the least insulation with which the coldest surface just meets a limit"),
            new Syntax.Example(
                "cli/coldseam seek wall.yaml --set depth=4..12in --step 0.5 --until"
                    + " \"psi.external <= 0.10\"",
                "one of several ψ, in steps of half an inch")));
  }

  /** Everything a run needs. */
  private record Asked(Case from, Optional<String> variant, Target target, Seek seek) {}

  @Override
  public int run(Syntax.Typed typed, Surroundings here) throws UsageException, CaseException {
    try {
      Asked asked = asked(typed, here);
      Seek.Outcome outcome = asked.seek().run();
      if (typed.has(JSON)) {
        here.out().println(json(asked, outcome, here));
      } else if (!typed.has(QUIET)) {
        here.out().print(card(asked, outcome, here));
      } else if (outcome.answer().isPresent()) {
        here.out().println(outcome.answer().get().setting());
      }
      return switch (outcome.ending()) {
        case FOUND, MET_AT_END -> ExitCode.DONE;
        case NONE -> ExitCode.NOT_MET;
        case NOT_CERTIFIED -> ExitCode.ACCURACY;
      };
    } catch (StudyException e) {
      throw new UsageException(NAME, e.getMessage());
    }
  }

  private static Asked asked(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, StudyException {
    if (typed.operands().size() > 1) {
      throw new UsageException(NAME, "one case at a time");
    }
    if (!typed.has(SET) || !typed.has(UNTIL)) {
      throw new UsageException(
          NAME,
          "needs --set NAME=FROM..TO and --until TARGET, e.g. --set insulation=100..300 --until"
              + " 'psi.external <= 0.10'");
    }
    Target target = Target.read(typed.value(UNTIL));
    Case from = CaseList.read(typed.operands(), NAME, here).get(0);
    Optional<String> variant =
        typed.has(VARIANT) ? CaseList.variant(from, typed.value(VARIANT), NAME) : Optional.empty();
    Accuracy accuracy =
        typed.has(ACCURACY)
            ? AccuracyOption.read(from.accuracy(), typed.value(ACCURACY))
            : from.accuracy();
    Seek seek =
        Seek.of(
            from,
            variant,
            typed.value(SET),
            typed.has(STEP) ? Optional.of(typed.value(STEP)) : Optional.empty(),
            typed.has(LARGEST),
            target,
            accuracy,
            solves(from, variant, typed, here));
    return new Asked(from, variant, target, seek);
  }

  private static Seek.Solves solves(
      Case from, Optional<String> variant, Syntax.Typed typed, Surroundings here) {
    return (changes, accuracy) -> {
      if (!here.errIsTerminal() || typed.has(QUIET)) {
        return solve(from, variant, changes, accuracy, Progress.SILENT);
      }
      try (ProgressLine progress = new ProgressLine(here.err(), changes.inWords())) {
        return solve(from, variant, changes, accuracy, progress);
      }
    };
  }

  private static Result solve(
      Case from, Optional<String> variant, Changes changes, Accuracy accuracy, Progress progress)
      throws CaseException {
    return CaseList.work(
        from, variant, changes, detail -> Solver.solve(detail, accuracy, progress));
  }

  private static String card(Asked asked, Seek.Outcome outcome, Surroundings here) {
    Ink ink = here.outInk();
    StringBuilder text = new StringBuilder();
    String variant = asked.variant().map(name -> ", variant \"" + name + "\"").orElse("");
    text.append(ink.strong(asked.from().title())).append(variant).append('\n');
    text.append(ink.faint(here.shown(asked.from().file()))).append("\n\n");
    text.append(Table.wrapped(answer(asked, outcome, ink), 92, "")).append("\n\n");
    Table table = new Table("lrll", 2, 92);
    table.row(asked.seek().name(), name(outcome), "", "");
    for (Seek.Solve solve : outcome.solves()) {
      Measure measure = solve.measure();
      String said =
          asked.target().met(measure)
              ? ink.good("meets it")
              : asked.target().missed(measure) ? "does not" : "not decided";
      table.row(solve.setting(), StudyFigures.of(measure), measure.kind().unit(), said);
    }
    text.append(table.text()).append('\n');
    text.append(Table.wrapped(conditions(outcome), 92, "")).append('\n');
    if (outcome.answer().isPresent()) {
      text.append("  ").append(again(asked, outcome.answer().get(), here)).append('\n');
    }
    return text.append(ink.faint(Sheet.safety())).append('\n').toString();
  }

  private static String name(Seek.Outcome outcome) {
    Measure measure = outcome.solves().get(0).measure();
    return measure.name() + (measure.knowledge() == Knowledge.ESTIMATE ? " (estimate)" : "");
  }

  private static String target(Asked asked, Seek.Outcome outcome) {
    Measure measure = outcome.solves().get(0).measure();
    String unit = measure.kind().unit();
    return measure.name()
        + (asked.target().atMost() ? " ≤ " : " ≥ ")
        + Digits.shortest(asked.target().limit(), 6)
        + (unit.isEmpty() ? "" : " " + unit);
  }

  private static String answer(Asked asked, Seek.Outcome outcome, Ink ink) {
    String name = asked.seek().name();
    String target = target(asked, outcome);
    switch (outcome.ending()) {
      case NONE -> {
        return ink.alert("No value of " + name + " that was solved meets " + target + ".");
      }
      case NOT_CERTIFIED -> {
        return ink.alert(
            "Nothing is proved of "
                + outcome.solves().get(0).measure().name()
                + " here, so nothing can be decided by intervals.");
      }
      case MET_AT_END -> {
        return ink.strong(name + " = " + outcome.answer().get().setting())
            + ": the end of the range meets "
            + target
            + " already.";
      }
      default -> {
        return found(asked, outcome, ink, target);
      }
    }
  }

  private static String found(Asked asked, Seek.Outcome outcome, Ink ink, String target) {
    Seek.Solve before = outcome.before().get();
    String text =
        ink.strong(asked.seek().name() + " = " + outcome.answer().get().setting())
            + " meets "
            + target
            + "; "
            + before.setting();
    text +=
        asked.target().missed(before.measure())
            ? " does not"
            : " cannot be decided: its interval still holds the target";
    return outcome.adjacent()
        ? text + ", a step of " + asked.seek().step() + " away."
        : text + "; what lies between was not solved.";
  }

  private static String conditions(Seek.Outcome outcome) {
    Measure measure = outcome.solves().get(0).measure();
    String text =
        measure.knowledge() == Knowledge.ESTIMATE
            ? "Estimates without bounds, decided with a margin of 0.01 K. "
            : "Decided by proved intervals. ";
    if (outcome.solves().size() < 2) {
      return text + "1 solve.";
    }
    return text
        + (outcome.monotone()
            ? "Assumed that it rises or falls throughout between the values solved, as the "
                + outcome.solves().size()
                + " solves do."
            : "It does not rise or fall throughout: a value that was not solved may meet the target"
                + " too. "
                + outcome.solves().size()
                + " solves.");
  }

  /** The command that solves the answer again, as accurately as it was decided. */
  private static String again(Asked asked, Seek.Solve answer, Surroundings here) {
    StringBuilder command = new StringBuilder("cli/coldseam solve ");
    command.append(quoted(here.shown(asked.from().file())));
    asked.variant().ifPresent(name -> command.append(" --variant ").append(quoted(name)));
    command.append(" --set ").append(quoted(asked.seek().name() + "=" + answer.setting()));
    if (answer.measure().knowledge() == Knowledge.CERTIFIED) {
      command.append(" --accuracy ");
      command.append(AccuracyOption.written(answer.measure().kind(), answer.accuracy()));
    }
    return command.toString();
  }

  private static String quoted(String word) {
    return word.indexOf(' ') < 0 ? word : '"' + word + '"';
  }

  private static String json(Asked asked, Seek.Outcome outcome, Surroundings here) {
    Json json = Json.onOneLine().object().member("coldseam", Main.VERSION);
    json.member("case", asked.from().title()).member("file", here.shown(asked.from().file()));
    if (asked.variant().isPresent()) {
      json.member("variant", asked.variant().get());
    } else {
      json.nothing("variant");
    }
    Measure first = outcome.solves().get(0).measure();
    json.member("set", asked.seek().name())
        .member("step", asked.seek().step())
        .member("until", target(asked, outcome))
        .member("quantity", first.typedName())
        .member("unit", first.kind().unit())
        .member("limit", asked.target().limit())
        .member("certified", first.knowledge() == Knowledge.CERTIFIED)
        .member("ending", word(outcome.ending()))
        .member("monotone", outcome.monotone());
    solve(json, "answer", outcome.answer(), asked);
    solve(json, "before", outcome.before(), asked);
    json.member("adjacent", outcome.adjacent()).array("solves");
    for (Seek.Solve solve : outcome.solves()) {
      json.object();
      members(json, solve, asked);
      json.endObject();
    }
    return json.endArray().endObject().text();
  }

  private static String word(Seek.Ending ending) {
    return switch (ending) {
      case FOUND -> "found";
      case MET_AT_END -> "met at the end of the range";
      case NONE -> "none";
      case NOT_CERTIFIED -> "not certified";
    };
  }

  private static void solve(Json json, String name, Optional<Seek.Solve> solve, Asked asked) {
    if (solve.isEmpty()) {
      json.nothing(name);
      return;
    }
    json.object(name);
    members(json, solve.get(), asked);
    json.endObject();
  }

  private static void members(Json json, Seek.Solve solve, Asked asked) {
    Measure measure = solve.measure();
    json.member("value", solve.setting())
        .member("result", measure.value())
        .member("lower", measure.lower())
        .member("upper", measure.upper())
        .member("decided", asked.target().met(measure) || asked.target().missed(measure))
        .member("meets", asked.target().met(measure));
    if (measure.knowledge() == Knowledge.CERTIFIED) {
      json.member("accuracy", AccuracyOption.written(measure.kind(), solve.accuracy()));
    }
  }
}
