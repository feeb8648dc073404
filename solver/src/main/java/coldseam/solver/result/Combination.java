package coldseam.solver.result;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Bracket;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/**
 * A sum of conductances with factors of either sign, as it depends on the materials and films they
 * share. A conductance added counts from above with Σ e f and from below with 2F − Σ r/f, one taken
 * off the other way round; so that both bounds of the sum are sums over the parts, each term convex
 * in its f and worst at an end of its tolerance. A material in L2D and in the U of a flank thus
 * counts once, with what is left of it.
 */
final class Combination {
  /** Steps that leave 1e-10 of the range: the bound is flat where it is best. */
  private static final int THIRDS = 58;

  /** Coefficients of f and 1/f of one part in the upper bound and, with a minus, in the lower. */
  private static final class Row {
    private final Part part;
    private double slope;
    private double upper;
    private double upperInverse;
    private double lower;
    private double lowerInverse;

    private Row(Part part) {
      this.part = part;
    }
  }

  private final List<Row> rows = new ArrayList<>();

  /** Inflow of what is added and of what is taken off, W/(m·K). */
  private double inflowAdded;

  private double inflowTaken;
  private double constantUpper;
  private double constantLower;
  private double allowance;
  private String unbounded = "";

  /** Adds a conductance times a factor. */
  Combination add(double factor, ByPart conductance) {
    return add(factor, conductance, "");
  }

  /**
   * Adds a conductance times a factor.
   *
   * @param factor of either sign
   * @param conductance as it depends on its parts
   * @param of which other detail it is of, to tell its parts from others of their name; or empty
   */
  Combination add(double factor, ByPart conductance, String of) {
    double size = Math.abs(factor);
    for (ByPart.Entry entry : conductance.entries()) {
      Row row = row(entry.part(), of);
      row.slope += factor * entry.slope();
      if (factor > 0) {
        row.upper += size * entry.slope();
        row.lowerInverse += size * entry.resisted();
      } else {
        row.upperInverse += size * entry.resisted();
        row.lower += size * entry.slope();
      }
    }
    if (factor > 0) {
      inflowAdded += size * conductance.inflow();
    } else {
      inflowTaken += size * conductance.inflow();
    }
    allowance += size * conductance.allowance();
    if (unbounded.isEmpty()) {
      unbounded = conductance.unbounded();
    }
    return this;
  }

  /** Takes off what no material in question changes. */
  Combination subtract(Bracket bracket) {
    constantUpper -= bracket.lower();
    constantLower -= bracket.upper();
    return this;
  }

  private Row row(Part part, String of) {
    boolean taken = false;
    for (Row row : rows) {
      if (row.part.same(part)) {
        return row;
      }
      taken |= row.part.name().equals(part.name());
    }
    if (taken && !of.isEmpty()) {
      return row(part.called(part.name() + " in " + of), "");
    }
    Row row = new Row(part);
    rows.add(row);
    return row;
  }

  /** The change per part, for a factor of 1 + h divided by h. */
  List<Result.Sensitivity> sensitivities() {
    List<Result.Sensitivity> all = new ArrayList<>();
    for (Row row : rows) {
      all.add(new Result.Sensitivity(row.part.name(), row.part.film(), row.slope));
    }
    return List.copyOf(all);
  }

  /** What the tolerances add to a single conductance times a factor; empty if it is unknown. */
  static Optional<Result.Tolerance> tolerance(
      double factor, Optional<ByPart> conductance, Quantity quantity) {
    return conductance.isEmpty()
        ? Optional.empty()
        : new Combination().add(factor, conductance.get()).tolerance(quantity);
  }

  /**
   * What the tolerances of the conductivities add.
   *
   * @param quantity the sum as it was worked out
   * @return empty if no conductivity in it has a tolerance
   */
  Optional<Result.Tolerance> tolerance(Quantity quantity) {
    double firstOrder = 0;
    boolean stated = false;
    for (Row row : rows) {
      stated |= row.part.relativeTolerance() > 0;
      firstOrder += Math.abs(row.slope) * row.part.relativeTolerance();
    }
    if (!stated || !Double.isFinite(quantity.value())) {
      return Optional.empty();
    }
    if (!unbounded.isEmpty() || !quantity.certified()) {
      String why =
          quantity.certificate() instanceof Certificate.NotCertified not ? not.reason() : unbounded;
      return Optional.of(
          new Result.Tolerance(firstOrder, new Certificate.NotCertified(why, firstOrder)));
    }
    Certificate.Certified proved = worst();
    double reach = Math.max(proved.upper() - quantity.value(), quantity.value() - proved.lower());
    return Optional.of(new Result.Tolerance(Math.max(0, reach - quantity.halfWidth()), proved));
  }

  /**
   * Any multiple of a flux is a flux too: of all multiples of those added for the lower bound, and
   * of those taken off for the upper one, the best is taken.
   */
  private Certificate.Certified worst() {
    double most = 1;
    for (Row row : rows) {
      most = Math.max(most, 1 / (1 - row.part.relativeTolerance()));
    }
    double high = constantUpper + least(new Above());
    double low = constantLower - least(new Below());
    return new Certificate.Certified(low - allowance * most, high + allowance * most);
  }

  /** The upper bound without its constant, the fluxes taken off multiplied by s. */
  private final class Above implements DoubleUnaryOperator {
    @Override
    public double applyAsDouble(double s) {
      double sum = 0;
      for (Row row : rows) {
        sum += worst(row.upper, s * s * row.upperInverse, row.part.relativeTolerance());
      }
      return sum - 2 * s * inflowTaken;
    }
  }

  /** The lower bound with a minus, without its constant, the fluxes added multiplied by s. */
  private final class Below implements DoubleUnaryOperator {
    @Override
    public double applyAsDouble(double s) {
      double sum = 0;
      for (Row row : rows) {
        sum += worst(row.lower, s * s * row.lowerInverse, row.part.relativeTolerance());
      }
      return sum - 2 * s * inflowAdded;
    }
  }

  /** The largest of a f + b/f for f within 1 ± t: convex for a, b ≥ 0, so at an end. */
  private static double worst(double a, double b, double t) {
    return Math.max(a * (1 + t) + b / (1 + t), a * (1 - t) + b / (1 - t));
  }

  /** The least value of a convex function between 0 and 2, by thirds; 1 counts in any case. */
  private static double least(DoubleUnaryOperator convex) {
    double from = 0;
    double to = 2;
    for (int i = 0; i < THIRDS; i++) {
      double third = (to - from) / 3;
      if (convex.applyAsDouble(from + third) < convex.applyAsDouble(to - third)) {
        to -= third;
      } else {
        from += third;
      }
    }
    return Math.min(convex.applyAsDouble((from + to) / 2), convex.applyAsDouble(1));
  }
}
