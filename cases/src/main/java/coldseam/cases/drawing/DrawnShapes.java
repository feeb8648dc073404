package coldseam.cases.drawing;

import coldseam.mesh.closing.Cells;
import coldseam.mesh.closing.Closing;
import coldseam.mesh.closing.DrawnLine;
import coldseam.mesh.closing.Joined;
import coldseam.mesh.closing.TangledLinesException;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * The shapes of a drawing put in place: filled outlines as they are drawn, and the faces that lines
 * enclose once their near corners are joined. Lengths in m.
 */
public final class DrawnShapes {
  /**
   * One shape.
   *
   * @param rings closed rings, filled by the even-odd rule
   * @param layer its layer; empty for a face between lines of several
   * @param look how it is filled, empty if it is not
   * @param line where it stands in the file
   * @param divided whether it is one of several faces that lines of the layer divide
   * @param inner a point in it
   * @param areaM2 its area
   */
  public record Shape(
      List<List<Point>> rings,
      String layer,
      String look,
      int line,
      boolean divided,
      Point inner,
      double areaM2) {
    /** Copies the rings. */
    public Shape {
      rings = rings.stream().map(List::copyOf).toList();
    }
  }

  /**
   * Something to look at in the drawing.
   *
   * @param where it is, m
   * @param sizeM how wide a gap was or is, or how long a piece
   * @param layer the layer of the line concerned
   * @param line where that line stands in the file
   */
  public record Mark(Point where, double sizeM, String layer, int line) {}

  private final Drawing drawing;
  private final List<DrawnLine> lines;
  private final int[] firstLine;
  private final int[] pieceOf;
  private final Joined joined;
  private final List<Shape> shapes;
  private Cells whole;

  private DrawnShapes(Drawing drawing, Placement placement) throws DrawingException {
    this.drawing = drawing;
    List<DrawnLine> drawn = new ArrayList<>();
    List<Integer> owners = new ArrayList<>();
    firstLine = new int[drawing.pieces().size()];
    for (int p = 0; p < firstLine.length; p++) {
      firstLine[p] = drawn.size();
      Piece piece = drawing.pieces().get(p);
      for (List<Point> ring : piece.rings()) {
        List<Point> placed = new ArrayList<>(ring.size());
        for (Point point : ring) {
          placed.add(placement.of(point));
        }
        drawn.add(new DrawnLine(placed, piece.closed()));
        owners.add(p);
      }
    }
    pieceOf = owners.stream().mapToInt(p -> p).toArray();
    try {
      joined = Closing.join(drawn, placement.toleranceM());
      lines = joined.lines();
      shapes = shapes();
    } catch (TangledLinesException e) {
      throw tangled(e);
    }
  }

  private static DrawingException tangled(TangledLinesException e) {
    return new DrawingException(
        0, "the drawing has " + e.getMessage(), "export the detail alone, and without hatching");
  }

  /**
   * Puts a drawing in place.
   *
   * @param drawing as read
   * @param placement where it lies
   * @return its shapes
   * @throws DrawingException if its lines are a tangle
   */
  public static DrawnShapes of(Drawing drawing, Placement placement) throws DrawingException {
    return new DrawnShapes(drawing, placement);
  }

  private List<Shape> shapes() throws TangledLinesException {
    List<Shape> all = new ArrayList<>();
    for (int p = 0; p < firstLine.length; p++) {
      Piece piece = drawing.pieces().get(p);
      if (piece.filled()) {
        List<List<Point>> rings = new ArrayList<>();
        List<DrawnLine> outlines = new ArrayList<>();
        for (int r = 0; r < piece.rings().size(); r++) {
          outlines.add(lines.get(firstLine[p] + r));
          rings.add(outlines.get(r).points());
        }
        filled(piece, rings, outlines).ifPresent(all::add);
      }
    }
    for (String layer : layers()) {
      all.addAll(closed(layer));
    }
    return all;
  }

  /** A filled outline with its area by the even-odd rule; empty if it has none. */
  private static Optional<Shape> filled(
      Piece piece, List<List<Point>> rings, List<DrawnLine> outlines) throws TangledLinesException {
    Point inner = null;
    double largest = 0;
    double area = 0;
    for (Cells.Cell cell : Closing.cells(outlines).cells()) {
      if (!thin(cell) && holds(rings, cell.inner())) {
        area += cell.areaM2();
        if (cell.areaM2() > largest) {
          largest = cell.areaM2();
          inner = cell.inner();
        }
      }
    }
    return inner == null
        ? Optional.empty()
        : Optional.of(
            new Shape(rings, piece.layer(), piece.look(), piece.line(), false, inner, area));
  }

  /** Faces of the lines of one layer that lie at even depth: a ring in a ring is a hole. */
  private List<Shape> closed(String layer) throws TangledLinesException {
    List<DrawnLine> own = new ArrayList<>();
    List<Integer> numbers = new ArrayList<>();
    for (int l = 0; l < lines.size(); l++) {
      Piece piece = drawing.pieces().get(pieceOf[l]);
      if (!piece.filled() && piece.layer().equals(layer)) {
        own.add(lines.get(l));
        numbers.add(l);
      }
    }
    List<Cells.Cell> cells = Closing.cells(own).cells();
    List<Shape> closed = new ArrayList<>();
    for (Cells.Cell cell : cells) {
      if (cell.depth() % 2 == 0 && !thin(cell)) {
        boolean divided = false;
        for (Cells.Cell other : cells) {
          divided |= other != cell && !thin(other) && dividedBy(cell, other, own);
        }
        int line = drawing.pieces().get(pieceOf[numbers.get(cell.lines().get(0))]).line();
        closed.add(new Shape(cell.rings(), layer, "", line, divided, cell.inner(), cell.areaM2()));
      }
    }
    return closed;
  }

