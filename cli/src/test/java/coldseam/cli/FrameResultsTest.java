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
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A frame as it is shown: both runs, the lengths, and what is taken off. */
class FrameResultsTest {
  static final String FRAME =
      """
      coldseam: 1
      title: Frame
      materials:
        wood: {conductivity: 0.13}
        glass: {conductivity: 1.0}
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: 0, exposure: outside}
      section:
        - {fill: indoors, box: [0, 18, 290, 120]}
        - {fill: outdoors, box: [0, -40, 290, 18]}
        - {fill: wood, box: [0, 0, 100, 80]}
        - stack: {face: [[90, 46], [290, 46]], towards: down}
          layers: [[glass, 4], [gap, 20], [glass, 4]]
          glazing: {U: 1.3, spacer: {height: 8, conductivity: 0.4}}
      frame: {between: [indoors, outdoors]}
      """;

  @TempDir Path dir;

  /** ISO 10077-2: L2D = U_f b_f + U_p b_p with the panel, U_f b_f + U_g b_g + ψ_g with glass. */
  @Test
  void data_hold_both_runs_and_add_up() throws IOException {
    Cases.write(dir, "frame.yaml", FRAME);
    Ran ran = Ran.in(dir, "solve", "frame.yaml", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    try (InputStream text = Sheet.class.getResourceAsStream("/result.schema.json")) {
      assertThat(
              SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
                  .getSchema(new String(text.readAllBytes(), StandardCharsets.UTF_8))
                  .validate(ran.out(), InputFormat.JSON))
          .isEmpty();
    }
    JsonNode json = new ObjectMapper().readTree(ran.out());
    JsonNode frame = json.get("frame");
    assertThat(frame.get("width_m").doubleValue()).isCloseTo(0.1, within(1e-9));
    double uf = json.get("U").get("value_W_per_m2K").doubleValue();
    assertThat(json.get("U").get("of").textValue()).isEqualTo("frame");
    double withPanel = frame.get("panelRun").get("value_W_per_mK").doubleValue();
    // 28 mm of 0.035 W/(m·K) between films of 0.13 and 0.04; 190 mm of it are seen.
    assertThat(withPanel).isCloseTo(uf * 0.1 + 0.19 / 0.97, within(1e-9));
    JsonNode edge = json.get("psi").get(0);
    assertThat(edge.get("of").textValue()).isEqualTo("glass edge");
    assertThat(edge.get("dimensions").textValue()).isEqualTo("visible");
    double glazed = frame.get("glazedRun").get("value_W_per_mK").doubleValue();
    assertThat(glazed)
        .isEqualTo(json.get("coupling").get(0).get("value_W_per_mK").doubleValue())
        .isCloseTo(uf * 0.1 + 1.3 * 0.19 + edge.get("value_W_per_mK").doubleValue(), within(1e-9));
    double lower =
        frame.get("glazedRun").get("lower_W_per_mK").doubleValue()
            - frame.get("panelRun").get("upper_W_per_mK").doubleValue();
    assertThat(edge.get("lower_W_per_mK").doubleValue())
        .isCloseTo(lower + 0.19 / 0.97 - 1.3 * 0.19, within(1e-9));
  }

  @Test
  void the_card_shows_the_way() throws IOException {
    Cases.write(dir, "frame.yaml", FRAME);
    String card = Ran.in(dir, "solve", "frame.yaml", "--no-plots").out();
    assertThat(card)
        .containsPattern("ψ glass edge +indoors – outdoors +0\\.\\d+ +± .*certified +visible")
        .containsPattern("U frame +indoors – outdoors +\\d\\.\\d+ +± .*certified +over 100 mm")
        .containsPattern("L2D with the insulating panel +0\\.\\d+")
        .containsPattern("less panel +−0\\.1959 +U 1\\.0309 × 0\\.1900 m")
        .containsPattern("less glazing +−0\\.2470 +U 1\\.3000 × 0\\.1900 m")
        .contains("reduced film at the inner corner (100, 46) mm")
        .doesNotContain("R frame");
    assertThat(Ran.in(dir, "check", "frame.yaml").out())
        .contains("U frame")
        .contains("projected width b_f of the frame: 100 mm");
  }
}
