package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.List;

/**
 * A clean planar partition made of labelled areas, laid in order, and labelled lines. Faces are the
 * connected regions of one label; edges are straight, meet only at vertices and separate two faces
 * (or one face from uncovered ground, or lie inside one face where a line was laid).
 *
 * <p>Coordinates are local: {@link #origin()} plus a local coordinate is the place in the drawing.
 */
public final class Partition {
  /** The label of ground that no area covers, and the face index there. */
  public static final int NONE = -1;

  private Partition() {}

  /**
   * Makes a partition.
   *
   * @param areas in the order laid, a later one over the earlier
   * @param lines lines to be noded with the areas
   * @param resolution which points are the same
   * @return the partition with everything doubtful listed in {@link #defects()}
   * @throws IllegalArgumentException if there is no area, or nothing of the areas is left
   */
  public static Partition of(
      List<LabelledArea> areas, List<LabelledLine> lines, Resolution resolution) {
    throw new UnsupportedOperationException();
  }

  /** The point of the drawing at local (0, 0). */
  public Point origin() {
    throw new UnsupportedOperationException();
  }

  public int vertexCount() {
    throw new UnsupportedOperationException();
  }

  /** Local x of a vertex, m. */
  public double x(int vertex) {
    throw new UnsupportedOperationException();
  }

  /** Local y of a vertex, m. */
  public double y(int vertex) {
    throw new UnsupportedOperationException();
  }

  public int edgeCount() {
    throw new UnsupportedOperationException();
  }

  public int edgeStart(int edge) {
    throw new UnsupportedOperationException();
  }

  public int edgeEnd(int edge) {
    throw new UnsupportedOperationException();
  }

  /** Length of an edge, m. */
  public double edgeLength(int edge) {
    throw new UnsupportedOperationException();
  }

  /** The face to the left when walking from {@link #edgeStart} to {@link #edgeEnd}, or NONE. */
  public int leftFace(int edge) {
    throw new UnsupportedOperationException();
  }

  /** The face to the right when walking from {@link #edgeStart} to {@link #edgeEnd}, or NONE. */
  public int rightFace(int edge) {
    throw new UnsupportedOperationException();
  }

  /** The label of the left face, or NONE. */
  public int leftLabel(int edge) {
    throw new UnsupportedOperationException();
  }

  /** The label of the right face, or NONE. */
  public int rightLabel(int edge) {
    throw new UnsupportedOperationException();
  }

  /** Labels of the lines that lie on an edge, ascending; mostly empty. */
  public List<Integer> linesOn(int edge) {
    throw new UnsupportedOperationException();
  }

  public int faceCount() {
    throw new UnsupportedOperationException();
  }

  /** The label of a face, 0 or more. */
  public int faceLabel(int face) {
    throw new UnsupportedOperationException();
  }

  /** Area of a face, m². */
  public double faceArea(int face) {
    throw new UnsupportedOperationException();
  }

  /**
   * The rings of a face as vertex indices: the outer ring first, counter-clockwise, then the holes,
   * clockwise. Rings touch at most in single vertices.
   */
  public List<int[]> faceRings(int face) {
    throw new UnsupportedOperationException();
  }

  /** Area with the label, all faces together, m². */
  public double labelArea(int label) {
    throw new UnsupportedOperationException();
  }

  /** Everything doubtful that was found, in a stable order. */
  public List<Defect> defects() {
    throw new UnsupportedOperationException();
  }

  /** How far any point of the drawing was moved, at most, m. */
  public double largestDisplacementM() {
    throw new UnsupportedOperationException();
  }
}
