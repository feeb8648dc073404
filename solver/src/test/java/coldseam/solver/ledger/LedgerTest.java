package coldseam.solver.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.ledger.Envelope.Kind;
import coldseam.solver.ledger.Envelope.Part;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What holds of every ledger. */
class LedgerTest {
  private static final long SEED = 20250401;

  /** Closed form with a = 4, worked by hand as a ratio of polynomials (<em>computed</em>). */
  @ParameterizedTest
  @CsvSource({"0.5, 0.967742", "0.9, 0.839784", "1, 0.8", "1.5, 0.616114"})
  void use_of_gains(double gamma, double eta) {
    assertThat(Utilisation.factor(gamma, 4)).isCloseTo(eta, within(5e-7));
  }

  @Test
  void use_of_gains_at_its_edges() {
    assertThat(Utilisation.factor(0, 4)).isEqualTo(1);
    assertThat(Utilisation.factor(-2, 4)).isEqualTo(-0.5);
    assertThat(Utilisation.factor(1 + 1e-13, 4)).isCloseTo(0.8, within(1e-9));
    assertThat(Utilisation.factor(1e200, 40)).isCloseTo(1e-200, within(1e-212));
  }

  private static Uncertain random(Random random, double least, double most) {
    double value = least + random.nextDouble() * (most - least);
    double half = random.nextBoolean() ? 0 : 0.2 * Math.abs(value) * random.nextDouble();
    double tolerance = random.nextBoolean() ? 0 : 0.2 * Math.abs(value) * random.nextDouble();
    Certificate certificate = new Certificate.Certified(value - half, value + half);
    return Uncertain.of(new Quantity(value, certificate), tolerance);
  }

  private static Envelope envelope(Random random) {
    List<Part> parts = new ArrayList<>();
    for (Kind kind : Kind.values()) {
      int count = 1 + random.nextInt(3);
      for (int i = 0; i < count; i++) {
        boolean inRoom = !kind.equals(Kind.GROUND) && random.nextInt(4) == 0;
        double least = kind == Kind.JUNCTION ? -0.2 : 0.02;
        parts.add(
            new Part(
                kind,
                kind + " " + i,
                100 * random.nextDouble(),
                random(random, least, 1.5),
                inRoom ? "room " + random.nextInt(2) : "",
                inRoom ? random(random, 0.1, 0.8) : Uncertain.exact(1),
                ""));
      }
    }
    return new Envelope(parts);
  }

  private static Climate climate(Random random) {
    List<Climate.Step> steps = new ArrayList<>();
    int months = 1 + random.nextInt(12);
    for (int i = 0; i < months; i++) {
      // Some months are warmer outside than inside.
      double outside = -15 + 40 * random.nextDouble();
      steps.add(Climate.step("month " + i, 30, 20, outside, OptionalDouble.of(9)));
    }
    return new Climate(20, steps, OptionalDouble.empty());
  }

  private static List<Gain> gains(Random random, Climate climate) {
    List<Gain> gains = new ArrayList<>();
    for (int g = random.nextInt(3); g > 0; g--) {
      List<Double> perStep = new ArrayList<>();
      for (int i = 0; i < climate.steps().size(); i++) {
        perStep.add(3000 * random.nextDouble());
      }
      gains.add(new Gain("gain " + g, perStep));
    }
    return gains;
  }

  private static Utilisation utilisation(Random random) {
    return random.nextBoolean()
        ? new Utilisation.Stated(random.nextDouble())
        : new Utilisation.ByTimeConstant(1e7 + 1e8 * random.nextDouble(), 1, 15);
  }

  private static Supply supply(Random random) {
    return switch (random.nextInt(3)) {
      case 0 -> new Supply.Heat();
      case 1 ->
          new Supply.Burnt(
              new Fuel("oil", "l", 10, 0.5 + 0.6 * random.nextDouble(), Fuel.Basis.NET));
      default -> new Supply.HeatPump(1 + 3 * random.nextDouble());
    };
  }

  /** Closed relative to what comes in, whatever is typed; added up here independently. */
  @Test
  void every_ledger_closes() {
    Random random = new Random(SEED);
    int withUnused = 0;
    for (int i = 0; i < 2000; i++) {
      Envelope envelope = envelope(random);
      Climate climate = climate(random);
      List<Gain> gains = gains(random, climate);
      double store = random.nextInt(3) == 0 ? 4000 * (random.nextDouble() - 0.5) : 0;
      Meters meters =
          new Meters(
              5000 * random.nextDouble(),
              2000 * random.nextDouble(),
              500 * random.nextDouble(),
              random.nextInt(2) * 3000,
              random.nextInt(2) * 2000,
              700 * random.nextDouble(),
              List.of(
                  new Meters.Burnt(
                      new Fuel("gas", "m³", 10.9, 0.9, Fuel.Basis.GROSS),
                      1000 * random.nextDouble())));
      Ledger designed =
          Ledger.designed(envelope, climate, gains, utilisation(random), store, supply(random));
      for (Ledger ledger :
          List.of(designed, Ledger.metered(envelope, climate, gains, store, meters))) {
        double in = 0;
        double out = 0;
        for (Entry entry : ledger.entries()) {
          double energy = entry.energyKWh().value();
          in += Math.max(0, energy);
          out += Math.max(0, -energy);
        }
        assertThat(in - out).isCloseTo(0, within(1e-9 * in));
        assertThat(in).isPositive();
      }
      Ledger.Designed outcome = (Ledger.Designed) designed.outcome();
      assertThat(outcome.needKWh().value()).isNotNegative();
      withUnused += outcome.usedKWh().value() < outcome.gainKWh() ? 1 : 0;
    }
    assertThat(withUnused).isGreaterThan(500);
  }

