package coldseam.solver.result;

import coldseam.mesh.partition.Defect;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.DefectWords;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Stretch;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What looks doubtful in the drawing, and places asked about that lie outside the section. */
final class SectionChecks {
  /** Part of a stretch that may lie off the outline without a word. */
  private static final double OFF_OUTLINE = 1e-6;

  private final Detail detail;
  private final Outline outline;
  private final Partition partition;

  SectionChecks(Detail detail, Outline outline) {
    this.detail = detail;
    this.outline = outline;
    partition = outline.partition();
  }

  List<String> warnings() {
    List<String> warnings = new ArrayList<>();
    List<String> names = detail.fills().stream().map(Fill::name).toList();
    for (Defect defect : partition.defects()) {
      if (defect.kind() != Defect.Kind.LINE_OFF_EDGE) {
        warnings.add(DefectWords.of(defect, names));
      }
    }
    warnings.addAll(stretchesPartlyOff());
    warnings.addAll(stretchesOverlaid());
    return warnings;
  }

  private List<String> stretchesPartlyOff() {
    double[] on = new double[detail.stretches().size()];
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (outline.contains(edge)) {
        for (int stretch : outline.conditions().stretches(edge)) {
          on[stretch] += partition.edgeLength(edge);
        }
      }
    }
    List<String> warnings = new ArrayList<>();
    for (int i = 0; i < on.length; i++) {
      Stretch stretch = detail.stretches().get(i);
      double drawn = 0;
      for (int k = 1; k < stretch.along().size(); k++) {
        drawn += stretch.along().get(k - 1).distance(stretch.along().get(k));
      }
      double off = drawn - on[i];
      int corners = stretch.along().size();
      if (off > Math.max(OFF_OUTLINE * drawn, corners * Resolution.STANDARD.closeM())) {
        warnings.add(
            "stretch '"
                + stretch.name()
                + "': "
                + Wording.length(off)
                + " of its "
                + Wording.length(drawn)
                + " lie off the outline of the conducting section and count for nothing");
      }
    }
    return warnings;
  }

  /** Stretches whose condition a later one with another condition replaces. */
  private List<String> stretchesOverlaid() {
    Map<List<Integer>, Double> lengths = new LinkedHashMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (!outline.contains(edge)) {
        continue;
      }
      List<Integer> stating = stating(edge);
      for (int k = 0; k < stating.size() - 1; k++) {
        int earlier = stating.get(k);
        int later = stating.get(stating.size() - 1);
        if (!detail
            .stretches()
            .get(earlier)
            .condition()
            .equals(detail.stretches().get(later).condition())) {
          List<Integer> pair = List.of(earlier, later);
          lengths.put(pair, lengths.getOrDefault(pair, 0.0) + partition.edgeLength(edge));
        }
      }
    }
    List<String> warnings = new ArrayList<>();
    for (Map.Entry<List<Integer>, Double> overlaid : lengths.entrySet()) {
      String earlier = detail.stretches().get(overlaid.getKey().get(0)).name();
      String later = detail.stretches().get(overlaid.getKey().get(1)).name();
      warnings.add(
          "stretches '"
              + earlier
              + "' and '"
              + later
              + "' say different things along the same "
              + Wording.length(overlaid.getValue())
              + ": the later one, '"
              + later
              + "', counts there");
    }
    return warnings;
  }

  /** The stretches on an edge that state a condition, the one that counts last. */
  private List<Integer> stating(int edge) {
    List<Integer> stating = new ArrayList<>();
    for (int stretch : outline.conditions().stretches(edge)) {
      if (detail.stretches().get(stretch).condition().isPresent()) {
        stating.add(stretch);
      }
    }
    return stating;
  }

  /** Faults of points and profiles asked for. */
  List<Fault> faults() {
    List<Fault> faults = new ArrayList<>();
    SectionShape shape = new SectionShape(outline);
    double reach = Resolution.STANDARD.closeM() + partition.largestDisplacementM();
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Temperature point && !shape.contains(point.at())) {
        double distance = shape.distanceToOutline(point.at());
        if (distance > reach) {
          faults.add(pointOutside(point.name(), point.at(), distance));
        }
      } else if (wanted instanceof Wanted.Profile line && line.points() < 2) {
        faults.add(
            new Fault(
                "profile", line.name(), "needs two points or more", Optional.of(line.from())));
      } else if (wanted instanceof Wanted.SurfaceProfile surface) {
        checkSpace(surface, faults);
      }
    }
    return faults;
  }

  private void checkSpace(Wanted.SurfaceProfile surface, List<Fault> faults) {
    int space = detail.spaceIndex(surface.space());
    if (space < 0) {
      faults.add(
          new Fault(
              "profile",
              surface.name(),
              "names '" + surface.space() + "', which is not one of the spaces",
              Optional.empty()));
    } else if (!Couplings.faced(partition.edgeCount(), outline.conditions()).get(space)) {
      faults.add(
          new Fault(
              "profile",
              surface.name(),
              "'" + surface.space() + "' touches no material",
              Optional.empty()));
    }
  }

  private static Fault pointOutside(String name, Point at, double distance) {
    return new Fault(
        "point",
        name,
        "lies outside the conducting section, " + Wording.length(distance) + " from its outline",
        Optional.of(at));
  }
}
