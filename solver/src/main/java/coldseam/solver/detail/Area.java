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
 */
public record Area(String name, Fill fill, List<List<Point>> rings, boolean glazing) {
  /** Copies the rings. */
  public Area {
    List<List<Point>> copies = new ArrayList<>();
    for (List<Point> ring : rings) {
      copies.add(List.copyOf(ring));
    }
    rings = List.copyOf(copies);
  }
}
