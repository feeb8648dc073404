package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.Expectation.Quantity;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Results, accuracy, view and expectations as they reach the solver and {@code prove}. */
class ResultsAskedTest {
  @TempDir private Path folder;

  private Case read(String more) throws CaseException {
    return Written.read(folder, Written.WALL + more);
  }

  private Detail detail(String more) throws CaseException {
    return read(more).detail(Optional.empty());
  }

  @Test
  void psi_and_U() throws CaseException {
    List<Wanted> wanted =
        detail(
                """
                psi:
                  a: {between: [indoors, outdoors], dimensions: overall-internal, of: sill}
                  b: {between: [indoors, outdoors], dimensions: internal, b: {outdoors: 80 %}}
                U:
                  - {of: wall, between: [indoors, outdoors], width: 60 cm}
                  - {of: roof, between: [indoors, outdoors]}
                """)
            .wanted();
    Wanted.Psi a = (Wanted.Psi) wanted.get(0);
    assertThat(a.dimensions()).isEqualTo(DimensionSystem.OVERALL_INTERNAL);
    assertThat(a.of()).isEqualTo("sill");
    assertThat(a.warm()).containsExactly("indoors");
    assertThat(a.subtractions()).isEmpty();
    Wanted.Psi b = (Wanted.Psi) wanted.get(1);
    assertThat(b.dimensions()).isEqualTo(DimensionSystem.INTERNAL);
    assertThat(b.weights()).containsEntry("outdoors", 0.8);
    Wanted.Transmittance wall = (Wanted.Transmittance) wanted.get(2);
    assertThat(wall.widthM()).isEqualTo(OptionalDouble.of(0.6));
    assertThat(((Wanted.Transmittance) wanted.get(3)).widthM()).isEmpty();
  }

  @Test
  void points_and_profiles() throws CaseException {
    List<Wanted> wanted =
        detail(
                """
                points: {A: [0, 500], B: {at: [240, 500], films: surface}}
                profiles:
                  p: {from: [0, 0], to: [240, 0], points: 5, films: surface}
                  q: {from: [0, 0], to: [240, 0]}
                  r: {surface-of: indoors}
                """)
            .wanted();
    assertThat(wanted)
        .containsExactly(
            new Wanted.Temperature("A", new Point(0, 0.5), FilmSet.HEAT_LOSS),
            new Wanted.Temperature("B", new Point(0.24, 0.5), FilmSet.SURFACE),
            new Wanted.Profile("p", new Point(0, 0), new Point(0.24, 0), 5, FilmSet.SURFACE),
            new Wanted.Profile("q", new Point(0, 0), new Point(0.24, 0), 21, FilmSet.HEAT_LOSS),
            new Wanted.SurfaceProfile("r", "indoors", FilmSet.HEAT_LOSS));
  }

  @Test
  void accuracy() throws CaseException {
    assertThat(read("").accuracy()).isEqualTo(Accuracy.STANDARD);
    Accuracy share = read("accuracy: {L2D: 0.02 %, psi: 0.0002, U: 0.1 %}\n").accuracy();
    assertThat(share.couplingRelative()).isCloseTo(2e-4, within(1e-18));
    assertThat(share.couplingWPerMK()).isInfinite();
    assertThat(share.psiWPerMK()).isEqualTo(2e-4);
    assertThat(share.transmittanceRelative()).isCloseTo(1e-3, within(1e-18));
    Accuracy absolute = read("accuracy: {L2D: 0.005}\n").accuracy();
    assertThat(absolute.couplingRelative()).isInfinite();
    assertThat(absolute.couplingWPerMK()).isEqualTo(0.005);
    assertThat(absolute.psiWPerMK()).isEqualTo(Accuracy.STANDARD.psiWPerMK());
    for (String wrong : List.of("{L2D: 0}", "{psi: 5 %}", "{U: 0.1 W/(m2 K)}", "{L2D: -1 %}")) {
      assertThat(Written.problems(folder, Written.WALL + "accuracy: " + wrong + "\n")).hasSize(1);
    }
  }

  @Test
  void view() throws CaseException {
    assertThat(detail("").view()).isEqualTo(View.UPRIGHT);
    assertThat(detail("").assumptions()).anyMatch(a -> a.what().equals("view"));
    assertThat(detail("view: plan\n").view()).isEqualTo(View.PLAN);
    assertThat(detail("view: plan\n").assumptions()).noneMatch(a -> a.what().equals("view"));
    View turned = detail("up: [3, 4]\n").view();
    assertThat(turned.upX()).isCloseTo(0.6, within(1e-15));
    assertThat(turned.upY()).isCloseTo(0.8, within(1e-15));
  }

  @Test
  void expectations() throws CaseException {
    List<Expectation> expected =
        read("""
                U: {of: wall, between: [indoors, outdoors]}
                points: {A: [0, 500]}
                expect:
                  - {L2D: [indoors, outdoors], value: 1.2, within: 0.1 %, source: s, status: seen}
                  - {R: wall, value: 8.564 h ft2 F/Btu, within: 0.2 %, source: s, status: computed}
                  - {temperature: A, value: 50 F, within: 0.02 K, source: s, status: memory}
                  - {weight: [indoors, outdoors], value: 0.1, within: 1e-3, source: s, status: seen}
                """)
            .expectations();
    assertThat(expected.get(0).quantity()).isEqualTo(Quantity.L2D);
    assertThat(expected.get(0).subject()).containsExactly("indoors", "outdoors");
    assertThat(expected.get(0).within()).isCloseTo(0.0012, within(1e-15));
    // 8.564 h·ft²·°F/Btu = 1.50821 m²·K/W
    assertThat(expected.get(1).value()).isCloseTo(1.50821, within(5e-6));
    assertThat(expected.get(2).value()).isCloseTo(10, within(1e-12));
    assertThat(expected.get(2).within()).isEqualTo(0.02);
    assertThat(expected.get(3).quantity()).isEqualTo(Quantity.WEIGHT);
  }

  @Test
  void library_figures_are_assumptions_with_their_source() throws CaseException {
    assertThat(detail("  - {fill: softwood, box: [0, 0, 10, 10]}\n").assumptions())
        .anySatisfy(
            a -> {
              assertThat(a.what()).isEqualTo("conductivity of timber 500");
              assertThat(a.value()).isEqualTo("0.13 W/(m·K)");
              assertThat(a.source()).startsWith("library: ISO 10456:2007, table 3");
            });
  }
}
