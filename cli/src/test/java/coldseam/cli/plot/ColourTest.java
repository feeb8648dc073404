package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cli.plot.Plots.Kind;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Nothing is told by colour alone. */
class ColourTest {
  static Stream<Solved> cases() {
    return Solved.shipped().stream();
  }

  /** Lightness as CIE 1976 L*, 0 to 100, of a relative luminance. */
  private static double lightness(double luminance) {
    return luminance > 0.008856 ? 116 * Math.cbrt(luminance) - 16 : 903.3 * luminance;
  }

  @Test
  void both_scales_keep_their_order_in_grey() {
    for (int bands = 4; bands <= 17; bands++) {
      for (int k = 1; k < bands; k++) {
        double below = (k - 0.5) / bands;
        double above = (k + 0.5) / bands;
        double step = 0.45 * 60 / bands;
        assertThat(
                lightness(Palette.luminance(Palette.temperature(above)))
                    - lightness(Palette.luminance(Palette.temperature(below))))
            .as("temperature, band %d of %d", k, bands)
            .isGreaterThan(step);
        assertThat(
                lightness(Palette.luminance(Palette.flow(below)))
                    - lightness(Palette.luminance(Palette.flow(above))))
            .as("flow, band %d of %d", k, bands)
            .isGreaterThan(step);
      }
    }
  }

  @Test
  void ink_reads_on_paper() {
    double paper = Palette.luminance(Palette.PAPER) + 0.05;
    for (Colour ink :
        List.of(
            Palette.INK, Palette.SECOND_INK, Palette.INSIDE, Palette.OUTSIDE, Palette.REFERENCE)) {
      // WCAG 2.1, 1.4.3: contrast of text at least 4.5 to 1.
      assertThat(paper / (Palette.luminance(ink) + 0.05)).isGreaterThan(4.5);
    }
  }

  @Test
  void materials_of_a_kind_differ_in_their_hatch() {
    for (double lambda : new double[] {0.035, 0.2, 0.5, 2, 100}) {
      List<Fill> fills = new ArrayList<>();
      for (int i = 0; i < 9; i++) {
        fills.add(Material.of("stuff " + i, lambda));
      }
      Set<String> hatches = new HashSet<>();
      for (MaterialLook look : MaterialLook.of(fills)) {
        hatches.add(look.hatch() + " " + look.turn() + " " + look.pitch());
        assertThat(look.hatch()).isNotEqualTo(Hatch.NONE);
      }
      assertThat(hatches).as("λ = %s", lambda).hasSize(9);
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void bands_are_told_by_labelled_isotherms_as_well(Solved solved) {
    Read plot = Read.of(solved.svg(Kind.TEMPERATURE));
    int isotherms = plot.layers("temperature-whole-isotherm_.*").size();
    assertThat(isotherms).isBetween(5, 17);
    int labels = 0;
    for (String layer : List.of("whole", "zoom")) {
      for (var group : plot.layers("temperature-" + layer + "-isotherm-labels")) {
        labels += group.getElementsByTagNameNS(SvgCanvas.SVG, "text").getLength();
      }
    }
    assertThat(labels).isGreaterThanOrEqualTo(isotherms / 3);
  }
}
