package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.data.Percentage.withPercentage;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class ConductionTest {
  private static final int[] INDOORS = {0};
  private static final int[] OUTDOORS = {1};

  /** Invented junctions of the everyday and of the awkward kind. */
  enum Junction {
    SLAB_THROUGH_INSULATION {
      @Override
      Sketch lay(Sketch sketch, Space in, Space out) {
        return sketch
            .box(material("insulation", 0.035), 0, -1.5, 0.16, 1.5)
            .box(material("brick", 0.5), 0.16, -1.5, 0.36, 1.5)
            .box(material("plaster", 0.57), 0.36, -1.5, 0.375, 1.5)
            .box(material("concrete", 2.3), -1.5, -0.1, 1.5, 0.1)
            .facing(in, 0.375, -1.5, 0.375, -0.1, 1.5, -0.1)
            .facing(in, 1.5, 0.1, 0.375, 0.1, 0.375, 1.5)
            .facing(out, 0, -1.5, 0, -0.1, -1.5, -0.1, -1.5, 0.1, 0, 0.1, 0, 1.5);
      }
    },
    STEEL_STUD {
      @Override
      Sketch lay(Sketch sketch, Space in, Space out) {
        Material steel = material("steel", 60);
        return sketch
            .box(material("wool", 0.04), 0, 0.0125, 0.4, 0.1025)
            .box(material("board", 0.21), 0, 0, 0.4, 0.0125)
            .box(material("sheathing", 0.12), 0, 0.1025, 0.4, 0.115)
            .box(steel, 0.2, 0.0125, 0.2011, 0.1025)
            .box(steel, 0.2, 0.0125, 0.24, 0.0136)
            .box(steel, 0.2, 0.1014, 0.24, 0.1025)
            .facing(in, 0, 0, 0.4, 0)
            .facing(out, 0, 0.115, 0.4, 0.115);
      }
    },
    FOIL_THROUGH_INSULATION {
      @Override
      Sketch lay(Sketch sketch, Space in, Space out) {
        Material foil = material("foil", 160);
        return sketch
            .box(material("insulation", 0.035), 0, 0, 1.2, 0.2)
            .box(material("boards", 0.13), 0, -0.02, 1.2, 0)
            .box(foil, 0.6, 0, 0.6001, 0.2)
            .box(foil, 0, 0.2, 1.2, 0.2001)
            .facing(in, 0, -0.02, 1.2, -0.02)
            .facing(out, 0, 0.2001, 1.2, 0.2001);
      }
    },
    SILL_WITH_FLASHING {
      @Override
      Sketch lay(Sketch sketch, Space in, Space out) {
        Material metal = material("aluminium", 160);
        return sketch
            .box(material("block", 0.3), 0.12, -1, 0.32, 0)
            .box(material("insulation", 0.04), 0, -1, 0.12, 0)
            .box(material("frame", 0.13), 0.1, 0, 0.17, 0.08)
            .box(material("pane", 0.035), 0.12, 0.08, 0.144, 0.5)
            .box(metal, -0.03, 0, 0.11, 0.0015)
            .box(metal, -0.03, -0.04, -0.0285, 0.0015)
            .facing(out, 0, -1, 0, 0, -0.0285, 0, -0.0285, -0.04, -0.03, -0.04, -0.03, 0.0015)
            .facing(out, -0.03, 0.0015, 0.1, 0.0015, 0.1, 0.08, 0.12, 0.08, 0.12, 0.5)
            .facing(in, 0.32, -1, 0.32, 0, 0.17, 0, 0.17, 0.08, 0.144, 0.08, 0.144, 0.5);
      }
    },
    WARM_PIPE_IN_SCREED {
      @Override
      Sketch lay(Sketch sketch, Space in, Space out) {
        return sketch
            .box(material("insulation", 0.03), 0, 0, 0.4, 0.1)
            .box(material("screed", 1.4), 0, 0.1, 0.4, 0.16)
            .disc(in, 0.2, 0.13, 0.008, 40)
            .facing(out, 0, 0, 0.4, 0);
      }
    };

    abstract Sketch lay(Sketch sketch, Space in, Space out);

    Sketch sketch() {
      Space in = space("indoors", 20, 0.13);
      Space out = space("outdoors", -5, 0.04);
      return lay(new Sketch().know(in).know(out), in, out);
    }
  }

  /**
   * With the standard accuracy L2D agrees to 0.05 % with a mesh refined four times, temperatures to
   * 0.02 K between spaces 25 K apart, and the guess of the error is neither far too low nor absurd.
   */
  @ParameterizedTest
  @EnumSource(Junction.class)
  void agreesWithItsOwnRefinedMesh(Junction junction) {
    Sketch sketch = junction.sketch().surfaceTemperatures();
    Partition partition = sketch.partition();
    Conditions conditions = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
    Solution solution = Conduction.solve(partition, conditions, sketch.goal(), Progress.SILENT);
    Mesh fine =
        NewestVertexBisection.refineAll(NewestVertexBisection.refineAll(solution.mesh()).mesh())
            .mesh();
    Discretisation d = new Discretisation(fine, conditions);
    double[][] fields = Assembly.unitFields(d);
    double above = ConductanceMatrix.of(d, fields).a[0][0];
    double[] nodal = FieldSolution.nodal(d, fields, new double[] {20, -5});
    TemperatureField field = solution.temperatures(new double[] {20, -5});
    Quantity coupling = solution.coupling(INDOORS, OUTDOORS);
    Certificate.Certified proved = (Certificate.Certified) coupling.certificate();

    assertThat(above).isBetween(proved.lower(), proved.upper());
    assertThat(coupling.value()).isCloseTo(above, withPercentage(0.05));
    assertThat(coupling.halfWidth()).isLessThan(0.002 * above);
    for (int v = 0; v < solution.mesh().vertexCount(); v++) {
      assertThat(field.atNode(v)).isCloseTo(nodal[v], within(0.02));
    }
    assertThat(solution.unknowns()).isLessThan(12000);
    assertThat(solution.passes()).isLessThan(8);
  }

  @Test
  void couplingsAreCertifiedToTheAccuracyAsked() {
    Quantity coupling = Junction.STEEL_STUD.sketch().solve().coupling(INDOORS, OUTDOORS);

    assertThat(coupling.certified()).isTrue();
    assertThat(coupling.halfWidth()).isPositive().isLessThan(0.002 * coupling.value());
  }

  @Test
  void theCapOnUnknownsIsKept() {
    for (int most : new int[] {1500, 4000}) {
      Solution solution =
          ExactCasesTest.checkerboard(0.04, 2)
              .accuracy(new Accuracy(1e-6, 1e-6, 1e-6, 1e-6, most))
              .solve();
      assertThat(solution.unknowns()).isBetween(most / 8, most);
      assertThat(solution.coupling(INDOORS, OUTDOORS).halfWidth()).isGreaterThan(1e-6);
    }
  }

  /** Conductors of 230 : 0.03 touching in one point: no affordable mesh closes that. */
  @Test
  void aHopelessCaseEndsSoonAndIsHonest() {
    Solution solution = ExactCasesTest.checkerboard(230, 0.03).accuracy(Accuracy.STANDARD).solve();
    Quantity coupling = solution.coupling(INDOORS, OUTDOORS);

    assertThat(solution.unknowns()).isLessThan(60_000);
    // exact: √(ab), Keller 1964
    assertThat(Math.sqrt(230 * 0.03))
        .isBetween(
            coupling.value() - coupling.halfWidth(), coupling.value() + coupling.halfWidth());
    assertThat(coupling.halfWidth()).isGreaterThan(0.1 * coupling.value());
  }

  @Test
  void progressIsToldOfEveryPassAndCanCancel() {
    List<String> told = new ArrayList<>();
    Solution solution =
        Junction.STEEL_STUD
            .sketch()
            .solve(
                (stage, pass, unknowns, relativeError) -> {
                  told.add(pass + " " + unknowns);
                  assertThat(stage).isNotBlank();
                  assertThat(relativeError).isPositive();
                  return true;
                });
    assertThat(told).hasSize(solution.passes());
    assertThat(told.get(told.size() - 1)).isEqualTo(solution.passes() + " " + solution.unknowns());

    assertThatThrownBy(
            () ->
                Junction.STEEL_STUD
                    .sketch()
                    .solve((stage, pass, unknowns, relativeError) -> pass < 2))
        .isInstanceOf(CancellationException.class);
  }

  @Test
  void theNextFilmSetBeginsWithTheMeshOfTheFirst() {
    Sketch sketch = Junction.SLAB_THROUGH_INSULATION.sketch();
    Partition partition = sketch.partition();
    Conditions heatLoss = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
    Conditions surface = Conditions.of(sketch.detail(), partition, FilmSet.SURFACE);
    Solution first = Conduction.solve(partition, heatLoss, sketch.goal(), Progress.SILENT);
    Solution next =
        Conduction.solveNext(first, surface, sketch.surfaceTemperatures().goal(), Progress.SILENT);

    assertThat(next.filmSet()).isEqualTo(FilmSet.SURFACE);
    assertThat(next.partition()).isSameAs(partition);
    assertThat(next.passes()).isLessThanOrEqualTo(4);
    assertThat(next.unknowns()).isGreaterThanOrEqualTo(first.unknowns());
    // the films of a sketch are the same in both sets
    assertThat(next.coupling(INDOORS, OUTDOORS).value())
        .isCloseTo(
            first.coupling(INDOORS, OUTDOORS).value(),
            within(first.coupling(INDOORS, OUTDOORS).halfWidth()));
  }

  /** Where nothing limits it the coldest point lies in a corner; refinement has gone there. */
  @Test
  void surfaceTemperaturesAreSteadyInTheCorner() {
    Sketch sketch = Junction.SLAB_THROUGH_INSULATION.sketch().surfaceTemperatures();
    double asked = sketch.solve().temperatures(new double[] {20, -5}).at(new Point(0.375, -0.1));
    Sketch tight = Junction.SLAB_THROUGH_INSULATION.sketch().accuracy(1e-6);
    double reference = tight.solve().temperatures(new double[] {20, -5}).at(new Point(0.375, -0.1));

    assertThat(asked).isCloseTo(reference, within(0.01));
  }

  @Test
  void aTemperatureOutsideTheSectionIsNotANumber() {
    TemperatureField field =
        Junction.STEEL_STUD.sketch().solve().temperatures(new double[] {20, -5});

    assertThat(field.at(new Point(0.2, 0.2))).isNaN();
    assertThat(field.at(new Point(0.2, 0.05))).isBetween(-5.0, 20.0);
  }
}
