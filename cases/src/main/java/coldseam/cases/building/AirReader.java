package coldseam.cases.building;

import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Uncertain;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Reads {@code air}: what is changed on purpose, and what leaks. */
final class AirReader {
  private static final List<String> KEYS =
      List.of("volume", "change", "flow", "recovery", "leakage");
  private static final List<String> LEAKAGE_KEYS = List.of("change", "n50", "e", "shielding");

  /** ρc of air over the seconds of an hour, W·h/(m³·K) (ISO 13789, from memory). */
  private static final double HEAT_OF_AIR = 1200.0 / 3600;

  /** How much of n50 leaks under ordinary wind. */
  private enum Shielding {
    NONE(0.10),
    MODERATE(0.07),
    HEAVY(0.04);

    private static final List<String> NAMES = List.of("none", "moderate", "heavy");

    private final double e;

    Shielding(double e) {
      this.e = e;
    }
  }

  private final OpenFile file;
  private final EnvelopeReader envelope;

  AirReader(OpenFile file, EnvelopeReader envelope) {
    this.file = file;
    this.envelope = envelope;
  }

  void read(OpenKeys building) {
    Optional<OpenValue> value = building.value("air");
    if (value.isEmpty()) {
      if (!building.reported("air")) {
        file.assume("air", "no air is changed: `air` is not given", "by convention of this tool");
      }
      return;
    }
    OpenKeys keys = value.get().keys("`air`", KEYS);
    keys.refuseBoth("change", "flow", "give one of them");
    boolean byVolume = keys.has("change") || keys.has("leakage");
    double volume =
        byVolume
            ? keys.number("volume", Place.VOLUME, "add `volume: …`, of the heated air in m3")
            : keys.number("volume", Place.VOLUME).orElse(0);
    double flow = keys.number("flow", Place.AIR_FLOW).orElse(0);
    if (keys.has("change")) {
      flow = volume * keys.number("change", Place.AIR_CHANGE).orElse(Double.NaN);
    }
    double recovery = keys.number("recovery", Place.PART).orElse(0);
    if (!byVolume && !keys.has("flow") && !keys.reported("change") && !keys.reported("flow")) {
      keys.wrong(
          "air", "`air` does not say how much", "add `change: 0.45`, per hour, or `flow: …`");
    }
    if (recovery > 0) {
      file.assume(
          "heat recovery",
          "takes its part off the air that is changed, not off leakage",
          "by convention of this tool");
    }
    add(Envelope.Kind.AIR, "air change", flow * (1 - recovery));
    if (keys.has("leakage")) {
      OpenValue leakage = keys.value("leakage").get();
      add(Envelope.Kind.LEAKAGE, "leakage", volume * leakage(leakage));
    }
    file.assume("heat of air", "1200 J/(m³·K)", "ISO 13789 (from memory)");
  }

  private void add(Envelope.Kind kind, String name, double flow) {
    if (flow > 0) {
      envelope.add(
          new Draft.Part(
              kind, name, flow, new Coefficient.Known(Uncertain.exact(HEAT_OF_AIR), ""), ""));
    }
  }

  /** Air changes per hour by leaks. */
  private double leakage(OpenValue value) {
    if (!value.mapping()) {
      return value.number("`leakage`", Place.AIR_CHANGE);
    }
    OpenKeys keys = value.keys("`leakage`", LEAKAGE_KEYS);
    keys.refuseBoth("change", "n50", "give one of them");
    keys.refuseBoth("e", "shielding", "give one of them");
    if (keys.has("change")) {
      return keys.number("change", Place.AIR_CHANGE).getAsDouble();
    }
    double n50 = keys.number("n50", Place.AIR_CHANGE, "add `n50: …`, per hour at 50 Pa");
    if (keys.has("e")) {
      return n50 * keys.number("e", Place.PART).getAsDouble();
    }
    Optional<String> word = keys.word("shielding", Shielding.NAMES);
    Shielding shielding =
        word.map(name -> Shielding.valueOf(name.toUpperCase(Locale.ROOT)))
            .orElse(Shielding.MODERATE);
    file.assume(
        "leakage",
        "n50 times e = "
            + String.format(Locale.ROOT, "%.2f", shielding.e)
            + ": several exposed façades, shielding "
            + Shielding.NAMES.get(shielding.ordinal()),
        "ISO 13789, shielding coefficients (from memory)");
    return n50 * shielding.e;
  }
}
