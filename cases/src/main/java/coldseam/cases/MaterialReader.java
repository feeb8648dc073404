package coldseam.cases;

import coldseam.cases.library.Entry;
import coldseam.cases.library.Library;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Material;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code materials}. */
final class MaterialReader {
  static final List<String> KEYS =
      List.of(
          "conductivity",
          "angle",
          "resistance",
          "thickness",
          "from",
          "at",
          "tolerance",
          "emissivity",
          "vapour-resistance",
          "source");

  /** A conductivity below this, but not 0, is a slip: still air has 0.025. */
  static final double LEAST_CONDUCTIVITY_W_PER_MK = 1e-6;

  static final String STATED = "stated in the case";

  private final Pass pass;
  private final Problems problems;
  private final Map<String, Optional<Material>> materials = new LinkedHashMap<>();
  private final Map<String, Entry> fromLibrary = new HashMap<>();
  private final Map<String, Assumption> converted = new HashMap<>();

  MaterialReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /**
   * Reads the materials of the base case or those of a variant that replace them.
   *
   * @param node the mapping
   */
  void read(Node node) {
    for (Node.Entry entry : Fields.named(problems, "`materials`", node)) {
      String name = entry.key().text();
      if (name.equals(Fills.HOLLOW)) {
        problems.add(
            entry.key(),
            "`hollow` is the fill of a place where nothing is, not a material",
            "choose another name");
        continue;
      }
      fromLibrary.remove(name);
      converted.remove(name);
      materials.put(name, material(name, entry.value()));
      pass.place("material", name, entry.key());
    }
  }

  /** Names with their materials; a material with a mistake is empty. */
  Map<String, Optional<Material>> materials() {
    return materials;
  }

  /** The library entry that a material's conductivity comes from. */
  Optional<Entry> libraryEntry(String name) {
    return Optional.ofNullable(fromLibrary.get(name));
  }

  /** What the conductivity of a material was converted to, if it was. */
  Optional<Assumption> conversion(String name) {
    return Optional.ofNullable(converted.get(name));
  }

  private Optional<Material> material(String name, Node node) {
    if (node instanceof Node.Scalar scalar) {
      Optional<Entry> entry = libraryEntryOf(scalar, "material `" + name + "`");
      if (entry.isPresent()) {
        fromLibrary.put(name, entry.get());
      }
      return entry.isEmpty() ? Optional.empty() : Optional.of(of(name, entry.get()));
    }
    String what = "material `" + Node.shortened(name) + "`";
    Fields fields = new Fields(problems, what, node, KEYS);
    Optional<Entry> entry = Optional.empty();
    if (fields.has("from")) {
      entry = libraryEntryOf(fields.get("from").get(), what);
    }
    int before = problems.count();
    double[] conductivity = conductivity(name, fields, entry);
    double angle = angle(fields);
    double tolerance = number(fields, "tolerance", Place.TOLERANCE, 0);
    double emissivity = number(fields, "emissivity", Place.EMISSIVITY, -1);
    double vapour = number(fields, "vapour-resistance", Place.VAPOUR_RESISTANCE, -1);
    String source = source(fields, what, entry);
    if (fields.has("at")) {
      source += convert(name, fields, entry, conductivity);
    }
    if (problems.count() > before || conductivity == null) {
      return Optional.empty();
    }
    return Optional.of(
        new Material(
            name,
            conductivity[0],
            conductivity[1],
            Math.toRadians(angle),
            tolerance,
            emissivity >= 0 ? OptionalDouble.of(emissivity) : entryEmissivity(entry),
            vapour >= 0 ? OptionalDouble.of(vapour) : entryVapour(entry),
            source));
  }

  /** Converts a conductivity in place; returns what to say of it beside its source. */
  private String convert(String name, Fields fields, Optional<Entry> entry, double[] conductivity) {
    Optional<ConversionReader.Conversion> read =
        new ConversionReader(pass)
            .read(fields.get("at").get(), fields.what(), entry, fromLibrary.containsKey(name));
    if (read.isEmpty() || conductivity == null) {
      return "";
    }
    ConversionReader.Conversion conversion = read.get();
    double stated = conductivity[0];
    conductivity[0] *= conversion.factor();
    conductivity[1] *= conversion.factor();
    converted.put(
        name,
        new Assumption(
            "conductivity of " + name + " at " + conversion.conditions(),
            Figures.of(conductivity[0])
                + " W/(m·K) = "
                + Figures.of(stated)
                + " W/(m·K) times "
                + conversion.factors(),
            conversion.source()));
    return "; converted by ISO 10456:2007 to " + conversion.conditions();
  }

  private Optional<Entry> libraryEntryOf(Node node, String what) {
    Optional<String> typed = Fields.text(problems, "the library name of " + what, node);
    if (typed.isEmpty()) {
      return Optional.empty();
    }
    Optional<Entry> entry = Library.find(typed.get());
    if (entry.isEmpty()) {
      problems.add(
          node,
          "`" + Node.shortened(typed.get()) + "` is no material of the library",
          nearestInLibrary(typed.get(), "or give a mapping, e.g. `{conductivity: 0.5}`"));
    }
    return entry;
  }

  private static String nearestInLibrary(String typed, String otherwise) {
    if (PlainNumber.is(typed)) {
      return "write `{conductivity: " + typed + "}`";
    }
    List<String> near = Library.nearest(typed);
    return near.isEmpty()
        ? "see `cli/coldseam materials` " + otherwise
        : "did you mean " + Fields.orList(near) + "?";
  }

