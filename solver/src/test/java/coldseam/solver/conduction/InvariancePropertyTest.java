package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.orthotropic;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.Random;
import java.util.function.UnaryOperator;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What must hold for any section: seeded random walls between three spaces. */
class InvariancePropertyTest {
  private static final double ACCURACY = 1e-3;

  /** The seed lays out a wall with boxes in it; the rest says what is changed about it. */
  private record Wall(
      long seed,
      UnaryOperator<Point> move,
      double turn,
      double lengths,
      double films,
      double conductivities,
      boolean split,
      double raised) {
    static Wall of(long seed) {
      return new Wall(seed, UnaryOperator.identity(), 0, 1, 1, 1, false, 1);
    }

    Wall moved(UnaryOperator<Point> by, double turned) {
      return new Wall(seed, by, turned, lengths, films, conductivities, split, raised);
    }

    Wall scaled(double length, double film, double conductivity) {
      return new Wall(seed, move, turn, length, film, conductivity, split, raised);
    }

    Wall splitted() {
      return new Wall(seed, move, turn, lengths, films, conductivities, true, raised);
    }

    Wall raised(double by) {
      return new Wall(seed, move, turn, lengths, films, conductivities, split, by);
    }

    Solution solve() {
      return sketch().solve();
    }

    Sketch sketch() {
      Random random = new Random(seed);
      Space outside = space("outdoors", -5, 0.04 * films);
      Space left = space("left room", 20, 0.13 * films);
      Space right = space("right room", 12, 0.17 * films);
      Sketch sketch =
          new Sketch()
              .moved(p -> move.apply(new Point(lengths * p.x(), lengths * p.y())))
              .accuracy(ACCURACY)
              .know(outside)
              .know(left)
              .know(right);
      sketch.box(new Filling("wall", 0.6).of(this), 0, 0, 1.2, 0.3);
      if (split) {
        sketch.box(new Filling("same as wall", 0.6).of(this), 0.31, 0.05, 0.77, 0.21);
        sketch.polygon(
            new Filling("wall again", 0.6).of(this), 0.9, 0, 1.1, 0, 1.0, 0.11, 0.93, 0.07);
      }
      sketch.box(new Filling("partition", 1.4).of(this), 0.5, 0.3, 0.6, 0.8);
      int boxes = 1 + random.nextInt(4);
      for (int i = 0; i < boxes; i++) {
        double x = 0.01 * random.nextInt(90);
        double y = 0.01 * random.nextInt(25);
        double wide = 0.01 * (1 + random.nextInt(25));
        double high = 0.01 * (1 + random.nextInt(8));
        double conductivity = Math.pow(10, -1.7 + 4 * random.nextDouble());
        Material fill =
            i == 1
                ? orthotropic("grained", 0.3 * conductivities, 0.1 * conductivities, 0.5 + turn)
                : new Filling("box " + i, conductivity * (i == 0 ? raised : 1)).of(this);
        sketch.box(fill, x, y, Math.min(1.2, x + wide), Math.min(0.3, y + high));
      }
      return sketch
          .facing(outside, 0, 0, 1.2, 0)
          .facing(left, 0, 0.3, 0.5, 0.3, 0.5, 0.8)
          .facing(right, 0.6, 0.8, 0.6, 0.3, 1.2, 0.3);
    }
  }

  private record Filling(String name, double conductivity) {
    Material of(Wall wall) {
      return material(name, conductivity * wall.conductivities());
    }
  }

