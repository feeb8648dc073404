package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cli.plot.Plots.Kind;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Labels of every plot of every shipped case: all on the sheet, none over another. */
class LabelsTest {
  /** Texts may come this near, or overlap by as much, points. */
  private static final double SLACK = 0.8;

  @TempDir static Path folder;

  static Stream<Solved> cases() {
    Stream<Solved> awkward =
        Stream.of(Awkward.SLAB_EDGE, Awkward.TURNED_SHEET, Awkward.PIPE, Awkward.MANY_LAYERS)
            .map(yaml -> Solved.of(folder, yaml));
    return Stream.concat(Solved.shipped().stream(), awkward);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void texts_lie_on_the_sheet(Solved solved) {
    for (Kind kind : Kind.values()) {
      Read plot = Read.of(solved.svg(kind));
      double width = Double.parseDouble(plot.root().getAttribute("width"));
      double height = Double.parseDouble(plot.root().getAttribute("height"));
      assertThat(plot.texts()).as(kind.stem()).hasSizeGreaterThan(5);
      for (Read.Text text : plot.texts()) {
        for (int i = 0; i < 4; i++) {
          assertThat(text.xs()[i]).as("%s: %s", kind, text.words()).isBetween(0.0, width);
          assertThat(text.ys()[i]).as("%s: %s", kind, text.words()).isBetween(0.0, height);
        }
      }
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  void no_text_lies_over_another(Solved solved) {
    List<String> over = new ArrayList<>();
    for (Kind kind : Kind.values()) {
      List<Read.Text> texts = Read.of(solved.svg(kind)).texts();
      for (int i = 0; i < texts.size(); i++) {
        for (int j = 0; j < i; j++) {
          if (overlap(texts.get(i), texts.get(j))) {
            over.add(kind + ": " + texts.get(i).words() + " | " + texts.get(j).words());
          }
        }
      }
    }
    assertThat(over).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("cases")
  void every_material_and_space_is_named(Solved solved) {
    Read plot = Read.of(solved.svg(Kind.SECTION));
    List<String> words = plot.texts().stream().map(Read.Text::words).toList();
    solved
        .result()
        .detail()
        .fills()
        .forEach(
            fill -> assertThat(words).anyMatch(text -> text.contains(fill.name().split(" ")[0])));
  }

  /** Whether two turned boxes overlap by more than the slack: no axis separates them. */
  private static boolean overlap(Read.Text a, Read.Text b) {
    return !separated(a, b, a) && !separated(a, b, b);
  }

  private static boolean separated(Read.Text a, Read.Text b, Read.Text axes) {
    for (int side = 0; side < 2; side++) {
      double dx = axes.xs()[side + 1] - axes.xs()[side];
      double dy = axes.ys()[side + 1] - axes.ys()[side];
      double length = Math.hypot(dx, dy);
      double[] first = span(a, dx / length, dy / length);
      double[] second = span(b, dx / length, dy / length);
      if (first[1] - SLACK < second[0] || second[1] - SLACK < first[0]) {
        return true;
      }
    }
    return false;
  }

  private static double[] span(Read.Text text, double ux, double uy) {
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < 4; i++) {
      double at = text.xs()[i] * ux + text.ys()[i] * uy;
      least = Math.min(least, at);
      most = Math.max(most, at);
    }
    return new double[] {least, most};
  }
}
