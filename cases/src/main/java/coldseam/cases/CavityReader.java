package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Exchange;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Settings;
import coldseam.solver.detail.AirCavity.Single;
import coldseam.solver.detail.AirCavity.Temperatures;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code cavities}: air whose conductivity the solver works out. */
final class CavityReader {
  static final List<String> KEYS =
      List.of(
          "rule",
          "ventilation",
          "openings",
          "to",
          "emissivity",
          "direction",
          "conductivity",
          "form",
          "throat",
          "temperatures",
          "single");
  private static final List<String> SINGLE_KEYS =
      List.of(
          "at", "rule", "ventilation", "openings", "to", "emissivity", "direction", "conductivity");
  static final List<String> RULES = List.of("frame", "layer");
  static final List<String> VENTILATIONS = List.of("unventilated", "slightly", "well");
  static final List<String> FORMS = List.of("earlier", "2017", "radiosity");
  static final List<String> TEMPERATURES = List.of("fixed", "found");

  /** mm² in a m². */
  private static final double MM2_PER_M2 = 1e6;

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;
  private final Map<String, Optional<AirCavity>> cavities = new LinkedHashMap<>();

  CavityReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
  }

  /**
   * Reads the cavities.
   *
   * @param node the mapping
   * @param materials names that are taken by materials
   */
  void read(Node node, Map<String, ?> materials) {
    for (Node.Entry entry : Fields.named(problems, "`cavities`", node, KEYS, "a cavity", "air")) {
      String name = entry.key().text();
      pass.place("cavity", name, entry.key());
      if (name.equals(Fills.HOLLOW)) {
        problems.add(entry.key(), "`hollow` cannot name air", "choose another name");
      } else if (materials.containsKey(name) || spaces.spaces().containsKey(name)) {
        problems.add(
            entry.key(),
            "`" + Node.shortened(name) + "` names a material or a space as well as air",
            "choose another name for one of them");
      }
      cavities.put(name, cavity(name, entry.value()));
    }
  }

  /** Names with their air; one with a mistake is empty. */
  Map<String, Optional<AirCavity>> cavities() {
    return cavities;
  }

  private Optional<AirCavity> cavity(String name, Node node) {
    int before = problems.count();
    Fields fields = new Fields(problems, "cavity `" + Node.shortened(name) + "`", node, KEYS);
    Settings settings = settings(fields);
    Optional<String> word = fields.word("form", FORMS);
    Optional<RadiationForm> form =
        word.isEmpty() ? Optional.empty() : Optional.of(form(word.get()));
    String met = fields.word("temperatures", TEMPERATURES).orElse("");
    Temperatures temperatures = met.equals("found") ? Temperatures.FOUND : Temperatures.FIXED;
    if (word.orElse("").equals("radiosity") && met.equals("fixed")) {
      problems.add(
          fields.get("temperatures").get(),
          fields.what() + " has fixed temperatures, but radiosity follows from those of the faces",
          "write `temperatures: found`, or leave it away");
    }
    double throat = throat(fields);
    List<Single> singles = fields.has("single") ? singles(fields) : List.of();
    // a number that hangs on a broken value is none, though its mistake stands elsewhere
    return problems.count() > before || Double.isNaN(throat)
        ? Optional.empty()
        : Optional.of(new AirCavity(name, settings, form, temperatures, throat, false, singles));
  }

  private static RadiationForm form(String word) {
    return switch (word) {
      case "2017" -> RadiationForm.SERIES;
      case "radiosity" -> RadiationForm.RADIOSITY;
      default -> RadiationForm.PRODUCT;
    };
  }

  private double throat(Fields fields) {
    Optional<Node> node = fields.get("throat");
    return node.isEmpty()
        ? Ventilation.UNVENTILATED_SLIT_M
        : pass.quantities().read(node.get(), "`throat` of " + fields.what(), Place.EXTENT);
  }

  private List<Single> singles(Fields of) {
    Node node = of.get("single").orElseThrow();
    if (!(node instanceof Node.Sequence sequence) || sequence.items().isEmpty()) {
      problems.add(
          node,
          "`single` of " + of.what() + " is a list, not " + Node.describe(node),
          "write `- {at: [x, y], conductivity: 0.1}`, one a line");
      return List.of();
    }
    List<Single> singles = new ArrayList<>();
    for (Node item : sequence.items()) {
      Fields fields = new Fields(problems, "this single cavity", item, SINGLE_KEYS);
      Optional<Node> at = fields.require("at", "add `at: [x, y]`, a point well inside it");
      Settings settings = settings(fields);
      if (at.isPresent()) {
        Optional<Point> point = pass.quantities().point(at.get(), "`at` of a single cavity");
        if (point.isPresent()) {
          singles.add(new Single(point.get(), settings));
        }
      }
    }
    return singles;
  }

  private Settings settings(Fields fields) {
    Optional<String> rule = fields.word("rule", RULES);
    fields.refuseBoth("ventilation", "openings", "the class follows from the openings");
    return new Settings(
        rule.isEmpty()
            ? Optional.empty()
            : Optional.of(rule.get().equals("frame") ? Rule.FRAME : Rule.LAYER),
        ventilation(fields),
        emissivities(fields),
        direction(fields),
        conductivity(fields));
  }

  private Optional<Exchange> ventilation(Fields fields) {
    Optional<String> to = space(fields);
    Optional<String> word = fields.word("ventilation", VENTILATIONS);
    if (word.isPresent()) {
      Ventilation ventilation =
          switch (word.get()) {
            case "unventilated" -> Ventilation.UNVENTILATED;
            case "slightly" -> Ventilation.SLIGHTLY_VENTILATED;
            default -> Ventilation.WELL_VENTILATED;
          };
      return Optional.of(new Exchange(ventilation, OptionalDouble.empty(), to));
    }
    Optional<Node> openings = fields.get("openings");
    if (openings.isPresent()) {
      double mm2 =
          pass.quantities().read(openings.get(), "`openings` of " + fields.what(), Place.OPENINGS);
      return Double.isNaN(mm2)
          ? Optional.empty()
          : Optional.of(
              new Exchange(
                  Ventilation.ofOpenings(mm2 / MM2_PER_M2),
                  OptionalDouble.of(mm2 / MM2_PER_M2),
                  to));
    }
    if (to.isPresent()) {
      problems.add(
          fields.keyNode("to"),
          fields.what() + " has `to` but no ventilation",
          "add `ventilation` or `openings`, or leave `to` away");
    }
    return Optional.empty();
  }

  private Optional<String> space(Fields fields) {
    Optional<Node> node = fields.get("to");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    Optional<String> name = Fields.text(problems, "`to` of " + fields.what(), node.get());
    if (name.isPresent() && !spaces.spaces().containsKey(name.get())) {
      spaces.reportUnknown(node.get(), name.get());
      return Optional.empty();
    }
    return name;
  }

  private Optional<Emissivities> emissivities(Fields fields) {
    Optional<Node> node = fields.get("emissivity");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    String what = "`emissivity` of " + fields.what();
    double[] both;
    if (node.get() instanceof Node.Sequence) {
      both = pass.quantities().pair(node.get(), what, Place.EMISSIVITY).orElse(null);
    } else {
      double one = pass.quantities().read(node.get(), what, Place.EMISSIVITY);
      both = Double.isNaN(one) ? null : new double[] {one, one};
    }
    if (both == null) {
      return Optional.empty();
    }
    return Optional.of(new Emissivities(both[0], both[1]));
  }

  private Optional<Point> direction(Fields fields) {
    Optional<Node> node = fields.get("direction");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    String what = "`direction` of " + fields.what();
    Optional<double[]> pair = pass.quantities().pair(node.get(), what, Place.DIRECTION);
    if (pair.isEmpty()) {
      return Optional.empty();
    }
    Point vector = new Point(pair.get()[0], pair.get()[1]);
    if (vector.x() == 0 && vector.y() == 0) {
      problems.add(node.get(), what + " points nowhere", "write `[0, -1]` for downwards, say");
      return Optional.empty();
    }
    return Optional.of(vector);
  }

  private OptionalDouble conductivity(Fields fields) {
    Optional<Node> node = fields.get("conductivity");
    if (node.isEmpty()) {
      return OptionalDouble.empty();
    }
    String what = "`conductivity` of " + fields.what();
    double lambda = pass.quantities().read(node.get(), what, Place.CONDUCTIVITY);
    if (lambda < MaterialReader.LEAST_CONDUCTIVITY_W_PER_MK) {
      problems.add(
          node.get(), what + " is too small for air", "still air has 0.025; or lay `hollow`");
      return OptionalDouble.empty();
    }
    return Double.isNaN(lambda) ? OptionalDouble.empty() : OptionalDouble.of(lambda);
  }

  /**
   * Air that fills whatever is left uncovered inside the section.
   *
   * @param node names it
   * @return the air, or empty if a mistake was reported
   */
  Optional<AirCavity> uncovered(Node node) {
    Optional<String> name = Fields.text(problems, "`uncovered`", node);
    if (name.isEmpty()) {
      return Optional.empty();
    }
    Optional<AirCavity> air = cavities.get(name.get());
    if (air == null) {
      problems.add(
          node,
          "`" + Node.shortened(name.get()) + "` is none of the `cavities`",
          cavities.isEmpty()
              ? "add `cavities: {" + Node.shortened(name.get()) + ": {}}`"
              : Problems.suggestion(name.get(), cavities.keySet()));
      return Optional.empty();
    }
    return air;
  }
}
