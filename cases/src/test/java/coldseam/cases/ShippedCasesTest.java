package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.detail.Detail;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The cases that ship: all are read, and each says what it must give. */
class ShippedCasesTest {
  static List<Path> shipped() {
    return Written.shipped();
  }

  @Test
  void demo_and_published_cases_are_there() {
    assertThat(shipped()).anyMatch(p -> p.startsWith("demo"));
    assertThat(shipped()).anyMatch(p -> p.startsWith("published"));
  }

  @ParameterizedTest
  @MethodSource("shipped")
  void is_read_with_all_variants(Path file) throws CaseException {
    Case read = CaseFile.read(file);
    Detail base = read.detail(Optional.empty());
    assertThat(base.title()).isEqualTo(read.title()).isNotBlank();
    assertThat(base.areas()).isNotEmpty();
    assertThat(base.spaces()).hasSizeGreaterThanOrEqualTo(2);
    for (String variant : read.variants()) {
      assertThat(read.detail(Optional.of(variant))).isNotEqualTo(base);
    }
  }

  @ParameterizedTest
  @MethodSource("shipped")
  void expects_something_with_a_source(Path file) throws CaseException {
    List<Expectation> expectations = CaseFile.read(file).expectations();
    assertThat(expectations).isNotEmpty();
    for (Expectation expectation : expectations) {
      assertThat(expectation.source()).isNotBlank();
      assertThat(expectation.status()).isIn("seen", "computed", "memory", "invented");
    }
  }
}
