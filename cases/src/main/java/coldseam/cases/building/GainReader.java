package coldseam.cases.building;

import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Gain;
import coldseam.solver.ledger.Utilisation;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads {@code gains} and {@code utilisation}. */
final class GainReader {
  private static final List<String> KEYS =
      List.of("floor-area", "capacity", "class", "method", "a0", "tau0");
  private static final List<String> METHODS = List.of("monthly", "seasonal");
  private static final List<String> CLASSES =
      List.of("very light", "light", "medium", "heavy", "very heavy");

  /** C over floor area of the classes, kJ/(m²·K) (ISO 13790:2008, table 12, from memory). */
  private static final double[] CAPACITIES = {80, 110, 165, 260, 370};

  private final OpenFile file;
  private final Optional<Climate> climate;

  GainReader(OpenFile file, Optional<Climate> climate) {
    this.file = file;
    this.climate = climate;
  }

  List<Gain> gains(OpenKeys building) {
    List<Gain> gains = new ArrayList<>();
    Optional<OpenValue> value = building.value("gains");
    if (value.isEmpty()) {
      return gains;
    }
    if (climate.isPresent() && climate.get().gainsInBase()) {
      building.wrong(
          "gains",
          "degree-days to a base of "
              + figure(climate.get().baseC().getAsDouble())
              + " °C, below the inside temperature of "
              + figure(climate.get().insideC())
              + " °C, already stand for gains: typed ones would be counted twice",
          "leave `gains` away, or use degree-days to a base equal to the inside temperature");
      return gains;
    }
    for (OpenValue.Named named : value.get().named("`gains`")) {
      List<Double> steps = steps(named);
      if (!steps.isEmpty()) {
        gains.add(new Gain(named.name(), steps));
      }
    }
    return gains;
  }

  private static String figure(double number) {
    return new BigDecimal(number).round(new MathContext(4)).stripTrailingZeros().toPlainString();
  }

  /** One figure for each month, or one for the period spread over its days. */
  private List<Double> steps(OpenValue.Named named) {
    String what = "gain `" + named.name() + "`";
    List<Double> steps = new ArrayList<>();
    if (climate.isEmpty()) {
      return steps;
    }
    List<Climate.Step> months = climate.get().steps();
    if (!named.value().list()) {
      double whole = named.value().number(what, Place.ENERGY);
      for (Climate.Step step : months) {
        steps.add(whole * step.days() / climate.get().days());
      }
      if (months.size() > 1) {
        file.assume(what, "spread evenly over the days of the period", "one figure was typed");
      }
      return Double.isNaN(whole) ? List.of() : steps;
    }
    List<OpenValue> items = named.value().items(what, "write one figure for each month");
    if (items.size() != months.size()) {
      named
          .value()
          .wrong(
              what + " has " + items.size() + " figures, the climate " + months.size() + " steps",
              "give one for each month in their order, or one for the whole period");
      return List.of();
    }
    boolean good = true;
    for (OpenValue item : items) {
      double one = item.number("a figure of " + what, Place.ENERGY);
      good &= !Double.isNaN(one);
      steps.add(one);
    }
    return good ? steps : List.of();
  }

  /** How gains are used; all of them where there are none or meters close the account. */
  Utilisation utilisation(OpenKeys building, boolean gains) {
    Utilisation all = new Utilisation.Stated(1);
    Optional<OpenValue> value = building.value("utilisation");
    boolean metered = building.has("meters");
    if (value.isEmpty()) {
      if (gains && !metered && !building.reported("utilisation")) {
        building.wrong(
            "gains",
            "`building` has gains but does not say how much of them is used",
            "add `utilisation: 0.95`, or `utilisation: {floor-area: …, class: medium}`");
      }
      return all;
    }
    if (metered) {
      building.wrong(
          "utilisation",
          "with `meters` gains that are not used are part of the remainder",
          "leave `utilisation` away");
      return all;
    }
    if (!value.get().mapping()) {
      double factor = value.get().number("`utilisation`", Place.PART);
      return Double.isNaN(factor) ? all : new Utilisation.Stated(factor);
    }
    return byTimeConstant(value.get().keys("`utilisation`", KEYS));
  }

  private Utilisation byTimeConstant(OpenKeys keys) {
    int before = file.mistakes();
    double area = keys.number("floor-area", Place.AREA, "add `floor-area: …`, heated, in m2");
    keys.refuseBoth("capacity", "class", "give one of them");
    double capacity = capacity(keys);
    boolean months = climate.isPresent() && climate.get().steps().size() > 1;
    Optional<String> method = keys.word("method", METHODS);
    boolean monthly = method.map(METHODS.get(0)::equals).orElse(months);
    double a0 =
        keys.number("a0", Place.EXPONENT)
            .orElse(
                monthly
                    ? Utilisation.ByTimeConstant.MONTHLY_A0
                    : Utilisation.ByTimeConstant.SEASONAL_A0);
    double tau0 =
        keys.number("tau0", Place.HOURS)
            .orElse(
                monthly
                    ? Utilisation.ByTimeConstant.MONTHLY_TAU0_H
                    : Utilisation.ByTimeConstant.SEASONAL_TAU0_H);
    if (area == 0) {
      keys.wrong("floor-area", "`floor-area` is 0", "give the heated floor area in m2");
    }
    if (file.mistakes() > before || Double.isNaN(area + capacity)) {
      return new Utilisation.Stated(1);
    }
    file.assume(
        "use of gains",
        "η = (1 − γ^a)/(1 − γ^(a+1)), a = a0 + τ/τ0 with a0 "
            + figure(a0)
            + ", τ0 "
            + figure(tau0)
            + " h"
            + (method.isEmpty() ? monthly ? ": months are given" : ": the period is one" : ""),
        "ISO 13790:2008, 12.2.1; ISO 52016-1, monthly method (from memory)");
    return new Utilisation.ByTimeConstant(area * capacity * 1000, a0, tau0);
  }

  private double capacity(OpenKeys keys) {
    if (keys.has("capacity")) {
      return keys.number("capacity", Place.CAPACITY).getAsDouble();
    }
    Optional<String> word = keys.word("class", CLASSES);
    if (word.isPresent()) {
      double capacity = CAPACITIES[CLASSES.indexOf(word.get())];
      file.assume(
          "heat capacity",
          figure(capacity) + " kJ/(m²·K) of floor area: class " + word.get(),
          "ISO 13790:2008, table 12 (from memory)");
      return capacity;
    }
    if (!keys.has("class") && !keys.reported("capacity") && !keys.reported("class")) {
      keys.wrong(
          "utilisation",
          "`utilisation` does not say how much heat the building holds",
          "add `capacity: 165`, kJ/(m2 K) of floor area, or `class: medium`");
    }
    return Double.NaN;
  }
}
