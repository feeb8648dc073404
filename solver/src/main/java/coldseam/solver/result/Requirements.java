package coldseam.solver.result;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What a case requires of its results, and whether it is met. */
final class Requirements {
  private final List<Wanted.Requirement> wanted = new ArrayList<>();

  Requirements(Detail detail) {
    for (Wanted any : detail.wanted()) {
      if (any instanceof Wanted.Requirement requirement) {
        wanted.add(requirement);
      }
    }
  }

  /** Requirements of what has no f_Rsi. */
  static List<Fault> unanswered(List<Result.Required> required, List<Wanted.Requirement> asked) {
    List<Fault> faults = new ArrayList<>();
    for (Wanted.Requirement one : asked) {
      boolean answered = false;
      for (Result.Required answer : required) {
        answered |=
            answer.kind() == one.kind()
                && (one.name().isEmpty() || one.name().equals(answer.name()));
      }
      if (!answered) {
        faults.add(
            new Fault(
                "require",
                one.name(),
                one.kind() == Wanted.Requirement.Kind.F_RSI
                    ? "nothing there has an f_Rsi; require it of an inside space that is warmer"
                        + " than another"
                    : "there is no such result",
                Optional.empty()));
      }
    }
    return faults;
  }

  List<Wanted.Requirement> wanted() {
    return wanted;
  }

  List<Result.Required> evaluate(
      List<Result.SpaceResult> spaces,
      List<Result.LinearTransmittance> psi,
      List<Result.EffectiveTransmittance> transmittances,
      List<SpaceMoisture> moisture) {
    List<Result.Required> all = new ArrayList<>();
    for (Wanted.Requirement one : wanted) {
      switch (one.kind()) {
        case F_RSI -> factors(one, spaces, all);
        case PSI -> {
          for (Result.LinearTransmittance each : psi) {
            if (each.name().equals(one.name())) {
              all.add(atMost(one, each.valueWPerMK()));
            }
          }
        }
        case U -> {
          for (Result.EffectiveTransmittance each : transmittances) {
            if (each.of().equals(one.name())) {
              all.add(atMost(one, each.valueWPerM2K()));
            }
          }
        }
        case MOISTURE -> {
          for (SpaceMoisture each : moisture) {
            all.add(
                new Result.Required(
                    one.kind(),
                    each.space(),
                    Double.NaN,
                    0,
                    Double.NaN,
                    each.verdict(each.atSurface())));
          }
        }
      }
    }
    return all;
  }

  private static void factors(
      Wanted.Requirement one, List<Result.SpaceResult> spaces, List<Result.Required> into) {
    for (Result.SpaceResult space : spaces) {
      boolean asked = one.name().isEmpty() || one.name().equals(space.name());
      if (!asked || space.coldest().isEmpty() || space.coldest().get().fRsi().isEmpty()) {
        continue;
      }
      Result.SurfacePoint point = space.coldest().get();
      double value = point.fRsi().getAsDouble();
      double difference = (space.temperatureC() - point.temperatureC()) / (1 - value);
      double error = value == 1 ? 0 : point.estimatedErrorK() / Math.abs(difference);
      into.add(
          new Result.Required(
              one.kind(),
              space.name(),
              value,
              error,
              one.limit(),
              Verdict.of(value - one.limit(), error)));
    }
  }

  /** Decided by the interval, whose ends need not lie alike from the value. */
  private static Result.Required atMost(Wanted.Requirement one, Quantity quantity) {
    double lower = quantity.value() - quantity.halfWidth();
    double upper = quantity.value() + quantity.halfWidth();
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      lower = proved.lower();
      upper = proved.upper();
    }
    Verdict verdict = Verdict.UNDECIDED;
    if (upper <= one.limit()) {
      verdict = Verdict.MET;
    } else if (lower > one.limit()) {
      verdict = Verdict.NOT_MET;
    }
    return new Result.Required(
        one.kind(), one.name(), quantity.value(), quantity.halfWidth(), one.limit(), verdict);
  }
}
