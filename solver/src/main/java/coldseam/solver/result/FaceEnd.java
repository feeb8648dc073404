package coldseam.solver.result;

/**
 * Where the outline that faces one space ends.
 *
 * @param stop the first outline edge that does not face the space, or −1
 * @param runStart first vertex of the last straight run before it
 * @param at the vertex it ends at
 * @param run direction of that run
 */
record FaceEnd(int stop, int runStart, int at, Direction run) {}
