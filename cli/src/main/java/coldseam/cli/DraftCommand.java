package coldseam.cli;

import coldseam.cases.CaseException;
import coldseam.cases.Doubt;
import coldseam.cases.Problem;
import coldseam.cases.drafting.Draft;
import coldseam.cases.drawing.DrawingException;
import coldseam.cases.drawing.DrawingUnit;
import coldseam.cases.words.Undecided;
import coldseam.cli.plot.Understood;
import coldseam.cli.text.Json;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Drafts a case from a drawing. */
final class DraftCommand implements Command {
  private static final String NAME = "draft";
  private static final String OUT = "--out";
  private static final String UNIT = "--unit";
  private static final String TOLERANCE = "--tolerance";
  private static final String FORCE = "--force";
  private static final String JSON = "--json";
  private static final String QUIET = "--quiet";

  @Override
  public Syntax syntax() {
    return new Syntax(
        NAME,
        "turn an SVG or DXF drawing into a case to complete",
        "DRAWING",
        1,
        "Reads an SVG file, packed or not, or an ASCII DXF file and writes a case that takes its"
            + " shapes from the drawing in place: layers and fills become areas, lines that nearly"
            + " meet are joined, the open regions around become spaces. Materials, temperatures and"
            + " whatever else the drawing does not tell are marked "
            + Undecided.mark("")
            + "; check lists them. A picture"
            + " beside the case shows what was understood, with everything to look at circled and"
            + " numbered as in the case. No file is overwritten.",
        List.of(
            new Syntax.Option(
                OUT, "FILE", "the case to write; else beside the drawing, sill.yaml for sill.dxf"),
            new Syntax.Option(
                UNIT, "UNIT", "what it is drawn in, mm, cm, m, in or ft, whatever the file says"),
            new Syntax.Option(
                TOLERANCE,
                "N",
                "how far apart corners may be that are joined, in the unit of the drawing; else a"
                    + " 4000th of its larger dimension"),
            new Syntax.Option(FORCE, "", "replace the case and the picture if they are there"),
            new Syntax.Option(JSON, "", "print what was understood as one JSON object"),
            new Syntax.Option(QUIET, "", "print warnings only")),
        List.of(
            new Syntax.Example(
                "cli/coldseam draft cases/demo/drawings/slab-edge.dxf --out edge.yaml",
                "writes edge.yaml and edge.understood.svg, lists what to look at")));
  }

  @Override
  public int run(Syntax.Typed typed, Surroundings here) throws UsageException, CaseException {
    if (typed.operands().size() > 1) {
      throw new UsageException(NAME, "one drawing at a time");
    }
    Path drawing = here.cwd().resolve(CaseList.path(typed.operands().get(0), NAME));
    Path file =
        typed.has(OUT)
            ? here.cwd().resolve(CaseList.path(typed.value(OUT), NAME))
            : drawing.resolveSibling(stem(drawing) + ".yaml");
    Path picture = file.resolveSibling(stem(file) + ".understood.svg");
    if (file.toAbsolutePath().normalize().equals(drawing.toAbsolutePath().normalize())
        || picture.toAbsolutePath().normalize().equals(drawing.toAbsolutePath().normalize())) {
      throw new UsageException(NAME, "the case would replace the drawing; choose another --out");
    }
    NewFiles files = new NewFiles(NAME, typed.has(FORCE), here);
    Draft.Said said = new Draft.Said(unit(typed), tolerance(typed));
    files.check(file);
    files.check(picture);
    Path folder = file.toAbsolutePath().normalize().getParent();
    String shown = relative(folder, drawing.toAbsolutePath().normalize());
    Draft draft = draft(drawing, shown, String.valueOf(picture.getFileName()), said);
    Map<Path, byte[]> written = new LinkedHashMap<>();
    written.put(picture, picture(draft, stem(file)).getBytes(StandardCharsets.UTF_8));
    written.put(file, here.named(draft.text()).getBytes(StandardCharsets.UTF_8));
    files.write(written);
    List<String> warnings = new ArrayList<>(draft.warnings());
    if (shown.startsWith("..") || Path.of(shown).isAbsolute()) {
      warnings.add(
          "the drawing lies outside of the case's folder: name it wherever the case is read,"
              + " --drawing "
              + here.shown(drawing));
    }
    for (String warning : warnings) {
      here.err().println(here.errInk().alert("warning: ") + warning);
    }
    if (typed.has(JSON)) {
      here.out().println(json(draft, here.shown(file), here.shown(picture), warnings));
    } else if (!typed.has(QUIET)) {
      here.out().print(here.named(card(draft, here.shown(file), here.shown(picture))));
    }
    return ExitCode.DONE;
  }

