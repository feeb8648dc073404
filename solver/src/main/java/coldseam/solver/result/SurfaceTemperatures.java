package coldseam.solver.result;

import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The coldest and the warmest point of the surfaces that face each space, and f_Rsi = (θsi −
 * θe)/(θi − θe) there (ISO 10211; ISO 13788), θe being the coldest space the detail touches.
 * Estimates: no bound is known for them.
 */
final class SurfaceTemperatures {
  /**
   * By how much, as a part of the largest temperature difference, surface points still moved at
   * most when refinement ended: 0.01 K of 25 K.
   */
  static final double STEADY = 0.01 / 25;

  /** Differences below this part of the largest one count as none. */
  private static final double TIE = 1e-9;

  private final Detail detail;
  private final double[] temperaturesC;
  private final FieldSet fields;
  private final Conditions conditions;
  private final BitSet faced;
  private final int reference;
  private final double span;

  /** An extreme point of a surface. */
  record Extreme(SurfaceTrace.Place place, double temperatureC) {}

  SurfaceTemperatures(Detail detail, double[] temperaturesC, FieldSet fields) {
    this.detail = detail;
    this.temperaturesC = temperaturesC;
    this.fields = fields;
    conditions = fields.solution().conditions();
    faced = Couplings.faced(fields.solution());
    int coldest = -1;
    double high = Double.NEGATIVE_INFINITY;
    for (int i = faced.nextSetBit(0); i >= 0; i = faced.nextSetBit(i + 1)) {
      coldest = coldest < 0 || temperaturesC[i] < temperaturesC[coldest] ? i : coldest;
      high = Math.max(high, temperaturesC[i]);
    }
    reference = coldest;
    span = coldest < 0 ? 0 : high - temperaturesC[coldest];
  }

  /** The estimated error of a surface temperature, K. */
  double errorK() {
    return STEADY * span;
  }

  /** What concerns every space, its flow taken from the heat-loss solution. */
  List<Result.SpaceResult> spaces(Balances flows) {
    List<Result.SpaceResult> results = new ArrayList<>();
    for (int i = 0; i < detail.spaces().size(); i++) {
      Space space = detail.spaces().get(i);
      boolean compared = hasFactor(i);
      results.add(
          new Result.SpaceResult(
              space.name(),
              temperaturesC[i],
              space.floating().isPresent(),
              flows.ofSpace(i),
              point(extreme(i, true)),
              point(extreme(i, false)),
              compared ? Optional.of(detail.spaces().get(reference).name()) : Optional.empty()));
    }
    return results;
  }

  /** The coldest (or warmest) point of a space's surfaces, the first found among equal ones. */
  Optional<Extreme> extreme(int space, boolean coldest) {
    if (!faced.get(space)) {
      return Optional.empty();
    }
    double sign = coldest ? 1 : -1;
    double least = Double.POSITIVE_INFINITY;
    SurfaceTrace.Place best = null;
    for (SurfaceTrace.Side side : fields.trace().sides()) {
      if (conditions.space(side.edge()) != space) {
        continue;
      }
      for (double s : new double[] {0, 0.5, 1, side.turningPoint(fields.field())}) {
        double value = sign * temperature(side, s);
        if (value < least - TIE * span) {
          least = value;
          best = new SurfaceTrace.Place(side, s);
        }
      }
    }
    return best == null
        ? Optional.empty()
        : Optional.of(new Extreme(best, temperature(best.side(), best.s())));
  }

  /** On a surface of fixed temperature the field may jump at its ends; the surface does not. */
  private double temperature(SurfaceTrace.Side side, double s) {
    return conditions.kind(side.edge()) == Kind.FIXED
        ? temperaturesC[conditions.space(side.edge())]
        : side.at(fields.field(), s);
  }

  private Optional<Result.SurfacePoint> point(Optional<Extreme> extreme) {
    return extreme.isEmpty() ? Optional.empty() : Optional.of(point(extreme.get()));
  }

  private Result.SurfacePoint point(Extreme extreme) {
    int edge = extreme.place().side().edge();
    int space = conditions.space(edge);
    boolean factor = hasFactor(space) && conditions.kind(edge) == Kind.FILM;
    return new Result.SurfacePoint(
        fields.filmSet(),
        extreme.temperatureC(),
        fields.trace().point(extreme.place()),
        conditions.filmM2KPerW(edge),
        factor
            ? OptionalDouble.of(
                (extreme.temperatureC() - temperaturesC[reference])
                    / (temperaturesC[space] - temperaturesC[reference]))
            : OptionalDouble.empty(),
        conditions.kind(edge) == Kind.FIXED ? 0 : errorK());
  }

  /** f_Rsi is given on inside surfaces of spaces warmer than the reference, surface films only. */
  private boolean hasFactor(int space) {
    return fields.filmSet() == FilmSet.SURFACE
        && faced.get(space)
        && detail.spaces().get(space).exposure() == Exposure.INSIDE
        && temperaturesC[space] > temperaturesC[reference];
  }
}
