package coldseam.cli.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Expected texts worked out by hand from the rule: the last digit printed is the first that the
 * half-width reaches, and number ± half-width as printed covers number ± half-width as given.
 */
class DigitsTest {
  @ParameterizedTest
  @CsvSource({
    "0.612349, 0.0004, 0.6123, 0.0005", // 0.0004 + 0.000049 of rounding
    "0.612349, 0.004, 0.612, 0.005",
    "0.61, 0.04, 0.61, 0.04", // nothing rounded away, nothing added
    "123.456, 12, 120, 20",
    "1.23456, 0.00000001, 1.2346, 0.0001", // not beyond four decimals
    "-0.00001, 0.001, 0.000, 0.002",
    "0.5, 0, 0.5000, 0.0000",
    "9.49, 0.096, 9.5, 0.2", // 0.096 becomes 0.1, so its first digit is in tenths
  })
  void numbers_end_where_their_half_width_begins(
      double value, double halfWidth, String number, String width) {
    assertThat(Digits.of(value, halfWidth, 4)).isEqualTo(new Digits.Figure(number, width));
  }

  @Test
  void what_is_printed_covers_what_is_known() {
    Random random = new Random(20260101);
    for (int i = 0; i < 20000; i++) {
      double value = random.nextGaussian() * Math.pow(10, random.nextInt(5) - 2);
      double halfWidth = random.nextDouble() * Math.pow(10, random.nextInt(8) - 6);
      Digits.Figure figure = Digits.of(value, halfWidth, 6);
      BigDecimal number = new BigDecimal(figure.value().replace('−', '-'));
      BigDecimal width = new BigDecimal(figure.halfWidth());
      BigDecimal exact = BigDecimal.valueOf(value);
      BigDecimal known = BigDecimal.valueOf(halfWidth);
      assertThat(number.subtract(width))
          .as("lower end of %s ± %s", value, halfWidth)
          .isLessThanOrEqualTo(exact.subtract(known));
      assertThat(number.add(width))
          .as("upper end of %s ± %s", value, halfWidth)
          .isGreaterThanOrEqualTo(exact.add(known));
      assertThat(number.scale()).as("decimals of %s ± %s", value, halfWidth).isLessThanOrEqualTo(6);
    }
  }

  @Test
  void bounds_are_covered_and_no_more() {
    assertThat(Digits.between(1.23456, 1.2342, 1.2349, 4).text()).isEqualTo("1.2346 ± 0.0004");
    assertThat(Digits.between(1.5, 1.5, 1.7, 4).text()).isEqualTo("1.5 ± 0.2");
    assertThat(Digits.between(1.5, Double.NEGATIVE_INFINITY, 2, 4).text()).isEqualTo("1.5 ± ?");
    Random random = new Random(5);
    for (int i = 0; i < 20000; i++) {
      double lower = random.nextGaussian();
      double upper = lower + random.nextDouble() * Math.pow(10, -random.nextInt(6));
      double value = lower + random.nextDouble() * (upper - lower);
      Digits.Figure figure = Digits.between(value, lower, upper, 6);
      BigDecimal number = new BigDecimal(figure.value().replace('−', '-'));
      BigDecimal width = new BigDecimal(figure.halfWidth());
      assertThat(number.subtract(width)).isLessThanOrEqualTo(BigDecimal.valueOf(lower));
      assertThat(number.add(width)).isGreaterThanOrEqualTo(BigDecimal.valueOf(upper));
    }
  }

  @Test
  void what_is_not_known_is_not_printed_as_if_it_were() {
    assertThat(Digits.of(1.23456, Double.POSITIVE_INFINITY, 4).text()).isEqualTo("1.23 ± ?");
    assertThat(Digits.of(1.23456, Double.NaN, 4).text()).isEqualTo("1.23 ± ?");
    assertThat(Digits.of(Double.POSITIVE_INFINITY, 0.1, 4).text()).isEqualTo("∞ ± ?");
    assertThat(Digits.of(Double.NaN, 0.1, 4).value()).isEqualTo("–");
  }

  @ParameterizedTest
  @CsvSource({"-0.04, 1, 0.0", "-0.06, 1, −0.1", "2.5, 0, 2", "1234.5, 2, 1234.50", "7, 1, 7.0"})
  void fixed_decimals_have_no_minus_zero(double value, int decimals, String text) {
    assertThat(Digits.fixed(value, decimals)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"0.035, 6, 0.035", "1200, 1, 1200", "0.00004, 3, 0", "-12.50, 3, −12.5"})
  void input_figures_stay_as_short_as_they_are(double value, int most, String text) {
    assertThat(Digits.shortest(value, most)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"0.012345, 2, 0.012", "98765, 2, 99000", "0, 3, 0", "-0.0996, 1, −0.1"})
  void significant_digits(double value, int digits, String text) {
    assertThat(Digits.significant(value, digits)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({
    "0.04371, 2, 4, 0.044",
    "0.0400001, 2, 4, 0.041",
    "0.000012, 2, 4, 0.0001",
    "99.1, 2, 4, 100",
    "0, 2, 4, 0"
  })
  void half_widths_are_rounded_upwards(double value, int digits, int most, String text) {
    assertThat(Digits.outward(value, digits, most)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"7e-15, 7e-15", "9.6e-15, 1e-14", "0.25, 3e-1", "0, 0", "12, 2e1"})
  void magnitudes_are_rounded_upwards(double value, String text) {
    assertThat(Digits.magnitude(value)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"0, '0'", "999, '999'", "1000, '1,000'", "1234567, '1,234,567'"})
  void whole_numbers_are_grouped(int count, String text) {
    assertThat(Digits.grouped(count)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"3.25, +3.25", "−3.25, −3.25", "0.00, 0.00", "∞, +∞"})
  void signs(String number, String text) {
    assertThat(Digits.signed(number)).isEqualTo(text);
  }
}
