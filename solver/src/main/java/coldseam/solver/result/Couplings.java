package coldseam.solver.result;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Coupling coefficients of a solution (ISO 10211, several environments): the matrix A with A_ij =
 * −L_ij, to which the stated conductances of floating spaces are added. A floating space f has no
 * net flow, Σ_j A_fj θ_j + Φ_f = 0, and is eliminated by the Schur complement.
 */
final class Couplings {
  private final Detail detail;
  private final Solution solution;
  private final double[][] matrix;

  /** What the floating spaces' own conductances add to A. */
  private final double[][] joined;

  private final int count;

  Couplings(Detail detail, Solution solution) {
    this.detail = detail;
    this.solution = solution;
    count = detail.spaces().size();
    matrix = new double[count][count];
    joined = new double[count][count];
    for (int i = 0; i < count; i++) {
      for (int j = 0; j < count; j++) {
        matrix[i][j] = solution.matrix(i, j);
      }
    }
    for (int i = 0; i < count; i++) {
      Optional<Space.Floating> floating = detail.spaces().get(i).floating();
      if (floating.isPresent() && floating.get().conductanceWPerMK() > 0) {
        join(i, detail.spaceIndex(floating.get().to()), floating.get().conductanceWPerMK());
      }
    }
  }

  private void join(int i, int j, double conductance) {
    for (double[][] a : new double[][][] {matrix, joined}) {
      a[i][i] += conductance;
      a[j][j] += conductance;
      a[i][j] -= conductance;
      a[j][i] -= conductance;
    }
  }

  /** L2D of every pair of spaces that the section faces. */
  List<Result.Coupling> pairs() {
    BitSet faced = faced(solution);
    List<Result.Coupling> pairs = new ArrayList<>();
    for (int i = faced.nextSetBit(0); i >= 0; i = faced.nextSetBit(i + 1)) {
      for (int j = faced.nextSetBit(i + 1); j >= 0; j = faced.nextSetBit(j + 1)) {
        pairs.add(pair(i, j));
      }
    }
    return pairs;
  }

  private Result.Coupling pair(int i, int j) {
    int[] from = {i};
    int[] to = {j};
    Quantity value = solution.coupling(from, to);
    return new Result.Coupling(
        name(i),
        name(j),
        value,
        Combination.tolerance(1, byPart(from, to, Map.of(), new int[0]), value));
  }

  static BitSet faced(Solution solution) {
    return faced(solution.partition().edgeCount(), solution.conditions());
  }

  static BitSet faced(int edgeCount, Conditions conditions) {
    BitSet faced = new BitSet();
    for (int edge = 0; edge < edgeCount; edge++) {
      if (conditions.space(edge) >= 0) {
        faced.set(conditions.space(edge));
      }
    }
    return faced;
  }

  String name(int space) {
    return detail.spaces().get(space).name();
  }

  /**
   * Coupling of two groups of spaces with floating ones eliminated.
   *
   * @param warm one group
   * @param cold the other
   * @param floating indices of the spaces to eliminate, none of them in the groups
   */
  Quantity between(int[] warm, int[] cold, int[] floating) {
    Quantity direct = solution.coupling(warm, cold);
    if (floating.length == 0 || !Double.isFinite(direct.value())) {
      return direct;
    }
    if (solution.bounds().isPresent()) {
      Optional<Quantity> proved =
          FloatingBounds.coupling(solution.bounds().get(), joined, floating, warm, cold);
      if (proved.isPresent()) {
        return proved.get();
      }
    }
    double[][] responses = responses(floating);
    double through = 0;
    double estimate = direct.halfWidth();
    String reason = "a floating space lies between";
    for (int f = 0; f < floating.length; f++) {
      for (int w : warm) {
        for (int c : cold) {
          through -= matrix[w][floating[f]] * responses[f][c];
        }
      }
      estimate += solution.coupling(warm, new int[] {floating[f]}).halfWidth();
      estimate += solution.coupling(new int[] {floating[f]}, cold).halfWidth();
    }
    if (direct.certificate() instanceof Certificate.NotCertified not) {
      reason = not.reason();
    }
    return new Quantity(direct.value() + through, new Certificate.NotCertified(reason, estimate));
  }

  /**
   * How a coupling of two groups depends on materials and films.
   *
   * @param warm one group
   * @param cold the other
   * @param weights spaces between that count as often as said, by index
   * @param floating indices of the spaces to eliminate
   * @return empty where the coupling is infinite
   */
  Optional<ByPart> byPart(int[] warm, int[] cold, Map<Integer, Double> weights, int[] floating) {
    double[] x = extended(warm, floating);
    double[] y = extended(cold, floating);
    boolean finite = Double.isFinite(solution.coupling(warm, cold).value());
    for (Map.Entry<Integer, Double> weight : weights.entrySet()) {
      int[] between = {weight.getKey()};
      finite &= Double.isFinite(solution.coupling(warm, between).value());
      double[] more = extended(between, floating);
      for (int i = 0; i < count; i++) {
        y[i] += weight.getValue() * more[i];
      }
    }
    if (!finite) {
      return Optional.empty();
    }
    boolean whole = floating.length == 0 && weights.isEmpty() && warm.length + cold.length == count;
    return Optional.of(ByPart.coupling(detail, solution.dissipation(), x, y, whole));
  }

