package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.MoistureLimits;
import coldseam.solver.result.Result;
import coldseam.solver.result.SpaceMoisture;
import coldseam.solver.result.Verdict;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * The moisture check of ISO 13788 on a layered wall, whose f_Rsi with Rsi 0.25 and Rse 0.04 is
 * (0.04 + R)/(0.29 + R) by hand. Months and limits *computed* from the standard's formulas.
 */
class MoistureTest {
  private static final List<Wanted.Moisture.Month> MONTHS =
      List.of(
          new Wanted.Moisture.Month("January", -1, 0.85),
          new Wanted.Moisture.Month("February", 0, 0.84),
          new Wanted.Moisture.Month("March", 4, 0.78),
          new Wanted.Moisture.Month("July", 21, 0.60),
          new Wanted.Moisture.Month("November", 5, 0.88),
          new Wanted.Moisture.Month("December", 1, 0.88));

  private static Wanted.Moisture monthly(OptionalDouble humidity, OptionalDouble excess) {
    return new Wanted.Moisture(
        List.of(), List.of(), MONTHS, humidity, excess, "class 3", MoistureLimits.MOULD);
  }

  private static Wanted.Moisture single() {
    return new Wanted.Moisture(
        List.of(),
        List.of(),
        List.of(),
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        "",
        MoistureLimits.MOULD);
  }

  private static Space indoors(OptionalDouble humidity) {
    return new Space(
        "indoors",
        20,
        humidity,
        Exposure.INSIDE,
        FilmRule.ISO_6946_INSIDE,
        FilmRule.ISO_13788_INSIDE,
        Optional.empty());
  }

  /** 300 mm of one material, 400 mm wide. */
  private static DrawnDetail wall(Space indoors, double conductivity) {
    return new DrawnDetail()
        .box(indoors, 0, -300, 400, 0)
        .box(material("brick", conductivity), 0, 0, 400, 300)
        .box(DrawnDetail.outdoors(-5), 0, 300, 400, 600);
  }

  private static double factor(double conductivity) {
    double r = 0.3 / conductivity;
    return (0.04 + r) / (0.29 + r);
  }

  private static SpaceMoisture only(Result result) {
    assertThat(result.moisture()).hasSize(1);
    return result.moisture().get(0);
  }

  /** Class 3, 20 °C indoors: February governs with 0.7727. */
  @Test
  void months_of_a_humidity_class() {
    DrawnDetail drawn =
        wall(indoors(OptionalDouble.empty()), 0.5)
            .want(monthly(OptionalDouble.empty(), OptionalDouble.of(810)));
    Result result = drawn.solve(1e-3);
    SpaceMoisture checked = only(result);
    double[] vapour = {1368.735, 1403.820, 1346.822, Double.NaN, 1435.491, 1424.068};
    double[] limit = {15.0592, 15.4532, 14.8087, Double.NaN, 15.8015, 15.6766};
    double[] required = {0.7647, 0.7727, 0.6755, Double.NaN, 0.7201, 0.7725};
    for (int m = 0; m < MONTHS.size(); m++) {
      SpaceMoisture.Month month = checked.months().get(m);
      assertThat(month.counts()).isEqualTo(m != 3);
      if (m == 3) {
        assertThat(month.required(MoistureLimits.MOULD)).isNaN();
        continue;
      }
      assertThat(month.vapourPa()).isCloseTo(vapour[m], within(1e-3));
      assertThat(month.mouldC()).isCloseTo(limit[m], within(1e-4));
      assertThat(month.requiredForMould()).isCloseTo(required[m], within(5.1e-5));
      assertThat(month.fRsi()).isCloseTo(factor(0.5), within(1e-6));
      assertThat(month.marginK(MoistureLimits.MOULD))
          .isCloseTo(
              (factor(0.5) - month.requiredForMould()) * (20 - month.outsideC()), within(1e-4));
    }
    assertThat(checked.critical()).hasValue(1);
    assertThat(checked.verdict(MoistureLimits.MOULD)).isEqualTo(Verdict.NOT_MET);
    assertThat(checked.verdict(MoistureLimits.CONDENSATION)).isEqualTo(Verdict.MET);
    assertThat(result.assumptions())
        .anyMatch(
            a -> a.what().equals("vapour pressure indoors") && a.value().contains("1.1 × 810"));
  }

