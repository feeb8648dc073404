package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;

/** A chain of segments as written, not yet placed: one subpath, polyline or boundary. */
final class Outline {
  private final double startX;
  private final double startY;
  private final List<Segment> segments = new ArrayList<>();
  private boolean closed;

  Outline(double startX, double startY) {
    this.startX = startX;
    this.startY = startY;
  }

  Outline add(Segment segment) {
    segments.add(segment);
    return this;
  }

  Outline line(double x, double y) {
    return add(new Segment.Straight(x, y));
  }

  Outline close() {
    closed = true;
    return this;
  }

  boolean closed() {
    return closed;
  }

  boolean empty() {
    return segments.isEmpty();
  }

  double startX() {
    return startX;
  }

  double startY() {
    return startY;
  }

  /** Adds the segments of this outline to another that ends where this one begins. */
  void appendTo(Outline other) {
    other.segments.addAll(segments);
  }

  /**
   * The outline with straight edges.
   *
   * @param at where it is placed
   * @param deviation how far from the curves, placed
   * @param into receives the corners, the first included, placed
   */
  void chords(Affine at, double deviation, Segment.Corner into) {
    into.add(at.x(startX, startY), at.y(startX, startY));
    for (Segment segment : segments) {
      segment.chords(at, deviation, into);
    }
  }
}
