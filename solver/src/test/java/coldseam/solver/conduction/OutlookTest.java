package coldseam.solver.conduction;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class OutlookTest {
  @Test
  void theBestRateIsWorthGoingOn() {
    Outlook outlook = new Outlook(2_000_000);
    double reached = 1e4;
    for (int unknowns = 1000; unknowns < 90_000; unknowns *= 2) {
      assertThat(outlook.worthwhile(unknowns, reached)).isTrue();
      reached /= 4;
    }
  }

  @Test
  void aPoorRateIsGivenUpOnceItIsNoLongerQuick() {
    Outlook outlook = new Outlook(2_000_000);
    assertThat(outlook.worthwhile(1_000, 3e4)).isTrue();
    assertThat(outlook.worthwhile(3_000, 2e4)).isTrue();
    assertThat(outlook.worthwhile(9_000, 1.4e4)).isTrue();
    assertThat(outlook.worthwhile(27_000, 1e4)).isFalse();
  }

  @Test
  void onePassWithoutGainIsForgiven() {
    Outlook outlook = new Outlook(2_000_000);
    assertThat(outlook.worthwhile(20_000, 50)).isTrue();
    assertThat(outlook.worthwhile(40_000, 60)).isTrue();
    assertThat(outlook.worthwhile(60_000, 10)).isTrue();
    assertThat(outlook.worthwhile(80_000, 12)).isTrue();
  }

  @Test
  void theCapOnUnknownsCounts() {
    Outlook outlook = new Outlook(50_000);
    assertThat(outlook.worthwhile(10_000, 1000)).isTrue();
    assertThat(outlook.worthwhile(20_000, 250)).isTrue();
    assertThat(outlook.worthwhile(40_000, 62)).isFalse();
  }
}