  /** 1 in a group, what the floating spaces take of it, 0 elsewhere. */
  private double[] extended(int[] group, int[] floating) {
    double[] x = new double[count];
    for (int i : group) {
      x[i] = 1;
    }
    if (floating.length > 0) {
      double[][] responses = responses(floating);
      for (int f = 0; f < floating.length; f++) {
        for (int i : group) {
          x[floating[f]] += responses[f][i];
        }
      }
    }
    return x;
  }

  /**
   * How {@link #response} depends on materials and films: ∂r = −A_ff⁻¹ (∂A ỹ)_f.
   *
   * @return dimensionless slopes, never bounded
   */
  ByPart responseByPart(int[] floating, int which, int[] cold) {
    int size = floating.length;
    double[][] system = new double[size][2 * size];
    for (int f = 0; f < size; f++) {
      system[f][size + f] = 1;
      for (int g = 0; g < size; g++) {
        system[f][g] = matrix[floating[f]][floating[g]];
      }
    }
    eliminate(system, floating);
    double[] x = new double[count];
    for (int f = 0; f < size; f++) {
      for (int g = 0; g < size; g++) {
        x[floating[g]] += floating[f] == which ? system[f][size + g] : 0;
      }
    }
    return ByPart.coupling(detail, solution.dissipation(), x, extended(cold, floating), false);
  }

  /** By how much a floating space warms when the cold group warms by 1 K, 0 … 1. */
  double response(int[] floating, int which, int[] cold) {
    double[][] responses = responses(floating);
    double sum = 0;
    for (int f = 0; f < floating.length; f++) {
      if (floating[f] == which) {
        for (int c : cold) {
          sum += responses[f][c];
        }
      }
    }
    return sum;
  }

  /** Row f: temperature of floating space f per kelvin of each other space. */
  private double[][] responses(int[] floating) {
    int size = floating.length;
    double[][] system = new double[size][size + count];
    for (int f = 0; f < size; f++) {
      for (int g = 0; g < size; g++) {
        system[f][g] = matrix[floating[f]][floating[g]];
      }
      for (int j = 0; j < count; j++) {
        if (!contains(floating, j)) {
          system[f][size + j] = -matrix[floating[f]][j];
        }
      }
    }
    eliminate(system, floating);
    double[][] responses = new double[size][count];
    for (int f = 0; f < size; f++) {
      System.arraycopy(system[f], size, responses[f], 0, count);
    }
    return responses;
  }

  /** Gauss–Jordan without exchanges: the matrix is symmetric positive definite. */
  private void eliminate(double[][] system, int[] floating) {
    int size = floating.length;
    for (int k = 0; k < size; k++) {
      double pivot = system[k][k];
      if (!(pivot > 0) || !Double.isFinite(pivot)) {
        throw undetermined(floating[k]);
      }
      for (int j = 0; j < system[k].length; j++) {
        system[k][j] /= pivot;
      }
      for (int i = 0; i < size; i++) {
        double factor = system[i][k];
        if (i != k && factor != 0) {
          for (int j = 0; j < system[i].length; j++) {
            system[i][j] -= factor * system[k][j];
          }
        }
      }
    }
  }

  private DetailException undetermined(int space) {
    return new DetailException(
        List.of(
            new Fault(
                "space",
                name(space),
                "floats, but its temperature cannot be worked out: its surface has a fixed"
                    + " temperature that meets another one in a point, or no heat reaches it",
                Optional.empty())));
  }

  /** Temperature of every space, °C; of the floating ones as they follow from the others. */
  double[] temperatures() {
    double[] stated = new double[count];
    for (int i = 0; i < count; i++) {
      stated[i] = detail.spaces().get(i).temperatureC();
    }
    return temperatures(stated);
  }

  /**
   * Temperature of every space.
   *
   * @param statedC temperatures; those of floating spaces are ignored
   */
  double[] temperatures(double[] statedC) {
    int[] floating = floating(detail);
    double[] temperatures = statedC.clone();
    for (int f : floating) {
      temperatures[f] = 0;
    }
    if (floating.length == 0) {
      return temperatures;
    }
    int size = floating.length;
    double[][] system = new double[size][size + 1];
    for (int f = 0; f < size; f++) {
      double received = -solution.spaceFlow(floating[f], new double[count]);
      for (int g = 0; g < size; g++) {
        system[f][g] = matrix[floating[f]][floating[g]];
      }
      for (int j = 0; j < count; j++) {
        if (!contains(floating, j) && matrix[floating[f]][j] != 0) {
          received -= matrix[floating[f]][j] * temperatures[j];
        }
      }
      system[f][size] = received;
    }
    eliminate(system, floating);
    for (int f = 0; f < size; f++) {
      temperatures[floating[f]] = system[f][size];
    }
    return temperatures;
  }

  /** Indices of the floating spaces. */
  static int[] floating(Detail detail) {
    return floatingBeside(detail, new int[0], new int[0]);
  }

  /** Indices of the floating spaces that belong to neither group. */
  static int[] floatingBeside(Detail detail, int[] one, int[] other) {
    int[] indices = new int[detail.spaces().size()];
    int count = 0;
    for (int i = 0; i < indices.length; i++) {
      if (detail.spaces().get(i).floating().isPresent()
          && !contains(one, i)
          && !contains(other, i)) {
        indices[count++] = i;
      }
    }
    return Arrays.copyOf(indices, count);
  }

  static boolean contains(int[] indices, int index) {
    for (int i : indices) {
      if (i == index) {
        return true;
      }
    }
    return false;
  }
}
