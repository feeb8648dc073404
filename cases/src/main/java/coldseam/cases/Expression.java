package coldseam.cases;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Arithmetic on numbers, units and named values: {@code + - * / ^ ( )}, min, max, abs, sqrt, sin,
 * cos, tan (angles in degrees) and pi. Dimensions are carried along, so that a length cannot be
 * added to a conductivity; beside a length a bare number counts in the unit of the case.
 */
final class Expression {
  static final List<String> FUNCTIONS =
      List.of("min", "max", "abs", "sqrt", "sin", "cos", "tan", "pi");

  /** Powers of quantities beyond this make no sense in any unit. */
  private static final int HIGHEST_POWER = 6;

  private final String text;
  private final NamedValues values;
  private final Arithmetic arithmetic;
  private int at;

  /**
   * Prepares a text.
   *
   * @param text not empty, without white space around it
   * @param values the named values
   * @param unit what bare numbers beside lengths count in
   */
  Expression(String text, NamedValues values, LengthUnit unit) {
    this.text = text;
    this.values = values;
    this.arithmetic = new Arithmetic(unit);
  }

  /**
   * Evaluates the text.
   *
   * @return its value; {@link Value#UNKNOWN} if it uses a value with a mistake
   * @throws Mistake if the text is no expression or mixes quantities
   */
  Value value() throws Mistake {
    Value value = sum();
    if (at < text.length()) {
      throw unexpected();
    }
    return value;
  }

  private Value sum() throws Mistake {
    Value left = product();
    for (char c = next(); c == '+' || c == '-' || c == '−'; c = next()) {
      int sign = at++;
      left = arithmetic.add(left, product(), c == '+' ? 1 : -1, sign);
    }
    return left;
  }

  private Value product() throws Mistake {
    Value left = signed();
    for (char c = next(); c == '*' || c == '/' || c == '·' || c == '×'; c = next()) {
      int sign = at++;
      left = arithmetic.multiply(left, signed(), c == '/' ? -1 : 1, sign);
    }
    return left;
  }

  private Value signed() throws Mistake {
    char c = next();
    if (c != '-' && c != '+' && c != '−') {
      return power(primary());
    }
    at++;
    if (c != '+' && startsNumber(next())) {
      Literal literal = new Literal(text, at, values);
      at = literal.end();
      // −4 °F is not the negative of 4 °F: the sign belongs to the number, not to the temperature.
      return literal.hasScale()
          ? power(literal.value(-1))
          : arithmetic.negative(power(literal.value(1)));
    }
    values.deeper(at);
    Value value = signed();
    values.shallower();
    return c == '+' ? value : arithmetic.negative(value);
  }

  private Value power(Value base) throws Mistake {
    if (next() != '^') {
      return base;
    }
    int sign = at++;
    values.deeper(at);
    Value exponent = signed();
    values.shallower();
    if (base.unknown() || exponent.unknown()) {
      return Value.UNKNOWN;
    }
    if (!exponent.dimension().bare()) {
      throw new Mistake(
          "an exponent is " + exponent.dimension().inWords(), "it is a plain number", sign);
    }
    double n = exponent.number();
    if (base.dimension().bare()) {
      return Value.bare(real(Math.pow(base.number(), n), sign));
    }
    if (n != Math.rint(n) || Math.abs(n) > HIGHEST_POWER) {
      throw new Mistake(
          "a quantity with a unit is raised to the power " + Figures.of(n),
          "take whole powers, or leave the unit away",
          sign);
    }
    return new Value(Math.pow(base.number(), n), base.dimension().power((int) n));
  }

  private Value primary() throws Mistake {
    char c = next();
    if (c == '(') {
      at++;
      values.deeper(at);
      Value value = sum();
      values.shallower();
      close();
      return value;
    }
    if (startsNumber(c)) {
      Literal literal = new Literal(text, at, values);
      at = literal.end();
      return literal.value(1);
    }
    if (Character.isLetter(c) || c == '_') {
      return named();
    }
    throw unexpected();
  }

