package coldseam.cases;

import static coldseam.cases.Written.WALL;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Temperatures;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fill;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Cavities as written in a case, and what is said to mistakes in them. */
class CavityReaderTest {
  private static final String HEAD =
      """
      coldseam: 1
      title: Frame
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: 0, exposure: outside}
      materials:
        wood: {conductivity: 0.13}
      """;

  private static final String SECTION =
      """
      section:
        - {fill: outdoors, box: [0, -20, 100, 0]}
        - {fill: wood, box: [0, 0, 100, 60]}
        - {fill: air, box: [40, 20, 60, 40]}
        - {fill: indoors, box: [0, 60, 100, 80]}
      """;

  @TempDir private Path folder;

  private Detail detail(String text) throws Exception {
    Path file = Files.writeString(folder.resolve("case.yaml"), text);
    return CaseFile.read(file).detail(Optional.empty());
  }

  private AirCavity air(String settings) throws Exception {
    Detail detail = detail(HEAD + "cavities:\n  air: " + settings + "\n" + SECTION);
    for (Fill fill : detail.fills()) {
      if (fill instanceof AirCavity air) {
        return air;
      }
    }
    throw new AssertionError("no air in " + detail.fills());
  }

  private void says(String text, String... problems) {
    assertThat(Written.problems(folder, text)).containsExactly(problems);
  }

  @Test
  void nothing_need_be_said_of_air() throws Exception {
    assertThat(air("{}")).isEqualTo(AirCavity.of("air"));
  }

  @Test
  void everything_may_be_said_of_it() throws Exception {
    AirCavity air =
        air(
            "{rule: layer, openings: 800, to: outdoors, emissivity: [0.9, 0.05], direction: [0, -1],"
                + " form: 2017, throat: 1.5, temperatures: found, single: [{at: [50, 30],"
                + " conductivity: 0.1, ventilation: slightly, rule: frame, emissivity: 0.2}]}");
    assertThat(air.settings().rule()).contains(Rule.LAYER);
    AirCavity.Exchange exchange = air.settings().exchange().orElseThrow();
    assertThat(exchange.ventilation()).isEqualTo(Ventilation.SLIGHTLY_VENTILATED);
    assertThat(exchange.openings()).hasValue(800e-6);
    assertThat(exchange.space()).contains("outdoors");
    assertThat(air.settings().emissivities()).contains(new Emissivities(0.9, 0.05));
    assertThat(air.settings().direction().orElseThrow().y()).isEqualTo(-1);
    assertThat(air.form()).contains(RadiationForm.SERIES);
    assertThat(air.throatM()).isEqualTo(0.0015);
    assertThat(air.temperatures()).isEqualTo(Temperatures.FOUND);
    AirCavity.Single single = air.singles().get(0);
    assertThat(single.inside().x()).isEqualTo(0.05);
    assertThat(single.settings().conductivityWPerMK()).hasValue(0.1);
    assertThat(single.settings().rule()).contains(Rule.FRAME);
  }

  @Test
  void radiosity_goes_with_temperatures_that_are_found() throws Exception {
    AirCavity air = air("{form: radiosity}");
    assertThat(air.form()).contains(RadiationForm.RADIOSITY);
    assertThat(air.temperatures()).isEqualTo(Temperatures.FOUND);
    assertThat(air("{form: radiosity, temperatures: found}")).isEqualTo(air);
    says(
        HEAD + "cavities:\n  air: {form: radiosity, temperatures: fixed}\n" + SECTION,
        "9:40: cavity `air` has fixed temperatures, but radiosity follows from those of the faces;"
            + " write `temperatures: found`, or leave it away");
  }

  @Test
  void uncovered_air_lies_under_everything_and_counts_where_enclosed() throws Exception {
    Detail detail = detail(HEAD + "cavities: {gap: {}, air: {}}\nuncovered: gap\n" + SECTION);
    assertThat(detail.areas().get(0).fill())
        .isInstanceOfSatisfying(AirCavity.class, air -> assertThat(air.enclosedOnly()).isTrue());
    assertThat(detail.areas()).hasSize(5);
  }

  @Test
  void mistakes_are_named_with_their_place() {
    says(
        HEAD
            + """
            cavities:
              air: {rule: frames, ventilation: closed, form: 2012, temperatures: 10}
              gap: {openings: -1, emissivity: 1.5, direction: [0, 0], conductivity: 0}
              slot: {ventilation: well, openings: 20, to: outdoor}
              hole: {to: outdoors}
              wood: {}
              void: {single: [{conductivity: 0.1}, {at: 3}]}
            uncovered: airs
            """
            + SECTION,
        "9:15: `rule` is `frame` or `layer`, not `frames`; did you mean `frame`?",
        "9:36: `ventilation` is `unventilated`, `slightly` or `well`, not `closed`",
        "9:50: `form` is `earlier`, `2017` or `radiosity`, not `2012`; did you mean `2017`?",
        "9:70: `temperatures` is `fixed` or `found`, not `10`",
        "10:19: `openings` of cavity `gap` is negative: -1; it is mm2 per metre of length, 0 or"
            + " more, e.g. `800`",
        "10:35: `emissivity` of cavity `gap` is out of range: 1.5; it is 0 to 1, e.g. `0.9`",
        "10:51: `direction` of cavity `gap` points nowhere; write `[0, -1]` for downwards, say",
        "10:73: `conductivity` of cavity `gap` is too small for air; still air has 0.025; or lay"
            + " `hollow`",
        "11:29: cavity `slot` has both `ventilation` and `openings`; the class follows from the"
            + " openings",
        "11:47: `outdoor` is no space of this case; did you mean `outdoors`?",
        "12:10: cavity `hole` has `to` but no ventilation; add `ventilation` or `openings`, or leave"
            + " `to` away",
        "13:3: `wood` names a material or a space as well as air; choose another name for one of"
            + " them",
        "14:19: this single cavity has no `at`; add `at: [x, y]`, a point well inside it",
        "14:45: `at` of a single cavity is two numbers, not `3`; write `[x, y]`, e.g. `[0, 240]`",
        "15:12: `airs` is none of the `cavities`; did you mean `air`?");
  }

  @Test
  void uncovered_needs_a_cavity() {
    says(
        WALL + "uncovered: air\n",
        "12:12: `air` is none of the `cavities`; add `cavities: {air: {}}`");
  }

  @Test
  void a_forgotten_name_is_told() {
    says(
        HEAD + "cavities: {rule: frame}\n" + SECTION,
        "8:12: a cavity needs a name before its `rule`; write cavities: {air: {rule: …}}");
  }
}