  /** 50 % typed is 55 % month by month: limit 14.1 °C, f 0.7050 at 0 °C, 0.7192 at −1 °C. */
  @Test
  void a_fixed_humidity_gets_its_margin_in_the_monthly_procedure_only() {
    SpaceMoisture monthly =
        only(
            wall(indoors(OptionalDouble.of(0.5)), 0.5)
                .want(monthly(OptionalDouble.empty(), OptionalDouble.empty()))
                .solve(1e-3));
    double vapour = 0.55 * 2336.951;
    assertThat(monthly.months().get(0).vapourPa()).isCloseTo(vapour, within(1e-3));
    assertThat(monthly.critical()).hasValue(0);
    assertThat(monthly.humidity()).contains("5 % margin");
    SpaceMoisture asTyped =
        only(wall(indoors(OptionalDouble.of(0.5)), 0.5).want(single()).solve(1e-3));
    assertThat(asTyped.months()).hasSize(1);
    assertThat(asTyped.months().get(0).dewPointC()).isCloseTo(9.269, within(1e-3));
    assertThat(asTyped.months().get(0).requiredForMould()).isCloseTo(0.70498, within(1e-5));
    assertThat(asTyped.months().get(0).requiredForCondensation()).isCloseTo(0.57076, within(1e-5));
    assertThat(asTyped.humidity()).isEqualTo("50 % as typed");
    double surface = -5 + 25 * factor(0.5);
    assertThat(asTyped.months().get(0).surfaceHumidity())
        .isCloseTo(1168.476 / MoistureLimits.saturationPa(surface), within(1e-5));
  }

  /** A wall of λ 1.2: f 0.5370 lies below both limits, and so does all of its 400 mm of surface. */
  @Test
  void a_cold_surface_is_told_with_its_length() {
    SpaceMoisture checked =
        only(wall(indoors(OptionalDouble.of(0.5)), 1.2).want(single()).solve(1e-3));
    assertThat(factor(1.2)).isCloseTo(0.5370, within(1e-4));
    assertThat(checked.verdict(MoistureLimits.MOULD)).isEqualTo(Verdict.NOT_MET);
    assertThat(checked.verdict(MoistureLimits.CONDENSATION)).isEqualTo(Verdict.NOT_MET);
    assertThat(checked.months().get(0).surfaceHumidity()).isGreaterThan(1);
    SpaceMoisture.Surface surface = checked.surface().orElseThrow();
    assertThat(surface.lengthM()).isCloseTo(0.4, within(1e-9));
    assertThat(surface.belowMouldM()).isCloseTo(0.4, within(1e-9));
    assertThat(surface.belowDewPointM()).isCloseTo(0.4, within(1e-9));
  }

  /** Along a wall with a concrete post: counted in small steps on each side of the mesh. */
  @Test
  void the_length_below_a_limit_is_where_the_profile_lies_below_it() {
    Result result =
        new DrawnDetail()
            .box(indoors(OptionalDouble.of(0.5)), -800, -300, 800, 0)
            .box(material("brick", 0.5), -800, 0, 800, 300)
            .box(material("concrete", 2.3), -100, 0, 100, 300)
            .box(DrawnDetail.outdoors(-5), -800, 300, 800, 600)
            .want(single())
            .solve(1e-3);
    SpaceMoisture checked = only(result);
    SpaceMoisture.Surface surface = checked.surface().orElseThrow();
    double limit = checked.months().get(0).mouldC();
    double below = 0;
    int steps = 1000;
    for (int i = 2; i < surface.samples().size(); i += 2) {
      double start = surface.samples().get(i - 2).temperatureC();
      double middle = surface.samples().get(i - 1).temperatureC();
      double end = surface.samples().get(i).temperatureC();
      double length =
          surface.samples().get(i).distanceM() - surface.samples().get(i - 2).distanceM();
      for (int k = 0; k < steps; k++) {
        double t = (k + 0.5) / steps;
        double value =
            start * (1 - t) * (1 - 2 * t) + end * t * (2 * t - 1) + middle * 4 * t * (1 - t);
        below += value < limit ? length / steps : 0;
      }
    }
    assertThat(surface.lengthM()).isCloseTo(1.6, within(1e-9));
    assertThat(surface.belowMouldM()).isCloseTo(below, within(2e-3)).isBetween(0.2, 1.0);
    assertThat(surface.belowDewPointM()).isLessThan(surface.belowMouldM());
  }

