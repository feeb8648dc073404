package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.cli.plot.Plots.Caption;
import coldseam.cli.plot.Plots.Kind;
import coldseam.solver.result.Result;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the plots say in words, and the PNG beside the SVG. */
class PlotsTest {
  @TempDir Path folder;

  private static List<String> words(Solved solved, Kind kind) {
    return Read.of(solved.svg(kind)).texts().stream().map(Read.Text::words).toList();
  }

  @Test
  void each_plot_says_its_film_set() {
    Solved balcony = Solved.shipped("balcony.yaml");
    assertThat(words(balcony, Kind.TEMPERATURE))
        .anyMatch(text -> text.contains("surface set of films"));
    assertThat(words(balcony, Kind.HEAT_FLOW))
        .anyMatch(text -> text.contains("heat-loss set of films"));
    Solved column = Solved.shipped("iso-10211-case-2.yaml");
    assertThat(words(column, Kind.TEMPERATURE))
        .anyMatch(text -> text.contains("which are the same here"));
  }

  @Test
  void the_variant_is_in_the_title() {
    Solved balcony = Solved.shipped("balcony.yaml");
    String svg =
        Plots.of(balcony.result(), new Caption(Optional.of("thermal break"), "mm", 0.001))
            .svg(Kind.SECTION);
    assertThat(Read.of(svg).all("title").get(0).getTextContent()).contains("thermal break");
  }

  @Test
  void heat_flow_through_each_space_is_stated() {
    Solved column = Solved.shipped("iso-10211-case-2.yaml");
    // ISO 10211:2017, A.2: 9.5 W/m; 9.491 W/m from elements of high degree (computed).
    assertThat(words(column, Kind.HEAT_FLOW))
        .anyMatch(text -> text.matches("9\\.49\\d*\u00a0W/m into the detail"))
        .anyMatch(text -> text.matches("9\\.49\\d*\u00a0W/m out of the detail"));
  }

  @Test
  void a_heat_flow_that_is_not_finite_is_said_to_be_none() {
    Solved column = Solved.shipped("iso-10211-case-1.yaml");
    assertThat(words(column, Kind.HEAT_FLOW))
        .contains("no finite heat flow")
        .noneMatch(text -> text.matches(".*[1-9].*W/m"));
  }

  @Test
  void coldest_points_carry_value_and_film() {
    assertThat(words(Solved.shipped("balcony.yaml"), Kind.TEMPERATURE))
        .anyMatch(text -> text.matches("1\\d\\.\\d+\u00a0°C"))
        .anyMatch(text -> text.matches("f_Rsi 0\\.\\d+, Rs 0\\.25"));
  }

  @Test
  void a_case_in_inches_is_drawn_in_customary_units() {
    Solved stud = Solved.shipped("steel-stud-inches.yaml");
    assertThat(words(stud, Kind.SECTION)).contains("3.5", "0.625", "Section · lengths in inches");
    assertThat(words(stud, Kind.TEMPERATURE)).contains("Temperature in °F", "70\u00a0°F");
    assertThat(words(stud, Kind.HEAT_FLOW)).contains("Density in Btu/(h·ft²)");
  }

  @Test
  void a_large_drawing_with_small_parts_gets_a_zoom_and_a_plain_one_does_not() {
    Solved slab = Solved.of(folder, Awkward.SLAB_EDGE);
    DrawnSection section = DrawnSection.of(slab.result());
    Box zoom = Zoom.of(section).orElseThrow();
    assertThat(zoom.width()).isLessThan(0.1 * section.bounds().width());
    // The foot of the wall and the foil, in local coordinates of the drawing.
    double x = section.localX(new coldseam.mesh.plane.Point(0.15, 0));
    assertThat(zoom.contains(x, section.localY(new coldseam.mesh.plane.Point(0, 0.0005)))).isTrue();
    assertThat(zoom.contains(x, section.localY(new coldseam.mesh.plane.Point(0, -0.8)))).isTrue();
    assertThat(Read.of(slab.svg(Kind.TEMPERATURE)).layers("temperature-zoom-bands")).hasSize(1);
    assertThat(Zoom.of(DrawnSection.of(Solved.shipped("iso-10211-case-1.yaml").result())))
        .isEmpty();
  }

