package coldseam.solver.result;

import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.Detail;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Heat flows into the detail and their sum, in positive, out negative. */
final class Balances {
  private final Detail detail;
  private final Solution solution;
  private final double[] temperaturesC;

  Balances(Detail detail, Solution solution, double[] temperaturesC) {
    this.detail = detail;
    this.solution = solution;
    this.temperaturesC = temperaturesC;
  }

  /** Flow of a space, W/m; infinite where two fixed temperatures meet in a point. */
  double ofSpace(int space) {
    return solution.spaceFlow(space, temperaturesC);
  }

  /** Sum of all flows over half the sum of their absolute values (ISO 10211). */
  Result.Balance balance() {
    double sum = solution.prescribedFlow();
    double size = Math.abs(sum);
    for (int i = 0; i < detail.spaces().size(); i++) {
      double flow = ofSpace(i);
      if (!Double.isFinite(flow)) {
        return new Result.Balance(Double.NaN, Double.NaN);
      }
      sum += flow;
      size += Math.abs(flow);
    }
    return new Result.Balance(sum, size == 0 ? 0 : sum / (size / 2));
  }

  List<Result.StretchResult> stretches() {
    Conditions conditions = solution.conditions();
    double[] lengths = new double[detail.stretches().size()];
    int[] spaces = new int[lengths.length];
    Arrays.fill(spaces, -1);
    boolean[] mixed = new boolean[lengths.length];
    for (int edge = 0; edge < solution.partition().edgeCount(); edge++) {
      if (conditions.kind(edge) == Kind.NONE) {
        continue;
      }
      for (int stretch : conditions.stretches(edge)) {
        mixed[stretch] |= lengths[stretch] > 0 && spaces[stretch] != conditions.space(edge);
        spaces[stretch] = conditions.space(edge);
        lengths[stretch] += solution.partition().edgeLength(edge);
      }
    }
    List<Result.StretchResult> results = new ArrayList<>();
    for (int i = 0; i < lengths.length; i++) {
      results.add(
          new Result.StretchResult(
              detail.stretches().get(i).name(),
              spaces[i] < 0 || mixed[i] ? "" : detail.spaces().get(spaces[i]).name(),
              solution.stretchFlow(i, temperaturesC),
              lengths[i]));
    }
    return results;
  }
}
