package coldseam.solver.conduction;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;

/** Both sides of the bound, and the identity of the gap, on whatever may go wrong. */
class TwoSidedBoundTest {
  private static final Space IN = Sketch.space("in", 20, 0);
  private static final Space OUT = Sketch.space("out", 0, 0);
  private static final Material SOLID = Sketch.material("solid", 1);

  private static TwoSidedBound bound(Sketch sketch, int refinements) {
    var detail = sketch.detail();
    var partition = sketch.partition();
    var conditions = Conditions.of(detail, partition, FilmSet.HEAT_LOSS);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    for (int i = 0; i < refinements; i++) {
      mesh = NewestVertexBisection.refineAll(mesh).mesh();
    }
    Discretisation d = new Discretisation(mesh, conditions);
    double[][] fields = Assembly.unitFields(d);
    StreamSpace space = new StreamSpace(mesh, conditions);
    double[][] streams = ConjugateProblem.streamFunctions(d, space);
    TwoSidedBound b = new TwoSidedBound(d, fields, space, streams);
    System.out.println(
        mesh.triangleCount()
            + " up "
            + b.up[0][0]
            + " lo "
            + b.lo[0][0]
            + " gap "
            + b.gap[0][0]
            + " mismatch "
            + b.mismatch()
            + " cuts "
            + space.cuts);
    return b;
  }

  @Test
  void corner_of_two_walls() {
    for (int r = 0; r < 4; r++) {
      TwoSidedBound b =
          bound(
              new Sketch()
                  .box(SOLID, 0, 0, 3, 1)
                  .box(SOLID, 0, 0, 1, 3)
                  .facing(IN, 3, 1, 1, 1, 1, 3)
                  .facing(OUT, 0, 3, 0, 0, 3, 0),
              r);
      assertThat(b.mismatch()).isLessThan(1e-12);
    }
  }

  @Test
  void tensor_and_films() {
    for (int r = 0; r < 4; r++) {
      TwoSidedBound b =
          bound(
              new Sketch()
                  .box(Sketch.orthotropic("wood", 2, 0.5, 0.5), 0, 0, 1, 1)
                  .box(SOLID, 1, 0, 1.5, 1)
                  .facing(Sketch.space("a", 1, 0.13), 0, 0, 0, 1)
                  .facing(Sketch.space("b", 0, 0.04), 1.5, 0, 1.5, 1),
              r);
      assertThat(b.mismatch()).isLessThan(1e-12);
    }
  }

  @Test
  void a_one_hole() {
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1),
        0);
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1, 0, 1),
        1);
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1, 0, 1, 0, 0, 1, 0),
        1);
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
            .flow(5, 0, 0, 0, 1)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1),
        0);
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .flow(5, 0, 0, 0, 1)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1),
        0);
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
            .box(Sketch.space("pipe 2", 50, 0.1), 0.6, 0.3, 0.7, 0.5)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1),
        0);
    bound(
        new Sketch()
            .box(SOLID, 0, 0, 1, 1)
            .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
            .box(new Hollow("void"), 0.1, 0.7, 0.3, 0.8)
            .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1),
        0);
  }

  @Test
  void hole_with_film() {
    for (int r = 0; r < 4; r++) {
      TwoSidedBound b =
          bound(
              new Sketch()
                  .box(SOLID, 0, 0, 1, 1)
                  .box(Sketch.space("pipe", 50, 0.1), 0.3, 0.3, 0.5, 0.5)
                  .box(Sketch.space("pipe 2", 50, 0.1), 0.6, 0.3, 0.7, 0.5)
                  .box(new Hollow("void"), 0.1, 0.7, 0.3, 0.8)
                  .flow(5, 0, 0, 0, 1)
                  .facing(Sketch.space("b", 0, 0.04), 1, 0, 1, 1),
              r);
      assertThat(b.mismatch()).isLessThan(1e-12);
      System.out.println(java.util.Arrays.deepToString(b.up));
      System.out.println(java.util.Arrays.deepToString(b.lo));
      System.out.println(java.util.Arrays.deepToString(b.gap));
    }
  }
}
