package coldseam.cli.text;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Writes numbers with no digit that is not known. The decimal sign is a point everywhere. */
public final class Digits {
  /** Decimals of a number that is known exactly. */
  private static final int MOST = 15;

  private Digits() {}

  /**
   * A number and its half-width, both to the same decimal place.
   *
   * @param value the number
   * @param halfWidth the half-width, rounded upwards so that it also covers the rounding of the
   *     number; "?" where there is none
   */
  public record Figure(String value, String halfWidth) {
    /** Both in one: {@code 0.612 ± 0.003}. */
    public String text() {
      return value + " ± " + halfWidth;
    }
  }

  /**
   * Writes a number down to the first digit that its half-width reaches, and no further.
   *
   * @param value the number
   * @param halfWidth how far it may be off, same unit; infinite or NaN if nobody knows
   * @param mostDecimals decimals never to exceed, however small the half-width
   * @return the figure; "∞" for an infinite number, three significant digits where the half-width
   *     is not known
   */
  public static Figure of(double value, double halfWidth, int mostDecimals) {
    if (!Double.isFinite(value)) {
      return new Figure(Double.isNaN(value) ? "–" : value > 0 ? "∞" : "−∞", "?");
    }
    if (!Double.isFinite(halfWidth)) {
      return new Figure(significant(value, 3), "?");
    }
    BigDecimal exact = BigDecimal.valueOf(value);
    BigDecimal width = BigDecimal.valueOf(Math.abs(halfWidth));
    int decimals = Math.min(decimals(halfWidth), mostDecimals);
    return covering(exact, exact.subtract(width), exact.add(width), decimals);
  }

  /**
   * Writes a number between two bounds, so that number ± half-width as written covers both bounds.
   *
   * @param value the number
   * @param lower lower bound, not above it
   * @param upper upper bound, not below it
   * @param mostDecimals decimals never to exceed
   * @return the figure
   */
  public static Figure between(double value, double lower, double upper, int mostDecimals) {
    double halfWidth = Math.max(upper - value, value - lower);
    if (!Double.isFinite(value) || !Double.isFinite(halfWidth)) {
      return of(value, halfWidth, mostDecimals);
    }
    return covering(
        BigDecimal.valueOf(value),
        BigDecimal.valueOf(lower),
        BigDecimal.valueOf(upper),
        Math.min(decimals(halfWidth), mostDecimals));
  }

  private static Figure covering(
      BigDecimal exact, BigDecimal lower, BigDecimal upper, int decimals) {
    BigDecimal rounded = exact.setScale(decimals, RoundingMode.HALF_EVEN);
    BigDecimal width =
        upper
            .subtract(rounded)
            .max(rounded.subtract(lower))
            .setScale(decimals, RoundingMode.CEILING);
    return new Figure(plain(rounded), plain(width));
  }

  /**
   * Decimals whose last one is the first that a half-width reaches: 2 for 0.05, 0 for 7; less than
   * 0 for a half-width of 10 or more.
   *
   * @param halfWidth a half-width or tolerance
   * @return how many decimals say something
   */
  public static int decimals(double halfWidth) {
    if (!Double.isFinite(halfWidth)) {
      return 0;
    }
    if (halfWidth == 0) {
      return MOST;
    }
    BigDecimal one =
        BigDecimal.valueOf(Math.abs(halfWidth)).round(new MathContext(1, RoundingMode.CEILING));
    return one.stripTrailingZeros().scale();
  }

  /**
   * Writes a number with a fixed count of decimals, never as minus zero.
   *
   * @param value the number
   * @param decimals how many
   * @return the text; "∞" or "–" where it is not finite
   */
  public static String fixed(double value, int decimals) {
    if (!Double.isFinite(value)) {
      return Double.isNaN(value) ? "–" : value > 0 ? "∞" : "−∞";
    }
    return plain(BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_EVEN));
  }

  /**
   * Writes a number with a count of significant digits and no exponent.
   *
   * @param value the number
   * @param digits how many, 1 or more
   * @return the text
   */
  public static String significant(double value, int digits) {
    if (!Double.isFinite(value) || value == 0) {
      return fixed(value, 0);
    }
    return plain(BigDecimal.valueOf(value).round(new MathContext(digits, RoundingMode.HALF_EVEN)));
  }

  /**
   * Writes a half-width, rounded upwards.
   *
   * @param value the half-width, 0 or more
   * @param digits significant digits
   * @param mostDecimals decimals never to exceed
   * @return the text
   */
  public static String outward(double value, int digits, int mostDecimals) {
    if (!Double.isFinite(value) || value == 0) {
      return fixed(value, 0);
    }
    BigDecimal rounded =
        BigDecimal.valueOf(value).round(new MathContext(digits, RoundingMode.CEILING));
    return plain(
        rounded.scale() > mostDecimals
            ? rounded.setScale(mostDecimals, RoundingMode.CEILING)
            : rounded);
  }

  /**
   * Writes an input figure as short as it is: up to a count of decimals, no trailing zeros.
   *
   * @param value the number
   * @param mostDecimals decimals at most
   * @return the text
   */
  public static String shortest(double value, int mostDecimals) {
    if (!Double.isFinite(value)) {
      return fixed(value, 0);
    }
    BigDecimal rounded = BigDecimal.valueOf(value).setScale(mostDecimals, RoundingMode.HALF_EVEN);
    return rounded.signum() == 0 ? "0" : plain(rounded.stripTrailingZeros());
  }

  /**
   * Writes a whole number with a comma between thousands.
   *
   * @param count the number, 0 or more
   * @return the text
   */
  public static String grouped(int count) {
    StringBuilder text = new StringBuilder(Integer.toString(count));
    for (int at = text.length() - 3; at > 0; at -= 3) {
      text.insert(at, ',');
    }
    return text.toString();
  }

  /**
   * Writes a very small number as a power of ten: {@code 3e-14}.
   *
   * @param value the number, 0 or more
   * @return the text, one significant digit
   */
  public static String magnitude(double value) {
    if (!Double.isFinite(value) || value == 0) {
      return fixed(value, 0);
    }
    BigDecimal one = BigDecimal.valueOf(value).round(new MathContext(1, RoundingMode.CEILING));
    int exponent = one.precision() - one.scale() - 1;
    return one.unscaledValue().toString().charAt(value < 0 ? 1 : 0) + "e" + exponent;
  }

  /**
   * A written number with its sign in front, plus as well as minus; zero has none.
   *
   * @param number as the other methods write it
   * @return the text
   */
  public static String signed(String number) {
    if (number.startsWith("−")) {
      return number;
    }
    for (int i = 0; i < number.length(); i++) {
      char c = number.charAt(i);
      if (c >= '1' && c <= '9' || c == '∞') {
        return "+" + number;
      }
    }
    return number;
  }

  private static String plain(BigDecimal number) {
    String text = number.abs().toPlainString();
    return number.signum() < 0 ? "−" + text : text;
  }
}
