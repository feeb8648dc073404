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
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Moisture checks on the card and in the data, and the exit code of requirements. */
class MoistureResultsTest {
  private static final String CASE = "cases/demo/winter-check.yaml";

  @TempDir Path dir;

  /** A month a row; at −1, 0 and 1 °C the f_Rsi needed are 0.7647, 0.7727, 0.7725 (*computed*). */
  @Test
  void data_hold_every_month_and_the_surface_of_the_one_that_governs() throws IOException {
    Ran ran = Ran.in(Root.folder(), "solve", CASE, "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    try (InputStream text = Sheet.class.getResourceAsStream("/result.schema.json")) {
      assertThat(
              SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
                  .getSchema(new String(text.readAllBytes(), StandardCharsets.UTF_8))
                  .validate(ran.out(), InputFormat.JSON))
          .isEmpty();
    }
    JsonNode json = new ObjectMapper().readTree(ran.out());
    JsonNode months = json.get("moisture");
    assertThat(months).hasSize(12);
    assertThat(months.get(0).get("requiredFRsi").doubleValue()).isCloseTo(0.7647, within(5.1e-5));
    assertThat(months.get(1).get("requiredFRsi").doubleValue()).isCloseTo(0.7727, within(5.1e-5));
    assertThat(months.get(11).get("requiredFRsi").doubleValue()).isCloseTo(0.7725, within(5.1e-5));
    assertThat(months.get(1).get("governs").booleanValue()).isTrue();
    assertThat(months.get(6).get("counts").booleanValue()).isFalse();
    assertThat(months.get(6).get("requiredFRsi").isNull()).isTrue();
    assertThat(months.get(1).get("surface").get("length_mm").doubleValue())
        .isCloseTo(2600, within(1e-6));
    double found = json.get("spaces").get(0).get("coldest").get("fRsi").doubleValue();
    assertThat(months.get(1).get("fRsi").doubleValue()).isCloseTo(found, within(1e-9));
    assertThat(json.get("required").get(0).get("met").booleanValue()).isTrue();
  }

  @Test
  void a_requirement_that_is_not_met_ends_with_1_and_says_so() throws IOException {
    Path out = dir.resolve("out");
    Ran ran =
        Ran.in(
            Root.folder(),
            "solve",
            CASE,
            "--variant",
            "as found",
            "--no-plots",
            "--out",
            out.toString());
    assertThat(ran.code()).isEqualTo(ExitCode.NOT_MET);
    assertThat(ran.err()).contains("a requirement of the case is not met").contains("moisture");
    assertThat(ran.out())
        .contains("mould to be expected")
        .contains("condensation to be expected")
        .contains("condensation inside the construction is not assessed")
        .contains("Local codes and a licensed professional decide");
    assertThat(Files.readString(out.resolve("result.csv")))
        .contains("moisture,February,indoors,")
        .contains("moistureSurface,February,indoors,");
  }
}
