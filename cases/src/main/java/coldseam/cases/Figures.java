package coldseam.cases;

import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers as they stand in messages and assumptions: six significant digits, no power of ten. */
final class Figures {
  private Figures() {}

  static String of(double number) {
    if (!Double.isFinite(number)) {
      return Double.toString(number);
    }
    BigDecimal rounded = new BigDecimal(number).round(new MathContext(6));
    if (rounded.signum() == 0) {
      return "0";
    }
    double size = Math.abs(number);
    if (size >= 1e12 || size < 1e-9) {
      return rounded.stripTrailingZeros().toString();
    }
    return rounded.stripTrailingZeros().toPlainString();
  }
}
