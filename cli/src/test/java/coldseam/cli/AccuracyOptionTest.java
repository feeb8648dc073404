package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.solver.detail.Accuracy;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AccuracyOptionTest {
  @Test
  void each_figure_replaces_that_of_the_case() throws Exception {
    Accuracy base = Accuracy.STANDARD;
    Accuracy read = AccuracyOption.read(base, "L2D=0.02%, psi=0.0002,U=0.1 %");
    assertThat(read.couplingRelative()).isEqualTo(0.0002);
    assertThat(read.couplingWPerMK()).isGreaterThan(1e100); // the share alone counts
    assertThat(read.psiWPerMK()).isEqualTo(0.0002);
    assertThat(read.transmittanceRelative()).isEqualTo(0.001);
    assertThat(read.mostUnknowns()).isEqualTo(base.mostUnknowns());
    assertThat(AccuracyOption.read(base, "L2D=0.003").couplingWPerMK()).isEqualTo(0.003);
    assertThat(AccuracyOption.read(base, "L2D=0.003").psiWPerMK()).isEqualTo(base.psiWPerMK());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "l2d=1% | did you mean L2D",
        "psi | needs a half-width",
        "psi=0.1% | not a share",
        "U=0.1 | is a share",
        "L2D=much | is no number",
        "L2D=-1% | more than 0",
        "L2D=NaN | more than 0",
        "fine | is no accuracy",
        "'' | is no accuracy"
      })
  void what_cannot_be_read_is_refused_with_what_would_be_right(String typed, String words) {
    assertThatThrownBy(() -> AccuracyOption.read(Accuracy.STANDARD, typed))
        .isInstanceOf(UsageException.class)
        .hasMessageContaining(words);
  }
}
