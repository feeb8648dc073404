package coldseam.cases;

/** Tells plain decimal numbers from everything else without work. */
final class PlainNumber {
  private PlainNumber() {}

  /** Whether a text is a decimal number: sign, digits, point, power of ten. */
  static boolean is(String text) {
    int i = 0;
    if (i < text.length() && (text.charAt(i) == '-' || text.charAt(i) == '+')) {
      i++;
    }
    int end = end(text, i);
    return end > i && end == text.length();
  }

  /** Index behind the unsigned decimal number that begins at an index; the index if none does. */
  static int end(String text, int from) {
    int i = digits(text, from);
    int count = i - from;
    if (i < text.length() && text.charAt(i) == '.') {
      int fraction = digits(text, i + 1);
      count += fraction - i - 1;
      i = fraction;
    }
    if (count == 0) {
      return from;
    }
    if (i < text.length() && (text.charAt(i) == 'e' || text.charAt(i) == 'E')) {
      int power = i + 1;
      if (power < text.length() && (text.charAt(power) == '-' || text.charAt(power) == '+')) {
        power++;
      }
      int stop = digits(text, power);
      return stop > power ? stop : i;
    }
    return i;
  }

  /** Index behind the digits that begin at an index. */
  static int digits(String text, int from) {
    int i = from;
    while (i < text.length() && text.charAt(i) >= '0' && text.charAt(i) <= '9') {
      i++;
    }
    return i;
  }
}
