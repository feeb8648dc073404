package coldseam.solver.air;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.DrawnDetail;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Exchange;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Settings;
import coldseam.solver.detail.AirCavity.Temperatures;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Air layers by ISO 6946. Resistances of layers are those of the standard's formulas (annex D),
 * from memory; sums of layers are by hand.
 */
class AirLayersTest {
  private static final double INNER_R = 0.1 / 0.15 + 0.1 / 0.034;
  private static final double OUTER_R = 0.1025 / 0.77;

  static AirCavity air(Settings settings) {
    return new AirCavity(
        "air", settings, Optional.empty(), Temperatures.FIXED, 0.002, false, List.of());
  }

  static Settings settings(Optional<Exchange> exchange, Optional<Emissivities> emissivities) {
    return new Settings(
        Optional.empty(), exchange, emissivities, Optional.empty(), OptionalDouble.empty());
  }

  private static Settings openings(double mm2) {
    return settings(
        Optional.of(
            new Exchange(
                Ventilation.ofOpenings(mm2 * 1e-6),
                OptionalDouble.of(mm2 * 1e-6),
                Optional.empty())),
        Optional.empty());
  }

  private static Wanted.Transmittance u() {
    return new Wanted.Transmittance(
        "wall", List.of("indoors"), List.of("outdoors"), OptionalDouble.empty());
  }

  /** A cavity wall, upwards from y = 0: block 100, wool 100, air, brick 102.5 mm. */
  private static DrawnDetail wall(AirCavity air, double gapMm) {
    return new DrawnDetail()
        .box(room("indoors", 20), 0, -100, 1000, 0)
        .box(outdoors(-5), 0, 302.5 + gapMm, 1000, 400 + gapMm)
        .box(material("block", 0.15), 0, 0, 1000, 100)
        .box(material("wool", 0.034), 0, 100, 1000, 200)
        .box(air, 0, 200, 1000, 200 + gapMm)
        .box(material("brick", 0.77), 0, 200 + gapMm, 1000, 302.5 + gapMm)
        .want(u());
  }

  private static double resistance(Result result) {
    return result.transmittances().get(0).resistanceM2KPerW().value();
  }

  /** Heat upwards, horizontal, downwards. */
  @ParameterizedTest
  @CsvSource({
    "25, 1, 0.9, 0.9, 0.1623", "25, 0, 0.9, 0.9, 0.1831", "25, -1, 0.9, 0.9, 0.1918",
    "50, 1, 0.9, 0.9, 0.1623", "50, 0, 0.9, 0.9, 0.1831", "50, -1, 0.9, 0.9, 0.2122",
    "10, 1, 0.9, 0.9, 0.1490", "10, 0, 0.9, 0.9, 0.1490", "10, -1, 0.9, 0.9, 0.1490",
    "25, 1, 0.2, 0.9, 0.338", "25, 0, 0.2, 0.9, 0.443", "25, -1, 0.2, 0.9, 0.498",
    "25, 1, 0.9, 0.05, 0.453", "25, 0, 0.9, 0.05, 0.664", "25, -1, 0.9, 0.05, 0.796"
  })
  void resistance_follows_thickness_direction_and_emissivity(
      double gap, int up, double one, double other, double r) {
    AirCavity air = air(settings(Optional.empty(), Optional.of(new Emissivities(one, other))));
    double films = up == 0 ? 0.17 : up > 0 ? 0.14 : 0.21;
    Result result = wall(air, gap).view(up == 0 ? View.PLAN : View.up(0, up)).solve(1e-4);
    assertThat(resistance(result) - INNER_R - OUTER_R - films)
        .isCloseTo(r, within(6e-4 * r + 5e-5));
    Cavity cavity = result.cavities().get(0);
    assertThat(cavity.rule()).isEqualTo(Rule.LAYER);
    assertThat(cavity.ventilation()).isEqualTo(Ventilation.UNVENTILATED);
    assertThat(cavity.counted().orElseThrow().box().depthM()).isCloseTo(gap / 1000, within(1e-9));
  }

