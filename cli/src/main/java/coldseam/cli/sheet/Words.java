package coldseam.cli.sheet;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import java.util.List;

/** What things are called, the same on every sheet. */
final class Words {
  /** Stands on every sheet. */
  static final String SAFETY =
      "Calculated under the assumptions stated. Local codes and a licensed professional decide;"
          + " thermal changes to loadbearing or fire-separating parts need their approval.";

  private Words() {}

  static String name(FilmSet set) {
    return set == FilmSet.HEAT_LOSS ? "heat-loss" : "surface";
  }

  static String name(DimensionSystem system) {
    return switch (system) {
      case INTERNAL -> "internal";
      case OVERALL_INTERNAL -> "overall-internal";
      case EXTERNAL -> "external";
    };
  }

  static String spaces(List<String> names) {
    return String.join(" + ", names);
  }

  static String between(List<String> warm, List<String> cold) {
    return spaces(warm) + " – " + spaces(cold);
  }

  /** Whether every number that has bounds at all has proved ones. */
  static boolean certified(Result result) {
    for (Result.Coupling coupling : result.couplings()) {
      if (!coupling.valueWPerMK().certified()) {
        return false;
      }
    }
    for (Result.LinearTransmittance psi : result.psi()) {
      if (!psi.valueWPerMK().certified()) {
        return false;
      }
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      if (!u.valueWPerM2K().certified()) {
        return false;
      }
    }
    return !result.couplings().isEmpty();
  }

  /** Why nothing is proved of a number; empty if something is. */
  static String reason(Quantity quantity) {
    return quantity.certificate() instanceof Certificate.NotCertified not ? not.reason() : "";
  }
}
