package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cli.plot.Plots.Kind;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Element;

/** What is drawn lies where it belongs: lines and bands are read back from the SVG and compared. */
class PlotGeometryTest {
  /** ISO 10211:2017, A.1: half a square column, 20 °C on one face, 0 °C on the other three. */
  private static final String COLUMN = "iso-10211-case-1.yaml";

  private static final String WALL =
      """
      coldseam: 1
      title: A wall of one material
      view: plan
      materials: {stone: {conductivity: 1.0}}
      spaces:
        indoors: {temperature: 20, humidity: 50 %, film: 0.1, exposure: inside}
        outdoors: {temperature: -5, film: 0.1, exposure: outside}
      section:
        - {fill: stone, box: [0, 0, 300, 200]}
      stretches:
        inner: {side: left, space: indoors}
        outer: {side: right, space: outdoors}
      """;

  private static final String PIPE =
      """
      coldseam: 1
      title: A pipe in a block
      view: plan
      materials: {stone: {conductivity: 1.0}, wood: {conductivity: 0.13}}
      spaces:
        pipe: {temperature: 60, film: 0.05, exposure: inside}
        indoors: {temperature: 20, film: 0.13, exposure: inside}
        outdoors: {temperature: -5, film: 0.04, exposure: outside}
      section:
        - {fill: stone, box: [0, 0, 500, 300]}
        - {fill: wood, box: [0, 0, 100, 300]}
        - {fill: pipe, box: [200, 100, 300, 200]}
      stretches:
        inner: {side: left, space: indoors}
        outer: {side: right, space: outdoors}
      """;

  @TempDir Path folder;

  /**
   * Temperature in the column from its Fourier series: (80/π) Σ sin(nπx/s) sinh(nπy/s) / (n
   * sinh(nπ)) over odd n, x from the left face, y from the cold one (separation of variables).
   */
  private static double column(double x, double y, double s) {
    double sum = 0;
    for (int n = 1; n < 400; n += 2) {
      double a = n * Math.PI;
      double ratio =
          Math.exp(a * (y / s - 1)) * (1 - Math.exp(-2 * a * y / s)) / (1 - Math.exp(-2 * a));
      sum += Math.sin(a * x / s) * ratio / n;
    }
    return 80 / Math.PI * sum;
  }

  private static Panel panel(Solved solved, Kind kind) {
    DrawnSection section = DrawnSection.of(solved.result());
    View view =
        switch (kind) {
          case TEMPERATURE -> new TemperatureView(solved.result(), solved.caption(), section);
          case HEAT_FLOW -> new HeatFlowView(solved.result(), solved.caption(), section);
          default -> new SectionView(solved.result(), solved.caption(), section);
        };
    return view.page().panel();
  }

  @Test
  void isotherms_lie_at_their_temperature() {
    Solved solved = Solved.shipped(COLUMN);
    DrawnSection section = DrawnSection.of(solved.result());
    Panel panel = panel(solved, Kind.TEMPERATURE);
    double side = section.bounds().height();
    assertThat(section.bounds().width()).isCloseTo(side / 2, within(1e-9));
    int points = 0;
    List<Element> layers =
        Read.of(solved.svg(Kind.TEMPERATURE)).layers("temperature-whole-isotherm_.*");
    assertThat(layers).hasSize(9);
    for (Element layer : layers) {
      double level = Double.parseDouble(layer.getAttribute("id").replaceAll(".*_", ""));
      for (Polyline line : Read.lines(layer)) {
        for (int i = 0; i < line.size(); i++) {
          double x = panel.localX(line.x(i)) - section.bounds().x0();
          double y = panel.localY(line.y(i)) - section.bounds().y0();
          // Near the corner, where all isotherms meet, a rounded coordinate is many kelvins.
          if (Math.hypot(x, y - side) > side / 10) {
            assertThat(column(x, y, side)).as("(%s, %s)", x, y).isCloseTo(level, within(0.06));
            points++;
          }
        }
      }
    }
    assertThat(points).isGreaterThan(100);
  }

  @Test
  void bands_have_the_temperatures_of_the_key() {
    Solved solved = Solved.shipped(COLUMN);
    DrawnSection section = DrawnSection.of(solved.result());
    Panel panel = panel(solved, Kind.TEMPERATURE);
    Box box = section.bounds();
    Element layer = Read.of(solved.svg(Kind.TEMPERATURE)).layers("temperature-whole-bands").get(0);
    List<List<Polyline>> bands = new ArrayList<>();
    for (int i = 0; i < layer.getElementsByTagName("path").getLength(); i++) {
      bands.add(
          Read.path(((Element) layer.getElementsByTagName("path").item(i)).getAttribute("d")));
    }
    assertThat(bands).hasSize(10);
    Random random = new Random(7);
    for (int i = 0; i < 2000; i++) {
      double x = random.nextDouble() * box.width();
      double y = random.nextDouble() * box.height();
      int top = -1;
      for (int band = 0; band < bands.size(); band++) {
        if (inside(bands.get(band), panel.x(box.x0() + x), panel.y(box.y0() + y))) {
          top = band;
        }
      }
      double exact = column(x, y, box.height());
      assertThat(exact).isBetween(2.0 * top - 0.1, 2.0 * top + 2.1);
    }
  }

