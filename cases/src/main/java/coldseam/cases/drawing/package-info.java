/**
 * A drawing is what an architect sends: an SVG or an ASCII DXF file. It is read into pieces, lines
 * and filled outlines with straight edges, each with its layer and the place in the file where it
 * stands; whatever is no outline is listed as left out. Curves are chords within a stated
 * deviation. Coordinates are in units of the drawing, y upwards. The entry is {@link
 * coldseam.cases.drawing.Drawing}; {@link coldseam.cases.drawing.DrawnShapes} joins the pieces,
 * closes faces and finds them again by layer or by a point.
 *
 * <p>Nothing is ever fetched and nothing in a drawing is run. Every reader works within the bounds
 * of {@link coldseam.cases.drawing.Limits}.
 */
package coldseam.cases.drawing;
