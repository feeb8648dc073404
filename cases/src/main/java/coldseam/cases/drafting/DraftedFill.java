package coldseam.cases.drafting;

import coldseam.cases.drawing.DrawnShapes.Shape;
import coldseam.mesh.plane.Point;
import java.util.List;

/**
 * One entry of a drafted section.
 *
 * @param name what it is called until somebody decides
 * @param kind how it is taken from the drawing
 * @param layer its layer, for {@link Kind#LAYER}
 * @param look how it is filled, empty if that does not matter
 * @param points the points that take it, for {@link Kind#FACES} and {@link Kind#OPEN}; m
 * @param shapes what it covers
 * @param areaM2 its area
 * @param line where the first of it stands in the drawing
 */
record DraftedFill(
    String name,
    Kind kind,
    String layer,
    String look,
    List<Point> points,
    List<Shape> shapes,
    double areaM2,
    int line) {
  /** How an entry takes its shapes. */
  enum Kind {
    /** By layer and look. */
    LAYER,
    /** By points in faces of a layer's lines. */
    FACES,
    /** By points in faces that only the lines of several layers close. */
    GAPS,
    /** The open region around a point. */
    OPEN
  }
}
