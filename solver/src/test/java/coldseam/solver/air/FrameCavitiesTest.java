package coldseam.solver.air;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static coldseam.solver.DrawnDetail.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.DrawnDetail;
import coldseam.solver.Solver;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Settings;
import coldseam.solver.detail.AirCavity.Single;
import coldseam.solver.detail.AirCavity.Temperatures;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Material;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Cavities of frames by ISO 10077-2; values of λ_eq from its formulas, computed by hand. */
class FrameCavitiesTest {
  private static final AirCavity AIR = AirCavity.of("air");

  private static AirCavity air(
      Temperatures temperatures, Optional<RadiationForm> form, Single... singles) {
    return new AirCavity("air", Settings.NONE, form, temperatures, 0.002, false, List.of(singles));
  }

  private static Settings conductivity(double of) {
    return new Settings(
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        OptionalDouble.of(of));
  }

  /** A block 100 x 80 mm, warm below and cold above, with openings upwards. */
  private static DrawnDetail block() {
    return new DrawnDetail()
        .box(room("indoors", 20), 0, -20, 100, 0)
        .box(outdoors(0), 0, 80, 100, 100)
        .box(material("frame", 0.17), 0, 0, 100, 80);
  }

  private static Cavity.Counted counted(Result result, int cavity) {
    return result.cavities().get(cavity).counted().orElseThrow();
  }

  /** Heat flows upwards on the sheet; d x b and λ as of the standard's constants. */
  @ParameterizedTest
  @CsvSource({
    "54, 6, 0.205031",
    "34, 5, 0.130367",
    "18, 5, 0.071417",
    "6, 76, 0.049355",
    "22, 10, 0.091010",
    "26, 5, 0.100914",
    "19, 12, 0.081517",
    "30, 5, 0.115640",
    "8, 3, 0.044941"
  })
  void a_rectangle_counts_as_itself(double d, double b, double lambda) {
    Result result = block().box(AIR, 50 - b / 2, 40 - d / 2, 50 + b / 2, 40 + d / 2).solve(1e-3);
    Cavity.Counted as = counted(result, 0);
    assertThat(as.conductivityWPerMK()).isCloseTo(lambda, within(1e-4 * lambda));
    assertThat(as.box().depthM()).isCloseTo(d / 1000, within(1e-12));
    assertThat(as.direction().y()).isEqualTo(1);
    assertThat(as.form()).contains(RadiationForm.PRODUCT.words());
  }

  @ParameterizedTest
  @CsvSource({
    "2.0, UNVENTILATED",
    "2.01, SLIGHTLY_VENTILATED",
    "10, SLIGHTLY_VENTILATED",
    "10.01, WELL_VENTILATED"
  })
  void the_width_of_a_slit_decides_the_class(double width, Ventilation ventilation) {
    Result result =
        block()
            .box(AIR, 40, 40, 60, 60)
            .box(AIR, 50 - width / 2, 60, 50 + width / 2, 80)
            .solve(1e-3);
    Cavity chamber = result.cavities().get(0);
    assertThat(chamber.ventilation()).isEqualTo(ventilation);
    if (ventilation == Ventilation.UNVENTILATED) {
      // the slit is a gap of its own
      assertThat(result.cavities()).hasSize(2);
      assertThat(chamber.slitM()).isZero();
      assertThat(result.cavities().get(1).slitM()).isCloseTo(0.002, within(1e-9));
    } else {
      assertThat(result.cavities()).hasSize(1);
      assertThat(chamber.slitM()).isCloseTo(width / 1000, within(1e-9));
    }
    assertThat(chamber.counted().isEmpty()).isEqualTo(ventilation == Ventilation.WELL_VENTILATED);
  }

  @Test
  void slightly_ventilated_air_conducts_twice_as_well() {
    Result result = block().box(AIR, 47.5, 62, 52.5, 80).solve(1e-3);
    assertThat(counted(result, 0).conductivityWPerMK()).isCloseTo(0.142834, within(1e-5));
  }

  /** A slit is as wide as from end to end, however its mouth is drawn. */
  @Test
  void a_kinked_mouth_is_no_wider() {
    Result result =
        block().box(AIR, 47, 40, 53, 80).polygon(outdoors(0), 47, 80, 50, 70, 53, 80).solve(1e-3);
    assertThat(result.cavities().get(0).slitM()).isCloseTo(0.006, within(1e-9));
    assertThat(result.cavities().get(0).ventilation()).isEqualTo(Ventilation.SLIGHTLY_VENTILATED);
  }

