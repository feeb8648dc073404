package coldseam.cli;

import coldseam.cases.library.Entry;
import coldseam.cases.library.Library;
import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Table;
import java.util.List;
import java.util.OptionalDouble;

/** Searches the material library. */
final class MaterialsCommand implements Command {
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";
  private static final int PAGE = 100;

  @Override
  public Syntax syntax() {
    return new Syntax(
        "materials",
        "search the material library",
        "[WORD…]",
        0,
        "Lists the materials in whose names every word occurs, all of them without a word. In a"
            + " case, a name stands for the material: \"insulation: EPS\". μ is the vapour"
            + " resistance factor, dry and wet cup.",
        List.of(
            new Syntax.Option(JSON, "", "print the list as one JSON object"),
            new Syntax.Option(QUIET, "", "print names only")),
        List.of(
            new Syntax.Example("cli/coldseam materials mineral wool", "finds mineral wool"),
            new Syntax.Example(
                "cli/coldseam materials --json", "prints the whole library as data")));
  }

  @Override
  public int run(Syntax.Typed typed, Surroundings here) {
    List<Entry> found =
        typed.operands().isEmpty() ? Library.all() : Library.search(typed.operands());
    if (typed.has(JSON)) {
      here.out().println(json(found));
    } else if (typed.has(QUIET)) {
      found.forEach(entry -> here.out().println(entry.name()));
    } else if (!found.isEmpty()) {
      here.out().print(table(found, here.outInk()));
    }
    if (found.isEmpty()) {
      String typedWords = String.join(" ", typed.operands());
      List<String> near = Library.nearest(typedWords);
      here.err()
          .println(
              "no material is called \""
                  + typedWords
                  + "\""
                  + (near.isEmpty() ? "" : "; the nearest are " + String.join(", ", near)));
    }
    return ExitCode.DONE;
  }

  private static String table(List<Entry> found, Ink ink) {
    Table table = new Table("lrrrrl", 0, PAGE);
    table.row(
        ink.strong("material"),
        ink.strong("λ W/(m·K)"),
        ink.strong("ρ kg/m³"),
        ink.strong("μ dry | wet"),
        ink.strong("ε"),
        ink.strong("source"));
    for (Entry entry : found) {
      table.row(
          entry.name(),
          Digits.shortest(entry.conductivityWPerMK(), 5),
          figure(entry.densityKgPerM3()),
          vapour(entry),
          figure(entry.emissivity()),
          ink.faint(entry.source() + (entry.status().equals("memory") ? " (from memory)" : "")));
    }
    return table.text();
  }

  private static String vapour(Entry entry) {
    String dry = figure(entry.vapourResistanceDry());
    String wet = figure(entry.vapourResistanceWet());
    return dry.equals(wet) ? dry : dry + " | " + wet;
  }

  private static String figure(OptionalDouble value) {
    return value.isPresent() ? Digits.shortest(value.getAsDouble(), 3) : "";
  }

  private static String json(List<Entry> found) {
    Json json = Json.onOneLine().object().member("coldseam", Main.VERSION).array("materials");
    for (Entry entry : found) {
      json.object()
          .member("name", entry.name())
          .member("otherNames", entry.otherNames())
          .member("conductivity_W_per_mK", entry.conductivityWPerMK());
      number(json, "density_kg_per_m3", entry.densityKgPerM3());
      number(json, "vapourResistanceDry", entry.vapourResistanceDry());
      number(json, "vapourResistanceWet", entry.vapourResistanceWet());
      number(json, "emissivity", entry.emissivity());
      json.member("source", entry.source()).member("status", entry.status()).endObject();
    }
    return json.endArray().endObject().text();
  }

  /** What is not known is {@code null}; what is infinite is the text {@code "infinite"}. */
  private static void number(Json json, String name, OptionalDouble value) {
    if (value.isEmpty()) {
      json.nothing(name);
    } else if (Double.isInfinite(value.getAsDouble())) {
      json.member(name, "infinite");
    } else {
      json.member(name, value.getAsDouble());
    }
  }
}
