package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import java.util.List;
import java.util.Optional;

/** Turns the name of a side into a line on the outline or a point on a cut-off plane. */
final class Sidelines {
  private final Problems problems;
  private final List<Area> areas;
  private Optional<Sides> sides;

  Sidelines(Problems problems, List<Area> areas) {
    this.problems = problems;
    this.areas = areas;
  }

  /**
   * The line over everything that lies on a side.
   *
   * @param node where the side is named
   * @param side one of {@link Sides#NAMES}
   * @return its two ends, or empty if a mistake was reported
   */
  Optional<List<Point>> whole(Node node, String side) {
    List<Point[]> pieces = pieces(node, side);
    return pieces.isEmpty()
        ? Optional.empty()
        : Optional.of(List.of(pieces.get(0)[0], pieces.get(pieces.size() - 1)[1]));
  }

  /**
   * A point in the middle of the one plane that lies on a side.
   *
   * @param node where the side is named
   * @param side one of {@link Sides#NAMES}
   * @return the point, or empty if a mistake was reported
   */
  Optional<Point> middle(Node node, String side) {
    List<Point[]> pieces = pieces(node, side);
    if (pieces.size() > 1) {
      problems.add(
          node,
          "the section has " + pieces.size() + " separate planes on the " + side,
          "give a point `[x, y]` on the one that is meant");
      return Optional.empty();
    }
    if (pieces.isEmpty()) {
      return Optional.empty();
    }
    Point a = pieces.get(0)[0];
    Point b = pieces.get(0)[1];
    return Optional.of(new Point((a.x() + b.x()) / 2, (a.y() + b.y()) / 2));
  }

  private List<Point[]> pieces(Node node, String side) {
    if (sides == null) {
      sides = areas.isEmpty() ? Optional.empty() : Sides.of(areas);
    }
    List<Point[]> pieces = sides.isEmpty() ? List.of() : sides.get().pieces(side);
    if (pieces.isEmpty()) {
      problems.add(
          node,
          "no straight edge of the section lies on the " + side,
          "give the points of the line themselves");
    }
    return pieces;
  }
}
