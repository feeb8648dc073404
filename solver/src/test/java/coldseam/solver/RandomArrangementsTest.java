package coldseam.solver;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.mesh.plane.Point;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/**
 * Random arrangements of shapes through partition, mesh and certified solve: solved, with bounds in
 * order and a balance of 0, or refused in words with a place. What lies where is held against the
 * drawing itself, point by point.
 *
 * <p>The long run: {@code mvn test -pl solver -am -Dtest=RandomArrangementsTest
 * -Dsurefire.failIfNoSpecifiedTests=false -Darrangements=5000}.
 */
@Timeout(value = 6, unit = TimeUnit.HOURS)
class RandomArrangementsTest {
  private static final int ORDINARY = 120;
  private static final int MOST_UNKNOWNS = 12_000;

  /** In less out over what passes. */
  private static final double BALANCE = 1e-9;

  /** Rounding over what passes beyond which nothing passes: no material joins the spaces. */
  private static final double NOTHING_FLOWS = 1e-4;

  /** Rounding errors that go into the sum of flows. */
  private static final double ROUNDINGS = 64;

  /** Points nearer to an edge than this may have been moved across it, m. */
  private static final double NEAR_EDGE_M = 5e-6;

  private int solved;
  private int certified;
  private int balances;
  private int beyond;
  private double worstBalance;
  private double slowestS;
  private int slowestSeed;

  @Test
  void solved_or_explained() {
    int count = Integer.getInteger("arrangements", ORDINARY);
    int first = Integer.getInteger("arrangements.first", 0);
    List<String> failures = new ArrayList<>();
    for (int seed = first; seed < first + count; seed++) {
      long start = System.nanoTime();
      Arrangement arrangement = Arrangement.of(seed);
      try {
        one(arrangement, seed);
      } catch (RuntimeException | AssertionError | StackOverflowError | OutOfMemoryError e) {
        failures.add("arrangement " + seed + ": " + trace(e) + arrangement.text());
      }
      double s = (System.nanoTime() - start) / 1e9;
      slowestSeed = s > slowestS ? seed : slowestSeed;
      slowestS = Math.max(slowestS, s);
    }
    String told =
        String.format(
            Locale.ROOT,
            "%d arrangements: %d solved, %d of them certified, %d explained, %d failed; %d"
                + " balances of films within %.1e, %d of them beyond 1e-9; slowest %.1f s (%d)",
            count,
            solved,
            certified,
            count - solved - failures.size(),
            failures.size(),
            balances,
            worstBalance,
            beyond,
            slowestS,
            slowestSeed);
    System.getLogger("coldseam.test").log(System.Logger.Level.INFO, told);
    assertThat(failures).as(told).isEmpty();
    assertThat(solved).as(told).isGreaterThan(count / 4);
    assertThat(certified).as(told).isGreaterThan(solved / 2);
  }

  private void one(Arrangement arrangement, int seed) {
    Result result;
    try {
      Accuracy accuracy = new Accuracy(0.01, 0.005, 0.005, 0.01, MOST_UNKNOWNS);
      result = Solver.solve(arrangement.drawn().detail(), accuracy, Progress.SILENT);
    } catch (DetailException e) {
      explained(e);
      return;
    }
    worstBalance = Math.max(worstBalance, balanced(result));
    boolean proved = bounds_in_order(result);
    lies_as_drawn(arrangement, result, seed);
    solved++;
    certified += proved ? 1 : 0;
  }

  private static String trace(Throwable e) {
    StringBuilder text = new StringBuilder(e + "\n");
    for (int i = 0; i < Math.min(8, e.getStackTrace().length); i++) {
      text.append("  ").append(e.getStackTrace()[i]).append('\n');
    }
    return text.toString();
  }

  private static void explained(DetailException e) {
    assertThat(e.faults()).isNotEmpty();
    for (Fault fault : e.faults()) {
      String shown = fault.toString();
      assertThat(fault.message()).as(shown).isNotBlank().doesNotContain("null", "NaN", "Exception");
      boolean placed = fault.where().isPresent() || fault.message().contains(" mm");
      boolean all = fault.message().startsWith("no material with a conductivity above 0");
      assertThat(placed || all || !fault.name().isEmpty()).as(shown).isTrue();
    }
  }

  private static boolean bounds_in_order(Result result) {
    boolean all = true;
    for (Result.Coupling coupling : result.couplings()) {
      String shown = coupling.toString();
      double value = coupling.valueWPerMK().value();
      assertThat(value).as(shown).isNotNaN();
      if (coupling.valueWPerMK().certificate() instanceof Certificate.Certified proved) {
        assertThat(proved.lower()).as(shown).isFinite().isLessThanOrEqualTo(value);
        assertThat(proved.upper()).as(shown).isFinite().isGreaterThanOrEqualTo(value);
      } else {
        all = false;
      }
    }
    return all;
  }