  /** A rectangle counts as itself though it lies askew in the section. */
  @Test
  void a_cavity_has_axes_of_its_own() {
    double c = Math.cos(Math.toRadians(30));
    double s = Math.sin(Math.toRadians(30));
    double[] corners = {-10, -2.5, 10, -2.5, 10, 2.5, -10, 2.5};
    double[] turned = new double[8];
    for (int i = 0; i < 8; i += 2) {
      turned[i] = 50 + c * corners[i] - s * corners[i + 1];
      turned[i + 1] = 40 + s * corners[i] + c * corners[i + 1];
    }
    Cavity.Counted as = counted(block().polygon(AIR, turned).solve(1e-3), 0);
    assertThat(as.box().depthM()).isCloseTo(0.005, within(1e-9));
    assertThat(as.box().widthM()).isCloseTo(0.020, within(1e-9));
    assertThat(as.direction().x()).isCloseTo(-s, within(1e-9));
    assertThat(as.direction().y()).isCloseTo(c, within(1e-9));
  }

  /** A groove 20 mm wide is outdoors; the chamber behind a slit of 6 mm in it is a cavity. */
  @Test
  void only_what_is_wide_open_belongs_to_the_space() {
    DrawnDetail drawn =
        block().box(AIR, 40, 60, 60, 80).box(AIR, 47, 50, 53, 60).box(AIR, 35, 20, 65, 50);
    Result result = drawn.solve(1e-3);
    assertThat(result.cavities()).hasSize(2);
    Cavity outer = result.cavities().get(1);
    Cavity inner = result.cavities().get(0);
    assertThat(outer.ventilation()).isEqualTo(Ventilation.WELL_VENTILATED);
    assertThat(outer.space()).contains("outdoors");
    assertThat(outer.areaM2()).isCloseTo(400e-6, within(1e-12));
    assertThat(inner.ventilation()).isEqualTo(Ventilation.SLIGHTLY_VENTILATED);
    assertThat(inner.slitM()).isCloseTo(0.006, within(1e-9));
    assertThat(inner.areaM2()).isCloseTo(960e-6, within(1e-12));
    // the groove drawn as outdoors gives the same
    Result same =
        block()
            .box(outdoors(0), 40, 60, 60, 80)
            .box(AIR, 47, 50, 53, 60)
            .box(AIR, 35, 20, 65, 50)
            .solve(1e-3);
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(same.couplings().get(0).valueWPerMK().value(), within(1e-9));
  }

  /** A space that a stretch assigns opens a cavity like one that is laid. */
  @Test
  void a_stretch_opens_a_cavity_too() {
    Result result =
        new DrawnDetail()
            .know(room("indoors", 20))
            .know(outdoors(0))
            .box(material("frame", 0.17), 0, 0, 100, 80)
            .box(AIR, 47.5, 62, 52.5, 80)
            .facing("out", "outdoors", 0, 80, 100, 80)
            .facing("in", "indoors", 0, 0, 100, 0)
            .solve(1e-3);
    assertThat(result.cavities().get(0).ventilation()).isEqualTo(Ventilation.SLIGHTLY_VENTILATED);
    assertThat(result.cavities().get(0).slitM()).isCloseTo(0.005, within(1e-9));
  }

  @Test
  void emissivities_are_those_of_the_faces_across_the_heat_flow() {
    Material foil =
        new Material(
            "foil", 160, 160, 0, 0, OptionalDouble.of(0.1), OptionalDouble.empty(), "test");
    Result result = block().box(AIR, 40, 30, 60, 50).box(foil, 40, 49, 60, 50).solve(1e-3);
    Cavity.Counted as = counted(result, 0);
    assertThat(as.emissivities().first()).isEqualTo(0.9);
    assertThat(as.emissivities().second()).isEqualTo(0.1);
    assertThat(result.assumptions())
        .anySatisfy(line -> assertThat(line.what()).isEqualTo("emissivity of frame in cavities"));
  }

