package coldseam.solver.conduction;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.algebra.NotPositiveDefiniteException;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Conditions;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.CancellationException;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;
import java.util.function.Supplier;

/** Solve, estimate, mark, refine, until what is asked is met. */
final class AdaptiveLoop {
  /** Part of an accuracy that a proved half-width may take: the middle is better than its proof. */
  private static final double PART_OF_PROVED = 0.6;

  /** The same with more than two spaces: a ψ may join several, and with them their half-widths. */
  private static final double PART_OF_SEVERAL = 0.35;

  /** The same where temperatures are asked for: near singular corners they are last to settle. */
  private static final double PART_WITH_TEMPERATURES = 0.12;

  /**
   * Largest disagreement of the two ways to the gap, relative to the energy, times the allowance.
   */
  private static final double MISMATCH = 1;

  /** Part of a relative accuracy that the guessed error may take. */
  private static final double PART_OF_RELATIVE = 0.1;

  /** The same for the second film set, of which only temperatures are read. */
  private static final double PART_FOR_SURFACES = 0.5;

  /** Systems with fewer unknowns are solved one after the other, see {@link #solveBothSides}. */
  private static final int SIDE_BY_SIDE_FROM = 2000;

  /** The error aimed at by a pass over what it may be. */
  private static final double AIM = 0.7;

  /**
   * A large reduction is not asked for in full: splitting spreads to triangles beside those chosen,
   * which lowers their errors too (measured).
   */
  private static final double WITH_NEIGHBOURS = 0.72;

  /** No pass aims at less than this part of the error: what is seen of it is still coarse. */
  private static final double MOST_AT_ONCE = 0.04;

  /** If less than this part of a conductance is left for a U, this part counts. */
  private static final double LEAST_PART_LEFT = 0.01;

  /** Temperatures wait while energies are off by more than this many times what they may. */
  private static final double ENERGY_FIRST = 4;

  /** The same for a χ: point bridges are small beside what surrounds them. */
  private static final double LEAST_PART_OF_POINT = 0.001;

  /** The loop ends after this many passes whatever is reached. */
  private static final int MOST_PASSES = 60;

  private final Partition partition;
  private final Conditions conditions;
  private final Conduction.Goal goal;
  private final Corners corners;
  private final Progress progress;
  private final History history;
  private final boolean proving;
  private final List<Proved> proved = new ArrayList<>();
  private int passes;

  // of the present pass
  private Discretisation d;
  private double[][] fields;
  private ConductanceMatrix matrix;

  /** Null where bounds steer and no temperature is asked for. */
  private HierarchicalIndicator indicator;

  private boolean[] wanted;
  private TwoSidedBound bound;
  private boolean[][] meeting;
  private double[] sums;
  private double[] targets;
  private TemperatureErrors temperatures;

  /**
   * What one pass proved.
   *
   * @param unknowns unknowns of the temperature problem
   * @param up upper energies
   * @param lo lower energies
   * @param gap their difference as the sum of local gaps
   */
  record Proved(int unknowns, double[][] up, double[][] lo, double[][] gap) {}

  AdaptiveLoop(
      Partition partition,
      Conditions conditions,
      Conduction.Goal goal,
      Progress progress,
      Corners corners,
      double earlierRatio,
      boolean proving) {
    this.partition = partition;
    this.proving = proving;
    this.conditions = conditions;
    this.goal = goal;
    this.corners = corners;
    this.progress = progress;
    history = new History(earlierRatio);
  }

  /**
   * Runs.
   *
   * @param start the mesh to begin with
   * @return the solution on the last mesh
   */
  FieldSolution run(Mesh start) {
    Mesh mesh = start;
    Marking marking = new Marking(mesh, corners);
    Outlook outlook = new Outlook(goal.accuracy().mostUnknowns());
    while (true) {
      solve(mesh);
      double energy = Math.max(energyRatio(), jumpRatio());
      double reached = Math.max(energy, temperatureRatio());
      tell(reached);
      if (reached <= 1 || passes >= MOST_PASSES || !outlook.worthwhile(d.unknowns, reached)) {
        break;
      }
      Mesh finer = marking.refine(wishes(), part(energy), excess(energy));
      if (finer == mesh
          || finer.vertexCount() + finer.sideCount() > goal.accuracy().mostUnknowns()) {
        break;
      }
      mesh = finer;
    }
    return new FieldSolution(
        partition,
        conditions,
        corners,
        d,
        fields,
        matrix,
        bound,
        history,
        List.copyOf(proved),
        passes);
  }

