package coldseam.cases.building;

import coldseam.cases.OpenFile;
import coldseam.cases.OpenKeys;
import coldseam.cases.OpenValue;
import coldseam.cases.Place;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Material;
import coldseam.solver.ledger.GroundFloor;
import coldseam.solver.ledger.Uncertain;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Reads the U of plane elements: typed, of layers, or of a slab on the ground by its clause. */
final class Transmittances {
  /** Keys of an element. */
  static final List<String> KEYS = List.of("area", "U", "layers", "heat-flow", "films", "to");

  /** Keys of a floor on the ground. */
  static final List<String> GROUND_KEYS = List.of("area", "U", "slab");

  private static final List<String> SLAB_KEYS =
      List.of("perimeter", "wall", "resistance", "layers", "ground");
  private static final List<String> DIRECTIONS = List.of("up", "horizontal", "down");
  private static final List<String> GROUNDS = List.of("clay", "sand", "rock");

  /** λ of clay or silt, sand or gravel, homogeneous rock (ISO 13370, from memory). */
  private static final double[] GROUND_W_PER_MK = {1.5, 2.0, 3.5};

  private final OpenFile file;

  Transmittances(OpenFile file) {
    this.file = file;
  }

  /** Resistance of layers with its ends by tolerances, m²·K/W. */
  private record Resistance(double value, double least, double most) {}

  /**
   * U of an element.
   *
   * @param keys of the element
   * @param inner whether it leads to an unheated room, with still air on both sides
   * @return U, or empty if a mistake was reported
   */
  Optional<Coefficient> of(OpenKeys keys, boolean inner) {
    keys.refuseBoth("U", "layers", "give one of them");
    if (!keys.has("layers")) {
      for (String key : List.of("heat-flow", "films")) {
        if (keys.has(key)) {
          keys.wrong(key, keys.what() + " has `" + key + "` but no `layers`", "leave it away");
        }
      }
      String example = "add `U: …` in W/(m2 K)" + (keys.has("to") ? "" : ", or `layers: …`");
      return keys.require("U", example).flatMap(value -> typed(value, keys));
    }
    Optional<Resistance> layers = layers(keys.value("layers").get());
    Optional<double[]> films = films(keys, inner);
    if (layers.isEmpty() || films.isEmpty()) {
      return Optional.empty();
    }
    double surfaces = films.get()[0] + films.get()[1];
    double u = 1 / (surfaces + layers.get().value());
    return Optional.of(
        new Coefficient.Known(
            new Uncertain(
                u,
                u,
                u,
                1 / (surfaces + layers.get().most()),
                1 / (surfaces + layers.get().least()),
                ""),
            "layers"));
  }

  private static Optional<Coefficient> typed(OpenValue value, OpenKeys keys) {
    return value
        .bracket("`U` of " + keys.what(), Place.TRANSMITTANCE)
        .map(u -> new Coefficient.Known(Uncertain.between(u.lower(), u.upper()), ""));
  }

  /** Rsi and Rse. */
  private Optional<double[]> films(OpenKeys keys, boolean inner) {
    if (keys.refuseBoth("heat-flow", "films", "give one of them")) {
      return Optional.empty();
    }
    if (keys.has("films")) {
      List<OpenValue> both =
          keys.value("films").get().items("`films` of " + keys.what(), "write `[0.13, 0.04]`");
      if (both.size() != 2) {
        keys.wrong("films", "`films` are two: inside, outside", "write `[0.13, 0.04]`");
        return Optional.empty();
      }
      double inside = both.get(0).number("the inner film", Place.FILM);
      double outside = both.get(1).number("the outer film", Place.FILM);
      return Double.isNaN(inside + outside)
          ? Optional.empty()
          : Optional.of(new double[] {inside, outside});
    }
    Optional<String> word = keys.word("heat-flow", DIRECTIONS);
    if (keys.has("heat-flow") && word.isEmpty()) {
      return Optional.empty();
    }
    FilmRule rule = FilmRule.ISO_6946_INSIDE;
    double inside =
        switch (word.orElse("horizontal")) {
          case "up" -> rule.upM2KPerW();
          case "down" -> rule.downM2KPerW();
          default -> rule.horizontalM2KPerW();
        };
    double outside = inner ? inside : FilmRule.ISO_6946_OUTSIDE.horizontalM2KPerW();
    file.assume(
        "films of " + keys.what(),
        figure(inside)
            + " and "
            + figure(outside)
            + " m²·K/W"
            + (word.isEmpty() ? ", heat flowing horizontally" : "")
            + (inner ? ", still air on both sides" : ""),
        "ISO 6946 conventional surface resistances");
    return Optional.of(new double[] {inside, outside});
  }

  private static String figure(double number) {
    return String.format(Locale.ROOT, "%.2f", number);
  }

