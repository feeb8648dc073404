package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.Expectation.Quantity;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Details that are hard to resolve, to mesh or to solve, through the whole of the tool. */
class AwkwardCasesTest {
  static List<Path> awkward() throws IOException {
    try (Stream<Path> files = Files.list(Path.of("awkward"))) {
      return files.filter(p -> p.toString().endsWith(".yaml")).sorted().toList();
    }
  }

  private static Result solved(Case read) throws CaseException {
    return Solver.solve(read.detail(Optional.empty()), read.accuracy(), Progress.SILENT);
  }

  private static Result solved(String name) throws CaseException {
    return solved(CaseFile.read(Path.of("awkward").resolve(name)));
  }

  @ParameterizedTest
  @MethodSource("awkward")
  void is_solved_in_balance_and_gives_what_it_expects(Path file) throws CaseException {
    Case read = CaseFile.read(file);
    Result result = solved(read);
    assertThat(result.balance().relative()).isLessThan(1e-9);
    for (Expectation expected : read.expectations()) {
      double value =
          expected.quantity() == Quantity.R
              ? result.transmittances().get(0).resistanceM2KPerW().value()
              : result.couplings().get(0).valueWPerMK().value();
      assertThat(expected.quantity()).isIn(Quantity.R, Quantity.L2D);
      assertThat(value).isCloseTo(expected.value(), within(expected.within()));
    }
  }

  /**
   * Between parallel heat flow and isothermal planes, the two limits of ISO 6946:2017, 6.7.2, which
   * bound the exact value for the same films.
   */
  @Test
  void a_foil_across_insulation_lies_between_the_limits_of_hand_calculation() throws CaseException {
    double share = 0.05 / 1000;
    double parallel = (1 - share) / (0.17 + 0.02 / 0.5 + 0.2 / 0.04);
    parallel += share / (0.17 + 0.02 / 0.5 + 0.2 / 160);
    double planes = 1 / (0.17 + 0.02 / 0.5 + 0.2 / (0.04 * (1 - share) + 160 * share));
    assertThat(coupling("foil-across.yaml")).isStrictlyBetween(parallel, planes);
  }

  @Test
  void a_plate_inside_foam_lies_between_the_limits_of_hand_calculation() throws CaseException {
    double share = 1.0 / 300;
    double parallel =
        0.3 * ((1 - share) / (0.17 + 0.1 / 0.038) + share / (0.17 + 0.06 / 0.038 + 0.04 / 380));
    double planes = 0.3 / (0.17 + 0.06 / 0.038 + 0.04 / (0.038 * (1 - share) + 380 * share));
    assertThat(coupling("metal-in-foam.yaml")).isStrictlyBetween(parallel, planes);
  }

  private static double coupling(String name) throws CaseException {
    return solved(name).couplings().get(0).valueWPerMK().value();
  }

  @Test
  void a_closed_hairline_is_said_with_place_and_width() throws CaseException {
    assertThat(solved("hairline.yaml").warnings())
        .anyMatch(w -> w.contains("0.0005 mm") && w.contains("closed"));
  }
}
