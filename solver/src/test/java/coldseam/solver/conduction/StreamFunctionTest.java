package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.Topology;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * What a stream function is (q has no divergence and q = curl S): constant where no heat passes,
 * falling by the heat that enters, and across any line inside by what the temperatures send across.
 */
class StreamFunctionTest {
  private static final double ROUNDING = 1e-9;
  private static final int DETAILS = 150;

  /** Fall of S along what faces a space; −1 for given flows, −2 for what nothing passes. */
  private static double fall(StreamFunction s, Conditions conditions, int space) {
    double sum = 0;
    Mesh mesh = s.mesh();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.neighbour(t, k) == Mesh.NONE && faced(conditions, mesh, t, k) == space) {
          double fall = s.value(t, (k + 1) % 3) - s.value(t, (k + 2) % 3);
          sum += space == -2 ? Math.abs(fall) : fall;
        }
      }
    }
    return sum;
  }

  private static int faced(Conditions conditions, Mesh mesh, int t, int k) {
    int edge = mesh.partitionEdge(t, k);
    Conditions.Kind kind = edge == Mesh.NONE ? Conditions.Kind.NONE : conditions.kind(edge);
    return switch (kind) {
      case FILM, FIXED -> conditions.space(edge);
      case FLOW -> -1;
      case NONE, CUT_OFF, HOLLOW, AXIS -> -2;
    };
  }

  @Test
  void falls_by_the_heat_that_enters_and_by_none_where_none_enters() {
    int hollows = 0;
    int jumps = 0;
    int solved = 0;
    for (int seed = 0; solved < DETAILS; seed++) {
      Sketch sketch = RandomDetails.sketch(new Random(seed)).accuracy(0.02);
      Solution solution;
      try {
        solution = sketch.solve();
      } catch (DetailException unsolvable) {
        continue;
      }
      solved++;
      double[] temperatures = sketch.temperaturesC();
      StreamFunction s = solution.streamFunction(temperatures).orElseThrow();
      MatrixBounds bounds = solution.bounds().orElseThrow();
      Conditions conditions = solution.conditions();
      double scale = s.entering();
      double balance = 0;
      for (int i = 0; i < temperatures.length; i++) {
        double fall = fall(s, conditions, i);
        balance += fall;
        assertThat(fall)
            .as("space %d, seed %d", i, seed)
            .isCloseTo(
                solution.spaceFlow(i, temperatures),
                within(flowHalfWidth(bounds, temperatures, i) + ROUNDING * scale));
        if (solution.prescribedFlow() == 0) {
          double lower = 0;
          for (int j = 0; j < temperatures.length; j++) {
            lower += bounds.lower()[i][j] * (temperatures[j] - temperatures[0]);
          }
          assertThat(fall).as("seed %d", seed).isCloseTo(lower, within(ROUNDING * scale));
        }
      }
      double given = fall(s, conditions, -1);
      assertThat(given).isCloseTo(solution.prescribedFlow(), within(ROUNDING * scale));
      assertThat(balance + given).as("seed %d", seed).isCloseTo(0, within(ROUNDING * scale));
      assertThat(fall(s, conditions, -2)).as("seed %d", seed).isLessThan(ROUNDING * scale);
      hollows += Topology.of(solution.mesh()).loopCount() > 1 ? 1 : 0;
      jumps += s.jumps().length > 0 ? 1 : 0;
    }
    assertThat(hollows).isGreaterThan(30);
    assertThat(jumps).isBetween(10, hollows - 1);
  }

  /** Half the differences of the bounds, the given flow's unknown part let alone. */
  private static double flowHalfWidth(MatrixBounds bounds, double[] temperatures, int i) {
    double sum = 0;
    for (int j = 0; j < temperatures.length; j++) {
      double difference = Math.abs(temperatures[j] - temperatures[i]);
      double gapI = bounds.upper()[i][i] - bounds.lower()[i][i];
      double gapJ = bounds.upper()[j][j] - bounds.lower()[j][j];
      sum += difference * Math.sqrt(Math.max(0, gapI) * Math.max(0, gapJ));
    }
    return sum;
  }

  private static final Space PIPE = space("pipe", 50, 0.1);
  private static final Space IN = space("indoors", 20, 0.13);
  private static final Space OUT = space("outdoors", 0, 0.04);

  private static Sketch block() {
    return new Sketch()
        .know(PIPE)
        .know(IN)
        .know(OUT)
        .box(material("concrete", 1), 0, 0, 1, 1)
        .box(Sketch.orthotropic("wood", 0.3, 0.1, 0.5), 0.6, 0, 1, 0.4)
        .box(PIPE, 0.3, 0.3, 0.5, 0.5)
        .box(new Hollow("hollow"), 0.7, 0.7, 0.8, 0.85)
        .facing(IN, 0, 1, 0, 0)
        .facing(OUT, 1, 0, 1, 1);
  }

  @Test
  void jumps_by_the_flow_of_a_hole() {
    Solution solution = block().accuracy(0.001).solve();
    double[] temperatures = {50, 20, 0};
    StreamFunction s = solution.streamFunction(temperatures).orElseThrow();

    assertThat(s.jumps()).hasSize(1);
    double flow = fall(s, solution.conditions(), 0);
    assertThat(flow).isGreaterThan(10);
    assertThat(s.jumps()[0]).isCloseTo(flow, within(ROUNDING * flow));
    assertThat(solution.spaceFlow(0, temperatures)).isCloseTo(flow, within(0.002 * flow));
    // 20 °C all around: what enters from the pipe leaves; only differences count
    StreamFunction warmer = solution.streamFunction(new double[] {150, 120, 100}).orElseThrow();
    assertThat(warmer.entering()).isCloseTo(s.entering(), within(ROUNDING * s.entering()));
    assertThat(solution.streamFunction(new double[] {20, 20, 20}).orElseThrow().greatest())
        .isZero();
  }

  /**
   * Along a straight line between two places the rise of S is the flow across it to the right; −λ∇θ
   * says the same, but for the gap of the bounds, 0.01 % of the energy, whose root is 1 %: of what
   * passes through a triangle, of which all that enters is ten times the most.
   */
  @Test
  void agrees_with_the_temperatures_across_any_line() {
    Solution solution = block().accuracy(0.0001).solve();
    double[] temperatures = {50, 20, 0};
    StreamFunction s = solution.streamFunction(temperatures).orElseThrow();
    TemperatureField field = solution.temperatures(temperatures);
    Mesh mesh = solution.mesh();
    Random random = new Random(3);
    double largest = 0;
    for (int i = 0; i < 2000; i++) {
      int t = random.nextInt(mesh.triangleCount());
      double[] from = place(random);
      double[] to = place(random);
      double[][] xy = {at(mesh, t, from), at(mesh, t, to)};
      double rise = s.in(t, to[0], to[1], to[2]) - s.in(t, from[0], from[1], from[2]);
      double across = 0;
      for (double part : new double[] {0.5 - Math.sqrt(1.0 / 12), 0.5 + Math.sqrt(1.0 / 12)}) {
        double[] l = new double[3];
        for (int k = 0; k < 3; k++) {
          l[k] = from[k] + part * (to[k] - from[k]);
        }
        double[] q = flux(solution.conditions().material(mesh.label(t)), field, t, l);
        across += (q[0] * (xy[1][1] - xy[0][1]) - q[1] * (xy[1][0] - xy[0][0])) / 2;
      }
      assertThat(rise).isCloseTo(across, within(0.001 * s.entering()));
      largest = Math.max(largest, Math.abs(rise));
    }
    assertThat(largest).isGreaterThan(0.01 * s.entering());
  }

  private static double[] place(Random random) {
    double a = random.nextDouble();
    double b = random.nextDouble();
    return a + b > 1 ? new double[] {a + b - 1, 1 - a, 1 - b} : new double[] {1 - a - b, a, b};
  }

  private static double[] at(Mesh mesh, int t, double[] l) {
    double[] xy = new double[2];
    for (int k = 0; k < 3; k++) {
      xy[0] += l[k] * mesh.x(mesh.vertex(t, k));
      xy[1] += l[k] * mesh.y(mesh.vertex(t, k));
    }
    return xy;
  }

  private static double[] flux(Material material, TemperatureField field, int t, double[] l) {
    double[] g = field.gradient(t, l[0], l[1], l[2]);
    double cos = Math.cos(material.angleRad());
    double sin = Math.sin(material.angleRad());
    double along = -material.conductivityWPerMK() * (g[0] * cos + g[1] * sin);
    double across = -material.crossConductivityWPerMK() * (g[1] * cos - g[0] * sin);
    return new double[] {along * cos - across * sin, along * sin + across * cos};
  }

  @Test
  void none_where_two_fixed_temperatures_meet() {
    Space hot = space("hot", 20, 0);
    Space cold = space("cold", 0, 0);
    Solution solution =
        new Sketch()
            .know(hot)
            .know(cold)
            .box(material("stone", 1), 0, 0, 1, 1)
            .facing(hot, 0, 1, 0, 0)
            .facing(cold, 0, 0, 1, 0)
            .accuracy(0.01)
            .solve();
    assertThat(solution.streamFunction(new double[] {20, 0})).isEmpty();
  }
}
