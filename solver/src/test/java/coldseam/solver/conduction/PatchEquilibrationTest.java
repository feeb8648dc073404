package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.orthotropic;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Percentage.withPercentage;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Two lower bounds made by different means, from stream functions on the whole section and from
 * fluxes patch by patch, hold each other to account: on every mesh of a uniform refinement neither
 * exceeds the exact value nor the upper bound. The second one's fluxes are looked at in the plain
 * coordinates of the drawing: no divergence, no jump across a side, nothing where nothing may
 * cross.
 */
class PatchEquilibrationTest {
  private static final Space ONE = space("one", 1, 0);
  private static final Space ZERO = space("zero", 0, 0);

  /** Meshes are refined until they have more. */
  private static final int TRIANGLES = 1200;

  /** Relative rounding of sums of energies. */
  private static final double ROUNDING = 1e-12;

  /** Divergence and jumps, relative to the largest flux times the size of a triangle. */
  private static final double BALANCED = 1e-12;

  /** Outflow that the patches may leave a triangle, relative to the same. */
  private static final double REMAINDER = 1e-9;

  /**
   * Gap of the patches over that of the conjugate problem for degrees 1 and 2: at least 1 for
   * linear fluxes, of which the conjugate problem has the best; quadratic fluxes may do better.
   */
  private static final double[] LEAST = {0, 1, 0.4};

  /** The same, at most: 4.2 and 3.4 seen. */
  private static final double[] MOST = {0, 6, 5};

  private static final int DETAILS = 120;

  private static Conditions conditions(Sketch sketch, Partition partition) {
    return Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
  }

  /** Checks all of a detail of two spaces on every mesh of a uniform refinement. */
  private static void holds(Sketch sketch, double exact, double lastPlace) {
    Partition partition = sketch.partition();
    Conditions conditions = conditions(sketch, partition);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    for (int level = 0; level < 3 || mesh.triangleCount() <= TRIANGLES; level++) {
      mesh = level == 0 ? mesh : NewestVertexBisection.refineAll(mesh).mesh();
      Bounds bounds = new Bounds(mesh, conditions);
      for (int degree = 1; degree <= 2; degree++) {
        String name = "degree " + degree + ", level " + level;
        PatchEquilibration patches = bounds.check(degree, name);
        assertThat(exact)
            .as(name)
            .isBetween(patches.lo[0][0] - lastPlace, bounds.global.up[0][0] + lastPlace);
      }
    }
  }

  /** Both bounds on one mesh. */
  private static final class Bounds {
    final Discretisation d;
    final Conditions conditions;
    final double[][] fields;
    final TwoSidedBound global;

    Bounds(Mesh mesh, Conditions conditions) {
      this.conditions = conditions;
      d = new Discretisation(mesh, conditions);
      fields = Assembly.unitFields(d);
      StreamSpace space = new StreamSpace(mesh, conditions);
      global = new TwoSidedBound(d, fields, space, ConjugateProblem.streamFunctions(d, space));
    }

    PatchEquilibration equilibrate(int degree) {
      return new PatchEquilibration(d, conditions, fields, degree);
    }

    /** Equilibrates, and checks what does not need the exact value. */
    PatchEquilibration check(int degree, String name) {
      PatchEquilibration patches = equilibrate(degree);
      int used = d.hasFlow ? d.spaces + 1 : d.spaces;
      for (int i = 0; i < used; i++) {
        checkFlux(patches, i, name);
        double up = global.up[i][i];
        double rounding = ROUNDING * Math.abs(up);
        assertThat(patches.lo[i][i]).as(name).isLessThanOrEqualTo(up + rounding);
        assertThat(patches.gap[i][i])
            .as("efficiency, %s", name)
            .isBetween(
                LEAST[degree] * global.gap[i][i] - rounding,
                MOST[degree] * global.gap[i][i] + rounding);
        for (int j = 0; j < used; j++) {
          double both = ROUNDING * Math.sqrt(Math.abs(up * global.up[j][j]));
          assertThat(global.up[i][j] - patches.lo[i][j] - patches.gap[i][j])
              .as("identity, %s", name)
              .isBetween(-both, both);
        }
      }
      return patches;
    }