  /**
   * The flows through the films of all spaces, from the temperatures of the surfaces, add up to 0.
   * Where a surface has a fixed temperature what enters there is what is left, and nothing is
   * shown. The balance of the result, which is that of the middle of the bounds, is 0 in any case.
   */
  private double balanced(Result result) {
    double stated = result.balance().relative();
    assertThat(Double.isNaN(stated) || Math.abs(stated) < BALANCE).as("balance stated").isTrue();
    Solution solution = result.heatLoss();
    double[] temperaturesC = new double[result.spaces().size()];
    for (int i = 0; i < temperaturesC.length; i++) {
      temperaturesC[i] = result.spaces().get(i).temperatureC();
    }
    TemperatureField field = solution.temperatures(temperaturesC);
    Mesh mesh = solution.mesh();
    Conditions conditions = solution.conditions();
    double sum = 0;
    double size = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int edge = mesh.partitionEdge(t, k);
        if (edge == Mesh.NONE || !conditions.conducts(mesh.label(t))) {
          continue;
        }
        if (conditions.kind(edge) == Conditions.Kind.FIXED) {
          return 0;
        }
        if (conditions.kind(edge) == Conditions.Kind.FILM) {
          int side = mesh.side(t, k);
          double meanC =
              (field.atNode(mesh.sideStart(side))
                      + 4 * field.atNode(mesh.vertexCount() + side)
                      + field.atNode(mesh.sideEnd(side)))
                  / 6;
          double conductance = mesh.sideLength(side) / conditions.filmM2KPerW(edge);
          double flow = conductance * (temperaturesC[conditions.space(edge)] - meanC);
          sum += flow;
          size += Math.abs(flow);
        }
      }
    }
    double relative = size == 0 ? 0 : Math.abs(sum) / (size / 2);
    double rounding = size == 0 ? 0 : ROUNDINGS * Math.ulp(1.0) * stiffest(solution) * 40 / size;
    if (rounding > NOTHING_FLOWS) {
      return 0;
    }
    balances++;
    assertThat(relative).as("balance, rounding %.1e", rounding).isLessThan(BALANCE + rounding);
    beyond += relative > BALANCE ? 1 : 0;
    return relative;
  }

  /** Largest conductance across a triangle, W/(m·K): what the last digit of a temperature moves. */
  private static double stiffest(Solution solution) {
    Mesh mesh = solution.mesh();
    double most = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double longest = 0;
      for (int k = 0; k < 3; k++) {
        longest = Math.max(longest, mesh.sideLength(mesh.side(t, k)));
      }
      double conductivity =
          solution.conditions().conducts(mesh.label(t))
              ? solution.conditions().material(mesh.label(t)).conductivityWPerMK()
              : 0;
      most = Math.max(most, conductivity * longest * longest / (2 * mesh.area(t)));
    }
    return most;
  }

  /** The mesh has at a point what was laid there last. */
  private static void lies_as_drawn(Arrangement arrangement, Result result, int seed) {
    Mesh mesh = result.heatLoss().mesh();
    List<Fill> fills = result.detail().fills();
    Random random = new Random(seed);
    for (int i = 0; i < 200; i++) {
      double x = -100 + 1200 * random.nextDouble();
      double y = -100 + 600 * random.nextDouble();
      Fill laid = null;
      boolean near = false;
      for (Arrangement.Shape shape : arrangement.shapes()) {
        laid = holds(shape.xy(), x, y) ? shape.fill() : laid;
        near |= distance(shape.xy(), x, y) < NEAR_EDGE_M * 1000;
      }
      if (near) {
        continue;
      }
      Point at = arrangement.move().apply(new Point(x / 1000, y / 1000));
      int triangle = mesh.locate(at.x() - mesh.origin().x(), at.y() - mesh.origin().y());
      boolean conducts = laid instanceof Material;
      String shown = "at (" + x + ", " + y + ")";
      if (triangle != Mesh.NONE) {
        assertThat(fills.get(mesh.label(triangle)).name())
            .as(shown)
            .isEqualTo(laid == null ? "nothing" : laid.name());
      } else {
        assertThat(conducts).as(shown).isFalse();
      }
    }
  }

  /** Even-odd rule. */
  private static boolean holds(double[] xy, double x, double y) {
    boolean inside = false;
    for (int i = 0; i < xy.length; i += 2) {
      int j = (i + 2) % xy.length;
      if (xy[i + 1] > y != xy[j + 1] > y) {
        double t = (y - xy[i + 1]) / (xy[j + 1] - xy[i + 1]);
        inside ^= x < xy[i] + t * (xy[j] - xy[i]);
      }
    }
    return inside;
  }

  private static double distance(double[] xy, double x, double y) {
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < xy.length; i += 2) {
      int j = (i + 2) % xy.length;
      double dx = xy[j] - xy[i];
      double dy = xy[j + 1] - xy[i + 1];
      double length = dx * dx + dy * dy;
      double t = length == 0 ? 0 : ((x - xy[i]) * dx + (y - xy[i + 1]) * dy) / length;
      double k = Math.max(0, Math.min(1, t));
      least = Math.min(least, Math.hypot(x - xy[i] - k * dx, y - xy[i + 1] - k * dy));
    }
    return least;
  }
}