  /** Relative to the diagonal, as the accuracy asked for is. */
  private static void assertSame(Solution one, Solution other, double factor) {
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        double scale = Math.sqrt(one.matrix(i, i) * one.matrix(j, j));
        assertThat(other.matrix(i, j))
            .as("entry %d, %d", i, j)
            .isCloseTo(factor * one.matrix(i, j), within(0.4 * ACCURACY * factor * scale));
      }
    }
  }

  private static UnaryOperator<Point> turn(double angle, double dx, double dy) {
    double cos = Math.cos(angle);
    double sin = Math.sin(angle);
    return p -> new Point(dx + cos * p.x() - sin * p.y(), dy + sin * p.x() + cos * p.y());
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void rotationAndTranslationChangeNothing(long seed) {
    double angle = new Random(seed).nextDouble() * 6;
    Solution still = Wall.of(seed).solve();
    UnaryOperator<Point> move = turn(angle, 1e4, -3e3);
    Solution moved = Wall.of(seed).moved(move, angle).solve();

    assertSame(still, moved, 1);
    double[] temperatures = {-5, 20, 12};
    Point point = new Point(0.55, 0.3);
    assertThat(moved.temperatures(temperatures).at(move.apply(point)))
        .isCloseTo(still.temperatures(temperatures).at(point), within(0.02));
  }

  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13, 14})
  void aMirrorImageHasTheSameCouplings(long seed) {
    Solution one = Wall.of(seed).solve();
    // the grain at angle φ is seen at −φ: turn by −2 · 0.5
    Solution mirrored = Wall.of(seed).moved(p -> new Point(p.x(), -p.y()), -1).solve();

    assertSame(one, mirrored, 1);
  }

  @ParameterizedTest
  @ValueSource(longs = {21, 22, 23, 24})
  void lengthsWithFilmsAndConductivitiesScale(long seed) {
    Solution one = Wall.of(seed).solve();

    assertSame(one, Wall.of(seed).scaled(37, 37, 1).solve(), 1);
    assertSame(one, Wall.of(seed).scaled(1, 1 / 2.5, 2.5).solve(), 2.5);
  }

  @ParameterizedTest
  @ValueSource(longs = {31, 32, 33, 34})
  void splittingARegionChangesNothing(long seed) {
    assertSame(Wall.of(seed).solve(), Wall.of(seed).splitted().solve(), 1);
  }

  @ParameterizedTest
  @ValueSource(longs = {41, 42, 43, 44, 45, 46})
  void raisingAConductivityNeverLowersTheHeatLossOfAGroup(long seed) {
    Solution low = Wall.of(seed).solve();
    Solution high = Wall.of(seed).raised(1.7).solve();
    int[][] groups = {{0}, {1}, {2}};
    int[][] rests = {{1, 2}, {0, 2}, {0, 1}};
    for (int g = 0; g < 3; g++) {
      double before = low.coupling(groups[g], rests[g]).value();
      assertThat(high.coupling(groups[g], rests[g]).value())
          .isGreaterThan(before * (1 - 0.1 * ACCURACY));
    }
    double sumBefore = low.matrix(0, 0) + low.matrix(1, 1) + low.matrix(2, 2);
    double sumAfter = high.matrix(0, 0) + high.matrix(1, 1) + high.matrix(2, 2);
    assertThat(sumAfter).isGreaterThan(sumBefore);
  }

  @ParameterizedTest
  @ValueSource(longs = {51, 52, 53, 54, 55, 56})
  void theMatrixIsSymmetricWithRowsThatSumToZero(long seed) {
    Solution solution = Wall.of(seed).solve();
    double[] temperatures = {-5, 20, 12};
    double out = solution.spaceFlow(0, temperatures);
    for (int i = 0; i < 3; i++) {
      double row = 0;
      for (int j = 0; j < 3; j++) {
        assertThat(solution.matrix(i, j)).isEqualTo(solution.matrix(j, i));
        row += solution.matrix(i, j);
        if (j != i) {
          assertThat(solution.matrix(i, j)).isNegative();
        }
      }
      assertThat(row).isCloseTo(0, within(1e-11 * solution.matrix(i, i)));
      // the stretches are integrated along the surface, the spaces over the whole section
      assertThat(solution.stretchFlow(i, temperatures))
          .isCloseTo(solution.spaceFlow(i, temperatures), within(1e-9 * -out));
    }
    assertThat(out + solution.spaceFlow(1, temperatures) + solution.spaceFlow(2, temperatures))
        .isCloseTo(0, within(1e-14 * -out));
  }

  /** θ is a weighted mean of the spaces' temperatures: maximum principle, Σ g_k = 1. */
  @ParameterizedTest
  @ValueSource(longs = {61, 62, 63, 64})
  void temperaturesStayBetweenThoseOfTheSpaces(long seed) {
    Solution solution = Wall.of(seed).solve();
    TemperatureField field = solution.temperatures(new double[] {-5, 20, 12});
    double[][] unit = {solution.unitField(0), solution.unitField(1), solution.unitField(2)};
    int nodes = solution.mesh().vertexCount() + solution.mesh().sideCount();
    for (int n = 0; n < nodes; n++) {
      assertThat(unit[0][n] + unit[1][n] + unit[2][n]).isCloseTo(1, within(1e-12));
      assertThat(field.atNode(n)).isBetween(-5 - 0.01, 20 + 0.01);
    }
  }
}