  /**
   * A shelf parts the layer in two lengths: across the wall both conduct the same, and the external
   * length is shared by the halves.
   */
  @ParameterizedTest
  @CsvSource({"450, 0", "450, 800", "500, 0"})
  void a_layer_parted_by_a_shelf_is_the_same_wall_on_either_side(double at, double openings) {
    AirCavity air = openings == 0 ? AirCavity.of("air") : air(openings(openings));
    DrawnDetail parted =
        wall(air, 40)
            .box(material("shelf", 17), at, 100, at + 6, 325)
            .psi("shelf", List.of("indoors"), List.of("outdoors"), DimensionSystem.EXTERNAL);
    Result.LinearTransmittance psi = parted.solve(1e-4).psi().get(0);
    assertThat(psi.subtracted()).hasSize(2);
    double length = 0;
    for (Result.Subtracted flank : psi.subtracted()) {
      length += flank.lengthM().orElseThrow();
    }
    assertThat(length).isCloseTo(1, within(1e-9));
    assertThat(psi.valueWPerMK().value()).isPositive();
  }

  /** ISO 6946:2017: a void narrower than ten times its thickness; 2017 form, from memory. */
  @ParameterizedTest
  @CsvSource({"20, 20, 0.22747", "50, 20, 0.25247", "20, 100, 0.19429"})
  void a_divided_void_takes_its_width_into_account(double d, double b, double r) {
    Settings layer =
        new Settings(
            Optional.of(Rule.LAYER),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            OptionalDouble.empty());
    Result result =
        new DrawnDetail()
            .box(room("indoors", 20), 0, -100, b, 0)
            .box(outdoors(0), 0, 20 + d, b, 200)
            .box(material("board", 0.2), 0, 0, b, 10)
            .box(air(layer), 0, 10, b, 10 + d)
            .box(material("board 2", 0.2), 0, 10 + d, b, 20 + d)
            .want(u())
            .solve(1e-4);
    assertThat(resistance(result) - 0.17 - 0.1).isCloseTo(r, within(1e-3 * r));
  }

  /**
   * Which edition's formula holds is said, and where a layer is thicker than the standard knows.
   */
  @ParameterizedTest
  @CsvSource({
    "20, 100, 'a small or divided void (ISO 6946:2017, annex D:'",
    "350, 1000, 'with the resistance of 300 mm, the thickest that ISO 6946 knows, a small or'"
  })
  void what_a_layer_counts_as_is_said(double d, double b, String said) {
    Settings layer =
        new Settings(
            Optional.of(Rule.LAYER),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            OptionalDouble.empty());
    Result result =
        new DrawnDetail()
            .box(room("indoors", 20), 0, -100, b, 0)
            .box(outdoors(0), 0, 20 + d, b, 700)
            .box(material("board", 0.2), 0, 0, b, 10)
            .box(air(layer), 0, 10, b, 10 + d)
            .box(material("board 2", 0.2), 0, 10 + d, b, 20 + d)
            .want(u())
            .solve(1e-3);
    assertThat(result.assumptions())
        .anySatisfy(
            line -> {
              assertThat(line.what()).startsWith("cavity 1 at");
              assertThat(line.value()).contains(said);
            });
    assertThat(wall(AirCavity.of("air"), 40).solve(1e-3).cavities().get(0).counted().get().form())
        .isEmpty();
  }

  /** What lies outside a well ventilated layer is left out; Rsi stands behind it. */
  @Test
  void a_well_ventilated_layer_belongs_to_the_outdoors() {
    Result result =
        wall(air(openings(1500)), 40)
            .psi("edge", List.of("indoors"), List.of("outdoors"), DimensionSystem.INTERNAL)
            .solve(1e-4);
    assertThat(resistance(result)).isCloseTo(0.13 + INNER_R + 0.13, within(1e-6));
    assertThat(result.flanks())
        .isNotEmpty()
        .allSatisfy(
            flank ->
                assertThat(flank.uWPerM2K().mid()).isCloseTo(1 / (0.26 + INNER_R), within(1e-9)));
    assertThat(result.cavities().get(0).ventilation()).isEqualTo(Ventilation.WELL_VENTILATED);
    assertThat(result.cavities().get(0).space()).contains("outdoors");
    assertThat(result.cavities().get(0).counted()).isEmpty();
  }

