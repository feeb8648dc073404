package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.CutOffPlane;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Flank;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Finds the flanks of a detail: named ones at the cut-off plane next to their point, and every
 * other cut-off plane, not marked as one of symmetry, whose two ends continue into surfaces that
 * face different spaces.
 */
final class FlankFinder {
  /** How far from its plane the point of a named flank may lie, as a part of the extent. */
  private static final double NEAR = 0.25;

  private final Detail detail;
  private final Outline outline;
  private final boolean frame;
  private final List<Fault> faults = new ArrayList<>();
  private final List<PlacedFlank> flanks = new ArrayList<>();

  FlankFinder(Detail detail, Outline outline) {
    this.detail = detail;
    this.outline = outline;
    frame = FramePlan.wanted(detail).isPresent();
    Map<Integer, Flank> named = attach();
    Set<String> names = new HashSet<>();
    for (Flank flank : detail.flanks()) {
      names.add(flank.name());
      if (flank.cut().isEmpty()) {
        flanks.add(withoutPlane(flank));
      }
    }
    List<CutOffPlane> planes = outline.conditions().cutOffPlanes();
    for (int i = 0; i < planes.size(); i++) {
      CutOffPlane plane = planes.get(i);
      Optional<Flank> typed = Optional.ofNullable(named.get(i));
      FlankEnd first = firstEnd(plane);
      FlankEnd last = lastEnd(plane);
      boolean separates = first.space() >= 0 && last.space() >= 0 && first.space() != last.space();
      if (typed.isPresent() || (separates && !plane.symmetry())) {
        if (typed.isEmpty() && sideOfFrame(plane)) {
          continue;
        }
        String name = typed.isPresent() ? typed.get().name() : freeName(plane, names);
        names.add(name);
        flanks.add(place(name, typed, plane, first, last));
      }
    }
    orderAsNamed();
    for (PlacedFlank flank : flanks) {
      checkU(flank);
    }
  }

  /** Whether a frame is asked for and the plane is not the end of its glazing or panel. */
  private boolean sideOfFrame(CutOffPlane plane) {
    return frame && FrameOutline.role(outline, plane) == Area.Role.OTHER;
  }

  List<PlacedFlank> flanks() {
    return flanks;
  }

  List<Fault> faults() {
    return faults;
  }

  private FlankEnd firstEnd(CutOffPlane plane) {
    int face = outline.previous(plane.edges().get(0));
    return new FlankEnd(plane.first(), face, false, space(face));
  }

  private FlankEnd lastEnd(CutOffPlane plane) {
    int face = outline.next(plane.edges().get(plane.edges().size() - 1));
    return new FlankEnd(plane.last(), face, true, space(face));
  }

  private int space(int face) {
    return face < 0 ? -1 : outline.conditions().space(face);
  }

  private PlacedFlank withoutPlane(Flank flank) {
    return new PlacedFlank(
        flank.name(),
        Optional.of(flank),
        Optional.empty(),
        -1,
        -1,
        Optional.empty(),
        Optional.empty(),
        true,
        FlankLayers.Reading.none("it has no cut-off plane"));
  }

  private PlacedFlank place(
      String name, Optional<Flank> typed, CutOffPlane plane, FlankEnd first, FlankEnd last) {
    boolean firstIsWarm = warmer(first.space(), last.space());
    FlankEnd warm = firstIsWarm ? first : last;
    FlankEnd cold = firstIsWarm ? last : first;
    return new PlacedFlank(
        name,
        typed,
        Optional.of(plane),
        warm.space(),
        cold.space(),
        Optional.of(warm),
        Optional.of(cold),
        innerIsWarm(warm.space(), cold.space()),
        FlankLayers.read(outline, plane, first, last));
  }

  /** Whether space a counts as the warmer; a space whose temperature is a result comes between. */
  private boolean warmer(int a, int b) {
    if (a < 0 || b < 0) {
      return a >= 0;
    }
    double ta = rank(a);
    double tb = rank(b);
    return ta == tb ? a < b : ta > tb;
  }

  private double rank(int space) {
    Space of = detail.spaces().get(space);
    if (of.floating().isEmpty()) {
      return of.temperatureC();
    }
    return detail.meanStatedTemperatureC();
  }

  private boolean innerIsWarm(int warm, int cold) {
    return warm < 0
        || cold < 0
        || detail.spaces().get(warm).exposure() == detail.spaces().get(cold).exposure()
        || detail.spaces().get(warm).exposure() == Exposure.INSIDE;
  }

