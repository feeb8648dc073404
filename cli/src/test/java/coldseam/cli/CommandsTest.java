package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.building.BuildingFile;
import coldseam.cli.sheet.Sheet;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Commands on cases whose answers are known by hand. */
class CommandsTest {
  private static final ObjectMapper JACKSON = new ObjectMapper();

  @TempDir Path dir;

  /** R = 0.13 + 0.2 / 0.5 + 0.04 = 0.57 m²·K/W; 25 K over it; the variant has 0.97. */
  @Test
  void a_plain_wall_is_solved_as_by_hand() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Ran ran = Ran.in(dir, "solve", "wall.yaml", "--variants", "--json");
    List<String> lines = ran.out().lines().toList();
    JsonNode base = JACKSON.readTree(lines.get(0));
    assertThat(base.get("file").textValue()).isEqualTo("wall.yaml");
    assertThat(base.get("variant").isNull()).isTrue();
    assertThat(base.get("U").get("value_W_per_m2K").doubleValue())
        .isCloseTo(1 / 0.57, within(1e-9));
    assertThat(base.get("U").get("R").get("value_m2K_per_W").doubleValue())
        .isCloseTo(0.57, within(1e-9));
    JsonNode indoors = base.get("spaces").get(0);
    assertThat(indoors.get("heatFlow_W_per_m").doubleValue()).isCloseTo(25 / 0.57, within(1e-7));
    assertThat(base.get("balance").get("relative").doubleValue()).isLessThan(1e-12);
    JsonNode thick = JACKSON.readTree(lines.get(1));
    assertThat(thick.get("variant").textValue()).isEqualTo("thick");
    assertThat(thick.get("U").get("R").get("value_m2K_per_W").doubleValue())
        .isCloseTo(0.97, within(1e-9));
    Ran card = Ran.in(dir, "solve", "wall.yaml", "--variant", "thick", "--no-plots");
    assertThat(card.out()).contains("wall.yaml, variant thick").contains("0.970");
    assertThat(dir.resolve("wall.coldseam/thick/result.json")).isNotEmptyFile();
    assertThat(dir.resolve("wall.coldseam/result.json")).doesNotExist();
  }

  @Test
  void what_is_understood_of_a_wall() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    String text = Ran.in(dir, "check", "wall.yaml").out();
    assertThat(text)
        .containsPattern("brick +0\\.5 +0\\.2000 m²")
        .containsPattern("indoors +20 °C")
        .containsPattern("facing indoors +1000 +Rs 0\\.13 for heat loss, 0\\.13 for surface")
        .containsPattern("cut-off planes +400")
        .contains("U wall")
        .contains("Variants, checked too: thick");
    JsonNode json = JACKSON.readTree(Ran.in(dir, "check", "wall.yaml", "--json").out());
    assertThat(json.get("valid").booleanValue()).isTrue();
    assertThat(json.get("materials").get(0).get("area_m2").doubleValue())
        .isCloseTo(0.2, within(1e-12));
    assertThat(json.get("outline").get(0).get("length_m").doubleValue())
        .isCloseTo(1, within(1e-12));
  }

  /** Every shipped case and variant is solved, its data fits the published schema, in = out. */
  @Test
  void results_of_shipped_cases_fit_the_schema() throws IOException {
    Schema schema;
    try (InputStream text = Sheet.class.getResourceAsStream("/result.schema.json")) {
      schema =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
              .getSchema(new String(text.readAllBytes(), StandardCharsets.UTF_8));
    }
    int solved = 0;
    for (String folder : List.of("cases/demo", "cases/published")) {
      try (Stream<Path> files = Files.list(Root.folder().resolve(folder))) {
        for (Path file :
            files.filter(f -> f.toString().endsWith(".yaml") && !BuildingFile.is(f)).toList()) {
          Ran ran = Ran.in(dir, "solve", file.toString(), "--variants", "--json");
          // a variant may fail what its case requires: that is what it shows
          assertThat(ran.code())
              .as("%s: %s", file, ran.err())
              .isEqualTo(ran.out().contains("\"met\":false") ? ExitCode.NOT_MET : ExitCode.DONE);
          for (String line : ran.out().lines().toList()) {
            assertThat(schema.validate(line, InputFormat.JSON)).as(file.toString()).isEmpty();
            assertThat(JACKSON.readTree(line).get("balance").get("relative").doubleValue())
                .as("balance of %s", file)
                .isBetween(-1e-9, 1e-9);
            solved++;
          }
        }
      }
    }
    assertThat(solved).isGreaterThanOrEqualTo(10);
  }

  @Test
  void the_published_cases_are_proved_from_anywhere() throws IOException {
    Ran ran = Ran.in(dir, "prove", "10211", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    JsonNode json = JACKSON.readTree(ran.out());
    assertThat(json.get("failed").intValue()).isZero();
    assertThat(json.get("cases")).hasSizeGreaterThanOrEqualTo(2);
    JsonNode check = json.get("cases").get(0).get("checks").get(0);
    assertThat(Math.abs(check.get("computed").doubleValue() - check.get("reference").doubleValue()))
        .isLessThanOrEqualTo(check.get("within").doubleValue());
    assertThat(check.get("source").textValue()).contains("10211");
    Ran quiet = Ran.in(dir, "prove", "case-2", "--quiet");
    assertThat(quiet.out().lines()).singleElement().asString().contains("1 cases, ");
  }

  /** EPS is one of the generic names that the case format's page uses as an example. */
  @Test
  void materials_are_found_by_words() throws IOException {
    // 1 in of 0.035 W/(m·K): 0.0254/0.035 m²·K/W = 4.12 h·ft²·°F/Btu, by hand.
    assertThat(Ran.in(dir, "materials", "expanded", "polystyrene").out())
        .contains("λ W/(m·K)", "R per inch", "EPS ", "0.035", "4.12")
        .contains("or expanded polystyrene, beadboard", "[1] handbook value");
    JsonNode all = JACKSON.readTree(Ran.in(dir, "materials", "--json").out()).get("materials");
    assertThat(all).hasSizeGreaterThan(20);
    for (JsonNode material : all) {
      assertThat(material.get("conductivity_W_per_mK").doubleValue()).isPositive();
      assertThat(material.get("source").textValue()).isNotBlank();
      assertThat(
              material.get("resistancePerInch_h_ft2_F_per_Btu").doubleValue()
                  * material.get("conductivity_W_per_mK").doubleValue())
          .isCloseTo(0.144228, within(1e-6)); // 0.0254 m / 0.1761102 m²·K/W
    }
    Ran none = Ran.in(dir, "materials", "minral", "wol");
    assertThat(none.out()).isEmpty();
    assertThat(none.err()).contains("mineral wool");
  }

  @Test
  void several_cases_share_a_folder_that_was_named() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Cases.write(dir, "corner.yaml", Cases.CORNER);
    Ran ran =
        Ran.in(dir, "solve", "wall.yaml", "corner.yaml", "--out", "out", "--no-plots", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(dir.resolve("out/wall/result.json")).isNotEmptyFile();
    assertThat(dir.resolve("out/corner/result.csv")).isNotEmptyFile();
    assertThat(ran.err()).contains("Written to out/wall/").contains("Written to out/corner/");
    assertThat(JACKSON.readTree(dir.resolve("out/wall/result.json").toFile()).get("coupling"))
        .isEqualTo(JACKSON.readTree(ran.out().lines().findFirst().orElseThrow()).get("coupling"));
  }

  @Test
  void names_of_variants_make_names_of_folders() {
    assertThat(SolveCommand.fileName("thermal break")).isEqualTo("thermal-break");
    assertThat(SolveCommand.fileName("../d λ=0.3")).isEqualTo("-..-d-λ-0.3");
  }
}
