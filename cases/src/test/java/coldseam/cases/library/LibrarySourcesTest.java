package coldseam.cases.library;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LibrarySourcesTest {
  @Test
  void every_entry_has_a_source_and_a_status() {
    assertThat(Library.all()).hasSizeGreaterThanOrEqualTo(150);
    for (Entry entry : Library.all()) {
      assertThat(entry.source()).as(entry.name()).isNotBlank();
      assertThat(entry.status()).as(entry.name()).isIn("seen", "memory");
    }
  }

  @Test
  void every_figure_is_possible() {
    for (Entry entry : Library.all()) {
      assertThat(entry.conductivityWPerMK()).as(entry.name()).isBetween(0.005, 400.0);
      entry.densityKgPerM3().ifPresent(d -> assertThat(d).isBetween(1.0, 12_000.0));
      entry.emissivity().ifPresent(e -> assertThat(e).isBetween(0.01, 1.0));
      // The wet cup never shows more resistance than the dry cup (ISO 10456:2007, table 3).
      if (entry.vapourResistanceDry().isPresent()) {
        assertThat(entry.vapourResistanceWet().orElseThrow())
            .as(entry.name())
            .isLessThanOrEqualTo(entry.vapourResistanceDry().getAsDouble());
      }
    }
  }

  @Test
  void every_name_means_one_material_and_can_stand_in_a_case() {
    Map<String, String> owners = new HashMap<>();
    for (Entry entry : Library.all()) {
      for (String name : names(entry)) {
        String key = name.toLowerCase(Locale.ROOT).replaceAll("[^\\p{L}\\p{N}.%]", "");
        assertThat(owners.put(key, entry.name())).as(name).isNull();
        assertThat(name).isEqualTo(name.strip()).matches("[^,:#\\[\\]{}]+");
        assertThat(Library.find(name)).contains(entry);
      }
    }
  }

  private static List<String> names(Entry entry) {
    List<String> names = new java.util.ArrayList<>(entry.otherNames());
    names.add(entry.name());
    return names;
  }

  /** Design values of ISO 10456:2007, table 3, and of ISO 10077-2 for frame materials. */
  @ParameterizedTest
  @CsvSource({
    "reinforced concrete 1 % steel, 2.3",
    "reinforced concrete 2 % steel, 2.5",
    "concrete, 2.0",
    "steel, 50",
    "stainless steel, 17",
    "aluminium, 160",
    "aluminum, 160",
    "copper, 380",
    "glass, 1.0",
    "softwood, 0.13",
    "hardwood, 0.18",
    "OSB, 0.13",
    "drywall, 0.25",
    "plywood, 0.13",
    "EPDM, 0.25",
    "nylon, 0.25",
    "vinyl, 0.17",
    "polyamide 6.6 with 25 % glass fibre, 0.30",
    "clay soil, 1.5",
    "sand and gravel, 2.0",
    "air, 0.025"
  })
  void known_values(String name, double conductivity) {
    assertThat(Library.find(name).orElseThrow().conductivityWPerMK()).isEqualTo(conductivity);
  }

  /** R per inch and nominal R as labels and ASHRAE Fundamentals give them, from memory. */
  @ParameterizedTest
  @CsvSource({
    "wood framing, 1, 1.25",
    "XPS R-5 per inch, 1, 5",
    "EPS 1 lb/ft3, 1, 3.85",
    "EPS 1.5 lb/ft3, 1, 4.17",
    "EPS 2 lb/ft3, 1, 4.35",
    "R-11 batt, 3.5, 11",
    "R-13 batt, 3.5, 13",
    "R-15 batt, 3.5, 15",
    "R-19 batt, 6.25, 19",
    "R-21 batt, 5.5, 21",
    "R-30 batt, 9.5, 30",
    "R-38 batt, 12, 38",
    "hardboard 50 lb/ft3, 1, 1.37",
    "insulating sheathing board, 0.5, 1.32",
    "face brick 130 lb/ft3, 1, 0.11",
    "common brick 120 lb/ft3, 1, 0.20",
    "drywall 40 lb/ft3, 0.5, 0.45"
  })
  void known_resistances_in_inches(String name, double inches, double rating) {
    double si = inches * 0.0254 / Library.find(name).orElseThrow().conductivityWPerMK();
    // 1 h·ft²·°F/Btu = 0.17611 m²·K/W; conductivities are rounded to three digits.
    assertThat(si / 0.17611).isCloseTo(rating, within(0.025 * rating));
  }

  /** Coefficients of ISO 10456 by volume and by mass, from memory. */
  @Test
  void known_coefficients_of_conversion() {
    assertThat(Library.find("EPS").orElseThrow().conversion().moistureByVolume()).hasValue(4);
    assertThat(Library.find("XPS").orElseThrow().conversion().moistureByVolume()).hasValue(2.5);
    assertThat(Library.find("cellular glass").orElseThrow().conversion().moistureByVolume())
        .hasValue(0);
    assertThat(Library.find("AAC 400").orElseThrow().conversion().moistureByMass()).hasValue(4);
    assertThat(Library.find("mineral wool").orElseThrow().conversion().temperaturePerK())
        .hasValue(0.0046);
    assertThat(Library.find("EPS").orElseThrow().conversion().temperaturePerK()).isEmpty();
  }

  @Test
  void finds_whatever_the_case_and_the_blanks() {
    assertThat(Library.find("Mineral  Wool")).isPresent();
    assertThat(Library.find("mineralwool")).isEqualTo(Library.find("mineral wool"));
    assertThat(Library.find("reinforced concrete, 1% steel"))
        .isEqualTo(Library.find("reinforced concrete 1 % steel"));
    assertThat(Library.find("unobtainium")).isEmpty();
    assertThat(Library.find("")).isEmpty();
  }

  @Test
  void searches_by_words_in_any_order() {
    assertThat(Library.search(List.of("steel")))
        .extracting(Entry::name)
        .contains("steel", "stainless steel austenitic", "reinforced concrete 1 % steel")
        .isSortedAccordingTo(String.CASE_INSENSITIVE_ORDER);
    assertThat(Library.search(List.of("steel", "reinforced"))).hasSize(2);
    assertThat(Library.search(List.of("lumber"))).extracting(Entry::name).contains("timber 500");
    assertThat(Library.search(List.of())).isEqualTo(Library.all());
    assertThat(Library.search(List.of("unobtainium"))).isEmpty();
  }

  @Test
  void suggests_up_to_three_names() {
    assertThat(Library.nearest("mineral wol")).startsWith("mineral wool").hasSizeBetween(1, 3);
    assertThat(Library.nearest("EPSS")).contains("EPS");
    assertThat(Library.nearest("galvanized stel")).startsWith("galvanized steel");
    assertThat(Library.nearest("qqqqqqqq")).isEmpty();
  }
}
