package coldseam.cases;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * A circle or a sector drawn as chords of equal area: the corners lie on a slightly larger circle,
 * so that the polygon has exactly the area of the round shape.
 */
final class Disc {
  /** Chords of a full circle where the case says nothing. */
  static final int CHORDS = 96;

  private final Point centre;
  private final double radiusM;
  private final double fromDegrees;
  private final double sweepDegrees;
  private final int chords;

  /**
   * Prepares a disc.
   *
   * @param centre its centre
   * @param radiusM its radius, m
   * @param fromDegrees where a sector begins, counter-clockwise from x
   * @param sweepDegrees how far it reaches, 360 for a full circle
   * @param chords how many chords along the arc
   */
  Disc(Point centre, double radiusM, double fromDegrees, double sweepDegrees, int chords) {
    this.centre = centre;
    this.radiusM = radiusM;
    this.fromDegrees = fromDegrees;
    this.sweepDegrees = sweepDegrees;
    this.chords = chords;
  }

  /** Fewest chords that make a shape of at most a quarter turn each. */
  static int fewestChords(double sweepDegrees) {
    return sweepDegrees >= 360 ? 3 : (int) Math.ceil(sweepDegrees / 90);
  }

  /** As many chords per degree as a full circle has. */
  static int usualChords(double sweepDegrees) {
    return Math.max(4, (int) Math.ceil(CHORDS * sweepDegrees / 360));
  }

  private boolean full() {
    return sweepDegrees >= 360;
  }

  /** Angle of one chord, radians. */
  private double step() {
    return Math.toRadians(sweepDegrees / chords);
  }

  /** Distance of the corners from the centre, m: r'² sin(α) = r² α for each chord's angle α. */
  private double cornerRadius() {
    return radiusM * Math.sqrt(step() / Math.sin(step()));
  }

  List<Point> ring() {
    List<Point> ring = new ArrayList<>();
    double r = cornerRadius();
    int corners = full() ? chords : chords + 1;
    for (int i = 0; i < corners; i++) {
      double angle = fromDegrees + sweepDegrees * i / chords;
      ring.add(new Point(centre.x() + r * Degrees.cos(angle), centre.y() + r * Degrees.sin(angle)));
    }
    if (!full()) {
      ring.add(centre);
    }
    return ring;
  }

  /** The largest distance between a chord and the arc, at its ends or its middle, m. */
  double deviationM() {
    double outside = cornerRadius() - radiusM;
    double inside = radiusM - cornerRadius() * Math.cos(step() / 2);
    return Math.max(outside, inside);
  }

  int chords() {
    return chords;
  }
}
