package coldseam.solver.result;

import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Wanted;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** The edge of a floor next to the ground: its F-factor (US practice; *from memory*). */
final class FloorEdges {
  private FloorEdges() {}

  static Optional<Result.FloorEdge> evaluate(
      Detail detail,
      double[] temperaturesC,
      List<Result.StretchResult> stretches,
      Couplings couplings) {
    for (Wanted any : detail.wanted()) {
      if (any instanceof Wanted.FloorEdge edge) {
        return Optional.of(evaluate(detail, edge, temperaturesC, stretches, couplings));
      }
    }
    return Optional.empty();
  }

  private static Result.FloorEdge evaluate(
      Detail detail,
      Wanted.FloorEdge edge,
      double[] temperaturesC,
      List<Result.StretchResult> stretches,
      Couplings couplings) {
    int warm = detail.spaceIndex(edge.warm());
    int cold = detail.spaceIndex(edge.cold());
    double difference = temperaturesC[warm] - temperaturesC[cold];
    if (!edge.factor() || detail.spaces().size() != 2 || difference == 0) {
      return new Result.FloorEdge(edge, OptionalDouble.empty(), 0);
    }
    double error = couplings.between(new int[] {warm}, new int[] {cold}, new int[0]).halfWidth();
    for (Result.StretchResult stretch : stretches) {
      if (stretch.name().equals(edge.surface())) {
        return new Result.FloorEdge(
            edge, OptionalDouble.of(stretch.heatFlowWPerM() / difference), error);
      }
    }
    return new Result.FloorEdge(edge, OptionalDouble.empty(), 0);
  }
}