  private void solve(Mesh mesh) {
    d = new Discretisation(mesh, conditions);
    try {
      solve();
    } catch (NotPositiveDefiniteException e) {
      throw Slivers.explained(d, conditions, e);
    }
  }

  private void solve() {
    meeting = d.meeting();
    if (proving && d.spaces > 1 && !meetsAnywhere()) {
      solveBothSides();
    } else {
      fields = Assembly.unitFields(d);
      bound = null;
      matrix = ConductanceMatrix.of(d, fields);
    }
    passes++;
    wanted = new boolean[d.spaces + 1];
    Arrays.fill(wanted, 0, d.spaces > 2 ? d.spaces : d.spaces - 1, true);
    wanted[d.spaces] = d.hasFlow;
    indicator = null;
    if (bound == null || temperaturesWanted()) {
      estimate();
    }
    setTargets();
  }

  private boolean temperaturesWanted() {
    return goal.temperatures() != Conduction.Temperatures.NONE;
  }

  private void estimate() {
    indicator = HierarchicalIndicator.of(d, fields, wanted);
    sums = new double[d.spaces + 1];
    for (int f = 0; f < sums.length; f++) {
      if (wanted[f]) {
        for (double lacking : indicator.energy[f]) {
          sums[f] += lacking;
        }
      }
    }
    if (d.spaces == 2) {
      sums[1] = sums[0];
    }
    history.add(matrix, Arrays.copyOf(sums, d.spaces), d.unknowns);
  }

  /** The conjugate problem, to be solved by another thread. */
  private record StreamFunctions(Discretisation d, StreamSpace space)
      implements Supplier<double[][]> {
    @Override
    public double[][] get() {
      return ConjugateProblem.streamFunctions(d, space);
    }
  }

  /**
   * The temperature problem and the conjugate one, large ones side by side; of small ones the
   * second takes less time where the first has warmed the code that they share.
   */
  private void solveBothSides() {
    StreamSpace space = new StreamSpace(d.mesh, conditions);
    double[][] streams;
    if (d.unknowns < SIDE_BY_SIDE_FROM) {
      fields = Assembly.unitFields(d);
      streams = ConjugateProblem.streamFunctions(d, space);
    } else {
      CompletableFuture<double[][]> other =
          CompletableFuture.supplyAsync(new StreamFunctions(d, space));
      fields = Assembly.unitFields(d);
      streams = joined(other);
    }
    bound = new TwoSidedBound(d, fields, space, streams);
    matrix = ConductanceMatrix.of(d, bound);
    proved.add(new Proved(d.unknowns, bound.up, bound.lo, bound.gap));
    if (!(bound.mismatch() <= MISMATCH * bound.allowance)) {
      throw Slivers.explained(
          d,
          conditions,
          new IllegalStateException(
              "the two ways to the gap of the bounds disagree by " + bound.mismatch()));
    }
  }

  /** What another thread found; what it threw is thrown as it is. */
  private static double[][] joined(CompletableFuture<double[][]> other) {
    try {
      return other.join();
    } catch (CompletionException e) {
      if (e.getCause() instanceof RuntimeException cause) {
        throw cause;
      }
      throw e;
    }
  }

  private boolean meetsAnywhere() {
    for (int i = 0; i < d.spaces; i++) {
      if (infinite(i)) {
        return true;
      }
    }
    return false;
  }

  private void setTargets() {
    Accuracy accuracy = goal.accuracy();
    double relative = accuracy.couplingRelative();
    double absolute = accuracy.couplingWPerMK();
    if (goal.transmittanceAsked() && goal.takenOffWPerMK() == 0) {
      relative = Math.min(relative, accuracy.transmittanceRelative());
    }
    if (goal.psiAsked()) {
      absolute = Math.min(absolute, accuracy.psiWPerMK());
    }
    boolean everywhere = goal.temperatures() == Conduction.Temperatures.EVERYWHERE;
    double provedPart =
        everywhere ? PART_WITH_TEMPERATURES : d.spaces > 2 ? PART_OF_SEVERAL : PART_OF_PROVED;
    double guessedPart = proving ? PART_OF_RELATIVE : PART_FOR_SURFACES;
    double relativePart = bound == null ? guessedPart : provedPart;
    double absolutePart = bound == null ? 3 * guessedPart : provedPart;
    targets = new double[d.spaces + 1];
    for (int i = 0; i < d.spaces; i++) {
      targets[i] =
          infinite(i)
              ? Double.POSITIVE_INFINITY
              : Math.max(
                  accuracy.negligibleWPerMK(),
                  Math.min(
                      relativePart * relativeTarget(relative, matrix.a[i][i]),
                      absolutePart * absolute));
    }
    targets[d.spaces] = relativePart * relative * matrix.flowEnergy;
  }

