package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Numbers, units and expressions. Factors between customary units and SI: NIST Special Publication
 * 811 (2008), appendix B.8, with the International Table Btu (from memory).
 */
class QuantitiesTest {
  private final Problems problems = new Problems("case");
  private final NamedValues values = new NamedValues(problems, LengthUnit.MM);
  private final Quantities quantities = new Quantities(problems, values, LengthUnit.MM);

  private double read(String text, Place place) {
    return quantities.read(scalar(text), "this", place);
  }

  private static Node.Scalar scalar(String text) {
    return new Node.Scalar(text, Node.Style.PLAIN, 1, 1);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '\0',
      value = {
        "160 | COORDINATE | 0.16",
        "-160 | COORDINATE | -0.16",
        "1.6e2 | COORDINATE | 0.16",
        "160 mm | COORDINATE | 0.16",
        "160mm | COORDINATE | 0.16",
        "16 cm | COORDINATE | 0.16",
        "0.16 m | COORDINATE | 0.16",
        "50 µm | COORDINATE | 5e-5",
        "6 in | COORDINATE | 0.1524",
        "6\" | COORDINATE | 0.1524",
        "5/8 in | COORDINATE | 0.015875",
        "5/8\" | COORDINATE | 0.015875",
        "1 5/8 in | COORDINATE | 0.041275",
        "1 5/8\" | COORDINATE | 0.041275",
        "5 ft | COORDINATE | 1.524",
        "5' | COORDINATE | 1.524",
        "5'-4\" | COORDINATE | 1.6256",
        "5' 4\" | COORDINATE | 1.6256",
        "5'4\" | COORDINATE | 1.6256",
        "5 ft 4 in | COORDINATE | 1.6256",
        "1'-4 5/8\" | COORDINATE | 0.422275",
        "1' - 4\" | COORDINATE | 0.2032",
        "-1'-4\" | COORDINATE | -0.4064",
        "33 mil | COORDINATE | 8.382e-4",
        "0.035 | CONDUCTIVITY | 0.035",
        "0.035 W/(m K) | CONDUCTIVITY | 0.035",
        "0.035 W/(m·K) | CONDUCTIVITY | 0.035",
        "0.035 W/mK | CONDUCTIVITY | 0.035",
        "0.035 W/m K | CONDUCTIVITY | 0.035",
        "1 Btu in/(h ft2 F) | CONDUCTIVITY | 0.1442279",
        "1 Btu·in/(h·ft²·°F) | CONDUCTIVITY | 0.1442279",
        "1 Btu in/h ft2 F | CONDUCTIVITY | 0.1442279",
        "1 Btu/(h ft F) | CONDUCTIVITY | 1.730735",
        "0.13 | FILM | 0.13",
        "0.13 m2 K/W | FILM | 0.13",
        "0.13 m2K/W | FILM | 0.13",
        "0.13 m²·K/W | FILM | 0.13",
        "1 h ft2 F/Btu | FILM | 0.1761102",
        "R-13 | RESISTANCE | 2.2894326",
        "R13 | RESISTANCE | 2.2894326",
        "R-0.56 | RESISTANCE | 0.0986217",
        "0.343 W/(m2 K) | TRANSMITTANCE | 0.343",
        "0.343 W/m2K | TRANSMITTANCE | 0.343",
        "1 Btu/(h ft2 F) | TRANSMITTANCE | 5.678263",
        "1.5 W/K | CONDUCTANCE | 1.5",
        "1.5 W/(m K) | CONDUCTANCE | 1.5",
        "100 W/m2 | FLOW_DENSITY | 100",
        "1 Btu/(h ft2) | FLOW_DENSITY | 3.154591",
        "20 | TEMPERATURE | 20",
        "20 C | TEMPERATURE | 20",
        "20 °C | TEMPERATURE | 20",
        "68 F | TEMPERATURE | 20",
        "-4 F | TEMPERATURE | -20",
        "- 4 °F | TEMPERATURE | -20",
        "-40 F | TEMPERATURE | -40",
        "68 F - 5 K | TEMPERATURE | 15",
        "5 % | TOLERANCE | 0.05",
        "0.05 | TOLERANCE | 0.05",
        "30 | ANGLE | 30",
        "30 deg | ANGLE | 30",
        "30° | ANGLE | 30",
      })
  void written_out_units(String text, Place place, double expected) {
    assertThat(read(text, place)).isCloseTo(expected, within(4e-7 * Math.abs(expected)));
    assertThat(problems.none()).isTrue();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "1 + 2 * 3 | 7",
        "(1 + 2) * 3 | 9",
        "7 - 2 - 1 | 4",
        "16 / 4 / 2 | 2",
        "2 ^ 3 ^ 2 | 512",
        "-2 ^ 2 | -4",
        "2 * -3 | -6",
        "--3 | 3",
        "min(3, 1, 2) | 1",
        "max(3, 1, 2) + abs(-4) | 7",
        "sqrt(9) * sin(30) | 1.5",
        "cos(60) + tan(45) | 1.5",
        "cos(90) | 0",
        "sin(180) | 0",
        "sin(-90) | -1",
        "100 * pi | 314.159265358979",
        "insulation + 240 | 400",
        "insulation + 1 cm | 170",
        "insulation / 2 | 80",
        "sqrt(insulation ^ 2 + 120 ^ 2) | 200",
        "frame depth - frame | 70",
        "ratio * insulation | 40",
        "(warm - cold) / 1 K | 25",
        "3 * h + 2 | 17",
        "12 mm / h | 2.4",
      })
  void arithmetic(String text, double expected) {
    values.put("insulation", scalar("160 mm"));
    values.put("frame", scalar("8"));
    values.put("frame depth", scalar("78"));
    values.put("ratio", scalar("25 %"));
    values.put("warm", scalar("68 F"));
    values.put("cold", scalar("-5 C"));
    values.put("h", scalar("5"));
    assertThat(read(text, Place.COORDINATE) * 1000)
        .isCloseTo(expected, within(1e-12 * Math.max(1, Math.abs(expected))));
    assertThat(problems.none()).isTrue();
  }

  @Test
  void a_bare_number_counts_in_the_unit_of_the_case() {
    for (LengthUnit unit : LengthUnit.ALL) {
      NamedValues named = new NamedValues(problems, unit);
      named.put("a", scalar("25.4 mm"));
      Quantities own = new Quantities(problems, named, unit);
      assertThat(own.read(scalar("2"), "this", Place.COORDINATE)).isEqualTo(2 * unit.metres());
      assertThat(own.read(scalar("a + 1"), "this", Place.COORDINATE))
          .isCloseTo(0.0254 + unit.metres(), within(1e-15));
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "0.04 W/(m K) | COORDINATE",
        "160 mm | CONDUCTIVITY",
        "R-13 | COORDINATE",
        "5 % | COORDINATE",
        "68 F | COORDINATE",
        "20 K | TEMPERATURE",
        "160 mm * 160 mm | COORDINATE",
        "160 mm + 5 K | COORDINATE",
        "160 mm + 68 F | COORDINATE",
        "68 F * 1 m | COORDINATE",
        "2 ^ (3 mm) | COORDINATE",
        "(3 mm) ^ 0.5 | COORDINATE",
        "sqrt(3 mm) | COORDINATE",
        "sin(3 mm) | COORDINATE",
        "(-8) ^ 0.5 | COORDINATE",
        "1.5 | COUNT",
        "0 | COUNT",
        "nothing | COORDINATE",
        "min() | COORDINATE",
        "abs(1, 2) | COORDINATE",
        "2,5 | COORDINATE",
        "0x10 | COORDINATE",
        "1_000 | COORDINATE",
        "12 parsec | COORDINATE",
        "3 4 | COORDINATE",
        "* 3 | COORDINATE",
        "tan(90) | COORDINATE",
        "5/0 in | COORDINATE",
        "Infinity | COORDINATE",
        "1e999 | COORDINATE",
      })
  void refused_once_and_in_words(String text, Place place) {
    assertThat(read(text, place)).isNaN();
    List<Problem> said = problems.inOrder();
    assertThat(said).hasSize(1);
    assertThat(said.get(0).right()).isPresent();
    assertThat(said.get(0).line()).isEqualTo(1);
    assertThat(said.get(0).column()).isBetween(1, text.length() + 1);
  }

  @Test
  void a_mistake_in_a_value_is_reported_where_it_is_written_and_only_there() {
    values.put("a", new Node.Scalar("3 +", Node.Style.PLAIN, 7, 4));
    assertThat(read("a * 2", Place.COORDINATE)).isNaN();
    assertThat(read("min(a, 3)", Place.COORDINATE)).isNaN();
    assertThat(read("sqrt(-a) ^ a", Place.COORDINATE)).isNaN();
    assertThat(problems.inOrder())
        .extracting(Problem::text)
        .containsExactly("case:7:7: value `a`: something is missing at the end; end with a number");
  }

  @Test
  void a_value_called_like_a_unit_or_a_rating_is_meant_where_it_can_be() {
    values.put("R", scalar("20"));
    values.put("m", scalar("3"));
    assertThat(read("R-13", Place.COORDINATE)).isCloseTo(0.007, within(1e-15));
    assertThat(read("2 * m", Place.COORDINATE)).isCloseTo(0.006, within(1e-15));
    assertThat(read("2 m", Place.COORDINATE)).isEqualTo(2);
  }
}
