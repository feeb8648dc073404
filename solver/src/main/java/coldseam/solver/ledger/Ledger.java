package coldseam.solver.ledger;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * A signed account of heat over the boundary of a building in a period. In positive, out negative;
 * it is never made with a sum that is not zero. Immutable.
 *
 * @param envelope what heat passes
 * @param climate what drives it
 * @param entries every item: what comes in, what leaves through the envelope, what leaves otherwise
 * @param outcome what closes the account
 */
public record Ledger(Envelope envelope, Climate climate, List<Entry> entries, Outcome outcome) {
  /** A sum farther from zero than this, over what came in, is a defect. */
  private static final double CLOSED = 1e-9;

  /** What closes the account. */
  public sealed interface Outcome {}

  /**
   * A design: what has to be bought.
   *
   * @param needKWh heat needed, kWh
   * @param lossKWh heat lost through the envelope and with air, kWh, positive
   * @param steps how gains are used, step by step; empty without gains
   * @param gainKWh gains, kWh
   * @param usedKWh gains used, kWh
   * @param supply what is bought
   * @param boughtKWh heat, fuel or electricity bought, kWh
   */
  public record Designed(
      Uncertain needKWh,
      Uncertain lossKWh,
      List<GainUse.Step> steps,
      double gainKWh,
      Uncertain usedKWh,
      Supply supply,
      Uncertain boughtKWh)
      implements Outcome {
    /** Copies the list. */
    public Designed {
      steps = List.copyOf(steps);
    }
  }

  /**
   * A building with meters: what the data does not explain.
   *
   * @param cameInKWh everything known that came in, kWh
   * @param wentOutKWh everything known that went out, kWh, positive
   * @param remainderKWh what closes the account, kWh: negative if it leaves by ways that the data
   *     does not explain, positive if the data lets more leave than came in
   */
  public record Metered(Uncertain cameInKWh, Uncertain wentOutKWh, Uncertain remainderKWh)
      implements Outcome {
    /** The remainder over what came in, its sign reversed: positive if unexplained heat leaves. */
    public double share() {
      return cameInKWh.value() == 0 ? 0 : -remainderKWh.value() / cameInKWh.value();
    }
  }

  /**
   * Checks that the account closes.
   *
   * @throws IllegalStateException if the sum is not zero
   */
  public Ledger {
    entries = ordered(entries);
    double sum = sumKWh(entries);
    if (!(Math.abs(sum) <= CLOSED * scale(entries))) {
      throw new IllegalStateException("the ledger does not close: " + sum + " kWh are left");
    }
  }

  /** What comes in, then what leaves through the envelope, then what leaves otherwise. */
  private static List<Entry> ordered(List<Entry> entries) {
    List<Entry> ordered = new ArrayList<>();
    for (int rank = 0; rank < 3; rank++) {
      for (Entry entry : entries) {
        if (rank(entry) == rank) {
          ordered.add(entry);
        }
      }
    }
    return List.copyOf(ordered);
  }

  private static int rank(Entry entry) {
    return entry.in() ? 0 : entry.envelope() ? 1 : 2;
  }

  /** The sum of all items, kWh: 0 to rounding. */
  public double sumKWh() {
    return sumKWh(entries);
  }

  /** The sum over what the signs of the items add up to: 0 to rounding. */
  public double relativeSum() {
    double scale = scale(entries);
    return scale == 0 ? 0 : sumKWh() / scale;
  }

  private static double sumKWh(List<Entry> entries) {
    double sum = 0;
    for (Entry entry : entries) {
      sum += entry.energyKWh().value();
    }
    return sum;
  }

  /** Half of what all items amount to without their signs: what comes in. */
  private static double scale(List<Entry> entries) {
    double sum = 0;
    for (Entry entry : entries) {
      sum += Math.abs(entry.energyKWh().value()) / 2;
    }
    return sum;
  }

  /**
   * The account of a design.
   *
   * @param envelope what heat passes
   * @param climate what drives it
   * @param gains what comes in unbought
   * @param utilisation how much of it is used
   * @param storeKWh what the building holds more at the end, kWh
   * @param supply what is bought
   * @return the account, closed by the purchase
   * @throws IllegalArgumentException if gains are given although the base of the degree-days stands
   *     for them, or a gain has not one figure for each step
   */
  public static Ledger designed(
      Envelope envelope,
      Climate climate,
      List<Gain> gains,
      Utilisation utilisation,
      double storeKWh,
      Supply supply) {
    requireGains(climate, gains);
    Losses losses = new Losses(envelope, climate);
    GainUse use = new GainUse(climate, gains, utilisation, storeKWh);
    List<Uncertain> lost = losses.perStep();
    List<Uncertain> all = new ArrayList<>(lost);
    all.add(envelope.transmissionWPerK().plus(envelope.airWPerK()));
    Uncertain need = Uncertain.through(all, ends -> use.of(ends).needKWh());
    Uncertain used = Uncertain.through(all, (ends, others) -> use.of(ends, others).usedKWh());
    Uncertain unused = Uncertain.through(all, (ends, others) -> use.of(ends, others).unusedKWh());
    List<Entry> entries = new ArrayList<>(entries(gains));
    List<Entry> bought = bought(need, supply);
    entries.addAll(bought);
    entries.addAll(losses.entries());
    if (unused.value() != 0 || unused.widestUpper() > 0) {
      entries.add(new Entry(Entry.Kind.UNUSED_GAIN, "gains not used", unused.times(-1)));
    }
    store(entries, storeKWh);
    double[] central = new double[all.size()];
    for (int i = 0; i < central.length; i++) {
      central[i] = all.get(i).value();
    }
    Uncertain loss = Uncertain.ZERO;
    for (Uncertain step : lost) {
      loss = loss.plus(step);
    }
    return new Ledger(
        envelope,
        climate,
        entries,
        new Designed(
            need,
            loss,
            gains.isEmpty() ? List.of() : use.of(central).steps(),
            use.gainKWh(),
            used,
            supply,
            bought.get(0).energyKWh()));
  }

