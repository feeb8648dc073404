package coldseam.cases;

import coldseam.solver.detail.Area;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code framing}: the module of a framed wall, its U and what belongs beside it. */
final class FramingReader {
  static final List<String> KEYS =
      List.of(
          "of",
          "between",
          "spacing",
          "at",
          "along",
          "layer",
          "fractions",
          "air-voids",
          "fasteners",
          "inverted-roof",
          "tapered");
  static final List<String> ALONG = List.of("x", "y");
  static final List<String> FRACTION_KEYS = List.of("cavity", "studs", "headers");
  static final List<String> FASTENER_KEYS =
      List.of("per-m2", "conductivity", "diameter", "insulation", "through");
  static final List<String> ROOF_KEYS = List.of("rain", "factor");
  static final List<String> TAPER_KEYS = List.of("shape", "thickness", "conductivity");
  static final List<String> SHAPES = List.of("rectangle", "thickest-at-apex", "thinnest-at-apex");

  /** What the module is called, where nothing else is said. */
  private static final String WALL = "wall";

  /** f·x of one layer of butt-jointed boards (ISO 6946). */
  private static final double RAIN_FACTOR = 0.04;

  /** Fractions add up to 1 to this much. */
  private static final double WHOLE = 1e-6;

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;

  FramingReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
  }

  /**
   * What was read.
   *
   * @param wanted U and what belongs beside it
   * @param of what the U is of
   * @param clip the module; empty if the whole drawing is one
   */
  record Framing(List<Wanted> wanted, String of, Optional<ModuleClip> clip) {}

  /**
   * Reads the block.
   *
   * @param key its key, for its place
   * @param node the mapping
   * @param areas the section as drawn
   * @return the framing, or empty if a mistake was reported
   */
  Optional<Framing> read(Node key, Node node, List<Area> areas) {
    int before = problems.count();
    Fields fields = new Fields(problems, "`framing`", node, KEYS);
    String of =
        fields.has("of")
            ? Fields.text(problems, "`of`", fields.get("of").get()).orElse(WALL)
            : WALL;
    pass.place("framing", of, key);
    pass.place("U", of, key);
    Optional<Node> between = fields.require("between", "add `between: [indoors, outdoors]`");
    Optional<PairReader.Sides> sides =
        between.isEmpty()
            ? Optional.empty()
            : new PairReader(problems, spaces.spaces())
                .read(between.get(), "`between` of `framing`");
    boolean alongY = fields.word("along", ALONG).orElse("x").equals("y");
    String layer =
        fields.has("layer")
            ? Fields.text(problems, "`layer`", fields.get("layer").get()).orElse("")
            : "";
    Optional<ModuleClip> clip = clip(fields, areas, alongY);
    Optional<Wanted.Framing.Fractions> fractions = fractions(fields);
    Optional<Wanted.Framing.Corrections> corrections = corrections(fields);
    if (corrections.isPresent() && layer.isEmpty()) {
      problems.add(
          fields.node(),
          "corrections count by the resistance of the insulation",
          "add `layer: ` and the fill that insulates");
    }
    if (problems.count() > before || sides.isEmpty()) {
      return Optional.empty();
    }
    List<Wanted> wanted = new ArrayList<>();
    wanted.add(
        new Wanted.Transmittance(
            of,
            sides.get().warm(),
            sides.get().cold(),
            clip.isEmpty()
                ? OptionalDouble.empty()
                : OptionalDouble.of(clip.get().high() - clip.get().low())));
    wanted.add(new Wanted.Framing(of, alongY, layer, fractions, corrections));
    return Optional.of(new Framing(wanted, of, clip));
  }

  private Optional<ModuleClip> clip(Fields fields, List<Area> areas, boolean alongY) {
    double[] ends = ModuleClip.extent(areas, alongY);
    if (!fields.has("spacing")) {
      if (fields.has("at")) {
        problems.add(
            fields.keyNode("at"), "`at` says where a module lies", "add its `spacing: 600`");
      }
      return Optional.empty();
    }
    double spacing = number(fields, "spacing", Place.SIZE);
    double at = (ends[0] + ends[1]) / 2;
    if (fields.has("at")) {
      at = number(fields, "at", Place.COORDINATE);
    }
    if (Double.isNaN(spacing) || Double.isNaN(at) || !(ends[1] > ends[0])) {
      return Optional.empty();
    }
    double low = at - spacing / 2;
    double high = at + spacing / 2;
    double same = Place.SIZE.least();
    if (low < ends[0] - same || high > ends[1] + same) {
      problems.add(
          fields.keyNode("spacing"),
          "the wall is not drawn over a whole module about "
              + (alongY ? "y = " : "x = ")
              + Figures.of(at / pass.quantities().unit().metres()),
          "draw its layers over a length of `spacing` at least, to either side of the stud");
      return Optional.empty();
    }
    if (!fields.has("at")) {
      pass.assume(
          "module of the framing",
          "the length of `spacing` in the middle of the drawing, planes of symmetry at its ends",
          "by convention of this tool");
    }
    return Optional.of(new ModuleClip(alongY, Math.max(low, ends[0]), Math.min(high, ends[1])));
  }

  private double number(Fields fields, String key, Place place) {
    return pass.quantities()
        .read(fields.get(key).get(), "`" + key + "` of " + fields.what(), place);
  }

  private double required(Fields fields, String key, Place place, String example) {
    return fields.require(key, example).isEmpty() ? Double.NaN : number(fields, key, place);
  }

  private Optional<Wanted.Framing.Fractions> fractions(Fields fields) {
    if (!fields.has("fractions")) {
      return Optional.empty();
    }
    Node node = fields.get("fractions").get();
    Fields own = new Fields(problems, "`fractions` of `framing`", node, FRACTION_KEYS);
    double cavity = required(own, "cavity", Place.FRACTION, "add `cavity: 75 %`");
    double studs = required(own, "studs", Place.FRACTION, "add `studs: 21 %`");
    double headers = own.has("headers") ? number(own, "headers", Place.FRACTION) : 0;
    double sum = cavity + studs + headers;
    if (Math.abs(sum - 1) > WHOLE) {
      problems.add(
          node,
          "the fractions add up to " + Figures.of(100 * sum) + " %",
          "they make up the whole wall, 100 %");
    }
    return Optional.of(new Wanted.Framing.Fractions(cavity, studs, headers));
  }

  private Optional<Wanted.Framing.Corrections> corrections(Fields fields) {
    boolean any = false;
    for (String key : KEYS.subList(KEYS.indexOf("air-voids"), KEYS.size())) {
      any |= fields.has(key);
    }
    if (!any) {
      return Optional.empty();
    }
    double level = fields.has("air-voids") ? number(fields, "air-voids", Place.VOID_LEVEL) : 0;
    if (level != Math.rint(level)) {
      problems.add(fields.get("air-voids").get(), "air voids have a level", "give 0, 1 or 2");
    }
    double[] fasteners = fasteners(fields);
    double rain = 0;
    double factor = RAIN_FACTOR;
    if (fields.has("inverted-roof")) {
      Node node = fields.get("inverted-roof").get();
      Fields own = new Fields(problems, "`inverted-roof` of `framing`", node, ROOF_KEYS);
      rain = required(own, "rain", Place.AMOUNT, "add `rain: 2`, mm a day");
      factor = own.has("factor") ? number(own, "factor", Place.EMISSIVITY) : RAIN_FACTOR;
      if (!own.has("factor")) {
        pass.assume(
            "f·x of the inverted roof", "0.04", "ISO 6946, one layer of butt-jointed boards");
      }
    }
    Optional<Wanted.Framing.Taper> taper = Optional.empty();
    double resistance = 0;
    if (fields.has("tapered")) {
      Fields own =
          new Fields(problems, "`tapered` of `framing`", fields.get("tapered").get(), TAPER_KEYS);
      own.require("shape", "add `shape: rectangle`");
      Optional<String> shape = own.word("shape", SHAPES);
      double thickness = required(own, "thickness", Place.SIZE, "add `thickness: 120`, the most");
      double conductivity =
          required(own, "conductivity", Place.CONDUCTIVITY, "add `conductivity: 0.035`");
      if (conductivity < MaterialReader.LEAST_CONDUCTIVITY_W_PER_MK) {
        problems.add(own.get("conductivity").get(), "the layer conducts nothing", "e.g. `0.035`");
      }
      resistance = thickness / conductivity;
      if (shape.isPresent()) {
        taper = Optional.of(Wanted.Framing.Taper.values()[SHAPES.indexOf(shape.get())]);
      }
    }
    return Optional.of(
        new Wanted.Framing.Corrections(
            (int) level,
            fasteners[0],
            fasteners[1],
            Math.PI / 4 * fasteners[2] * fasteners[2],
            fasteners[3],
            fasteners[4],
            rain,
            factor,
            taper,
            resistance));
  }

  /** How many, conductivity, diameter, thickness of the insulation, length in it. */
  private double[] fasteners(Fields fields) {
    if (!fields.has("fasteners")) {
      return new double[5];
    }
    Node node = fields.get("fasteners").get();
    Fields own = new Fields(problems, "`fasteners` of `framing`", node, FASTENER_KEYS);
    double count = required(own, "per-m2", Place.AMOUNT, "add `per-m2: 4`");
    double conductivity =
        required(own, "conductivity", Place.CONDUCTIVITY, "add `conductivity: 50`");
    double diameter = required(own, "diameter", Place.SIZE, "add `diameter: 5`");
    double insulation =
        required(own, "insulation", Place.SIZE, "add `insulation: 120`, its thickness");
    double through = own.has("through") ? number(own, "through", Place.SIZE) : insulation;
    return new double[] {count, conductivity, diameter, insulation, through};
  }
}
