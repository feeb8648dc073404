package coldseam.cases.building;

import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.ledger.Climate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code climate}: one mean temperature, degree-days, or months. */
final class ClimateReader {
  private static final List<String> KEYS =
      List.of("inside", "outside", "days", "degree-days", "base", "months", "annual-mean");
  private static final List<String> MONTH_KEYS = List.of("outside", "days");

  private final OpenFile file;

  ClimateReader(OpenFile file) {
    this.file = file;
  }

  /** The climate, or empty if a mistake was reported. */
  Optional<Climate> read(OpenValue value) {
    int before = file.mistakes();
    OpenKeys keys = value.keys("`climate`", KEYS);
    double inside = keys.number("inside", Place.TEMPERATURE, "add `inside: 20`, in °C");
    OptionalDouble annual = keys.number("annual-mean", Place.TEMPERATURE);
    keys.refuseBoth("outside", "degree-days", "give one of them");
    keys.refuseBoth("months", "outside", "each month has its own");
    keys.refuseBoth("months", "degree-days", "give one of them");
    keys.refuseBoth("months", "days", "each month has its own");
    List<Climate.Step> steps = new ArrayList<>();
    OptionalDouble base = OptionalDouble.empty();
    if (keys.has("months")) {
      months(keys, inside, annual, steps);
    } else if (keys.has("degree-days")) {
      double degreeDays = keys.number("degree-days", Place.DEGREE_DAYS).orElse(Double.NaN);
      base =
          OptionalDouble.of(
              keys.number(
                  "base",
                  Place.TEMPERATURE,
                  "add `base: 20`, the temperature up to which the degree-days were counted"));
      double days =
          keys.number("days", Place.DAYS, "add `days: …`, how long the period of these days is");
      steps.add(Climate.degreeDays(days, degreeDays, inside, annual));
    } else {
      double outside =
          keys.number(
              "outside",
              Place.TEMPERATURE,
              "add `outside: …`, the mean of the period, or `degree-days`, or `months`");
      double days = keys.number("days", Place.DAYS, "add `days: …`, how long the period is");
      steps.add(Climate.step("period", days, inside, outside, annual));
    }
    if (keys.has("base") && !keys.has("degree-days")) {
      keys.wrong("base", "`climate` has a `base` but no `degree-days`", "leave it away");
    }
    if (file.mistakes() > before) {
      return Optional.empty();
    }
    Climate climate = new Climate(inside, steps, base);
    if (climate.baseAboveInside()) {
      keys.wrong(
          "base",
          "the base of the degree-days lies above the inside temperature",
          "use degree-days to a base equal to it, or below it");
      return Optional.empty();
    }
    return Optional.of(climate);
  }

  private void months(
      OpenKeys keys, double inside, OptionalDouble annual, List<Climate.Step> steps) {
    for (OpenValue.Named month :
        keys.value("months").get().named("`months`", MONTH_KEYS, "a month", "January")) {
      OpenKeys one = month.value().keys("month `" + month.name() + "`", MONTH_KEYS);
      double outside =
          one.number("outside", Place.TEMPERATURE, "add `outside: …`, the mean of the month");
      double days = one.number("days", Place.DAYS, "add `days: 31`");
      steps.add(Climate.step(month.name(), days, inside, outside, annual));
    }
    if (steps.isEmpty() && keys.value("months").get().mapping()) {
      keys.wrong("months", "`months` names none", "write `{January: {outside: 1.2, days: 31}}`");
    }
  }
}
