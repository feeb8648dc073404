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
import java.util.Optional;
import java.util.TreeMap;

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
          Point at = outline.point(end);
          Point first = places.get(pair);
          if (first == null || Outline.LEFT_TO_RIGHT.compare(at, first) < 0) {
            places.put(pair, at);
          }
        }
        lengths.put(pair, lengths.getOrDefault(pair, 0.0) + partition.edgeLength(edge));
      }
    }
    List<String> warnings = new ArrayList<>();
    for (Map.Entry<String, Double> meeting : lengths.entrySet()) {
      warnings.add(
          meeting.getKey()
              + " with nothing between them along "
              + Wording.length(meeting.getValue())
              + " from "
              + Wording.place(places.get(meeting.getKey()))
              + ": no heat is counted there");
    }
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
    Optional<Space> coldestInside = coldestInside();
    if (coldestInside.isEmpty()) {
      return warnings;
    }
    Space inside = coldestInside.get();
    for (Space outside : detail.spaces()) {
      if (outside.floating().isEmpty()
          && outside.exposure() == Exposure.OUTSIDE
          && outside.temperatureC() > inside.temperatureC()) {
        warnings.add(
            "outside '"
                + outside.name()
                + "' at "
                + Wording.figure(outside.temperatureC())
                + " °C is warmer than inside '"
                + inside.name()
                + "' at "
                + Wording.figure(inside.temperatureC())
                + " °C: is it meant?");
      }
    }
    return warnings;
  }

  /** The coldest inside space of stated temperature, the first of several. */
  private Optional<Space> coldestInside() {
    Space coldest = null;
    for (Space space : detail.spaces()) {
      if (space.floating().isEmpty()
          && space.exposure() == Exposure.INSIDE
          && (coldest == null || space.temperatureC() < coldest.temperatureC())) {
        coldest = space;
      }
    }
    return Optional.ofNullable(coldest);
  }

  private List<String> equalTemperatures() {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (Space space : detail.spaces()) {
      if (space.floating().isEmpty()) {
        lowest = Math.min(lowest, space.temperatureC());
        highest = Math.max(highest, space.temperatureC());
      }
    }
    if (detail.spaces().size() < 2 || lowest != highest || heated()) {
      return List.of();
    }
    return List.of(
        "every space is at "
            + Wording.figure(lowest)
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
