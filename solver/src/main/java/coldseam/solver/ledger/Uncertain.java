package coldseam.solver.ledger;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import java.util.List;
import java.util.function.ToDoubleBiFunction;
import java.util.function.ToDoubleFunction;

/**
 * A number with two nested intervals: one for what is known of it as stated, and a wider one for
 * conductivities anywhere within their tolerances. Sums and products carry both outward, as if
 * everything were at its worst together.
 *
 * @param value the number, within both
 * @param lower lower end as stated
 * @param upper upper end as stated
 * @param widestLower lower end over all tolerances
 * @param widestUpper upper end over all tolerances
 * @param doubt why the interval is an estimate and no bound; empty if it is a bound
 */
public record Uncertain(
    double value,
    double lower,
    double upper,
    double widestLower,
    double widestUpper,
    String doubt) {
  /** Nothing. */
  public static final Uncertain ZERO = exact(0);

  /**
   * Orders the ends: rounding may have moved one past the number.
   *
   * @throws IllegalArgumentException if one of the numbers is not finite
   */
  public Uncertain {
    if (!Double.isFinite(value)
        || !Double.isFinite(widestUpper - widestLower)
        || !Double.isFinite(upper - lower)) {
      throw new IllegalArgumentException("a number of a ledger is finite, with finite bounds");
    }
    lower = Math.min(lower, value);
    upper = Math.max(upper, value);
    widestLower = Math.min(widestLower, lower);
    widestUpper = Math.max(widestUpper, upper);
  }

  /**
   * A number taken as it stands.
   *
   * @param value the number
   * @return it, all ends equal
   */
  public static Uncertain exact(double value) {
    return new Uncertain(value, value, value, value, value, "");
  }

  /**
   * A number known between two ends; its value is the middle.
   *
   * @param lower lower end
   * @param upper upper end
   * @return it, without a tolerance
   */
  public static Uncertain between(double lower, double upper) {
    return new Uncertain(lower + (upper - lower) / 2, lower, upper, lower, upper, "");
  }

  /**
   * A solved number.
   *
   * @param quantity the number with its certificate
   * @param tolerance what its interval has to be widened by for tolerances, same unit, 0 or more
   * @return it; an estimate where nothing is proved of it
   */
  public static Uncertain of(Quantity quantity, double tolerance) {
    double lower = quantity.value() - quantity.halfWidth();
    double upper = quantity.value() + quantity.halfWidth();
    String doubt = "";
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      lower = proved.lower();
      upper = proved.upper();
    } else if (quantity.certificate() instanceof Certificate.NotCertified not) {
      doubt = not.reason().isEmpty() ? "not certified" : not.reason();
    }
    return new Uncertain(
        quantity.value(), lower, upper, lower - tolerance, upper + tolerance, doubt);
  }

  /** Whether the interval is a bound, what is stated taken as it stands. */
  public boolean proved() {
    return doubt.isEmpty();
  }

  /** How far the number may be from either end as stated. */
  public double halfWidth() {
    return Math.max(upper - value, value - lower);
  }

  /** What the interval has to be widened by for tolerances of conductivities. */
  public double tolerance() {
    return Math.max(widestUpper - upper, lower - widestLower);
  }

  /**
   * The sum.
   *
   * @param other what is added
   * @return the sum
   */
  public Uncertain plus(Uncertain other) {
    return new Uncertain(
        value + other.value,
        lower + other.lower,
        upper + other.upper,
        widestLower + other.widestLower,
        widestUpper + other.widestUpper,
        doubt.isEmpty() ? other.doubt : doubt);
  }

  /**
   * A multiple.
   *
   * @param factor of either sign
   * @return the product
   */
  public Uncertain times(double factor) {
    return factor >= 0
        ? new Uncertain(
            factor * value,
            factor * lower,
            factor * upper,
            factor * widestLower,
            factor * widestUpper,
            doubt)
        : new Uncertain(
            factor * value,
            factor * upper,
            factor * lower,
            factor * widestUpper,
            factor * widestLower,
            doubt);
  }

  /**
   * The product with a number that is not negative.
   *
   * @param factor 0 or more, its ends too
   * @return the product
   */
  public Uncertain times(Uncertain factor) {
    return new Uncertain(
        value * factor.value,
        least(lower, factor.lower, factor.upper),
        most(upper, factor.lower, factor.upper),
        least(widestLower, factor.widestLower, factor.widestUpper),
        most(widestUpper, factor.widestLower, factor.widestUpper),
        doubt.isEmpty() ? factor.doubt : doubt);
  }

  private static double least(double end, double lower, double upper) {
    return Math.min(end * lower, end * upper);
  }

  private static double most(double end, double lower, double upper) {
    return Math.max(end * lower, end * upper);
  }

  /**
   * What comes of numbers by way of a function that rises, or falls, with every one of them.
   *
   * @param numbers its arguments
   * @param monotone the function
   * @return its value, with the ends that the ends of the numbers give
   */
  static Uncertain through(List<Uncertain> numbers, ToDoubleFunction<double[]> monotone) {
    double value = monotone.applyAsDouble(ends(numbers, Uncertain::value));
    double a = monotone.applyAsDouble(ends(numbers, Uncertain::lower));
    double b = monotone.applyAsDouble(ends(numbers, Uncertain::upper));
    double c = monotone.applyAsDouble(ends(numbers, Uncertain::widestLower));
    double d = monotone.applyAsDouble(ends(numbers, Uncertain::widestUpper));
    return new Uncertain(
        value, Math.min(a, b), Math.max(a, b), Math.min(c, d), Math.max(c, d), doubt(numbers));
  }

  /**
   * What comes of numbers by way of a function of two copies of them that rises, or falls, with
   * every number of the one and does the opposite with every number of the other.
   *
   * @param numbers its arguments
   * @param opposed the function
   * @return its value, with the ends that opposite ends of the numbers give
   */
  static Uncertain through(
      List<Uncertain> numbers, ToDoubleBiFunction<double[], double[]> opposed) {
    double[] value = ends(numbers, Uncertain::value);
    double[] lower = ends(numbers, Uncertain::lower);
    double[] upper = ends(numbers, Uncertain::upper);
    double[] least = ends(numbers, Uncertain::widestLower);
    double[] most = ends(numbers, Uncertain::widestUpper);
    double a = opposed.applyAsDouble(lower, upper);
    double b = opposed.applyAsDouble(upper, lower);
    double c = opposed.applyAsDouble(least, most);
    double d = opposed.applyAsDouble(most, least);
    return new Uncertain(
        opposed.applyAsDouble(value, value),
        Math.min(a, b),
        Math.max(a, b),
        Math.min(c, d),
        Math.max(c, d),
        doubt(numbers));
  }

  private static String doubt(List<Uncertain> numbers) {
    for (Uncertain number : numbers) {
      if (!number.proved()) {
        return number.doubt;
      }
    }
    return "";
  }

  private static double[] ends(List<Uncertain> numbers, ToDoubleFunction<Uncertain> end) {
    double[] ends = new double[numbers.size()];
    for (int i = 0; i < ends.length; i++) {
      ends[i] = end.applyAsDouble(numbers.get(i));
    }
    return ends;
  }
}
