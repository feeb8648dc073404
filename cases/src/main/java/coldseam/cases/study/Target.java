package coldseam.cases.study;

import coldseam.cases.TypedNumber;
import coldseam.cases.words.Spelling;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What a number of a result is to be: {@code psi.external <= 0.10}.
 *
 * @param kind which kind of number
 * @param of whose, as typed; empty if there is only one
 * @param atMost whether it is to be at most the limit, rather than at least
 * @param limit in the unit of the kind
 */
public record Target(Measure.Kind kind, Optional<String> of, boolean atMost, double limit) {
  private static final String EXAMPLE = "e.g. --until 'psi.external <= 0.10' or 'fRsi >= 0.75'";

  /**
   * Reads a target.
   *
   * @param typed as typed
   * @return the target
   * @throws StudyException if it cannot be understood
   */
  public static Target read(String typed) throws StudyException {
    String text = typed.replace("≤", "<=").replace("≥", ">=");
    int at = Math.max(text.indexOf("<="), text.indexOf(">="));
    if (at < 0) {
      throw new StudyException("\"" + typed + "\" compares nothing by <= or >=; " + EXAMPLE);
    }
    String left = text.substring(0, at).strip();
    int dot = left.indexOf('.');
    String name = dot < 0 ? left : left.substring(0, dot).strip();
    Measure.Kind kind = kind(name);
    String right = text.substring(at + 2).strip();
    OptionalDouble limit = TypedNumber.in(right, kind.unit());
    if (limit.isEmpty() || !Double.isFinite(limit.getAsDouble())) {
      String in = kind.unit().isEmpty() ? "" : " in " + kind.unit();
      throw new StudyException("\"" + right + "\" is no number" + in + " for " + name);
    }
    Optional<String> of = dot < 0 ? Optional.empty() : Optional.of(left.substring(dot + 1).strip());
    return new Target(kind, of, text.startsWith("<=", at), limit.getAsDouble());
  }

  private static Measure.Kind kind(String name) throws StudyException {
    List<String> words = new ArrayList<>();
    for (Measure.Kind kind : Measure.Kind.values()) {
      if (kind.word().equals(name)) {
        return kind;
      }
      words.add(kind.word());
    }
    throw new StudyException(
        Spelling.nearest(name, words)
            .map(near -> "there is no " + name + "; did you mean " + near + "?")
            .orElse("\"" + name + "\" is none of " + String.join(", ", words) + "; " + EXAMPLE));
  }

  /**
   * The number meant, of a result.
   *
   * @param result the result
   * @return the number
   * @throws StudyException if there is none, or several could be meant
   */
  Measure in(Result result) throws StudyException {
    List<Measure> some = new ArrayList<>();
    for (Measure measure : Measure.all(result)) {
      if (measure.kind() == kind) {
        some.add(measure);
      }
    }
    if (some.isEmpty()) {
      throw new StudyException(
          "the case has no " + kind.word() + " that is finite; ask for it in the case first");
    }
    if (of.isEmpty()) {
      if (some.size() > 1) {
        throw new StudyException(
            kind.word() + " can be " + list(some) + "; say which: " + some.get(0).typedName());
      }
      return some.get(0);
    }
    for (Measure measure : some) {
      if (same(measure.of(), of.get())) {
        return measure;
      }
    }
    return byDimensions(result, some);
  }

  /** The only ψ of a dimension system, if that was typed instead of a name. */
  private Measure byDimensions(Result result, List<Measure> some) throws StudyException {
    List<Measure> found = new ArrayList<>();
    for (Result.LinearTransmittance psi : result.psi()) {
      if (kind == Measure.Kind.PSI
          && psi.dimensions().isPresent()
          && same(psi.dimensions().get().name(), of.get())) {
        for (Measure measure : some) {
          if (measure.of().equals(psi.name())) {
            found.add(measure);
          }
        }
      }
    }
    if (found.size() == 1) {
      return found.get(0);
    }
    if (found.size() > 1) {
      throw new StudyException(
          "several "
              + kind.symbol()
              + " are "
              + of.get()
              + ": "
              + list(found)
              + "; say which: "
              + found.get(0).typedName());
    }
    throw new StudyException(
        "there is no " + kind.word() + "." + of.get() + "; there is " + list(some));
  }

  /** Upper and lower case, blanks and dashes do not matter. */
  private static boolean same(String one, String other) {
    return folded(one).equals(folded(other));
  }

  private static String folded(String text) {
    StringBuilder folded = new StringBuilder();
    for (char c : text.toLowerCase(Locale.ROOT).toCharArray()) {
      if (Character.isLetterOrDigit(c)) {
        folded.append(c);
      }
    }
    return folded.toString();
  }

  private static String list(List<Measure> some) {
    List<String> names = new ArrayList<>();
    for (Measure measure : some) {
      names.add(measure.typedName());
    }
    return String.join(", ", names);
  }

  /** Whether a number surely meets it: the whole of its interval does. */
  public boolean met(Measure measure) {
    return atMost ? measure.upper() <= limit : measure.lower() >= limit;
  }

  /** Whether a number surely does not: nothing of its interval does. */
  public boolean missed(Measure measure) {
    if (measure.knowledge() == Measure.Knowledge.ESTIMATE) {
      return !met(measure);
    }
    return atMost ? measure.lower() > limit : measure.upper() < limit;
  }
}
