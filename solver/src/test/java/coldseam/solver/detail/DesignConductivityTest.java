package coldseam.solver.detail;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** ISO 10456:2007, clause 7; factors computed by hand. */
class DesignConductivityTest {
  /** Mineral wool 0.035, f_T 0.0046 1/K, 10 to 20 °C: e^0.046 = 1.047074, 0.036648. */
  @Test
  void mineralWoolAtTwentyDegrees() {
    double factor = DesignConductivity.temperatureFactor(0.0046, 10, 20);
    assertThat(factor).isCloseTo(1.047074, within(0.5e-6));
    assertThat(0.035 * factor).isCloseTo(0.036648, within(0.5e-6));
  }

  /** EPS 0.035, f_ψ 4, 0.02 m³/m³ more: e^0.08 = 1.083287, 0.037915. */
  @Test
  void moistExpandedPolystyrene() {
    double factor = DesignConductivity.moistureFactor(4, 0.01, 0.03);
    assertThat(factor).isCloseTo(1.083287, within(0.5e-6));
    assertThat(0.035 * factor).isCloseTo(0.037915, within(0.5e-6));
  }
}
