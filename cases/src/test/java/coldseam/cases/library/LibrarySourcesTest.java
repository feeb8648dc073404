package coldseam.cases.library;

import static org.assertj.core.api.Assertions.assertThat;

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
    assertThat(Library.all()).hasSizeGreaterThan(100);
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
