package coldseam.solver.conduction;

import coldseam.solver.detail.Conditions;

/**
 * Two-sided bounds of the matrix A of the spaces from temperature fields u_i and fluxes q_i
 * (Thomson; Prager and Synge 1947):
 *
 * <p>up_ij = ∫λ∇u_i·∇u_j + Σ∫(u_i − δ_i)(u_j − δ_j)/Rs and lo_ij = F_i(q_j) + F_j(q_i) −
 * ∫q_i·λ⁻¹q_j − Σ∫Rs q_in q_jn. With G = up − lo, xᵀAy lies within ½√(xᵀGx · yᵀGy) of xᵀ(up +
 * lo)y/2. A given flow g is one more row and column, in which up gains −∫g u_i and −∫g u_j.
 *
 * <p>G is also the sum of a local gap over triangles and film sides, Σ∫(q_i + λ∇u_i)·λ⁻¹(q_j +
 * λ∇u_j) + Σ∫Rs(q_in − (δ_i − u_i)/Rs)(q_jn − (δ_j − u_j)/Rs), for any u that takes the fixed
 * temperatures and any q without divergence that crosses no side it must not, solved or not. It is
 * evaluated both ways; the two must agree.
 *
 * <p>What is assumed: the section is exactly that of the partition, its conductivities constant in
 * each label; all energies are sums of products of differences of nodal values, whose rounding is
 * covered by the allowance of {@link #ROUNDING} times the energy and more for stretched and for
 * blunt triangles.
 */
final class TwoSidedBound {
  /** Relative rounding allowance of an energy for triangles of aspect up to {@link #ASPECT}. */
  static final double ROUNDING = 1e-12;

  /** The allowance grows with the aspect over this. */
  static final double ASPECT = 1000;

  /** Triangles whose figures cancel less than this are covered by the general allowance. */
  private static final double CANCELLING = 1000;

  /** Rounding errors that go into the energy of one triangle. */
  private static final double ROUNDINGS = 16;

  /** Upper energies, W/(m·K); the last row and column belong to the given flows. */
  final double[][] up;

  /** Lower energies. */
  final double[][] lo;

  /** The sum of the local gaps. */
  final double[][] gap;

  /** Local gap of each field by triangle; those of a film side count to its triangle. */
  final double[][] local;

  /** Relative rounding allowance. */
  final double allowance;

  private final Discretisation d;
  private final StreamSpace space;
  private final double[][] fields;
  private final double[][] streams;

  /**
   * Works the bounds out.
   *
   * @param d the discretisation
   * @param fields unit fields and the field of the given flows
   * @param space the space of the stream functions
   * @param streams stream functions of the same
   */
  TwoSidedBound(Discretisation d, double[][] fields, StreamSpace space, double[][] streams) {
    this.d = d;
    this.space = space;
    this.fields = fields;
    this.streams = streams;
    int n = d.spaces + 1;
    up = new double[n][n];
    lo = new double[n][n];
    gap = new double[n][n];
    local = new double[n][d.mesh.triangleCount()];
    int used = d.hasFlow ? n : n - 1;
    for (int i = 0; i < used; i++) {
      for (int j = i; j < used; j++) {
        up[i][j] = upper(i, j);
        lo[i][j] = lower(i, j);
        up[j][i] = up[i][j];
        lo[j][i] = lo[i][j];
      }
    }
    gaps(used);
    allowance = Math.max(ROUNDING * Math.max(1, aspect() / ASPECT), cancelled(used));
  }

  /** Largest disagreement of the two ways to the gap, relative to the energies. */
  double mismatch() {
    double worst = 0;
    for (int i = 0; i < gap.length; i++) {
      for (int j = 0; j < gap.length; j++) {
        double scale = Math.sqrt(scale(i) * scale(j));
        double difference = Math.abs(up[i][j] - lo[i][j] - gap[i][j]);
        worst = scale > 0 ? Math.max(worst, difference / scale) : Math.max(worst, difference);
      }
    }
    return worst;
  }

