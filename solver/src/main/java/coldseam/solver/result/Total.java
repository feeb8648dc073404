package coldseam.solver.result;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Bracket;

/**
 * A sum of quantities, intervals added outward. It is certified only if every quantity in it is;
 * otherwise it carries the sum of the estimates.
 */
final class Total {
  private double value;
  private double lower;
  private double upper;
  private double estimate;
  private String reason = "";

  /** Adds a quantity times a factor. */
  Total add(double factor, Quantity quantity) {
    if (factor == 0) {
      return this;
    }
    value += factor * quantity.value();
    estimate += Math.abs(factor) * quantity.halfWidth();
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      lower += factor > 0 ? factor * proved.lower() : factor * proved.upper();
      upper += factor > 0 ? factor * proved.upper() : factor * proved.lower();
    } else if (reason.isEmpty()) {
      reason = ((Certificate.NotCertified) quantity.certificate()).reason();
    }
    return this;
  }

  /** Takes off a bracket. */
  Total subtract(Bracket bracket) {
    value -= bracket.mid();
    lower -= bracket.upper();
    upper -= bracket.lower();
    estimate += (bracket.upper() - bracket.lower()) / 2;
    return this;
  }

  /** Marks the sum as not certified. */
  Total uncertain(String why) {
    if (reason.isEmpty()) {
      reason = why;
    }
    return this;
  }

  Quantity quantity() {
    if (!Double.isFinite(value)) {
      return new Quantity(
          value,
          new Certificate.NotCertified(
              reason.isEmpty() ? "the stated problem has no finite answer" : reason,
              Double.POSITIVE_INFINITY));
    }
    if (reason.isEmpty()) {
      return new Quantity(lower + (upper - lower) / 2, new Certificate.Certified(lower, upper));
    }
    return new Quantity(value, new Certificate.NotCertified(reason, estimate));
  }

  /** A bracket times a factor, the ends kept in order. */
  static Bracket scaled(Bracket bracket, double factor) {
    return factor >= 0
        ? new Bracket(factor * bracket.lower(), factor * bracket.upper())
        : new Bracket(factor * bracket.upper(), factor * bracket.lower());
  }

  /** What is known of a quantity as a bracket: its proved interval, else its value alone. */
  static Bracket bracket(Quantity quantity) {
    return quantity.certificate() instanceof Certificate.Certified proved
        ? new Bracket(proved.lower(), proved.upper())
        : Bracket.of(quantity.value());
  }

  /**
   * One over a quantity. Where its proved interval reaches down to 0 nothing is known of the
   * inverse: it is infinite.
   */
  static Quantity inverse(Quantity quantity) {
    if (quantity.certificate() instanceof Certificate.Certified proved && proved.lower() <= 0) {
      return new Quantity(
          Double.POSITIVE_INFINITY,
          new Certificate.NotCertified(
              "the interval of what it is the inverse of contains 0", Double.POSITIVE_INFINITY));
    }
    double inverse = 1 / quantity.value();
    if (quantity.certificate() instanceof Certificate.Certified proved && proved.lower() > 0) {
      return new Quantity(
          inverse, new Certificate.Certified(1 / proved.upper(), 1 / proved.lower()));
    }
    String why =
        quantity.certificate() instanceof Certificate.NotCertified not
            ? not.reason()
            : "the interval of what it is the inverse of contains 0";
    double spread =
        Double.isFinite(quantity.value())
            ? quantity.halfWidth() * inverse * inverse
            : Double.POSITIVE_INFINITY;
    return new Quantity(inverse, new Certificate.NotCertified(why, spread));
  }
}
