package coldseam.solver.result;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Bracket;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Interval arithmetic: whatever the true values within their bounds, the sum lies within its. */
class TotalTest {
  private static final Certificate.NotCertified UNPROVED =
      new Certificate.NotCertified("unproved", 0.25);

  private static Quantity certified(double lower, double upper) {
    return new Quantity((lower + upper) / 2, new Certificate.Certified(lower, upper));
  }

  @Test
  void intervals_are_added_and_taken_off_outward() {
    Random random = new Random(7);
    for (int trial = 0; trial < 200; trial++) {
      double[] low = {random.nextDouble(), random.nextDouble(), random.nextDouble()};
      double[] high = {low[0] + random.nextDouble(), low[1] + random.nextDouble(), low[2] + 0.5};
      double factor = random.nextDouble() * 4 - 2;
      Quantity sum =
          new Total()
              .add(1, certified(low[0], high[0]))
              .add(factor, certified(low[1], high[1]))
              .subtract(new Bracket(low[2], high[2]))
              .quantity();
      Certificate.Certified proved = (Certificate.Certified) sum.certificate();
      double a = low[0] + random.nextDouble() * (high[0] - low[0]);
      double b = low[1] + random.nextDouble() * (high[1] - low[1]);
      double c = low[2] + random.nextDouble() * (high[2] - low[2]);
      assertThat(a + factor * b - c).isBetween(proved.lower() - 1e-12, proved.upper() + 1e-12);
      double width = high[0] - low[0] + Math.abs(factor) * (high[1] - low[1]) + 0.5;
      assertThat(proved.upper() - proved.lower()).isCloseTo(width, within(1e-12));
      assertThat(sum.value()).isCloseTo((proved.lower() + proved.upper()) / 2, within(1e-12));
    }
  }

  @Test
  void one_unproved_part_leaves_the_sum_unproved() {
    Quantity sum = new Total().add(2, new Quantity(3, UNPROVED)).add(1, certified(1, 3)).quantity();
    assertThat(sum.certified()).isFalse();
    assertThat(sum.value()).isEqualTo(8);
    assertThat(sum.halfWidth()).isEqualTo(1.5);
    assertThat(new Total().add(1, certified(1, 3)).uncertain("why").quantity().certified())
        .isFalse();
    assertThat(new Total().add(0, new Quantity(3, UNPROVED)).quantity().certified()).isTrue();
  }

  @Test
  void an_infinite_part_makes_the_sum_infinite_and_unproved() {
    Quantity infinite =
        new Quantity(
            Double.POSITIVE_INFINITY,
            new Certificate.NotCertified("they meet", Double.POSITIVE_INFINITY));
    Quantity sum = new Total().add(1, infinite).subtract(Bracket.of(1)).quantity();
    assertThat(sum.value()).isEqualTo(Double.POSITIVE_INFINITY);
    assertThat(sum.halfWidth()).isInfinite();
    assertThat(new Total().add(0, infinite).quantity().value()).isZero();
  }

  @Test
  void inverses_turn_the_interval_round() {
    Quantity inverse = Total.inverse(certified(2, 4));
    assertThat(inverse.certificate()).isEqualTo(new Certificate.Certified(0.25, 0.5));
    assertThat(inverse.value()).isBetween(0.25, 0.5);
    Quantity unproved = Total.inverse(new Quantity(2, UNPROVED));
    assertThat(unproved.value()).isEqualTo(0.5);
    assertThat(unproved.halfWidth()).isCloseTo(0.25 / 4, within(1e-12));
    assertThat(Total.inverse(certified(-1, 3)).certified()).isFalse();
    assertThat(Total.inverse(certified(-1, 3)).value()).isInfinite();
  }

  @Test
  void brackets_keep_their_order_when_scaled() {
    assertThat(Total.scaled(new Bracket(1, 2), -3)).isEqualTo(new Bracket(-6, -3));
    assertThat(Total.scaled(new Bracket(1, 2), 3)).isEqualTo(new Bracket(3, 6));
    assertThat(Total.bracket(certified(1, 2))).isEqualTo(new Bracket(1, 2));
    assertThat(Total.bracket(new Quantity(5, UNPROVED))).isEqualTo(Bracket.of(5));
  }
}
