package coldseam.solver.cavity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** ISO 6946, annex D: unventilated air layers, small or divided voids, ventilated layers. */
class AirLayerTest {
  private static double resistance(double mm, LayerFlow flow, Emissivities faces) {
    return AirLayer.of(mm / 1000, flow, faces).resistanceM2KPerW();
  }

  /** Formula at 10 °C, ε 0.9; to four digits, computed by hand. */
  @ParameterizedTest
  @CsvSource({
    "5, 0.1085, 0.1085, 0.1085",
    "7, 0.1285, 0.1285, 0.1285",
    "10, 0.1490, 0.1490, 0.1490",
    "15, 0.1623, 0.1701, 0.1701",
    "25, 0.1623, 0.1831, 0.1918",
    "50, 0.1623, 0.1831, 0.2122",
    "100, 0.1623, 0.1831, 0.2201",
    "300, 0.1623, 0.1831, 0.2264"
  })
  void layersOfHighEmissivity(double mm, double up, double horizontal, double down) {
    assertThat(resistance(mm, LayerFlow.UP, Emissivities.ORDINARY)).isCloseTo(up, within(0.5e-4));
    assertThat(resistance(mm, LayerFlow.HORIZONTAL, Emissivities.ORDINARY))
        .isCloseTo(horizontal, within(0.5e-4));
    assertThat(resistance(mm, LayerFlow.DOWN, Emissivities.ORDINARY))
        .isCloseTo(down, within(0.5e-4));
  }

  /**
   * ISO 6946, table 8, from memory; the plateaus 0.16 and 0.18 are also seen quoted from the 2007
   * edition. The formula rounds to every entry.
   */
  @ParameterizedTest
  @CsvSource({
    "0, 0.00, 0.00, 0.00",
    "5, 0.11, 0.11, 0.11",
    "7, 0.13, 0.13, 0.13",
    "10, 0.15, 0.15, 0.15",
    "15, 0.16, 0.17, 0.17",
    "25, 0.16, 0.18, 0.19",
    "50, 0.16, 0.18, 0.21",
    "100, 0.16, 0.18, 0.22",
    "300, 0.16, 0.18, 0.23"
  })
  void tableAndFormulaAgree(double mm, double up, double horizontal, double down) {
    LayerFlow[] flows = {LayerFlow.UP, LayerFlow.HORIZONTAL, LayerFlow.DOWN};
    double[] expected = {up, horizontal, down};
    for (int i = 0; i < flows.length; i++) {
      assertThat(AirLayer.tabulatedM2KPerW(mm / 1000, flows[i]))
          .isCloseTo(expected[i], within(1e-12));
      double exact = resistance(mm, flows[i], Emissivities.ORDINARY);
      assertThat(Math.round(exact * 100) / 100.0).isEqualTo(expected[i]);
    }
  }

  /** Between thicknesses of table 8 linear (ISO 6946): 75 mm down (0.21 + 0.22)/2, by hand. */
  @Test
  void tableIsLinearBetweenItsThicknesses() {
    assertThat(AirLayer.tabulatedM2KPerW(0.075, LayerFlow.DOWN)).isCloseTo(0.215, within(1e-12));
    assertThat(AirLayer.tabulatedM2KPerW(0.0025, LayerFlow.UP)).isCloseTo(0.055, within(1e-12));
    assertThat(AirLayer.tabulatedM2KPerW(0.1, LayerFlow.inclined(45)))
        .isCloseTo(0.17, within(1e-12));
  }

  /** One face of low emissivity, the other 0.9; up, horizontal, down. Computed by hand. */
  @ParameterizedTest
  @CsvSource({
    "25, 0.2, 0.338, 0.443, 0.498",
    "25, 0.05, 0.453, 0.664, 0.796",
    "50, 0.05, 0.453, 0.664, 1.323"
  })
  void layersWithAFaceOfLowEmissivity(
      double mm, double emissivity, double up, double horizontal, double down) {
    Emissivities faces = new Emissivities(emissivity, 0.9);
    assertThat(resistance(mm, LayerFlow.UP, faces)).isCloseTo(up, within(0.5e-3));
    assertThat(resistance(mm, LayerFlow.HORIZONTAL, faces)).isCloseTo(horizontal, within(0.5e-3));
    assertThat(resistance(mm, LayerFlow.DOWN, faces)).isCloseTo(down, within(0.5e-3));
  }

