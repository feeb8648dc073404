package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Framed walls as they are written, and the module that is cut out of them. */
class FramingReaderTest {
  private static final String WALL =
      Written.HEAD
          + """
          view: plan
          materials:
            wool: {conductivity: 0.035}
            timber: {conductivity: 0.13}
          spaces:
            indoors: {temperature: 20, exposure: inside}
            outdoors: {temperature: -5, exposure: outside}
          section:
            - {fill: indoors, box: [-1000, -200, 1000, 0]}
            - {fill: outdoors, box: [-1000, 140, 1000, 340]}
            - {fill: wool, box: [-1000, 0, 1000, 140]}
            - group:
                - {fill: timber, box: [-622.5, 0, -577.5, 140]}
              repeat: {times: 3, step: [600, 0]}
          """;

  @TempDir private Path folder;

  private Detail detail(String text) throws CaseException {
    return Written.read(folder, text).detail(Optional.empty());
  }

  private Result solved(String text) throws CaseException {
    return Solver.solve(detail(text), Accuracy.STANDARD, Progress.SILENT);
  }

  /** By hand: 45 of 600 mm timber between films of 0.13 and 0.04. */
  @Test
  void a_module_is_cut_out_of_a_longer_wall() throws CaseException {
    Detail detail =
        detail(WALL + "framing: {between: [indoors, outdoors], spacing: 600, layer: wool}\n");
    assertThat(detail.areas())
        .allMatch(
            a ->
                a.rings().stream()
                    .flatMap(r -> r.stream())
                    .allMatch(p -> Math.abs(p.x()) <= 0.3 + 1e-9));
    Result result = Solver.solve(detail, Accuracy.STANDARD, Progress.SILENT);
    assertThat(result.transmittances().get(0).widthM()).isCloseTo(0.6, offset(1e-9));
    Result.Framing framing = result.framings().get(0);
    double wool = 0.17 + 0.14 / 0.035;
    double timber = 0.17 + 0.14 / 0.13;
    assertThat(framing.parallelR()).isCloseTo(1 / (0.925 / wool + 0.075 / timber), offset(1e-9));
    assertThat(framing.framedShare()).isCloseTo(0.075, offset(1e-9));
    assertThat(framing.layerR().getAsDouble()).isCloseTo(4, offset(1e-9));
    assertThat(result.assumptions()).anyMatch(a -> a.what().equals("module of the framing"));
    assertThat(result.warnings()).isEmpty();
  }

  /** A module between two studs' middles is the same wall. */
  @Test
  void a_module_may_lie_elsewhere() throws CaseException {
    Result middle =
        solved(WALL + "framing: {between: [indoors, outdoors], spacing: 600, at: 600}\n");
    Result between =
        solved(WALL + "framing: {between: [indoors, outdoors], spacing: 600, at: 300}\n");
    assertThat(between.transmittances().get(0).valueWPerM2K().value())
        .isCloseTo(middle.transmittances().get(0).valueWPerM2K().value(), offset(5e-4));
    assertThat(between.framings().get(0).parallelR())
        .isCloseTo(middle.framings().get(0).parallelR(), offset(1e-9));
  }

  @Test
  void what_is_stated_of_a_framing() throws CaseException {
    Detail detail =
        detail(
            WALL
                + """
                framing:
                  of: roof
                  between: [indoors, outdoors]
                  layer: wool
                  fractions: {cavity: 75 %, studs: 21 %, headers: 4 %}
                  air-voids: 1
                  fasteners: {per-m2: 4, conductivity: 50, diameter: 5, insulation: 140, through: 70}
                  inverted-roof: {rain: 2}
                  tapered: {shape: thickest-at-apex, thickness: 70, conductivity: 0.035}
                """);
    Wanted.Framing framing =
        (Wanted.Framing)
            detail.wanted().stream()
                .filter(Wanted.Framing.class::isInstance)
                .findFirst()
                .orElseThrow();
    assertThat(framing.of()).isEqualTo("roof");
    assertThat(framing.fractions().orElseThrow().headers()).isCloseTo(0.04, offset(1e-12));
    Wanted.Framing.Corrections ask = framing.corrections().orElseThrow();
    assertThat(ask.fastenerM2()).isCloseTo(1.9635e-5, offset(1e-9));
    assertThat(ask.throughM()).isCloseTo(0.07, offset(1e-12));
    assertThat(ask.rainFactor()).isCloseTo(0.04, offset(1e-12));
    assertThat(ask.taperM2KPerW()).isCloseTo(2, offset(1e-9));
    assertThat(ask.taper()).contains(Wanted.Framing.Taper.THICKEST_AT_APEX);
  }

  @Test
  void what_is_wrong_with_a_framing() {
    assertThat(
            Written.problems(
                folder,
                WALL
                    + """
                    U: {of: wall, between: [indoors, outdoors], width: 600}
                    framing:
                      between: [indoors, outdoors]
                      spacing: 900
                      at: 900
                    """))
        .containsExactly(
            "20:3: the wall is not drawn over a whole module about x = 900; draw its layers over a"
                + " length of `spacing` at least, to either side of the stud");
    assertThat(
            Written.problems(
                folder,
                WALL
                    + """
                    U: {of: wall, between: [indoors, outdoors], width: 600}
                    framing: {between: [indoors, outdoors]}
                    """))
        .containsExactly(
            "18:1: there is a U of `wall` already; leave that one away, or call this one otherwise"
                + " by `of`");
    assertThat(
            Written.problems(
                folder,
                WALL
                    + """
                    framing:
                      between: [indoors, outdoors]
                      at: 0
                      fractions: {cavity: 75 %, studs: 20 %}
                      air-voids: 1.5
                    """))
        .containsExactly(
            "18:3: corrections count by the resistance of the insulation; add `layer: ` and the fill"
                + " that insulates",
            "19:3: `at` says where a module lies; add its `spacing: 600`",
            "20:14: the fractions add up to 95 %; they make up the whole wall, 100 %",
            "21:14: air voids have a level; give 0, 1 or 2");
  }
}
