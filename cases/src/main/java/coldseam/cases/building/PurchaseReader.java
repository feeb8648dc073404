package coldseam.cases.building;

import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.ledger.Fuel;
import coldseam.solver.ledger.Meters;
import coldseam.solver.ledger.Supply;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads {@code heating}, what a design buys, and {@code meters}, what a building has used. */
final class PurchaseReader {
  private static final List<String> FUEL_KEYS = List.of("unit", "heating-value", "efficiency");
  private static final List<String> HEATING_KEYS =
      List.of("fuel", "unit", "heating-value", "efficiency", "performance");
  private static final List<String> METER_KEYS =
      List.of(
          "electricity",
          "photovoltaics",
          "exported",
          "fuels",
          "heat",
          "ambient",
          "heat-pump",
          "drain");
  private static final List<String> USED_KEYS =
      List.of("used", "unit", "heating-value", "efficiency");
  private static final List<String> PUMP_KEYS = List.of("electricity", "performance");
  private static final List<String> BASES = List.of("gross", "net");

  private final OpenFile file;

  PurchaseReader(OpenFile file) {
    this.file = file;
  }

  Supply supply(OpenKeys building) {
    Supply heat = new Supply.Heat();
    Optional<OpenValue> value = building.value("heating");
    if (value.isEmpty()) {
      return heat;
    }
    OpenKeys keys = value.get().keys("`heating`", HEATING_KEYS);
    keys.refuseBoth("fuel", "performance", "a fuel is burnt, electricity lifts ambient heat");
    if (keys.has("performance")) {
      for (String key : FUEL_KEYS) {
        keys.refuseBoth("performance", key, "it belongs to a fuel");
      }
      double performance = keys.number("performance", Place.PERFORMANCE).getAsDouble();
      return Double.isNaN(performance) ? heat : new Supply.HeatPump(performance);
    }
    Optional<OpenValue> named =
        keys.require("fuel", "add `fuel: NAME`, or `performance: 3.2` of a heat pump");
    Optional<String> name = named.flatMap(text -> text.text("`fuel`"));
    Optional<Fuel> fuel = fuel(keys, name.orElse("fuel"));
    return fuel.isEmpty() ? heat : new Supply.Burnt(fuel.get());
  }

  /** A figure with the basis it refers to. */
  private record OnBasis(Fuel.Basis basis, double figure, OpenKeys keys) {}

  private Optional<Fuel> fuel(OpenKeys keys, String name) {
    Optional<OpenValue> unitValue = keys.require("unit", "add `unit: m3`, what it is bought in");
    Optional<String> unit = unitValue.flatMap(text -> text.text("`unit`"));
    Optional<OnBasis> heating =
        onBasis(keys, "heating-value", Place.HEATING_VALUE, Place.HEATING_VALUE, "10.9");
    Optional<OnBasis> efficiency =
        onBasis(keys, "efficiency", Place.GROSS_EFFICIENCY, Place.NET_EFFICIENCY, "88 %");
    if (unit.isEmpty() || heating.isEmpty() || efficiency.isEmpty()) {
      return Optional.empty();
    }
    Fuel.Basis basis = heating.get().basis();
    if (basis != efficiency.get().basis()) {
      String one = BASES.get(basis.ordinal());
      String other = BASES.get(efficiency.get().basis().ordinal());
      keys.wrong(
          "efficiency",
          "the heating value of `" + name + "` is " + one + ", the efficiency " + other,
          "give both on one basis: gross over net is about 1.11 for natural gas, 1.09 for propane,"
              + " 1.06 for heating oil, 1.08 for dry wood");
      return Optional.empty();
    }
    return Optional.of(
        new Fuel(name, unit.get(), heating.get().figure(), efficiency.get().figure(), basis));
  }

  private Optional<OnBasis> onBasis(
      OpenKeys keys, String key, Place gross, Place net, String example) {
    String right = "write `" + key + ": {gross: " + example + "}` or `{net: …}`";
    Optional<OpenValue> value = keys.require(key, right);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    if (!value.get().mapping()) {
      value
          .get()
          .wrong(
              "`" + key + "` does not say whether it is by the gross or the net heating value",
              right);
      return Optional.empty();
    }
    OpenKeys one = value.get().keys("`" + key + "` of " + keys.what(), BASES);
    if (one.refuseBoth("gross", "net", "give one of them")) {
      return Optional.empty();
    }
    for (Fuel.Basis basis : Fuel.Basis.values()) {
      String word = BASES.get(basis.ordinal());
      if (one.has(word)) {
        Place place = basis == Fuel.Basis.GROSS ? gross : net;
        double figure = one.number(word, place).getAsDouble();
        return Double.isNaN(figure)
            ? Optional.empty()
            : Optional.of(new OnBasis(basis, figure, one));
      }
    }
    if (!one.reported("gross") && !one.reported("net")) {
      value.get().wrong("`" + key + "` of " + keys.what() + " has neither gross nor net", right);
    }
    return Optional.empty();
  }

  Optional<Meters> meters(OpenKeys building) {
    Optional<OpenValue> value = building.value("meters");
    if (value.isEmpty()) {
      return Optional.empty();
    }
    int before = file.mistakes();
    OpenKeys keys = value.get().keys("`meters`", METER_KEYS);
    double electricity = keys.number("electricity", Place.ENERGY).orElse(0);
    double photovoltaics = keys.number("photovoltaics", Place.ENERGY).orElse(0);
    double exported = keys.number("exported", Place.ENERGY).orElse(0);
    double heat = keys.number("heat", Place.ENERGY).orElse(0);
    double drain = keys.number("drain", Place.ENERGY).orElse(0);
    keys.refuseBoth("ambient", "heat-pump", "give one of them");
    double ambient = keys.number("ambient", Place.ENERGY).orElse(0);
    if (keys.has("heat-pump")) {
      ambient = ambient(keys.value("heat-pump").get());
    }
    if (exported > photovoltaics + electricity) {
      keys.wrong(
          "exported",
          "more electricity is exported than comes in",
          "`photovoltaics` is all that is made, exported electricity included");
    }
    List<Meters.Burnt> fuels = fuels(keys);
    if (file.mistakes() > before) {
      return Optional.empty();
    }
    return Optional.of(
        new Meters(electricity, photovoltaics, exported, heat, ambient, drain, fuels));
  }

  private double ambient(OpenValue value) {
    OpenKeys pump = value.keys("`heat-pump`", PUMP_KEYS);
    double used = pump.number("electricity", Place.ENERGY, "add `electricity: …`, kWh it has used");
    double performance = pump.number("performance", Place.PERFORMANCE, "add `performance: 3.2`");
    file.assume(
        "electricity of the heat pump",
        "is part of the electricity by meter; its ambient heat is performance less 1 times it",
        "by convention of this tool");
    return used * (performance - 1);
  }

  private List<Meters.Burnt> fuels(OpenKeys keys) {
    List<Meters.Burnt> fuels = new ArrayList<>();
    if (!keys.has("fuels")) {
      return fuels;
    }
    for (OpenValue.Named named :
        keys.value("fuels").get().named("`fuels`", USED_KEYS, "a fuel", "natural gas")) {
      OpenKeys one = named.value().keys("fuel `" + named.name() + "`", USED_KEYS);
      double used = one.number("used", Place.FUEL_USED, "add `used: …`, units by meter");
      Optional<Fuel> fuel = fuel(one, named.name());
      if (fuel.isPresent()) {
        fuels.add(new Meters.Burnt(fuel.get(), used));
      }
    }
    return fuels;
  }
}
