package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** From a drawing to a certified ψ, and nothing that stands in the way is overwritten. */
class DraftCommandTest {
  private static final Path DRAWINGS = Root.folder().resolve("cases/demo/drawings");

  /** What a person would choose for the layers of the demo drawings. */
  private static final Map<String, String> CHOICES =
      Map.ofEntries(
          Map.entry("BRICKWORK", "perforated brick 1000"),
          Map.entry("HATCH ANSI37", "mineral wool"),
          Map.entry("MINERAL-WOOL", "mineral wool"),
          Map.entry("CONCRETE-SLAB", "reinforced concrete 1 % steel"),
          Map.entry("SCREED", "{conductivity: 1.35}"),
          Map.entry("IMPACT-SOUND-INSULATION", "mineral wool"),
          Map.entry("PLASTER", "gypsum plaster"),
          Map.entry("GYPSUM-PLASTER", "gypsum plaster"),
          Map.entry("RENDER", "cement render"),
          Map.entry("CEMENT-RENDER", "cement render"),
          Map.entry("SHELF-ANGLE-STEEL", "steel"),
          Map.entry("TIMBER-FRAME", "timber 500"),
          Map.entry("SILL-BOARD", "particleboard"),
          Map.entry("POLYURETHANE-FOAM", "PUR"),
          Map.entry("SUPPORT-XPS", "XPS"),
          Map.entry("ALUMINIUM-SHEET", "aluminium"),
          Map.entry("aerated concrete", "autoclaved aerated concrete 600"),
          Map.entry("reinforced concrete", "reinforced concrete 1 % steel"),
          Map.entry("mineral wool", "{from: mineral wool}"),
          Map.entry("screed", "{conductivity: 1.35}"),
          Map.entry("wood fibre board", "wood fibre insulating board"),
          Map.entry("cement render", "{from: cement render}"),
          Map.entry("gypsum plaster", "{from: gypsum plaster}"),
          Map.entry("gypsum board", "{from: gypsum board}"),
          Map.entry("EPS", "{from: EPS}"),
          Map.entry("EPS wedge", "EPS"),
          Map.entry("OSB", "{from: OSB}"),
          Map.entry("timber", "{from: timber}"),
          Map.entry("frame timber hardwood", "hardwood"),
          Map.entry("spray foam PUR", "PUR"),
          Map.entry("chipboard", "{from: chipboard}"),
          Map.entry("aluminium", "{from: aluminium}"));

  @TempDir Path dir;

  private Path copied(String name) throws IOException {
    return Files.copy(DRAWINGS.resolve(name), dir.resolve(name));
  }

  /**
   * Replaces the marks of a drafted case, and nothing else.
   *
   * @param outerFace x of the wall's outer face; a region beyond it is outdoors
   */
  private static String chosen(String drafted, double outerFace, String dimensions) {
    StringBuilder text = new StringBuilder();
    Pattern material = Pattern.compile("  (.*): \"?TODO .*");
    Pattern region = Pattern.compile("(.*)TODO indoors or outdoors(, around: \\[)([-0-9.]+)(.*)");
    for (String line : drafted.split("\n")) {
      Matcher named = material.matcher(line);
      Matcher open = region.matcher(line);
      if (line.startsWith("#") || !line.contains("TODO")) {
        text.append(line);
      } else if (line.startsWith("    dimensions")) {
        text.append("    dimensions: ").append(dimensions);
      } else if (open.matches()) {
        boolean out = Double.parseDouble(open.group(3)) > outerFace;
        text.append(open.group(1)).append(out ? "outdoors" : "indoors");
        text.append(open.group(2)).append(open.group(3)).append(open.group(4));
      } else if (line.contains("hollow")) {
        text.append(line.replaceFirst("\"TODO [^\"]*\"", "EPS"));
      } else if (line.contains("temperature")) {
        text.append(line.replaceFirst("TODO (-?[0-9]+) perhaps", "$1"));
      } else {
        assertThat(named.matches()).as(line).isTrue();
        assertThat(CHOICES).containsKey(named.group(1));
        text.append("  ").append(named.group(1)).append(": ");
        text.append(CHOICES.get(named.group(1)));
      }
      text.append('\n');
    }
    return text.toString();
  }

