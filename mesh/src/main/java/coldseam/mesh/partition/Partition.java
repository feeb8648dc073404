package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;

/**
 * A clean planar partition made of labelled areas, laid in order, and labelled lines. Faces are the
 * connected regions of one label; edges are straight, meet only at vertices and separate two faces,
 * or one face from uncovered ground. Two faces of one label are neighbours only where a line
 * divides them along a drawn edge.
 *
 * <p>Nothing is rounded to a grid. Points within the joining length become one; gaps up to the
 * closing length are closed one by one and listed. Vertices on a straight edge where nothing else
 * ends are left out.
 *
 * <p>Coordinates are local: {@link #origin()} plus a local coordinate is the place in the drawing.
 */
public final class Partition {
  /** The label of ground that no area covers, and the face index there. */
  public static final int NONE = -1;

  private final Point origin;
  private final Boundaries edges;
  private final int[] leftFace;
  private final int[] rightFace;
  private final int[] faceLabel;
  private final double[] faceArea;
  private final List<List<int[]>> faceRings;
  private final List<Defect> defects;
  private final double largestDisplacementM;

  /** Takes over what the builder made. */
  Partition(
      Point origin,
      Boundaries edges,
      FaceRings rings,
      List<Defect> defects,
      double largestDisplacementM) {
    this.origin = origin;
    this.edges = edges;
    this.defects = List.copyOf(defects);
    this.largestDisplacementM = largestDisplacementM;
    leftFace = new int[edges.edgeCount];
    rightFace = new int[edges.edgeCount];
    for (int e = 0; e < edges.edgeCount; e++) {
      leftFace[e] = rings.faceOf(2 * e);
      rightFace[e] = rings.faceOf(2 * e + 1);
    }
    int n = rings.faces().size();
    faceLabel = new int[n];
    faceArea = new double[n];
    faceRings = new ArrayList<>(n);
    for (int f = 0; f < n; f++) {
      FaceRings.Face face = rings.faces().get(f);
      faceLabel[f] = face.label();
      faceArea[f] = rings.area(face);
      faceRings.add(face.rings());
    }
  }

  /**
   * Makes a partition.
   *
   * @param areas in the order laid, a later one over the earlier
   * @param lines lines to be noded with the areas
   * @param resolution which points are the same
   * @return the partition with everything doubtful listed in {@link #defects()}
   * @throws IllegalArgumentException if there is no area, or nothing of the areas is left
   * @throws IllegalStateException if the result breaks one of its own promises: a defect of this
   *     program
   */
  public static Partition of(
      List<LabelledArea> areas, List<LabelledLine> lines, Resolution resolution) {
    return new PartitionBuilder(areas, resolution).build(lines);
  }

  /** The point of the drawing at local (0, 0). */
  public Point origin() {
    return origin;
  }

  public int vertexCount() {
    return edges.vertexCount;
  }

  /** Local x of a vertex, m. */
  public double x(int vertex) {
    return edges.x[vertex];
  }

  /** Local y of a vertex, m. */
  public double y(int vertex) {
    return edges.y[vertex];
  }

  public int edgeCount() {
    return edges.edgeCount;
  }

  public int edgeStart(int edge) {
    return edges.start[edge];
  }

  public int edgeEnd(int edge) {
    return edges.end[edge];
  }

  /** Length of an edge, m. */
  public double edgeLength(int edge) {
    return edges.length(edge);
  }

  /** The face to the left when walking from {@link #edgeStart} to {@link #edgeEnd}, or NONE. */
  public int leftFace(int edge) {
    return leftFace[edge];
  }

  /** The face to the right when walking from {@link #edgeStart} to {@link #edgeEnd}, or NONE. */
  public int rightFace(int edge) {
    return rightFace[edge];
  }

  /** The label of the left face, or NONE. */
  public int leftLabel(int edge) {
    return leftFace[edge] == NONE ? NONE : faceLabel[leftFace[edge]];
  }

  /** The label of the right face, or NONE. */
  public int rightLabel(int edge) {
    return rightFace[edge] == NONE ? NONE : faceLabel[rightFace[edge]];
  }

  /** Labels of the lines that lie on an edge, ascending; mostly empty. */
  public List<Integer> linesOn(int edge) {
    List<Integer> labels = new ArrayList<>(edges.lines[edge].length);
    for (int line : edges.lines[edge]) {
      labels.add(line);
    }
    return List.copyOf(labels);
  }

  public int faceCount() {
    return faceLabel.length;
  }

  /** The label of a face, 0 or more. */
  public int faceLabel(int face) {
    return faceLabel[face];
  }

  /** Area of a face, m². */
  public double faceArea(int face) {
    return faceArea[face];
  }

  /**
   * The rings of a face as vertex indices: the outer ring first, counter-clockwise, then the holes,
   * clockwise. Rings touch at most in single vertices.
   */
  public List<int[]> faceRings(int face) {
    List<int[]> copies = new ArrayList<>(faceRings.get(face).size());
    for (int[] ring : faceRings.get(face)) {
      copies.add(ring.clone());
    }
    return List.copyOf(copies);
  }

  /** Area with the label, all faces together, m². */
  public double labelArea(int label) {
    double sum = 0;
    for (int f = 0; f < faceLabel.length; f++) {
      if (faceLabel[f] == label) {
        sum += faceArea[f];
      }
    }
    return sum;
  }

  /** Everything doubtful that was found: kind by kind, each in the order of the drawing. */
  public List<Defect> defects() {
    return defects;
  }

  /** How far any point of the drawing was moved, at most, m. */
  public double largestDisplacementM() {
    return largestDisplacementM;
  }
}
