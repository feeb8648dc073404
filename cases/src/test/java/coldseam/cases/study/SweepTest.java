package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.solver.detail.Accuracy;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SweepTest {
  @TempDir Path dir;

  private static Sweep sweep(Case wall, String... sets) throws StudyException {
    List<Axis> axes = new ArrayList<>();
    for (String set : sets) {
      axes.add(Axis.read(set, wall, Optional.empty()));
    }
    return Sweep.of(wall, Optional.empty(), axes);
  }

  @Test
  void every_combination_is_a_point_and_the_last_axis_changes_fastest() throws Exception {
    Sweep sweep = sweep(Wall.in(dir), "core=wool,brick", "thickness=80..120/3");
    assertThat(sweep.points().stream().map(p -> p.settings().toString()))
        .containsExactly(
            "{core=wool, thickness=80}",
            "{core=wool, thickness=100}",
            "{core=wool, thickness=120}",
            "{core=brick, thickness=80}",
            "{core=brick, thickness=100}",
            "{core=brick, thickness=120}");
    assertThat(sweep.points().get(4).changes().fills()).isEqualTo(Map.of("core", "brick"));
    assertThat(sweep.points().get(4).changes().values()).isEqualTo(Map.of("thickness", "100"));
  }

  /** U = 1/R by ISO 6946. */
  @Test
  void a_point_is_the_case_with_its_settings() throws Exception {
    Case wall = Wall.in(dir);
    for (Point point : sweep(wall, "core=wool,brick", "thickness=80..120/3").points()) {
      double lambda = point.settings().get("core").equals("brick") ? 0.5 : Wall.LAMBDA;
      double metres = Double.parseDouble(point.settings().get("thickness")) / 1000;
      double u = 1 / (Wall.FILMS + metres / lambda);
      Measure measured = Measure.all(Wall.solved(wall, point.changes(), Accuracy.STANDARD)).get(0);
      assertThat(measured.typedName()).isEqualTo("U.wall");
      assertThat(u).isBetween(measured.lower(), measured.upper());
      assertThat(measured.upper() - measured.lower()).isLessThan(0.01 * u);
    }
  }

  @Test
  void what_makes_no_case_is_told_with_its_settings_and_its_place() throws Exception {
    Case wall = Wall.in(dir);
    Sweep sweep = sweep(wall, "thickness=-100..100/3");
    assertThatThrownBy(() -> sweep.check(sweep.points(), 2))
        .isInstanceOf(CaseException.class)
        .hasMessageContaining("wall.yaml:")
        .hasMessageContaining("with thickness = 0: ");
    Sweep unknown = sweep(wall, "coer=brick,wool");
    assertThatThrownBy(() -> unknown.check(unknown.points(), 1))
        .hasMessageContaining("no shape has the name or the fill `coer`")
        .hasMessageContaining("did you mean `core`?");
    Sweep strange = sweep(wall, "core=brick,marzipan");
    assertThatThrownBy(() -> strange.check(strange.points(), 2))
        .hasMessageContaining("with core = marzipan: `marzipan` is no material");
  }

  @Test
  void the_key_follows_case_variant_and_accuracy_but_not_the_axes() throws Exception {
    Case wall = Wall.in(dir);
    String key = sweep(wall, "thickness=80..120/3").key(Accuracy.STANDARD, "1");
    assertThat(sweep(wall, "lambda=0.03,0.04").key(Accuracy.STANDARD, "1")).isEqualTo(key);
    assertThat(sweep(wall, "lambda=0.03,0.04").key(Accuracy.STANDARD, "2")).isNotEqualTo(key);
    Accuracy finer = new Accuracy(0.001, 0.001, 0.001, 0.001, 0.01, 0.0005, 2_000_000);
    assertThat(sweep(wall, "thickness=80..120/3").key(finer, "1")).isNotEqualTo(key);
    Axis axis = Axis.read("thickness=80..120/3", wall, Optional.of("massive"));
    assertThat(Sweep.of(wall, Optional.of("massive"), List.of(axis)).key(Accuracy.STANDARD, "1"))
        .isNotEqualTo(key);
    Case changed = Wall.in(dir, Wall.TEXT.replace("0.5}", "0.6}"));
    assertThat(sweep(changed, "thickness=80..120/3").key(Accuracy.STANDARD, "1")).isNotEqualTo(key);
  }

  @Test
  void too_many_axes_or_points_are_refused() throws Exception {
    Case wall = Wall.in(dir);
    assertThatThrownBy(() -> sweep(wall, "thickness=1..2/2", "thickness=3..4/2"))
        .hasMessageContaining("set twice");
    assertThatThrownBy(() -> sweep(wall, "thickness=1..2/2", "lambda=3..4/2", "core=a,b"))
        .hasMessageContaining("one or two");
    assertThatThrownBy(() -> sweep(wall, "thickness=1..2/1000", "lambda=3..4/1000"))
        .hasMessageContaining("1000000 combinations");
  }
}
