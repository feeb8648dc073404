package coldseam.cases.building;

import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Wanted;
import coldseam.solver.ledger.Climate;
import coldseam.solver.ledger.Envelope;
import coldseam.solver.ledger.Uncertain;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Reads everything heat passes by difference of temperature, but air. */
final class EnvelopeReader {
  /** Dimension systems as they are typed, in the order of {@link DimensionSystem}. */
  static final List<String> SYSTEMS = List.of("internal", "overall-internal", "external");

  private static final List<String> WINDOW_KEYS = List.of("area", "U", "to");
  private static final List<String> JUNCTION_KEYS =
      List.of("length", "psi", "dimensions", "case", "variant", "to");
  private static final List<String> POINT_KEYS = List.of("number", "chi", "to");
  private static final List<String> ROOM_KEYS = List.of("b", "temperature", "outside", "air");

  private final OpenFile file;
  private final Optional<DimensionSystem> dimensions;
  private final Optional<Climate> climate;
  private final Transmittances transmittances;
  private final List<Draft.Part> parts = new ArrayList<>();
  private final Map<String, Draft.Room> rooms = new LinkedHashMap<>();
  private final Set<String> roomNames = new HashSet<>();
  private final Set<String> used = new HashSet<>();
  private final List<Building.Part> cases = new ArrayList<>();
  private boolean ground;

  EnvelopeReader(OpenFile file, Optional<DimensionSystem> dimensions, Optional<Climate> climate) {
    this.file = file;
    this.dimensions = dimensions;
    this.climate = climate;
    transmittances = new Transmittances(file);
  }

  List<Draft.Part> parts() {
    return List.copyOf(parts);
  }

  Map<String, Draft.Room> rooms() {
    return rooms;
  }

  List<Building.Part> cases() {
    return cases;
  }

  /** Whether something lies on the ground. */
  boolean onGround() {
    return ground;
  }

  void add(Draft.Part part) {
    parts.add(part);
  }

  void read(OpenKeys keys) {
    if (keys.has("unheated")) {
      rooms(keys.value("unheated").get());
    }
    planes(keys, "elements", Envelope.Kind.ELEMENT, Transmittances.KEYS, "wall");
    planes(keys, "windows", Envelope.Kind.WINDOW, WINDOW_KEYS, "south");
    ground(keys);
    if (keys.has("junctions")) {
      junctions(keys.value("junctions").get());
    }
    if (keys.has("points")) {
      points(keys.value("points").get());
    }
    for (String room : roomNames) {
      if (!used.contains(room) && rooms.containsKey(room)) {
        keys.wrong(
            "unheated",
            "nothing leads to the unheated room `" + room + "`",
            "give an element `to: " + room + "`, or leave the room away");
      }
    }
  }

  private void rooms(OpenValue value) {
    for (OpenValue.Named named :
        value.named("`unheated`", ROOM_KEYS, "an unheated room", "garage")) {
      roomNames.add(named.name());
      String what = "unheated room `" + named.name() + "`";
      OpenKeys keys = named.value().keys(what, ROOM_KEYS);
      keys.refuseBoth("b", "temperature", "give one of them");
      keys.refuseBoth("b", "outside", "give one of them");
      keys.refuseBoth("temperature", "outside", "give one of them");
      if (keys.has("b")) {
        double b = keys.number("b", Place.WEIGHT).getAsDouble();
        rooms.put(named.name(), new Draft.Room.Stated(positive(keys, "b", b)));
      } else if (keys.has("temperature")) {
        rooms.put(named.name(), new Draft.Room.Stated(byTemperature(keys, what)));
      } else if (keys.has("outside")) {
        double outside = keys.number("outside", Place.HEAT_TRANSFER).getAsDouble();
        double air = keys.number("air", Place.HEAT_TRANSFER).orElse(0);
        rooms.put(named.name(), new Draft.Room.ByLoss(outside, air));
        file.assume(
            "b of " + what,
            "H_ue/(H_iu + H_ue), air change included on both sides",
            "ISO 13789 (from memory)");
      } else if (!keys.reported("b") && !keys.reported("temperature")) {
        named
            .key()
            .wrong(
                what + " does not say how cold it is",
                "add `b: 0.5`, `temperature: …`, or `outside: …`, what it loses in W/K");
      }
    }
  }

