package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.mesh.partition.Partition;
import coldseam.solver.conduction.Conduction;
import coldseam.solver.conduction.Progress;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;

/**
 * What 0.1 mm of foil and 1.5 mm of flashing cost: the same detail certified to 0.1 % with and
 * without them. No outside figure exists; the limits are what was reached, and some more.
 */
class SheetsTest {
  private static final double ACCURACY = 1e-3;
  private static final Space INDOORS = room("indoors", 20);
  private static final Space OUTDOORS = outdoors(-5);
  private static final Material CONCRETE = material("concrete", 2.3);
  private static final Material WOOL = material("wool", 0.035);
  private static final Material METAL = material("metal", 160);

  private static Solution solve(DrawnDetail drawn) {
    Partition partition = drawn.partition();
    Conditions conditions = Conditions.of(drawn.detail(), partition, FilmSet.HEAT_LOSS);
    Conduction.Goal goal =
        new Conduction.Goal(
            new Accuracy(ACCURACY, 1e9, 1e9, 1e9, 100_000),
            false,
            false,
            Conduction.Temperatures.NONE,
            new double[] {20, -5});
    Solution solution = Conduction.solve(partition, conditions, goal, Progress.SILENT);
    Quantity coupling = solution.coupling(new int[] {0}, new int[] {1});
    assertThat(coupling.certified()).isTrue();
    assertThat(coupling.halfWidth()).isPositive().isLessThan(ACCURACY * coupling.value());
    return solution;
  }

  /** A slab through an insulated wall, plaster and render on it. */
  private static DrawnDetail balcony() {
    return new DrawnDetail()
        .box(INDOORS, -1500, -1500, 0, 1600)
        .box(OUTDOORS, 425, -1500, 2325, 1600)
        .box(material("plaster", 0.57), 0, -1500, 15, 1600)
        .box(material("brickwork", 0.5), 15, -1500, 255, 1600)
        .box(WOOL, 255, -1500, 415, 1600)
        .box(material("render", 1), 415, -1500, 425, 1600)
        .box(CONCRETE, -1500, -200, 1825, 0)
        .box(material("screed", 1.35), -1500, 0, 0, 80);
  }

  /** Foil on the brickwork, and a flashing from within the insulation out over the slab. */
  @Test
  void an_ordinary_detail_takes_less_than_twice_the_unknowns() {
    DrawnDetail with =
        balcony()
            .box(METAL, 255, -1500, 255.1, -200)
            .box(METAL, 255, 0, 255.1, 1600)
            .polygon(METAL, 315, 150, 315, 30, 455, 10, 455, 1, 456.5, 1, 456.5, 11.3, 316.5, 31.3)
            .polygon(METAL, 315, 150, 315, 31, 316.5, 31, 316.5, 150);
    assertThat(solve(with).unknowns()).isLessThan(2 * solve(balcony()).unknowns());
  }

  private static DrawnDetail wallFoot() {
    return new DrawnDetail()
        .box(INDOORS, -1500, 0, 0, 1500)
        .box(OUTDOORS, 350, -800, 700, 1500)
        .box(material("block", 0.5), 0, -800, 200, 1500)
        .box(WOOL, 200, -800, 350, 1500)
        .box(CONCRETE, -1500, -200, 200, 0)
        .box(INDOORS, -1500, -800, 0, -200);
  }

  /**
   * Sheets that bridge the insulation of a detail so plain that its coarsest mesh is fine enough:
   * 14 times the unknowns. Each of the thirteen singular corners that the sheets bring takes some
   * 15 triangles for each halving of the distance from it.
   */
  @Test
  void sheets_that_bridge_a_plain_detail_take_fourteen_times_the_unknowns() {
    DrawnDetail with =
        wallFoot()
            .box(METAL, 200, 300, 200.1, 1500)
            .box(METAL, 200, 300, 350, 300.1)
            .polygon(
                METAL, 200, 60, 260, 60, 260, 10, 400, 0, 400, -30, 401.5, -30, 401.5, 1.4, 261.5,
                11.4, 261.5, 61.5, 200, 61.5);
    Solution bridged = solve(with);
    Solution plain = solve(wallFoot());
    assertThat(bridged.unknowns()).isLessThan(4500);
    assertThat(plain.passes()).isEqualTo(1);
    assertThat(bridged.unknowns()).isLessThan(17 * plain.unknowns());
  }
}
