package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * One laid shape.
 *
 * @param name how messages call it, e.g. "section[3] (brick)"
 * @param fill what fills it
 * @param rings closed rings by the even-odd rule, m
 * @param glazing whether its surfaces count as glazing or frame for the surface films
 */
public record Area(String name, Fill fill, List<List<Point>> rings, boolean glazing) {
  /** Copies the rings. */
  public Area {
    rings = rings.stream().map(List::copyOf).toList();
  }
}
