/**
 * A partition is a set of faces that do not overlap, share their edges exactly and carry the label
 * of the area laid last over them. Lengths are metres, coordinates local to {@link
 * coldseam.mesh.partition.Partition#origin()}. The entry is {@link
 * coldseam.mesh.partition.Partition}. Not guaranteed: that the drawing is what its author meant;
 * what looks doubtful is listed as a {@link coldseam.mesh.partition.Defect}.
 */
package coldseam.mesh.partition;