  /** R = 0.1 + 0.3/1.0 + 0.1: the surface of the wall is at 15 °C, its other one at 0 °C. */
  @Test
  void the_critical_isotherms_of_a_plane_wall_lie_where_the_hand_puts_them() {
    Solved solved = Solved.of(folder, WALL);
    Panel panel = panel(solved, Kind.TEMPERATURE);
    Box box = DrawnSection.of(solved.result()).bounds();
    Read plot = Read.of(solved.svg(Kind.TEMPERATURE));
    // 20 °C, 50 %: mould limit 12.6246 °C, dew point 9.269 °C (computed from ISO 13788's formula).
    for (String[] line : new String[][] {{"mould-limit", "12.6246"}, {"dew-point", "9.269"}}) {
      double depth = 0.3 * (15 - Double.parseDouble(line[1])) / 15;
      List<Polyline> drawn = Read.lines(plot.layers("temperature-whole-" + line[0]).get(0));
      assertThat(drawn).isNotEmpty();
      for (Polyline part : drawn) {
        assertThat(part.bounds().height()).isCloseTo(0.2 * panel.pointsPerM(), within(0.1));
        for (int i = 0; i < part.size(); i++) {
          assertThat(panel.localX(part.x(i)) - box.x0()).isCloseTo(depth, within(1e-4));
        }
      }
    }
  }

  @Test
  void faces_are_drawn_where_they_are_laid() {
    Solved solved = Solved.of(folder, WALL);
    Panel panel = panel(solved, Kind.SECTION);
    Box box = panel.on(DrawnSection.of(solved.result()).bounds());
    Element layer = Read.of(solved.svg(Kind.SECTION)).layers("section-whole-materials").get(0);
    Box drawn = Read.lines(layer).get(0).bounds();
    assertThat(drawn.x0()).isCloseTo(box.x0(), within(0.01));
    assertThat(drawn.y0()).isCloseTo(box.y0(), within(0.01));
    assertThat(drawn.x1()).isCloseTo(box.x1(), within(0.01));
    assertThat(drawn.y1()).isCloseTo(box.y1(), within(0.01));
    assertThat(drawn.width() / drawn.height()).isCloseTo(1.5, within(1e-3));
  }

  /**
   * 25 K / (0.1 + 0.3 + 0.1) m²·K/W · 0.2 m = 10 W/m, in 20 tubes of 0.5 W/m, each 10 mm wide at
   * the scale of the sheet; a line is written to 0.01 points.
   */
  @Test
  void tubes_of_a_plane_wall_are_of_one_width() {
    Solved solved = Solved.of(folder, WALL);
    Panel panel = panel(solved, Kind.HEAT_FLOW);
    Read plot = Read.of(solved.svg(Kind.HEAT_FLOW));
    assertThat(plot.texts().stream().map(Read.Text::words))
        .anyMatch(text -> text.contains("0.5\u00a0W/m"));
    double bottom = panel.on(DrawnSection.of(solved.result()).bounds()).y1();
    List<Polyline> lines = Read.lines(plot.layers("heat-flow-whole-tubes").get(0));
    assertThat(lines).hasSize(19);
    lines.sort(Comparator.comparingDouble(line -> -line.y(0)));
    for (int i = 0; i < lines.size(); i++) {
      double place = bottom - (i + 1) * 0.01 * panel.pointsPerM();
      Polyline line = lines.get(i);
      assertThat(line.bounds().width()).isCloseTo(0.3 * panel.pointsPerM(), within(0.02));
      assertThat(line.x(line.size() - 1)).as("with the heat").isGreaterThan(line.x(0));
      assertThat(line.bounds().y0()).isCloseTo(place, within(0.02));
      assertThat(line.bounds().y1()).isCloseTo(place, within(0.02));
    }
    List<Polyline> heads = Read.lines(plot.layers("heat-flow-whole-heads").get(0));
    assertThat(heads).isNotEmpty();
    for (Polyline head : heads) {
      // The first point of a head is its tip, the third lies in its tail.
      assertThat(head.x(0) - head.x(2)).isGreaterThan(5);
      assertThat(Math.abs(head.y(0) - head.y(2))).isLessThan(0.1);
    }
  }

