package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What a case types for its sheet. */
class TitleBlockTest {
  @TempDir private Path folder;

  @Test
  void is_read_as_typed() throws Exception {
    Case read =
        Written.read(
            folder,
            Written.WALL
                + "sheet: {project: Mill Lane 4, number: 007, revision: B, date: 2028-02-29,"
                + " checked-by: J. Holm, question: Is it warm enough?}\n");
    assertThat(read.titleBlock())
        .isEqualTo(
            new TitleBlock(
                Optional.of("Mill Lane 4"),
                Optional.of("007"),
                Optional.of("B"),
                Optional.of("2028-02-29"),
                Optional.empty(),
                Optional.of("J. Holm"),
                Optional.of("Is it warm enough?")));
    assertThat(Written.read(folder, Written.WALL).titleBlock()).isEqualTo(TitleBlock.EMPTY);
  }

  @Test
  void a_date_is_a_day_of_the_calendar() throws IOException {
    for (String wrong : new String[] {"2026-02-29", "2026-13-01", "30.11.2026", "soon"}) {
      assertThat(Written.problems(folder, Written.WALL + "sheet: {date: " + wrong + "}\n"))
          .singleElement()
          .asString()
          .contains("`" + wrong + "` is no date; write year, month and day, such as 2026-11-30");
    }
  }

  @Test
  void an_unknown_key_is_refused_with_the_nearest() throws IOException {
    assertThat(Written.problems(folder, Written.WALL + "sheet: {checked: J. Holm}\n"))
        .singleElement()
        .asString()
        .contains("has no key `checked`");
  }
}