  private Optional<Resistance> layers(OpenValue list) {
    double value = 0;
    double least = 0;
    double most = 0;
    boolean good = true;
    List<OpenValue> items = list.items("`layers`", "write `[[MATERIAL, THICKNESS], …]`");
    for (OpenValue item : items) {
      List<OpenValue> pair =
          item.items("a layer", "write `[MATERIAL, THICKNESS]`, e.g. `[EPS, 160 mm]`");
      if (pair.size() != 2) {
        if (!pair.isEmpty()) {
          item.wrong("a layer is a material and a thickness", "write `[MATERIAL, THICKNESS]`");
        }
        good = false;
        continue;
      }
      Optional<Material> material = file.material(pair.get(0));
      double thickness = pair.get(1).number("thickness of the layer", Place.THICKNESS);
      if (material.isEmpty() || Double.isNaN(thickness)) {
        good = false;
        continue;
      }
      Material solid = material.get();
      boolean plain = solid.conductivityWPerMK() == solid.crossConductivityWPerMK();
      if (!plain || solid.conductivityWPerMK() == 0) {
        pair.get(0)
            .wrong(
                "`"
                    + solid.name()
                    + (plain ? "` conducts nothing" : "` conducts differently along and across"),
                "give the element its `U`, or solve it as a case");
        good = false;
        continue;
      }
      double r = thickness / solid.conductivityWPerMK();
      value += r;
      least += r / (1 + solid.relativeTolerance());
      most += r / (1 - solid.relativeTolerance());
    }
    return good && !items.isEmpty()
        ? Optional.of(new Resistance(value, least, most))
        : Optional.empty();
  }

  /**
   * U of a floor with the ground below it.
   *
   * @param keys of the floor
   * @param area m²
   * @return U, or empty if a mistake was reported
   */
  Optional<Coefficient> ofGround(OpenKeys keys, double area) {
    keys.refuseBoth("U", "slab", "give one of them");
    if (!keys.has("slab")) {
      return keys.require("U", "add `U: …` with the ground, or `slab: …` for its clause")
          .flatMap(value -> typed(value, keys));
    }
    OpenKeys slab = keys.value("slab").get().keys("`slab` of " + keys.what(), SLAB_KEYS);
    double perimeter =
        slab.number("perimeter", Place.SIZE, "add `perimeter: …`, its exposed edge in m");
    double wall = slab.number("wall", Place.EXTENT, "add `wall: …`, thickness of the walls");
    slab.refuseBoth("resistance", "layers", "give one of them");
    Optional<Resistance> floor = floor(slab);
    double ground = ground(slab);
    if (floor.isEmpty() || Double.isNaN(perimeter + wall + ground + area)) {
      return Optional.empty();
    }
    if (area == 0) {
      keys.wrong("area", "`area` is 0", "give the area of the slab in m2");
      return Optional.empty();
    }
    GroundFloor middle = new GroundFloor(area, perimeter, wall, floor.get().value(), ground);
    double u = middle.transmittanceWPerM2K();
    double least =
        new GroundFloor(area, perimeter, wall, floor.get().most(), ground).transmittanceWPerM2K();
    double most =
        new GroundFloor(area, perimeter, wall, floor.get().least(), ground).transmittanceWPerM2K();
    file.assume(
        "U of " + keys.what(),
        String.format(
            Locale.ROOT,
            "%.4f W/(m²·K): B' %.3f m, d_t %.3f m",
            u,
            middle.characteristicM(),
            middle.equivalentThicknessM()),
        "ISO 13370:2017, slab on ground");
    return Optional.of(
        new Coefficient.Known(new Uncertain(u, u, u, least, most, ""), "slab on ground"));
  }

  private Optional<Resistance> floor(OpenKeys slab) {
    if (slab.has("layers")) {
      return layers(slab.value("layers").get());
    }
    Optional<OpenValue> typed =
        slab.require("resistance", "add `resistance: …` of the floor, or its `layers`");
    Optional<Bracket> ends =
        typed.flatMap(value -> value.bracket("`resistance` of the slab", Place.FILM));
    return ends.map(both -> new Resistance(both.mid(), both.lower(), both.upper()));
  }

  private double ground(OpenKeys slab) {
    Optional<OpenValue> value = slab.value("ground");
    boolean word = value.isPresent() && isWord(value.get());
    if (value.isPresent() && !word) {
      double typed = value.get().number("`ground` of the slab", Place.CONDUCTIVITY);
      if (typed == 0) {
        value.get().wrong("ground that conducts nothing is none", "e.g. `2.0`, or `sand`");
        return Double.NaN;
      }
      return typed;
    }
    int kind = word ? GROUNDS.indexOf(value.get().text("`ground`").orElseThrow()) : 1;
    file.assume(
        "ground",
        String.format(Locale.ROOT, "%s, %.1f W/(m·K)", GROUNDS.get(kind), GROUND_W_PER_MK[kind]),
        "ISO 13370, thermal properties of the ground (from memory)");
    return GROUND_W_PER_MK[kind];
  }

  private static boolean isWord(OpenValue value) {
    return !value.list() && !value.mapping() && GROUNDS.contains(value.text("`ground`").orElse(""));
  }
}
