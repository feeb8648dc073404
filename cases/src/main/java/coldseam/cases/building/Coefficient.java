package coldseam.cases.building;

import coldseam.cases.CaseException;
import coldseam.cases.OpenValue;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.ledger.Uncertain;
import coldseam.solver.result.Result;
import java.util.List;

/** U, ψ or χ of a part: known, or a result of a case. */
sealed interface Coefficient {
  /**
   * The number.
   *
   * @param results of the cases, in the order of {@link Building#parts()}
   * @return it with its intervals
   * @throws CaseException if the case does not give it
   */
  Uncertain of(List<Result> results) throws CaseException;

  /** Where it comes from, in words; empty if it was typed. */
  String source();

  /**
   * Typed, or worked out from what was typed.
   *
   * @param number with its intervals
   * @param source in words
   */
  record Known(Uncertain number, String source) implements Coefficient {
    @Override
    public Uncertain of(List<Result> results) {
      return number;
    }
  }

  /**
   * A ψ of a case.
   *
   * @param part the case's place in {@link Building#parts()}
   * @param psi name of the ψ
   * @param source in words
   * @param place where it was asked for
   */
  record Solved(int part, String psi, String source, OpenValue place) implements Coefficient {
    @Override
    public Uncertain of(List<Result> results) throws CaseException {
      for (Result.LinearTransmittance one : results.get(part).psi()) {
        if (one.name().equals(psi) && Double.isFinite(one.valueWPerMK().value())) {
          return number(one);
        }
      }
      throw place.mistake(
          "ψ `" + psi + "` has no finite value",
          "two fixed temperatures meet in a point of that case; give its surfaces films");
    }

    /** With the interval that is proved for every combination of conductivities, where it is. */
    private static Uncertain number(Result.LinearTransmittance psi) {
      if (psi.tolerance().isEmpty()) {
        return Uncertain.of(psi.valueWPerMK(), 0);
      }
      Result.Tolerance tolerance = psi.tolerance().get();
      Uncertain plain = Uncertain.of(psi.valueWPerMK(), tolerance.halfWidth());
      if (tolerance.certificate() instanceof Certificate.Certified proved) {
        return new Uncertain(
            plain.value(),
            plain.lower(),
            plain.upper(),
            proved.lower(),
            proved.upper(),
            plain.doubt());
      }
      return plain;
    }
  }
}
