package coldseam.cases.study;

import java.math.BigDecimal;
import java.util.Optional;

/**
 * Two ends of a value, in one unit.
 *
 * @param from the one
 * @param to the other
 * @param unit written after both; empty for bare numbers
 */
record Range(BigDecimal from, BigDecimal to, String unit) {
  /** Numbers longer than this are no lengths or conductivities. */
  private static final int LONGEST = 40;

  /** Exponents beyond this are none either. */
  private static final int MOST_SCALE = 30;

  /**
   * Reads {@code from..to}, with a unit after one or both.
   *
   * @param name of the value
   * @param typed as typed
   * @return the range, ends in the order typed
   * @throws StudyException if it cannot be understood
   */
  static Range read(String name, String typed) throws StudyException {
    int dots = typed.indexOf("..");
    String first = dots < 0 ? "" : typed.substring(0, dots).strip();
    String second = dots < 0 ? "" : typed.substring(dots + 2).strip();
    int firstEnd = numberEnd(first);
    int secondEnd = numberEnd(second);
    Optional<BigDecimal> from = number(first.substring(0, firstEnd));
    Optional<BigDecimal> to = number(second.substring(0, secondEnd));
    if (from.isEmpty() || to.isEmpty()) {
      throw new StudyException(
          "\""
              + typed.strip()
              + "\" is no range of "
              + name
              + "; write two numbers, e.g. "
              + name
              + "=100..200, in one unit if need be: 4..8 in");
    }
    String firstUnit = first.substring(firstEnd).strip();
    String secondUnit = second.substring(secondEnd).strip();
    if (!firstUnit.isEmpty() && !firstUnit.equals(secondUnit)) {
      throw new StudyException(
          "\"" + typed.strip() + "\" has two units; write both ends of " + name + " in one");
    }
    return new Range(from.get(), to.get(), secondUnit);
  }

  /** Where the number ends that a text begins with. */
  private static int numberEnd(String text) {
    int end = 0;
    while (end < text.length()) {
      char c = text.charAt(end);
      boolean sign = (c == '-' || c == '+') && (end == 0 || isExponent(text, end - 1));
      boolean exponent = isExponent(text, end) && end > 0 && digitAfter(text, end + 1);
      if (!(c >= '0' && c <= '9') && c != '.' && !sign && !exponent) {
        break;
      }
      end++;
    }
    return end;
  }

  private static boolean isExponent(String text, int at) {
    return text.charAt(at) == 'e' || text.charAt(at) == 'E';
  }

  private static boolean digitAfter(String text, int at) {
    int digit = at < text.length() && "+-".indexOf(text.charAt(at)) >= 0 ? at + 1 : at;
    return digit < text.length() && text.charAt(digit) >= '0' && text.charAt(digit) <= '9';
  }

  /** A number, if a text is one. */
  static Optional<BigDecimal> number(String text) {
    if (text.isEmpty() || text.length() > LONGEST) {
      return Optional.empty();
    }
    try {
      BigDecimal number = new BigDecimal(text);
      return Math.abs((long) number.scale()) > MOST_SCALE ? Optional.empty() : Optional.of(number);
    } catch (NumberFormatException e) {
      return Optional.empty();
    }
  }

  /** A number of this range as it is written in a case. */
  String written(BigDecimal number) {
    return plain(number) + (unit.isEmpty() ? "" : " " + unit);
  }

  static String plain(BigDecimal number) {
    return number.signum() == 0 ? "0" : number.stripTrailingZeros().toPlainString();
  }
}
