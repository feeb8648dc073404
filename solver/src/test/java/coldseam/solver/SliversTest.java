package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.space;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Space;
import coldseam.solver.result.Result;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Shapes far thinner than long: solved with bounds that hold, or told with their place. */
class SliversTest {
  private static final Space INSIDE = space("inside", 20, Exposure.INSIDE, 0.001);
  private static final Space OUTSIDE = space("outside", 0, Exposure.OUTSIDE, 0.0013);

  private static DrawnDetail block() {
    return new DrawnDetail()
        .box(INSIDE, -200, -500, 1200, 0)
        .box(OUTSIDE, -200, 400, 1200, 900)
        .box(material("block", 0.2), 0, 0, 1000, 400);
  }

  /**
   * A wedge of the one material is left under the other. Between conductivities of 0.2 and 0.21 the
   * exact L2D lies between those of plain walls of either: 1 m / (Rs + 0.4/λ + Rs).
   */
  @ParameterizedTest
  @ValueSource(doubles = {0.1, 0.01, 0.003})
  void a_wedge_of_a_hair_is_solved(double hairMm) {
    Result result =
        block().polygon(material("over", 0.21), 0, hairMm, 1000, 0, 1000, 400, 0, 400).solve(1e-3);
    Certificate certificate = result.couplings().get(0).valueWPerMK().certificate();
    assertThat(certificate).isInstanceOf(Certificate.Certified.class);
    Certificate.Certified proved = (Certificate.Certified) certificate;
    assertThat(proved.upper()).isGreaterThan(1 / (0.001 + 0.4 / 0.2 + 0.0013));
    assertThat(proved.lower()).isLessThan(1 / (0.001 + 0.4 / 0.21 + 0.0013));
    assertThat(proved.upper() - proved.lower()).isLessThan(3e-3);
  }

  /** A fin of the thickness of some atoms: either the numbers carry it or the message its place. */
  @ParameterizedTest
  @ValueSource(doubles = {1.1e-5, 2e-5, 1e-4, 1e-3})
  void a_fin_is_solved_or_told(double thicknessMm) {
    DrawnDetail drawn =
        block()
            .box(material("fin", 30), 750, 225, 1650, 225 + thicknessMm)
            .box(material("fin", 30), 900, 0, 950, 900);
    try {
      assertThat(drawn.solve(1e-2).couplings().get(0).valueWPerMK().certified()).isTrue();
    } catch (DetailException e) {
      Fault fault = e.faults().get(0);
      assertThat(fault.message())
          .startsWith("'fin' is only ")
          .contains("too thin to be computed with");
      assertThat(fault.where()).isPresent();
      assertThat(fault.where().get().y()).isBetween(-0.001, 0.901);
    }
  }
}
