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
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Whole windows by ISO 10077-1, from figures typed and figures solved. */
class WindowsTest {
  private static final ObjectMapper JACKSON = new ObjectMapper();

  private static final String TYPED =
      """
      coldseam: 1
      title: Fixed light
      window:
        width: 1230
        height: 1480
        profiles:
          sash: {U_f: 1.36, width: 110, psi_g: 0.08}
        glazings:
          double: {U_g: 1.1}
      """;

  @TempDir Path dir;

  private static JsonNode data(Ran ran) throws IOException {
    try (InputStream text = Sheet.class.getResourceAsStream("/window-result.schema.json")) {
      assertThat(
              SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
                  .getSchema(new String(text.readAllBytes(), StandardCharsets.UTF_8))
                  .validate(ran.out(), InputFormat.JSON))
          .isEmpty();
    }
    return JACKSON.readTree(ran.out());
  }

  /** 1.23 x 1.48 m: A_g 1.2726, A_f 0.5478, l_g 4.54, U_w 1.377757; computed by hand. */
  @Test
  void figures_that_are_typed() throws IOException {
    Cases.write(dir, "window.yaml", TYPED);
    Ran ran = Ran.in(dir, "solve", "window.yaml", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    JsonNode json = data(ran);
    JsonNode u = json.get("U").get(0);
    assertThat(u.get("value_W_per_m2K").doubleValue()).isCloseTo(1.377757, within(0.5e-6));
    assertThat(u.get("certified").booleanValue()).isTrue();
    assertThat(json.get("window").get("terms").get(0).get("area_m2").doubleValue())
        .isCloseTo(1.2726, within(1e-12));
    assertThat(Files.exists(dir.resolve("window.coldseam"))).isFalse();
    Ran card = Ran.in(dir, "solve", "window.yaml");
    assertThat(card.out())
        .containsPattern("U_w +1\\.3778 +± 0\\.0001 +W/\\(m²·K\\) +certified +1230 x 1480 mm")
        .containsPattern("glazing +double +1\\.2726 +m² +1\\.1 ")
        .containsPattern("edge +sash with double +4\\.5400 +m +0\\.08 ")
        .contains("a licensed professional decide");
    try (var files = Files.list(dir.resolve("window.coldseam"))) {
      assertThat(files.map(f -> f.getFileName().toString())).contains("result.json", "result.csv");
    }
    List<String> rows = Files.readAllLines(dir.resolve("window.coldseam/result.csv"));
    int columns = rows.get(0).split(",", -1).length;
    assertThat(rows).hasSize(5).allMatch(row -> row.split(",", -1).length == columns);
  }

  /** U_w from a frame that is solved for it: the sum is made again from the frame's own data. */
  @Test
  void figures_that_are_solved() throws IOException {
    Cases.write(dir, "frame.yaml", FrameResultsTest.FRAME);
    Cases.write(
        dir,
        "window.yaml",
        TYPED
                .replace("{U_f: 1.36, width: 110, psi_g: 0.08}", "{case: frame.yaml}")
                .replace("{U_g: 1.1}", "{case: frame.yaml}")
            + "  installed: 0.03\n");
    JsonNode frame = JACKSON.readTree(Ran.in(dir, "solve", "frame.yaml", "--json").out());
    JsonNode json = data(Ran.in(dir, "solve", "window.yaml", "--json"));
    // b_f 100 mm all round, glazing 1.3.
    double glass = 1.03 * 1.28;
    double uf = frame.get("U").get("value_W_per_m2K").doubleValue();
    double psi = frame.get("psi").get(0).get("value_W_per_mK").doubleValue();
    double sum = glass * 1.3 + (1.23 * 1.48 - glass) * uf + 2 * (1.03 + 1.28) * psi;
    JsonNode u = json.get("U").get(0);
    assertThat(u.get("value_W_per_m2K").doubleValue()).isCloseTo(sum / 1.23 / 1.48, within(1e-9));
    double upper =
        glass * 1.3
            + (1.23 * 1.48 - glass) * frame.get("U").get("upper_W_per_m2K").doubleValue()
            + 2 * (1.03 + 1.28) * frame.get("psi").get(0).get("upper_W_per_mK").doubleValue();
    assertThat(u.get("upper_W_per_m2K").doubleValue()).isCloseTo(upper / 1.23 / 1.48, within(1e-9));
    assertThat(json.get("U").get(1).get("value_W_per_m2K").doubleValue())
        .isCloseTo((sum + 2 * 2.71 * 0.03) / 1.23 / 1.48, within(1e-9));
    assertThat(json.get("cases").get(0).get("name").textValue()).isEqualTo("frame.yaml");
    assertThat(json.get("cases")).hasSize(1);
    assertThat(json.get("warnings")).isEmpty();
  }

  /** ψ of the joint from cases: added as solved, side by side, each case solved once. */
  @Test
  void joints_that_are_solved() throws IOException {
    Cases.write(dir, "corner.yaml", Cases.CORNER);
    Cases.write(
        dir,
        "window.yaml",
        TYPED
            + "  installed: {top: 0.01, bottom: {case: corner.yaml, psi: internal},"
            + " left: 0, right: {case: corner.yaml, psi: internal}}\n");
    JsonNode corner = JACKSON.readTree(Ran.in(dir, "solve", "corner.yaml", "--json").out());
    JsonNode psi = corner.get("psi").get(0);
    JsonNode json = data(Ran.in(dir, "solve", "window.yaml", "--json"));
    JsonNode window = json.get("U").get(0);
    JsonNode installed = json.get("U").get(1);
    double added = 1.23 * (0.01 + psi.get("value_W_per_mK").doubleValue());
    added += 1.48 * psi.get("value_W_per_mK").doubleValue();
    assertThat(
            installed.get("value_W_per_m2K").doubleValue()
                - window.get("value_W_per_m2K").doubleValue())
        .isCloseTo(added / 1.23 / 1.48, within(1e-9));
    double half =
        2.71 * (psi.get("upper_W_per_mK").doubleValue() - psi.get("lower_W_per_mK").doubleValue());
    assertThat(
            installed.get("upper_W_per_m2K").doubleValue()
                - installed.get("lower_W_per_m2K").doubleValue())
        .isCloseTo(half / 1.23 / 1.48, within(1e-9));
    assertThat(json.get("cases")).hasSize(1);
  }

  @Test
  void a_psi_of_another_glazing_is_warned_of() throws IOException {
    Cases.write(dir, "frame.yaml", FrameResultsTest.FRAME);
    Cases.write(
        dir,
        "window.yaml",
        TYPED.replace("{U_f: 1.36, width: 110, psi_g: 0.08}", "{case: frame.yaml}"));
    JsonNode json = data(Ran.in(dir, "solve", "window.yaml", "--json"));
    assertThat(json.get("warnings").get(0).textValue())
        .contains("profile `sash`", "U 1.3 W/(m²·K)", "`double` has 1.1");
  }

  @Test
  void accuracy_not_reached_ends_with_three() throws IOException {
    Cases.write(dir, "frame.yaml", FrameResultsTest.FRAME);
    Cases.write(
        dir,
        "window.yaml",
        TYPED.replace("{U_f: 1.36, width: 110, psi_g: 0.08}", "{case: frame.yaml}"));
    Ran ran =
        Ran.in(
            dir,
            "solve",
            "window.yaml",
            "--json",
            "--accuracy",
            "U=0.001%",
            "--most-unknowns",
            "300");
    assertThat(ran.code()).isEqualTo(ExitCode.ACCURACY);
    assertThat(ran.err()).contains("window.yaml: the accuracy asked for was not reached");
    assertThat(data(ran).get("accuracy").get("reached").booleanValue()).isFalse();
  }

  @Test
  void mistakes_end_with_two_and_write_nothing() throws IOException {
    Cases.write(dir, "window.yaml", TYPED.replace("U_g", "Ug"));
    Cases.write(dir, "wall.yaml", Cases.WALL.replace("title", "tilte"));
    Ran ran = Ran.in(dir, "solve", "window.yaml", "wall.yaml");
    assertThat(ran.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err())
        .contains("window.yaml:9:14: glazing `double` has no key `Ug`; did you mean `U_g`?")
        .contains("wall.yaml:");
    assertThat(Files.exists(dir.resolve("window.coldseam"))).isFalse();
    assertThat(Ran.in(dir, "check", "window.yaml").code()).isEqualTo(ExitCode.BAD_INPUT);
    Cases.write(dir, "window.yaml", TYPED);
    assertThat(Ran.in(dir, "solve", "window.yaml", "--variant", "x").err())
        .contains("a window file, which has no variants");
  }

  @Test
  void check_lists_what_is_assumed() throws IOException {
    Cases.write(dir, "window.yaml", TYPED);
    Ran ran = Ran.in(dir, "check", "window.yaml");
    assertThat(ran.code()).isZero();
    assertThat(ran.out()).contains("Fixed light", "corners of the frame", "ISO 10077-1");
    JsonNode json = JACKSON.readTree(Ran.in(dir, "check", "window.yaml", "--json").out());
    assertThat(json.get("valid").booleanValue()).isTrue();
  }
}
