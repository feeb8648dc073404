package coldseam.cases;

import coldseam.mesh.plane.Point;

/**
 * A place in a drawing that the reader should look at.
 *
 * @param where in the section, m
 * @param text what is there, e.g. "corners 0.4 mm apart on layer `WALL` (line 120): joined"
 */
public record Doubt(Point where, String text) {}