  private double scale(int i) {
    return Math.max(Math.abs(up[i][i]), Math.max(Math.abs(lo[i][i]), gap[i][i]));
  }

  /** Largest ratio of longest side to height over the triangles. */
  private double aspect() {
    double worst = 1;
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      double longest = 0;
      for (int k = 0; k < 3; k++) {
        int a = d.mesh.vertex(t, (k + 1) % 3);
        int b = d.mesh.vertex(t, (k + 2) % 3);
        double dx = d.mesh.x(b) - d.mesh.x(a);
        double dy = d.mesh.y(b) - d.mesh.y(a);
        longest = Math.max(longest, dx * dx + dy * dy);
      }
      worst = Math.max(worst, longest / (2 * d.mesh.area(t)));
    }
    return worst;
  }

  /**
   * What may be lost to rounding in the energies of triangles whose figures nearly cancel, relative
   * to the energy of the field that loses most.
   */
  private double cancelled(int used) {
    double[] lost = new double[used];
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      double cancellation = QuadraticElement.cancellation(d.couplings, t);
      for (int f = 0; f < used && cancellation > CANCELLING; f++) {
        double energy =
            Math.abs(d.body.conducted(t, fields[f], fields[f]))
                + Math.abs(d.body.resisted(space.nodes, t, streams[f], streams[f]));
        lost[f] += ROUNDINGS * Math.ulp(1.0) * cancellation * energy;
      }
    }
    double worst = 0;
    for (int f = 0; f < used; f++) {
      worst = lost[f] > 0 ? Math.max(worst, lost[f] / scale(f)) : worst;
    }
    return worst;
  }

  /** The energy of two temperature fields by triangle. */
  private record Conducted(Body body, double[] u, double[] v) implements TriangleSums.Terms {
    @Override
    public void add(int from, int to, double[] sums) {
      for (int t = from; t < to; t++) {
        sums[0] += body.conducted(t, u, v);
      }
    }
  }

  /** The energy of the fluxes of two stream functions by triangle. */
  private record Resisted(Body body, int[] nodes, double[] s, double[] v)
      implements TriangleSums.Terms {
    @Override
    public void add(int from, int to, double[] sums) {
      for (int t = from; t < to; t++) {
        sums[0] += body.resisted(nodes, t, s, v);
      }
    }
  }

  private double upper(int i, int j) {
    Conducted energies = new Conducted(d.body, fields[i], fields[j]);
    double sum = TriangleSums.of(d.mesh.triangleCount(), 1, energies)[0];
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FILM) {
        sum += o.filmEnergy(s, fields[i], unit(s, i), fields[j], unit(s, j));
      } else if (o.kind[s] == Conditions.Kind.FLOW) {
        double flow = o.areaM2[s] * o.flowWPerM2[s];
        sum -= j == d.spaces ? flow * o.mean(s, fields[i]) : 0;
        sum -= i == d.spaces ? flow * o.mean(s, fields[j]) : 0;
      }
    }
    return sum;
  }

  private double lower(int i, int j) {
    Resisted energies = new Resisted(d.body, space.nodes, streams[i], streams[j]);
    double sum = -TriangleSums.of(d.mesh.triangleCount(), 1, energies)[0];
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FILM) {
        sum -= filmResistance(s, i, j);
      }
      if (o.space[s] >= 0) {
        sum += unit(s, i) * fall(s, streams[j]) + unit(s, j) * fall(s, streams[i]);
      }
    }
    return sum;
  }

  private double unit(int s, int field) {
    return d.outline.space[s] == field ? 1 : 0;
  }

  /** The middle of the bounds of an entry. */
  double middle(int i, int j) {
    return (up[i][j] + lo[i][j]) / 2;
  }

  /**
   * How far xᵀAy may be from the middle: ½√(xᵀGx · yᵀGy) and the allowance for rounding.
   *
   * @param x a number for each space
   * @param y a number for each space
   * @return W/(m·K)
   */
  double halfWidth(double[] x, double[] y) {
    double gaps = form(gap, x) * form(gap, y);
    double energies = form(up, x) * form(up, y);
    return Math.sqrt(Math.max(0, gaps)) / 2 + allowance * Math.sqrt(Math.max(0, energies));
  }

  private static double form(double[][] a, double[] x) {
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j < x.length; j++) {
        sum += x[i] * a[i][j] * x[j];
      }
    }
    return sum;
  }

  /** Flow in across a side of the outline by the stream function of a field. */
  double fall(int s, int field) {
    return fall(s, streams[field]);
  }

  private double fall(int s, double[] stream) {
    return stream[ConjugateProblem.streamStart(d, space, s)]
        - stream[ConjugateProblem.streamEnd(d, space, s)];
  }

  /** The stream function for given temperatures; those of the spaces add up to 0. */
  StreamFunction streamFunction(double[] temperaturesC) {
    double[] sum = streams[d.spaces].clone();
    for (int i = 1; i < d.spaces; i++) {
      double difference = temperaturesC[i] - temperaturesC[0];
      for (int n = 0; n < sum.length && difference != 0; n++) {
        sum[n] += difference * streams[i][n];
      }
    }
    return new StreamFunction(d.mesh, space.nodes, sum);
  }

  /** ∫q_i·λ⁻¹q_j over a triangle. */
  double resistance(int t, int i, int j) {
    return d.body.resisted(space.nodes, t, streams[i], streams[j]);
  }

  /** ∫Rs q_in q_jn along a side with a film. */
  double filmResistance(int s, int i, int j) {
    double[] a = streams[i];
    double[] b = streams[j];
    return d.outline.resisted(
        s, rise(s, a, true), rise(s, a, false), rise(s, b, true), rise(s, b, false));
  }

  /** Rise of S along the first or second half of a side. */
  private double rise(int s, double[] stream, boolean first) {
    double middle = stream[ConjugateProblem.streamMiddle(d, space, s)];
    return first
        ? middle - stream[ConjugateProblem.streamStart(d, space, s)]
        : stream[ConjugateProblem.streamEnd(d, space, s)] - middle;
  }

  /** The gap from what q and −λ∇u differ by, triangle by triangle. */
  private void gaps(int used) {
    double[] sums = TriangleSums.of(d.mesh.triangleCount(), used * used, new Gaps(used));
    for (int i = 0; i < used; i++) {
      for (int j = i; j < used; j++) {
        gap[i][j] = sums[used * i + j];
        gap[j][i] = gap[i][j];
      }
    }
    Outline o = d.outline;
    double[][] film = new double[used][o.misfitSize()];
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] != Conditions.Kind.FILM) {
        continue;
      }
      for (int f = 0; f < used; f++) {
        double first = rise(s, streams[f], true);
        double second = rise(s, streams[f], false);
        o.misfit(s, fields[f], unit(s, f), first, second, film[f]);
      }
      for (int i = 0; i < used; i++) {
        for (int j = i; j < used; j++) {
          count(o.triangle[s], i, j, o.gap(s, film[i], film[j]));
        }
      }
    }
  }

  /** The local gaps of triangles; those of a field with itself are kept. */
  private final class Gaps implements TriangleSums.Terms {
    private final int used;

    private Gaps(int used) {
      this.used = used;
    }

    @Override
    public void add(int from, int to, double[] sums) {
      double[][] misfit = new double[used][d.body.misfitSize()];
      for (int t = from; t < to; t++) {
        for (int f = 0; f < used; f++) {
          d.body.misfit(t, fields[f], space.nodes, streams[f], misfit[f]);
        }
        for (int i = 0; i < used; i++) {
          for (int j = i; j < used; j++) {
            double part = d.body.gap(t, misfit[i], misfit[j]);
            sums[used * i + j] += part;
            if (i == j) {
              local[i][t] = part;
            }
          }
        }
      }
    }
  }

  private void count(int t, int i, int j, double value) {
    gap[i][j] += value;
    if (i == j) {
      local[i][t] += value;
    } else {
      gap[j][i] += value;
    }
  }
}
