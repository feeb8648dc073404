package coldseam.cases;

/**
 * What kind of number a place in a case wants, and what it may be. Limits stand in SI, °C and
 * degrees; they keep nonsense and overflow out and leave everything that is built far inside.
 */
public enum Place {
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
  /** A part of an area. */
  FRACTION(Dimension.SHARE, "", 0, 1, "0 to 100 %, e.g. `21 %`"),
  /** Level of air voids. */
  VOID_LEVEL(Dimension.BARE, "", 0, 2, "0, 1 or 2"),
  /** Rain in mm a day, or fasteners in 1 m². */
  AMOUNT(Dimension.BARE, "", 0, 1e4, "a number, 0 or more, e.g. `2`"),
  /** Wind, m/s. */
  SPEED(Dimension.BARE, "", 0, 100, "0 to 100 m/s, e.g. `4`"),
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
  COUNT(Dimension.BARE, "", 1, 100_000, "a whole number, 1 or more"),
  /** A of a building's element. */
  AREA(Dimension.AREA, "m2", 0, 1e7, "an area in m2, 0 or more, e.g. `142`"),
  /** V of a building. */
  VOLUME(Dimension.VOLUME, "m3", 0, 1e8, "a volume in m3, 0 or more, e.g. `232`"),
  /** Thickness of a layer where bare lengths count in metres. */
  THICKNESS(Dimension.LENGTH, "m", 1e-6, 10, "a thickness of up to 10 m, e.g. `160 mm`"),
  /** χ, or H of something. */
  POINT_TRANSMITTANCE(Dimension.CONDUCTANCE, "W/K", -1e6, 1e6, "a number in W/K, e.g. `0.02`"),
  /** H of something that cannot gain heat. */
  HEAT_TRANSFER(Dimension.CONDUCTANCE, "W/K", 0, 1e7, "0 or more W/K, e.g. `43`"),
  /** How many, fractions too. */
  NUMBER(Dimension.BARE, "", 0, 1e7, "a number, 0 or more, e.g. `4`"),
  /** n. */
  AIR_CHANGE(Dimension.BARE, "", 0, 100, "air changes per hour, 0 to 100, e.g. `0.45`"),
  /** Air in m³/h. */
  AIR_FLOW(Dimension.BARE, "", 0, 1e7, "m3 of air per hour, 0 or more, e.g. `120`"),
  /** A part of a whole. */
  PART(Dimension.SHARE, "", 0, 1, "0 to 100 %, e.g. `80 %`"),
  /** Heat that can only go one way, kWh. */
  ENERGY(Dimension.BARE, "", 0, 1e12, "kWh, 0 or more, e.g. `2350`"),
  /** Heat that can go either way, kWh. */
  SIGNED_ENERGY(Dimension.BARE, "", -1e12, 1e12, "kWh, e.g. `120`"),
  /** Units of fuel. */
  FUEL_USED(Dimension.BARE, "", 0, 1e12, "units of the fuel, 0 or more, e.g. `905`"),
  /** kWh per unit of fuel. */
  HEATING_VALUE(Dimension.BARE, "", 1e-6, 1e6, "kWh per unit of the fuel, e.g. `10.9`"),
  /** Heat over fuel by the lower heating value. */
  NET_EFFICIENCY(Dimension.SHARE, "", 0.01, 1.3, "1 to 130 %, e.g. `97 %`"),
  /** Heat over fuel by the higher heating value. */
  GROSS_EFFICIENCY(Dimension.SHARE, "", 0.01, 1, "1 to 100 %, e.g. `88 %`"),
  /** Heat over electricity. */
  PERFORMANCE(Dimension.BARE, "", 1, 100, "heat over electricity, 1 or more, e.g. `3.2`"),
  /** Length of a period. */
  DAYS(Dimension.BARE, "", 1e-3, 1e5, "days, more than 0, e.g. `212`"),
  /** K·d. */
  DEGREE_DAYS(Dimension.BARE, "", 0, 1e6, "kelvins times days, 0 or more, e.g. `3350`"),
  /** C over floor area, kJ/(m²·K). */
  CAPACITY(Dimension.BARE, "", 1e-3, 1e5, "kJ/(m2 K), more than 0, e.g. `165`"),
  /** a₀. */
  EXPONENT(Dimension.BARE, "", 1e-3, 100, "a number, more than 0, e.g. `1`"),
  /** τ₀ in hours. */
  HOURS(Dimension.BARE, "", 1e-3, 1e5, "hours, more than 0, e.g. `15`");

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
