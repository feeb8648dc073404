package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.CornerRule;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Frames and glazings as they are written. */
class FrameReaderTest {
  private static final String FRAME =
      Written.HEAD
          + """
          materials:
            wood: {conductivity: 0.13}
            glass: {conductivity: 1.0}
          spaces:
            indoors: {temperature: 20, exposure: inside}
            outdoors: {temperature: 0, exposure: outside}
          section:
            - {fill: indoors, box: [0, 18, 300, 120]}
            - {fill: outdoors, box: [0, -40, 300, 18]}
            - {fill: wood, box: [0, 0, 100, 80]}
          """;

  private static final String GLAZING =
      """
        - stack: {face: [[90, 46], [300, 46]], towards: down}
          layers: [[glass, 4], [gap, 20], [glass, 4]]
          glazing: {U: 1/(0.17 + 0.008 + 0.02/0.034), spacer: {height: 6, conductivity: 0.5}, sealant: {height: 3, conductivity: 0.4}}
      frame: {between: [indoors, outdoors]}
      """;

  @TempDir private Path folder;

  private Detail detail(String text) throws CaseException {
    return Written.read(folder, text).detail(Optional.empty());
  }

  private static Area named(Detail detail, String end) {
    return detail.areas().stream().filter(a -> a.name().endsWith(end)).findFirst().orElseThrow();
  }

  /** *Computed*: 0.02 m / (1/U − 0.17 − 2·0.004/1.0) with U = 1/(0.178 + 0.02/0.034). */
  @Test
  void the_gap_conducts_what_gives_the_glazing_its_U() throws CaseException {
    Detail detail = detail(FRAME + GLAZING);
    Material gas = (Material) named(detail, "(gas of glazing)").fill();
    assertThat(gas.conductivityWPerMK()).isCloseTo(0.034, offset(1e-12));
    assertThat(detail.assumptions())
        .anyMatch(a -> a.what().contains("gas of glazing") && a.value().startsWith("0.034 W/"));
    assertThat(detail.areas())
        .filteredOn(a -> a.role() == Area.Role.GLAZING)
        .hasSize(5)
        .allMatch(Area::glazing);
    assertThat(named(detail, "sealant (sealant of glazing)").rings().get(0))
        .extracting(p -> Math.round(p.x() * 1e6) / 1e3)
        .containsExactlyInAnyOrder(90.0, 93.0, 93.0, 90.0);
    assertThat(named(detail, "spacer (spacer of glazing)").rings().get(0))
        .extracting(p -> Math.round(p.y() * 1e6) / 1e3)
        .containsExactlyInAnyOrder(42.0, 42.0, 22.0, 22.0);
  }

  /** *Computed*: λ = 2 s / (1/U − 0.17 − panes), s = 12 mm, three panes of 4 mm. */
  @Test
  void two_gaps_share_what_is_left() throws CaseException {
    Detail detail =
        detail(
            FRAME
                + """
                  - stack: {face: [[90, 46], [300, 46]], towards: down}
                    layers: [[glass, 4], [gap, 12], [glass, 4], [gap, 12], [glass, 4]]
                    glazing: {U: 0.7, spacer: {height: 6, conductivity: 0.5}}
                """);
    Material gas = (Material) named(detail, "(gas of glazing)").fill();
    assertThat(gas.conductivityWPerMK())
        .isCloseTo(2 * 0.012 / (1 / 0.7 - 0.17 - 0.012), offset(1e-12));
    assertThat(detail.areas()).filteredOn(a -> a.role() == Area.Role.GLAZING).hasSize(7);
  }

  /** U of the glazing as solved is the U typed, and U_f·b_f, U_g·b_g and ψ_g add up to L2D. */
  @Test
  void a_typed_U_comes_back() throws CaseException {
    Result result = Solver.solve(detail(FRAME + GLAZING), Accuracy.STANDARD, Progress.SILENT);
    Result.LinearTransmittance edge = result.psi().get(0);
    double sum = edge.valueWPerMK().value();
    for (Result.Subtracted term : edge.subtracted()) {
      sum += term.uWPerM2K().orElseThrow().mid() * term.lengthM().getAsDouble();
    }
    assertThat(edge.subtracted().get(1).uWPerM2K().orElseThrow().mid())
        .isCloseTo(1 / (0.178 + 0.02 / 0.034), offset(1e-9));
    assertThat(edge.subtracted().get(1).lengthM().getAsDouble()).isCloseTo(0.2, offset(1e-9));
    assertThat(sum).isCloseTo(result.couplings().get(0).valueWPerMK().value(), offset(1e-6));
    assertThat(edge.valueWPerMK().value()).isBetween(0.02, 0.12);
  }

