package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Framed walls and floor edges on the card and in the data, in SI and US customary units. */
class FramingResultsTest {
  private static final String STEEL =
      """
      coldseam: 1
      title: Steel studs
      unit: in
      view: plan
      materials:
        board: {resistance: R-0.56, thickness: 5/8}
        batt: {resistance: R-13, thickness: 3.5}
        steel: {conductivity: 50}
      spaces:
        indoors: {temperature: 70 F, film: R-0.68, exposure: inside}
        outdoors: {temperature: 20 F, film: R-0.25, exposure: outside}
      section:
        - {fill: indoors, box: [-8, -10, 8, 0]}
        - {fill: outdoors, box: [-8, 4.75, 8, 14]}
        - stack: {face: [[-8, 0], [8, 0]], towards: up}
          layers: [[board, 5/8], [batt, 3.5], [board, 5/8]]
        - {fill: steel, box: [0, 5/8, 43 mil, 5/8 + 3.5]}
      framing: {between: [indoors, outdoors], layer: batt}
      """;

  @TempDir Path dir;

  @Test
  void a_steel_wall_in_inches() throws IOException {
    Cases.write(dir, "steel.yaml", STEEL);
    Ran card = Ran.in(dir, "solve", "steel.yaml", "--no-plots");
    assertThat(card.code()).as(card.err()).isZero();
    assertThat(card.out())
        .contains("Framing of wall")
        .contains("h·ft²·°F/Btu")
        .contains("Btu/(h·ft·°F)")
        .contains("No mean of the two limits is given: metal bridges a layer")
        .doesNotContain("mean of the limits  ");
    JsonNode framing =
        new ObjectMapper()
            .readTree(Ran.in(dir, "solve", "steel.yaml", "--json").out())
            .get("framing")
            .get(0);
    assertThat(framing.get("mean_m2K_per_W").isNull()).isTrue();
    assertThat(framing.get("metalBridges").booleanValue()).isTrue();
    // R-13 + 2 × R-0.56 + films, beside the stud
    assertThat(framing.get("besideFraming_m2K_per_W").doubleValue())
        .isCloseTo(15.05 * 0.1761102, within(1e-5));
    assertThat(framing.get("R_m2K_per_W").doubleValue())
        .isBetween(
            framing.get("isothermalPlanes_m2K_per_W").doubleValue(),
            framing.get("parallelPaths_m2K_per_W").doubleValue());
  }

  @Test
  void a_floor_edge_names_both_ways_and_the_factor() throws IOException {
    Ran ran =
        Ran.in(
            Root.folder(),
            "solve",
            "cases/demo/slab-edge.yaml",
            "--no-plots",
            "--out",
            dir.resolve("out").toString());
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .contains("ψ floor edge internal A")
        .contains("0.2438")
        .contains("ψ floor edge external A")
        .contains("0.1342")
        .contains("ψ floor edge internal B")
        .contains("0.2056")
        .contains("less floor by ISO 13370")
        .contains("less floor without the wall")
        .contains("slab-edge F-factor")
        .contains("Btu/(h·ft·°F)");
  }
}