  /** An L of 589 mm² in a box of 27 x 30 mm counts as 23.0 x 25.6 mm: by hand. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 17, 90, 160})
  void an_angle_is_boxed_whichever_way_the_drawing_lies(double turn) {
    double c = Math.cos(Math.toRadians(turn));
    double s = Math.sin(Math.toRadians(turn));
    Result result =
        new DrawnDetail()
            .moved(p -> new Point(c * p.x() - s * p.y(), s * p.x() + c * p.y()))
            .box(room("indoors", 20), 0, -20, 100, 0)
            .box(outdoors(0), 0, 80, 100, 100)
            .box(material("frame", 0.17), 0, 0, 100, 80)
            .polygon(AIR, 30, 30, 30, 57, 47, 57, 47, 40, 60, 40, 60, 30)
            .solve(1e-3);
    Cavity.Counted as = counted(result, 0);
    assertThat(as.box().depthM()).isCloseTo(Math.sqrt(589e-6 * 27 / 30), within(1e-9));
    assertThat(as.box().widthM()).isCloseTo(Math.sqrt(589e-6 * 30 / 27), within(1e-9));
    assertThat(as.conductivityWPerMK()).isCloseTo(0.10636, within(1e-5));
    assertThat(as.direction().x()).isCloseTo(-s, within(1e-9));
    assertThat(as.direction().y()).isCloseTo(c, within(1e-9));
  }

  /**
   * Air 20 x 50 mm between two plates: with R the resistance of all else, ΔT = ΔT_total (d/λ)/(R +
   * d/λ) and λ = d (h_a + h_r) as in ISO 10077-2. The root is found by bisection.
   */
  @ParameterizedTest
  @EnumSource(names = {"PRODUCT", "SERIES"})
  void found_temperatures_solve_the_scalar_equation(RadiationForm form) {
    double d = 0.02;
    double b = 0.05;
    DrawnDetail drawn =
        new DrawnDetail()
            .box(space("indoors", 24, Exposure.INSIDE, 0.13), 0, -20, 50, 0)
            .box(space("outdoors", -11, Exposure.OUTSIDE, 0.04), 0, 40, 50, 60)
            .box(material("plate", 0.5), 0, 0, 50, 10)
            .box(air(Temperatures.FOUND, Optional.of(form)), 0, 10, 50, 30)
            .box(material("plate 2", 0.2), 0, 30, 50, 40);
    Result result = drawn.solve(1e-7);
    double below = 0.13 + 0.01 / 0.5;
    double above = 0.04 + 0.01 / 0.2;
    DoubleUnaryOperator excess =
        lambda -> {
          double q = 35 / (below + above + d / lambda);
          double difference = q * d / lambda;
          double mean = 273.15 + 24 - q * below - difference / 2;
          double ha = Math.max(0.025 / d, 0.73 * Math.cbrt(difference));
          double f = 0.5 * (1 + Math.sqrt(1 + (d / b) * (d / b)) - d / b);
          double black = 4 * 5.67e-8 * mean * mean * mean;
          double hr =
              form == RadiationForm.PRODUCT
                  ? black * f / (2 / 0.9 - 1)
                  : black / (2 / 0.9 - 2 + 1 / f);
          return d * (ha + hr) - lambda;
        };
    double low = 0.01;
    double high = 1;
    for (int i = 0; i < 100; i++) {
      double middle = (low + high) / 2;
      if (excess.applyAsDouble(middle) > 0) {
        low = middle;
      } else {
        high = middle;
      }
    }
    assertThat(counted(result, 0).conductivityWPerMK()).isCloseTo(low, within(1e-6 * low));
    assertThat(counted(result, 0).passes()).isLessThanOrEqualTo(Cavities.MOST_PASSES);
    // an accuracy in W/(m·K) asks as much as the same one as a share
    Accuracy absolute = new Accuracy(10, 1e-10, 1, 1, 2_000_000);
    Result closely = Solver.solve(drawn.detail(), absolute, Progress.SILENT);
    assertThat(counted(closely, 0).conductivityWPerMK()).isCloseTo(low, within(1e-9 * low));
    double r = below + above + d / low;
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(0.05 / r, within(1e-6 / r));
  }

  @Test
  void what_does_not_settle_is_not_certified() {
    DrawnDetail drawn = block().box(air(Temperatures.FOUND, Optional.empty()), 40, 20, 60, 60);
    Result result =
        Solver.solve(drawn.detail(), new Accuracy(1e-30, 1, 1, 1, 2_000), Progress.SILENT);
    assertThat(result.couplings().get(0).valueWPerMK().certificate())
        .isInstanceOfSatisfying(
            Certificate.NotCertified.class,
            not -> assertThat(not.reason()).contains("did not settle in 12 passes"));
    assertThat(counted(result, 0).settled()).isFalse();
    assertThat(counted(result, 0).passes()).isEqualTo(12);
  }