  /** A material with the figures of the library. */
  static Material of(String name, Entry entry) {
    Optional<Entry> from = Optional.of(entry);
    return new Material(
        name,
        entry.conductivityWPerMK(),
        entry.conductivityWPerMK(),
        0,
        0,
        entryEmissivity(from),
        entryVapour(from),
        sourceOf(entry));
  }

  /** Where a figure of the library comes from and how far that is confirmed. */
  static String sourceOf(Entry entry) {
    return entry.status().equals("memory")
        ? entry.source() + " (from memory, not confirmed in the text)"
        : entry.source();
  }

  private static OptionalDouble entryEmissivity(Optional<Entry> entry) {
    return entry.isPresent() ? entry.get().emissivity() : OptionalDouble.empty();
  }

  private static OptionalDouble entryVapour(Optional<Entry> entry) {
    return entry.isPresent() ? entry.get().vapourResistanceDry() : OptionalDouble.empty();
  }

  private String source(Fields fields, String what, Optional<Entry> entry) {
    if (fields.has("source")) {
      return Fields.text(problems, "`source` of " + what, fields.get("source").get())
          .orElse(STATED);
    }
    boolean own = fields.has("conductivity") || fields.has("resistance");
    return entry.isPresent() && !own ? sourceOf(entry.get()) : STATED;
  }

  private double number(Fields fields, String key, Place place, double otherwise) {
    Optional<Node> node = fields.get(key);
    return node.isEmpty()
        ? otherwise
        : pass.quantities().read(node.get(), named(key, fields), place);
  }

  private static String named(String key, Fields fields) {
    return "`" + key + "` of " + fields.what();
  }

  private double angle(Fields fields) {
    Optional<Node> angle = fields.get("angle");
    if (angle.isEmpty()) {
      return 0;
    }
    if (!(fields.get("conductivity").orElse(null) instanceof Node.Sequence)) {
      problems.add(
          fields.keyNode("angle"),
          fields.what() + " has an `angle` but one conductivity for every direction",
          "give `conductivity: [along, across]`, or leave `angle` away");
    }
    return pass.quantities().read(angle.get(), named("angle", fields), Place.ANGLE);
  }

  /** λ along and across; null if it cannot be told, which has been reported. */
  private double[] conductivity(String name, Fields fields, Optional<Entry> entry) {
    fields.refuseBoth("conductivity", "resistance", "leave one of them away");
    fields.refuseBoth("conductivity", "thickness", "`thickness` belongs to `resistance`");
    Optional<Node> stated = fields.get("conductivity");
    if (stated.isPresent()) {
      return statedConductivity(stated.get(), named("conductivity", fields));
    }
    if (fields.has("resistance") || fields.has("thickness")) {
      return fromResistance(fields);
    }
    if (entry.isPresent()) {
      fromLibrary.put(name, entry.get());
      double lambda = entry.get().conductivityWPerMK();
      return new double[] {lambda, lambda};
    }
    if (!fields.has("from")
        && !fields.reported("conductivity")
        && !fields.reported("resistance")
        && !fields.reported("from")) {
      problems.add(
          fields.node(),
          fields.what() + " has no conductivity",
          "add `conductivity: …`, or `from: NAME` with a name of the library");
    }
    return null;
  }

  private double[] statedConductivity(Node node, String what) {
    double[] both;
    if (node instanceof Node.Sequence) {
      both = pass.quantities().pair(node, what, Place.CONDUCTIVITY).orElse(null);
    } else {
      double one = pass.quantities().read(node, what, Place.CONDUCTIVITY);
      both = Double.isNaN(one) ? null : new double[] {one, one};
    }
    if (both == null) {
      return null;
    }
    if ((both[0] == 0) != (both[1] == 0)) {
      problems.add(node, what + " is 0 in one direction only", "make both 0, or both more than 0");
      return null;
    }
    double least = Math.min(both[0], both[1]);
    if (least > 0 && least < LEAST_CONDUCTIVITY_W_PER_MK) {
      problems.add(
          node,
          what + " is below anything known: " + Figures.of(least) + " W/(m K)",
          "still air has 0.025; write 0 if no heat is to pass");
      return null;
    }
    return both;
  }

  private double[] fromResistance(Fields fields) {
    Optional<Node> resistance = fields.require("resistance", "add `resistance: …`, e.g. `R-13`");
    Optional<Node> thickness = fields.require("thickness", "add `thickness: …` of that layer");
    if (resistance.isEmpty() || thickness.isEmpty()) {
      return null;
    }
    Quantities quantities = pass.quantities();
    double r = quantities.read(resistance.get(), named("resistance", fields), Place.RESISTANCE);
    double d = quantities.read(thickness.get(), named("thickness", fields), Place.SIZE);
    if (Double.isNaN(r) || Double.isNaN(d)) {
      return null;
    }
    double lambda = d / r;
    if (lambda < LEAST_CONDUCTIVITY_W_PER_MK || lambda > Place.CONDUCTIVITY.most()) {
      problems.add(
          resistance.get(),
          fields.what() + " would have a conductivity of " + Figures.of(lambda) + " W/(m K)",
          "check the units of `resistance` and `thickness`");
      return null;
    }
    return new double[] {lambda, lambda};
  }
}
