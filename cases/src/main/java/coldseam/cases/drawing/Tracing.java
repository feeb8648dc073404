package coldseam.cases.drawing;

import coldseam.mesh.closing.Cells;
import coldseam.mesh.closing.Closing;
import coldseam.mesh.closing.DrawnLine;
import coldseam.mesh.closing.TangledLinesException;
import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;

/**
 * Receives placed outlines from a reader, twice: roughly, to find how large the drawing is, then
 * with chords as fine as asked.
 */
final class Tracing {
  /** Chords deviate by at most this part of the drawing's larger dimension unless stated. */
  static final double STANDARD_DEVIATION = 1.0 / 20_000;

  private final double deviation;
  private final boolean rough;
  private final List<Piece> pieces = new ArrayList<>();
  private double minX = Double.POSITIVE_INFINITY;
  private double minY = Double.POSITIVE_INFINITY;
  private double maxX = Double.NEGATIVE_INFINITY;
  private double maxY = Double.NEGATIVE_INFINITY;
  private int items;
  private int corners;

  private Tracing(double deviation, boolean rough) {
    this.deviation = deviation;
    this.rough = rough;
  }

  static Tracing rough() {
    return new Tracing(Double.POSITIVE_INFINITY, true);
  }

  static Tracing fine(double deviation) {
    return new Tracing(deviation, false);
  }

  double extent() {
    return pieces.isEmpty() && items == 0 ? 0 : Math.max(0, Math.max(maxX - minX, maxY - minY));
  }

  List<Piece> pieces() {
    return pieces;
  }

  /**
   * Counts one more thing unfolded, whatever it is.
   *
   * @param line where it stands in the file
   * @param length how much is written for it; a very long thing counts several times
   */
  void count(int line, int length) throws DrawingException {
    items += 1 + length / 64;
    if (items > Limits.MOST_ITEMS) {
      throw new DrawingException(
          line,
          "the drawing unfolds into more than " + Limits.MOST_ITEMS + " parts",
          "draw blocks in blocks, or references to references, fewer times");
    }
  }

  /**
   * Adds lines, each a piece of its own.
   *
   * @param outlines as written
   * @param at where they are placed
   * @param layer their layer
   * @param line where they stand in the file
   */
  void lines(List<Outline> outlines, Affine at, String layer, int line) throws DrawingException {
    for (Outline outline : outlines) {
      List<Point> ring = ring(outline, at, line);
      boolean closed = outline.closed() && ring.size() > 2;
      if (ring.size() > 1 && !rough) {
        pieces.add(new Piece(layer, "", false, List.of(ring), closed, line));
      }
    }
  }

  /** Adds one filled shape; open outlines are filled as if they were closed. */
  void filled(List<Outline> outlines, Affine at, String layer, String look, int line)
      throws DrawingException {
    List<List<Point>> rings = new ArrayList<>();
    for (Outline outline : outlines) {
      List<Point> ring = ring(outline, at, line);
      if (ring.size() > 2) {
        rings.add(ring);
      }
    }
    if (!rings.isEmpty() && !rough) {
      pieces.add(new Piece(layer, look, true, rings, true, line));
    }
  }

  /** Adds one shape filled by the rule of non-zero winding. */
  void wound(List<Outline> outlines, Affine at, String layer, String look, int line)
      throws DrawingException {
    List<DrawnLine> rings = new ArrayList<>();
    for (Outline outline : outlines) {
      List<Point> ring = ring(outline, at, line);
      if (ring.size() > 2) {
        rings.add(new DrawnLine(ring, true));
      }
    }
    if (rough || rings.isEmpty()) {
      return;
    }
    Cells cells;
    try {
      cells = Closing.cells(rings);
    } catch (TangledLinesException e) {
      throw new DrawingException(line, "this shape has " + e.getMessage(), "draw it simpler");
    }
    boolean simple = rings.size() == 1 && cells.cells().size() == 1;
    for (Cells.Cell cell : cells.cells()) {
      int winding = 0;
      for (DrawnLine ring : rings) {
        winding += winding(ring.points(), cell.inner());
      }
      if (winding != 0) {
        List<List<Point>> shown = simple ? List.of(rings.get(0).points()) : cell.rings();
        pieces.add(new Piece(layer, look, true, shown, true, line));
      }
    }
  }

  /** How often a ring goes around a point, counter-clockwise. */
  private static int winding(List<Point> ring, Point p) {
    int winding = 0;
    for (int i = 0; i < ring.size(); i++) {
      Point a = ring.get(i);
      Point b = ring.get((i + 1) % ring.size());
      double side = (b.x() - a.x()) * (p.y() - a.y()) - (p.x() - a.x()) * (b.y() - a.y());
      if (a.y() <= p.y() && b.y() > p.y() && side > 0) {
        winding++;
      } else if (a.y() > p.y() && b.y() <= p.y() && side < 0) {
        winding--;
      }
    }
    return winding;
  }

  private List<Point> ring(Outline outline, Affine at, int line) throws DrawingException {
    List<Point> ring = new ArrayList<>();
    boolean[] far = new boolean[1];
    outline.chords(at, deviation, (x, y) -> corner(x, y, ring, far));
    if (far[0]) {
      throw new DrawingException(
          line,
          "a coordinate here is beyond anything drawn",
          "the largest coordinate read is " + (long) Limits.FARTHEST);
    }
    if (corners > Limits.MOST_CORNERS) {
      throw new DrawingException(
          line,
          "the drawing has more than " + Limits.MOST_CORNERS + " corners up to here",
          "draw less, or let chords deviate more");
    }
    int last = ring.size() - 1;
    if (outline.closed() && last > 0 && near(ring.get(0), ring.get(last))) {
      ring.remove(last);
    }
    return ring;
  }

  /** Whether a closed outline was written with its first corner repeated, but for rounding. */
  private static boolean near(Point a, Point b) {
    double size = Math.abs(a.x()) + Math.abs(a.y()) + Math.abs(b.x()) + Math.abs(b.y());
    return Math.abs(a.x() - b.x()) + Math.abs(a.y() - b.y()) <= 1e-14 * size;
  }

  private void corner(double x, double y, List<Point> ring, boolean[] far) {
    if (!(Math.abs(x) <= Limits.FARTHEST && Math.abs(y) <= Limits.FARTHEST)) {
      far[0] = true;
      return;
    }
    corners++;
    minX = Math.min(minX, x);
    maxX = Math.max(maxX, x);
    minY = Math.min(minY, y);
    maxY = Math.max(maxY, y);
    Point next = new Point(x, y);
    if (ring.isEmpty() || !ring.get(ring.size() - 1).equals(next)) {
      ring.add(next);
    }
  }
}
