package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.Expectation;
import coldseam.cases.building.BuildingFile;
import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Table;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/** Runs cases against what they expect of themselves. */
final class ProveCommand implements Command {
  private static final String NAME = "prove";
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";
  private static final int PAGE = 100;

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "run the published validation cases, pass or fail",
        "[WHICH…]",
        0,
        "Solves every case of cases/published that has one of the words in its file name or title,"
            + " all of them without a word, and compares the results with the values that the case"
            + " file expects, each with its source and tolerance. A case file or a folder of them"
            + " may be named instead. Ends with 1 if a value is not within its tolerance.",
        List.of(
            new Syntax.Option(JSON, "", "print every comparison as one JSON object"),
            new Syntax.Option(QUIET, "", "print only what fails, and the count")),
        List.of(
            new Syntax.Example("cli/coldseam prove", "runs all published cases"),
            new Syntax.Example("cli/coldseam prove 10211", "runs those of ISO 10211"),
            new Syntax.Example(
                "cli/coldseam prove cases/demo", "runs the demo cases against their own values")));
  }

  /** A case with its comparisons. */
  private record Proof(Case of, String file, List<Expected> checks) {
    long failed() {
      return checks.stream().filter(check -> !check.passed()).count();
    }
  }

  @Override
  public int run(Syntax.Typed typed, Surroundings here)
      throws UsageException, CaseException, IOException {
    List<Case> cases = CaseList.read(files(typed.operands(), here), NAME, here);
    cases = chosen(cases, typed.operands(), here);
    List<Proof> proofs = new ArrayList<>();
    Ink ink = here.outInk();
    for (Case from : withExpectations(cases, here)) {
      Proof proof = prove(from, here);
      proofs.add(proof);
      if (!typed.has(JSON)) {
        here.out().print(text(proof, typed.has(QUIET), ink));
      }
    }
    int count = proofs.stream().mapToInt(proof -> proof.checks().size()).sum();
    long failed = proofs.stream().mapToLong(Proof::failed).sum();
    if (typed.has(JSON)) {
      here.out().println(json(proofs, count - failed, failed));
    } else {
      String sum = proofs.size() + " cases, " + (count - failed) + " passed, " + failed + " failed";
      here.out().println(failed == 0 ? ink.good(sum) : ink.bad(sum));
    }
    return failed == 0 ? ExitCode.DONE : ExitCode.NOT_MET;
  }

  /** Files to read: those named, and the published ones if a word is left or nothing was typed. */
  private static List<String> files(List<String> which, Surroundings here)
      throws UsageException, IOException {
    List<String> files = new ArrayList<>();
    boolean words = which.isEmpty();
    for (String word : which) {
      Path path = here.cwd().resolve(CaseList.path(word, NAME));
      if (Files.isDirectory(path)) {
        files.addAll(in(path));
      } else if (named(word) && BuildingFile.is(path)) {
        throw new UsageException(
            NAME,
            word
                + " is a building, which expects nothing; "
                + "cli/coldseam ledger "
                + word
                + " draws up its account");
      } else if (named(word)) {
        files.add(path.toString());
      } else {
        words = true;
      }
    }
    if (words) {
      Path home =
          here.home()
              .orElseThrow(
                  () ->
                      new UsageException(
                          NAME, "the published cases are not found; name a folder of cases"));
      files.addAll(in(home.resolve("cases").resolve("published")));
    }
    return files.stream().distinct().toList();
  }

  private static boolean named(String word) {
    return word.endsWith(".yaml") || word.endsWith(".yml");
  }

  private static List<String> in(Path folder) throws UsageException, IOException {
    List<String> found = List.of();
    if (Files.isDirectory(folder)) {
      try (Stream<Path> entries = Files.list(folder)) {
        found =
            entries
                .filter(entry -> named(entry.toString()) && !BuildingFile.is(entry))
                .map(Path::toString)
                .sorted()
                .toList();
      }
    }
    if (found.isEmpty()) {
      throw new UsageException(NAME, "there is no case in " + folder);
    }
    return found;
  }

  private static List<Case> chosen(List<Case> cases, List<String> which, Surroundings here)
      throws UsageException {
    List<String> words = new ArrayList<>();
    for (String word : which) {
      if (!named(word) && !Files.isDirectory(here.cwd().resolve(word))) {
        words.add(word.toLowerCase(Locale.ROOT));
      }
    }
    if (words.isEmpty()) {
      return cases;
    }
    List<Case> chosen = new ArrayList<>();
    for (Case from : cases) {
      String name = (from.file().getFileName() + " " + from.title()).toLowerCase(Locale.ROOT);
      boolean asFile = which.stream().anyMatch(w -> named(w) && from.file().endsWith(w));
      if (asFile || words.stream().anyMatch(name::contains)) {
        chosen.add(from);
      }
    }
    if (chosen.isEmpty()) {
      throw new UsageException(
          NAME, "no published case has \"" + String.join(" ", which) + "\" in its name or title");
    }
    return chosen;
  }

  /** A case without expectations proves nothing; it is told, and nothing else is refused. */
  private static List<Case> withExpectations(List<Case> cases, Surroundings here)
      throws UsageException {
    List<Case> expecting = new ArrayList<>();
    List<String> silent = new ArrayList<>();
    for (Case from : cases) {
      if (from.expectations().isEmpty()) {
        silent.add(here.shown(from.file()) + " expects nothing");
      } else {
        expecting.add(from);
      }
    }
    if (expecting.isEmpty()) {
      throw new UsageException(NAME, silent.get(0) + "; give it an expect: block");
    }
    silent.forEach(here.err()::println);
    return expecting;
  }

  private static Proof prove(Case from, Surroundings here) throws CaseException {
    String file = here.shown(from.file());
    Map<Optional<String>, Result> results = new LinkedHashMap<>();
    List<Expected> checks = new ArrayList<>();
    for (Expectation expectation : from.expectations()) {
      Optional<String> variant = expectation.variant();
      if (!results.containsKey(variant)) {
        results.put(variant, solve(from, variant, file, here));
      }
      checks.add(Expected.in(expectation, results.get(variant)));
    }
    return new Proof(from, file, checks);
  }

  private static Result solve(Case from, Optional<String> variant, String file, Surroundings here)
      throws CaseException {
    if (!here.errIsTerminal()) {
      return CaseList.work(
          from, variant, detail -> Solver.solve(detail, from.accuracy(), Progress.SILENT));
    }
    try (ProgressLine progress = new ProgressLine(here.err(), file)) {
      return CaseList.work(
          from, variant, detail -> Solver.solve(detail, from.accuracy(), progress));
    }
  }

  private static String text(Proof proof, boolean failuresOnly, Ink ink) {
    StringBuilder text = new StringBuilder();
    Table table = new Table("llrrrrll", 2, PAGE);
    String source = "";
    for (Expected check : proof.checks()) {
      if (failuresOnly && check.passed()) {
        continue;
      }
      Expectation e = check.expectation();
      String from = e.source() + " (" + e.status() + ")";
      if (!from.equals(source)) {
        flush(text, source, table, ink);
        table = new Table("llrrrrll", 2, PAGE);
        table.row(
            "",
            "",
            ink.faint("reference"),
            ink.faint("within"),
            ink.faint("computed"),
            ink.faint("off by"));
        source = from;
      }
      table.row(row(check, ink));
    }
    flush(text, source, table, ink);
    if (text.length() == 0) {
      return "";
    }
    return ink.strong(proof.of().title()) + "\n" + ink.faint(proof.file()) + "\n" + text + "\n";
  }

  private static void flush(StringBuilder text, String source, Table table, Ink ink) {
    if (!table.isEmpty()) {
      text.append("  ").append(ink.faint(source)).append('\n').append(table.text());
    }
  }

  private static String[] row(Expected check, Ink ink) {
    Expectation e = check.expectation();
    int decimals = Digits.decimals(e.within()) + 1;
    String computed = "none";
    String off = "";
    if (check.computed().isPresent()) {
      computed = Digits.fixed(check.computed().getAsDouble(), decimals);
      off = Digits.signed(Digits.fixed(check.computed().getAsDouble() - e.value(), decimals));
    }
    return new String[] {
      check.passed() ? ink.good("pass") : ink.bad("FAIL"),
      check.what() + e.variant().map(v -> ", variant " + v).orElse(""),
      Digits.shortest(e.value(), 7),
      Digits.significant(e.within(), 2),
      computed,
      off,
      check.unit()
    };
  }

  private static String json(List<Proof> proofs, long passed, long failed) {
    Json json = Json.onOneLine().object().member("coldseam", Main.VERSION);
    json.member("passed", (int) passed).member("failed", (int) failed).array("cases");
    for (Proof proof : proofs) {
      json.object().member("case", proof.of().title()).member("file", proof.file());
      json.array("checks");
      for (Expected check : proof.checks()) {
        Expectation e = check.expectation();
        json.object().member("quantity", e.quantity().name()).member("subject", e.subject());
        if (e.variant().isPresent()) {
          json.member("variant", e.variant().get());
        } else {
          json.nothing("variant");
        }
        json.member("unit", check.unit())
            .member("reference", e.value())
            .member("within", e.within())
            .member("computed", check.computed().orElse(Double.NaN))
            .member("passed", check.passed())
            .member("source", e.source())
            .member("status", e.status())
            .endObject();
      }
      json.endArray().endObject();
    }
    return json.endArray().endObject().text();
  }
}
