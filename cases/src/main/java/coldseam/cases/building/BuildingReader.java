package coldseam.cases.building;

import coldseam.cases.CaseException;
import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Gain;
import coldseam.solver.ledger.Meters;
import coldseam.solver.ledger.Supply;
import coldseam.solver.ledger.Utilisation;
import java.util.List;
import java.util.Optional;

/** Reads one building file. */
final class BuildingReader {
  private static final List<String> KEYS =
      List.of(
          "dimensions",
          "elements",
          "windows",
          "ground",
          "junctions",
          "points",
          "unheated",
          "air",
          "climate",
          "gains",
          "utilisation",
          "store",
          "heating",
          "meters");

  private final OpenFile file;

  BuildingReader(OpenFile file) {
    this.file = file;
  }

  Building read() throws CaseException {
    if (file.body().isEmpty()) {
      file.conclude();
    }
    OpenValue body = file.body().orElseThrow();
    OpenKeys keys = body.keys("`building`", KEYS);
    Optional<DimensionSystem> dimensions = dimensions(keys);
    Optional<Climate> climate = Optional.empty();
    Optional<OpenValue> climateValue =
        keys.require("climate", "add `climate: {inside: 20, outside: 4.2, days: 212}`");
    if (climateValue.isPresent()) {
      climate = new ClimateReader(file).read(climateValue.get());
    }
    EnvelopeReader envelope = new EnvelopeReader(file, dimensions, climate);
    envelope.read(keys);
    new AirReader(file, envelope).read(keys);
    GainReader gainReader = new GainReader(file, climate);
    List<Gain> gains = gainReader.gains(keys);
    Utilisation utilisation = gainReader.utilisation(keys, !gains.isEmpty());
    double store = keys.number("store", Place.SIGNED_ENERGY).orElse(0);
    PurchaseReader purchases = new PurchaseReader(file);
    keys.refuseBoth(
        "heating",
        "meters",
        "`heating` closes the account of a design, `meters` that of a building in use");
    Supply supply = purchases.supply(keys);
    Optional<Meters> meters = purchases.meters(keys);
    if (envelope.parts().isEmpty() && file.mistakes() == 0) {
      body.wrong("`building` has nothing that heat could pass", "add `elements:` with their areas");
    }
    file.conclude();
    conventions(envelope, store);
    return new Building(
        file.file(),
        file.title(),
        dimensions,
        new Draft(
            envelope.parts(),
            envelope.rooms(),
            climate.orElseThrow(),
            gains,
            utilisation,
            store,
            supply,
            meters),
        envelope.cases(),
        file.assumptions());
  }

  private Optional<DimensionSystem> dimensions(OpenKeys keys) {
    Optional<String> word = keys.word("dimensions", EnvelopeReader.SYSTEMS);
    if (word.isEmpty() && keys.has("junctions") && !keys.has("dimensions")) {
      if (!keys.reported("dimensions")) {
        keys.wrong(
            "junctions",
            "`building` has junctions but does not say how its areas are measured",
            "add `dimensions: external`, `internal` or `overall-internal`");
      }
    }
    return word.map(name -> DimensionSystem.values()[EnvelopeReader.SYSTEMS.indexOf(name)]);
  }

  private void conventions(EnvelopeReader envelope, double store) {
    file.assume(
        "sum of losses",
        "H_T = Σ A U + Σ l ψ + Σ χ, unheated rooms by b",
        "ISO 13789 (from memory)");
    if (envelope.onGround()) {
      file.assume(
          "ground",
          "driven by the annual mean temperature outdoors",
          "ISO 13370, annual means (from memory)");
    }
    if (store == 0) {
      file.assume("change of store", "0: the building ends the period as it began", "none stated");
    }
  }
}
