package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/**
 * Tells whether the half-widths asked for were reached.
 *
 * @param asked the half-widths asked for
 */
record Reached(Accuracy asked) {
  /** Half-widths that exceed what was asked by rounding alone count as reached. */
  private static final double ROUNDING = 1 + 1e-9;

  private static final int MOST_DECIMALS = 12;

  /**
   * A number that is not known as well as was asked.
   *
   * @param what its name
   * @param asked the half-width asked for
   * @param reached the half-width reached
   * @param unit of both
   * @param option how the half-width is asked for
   */
  record Missed(String what, double asked, double reached, String unit, String option) {
    /** In words, with the half-width reached rounded up and the one asked for as it counts. */
    String inWords() {
      return what
          + ": asked ± "
          + Digits.significant(asked, 3)
          + ", reached ± "
          + (Double.isFinite(reached) ? Digits.outward(reached, 2, MOST_DECIMALS) : "?")
          + " "
          + unit;
    }
  }

  boolean by(Result result) {
    return missed(result).isEmpty();
  }

  /** Every number that is not known as well as was asked, in the order of the card. */
  List<Missed> missed(Result result) {
    List<Missed> missed = new ArrayList<>();
    for (Result.LinearTransmittance psi : result.psi()) {
      double allowed = asked.psiWPerMK() + stated(psi);
      note(missed, "ψ " + psi.name(), psi.valueWPerMK(), allowed, "W/(m·K)", "psi");
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      double allowed =
          Math.max(
              asked.transmittanceRelative() * Math.abs(u.valueWPerM2K().value()),
              asked.negligibleWPerMK() / u.widthM());
      note(missed, "U " + u.of(), u.valueWPerM2K(), allowed, "W/(m²·K)", "U");
    }
    for (Result.PointTransmittance chi : result.chi()) {
      double allowed =
          Math.max(asked.pointWPerK(chi.valueWPerK().value()), asked.negligibleWPerMK())
              + stated(chi);
      note(missed, "χ " + chi.name(), chi.valueWPerK(), allowed, "W/K", "chi");
    }
    Counted counted = Counted.of(result);
    for (Result.Coupling coupling : result.couplings()) {
      String name = counted.coupling();
      String what = name + " " + coupling.from() + " – " + coupling.to();
      note(missed, what, coupling.valueWPerMK(), allowed(coupling, result), counted.unit(), name);
    }
    return missed;
  }

  private static void note(
      List<Missed> missed,
      String what,
      Quantity quantity,
      double allowed,
      String unit,
      String option) {
    if (exceeds(quantity, allowed)) {
      missed.add(new Missed(what, allowed, quantity.halfWidth(), unit, option));
    }
  }

  /**
   * What was not reached and what can be done about it, a line each.
   *
   * @param result the result
   * @return the lines; none if everything was reached
   */
  List<String> inWords(Result result) {
    List<String> lines = new ArrayList<>();
    Set<String> options = new LinkedHashSet<>();
    for (Missed missed : missed(result)) {
      lines.add(missed.inWords());
      options.add(missed.option());
    }
    if (!lines.isEmpty()) {
      lines.add(
          "refinement stopped at "
              + Digits.grouped(result.unknowns())
              + " unknowns, with "
              + Digits.grouped(asked.mostUnknowns())
              + " allowed: allow more with --most-unknowns, or ask for a coarser accuracy of "
              + String.join(", ", options)
              + " with --accuracy");
    }
    return lines;
  }

  /** What is uncertain of a ψ before anything is solved: U given or known only as a range. */
  private static double stated(Result.LinearTransmittance psi) {
    double sum = 0;
    for (Result.Subtracted term : psi.subtracted()) {
      if (term.uWPerM2K().isPresent()) {
        sum += (term.valueWPerMK().upper() - term.valueWPerMK().lower()) / 2;
      }
    }
    return sum;
  }

  /** The same of a χ. */
  private static double stated(Result.PointTransmittance chi) {
    double sum = 0;
    for (Result.PointTerm term : chi.subtracted()) {
      if (term.areaM2().isPresent() || term.lengthM().isPresent()) {
        sum += (term.valueWPerK().upper() - term.valueWPerK().lower()) / 2;
      }
    }
    return sum;
  }

  /**
   * The half-width allowed for a coupling: relative to √(A_ii A_jj), the geometric mean of all that
   * couples to its two spaces, since a coupling next to nothing cannot be known to a part of
   * itself; the smaller of that and the absolute one, but never nothing.
   */
  private double allowed(Result.Coupling coupling, Result result) {
    double scale = Math.sqrt(total(coupling.from(), result) * total(coupling.to(), result));
    return Math.max(
        asked.negligibleWPerMK(),
        Math.min(asked.couplingRelative() * scale, asked.couplingWPerMK()));
  }

  private static double total(String space, Result result) {
    double sum = 0;
    for (Result.Coupling coupling : result.couplings()) {
      if (coupling.from().equals(space) || coupling.to().equals(space)) {
        sum += Math.abs(coupling.valueWPerMK().value());
      }
    }
    return sum;
  }

  private static boolean exceeds(Quantity quantity, double allowed) {
    return Double.isFinite(quantity.value()) && !(quantity.halfWidth() <= allowed * ROUNDING);
  }
}
