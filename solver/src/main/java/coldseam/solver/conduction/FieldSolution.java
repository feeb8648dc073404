package coldseam.solver.conduction;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;

/** The unit fields on the final mesh and what follows from them. */
final class FieldSolution implements Solution {
  static final String NOT_PROVED =
      "no bounds are computed with these films: the error is guessed from what refinement changed";
  static final String MEETING =
      "two fixed temperatures meet in a point, so the heat flow between them is infinite:"
          + " only temperatures have a meaning";

  private final Partition partition;
  private final Conditions conditions;
  private final Corners corners;
  private final Discretisation d;
  private final double[][] fields;
  private final ConductanceMatrix matrix;
  private final TwoSidedBound bound;
  private final History history;
  private final List<AdaptiveLoop.Proved> proved;
  private final int passes;
  private final boolean[][] meeting;

  /** Why bounds prove nothing although there are some; empty if they do. */
  private final String doubt;

  private volatile StretchFlows stretchFlows;
  private volatile Dissipation dissipation;

  FieldSolution(
      Partition partition,
      Conditions conditions,
      Corners corners,
      Discretisation d,
      double[][] fields,
      ConductanceMatrix matrix,
      TwoSidedBound bound,
      History history,
      List<AdaptiveLoop.Proved> proved,
      int passes) {
    this(partition, conditions, corners, d, fields, matrix, bound, history, proved, passes, "");
  }

  private FieldSolution(
      Partition partition,
      Conditions conditions,
      Corners corners,
      Discretisation d,
      double[][] fields,
      ConductanceMatrix matrix,
      TwoSidedBound bound,
      History history,
      List<AdaptiveLoop.Proved> proved,
      int passes,
      String doubt) {
    this.doubt = doubt;
    this.partition = partition;
    this.conditions = conditions;
    this.corners = corners;
    this.d = d;
    this.fields = fields;
    this.matrix = matrix;
    this.bound = bound;
    this.history = history;
    this.proved = proved;
    this.passes = passes;
    meeting = d.meeting();
  }

  FieldSolution unproved(String reason) {
    return new FieldSolution(
        partition, conditions, corners, d, fields, matrix, bound, history, proved, passes, reason);
  }

  /** Guessed error over the sum of the indicators, the worst of the spaces. */
  double errorRatio() {
    if (history.passes() == 0) {
      return Double.NaN;
    }
    double worst = 0;
    for (int i = 0; i < d.spaces; i++) {
      double[] x = new double[d.spaces];
      x[i] = 1;
      double indicated = history.indicated(history.passes() - 1, x);
      boolean known = bound != null && indicated > 0;
      worst = Math.max(worst, known ? bound.gap[i][i] / 2 / indicated : history.ratio(x));
    }
    return worst;
  }

  /** The triangles beside the coldest and warmest surface points at these temperatures, °C. */
  BitSet besideExtremes(double[] temperaturesC) {
    return new SurfaceExtremes(d, nodal(d, fields, temperaturesC)).triangles(d);
  }

  /** The corners of the drawing. */
  Corners corners() {
    return corners;
  }

  /** What each pass proved, in order. */
  List<AdaptiveLoop.Proved> proved() {
    return proved;
  }

  History history() {
    return history;
  }

  @Override
  public Mesh mesh() {
    return d.mesh;
  }

  @Override
  public Partition partition() {
    return partition;
  }

  @Override
  public Conditions conditions() {
    return conditions;
  }

  @Override
  public int unknowns() {
    return d.unknowns;
  }

  @Override
  public int passes() {
    return passes;
  }

  @Override
  public double matrix(int i, int j) {
    if (i != j) {
      return meeting[i][j] ? Double.NEGATIVE_INFINITY : matrix.a[i][j];
    }
    for (boolean infinite : meeting[i]) {
      if (infinite) {
        return Double.POSITIVE_INFINITY;
      }
    }
    return matrix.a[i][i];
  }

  @Override
  public Quantity coupling(int[] warm, int[] cold) {
    double[] x = new double[d.spaces];
    double[] y = new double[d.spaces];
    double value = 0;
    for (int i : warm) {
      x[i] = 1;
      for (int j : cold) {
        if (meeting[i][j]) {
          return new Quantity(
              Double.POSITIVE_INFINITY,
              new Certificate.NotCertified(MEETING, Double.POSITIVE_INFINITY));
        }
        y[j] = 1;
        value -= matrix.a[i][j];
      }
    }
    if (bound != null) {
      double proved = bound.halfWidth(x, y);
      if (!doubt.isEmpty()) {
        return new Quantity(value, new Certificate.NotCertified(doubt, proved));
      }
      return new Quantity(value, new Certificate.Certified(value - proved, value + proved));
    }
    double halfWidth = Math.sqrt(history.error(x) * history.error(y));
    return new Quantity(value, new Certificate.NotCertified(NOT_PROVED, halfWidth));
  }

  @Override
  public Optional<MatrixBounds> bounds() {
    if (bound == null || !doubt.isEmpty()) {
      return Optional.empty();
    }
    double[][] upper = new double[d.spaces][];
    double[][] lower = new double[d.spaces][];
    for (int i = 0; i < d.spaces; i++) {
      upper[i] = Arrays.copyOf(bound.up[i], d.spaces);
      lower[i] = Arrays.copyOf(bound.lo[i], d.spaces);
    }
    return Optional.of(new MatrixBounds(upper, lower, bound.allowance));
  }

  @Override
  public double spaceFlow(int space, double[] temperaturesC) {
    double sum = matrix.drivenFlow[space];
    for (int j = 0; j < d.spaces; j++) {
      double difference = temperaturesC[j] - temperaturesC[space];
      if (j == space || difference == 0) {
        continue;
      }
      if (meeting[space][j]) {
        return difference < 0 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
      }
      sum += matrix.a[space][j] * difference;
    }
    return sum;
  }

  @Override
  public double stretchFlow(int stretch, double[] temperaturesC) {
    StretchFlows ready = stretchFlows;
    if (ready == null) {
      ready = new StretchFlows(d, conditions, fields, bound);
      stretchFlows = ready;
    }
    return ready.flow(stretch, temperaturesC);
  }

  @Override
  public Dissipation dissipation() {
    Dissipation ready = dissipation;
    if (ready == null) {
      ready = new Dissipation(conditions, d, fields, doubt.isEmpty() ? bound : null);
      dissipation = ready;
    }
    return ready;
  }

  @Override
  public double prescribedFlow() {
    return matrix.prescribedFlow;
  }

  @Override
  public double[] unitField(int space) {
    return fields[space].clone();
  }

  @Override
  public TemperatureField temperatures(double[] temperaturesC) {
    return new TemperatureField(d.mesh, nodal(d, fields, temperaturesC));
  }

  @Override
  public Optional<StreamFunction> streamFunction(double[] temperaturesC) {
    return bound == null ? Optional.empty() : Optional.of(bound.streamFunction(temperaturesC));
  }

  /** Nodal temperatures; spaces of one temperature give exactly that temperature. */
  static double[] nodal(Discretisation d, double[][] fields, double[] temperaturesC) {
    double[] nodal = new double[d.nodeCount];
    double reference = temperaturesC[0];
    for (int n = 0; n < nodal.length; n++) {
      double sum = fields[d.spaces][n];
      for (int i = 1; i < d.spaces; i++) {
        sum += (temperaturesC[i] - reference) * fields[i][n];
      }
      nodal[n] = reference + sum;
    }
    return nodal;
  }
}
