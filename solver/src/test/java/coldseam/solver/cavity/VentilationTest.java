package coldseam.solver.cavity;

import static coldseam.solver.cavity.Ventilation.SLIGHTLY_VENTILATED;
import static coldseam.solver.cavity.Ventilation.UNVENTILATED;
import static coldseam.solver.cavity.Ventilation.WELL_VENTILATED;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class VentilationTest {
  /** ISO 10077-2: up to 2 mm, up to 10 mm, more. From memory. */
  @ParameterizedTest
  @CsvSource({
    "0, UNVENTILATED",
    "2, UNVENTILATED",
    "2.01, SLIGHTLY_VENTILATED",
    "10, SLIGHTLY_VENTILATED",
    "10.01, WELL_VENTILATED"
  })
  void cavitiesOfFramesByTheirSlit(double mm, Ventilation expected) {
    assertThat(Ventilation.ofSlit(mm / 1000)).isEqualTo(expected);
  }

  @Test
  void slitsOfDrawnLengthsAreNotJudgedByTheirRounding() {
    assertThat(Ventilation.ofSlit(0.110 - 0.100)).isEqualTo(SLIGHTLY_VENTILATED);
    assertThat(Ventilation.ofSlit(0.032 - 0.030)).isEqualTo(UNVENTILATED);
  }

  /** ISO 6946: up to 500 mm², less than 1500 mm², from 1500 mm² on. From memory. */
  @ParameterizedTest
  @CsvSource({
    "0, UNVENTILATED",
    "500, UNVENTILATED",
    "501, SLIGHTLY_VENTILATED",
    "1499, SLIGHTLY_VENTILATED",
    "1500, WELL_VENTILATED"
  })
  void airLayersByTheirOpenings(double mm2, Ventilation expected) {
    assertThat(Ventilation.ofOpenings(mm2 * 1e-6)).isEqualTo(expected);
  }

  /**
   * ISO 6946:2017: R_tot = (1500 − A)/1000 R_unvent + (A − 500)/1000 R_well. By hand: 800 mm², 3.0
   * and 2.0 give 0.7 · 3 + 0.3 · 2 = 2.7.
   */
  @Test
  void totalResistanceOfASlightlyVentilatedConstruction() {
    assertThat(Ventilation.totalResistance(3, 2, 800e-6)).isCloseTo(2.7, within(1e-12));
    assertThat(Ventilation.totalResistance(3, 2, 0)).isEqualTo(3);
    assertThat(Ventilation.totalResistance(3, 2, 500e-6)).isEqualTo(3);
    assertThat(Ventilation.totalResistance(3, 2, 1500e-6)).isEqualTo(2);
    assertThat(Ventilation.totalResistance(3, 2, 1)).isEqualTo(2);
    assertThat(SLIGHTLY_VENTILATED.words()).isEqualTo("slightly ventilated");
    assertThat(WELL_VENTILATED.words()).isEqualTo("well ventilated");
  }

  @Test
  void refusesNegativeOpenings() {
    assertThatThrownBy(() -> Ventilation.ofSlit(-1)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Ventilation.ofOpenings(Double.NaN))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
