package coldseam.solver.result;

import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;

/**
 * Temperature weighting factors g with θ(point) = Σ g_k θ_k (ISO 10211, more than two
 * environments): the unit fields at the coldest point of each inside space and at named points.
 */
final class Weights {
  private static final int FEWEST_SPACES = 3;

  private final Detail detail;
  private final List<Result.Weight> weights = new ArrayList<>();

  private Weights(Detail detail) {
    this.detail = detail;
  }

  /**
   * Works them out.
   *
   * @param detail the detail
   * @param surfaces coldest points
   * @param coldestFields the fields they were found in
   * @param fields the fields of each film set
   */
  static List<Result.Weight> of(
      Detail detail, SurfaceTemperatures surfaces, FieldSet coldestFields, FieldSets fields) {
    BitSet faced = Couplings.faced(coldestFields.solution());
    if (faced.cardinality() < FEWEST_SPACES) {
      return List.of();
    }
    Weights all = new Weights(detail);
    for (int i = faced.nextSetBit(0); i >= 0; i = faced.nextSetBit(i + 1)) {
      if (detail.spaces().get(i).exposure() == Exposure.INSIDE) {
        String name = "coldest of " + detail.spaces().get(i).name();
        Optional<SurfaceTemperatures.Extreme> coldest = surfaces.extreme(i, true);
        if (coldest.isPresent()) {
          SurfaceTrace.Place place = coldest.get().place();
          for (int k = faced.nextSetBit(0); k >= 0; k = faced.nextSetBit(k + 1)) {
            all.add(name, coldestFields, k, place.side().at(coldestFields.unit(k), place.s()));
          }
        }
      }
    }
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Temperature point) {
        FieldSet set = fields.of(point.filmSet());
        for (int k = faced.nextSetBit(0); k >= 0; k = faced.nextSetBit(k + 1)) {
          all.add(point.name(), set, k, set.at(set.unit(k), point.at()));
        }
      }
    }
    return all.weights;
  }

  private void add(String point, FieldSet set, int space, double g) {
    weights.add(new Result.Weight(point, set.filmSet(), detail.spaces().get(space).name(), g));
  }
}
