package coldseam.cli.sheet;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What things are called, the same on every sheet. */
final class Words {
  /** Stands on every sheet. */
  static final String SAFETY =
      "Calculated under the assumptions stated. Local codes and a licensed professional decide;"
          + " thermal changes to loadbearing or fire-separating parts need their approval.";

  /** How lengths of a glass edge are measured: projected width of the frame, visible lengths. */
  static final String VISIBLE = "visible";

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

  /** How the lengths of a ψ are measured. */
  static String dimensions(Result.LinearTransmittance psi) {
    return psi.dimensions().isPresent() ? name(psi.dimensions().get()) : VISIBLE;
  }

  static String spaces(List<String> names) {
    return String.join(" + ", names);
  }

  static String between(List<String> warm, List<String> cold) {
    return spaces(warm) + " – " + spaces(cold);
  }

  /** Every number that could have proved bounds: couplings, ψ, χ, U and R. */
  static List<Quantity> numbers(Result result) {
    List<Quantity> numbers = new ArrayList<>();
    for (Result.LinearTransmittance psi : result.psi()) {
      numbers.add(psi.valueWPerMK());
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      numbers.add(u.valueWPerM2K());
      numbers.add(u.resistanceM2KPerW());
    }
    for (Result.PointTransmittance chi : result.chi()) {
      numbers.add(chi.valueWPerK());
    }
    for (Result.Coupling coupling : result.couplings()) {
      numbers.add(coupling.valueWPerMK());
    }
    return numbers;
  }

  /** Whether every number that could have proved bounds has them. */
  static boolean certified(Result result) {
    for (Quantity quantity : numbers(result)) {
      if (!quantity.certified()) {
        return false;
      }
    }
    return !result.couplings().isEmpty();
  }

  /** What tolerances of conductivities add, wherever that is known. */
  static List<Result.Tolerance> tolerances(Result result) {
    List<Result.Tolerance> all = new ArrayList<>();
    for (Result.LinearTransmittance psi : result.psi()) {
      add(all, psi.tolerance());
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      add(all, u.tolerance());
    }
    for (Result.PointTransmittance chi : result.chi()) {
      add(all, chi.tolerance());
    }
    for (Result.Coupling coupling : result.couplings()) {
      add(all, coupling.tolerance());
    }
    return all;
  }

  private static void add(List<Result.Tolerance> all, Optional<Result.Tolerance> tolerance) {
    if (tolerance.isPresent()) {
      all.add(tolerance.get());
    }
  }

  /** Why nothing is proved of a number; empty if something is. */
  static String reason(Quantity quantity) {
    return quantity.certificate() instanceof Certificate.NotCertified not ? not.reason() : "";
  }
}
