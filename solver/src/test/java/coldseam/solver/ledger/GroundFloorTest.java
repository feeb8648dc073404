package coldseam.solver.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Values of the formula of ISO 13370:2017 <em>computed</em> outside this program for λ 2.0 and
 * walls of 0.3 m.
 */
class GroundFloorTest {
  /** A square floor of side 2 B' has the characteristic dimension B'. */
  @ParameterizedTest
  @CsvSource({
    "8, 0, 0.55405", "8, 0.5, 0.40935", "8, 1.0, 0.33409", "8, 2.5, 0.21849", "8, 5.0, 0.13912",
    "4, 0, 0.87766", "4, 2.5, 0.26497", "12, 2.5, 0.18673", "20, 0, 0.28200", "20, 2.5, 0.14492"
  })
  void slab_on_ground(double characteristic, double resistance, double u) {
    double side = 2 * characteristic;
    GroundFloor floor = new GroundFloor(side * side, 4 * side, 0.3, resistance, 2.0);
    assertThat(floor.characteristicM()).isCloseTo(characteristic, within(1e-12));
    assertThat(floor.transmittanceWPerM2K()).isCloseTo(u, within(5e-6));
  }

  @Test
  void a_floor_without_perimeter_is_refused() {
    assertThatThrownBy(() -> new GroundFloor(80, 0, 0.3, 1, 2))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