  /** Whatever building has its figures within their intervals, every item lies within its own. */
  @Test
  void everything_lies_within_its_interval() {
    Random random = new Random(SEED + 1);
    int wide = 0;
    for (int i = 0; i < 300; i++) {
      Envelope envelope = envelope(random);
      Climate climate = climate(random);
      List<Gain> gains = gains(random, climate);
      Utilisation utilisation = utilisation(random);
      Supply supply = supply(random);
      Ledger ledger = Ledger.designed(envelope, climate, gains, utilisation, 0, supply);
      Uncertain need = ((Ledger.Designed) ledger.outcome()).needKWh();
      Uncertain bought = ((Ledger.Designed) ledger.outcome()).boughtKWh();
      for (int k = 0; k < 20; k++) {
        List<Part> moved = new ArrayList<>();
        for (Part part : envelope.parts()) {
          moved.add(
              new Part(
                  part.kind(),
                  part.name(),
                  part.amount(),
                  chosen(random, part.coefficient()),
                  part.room(),
                  chosen(random, part.b()),
                  ""));
        }
        Ledger other = Ledger.designed(new Envelope(moved), climate, gains, utilisation, 0, supply);
        double rounding = 1e-9 * (1 + need.widestUpper());
        assertThat(((Ledger.Designed) other.outcome()).needKWh().value())
            .isBetween(need.widestLower() - rounding, need.widestUpper() + rounding);
        assertThat(((Ledger.Designed) other.outcome()).boughtKWh().value())
            .isBetween(bought.widestLower() - rounding, bought.widestUpper() + rounding);
        for (Entry entry : ledger.entries()) {
          for (Entry moving : other.entries()) {
            if (moving.kind() == entry.kind() && moving.name().equals(entry.name())) {
              Uncertain interval = entry.energyKWh();
              assertThat(moving.energyKWh().value())
                  .as(entry.name())
                  .isBetween(interval.widestLower() - rounding, interval.widestUpper() + rounding);
            }
          }
        }
      }
      wide += need.tolerance() > 0 ? 1 : 0;
    }
    assertThat(wide).isGreaterThan(100);
  }

  private static Uncertain chosen(Random random, Uncertain number) {
    double part = random.nextInt(3) / 2.0;
    return Uncertain.exact(
        number.widestLower() + part * (number.widestUpper() - number.widestLower()));
  }

  @Test
  void a_share_of_junctions_lies_within_its_ends_for_either_sign() {
    for (double psi : new double[] {0.1, -0.1}) {
      Envelope envelope =
          new Envelope(
              List.of(
                  new Part(
                      Kind.ELEMENT,
                      "wall",
                      100,
                      Uncertain.between(0.2, 0.4),
                      "",
                      Uncertain.exact(1),
                      ""),
                  new Part(
                      Kind.JUNCTION,
                      "edge",
                      50,
                      Uncertain.exact(psi),
                      "",
                      Uncertain.exact(1),
                      "")));
      Uncertain share = envelope.bridgeShare();
      // 50 psi / (50 psi + 100 U) at both ends of U.
      double one = 50 * psi / (50 * psi + 20);
      double other = 50 * psi / (50 * psi + 40);
      assertThat(share.lower()).isCloseTo(Math.min(one, other), within(1e-12));
      assertThat(share.upper()).isCloseTo(Math.max(one, other), within(1e-12));
    }
  }

  @Test
  void a_base_below_the_inside_temperature_stands_for_gains() {
    Climate climate =
        new Climate(
            20,
            List.of(Climate.degreeDays(212, 2500, 20, OptionalDouble.of(9))),
            OptionalDouble.of(15.5));
    List<Gain> gains = List.of(new Gain("sun", List.of(100.0)));
    assertThatThrownBy(
            () ->
                Ledger.designed(
                    WorkedHouseTest.house(),
                    climate,
                    gains,
                    new Utilisation.Stated(1),
                    0,
                    new Supply.Heat()))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("stands for gains");
  }

  /** 24 h · 137.55 W/K · 3350 K·d, ground by 10.6 K · 212 d: worked by hand. */
  @Test
  void degree_days() {
    Climate climate =
        new Climate(
            20,
            List.of(Climate.degreeDays(212, 3349.6, 20, OptionalDouble.of(9.4))),
            OptionalDouble.of(20));
    Ledger ledger =
        Ledger.designed(
            WorkedHouseTest.house(),
            climate,
            List.of(),
            new Utilisation.Stated(1),
            0,
            new Supply.Heat());
    // 3349.6 K·d are 15.8 K over 212 days, so that the losses are those of the mean temperatures.
    assertThat(((Ledger.Designed) ledger.outcome()).needKWh().value())
        .isCloseTo(11084.764, within(0.0005));
  }

  @Test
  void a_ledger_that_does_not_close_is_refused() {
    List<Entry> entries =
        List.of(
            new Entry(Entry.Kind.GAIN, "sun", Uncertain.exact(1000)),
            new Entry(Entry.Kind.AIR, "air", Uncertain.exact(-999.9)));
    Envelope nothing = new Envelope(List.of());
    assertThatThrownBy(
            () ->
                new Ledger(
                    nothing,
                    WorkedHouseTest.winter(),
                    entries,
                    new Ledger.Metered(Uncertain.ZERO, Uncertain.ZERO, Uncertain.ZERO)))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("does not close");
  }
}
