package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.ground.GroundFloor;
import coldseam.solver.ground.GroundSection;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code ground}: where the edge of a floor lies in its block of soil. */
final class GroundReader {
  static final List<String> KEYS =
      List.of(
          "floor",
          "width",
          "wall",
          "floor-level",
          "ground-level",
          "between",
          "soil",
          "resistance",
          "wall-resistance",
          "edge",
          "void",
          "psi");
  static final List<String> FLOORS = List.of("slab", "suspended", "cellar");
  static final List<String> EDGE_KEYS = List.of("lies", "extent", "thickness", "conductivity");
  static final List<String> LIES = List.of("horizontal", "vertical");
  static final List<String> VOID_KEYS =
      List.of("space", "height", "wall-U", "openings", "wind", "shielding");
  static final List<String> SHIELDING = List.of("sheltered", "average", "exposed");

  private static final String SOIL = "soil";

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;

  GroundReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
  }

  /** The kinds of floor, in the order of {@link #FLOORS}. */
  enum Kind {
    SLAB("slab on the ground"),
    SUSPENDED("suspended floor"),
    CELLAR("cellar");

    private final String words;

    Kind(String words) {
      this.words = words;
    }

    String words() {
      return words;
    }
  }

  /**
   * Insulation along the edge of a slab.
   *
   * @param lies how
   * @param extentM its width or depth
   * @param thicknessM its thickness
   * @param conductivityWPerMK its conductivity
   */
  record Edge(
      GroundFloor.Edge lies, double extentM, double thicknessM, double conductivityWPerMK) {}

  /**
   * What is said of the void under a suspended floor.
   *
   * @param space the void
   * @param heightM height of the floor above the ground
   * @param wallUWPerM2K U of the void's walls above the ground
   * @param ventilationWPerMK conductance of its ventilation
   */
  record Crawl(Space space, double heightM, double wallUWPerM2K, double ventilationWPerMK) {}

  /**
   * What was read.
   *
   * @param node where it is written
   * @param kind the kind of floor
   * @param section where it lies
   * @param indoors the space over the floor
   * @param outdoors the space outdoors
   * @param soil the soil
   * @param resistance R of the floor in place of that of the layers drawn
   * @param wallResistance R of the wall below the ground in place of that of the layers drawn
   * @param edge insulation along the edge
   * @param crawl the void
   * @param psi whether ψ are wanted
   */
  record Ground(
      Node node,
      Kind kind,
      GroundSection section,
      Space indoors,
      Space outdoors,
      Material soil,
      OptionalDouble resistance,
      OptionalDouble wallResistance,
      Optional<Edge> edge,
      Optional<Crawl> crawl,
      boolean psi) {}

  /**
   * Reads the block.
   *
   * @param key its key, for its place
   * @param node the mapping
   * @param fills finds the soil
   * @return the ground, or empty if a mistake was reported
   */
  Optional<Ground> read(Node key, Node node, Fills fills) {
    pass.place("ground", "", key);
    int before = problems.count();
    Fields fields = new Fields(problems, "`ground`", node, KEYS);
    Kind kind = Kind.values()[FLOORS.indexOf(fields.word("floor", FLOORS).orElse("slab"))];
    Optional<double[]> wall = wall(fields);
    double floor = level(fields, "floor-level", "the surface of the floor");
    double ground = level(fields, "ground-level", "the surface of the ground outdoors");
    double width = GroundSection.STANDARD_WIDTH_M;
    if (fields.has("width")) {
      width = number(fields, "width", Place.SIZE);
    } else {
      pass.assume("width of the floor B'", "8 m", "ISO 10211, ground floors of unknown width");
    }
    Optional<PairReader.Sides> sides = between(fields);
    Optional<Material> soil = soil(key, fields, fills);
    OptionalDouble resistance = optional(fields, "resistance");
    OptionalDouble wallResistance = optional(fields, "wall-resistance");
    Optional<Edge> edge = edge(fields);
    Optional<Crawl> crawl = crawl(fields);
    belongs(fields, "edge", kind, Kind.SLAB);
    belongs(fields, "void", kind, Kind.SUSPENDED);
    belongs(fields, "wall-resistance", kind, Kind.CELLAR);
    boolean psi = fields.has("psi") ? fields.flag("psi") : kind == Kind.SLAB;
    if (kind == Kind.SUSPENDED && psi && !fields.has("void")) {
      problems.add(
          fields.keyNode("psi"),
          "a ψ of a suspended floor takes off the floor by ISO 13370, which depends on its void",
          "add `void: {space: …, height: …, wall-U: …, openings: …, wind: …, shielding: …}`");
    }
    if (kind == Kind.CELLAR && floor >= ground) {
      problems.add(
          fields.keyNode("floor-level"),
          "the floor of the cellar does not lie below the ground",
          "give a `floor-level` below `ground-level`, or `floor: slab`");
    }
    if (problems.count() > before || wall.isEmpty() || sides.isEmpty() || soil.isEmpty()) {
      return Optional.empty();
    }
    if (Double.isNaN(floor) || Double.isNaN(ground) || Double.isNaN(width)) {
      return Optional.empty();
    }
    Optional<Space> indoors = spaces.spaces().get(sides.get().warm().get(0));
    Optional<Space> outdoors = spaces.spaces().get(sides.get().cold().get(0));
    if (indoors.isEmpty() || outdoors.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Ground(
            key,
            kind,
            new GroundSection(wall.get()[0], wall.get()[1], floor, ground, width),
            indoors.get(),
            outdoors.get(),
            soil.get(),
            resistance,
            wallResistance,
            edge,
            crawl,
            psi));
  }

  private void belongs(Fields fields, String key, Kind kind, Kind wanted) {
    if (kind != wanted && fields.has(key)) {
      problems.add(
          fields.keyNode(key),
          "`" + key + "` belongs to a " + wanted.words(),
          "leave it away, or write `floor: " + FLOORS.get(wanted.ordinal()) + "`");
    }
  }

  private Optional<double[]> wall(Fields fields) {
    Optional<Node> node =
        fields.require("wall", "add `wall: [x, x]`, the inner and the outer face of the wall");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    Optional<double[]> faces =
        pass.quantities().pair(node.get(), "`wall` of `ground`", Place.COORDINATE);
    if (faces.isPresent() && Math.abs(faces.get()[0] - faces.get()[1]) < Place.SIZE.least()) {
      problems.add(node.get(), "the wall has no thickness", "write `[x inside, x outside]`");
      return Optional.empty();
    }
    return faces;
  }

  private double level(Fields fields, String key, String what) {
    Optional<Node> node = fields.require(key, "add `" + key + ": y`, " + what);
    return node.isEmpty() ? Double.NaN : number(fields, key, Place.COORDINATE);
  }

  private double number(Fields fields, String key, Place place) {
    return pass.quantities()
        .read(fields.get(key).get(), "`" + key + "` of " + fields.what(), place);
  }

  private OptionalDouble optional(Fields fields, String key) {
    return fields.has(key)
        ? OptionalDouble.of(number(fields, key, Place.FILM))
        : OptionalDouble.empty();
  }

  private Optional<PairReader.Sides> between(Fields fields) {
    Optional<Node> node = fields.require("between", "add `between: [indoors, outdoors]`");
    Optional<PairReader.Sides> sides =
        node.isEmpty()
            ? Optional.empty()
            : new PairReader(problems, spaces.spaces()).read(node.get(), "`between` of `ground`");
    if (sides.isPresent() && sides.get().warm().size() + sides.get().cold().size() > 2) {
      problems.add(
          node.get(),
          "a floor's edge lies between the space over the floor and outdoors",
          "name one space on each side");
      return Optional.empty();
    }
    return sides;
  }

  private Optional<Material> soil(Node key, Fields fields, Fills fills) {
    Node node =
        fields.has("soil")
            ? fields.get("soil").get()
            : new Node.Scalar(SOIL, Node.Style.PLAIN, key.line(), key.column());
    Optional<Fill> fill = fills.find(node, Optional.empty());
    if (fill.isEmpty()) {
      return Optional.empty();
    }
    if (fill.get() instanceof Material material && material.conductivityWPerMK() > 0) {
      return Optional.of(material);
    }
    problems.add(node, "the soil conducts nothing", "name a material, e.g. `sand and gravel`");
    return Optional.empty();
  }

  private Optional<Edge> edge(Fields fields) {
    if (!fields.has("edge")) {
      return Optional.empty();
    }
    Fields own = new Fields(problems, "`edge` of `ground`", fields.get("edge").get(), EDGE_KEYS);
    own.require("lies", "add `lies: horizontal` or `lies: vertical`");
    Optional<String> lies = own.word("lies", LIES);
    double extent = required(own, "extent", Place.SIZE, "add `extent: 1 m`, its width or depth");
    double thickness = required(own, "thickness", Place.SIZE, "add `thickness: 70 mm`");
    double conductivity =
        required(own, "conductivity", Place.CONDUCTIVITY, "add `conductivity: 0.035`");
    if (conductivity < MaterialReader.LEAST_CONDUCTIVITY_W_PER_MK) {
      problems.add(
          own.get("conductivity").get(), "the insulation conducts nothing", "e.g. `0.035`");
    }
    return lies.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Edge(
                GroundFloor.Edge.values()[LIES.indexOf(lies.get())],
                extent,
                thickness,
                conductivity));
  }

  private double required(Fields fields, String key, Place place, String example) {
    return fields.require(key, example).isEmpty() ? Double.NaN : number(fields, key, place);
  }

  private Optional<Crawl> crawl(Fields fields) {
    if (!fields.has("void")) {
      return Optional.empty();
    }
    Fields own = new Fields(problems, "`void` of `ground`", fields.get("void").get(), VOID_KEYS);
    Optional<Node> node = own.require("space", "add `space: `, the void under the floor");
    Optional<String> name =
        node.isEmpty() ? Optional.empty() : Fields.text(problems, "`space`", node.get());
    double height =
        required(own, "height", Place.EXTENT, "add `height: 0.3 m`, of the floor over the ground");
    double wall = required(own, "wall-U", Place.TRANSMITTANCE, "add `wall-U: 1.5`, of its walls");
    double openings =
        required(own, "openings", Place.OPENINGS, "add `openings: 1500`, mm2 per m of edge");
    double wind = required(own, "wind", Place.SPEED, "add `wind: 4`, in m/s");
    own.require("shielding", "add `shielding: average`, `sheltered` or `exposed`");
    Optional<String> shielding = own.word("shielding", SHIELDING);
    if (name.isEmpty() || shielding.isEmpty()) {
      return Optional.empty();
    }
    Optional<Space> space = spaces.spaces().get(name.get());
    if (space == null) {
      spaces.reportUnknown(node.get(), name.get());
      return Optional.empty();
    }
    if (space.isEmpty()) {
      return Optional.empty();
    }
    if (space.get().floating().isEmpty() || space.get().floating().get().conductanceWPerMK() > 0) {
      problems.add(
          node.get(),
          "`" + Node.shortened(name.get()) + "` does not simply float",
          "write `floats: true` with the space; its ventilation is added here");
      return Optional.empty();
    }
    double squareMetres = openings * 1e-6;
    return Optional.of(
        new Crawl(
            space.get(),
            height,
            wall,
            GroundFloor.ventilation(
                squareMetres,
                wind,
                GroundFloor.Shielding.values()[SHIELDING.indexOf(shielding.get())])));
  }

  /** What is laid under the section, in order, then the section. */
  static List<Area> laid(Ground ground, List<Area> areas) {
    List<Area> all = new ArrayList<>();
    all.addAll(ground.section().under(ground.soil(), ground.outdoors(), top(areas)));
    all.addAll(areas);
    return all;
  }

  /** Where the conducting section ends above, m. */
  static double top(List<Area> areas) {
    double top = Double.NEGATIVE_INFINITY;
    for (Area area : areas) {
      if (Sides.conducts(area.fill())) {
        for (List<Point> ring : area.rings()) {
          for (Point point : ring) {
            top = Math.max(top, point.y());
          }
        }
      }
    }
    return top;
  }
}
