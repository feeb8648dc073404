package coldseam.cases;

/**
 * What kind of quantity a number is, as powers of metre, watt, kelvin, second and degree.
 *
 * @param metre power of the metre
 * @param watt power of the watt
 * @param kelvin power of the kelvin
 * @param second power of the second
 * @param degree power of the degree of angle
 * @param kind what the powers do not tell
 */
record Dimension(int metre, int watt, int kelvin, int second, int degree, Kind kind) {
  /** What the powers do not tell. */
  enum Kind {
    /** A number without a unit: it takes the unit of its place. */
    BARE,
    /** A share, written with a percent sign. */
    SHARE,
    /** A temperature counted from 0 °C, not a difference of temperatures. */
    LEVEL,
    /** A quantity with a unit. */
    QUANTITY
  }

  static final Dimension BARE = new Dimension(0, 0, 0, 0, 0, Kind.BARE);
  static final Dimension SHARE = new Dimension(0, 0, 0, 0, 0, Kind.SHARE);
  static final Dimension TEMPERATURE = new Dimension(0, 0, 1, 0, 0, Kind.LEVEL);
  static final Dimension TEMPERATURE_DIFFERENCE = of(0, 0, 1, 0, 0);
  static final Dimension LENGTH = of(1, 0, 0, 0, 0);
  static final Dimension AREA = of(2, 0, 0, 0, 0);
  static final Dimension VOLUME = of(3, 0, 0, 0, 0);
  static final Dimension ANGLE = of(0, 0, 0, 0, 1);
  static final Dimension CONDUCTIVITY = of(-1, 1, -1, 0, 0);
  static final Dimension RESISTIVITY = of(1, -1, 1, 0, 0);
  static final Dimension RESISTANCE = of(2, -1, 1, 0, 0);
  static final Dimension TRANSMITTANCE = of(-2, 1, -1, 0, 0);
  static final Dimension CONDUCTANCE = of(0, 1, -1, 0, 0);
  static final Dimension FLOW_DENSITY = of(-2, 1, 0, 0, 0);
  static final Dimension FLOW_PER_LENGTH = of(-1, 1, 0, 0, 0);

  static Dimension of(int metre, int watt, int kelvin, int second, int degree) {
    boolean none = metre == 0 && watt == 0 && kelvin == 0 && second == 0 && degree == 0;
    return new Dimension(metre, watt, kelvin, second, degree, none ? Kind.BARE : Kind.QUANTITY);
  }

  /** Powers and kind are equal. */
  boolean same(Dimension other) {
    return kind == other.kind
        && metre == other.metre
        && watt == other.watt
        && kelvin == other.kelvin
        && second == other.second
        && degree == other.degree;
  }

  /** A number without a unit, or a share. */
  boolean bare() {
    return kind == Kind.BARE || kind == Kind.SHARE;
  }

  /** The dimension of a product, or of a quotient with sign −1. */
  Dimension times(Dimension other, int sign) {
    return of(
        metre + sign * other.metre,
        watt + sign * other.watt,
        kelvin + sign * other.kelvin,
        second + sign * other.second,
        degree + sign * other.degree);
  }

  /** The dimension of a power. */
  Dimension power(int exponent) {
    return of(
        metre * exponent, watt * exponent, kelvin * exponent, second * exponent, degree * exponent);
  }

  /** Whether a square root of it exists. */
  boolean square() {
    return metre % 2 == 0 && watt % 2 == 0 && kelvin % 2 == 0 && second % 2 == 0 && degree % 2 == 0;
  }

  /** The dimension of the square root. */
  Dimension root() {
    return of(metre / 2, watt / 2, kelvin / 2, second / 2, degree / 2);
  }

  /** In words, e.g. "a length"; "another quantity" if the trade has no word for it. */
  String inWords() {
    Dimension[] known = {
      BARE,
      SHARE,
      TEMPERATURE,
      TEMPERATURE_DIFFERENCE,
      LENGTH,
      AREA,
      VOLUME,
      ANGLE,
      CONDUCTIVITY,
      RESISTIVITY,
      RESISTANCE,
      TRANSMITTANCE,
      CONDUCTANCE,
      FLOW_DENSITY,
      FLOW_PER_LENGTH
    };
    String[] words = {
      "a number without a unit",
      "a share",
      "a temperature",
      "a difference of temperatures",
      "a length",
      "an area",
      "a volume",
      "an angle",
      "a thermal conductivity",
      "a thermal resistivity",
      "a thermal resistance",
      "a thermal transmittance",
      "a thermal conductance",
      "a heat flow per area",
      "a heat flow per length"
    };
    for (int i = 0; i < known.length; i++) {
      if (same(known[i])) {
        return words[i];
      }
    }
    return "another quantity";
  }

  /** Whether a unit written after a number may have it. */
  boolean known() {
    return !inWords().equals("another quantity") && kind != Kind.BARE;
  }
}