  /**
   * Whether an open line runs between two faces of one group. Closed outlines that overlap do not
   * divide each other: the two are one thing drawn in parts.
   */
  private static boolean dividedBy(Cells.Cell cell, Cells.Cell other, List<DrawnLine> lines) {
    if (cell.group() != other.group()) {
      return false;
    }
    for (int line : cell.lines()) {
      if (!lines.get(line).closed() && other.lines().contains(line)) {
        return true;
      }
    }
    return false;
  }

  /** Whether a face is thinner than the length to which gaps are closed anyway. */
  private static boolean thin(Cells.Cell cell) {
    double around = 0;
    for (List<Point> ring : cell.rings()) {
      for (int i = 0; i < ring.size(); i++) {
        around += ring.get(i).distance(ring.get((i + 1) % ring.size()));
      }
    }
    return 2 * cell.areaM2() <= Resolution.STANDARD.closeM() * around;
  }

  /** Names of the layers with something drawn, in the order drawn. */
  public List<String> layers() {
    Set<String> names = new LinkedHashSet<>();
    drawing.pieces().forEach(piece -> names.add(piece.layer()));
    return List.copyOf(names);
  }

  /** How shapes of the drawing are filled, in the order drawn. */
  public List<String> looks() {
    Set<String> names = new LinkedHashSet<>();
    for (Piece piece : drawing.pieces()) {
      if (piece.filled()) {
        names.add(piece.look());
      }
    }
    return List.copyOf(names);
  }

  /** Every shape: filled outlines in the order drawn, then the faces of each layer's lines. */
  public List<Shape> all() {
    return shapes;
  }

  /**
   * The shapes of a layer, of a look, or of both.
   *
   * @param layer the layer; any if empty
   * @param look how they are filled; any, and none, if empty
   * @return in the order drawn
   */
  public List<Shape> find(Optional<String> layer, Optional<String> look) {
    List<Shape> found = new ArrayList<>();
    for (Shape shape : shapes) {
      boolean there = layer.isEmpty() || shape.layer().equals(layer.get());
      if (there && (look.isEmpty() || shape.look().equals(look.get()))) {
        found.add(shape);
      }
    }
    return found;
  }

  private Cells whole() throws DrawingException {
    if (whole == null) {
      try {
        whole = Closing.cells(lines);
      } catch (TangledLinesException e) {
        throw tangled(e);
      }
    }
    return whole;
  }

  /**
   * The faces between all lines of the drawing, whatever their layer.
   *
   * @throws DrawingException if the lines are a tangle
   */
  public List<Shape> faces() throws DrawingException {
    List<Shape> faces = new ArrayList<>();
    for (Cells.Cell cell : whole().cells()) {
      if (!thin(cell)) {
        Piece piece = drawing.pieces().get(pieceOf[cell.lines().get(0)]);
        faces.add(
            new Shape(
                cell.rings(), piece.layer(), "", piece.line(), true, cell.inner(), cell.areaM2()));
      }
    }
    return faces;
  }

  /**
   * The face between lines of any layer that holds a point.
   *
   * @param at the point, m
   * @return the face, or empty if nothing encloses the point
   * @throws DrawingException if the lines are a tangle
   */
  public Optional<Shape> face(Point at) throws DrawingException {
    for (Shape face : faces()) {
      if (holds(face, at)) {
        return Optional.of(face);
      }
    }
    return Optional.empty();
  }

  /** Whether a point lies in a shape by the even-odd rule. */
  public static boolean holds(Shape shape, Point at) {
    return holds(shape.rings(), at);
  }

  private static boolean holds(List<List<Point>> rings, Point at) {
    boolean inside = false;
    for (List<Point> ring : rings) {
      for (int i = 0; i < ring.size(); i++) {
        Point a = ring.get(i);
        Point b = ring.get((i + 1) % ring.size());
        boolean across = a.y() > at.y() != b.y() > at.y();
        if (across && at.x() < a.x() + (at.y() - a.y()) / (b.y() - a.y()) * (b.x() - a.x())) {
          inside = !inside;
        }
      }
    }
    return inside;
  }

  /** Places where corners were joined, each with the widest gap. */
  public List<Mark> joins() {
    return marks(joined.joins());
  }

  /** Corners that nearly meet, left apart because something thin lies there. */
  public List<Mark> doubts() {
    return marks(joined.doubts());
  }

  private List<Mark> marks(List<Joined.Join> places) {
    // Of what is joined in one place the widest gap is told.
    Map<Point, Mark> widest = new LinkedHashMap<>();
    for (Joined.Join place : places) {
      if (place.distanceM() <= Resolution.STANDARD.closeM()) {
        continue;
      }
      Piece piece = drawing.pieces().get(pieceOf[place.line()]);
      Mark mark = new Mark(place.to(), place.distanceM(), piece.layer(), piece.line());
      Mark known = widest.get(place.to());
      if (known == null || known.sizeM() < mark.sizeM()) {
        widest.put(place.to(), mark);
      }
    }
    return new ArrayList<>(widest.values());
  }

  /**
   * Pieces of line that bound no face of the drawing.
   *
   * @throws DrawingException if the lines are a tangle
   */
  public List<Mark> dropped() throws DrawingException {
    List<Mark> marks = new ArrayList<>();
    for (Cells.Dropped piece : whole().dropped()) {
      Piece of = drawing.pieces().get(pieceOf[piece.line()]);
      Point middle =
          new Point(
              (piece.from().x() + piece.to().x()) / 2, (piece.from().y() + piece.to().y()) / 2);
      marks.add(new Mark(middle, piece.lengthM(), of.layer(), of.line()));
    }
    return marks;
  }
}