  /**
   * The requirement. The wall's U is that of the layers as drawn, by ISO 6946:2017, 6.7: the sum of
   * the layers' d/λ and 0.13 + 0.04 m²·K/W; where timber lies in the wall, it is a flank of its
   * own.
   */
  @ParameterizedTest
  @CsvSource({
    "slab-edge.dxf, 2400, external, 0.015/0.4+0.24/0.4+0.16/0.035+0.01/1",
    "sill.dxf, 400, internal, 0.015/0.4+0.24/0.4+0.16/0.035+0.01/1",
    "slab-edge.svg, 1900, external, 0.015/0.4+0.3/0.16+0.12/0.035+0.015/1",
    "sill.svg, 380, internal, 0.0125/0.25+0.015/0.13+0.2/0.035+0.06/0.042+0.0078/1"
  })
  void a_demo_drawing_becomes_a_certified_psi_by_choosing_only(
      String name, double outerFace, String dimensions, String layers) throws IOException {
    copied(name);
    Ran draft = Ran.in(dir, "draft", name, "--out", "drafted.yaml");
    assertThat(draft.code()).as(draft.err()).isZero();
    String drafted = Files.readString(dir.resolve("drafted.yaml"));
    long marks =
        drafted
            .lines()
            .filter(line -> !line.startsWith("#"))
            .filter(line -> line.contains("TODO"))
            .count();
    Ran check = Ran.in(dir, "check", "drafted.yaml");
    assertThat(check.code()).isEqualTo(ExitCode.BAD_INPUT);
    List<String> mistakes = check.err().lines().filter(line -> line.contains(".yaml:")).toList();
    assertThat(mistakes).hasSize((int) marks);
    assertThat(mistakes).allMatch(line -> line.contains("is still to be decided"));

    Files.writeString(dir.resolve("chosen.yaml"), chosen(drafted, outerFace, dimensions));
    Ran solved = Ran.in(dir, "solve", "chosen.yaml", "--json");
    assertThat(solved.code()).as(solved.err()).isZero();
    int psi = solved.out().indexOf("\"psi\":[{");
    assertThat(psi).isPositive();
    assertThat(solved.out().substring(psi, solved.out().indexOf("\"subtracted\"")))
        .contains("\"certified\":true")
        .doesNotContain("\"certified\":false");
    double resistance = 0.17;
    for (String layer : layers.split("\\+")) {
      String[] parts = layer.split("/");
      resistance += Double.parseDouble(parts[0]) / Double.parseDouble(parts[1]);
    }
    assertThat(number(solved.out(), "bottom flank\",\"U_W_per_m2K\":"))
        .isCloseTo(1 / resistance, within(2e-3 / resistance));
    assertThat(
            Math.abs(
                number(
                    solved.out(),
                    "\"dimensions\":\""
                        + dimensions
                        + "\",\"filmSet\":\"heat-loss\",\"value_W_per_mK\":")))
        .isLessThan(0.2);
  }

  private static double number(String json, String after) {
    int at = json.indexOf(after);
    assertThat(at).as(after).isGreaterThan(0);
    int end = at + after.length();
    while ("0123456789.eE-+".indexOf(json.charAt(end)) >= 0) {
      end++;
    }
    return Double.parseDouble(json.substring(at + after.length(), end));
  }

  @Test
  void the_picture_circles_what_the_case_lists() throws IOException {
    copied("slab-edge.dxf");
    Ran.in(dir, "draft", "slab-edge.dxf");
    String drafted = Files.readString(dir.resolve("slab-edge.yaml"));
    String picture = Files.readString(dir.resolve("slab-edge.understood.svg"));
    int listed = 0;
    Matcher items = Pattern.compile("(?m)^# (\\d+): corners").matcher(drafted);
    while (items.find()) {
      listed++;
      assertThat(picture).containsPattern(">\\s*" + items.group(1) + "\\s*<");
    }
    assertThat(listed).isGreaterThan(5);
    assertThat(picture).contains("id=\"understood-to-look-at\"").contains("BRICKWORK");
    assertThat(drafted).contains("# LINE on layer `FURNITURE`: the layer is off");
  }

  @Test
  void check_draws_what_it_understood() throws IOException {
    String second = "  - {fill: brick, box: [203, 0, 400, 1000]}\n";
    String apart =
        Cases.WALL
            .replace("  - {fill: outdoors, box: [200, 0, 300, 1000]}\n", second)
            .replace("section:\n", "section:\n  - {fill: outdoors, box: [400, 0, 500, 1000]}\n")
            .replace(
                "  - {fill: brick, box: [0,",
                "  - {fill: brick, box: [150, 0, 203, 20]}\n  - {fill: brick, box: [0,");
    Cases.write(dir, "wall.yaml", apart);
    Ran ran = Ran.in(dir, "check", "wall.yaml", "--out", "wall.svg");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out()).contains("Shown in wall.svg, by number").contains("4  gap of 3 mm");
    assertThat(Files.readString(dir.resolve("wall.svg")))
        .contains("gap of 3 mm")
        .containsPattern(">\\s*4\\s*<");
    Ran again = Ran.in(dir, "check", "wall.yaml", "--out", "wall.svg");
    assertThat(again.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(again.err()).contains("is there already").contains("--force");
    assertThat(Ran.in(dir, "check", "wall.yaml", "--out", "wall.svg", "--force").code()).isZero();
  }

