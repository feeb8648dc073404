package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/** Numbers as the plots write them. */
final class Figures {
  private static final char MINUS = '\u2212';

  private Figures() {}

  static String temperature(double celsius) {
    return fixed(celsius, 1) + " °C";
  }

  /** A temperature of as few decimals as it has, for steps and spaces: 20, −5, 12.5. */
  static String plain(double value) {
    return value == Math.rint(value) ? fixed(value, 0) : trimmed(fixed(value, 2));
  }

  static String fixed(double value, int decimals) {
    if (!Double.isFinite(value)) {
      return Double.isNaN(value) ? "unknown" : value > 0 ? "infinite" : MINUS + "infinite";
    }
    BigDecimal rounded = BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_UP);
    return signed(rounded.toPlainString(), rounded.signum() == 0);
  }

  /** A number of so many significant digits, trailing zeros kept. */
  static String significant(double value, int digits) {
    if (!Double.isFinite(value) || value == 0) {
      return fixed(value, 0);
    }
    BigDecimal rounded =
        BigDecimal.valueOf(value).round(new MathContext(digits, RoundingMode.HALF_UP));
    int decimals = Math.max(0, digits - rounded.precision() + rounded.scale());
    return signed(rounded.setScale(decimals, RoundingMode.HALF_UP).toPlainString(), false);
  }

  /** A conductivity or resistance: the digits it was typed with, four at most. */
  static String quantity(double value) {
    if (!Double.isFinite(value) || value == 0) {
      return fixed(value, 0);
    }
    return signed(
        BigDecimal.valueOf(value)
            .round(new MathContext(4, RoundingMode.HALF_UP))
            .stripTrailingZeros()
            .toPlainString(),
        false);
  }

  /** A length in the unit of the case, without the unit's name. */
  static String length(double metres, Caption caption) {
    double value = metres / caption.metresPerUnit();
    int decimals = (int) Math.max(0, Math.round(Math.log10(caption.metresPerUnit()) + 4));
    return trimmed(fixed(value, Math.min(4, decimals)));
  }

  static String percent(double share) {
    return String.format(Locale.ROOT, "%.0f %%", 100 * share);
  }

  private static String signed(String text, boolean zero) {
    return text.startsWith("-") ? (zero ? text.substring(1) : MINUS + text.substring(1)) : text;
  }

  private static String trimmed(String text) {
    return text.contains(".") ? text.replaceAll("0+$", "").replaceAll("\\.$", "") : text;
  }
}
