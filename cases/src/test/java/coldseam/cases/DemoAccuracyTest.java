package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Percentage.withPercentage;

import coldseam.solver.Solver;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/**
 * Every demo case and variant, solved to the accuracy it asks for, agrees within 0.05 % with a
 * solve whose proved half-width is forty times less than that; both intervals hold the same value.
 */
class DemoAccuracyTest {
  private static final Accuracy FINE = new Accuracy(1e-5, 1e-3, 1e-3, 1e-5, 2_000_000);

  @Test
  void demos_agree_with_their_finest_meshes() throws IOException, CaseException {
    List<Path> files;
    try (Stream<Path> found = Files.list(Path.of("demo"))) {
      files =
          found
              .filter(f -> f.toString().endsWith(".yaml") && !OpenFile.is(f, "building"))
              .sorted()
              .toList();
    }
    assertThat(files).hasSizeGreaterThanOrEqualTo(7);
    for (Path file : files) {
      Case read = CaseFile.read(file);
      List<Optional<String>> variants = new ArrayList<>();
      variants.add(Optional.empty());
      read.variants().forEach(name -> variants.add(Optional.of(name)));
      for (Optional<String> variant : variants) {
        Detail detail = read.detail(variant);
        compare(
            file + " " + variant.orElse(""),
            Solver.solve(detail, read.accuracy(), Progress.SILENT),
            Solver.solve(detail, FINE, Progress.SILENT));
      }
    }
  }

  private static void compare(String what, Result asked, Result fine) {
    assertThat(asked.couplings()).as(what).isNotEmpty().hasSameSizeAs(fine.couplings());
    for (int i = 0; i < asked.couplings().size(); i++) {
      var value = asked.couplings().get(i).valueWPerMK();
      var reference = fine.couplings().get(i).valueWPerMK();
      assertThat(value.value()).as(what).isCloseTo(reference.value(), withPercentage(0.05));
      var wide = (Certificate.Certified) value.certificate();
      var narrow = (Certificate.Certified) reference.certificate();
      assertThat(wide.lower()).as(what).isLessThanOrEqualTo(narrow.upper());
      assertThat(wide.upper()).as(what).isGreaterThanOrEqualTo(narrow.lower());
      assertThat(narrow.upper() - narrow.lower()).as(what).isLessThan(5e-5 * value.value());
    }
  }
}