  /** However obliquely heat flows, the directions of the boxes come to rest. */
  @ParameterizedTest
  @EnumSource(Temperatures.class)
  void directions_come_to_rest_in_oblique_flow(Temperatures temperatures) {
    for (int left = 0; left <= 20; left++) {
      DrawnDetail drawn =
          new DrawnDetail()
              .box(space("left", left, Exposure.INSIDE, 0.05), -20, 0, 0, 90)
              .box(space("below", 20 - left, Exposure.INSIDE, 0.05), 0, -20, 90, 0)
              .box(space("outdoors", -1, Exposure.OUTSIDE, 0.05), 90, 0, 110, 110)
              .box(space("outdoors", -1, Exposure.OUTSIDE, 0.05), 0, 90, 90, 110)
              .box(material("frame", 0.05), 0, 0, 90, 90);
      AirCavity air = air(temperatures, Optional.empty());
      for (int i = 0; i < 9; i++) {
        double x = 5 + 29.0 * (i % 3);
        double y = 5 + 29.0 * (i / 3);
        drawn.box(air, x, y, x + (i % 2 == 0 ? 8 : 24), y + (i % 2 == 0 ? 24 : 8));
      }
      Result result = Solver.solve(drawn.detail(), Accuracy.STANDARD, Progress.SILENT);
      assertThat(result.couplings().get(0).valueWPerMK().certificate())
          .isInstanceOf(Certificate.Certified.class);
      assertThat(counted(result, 0).passes()).isLessThanOrEqualTo(Cavities.MOST_PASSES);
    }
  }

  @Test
  void a_point_in_no_cavity_is_a_mistake() {
    AirCavity air =
        air(
            Temperatures.FIXED,
            Optional.empty(),
            new Single(new Point(0.01, 0.01), conductivity(0.1)));
    DetailException e =
        catchThrowableOfType(
            DetailException.class, () -> block().box(air, 40, 20, 60, 60).solve(1e-3));
    assertThat(e.faults()).hasSize(1);
    assertThat(e.faults().get(0).part()).isEqualTo("cavity");
    assertThat(e.faults().get(0).message()).contains("contains the point (10, 10) mm");
  }

  @Test
  void one_cavity_of_many_may_be_stated() {
    AirCavity air =
        air(
            Temperatures.FIXED,
            Optional.empty(),
            new Single(new Point(0.05, 0.04), conductivity(0.1)));
    Result result = block().box(air, 40, 20, 60, 60).box(air, 70, 20, 76, 74).solve(1e-3);
    assertThat(counted(result, 0).conductivityWPerMK()).isEqualTo(0.1);
    assertThat(counted(result, 1).conductivityWPerMK()).isCloseTo(0.205031, within(1e-5));
  }

  /** Laid first and over everything, but only where it is enclosed. */
  @Test
  void what_is_left_uncovered_may_be_air() {
    AirCavity uncovered =
        new AirCavity(
            "air", Settings.NONE, Optional.empty(), Temperatures.FIXED, 0.002, true, List.of());
    DrawnDetail ring =
        new DrawnDetail()
            .box(uncovered, -50, -50, 150, 150)
            .box(room("indoors", 20), 0, -20, 100, 0)
            .box(outdoors(0), 0, 80, 100, 100);
    double[][] sides = {{0, 0, 100, 20}, {0, 60, 100, 80}, {0, 20, 40, 60}, {60, 20, 100, 60}};
    for (int i = 0; i < 4; i++) {
      ring.box(material("frame", 0.17), sides[i][0], sides[i][1], sides[i][2], sides[i][3]);
    }
    Result result = ring.solve(1e-3);
    Result laid = block().box(AIR, 40, 20, 60, 60).solve(1e-3);
    assertThat(result.cavities()).hasSize(1);
    assertThat(result.couplings().get(0).valueWPerMK().value())
        .isCloseTo(laid.couplings().get(0).valueWPerMK().value(), within(1e-9));
  }