  private double positive(OpenKeys keys, String key, double b) {
    if (b < 0) {
      keys.wrong(key, "`b` is negative", "it is (θi − θu)/(θi − θe), mostly 0 to 1");
    }
    return b;
  }

  private double byTemperature(OpenKeys keys, String what) {
    double temperature = keys.number("temperature", Place.TEMPERATURE).getAsDouble();
    if (climate.isEmpty()) {
      return 1;
    }
    if (climate.get().baseC().isPresent()) {
      keys.wrong(
          "temperature",
          "with degree-days the temperature of " + what + " makes no b",
          "give `b`, or `outside`, what it loses in W/K");
      return 1;
    }
    double difference = climate.get().meanDifferenceK();
    double b = (climate.get().insideC() - temperature) / difference;
    if (!(b >= 0) || !Double.isFinite(b)) {
      keys.wrong(
          "temperature",
          what + " is warmer than the building",
          "give a temperature between outdoors and indoors, or `b`");
      return 1;
    }
    return b;
  }

  /** The room a part leads to; empty for outdoors. */
  private String room(OpenKeys keys) {
    Optional<OpenValue> value = keys.value("to");
    if (value.isEmpty()) {
      return "";
    }
    Optional<String> name = value.get().text("`to` of " + keys.what());
    if (name.isEmpty()) {
      return "";
    }
    if (!roomNames.contains(name.get())) {
      value
          .get()
          .wrong(
              "`" + name.get() + "` is no unheated room of this building",
              roomNames.isEmpty()
                  ? "add `unheated: {" + name.get() + ": {b: 0.5}}`"
                  : OpenKeys.suggestion(name.get(), roomNames));
    }
    used.add(name.get());
    return name.get();
  }

  private void planes(
      OpenKeys building, String key, Envelope.Kind kind, List<String> known, String example) {
    if (!building.has(key)) {
      return;
    }
    String one = kind == Envelope.Kind.WINDOW ? "a window" : "an element";
    for (OpenValue.Named named :
        building.value(key).get().named("`" + key + "`", known, one, example)) {
      OpenKeys keys =
          named
              .value()
              .keys(one.substring(one.indexOf(' ') + 1) + " `" + named.name() + "`", known);
      double area = keys.number("area", Place.AREA, "add `area: …`, in m2");
      String room = room(keys);
      Optional<Coefficient> u = transmittances.of(keys, !room.isEmpty());
      if (u.isPresent() && !Double.isNaN(area)) {
        parts.add(new Draft.Part(kind, named.name(), area, u.get(), room));
      }
    }
  }

  private void ground(OpenKeys building) {
    if (!building.has("ground")) {
      return;
    }
    if (climate.isPresent() && climate.get().steps().get(0).groundKelvinDays().isEmpty()) {
      building.wrong(
          "ground",
          "`ground` is driven by the annual mean temperature outdoors, which `climate` does not"
              + " give",
          "add `annual-mean: …` to `climate`");
    }
    for (OpenValue.Named named :
        building
            .value("ground")
            .get()
            .named("`ground`", Transmittances.GROUND_KEYS, "a floor on the ground", "floor")) {
      OpenKeys keys =
          named.value().keys("ground `" + named.name() + "`", Transmittances.GROUND_KEYS);
      double area = keys.number("area", Place.AREA, "add `area: …`, in m2");
      Optional<Coefficient> u = transmittances.ofGround(keys, area);
      if (u.isPresent() && !Double.isNaN(area)) {
        ground = true;
        parts.add(new Draft.Part(Envelope.Kind.GROUND, named.name(), area, u.get(), ""));
      }
    }
  }

  private void junctions(OpenValue value) {
    for (OpenValue.Named named : value.named("`junctions`", JUNCTION_KEYS, "a junction", "eaves")) {
      OpenKeys keys = named.value().keys("junction `" + named.name() + "`", JUNCTION_KEYS);
      double length = keys.number("length", Place.EXTENT, "add `length: …`, in m");
      String room = room(keys);
      Optional<Coefficient> psi = keys.has("case") ? solved(keys) : typed(keys);
      if (psi.isPresent() && !Double.isNaN(length)) {
        parts.add(new Draft.Part(Envelope.Kind.JUNCTION, named.name(), length, psi.get(), room));
      }
    }
  }

