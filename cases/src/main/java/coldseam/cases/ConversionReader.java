package coldseam.cases;

import coldseam.cases.library.Entry;
import coldseam.solver.detail.DesignConductivity;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code at} of a material: temperature and moisture its conductivity is converted to. */
final class ConversionReader {
  private static final String TEMPERATURE = "temperature";
  private static final String BY_VOLUME = "moisture-by-volume";
  private static final String BY_MASS = "moisture-by-mass";
  private static final String STATED_AT = "stated-at";
  private static final String COEFFICIENTS = "coefficients";
  private static final List<String> CONDITIONS = List.of(TEMPERATURE, BY_VOLUME, BY_MASS);
  private static final List<String> KEYS =
      List.of(TEMPERATURE, BY_VOLUME, BY_MASS, STATED_AT, COEFFICIENTS);

  /** What declared values hold for, °C; ISO 10456:2007, table 2, condition I(b): 10 °C and dry. */
  private static final double DECLARED_C = 10;

  /** A conductivity that changes by more than this factor either way is a slip of the pen. */
  private static final double MOST_CHANGE = 10;

  private final Pass pass;
  private final Problems problems;

  ConversionReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /**
   * A conversion.
   *
   * @param factor F_T F_m
   * @param conditions what it is converted to, in words
   * @param factors F_T and F_m with their coefficients, in words
   * @param source clauses, and where the coefficients come from
   */
  record Conversion(double factor, String conditions, String factors, String source) {}

  /** What is gathered on the way. */
  private static final class Sum {
    private double factor = 1;
    private String conditions = "";
    private String factors = "";
    private String clauses = "";
    private boolean typed;
    private boolean library;

    void add(double by, String condition, String words, String clause) {
      factor *= by;
      conditions += (conditions.isEmpty() ? "" : ", ") + condition;
      factors += (factors.isEmpty() ? "" : ", ") + words;
      clauses += (clauses.isEmpty() ? "" : " and ") + clause;
    }
  }

  /**
   * Reads a conversion.
   *
   * @param node the mapping
   * @param material how messages call the material
   * @param entry the entry of the library its figures come from
   * @param libraryConductivity whether its conductivity is that of the entry
   * @return the conversion, or empty if a mistake was reported
   */
  Optional<Conversion> read(
      Node node, String material, Optional<Entry> entry, boolean libraryConductivity) {
    int before = problems.count();
    Fields at = new Fields(problems, "`at` of " + material, node, KEYS);
    Fields from = inner(at, STATED_AT, CONDITIONS);
    Fields coefficients = inner(at, COEFFICIENTS, CONDITIONS);
    boolean both = at.refuseBoth(BY_VOLUME, BY_MASS, "give the one its coefficient is for");
    if (problems.count() == before
        && !at.has(TEMPERATURE)
        && !at.has(BY_VOLUME)
        && !at.has(BY_MASS)) {
      problems.add(node, at.what() + " says nothing", "give `temperature`, or moisture");
    }
    Optional<Entry.Conversion> known =
        entry.isEmpty() ? Optional.empty() : Optional.of(entry.get().conversion());
    Sum sum = new Sum();
    if (at.has(TEMPERATURE)) {
      OptionalDouble own =
          known.isPresent() && libraryConductivity
              ? known.get().temperaturePerK()
              : OptionalDouble.empty();
      temperature(at, from, coefficients, own, sum);
    }
    if (at.has(BY_VOLUME) && !both) {
      OptionalDouble own =
          known.isPresent() ? known.get().moistureByVolume() : OptionalDouble.empty();
      moisture(BY_VOLUME, at, from, coefficients, own, sum);
    }
    if (at.has(BY_MASS) && !both) {
      OptionalDouble own =
          known.isPresent() ? known.get().moistureByMass() : OptionalDouble.empty();
      moisture(BY_MASS, at, from, coefficients, own, sum);
    }
    refuseUnused(at, from);
    refuseUnused(at, coefficients);
    if (problems.count() > before) {
      return Optional.empty();
    }
    if (!(sum.factor <= MOST_CHANGE && sum.factor >= 1 / MOST_CHANGE)) {
      problems.add(
          node,
          at.what() + " changes the conductivity by a factor of " + Figures.of(sum.factor),
          "check coefficients and conditions");
      return Optional.empty();
    }
    return Optional.of(
        new Conversion(
            sum.factor,
            sum.conditions,
            sum.factors,
            "ISO 10456:2007, " + sum.clauses + origin(sum)));
  }