  /** Black-body coefficient 4 σ T³ of ISO 6946, annex C. Computed by hand. */
  @ParameterizedTest
  @CsvSource({"-10, 4.133", "0, 4.622", "10, 5.149", "20, 5.714", "30, 6.319"})
  void blackBodyCoefficient(double celsius, double expected) {
    assertThat(EquivalentConductivity.radiation(273.15 + celsius))
        .isCloseTo(expected, within(0.5e-3));
  }

  /** Small or divided voids with horizontal heat flow at 10 °C, ε 0.9. Computed by hand. */
  @ParameterizedTest
  @CsvSource({"20, 20, 0.22747, 0.23648", "50, 20, 0.25247, 0.26582", "20, 100, 0.19429, 0.19673"})
  void smallOrDividedVoidsInBothEditions(double d, double b, double in2017, double in2007) {
    AirLayer layer = AirLayer.of(d / 1000, LayerFlow.HORIZONTAL, Emissivities.ORDINARY);
    assertThat(layer.dividedResistanceM2KPerW(b / 1000, RadiationForm.SERIES))
        .isCloseTo(in2017, within(0.5e-5));
    assertThat(layer.dividedResistanceM2KPerW(b / 1000, RadiationForm.PRODUCT))
        .isCloseTo(in2007, within(0.5e-5));
    assertThat(layer.dividedAt(b / 1000)).isTrue();
  }

  @Test
  void aLayerIsAtLeastTenTimesAsWideAsThick() {
    AirLayer layer = AirLayer.of(0.02, LayerFlow.HORIZONTAL, Emissivities.ORDINARY);
    assertThat(layer.dividedAt(0.2)).isFalse();
    assertThat(layer.dividedAt(0.5 - 0.3)).isFalse(); // 0.2 less a rounding
    assertThat(layer.dividedAt(0.1999)).isTrue();
    // Both forms go over into the layer's as the void gets wide.
    for (RadiationForm form : RadiationForm.values()) {
      assertThat(layer.dividedResistanceM2KPerW(2e6, form))
          .isCloseTo(layer.resistanceM2KPerW(), within(1e-8));
    }
  }

  /** Above 5 K: 0.73 ΔT^(1/3) horizontal, 1.14 ΔT^(1/3) up (ISO 6946, annex D). By hand, 8 K. */
  @Test
  void largerTemperatureDifferencesMoveMoreAir() {
    Emissivities faces = Emissivities.ORDINARY;
    assertThat(new AirLayer(0.1, LayerFlow.HORIZONTAL, faces, 8, 10).convectionWPerM2K())
        .isCloseTo(1.46, within(1e-12));
    assertThat(new AirLayer(0.1, LayerFlow.UP, faces, 8, 10).convectionWPerM2K())
        .isCloseTo(2.28, within(1e-12));
    // 0.09 · 8^0.187 · 0.1^-0.44, from memory of the standard, evaluated by hand:
    // exp(0.187 · 2.0794415) = 1.4752915, exp(0.44 · 2.3025851) = 2.7542287.
    assertThat(new AirLayer(0.1, LayerFlow.DOWN, faces, 8, 10).convectionWPerM2K())
        .isCloseTo(0.09 * 1.4752915 * 2.7542287, within(1e-6));
    assertThat(new AirLayer(0.1, LayerFlow.UP, faces, 5, 10).convectionWPerM2K()).isEqualTo(1.95);
  }

  /** ISO 6946, annex D: h_a between the horizontal and the vertical layer, linear in the angle. */
  @Test
  void inclinedLayersLieBetweenUpwardAndHorizontal() {
    Emissivities faces = Emissivities.ORDINARY;
    assertThat(AirLayer.of(0.1, LayerFlow.inclined(0), faces).convectionWPerM2K())
        .isCloseTo(1.95, within(1e-12));
    assertThat(AirLayer.of(0.1, LayerFlow.inclined(90), faces).convectionWPerM2K())
        .isCloseTo(1.25, within(1e-12));
    assertThat(AirLayer.of(0.1, LayerFlow.inclined(45), faces).convectionWPerM2K())
        .isCloseTo(1.60, within(1e-12));
    assertThat(resistance(0, LayerFlow.inclined(45), faces)).isZero();
  }

  @Test
  void refusesWhatTheStandardDoesNotCover() {
    assertThatThrownBy(() -> resistance(301, LayerFlow.UP, Emissivities.ORDINARY))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> LayerFlow.inclined(91)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> new AirLayer(0.1, LayerFlow.UP, Emissivities.ORDINARY, Double.NaN, 10))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