  /** What flows out of the pipe is a whole number of tubes, so that no line ends in the block. */
  @Test
  void tubes_go_on_around_a_hole() {
    Solved solved = Solved.of(folder, PIPE);
    Panel panel = panel(solved, Kind.HEAT_FLOW);
    Read plot = Read.of(solved.svg(Kind.HEAT_FLOW));
    Box box = panel.on(DrawnSection.of(solved.result()).bounds());
    List<double[]> inside = new ArrayList<>();
    for (Polyline line : Read.lines(plot.layers("heat-flow-whole-tubes").get(0))) {
      // None runs along a cut-off plane, which is no line between tubes.
      assertThat(line.bounds().y0()).isGreaterThan(box.y0() + 1);
      assertThat(line.bounds().y1()).isLessThan(box.y1() - 1);
      for (int end : new int[] {0, line.size() - 1}) {
        double x = line.x(end);
        double y = line.y(end);
        double pipe =
            Math.max(
                Math.abs(panel.localX(x) - panel.localX(box.x0()) - 0.25),
                Math.abs(panel.localY(y) - panel.localY(box.midY())));
        boolean free =
            Math.min(Math.min(x - box.x0(), box.x1() - x), Math.min(y - box.y0(), box.y1() - y))
                > 0.3;
        if (!line.closed() && free && pipe > 0.0505) {
          inside.add(new double[] {x, y});
        }
      }
    }
    assertThat(inside).as("ends at the jump").isNotEmpty();
    for (double[] end : inside) {
      assertThat(inside.stream().filter(o -> Math.hypot(o[0] - end[0], o[1] - end[1]) < 0.5))
          .hasSize(2);
    }
    assertThat(plot.layers("heat-flow-whole-seams")).isEmpty();
  }

  @Test
  void lines_that_do_not_go_on_are_said_to() {
    String second =
        PIPE.replace(
                "outdoors: {",
                "feed: {temperature: 45, film: 0.05, exposure: inside}\n  outdoors: {")
            .replace("stretches:", "  - {fill: feed, box: [380, 60, 430, 110]}\nstretches:");
    Read plot = Read.of(Solved.of(folder, second).svg(Kind.HEAT_FLOW));
    assertThat(plot.layers("heat-flow-.*-seams")).isNotEmpty();
    assertThat(plot.texts().stream().map(Read.Text::words))
        .anyMatch(text -> text.startsWith("heat crosses here"));
  }

  @Test
  void without_heat_there_are_no_tubes() {
    Solved solved = Solved.of(folder, PIPE.replaceAll("temperature: -?\\d+", "temperature: 20"));
    assertThat(Read.of(solved.svg(Kind.HEAT_FLOW)).layers("heat-flow-whole-tubes")).isEmpty();
  }

  @Test
  void arrows_stand_in_where_there_are_no_tubes() {
    Read plot = Read.of(Solved.shipped(COLUMN).svg(Kind.HEAT_FLOW));
    assertThat(plot.layers("heat-flow-whole-tubes")).isEmpty();
    List<Polyline> arrows = Read.lines(plot.layers("heat-flow-whole-arrows").get(0));
    assertThat(arrows.size()).isGreaterThan(20);
    for (Polyline arrow : arrows) {
      // Heat flows in through the upper face only; the fourth point of an arrow is its tip.
      assertThat(arrow.y(3) - arrow.y(0)).isGreaterThan(-0.1);
    }
  }

  @Test
  void every_reference_length_of_psi_is_drawn_or_listed() {
    Solved solved = Solved.shipped("balcony.yaml");
    String words =
        String.join(
            "\n",
            Read.of(solved.svg(Kind.SECTION)).texts().stream().map(Read.Text::words).toList());
    assertThat(words)
        .contains("bottom flank, internal 1300")
        .contains("bottom flank, overall internal 1440")
        .contains("bottom flank, external 1400")
        .contains("top flank, internal 1520")
        .contains("top flank, overall internal 1660")
        .contains("top flank, external 1700");
  }

  private static boolean inside(List<Polyline> rings, double x, double y) {
    boolean odd = false;
    for (Polyline ring : rings) {
      for (int i = 0; i < ring.size(); i++) {
        int j = ring.after(i);
        if (ring.y(i) > y != ring.y(j) > y
            && x
                < ring.x(i) + (y - ring.y(i)) / (ring.y(j) - ring.y(i)) * (ring.x(j) - ring.x(i))) {
          odd = !odd;
        }
      }
    }
    return odd;
  }
}
