package coldseam.solver.window;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.window.WindowTransmittance.Kind;
import coldseam.solver.window.WindowTransmittance.Term;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** ISO 10077-1. */
class WindowTest {
  private static Quantity typed(double value) {
    return new Quantity(value, new Certificate.Certified(value, value));
  }

  private static Profile profile(String name, double width, double u, double psi) {
    return new Profile(name, width, width, typed(u), Optional.of(typed(psi)), Map.of());
  }

  private static final Infill DOUBLE = new Infill("double", false, typed(1.1));
  private static final Profile SASH = profile("sash", 0.11, 1.36, 0.08);

  private static Window plain(double width, double height, Sides<Profile> frame) {
    return new Window(
        width,
        height,
        frame,
        List.of(),
        List.of(),
        List.of(List.of(DOUBLE)),
        List.of(),
        Optional.empty());
  }

  private static double amount(WindowTransmittance result, Kind kind, String name) {
    for (Term term : result.terms()) {
      if (term.kind() == kind && term.name().equals(name)) {
        return term.amount();
      }
    }
    throw new AssertionError("no " + kind + " " + name);
  }

  /**
   * 1.23 x 1.48 m, b_f 0.11 all round, U_f 1.36, U_g 1.1, ψ_g 0.08: A_g 1.2726, A_f 0.5478, l_g
   * 4.54, U_w 1.377757. Computed by hand.
   */
  @Test
  void oneProfileAllRound() {
    WindowTransmittance result = plain(1.23, 1.48, Sides.all(SASH)).transmittance();
    assertThat(amount(result, Kind.GLAZING, "double")).isCloseTo(1.2726, within(1e-12));
    assertThat(amount(result, Kind.FRAME, "sash")).isCloseTo(0.5478, within(1e-12));
    assertThat(amount(result, Kind.EDGE, "sash with double")).isCloseTo(4.54, within(1e-12));
    assertThat(result.uWPerM2K().value()).isCloseTo(1.377757, within(0.5e-6));
    assertThat(result.uWPerM2K().certified()).isTrue();
    assertThat(result.uWPerM2K().halfWidth()).isLessThan(1e-15);
    assertThat(result.installedWPerM2K()).isEmpty();
  }

  /**
   * Four profiles, 1 x 2 m: widths 0.1 top, 0.2 bottom, 0.05 left, 0.15 right. By hand: A_g = 0.8 ·
   * 1.7 = 1.36; mitred A_f 0.1 · 0.9, 0.2 · 0.9, 0.05 · 1.85, 0.15 · 1.85 = 0.09, 0.18, 0.0925,
   * 0.2775, together 0.64.
   */
  @Test
  void fourProfilesMeetInMitres() {
    Sides<Profile> four =
        new Sides<>(
            profile("head", 0.1, 1, 0.01),
            profile("sill", 0.2, 2, 0.02),
            profile("left", 0.05, 3, 0.03),
            profile("right", 0.15, 4, 0.04));
    WindowTransmittance result = plain(1, 2, four).transmittance();
    assertThat(amount(result, Kind.FRAME, "head")).isCloseTo(0.09, within(1e-12));
    assertThat(amount(result, Kind.FRAME, "sill")).isCloseTo(0.18, within(1e-12));
    assertThat(amount(result, Kind.FRAME, "left")).isCloseTo(0.0925, within(1e-12));
    assertThat(amount(result, Kind.FRAME, "right")).isCloseTo(0.2775, within(1e-12));
    assertThat(amount(result, Kind.GLAZING, "double")).isCloseTo(1.36, within(1e-12));
    // 1.36·1.1 + 0.09 + 0.36 + 0.2775 + 1.11 + 0.8·0.03 + 1.7·0.07, over 2.
    assertThat(result.uWPerM2K().value())
        .isCloseTo((1.496 + 1.8375 + 0.024 + 0.119) / 2, within(1e-12));
  }

  /** Wider inside than outside: areas by the wider side, perimeter by the narrower. By hand. */
  @Test
  void glassIsTheSmallerAndPerimeterTheLargerOfTwoSides() {
    Profile uneven = new Profile("uneven", 0.10, 0.08, typed(1), Optional.of(typed(0)), Map.of());
    WindowTransmittance result = plain(1, 1, Sides.all(uneven)).transmittance();
    assertThat(amount(result, Kind.GLAZING, "double")).isCloseTo(0.64, within(1e-12));
    assertThat(amount(result, Kind.FRAME, "uneven")).isCloseTo(0.36, within(1e-12));
    assertThat(amount(result, Kind.EDGE, "uneven with double")).isCloseTo(4 * 0.84, within(1e-12));
  }

