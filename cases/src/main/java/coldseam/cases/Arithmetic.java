package coldseam.cases;

/** Arithmetic on values with dimensions. Temperatures count in °C. */
final class Arithmetic {
  private final LengthUnit unit;

  /**
   * Fixes what bare numbers mean.
   *
   * @param unit of bare numbers beside lengths
   */
  Arithmetic(LengthUnit unit) {
    this.unit = unit;
  }

  /** Sum, or difference with sign −1; the index is where the sign stands. */
  Value add(Value a, Value b, int sign, int index) throws Mistake {
    if (a.unknown() || b.unknown()) {
      return Value.UNKNOWN;
    }
    Dimension common = common(a.dimension(), b.dimension());
    if (common == null) {
      throw new Mistake(
          (sign > 0 ? "adds " : "subtracts ")
              + (sign > 0 ? a : b).dimension().inWords()
              + (sign > 0 ? " and " : " from ")
              + (sign > 0 ? b : a).dimension().inWords(),
          "only like quantities add up",
          index);
    }
    double sum = like(a, common) + sign * like(b, common);
    boolean levels =
        a.dimension().same(Dimension.TEMPERATURE) && b.dimension().same(Dimension.TEMPERATURE);
    return new Value(sum, levels && sign < 0 ? Dimension.TEMPERATURE_DIFFERENCE : common);
  }

  /** The smaller or the larger of two. */
  Value extreme(Value a, Value b, boolean smaller, int index) throws Mistake {
    if (a.unknown() || b.unknown()) {
      return Value.UNKNOWN;
    }
    Dimension common = common(a.dimension(), b.dimension());
    if (common == null) {
      throw new Mistake(
          "compares " + a.dimension().inWords() + " with " + b.dimension().inWords(),
          "only like quantities compare",
          index);
    }
    double x = like(a, common);
    double y = like(b, common);
    return new Value(smaller ? Math.min(x, y) : Math.max(x, y), common);
  }

  /** Product, or quotient with sign −1. */
  Value multiply(Value a, Value b, int sign, int index) throws Mistake {
    if (a.unknown() || b.unknown()) {
      return Value.UNKNOWN;
    }
    if (sign < 0 && b.number() == 0) {
      throw new Mistake("divides by zero", "the divisor must not be 0", index);
    }
    double number = sign > 0 ? a.number() * b.number() : a.number() / b.number();
    boolean level = a.dimension().same(Dimension.TEMPERATURE);
    if (level || b.dimension().same(Dimension.TEMPERATURE)) {
      Dimension other = level ? b.dimension() : a.dimension();
      if (!other.bare() || (sign < 0 && !level)) {
        throw new Mistake(
            "multiplies a temperature by " + other.inWords(),
            "take a difference of temperatures",
            index);
      }
      return new Value(number, Dimension.TEMPERATURE);
    }
    return new Value(number, a.dimension().times(b.dimension(), sign));
  }

  Value negative(Value a) {
    return new Value(-a.number(), a.dimension());
  }

  /** One of the functions of one number. */
  Value function(String name, Value a, int index) throws Mistake {
    if (name.equals("abs")) {
      return new Value(Math.abs(a.number()), a.dimension());
    }
    if (name.equals("sqrt")) {
      if (a.number() < 0 || !a.dimension().square()) {
        throw new Mistake(
            a.number() < 0
                ? "takes the square root of a negative number"
                : "takes the square root of " + a.dimension().inWords(),
            "a square root wants a square",
            index);
      }
      return new Value(Math.sqrt(a.number()), a.dimension().root());
    }
    if (!a.dimension().bare() && !a.dimension().same(Dimension.ANGLE)) {
      throw new Mistake(
          "`" + name + "` of " + a.dimension().inWords(), "it takes an angle in degrees", index);
    }
    double sin = Degrees.sin(a.number());
    double cos = Degrees.cos(a.number());
    if (name.equals("tan") && cos == 0) {
      throw new Mistake("this tangent is infinite", "take another angle", index);
    }
    return Value.bare(name.equals("sin") ? sin : name.equals("cos") ? cos : sin / cos);
  }

  /** The dimension two values can be brought to, or null. */
  private static Dimension common(Dimension a, Dimension b) {
    if (a.same(b)) {
      return a;
    }
    if (a.bare() || b.bare()) {
      return a.bare() && b.bare() ? Dimension.BARE : a.bare() ? b : a;
    }
    boolean temperatures =
        (a.same(Dimension.TEMPERATURE) && b.same(Dimension.TEMPERATURE_DIFFERENCE))
            || (b.same(Dimension.TEMPERATURE) && a.same(Dimension.TEMPERATURE_DIFFERENCE));
    return temperatures ? Dimension.TEMPERATURE : null;
  }

  /** The number a value has when brought to a dimension: bare lengths count in the unit. */
  private double like(Value value, Dimension dimension) {
    boolean lengths =
        dimension.metre() != 0
            && dimension.watt() == 0
            && dimension.kelvin() == 0
            && dimension.degree() == 0;
    return value.dimension().bare() && lengths
        ? value.number() * Math.pow(unit.metres(), dimension.metre())
        : value.number();
  }
}
