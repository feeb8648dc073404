package coldseam.cli.sheet;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;

/**
 * Tells whether the half-widths asked for were reached.
 *
 * @param asked the half-widths asked for
 */
record Reached(Accuracy asked) {
  /** Half-widths that exceed what was asked by rounding alone count as reached. */
  private static final double ROUNDING = 1 + 1e-9;

  boolean by(Result result) {
    for (Result.LinearTransmittance psi : result.psi()) {
      if (exceeds(psi.valueWPerMK(), asked.psiWPerMK() + stated(psi))) {
        return false;
      }
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      double allowed =
          Math.max(
              asked.transmittanceRelative() * Math.abs(u.valueWPerM2K().value()),
              asked.negligibleWPerMK() / u.widthM());
      if (exceeds(u.valueWPerM2K(), allowed)) {
        return false;
      }
    }
    for (Result.Coupling coupling : result.couplings()) {
      if (exceeds(coupling.valueWPerMK(), allowed(coupling, result))) {
        return false;
      }
    }
    return true;
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
