package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** A target is met by the whole of an interval, missed by the whole of it, or undecided. */
class TargetTest {
  private static Measure between(double lower, double upper, Measure.Knowledge knowledge) {
    return new Measure(Measure.Kind.PSI, "a", (lower + upper) / 2, lower, upper, knowledge);
  }

  private static String decided(Target target, Measure measure) {
    return target.met(measure) ? "met" : target.missed(measure) ? "missed" : "open";
  }

  @Test
  void intervals_decide() throws StudyException {
    Target most = Target.read("psi.a <= 0.1");
    Target least = Target.read("psi.a≥0.1");
    double[][] ends = {{0.08, 0.09}, {0.08, 0.1}, {0.08, 0.11}, {0.1, 0.12}, {0.11, 0.12}};
    String[] ofMost = {"met", "met", "open", "open", "missed"};
    String[] ofLeast = {"missed", "open", "open", "met", "met"};
    for (int i = 0; i < ends.length; i++) {
      Measure measure = between(ends[i][0], ends[i][1], Measure.Knowledge.CERTIFIED);
      assertThat(decided(most, measure)).as("≤, %d", i).isEqualTo(ofMost[i]);
      assertThat(decided(least, measure)).as("≥, %d", i).isEqualTo(ofLeast[i]);
    }
  }

  /**
   * An estimate meets a target with its margin or not at all; what is not proved decides nothing.
   */
  @Test
  void estimates_need_their_margin() throws StudyException {
    Target least = Target.read("psi.a >= 0.1");
    assertThat(decided(least, between(0.09, 0.12, Measure.Knowledge.ESTIMATE))).isEqualTo("missed");
    assertThat(decided(least, between(0.1, 0.12, Measure.Knowledge.ESTIMATE))).isEqualTo("met");
    Measure open =
        new Measure(
            Measure.Kind.PSI,
            "a",
            0.5,
            Double.NEGATIVE_INFINITY,
            Double.POSITIVE_INFINITY,
            Measure.Knowledge.OPEN);
    assertThat(decided(least, open)).isEqualTo("open");
  }
}