  /** ISO 6946:2017: R = (1500 − A)/1000 · R_unventilated + (A − 500)/1000 · R_well, by hand. */
  @ParameterizedTest
  @CsvSource({"800, 0.3", "1200, 0.7", "1499, 0.999"})
  void a_slightly_ventilated_layer_lies_between(double mm2, double share) {
    Result result =
        wall(air(openings(mm2)), 50)
            .psi("edge", List.of("indoors"), List.of("outdoors"), DimensionSystem.INTERNAL)
            .solve(1e-4);
    double air = 1 / (1.25 + 4 * 5.67e-8 * Math.pow(283.15, 3) / (2 / 0.9 - 1));
    double unventilated = 0.17 + INNER_R + OUTER_R + air;
    double well = 0.26 + INNER_R;
    double expected = (1 - share) * unventilated + share * well;
    assertThat(resistance(result)).isCloseTo(expected, within(1e-5));
    assertThat(result.transmittances().get(0).valueWPerM2K().certificate())
        .isInstanceOfSatisfying(
            Certificate.Certified.class,
            proved -> {
              assertThat(1 / expected).isBetween(proved.lower() - 1e-6, proved.upper() + 1e-6);
              assertThat(proved.upper() - proved.lower()).isLessThan(1e-4 / expected);
            });
    // a plain wall has no ψ: flanks are interpolated alike
    assertThat(result.psi().get(0).valueWPerMK().value()).isCloseTo(0, within(1e-6));
    assertThat(result.psiWithSensitivities()).isEmpty();
    for (Result.FlankResult flank : result.flanks()) {
      assertThat(flank.uWPerM2K().mid()).isCloseTo(1 / expected, within(1e-9));
      assertThat(flank.layers()).hasSize(4);
      assertThat(result.assumptions())
          .filteredOn(line -> line.what().equals("U of flank '" + flank.name() + "'"))
          .singleElement()
          .satisfies(line -> assertThat(line.value()).contains("well ventilated"));
    }
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(1 / expected, within(1e-5));
    assertThat(result.assumptions())
        .anySatisfy(
            line -> {
              assertThat(line.what()).isEqualTo("slightly ventilated air layers");
              assertThat(line.source()).contains("ISO 6946:2017").contains("extension");
            });
    assertThat(result.cavities().get(0).ventilation()).isEqualTo(Ventilation.SLIGHTLY_VENTILATED);
  }

  /** Ventilated from an attic, the layer of a roof leads heat there and no more to the outdoors. */
  @Test
  void heat_that_passes_to_another_space_has_no_total_resistance() {
    AirCavity attic =
        air(
            settings(
                Optional.of(
                    new Exchange(
                        Ventilation.SLIGHTLY_VENTILATED,
                        OptionalDouble.of(900e-6),
                        Optional.of("attic"))),
                Optional.empty()));
    DrawnDetail drawn = wall(attic, 50).box(room("attic", 5), 1000, 300, 1100, 320);
    DetailException e = catchThrowableOfType(DetailException.class, () -> drawn.solve(1e-3));
    assertThat(e.faults().get(0).message())
        .contains("(cavity 1)")
        .contains("to another space")
        .contains("no one total resistance");
    DrawnDetail beside = wall(air(openings(900)), 50).box(room("attic", 5), 1000, 300, 1100, 320);
    Result result = beside.solve(1e-3);
    assertThat(result.couplings()).hasSize(3);
    assertThat(result.couplings().get(0).valueWPerMK().certified()).isTrue();
  }