  @Test
  void a_frame_of_twenty_cavities_settles_in_twelve_passes() {
    for (Temperatures temperatures : Temperatures.values()) {
      DrawnDetail drawn =
          new DrawnDetail()
              .box(room("indoors", 20), 0, -20, 130, 0)
              .box(outdoors(0), 0, 80, 130, 100)
              .box(material("PVC", 0.17), 0, 0, 130, 80)
              .box(material("panel", 0.035), 100, 30, 300, 54);
      drawn.box(room("indoors", 20), 130, -20, 300, 30).box(outdoors(0), 130, 54, 300, 100);
      AirCavity air = air(temperatures, Optional.empty());
      for (int i = 0; i < 20; i++) {
        double x = 3 + 19.0 * (i % 5);
        double y = 3 + 19.0 * (i / 5);
        drawn.polygon(
            air,
            x,
            y,
            x + 16,
            y,
            x + 16,
            y + 9,
            x + 9 + i % 3,
            y + 9,
            x + 9 + i % 3,
            y + 16,
            x,
            y + 16);
      }
      Result result = Solver.solve(drawn.detail(), Accuracy.STANDARD, Progress.SILENT);
      assertThat(result.cavities()).hasSize(20);
      assertThat(result.couplings().get(0).valueWPerMK().certificate())
          .isInstanceOf(Certificate.Certified.class);
      assertThat(result.cavities())
          .allSatisfy(
              cavity ->
                  assertThat(cavity.counted().orElseThrow().passes())
                      .isLessThanOrEqualTo(Cavities.MOST_PASSES));
      assertThat(counted(result, 0).differenceK().isPresent())
          .isEqualTo(temperatures == Temperatures.FOUND);
    }
  }

  /**
   * Random shapes: nothing fails, area is kept, λ lies between still air and what 0.3 m may have.
   */
  @ParameterizedTest
  @ValueSource(longs = {11, 12, 13, 14, 15})
  void any_shape_gets_a_conductivity(long seed) {
    Random random = new Random(seed);
    int solved = 0;
    for (int trial = 0; trial < 12; trial++) {
      double turn = random.nextBoolean() ? 0 : random.nextDouble() * Math.PI;
      double c = Math.cos(turn);
      double s = Math.sin(turn);
      DrawnDetail drawn =
          new DrawnDetail()
              .moved(p -> new Point(c * p.x() - s * p.y(), s * p.x() + c * p.y()))
              .box(room("indoors", 20), 0, -20, 100, 0)
              .box(outdoors(0), 0, 80, 100, 100)
              .box(material("frame", 0.17), 0, 0, 100, 80);
      AirCavity air =
          air(
              random.nextBoolean() ? Temperatures.FIXED : Temperatures.FOUND,
              random.nextBoolean() ? Optional.empty() : Optional.of(RadiationForm.SERIES));
      int shapes = 1 + random.nextInt(5);
      for (int i = 0; i < shapes; i++) {
        randomShape(drawn, air, random);
      }
      Result result;
      try {
        result = Solver.solve(drawn.detail(), coarse(), Progress.SILENT);
      } catch (DetailException e) {
        // air may cut the block from its spaces, which is said and is no crash
        continue;
      }
      solved++;
      double sum = 0;
      for (Cavity cavity : result.cavities()) {
        assertThat(cavity.areaM2()).isPositive();
        sum += cavity.areaM2();
        if (cavity.counted().isPresent()) {
          assertThat(cavity.rule()).isEqualTo(Rule.FRAME);
          assertThat(cavity.counted().get().conductivityWPerMK()).isBetween(0.0249, 2.0);
        }
      }
      double laid = drawn.partition().labelArea(drawn.detail().fills().indexOf(air));
      assertThat(sum).isCloseTo(laid, within(1e-9 * laid));
    }
    assertThat(solved).isGreaterThanOrEqualTo(9);
  }

  private static Accuracy coarse() {
    return new Accuracy(0.05, 0.05, 0.05, 0.05, 20_000);
  }

  private static void randomShape(DrawnDetail drawn, AirCavity air, Random random) {
    double x = 5 + random.nextDouble() * 70;
    double y = random.nextInt(5) == 0 ? 70 : 5 + random.nextDouble() * 50;
    if (random.nextBoolean()) {
      double w = random.nextInt(4) == 0 ? 0.5 + random.nextDouble() : 3 + random.nextDouble() * 20;
      drawn.box(air, x, y, x + w, y + 3 + random.nextDouble() * 20);
      return;
    }
    int corners = 3 + random.nextInt(8);
    double[] xy = new double[2 * corners];
    for (int i = 0; i < corners; i++) {
      double angle = 2 * Math.PI * i / corners;
      double radius = 1 + random.nextDouble() * 14;
      xy[2 * i] = x + 10 + radius * Math.cos(angle);
      xy[2 * i + 1] = y + 10 + radius * Math.sin(angle);
    }
    drawn.polygon(air, xy);
  }
}
