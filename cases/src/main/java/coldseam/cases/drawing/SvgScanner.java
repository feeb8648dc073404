package coldseam.cases.drawing;

/** Goes through the numbers and words of an attribute. */
final class SvgScanner {
  private final String what;
  private final String text;
  private final int line;
  private int at;

  SvgScanner(String what, String text, int line) {
    this.what = what;
    this.text = text;
    this.line = line;
  }

  DrawingException wrong(String wanted) {
    String rest =
        at >= text.length() ? "the end" : "`" + DxfGroups.shortened(text.substring(at)) + "`";
    return new DrawingException(
        line, wanted + " is due in " + what + ", character " + (at + 1) + ", not " + rest, "");
  }

  private static boolean blank(char c) {
    return c == ' ' || c == '\t' || c == '\n' || c == '\r' || c == '\f';
  }

  void skipBlank() {
    while (at < text.length() && blank(text.charAt(at))) {
      at++;
    }
  }

  /** Passes over white space with at most one comma in it. */
  void skipComma() {
    skipBlank();
    if (at < text.length() && text.charAt(at) == ',') {
      at++;
      skipBlank();
    }
  }

  boolean done() {
    skipBlank();
    return at >= text.length();
  }

  char peek() {
    return at < text.length() ? text.charAt(at) : '\0';
  }

  char take() {
    return text.charAt(at++);
  }

  boolean startsNumber() {
    char c = peek();
    return c >= '0' && c <= '9' || c == '-' || c == '+' || c == '.';
  }

  /** A number, and the comma after it. */
  double number() throws DrawingException {
    skipBlank();
    int from = at;
    if (peek() == '-' || peek() == '+') {
      at++;
    }
    int digits = digits();
    if (peek() == '.') {
      at++;
      digits += digits();
    }
    if (digits == 0) {
      at = from;
      throw wrong("a number");
    }
    if (peek() == 'e' || peek() == 'E') {
      int mantissa = at++;
      if (peek() == '-' || peek() == '+') {
        at++;
      }
      if (digits() == 0) {
        at = mantissa;
      }
    }
    double number = at - from > 400 ? Double.NaN : Double.parseDouble(text.substring(from, at));
    if (!(Math.abs(number) <= 1e300)) {
      at = from;
      throw wrong("a number within range");
    }
    skipComma();
    return number;
  }

  private int digits() {
    int from = at;
    while (peek() >= '0' && peek() <= '9') {
      at++;
    }
    return at - from;
  }

  /** 0 or 1, which may stand right before the next number. */
  boolean flag() throws DrawingException {
    skipBlank();
    char c = peek();
    if (c != '0' && c != '1') {
      throw wrong("0 or 1");
    }
    at++;
    skipComma();
    return c == '1';
  }

  /** Letters up to something else. */
  String word() {
    int from = at;
    while (Character.isLetter(peek()) || peek() == '%') {
      at++;
    }
    return text.substring(from, at);
  }
}
