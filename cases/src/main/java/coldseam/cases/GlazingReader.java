package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Reads {@code glazing} of a stack: panes and gaps by turns, gaps filled by what gives the glazing
 * its U (ISO 10077-2), and at the beginning of the face a sealant and a spacer in every gap.
 */
final class GlazingReader {
  /** The fill of a gap that the glazing's U decides. */
  static final String GAP = "gap";

  static final List<String> KEYS = List.of("U", "spacer", "sealant");
  private static final List<String> EDGE_KEYS = List.of("height", "conductivity");

  /** Films that a glazing's U is stated with, inside and outside together: EN 673, m²·K/W. */
  private static final double FILMS_M2K_PER_W = 0.13 + 0.04;

  private final Pass pass;
  private final Problems problems;
  private final Map<String, Material> made = new HashMap<>();

  GlazingReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /** One strip of the edge: how far it reaches from the strip before, and what it is made of. */
  private record Edge(String name, double heightM, double conductivityWPerMK) {}

  /**
   * What the glazing is made of beside its layers.
   *
   * @param node the mapping
   * @param layers the layers of the stack as read
   * @param name how the stack is called
   * @return every layer, then sealant and spacer of each gap
   */
  List<Area> read(Node node, List<StackReader.Layer> layers, String name) {
    int before = problems.count();
    Fields fields = new Fields(problems, "`glazing`", node, KEYS);
    double u = Double.NaN;
    if (fields.has("U")) {
      u = pass.quantities().read(fields.get("U").get(), "`U` of `glazing`", Place.TRANSMITTANCE);
    }
    List<Edge> edges = new ArrayList<>();
    for (String key : List.of("sealant", "spacer")) {
      edge(fields, key).ifPresent(edges::add);
    }
    if (layers.isEmpty() || problems.count() > before) {
      return List.of();
    }
    if (layers.size() < 3 || layers.size() % 2 == 0) {
      problems.add(
          node,
          "a glazing of " + layers.size() + " layers is none",
          "write panes and gaps by turns, e.g. `[[glass, 4], [gap, 16], [glass, 4]]`");
      return List.of();
    }
    Optional<Material> gas = gas(fields, layers, u);
    if (problems.count() > before) {
      return List.of();
    }
    List<Area> areas = new ArrayList<>();
    for (StackReader.Layer layer : layers) {
      Fill fill = gap(layer) ? gas.orElseThrow() : layer.fill();
      areas.add(area(name + ".layer[" + layer.number() + "]", fill, layer.ring()));
    }
    for (int i = 1; i < layers.size(); i += 2) {
      double from = 0;
      for (Edge edge : edges) {
        List<Point> ring = part(layers.get(i).ring(), from, from + edge.heightM());
        areas.add(area(name + "." + edge.name(), material(edge), ring));
        from += edge.heightM();
      }
    }
    return areas;
  }

  private static Area area(String called, Fill fill, List<Point> ring) {
    return new Area(
        called + " (" + fill.name() + ")", fill, List.of(ring), true, Area.Role.GLAZING);
  }

  private static boolean gap(StackReader.Layer layer) {
    return layer.fill() == StackReader.GAP_FILL;
  }

