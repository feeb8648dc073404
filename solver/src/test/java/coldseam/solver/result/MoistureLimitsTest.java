package coldseam.solver.result;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The formulas of ISO 13788 against values *computed* from them with another program. */
class MoistureLimitsTest {
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
    assertThat(MoistureLimits.saturationPa(celsius)).isCloseTo(pa, within(5e-4));
    assertThat(MoistureLimits.saturatedC(pa)).isCloseTo(celsius, within(1e-4));
  }

  /** 20 °C: humidity, θe, limit for mould, f_Rsi against mould, against condensation. */
  @ParameterizedTest
  @CsvSource({
    "0.5, -5, 12.6246, 0.70498, 0.57076",
    "0.5, 0, 12.6246, 0.63123, 0.46345",
    "0.5, -10, 12.6246, 0.75415, 0.64230",
    "0.6, -5, 15.4349, 0.81739, 0.68016"
  })
  void a_humidity_as_typed(
      double humidity, double outside, double limit, double mould, double condensation) {
    double vapour = humidity * MoistureLimits.saturationPa(20);
    double critical = MoistureLimits.criticalC(vapour, MoistureLimits.MOULD);
    assertThat(critical).isCloseTo(limit, within(5e-5));
    assertThat(MoistureLimits.requiredFactor(critical, 20, outside)).isCloseTo(mould, within(1e-5));
    double dewPoint = MoistureLimits.criticalC(vapour, MoistureLimits.CONDENSATION);
    assertThat(MoistureLimits.requiredFactor(dewPoint, 20, outside))
        .isCloseTo(condensation, within(1e-5));
  }

  /** The excess holds up to 0 °C and has gone at 20 °C (ISO 13788, figure A.1; *from memory*). */
  @ParameterizedTest
  @CsvSource({"-10, 810", "0, 810", "5, 607.5", "10, 405", "20, 0", "30, 0"})
  void excess_of_class_3(double outside, double pa) {
    assertThat(MoistureLimits.excessPa(MoistureLimits.classPa(3), outside))
        .isCloseTo(pa, within(1e-9));
  }

  @Test
  void classes_without_an_upper_limit_are_refused() {
    assertThat(MoistureLimits.classPa(1)).isEqualTo(270);
    assertThat(MoistureLimits.classPa(4)).isEqualTo(1080);
    assertThatIllegalArgumentException().isThrownBy(() -> MoistureLimits.classPa(5));
    assertThatIllegalArgumentException().isThrownBy(() -> MoistureLimits.classPa(0));
  }
}
