package coldseam.solver.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.ledger.Envelope.Kind;
import coldseam.solver.ledger.Envelope.Part;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * An invented house worked by hand from ISO 13789 and the monthly method of ISO 13790
 * (<em>computed</em>, outside this program); every figure to the digits it was worked to.
 */
class WorkedHouseTest {
  private static final double KWH = 0.0005;
  private static final Uncertain ONE = Uncertain.exact(1);

  private static Part part(Kind kind, String name, double amount, double coefficient) {
    return new Part(kind, name, amount, Uncertain.exact(coefficient), "", ONE, "");
  }

  static Envelope house() {
    List<Part> parts = new ArrayList<>();
    parts.add(part(Kind.ELEMENT, "wall", 142, 0.24));
    parts.add(part(Kind.ELEMENT, "roof", 86, 0.16));
    parts.add(part(Kind.WINDOW, "windows", 21, 1.25));
    parts.add(part(Kind.WINDOW, "door", 2.1, 1.6));
    parts.add(
        new Part(
            Kind.ELEMENT,
            "wall to the garage",
            18,
            Uncertain.exact(0.6),
            "garage",
            Uncertain.exact(0.5),
            ""));
    parts.add(part(Kind.GROUND, "floor", 82, 0.21));
    parts.add(part(Kind.JUNCTION, "slab edge", 38, 0.12));
    parts.add(part(Kind.JUNCTION, "balcony", 6.5, 0.48));
    parts.add(part(Kind.JUNCTION, "window surround", 74, 0.045));
    parts.add(part(Kind.JUNCTION, "eaves", 37, -0.03));
    parts.add(part(Kind.JUNCTION, "corners", 21.6, -0.06));
    parts.add(part(Kind.POINT, "fixings", 4, 0.02));
    parts.add(part(Kind.AIR, "air change", 232 * 0.45, 1200.0 / 3600));
    return new Envelope(parts);
  }

  static Climate winter() {
    OptionalDouble annual = OptionalDouble.of(9.4);
    return new Climate(
        20, List.of(Climate.step("period", 212, 20, 4.2, annual)), OptionalDouble.empty());
  }

  static List<Gain> gains() {
    return List.of(new Gain("sun", List.of(2350.0)), new Gain("people", List.of(1180.0)));
  }

  private static final Utilisation MONTHLY =
      new Utilisation.ByTimeConstant(165 * 45 * 3600.0, 1, 15);
  private static final Fuel GAS = new Fuel("gas", "m³", 10.9, 0.88, Fuel.Basis.GROSS);

  private static Ledger designed(Utilisation utilisation) {
    return Ledger.designed(house(), winter(), gains(), utilisation, 0, new Supply.Burnt(GAS));
  }

  private static double sum(Ledger ledger, Entry.Kind... kinds) {
    double sum = 0;
    for (Entry entry : ledger.entries()) {
      sum += List.of(kinds).contains(entry.kind()) ? entry.energyKWh().value() : 0;
    }
    return sum;
  }

  @Test
  void transmission_and_the_part_of_junctions() {
    Envelope house = house();
    assertThat(house.transmissionWPerK().value()).isCloseTo(108.754, within(1e-9));
    assertThat(house.bridgesWPerK().value()).isCloseTo(8.684, within(1e-9));
    assertThat(house.bridgeShare().value()).isCloseTo(0.0798, within(5e-5));
    assertThat(house.areaM2()).isCloseTo(351.1, within(1e-9));
    assertThat(house.meanDeltaUWPerM2K().value()).isCloseTo(0.02473, within(5e-6));
    assertThat(house.airWPerK().value()).isCloseTo(34.80, within(1e-9));
  }

  @Test
  void what_leaves() {
    Ledger ledger = designed(MONTHLY);
    assertThat(sum(ledger, Entry.Kind.ELEMENT, Entry.Kind.WINDOW))
        .isCloseTo(-6226.236, within(KWH));
    assertThat(sum(ledger, Entry.Kind.JUNCTION, Entry.Kind.POINT)).isCloseTo(-698.110, within(KWH));
    assertThat(sum(ledger, Entry.Kind.ROOM)).isCloseTo(-434.108, within(KWH));
    assertThat(sum(ledger, Entry.Kind.AIR)).isCloseTo(-2797.586, within(KWH));
    assertThat(sum(ledger, Entry.Kind.GROUND)).isCloseTo(-928.723, within(KWH));
    assertThat(((Ledger.Designed) ledger.outcome()).lossKWh().value())
        .isCloseTo(11084.764, within(KWH));
  }

  @Test
  void the_design_side() {
    Ledger ledger = designed(MONTHLY);
    Ledger.Designed outcome = (Ledger.Designed) ledger.outcome();
    GainUse.Step step = outcome.steps().get(0);
    assertThat(step.use().ratio()).isCloseTo(0.318455, within(5e-7));
    assertThat(step.conductanceWPerK()).isCloseTo(137.88666, within(5e-6));
    assertThat(step.use().timeConstantH()).isCloseTo(53.8486, within(5e-5));
    assertThat(step.use().exponent()).isCloseTo(4.589905, within(5e-7));
    assertThat(step.use().factor()).isCloseTo(0.996425, within(5e-7));
    assertThat(outcome.usedKWh().value()).isCloseTo(3517.381, within(KWH));
    assertThat(sum(ledger, Entry.Kind.UNUSED_GAIN)).isCloseTo(-12.619, within(KWH));
    assertThat(outcome.needKWh().value()).isCloseTo(7567.383, within(KWH));
    assertThat(outcome.boughtKWh().value()).isCloseTo(8599.299, within(KWH));
    assertThat(outcome.boughtKWh().value() / 10.9).isCloseTo(788.93, within(0.005));
    assertThat(sum(ledger, Entry.Kind.FLUE)).isCloseTo(-1031.915, within(2 * KWH));
    assertThat(ledger.relativeSum()).isCloseTo(0, within(1e-12));
  }

  @Test
  void with_the_seasonal_parameters_more_is_needed() {
    Ledger ledger = designed(new Utilisation.ByTimeConstant(165 * 45 * 3600.0, 0.8, 30));
    assertThat(((Ledger.Designed) ledger.outcome()).needKWh().value())
        .isCloseTo(7680.33, within(0.005));
  }

  @Test
  void the_metered_side() {
    Meters meters = new Meters(2450, 1310, 690, 0, 0, 640, List.of(new Meters.Burnt(GAS, 905)));
    Ledger ledger = Ledger.metered(house(), winter(), gains(), 0, meters);
    Ledger.Metered outcome = (Ledger.Metered) ledger.outcome();
    assertThat(sum(ledger, Entry.Kind.FUEL)).isCloseTo(9864.5, within(KWH));
    assertThat(sum(ledger, Entry.Kind.FLUE)).isCloseTo(-1183.740, within(KWH));
    assertThat(outcome.cameInKWh().value()).isCloseTo(17154.5, within(KWH));
    assertThat(outcome.wentOutKWh().value()).isCloseTo(13598.504, within(KWH));
    assertThat(outcome.remainderKWh().value()).isCloseTo(-3555.996, within(KWH));
    assertThat(outcome.share()).isCloseTo(0.207, within(5e-4));
    assertThat(ledger.relativeSum()).isCloseTo(0, within(1e-12));
  }
}
