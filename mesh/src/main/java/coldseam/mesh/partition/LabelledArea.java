package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * One laid shape: closed rings filled by the even-odd rule.
 *
 * @param label what fills the shape, 0 or more; areas of equal label are one material
 * @param rings each ring a closed polygon without its first point repeated, m; either direction
 */
public record LabelledArea(int label, List<List<Point>> rings) {
  /**
   * Copies the rings.
   *
   * @throws IllegalArgumentException if the label is negative, no ring is given or a ring has fewer
   *     than three points
   */
  public LabelledArea {
    if (label < 0) {
      throw new IllegalArgumentException("a label is 0 or more, not " + label);
    }
    if (rings.isEmpty()) {
      throw new IllegalArgumentException("an area needs a ring");
    }
    List<List<Point>> copies = new ArrayList<>(rings.size());
    for (List<Point> ring : rings) {
      copies.add(List.copyOf(ring));
      if (ring.size() < 3) {
        throw new IllegalArgumentException("a ring needs three points or more");
      }
    }
    rings = List.copyOf(copies);
  }
}