  private Value named() throws Mistake {
    int from = at;
    String known = values.longestAt(text, from);
    if (!known.isEmpty()) {
      at = from + known.length();
      return values.of(known);
    }
    at = NamedValues.wordEnd(text, from);
    String name = text.substring(from, at);
    if (name.equals("pi")) {
      return Value.bare(Math.PI);
    }
    if (FUNCTIONS.contains(name) && next() == '(') {
      return function(name, from);
    }
    Optional<Literal> resistance = Literal.ratedResistance(text, from, values);
    if (resistance.isPresent()) {
      at = resistance.get().end();
      return resistance.get().value(1);
    }
    throw unknown(name, from);
  }

  private Value function(String name, int from) throws Mistake {
    List<Value> arguments = new ArrayList<>();
    do {
      at++;
      values.deeper(at);
      arguments.add(sum());
      values.shallower();
    } while (next() == ',' || next() == ';');
    close();
    boolean several = name.equals("min") || name.equals("max");
    if (!several && arguments.size() != 1) {
      throw new Mistake(
          "`" + name + "` takes one number, not " + arguments.size(),
          "numbers have a decimal point, not a comma",
          from);
    }
    Value first = arguments.get(0);
    if (several) {
      for (Value argument : arguments) {
        first = arithmetic.extreme(first, argument, name.equals("min"), from);
      }
      return first;
    }
    return first.unknown() ? first : arithmetic.function(name, first, from);
  }

  private static double real(double number, int index) throws Mistake {
    if (Double.isNaN(number)) {
      throw new Mistake("this power has no value", "a negative number needs a whole power", index);
    }
    return number;
  }

  private void close() throws Mistake {
    if (next() != ')') {
      throw at < text.length()
          ? unexpected()
          : new Mistake("a bracket is not closed", "add `)`", text.length());
    }
    at++;
  }

  /** The next character that is not blank, 0 at the end. */
  private char next() {
    while (at < text.length() && Character.isWhitespace(text.charAt(at))) {
      at++;
    }
    return at < text.length() ? text.charAt(at) : 0;
  }

  private boolean startsNumber(char c) {
    boolean point = c == '.' && at + 1 < text.length() && Character.isDigit(text.charAt(at + 1));
    return (c >= '0' && c <= '9') || point;
  }

  private Mistake unexpected() {
    if (at >= text.length()) {
      return new Mistake("something is missing at the end", "end with a number", text.length());
    }
    char c = text.charAt(at);
    if (c == ',') {
      return new Mistake("a comma does not belong here", "numbers have a decimal point", at);
    }
    if (c == '.') {
      return notFinite(text.substring(at), at);
    }
    if (Character.isLetter(c) || c == '°') {
      int end = at + 1;
      while (end < text.length() && Character.isLetter(text.charAt(end))) {
        end++;
      }
      String word = text.substring(at, end);
      return new Mistake(
          "`" + Node.shortened(word) + "` is no unit known here",
          "units are " + Literal.EXAMPLES + "; between two numbers stands one of + - * / ^",
          at);
    }
    int end = text.offsetByCodePoints(at, 1);
    return new Mistake(
        "`" + text.substring(at, end) + "` does not belong here",
        "write a number, a value's name, or arithmetic on them",
        at);
  }

  private Mistake unknown(String first, int from) {
    String name = first;
    String lower = name.toLowerCase(java.util.Locale.ROOT);
    if (lower.equals("nan") || lower.equals("inf") || lower.equals("infinity")) {
      return notFinite(name, from);
    }
    List<String> valid = new ArrayList<>(values.names());
    valid.addAll(FUNCTIONS);
    int end = from + name.length();
    while (end + 1 < text.length()
        && text.charAt(end) == ' '
        && NamedValues.wordEnd(text, end + 1) > end + 1) {
      end = NamedValues.wordEnd(text, end + 1);
    }
    name = text.substring(from, end);
    String right = Problems.suggestion(name, valid);
    if (!right.startsWith("did")) {
      right = "define it under `values`, or write a number";
    }
    return new Mistake("`" + Node.shortened(name) + "` is no named value", right, from);
  }

  private static Mistake notFinite(String word, int from) {
    return new Mistake(
        "`" + Node.shortened(word) + "` is not a number to count with",
        "write a finite number",
        from);
  }
}
