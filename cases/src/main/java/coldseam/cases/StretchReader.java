package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads {@code stretches}. */
final class StretchReader {
  static final List<String> KEYS =
      List.of(
          "along",
          "side",
          "space",
          "film",
          "temperature",
          "flow",
          "adiabatic",
          "symmetry",
          "surface");
  private static final List<String> CONDITIONS =
      List.of("space", "temperature", "flow", "adiabatic", "symmetry");

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;
  private final List<Stretch> stretches = new ArrayList<>();
  private final List<String> names = new ArrayList<>();

  StretchReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
  }

  /** Names of all stretches, those with a mistake included. */
  List<String> names() {
    return names;
  }

  List<Stretch> stretches() {
    return stretches;
  }

  /**
   * Reads the stretches; spaces are added for those with a temperature of their own.
   *
   * @param node the mapping
   * @param areas the section
   * @param materials names that are taken by materials
   */
  void read(Node node, List<Area> areas, Map<String, ?> materials) {
    Sidelines sidelines = new Sidelines(problems, areas);
    for (Node.Entry entry :
        Fields.named(problems, "`stretches`", node, KEYS, "a stretch", "face")) {
      String name = entry.key().text();
      names.add(name);
      pass.place("stretch", name, entry.key());
      if (spaces.spaces().containsKey(name) || materials.containsKey(name)) {
        problems.add(
            entry.key(),
            "`" + Node.shortened(name) + "` names a space or a material as well as a stretch",
            "choose another name for the stretch");
        continue;
      }
      stretch(entry.key(), entry.value(), sidelines);
    }
  }

  private void stretch(Node.Scalar key, Node node, Sidelines sidelines) {
    String name = key.text();
    int before = problems.count();
    Fields fields = new Fields(problems, "stretch `" + Node.shortened(name) + "`", node, KEYS);
    Optional<List<Point>> along = along(fields, sidelines);
    boolean glazing = fields.word("surface", SectionReader.SURFACES).isPresent();
    Optional<EdgeCondition> condition = condition(key, fields);
    if (problems.count() == before && along.isPresent()) {
      stretches.add(new Stretch(name, along.get(), condition, glazing));
    }
  }

  private Optional<List<Point>> along(Fields fields, Sidelines sidelines) {
    if (fields.refuseBoth("along", "side", "leave one of them away")) {
      return Optional.empty();
    }
    if (fields.has("along")) {
      return pass.quantities().line(fields.get("along").get(), "`along` of " + fields.what(), 2);
    }
    Optional<String> side = fields.word("side", Sides.NAMES);
    if (side.isPresent()) {
      return sidelines.whole(fields.get("side").get(), side.get());
    }
    if (!fields.has("side") && !fields.reported("along") && !fields.reported("side")) {
      problems.add(
          fields.node(),
          fields.what() + " lies nowhere",
          "add `along: [[x, y], [x, y]]`, or `side: left`, `right`, `top` or `bottom`");
    }
    return Optional.empty();
  }

  private Optional<EdgeCondition> condition(Node.Scalar key, Fields fields) {
    boolean adiabatic = fields.flag("adiabatic");
    boolean symmetry = fields.flag("symmetry");
    for (int i = 0; i < CONDITIONS.size(); i++) {
      for (int j = i + 1; j < CONDITIONS.size(); j++) {
        boolean bothPlanes = i == 3 && j == 4;
        if (!bothPlanes
            && fields.refuseBoth(
                CONDITIONS.get(i), CONDITIONS.get(j), "a stretch has one condition")) {
          return Optional.empty();
        }
      }
    }
    if (fields.has("temperature")) {
      return ownTemperature(key, fields);
    }
    if (fields.has("space")) {
      return faces(fields);
    }
    if (fields.has("film")) {
      problems.add(
          fields.keyNode("film"),
          fields.what() + " has a film but no space",
          "add `space: ` and the space it faces");
      return Optional.empty();
    }
    if (fields.has("flow")) {
      double flow =
          pass.quantities()
              .read(fields.get("flow").get(), "`flow` of " + fields.what(), Place.FLOW_DENSITY);
      return Double.isNaN(flow) ? Optional.empty() : Optional.of(new EdgeCondition.HeatFlow(flow));
    }
    return adiabatic || symmetry
        ? Optional.of(new EdgeCondition.CutOff(symmetry))
        : Optional.empty();
  }

  private Optional<EdgeCondition> ownTemperature(Node.Scalar key, Fields fields) {
    double temperature =
        pass.quantities()
            .read(
                fields.get("temperature").get(),
                "`temperature` of " + fields.what(),
                Place.TEMPERATURE);
    FilmReader.Films own = FilmReader.Films.NONE;
    if (fields.has("film")) {
      own = spaces.films().read(fields.get("film").get(), fields.what(), Optional.empty());
    }
    if (!Double.isNaN(temperature)) {
      spaces.addOfStretch(key.text(), temperature, own);
      pass.place("space", key.text(), key);
    } else {
      spaces.spaces().put(key.text(), Optional.empty());
    }
    return Optional.of(new EdgeCondition.Faces(key.text(), Optional.empty(), Optional.empty()));
  }

  private Optional<EdgeCondition> faces(Fields fields) {
    Node node = fields.get("space").get();
    Optional<String> name = Fields.text(problems, "`space` of " + fields.what(), node);
    if (name.isEmpty()) {
      return Optional.empty();
    }
    Optional<Space> space = spaces.spaces().get(name.get());
    if (space == null) {
      spaces.reportUnknown(node, name.get());
      return Optional.empty();
    }
    FilmReader.Films own = FilmReader.Films.NONE;
    if (fields.has("film")) {
      Optional<Exposure> exposure =
          space.isPresent() ? Optional.of(space.get().exposure()) : Optional.empty();
      if (space.isPresent()) {
        own = spaces.films().read(fields.get("film").get(), fields.what(), exposure);
      }
    }
    return Optional.of(new EdgeCondition.Faces(name.get(), own.heatLoss(), own.surface()));
  }
}
