package coldseam.solver.result;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.Wanted.Framing.Taper;
import org.junit.jupiter.api.Test;

/** Rules of ISO 6946 by hand and by numerical integration. */
class TransmittanceRulesTest {
  /** Timber wall: R'T 5.227378, R''T 4.971391, e 2.510 % (*computed* by hand). */
  @Test
  void error_of_the_mean() {
    assertThat(TransmittanceRules.error(5.227378, 4.971391)).isCloseTo(0.02510, within(5e-6));
  }

  /** By hand: ΔU'' (R1/RT)² with R1 4, RT 5. */
  @Test
  void corrections() {
    assertThat(TransmittanceRules.airVoids(0, 4, 5)).isZero();
    assertThat(TransmittanceRules.airVoids(1, 4, 5)).isCloseTo(0.0064, within(1e-12));
    assertThat(TransmittanceRules.airVoids(2, 4, 5)).isCloseTo(0.0256, within(1e-12));
    double section = Math.PI / 4 * 0.005 * 0.005;
    assertThat(TransmittanceRules.fasteners(4, 50, section, 0.14, 0.14, 4, 5))
        .isCloseTo(0.8 * 50 * section * 4 / 0.14 * 0.64, within(1e-12));
    // recessed by half: 0.8 d1/d0 over d1
    assertThat(TransmittanceRules.fasteners(4, 50, section, 0.14, 0.07, 4, 5))
        .isCloseTo(0.8 * 50 * section * 4 / 0.14 * 0.64, within(1e-12));
    assertThat(TransmittanceRules.invertedRoof(2, 0.04, 4, 5)).isCloseTo(0.0512, within(1e-12));
  }

  /** The formulas are the means of 1/(R0 + R(x)) over the part of the roof, here in small steps. */
  @Test
  void tapered_layers() {
    double most = 3.2;
    double rest = 1.1;
    int steps = 200_000;
    double rectangle = 0;
    double thick = 0;
    double thin = 0;
    for (int i = 0; i < steps; i++) {
      double x = (i + 0.5) / steps;
      double u = 1 / (rest + most * x);
      rectangle += u / steps;
      // x is the thickness: strips of a triangle narrow towards its apex
      thick += 2 * (1 - x) * u / steps;
      thin += 2 * x * u / steps;
    }
    assertThat(TransmittanceRules.tapered(Taper.RECTANGLE, most, rest))
        .isCloseTo(rectangle, within(1e-9));
    assertThat(TransmittanceRules.tapered(Taper.THICKEST_AT_APEX, most, rest))
        .isCloseTo(thick, within(1e-9));
    assertThat(TransmittanceRules.tapered(Taper.THINNEST_AT_APEX, most, rest))
        .isCloseTo(thin, within(1e-9));
  }
}
