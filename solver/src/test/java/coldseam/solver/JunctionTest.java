package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import java.util.List;
import org.junit.jupiter.api.Test;

class JunctionTest {
  private static final Space INDOORS = room("indoors", 20);
  private static final Space OUTDOORS = outdoors(0);

  private static DrawnDetail corner() {
    Material masonry = material("masonry", 0.5);
    return new DrawnDetail()
        .box(OUTDOORS, -1500, -1500, 800, 800)
        .box(masonry, -1500, -1500, 300, 300)
        .box(INDOORS, -1500, -1500, 0, 0)
        .psi("internal", List.of("indoors"), List.of("outdoors"), DimensionSystem.INTERNAL)
        .psi("external", List.of("indoors"), List.of("outdoors"), DimensionSystem.EXTERNAL);
  }

  /** Homogeneous corner; computed: elements of degree 8, eight digits stable. */
  @Test
  void a_homogeneous_corner_has_the_psi_of_both_dimension_systems() {
    Result result = corner().solve(2e-4);
    System.out.println(result.couplings());
    System.out.println(result.psi());
    System.out.println(result.spaces());
    System.out.println(result.flanks());
    result.assumptions().forEach(System.out::println);
    result.warnings().forEach(System.out::println);
    System.out.println(result.balance() + " " + result.timesMs() + " " + result.unknowns());
    assertThat(result.psi().get(0).valueWPerMK().value()).isCloseTo(0.17411129, within(2e-4));
    assertThat(result.psi().get(1).valueWPerMK().value()).isCloseTo(-0.60510949, within(2e-4));
  }
}
