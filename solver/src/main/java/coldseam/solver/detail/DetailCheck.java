package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Conditions.Kind;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/** Everything that keeps a detail from being solved, found in one go. */
final class DetailCheck {
  private final OutlineReading reading;
  private final Detail detail;
  private final Partition partition;

  DetailCheck(OutlineReading reading) {
    this.reading = reading;
    detail = reading.detail();
    partition = reading.partition();
  }

  List<Fault> faults() {
    List<Fault> faults = new ArrayList<>(reading.faults());
    if (nothingConducts()) {
      faults.add(
          new Fault(
              "section",
              "",
              "no material with a conductivity above 0 is left in the section",
              Optional.empty()));
      return faults;
    }
    faults.addAll(spacesFacingNothing());
    faults.addAll(stretchesOffOutline());
    int[] part = edgeConnectedParts();
    faults.addAll(isolatedParts(part));
    faults.addAll(driftingSpaces(part));
    return faults;
  }

  private boolean nothingConducts() {
    for (int face = 0; face < partition.faceCount(); face++) {
      if (conducting(face)) {
        return false;
      }
    }
    return true;
  }

  private List<Fault> spacesFacingNothing() {
    BitSet faced = new BitSet();
    for (int space : reading.spaces()) {
      if (space >= 0) {
        faced.set(space);
      }
    }
    for (Space space : detail.spaces()) {
      if (space.floating().isPresent()) {
        int to = detail.spaceIndex(space.floating().get().to());
        if (to >= 0) {
          faced.set(to);
        }
      }
    }
    List<Fault> faults = new ArrayList<>();
    for (int i = 0; i < detail.spaces().size(); i++) {
      if (!faced.get(i)) {
        faults.add(
            new Fault(
                "space",
                detail.spaces().get(i).name(),
                "touches no material; lay it where it meets the section, or let a stretch of the"
                    + " outline face it",
                Optional.empty()));
      }
    }
    return faults;
  }

  private List<Fault> stretchesOffOutline() {
    double[] on = new double[detail.stretches().size()];
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (reading.outline(edge)) {
        for (int line : partition.linesOn(edge)) {
          if (line < on.length) {
            on[line] += partition.edgeLength(edge);
          }
        }
      }
    }
    List<Fault> faults = new ArrayList<>();
    for (int i = 0; i < on.length; i++) {
      Stretch stretch = detail.stretches().get(i);
      if (on[i] == 0) {
        faults.add(
            new Fault(
                "stretch",
                stretch.name(),
                "none of its "
                    + Wording.length(length(stretch.along()))
                    + " lies on the outline of the conducting section; draw it along an edge where"
                    + " material ends",
                Optional.of(stretch.along().get(0))));
      }
    }
    return faults;
  }

  private static double length(List<Point> along) {
    double sum = 0;
    for (int i = 1; i < along.size(); i++) {
      sum += along.get(i - 1).distance(along.get(i));
    }
    return sum;
  }

  private List<Fault> isolatedParts(int[] part) {
    BitSet held = new BitSet();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (reading.kinds()[edge] == Kind.FILM || reading.kinds()[edge] == Kind.FIXED) {
        held.set(root(part, conductingFace(edge)));
      }
    }
    List<Fault> faults = new ArrayList<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      if (conducting(face) && root(part, face) == face && !held.get(face)) {
        String materials = materials(part, face);
        Point at = corner(face);
        faults.add(
            new Fault(
                "section",
                materials,
                "a part of the section around "
                    + Wording.place(at)
                    + " ("
                    + materials
                    + ") touches no space, so that its temperature is undetermined",
                Optional.of(at)));
      }
    }
    return faults;
  }

  /** The materials of a part in words, in alphabetical order. */
  private String materials(int[] part, int root) {
    Set<String> names = new TreeSet<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      if (conducting(face) && root(part, face) == root) {
        names.add(reading.fills().get(partition.faceLabel(face)).name());
      }
    }
    return String.join(", ", names);
  }

  /** Floating spaces that no part of the section and no conductance connects with a stated one. */
  private List<Fault> driftingSpaces(int[] part) {
    List<Fault> faults = new ArrayList<>();
    List<Space> spaces = detail.spaces();
    int[] group = singles(spaces.size());
    for (int i = 0; i < spaces.size(); i++) {
      joinByConductance(group, i, faults);
    }
    joinAcrossSection(group, part);
    BitSet anchored = new BitSet();
    for (int i = 0; i < spaces.size(); i++) {
      if (spaces.get(i).floating().isEmpty()) {
        anchored.set(root(group, i));
      }
    }
    for (int i = 0; i < spaces.size(); i++) {
      if (!anchored.get(root(group, i))) {
        faults.add(
            new Fault(
                "space",
                spaces.get(i).name(),
                "floats, but nothing connects it with a space of stated temperature",
                Optional.empty()));
      }
    }
    return faults;
  }

  private void joinByConductance(int[] group, int space, List<Fault> faults) {
    Optional<Space.Floating> floating = detail.spaces().get(space).floating();
    if (floating.isEmpty() || floating.get().conductanceWPerMK() == 0) {
      return;
    }
    int to = detail.spaceIndex(floating.get().to());
    if (to >= 0 && to != space) {
      join(group, space, to);
      return;
    }
    faults.add(
        new Fault(
            "space",
            detail.spaces().get(space).name(),
            "its conductance leads to '"
                + floating.get().to()
                + "', which is not another of the spaces",
            Optional.empty()));
  }

  private void joinAcrossSection(int[] group, int[] part) {
    Map<Integer, Integer> firstSpace = new TreeMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      int space = reading.spaces()[edge];
      if (space >= 0) {
        Integer first = firstSpace.putIfAbsent(root(part, conductingFace(edge)), space);
        if (first != null) {
          join(group, first, space);
        }
      }
    }
  }

  private int conductingFace(int edge) {
    return reading.conductsLeft(edge) ? partition.leftFace(edge) : partition.rightFace(edge);
  }

  private static int[] singles(int size) {
    int[] set = new int[size];
    for (int i = 0; i < size; i++) {
      set[i] = i;
    }
    return set;
  }

  private static void join(int[] set, int one, int other) {
    int a = root(set, one);
    int b = root(set, other);
    set[Math.max(a, b)] = Math.min(a, b);
  }

  private int[] edgeConnectedParts() {
    int[] part = singles(partition.faceCount());
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (reading.inside(edge)) {
        join(part, partition.leftFace(edge), partition.rightFace(edge));
      }
    }
    return part;
  }

  private static int root(int[] part, int face) {
    int root = face;
    while (part[root] != root) {
      part[root] = part[part[root]];
      root = part[root];
    }
    return root;
  }

  private boolean conducting(int face) {
    return reading.materials()[partition.faceLabel(face)] != null;
  }

  private Point corner(int face) {
    int vertex = partition.faceRings(face).get(0)[0];
    return new Point(
        partition.origin().x() + partition.x(vertex), partition.origin().y() + partition.y(vertex));
  }
}
