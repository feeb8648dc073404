package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * Something doubtful found in a drawing while it was made into a partition. "Thin" is a strip no
 * wider than a fiftieth of its length.
 *
 * @param kind what was found
 * @param where a point in the middle of it, in the coordinates of the drawing, m
 * @param sizeM its size as the kind says, m
 * @param labels labels of the areas or the line concerned, ascending, without repeats; a single
 *     label where one area or line is concerned
 */
public record Defect(Kind kind, Point where, double sizeM, List<Integer> labels) {
  /** What can be found. */
  public enum Kind {
    /**
     * A gap between areas no wider than the closing length; it has been closed. Such a gap may be
     * uncovered or show an earlier area. Size: its largest width.
     */
    CLOSED_GAP,
    /**
     * Uncovered ground wider than the closing length, but thin and no wider than a tenth of the
     * thicker area beside it: probably not meant. Size: its mean width.
     */
    GAP,
    /**
     * What shows of an earlier area between later ones, or along its own edge beside a later one:
     * thin, narrower than 99 closing lengths (just under 0.1 mm) and no wider than a tenth of the
     * area itself; probably not meant. A strip with its own outline on both long sides is a drawn
     * sheet and never a sliver, however thin. Size: its mean width.
     */
    SLIVER,
    /**
     * A place enclosed by areas that nothing covers, and that is not thin. Size: area over half the
     * perimeter.
     */
    UNCOVERED,
    /**
     * A place where a ring crosses itself; it is filled by the even-odd rule. Size: area over half
     * the perimeter of the smaller part cut off.
     */
    SELF_CROSSING,
    /** A shape without area; left out. Size: half its perimeter. */
    ZERO_AREA,
    /**
     * An area of which nothing is left, others being laid over it. Size: its area over half its
     * perimeter.
     */
    HIDDEN,
    /**
     * A part of a labelled line, or all of it, that lies on no edge between different labels or
     * between a label and uncovered ground. Size: its length.
     */
    LINE_OFF_EDGE
  }

  /** Copies the labels. */
  public Defect {
    labels = List.copyOf(labels);
  }
}
