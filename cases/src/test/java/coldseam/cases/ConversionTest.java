package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.Area;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Material;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code at} of a material: ISO 10456:2007, clause 7. */
class ConversionTest {
  @TempDir private Path folder;

  private Detail detail(String material) throws CaseException {
    return Written.read(folder, wall(material)).detail(Optional.empty());
  }

  private static String wall(String material) {
    return Written.WALL.replace("masonry: {conductivity: 0.5}", "masonry: " + material);
  }

  private static Material laid(Detail detail) {
    for (Area area : detail.areas()) {
      if (area.fill() instanceof Material material) {
        return material;
      }
    }
    throw new AssertionError("no material laid");
  }

  private static Assumption converted(Detail detail) {
    for (Assumption assumption : detail.assumptions()) {
      if (assumption.what().contains(" at ")) {
        return assumption;
      }
    }
    throw new AssertionError("the conversion is not listed");
  }

  /** Mineral wool 0.035, f_T 0.0046, 10 to 20 °C: 0.036648. By hand. */
  @Test
  void coefficientOfTheLibrary() throws CaseException {
    Detail detail = detail("{from: mineral wool, at: {temperature: 20}}");
    assertThat(laid(detail).conductivityWPerMK()).isCloseTo(0.036648, within(0.5e-6));
    Assumption assumption = converted(detail);
    assertThat(assumption.what()).isEqualTo("conductivity of masonry at 20 °C");
    assertThat(assumption.value())
        .isEqualTo("0.0366476 W/(m·K) = 0.035 W/(m·K) times F_T = 1.0471 from 10 °C");
    assertThat(assumption.source())
        .isEqualTo("ISO 10456:2007, 7.2; coefficient of the library, from memory");
    assertThat(laid(detail).source()).contains("converted by ISO 10456:2007 to 20 °C");
  }

  /** EPS 0.035 with 0.02 m³/m³ more: 0.037915. By hand. */
  @Test
  void moistureByVolume() throws CaseException {
    Detail detail =
        detail("{from: EPS, at: {moisture-by-volume: 3 %, stated-at: {moisture-by-volume: 0.01}}}");
    assertThat(laid(detail).conductivityWPerMK()).isCloseTo(0.037915, within(0.5e-6));
    assertThat(converted(detail).what())
        .isEqualTo("conductivity of masonry at 0.03 m³/m³ of moisture");
  }

  /** Both factors, typed: 0.2 e^(0.003 · 10) e^(4 · 0.05) = 0.2 e^0.23 = 0.2517200. By hand. */
  @Test
  void bothFactorsOfAnOrthotropicMaterial() throws CaseException {
    Detail detail =
        detail(
            "{conductivity: [0.2, 0.1], at: {temperature: 68 F, moisture-by-mass: 5 %,"
                + " coefficients: {temperature: 0.003, moisture-by-mass: 4}}}");
    assertThat(laid(detail).conductivityWPerMK()).isCloseTo(0.2517200, within(0.5e-7));
    assertThat(laid(detail).crossConductivityWPerMK()).isCloseTo(0.1258600, within(0.5e-7));
    assertThat(converted(detail).source())
        .isEqualTo("ISO 10456:2007, 7.2 and 7.3; coefficient stated in the case");
  }

  @Test
  void aVariantMayUndoIt() throws CaseException {
    Case read =
        Written.read(
            folder,
            wall("{from: mineral wool, at: {temperature: 20}}")
                + "variants:\n  declared: {materials: {masonry: mineral wool}}\n");
    Detail declared = read.detail(Optional.of("declared"));
    assertThat(laid(declared).conductivityWPerMK()).isEqualTo(0.035);
    assertThat(declared.assumptions()).noneMatch(a -> a.what().contains(" at "));
  }

  @Test
  void whatIsNotKnownIsAskedFor() {
    assertThat(problem("{from: EPS, at: {temperature: 20}}"))
        .isEqualTo(
            "4:29: `at` of material `masonry` needs the coefficient of ISO 10456 for"
                + " `temperature`; add `coefficients: {temperature: …}`, per K");
    // f_T belongs to the conductivity of the library.
    assertThat(problem("{from: mineral wool, conductivity: 0.04, at: {temperature: 20}}"))
        .contains("needs the coefficient of ISO 10456 for `temperature`");
    assertThat(problem("{from: EPS, at: {moisture-by-mass: 0.02}}"))
        .contains("needs the coefficient of ISO 10456 for `moisture-by-mass`", "per kg/kg");
  }

  @Test
  void slipsAreReportedInTheirPlace() {
    assertThat(problem("{from: EPS, at: {}}"))
        .isEqualTo(
            "4:28: `at` of material `masonry` says nothing; give `temperature`, or moisture");
    assertThat(problem("{from: EPS, at: {moisture-by-volume: 1 %, moisture-by-mass: 1 %}}"))
        .contains("has both `moisture-by-volume` and `moisture-by-mass`");
    assertThat(problem("{from: EPS, at: {moisture-by-volume: 120 %}}")).contains("out of range");
    assertThat(problem("{from: EPS, at: {moisture-by-volume: 1 %, stated-at: {temperature: 10}}}"))
        .isEqualTo(
            "4:66: `stated-at` has `temperature`, which `at` does not convert to;"
                + " give `at` a `temperature` too, or leave it away");
    assertThat(problem("{from: EPS, at: {temprature: 20}}"))
        .contains("has no key `temprature`; did you mean `temperature`?");
    assertThat(
            problem("{conductivity: 1, at: {temperature: 500, coefficients: {temperature: 0.1}}}"))
        .contains("changes the conductivity by a factor of");
  }

  private String problem(String material) {
    List<String> problems = Written.problems(folder, wall(material));
    assertThat(problems).hasSize(1);
    return problems.get(0);
  }
}
