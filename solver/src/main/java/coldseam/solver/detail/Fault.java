package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.Optional;

/**
 * Something in a detail that keeps it from being solved.
 *
 * @param part what kind of thing is at fault: "space", "stretch", "flank", "psi", "section", …
 * @param name the name of that thing in the detail, or empty
 * @param message what is wrong and what would be right; lengths in it in mm
 * @param where the place in the drawing, if it has one, m
 */
public record Fault(String part, String name, String message, Optional<Point> where) {}
