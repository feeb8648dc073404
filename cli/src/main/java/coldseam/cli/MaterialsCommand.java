package coldseam.cli;

import coldseam.cases.library.Entry;
import coldseam.cases.library.Library;
import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Table;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** Searches the material library. */
final class MaterialsCommand implements Command {
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";
  private static final int PAGE = 100;
  private static final String INDENT = "    ";
  private static final double INCH_M = 0.0254;

  /** 1 h·ft²·°F/Btu in m²·K/W. */
  private static final double RATING_M2K_PER_W = 0.1761101838;

  @Override
  public Syntax syntax() {
    return new Syntax(
        "materials",
        "search the material library",
        "[WORD…]",
        0,
        "Lists the materials in whose names every word occurs, all of them without a word. In a"
            + " case, a name stands for the material: \"insulation: EPS\", and so does each of its"
            + " other names. R per inch is in h·ft²·°F/Btu. μ is the vapour resistance factor, dry"
            + " and wet cup. \"From memory\": compare with the standard or the product's"
            + " declaration before you rely on it.",
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

  /** One line a material, its other names under it, the sources by number at the end. */
  private static String table(List<Entry> found, Ink ink) {
    Table table = new Table("lrrrrrr", 0, PAGE);
    table.row(
        ink.strong("material"),
        ink.strong("λ W/(m·K)"),
        ink.strong("R per inch"),
        ink.strong("ρ kg/m³"),
        ink.strong("μ dry | wet"),
        ink.strong("ε"),
        ink.strong("source"));
    List<String> sources = new ArrayList<>();
    for (Entry entry : found) {
      String source = entry.source() + (entry.status().equals("memory") ? " (from memory)" : "");
      if (!sources.contains(source)) {
        sources.add(source);
      }
      table.row(
          entry.name(),
          Digits.shortest(entry.conductivityWPerMK(), 5),
          Digits.shortest(perInch(entry), 2),
          figure(entry.densityKgPerM3()),
          vapour(entry),
          figure(entry.emissivity()),
          "[" + (sources.indexOf(source) + 1) + "]");
    }
    String[] lines = table.text().split("\n");
    StringBuilder text = new StringBuilder(lines[0]).append('\n');
    for (int i = 0; i < found.size(); i++) {
      text.append(lines[i + 1]).append('\n');
      if (!found.get(i).otherNames().isEmpty()) {
        String names = "or " + String.join(", ", found.get(i).otherNames());
        String under = Table.wrapped(names, PAGE - INDENT.length(), INDENT);
        text.append(INDENT).append(ink.faint(under)).append('\n');
      }
    }
    for (int i = 0; i < sources.size(); i++) {
      text.append(ink.faint("[" + (i + 1) + "] " + sources.get(i))).append('\n');
    }
    return text.toString();
  }

  /** R of one inch, h·ft²·°F/Btu. */
  private static double perInch(Entry entry) {
    return INCH_M / entry.conductivityWPerMK() / RATING_M2K_PER_W;
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
          .member("conductivity_W_per_mK", entry.conductivityWPerMK())
          .member("resistancePerInch_h_ft2_F_per_Btu", perInch(entry));
      number(json, "density_kg_per_m3", entry.densityKgPerM3());
      number(json, "vapourResistanceDry", entry.vapourResistanceDry());
      number(json, "vapourResistanceWet", entry.vapourResistanceWet());
      number(json, "emissivity", entry.emissivity());
      number(json, "temperatureCoefficient_per_K", entry.conversion().temperaturePerK());
      number(json, "moistureCoefficientByVolume", entry.conversion().moistureByVolume());
      number(json, "moistureCoefficientByMass", entry.conversion().moistureByMass());
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
