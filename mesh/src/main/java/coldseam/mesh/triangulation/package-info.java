/**
 * A mesh is a set of triangles that fill the faces of a partition, share their sides exactly and
 * know which partition edge a side lies on. Lengths are metres, coordinates local to {@link
 * coldseam.mesh.triangulation.Mesh#origin()}. The entry is {@link
 * coldseam.mesh.triangulation.Triangulator}.
 */
package coldseam.mesh.triangulation;
