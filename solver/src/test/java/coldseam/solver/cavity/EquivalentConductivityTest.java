package coldseam.solver.cavity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** ISO 10077-2, unventilated and slightly ventilated air cavities of frames. */
class EquivalentConductivityTest {
  /** Half a unit of the last digit given. */
  private static final double SIX_DIGITS = 0.5e-6;

  private static final double FIVE_DIGITS = 0.5e-5;

  private static double fixed(CavityBox box) {
    return EquivalentConductivity.fixed(box, Emissivities.ORDINARY, RadiationForm.PRODUCT)
        .conductivityWPerMK();
  }

  /**
   * The rectangular cavities of the frames of ISO 10077-2:2012, annex D, cases D.4, D.2 and D.7.
   * Values computed outside the project, in a few lines of Python, from C1 0.025, C3 1.57 and C4
   * 2.11 of the standard.
   */
  @ParameterizedTest
  @CsvSource({
    "54, 6, 0.205031",
    "34, 5, 0.130367",
    "18, 5, 0.071417",
    "6, 76, 0.049360",
    "22, 10, 0.091015",
    "26, 5, 0.100907",
    "19, 12, 0.081520",
    "30, 5, 0.115639",
    "8, 3, 0.044941"
  })
  void rectangularCavitiesOfTheFrameCases(double depthMm, double widthMm, double expected) {
    assertThat(fixed(new CavityBox(depthMm / 1000, widthMm / 1000)))
        .isCloseTo(expected, within(SIX_DIGITS));
  }

  /** Same cases, slightly ventilated: factor 2. Computed by hand. */
  @ParameterizedTest
  @CsvSource({"18, 5, 0.142834, 1e-6", "8, 3, 0.089882, 1e-6"})
  void slightlyVentilatedCavitiesCountTwice(double d, double b, double expected, double margin) {
    EquivalentConductivity still =
        EquivalentConductivity.fixed(
            new CavityBox(d / 1000, b / 1000), Emissivities.ORDINARY, RadiationForm.PRODUCT);
    EquivalentConductivity moving = still.slightlyVentilated();
    assertThat(moving.conductivityWPerMK()).isCloseTo(expected, within(margin));
    assertThat(moving.gasConductivityWPerMK()).isEqualTo(2 * still.gasConductivityWPerMK());
    assertThat(moving.ventilation()).isEqualTo(Ventilation.SLIGHTLY_VENTILATED);
  }

  /**
   * The non-rectangular cavities of cases D.2 and D.7: depth and width of the rectangle around,
   * area in mm², λ_eq computed by hand.
   */
  @ParameterizedTest
  @CsvSource({
    "27, 30, 589, 0.10636",
    "15, 13, 181, 0.06687",
    "77, 51, 1047, 0.17158",
    "31, 25, 580, 0.11866",
    "9, 10, 48, 0.04504",
    "19, 25, 367, 0.07894",
    "35, 15, 417, 0.12830",
    "37, 36, 661.5, 0.11830"
  })
  void otherCavitiesByTheRectangleOfEqualAreaAndAspect(
      double depthMm, double widthMm, double areaMm2, double expected) {
    CavityBox box = CavityBox.ofEqualArea(areaMm2 * 1e-6, depthMm / 1000, widthMm / 1000);
    assertThat(box.depthM() * box.widthM()).isCloseTo(areaMm2 * 1e-6, within(1e-15));
    assertThat(box.depthM() / box.widthM()).isCloseTo(depthMm / widthMm, within(1e-12));
    assertThat(fixed(box)).isCloseTo(expected, within(FIVE_DIGITS));
  }

  /** 34 x 5 mm as a drawing gives it, 105 - 100 and so on: exactly 5 mm is not below 5 mm. */
  @Test
  void fiveMillimetresExactlyIsNotBelowFive() {
    double width = 0.105 - 0.100;
    assertThat(width).isLessThan(0.005); // the rounding this test is about
    assertThat(fixed(new CavityBox(0.034, width))).isCloseTo(0.130367, within(SIX_DIGITS));
    // Conduction only, 0.025 + d h_r, computed by hand.
    double radiation = 0.034 * 2.11 * (1 + Math.hypot(1, 34 / 4.99) - 34 / 4.99);
    assertThat(fixed(new CavityBox(0.034, 0.00499))).isCloseTo(0.025 + radiation, within(1e-12));
  }