  /** What fills the gaps; empty if materials of the case do. */
  private Optional<Material> gas(Fields fields, List<StackReader.Layer> layers, double u) {
    double panes = 0;
    double gaps = 0;
    for (int i = 0; i < layers.size(); i++) {
      StackReader.Layer layer = layers.get(i);
      double thickness = layer.ring().get(0).distance(layer.ring().get(3));
      if (gap(layer) && i % 2 == 1) {
        gaps += thickness;
      } else if (gap(layer)) {
        problems.add(layer.node(), "a glazing has no gap outside", "begin and end with a pane");
      } else if (layer.fill() instanceof Material material && material.conductivityWPerMK() > 0) {
        panes += thickness / material.conductivityWPerMK();
      } else {
        problems.add(layer.node(), "a layer of a glazing conducts nothing", "give it a material");
      }
    }
    if (gaps == 0) {
      if (fields.has("U")) {
        problems.add(
            fields.keyNode("U"),
            "the U of the glazing decides nothing",
            "fill its gaps by `gap`, e.g. `[gap, 16]`, or leave `U` away");
      }
      return Optional.empty();
    }
    if (!fields.has("U")) {
      if (!fields.reported("U")) {
        problems.add(
            fields.node(), "nothing says what fills the gaps of the glazing", "add its `U: 1.1`");
      }
      return Optional.empty();
    }
    double resistance = 1 / u - FILMS_M2K_PER_W - panes;
    if (u == 0) {
      problems.add(fields.get("U").get(), "no glazing has a U of 0", "e.g. `1.1`, in W/(m2 K)");
      return Optional.empty();
    }
    if (!(resistance > 0)) {
      problems.add(
          fields.get("U").get(),
          "no filling of its gaps gives the glazing that U",
          "with the gaps left away it is " + Figures.of(1 / (FILMS_M2K_PER_W + panes)));
      return Optional.empty();
    }
    if (gaps / resistance < MaterialReader.LEAST_CONDUCTIVITY_W_PER_MK) {
      problems.add(
          fields.get("U").get(),
          "the gaps of the glazing would have a conductivity of "
              + Figures.of(gaps / resistance)
              + " W/(m K)",
          "check its U, e.g. `1.1`, in W/(m2 K)");
      return Optional.empty();
    }
    Material gas = material(new Edge("gas", 0, gaps / resistance));
    pass.assume(
        "conductivity of " + gas.name() + " in the glazing",
        Figures.of(gas.conductivityWPerMK())
            + " W/(m·K), so that U of the glazing is "
            + Figures.of(u)
            + " W/(m²·K) with films of 0.13 and 0.04 m²·K/W",
        "ISO 10077-2, gas space as a solid");
    return Optional.of(gas);
  }

  private Optional<Edge> edge(Fields fields, String key) {
    if (!fields.has(key)) {
      return Optional.empty();
    }
    String what = "`" + key + "` of `glazing`";
    Fields edge = new Fields(problems, what, fields.get(key).get(), EDGE_KEYS);
    Optional<Node> heightNode = edge.require("height", "add `height: ` along the glazing");
    Optional<Node> conductivityNode = edge.require("conductivity", "add `conductivity: `");
    if (heightNode.isEmpty() || conductivityNode.isEmpty()) {
      return Optional.empty();
    }
    double height = pass.quantities().read(heightNode.get(), "`height` of " + what, Place.SIZE);
    double conductivity =
        pass.quantities()
            .read(conductivityNode.get(), "`conductivity` of " + what, Place.CONDUCTIVITY);
    if (conductivity > 0 && conductivity < MaterialReader.LEAST_CONDUCTIVITY_W_PER_MK) {
      problems.add(
          conductivityNode.get(),
          "`conductivity` of " + what + " is below anything known",
          "still air has 0.025; write 0 if no heat is to pass");
      return Optional.empty();
    }
    return Double.isNaN(height) || Double.isNaN(conductivity)
        ? Optional.empty()
        : Optional.of(new Edge(key, height, conductivity));
  }

  /** A material of a glazing; another one of that name but not that conductivity is numbered. */
  private Material material(Edge edge) {
    String name = edge.name() + " of glazing";
    for (int number = 2; made.containsKey(name); number++) {
      if (made.get(name).conductivityWPerMK() == edge.conductivityWPerMK()) {
        return made.get(name);
      }
      name = edge.name() + " of glazing " + number;
    }
    Material material = Material.of(name, edge.conductivityWPerMK());
    made.put(name, material);
    return material;
  }

  /** The piece of a layer between two distances from the beginning of the face. */
  private static List<Point> part(List<Point> ring, double from, double to) {
    Point p = ring.get(0);
    Point q = ring.get(1);
    Point r = ring.get(2);
    Point s = ring.get(3);
    double length = p.distance(q);
    return List.of(
        between(p, q, from / length),
        between(p, q, to / length),
        between(s, r, to / length),
        between(s, r, from / length));
  }

  private static Point between(Point a, Point b, double share) {
    double t = Math.min(1, share);
    return new Point(a.x() + t * (b.x() - a.x()), a.y() + t * (b.y() - a.y()));
  }
}
