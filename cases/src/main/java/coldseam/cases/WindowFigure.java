package coldseam.cases;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;

/** A figure of a window: typed, or a result of a case. */
sealed interface WindowFigure {
  /**
   * The figure.
   *
   * @param results of the cases, in the order of {@link WindowCase#parts()}
   * @return the number with what is known of it; empty if the result has none
   */
  Optional<Quantity> of(List<Result> results);

  /**
   * Typed: it holds as stated.
   *
   * @param bracket the number, or both its ends
   */
  record Typed(Bracket bracket) implements WindowFigure {
    @Override
    public Optional<Quantity> of(List<Result> results) {
      return Optional.of(exact(bracket));
    }
  }

  /** What is taken from a case. */
  enum Kind {
    /** U_f of its frame. */
    FRAME,
    /** ψ_g of its glass edge. */
    GLASS_EDGE,
    /** U_g of its glazing. */
    GLAZING,
    /** A ψ by its name. */
    PSI
  }

  /**
   * A result of a case.
   *
   * @param part the case's place in {@link WindowCase#parts()}
   * @param kind what is taken
   * @param name of a ψ
   */
  record OfCase(int part, Kind kind, String name) implements WindowFigure {
    @Override
    public Optional<Quantity> of(List<Result> results) {
      Result result = results.get(part);
      return switch (kind) {
        case FRAME -> transmittance(result);
        case GLASS_EDGE -> psi(result, Wanted.Frame.GLASS_EDGE);
        case GLAZING -> glazing(result);
        case PSI -> psi(result, name);
      };
    }

    private static Optional<Quantity> transmittance(Result result) {
      for (Result.EffectiveTransmittance u : result.transmittances()) {
        if (u.of().equals(Wanted.Frame.NAME)) {
          return Optional.of(u.valueWPerM2K());
        }
      }
      return Optional.empty();
    }

    private static Optional<Quantity> psi(Result result, String name) {
      for (Result.LinearTransmittance psi : result.psi()) {
        if (psi.name().equals(name)) {
          return Optional.of(psi.valueWPerMK());
        }
      }
      return Optional.empty();
    }

    /** U of the glazing that the glass edge takes off; empty if there are several that differ. */
    private static Optional<Quantity> glazing(Result result) {
      Optional<Bracket> found = Optional.empty();
      for (Result.LinearTransmittance psi : result.psi()) {
        if (!psi.name().equals(Wanted.Frame.GLASS_EDGE)) {
          continue;
        }
        for (Result.Subtracted term : psi.subtracted()) {
          if (term.name().equals(Wanted.Frame.NAME) || term.uWPerM2K().isEmpty()) {
            continue;
          }
          if (found.isPresent() && !same(found.get(), term.uWPerM2K().get())) {
            return Optional.empty();
          }
          found = term.uWPerM2K();
        }
      }
      return found.isEmpty() ? Optional.empty() : Optional.of(exact(found.get()));
    }

    /** Glazings drawn twice differ by rounding. */
    private static boolean same(Bracket one, Bracket other) {
      return Math.abs(one.mid() - other.mid()) <= 1e-9 * Math.abs(one.mid());
    }
  }

  /** A bracket as a quantity that lies between its ends. */
  private static Quantity exact(Bracket bracket) {
    return new Quantity(bracket.mid(), new Certificate.Certified(bracket.lower(), bracket.upper()));
  }
}