  private static Draft draft(Path drawing, String shown, String picture, Draft.Said said)
      throws CaseException {
    try {
      return Draft.of(drawing, shown, picture, said);
    } catch (DrawingException e) {
      throw new CaseException(
          List.of(new Problem(drawing.toString(), e.line(), 0, e.wrong(), e.right())));
    }
  }

  private static String stem(Path file) {
    String name = String.valueOf(file.getFileName());
    String lower = name.toLowerCase(Locale.ROOT);
    for (String end : List.of(".svg.gz", ".svgz", ".svg", ".dxf", ".yaml", ".yml")) {
      if (lower.endsWith(end) && name.length() > end.length()) {
        return name.substring(0, name.length() - end.length());
      }
    }
    return name;
  }

  private static String relative(Path folder, Path drawing) {
    try {
      return folder.relativize(drawing).toString().replace('\\', '/');
    } catch (IllegalArgumentException e) {
      return drawing.toString();
    }
  }

  private static Optional<DrawingUnit> unit(Syntax.Typed typed) throws UsageException {
    if (!typed.has(UNIT)) {
      return Optional.empty();
    }
    for (DrawingUnit unit : DrawingUnit.values()) {
      if (unit.symbol().equals(typed.value(UNIT))) {
        return Optional.of(unit);
      }
    }
    throw new UsageException(NAME, "--unit is mm, cm, m, in or ft, not " + typed.value(UNIT));
  }

  private static OptionalDouble tolerance(Syntax.Typed typed) throws UsageException {
    if (!typed.has(TOLERANCE)) {
      return OptionalDouble.empty();
    }
    try {
      double value = Double.parseDouble(typed.value(TOLERANCE));
      if (value >= 0 && value < 1e9) {
        return OptionalDouble.of(value);
      }
    } catch (NumberFormatException e) {
      throw new UsageException(
          NAME, "--tolerance is a number, such as 0.5, not " + typed.value(TOLERANCE));
    }
    throw new UsageException(NAME, "--tolerance is 0 or more, not " + typed.value(TOLERANCE));
  }

  /** The picture; what is undecided looks like a mineral. */
  private static String picture(Draft draft, String title) {
    List<Fill> fills = new ArrayList<>();
    for (int label = 0; label < draft.names().size(); label++) {
      String name = draft.names().get(label);
      fills.add(draft.isOpen(label) ? Space.of(name, 0, Exposure.OUTSIDE) : Material.of(name, 1));
    }
    List<Understood.Mark> marks = new ArrayList<>();
    for (Doubt doubt : draft.doubts()) {
      marks.add(new Understood.Mark(doubt.where(), doubt.text()));
    }
    return Understood.svg(
        title, "Drawing as understood · materials undecided", draft.partition(), fills, marks);
  }

  private static String card(Draft draft, String file, String picture) {
    StringBuilder out = new StringBuilder("Written to " + file + ", shown in " + picture + "\n");
    int number = 1;
    out.append("\nAreas\n");
    for (String name : draft.names()) {
      out.append("  ").append(number++).append("  ").append(name).append('\n');
    }
    if (!draft.doubts().isEmpty()) {
      out.append("\nTo look at\n");
      for (Doubt doubt : draft.doubts()) {
        out.append("  ").append(number++).append("  ").append(doubt.text()).append('\n');
      }
    }
    out.append("\nNext: replace every ").append(Undecided.mark("")).append(" in ").append(file);
    return out.append("; cli/coldseam check ").append(file).append(" lists them\n").toString();
  }

  private static String json(Draft draft, String file, String picture, List<String> warnings) {
    Json json = Json.onOneLine().object().member("coldseam", Main.VERSION);
    json.member("file", file).member("picture", picture).array("areas");
    int number = 1;
    for (int label = 0; label < draft.names().size(); label++) {
      json.object()
          .member("number", number++)
          .member("name", draft.names().get(label))
          .member("open", draft.isOpen(label))
          .member("area_m2", draft.partition().labelArea(label))
          .endObject();
    }
    json.endArray().array("doubts");
    for (Doubt doubt : draft.doubts()) {
      json.object()
          .member("number", number++)
          .member("x_mm", doubt.where().x() * 1000)
          .member("y_mm", doubt.where().y() * 1000)
          .member("text", doubt.text())
          .endObject();
    }
    json.endArray().member("warnings", warnings);
    return json.endObject().text();
  }
}