    private static void checkFlux(PatchEquilibration patches, int field, String name) {
      FluxAudit audit = new FluxAudit(patches, field);
      double scale = audit.scale();
      assertThat(audit.source()).as("divergence, %s", name).isLessThan(BALANCED * scale);
      assertThat(audit.jump()).as("jump, %s", name).isLessThan(BALANCED * scale);
      assertThat(patches.carried[field]).as("remainder, %s", name).isLessThan(REMAINDER * scale);
    }

    /** Each entry of a better middle, less what it may be off itself, lies in the interval. */
    void assertInside(PatchEquilibration coarse, double[][] up, String name) {
      for (int i = 0; i < global.up.length; i++) {
        for (int j = 0; j < global.up.length; j++) {
          double middle = (up[i][j] + coarse.lo[i][j]) / 2;
          double own = Math.sqrt(global.gap[i][i] * global.gap[j][j]) / 2;
          double half = Math.sqrt(coarse.gap[i][i] * coarse.gap[j][j]) / 2;
          double rounding = ROUNDING * Math.sqrt(Math.abs(up[i][i] * up[j][j]));
          assertThat(Math.abs(global.middle(i, j) - middle))
              .as("entry %d %d, %s", i, j, name)
              .isLessThanOrEqualTo(half + own + rounding);
        }
      }
    }
  }

  /** Arms of thickness 1 and inner length 5, the outer corner at the origin. */
  private static Sketch corner(Sketch sketch) {
    return sketch
        .know(ONE)
        .know(ZERO)
        .polygon(material("stone", 1), 0, 0, 6, 0, 6, 1, 1, 1, 1, 6, 0, 6)
        .facing(ONE, 6, 1, 1, 1, 1, 6)
        .facing(ZERO, 0, 6, 0, 0, 6, 0);
  }

  /** Exact: conformal map; adiabatic ends of arms of 5 thicknesses change less than 1e-13. */
  private static final double CORNER = 10 + (Math.PI - Math.log(4)) / Math.PI;

  @Test
  void isothermal_corner() {
    holds(corner(new Sketch()), CORNER, 1e-9);
  }

  /** Computed: elements of degree 8 graded to the corner, eight digits stable. */
  private static final double FILM_CORNER = 4.07021518;

  private static Sketch filmCorner(Sketch sketch) {
    Space inside = space("indoors", 1, 0.13);
    Space outside = space("outdoors", 0, 0.04);
    return sketch
        .know(inside)
        .know(outside)
        .polygon(material("block", 0.5), 0, 0, 1.8, 0, 1.8, 0.3, 0.3, 0.3, 0.3, 1.8, 0, 1.8)
        .facing(inside, 1.8, 0.3, 0.3, 0.3, 0.3, 1.8)
        .facing(outside, 0, 1.8, 0, 0, 1.8, 0);
  }

  @Test
  void corner_with_films() {
    holds(filmCorner(new Sketch()), FILM_CORNER, 5e-9);
  }

  /** Two such corners that touch in one point, in the outer corner or at the end of an arm. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 1.8})
  void pinch(double x) {
    Sketch sketch = filmCorner(new Sketch()).moved(p -> new Point(2 * x - p.x(), -p.y()));
    holds(filmCorner(sketch), 2 * FILM_CORNER, 1e-8);
  }

  /** Two blocks, each between its own spaces, that touch in a point: nothing is exchanged. */
  @Test
  void pinch_that_carries_nothing() {
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
    Conditions conditions = conditions(sketch, partition);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    for (int degree = 1; degree <= 2; degree++) {
      PatchEquilibration patches = new Bounds(mesh, conditions).equilibrate(degree);
      assertThat(patches.lo[0][0]).isBetween(-1e-12, 1e-12);
      assertThat(patches.gap[0][0]).isLessThan(1e-12);
    }
  }

  /** Exact: Keller 1964, Dykhne 1970. */
  @ParameterizedTest
  @CsvSource({"1, 4", "1, 9", "0.04, 2.0"})
  void checkerboard(double a, double b) {
    holds(ExactCasesTest.checkerboard(a, b), Math.sqrt(a * b), 1e-12);
  }

