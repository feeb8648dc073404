package coldseam.cases;

import java.util.Optional;

/**
 * A number with or without a unit, as the trade writes it: {@code 160 mm}, {@code 1'-4 5/8"},
 * {@code 5/8 in}, {@code 5 ft 4 in}, {@code 33 mil}, {@code 68 F}, {@code R-13}.
 */
final class Literal {
  static final String EXAMPLES =
      "`mm`, `cm`, `m`, `in`, `ft`, `mil`, `W/(m K)`, `m2 K/W`, `W/(m2 K)`, `Btu in/(h ft2 F)`,"
          + " `h ft2 F/Btu`, `C`, `F`, `K`, `deg` and `%`";

  private static final double INCH_M = 0.0254;

  private final String text;
  private int at;
  private double number;
  private Unit unit;

  /**
   * Reads the number that begins at an index.
   *
   * @param text the text
   * @param from where a digit or a decimal point stands
   * @param names the named values, which are no units
   * @throws Mistake if a power of ten runs out of range
   */
  Literal(String text, int from, NamedValues names) throws Mistake {
    this.text = text;
    this.at = from;
    readNumber();
    if (feetAndInches()) {
      return;
    }
    int blanks = skipBlanks(at);
    unit = Unit.longestAt(text, blanks, names);
    if (unit != null) {
      at = unit.end();
      if (wordBetween(blanks, at).startsWith("f")) {
        addInches(at);
      }
    }
  }

  private Literal(String text, double number, int end) {
    this.text = text;
    this.number = number;
    this.at = end;
    this.unit = Unit.longestAt("h ft2 F/Btu", 0, (all, index) -> false);
  }

  /**
   * A resistance as rated in North America, such as R-13: h·ft²·°F/Btu.
   *
   * @param text the text
   * @param from where the R stands
   * @param names the named values; one called R is not meant as a rating
   * @return the resistance, or empty if none stands there
   */
  static Optional<Literal> ratedResistance(String text, int from, NamedValues names) {
    if (text.charAt(from) != 'R' || names.has("R")) {
      return Optional.empty();
    }
    int digits = from + 1;
    if (digits < text.length() && (text.charAt(digits) == '-' || text.charAt(digits) == ' ')) {
      digits++;
    }
    int end = PlainNumber.end(text, digits);
    if (end == digits) {
      return Optional.empty();
    }
    double number = Double.parseDouble(text.substring(digits, end));
    return Optional.of(new Literal(text, number, end));
  }

  /** Index behind the number and its unit. */
  int end() {
    return at;
  }

  /** Whether the unit counts from a zero of its own, so that the sign belongs to the number. */
  boolean hasScale() {
    return unit != null && unit.offset() != 0;
  }

  /** The value with the sign given. */
  Value value(int sign) {
    if (unit == null) {
      return Value.bare(sign * number);
    }
    return new Value((sign * number + unit.offset()) * unit.factor(), unit.dimension());
  }

  private void readNumber() throws Mistake {
    int end = PlainNumber.end(text, at);
    number = Double.parseDouble(text.substring(at, end));
    if (Double.isInfinite(number)) {
      throw new Mistake("this number is too large to be counted", "write a smaller one", at);
    }
    boolean whole = PlainNumber.digits(text, at) == end;
    at = end;
    if (whole) {
      readFraction();
    }
  }

  /** A fraction of an inch or a foot behind, or instead of, a whole number. */
  private void readFraction() {
    int blanks = skipBlanks(at);
    boolean mixed = blanks > at;
    int over = mixed ? PlainNumber.digits(text, blanks) : at;
    if ((mixed && over == blanks) || over >= text.length() || text.charAt(over) != '/') {
      return;
    }
    int end = PlainNumber.digits(text, over + 1);
    if (end == over + 1 || end - over > 6 || over - blanks > 6 || !customaryAt(skipBlanks(end))) {
      return;
    }
    double under = Double.parseDouble(text.substring(over + 1, end));
    if (under == 0) {
      return;
    }
    number =
        mixed ? number + Double.parseDouble(text.substring(blanks, over)) / under : number / under;
    at = end;
  }

  private boolean customaryAt(int index) {
    return inchMark(index) || footMark(index) || startsWith(index, "in") || startsWith(index, "ft");
  }

  private boolean startsWith(int index, String word) {
    int end = index + word.length();
    return text.startsWith(word, index)
        && (end >= text.length() || !Character.isLetterOrDigit(text.charAt(end)));
  }

  private boolean inchMark(int index) {
    return index < text.length() && "\"″”".indexOf(text.charAt(index)) >= 0;
  }

  private boolean footMark(int index) {
    return index < text.length() && "'′’".indexOf(text.charAt(index)) >= 0;
  }

  /** Reads foot and inch marks; whether one stands here. */
  private boolean feetAndInches() throws Mistake {
    int mark = skipBlanks(at);
    if (inchMark(mark)) {
      unit = metres(INCH_M, mark + 1);
      at = unit.end();
      return true;
    }
    if (!footMark(mark)) {
      return false;
    }
    unit = metres(12 * INCH_M, mark + 1);
    at = unit.end();
    addInches(at < text.length() && text.charAt(at) == '-' ? at + 1 : at);
    return true;
  }

  /** Adds inches that stand behind feet; leaves everything as it is if none do. */
  private void addInches(int from) throws Mistake {
    int start = skipBlanks(from);
    boolean digit = start < text.length() && Character.isDigit(text.charAt(start));
    boolean dashed = from > at;
    if (!digit || (dashed && start != from)) {
      return;
    }
    double feet = number;
    Unit inFeet = unit;
    int before = at;
    at = start;
    readNumber();
    int mark = skipBlanks(at);
    boolean word = startsWith(mark, "in");
    if (inchMark(mark) || word) {
      number = feet + number / 12;
      unit = inFeet;
      at = word ? mark + 2 : mark + 1;
    } else {
      number = feet;
      at = before;
    }
  }

  private Unit metres(double factor, int end) {
    return new Unit(factor, 0, Dimension.LENGTH, end);
  }

  private String wordBetween(int from, int to) {
    return text.substring(from, to);
  }

  private int skipBlanks(int index) {
    int i = index;
    while (i < text.length() && text.charAt(i) == ' ') {
      i++;
    }
    return i;
  }
}