  /** A month of a floating room: its temperature follows outdoors, by hand from the couplings. */
  @Test
  void floating_rooms_follow_the_month() {
    Space loft =
        DrawnDetail.floating(DrawnDetail.space("loft", 0, Exposure.INSIDE, 0.13), 0.5, "outdoors");
    DrawnDetail drawn =
        new DrawnDetail()
            .box(indoors(OptionalDouble.of(0.5)), 0, -300, 400, 0)
            .box(material("ceiling", 0.5), 0, 0, 400, 100)
            .box(loft, 0, 100, 400, 300)
            .know(DrawnDetail.outdoors(-5))
            .box(material("gable", 0.5), 400, 0, 700, 300)
            .box(DrawnDetail.outdoors(-5), 700, 0, 900, 300)
            .want(
                new Wanted.Moisture(
                    List.of("indoors"),
                    List.of(),
                    List.of(
                        new Wanted.Moisture.Month("A", -5, Double.NaN),
                        new Wanted.Moisture.Month("B", 5, Double.NaN)),
                    OptionalDouble.empty(),
                    OptionalDouble.empty(),
                    "",
                    MoistureLimits.CONDENSATION));
    SpaceMoisture checked = only(drawn.solve(1e-3));
    // linear in the outdoor temperature: all other temperatures follow it
    double f = checked.months().get(0).fRsi();
    assertThat(checked.months().get(1).fRsi()).isCloseTo(f, within(2e-3));
    assertThat(checked.months().get(1).surfaceC()).isCloseTo(20 - (1 - f) * 15, within(0.03));
  }

  @Test
  void what_cannot_be_judged_is_told() {
    DetailException unknown =
        catchThrowableOfType(
            DetailException.class,
            () -> wall(indoors(OptionalDouble.empty()), 0.5).want(single()).inspect());
    assertThat(unknown.faults()).anyMatch(f -> f.message().contains("humidity"));
    DetailException none =
        catchThrowableOfType(
            DetailException.class,
            () ->
                wall(indoors(OptionalDouble.empty()), 0.5)
                    .want(new Wanted.Requirement(Wanted.Requirement.Kind.F_RSI, "outdoors", 0.7))
                    .solve(1e-3));
    assertThat(none.faults().get(0).message()).contains("f_Rsi");
  }

  /** ψ and U are decided by their intervals, f_Rsi by the error of its temperature. */
  @Test
  void requirements() {
    DrawnDetail drawn = wall(indoors(OptionalDouble.of(0.5)), 0.5);
    drawn
        .want(
            new Wanted.Transmittance(
                "wall", List.of("indoors"), List.of("outdoors"), OptionalDouble.of(0.4)))
        .want(new Wanted.Requirement(Wanted.Requirement.Kind.F_RSI, "", 0.70))
        .want(new Wanted.Requirement(Wanted.Requirement.Kind.F_RSI, "indoors", factor(0.5)))
        .want(new Wanted.Requirement(Wanted.Requirement.Kind.F_RSI, "indoors", 0.75))
        .want(new Wanted.Requirement(Wanted.Requirement.Kind.U, "wall", 1.31))
        .want(new Wanted.Requirement(Wanted.Requirement.Kind.U, "wall", 1.29))
        .want(single())
        .want(new Wanted.Requirement(Wanted.Requirement.Kind.MOISTURE, "", Double.NaN));
    Result result = drawn.solve(1e-3);
    assertThat(factor(0.5)).isCloseTo(0.71910, within(1e-5));
    assertThat(1 / 0.77).isCloseTo(1.2987, within(1e-4));
    assertThat(result.requirements())
        .extracting(Result.Required::verdict)
        .containsExactly(
            Verdict.MET,
            Verdict.UNDECIDED,
            Verdict.NOT_MET,
            Verdict.MET,
            Verdict.NOT_MET,
            Verdict.MET);
  }
}
