package coldseam.mesh.closing;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * Lines with near corners joined.
 *
 * @param lines the lines in the order given, corners moved where they were joined
 * @param joins what was joined, in the order of the lines
 * @param doubts what is near enough to be joined, but was left because something thin lies there
 */
public record Joined(List<DrawnLine> lines, List<Join> joins, List<Join> doubts) {
  /** Copies the lists. */
  public Joined {
    lines = List.copyOf(lines);
    joins = List.copyOf(joins);
    doubts = List.copyOf(doubts);
  }

  /**
   * Two places that are, or might be, one.
   *
   * @param line index of the line that has a corner at the first place
   * @param from the first place as drawn
   * @param other index of the line at the second place
   * @param to the second place
   */
  public record Join(int line, Point from, int other, Point to) {
    /** How far apart the two are, m. */
    public double distanceM() {
      return from.distance(to);
    }
  }
}
