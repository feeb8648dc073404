package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cli.plot.Plots.Kind;
import java.nio.file.Path;
import java.util.ArrayList;
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
        kind == Kind.TEMPERATURE
            ? new TemperatureView(solved.result(), solved.caption(), section)
            : new SectionView(solved.result(), solved.caption(), section);
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

  @Test
  void arrows_follow_the_heat() {
    Solved solved = Solved.of(folder, WALL);
    Element layer = Read.of(solved.svg(Kind.HEAT_FLOW)).layers("heat-flow-whole-arrows").get(0);
    List<Polyline> arrows = Read.lines(layer);
    assertThat(arrows.size()).isGreaterThan(20);
    for (Polyline arrow : arrows) {
      // The fourth point of an arrow is its tip, the first lies at its tail.
      assertThat(arrow.x(3) - arrow.x(0)).isGreaterThan(5);
      assertThat(Math.abs(arrow.y(3) - arrow.y(0))).isLessThan(1);
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
