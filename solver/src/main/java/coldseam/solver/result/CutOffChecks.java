package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.CutOffPlane;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Checks of the cut-off planes (ISO 10211:2017, rules for cut-off planes): unless it is a plane of
 * symmetry, a plane lies at least 1 m, and three times the thickness of the flanking element, from
 * the central element; and temperatures along it are those of one-dimensional flow.
 */
final class CutOffChecks {
  private static final double LEAST_DISTANCE_M = 1;
  private static final double LEAST_THICKNESSES = 3;

  /** Rounding allowed on the distance, relative. */
  private static final double ROUNDING = 1e-6;

  /**
   * Departure from one-dimensional flow above which a warning is given, as a part of the
   * temperature difference.
   */
  static final double PROFILE_DEPARTURE = 0.005;

  private final Outline outline;
  private final List<Plane> planes = new ArrayList<>();

  /** A cut-off plane between two surfaces, with its layers. */
  private record Plane(
      CutOffPlane plane, FlankEnd first, FlankEnd last, FlankLayers.Reading reading) {}

  CutOffChecks(Outline outline) {
    this.outline = outline;
    for (CutOffPlane plane : outline.conditions().cutOffPlanes()) {
      int before = outline.previous(plane.edges().get(0));
      int after = outline.next(plane.edges().get(plane.edges().size() - 1));
      if (plane.symmetry() || before < 0 || after < 0) {
        continue;
      }
      FlankEnd first =
          new FlankEnd(plane.first(), before, false, outline.conditions().space(before));
      FlankEnd last = new FlankEnd(plane.last(), after, true, outline.conditions().space(after));
      if (first.space() >= 0 && last.space() >= 0) {
        planes.add(new Plane(plane, first, last, FlankLayers.read(outline, plane, first, last)));
      }
    }
  }

  boolean any() {
    return !planes.isEmpty();
  }

  /** Warnings that need no solution. */
  List<String> distances() {
    List<String> warnings = new ArrayList<>();
    for (Plane plane : planes) {
      Optional<FlankLayers> layers = plane.reading().layers();
      if (layers.isEmpty()) {
        if (plane.first().space() != plane.last().space()) {
          warnings.add(
              where(plane)
                  + ": the section is not layered there ("
                  + plane.reading().reason()
                  + "); ISO 10211 asks for a plane of symmetry or for undisturbed flow");
        }
        continue;
      }
      double thickness = layers.get().thicknessM();
      double least = Math.max(LEAST_DISTANCE_M, LEAST_THICKNESSES * thickness);
      double distance = undisturbed(plane, layers.get());
      if (distance < least * (1 - ROUNDING)) {
        warnings.add(
            where(plane)
                + ": the section changes "
                + Wording.length(distance)
                + " from it; ISO 10211 asks for "
                + Wording.length(least)
                + " (1 m, and three times the "
                + Wording.length(thickness)
                + " of the element) or a plane of symmetry");
      }
    }
    return warnings;
  }

  private String where(Plane plane) {
    return "cut-off plane "
        + Wording.place(outline.point(plane.plane().first()))
        + " to "
        + Wording.place(outline.point(plane.plane().last()));
  }

  /** How far from the plane the layers go on as they are, m. */
  private double undisturbed(Plane plane, FlankLayers layers) {
    Partition partition = outline.partition();
    LayerStrip strip = new LayerStrip(outline, plane.plane(), plane.first(), plane.last(), layers);
    double least = Double.POSITIVE_INFINITY;
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      boolean border = partition.leftLabel(edge) != partition.rightLabel(edge);
      boolean conducting =
          outline.conditions().conducts(partition.leftLabel(edge))
              || outline.conditions().conducts(partition.rightLabel(edge));
      if (border && conducting && outline.conditions().kind(edge) != Kind.CUT_OFF) {
        least = Math.min(least, strip.disturbedFrom(edge));
      }
    }
    return least;
  }

  /**
   * Warnings on temperatures along the planes.
   *
   * @param fields the heat-loss field
   * @param temperaturesC temperature of every space
   */
  List<String> profiles(FieldSet fields, double[] temperaturesC) {
    List<String> warnings = new ArrayList<>();
    for (Plane plane : planes) {
      double difference =
          temperaturesC[plane.last().space()] - temperaturesC[plane.first().space()];
      if (plane.reading().layers().isEmpty() || difference == 0) {
        continue;
      }
      double departure = departure(plane, fields, temperaturesC) / Math.abs(difference);
      if (departure > PROFILE_DEPARTURE) {
        warnings.add(
            String.format(
                Locale.ROOT,
                "%s: temperatures along it depart from one-dimensional flow by up to %.1f %% of"
                    + " the temperature difference; move it further away",
                where(plane),
                100 * departure));
      }
    }
    return warnings;
  }

  private double departure(Plane plane, FieldSet fields, double[] temperaturesC) {
    Mesh mesh = fields.solution().mesh();
    Partition partition = outline.partition();
    Direction run = outline.direction(plane.plane().first(), plane.plane().last());
    double worst = 0;
    for (SurfaceTrace.Side side : fields.trace().sides()) {
      if (!plane.plane().edges().contains(side.edge())) {
        continue;
      }
      double start =
          run.dot(
              mesh.x(side.start()) - partition.x(plane.plane().first()),
              mesh.y(side.start()) - partition.y(plane.plane().first()));
      double end =
          run.dot(
              mesh.x(side.end()) - partition.x(plane.plane().first()),
              mesh.y(side.end()) - partition.y(plane.plane().first()));
      for (double s : new double[] {0, 0.5, 1}) {
        double expected = layered(plane, start + s * (end - start), temperaturesC);
        worst = Math.max(worst, Math.abs(side.at(fields.field(), s) - expected));
      }
    }
    return worst;
  }

  /** Temperature of one-dimensional flow at a distance along the plane from its first end. */
  private double layered(Plane plane, double along, double[] temperaturesC) {
    FlankLayers layers = plane.reading().layers().orElseThrow();
    Conditions conditions = outline.conditions();
    double resistance = conditions.filmM2KPerW(plane.first().face());
    for (FlankLayers.Layer layer : layers.layers()) {
      double part = (along - layer.startM()) / (layer.endM() - layer.startM());
      resistance +=
          Math.max(0, Math.min(1, part)) * layer.thicknessM() / layer.conductivityWPerMK();
    }
    double from = temperaturesC[plane.first().space()];
    double to = temperaturesC[plane.last().space()];
    return from + (to - from) * resistance / layers.resistanceM2KPerW();
  }
}
