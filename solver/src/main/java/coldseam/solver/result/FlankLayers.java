package coldseam.solver.result;

import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.CutOffPlane;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The layers met along a cut-off plane. The section is layered there when the two faces and every
 * interface that starts from the plane run in one direction; a thickness is measured perpendicular
 * to that direction, and R = Σ d/λ + Rs + Rs (ISO 6946).
 *
 * @param layers from the first end of the plane to the last
 * @param direction from the plane into the detail, along the layers
 * @param resistanceM2KPerW with the films of the conditions at both faces
 * @param oblique whether the plane is not perpendicular to the layers
 * @param obliqueConductivity whether a principal direction of a conductivity is oblique to them
 */
record FlankLayers(
    List<Layer> layers,
    Direction direction,
    double resistanceM2KPerW,
    boolean oblique,
    boolean obliqueConductivity) {
  /** Sine of the angle up to which faces and interfaces count as parallel. */
  static final double PARALLEL_SINE = 1e-3;

  /**
   * One layer.
   *
   * @param material what it is made of
   * @param label its fill
   * @param thicknessM perpendicular to the layers, m
   * @param startM where it begins, measured along the plane, m
   * @param endM where it ends, measured along the plane, m
   * @param conductivityWPerMK λ across the layer, W/(m·K)
   */
  record Layer(
      Material material,
      int label,
      double thicknessM,
      double startM,
      double endM,
      double conductivityWPerMK) {
    String words() {
      return material.name()
          + " "
          + Wording.length(thicknessM)
          + " (λ "
          + Wording.figure(conductivityWPerMK)
          + ")";
    }
  }

  /** Layers, or why there are none. */
  record Reading(Optional<FlankLayers> layers, String reason) {
    static Reading none(String reason) {
      return new Reading(Optional.empty(), reason);
    }
  }

  /** Thickness of all layers together, m. */
  double thicknessM() {
    double sum = 0;
    for (Layer layer : layers) {
      sum += layer.thicknessM();
    }
    return sum;
  }

  /** Reads the layers at a plane whose two ends continue into faces. */
  static Reading read(Outline outline, CutOffPlane plane, FlankEnd first, FlankEnd last) {
    if (!facesSpace(outline, first) || !facesSpace(outline, last)) {
      return Reading.none("one of its ends meets no surface that faces a space");
    }
    List<Direction> directions = new ArrayList<>();
    directions.add(inward(outline, first));
    directions.add(inward(outline, last));
    List<Stripe> stripes = new ArrayList<>();
    double at = 0;
    for (int i = 0; i < plane.edges().size(); i++) {
      int edge = plane.edges().get(i);
      double length = outline.partition().edgeLength(edge);
      int label = outline.label(edge);
      Stripe before = stripes.isEmpty() ? null : stripes.get(stripes.size() - 1);
      if (before != null && before.label() == label) {
        stripes.set(stripes.size() - 1, new Stripe(label, before.start(), at + length));
      } else {
        if (before != null) {
          int vertex = plane.vertices().get(i);
          List<Integer> interfaces = outline.interfaces(vertex);
          if (interfaces.size() != 1) {
            return Reading.none(interfaces.size() + " interfaces start from one point of it");
          }
          directions.add(outline.direction(vertex, outline.other(interfaces.get(0), vertex)));
        }
        stripes.add(new Stripe(label, at, at + length));
      }
      at += length;
    }
    Direction along = directions.get(0);
    for (Direction direction : directions) {
      if (Math.abs(along.cross(direction)) > PARALLEL_SINE || along.dot(direction) < 0) {
        return Reading.none("the faces and layers that start from it are not parallel");
      }
    }
    return new Reading(Optional.of(build(outline, plane, first, last, along, stripes)), "");
  }

  private record Stripe(int label, double start, double end) {}

  private static boolean facesSpace(Outline outline, FlankEnd end) {
    return end.face() >= 0
        && (outline.conditions().kind(end.face()) == Kind.FILM
            || outline.conditions().kind(end.face()) == Kind.FIXED);
  }

  private static Direction inward(Outline outline, FlankEnd end) {
    return outline.direction(end.vertex(), outline.other(end.face(), end.vertex()));
  }

  private static FlankLayers build(
      Outline outline,
      CutOffPlane plane,
      FlankEnd first,
      FlankEnd last,
      Direction along,
      List<Stripe> stripes) {
    Direction cut = outline.direction(plane.first(), plane.last());
    double sine = Math.abs(cut.cross(along));
    List<Layer> layers = new ArrayList<>();
    double resistance =
        outline.conditions().filmM2KPerW(first.face())
            + outline.conditions().filmM2KPerW(last.face());
    boolean oblique = false;
    for (Stripe stripe : stripes) {
      Material material = outline.conditions().material(stripe.label());
      double conductivity = across(material, along);
      double thickness = (stripe.end() - stripe.start()) * sine;
      layers.add(
          new Layer(
              material, stripe.label(), thickness, stripe.start(), stripe.end(), conductivity));
      resistance += thickness / conductivity;
      oblique |= obliqueTo(material, along);
    }
    return new FlankLayers(
        List.copyOf(layers), along, resistance, Math.abs(cut.dot(along)) > PARALLEL_SINE, oblique);
  }

  /** n·Λ·n for n perpendicular to the layers. */
  private static double across(Material material, Direction along) {
    double cosine = Math.cos(material.angleRad());
    double sine = Math.sin(material.angleRad());
    double first = -along.y() * cosine + along.x() * sine;
    double second = along.y() * sine + along.x() * cosine;
    return material.conductivityWPerMK() * first * first
        + material.crossConductivityWPerMK() * second * second;
  }

  private static boolean obliqueTo(Material material, Direction along) {
    if (material.isotropic()) {
      return false;
    }
    double cosine = Math.cos(material.angleRad());
    double sine = Math.sin(material.angleRad());
    return Math.abs(along.dot(cosine, sine) * along.cross(cosine, sine)) > PARALLEL_SINE;
  }
}