  @Test
  void nothing_is_overwritten_and_nothing_half_written() throws IOException {
    copied("sill.svg");
    Files.writeString(dir.resolve("sill.yaml"), "mine");
    Ran ran = Ran.in(dir, "draft", "sill.svg");
    assertThat(ran.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err()).contains("sill.yaml is there already");
    assertThat(dir.resolve("sill.yaml")).hasContent("mine");
    assertThat(names()).containsExactly("sill.svg", "sill.yaml");
    assertThat(Ran.in(dir, "draft", "sill.svg", "--force").code()).isZero();
    assertThat(Files.readString(dir.resolve("sill.yaml"))).startsWith("# Drafted from sill.svg");
    assertThat(names()).containsExactly("sill.svg", "sill.understood.svg", "sill.yaml");
    assertThat(Ran.in(dir, "draft", "sill.svg", "--out", "sill.svg", "--force").err())
        .contains("would replace the drawing");
    assertThat(dir.resolve("sill.svg")).hasSameBinaryContentAs(DRAWINGS.resolve("sill.svg"));
  }

  private List<String> names() throws IOException {
    try (Stream<Path> files = Files.list(dir)) {
      return files.map(f -> f.getFileName().toString()).sorted().toList();
    }
  }

  @Test
  void a_bad_drawing_is_told_with_its_line_and_leaves_nothing() throws IOException {
    String good = Files.readString(DRAWINGS.resolve("slab-edge.dxf"));
    Files.writeString(dir.resolve("cut.dxf"), good.substring(0, good.length() / 2));
    Ran ran = Ran.in(dir, "draft", "cut.dxf");
    assertThat(ran.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err()).matches("(?s)cut.dxf:\\d+: .*\n");
    Files.writeString(dir.resolve("empty.svg"), "<svg xmlns='http://www.w3.org/2000/svg'/>");
    assertThat(Ran.in(dir, "draft", "empty.svg").err()).contains("no outline in this drawing");
    assertThat(Ran.in(dir, "draft", "none.dxf").err()).contains("there is no such file");
    assertThat(names()).containsExactly("cut.dxf", "empty.svg");
  }

  @Test
  void a_drawing_without_a_unit_leaves_it_open() throws IOException {
    String box = "<svg xmlns='http://www.w3.org/2000/svg' viewBox='0 0 900 900'>";
    Files.writeString(
        dir.resolve("plain.svg"), box + "<rect width='400' height='900' id='a'/></svg>");
    Ran ran = Ran.in(dir, "draft", "plain.svg");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(Ran.in(dir, "check", "plain.yaml").err())
        .contains("`unit` is still to be decided; mm, cm, m or in");
    assertThat(Ran.in(dir, "draft", "plain.svg", "--unit", "cm", "--force").code()).isZero();
    assertThat(Ran.in(dir, "check", "plain.yaml").err()).doesNotContain("`unit`");
    assertThat(Ran.in(dir, "draft", "plain.svg", "--unit", "km", "--force").err())
        .contains("--unit is mm, cm, m, in or ft");
  }

  @Test
  void a_header_that_contradicts_the_size_is_warned_about() throws IOException {
    String good = Files.readString(DRAWINGS.resolve("slab-edge.dxf"));
    Files.writeString(
        dir.resolve("metres.dxf"), good.replace("$INSUNITS\n 70\n4", "$INSUNITS\n 70\n6"));
    Ran ran = Ran.in(dir, "draft", "metres.dxf");
    assertThat(ran.code()).isZero();
    assertThat(ran.err())
        .contains("warning: in m the drawing is 3400 m")
        .contains("in mm it would");
  }

  @Test
  void names_from_a_drawing_cannot_spoil_the_case() throws IOException {
    StringBuilder svg = new StringBuilder("<svg xmlns='http://www.w3.org/2000/svg' ");
    svg.append("width='900mm' height='900mm' viewBox='0 0 900 900'>");
    String[] names = {
      "a: {b",
      "- c",
      "#d",
      "&amp;e",
      "*f",
      "yes",
      "'g",
      "&quot;h\\",
      "TODO",
      "1e5",
      " i ",
      "j&#9;k",
      "{l}",
      "[m",
      "null",
      "ψ ü",
      "hollow",
      "indoors",
      "n, o",
      "!p",
      "%q",
      "@r",
      "a &lt; b"
    };
    for (int i = 0; i < names.length; i++) {
      svg.append("<g id='").append(names[i].replace("'", "&#39;")).append("'><rect x='");
      svg.append(30 * i).append("' width='30' height='900'/></g>");
    }
    Files.writeString(dir.resolve("names.svg"), svg + "</svg>");
    Ran ran = Ran.in(dir, "draft", "names.svg");
    assertThat(ran.code()).as(ran.err()).isZero();
    Ran check = Ran.in(dir, "check", "names.yaml");
    assertThat(check.err().lines().filter(line -> line.contains(".yaml:")))
        .allMatch(line -> line.contains("is still to be decided"))
        .hasSizeGreaterThan(names.length);
  }

  @Test
  void data_for_machines() throws IOException {
    copied("sill.dxf");
    Ran ran = Ran.in(dir, "draft", "sill.dxf", "--json");
    assertThat(ran.out().lines()).hasSize(1);
    assertThat(ran.out()).contains("\"areas\":[{\"number\":1,\"name\":\"BRICKWORK\"");
    assertThat(Ran.in(dir, "draft", "sill.dxf", "--force", "--quiet").out()).isEmpty();
  }
}
