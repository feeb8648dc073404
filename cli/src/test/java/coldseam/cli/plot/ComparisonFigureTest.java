package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.Case;
import coldseam.cases.CaseFile;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Element;

/** Alternatives are drawn at one scale and on one scale of temperature. */
class ComparisonFigureTest {
  @TempDir Path dir;

  /** A wall of a thickness and height, mm, with indoors at a temperature. */
  private ComparisonFigure.Column column(String letter, int thickness, int height, int indoors)
      throws Exception {
    Path file =
        Files.writeString(
            dir.resolve(letter + ".yaml"),
            """
            coldseam: 1
            title: Wall
            view: plan
            materials: {brick: {conductivity: 0.5}}
            spaces:
              indoors: {temperature: %3$d, film: 0.13}
              outdoors: {temperature: -5, film: 0.04}
            section:
              - {fill: indoors, box: [-100, 0, 0, %2$d]}
              - {fill: brick, box: [0, 0, %1$d, %2$d]}
              - {fill: outdoors, box: [%1$d, 0, %1$d + 100, %2$d]}
            U: {of: wall, between: [indoors, outdoors]}
            """
                .formatted(thickness, height, indoors));
    Case wall = CaseFile.read(file);
    return new ComparisonFigure.Column(
        letter,
        "wall " + thickness + " × " + height,
        Solver.solve(wall.detail(Optional.empty()), wall.accuracy(), Progress.SILENT),
        new Plots.Caption(Optional.empty(), wall.unit(), wall.metresPerUnit()),
        List.of("U of " + letter));
  }

  private static Box box(Read svg, String layer) {
    List<Element> found = svg.layers("compare-" + layer);
    assertThat(found).as(layer).hasSize(1);
    Box box = Box.EMPTY;
    for (Polyline line : Read.lines(found.get(0))) {
      box = box.with(line.bounds());
    }
    return box;
  }

  @Test
  void every_section_and_every_field_at_one_scale() throws Exception {
    int[][] sizes = {{200, 1000}, {400, 500}, {300, 800}, {100, 1200}, {250, 900}};
    List<ComparisonFigure.Column> columns = new ArrayList<>();
    for (int i = 0; i < sizes.length; i++) {
      columns.add(column(Character.toString('A' + i), sizes[i][0], sizes[i][1], 20));
    }
    Read svg =
        Read.of(
            ComparisonFigure.svg(
                new ComparisonFigure.Content("Walls", "five", "CERTIFIED", columns)));
    double scale = box(svg, "A-section-materials").width() / sizes[0][0];
    assertThat(scale).isGreaterThan(0.05);
    for (int i = 0; i < sizes.length; i++) {
      for (String of : List.of("section-materials", "temperature-bands")) {
        Box box = box(svg, Character.toString('A' + i) + "-" + of);
        assertThat(box.width()).as("%d %s", i, of).isCloseTo(scale * sizes[i][0], within(0.3));
        assertThat(box.height()).as("%d %s", i, of).isCloseTo(scale * sizes[i][1], within(0.3));
      }
    }
    // Nothing lies over anything else: frames are apart.
    for (int i = 0; i < sizes.length; i++) {
      for (int k = 0; k < i; k++) {
        Box a = box(svg, Character.toString('A' + i) + "-section-frame");
        Box b = box(svg, Character.toString('A' + k) + "-section-frame");
        assertThat(a.x0() >= b.x1() || b.x0() >= a.x1() || a.y0() >= b.y1() || b.y0() >= a.y1())
            .isTrue();
      }
    }
  }

  /** Indoors at 20 °C and at 10 °C: one scale over both, the colder wall has no band above 10. */
  @Test
  void one_scale_of_temperature() throws Exception {
    List<ComparisonFigure.Column> columns =
        List.of(column("A", 200, 500, 20), column("B", 200, 500, 10));
    String text =
        ComparisonFigure.svg(new ComparisonFigure.Content("Walls", "two", "CERTIFIED", columns));
    Read svg = Read.of(text);
    // Surfaces: θ = −5 + ΔT·0.04/0.57 and θi − ΔT·0.13/0.57, so 14.3 and 6.6 °C at most.
    assertThat(svg.layers("compare-A-temperature-isotherm_1[0-4]")).isNotEmpty();
    assertThat(svg.layers("compare-B-temperature-isotherm_1[0-4]")).isEmpty();
    assertThat(svg.layers("compare-B-temperature-isotherm_[0-6]")).isNotEmpty();
    assertThat(text).containsOnlyOnce(">Temperature in °C</text>");
    assertThat(text).contains("U of A").contains("U of B").contains("licensed professional");
    // The level of 0 °C divides the same two colours in both.
    assertThat(colour(svg, "A")).isEqualTo(colour(svg, "B"));
  }

  /** Colour of the coldest band. */
  private static String colour(Read svg, String letter) {
    Element bands = svg.layers("compare-" + letter + "-temperature-bands").get(0);
    Element first = (Element) bands.getElementsByTagNameNS(SvgCanvas.SVG, "path").item(0);
    return first.getAttribute("fill");
  }
}