  private static String origin(Sum sum) {
    String library = sum.library ? "; coefficient of the library, from memory" : "";
    return library + (sum.typed ? "; coefficient stated in the case" : "");
  }

  private Fields inner(Fields at, String key, List<String> keys) {
    Optional<Node> node = at.get(key);
    return node.isEmpty() ? null : new Fields(problems, "`" + key + "`", node.get(), keys);
  }

  private void temperature(
      Fields at, Fields from, Fields coefficients, OptionalDouble own, Sum sum) {
    double to = number(at, TEMPERATURE, Place.TEMPERATURE);
    double stated =
        from != null && from.has(TEMPERATURE)
            ? number(from, TEMPERATURE, Place.TEMPERATURE)
            : DECLARED_C;
    double f =
        coefficient(
            TEMPERATURE, Place.TEMPERATURE_COEFFICIENT, at, coefficients, own, "per K", sum);
    double factor = DesignConductivity.temperatureFactor(f, stated, to);
    sum.add(
        factor,
        Figures.of(to) + " °C",
        "F_T = " + Figures.of(rounded(factor)) + " from " + Figures.of(stated) + " °C",
        "7.2");
  }

  private void moisture(
      String key, Fields at, Fields from, Fields coefficients, OptionalDouble own, Sum sum) {
    boolean volume = key.equals(BY_VOLUME);
    Place place = volume ? Place.MOISTURE_BY_VOLUME : Place.MOISTURE_BY_MASS;
    double to = number(at, key, place);
    double stated = from != null && from.has(key) ? number(from, key, place) : 0;
    double f =
        coefficient(
            key,
            Place.MOISTURE_COEFFICIENT,
            at,
            coefficients,
            own,
            volume ? "per m³/m³" : "per kg/kg",
            sum);
    double factor = DesignConductivity.moistureFactor(f, stated, to);
    String unit = volume ? " m³/m³" : " kg/kg";
    sum.add(
        factor,
        Figures.of(to) + unit + " of moisture",
        "F_m = " + Figures.of(rounded(factor)) + " from " + Figures.of(stated) + unit,
        "7.3");
  }

  /** Four decimals are more than the coefficients are known to. */
  private static double rounded(double factor) {
    return Math.rint(factor * 1e4) / 1e4;
  }

  private double number(Fields fields, String key, Place place) {
    return pass.quantities()
        .read(fields.get(key).get(), "`" + key + "` of " + fields.what(), place);
  }

  private double coefficient(
      String key,
      Place place,
      Fields at,
      Fields coefficients,
      OptionalDouble own,
      String unit,
      Sum sum) {
    if (coefficients != null && coefficients.has(key)) {
      sum.typed = true;
      return number(coefficients, key, place);
    }
    if (own.isPresent()) {
      sum.library = true;
      return own.getAsDouble();
    }
    if (coefficients == null || !coefficients.reported(key)) {
      problems.add(
          at.keyNode(key),
          at.what() + " needs the coefficient of ISO 10456 for `" + key + "`",
          "add `coefficients: {" + key + ": …}`, " + unit);
    }
    return Double.NaN;
  }

  /** A coefficient or a stated condition that nothing is converted by is a slip. */
  private void refuseUnused(Fields at, Fields inner) {
    if (inner == null) {
      return;
    }
    for (String key : CONDITIONS) {
      if (inner.has(key) && !at.has(key) && !at.reported(key)) {
        problems.add(
            inner.keyNode(key),
            inner.what() + " has `" + key + "`, which `at` does not convert to",
            "give `at` a `" + key + "` too, or leave it away");
      }
    }
  }
}
