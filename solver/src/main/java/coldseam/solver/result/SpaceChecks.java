package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.BinaryOperator;

/** What looks doubtful in the spaces: air that meets other air, and temperatures. */
final class SpaceChecks {
  private final Detail detail;
  private final Outline outline;
  private final Partition partition;

  SpaceChecks(Detail detail, Outline outline) {
    this.detail = detail;
    this.outline = outline;
    partition = outline.partition();
  }

  List<String> warnings() {
    List<String> warnings = meetingSpaces();
    warnings.addAll(warmOutside());
    warnings.addAll(equalTemperatures());
    return warnings;
  }

  /** Edges along which two spaces meet with nothing between them. */
  private List<String> meetingSpaces() {
    List<Fill> fills = detail.fills();
    Map<String, Point> places = new TreeMap<>();
    Map<String, Double> lengths = new TreeMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      int a = Math.min(partition.leftLabel(edge), partition.rightLabel(edge));
      int b = Math.max(partition.leftLabel(edge), partition.rightLabel(edge));
      if (a != Partition.NONE
          && fills.get(a) instanceof Space one
          && fills.get(b) instanceof Space other
          && unlike(one, other)) {
        String pair = "'" + one.name() + "' meets '" + other.name() + "'";
        for (int end : new int[] {partition.edgeStart(edge), partition.edgeEnd(edge)}) {
          places.merge(pair, outline.point(end), BinaryOperator.minBy(Outline.LEFT_TO_RIGHT));
        }
        lengths.merge(pair, partition.edgeLength(edge), Double::sum);
      }
    }
    List<String> warnings = new ArrayList<>();
    lengths.forEach(
        (pair, length) ->
            warnings.add(
                pair
                    + " with nothing between them along "
                    + Wording.length(length)
                    + " from "
                    + Wording.place(places.get(pair))
                    + ": no heat is counted there"));
    return warnings;
  }

  /** Zones of one room with films of their own may meet; other spaces are kept apart. */
  private static boolean unlike(Space one, Space other) {
    return !one.name().equals(other.name())
        && (one.exposure() != other.exposure()
            || one.floating().isPresent()
            || other.floating().isPresent()
            || one.temperatureC() != other.temperatureC());
  }

  /** Each outside space with the coldest of the inside ones colder than it. */
  private List<String> warmOutside() {
    List<String> warnings = new ArrayList<>();
    for (Space outside : stated(Exposure.OUTSIDE)) {
      stated(Exposure.INSIDE).stream()
          .filter(inside -> inside.temperatureC() < outside.temperatureC())
          .min((a, b) -> Double.compare(a.temperatureC(), b.temperatureC()))
          .ifPresent(
              inside ->
                  warnings.add(
                      "outside '"
                          + outside.name()
                          + "' at "
                          + Wording.figure(outside.temperatureC())
                          + " °C is warmer than inside '"
                          + inside.name()
                          + "' at "
                          + Wording.figure(inside.temperatureC())
                          + " °C: is it meant?"));
    }
    return warnings;
  }

  private List<Space> stated(Exposure exposure) {
    return detail.spaces().stream()
        .filter(space -> space.floating().isEmpty() && space.exposure() == exposure)
        .toList();
  }

  private List<String> equalTemperatures() {
    double[] stated =
        detail.spaces().stream()
            .filter(space -> space.floating().isEmpty())
            .mapToDouble(Space::temperatureC)
            .distinct()
            .toArray();
    if (detail.spaces().size() < 2 || stated.length != 1 || heated()) {
      return List.of();
    }
    return List.of(
        "every space is at "
            + Wording.figure(stated[0])
            + " °C: no heat flows; only L2D, ψ and U have a meaning");
  }

  private boolean heated() {
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (outline.conditions().kind(edge) == Kind.FLOW
          && outline.conditions().flowWPerM2(edge) != 0) {
        return true;
      }
    }
    return false;
  }
}