  /** Two by two panes with a mullion and a transom, one a panel; bars; installed. By hand. */
  @Test
  void panesBarsAndInstallation() {
    Infill panel = new Infill("panel", true, typed(0.5));
    Profile post = profile("post", 0.1, 1.5, 0.05);
    Profile sash =
        new Profile(
            "sash", 0.1, 0.1, typed(1), Optional.of(typed(0.08)), Map.of("panel", typed(0.02)));
    Window window =
        new Window(
            2,
            2,
            Sides.all(sash),
            List.of(new Divider(post, 0.75)),
            List.of(new Divider(post, 1.45)),
            List.of(List.of(DOUBLE, DOUBLE), List.of(panel, DOUBLE)),
            List.of(
                new Bars("inlaid", typed(0.01), OptionalDouble.empty(), 1, 2),
                new Bars("stuck on", typed(0.02), OptionalDouble.of(3), 0, 0)),
            Optional.of(new Sides<>(typed(0.01), typed(0.02), typed(0.03), typed(-0.04))));
    WindowTransmittance result = window.transmittance();
    // Columns 0.1-0.7 and 0.8-1.9, rows 0.1-1.4 and 1.5-1.9.
    assertThat(amount(result, Kind.GLAZING, "double"))
        .isCloseTo(0.6 * 1.3 + 1.1 * 1.3 + 1.1 * 0.4, within(1e-12));
    assertThat(amount(result, Kind.PANEL, "panel")).isCloseTo(0.6 * 0.4, within(1e-12));
    assertThat(amount(result, Kind.FRAME, "post"))
        .isCloseTo(0.1 * 1.8 + 0.1 * (0.6 + 1.1), within(1e-12));
    assertThat(amount(result, Kind.FRAME, "sash")).isCloseTo(4 - 1.8 * 1.8, within(1e-12));
    double areas = 0;
    for (Term term : result.terms()) {
      areas += term.area() ? term.amount() : 0;
    }
    assertThat(areas).isCloseTo(4, within(1e-12));
    assertThat(amount(result, Kind.EDGE, "sash with panel")).isCloseTo(1.0, within(1e-12));
    assertThat(amount(result, Kind.EDGE, "post with panel")).isCloseTo(1.0, within(1e-12));
    // Sash with glass: left 1.3, top 0.6 + 1.1, right 1.3 + 0.4, bottom 1.1.
    assertThat(amount(result, Kind.EDGE, "sash with double")).isCloseTo(5.8, within(1e-12));
    // Bars of the three glazed panes: 1 · height + 2 · width.
    assertThat(amount(result, Kind.BARS, "inlaid"))
        .isCloseTo(1.3 + 1.2 + 1.3 + 2.2 + 0.4 + 2.2, within(1e-12));
    assertThat(amount(result, Kind.BARS, "stuck on")).isEqualTo(3);
    assertThat(result.installedWPerM2K().orElseThrow().value() - result.uWPerM2K().value())
        .isCloseTo((2 * 0.03 - 2 * 0.01) / 4, within(1e-12));
  }

  /** Ends are added to ends; one figure that is not proved makes the sum an estimate. */
  @Test
  void intervalsAreCarried() {
    Quantity uf = new Quantity(1.4, new Certificate.Certified(1.3, 1.5));
    Profile known = new Profile("sash", 0.11, 0.11, uf, Optional.of(typed(0.08)), Map.of());
    Quantity u = plain(1.23, 1.48, Sides.all(known)).transmittance().uWPerM2K();
    assertThat(u.certified()).isTrue();
    assertThat(u.halfWidth()).isCloseTo(0.1 * 0.5478 / 1.8204, within(1e-12));
    Quantity guess = new Quantity(0.08, new Certificate.NotCertified("for a test", 0.01));
    Profile guessed = new Profile("sash", 0.11, 0.11, uf, Optional.of(guess), Map.of());
    Quantity estimate = plain(1.23, 1.48, Sides.all(guessed)).transmittance().uWPerM2K();
    assertThat(estimate.certified()).isFalse();
    assertThat(estimate.halfWidth())
        .isCloseTo((0.1 * 0.5478 + 0.01 * 4.54) / 1.8204, within(1e-12));
  }

  @Test
  void refusesWhatIsNoWindow() {
    assertThatThrownBy(() -> plain(0.2, 1, Sides.all(SASH)).transmittance())
        .hasMessageContaining("no glass in column 1");
    assertThatThrownBy(() -> plain(1, 0.22, Sides.all(SASH)).transmittance())
        .hasMessageContaining("no glass in row 1");
    assertThatThrownBy(() -> plain(0, 1, Sides.all(SASH)).transmittance())
        .isInstanceOf(IllegalArgumentException.class);
    Profile bare =
        new Profile("bare", 0.1, 0.1, typed(1), Optional.empty(), Map.of("other", typed(0)));
    assertThatThrownBy(() -> plain(1, 1, Sides.all(bare)).transmittance())
        .hasMessageContaining("no ψ of its edge with `double`");
    Window twoRows =
        new Window(
            1,
            1,
            Sides.all(SASH),
            List.of(),
            List.of(),
            List.of(List.of(DOUBLE), List.of(DOUBLE)),
            List.of(),
            Optional.empty());
    assertThatThrownBy(twoRows::transmittance).hasMessageContaining("1 x 1 panes");
  }
}
