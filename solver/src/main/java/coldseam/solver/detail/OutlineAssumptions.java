package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Says which cut-off planes there are and where two spaces touch without anything between. */
final class OutlineAssumptions {
  private final OutlineReading reading;
  private final Partition partition;

  OutlineAssumptions(OutlineReading reading) {
    this.reading = reading;
    partition = reading.partition();
  }

  List<Assumption> list() {
    List<Assumption> lines = new ArrayList<>();
    for (CutOffPlane plane : reading.cutOffPlanes()) {
      lines.add(
          new Assumption(
              plane.symmetry() ? "plane of symmetry" : "cut-off plane",
              Wording.place(point(plane.first()))
                  + " to "
                  + Wording.place(point(plane.last()))
                  + ", "
                  + Wording.length(plane.lengthM())
                  + ", no heat crosses",
              plane.stated()
                  ? "stated in the case"
                  : "ISO 10211, adiabatic where the drawing ends"));
    }
    lines.addAll(touchingSpaces());
    return lines;
  }

  private List<Assumption> touchingSpaces() {
    Map<String, Double> lengths = new TreeMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      int left = partition.leftLabel(edge);
      int right = partition.rightLabel(edge);
      if (left != Partition.NONE
          && right != Partition.NONE
          && left != right
          && reading.fills().get(left) instanceof Space a
          && reading.fills().get(right) instanceof Space b) {
        boolean ordered = a.name().compareTo(b.name()) < 0;
        String pair = ordered ? a.name() + " and " + b.name() : b.name() + " and " + a.name();
        lengths.put(pair, lengths.getOrDefault(pair, 0.0) + partition.edgeLength(edge));
      }
    }
    List<Assumption> lines = new ArrayList<>();
    for (Map.Entry<String, Double> touching : lengths.entrySet()) {
      lines.add(
          new Assumption(
              "spaces that touch: " + touching.getKey(),
              Wording.length(touching.getValue())
                  + " with nothing between; no heat is counted there",
              "by convention of this tool"));
    }
    return lines;
  }

  private Point point(int vertex) {
    return new Point(
        partition.origin().x() + partition.x(vertex), partition.origin().y() + partition.y(vertex));
  }
}
