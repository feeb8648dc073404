package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ShardTest {
  @Test
  void parts_make_the_whole_once_and_are_about_equal() {
    Random random = new Random(7);
    for (int trial = 0; trial < 100; trial++) {
      List<Integer> all = IntStream.range(0, random.nextInt(200)).boxed().toList();
      int of = 1 + random.nextInt(30);
      List<Integer> joined = new ArrayList<>();
      for (int k = 1; k <= of; k++) {
        List<Integer> part = new Shard(k, of).part(all);
        assertThat(part).hasSizeBetween(all.size() / of, all.size() / of + 1);
        joined.addAll(part);
      }
      assertThat(joined).as("trial %d", trial).containsExactlyInAnyOrderElementsOf(all);
    }
  }

  @Test
  void the_first_is_1() throws StudyException {
    assertThat(Shard.read("1/3").part(List.of("a", "b", "c", "d"))).containsExactly("a", "d");
    assertThat(Shard.read(" 3 / 3 ").part(List.of("a", "b", "c", "d"))).containsExactly("c");
    assertThat(Shard.read("1/1").whole()).isTrue();
  }

  @ParameterizedTest
  @ValueSource(strings = {"0/3", "4/3", "3", "1/0", "a/b", "", "-1/3", "1/2/3"})
  void others_are_refused(String typed) {
    assertThatThrownBy(() -> Shard.read(typed)).isInstanceOf(StudyException.class);
  }
}
