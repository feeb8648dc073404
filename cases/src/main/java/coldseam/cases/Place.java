package coldseam.cases;

/**
 * What kind of number a place in a case wants, and what it may be. Limits stand in SI, °C and
 * degrees; they keep nonsense and overflow out and leave everything that is built far inside.
 */
enum Place {
  /** A coordinate or a displacement. */
  COORDINATE(Dimension.LENGTH, "m", -1e6, 1e6, "a length of at most 1000 km, e.g. `160 mm`"),
  /** The size of something drawn; thinner than the resolution it would vanish. */
  SIZE(Dimension.LENGTH, "m", 1e-6, 1e6, "a length of 0.001 mm or more, e.g. `160 mm`"),
  /** A length that counts in a sum. */
  EXTENT(Dimension.LENGTH, "m", 0, 1e6, "a length, 0 or more, e.g. `1.2 m`"),
  /** λ. */
  CONDUCTIVITY(Dimension.CONDUCTIVITY, "W/(m K)", 0, 1e5, "0 to 100000 W/(m K), e.g. `0.035`"),
  /** Rs. */
  FILM(Dimension.RESISTANCE, "m2 K/W", 0, 1e6, "0 to 1000000 m2 K/W, e.g. `0.13`"),
  /** R of a layer. */
  RESISTANCE(Dimension.RESISTANCE, "m2 K/W", 1e-6, 1e6, "more than 0 m2 K/W, e.g. `R-13`"),
  /** U. */
  TRANSMITTANCE(Dimension.TRANSMITTANCE, "W/(m2 K)", 0, 1e5, "0 to 100000 W/(m2 K), e.g. `1.4`"),
  /** ψ. */
  LINEAR_TRANSMITTANCE(
      Dimension.CONDUCTIVITY, "W/(m K)", -1e4, 1e4, "a number in W/(m K), e.g. `0.08`"),
  /** Conductance of a floating space, per metre of detail. */
  CONDUCTANCE(
      Dimension.CONDUCTIVITY, "W/(m K)", 0, 1e6, "0 or more W/K per metre of detail, e.g. `1.5`"),
  /** θ. */
  TEMPERATURE(
      Dimension.TEMPERATURE, "C", -273.15, 5000, "a temperature in °C or F, e.g. `20` or `68 F`"),
  /** φ. */
  HUMIDITY(Dimension.SHARE, "", 0, 1, "0 to 100 %, e.g. `50 %`"),
  /** f_Rsi. */
  FACTOR(Dimension.SHARE, "", 0, 1, "0 to 1, e.g. `0.7`"),
  /** Vapour pressure. */
  PRESSURE(Dimension.BARE, "", 0, 1e5, "0 to 100000 Pa, e.g. `600`"),
  /** ψ. */
  COUPLING(Dimension.CONDUCTIVITY, "W/(m K)", -1e5, 1e5, "a number in W/(m K), e.g. `0.10`"),
  /** ε. */
  EMISSIVITY(Dimension.BARE, "", 0, 1, "0 to 1, e.g. `0.9`"),
  /** Openings of an air layer, mm² per metre or per m². */
  OPENINGS(Dimension.BARE, "", 0, 1e9, "mm2 per metre of length, 0 or more, e.g. `800`"),
  /** μ. */
  VAPOUR_RESISTANCE(Dimension.BARE, "", 0, 1e9, "a number, 0 or more, e.g. `60`"),
  /** By what part of itself a conductivity may be off. */
  TOLERANCE(Dimension.SHARE, "", 0, 0.999999, "0 up to less than 100 %, e.g. `10 %`"),
  /** ψ of ISO 10456, m³/m³. */
  MOISTURE_BY_VOLUME(Dimension.SHARE, "", 0, 1, "0 to 100 % of the volume, e.g. `2 %`"),
  /** u of ISO 10456, kg/kg. */
  MOISTURE_BY_MASS(Dimension.SHARE, "", 0, 10, "0 or more of the dry mass, e.g. `5 %`"),
  /** f_T of ISO 10456, per K. */
  TEMPERATURE_COEFFICIENT(Dimension.BARE, "", -0.1, 0.1, "a number per K, e.g. `0.0046`"),
  /** f_ψ or f_u of ISO 10456. */
  MOISTURE_COEFFICIENT(Dimension.BARE, "", 0, 100, "a number, 0 or more, e.g. `4`"),
  /** Heat flow into a stretch. */
  FLOW_DENSITY(Dimension.FLOW_DENSITY, "W/m2", -1e9, 1e9, "a heat flow in W/m2, e.g. `100`"),
  /** An angle. */
  ANGLE(Dimension.ANGLE, "deg", -36000, 36000, "an angle in degrees, e.g. `30 deg`"),
  /** b. */
  WEIGHT(Dimension.SHARE, "", -100, 100, "a factor, mostly 0 to 1, e.g. `0.8`"),
  /** A component of a direction. */
  DIRECTION(Dimension.BARE, "", -1e6, 1e6, "a number; only the ratio of the two counts"),
  /** How much larger the thing is than its drawing. */
  SCALE(Dimension.BARE, "", 1e-6, 1e6, "a number more than 0, e.g. `10` of a drawing 1:10"),
  /** How many. */
  COUNT(Dimension.BARE, "", 1, 100_000, "a whole number, 1 or more");

  private final Dimension dimension;
  private final String unit;
  private final double least;
  private final double most;
  private final String wanted;

  Place(Dimension dimension, String unit, double least, double most, String wanted) {
    this.dimension = dimension;
    this.unit = unit;
    this.least = least;
    this.most = most;
    this.wanted = wanted;
  }

  Dimension dimension() {
    return dimension;
  }

  /** The unit that limits are given in, as written in a case; empty for a bare number. */
  String unit() {
    return unit;
  }

  double least() {
    return least;
  }

  double most() {
    return most;
  }

  /** What would be right, in words. */
  String wanted() {
    return wanted;
  }

  /** Whether a value of that dimension may stand here. */
  boolean takes(Dimension other) {
    if (other.same(dimension) || other.kind() == Dimension.Kind.BARE) {
      return true;
    }
    return this == CONDUCTANCE && other.same(Dimension.CONDUCTANCE);
  }
}
