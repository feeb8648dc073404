package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.cases.Case;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AxisTest {
  @TempDir Path dir;
  private Case wall;

  @BeforeEach
  void read() throws Exception {
    wall = Wall.in(dir);
  }

  private Axis axis(String typed) throws StudyException {
    return Axis.read(typed, wall, Optional.empty());
  }

  @Test
  void both_ends_are_included_and_steps_are_decimal() throws StudyException {
    Axis axis = axis("lambda=0.03..0.05/5");
    assertThat(axis.settings()).containsExactly("0.03", "0.035", "0.04", "0.045", "0.05");
    assertThat(axis.numeric()).isTrue();
    assertThat(axis("thickness = 0..1/4").settings())
        .containsExactly("0", "0.333333333333", "0.666666666667", "1");
    assertThat(axis("thickness=200..100/3").settings()).containsExactly("200", "150", "100");
  }

  @Test
  void a_unit_goes_with_every_step() throws StudyException {
    Axis axis = axis("thickness=4..6 in/3");
    assertThat(axis.settings()).containsExactly("4 in", "5 in", "6 in");
    assertThat(axis.number("5 in").get().intValue()).isEqualTo(5);
    assertThat(axis("lambda=1e-2..3e-2 W/(m K)/2").settings())
        .containsExactly("0.01 W/(m K)", "0.03 W/(m K)");
    assertThat(axis("thickness=4 in..6 in/2").unit()).isEqualTo("in");
  }

  @Test
  void a_list_is_of_numbers_or_of_fills() throws StudyException {
    assertThat(axis("thickness=80, 100,  lambda * 3000")).matches(a -> !a.fill() && !a.numeric());
    Axis fills = axis("core=EPS; concrete, cellular; brick");
    assertThat(fills.fill()).isTrue();
    assertThat(fills.settings()).isEqualTo(List.of("EPS", "concrete, cellular", "brick"));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "thickness             | sets nothing",
        "=1..2/3               | sets nothing",
        "thickness=1..2        | does not say how many",
        "thickness=1..2/many   | does not say how many",
        "thickness=1..2/1      | there are 2 to",
        "thickness=5..5/3      | begins where it ends",
        "thickness=1..two/3    | no range of thickness",
        "thickness=1 mm..2 in/3| two units",
        "thicknes=1..2/3       | did you mean \"thickness\"?",
        "thickness=1,,2        | nothing where a setting is due",
        "thickness=1,2,1       | listed twice",
      })
  void what_cannot_be_meant_is_refused(String typed, String why) {
    assertThatThrownBy(() -> axis(typed))
        .isInstanceOf(StudyException.class)
        .hasMessageContaining(why);
  }
}
