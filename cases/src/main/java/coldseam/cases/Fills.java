package coldseam.cases;

import coldseam.cases.library.Entry;
import coldseam.cases.library.Library;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** What names mean as fills: materials of the case, spaces, air, {@code hollow}, the library. */
final class Fills {
  static final String HOLLOW = "hollow";

  private final Pass pass;
  private final MaterialReader materials;
  private final SpaceReader spaces;
  private final CavityReader cavities;
  private final Map<String, Node.Scalar> replacements = new LinkedHashMap<>();
  private final Set<String> met = new LinkedHashSet<>();
  private final Set<String> replaced = new HashSet<>();
  private final Set<String> assumed = new HashSet<>();
  private final Map<String, Optional<Fill>> known = new HashMap<>();
  private final Map<String, Material> turned = new HashMap<>();

  Fills(Pass pass, MaterialReader materials, SpaceReader spaces, CavityReader cavities) {
    this.pass = pass;
    this.materials = materials;
    this.spaces = spaces;
    this.cavities = cavities;
  }

  /** From now on, shapes of that name or fill are filled by another. */
  void replace(String old, Node.Scalar by) {
    replacements.put(old, by);
  }

  /** Names to be replaced that no shape had. */
  List<String> notReplaced() {
    List<String> unused = new ArrayList<>(replacements.keySet());
    unused.removeAll(replaced);
    return unused;
  }

  /** The names by which fills can be replaced, once the section is read. */
  Set<String> replaceable() {
    return met;
  }

  /**
   * What a shape is filled with.
   *
   * @param node where the fill is named
   * @param shape the name of the shape, if it has one
   * @return the fill, or empty if a mistake was reported
   */
  Optional<Fill> find(Node node, Optional<String> shape) {
    Optional<String> name = Fields.text(pass.problems(), "`fill`", node);
    if (name.isEmpty()) {
      return Optional.empty();
    }
    if (!replacements.isEmpty()) {
      met.add(name.get());
      if (shape.isPresent()) {
        met.add(shape.get());
      }
    }
    String key = shape.isPresent() && replacements.containsKey(shape.get()) ? shape.get() : "";
    if (key.isEmpty() && replacements.containsKey(name.get())) {
      key = name.get();
    }
    if (key.isEmpty()) {
      return meant(node, name.get());
    }
    replaced.add(key);
    Node.Scalar by = replacements.get(key);
    return meant(by, by.text().strip());
  }

  private Optional<Fill> meant(Node node, String name) {
    Optional<Fill> fill = known.get(name);
    if (fill == null) {
      fill = lookedUp(name);
      if (fill == null) {
        reportUnknown(node, name);
        return Optional.empty();
      }
      known.put(name, fill);
    }
    return fill;
  }

  /** The fill; empty if its definition has a mistake; null if nothing has that name. */
  private Optional<Fill> lookedUp(String name) {
    Optional<Space> space = spaces.spaces().get(name);
    if (space != null) {
      return space.isPresent() ? Optional.of(space.get()) : Optional.empty();
    }
    Optional<AirCavity> air = cavities.cavities().get(name);
    if (air != null) {
      return air.isPresent() ? Optional.of(air.get()) : Optional.empty();
    }
    Optional<Material> material = materials.materials().get(name);
    if (material != null) {
      Optional<Entry> entry = materials.libraryEntry(name);
      if (entry.isPresent()) {
        assume(name, entry.get());
      }
      Optional<Assumption> conversion = materials.conversion(name);
      if (conversion.isPresent()) {
        pass.assume(conversion.get());
      }
      return material.isPresent() ? Optional.of(material.get()) : Optional.empty();
    }
    if (name.equals(HOLLOW)) {
      return Optional.of(new Hollow(HOLLOW));
    }
    Optional<Entry> entry = Library.find(name);
    if (entry.isEmpty()) {
      return null;
    }
    // The library's own name, so that two ways to write it are one material.
    String own = entry.get().name();
    boolean taken =
        materials.materials().containsKey(own)
            || spaces.spaces().containsKey(own)
            || cavities.cavities().containsKey(own);
    String called = taken ? name : own;
    assume(called, entry.get());
    return Optional.of(MaterialReader.of(called, entry.get()));
  }

  private void assume(String name, Entry entry) {
    if (assumed.add(name)) {
      String of = name.equals(entry.name()) ? "" : " (" + entry.name() + ")";
      pass.assume(
          "conductivity of " + name + of,
          Figures.of(entry.conductivityWPerMK()) + " W/(m·K)",
          "library: " + MaterialReader.sourceOf(entry));
    }
  }

  private void reportUnknown(Node node, String name) {
    List<String> valid = new ArrayList<>(materials.materials().keySet());
    valid.addAll(spaces.spaces().keySet());
    valid.addAll(cavities.cavities().keySet());
    valid.add(HOLLOW);
    String right = Problems.suggestion(name, valid);
    if (name.equals(GlazingReader.GAP)) {
      right = "a stack with a `gap` needs `glazing: {U: …}` beside its `layers`";
    } else if (!right.startsWith("did")) {
      List<String> near = Library.nearest(name);
      right =
          near.isEmpty()
              ? "define it under `materials`, or see `cli/coldseam materials`"
              : "did you mean " + Fields.orList(near) + " of the library?";
    }
    pass.problems()
        .add(
            node,
            "`"
                + Node.shortened(name)
                + "` is no material or space of this case, nor a material of the library",
            right);
  }

  /**
   * A fill as it is after a motion: the direction of an orthotropic material turns with the shape.
   *
   * @param fill the fill
   * @param motion the motion
   * @return the same fill unless it is orthotropic and its direction changes
   */
  Fill turned(Fill fill, Motion motion) {
    if (!(fill instanceof Material material) || material.isotropic()) {
      return fill;
    }
    String name = material.name();
    int cut = name.indexOf(TURNED);
    String base = cut < 0 ? name : name.substring(0, cut);
    Optional<Material> original = materials.materials().getOrDefault(base, Optional.empty());
    double degrees = halfTurn(Math.toDegrees(motion.direction(material.angleRad())));
    boolean asWritten =
        original.isPresent() && near(halfTurn(Math.toDegrees(original.get().angleRad())), degrees);
    if (asWritten) {
      return original.get();
    }
    String called = base + TURNED + Figures.of(degrees) + " deg";
    Material made =
        new Material(
            called,
            material.conductivityWPerMK(),
            material.crossConductivityWPerMK(),
            Math.toRadians(degrees),
            material.relativeTolerance(),
            material.emissivity(),
            material.vapourResistanceFactor(),
            material.source());
    Material first = turned.putIfAbsent(called, made);
    return first == null ? made : first;
  }

  private static final String TURNED = ", along ";

  /** A direction is the same after half a turn: 0 up to 180 degrees. */
  private static double halfTurn(double degrees) {
    double turn = degrees % 180;
    turn = turn < 0 ? turn + 180 : turn;
    return near(turn, 180) || near(turn, 0) ? 0 : turn;
  }

  private static boolean near(double a, double b) {
    return Math.abs(a - b) < 1e-9;
  }
}