  @Test
  void a_slender_section_is_zoomed_in_its_middle() {
    StringBuilder yaml =
        new StringBuilder(
            """
            coldseam: 1
            title: A long wall
            view: plan
            materials: {wool: {conductivity: 0.035}, stud: {conductivity: 0.13}}
            spaces:
              indoors: {temperature: 20, exposure: inside}
              outdoors: {temperature: -5, exposure: outside}
            stretches:
              inner: {side: bottom, space: indoors}
              outer: {side: top, space: outdoors}
            section:
              - {fill: wool, box: [0, 0, 24000, 150]}
            """);
    for (int i = 0; i < 40; i++) {
      yaml.append(
          "  - {fill: stud, box: [%d, 0, %d, 150]}%n".formatted(600 * i + 270, 600 * i + 330));
    }
    Solved wall = Solved.of(folder, yaml.toString());
    Box zoom = Zoom.of(DrawnSection.of(wall.result())).orElseThrow();
    assertThat(zoom.height()).isBetween(0.15, 0.3);
    Read plot = Read.of(wall.svg(Kind.TEMPERATURE));
    assertThat(plot.layers("temperature-whole-isotherm_.*")).isEmpty();
    assertThat(plot.layers("temperature-zoom-isotherm_.*")).hasSizeGreaterThan(5);
  }

  @Test
  void a_foil_thinner_than_a_line_is_drawn_as_one() {
    Solved sheet = Solved.of(folder, Awkward.TURNED_SHEET);
    Panel panel =
        new SectionView(sheet.result(), sheet.caption(), DrawnSection.of(sheet.result()))
            .page()
            .panel();
    assertThat(panel.pointsPerM() * 1e-4).isLessThan(0.1);
    List<Polyline> lines =
        Read.lines(Read.of(sheet.svg(Kind.SECTION)).layers("section-whole-joints").get(0));
    double length = 0.1755 * panel.pointsPerM();
    assertThat(lines).anyMatch(line -> line.closed() && Math.abs(line.length() / 2 - length) < 1);
  }

  /** Shares add up to 100 % (Euler), but for what is lost in writing them. */
  @Test
  void written_shares_add_up() {
    Solved balcony = Solved.shipped("balcony.yaml");
    List<Result.Share> shares = balcony.result().shares().parts();
    assertThat(words(balcony, Kind.SHARES))
        .contains(shares.get(0).of(), "film outdoors 0.04", "balcony surface")
        .anyMatch(text -> text.startsWith("Shares of L2D indoors – outdoors"));
    double sum = 0;
    for (String text : words(balcony, Kind.SHARES)) {
      if (text.matches("[0-9.]+ %") && text.contains(".")) {
        sum += Double.parseDouble(text.substring(0, text.length() - 2));
      }
    }
    assertThat(sum).isBetween(99.5, 100.5);
  }

  @Test
  void where_nothing_finite_flows_there_are_no_shares() {
    assertThat(words(Solved.shipped("iso-10211-case-1.yaml"), Kind.SHARES))
        .anyMatch(text -> text.startsWith("Shares: no heat flows, or infinitely much"))
        .noneMatch(text -> text.matches("[0-9.]+ %"));
  }

  @Test
  void png_shows_the_same_sheet_at_twice_its_size() throws Exception {
    Solved balcony = Solved.shipped("corner.yaml");
    Plots plots = Plots.of(balcony.result(), balcony.caption());
    byte[] png;
    try {
      png = plots.png(Kind.TEMPERATURE);
    } catch (NoFontException e) {
      Assumptions.abort(e.getMessage());
      return;
    }
    BufferedImage image = ImageIO.read(new ByteArrayInputStream(png));
    Read svg = Read.of(plots.svg(Kind.TEMPERATURE));
    assertThat(image.getWidth()).isEqualTo(2 * Integer.parseInt(svg.root().getAttribute("width")));
    assertThat(image.getHeight())
        .isEqualTo(2 * Integer.parseInt(svg.root().getAttribute("height")));
    int coloured = 0;
    for (int x = 0; x < image.getWidth(); x += 7) {
      for (int y = 0; y < image.getHeight(); y += 7) {
        coloured += (image.getRGB(x, y) & 0xFFFFFF) == 0xFFFFFF ? 0 : 1;
      }
    }
    assertThat(coloured).isGreaterThan(1000);
  }

  @Test
  void drawing_twice_gives_the_same_text() {
    Solved cellar = Solved.shipped("cellar.yaml");
    for (Kind kind : Kind.values()) {
      assertThat(cellar.svg(kind)).isEqualTo(cellar.svg(kind));
    }
  }

  @Test
  void plots_drawn_at_once_are_those_drawn_one_by_one() {
    Solved corner = Solved.shipped("corner.yaml");
    var drawn = Plots.of(corner.result(), corner.caption()).svgs(List.of(Kind.values()));
    assertThat(drawn.keySet()).containsExactly(Kind.values());
    drawn.forEach((kind, svg) -> assertThat(svg).isEqualTo(corner.svg(kind)));
  }

  @Test
  void a_unit_of_no_length_is_refused() {
    assertThatThrownBy(() -> new Caption(Optional.empty(), "mm", 0))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("a unit of length is more than 0 m");
  }
}