  /** The relative accuracy of a conductance, and of what is left of it for a U. */
  private double relativeTarget(double relative, double conductance) {
    double target = relative * conductance;
    if (goal.transmittanceAsked() && goal.takenOffWPerMK() > 0) {
      double left = Math.max(conductance - goal.takenOffWPerMK(), LEAST_PART_LEFT * conductance);
      target = Math.min(target, goal.accuracy().transmittanceRelative() * left);
    }
    if (goal.pointAsked()) {
      double left = Math.abs(conductance - goal.takenOffWPerMK());
      double point = Math.max(left, LEAST_PART_OF_POINT * conductance);
      target = Math.min(target, goal.accuracy().pointWPerK(point));
    }
    return target;
  }

  private boolean infinite(int space) {
    for (boolean meets : meeting[space]) {
      if (meets) {
        return true;
      }
    }
    return false;
  }

  /** Guessed errors of the conductances over what they may be. */
  private double energyRatio() {
    double worst = 0;
    double[] x = new double[d.spaces];
    for (int i = 0; i < d.spaces; i++) {
      if (!infinite(i) && targets[i] > 0) {
        x[i] = 1;
        double error = bound == null ? history.error(x) : bound.gap[i][i] / 2;
        worst = Math.max(worst, error / targets[i]);
        x[i] = 0;
      }
    }
    if (d.hasFlow && targets[d.spaces] > 0) {
      double error = bound == null ? sums[d.spaces] : bound.gap[d.spaces][d.spaces] / 2;
      worst = Math.max(worst, error / targets[d.spaces]);
    }
    return worst;
  }

  /** The same for temperatures in fields of infinite energy. */
  private double jumpRatio() {
    double sum = 0;
    for (int i = 0; i < d.spaces; i++) {
      if (infinite(i) && wanted[i]) {
        for (int t = 0; t < d.mesh.triangleCount(); t++) {
          sum += jumpWish(i, t);
        }
      }
    }
    return sum;
  }

  /** Square of the temperature error that a triangle causes elsewhere, over what it may be. */
  private double jumpWish(int field, int t) {
    double size = d.mesh.area(t) / d.extentSquared;
    double conductance = d.body.depthM(t) * QuadraticElement.conductivity(d.couplings, t);
    double error = indicator.energy[field][t] / conductance;
    return size * error / (TemperatureErrors.MAY * TemperatureErrors.MAY);
  }

  private double[] wishes() {
    double[] wishes = new double[d.mesh.triangleCount()];
    for (int f = 0; f <= d.spaces; f++) {
      if (!wanted[f] || !(targets[f] > 0)) {
        continue;
      }
      boolean jumps = Double.isInfinite(targets[f]);
      for (int t = 0; t < wishes.length; t++) {
        double lacking = bound == null ? indicator.energy[f][t] : bound.local[f][t] / 2;
        wishes[t] += jumps ? jumpWish(f, t) : lacking / targets[f];
      }
    }
    return wishes;
  }

  /** The part of the error that the next pass aims at, so that the last does not overshoot. */
  private static double part(double ratio) {
    return ratio <= 1 ? 1 : Math.max(Math.pow(AIM / ratio, WITH_NEIGHBOURS), MOST_AT_ONCE);
  }

  /** Temperature errors over what they may be, inside and at the coldest and warmest points. */
  private double temperatureRatio() {
    TemperatureErrors before = temperatures;
    if (indicator == null) {
      return 0;
    }
    double[][] amplitude = indicator.amplitude.clone();
    for (int i = 0; i < d.spaces; i++) {
      if (infinite(i)) {
        amplitude[i] = null;
      }
    }
    boolean everywhere = goal.temperatures() != Conduction.Temperatures.SURFACE;
    temperatures =
        new TemperatureErrors(d, corners, fields, amplitude, goal.temperaturesC(), everywhere);
    if (!temperaturesWanted() || before == null) {
      return temperatures.worst;
    }
    double move = temperatures.expectedToMove(before, goal.temperaturesC());
    if (move > 1) {
      temperatures.distrustExtremes(move);
    }
    return Math.max(temperatures.worst, move);
  }

  /**
   * Of temperatures, square of the error over what it may be; nothing while energies are far off.
   */
  private double[] excess(double energy) {
    return temperatures == null || energy > ENERGY_FIRST
        ? new double[d.mesh.triangleCount()]
        : temperatures.excess;
  }

  private void tell(double reached) {
    if (!progress.pass(conditions.filmSet().toString(), passes, d.unknowns, reached)) {
      throw new CancellationException("cancelled after pass " + passes);
    }
  }
}
