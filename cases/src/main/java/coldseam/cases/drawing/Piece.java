package coldseam.cases.drawing;

import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * One line or one filled outline of a drawing.
 *
 * @param layer its layer
 * @param look how it is filled: the hatch pattern, the class or the colour; empty for a line
 * @param filled whether the rings are filled by the even-odd rule; else each is a line
 * @param rings corners in units of the drawing; the first of a closed ring is not repeated
 * @param closed whether the rings return to their first corners
 * @param line where it stands in the file
 */
public record Piece(
    String layer, String look, boolean filled, List<List<Point>> rings, boolean closed, int line) {
  /** Copies the rings. */
  public Piece {
    rings = rings.stream().map(List::copyOf).toList();
  }
}
