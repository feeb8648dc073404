package coldseam.solver.result;

import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The undisturbed construction where a body of revolution ends. At a cut-off cylinder of radius R
 * it is a plane wall of layers along the axis: U over the area πR² of the cylinder's cross-section,
 * all of it where the body lies inside, taken off it again where the body lies outside. At cut-off
 * planes square to the axis it is a pipe of layers around the axis: 2π/Σ(Rs/r + ln(r₂/r₁)/λ) for
 * each metre between the two planes.
 *
 * @param placed the flank; of two alike at both ends of a pipe, the first
 * @param name its name, or both
 * @param area whether it counts by area, else by length
 * @param conductance per m² or per m
 * @param extent area, m², or length, m
 * @param reason why it cannot be counted; empty if it can
 */
record RoundFlank(
    PlacedFlank placed,
    String name,
    boolean area,
    double conductance,
    double extent,
    String reason) {
  /** Relative difference up to which the pipes at both ends are alike. */
  private static final double ALIKE = 1e-6;

  /**
   * The flanks of a body of revolution.
   *
   * @param outline its outline
   * @param placed the flanks at cut-off planes of its section
   */
  static List<RoundFlank> of(Outline outline, List<PlacedFlank> placed) {
    List<RoundFlank> flanks = new ArrayList<>();
    List<PlacedFlank> pipes = new ArrayList<>();
    for (PlacedFlank flank : placed) {
      Direction run = outline.direction(first(flank), last(flank));
      if (Math.abs(run.x()) <= FlankLayers.PARALLEL_SINE) {
        flanks.add(cylinder(outline, flank, run));
      } else if (Math.abs(run.y()) <= FlankLayers.PARALLEL_SINE) {
        pipes.add(flank);
      } else {
        flanks.add(uncounted(flank, "its plane is neither parallel to the axis nor square to it"));
      }
    }
    flanks.addAll(pipes(outline, pipes));
    return flanks;
  }

  private static int first(PlacedFlank flank) {
    return flank.plane().orElseThrow().first();
  }

  private static int last(PlacedFlank flank) {
    return flank.plane().orElseThrow().last();
  }

  private static RoundFlank uncounted(PlacedFlank flank, String reason) {
    return new RoundFlank(flank, flank.name(), false, Double.NaN, Double.NaN, reason);
  }

  private static RoundFlank cylinder(Outline outline, PlacedFlank flank, Direction run) {
    if (flank.drawnUWPerM2K().isEmpty()) {
      return uncounted(flank, flank.reading().reason());
    }
    double radius = outline.point(first(flank)).x();
    // walked with the body on the left, a plane it lies inside of runs upward
    double area = Math.copySign(Math.PI * radius * radius, run.y());
    return new RoundFlank(flank, flank.name(), true, flank.drawnUWPerM2K().getAsDouble(), area, "");
  }

  /** Pipes count together by the length between the two ends, if these are alike. */
  private static List<RoundFlank> pipes(Outline outline, List<PlacedFlank> pipes) {
    List<RoundFlank> flanks = new ArrayList<>();
    for (PlacedFlank pipe : pipes) {
      if (pipe.reading().layers().isEmpty()) {
        flanks.add(uncounted(pipe, pipe.reading().reason()));
      }
    }
    if (!flanks.isEmpty() || pipes.isEmpty()) {
      return flanks;
    }
    PlacedFlank one = pipes.get(0);
    double conductance = conductance(outline, one);
    double length = 0;
    boolean alike = pipes.size() == 2;
    for (PlacedFlank other : pipes) {
      double difference = Math.abs(conductance(outline, other) - conductance);
      alike &= difference <= ALIKE * conductance;
      alike &= other.warm() == one.warm() && other.cold() == one.cold();
      length = Math.abs(outline.point(first(other)).y() - outline.point(first(one)).y());
    }
    if (!alike || !(length > 0)) {
      flanks.add(uncounted(one, "it is not the same at two ends, so that its length is open"));
      return flanks;
    }
    String name = one.name() + " and " + pipes.get(1).name();
    flanks.add(new RoundFlank(one, name, false, conductance, length, ""));
    return flanks;
  }

  private static double conductance(Outline outline, PlacedFlank pipe) {
    double sum = 0;
    for (double resistance : resistances(outline, pipe)) {
      sum += resistance;
    }
    return 1 / sum;
  }

  /** Of its layers, then of the films at the warm and at the cold end, for a metre, m·K/W. */
  private static double[] resistances(Outline outline, PlacedFlank pipe) {
    List<FlankLayers.Layer> layers = pipe.reading().layers().orElseThrow().layers();
    double start = outline.point(first(pipe)).x();
    double towards = Math.signum(outline.point(last(pipe)).x() - start);
    double[] resistances = new double[layers.size() + 2];
    for (int i = 0; i < layers.size(); i++) {
      double from = start + towards * layers.get(i).startM();
      double to = start + towards * layers.get(i).endM();
      resistances[i] =
          Math.abs(Math.log(to / from)) / (2 * Math.PI * layers.get(i).conductivityWPerMK());
    }
    int at = layers.size();
    for (FlankEnd end : ends(pipe)) {
      double radius = outline.point(end.vertex()).x();
      resistances[at++] = outline.conditions().filmM2KPerW(end.face()) / (2 * Math.PI * radius);
    }
    return resistances;
  }

  private static List<FlankEnd> ends(PlacedFlank flank) {
    return List.of(flank.warmEnd().orElseThrow(), flank.coldEnd().orElseThrow());
  }

  /** What it takes off. */
  Result.PointTerm term() {
    Bracket value = Bracket.of(conductance * extent);
    String layers = String.join(", ", placed.layerWords());
    if (area) {
      return new Result.PointTerm(
          name,
          Optional.of(Bracket.of(conductance)),
          OptionalDouble.of(extent),
          Optional.empty(),
          OptionalDouble.empty(),
          value,
          "U "
              + Wording.figure(conductance)
              + " W/(m²·K) of the layers met at the cut-off cylinder ("
              + layers
              + ") times the area "
              + Wording.figure(extent)
              + " m² within it");
    }
    return new Result.PointTerm(
        name,
        Optional.empty(),
        OptionalDouble.empty(),
        Optional.of(Bracket.of(conductance)),
        OptionalDouble.of(extent),
        value,
        Wording.figure(conductance)
            + " W/(m·K) of the layers around the axis ("
            + layers
            + ") times the length "
            + Wording.length(extent)
            + " between the cut-off planes");
  }

  /** How its conductance depends on materials and films. */
  ByPart byPart(Detail detail, Outline outline) {
    Conditions conditions = outline.conditions();
    if (area) {
      return placed.byPart(detail, conditions).orElseThrow();
    }
    List<Part> parts = new ArrayList<>();
    for (FlankLayers.Layer layer : placed.reading().layers().orElseThrow().layers()) {
      parts.add(Part.of(layer.material()));
    }
    for (FlankEnd end : ends(placed)) {
      parts.add(
          Part.film(detail.spaces().get(end.space()).name(), conditions.filmM2KPerW(end.face())));
    }
    return ByPart.layers(parts, resistances(outline, placed));
  }
}
