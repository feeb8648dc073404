package coldseam.cli;

import coldseam.cases.study.Measure;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.cli.text.Digits;

/** Numbers of studies as they are printed. */
final class StudyFigures {
  /** No length or coefficient of the trade has more decimals. */
  private static final int MOST_DECIMALS = 7;

  private StudyFigures() {}

  /** Number ± half-width, to the digits that hold. */
  static String of(Measure measure) {
    return measure.knowledge() == Knowledge.OPEN
        ? "not certified"
        : Digits.between(measure.value(), measure.lower(), measure.upper(), MOST_DECIMALS).text();
  }
}
