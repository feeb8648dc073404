package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values computed from the formulas of ISO 13788 with another program, status: computed. */
class CriticalTemperatureTest {
  @ParameterizedTest
  @CsvSource({"0.5, 1, 9.269", "0.5, 0.8, 12.6246", "0.6, 0.8, 15.4349"})
  void limits_for_air_of_20_degrees(double humidity, double atSurface, double celsius) {
    assertThat(CriticalTemperature.of(20, humidity, atSurface)).isCloseTo(celsius, within(5e-4));
  }
}
