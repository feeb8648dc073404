/**
 * Refinement is the replacement of triangles by smaller ones that fill exactly the same region. The
 * entry is {@link coldseam.mesh.refinement.NewestVertexBisection}.
 */
package coldseam.mesh.refinement;
