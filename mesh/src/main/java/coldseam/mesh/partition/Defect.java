package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * Something doubtful found in a drawing while it was made into a partition.
 *
 * @param kind what was found
 * @param where a point in the middle of it, in the coordinates of the drawing, m
 * @param sizeM how wide it is (for {@link Kind#UNCOVERED} and {@link Kind#SLIVER}: area over half
 *     the perimeter), m
 * @param labels labels of the areas or the line concerned, in order, without repeats
 */
public record Defect(Kind kind, Point where, double sizeM, List<Integer> labels) {
  /** What can be found. */
  public enum Kind {
    /** A gap between areas no wider than the closing length; it has been closed. */
    CLOSED_GAP,
    /** A gap between areas, wider than the closing length but thin: probably not meant. */
    GAP,
    /** A thin face left where one area overlaps another: probably not meant. */
    SLIVER,
    /** A place enclosed by areas that nothing covers. */
    UNCOVERED,
    /** A ring that crosses itself; filled by the even-odd rule. */
    SELF_CROSSING,
    /** A shape without area; left out. */
    ZERO_AREA,
    /** An area of which nothing is left, others being laid over it. */
    HIDDEN,
    /** A labelled line of which a part, or all, lies on no edge between faces of the drawing. */
    LINE_OFF_EDGE
  }

  /** Copies the labels. */
  public Defect {
    labels = List.copyOf(labels);
  }
}
