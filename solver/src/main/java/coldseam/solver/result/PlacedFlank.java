package coldseam.solver.result;

import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.CutOffPlane;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Flank;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A flank with its place in the detail.
 *
 * @param name its name in the case, or the one given here
 * @param typed what the case says of it
 * @param plane its cut-off plane; empty if it is typed altogether
 * @param warm the warmer space it separates, or −1
 * @param cold the colder space, or −1
 * @param warmEnd the end of the plane at the warmer space
 * @param coldEnd the end at the colder space
 * @param innerIsWarm whether internal dimensions are measured on the warm side
 * @param reading the layers met at the plane
 */
record PlacedFlank(
    String name,
    Optional<Flank> typed,
    Optional<CutOffPlane> plane,
    int warm,
    int cold,
    Optional<FlankEnd> warmEnd,
    Optional<FlankEnd> coldEnd,
    boolean innerIsWarm,
    FlankLayers.Reading reading) {

  /** U of the drawn layers, W/(m²·K); empty if the section is not layered at the plane. */
  OptionalDouble drawnUWPerM2K() {
    return reading.layers().isPresent()
        ? OptionalDouble.of(1 / reading.layers().get().resistanceM2KPerW())
        : OptionalDouble.empty();
  }

  /** U as typed, else of the drawn layers. */
  Optional<Bracket> uWPerM2K() {
    Optional<Bracket> stated = statedUWPerM2K();
    if (stated.isPresent() || drawnUWPerM2K().isEmpty()) {
      return stated;
    }
    return Optional.of(Bracket.of(drawnUWPerM2K().getAsDouble()));
  }

  /** How U depends on materials and films; empty if it is typed. */
  Optional<ByPart> byPart(Detail detail, Conditions conditions) {
    if (typedU() || reading.layers().isEmpty() || warmEnd.isEmpty() || coldEnd.isEmpty()) {
      return Optional.empty();
    }
    List<FlankLayers.Layer> layers = reading.layers().get().layers();
    List<Part> parts = new ArrayList<>();
    double[] resistances = new double[layers.size() + 2];
    for (FlankLayers.Layer layer : layers) {
      resistances[parts.size()] = layer.thicknessM() / layer.conductivityWPerMK();
      parts.add(Part.of(layer.material()));
    }
    for (FlankEnd end : List.of(warmEnd.get(), coldEnd.get())) {
      resistances[parts.size()] = conditions.filmM2KPerW(end.face());
      parts.add(
          Part.film(detail.spaces().get(end.space()).name(), conditions.filmM2KPerW(end.face())));
    }
    return Optional.of(ByPart.layers(parts, resistances));
  }

  private Optional<Bracket> statedUWPerM2K() {
    return typed.isEmpty() ? Optional.empty() : typed.get().typedUWPerM2K();
  }

  boolean typedU() {
    return statedUWPerM2K().isPresent();
  }

  Optional<FlankEnd> inner() {
    return innerIsWarm ? warmEnd : coldEnd;
  }

  Optional<FlankEnd> outer() {
    return innerIsWarm ? coldEnd : warmEnd;
  }

  /** The layers in words, warm to cold. */
  List<String> layerWords() {
    if (reading.layers().isEmpty()) {
      return List.of();
    }
    List<String> words = new ArrayList<>();
    for (FlankLayers.Layer layer : reading.layers().get().layers()) {
      words.add(layer.words());
    }
    if (plane.isPresent() && warmEnd.isPresent() && warmEnd.get().vertex() != plane.get().first()) {
      Collections.reverse(words);
    }
    return words;
  }

  String uWords() {
    if (typedU()) {
      return "U typed in the case";
    }
    return "U from the layers met at the cut-off plane: " + String.join(", ", layerWords());
  }

  /** The two ends of its plane in words. */
  String placeWords(Outline outline) {
    if (plane.isEmpty()) {
      return "no plane of its own";
    }
    return "the cut-off plane "
        + Wording.place(outline.point(plane.get().first()))
        + " to "
        + Wording.place(outline.point(plane.get().last()));
  }

  Map<DimensionSystem, Double> typedLengths() {
    return typed.isEmpty() ? Map.of() : typed.get().typedLengthM();
  }
}