  private Optional<Coefficient> typed(OpenKeys keys) {
    if (keys.has("variant")) {
      keys.wrong("variant", keys.what() + " has a `variant` but no `case`", "add `case: FILE`");
    }
    Optional<OpenValue> psi =
        keys.require("psi", "add `psi: …`, or `case: FILE, psi: NAME` of a case");
    Optional<Bracket> number =
        psi.flatMap(one -> one.bracket("`psi` of " + keys.what(), Place.LINEAR_TRANSMITTANCE));
    Optional<OpenValue> stated =
        keys.require(
            "dimensions",
            "a ψ means nothing without its dimension system: add `dimensions: external`, `internal`"
                + " or `overall-internal`");
    Optional<String> system = keys.word("dimensions", SYSTEMS);
    if (system.isPresent() && stated.isPresent()) {
      refuseMixed(stated.get(), SYSTEMS.indexOf(system.get()), keys.what());
    }
    return number.map(
        one -> new Coefficient.Known(Uncertain.between(one.lower(), one.upper()), ""));
  }

  private void refuseMixed(OpenValue at, int system, String what) {
    if (dimensions.isPresent() && dimensions.get().ordinal() != system) {
      String areas = SYSTEMS.get(dimensions.get().ordinal());
      at.wrong(
          "the ψ of "
              + what
              + " is by "
              + SYSTEMS.get(system)
              + " dimensions, the areas of the building by "
              + areas
              + " ones: their sum would be wrong",
          "use a ψ by " + areas + " dimensions");
    }
  }

  private Optional<Coefficient> solved(OpenKeys keys) {
    Optional<OpenValue> psi = keys.require("psi", "add `psi: NAME`, the name of a ψ of the case");
    keys.refuseBoth("case", "dimensions", "the case says how its ψ is measured");
    Optional<OpenFile.Source> source = file.source(keys);
    if (psi.isEmpty() || source.isEmpty()) {
      return Optional.empty();
    }
    Optional<String> name = psi.get().text("`psi` of " + keys.what());
    List<String> known = new ArrayList<>();
    for (Wanted wanted : source.get().detail().wanted()) {
      if (wanted instanceof Wanted.Psi one) {
        known.add(one.name());
        if (name.isPresent() && one.name().equals(name.get())) {
          refuseMixed(psi.get(), one.dimensions().ordinal(), keys.what());
          return Optional.of(
              new Coefficient.Solved(
                  part(source.get()),
                  one.name(),
                  source.get().words() + ": " + one.name(),
                  psi.get()));
        }
      }
    }
    if (name.isPresent()) {
      psi.get()
          .wrong(
              "the case `" + source.get().words() + "` has no ψ `" + name.get() + "`",
              known.isEmpty()
                  ? "give it `psi: {NAME: {between: [warm, cold], dimensions: …}}`"
                  : OpenKeys.suggestion(name.get(), known));
    }
    return Optional.empty();
  }

  private int part(OpenFile.Source source) {
    for (int i = 0; i < cases.size(); i++) {
      if (cases.get(i).from() == source.from() && cases.get(i).variant().equals(source.variant())) {
        return i;
      }
    }
    cases.add(new Building.Part(source.words(), source.from(), source.variant()));
    return cases.size() - 1;
  }

  private void points(OpenValue value) {
    for (OpenValue.Named named : value.named("`points`", POINT_KEYS, "a point bridge", "fixings")) {
      OpenKeys keys = named.value().keys("points `" + named.name() + "`", POINT_KEYS);
      double number = keys.number("number", Place.NUMBER, "add `number: …`, how many there are");
      String room = room(keys);
      Optional<Bracket> chi =
          keys.require("chi", "add `chi: …`, χ of one in W/K")
              .flatMap(one -> one.bracket("`chi` of " + keys.what(), Place.POINT_TRANSMITTANCE));
      if (chi.isPresent() && !Double.isNaN(number)) {
        Uncertain one = Uncertain.between(chi.get().lower(), chi.get().upper());
        parts.add(
            new Draft.Part(
                Envelope.Kind.POINT, named.name(), number, new Coefficient.Known(one, ""), room));
      }
    }
  }
}
