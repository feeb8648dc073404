package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cli.sheet.Sheet;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.networknt.schema.InputFormat;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A body of revolution as it is shown: everything in W/K and W, and what a χ takes off. */
class RoundResultsTest {
  static final String ROD =
      """
      coldseam: 1
      title: Rod
      geometry: axisymmetric
      view: plan
      materials:
        insulation: {conductivity: 0.04, tolerance: 10 %}
        steel: {conductivity: 50}
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: -5, exposure: outside}
      section:
        - {fill: indoors, box: [0, -50, 500, 0]}
        - {fill: outdoors, box: [0, 200, 500, 250]}
        - {fill: insulation, box: [0, 0, 500, 200]}
        - {fill: steel, box: [0, 0, 10, 200]}
      stretches:
        head: {along: [[0, 0], [10, 0]]}
      chi:
        rod: {between: [indoors, outdoors]}
      """;

  @TempDir Path dir;

  /** Computed: elements of degree 8, L3D 0.15751076 W/K, χ 0.00559622 W/K. */
  @Test
  void data_are_of_the_whole_body() throws IOException {
    Cases.write(dir, "rod.yaml", ROD);
    Ran ran = Ran.in(dir, "solve", "rod.yaml", "--json", "--accuracy", "chi=0.1%");
    assertThat(ran.code()).as(ran.err()).isZero();
    try (InputStream text = Sheet.class.getResourceAsStream("/result.schema.json")) {
      assertThat(
              SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
                  .getSchema(new String(text.readAllBytes(), StandardCharsets.UTF_8))
                  .validate(ran.out(), InputFormat.JSON))
          .isEmpty();
    }
    JsonNode json = new ObjectMapper().readTree(ran.out());
    List<String> perMetre = new ArrayList<>();
    names(json, perMetre);
    assertThat(perMetre).doesNotContain("heatFlow_W_per_m", "sum_W_per_m", "value_W_per_mK");
    JsonNode coupling = json.get("coupling").get(0);
    assertThat(coupling.get("lower_W_per_K").doubleValue()).isLessThan(0.15751077);
    assertThat(coupling.get("upper_W_per_K").doubleValue()).isGreaterThan(0.15751075);
    JsonNode chi = json.get("chi").get(0);
    assertThat(chi.get("value_W_per_K").doubleValue()).isCloseTo(0.00559622, within(5.6e-6));
    assertThat(chi.get("upper_W_per_K").doubleValue() - chi.get("lower_W_per_K").doubleValue())
        .isLessThan(2 * 5.6e-6);
    JsonNode wall = chi.get("subtracted").get(0);
    assertThat(wall.get("area_m2").doubleValue()).isCloseTo(Math.PI / 4, within(1e-12));
    assertThat(wall.get("U_W_per_m2K").doubleValue()).isCloseTo(1 / 5.17, within(1e-12));
    assertThat(json.get("spaces").get(0).get("heatFlow_W").doubleValue())
        .isCloseTo(25 * 0.15751076, within(1e-4));
    assertThat(json.get("accuracy").get("reached").booleanValue()).isTrue();
  }

  private static void names(JsonNode node, List<String> names) {
    node.fieldNames().forEachRemaining(names::add);
    node.forEach(child -> names(child, names));
  }

  @Test
  void the_card_names_l3d_and_the_way_to_chi() throws IOException {
    Cases.write(dir, "rod.yaml", ROD);
    Ran ran = Ran.in(dir, "solve", "rod.yaml", "--accuracy", "chi=0.1%", "--out", "out");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .contains("χ rod  indoors – outdoors  0.00560")
        .contains("L3D    indoors – outdoors   0.1575")
        .contains("χ rod = L3D less what is counted elsewhere  W/K")
        .contains("U 0.1934 × 0.7854 m²")
        .contains("Heat flow  W, positive into the detail")
        .doesNotContain("W/(m·K)  certified")
        .doesNotContain("W/m");
  }

  @Test
  void the_table_has_columns_of_the_whole_body() throws IOException {
    Cases.write(dir, "rod.yaml", ROD);
    Ran ran = Ran.in(dir, "solve", "rod.yaml", "--quiet", "--out", "out");
    assertThat(ran.code()).as(ran.err()).isZero();
    List<String> lines = Files.readAllLines(dir.resolve("out/result.csv"));
    List<String> head = List.of(lines.get(0).split(",", -1));
    String[] chi =
        lines.stream()
            .filter(l -> l.contains(",chi,rod,"))
            .findFirst()
            .orElseThrow()
            .split(",", -1);
    assertThat(Double.parseDouble(chi[head.indexOf("value_W_per_K")]))
        .isCloseTo(0.0056, within(5e-4));
    assertThat(chi[head.indexOf("value_W_per_mK")]).isEmpty();
    assertThat(lines).anyMatch(l -> l.contains(",subtracted,right flank,"));
  }

  @Test
  void plots_mark_the_axis_and_write_watts() throws IOException {
    Cases.write(dir, "rod.yaml", ROD);
    assertThat(Ran.in(dir, "solve", "rod.yaml", "--quiet", "--out", "out").code()).isZero();
    String section = Files.readString(dir.resolve("out/section.svg"));
    assertThat(section.contains("id=\"section-whole-axis\"")).isTrue();
    assertThat(section.contains("axis of revolution: x is the radius")).isTrue();
    assertThat(section.contains("L3D CERTIFIED")).isTrue();
    String flow = Files.readString(dir.resolve("out/heat-flow.svg"));
    assertThat(flow.contains("\u00a0W into the detail")).isTrue();
    assertThat(flow.contains("W/m ") || flow.contains("W/m<")).isFalse();
  }

  /** A better conductor loses more: the bracket of the seek runs in W/K. */
  @Test
  void sweeps_and_seeks_run_over_chi() throws IOException {
    Cases.write(
        dir,
        "rod.yaml",
        ROD.replace("materials:", "values: {steel: 50}\nmaterials:")
            .replace("steel: {conductivity: 50}", "steel: {conductivity: steel}"));
    Ran sweep = Ran.in(dir, "sweep", "rod.yaml", "--set", "steel=10..50/3", "--json");
    assertThat(sweep.code()).as(sweep.err()).isZero();
    assertThat(sweep.out().lines())
        .hasSize(3)
        .allMatch(line -> line.contains("\"chi\":[{\"name\":\"rod\",\"value_W_per_K\":"))
        .noneMatch(line -> line.contains("W_per_mK"));
    Ran seek =
        Ran.in(
            dir, "seek", "rod.yaml", "--set", "steel=1..50", "--until", "chi <= 0.005", "--json");
    assertThat(seek.code()).as(seek.err()).isZero();
    assertThat(seek.out()).contains("chi");
  }
}