  @Test
  void two_layers_with_different_openings_have_no_common_share() {
    AirCavity other =
        new AirCavity(
            "gap", openings(700), Optional.empty(), Temperatures.FIXED, 0.002, false, List.of());
    DrawnDetail drawn = wall(air(openings(900)), 50).box(other, 0, 40, 1000, 60);
    DetailException e = catchThrowableOfType(DetailException.class, () -> drawn.solve(1e-3));
    assertThat(e.faults().get(0).message()).contains("900").contains("700").contains("one total");
  }

  /** A layer that a drawing leaves open to the outside: 3 mm are 3000 mm² per metre. */
  @Test
  void openings_are_measured_in_the_drawing() {
    DrawnDetail drawn =
        new DrawnDetail()
            .box(room("indoors", 20), 0, -100, 1000, 0)
            .box(outdoors(0), -100, 250, 1000, 400)
            .box(outdoors(0), -100, 110, 0, 250)
            .box(material("wool", 0.04), 0, 0, 1000, 100)
            .box(AirCavity.of("air"), 0, 100, 1000, 150)
            .box(material("brick", 0.77), 0, 150, 1000, 250)
            .box(material("vent", 1), 0, 100, 20, 150)
            .box(AirCavity.of("air"), 0, 120, 20, 123);
    Cavity cavity = drawn.solve(1e-3).cavities().get(0);
    assertThat(cavity.rule()).isEqualTo(Rule.LAYER);
    assertThat(cavity.slitM()).isCloseTo(0.003, within(1e-9));
    assertThat(cavity.ventilation()).isEqualTo(Ventilation.WELL_VENTILATED);
  }

  /** Each leg has the thickness and the direction of its own: 0.1831 beside, 0.1623 above. */
  @Test
  void a_layer_round_a_corner_is_cut_into_its_legs() {
    DrawnDetail drawn =
        new DrawnDetail()
            .view(View.UPRIGHT)
            .box(outdoors(0), -200, -0.0, 1000, 1300)
            .box(material("brick", 0.77), 0, 0, 1000, 1000)
            .box(AirCavity.of("air"), 100, 0, 1000, 900)
            .box(material("wool", 0.04), 150, 0, 1000, 850)
            .box(room("indoors", 20), 300, 0, 1000, 700);
    Result result = drawn.solve(1e-3);
    assertThat(result.cavities()).hasSize(2);
    for (Cavity cavity : result.cavities()) {
      Cavity.Counted as = cavity.counted().orElseThrow();
      assertThat(as.box().depthM()).isCloseTo(0.05, within(1e-9));
      double r = Math.abs(as.direction().y()) > 0.5 ? 0.1623 : 0.1831;
      assertThat(0.05 / as.conductivityWPerMK()).isCloseTo(r, within(1e-4));
    }
    assertThat(result.cavities().get(0).areaM2() + result.cavities().get(1).areaM2())
        .isCloseTo(0.05 * (900 + 850) / 1000, within(1e-9));
  }

  @Test
  void a_layer_thicker_than_the_standard_knows_is_solved_with_its_thickest() {
    Result result = wall(air(Settings.NONE), 450).view(View.UPRIGHT).solve(1e-3);
    assertThat(result.cavities().get(0).counted().orElseThrow().conductivityWPerMK())
        .isBetween(1.0, 4.0);
  }

  @Test
  void a_single_cavity_may_be_stated_by_a_point_in_it() {
    AirCavity air =
        new AirCavity(
            "air",
            Settings.NONE,
            Optional.empty(),
            Temperatures.FIXED,
            0.002,
            false,
            List.of(
                new AirCavity.Single(
                    new Point(0.5, 0.225),
                    new Settings(
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty(),
                        OptionalDouble.of(0.3)))));
    Result result = wall(air, 50).solve(1e-4);
    assertThat(resistance(result)).isCloseTo(0.17 + INNER_R + OUTER_R + 0.05 / 0.3, within(1e-6));
    assertThat(result.cavities().get(0).counted().orElseThrow().stated()).isTrue();
  }
}