  /** What is bought first, then what comes with it. */
  private static List<Entry> bought(Uncertain need, Supply supply) {
    if (supply instanceof Supply.Burnt burnt) {
      Fuel fuel = burnt.fuel();
      double perHeat = 1 / fuel.efficiency();
      return List.of(
          new Entry(Entry.Kind.FUEL, fuel.name(), need.times(perHeat)),
          new Entry(Entry.Kind.FLUE, "flue, " + fuel.name(), need.times(1 - perHeat)));
    }
    if (supply instanceof Supply.HeatPump pump) {
      double perHeat = 1 / pump.performance();
      Entry electricity =
          new Entry(Entry.Kind.ELECTRICITY, "electricity for heat", need.times(perHeat));
      return pump.performance() == 1
          ? List.of(electricity)
          : List.of(
              electricity, new Entry(Entry.Kind.AMBIENT, "ambient heat", need.times(1 - perHeat)));
    }
    return List.of(new Entry(Entry.Kind.HEAT, "heat bought", need));
  }

  /**
   * The account of a building with meters.
   *
   * @param envelope what heat passes
   * @param climate what drives it
   * @param gains what comes in unbought
   * @param storeKWh what the building holds more at the end, kWh
   * @param meters what went in and out
   * @return the account, closed by what the data does not explain
   * @throws IllegalArgumentException if gains are given although the base of the degree-days stands
   *     for them, or a gain has not one figure for each step
   */
  public static Ledger metered(
      Envelope envelope, Climate climate, List<Gain> gains, double storeKWh, Meters meters) {
    requireGains(climate, gains);
    List<Entry> entries = new ArrayList<>(entries(gains));
    entries.addAll(meters.entries());
    entries.addAll(new Losses(envelope, climate).entries());
    store(entries, storeKWh);
    Uncertain in = Uncertain.ZERO;
    Uncertain out = Uncertain.ZERO;
    for (Entry entry : entries) {
      if (entry.in()) {
        in = in.plus(entry.energyKWh());
      } else {
        out = out.plus(entry.energyKWh().times(-1));
      }
    }
    Uncertain remainder = out.plus(in.times(-1));
    entries.add(new Entry(Entry.Kind.REMAINDER, "not explained by the data", remainder));
    return new Ledger(envelope, climate, entries, new Metered(in, out, remainder));
  }

  private static void requireGains(Climate climate, List<Gain> gains) {
    if (climate.gainsInBase() && !gains.isEmpty()) {
      throw new IllegalArgumentException("the base of the degree-days stands for gains already");
    }
    for (Gain gain : gains) {
      if (gain.perStepKWh().size() != climate.steps().size()) {
        throw new IllegalArgumentException("a gain has one figure for each step");
      }
    }
  }

  private static List<Entry> entries(List<Gain> gains) {
    List<Entry> entries = new ArrayList<>();
    for (Gain gain : gains) {
      entries.add(new Entry(Entry.Kind.GAIN, gain.name(), Uncertain.exact(gain.sumKWh())));
    }
    return entries;
  }

  private static void store(List<Entry> entries, double storeKWh) {
    if (storeKWh != 0) {
      entries.add(new Entry(Entry.Kind.STORE, "change of store", Uncertain.exact(-storeKWh)));
    }
  }

  /** What leaves by difference of temperature. */
  private record Losses(Envelope envelope, Climate climate) {
    /** Positive, kWh. */
    List<Uncertain> perStep() {
      List<Uncertain> steps = new ArrayList<>();
      for (Climate.Step step : climate.steps()) {
        Uncertain sum = Uncertain.ZERO;
        for (Envelope.Part part : envelope.parts()) {
          sum = sum.plus(of(part, step));
        }
        steps.add(sum);
      }
      return steps;
    }

    private static Uncertain of(Envelope.Part part, Climate.Step step) {
      return part.conductanceWPerK()
          .times(part.ground() ? step.groundKiloKelvinHours() : step.outdoorKiloKelvinHours());
    }

    /** One item for each part, one for each unheated room. */
    List<Entry> entries() {
      List<Entry> entries = new ArrayList<>();
      for (Envelope.Part part : envelope.parts()) {
        if (part.room().isEmpty()) {
          entries.add(new Entry(kind(part), part.name(), out(part)));
        }
      }
      for (Map.Entry<String, List<Envelope.Part>> room : envelope.rooms().entrySet()) {
        Uncertain sum = Uncertain.ZERO;
        for (Envelope.Part part : room.getValue()) {
          sum = sum.plus(out(part));
        }
        entries.add(new Entry(Entry.Kind.ROOM, room.getKey(), sum));
      }
      return entries;
    }

    private Uncertain out(Envelope.Part part) {
      Uncertain sum = Uncertain.ZERO;
      for (Climate.Step step : climate.steps()) {
        sum = sum.plus(of(part, step));
      }
      return sum.times(-1);
    }

    private static Entry.Kind kind(Envelope.Part part) {
      return switch (part.kind()) {
        case ELEMENT -> Entry.Kind.ELEMENT;
        case WINDOW -> Entry.Kind.WINDOW;
        case JUNCTION -> Entry.Kind.JUNCTION;
        case POINT -> Entry.Kind.POINT;
        case GROUND -> Entry.Kind.GROUND;
        case AIR -> Entry.Kind.AIR;
        case LEAKAGE -> Entry.Kind.LEAKAGE;
      };
    }
  }
}
