package coldseam.cases;

import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code spaces}; stretches with a temperature of their own add to them. */
final class SpaceReader {
  static final List<String> KEYS = List.of("temperature", "exposure", "humidity", "film", "floats");
  static final List<String> EXPOSURES = List.of("inside", "outside");
  private static final List<String> FLOATS_KEYS = List.of("conductance", "to");

  private final Pass pass;
  private final Problems problems;
  private final FilmReader films;
  private final Map<String, Optional<Space>> spaces = new LinkedHashMap<>();
  private double coldest = Double.POSITIVE_INFINITY;

  SpaceReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
    this.films = new FilmReader(pass);
  }

  /**
   * Reads the spaces.
   *
   * @param node the mapping
   * @param materials names that are taken by materials
   */
  void read(Node node, Map<String, ?> materials) {
    List<Node.Entry> entries = Fields.named(problems, "`spaces`", node);
    if (entries.isEmpty() && problems.none()) {
      problems.add(node, "there is no space", "add `indoors` and `outdoors`, say");
    }
    Map<String, Fields> opened = new LinkedHashMap<>();
    Map<String, Double> temperatures = new LinkedHashMap<>();
    for (Node.Entry entry : entries) {
      String name = entry.key().text();
      pass.place("space", name, entry.key());
      checkName(entry.key(), materials);
      Fields fields =
          new Fields(problems, "space `" + Node.shortened(name) + "`", entry.value(), KEYS);
      double temperature = temperature(fields);
      opened.put(name, fields);
      temperatures.put(name, temperature);
      coldest = Math.min(coldest, Double.isNaN(temperature) ? coldest : temperature);
      spaces.put(name, Optional.empty());
    }
    boolean allFloat = !opened.isEmpty();
    for (Map.Entry<String, Fields> entry : opened.entrySet()) {
      Fields fields = entry.getValue();
      allFloat &= fields.has("floats") && !fields.has("temperature");
      spaces.put(entry.getKey(), space(entry.getKey(), fields, temperatures.get(entry.getKey())));
    }
    if (allFloat) {
      problems.add(node, "every space floats", "give one space at least a temperature");
    }
  }

  private void checkName(Node.Scalar key, Map<String, ?> materials) {
    if (key.text().equals(Fills.HOLLOW)) {
      problems.add(key, "`hollow` cannot name a space", "choose another name");
    } else if (materials.containsKey(key.text())) {
      problems.add(
          key,
          "`" + Node.shortened(key.text()) + "` names a material as well as a space",
          "choose another name for one of them");
    }
  }

  /** Names with their spaces; a space with a mistake is empty. */
  Map<String, Optional<Space>> spaces() {
    return spaces;
  }

  /** Every space without a mistake, in order. */
  List<Space> good() {
    List<Space> good = new ArrayList<>();
    for (Optional<Space> space : spaces.values()) {
      if (space.isPresent()) {
        good.add(space.get());
      }
    }
    return good;
  }

  FilmReader films() {
    return films;
  }

  /** Reports a name that is no space. */
  void reportUnknown(Node node, String name) {
    problems.add(
        node,
        "`" + Node.shortened(name) + "` is no space of this case",
        Problems.suggestion(name, spaces.keySet()));
  }

  /**
   * Adds the space of a stretch with a temperature of its own.
   *
   * @param name the stretch
   * @param temperatureC its temperature
   * @param own its films, the surface's temperature fixed where nothing is said
   */
  void addOfStretch(String name, double temperatureC, FilmReader.Films own) {
    coldest = Math.min(coldest, temperatureC);
    FilmRule fixed = FilmRule.FIXED_TEMPERATURE;
    spaces.put(
        name,
        Optional.of(
            new Space(
                name,
                temperatureC,
                OptionalDouble.empty(),
                assumedExposure(name, temperatureC),
                own.heatLoss().orElse(own.surface().orElse(fixed)),
                own.surface().orElse(own.heatLoss().orElse(fixed)),
                Optional.empty())));
  }

  private Exposure assumedExposure(String name, double temperatureC) {
    Exposure exposure = temperatureC <= coldest ? Exposure.OUTSIDE : Exposure.INSIDE;
    String word = exposure == Exposure.OUTSIDE ? "outside" : "inside";
    pass.assume(
        "exposure of " + name,
        word + " (films are typed)",
        "by convention of this tool: outside if no space is colder");
    return exposure;
  }

  private double temperature(Fields fields) {
    if (fields.has("floats")) {
      fields.refuseBoth("floats", "temperature", "the temperature of a floating space is a result");
      if (!fields.has("temperature")) {
        return Double.NaN;
      }
    }
    Optional<Node> node = fields.require("temperature", "add `temperature: 20`, in °C");
    return node.isEmpty()
        ? Double.NaN
        : pass.quantities()
            .read(node.get(), "`temperature` of " + fields.what(), Place.TEMPERATURE);
  }

  private Optional<Space> space(String name, Fields fields, double temperature) {
    int before = problems.count();
    Optional<Exposure> exposure = exposure(fields);
    OptionalDouble humidity = humidity(fields);
    Optional<Space.Floating> floating = floating(name, fields);
    FilmReader.Films own =
        fields.has("film")
            ? films.read(fields.get("film").get(), fields.what(), exposure)
            : FilmReader.Films.NONE;
    boolean enough =
        exposure.isPresent() || (own.heatLoss().isPresent() && own.surface().isPresent());
    if (problems.count() == before && !enough && !fields.reported("exposure")) {
      problems.add(
          fields.node(),
          fields.what() + " has no `exposure`, which decides its films",
          "add `exposure: inside` or `exposure: outside`");
    }
    boolean noTemperature = Double.isNaN(temperature) && floating.isEmpty();
    if (problems.count() > before || noTemperature || !enough) {
      return Optional.empty();
    }
    Exposure side = exposure.isPresent() ? exposure.get() : assumedExposure(name, temperature);
    if (own.surface().isPresent() && isAshrae(own.surface().get())) {
      assumeAshraeSurface(name);
    }
    FilmReader.Films iso = FilmReader.iso(side);
    return Optional.of(
        new Space(
            name,
            temperature,
            humidity,
            side,
            own.heatLoss().orElse(iso.heatLoss().get()),
            own.surface().orElse(iso.surface().get()),
            floating));
  }

  private OptionalDouble humidity(Fields fields) {
    Optional<Node> node = fields.get("humidity");
    if (node.isEmpty()) {
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(
        pass.quantities().read(node.get(), "`humidity` of " + fields.what(), Place.HUMIDITY));
  }

  private static boolean isAshrae(FilmRule rule) {
    return rule == FilmReader.ASHRAE_INSIDE || rule == FilmReader.ASHRAE_OUTSIDE;
  }

  private void assumeAshraeSurface(String name) {
    pass.assume(
        "films of " + name + " for surface temperatures",
        "the same as for heat loss",
        "by convention of this tool; the ASHRAE table knows one set");
  }

  private Optional<Exposure> exposure(Fields fields) {
    Optional<String> word = fields.word("exposure", EXPOSURES);
    if (word.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(word.get().equals("inside") ? Exposure.INSIDE : Exposure.OUTSIDE);
  }

  private Optional<Space.Floating> floating(String name, Fields fields) {
    Optional<Node> node = fields.get("floats");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    if (node.get() instanceof Node.Scalar scalar) {
      if (scalar.style() == Node.Style.PLAIN && scalar.text().equals("true")) {
        return Optional.of(new Space.Floating(0, ""));
      }
      problems.add(
          scalar,
          "`floats` is `true` or a conductance, not " + Node.describe(scalar),
          "write `true`, or `{conductance: 1.5, to: outdoors}`");
      return Optional.empty();
    }
    Fields to = new Fields(problems, "`floats` of " + fields.what(), node.get(), FLOATS_KEYS);
    Optional<Node> conductance = to.require("conductance", "add `conductance: 1.5`, in W/(m K)");
    Optional<Node> other = to.require("to", "add `to: ` and the space it leads to");
    if (conductance.isEmpty() || other.isEmpty()) {
      return Optional.empty();
    }
    double value =
        pass.quantities()
            .read(conductance.get(), "`conductance` of " + fields.what(), Place.CONDUCTANCE);
    Optional<String> target = Fields.text(problems, "`to`", other.get());
    if (target.isEmpty() || Double.isNaN(value)) {
      return Optional.empty();
    }
    if (!spaces.containsKey(target.get())) {
      reportUnknown(other.get(), target.get());
      return Optional.empty();
    }
    if (target.get().equals(name)) {
      problems.add(other.get(), fields.what() + " loses heat to itself", "name another space");
      return Optional.empty();
    }
    return Optional.of(new Space.Floating(value, target.get()));
  }
}