  /** Named flanks by the index of the cut-off plane they lie at. */
  private Map<Integer, Flank> attach() {
    List<CutOffPlane> planes = outline.conditions().cutOffPlanes();
    Map<Integer, Flank> taken = new HashMap<>();
    double reach = NEAR * extent();
    for (Flank flank : detail.flanks()) {
      if (flank.cut().isEmpty()) {
        continue;
      }
      Point cut = flank.cut().get();
      int nearest = -1;
      double least = Double.POSITIVE_INFINITY;
      for (int i = 0; i < planes.size(); i++) {
        Point first = outline.point(planes.get(i).first());
        double distance = SectionShape.distance(cut, first, outline.point(planes.get(i).last()));
        if (distance < least) {
          least = distance;
          nearest = i;
        }
      }
      if (nearest < 0 || least > reach) {
        fault(flank, "no cut-off plane near its point " + Wording.place(cut) + nearestWords(least));
      } else if (planes.get(nearest).symmetry()) {
        fault(flank, "its cut-off plane is marked as a plane of symmetry, which is no flank");
      } else if (taken.containsKey(nearest)) {
        fault(flank, "lies at the cut-off plane of flank '" + taken.get(nearest).name() + "'");
      } else {
        taken.put(nearest, flank);
      }
    }
    return taken;
  }

  private static String nearestWords(double least) {
    return Double.isInfinite(least)
        ? "; the section has none"
        : "; the nearest is " + Wording.length(least) + " away";
  }

  private double extent() {
    double minX = Double.POSITIVE_INFINITY;
    double minY = Double.POSITIVE_INFINITY;
    double maxX = Double.NEGATIVE_INFINITY;
    double maxY = Double.NEGATIVE_INFINITY;
    for (int vertex = 0; vertex < outline.partition().vertexCount(); vertex++) {
      minX = Math.min(minX, outline.partition().x(vertex));
      maxX = Math.max(maxX, outline.partition().x(vertex));
      minY = Math.min(minY, outline.partition().y(vertex));
      maxY = Math.max(maxY, outline.partition().y(vertex));
    }
    return Math.max(maxX - minX, maxY - minY);
  }

  private void fault(Flank flank, String message) {
    faults.add(new Fault("flank", flank.name(), message, flank.cut()));
  }

  /** A named flank must have a U. */
  private void checkU(PlacedFlank flank) {
    if (flank.typed().isPresent() && flank.uWPerM2K().isEmpty()) {
      fault(
          flank.typed().get(),
          "the section is not layered at "
              + flank.placeWords(outline)
              + " ("
              + flank.reading().reason()
              + "): type its U");
    }
  }

  /** Named flanks first, as the case names them, then those found, as they stand. */
  private void orderAsNamed() {
    List<String> names = new ArrayList<>();
    for (Flank flank : detail.flanks()) {
      names.add(flank.name());
    }
    flanks.sort(new AsNamed(names));
  }

  private static final class AsNamed implements Comparator<PlacedFlank> {
    private final List<String> names;

    private AsNamed(List<String> names) {
      this.names = names;
    }

    @Override
    public int compare(PlacedFlank a, PlacedFlank b) {
      return Integer.compare(position(a), position(b));
    }

    private int position(PlacedFlank flank) {
      int index = names.indexOf(flank.name());
      return index < 0 ? names.size() : index;
    }
  }

  /** "left flank", "top flank", … by the side of the drawing the plane looks to. */
  private String freeName(CutOffPlane plane, Set<String> names) {
    Direction run = outline.direction(plane.first(), plane.last());
    View view = detail.view();
    double upX = view.plan() ? 0 : view.upX();
    double upY = view.plan() ? 1 : view.upY();
    double up = run.y() * upX - run.x() * upY;
    double right = run.y() * upY + run.x() * upX;
    String side;
    Area.Role role = FrameOutline.role(outline, plane);
    if (frame && role != Area.Role.OTHER) {
      side = FrameTransmittances.name(role);
    } else if (Math.abs(up) > Math.abs(right)) {
      side = up > 0 ? "top flank" : "bottom flank";
    } else {
      side = right > 0 ? "right flank" : "left flank";
    }
    String name = side;
    for (int number = 2; names.contains(name); number++) {
      name = side + " " + number;
    }
    return name;
  }
}
