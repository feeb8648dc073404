package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Space;
import java.util.Random;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

/**
 * Bounds on random details: three spaces, one of them in two stretches, holes with films, hollows,
 * rotated tensors, films that differ edge by edge, a fixed temperature, a given flow. Derived from
 * the theorems of Thomson and of Prager and Synge (1947); nothing here knows the answers.
 */
class TwoSidedBoundTest {
  private static final int DETAILS = 1000;
  private static final int REVOLVED = 500;

  /** Relative rounding of sums of energies. */
  private static final double ROUNDING = 1e-10;

  private record Solved(
      Discretisation d, double[][] fields, StreamSpace space, double[][] streams) {
    static Solved of(Mesh mesh, Conditions conditions, boolean withCuts) {
      Discretisation d = new Discretisation(mesh, conditions);
      StreamSpace space = new StreamSpace(mesh, conditions, withCuts);
      return new Solved(
          d, Assembly.unitFields(d), space, ConjugateProblem.streamFunctions(d, space));
    }

    TwoSidedBound bound() {
      return new TwoSidedBound(d, fields, space, streams);
    }

    /** The same fields with noise that keeps them admissible. */
    Solved noisy(Random random, double part) {
      double[][] u = new double[fields.length][];
      for (int f = 0; f < fields.length; f++) {
        u[f] = fields[f].clone();
        double size = part * largest(u[f]);
        for (int n = 0; n < u[f].length; n++) {
          u[f][n] += d.fixed(n) ? 0 : size * (2 * random.nextDouble() - 1);
        }
      }
      double[][] s = new double[streams.length][];
      for (int f = 0; f < streams.length; f++) {
        s[f] = streams[f].clone();
        double size = part * largest(s[f]);
        double[] noise = new double[d.nodeCount + space.cuts];
        for (int i = 0; i < noise.length; i++) {
          noise[i] = size * (2 * random.nextDouble() - 1);
        }
        for (int n = 0; n < space.nodeCount; n++) {
          s[f][n] += space.pinned[space.chain[n]] ? 0 : noise[space.chain[n]];
          for (int c = 0; c < space.cuts; c++) {
            if (Double.isNaN(space.givenJump[c])) {
              s[f][n] += space.jump(n, c) * noise[d.nodeCount + c];
            }
          }
        }
        space.followAxis(s[f]);
      }
      return new Solved(d, complete(u), space, complete(s, 0));
    }

    /** The last space's field is 1 less the others. */
    private double[][] complete(double[][] u) {
      return complete(u, 1);
    }

    private double[][] complete(double[][] values, double total) {
      double[] last = values[d.spaces - 1];
      for (int n = 0; n < last.length; n++) {
        last[n] = total;
        for (int f = 0; f < d.spaces - 1; f++) {
          last[n] -= values[f][n];
        }
      }
      return values;
    }
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double v : values) {
      largest = Math.max(largest, Math.abs(v));
    }
    return largest;
  }

  private static Mesh refined(Mesh mesh) {
    return NewestVertexBisection.refineAll(mesh).mesh();
  }

  @Test
  void bounds_hold_on_random_details() {
    bounds_hold(DETAILS, RandomDetails::sketch);
  }

  @Test
  void bounds_hold_on_random_bodies_of_revolution() {
    bounds_hold(REVOLVED, RandomDetails::revolved);
  }

  private static void bounds_hold(int details, Function<Random, Sketch> draw) {
    int solved = 0;
    for (int seed = 0; solved < details; seed++) {
      assertThat(seed).as("seeds that make a detail").isLessThan(3 * details);
      Random random = new Random(seed);
      Sketch sketch = draw.apply(random);
      Partition partition = sketch.partition();
      Conditions conditions;
      try {
        conditions = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
      } catch (DetailException unsolvable) {
        continue;
      }
      solved++;
      Mesh coarse = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
      Solved first = Solved.of(coarse, conditions, true);
      Solved second = Solved.of(refined(coarse), conditions, true);
      TwoSidedBound one = first.bound();
      TwoSidedBound two = second.bound();
      check(one, seed);
      check(two, seed);
      for (int i = 0; i < 4; i++) {
        double scale = ROUNDING * Math.abs(one.up[i][i]);
        assertThat(two.up[i][i]).as("seed %d", seed).isLessThanOrEqualTo(one.up[i][i] + scale);
        if (conditions.geometry() == Geometry.PLANE) {
          // what stands for 1/r around the axis is closer on a finer mesh, but not everywhere
          assertThat(two.lo[i][i]).as("seed %d", seed).isGreaterThanOrEqualTo(one.lo[i][i] - scale);
        }
      }
      TwoSidedBound noisy = first.noisy(random, 0.1 * random.nextDouble()).bound();
      check(noisy, seed);
      assertInside(two, noisy, seed);
      assertInside(two, one, seed);
    }
  }

  private static void check(TwoSidedBound bound, int seed) {
    assertThat(bound.mismatch()).as("identity, seed %d", seed).isLessThan(bound.allowance);
    for (int i = 0; i < 4; i++) {
      assertThat(bound.lo[i][i])
          .as("order, seed %d", seed)
          .isLessThanOrEqualTo(bound.up[i][i] + ROUNDING * Math.abs(bound.up[i][i]));
      if (i == 3) {
        continue; // the row of the given flow sums to what enters
      }
      double row = 0;
      for (int j = 0; j < 3; j++) {
        row += bound.middle(i, j);
      }
      double scale = Math.sqrt(Math.abs(bound.up[i][i] * bound.up[0][0]));
      assertThat(Math.abs(row))
          .as("balance, seed %d", seed)
          .isLessThanOrEqualTo(1e-9 * scale + 1e-300);
    }
  }

  /** Every entry of a better middle, less what it may be off itself, lies in the interval. */
  private static void assertInside(TwoSidedBound fine, TwoSidedBound coarse, int seed) {
    for (int i = 0; i < 4; i++) {
      for (int j = 0; j < 4; j++) {
        double own = Math.sqrt(Math.abs(fine.gap[i][i] * fine.gap[j][j])) / 2;
        double half = Math.sqrt(Math.abs(coarse.gap[i][i] * coarse.gap[j][j])) / 2;
        double scale = Math.sqrt(Math.abs(coarse.up[i][i] * coarse.up[j][j]));
        assertThat(Math.abs(fine.middle(i, j) - coarse.middle(i, j)))
            .as("entry %d %d, seed %d", i, j, seed)
            .isLessThanOrEqualTo(half + own + ROUNDING * scale);
      }
    }
  }

  /** A rim with a film needs its cut: without, the bound stays one but never closes. */
  @Test
  void without_its_cut_a_hole_never_closes() {
    Space pipe = space("pipe", 50, 0.1);
    Space out = space("outdoors", 0, 0.04);
    Sketch sketch =
        new Sketch()
            .know(pipe)
            .know(out)
            .box(material("concrete", 1), 0, 0, 1, 1)
            .box(pipe, 0.3, 0.3, 0.5, 0.5)
            .facing(out, 1, 0, 1, 1);
    Partition partition = sketch.partition();
    Conditions conditions = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    for (int i = 0; i < 4; i++) {
      mesh = refined(mesh);
    }
    TwoSidedBound with = Solved.of(mesh, conditions, true).bound();
    TwoSidedBound without = Solved.of(mesh, conditions, false).bound();

    assertThat(with.gap[0][0]).isLessThan(0.01 * with.up[0][0]);
    assertThat(without.lo[0][0]).isLessThanOrEqualTo(with.lo[0][0]);
    assertThat(without.gap[0][0]).isGreaterThan(0.5 * with.up[0][0]);
  }

  /**
   * Two blocks that touch in a corner exchange nothing there, each between two spaces of its own;
   * where the fans of the corner are joined the bounds no longer close at the rate of smooth
   * fields.
   */
  @Test
  void fans_of_a_pinch_are_apart() {
    Space a = space("a", 1, 0.1);
    Space b = space("b", 0, 0.1);
    Sketch sketch =
        new Sketch()
            .know(a)
            .know(b)
            .box(material("lower", 1), 0, 0, 1, 1)
            .box(material("upper", 1), 1, 1, 2, 2)
            .facing(a, 0, 0, 0, 1)
            .facing(b, 2, 1, 2, 2);
    Partition partition = sketch.partition();
    Conditions conditions = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
    Mesh apart = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    TwoSidedBound exact = Solved.of(apart, conditions, true).bound();
    assertThat(exact.up[0][0]).isLessThan(1e-12);
    assertThat(exact.gap[0][0]).isLessThan(1e-12);

    Discretisation joined = new Discretisation(joined(apart), conditions);
    double[][] fields = Assembly.unitFields(joined);
    assertThat(ConductanceMatrix.of(joined, fields).a[0][0]).isGreaterThan(0.05);
  }

  /** The mesh with vertices at the same place made one. */
  private static Mesh joined(Mesh mesh) {
    double[] x = new double[mesh.vertexCount() - 1];
    double[] y = new double[mesh.vertexCount() - 1];
    int[] number = new int[mesh.vertexCount()];
    int used = 0;
    for (int v = 0; v < number.length; v++) {
      int same = 0;
      while (same < used && (x[same] != mesh.x(v) || y[same] != mesh.y(v))) {
        same++;
      }
      if (same == used) {
        x[used] = mesh.x(v);
        y[used++] = mesh.y(v);
      }
      number[v] = same;
    }
    int[] corners = new int[3 * mesh.triangleCount()];
    int[] labels = new int[mesh.triangleCount()];
    int[] edges = new int[corners.length];
    for (int t = 0; t < labels.length; t++) {
      labels[t] = mesh.label(t);
      for (int k = 0; k < 3; k++) {
        edges[3 * t + k] = mesh.partitionEdge(t, k);
        corners[3 * t + k] = number[mesh.vertex(t, k)];
      }
    }
    return Mesh.of(mesh.origin(), x, y, corners, labels, edges);
  }
}
