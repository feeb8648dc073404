package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * A piece of inside surface beside an inner corner of a frame, where the film for heat loss is the
 * reduced one (ISO 10077-2). Its ends become vertices of the partition.
 *
 * @param along corners of a line that runs along the outline round the corner, m
 */
public record CornerZone(List<Point> along) {
  /** Copies the points. */
  public CornerZone {
    along = List.copyOf(along);
  }
}