  @Test
  void what_is_stated_of_a_frame() throws CaseException {
    Detail detail =
        detail(
            FRAME
                + """
                  - {fill: wood, box: [90, 18, 300, 46], part: panel}
                frame:
                  between: [indoors, outdoors]
                  panel: {conductivity: 0.04}
                  width: 110
                  visible: [190, 20 cm]
                  corners: whole
                """);
    assertThat(detail.wanted())
        .containsExactly(
            new Wanted.Frame(
                List.of("indoors"),
                List.of("outdoors"),
                0.04,
                OptionalDouble.of(0.11),
                List.of(0.19, 0.2),
                CornerRule.WHOLE,
                Optional.empty()));
    assertThat(named(detail, "[4] (wood)").role()).isEqualTo(Area.Role.PANEL);
  }

  @Test
  void what_is_wrong_with_a_frame() {
    assertThat(
            Written.problems(
                folder,
                FRAME
                    + """
                      - {fill: glass, box: [90, 18, 300, 46], part: pane}
                    U: {of: frame, between: [indoors, outdoors]}
                    frame: {panel: {conductivity: 0}, width: 0, visible: [], corners: some}
                    """))
        .containsExactly(
            "13:49: `part` is `glazing` or `panel`, not `pane`; did you mean `panel`?",
            "15:1: there is a U of `frame` already; call the other one otherwise",
            "15:8: `frame` has no `between`; add `between: [indoors, outdoors]`",
            "15:31: the panel conducts nothing; the standard's has `0.035`",
            "15:42: `width` of `frame` is out of range: 0; it is a length of 0.001 mm or more, e.g."
                + " `160 mm`",
            "15:54: `visible` is an empty list; give one length for each glazing",
            "15:67: `corners` is `limited`, `whole` or `none`, not `some`");
  }

  @Test
  void what_is_wrong_with_a_glazing() {
    String stack = "  - stack: {face: [[90, 46], [300, 46]], towards: down}\n    layers: ";
    assertThat(
            Written.problems(
                folder,
                FRAME
                    + stack
                    + "[[glass, 4], [gap, 20]]\n    glazing: {U: 1}\n"
                    + stack
                    + "[[glass, 4], [gap, 20], [glass, 4]]\n    glazing: {}\n"
                    + stack
                    + "[[glass, 4], [gap, 20], [glass, 4]]\n    glazing: {U: 6}\n"
                    + stack
                    + "[[glass, 4], [wood, 20], [glass, 4]]\n    glazing: {U: 1}\n"
                    + stack
                    + "[[glass, 4], [gap, 20], [glass, 4]]\n"
                    + stack
                    + "[[glass, 4]]\n    glazing: {spacer: {height: 6}}\n    part: glazing\n"))
        .containsExactly(
            "15:14: a glazing of 2 layers is none; write panes and gaps by turns, e.g. `[[glass, 4],"
                + " [gap, 16], [glass, 4]]`",
            "18:14: nothing says what fills the gaps of the glazing; add its `U: 1.1`",
            "21:18: no filling of its gaps gives the glazing that U; with the gaps left away it is"
                + " 5.61798",
            "24:15: the U of the glazing decides nothing; fill its gaps by `gap`, e.g. `[gap, 16]`,"
                + " or leave `U` away",
            "26:27: `gap` is no material or space of this case, nor a material of the library; a"
                + " stack with a `gap` needs `glazing: {U: …}` beside its `layers`",
            "29:23: `spacer` of `glazing` has no `conductivity`; add `conductivity: `",
            "30:5: this stack has both `glazing` and `part`; a glazing is one already");
  }

  @Test
  void a_glazing_that_conducts_next_to_nothing() {
    String stack =
        "  - stack: {face: [[90, 46], [300, 46]], towards: down}\n    layers: "
            + "[[glass, 4], [gap, 20], [glass, 4]]\n    glazing: ";
    assertThat(
            Written.problems(
                folder,
                FRAME
                    + stack
                    + "{U: 1e-300}\n"
                    + stack
                    + "{U: 1, spacer: {height: 6, conductivity: 1e-300}}\n"))
        .containsExactly(
            "15:18: the gaps of the glazing would have a conductivity of 2E-302 W/(m K); check its"
                + " U, e.g. `1.1`, in W/(m2 K)",
            "18:55: `conductivity` of `spacer` of `glazing` is below anything known; still air has"
                + " 0.025; write 0 if no heat is to pass");
  }
}
