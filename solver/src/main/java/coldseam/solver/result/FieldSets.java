package coldseam.solver.result;

import coldseam.solver.detail.FilmSet;
import java.util.Optional;

/**
 * The fields of each film set.
 *
 * @param heatLoss with the films for heat loss
 * @param surface with the films for surface temperatures; empty if no result needs them
 */
record FieldSets(FieldSet heatLoss, Optional<FieldSet> surface) {
  FieldSet of(FilmSet filmSet) {
    return filmSet == FilmSet.HEAT_LOSS ? heatLoss : surface.orElseThrow();
  }
}