  /** 20 x 20 mm, ε 0.9, 283 K: h_r 3.14 in series against 2.97 as a product. Computed by hand. */
  @Test
  void editionsDifferInTheRadiationForm() {
    CavityBox square = new CavityBox(0.02, 0.02);
    assertThat(
            EquivalentConductivity.at(square, Emissivities.ORDINARY, RadiationForm.SERIES, 10, 283)
                .radiationWPerM2K())
        .isCloseTo(3.14, within(0.005));
    assertThat(
            EquivalentConductivity.at(square, Emissivities.ORDINARY, RadiationForm.PRODUCT, 10, 283)
                .radiationWPerM2K())
        .isCloseTo(2.97, within(0.005));
    assertThat(
            EquivalentConductivity.fixed(square, Emissivities.ORDINARY, RadiationForm.SERIES)
                .radiationWPerM2K())
        .isCloseTo(3.14, within(0.005));
  }

  /** C3 = C2 10^(1/3) = 1.5727 and C4 = 2 sigma 283.15³ E = 2.106 before rounding; by hand. */
  @Test
  void fixedFormIsTheTemperatureFormAtTenKelvin() {
    EquivalentConductivity at =
        EquivalentConductivity.at(
            new CavityBox(0.02, 0.02), Emissivities.ORDINARY, RadiationForm.PRODUCT, 10, 283.15);
    assertThat(at.convectionWPerM2K()).isCloseTo(1.5727, within(0.00005));
    assertThat(at.radiationWPerM2K() / Math.sqrt(2)).isCloseTo(2.106, within(0.0005));
  }

  /** h_a = max(C1/d, C2 ΔT^(1/3)): 8 K over 50 mm gives 0.73 · 2; over 10 mm 0.025/0.01 = 2.5. */
  @Test
  void convectionByTemperatureDifference() {
    Emissivities shiny = new Emissivities(0, 0.9);
    assertThat(
            EquivalentConductivity.at(
                    new CavityBox(0.05, 0.05), shiny, RadiationForm.PRODUCT, 8, 283)
                .conductivityWPerMK())
        .isCloseTo(0.05 * 1.46, within(1e-12));
    assertThat(
            EquivalentConductivity.at(
                    new CavityBox(0.01, 0.05), shiny, RadiationForm.SERIES, 8, 283)
                .conductivityWPerMK())
        .isCloseTo(0.025, within(1e-12));
  }

  /** Both forms between wide parallel faces are 4 σ T³ E (textbook, endless parallel planes). */
  @Test
  void wideCavitiesOfBothFormsAreParallelPlanes() {
    Random random = new Random(11);
    for (int i = 0; i < 200; i++) {
      Emissivities faces =
          new Emissivities(0.02 + 0.98 * random.nextDouble(), 0.02 + 0.98 * random.nextDouble());
      double expected = 4 * 5.67e-8 * Math.pow(283, 3) * faces.exchange();
      for (RadiationForm form : RadiationForm.values()) {
        double coefficient =
            EquivalentConductivity.at(new CavityBox(1e-6, 1), faces, form, 10, 283)
                .radiationWPerM2K();
        assertThat(coefficient).isCloseTo(expected, within(2e-6 * expected));
      }
    }
  }

  @Test
  void refusesWhatIsNoCavity() {
    assertThatThrownBy(() -> new CavityBox(0, 1)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> CavityBox.ofEqualArea(1.1, 1, 1))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> new Emissivities(0.9, 1.1))
        .isInstanceOf(IllegalArgumentException.class);
    CavityBox box = new CavityBox(1, 1);
    assertThatThrownBy(
            () ->
                EquivalentConductivity.at(
                    box, Emissivities.ORDINARY, RadiationForm.SERIES, -1, 283))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(
            () ->
                new EquivalentConductivity(
                    box, RadiationForm.SERIES, 1, 1, Ventilation.WELL_VENTILATED))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
