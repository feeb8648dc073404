package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cli.plot.Plots.Kind;
import coldseam.solver.detail.Accuracy;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.w3c.dom.Element;
import org.w3c.dom.NamedNodeMap;

/** The SVG files as files: valid, self-contained, readable without seeing, small. */
class SvgTest {
  @TempDir Path folder;

  static Stream<Solved> cases() {
    return Solved.shipped().stream();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void stands_alone_and_tells_what_it_shows(Solved solved) {
    for (Kind kind : Kind.values()) {
      String svg = solved.svg(kind);
      assertThat(svg)
          .startsWith("<?xml version=\"1.0\" encoding=\"UTF-8\"?>")
          .doesNotContain("<!DOCTYPE", "href", "url(", "NaN", "Infinity");
      Read plot = Read.of(svg);
      assertThat(plot.root().getAttribute("role")).isEqualTo("img");
      String[] told = plot.root().getAttribute("aria-labelledby").split(" ");
      assertThat(told).hasSize(2);
      assertThat(plot.all("title").get(0).getAttribute("id")).isEqualTo(told[0]);
      assertThat(plot.all("title").get(0).getTextContent())
          .contains(solved.result().detail().title());
      assertThat(plot.all("desc").get(0).getAttribute("id")).isEqualTo(told[1]);
      assertThat(plot.all("desc").get(0).getTextContent()).hasSizeGreaterThan(20);
      assertThat(svg)
          .containsPattern(
              solved.result().couplings().stream().allMatch(c -> c.valueWPerMK().certified())
                  ? "L[23]D CERTIFIED|TEMPERATURES ARE ESTIMATES"
                  : "NOT CERTIFIED")
          .contains("licensed professional decide");
    }
  }

  @Test
  void ids_are_unique_even_with_all_plots_in_one_document() {
    Solved solved = Solved.shipped("balcony.yaml");
    Set<String> ids = new HashSet<>();
    for (Kind kind : Kind.values()) {
      for (Element element : Read.of(solved.svg(kind)).all("*")) {
        if (element.hasAttribute("id")) {
          assertThat(ids.add(element.getAttribute("id"))).as(element.getAttribute("id")).isTrue();
        }
      }
    }
    assertThat(ids).hasSizeGreaterThan(40);
  }

  @Test
  void coordinates_have_two_decimals_at_most() {
    Read plot = Read.of(Solved.shipped("balcony.yaml").svg(Kind.TEMPERATURE));
    for (Element element : plot.all("*")) {
      NamedNodeMap attributes = element.getAttributes();
      for (int i = 0; i < attributes.getLength(); i++) {
        if (!attributes.item(i).getNodeName().equals("id")) {
          assertThat(attributes.item(i).getNodeValue()).doesNotContainPattern("\\d\\.\\d{3}");
        }
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void stays_below_300_kilobytes(Solved solved) {
    for (Kind kind : new Kind[] {Kind.SECTION, Kind.TEMPERATURE, Kind.HEAT_FLOW}) {
      assertThat(solved.svg(kind).length()).as(kind.stem()).isBetween(5_000, 300_000);
    }
  }

  @Test
  void does_not_grow_with_the_mesh() throws Exception {
    Path file = Files.writeString(folder.resolve("sheet.yaml"), Awkward.TURNED_SHEET);
    Solved coarse = Solved.of(file, Optional.of(new Accuracy(0.02, 1, 1, 0.02, 2_000_000)));
    Solved fine = Solved.of(file, Optional.of(new Accuracy(2e-5, 1, 1, 0.02, 2_000_000)));
    assertThat(fine.result().triangles()).isGreaterThan(5 * coarse.result().triangles());
    for (Kind kind : new Kind[] {Kind.SECTION, Kind.TEMPERATURE, Kind.HEAT_FLOW}) {
      double before = coarse.svg(kind).length();
      assertThat(fine.svg(kind).length() / before).as(kind.stem()).isLessThan(1.5);
    }
  }

  @Test
  void text_with_signs_of_markup_survives() {
    Solved solved =
        Solved.of(
            folder,
            """
            coldseam: 1
            title: 'Wall <b>"A" & B</b> \u03c8 \u2264 0.1'
            view: plan
            materials: {'a < b & c': {conductivity: 1}}
            spaces:
              in: {temperature: 20, film: 0.1, exposure: inside}
              out: {temperature: 0, film: 0.1, exposure: outside}
            section:
              - {fill: 'a < b & c', box: [0, 0, 300, 300]}
            stretches:
              inner: {side: left, space: in}
              outer: {side: right, space: out}
            """);
    Read plot = Read.of(solved.svg(Kind.SECTION));
    assertThat(plot.texts().stream().map(Read.Text::words))
        .contains("Wall <b>\"A\" & B</b> \u03c8 \u2264 0.1", "a < b & c");
  }
}
