package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class NearestTest {
  private static final List<String> WORDS = List.of("solve", "check", "materials", "prove");

  @Test
  void a_slip_finds_its_word_and_a_stranger_finds_none() {
    assertThat(Nearest.of("sovle", WORDS)).contains("solve");
    assertThat(Nearest.of("chekc", WORDS)).contains("check");
    assertThat(Nearest.of("material", WORDS)).contains("materials");
    assertThat(Nearest.of("PROVE", WORDS)).contains("prove");
    assertThat(Nearest.of("render", WORDS)).isEmpty();
    assertThat(Nearest.of("", WORDS)).isEmpty();
  }
}
