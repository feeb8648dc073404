package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

/**
 * ISO 10211:2017, annex C (annex A of earlier editions), case 2: a metal angle in insulation behind
 * a board. Temperatures of the standard with one decimal, and computed with elements of degree 2 to
 * 7 graded to the corners, six decimals stable. Heat flow 9.5 W/m; computed 9.49145.
 */
class Iso10211ValidationCase2Test {
  private static final double[][] POINTS = {
    {0, 47.5, 7.1, 7.064167},
    {500, 47.5, 0.8, 0.761293},
    {0, 41.5, 7.9, 7.897186},
    {15, 41.5, 6.3, 6.272292},
    {500, 41.5, 0.8, 0.827498},
    {0, 36.5, 16.4, 16.407860},
    {15, 36.5, 16.3, 16.333555},
    {0, 0, 16.8, 16.767169},
    {500, 0, 18.3, 18.333663}
  };

  static Sketch detail(UnaryOperator<Point> move) {
    Space inside = space("inside", 20, 0.11);
    Space outside = space("outside", 0, 0.06);
    Material metal = material("aluminium", 230);
    return new Sketch()
        .moved(move)
        .know(inside)
        .know(outside)
        .box(material("insulation", 0.029), 0, 0.0015, 0.5, 0.0415)
        .box(material("board", 1.15), 0, 0.0415, 0.5, 0.0475)
        .box(material("wood", 0.12), 0, 0.0365, 0.015, 0.0415)
        .box(metal, 0, 0.035, 0.015, 0.0365)
        .box(metal, 0, 0.0015, 0.0015, 0.035)
        .box(metal, 0, 0, 0.5, 0.0015)
        .facing(inside, 0, 0, 0.5, 0)
        .facing(outside, 0, 0.0475, 0.5, 0.0475);
  }

  private static void check(Sketch sketch, UnaryOperator<Point> move, double kelvin) {
    Solution solution = sketch.surfaceTemperatures().solve();
    double[] temperatures = {20, 0};
    TemperatureField field = solution.temperatures(temperatures);

    for (double[] point : POINTS) {
      Point at = move.apply(new Point(point[0] / 1000, point[1] / 1000));
      assertThat(field.at(at))
          .as("(%s, %s)", point[0], point[1])
          .isCloseTo(point[3], within(kelvin))
          .isCloseTo(point[2], within(0.05 + kelvin));
    }
    assertThat(solution.spaceFlow(0, temperatures)).isCloseTo(9.49145, within(0.005));
    assertThat(solution.spaceFlow(0, temperatures) + solution.spaceFlow(1, temperatures)).isZero();
    assertThat(solution.stretchFlow(0, temperatures) + solution.stretchFlow(1, temperatures))
        .isCloseTo(0, within(9.5e-9));
  }

  @Test
  void temperaturesAndHeatFlow() {
    check(detail(UnaryOperator.identity()), UnaryOperator.identity(), 0.02);
  }

  @Test
  void temperaturesAndHeatFlowFarOutAndTurned() {
    UnaryOperator<Point> move =
        p ->
            new Point(
                1e4 + p.x() * Math.cos(0.4) - p.y() * Math.sin(0.4),
                -2e4 + p.x() * Math.sin(0.4) + p.y() * Math.cos(0.4));
    check(detail(move), move, 0.02);
  }

  @Test
  void aTighterAccuracyIsMet() {
    check(detail(UnaryOperator.identity()).accuracy(2e-4), UnaryOperator.identity(), 0.005);
  }
}
