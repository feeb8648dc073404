package coldseam.solver.window;

/**
 * A mullion or a transom.
 *
 * @param profile what it is
 * @param centreM distance of its middle from the left edge of the window (mullion) or from its
 *     upper edge (transom), m
 */
public record Divider(Profile profile, double centreM) {}
