package coldseam.cli.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import coldseam.solver.result.Result;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Results as data, against the published schema and against the values that went in. */
class JsonResultsTest {
  private static final ObjectMapper JACKSON = new ObjectMapper();

  private static List<String> against(String json) throws Exception {
    try (InputStream schema = Sheet.class.getResourceAsStream("/result.schema.json")) {
      String text = new String(schema.readAllBytes(), StandardCharsets.UTF_8);
      Schema read =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12).getSchema(text);
      return read.validate(json, InputFormat.JSON).stream().map(Object::toString).toList();
    }
  }

  @Test
  void every_kind_of_result_fits_the_schema() throws Exception {
    for (Result result :
        List.of(Samples.estimated(), Samples.certified(), Samples.mixed(), Samples.infinite())) {
      assertThat(against(Sheet.json(Samples.subject(), result, false))).isEmpty();
      assertThat(against(Sheet.json(Samples.inches(), result, true))).isEmpty();
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"\"certified\":false", "\"variant\":null,", "\"fRsi\":0.724936", "\"g\":0.65"})
  void the_schema_notices_what_is_missing_or_misnamed(String part) throws Exception {
    String json = Sheet.json(Samples.subject(), Samples.estimated(), false);
    assertThat(json).contains(part);
    String spoiled = json.replace(part, part.endsWith(",") ? "" : part.replaceFirst("\":", "X\":"));
    assertThat(against(spoiled)).isNotEmpty();
  }

  @Test
  void every_figure_says_its_films() throws Exception {
    JsonNode json = JACKSON.readTree(Sheet.json(Samples.subject(), Samples.estimated(), false));
    for (String of : List.of("coupling", "psi", "spaces", "stretches")) {
      assertThat(json.get(of)).as(of).isNotEmpty();
      for (JsonNode each : json.get(of)) {
        assertThat(each.get("filmSet").textValue()).as(of).isEqualTo("heat-loss");
      }
    }
    assertThat(json.get("U").get("filmSet").textValue()).isEqualTo("heat-loss");
    List<String> lines = Sheet.csv(Samples.subject(), Samples.estimated()).lines().toList();
    int at = List.of(lines.get(0).split(",")).indexOf("filmSet");
    for (String line : lines.subList(1, lines.size())) {
      assertThat(line.split(",", -1)[at]).as(line).isIn("heat-loss", "surface");
    }
  }

  @Test
  void estimates_have_no_bounds() throws Exception {
    JsonNode json = JACKSON.readTree(Sheet.json(Samples.subject(), Samples.estimated(), false));
    JsonNode coupling = json.get("coupling").get(0);
    assertThat(coupling.get("between").toString()).isEqualTo("[\"indoors\",\"outdoors\"]");
    assertThat(coupling.get("value_W_per_mK").doubleValue()).isEqualTo(1.23456);
    assertThat(coupling.get("lower_W_per_mK").isNull()).isTrue();
    assertThat(coupling.get("upper_W_per_mK").isNull()).isTrue();
    assertThat(coupling.get("certified").booleanValue()).isFalse();
    assertThat(coupling.get("estimatedHalfWidth_W_per_mK").doubleValue()).isEqualTo(0.0004);
    assertThat(coupling.get("reason").textValue()).isEqualTo("no bounds are computed");
    assertThat(json.get("accuracy").get("certified").booleanValue()).isFalse();
    assertThat(json.get("accuracy").get("halfWidth_W_per_mK").isNull()).isTrue();
    assertThat(json.get("accuracy").get("estimatedHalfWidth_W_per_mK").doubleValue())
        .isEqualTo(0.0004);
    JsonNode subtracted = json.get("psi").get(0).get("subtracted").get(1);
    assertThat(subtracted.get("value_W_per_mK").doubleValue()).isEqualTo(0.16);
    assertThat(subtracted.get("upper_W_per_mK").doubleValue()).isEqualTo(0.16005);
    assertThat(json.get("U").get("value_W_per_m2K").doubleValue()).isEqualTo(0.2134);
    assertThat(json.get("points").get(0).get("at_mm").toString()).isEqualTo("[123.4,-500]");
  }

  @Test
  void proved_bounds_are_given() throws Exception {
    JsonNode json = JACKSON.readTree(Sheet.json(Samples.subject(), Samples.certified(), false));
    JsonNode psi = json.get("psi").get(0);
    assertThat(psi.get("lower_W_per_mK").doubleValue()).isEqualTo(0.6119);
    assertThat(psi.get("upper_W_per_mK").doubleValue()).isEqualTo(0.6128);
    assertThat(psi.has("estimatedHalfWidth_W_per_mK")).isFalse();
    assertThat(json.get("accuracy").get("certified").booleanValue()).isTrue();
    assertThat(json.get("accuracy").get("halfWidth_W_per_mK").doubleValue())
        .isCloseTo(0.00036, offset(1e-12));
  }

  @Test
  void tolerances_and_shares_say_what_is_proved_of_them() throws Exception {
    JsonNode json = JACKSON.readTree(Sheet.json(Samples.subject(), Samples.certified(), false));
    JsonNode coupling = json.get("coupling").get(0);
    assertThat(coupling.get("toleranceHalfWidth_W_per_mK").doubleValue())
        .isCloseTo(1.23456 / 4 - 0.00036, offset(1e-12));
    assertThat(coupling.get("toleranceUpper_W_per_mK").doubleValue())
        .isCloseTo(1.23456 * 1.25, offset(1e-12));
    assertThat(coupling.get("toleranceCertified").booleanValue()).isTrue();
    assertThat(json.get("U").has("toleranceLower_W_per_m2K")).isTrue();
    assertThat(json.get("shares").get(0).toString())
        .isEqualTo(
            "{\"of\":\"insulation\",\"film\":false,\"share\":0.8,\"relativeTolerance\":0.03}");
    assertThat(json.get("sharesReferTo").textValue()).isEqualTo("L2D indoors – outdoors");
    JsonNode change = json.get("psi").get(0).get("sensitivities").get(1);
    assertThat(change.get("film").booleanValue()).isTrue();
    assertThat(change.get("changePer10Percent_W_per_mK").doubleValue())
        .isCloseTo(-0.0002, offset(1e-15));

    json = JACKSON.readTree(Sheet.json(Samples.subject(), Samples.mixed(), false));
    JsonNode psi = json.get("psi").get(0);
    assertThat(psi.get("toleranceCertified").booleanValue()).isFalse();
    assertThat(psi.get("toleranceLower_W_per_mK").isNull()).isTrue();
    assertThat(psi.get("toleranceReason").textValue()).contains("more than two");
    json = JACKSON.readTree(Sheet.json(Samples.subject(), Samples.estimated(), false));
    assertThat(json.get("coupling").get(0).has("toleranceHalfWidth_W_per_mK")).isFalse();
  }

  @Test
  void an_infinite_coupling_is_null_and_says_why() throws Exception {
    JsonNode coupling =
        JACKSON
            .readTree(Sheet.json(Samples.subject(), Samples.infinite(), false))
            .get("coupling")
            .get(0);
    assertThat(coupling.get("value_W_per_mK").isNull()).isTrue();
    assertThat(coupling.get("note").textValue()).contains("no finite answer");
    assertThat(coupling.get("reason").textValue()).contains("fixed temperatures meet");
  }

  @Test
  void columns_of_the_table_are_named_as_the_members_and_hold_the_same_values() {
    List<String> lines = Sheet.csv(Samples.inches(), Samples.estimated()).lines().toList();
    List<String> heading = List.of(lines.get(0).split(","));
    String psi = lines.stream().filter(l -> l.contains(",psi,")).findFirst().orElseThrow();
    assertThat(psi).startsWith("cases/stud.yaml,\"steel, \"\"light\"\"\",psi,external,");
    String[] cells = psi.replace("\"steel, \"\"light\"\"\"", "steel").split(",", -1);
    assertThat(cells).hasSameSizeAs(heading);
    assertThat(cells[heading.indexOf("value_W_per_mK")]).isEqualTo("0.61234");
    assertThat(cells[heading.indexOf("certified")]).isEqualTo("false");
    assertThat(cells[heading.indexOf("lower_W_per_mK")]).isEmpty();
    assertThat(cells[heading.indexOf("estimatedHalfWidth_W_per_mK")]).isEqualTo("4.2E-4");
    assertThat(cells[heading.indexOf("toleranceHalfWidth_W_per_mK")]).isEmpty();
    assertThat(cell(Samples.certified(), "coupling", "toleranceLower_W_per_mK"))
        .isEqualTo(Double.toString(1.23456 - 1.23456 / 4));
    assertThat(cell(Samples.mixed(), "coupling", "toleranceLower_W_per_mK")).isEmpty();
    assertThat(cell(Samples.mixed(), "share,insulation", "share")).isEqualTo("0.8");
    assertThat(
            Double.parseDouble(cell(Samples.mixed(), "sensitivity", "changePer10Percent_W_per_mK")))
        .isCloseTo(0.001234, offset(1e-15));
  }

  /** A cell of the first row of a quantity. */
  private static String cell(Result result, String quantity, String column) {
    List<String> lines = Sheet.csv(Samples.subject(), result).lines().toList();
    int at = List.of(lines.get(0).split(",")).indexOf(column);
    String row =
        lines.stream().filter(l -> l.contains("," + quantity + ",")).findFirst().orElseThrow();
    return row.split(",", -1)[at];
  }
}
