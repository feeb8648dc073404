package coldseam.solver.result;

/**
 * One end of a cut-off plane and the face that continues from it into the detail.
 *
 * @param vertex the end of the plane
 * @param face the outline edge next to it, or −1
 * @param forward whether one walks into the detail with the section on the left
 * @param space the space the face faces, or −1
 */
record FlankEnd(int vertex, int face, boolean forward, int space) {}
