package coldseam.cases;

import coldseam.cases.drawing.OpenRegions;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Fill;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Lays what fills the open regions of a section, once all its other shapes are known. */
final class AroundReader {
  private final Problems problems;
  private final List<Asked> asked = new ArrayList<>();

  /** An open region asked for, and the place among the areas where it is laid. */
  private record Asked(
      int index, Node node, String called, Fill fill, Point at, boolean glazing, Area.Role role) {}

  AroundReader(Problems problems) {
    this.problems = problems;
  }

  void add(
      int index, Node node, String called, Fill fill, Point at, boolean glazing, Area.Role role) {
    asked.add(new Asked(index, node, called, fill, at, glazing, role));
  }

  /**
   * Lays the regions asked for.
   *
   * @param areas all other areas in the order laid
   * @return the same with the regions among them
   */
  List<Area> laid(List<Area> areas) {
    if (asked.isEmpty()) {
      return areas;
    }
    List<Point> points = new ArrayList<>();
    asked.forEach(one -> points.add(one.at()));
    List<List<List<Point>>> shapes = new ArrayList<>();
    areas.forEach(area -> shapes.add(area.rings()));
    Optional<OpenRegions> regions = OpenRegions.of(shapes, points);
    if (regions.isEmpty()) {
      problems.add(asked.get(0).node(), "there is nothing to lie around", "lay a shape first");
      return areas;
    }
    int[] region = new int[asked.size()];
    List<Area> all = new ArrayList<>(areas);
    int shift = 0;
    for (int i = 0; i < region.length; i++) {
      Asked one = asked.get(i);
      region[i] = regions.get().at(one.at());
      if (region[i] < 0) {
        problems.add(
            one.node(),
            "the point of `around` is not in the open: a shape covers it",
            "name a point that no shape covers");
        continue;
      }
      boolean known = false;
      for (int k = 0; k < i; k++) {
        if (region[k] == region[i]) {
          known = true;
          sameRegion(asked.get(k), one);
        }
      }
      if (!known) {
        all.add(
            one.index() + shift++,
            new Area(
                one.called(),
                one.fill(),
                regions.get().rings(region[i]),
                one.glazing(),
                one.role()));
      }
    }
    return all;
  }

  private void sameRegion(Asked first, Asked second) {
    if (!first.fill().name().equals(second.fill().name())) {
      problems.add(
          second.node(),
          "the open region around this point is the same as that of " + first.called(),
          "close what is to lie between them; `check --out` shows the section");
    }
  }
}
