package coldseam.cases.building;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.CaseException;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.ledger.Entry;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Ledger;
import coldseam.solver.ledger.Uncertain;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Building files: what they mean, and what is wrong with them. */
class BuildingFileTest {
  private static final String PLAIN =
      """
      coldseam: 1
      title: Test
      building:
        dimensions: external
        elements:
          wall: {area: 100, U: 0.25}
        junctions:
          eaves: {length: 40, psi: 0.1, dimensions: external}
        air: {volume: 200, change: 0.5}
        climate: {inside: 20, outside: 5, days: 200, annual-mean: 9}
      """;

  private static final String WALL_CORNER =
      """
      coldseam: 1
      title: Corner
      view: plan
      materials:
        brick: {conductivity: 0.5, tolerance: 10 %}
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: 0, exposure: outside}
      section:
        - {fill: outdoors, box: [0, 0, 1500, 1500]}
        - {fill: brick, box: [0, 0, 1300, 1300]}
        - {fill: indoors, box: [0, 0, 1000, 1000]}
      psi:
        inner: {between: [indoors, outdoors], dimensions: internal}
        outer: {between: [indoors, outdoors], dimensions: external}
      """;

  @TempDir private Path folder;

  private Building read(String text) throws CaseException {
    try {
      Path file = folder.resolve("building.yaml");
      Files.writeString(file, text);
      return BuildingFile.read(file);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Problems as {@code line:column: wrong; right}. */
  private List<String> problems(String text) {
    try {
      read(text).account(List.of());
      return List.of();
    } catch (CaseException e) {
      String file = folder.resolve("building.yaml") + ":";
      return e.problems().stream().map(p -> p.text().replace(file, "")).toList();
    }
  }

  private Ledger ledger(String text) throws CaseException {
    return read(text).account(List.of()).ledger();
  }

  private static double sum(Ledger ledger, Entry.Kind kind) {
    double sum = 0;
    for (Entry entry : ledger.entries()) {
      sum += entry.kind() == kind ? entry.energyKWh().value() : 0;
    }
    return sum;
  }

  private static Envelope.Part part(Ledger ledger, String name) {
    return ledger.envelope().parts().stream()
        .filter(part -> part.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  /** 15 K over 4800 h are 72 kKh: 25, 4 and 100/3 W/K, by hand. */
  @Test
  void a_plain_building() throws CaseException {
    Ledger ledger = ledger(PLAIN);
    assertThat(sum(ledger, Entry.Kind.ELEMENT)).isCloseTo(-1800, within(1e-9));
    assertThat(sum(ledger, Entry.Kind.JUNCTION)).isCloseTo(-288, within(1e-9));
    assertThat(sum(ledger, Entry.Kind.AIR)).isCloseTo(-2400, within(1e-9));
    assertThat(sum(ledger, Entry.Kind.HEAT)).isCloseTo(4488, within(1e-9));
  }

  /**
   * The worked house of {@code WorkedHouseTest} (<em>computed</em> by hand), read from its file.
   */
  @Test
  void the_house_as_designed() throws CaseException {
    Building house = BuildingFile.read(Path.of("demo/house.yaml"));
    Ledger ledger = house.account(List.of()).ledger();
    assertThat(ledger.envelope().transmissionWPerK().value()).isCloseTo(108.754, within(1e-9));
    assertThat(ledger.envelope().bridgesWPerK().value()).isCloseTo(8.684, within(1e-9));
    assertThat(ledger.envelope().meanDeltaUWPerM2K().value()).isCloseTo(0.02473, within(5e-6));
    Ledger.Designed outcome = (Ledger.Designed) ledger.outcome();
    assertThat(outcome.lossKWh().value()).isCloseTo(11084.764, within(0.0005));
    assertThat(outcome.needKWh().value()).isCloseTo(7567.383, within(0.0005));
    assertThat(outcome.boughtKWh().value()).isCloseTo(8599.299, within(0.0005));
    assertThat(sum(ledger, Entry.Kind.UNUSED_GAIN)).isCloseTo(-12.619, within(0.0005));
    assertThat(house.account(List.of()).warnings()).hasSize(1).allMatch(w -> w.contains("7680"));
  }

  @Test
  void the_house_by_its_meters() throws CaseException {
    Ledger ledger =
        BuildingFile.read(Path.of("demo/house-metered.yaml")).account(List.of()).ledger();
    Ledger.Metered outcome = (Ledger.Metered) ledger.outcome();
    assertThat(outcome.cameInKWh().value()).isCloseTo(17154.5, within(0.0005));
    assertThat(outcome.wentOutKWh().value()).isCloseTo(13598.504, within(0.0005));
    assertThat(outcome.remainderKWh().value()).isCloseTo(-3555.996, within(0.0005));
    assertThat(outcome.share()).isCloseTo(0.207, within(5e-4));
  }

  /** A ψ is solved; its interval and what tolerances add are carried to the need. */
  @Test
  void a_psi_of_a_case() throws CaseException, IOException {
    Files.writeString(folder.resolve("corner.yaml"), WALL_CORNER);
    Building building =
        read(
            PLAIN.replace(
                "{length: 40, psi: 0.1, dimensions: external}",
                "{length: 40, case: corner.yaml, psi: outer}"));
    assertThat(building.parts()).hasSize(1);
    Building.Part from = building.parts().get(0);
    assertThat(from.name()).isEqualTo("corner.yaml");
    Result result =
        Solver.solve(from.from().detail(from.variant()), from.from().accuracy(), Progress.SILENT);
    Ledger ledger = building.account(List.of(result)).ledger();
    Result.LinearTransmittance psi =
        result.psi().stream().filter(p -> p.name().equals("outer")).findFirst().orElseThrow();
    Certificate.Certified proved = (Certificate.Certified) psi.valueWPerMK().certificate();
    Uncertain h = part(ledger, "eaves").conductanceWPerK();
    assertThat(h.value()).isCloseTo(40 * psi.valueWPerMK().value(), within(1e-12));
    assertThat(h.lower()).isCloseTo(40 * proved.lower(), within(1e-12));
    assertThat(h.upper()).isCloseTo(40 * proved.upper(), within(1e-12));
    assertThat(psi.tolerance()).isPresent();
    Uncertain need = ((Ledger.Designed) ledger.outcome()).needKWh();
    // 72 kKh act on it, the rest is exact.
    assertThat(need.halfWidth()).isCloseTo(72 * h.halfWidth(), within(1e-9 * need.value()));
    assertThat(need.tolerance()).isCloseTo(72 * h.tolerance(), within(1e-9 * need.value()));
    assertThat(need.tolerance()).isPositive();
    assertThat(need.proved()).isTrue();
  }

  @Test
  void cases_are_refused_where_they_do_not_fit() throws IOException {
    Files.writeString(folder.resolve("corner.yaml"), WALL_CORNER);
    String typed = "{length: 40, psi: 0.1, dimensions: external}";
    assertThat(problems(PLAIN.replace(typed, "{length: 40, case: none.yaml, psi: outer}")))
        .containsExactly(
            "8:31: the case `none.yaml` cannot be read: there is no such file;"
                + " did you mean `corner.yaml`?");
    assertThat(problems(PLAIN.replace(typed, "{length: 40, case: corner.yaml, psi: inner}")))
        .containsExactly(
            "8:49: the ψ of junction `eaves` is by internal dimensions, the areas of the building"
                + " by external ones: their sum would be wrong; use a ψ by external dimensions");
    assertThat(problems(PLAIN.replace(typed, "{length: 40, case: corner.yaml, psi: outre}")))
        .containsExactly("8:49: the case `corner.yaml` has no ψ `outre`; did you mean `outer`?");
  }

  @Test
  void a_psi_needs_its_dimension_system() {
    assertThat(problems(PLAIN.replace(", dimensions: external}", "}")))
        .containsExactly(
            "8:12: junction `eaves` has no `dimensions`; a ψ means nothing without its dimension"
                + " system: add `dimensions: external`, `internal` or `overall-internal`");
    assertThat(problems(PLAIN.replace("  dimensions: external\n", "")))
        .containsExactly(
            "6:3: `building` has junctions but does not say how its areas are measured;"
                + " add `dimensions: external`, `internal` or `overall-internal`");
    assertThat(problems(PLAIN.replace(", dimensions: external}", ", dimensions: internal}")))
        .containsExactly(
            "8:47: the ψ of junction `eaves` is by internal dimensions, the areas of the building"
                + " by external ones: their sum would be wrong; use a ψ by external dimensions");
  }

  @Test
  void degree_days_below_the_inside_temperature_stand_for_gains() throws CaseException {
    String degreeDays =
        PLAIN.replace(
            "{inside: 20, outside: 5, days: 200, annual-mean: 9}",
            "{inside: 20, degree-days: 3000, base: BASE, days: 200}");
    String gains = "  gains: {sun: 500}\n  utilisation: 1\n";
    assertThat(problems(degreeDays.replace("BASE", "15.5") + gains))
        .containsExactly(
            "11:3: degree-days to a base of 15.5 °C, below the inside temperature of 20 °C, already"
                + " stand for gains: typed ones would be counted twice; leave `gains` away, or use"
                + " degree-days to a base equal to the inside temperature");
    assertThat(problems(degreeDays.replace("BASE", "65 F") + gains)).hasSize(1);
    // 65 °F inside as well: the same temperature, whatever the unit.
    assertThat(
            problems(
                degreeDays.replace("BASE", "65 F").replace("inside: 20", "inside: 18.3333333")
                    + gains))
        .isEmpty();
    assertThat(problems(degreeDays.replace("BASE", "22")))
        .containsExactly(
            "10:44: the base of the degree-days lies above the inside temperature; use degree-days"
                + " to a base equal to it, or below it");
    Ledger net = ledger(degreeDays.replace("BASE", "15.5"));
    assertThat(sum(net, Entry.Kind.HEAT)).isCloseTo(4488, within(1e-9));
    assertThat(sum(ledger(degreeDays.replace("BASE", "20") + gains), Entry.Kind.HEAT))
        .isCloseTo(3988, within(1e-9));
  }

  @Test
  void heating_value_and_efficiency_are_on_one_basis() {
    String heating =
        PLAIN
            + """
              heating:
                fuel: natural gas
                unit: m3
                heating-value: {gross: 10.9}
                efficiency: {net: 97 %}
            """;
    assertThat(problems(heating))
        .containsExactly(
            "15:5: the heating value of `natural gas` is gross, the efficiency net; give both on"
                + " one basis: gross over net is about 1.11 for natural gas, 1.09 for propane, 1.06"
                + " for heating oil, 1.08 for dry wood");
    assertThat(problems(heating.replace("{net: 97 %}", "0.9")))
        .containsExactly(
            "15:17: `efficiency` does not say whether it is by the gross or the net heating value;"
                + " write `efficiency: {gross: 88 %}` or `{net: …}`");
    assertThat(problems(heating.replace("{net: 97 %}", "{gross: 104 %}")))
        .hasSize(1)
        .allMatch(p -> p.startsWith("15:25: `gross` of `efficiency` of `heating` is out of range"));
    assertThat(problems(heating.replace("{net: 97 %}", "{gross: 88 %}"))).isEmpty();
  }

  @Test
  void the_ground_is_driven_by_the_year() throws CaseException {
    String floor = PLAIN + "  ground:\n    floor: {area: 80, U: 0.25}\n";
    // 20 W/K · 11 K · 4.8 kh, by hand.
    assertThat(sum(ledger(floor), Entry.Kind.GROUND)).isCloseTo(-1056, within(1e-9));
    assertThat(problems(floor.replace(", annual-mean: 9", "")))
        .containsExactly(
            "11:3: `ground` is driven by the annual mean temperature outdoors, which `climate` does"
                + " not give; add `annual-mean: …` to `climate`");
  }

  /** ISO 13370:2017 with B' 8, R 2.5, w 0.3, λ 2.0: 0.21849 (<em>computed</em>). */
  @Test
  void a_slab_by_its_clause() throws CaseException {
    Ledger ledger =
        ledger(
            PLAIN
                + "  ground:\n    floor: {area: 256, slab: {perimeter: 64, wall: 300 mm,"
                + " resistance: 2.5}}\n");
    assertThat(part(ledger, "floor").coefficient().value()).isCloseTo(0.21849, within(5e-6));
  }

  /** b = 6/(6 + 4), 6 W/K of wall, 2 of them by air: by hand. */
  @Test
  void unheated_rooms() throws CaseException {
    String room =
        PLAIN.replace(
            "{area: 100, U: 0.25}",
            "{area: 100, U: 0.25}\n    shared: {area: 8, U: 0.5, to: shed}");
    Ledger byLoss = ledger(room + "  unheated:\n    shed: {outside: 4, air: 2}\n");
    assertThat(part(byLoss, "shared").b().value()).isCloseTo(0.4, within(1e-12));
    assertThat(sum(byLoss, Entry.Kind.ROOM)).isCloseTo(-4 * 0.4 * 72, within(1e-9));
    Ledger byTemperature = ledger(room + "  unheated:\n    shed: {temperature: 11}\n");
    assertThat(part(byTemperature, "shared").b().value()).isCloseTo(0.6, within(1e-12));
    assertThat(problems(room))
        .containsExactly(
            "7:35: `shed` is no unheated room of this building; add `unheated: {shed: {b: 0.5}}`");
    assertThat(problems(PLAIN + "  unheated:\n    shed: {b: 0.5}\n"))
        .containsExactly(
            "11:3: nothing leads to the unheated room `shed`; give an element `to: shed`, or leave"
                + " the room away");
  }

  /** R 0.13 + 0.24/0.5 + 0.16/0.04 + 0.04 = 4.65 m²·K/W; λ ± 10 %: by hand. */
  @Test
  void layers_with_tolerances() throws CaseException {
    String text =
        PLAIN
            .replace(
                "title: Test\n",
                "title: Test\nmaterials:\n  brick: {conductivity: 0.5}\n"
                    + "  board: {conductivity: 0.04, tolerance: 10 %}\n")
            .replace("U: 0.25", "layers: [[brick, 0.24], [board, 160 mm]]");
    Uncertain u = part(ledger(text), "wall").coefficient();
    assertThat(u.value()).isCloseTo(1 / 4.65, within(1e-12));
    assertThat(u.widestUpper()).isCloseTo(1 / (0.65 + 4 / 1.1), within(1e-12));
    assertThat(u.widestLower()).isCloseTo(1 / (0.65 + 4 / 0.9), within(1e-12));
    assertThat(u.halfWidth()).isZero();
    assertThat(read(text).assumptions())
        .anyMatch(a -> a.what().equals("films of element `wall`") && a.source().contains("6946"));
    assertThat(problems(text.replace("[brick, 0.24]", "[bruck, 0.24]")))
        .containsExactly(
            "9:33: `bruck` is no material of this file or of the library; did you mean `brick`?");
  }

  /** n50 2.0 with e 0.07 is 0.14 per hour: 200 · 0.14/3 W/K over 72 kKh, by hand. */
  @Test
  void leakage_and_recovery() throws CaseException {
    Ledger ledger =
        ledger(
            PLAIN.replace(
                "{volume: 200, change: 0.5}",
                "{volume: 200, change: 0.5, recovery: 80 %, leakage: {n50: 2.0}}"));
    assertThat(sum(ledger, Entry.Kind.AIR)).isCloseTo(-480, within(1e-9));
    assertThat(sum(ledger, Entry.Kind.LEAKAGE)).isCloseTo(-28.0 / 3 * 72, within(1e-9));
  }

  @Test
  void gains_month_by_month() throws CaseException {
    String months =
        PLAIN.replace(
            "{inside: 20, outside: 5, days: 200, annual-mean: 9}",
            "\n    inside: 20\n    months:\n      January: {outside: 0, days: 30}\n"
                + "      April: {outside: 18, days: 10}");
    String gains = "  gains: {sun: [300, 900], people: 400}\n  utilisation: 1\n";
    Ledger.Designed outcome = (Ledger.Designed) ledger(months + gains).outcome();
    // H 187/3 W/K: 897.6 and 29.92 kWh; people 300 and 100; in April all but 29.92 is left over.
    assertThat(outcome.steps()).hasSize(2);
    assertThat(outcome.steps().get(0).lossKWh()).isCloseTo(897.6, within(1e-9));
    assertThat(outcome.steps().get(0).usedKWh()).isCloseTo(600, within(1e-9));
    assertThat(outcome.steps().get(1).usedKWh()).isCloseTo(29.92, within(1e-9));
    assertThat(outcome.needKWh().value()).isCloseTo(297.6, within(1e-9));
    assertThat(problems(months + gains.replace("[300, 900]", "[300]")))
        .hasSize(1)
        .allMatch(p -> p.contains("gain `sun` has 1 figures, the climate 2 steps"));
  }

  @Test
  void what_excludes_each_other_is_refused() {
    String meters = "  meters: {electricity: 1000}\n";
    List<String> found = new ArrayList<>();
    found.addAll(problems(PLAIN + meters + "  heating: {performance: 3}\n"));
    found.addAll(problems(PLAIN + meters + "  gains: {sun: 3}\n  utilisation: 0.9\n"));
    found.addAll(problems(PLAIN + "  gains: {sun: 3}\n"));
    found.addAll(problems(PLAIN + "  meters: {electricity: 1000, exported: 1200}\n"));
    found.addAll(problems(PLAIN + "  meters: {ambient: 1, heat-pump: {electricity: 1}}\n"));
    assertThat(found)
        .containsExactly(
            "11:3: `building` has both `heating` and `meters`; `heating` closes the account of a"
                + " design, `meters` that of a building in use",
            "13:3: with `meters` gains that are not used are part of the remainder;"
                + " leave `utilisation` away",
            "11:3: `building` has gains but does not say how much of them is used;"
                + " add `utilisation: 0.95`, or `utilisation: {floor-area: …, class: medium}`",
            "11:31: more electricity is exported than comes in; `photovoltaics` is all that is"
                + " made, exported electricity included",
            "11:24: `meters` has both `ambient` and `heat-pump`; give one of them",
            "11:35: `heat-pump` has no `performance`; add `performance: 3.2`");
  }

  /** 4488 kWh at a performance of 3: a third bought, two thirds ambient. */
  @Test
  void a_heat_pump() throws CaseException {
    Ledger ledger = ledger(PLAIN + "  heating: {performance: 3}\n");
    assertThat(sum(ledger, Entry.Kind.ELECTRICITY)).isCloseTo(1496, within(1e-9));
    assertThat(sum(ledger, Entry.Kind.AMBIENT)).isCloseTo(2992, within(1e-9));
    Ledger metered =
        ledger(
            PLAIN
                + "  meters: {electricity: 1500, heat-pump: {electricity: 1000,"
                + " performance: 3.5}}\n");
    assertThat(sum(metered, Entry.Kind.AMBIENT)).isCloseTo(2500, within(1e-9));
  }

  @Test
  void electricity_over_a_low_base_is_told() throws CaseException {
    BuildingAccount account =
        read(PLAIN.replace(
                    "{inside: 20, outside: 5, days: 200, annual-mean: 9}",
                    "{inside: 20, degree-days: 3000, base: 15.5, days: 200}")
                + "  meters: {electricity: 1500}\n")
            .account(List.of());
    assertThat(account.warnings()).hasSize(1).allMatch(w -> w.contains("counts them twice"));
  }

  @Test
  void a_store_that_grew_has_to_be_heated() throws CaseException {
    assertThat(sum(ledger(PLAIN + "  store: 100\n"), Entry.Kind.HEAT))
        .isCloseTo(4588, within(1e-9));
    assertThat(read(PLAIN).assumptions())
        .anyMatch(a -> a.what().equals("change of store") && a.value().startsWith("0"));
    assertThat(read(PLAIN + "  store: 100\n").assumptions())
        .noneMatch(a -> a.what().equals("change of store"));
  }

  @Test
  void a_building_is_told_from_a_case() throws IOException {
    Path file = folder.resolve("any.yaml");
    Files.writeString(file, PLAIN);
    assertThat(BuildingFile.is(file)).isTrue();
    Files.writeString(file, WALL_CORNER);
    assertThat(BuildingFile.is(file)).isFalse();
    assertThat(BuildingFile.is(folder.resolve("none.yaml"))).isFalse();
  }
}
