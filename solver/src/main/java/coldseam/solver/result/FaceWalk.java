package coldseam.solver.result;

/**
 * A straight piece of outline that faces one space.
 *
 * @param from vertex it begins at
 * @param to vertex it ends at
 * @param lengthM m
 * @param direction from the first to the last
 * @param stop the outline edge that follows, or −1
 * @param space the space it faces
 * @param forward whether it runs with the section on the left
 */
record FaceWalk(
    int from, int to, double lengthM, Direction direction, int stop, int space, boolean forward) {}