  /** Exact: the affine map to isotropy makes a rhombus, conductance √(k1 k2) = 1. */
  @Test
  void rotated_tensor() {
    double width = Math.sqrt(1.625 / 0.875);
    Sketch sketch =
        new Sketch()
            .know(ONE)
            .know(ZERO)
            .box(orthotropic("wood", 2, 0.5, Math.PI / 6), 0, 0, width, 1)
            .facing(ZERO, 0, 0, width, 0)
            .facing(ONE, 0, 1, width, 1);
    holds(sketch, 1, 1e-12);
  }

  /** ISO 10211:2017, annex C, case 2; computed with elements of degree 7: 9.49145 W/m for 20 K. */
  @Test
  void metal_angle() {
    holds(Iso10211ValidationCase2Test.detail(p -> p), 9.49145 / 20, 5e-6 / 20);
  }

  /**
   * Exact: the mirror on the diagonal changes fixed sides for cut-offs and back, so the conductance
   * is that of its own conjugate, 1. Both cut-offs begin within a side.
   */
  @ParameterizedTest
  @ValueSource(doubles = {0.3, 0.5, 0.8})
  void cut_offs_within_sides(double from) {
    Sketch sketch =
        new Sketch()
            .know(ONE)
            .know(ZERO)
            .box(material("square", 1), 0, 0, 1, 1)
            .facing(ONE, 0, 0, from, 0)
            .facing(ZERO, 0, from, 0, 1, 1, 1);
    holds(sketch, 1, 1e-12);
  }

  /** A hole with a film; held against the interval of the finest adaptive mesh. */
  @Test
  void hole_with_a_film() {
    Space pipe = space("pipe", 1, 0.1);
    Space out = space("outdoors", 0, 0.04);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-6)
            .know(pipe)
            .know(out)
            .box(material("concrete", 1), 0, 0, 1, 1)
            .box(pipe, 0.3, 0.3, 0.5, 0.5)
            .facing(out, 1, 0, 1, 1);
    Quantity fine = sketch.solve().coupling(new int[] {0}, new int[] {1});
    Certificate.Certified proved = (Certificate.Certified) fine.certificate();
    holds(sketch, fine.value(), proved.upper() - fine.value());
  }

  /**
   * Exact: a flow g through two layers and a film, energy −g²(Σ d/λ + Rs) for each metre of width;
   * the field is linear in each layer, so that both bounds meet it.
   */
  @Test
  void given_flow_through_layers() {
    Space out = space("outdoors", 0, 0.04);
    Sketch sketch =
        new Sketch()
            .know(out)
            .box(material("brick", 0.5), 0, 0, 0.24, 0.7)
            .box(material("wool", 0.035), 0.24, 0, 0.38, 0.7)
            .facing(out, 0.38, 0, 0.38, 0.7)
            .flow(7, 0, 0, 0, 0.7);
    Partition partition = sketch.partition();
    Conditions conditions = conditions(sketch, partition);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    double exact = -49 * 0.7 * (0.24 / 0.5 + 0.14 / 0.035 + 0.04);
    for (int degree = 1; degree <= 2; degree++) {
      PatchEquilibration patches = new Bounds(mesh, conditions).equilibrate(degree);
      assertThat(patches.lo[1][1]).isCloseTo(exact, withPercentage(1e-9));
      assertThat(patches.gap[1][1]).isLessThan(ROUNDING * -exact);
    }
  }

  @Test
  void random_details() {
    int solved = 0;
    for (int seed = 0; solved < DETAILS; seed++) {
      assertThat(seed).as("seeds that make a detail").isLessThan(2 * DETAILS);
      Sketch sketch = RandomDetails.sketch(new Random(seed));
      Partition partition = sketch.partition();
      Conditions conditions;
      try {
        conditions = conditions(sketch, partition);
      } catch (DetailException unsolvable) {
        continue;
      }
      solved++;
      Mesh coarse = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
      Bounds first = new Bounds(coarse, conditions);
      Bounds second = new Bounds(NewestVertexBisection.refineAll(coarse).mesh(), conditions);
      for (int degree = 1; degree <= 2; degree++) {
        String name = "seed " + seed + ", degree " + degree;
        PatchEquilibration patches = first.check(degree, name);
        second.check(degree, name + ", refined");
        second.assertInside(patches, first.global.up, name);
      }
    }
  }
}
