package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Flank;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Stretches and flanks. */
class OutlineTest {
  @TempDir private Path folder;

  private Detail detail(String text) throws CaseException {
    return Written.read(folder, text).detail(Optional.empty());
  }

  private static void runs(Stretch stretch, double... mm) {
    assertThat(stretch.along()).hasSize(mm.length / 2);
    for (int i = 0; i < mm.length; i += 2) {
      isAt(stretch.along().get(i / 2), mm[i], mm[i + 1]);
    }
  }

  private static void isAt(Point point, double xMm, double yMm) {
    assertThat(point.x() * 1000).isCloseTo(xMm, within(1e-9));
    assertThat(point.y() * 1000).isCloseTo(yMm, within(1e-9));
  }

  @Test
  void sides_are_those_of_the_conducting_section_not_of_the_sheet() throws CaseException {
    Detail detail =
        detail(
            Written.WALL
                + "stretches: {l: {side: left}, r: {side: right}, t: {side: top}, b: {side:"
                + " bottom}}\n");
    runs(detail.stretches().get(0), 0, 0, 0, 1000);
    runs(detail.stretches().get(1), 240, 0, 240, 1000);
    runs(detail.stretches().get(2), 0, 1000, 240, 1000);
    runs(detail.stretches().get(3), 0, 0, 240, 0);
  }

  @Test
  void sides_are_those_that_are_seen_after_all_is_laid() throws CaseException {
    String text =
        Written.HEAD
            + """
            materials: {a: {conductivity: 1}}
            spaces: {i: {temperature: 1, film: 0.1}, o: {temperature: 0, film: 0.1}}
            section:
              - {fill: a, box: [-500, 0, 500, 1000]}
              - {fill: i, box: [-500, 0, -100, 900]}
              - {fill: hollow, box: [-500, 900, -200, 1000]}
              - {fill: o, polygon: [[100, -100], [600, -100], [600, 1100], [100, 1100]]}
            stretches: {l: {side: left}, r: {side: right}, b: {side: bottom}}
            flanks: {low: {cut: bottom}, high: {cut: top}}
            """;
    Detail detail = detail(text);
    runs(detail.stretches().get(0), -200, 900, -200, 1000);
    runs(detail.stretches().get(1), 100, 0, 100, 1000);
    runs(detail.stretches().get(2), -100, 0, 100, 0);
    isAt(detail.flanks().get(0).cut().orElseThrow(), 0, 0);
    isAt(detail.flanks().get(1).cut().orElseThrow(), -50, 1000);
  }

  @Test
  void two_planes_on_one_side_are_not_guessed_between() {
    String text =
        Written.WALL
            + "  - {fill: masonry, box: [500, 0, 600, 1000]}\n"
            + "flanks: {low: {cut: bottom}}\n";
    assertThat(Written.problems(folder, text))
        .containsExactly(
            "13:21: the section has 2 separate planes on the bottom; give a point `[x, y]` on the"
                + " one that is meant");
  }

  @Test
  void conditions_of_stretches() throws CaseException {
    Detail detail =
        detail(
            Written.WALL
                + """
                stretches:
                  plain: {side: left}
                  own film: {side: left, space: indoors, film: {surface: 0.2}, surface: frame}
                  heated: {along: [[0, 0], [0, 100]], temperature: 86 F}
                  windy: {along: [[240, 0], [240, 100]], temperature: -9, film: 0.02}
                  mat: {side: left, flow: 100}
                  cut: {side: top, adiabatic: true}
                  axis: {side: bottom, symmetry: true}
                """);
    assertThat(detail.stretches().get(0).condition()).isEmpty();
    EdgeCondition.Faces own =
        (EdgeCondition.Faces) detail.stretches().get(1).condition().orElseThrow();
    assertThat(own.space()).isEqualTo("indoors");
    assertThat(own.heatLoss()).isEmpty();
    assertThat(own.surface().orElseThrow().horizontalM2KPerW()).isEqualTo(0.2);
    assertThat(detail.stretches().get(1).glazing()).isTrue();
    assertThat(detail.stretches().get(2).condition())
        .contains(new EdgeCondition.Faces("heated", Optional.empty(), Optional.empty()));
    assertThat(detail.stretches().get(4).condition()).contains(new EdgeCondition.HeatFlow(100));
    assertThat(detail.stretches().get(5).condition()).contains(new EdgeCondition.CutOff(false));
    assertThat(detail.stretches().get(6).condition()).contains(new EdgeCondition.CutOff(true));
    assertThat(detail.spaces())
        .extracting(Space::name)
        .containsExactly("indoors", "outdoors", "heated", "windy");
    Space heated = detail.spaces().get(2);
    assertThat(heated.temperatureC()).isCloseTo(30, within(1e-12));
    assertThat(heated.heatLoss().fixedTemperature()).isTrue();
    assertThat(heated.surface().fixedTemperature()).isTrue();
    assertThat(detail.spaces().get(3).heatLoss().horizontalM2KPerW()).isEqualTo(0.02);
  }

  @Test
  void flanks_typed_and_drawn() throws CaseException {
    Detail detail =
        detail(
            Written.WALL
                + """
                flanks:
                  a: {cut: top}
                  b: {cut: [100, 0], U: [0.2, 0.21], length: 1 m}
                  c: {U: 0.3, length: {internal: 900, external: 1000}}
                """);
    Flank b = detail.flanks().get(1);
    isAt(detail.flanks().get(0).cut().orElseThrow(), 120, 1000);
    isAt(b.cut().orElseThrow(), 100, 0);
    assertThat(b.typedUWPerM2K()).contains(new Bracket(0.2, 0.21));
    assertThat(b.typedLengthM()).hasSize(3).allSatisfy((s, l) -> assertThat(l).isEqualTo(1));
    Flank c = detail.flanks().get(2);
    assertThat(c.cut()).isEmpty();
    assertThat(c.typedLengthM())
        .containsEntry(DimensionSystem.INTERNAL, 0.9)
        .containsEntry(DimensionSystem.EXTERNAL, 1.0)
        .hasSize(2);
  }
}
