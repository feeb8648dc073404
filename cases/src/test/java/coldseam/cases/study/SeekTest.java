package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.cases.Case;
import coldseam.cases.CaseFile;
import coldseam.cases.Changes;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Answers against the exact ones of a plain wall, and of a balcony by solving them again. */
class SeekTest {
  @TempDir Path dir;
  private Case wall;

  @BeforeEach
  void read() throws Exception {
    wall = Wall.in(dir);
  }

  private Seek.Outcome seek(String set, String until, String step, boolean largest)
      throws Exception {
    return seek(wall, set, until, step, largest);
  }

  private static Seek.Outcome seek(
      Case from, String set, String until, String step, boolean largest) throws Exception {
    Target target = Target.read(until);
    Optional<String> stated = step.isEmpty() ? Optional.empty() : Optional.of(step);
    Seek.Outcome outcome =
        Seek.of(
                from,
                Optional.empty(),
                set,
                stated,
                largest,
                target,
                from.accuracy(),
                Wall.solves(from))
            .run();
    assertThat(outcome.solves()).hasSizeLessThanOrEqualTo(Seek.MOST_SOLVES);
    if (outcome.ending() == Seek.Ending.FOUND) {
      assertThat(target.met(outcome.answer().get().measure())).isTrue();
      assertThat(target.met(outcome.before().get().measure())).isFalse();
    }
    return outcome;
  }

  /** U ≤ 0.3: R ≥ 1/0.3, thickness ≥ 40 (1/0.3 − 0.17) = 126.533… mm (ISO 6946, computed). */
  @Test
  void the_smallest_whole_millimetre() throws Exception {
    Seek.Outcome outcome = seek("thickness=50..300", "U <= 0.3", "1", false);
    assertThat(outcome.ending()).isEqualTo(Seek.Ending.FOUND);
    assertThat(outcome.answer().get().setting()).isEqualTo("127");
    assertThat(outcome.before().get().setting()).isEqualTo("126");
    assertThat(outcome.adjacent()).isTrue();
    assertThat(outcome.monotone()).isTrue();
  }

  /** The same limit in the units of US practice: 0.3 W/(m²·K) = 0.052833… Btu/(h·ft²·°F). */
  @Test
  void a_limit_may_have_a_unit_and_so_may_the_range() throws Exception {
    Seek.Outcome outcome =
        seek(
            "thickness=2..12 in",
            "U <= 0.05283323 Btu/(h ft2 F)",
            "1/8 in".replace("1/8", "0.125"),
            false);
    // 126.533 mm are 4.98 in.
    assertThat(outcome.answer().get().setting()).isEqualTo("5 in");
  }

  @Test
  void random_limits_are_met_by_the_first_step_that_can() throws Exception {
    Random random = new Random(11);
    for (int trial = 0; trial < 40; trial++) {
      double limit = 0.15 + 0.5 * random.nextDouble();
      double exact = 1000 * Wall.LAMBDA * (1 / limit - Wall.FILMS);
      Seek.Outcome outcome = seek("thickness=40..290", "U <= " + limit, "1", false);
      String expected = Integer.toString((int) Math.ceil(exact));
      assertThat(outcome.answer().get().setting()).as("U ≤ %s", limit).isEqualTo(expected);
      assertThat(outcome.adjacent()).isTrue();
    }
  }

  /** U = 0.5 exactly at 73.2 mm: no interval can tell, so the next step is the answer. */
  @Test
  void what_cannot_be_decided_is_not_met() throws Exception {
    Seek.Outcome outcome = seek("thickness=50..100", "U <= 0.5", "0.2", false);
    assertThat(Double.parseDouble(outcome.answer().get().setting())).isIn(73.2, 73.4);
    if (outcome.answer().get().setting().equals("73.4")) {
      assertThat(outcome.before().get().measure().lower()).isLessThanOrEqualTo(0.5);
      assertThat(outcome.before().get().measure().upper()).isGreaterThan(0.5);
    }
  }

  /** f_Rsi = 1 − 0.13/R ≥ 0.95 + 0.01 K/25 K: R ≥ 0.13/0.0496, thickness ≥ 98.04 mm (computed). */
  @Test
  void the_temperature_factor_keeps_its_margin() throws Exception {
    Seek.Outcome outcome = seek("thickness=50..150", "fRsi.indoors >= 0.95", "1", false);
    assertThat(outcome.answer().get().setting()).isEqualTo("99");
    assertThat(outcome.answer().get().measure().knowledge()).isEqualTo(Measure.Knowledge.ESTIMATE);
    // Without the margin 97.2 mm would do.
    assertThat(seek("thickness=50..150", "fRsi >= 0.95", "1", false).answer().get().setting())
        .isEqualTo("99");
  }

  /** U ≥ 0.5 up to 73.2 mm. */
  @Test
  void the_largest_value_is_sought_from_the_other_end() throws Exception {
    Seek.Outcome outcome = seek("thickness=50..300", "U >= 0.5", "1", true);
    assertThat(outcome.answer().get().setting()).isEqualTo("73");
    assertThat(outcome.before().get().setting()).isEqualTo("74");
  }

