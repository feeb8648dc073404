package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values computed from the formulas of ISO 13788 with another program, status: computed. */
class CriticalTemperatureTest {
  @ParameterizedTest
  @CsvSource({
    "-20, 102.740",
    "-10, 259.333",
    "-5, 401.181",
    "0, 610.5",
    "5, 871.865",
    "10, 1227.310",
    "15, 1704.407",
    "20, 2336.951",
    "25, 3165.920"
  })
  void saturation_pressure(double celsius, double pa) {
    assertThat(CriticalTemperature.saturationPa(celsius)).isCloseTo(pa, within(5e-4));
    assertThat(CriticalTemperature.saturated(pa)).isCloseTo(celsius, within(1e-4));
  }

  @ParameterizedTest
  @CsvSource({"0.5, 1, 9.269", "0.5, 0.8, 12.6246", "0.6, 0.8, 15.4349"})
  void limits_for_air_of_20_degrees(double humidity, double atSurface, double celsius) {
    assertThat(CriticalTemperature.of(20, humidity, atSurface)).isCloseTo(celsius, within(5e-4));
  }
}
