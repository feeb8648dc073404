package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.refinement.NewestVertexBisection;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.SizeField;
import coldseam.mesh.triangulation.Triangulator;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class HierarchicalIndicatorTest {
  private static final boolean[] FIRST = {true, false, false};

  /** One mesh of a sketch with its fields and indicators. */
  private record Level(Discretisation d, double[][] fields, HierarchicalIndicator indicator) {
    static Level of(Mesh mesh, Conditions conditions) {
      Discretisation d = new Discretisation(mesh, conditions);
      double[][] fields = Assembly.unitFields(d);
      return new Level(d, fields, new HierarchicalIndicator(d, fields, FIRST));
    }

    double energy() {
      return ConductanceMatrix.of(d, fields).a[0][0];
    }

    double indicated() {
      return Arrays.stream(indicator.energy[0]).sum();
    }
  }

  private static Level coarse(Sketch sketch, int halvings) {
    Partition partition = sketch.partition();
    Conditions conditions = Conditions.of(sketch.detail(), partition, FilmSet.HEAT_LOSS);
    Mesh mesh = Triangulator.triangulate(partition, conditions::conducts, SizeField.NONE);
    for (int i = 0; i < halvings; i++) {
      mesh = NewestVertexBisection.refineAll(mesh).mesh();
    }
    return Level.of(mesh, conditions);
  }

  /** A layered wall is solved exactly: nothing may be indicated. */
  @Test
  void vanishesOnAFieldThatTheElementsRepresent() {
    Space in = space("indoors", 20, 0.13);
    Space out = space("outdoors", 0, 0.04);
    Level level =
        coarse(
            new Sketch()
                .know(in)
                .know(out)
                .box(material("foil", 160), 0, 0, 0.0001, 1)
                .box(material("wool", 0.035), 0.0001, 0, 0.2, 1)
                .facing(in, 0, 0, 0, 1)
                .facing(out, 0.2, 0, 0.2, 1),
            0);

    assertThat(level.indicated()).isCloseTo(0, within(1e-20));
    assertThat(Arrays.stream(level.indicator.amplitude[0]).max().orElseThrow())
        .isCloseTo(0, within(1e-10));
  }

  /** Exact energies: conformal map of the corner, √(ab) of the checkerboards (Keller 1964). */
  @Test
  void isOfTheSizeOfTheErrorOnSingularFields() {
    Space in = space("indoors", 1, 0);
    Space out = space("outdoors", 0, 0);
    Sketch corner =
        new Sketch()
            .know(in)
            .know(out)
            .polygon(material("stone", 1), 0, 0, 5, 0, 5, 1, 1, 1, 1, 5, 0, 5)
            .facing(in, 5, 1, 1, 1, 1, 5)
            .facing(out, 0, 5, 0, 0, 5, 0);
    assertEffective(corner, 9 - 2 * Math.log(2) / Math.PI, 0.4, 1.2);
    assertEffective(ExactCasesTest.checkerboard(1, 9), 3, 0.2, 1.2);
    assertEffective(ExactCasesTest.checkerboard(0.04, 2), Math.sqrt(0.08), 0.1, 1.2);
  }

  private static void assertEffective(Sketch sketch, double exact, double low, double high) {
    for (int halvings = 0; halvings < 4; halvings++) {
      Level level = coarse(sketch, halvings);
      assertThat(level.indicated() / (level.energy() - exact))
          .as("after %d halvings", halvings)
          .isBetween(low, high);
    }
  }

  /** A foil of 0.1 mm over a metre: neither blind nor off by the slenderness squared. */
  @Test
  void judgesFoilsRightly() {
    Sketch sketch = ConductionTest.Junction.FOIL_THROUGH_INSULATION.sketch();
    double reference = sketch.accuracy(2e-4).solve().matrix(0, 0);
    Level level = coarse(sketch, 1);

    assertThat(level.indicated() / (level.energy() - reference)).isBetween(0.2, 5.0);
  }

  /** Half the elements' size leaves a sixteenth of the error's energy where the field is smooth. */
  @Test
  void fallsWithTheFourthPowerOfTheSizeInASmoothField() {
    Space base = space("base", 1, 0);
    Space air = space("air", 0, 0.04);
    Sketch fin =
        new Sketch()
            .know(base)
            .know(air)
            .box(material("fin", 2), 0, 0, 0.3, 0.1)
            .facing(base, 0, 0, 0, 0.1)
            .facing(air, 0, 0.1, 0.3, 0.1);
    double[] middle = new double[2];
    for (int i = 0; i < 2; i++) {
      Level level = coarse(fin, 3 + i);
      Mesh mesh = level.d.mesh;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        double x = mesh.origin().x();
        for (int k = 0; k < 3; k++) {
          x += mesh.x(mesh.vertex(t, k)) / 3;
        }
        middle[i] += x > 0.1 && x < 0.2 ? level.indicator.energy[0][t] : 0;
      }
    }

    assertThat(middle[0] / middle[1]).isBetween(12.0, 22.0);
  }
}
