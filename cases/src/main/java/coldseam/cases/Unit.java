package coldseam.cases;

/**
 * A unit as written after a number: value in SI = (number + offset) · factor. Temperatures count in
 * °C, angles in degrees, shares as parts of 1.
 *
 * <p>Written as in the trade: products with a space, `·` or `*`, powers as `m2`, `m²` or `m^2`, one
 * `/` before everything that divides, with or without brackets. Exact factors: inch 25.4 mm; Btu
 * 1055.05585262 J (International Table); degree Fahrenheit 5/9 K.
 *
 * @param factor SI per unit
 * @param offset added to the number first; 0 but for °F
 * @param dimension of what
 * @param end index in the text behind the unit
 */
record Unit(double factor, double offset, Dimension dimension, int end) {
  private static final double INCH = 0.0254;
  private static final double FOOT = 12 * INCH;
  private static final double BTU_J = 1055.05585262;
  private static final double HOUR_S = 3600;

  /** Tells where something else than a unit stands. */
  interface Names {
    boolean named(String text, int at);
  }

  /**
   * Reads the longest unit that stands at a place.
   *
   * @param text the text
   * @param from index where the unit begins
   * @param names names that are no units behind a `*` or `/`
   * @return the unit, or null if none known begins there
   */
  static Unit longestAt(String text, int from, Names names) {
    return new Scan(text, names).longest(from);
  }

  /** Reads atoms one by one and remembers the longest run that means a known quantity. */
  private static final class Scan {
    private final String text;
    private final Names names;
    private double factor = 1;
    private Dimension dimension = Dimension.BARE;
    private int atoms;
    private Unit best;

    Scan(String text, Names names) {
      this.text = text;
      this.names = names;
    }

    Unit longest(int from) {
      int at = from;
      int sign = 1;
      boolean opened = false;
      boolean explicit = false;
      while (true) {
        Unit atom = atomAt(at);
        if (atom == null || (explicit && names.named(text, at))) {
          return best;
        }
        at = multiply(atom, sign);
        if (opened && at < text.length() && text.charAt(at) == ')') {
          opened = false;
          at++;
        }
        if (!opened) {
          remember(atom, at);
        }
        int next = skipBlanks(at);
        explicit = false;
        char c = next < text.length() ? text.charAt(next) : ' ';
        if (c == '/' && !opened) {
          sign = -1;
          next = skipBlanks(next + 1);
          explicit = true;
          if (next < text.length() && text.charAt(next) == '(') {
            opened = true;
            next = skipBlanks(next + 1);
          }
        } else if (c == '*' || c == '·') {
          next = skipBlanks(next + 1);
          explicit = c == '*';
        }
        at = next;
      }
    }

    private int multiply(Unit atom, int sign) {
      int at = atom.end;
      int power = 1;
      if (at < text.length() && text.charAt(at) == '^') {
        at++;
      }
      if (at < text.length() && "2²3³".indexOf(text.charAt(at)) >= 0) {
        power = "2²".indexOf(text.charAt(at)) >= 0 ? 2 : 3;
        at++;
      } else {
        at = atom.end;
      }
      factor *= Math.pow(atom.factor, sign * power);
      dimension = dimension.times(atom.dimension.power(power), sign);
      atoms++;
      return at;
    }

    private void remember(Unit atom, int at) {
      boolean alone = atoms == 1 && at == atom.end;
      if (alone && atom.dimension.same(Dimension.SHARE)) {
        best = new Unit(atom.factor, 0, Dimension.SHARE, at);
      } else if (alone && atom.offset == OF_CELSIUS) {
        best = new Unit(1, 0, Dimension.TEMPERATURE, at);
      } else if (alone && atom.offset == OF_FAHRENHEIT) {
        best = new Unit(atom.factor, -32, Dimension.TEMPERATURE, at);
      } else if (dimension.known()) {
        best = new Unit(factor, 0, dimension, at);
      }
    }

    private int skipBlanks(int at) {
      int i = at;
      while (i < text.length() && text.charAt(i) == ' ') {
        i++;
      }
      return i;
    }

    /** The atom at a place without its power, or null. */
    private Unit atomAt(int at) {
      if (at >= text.length()) {
        return null;
      }
      char c = text.charAt(at);
      if (c == '%') {
        return new Unit(0.01, 0, Dimension.SHARE, at + 1);
      }
      int end = at;
      if (c == '°' || c == 'º') {
        end++;
      }
      while (end < text.length() && Character.isLetter(text.charAt(end))) {
        end++;
      }
      if (end < text.length() && text.charAt(end) == '_') {
        return null;
      }
      return end == at ? null : atom(text.substring(at, end).replace('º', '°'), end);
    }
  }

  private static final double OF_CELSIUS = 1;
  private static final double OF_FAHRENHEIT = 2;

  /** One word of a unit; offset marks the two temperature scales. Null if it is none. */
  private static Unit atom(String word, int end) {
    return switch (word) {
      case "m" -> length(1, end);
      case "cm" -> length(0.01, end);
      case "mm" -> length(0.001, end);
      case "um", "µm", "μm" -> length(1e-6, end);
      case "in", "inch", "inches" -> length(INCH, end);
      case "ft", "foot", "feet" -> length(FOOT, end);
      case "mil", "mils", "thou" -> length(INCH / 1000, end);
      case "W" -> new Unit(1, 0, Dimension.of(0, 1, 0, 0, 0), end);
      case "Btu", "BTU" -> new Unit(BTU_J, 0, Dimension.of(0, 1, 0, 1, 0), end);
      case "h", "hr" -> new Unit(HOUR_S, 0, Dimension.of(0, 0, 0, 1, 0), end);
      case "K" -> new Unit(1, 0, Dimension.TEMPERATURE_DIFFERENCE, end);
      case "mK" -> new Unit(1, 0, Dimension.of(1, 0, 1, 0, 0), end);
      case "C", "°C", "degC" -> new Unit(1, OF_CELSIUS, Dimension.TEMPERATURE_DIFFERENCE, end);
      case "F", "°F", "degF" ->
          new Unit(5.0 / 9, OF_FAHRENHEIT, Dimension.TEMPERATURE_DIFFERENCE, end);
      case "deg", "°" -> new Unit(1, 0, Dimension.ANGLE, end);
      case "rad" -> new Unit(180 / Math.PI, 0, Dimension.ANGLE, end);
      default -> null;
    };
  }

  private static Unit length(double metres, int end) {
    return new Unit(metres, 0, Dimension.LENGTH, end);
  }
}