  @Test
  void an_end_that_meets_it_is_the_answer_after_one_solve() throws Exception {
    Seek.Outcome outcome = seek("thickness=200..300", "U <= 0.3", "", false);
    assertThat(outcome.ending()).isEqualTo(Seek.Ending.MET_AT_END);
    assertThat(outcome.answer().get().setting()).isEqualTo("200");
    assertThat(outcome.solves()).hasSize(1);
  }

  @Test
  void no_value_meets_what_none_can() throws Exception {
    Seek.Outcome outcome = seek("thickness=50..100", "U <= 0.3", "", false);
    assertThat(outcome.ending()).isEqualTo(Seek.Ending.NONE);
    assertThat(outcome.answer()).isEmpty();
  }

  /** λ falls to 0.02 at 150 and rises again: both ends miss what the middle meets. */
  @Test
  void what_does_not_rise_or_fall_throughout_is_told() throws Exception {
    String text =
        Wall.TEXT.replace(
            "{conductivity: lambda}", "{conductivity: 0.02 + abs(lambda - 150) / 1000}");
    Case strange = Wall.in(dir, text.replace("lambda: 0.04", "lambda: 150"));
    Seek.Outcome outcome = seek(strange, "lambda=100..200", "U <= 0.3", "1", false);
    assertThat(outcome.ending()).isEqualTo(Seek.Ending.FOUND);
    assertThat(outcome.monotone()).isFalse();
    // U ≤ 0.3 needs λ ≤ 0.1 / (1/0.3 − 0.17) = 0.03161 (computed), so from 138.4 on.
    assertThat(outcome.answer().get().setting()).isEqualTo("139");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "thickness=50..100   | U < 0.3        |       | compares nothing",
        "thickness=50..100   | V <= 0.3       |       | is none of",
        "thickness=50..100   | Psi <= 0.3     |       | did you mean psi?",
        "thickness=50..100   | U <= warm      |       | is no number in W/(m²·K)",
        "thickness=50..100   | U <= 20 C      |       | is no number in W/(m²·K)",
        "thickness=50..100   | U.roof <= 0.3  |       | there is U.wall",
        "thickness=50..100   | psi <= 0.3     |       | has no psi",
        "thicknes=50..100    | U <= 0.3       |       | did you mean",
        "thickness=50..50    | U <= 0.3       |       | begins where it ends",
        "thickness=50..100/5 | U <= 0.3       |       | has a count of steps",
        "thickness           | U <= 0.3       |       | sets nothing",
        "thickness=50..100   | U <= 0.3       | 0     | a number above 0",
        "thickness=50..100   | U <= 0.3       | 0.01  | at most 1024",
      })
  void what_cannot_be_meant_is_refused(String set, String until, String step, String why) {
    assertThatThrownBy(() -> seek(set, until, step == null ? "" : step, false))
        .isInstanceOf(StudyException.class)
        .hasMessageContaining(why);
  }

  /** The balcony has three ψ; the answer, solved again by itself, meets the target. */
  @Test
  void a_balcony_with_a_thermal_break() throws Exception {
    Case balcony = CaseFile.read(Path.of("demo/balcony.yaml"));
    Optional<String> variant = Optional.of("thermal break");
    Seek.Solves solves =
        (changes, accuracy) ->
            Solver.solve(balcony.detail(variant, changes), accuracy, Progress.SILENT);
    Target ambiguous = Target.read("psi <= 0.1");
    assertThatThrownBy(
            () ->
                Seek.of(
                        balcony,
                        variant,
                        "insulation=100..300",
                        Optional.empty(),
                        false,
                        ambiguous,
                        balcony.accuracy(),
                        solves)
                    .run())
        .isInstanceOf(StudyException.class)
        .hasMessageContaining("psi.internal, psi.overall internal, psi.external");

    Target target = Target.read("psi.external <= 0.10");
    Seek.Outcome outcome =
        Seek.of(
                balcony,
                variant,
                "insulation=100..300",
                Optional.empty(),
                false,
                target,
                balcony.accuracy(),
                solves)
            .run();
    assertThat(outcome.ending()).isEqualTo(Seek.Ending.FOUND);
    assertThat(outcome.adjacent()).isTrue();
    assertThat(outcome.solves()).hasSizeLessThanOrEqualTo(12);
    Seek.Solve answer = outcome.answer().get();
    Result again =
        solves.of(new Changes(Map.of("insulation", answer.setting()), Map.of()), answer.accuracy());
    assertThat(target.met(target.in(again))).isTrue();
    // A solve ten times more accurate agrees on both sides.
    Accuracy fine = new Accuracy(2e-5, 1e-4, answer.accuracy().psiWPerMK() / 10, 2e-5, 2_000_000);
    for (Seek.Solve side : new Seek.Solve[] {answer, outcome.before().get()}) {
      Result finer = solves.of(new Changes(Map.of("insulation", side.setting()), Map.of()), fine);
      assertThat(target.met(target.in(finer))).isEqualTo(side == answer);
    }
  }
}
