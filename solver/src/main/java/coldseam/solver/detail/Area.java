package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * One laid shape.
 *
 * @param name how messages call it, e.g. "section[3] (brick)"
 * @param fill what fills it
 * @param rings closed rings by the even-odd rule, m
 * @param glazing whether its surfaces count as glazing or frame for the surface films
 * @param role what it is to a frame drawn with it
 */
public record Area(String name, Fill fill, List<List<Point>> rings, boolean glazing, Role role) {
  /** What a shape is to a frame drawn with it (ISO 10077-2). */
  public enum Role {
    /** Any other shape: the frame itself, gaskets, a wall. */
    OTHER,
    /** A piece of the glazing: a pane, gas, spacer, sealant. */
    GLAZING,
    /** The insulating panel in place of the glazing. */
    PANEL
  }

  /** Copies the rings. */
  public Area {
    List<List<Point>> copies = new ArrayList<>();
    for (List<Point> ring : rings) {
      copies.add(List.copyOf(ring));
    }
    rings = List.copyOf(copies);
  }

  /**
   * A shape that is neither glazing nor panel of a frame.
   *
   * @param name how messages call it
   * @param fill what fills it
   * @param rings closed rings by the even-odd rule, m
   * @param glazing whether its surfaces count as glazing or frame for the surface films
   */
  public Area(String name, Fill fill, List<List<Point>> rings, boolean glazing) {
    this(name, fill, rings, glazing, Role.OTHER);
  }
}
