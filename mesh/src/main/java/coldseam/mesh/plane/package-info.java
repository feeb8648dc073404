/**
 * The plane: points, the one resolution below which points are the same, and the two predicates on
 * which every triangulation rests. Lengths are metres throughout. The entry is {@link
 * coldseam.mesh.plane.Predicates}.
 */
package coldseam.mesh.plane;
