package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.orthotropic;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Exponents of corners known in closed form: π/ω between like conditions, π/2ω between unlike ones
 * (Grisvard 1985); (4/π) arctan √(λ₁/λ₂) where four squares of two materials meet (Kellogg 1975);
 * an orthotropic corner by the affine map that makes it isotropic (computed).
 */
class CornerExponentsTest {
  private static final double CLOSE = 2e-4;
  private static final Space ONE = space("one", 1, 0);
  private static final Space ZERO = space("zero", 0, 0);
  private static final Space AIR = space("air", 0, 0.04);
  private static final Space ROOM = space("room", 1, 0.13);
  private static final Material STONE = material("stone", 1);

  /** The exponent at a point, NaN where edges of the partition do not meet. */
  private static double at(Sketch sketch, double x, double y) {
    Partition partition = sketch.partition();
    Conditions conditions = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    double[] exponents = CornerExponents.of(mesh, conditions);
    for (int v = 0; v < mesh.vertexCount(); v++) {
      double dx = mesh.origin().x() + mesh.x(v) - x;
      double dy = mesh.origin().y() + mesh.y(v) - y;
      if (Math.hypot(dx, dy) < 1e-9) {
        return exponents[v];
      }
    }
    throw new AssertionError("no vertex at " + x + ", " + y);
  }

  private static Sketch corner(Material material, Space inside, Space outside) {
    return new Sketch()
        .know(inside)
        .know(outside)
        .polygon(material, 0, 0, 3, 0, 3, 1, 1, 1, 1, 3, 0, 3)
        .facing(inside, 3, 1, 1, 1, 1, 3)
        .facing(outside, 0, 3, 0, 0, 3, 0);
  }

  @Test
  void re_entrant_corner() {
    assertThat(at(corner(STONE, ONE, ZERO), 1, 1)).isCloseTo(2.0 / 3, within(CLOSE));
    assertThat(at(corner(STONE, ROOM, AIR), 1, 1)).isCloseTo(2.0 / 3, within(CLOSE));
    assertThat(at(corner(STONE, ONE, ZERO), 0, 0)).isEqualTo(CornerExponents.REGULAR);
    assertThat(at(corner(STONE, ROOM, AIR), 3, 1)).isEqualTo(CornerExponents.REGULAR);
  }

  /** Edges along the axes stay square to each other when an axis is scaled. */
  @Test
  void re_entrant_corner_of_an_orthotropic_material() {
    assertThat(at(corner(orthotropic("wood", 4, 1, 0), ONE, ZERO), 1, 1))
        .isCloseTo(2.0 / 3, within(CLOSE));
    // turned by 45°: rays at ±45° from the axis of λ = 4 come to ±arctan 2
    double angle = 2 * Math.PI - 2 * Math.atan(2);
    assertThat(at(corner(orthotropic("wood", 4, 1, Math.PI / 4), ONE, ZERO), 1, 1))
        .isCloseTo(Math.PI / angle, within(CLOSE));
  }

  /** The end of a heated strip in a straight adiabatic edge: ω = π, unlike conditions. */
  @Test
  void end_of_a_fixed_temperature() {
    Sketch sketch =
        new Sketch()
            .know(ONE)
            .know(ZERO)
            .box(STONE, -2, -2, 2, 0)
            .facing(ONE, -1, 0, 1, 0)
            .facing(ZERO, -2, -2, 2, -2);
    assertThat(at(sketch, 1, 0)).isCloseTo(0.5, within(CLOSE));
  }

  @ParameterizedTest
  @CsvSource({"1, 4", "1, 9", "0.04, 2", "160, 0.035"})
  void four_squares_of_two_materials(double a, double b) {
    double expected = 4 / Math.PI * Math.atan(Math.sqrt(Math.min(a, b) / Math.max(a, b)));
    assertThat(at(ExactCasesTest.checkerboard(a, b), 0.5, 0.5)).isCloseTo(expected, within(CLOSE));
  }

  /** Fields are linear in each layer beside a straight joint, and r log r where it meets a film. */
  @Test
  void ends_of_a_straight_joint() {
    Sketch sketch =
        new Sketch()
            .know(ROOM)
            .know(AIR)
            .box(STONE, 0, 0, 1, 0.2)
            .box(material("wool", 0.04), 0, 0.2, 1, 0.3)
            .box(material("board", 0.2), 0.5, 0.2, 1, 0.3)
            .facing(ROOM, 0, 0, 1, 0)
            .facing(AIR, 1, 0.3, 0, 0.3);
    assertThat(at(sketch, 0, 0.2)).isEqualTo(CornerExponents.REGULAR);
    assertThat(at(sketch, 0.5, 0.3)).isEqualTo(1);
    assertThat(at(sketch, 0, 0)).isEqualTo(CornerExponents.REGULAR);
  }
}
