package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Shapes that are hard on a program, laid in a plain wall of 0.2 m and 0.5 W/(m·K). Whatever is
 * laid in it conducts as the wall does, so that its R stays 0.13 + 0.4 + 0.04 = 0.57 m²·K/W by ISO
 * 6946:2017, 6.7, as long as the area of the wall is all covered.
 */
class HardenedGeometryTest {
  private static final double R = 0.57;

  @TempDir Path dir;

  private Ran solve(String shapes) throws IOException {
    String text =
        Cases.WALL
            .replace("  brick:", "  b: {conductivity: 0.5}\n  brick:")
            .replace("  - {fill: outdoors", shapes + "  - {fill: outdoors");
    text = text.substring(0, text.indexOf("variants:"));
    Cases.write(dir, "wall.yaml", text);
    return Ran.in(dir, "solve", "wall.yaml", "--json");
  }

  private static double u(Ran ran) {
    String key = "\"value_W_per_m2K\":";
    int at = ran.out().indexOf(key);
    assertThat(at).as(ran.out()).isPositive();
    return Double.parseDouble(ran.out().substring(at + key.length()).split("[,}]")[0]);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "laid twice | box: [50, 100, 150, 300] | box: [50, 100, 150, 300]",
        "touching along an edge | box: [50, 100, 100, 300] | box: [100, 100, 150, 300]",
        "touching in a corner | box: [50, 100, 100, 300] | box: [100, 300, 150, 500]",
        "nested | box: [50, 100, 150, 300] | box: [60, 110, 140, 290]",
        "clockwise | polygon: [[50, 100], [50, 300], [150, 300], [150, 100]] | box: [1, 1, 2, 2]",
        "corners on a line | polygon: [[50, 100], [60, 100], [70, 100], [150, 100], [150, 300]] |"
            + " box: [1, 1, 2, 2]",
        "a corner twice | polygon: [[50, 100], [50, 100], [150, 100], [150, 300]] |"
            + " box: [1, 1, 2, 2]",
        "a gap below the resolution | box: [50, 100, 100, 300] | box: [100.0005, 100, 150, 300]",
        "thousands of times smaller | box: [50, 100, 50.002, 100.002] | box: [60, 60, 60.01, 60.01]",
        "as large as the wall | box: [0, 0, 200, 1000] | box: [0, 0, 200, 999.9999]",
        "a spike | polygon: [[50, 100], [150, 100], [150, 300], [190, 300.02], [150, 300.03]] |"
            + " box: [1, 1, 2, 2]"
      })
  void what_is_laid_in_the_wall_conducts_as_it_does(String what, String one, String other)
      throws IOException {
    Ran ran = solve("  - {fill: b, " + one + "}\n  - {fill: b, " + other + "}\n");
    assertThat(ran.code()).as(what + ": " + ran.err()).isZero();
    assertThat(u(ran)).as(what).isCloseTo(1 / R, within(1e-9));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "polygon: [[50, 100], [150, 300], [150, 100], [50, 300]] | crosses itself: the edge from [50, 100] to [150, 300]",
        "polygon: [[50, 100], [150, 100], [100, 100]] | has no area",
        "box: [50, 100, 50, 300] | has no width",
        "box: [50, 100, 1e12, 300] | is out of range",
      })
  void what_cannot_be_meant_is_told_with_its_line(String shape, String why) throws IOException {
    Ran ran = solve("  - {fill: b, " + shape + "}\n");
    assertThat(ran.code()).as(ran.out()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err()).startsWith("wall.yaml:13:").contains(why);
  }

  @Test
  void a_gap_above_the_resolution_is_told_with_place_and_size() throws IOException {
    Ran ran =
        solve(
            "  - {fill: hollow, box: [50, 100, 150, 300]}\n"
                + "  - {fill: b, box: [50, 100, 100, 300]}\n"
                + "  - {fill: b, box: [100.05, 100, 150, 300]}\n");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .contains("sliver 0.04999 mm thin of 'brick', 'hollow' and 'b' at (100, 200) mm");
  }

  /** 1 km of wall with a box of 1 mm in it. */
  @Test
  void a_million_to_one() throws IOException {
    String shape = "  - {fill: brick, box: [100, 5e5, 101, 500001]}\n";
    String text =
        Cases.WALL
            .replace("1000]", "1e6]")
            .replace("  - {fill: outdoors", shape + "  - {fill: outdoors");
    Cases.write(dir, "wall.yaml", text);
    Ran ran = Ran.in(dir, "solve", "wall.yaml", "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(u(ran)).isCloseTo(1 / R, within(1e-9));
  }

  /** Ten thousand boxes in a hundred rows, each row in turn of the one name and the other. */
  @Test
  void ten_thousand_shapes() throws IOException {
    StringBuilder shapes = new StringBuilder();
    for (int row = 0; row < 100; row++) {
      for (int column = 0; column < 100; column++) {
        shapes.append(
            String.format(
                Locale.ROOT,
                "  - {fill: %s, box: [%d, %d, %d, %d]}\n",
                row % 2 == 0 ? "b" : "brick",
                2 * column,
                10 * row,
                2 * column + 2,
                10 * row + 10));
      }
    }
    Ran ran = solve(shapes.toString());
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(u(ran)).isCloseTo(1 / R, within(1e-9));
  }
}
