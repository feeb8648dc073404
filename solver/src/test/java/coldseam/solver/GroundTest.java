package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.View;
import coldseam.solver.ground.GroundFloor;
import coldseam.solver.result.Result;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * The formulas of ISO 13370 by numbers *computed* from a public transcription of the standard, and
 * against L2D of strip buildings computed with elements of high degree ("computed"): half a floor
 * of width B', walls as adiabatic strips of 0.3 m, soil of λ 2.0 to 2.5 B'.
 */
class GroundTest {
  private static final Space OUT = DrawnDetail.space("outdoors", 0, Exposure.OUTSIDE, 0.04);

  private static GroundFloor floor(double width, double resistance) {
    return new GroundFloor(width, 2, 0.3, resistance, 0.17, 0.04);
  }

  /** B', Rf, dt, U by formula, U by elements of high degree. */
  @ParameterizedTest
  @CsvSource({
    "8, 0, 0.72, 0.55405, 0.56581",
    "8, 0.5, 1.72, 0.40935, 0.42065",
    "8, 1.0, 2.72, 0.33409, 0.34295",
    "8, 2.5, 5.72, 0.21849, 0.22437",
    "8, 5.0, 10.72, 0.13912, 0.14333",
    "4, 0, 0.72, 0.87766, 0.91027",
    "4, 2.5, 5.72, 0.26497, 0.27309",
    "12, 0, 0.72, 0.41407, 0.42070",
    "12, 2.5, 5.72, 0.18673, 0.19180",
    "20, 0, 0.72, 0.28200, 0.28531",
    "20, 2.5, 5.72, 0.14492, 0.15027"
  })
  void slabs(double width, double resistance, double thickness, double formula, double computed) {
    GroundFloor floor = floor(width, resistance);
    assertThat(floor.equivalentM()).isCloseTo(thickness, within(1e-12));
    assertThat(floor.slab()).isCloseTo(formula, within(5.1e-6));
    // the formula is 1 to 4 % below a section in two dimensions
    assertThat(computed / formula).isBetween(1.0, 1.05);
    Result result =
        strip(width, 0)
            .facing(
                "floor",
                "indoors",
                FilmRule.uniform(0.17 + resistance, "typed in the test"),
                -width * 500,
                0,
                0,
                0)
            .solve(2e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value() / (width / 2))
        .isCloseTo(computed, within(2e-4 * computed + 1e-5));
  }

  /** Half a floor from −B'/2 to 0, wall of 300 mm, soil to 2.5 B'; a cellar of some depth, mm. */
  private static DrawnDetail strip(double width, double depth) {
    double reach = 2500 * width;
    DrawnDetail drawn =
        new DrawnDetail()
            .view(View.UPRIGHT)
            .know(DrawnDetail.space("indoors", 1, Exposure.INSIDE, 0.17))
            .know(OUT)
            .box(material("soil", 2), -width * 500, -reach, 300 + reach, 0);
    if (depth > 0) {
      drawn.box(new Hollow("room"), -width * 500, -depth, 0, 0);
    }
    return drawn.facing("ground", "outdoors", 300, 0, 300 + reach, 0);
  }

  /** Rf, ψ_g,e of a lying strip and of a standing one, by formula: B' 8, 70 mm of 0.035, D 1 m. */
  @ParameterizedTest
  @CsvSource({"0, -0.4304, -0.6184", "1.0, -0.1101, -0.1835"})
  void edge_insulation(double resistance, double horizontal, double vertical) {
    GroundFloor floor = floor(8, resistance);
    assertThat(floor.edgeInsulation(GroundFloor.Edge.HORIZONTAL, 1, 0.07, 0.035))
        .isCloseTo(horizontal, within(5.1e-5));
    double standing = floor.edgeInsulation(GroundFloor.Edge.VERTICAL, 1, 0.07, 0.035);
    assertThat(standing).isCloseTo(vertical, within(5.1e-5));
    assertThat(floor.slabWith(standing)).isCloseTo(floor.slab() + vertical / 4, within(2e-5));
  }

  /** z, Rf, Rw, U_bf, U_bw, half H by formula, half L2D by elements of high degree: B' 8. */
  @ParameterizedTest
  @CsvSource({
    "1.0, 1.0, 1.0, 0.306897, 0.611745, 1.83933, 1.78318",
    "2.0, 1.0, 1.0, 0.283991, 0.499271, 2.13451, 2.10369",
    "2.5, 2.5, 2.5, 0.190305, 0.262182, 1.41667, 1.43417"
  })
  void basements(
      double depth,
      double floorR,
      double wallR,
      double floorU,
      double wallU,
      double formula,
      double computed) {
    GroundFloor floor = floor(8, floorR);
    assertThat(floor.basementFloor(depth)).isCloseTo(floorU, within(5.1e-7));
    assertThat(floor.basementWall(depth, wallR)).isCloseTo(wallU, within(5.1e-7));
    assertThat(floor.basement(depth, wallR)).isCloseTo(formula, within(5.1e-6));
    Result result =
        strip(8, depth * 1000)
            .facing(
                "floor",
                "indoors",
                FilmRule.uniform(0.17 + floorR, "typed in the test"),
                -4000,
                -depth * 1000,
                0,
                -depth * 1000)
            .facing(
                "wall",
                "indoors",
                FilmRule.uniform(0.13 + wallR, "typed in the test"),
                0,
                -depth * 1000,
                0,
                0)
            .solve(2e-4);
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(computed, within(0.001 * computed));
    assertThat(computed / formula).isBetween(0.95, 1.05);
  }

  /**
   * By hand: U_g of bare ground under the void with B' 8, w 0.3 is 0.554054; h 0.3 m of walls of U
   * 1.5 and 1500 mm²/m of openings at 4 m/s with average shielding give U_x = 2·0.3·1.5/8 +
   * 1450·0.0015·4·0.05/8.
   */
  @Test
  void suspended_floors() {
    double ventilation = GroundFloor.ventilation(0.0015, 4, GroundFloor.Shielding.AVERAGE);
    assertThat(ventilation).isCloseTo(0.2175, within(1e-12));
    double across = 2 * 0.3 * 1.5 / 8 + 1450 * 0.0015 * 4 * 0.05 / 8;
    assertThat(floor(8, 0).suspended(0.4, 0.3, 1.5, ventilation))
        .isCloseTo(1 / (1 / 0.4 + 1 / (0.554054 + across)), within(1e-6));
  }

  /** By hand: 1/U = 1/U_f + A/(A U_bf + z P U_bw + h P U_w + 0.33 n V), A/P = 4 m. */
  @Test
  void floors_over_basements() {
    double out = 4 * 0.283991 + 2 * 0.499271 + 0.5 * 1.2 + 0.33 * 0.3 * 4 * 2.5;
    assertThat(floor(8, 1).overBasement(0.5, 2, 1, 0.5, 1.2, 0.3))
        .isCloseTo(1 / (1 / 0.5 + 4 / out), within(1e-6));
  }
}
